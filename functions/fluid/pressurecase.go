package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// Names of the stresses that the laws of cases give.
const (
	hoopStress       = "hoop"
	axialStress      = "axial"
	radialStress     = "radial"
	equivalentStress = "equivalent"
)

// caseLaws are those of the walls of tubes and spheres under pressure.
func caseLaws() []*law.Law {
	const (
		lame     = "Lamé G. (1852) Leçons sur la théorie mathématique de l'élasticité des corps solides; Timoshenko S., Goodier J.N., Theory of Elasticity, 3rd ed. (1970), sections 28 and 136"
		boiler   = "Timoshenko S., Woinowsky-Krieger S., Theory of Plates and Shells, 2nd ed. (1959), chapter 14 (membrane theory)"
		elastic  = "Elastic, round and without holes, welds or notches: ends, covers and seats of seals bend and are loaded higher. "
		geometry = "the radii do not enclose a wall, or the radius lies outside it"
	)
	inner := law.Parameter{Name: "inner_radius", Meaning: "radius of the inner surface", Unit: "mm", Finite: law.AtLeast(0)}
	outer := law.Parameter{Name: "outer_radius", Meaning: "radius of the outer surface", Unit: "mm", Finite: law.Above(0)}
	inside := law.Parameter{Name: "inner_pressure", Meaning: "gauge pressure inside; 0 for a case closed at the surface", Unit: "MPa(g)"}
	outside := law.Parameter{Name: "outer_pressure", Meaning: "gauge pressure outside: in the sea the sea pressure", Unit: "MPa(g)"}
	radius := law.Parameter{Name: "radius", Meaning: "radius at which the stress is asked for; it is highest at the inner surface", Unit: "mm", Finite: law.Above(0)}
	outerLoad := outside
	outerLoad.Finite = law.AtLeast(0)
	limit := law.Parameter{Name: "stress", Meaning: "equivalent stress that must not be passed: the yield stress divided by a factor of safety", Unit: "MPa", Finite: law.Above(0)}
	const needless = "no wall is thick enough: the pressure alone takes the material to its limit"
	component := func(choices ...string) law.Parameter {
		return law.Parameter{
			Name: "component", Meaning: "which stress; pull is positive, push negative", Type: law.Text,
			Default: `"` + hoopStress + `"`, Choices: choices,
		}
	}
	return []*law.Law{
		{
			Name: "thick_cylinder_stress", Group: "fluid",
			Gives: "stress in the wall of a tube with closed ends under pressure from inside and outside",
			Parameters: []law.Parameter{
				inner, outer, inside, outside, radius,
				component(hoopStress, radialStress, axialStress, equivalentStress),
			},
			Result:   law.Result{Unit: "MPa"},
			Equation: "hoop A + B/r^2, radial A - B/r^2, axial A, equivalent (von Mises) sqrt(3) |B|/r^2; A = (p_i r_i^2 - p_o r_o^2)/(r_o^2 - r_i^2), B = (p_i - p_o) r_i^2 r_o^2/(r_o^2 - r_i^2); r_i inner_radius, r_o outer_radius, p_i inner_pressure, p_o outer_pressure, r radius",
			Source:   lame,
			Caution:  elastic + "Under pressure from outside a tube may buckle long before it yields: see cylinder_buckling_pressure. " + law.CautionPressure,
			Refusal:  geometry,
			Examples: []law.Example{
				// A = 100/3 MPa, B/r^2 = 400/3 MPa at the inner surface.
				{Formula: "thick_cylinder_stress(50[mm], 100[mm], 100[MPa], 0[MPa], 50[mm])", Gives: "166.6667 MPa"},
				{Formula: `thick_cylinder_stress(50[mm], 100[mm], 100[MPa], 0[MPa], 50[mm], component: "radial")`, Gives: "-100 MPa"},
			},
			Body: componentBody(5, func(x []float64, component string) float64 {
				return cylinderStress(x[0], x[1], x[2], x[3], x[4], component)
			}),
		},
		{
			Name: "thin_cylinder_stress", Group: "fluid",
			Gives: "membrane stress in the thin wall of a tube with closed ends",
			Parameters: []law.Parameter{
				{Name: "radius", Meaning: "radius of the middle of the wall", Unit: "mm", Finite: law.Above(0)},
				{Name: "wall", Meaning: "thickness of the wall, at most a tenth of the radius", Unit: "mm", Finite: law.Above(0)},
				{Name: "pressure", Meaning: "pressure inside less that outside", Unit: "MPa(g)"},
				component(hoopStress, axialStress),
			},
			Result:   law.Result{Unit: "MPa"},
			Equation: "hoop p r/w, axial p r/(2 w); p pressure, r radius, w wall",
			Source:   boiler,
			Caution:  elastic + "Beyond a wall of a tenth of the radius it errs by more than 5 %: use thick_cylinder_stress. " + law.CautionPressure,
			Refusal:  "the wall is thicker than half the radius: this is no thin wall",
			Examples: []law.Example{
				{Formula: "thin_cylinder_stress(100[mm], 5[mm], 2[MPa])", Gives: "40 MPa"},
				{Formula: `thin_cylinder_stress(100[mm], 5[mm], 2[MPa], component: "axial")`, Gives: "20 MPa"},
			},
			Body: componentBody(3, func(x []float64, component string) float64 {
				if x[1] > x[0]/2 {
					return math.NaN()
				}
				stress := x[2] * x[0] / x[1]
				if component == axialStress {
					return stress / 2
				}
				return stress
			}),
		},
		{
			Name: "sphere_stress", Group: "fluid",
			Gives: "stress in the wall of a hollow sphere under pressure from inside and outside",
			Parameters: []law.Parameter{
				inner, outer, inside, outside, radius,
				component(hoopStress, radialStress, equivalentStress),
			},
			Result:   law.Result{Unit: "MPa"},
			Equation: "hoop A + B/r^3, radial A - 2 B/r^3, equivalent (von Mises) 3 |B|/r^3; A = (p_i r_i^3 - p_o r_o^3)/(r_o^3 - r_i^3), B = (p_i - p_o) r_i^3 r_o^3/[2 (r_o^3 - r_i^3)]; r_i inner_radius, r_o outer_radius, p_i inner_pressure, p_o outer_pressure, r radius",
			Source:   lame,
			Caution:  elastic + "Under pressure from outside a sphere may buckle before it yields: see sphere_buckling_pressure. " + law.CautionPressure,
			Refusal:  geometry,
			Examples: []law.Example{
				// A = 100/7 MPa, B/r^3 = 400/7 MPa at the inner surface.
				{Formula: "sphere_stress(50[mm], 100[mm], 100[MPa], 0[MPa], 50[mm])", Gives: "71.428571 MPa"},
				{Formula: `sphere_stress(50[mm], 100[mm], 100[MPa], 0[MPa], 50[mm], component: "radial")`, Gives: "-100 MPa"},
			},
			Body: componentBody(5, func(x []float64, component string) float64 {
				return sphereStress(x[0], x[1], x[2], x[3], x[4], component)
			}),
		},
		{
			Name: "thick_cylinder_wall", Group: "fluid",
			Gives:      "wall that a tube with closed ends needs under pressure from outside to keep its equivalent stress below a limit",
			Parameters: []law.Parameter{inner, outerLoad, limit},
			Result:     law.Result{Unit: "mm"},
			Equation:   "w = r_i [1/sqrt(1 - sqrt(3) p/s) - 1], from the equivalent stress of thick_cylinder_stress at the inner surface; r_i inner_radius, p outer_pressure, s stress",
			Source:     lame,
			Caution:    elastic + "Against yielding alone: check cylinder_buckling_pressure as well. " + law.CautionPressure,
			Refusal:    needless,
			Examples: []law.Example{
				// sqrt(3) p/s = 3/4: half the outer radius.
				{Formula: "thick_cylinder_wall(50[mm], 75[MPa], sqrt(3) * 100[MPa])", Gives: "50 mm"},
			},
			Body: law.Of3(func(inner, pressure, limit float64) float64 {
				rest := 1 - math.Sqrt(3)*pressure/limit
				if !(rest > 0) {
					return math.NaN()
				}
				return inner * (1/math.Sqrt(rest) - 1)
			}),
		},
		{
			Name: "sphere_wall", Group: "fluid",
			Gives:      "wall that a hollow sphere needs under pressure from outside to keep its equivalent stress below a limit",
			Parameters: []law.Parameter{inner, outerLoad, limit},
			Result:     law.Result{Unit: "mm"},
			Equation:   "w = r_i [1/(1 - 3 p/(2 s))^(1/3) - 1], from the equivalent stress of sphere_stress at the inner surface; r_i inner_radius, p outer_pressure, s stress",
			Source:     lame,
			Caution:    elastic + "Against yielding alone: check sphere_buckling_pressure as well. " + law.CautionPressure,
			Refusal:    needless,
			Examples: []law.Example{
				// 3 p/(2 s) = 7/8: half the outer radius.
				{Formula: "sphere_wall(50[mm], 70[MPa], 120[MPa])", Gives: "50 mm"},
			},
			Body: law.Of3(func(inner, pressure, limit float64) float64 {
				rest := 1 - 1.5*pressure/limit
				if !(rest > 0) {
					return math.NaN()
				}
				return inner * (1/column.Cbrt(rest) - 1)
			}),
		},
	}
}

// componentBody makes a body of a function of count numbers and the name of the
// stress, which is the argument after them.
func componentBody(count int, of func(x []float64, component string) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, work *law.Work) {
		component := arguments[count].Text
		law.OfMany(func(x []float64) float64 { return of(x, component) })(dst, arguments[:count], work)
	}
}

// walled says whether two radii enclose a wall in which a third lies; radii are
// told apart to the last bits of a computed one.
func walled(inner, outer, radius float64) bool {
	const slack = 1e-12
	return inner < outer && radius >= inner*(1-slack) && radius <= outer*(1+slack) && radius > 0
}

// cylinderStress gives a stress in Pa in a tube's wall.
func cylinderStress(inner, outer, inside, outside, radius float64, component string) float64 {
	if !walled(inner, outer, radius) {
		return math.NaN()
	}
	ratio := inner / outer
	square := float64(ratio * ratio)
	rest := (1 - ratio) * (1 + ratio) // keeps every digit of thin walls
	mean := (float64(inside*square) - outside) / rest
	reach := inner / radius
	bend := float64((inside - outside) * (reach * reach) / rest)
	switch component {
	case radialStress:
		return mean - bend
	case axialStress:
		return mean
	case equivalentStress:
		return math.Sqrt(3) * math.Abs(bend)
	}
	return mean + bend
}

// sphereStress gives a stress in Pa in a sphere's wall.
func sphereStress(inner, outer, inside, outside, radius float64, component string) float64 {
	if !walled(inner, outer, radius) {
		return math.NaN()
	}
	ratio := inner / outer
	square := float64(ratio * ratio)
	rest := (1 - ratio) * (1 + ratio + square)
	mean := (float64(inside*square*ratio) - outside) / rest
	reach := inner / radius
	twice := float64((inside - outside) * (reach * reach * reach) / rest)
	bend := float64(twice / 2)
	switch component {
	case radialStress:
		return mean - twice
	case equivalentStress:
		return 3 * math.Abs(bend)
	}
	return mean + bend
}
