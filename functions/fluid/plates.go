package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// plate is a flat shape, upright or inclined, with its top edge or point
// horizontal: what its moments are in units of its width and its length down
// the slope.
type plate struct {
	name     string
	area     float64 // area/(width length)
	centroid float64 // distance of the centroid from the top/length
	second   float64 // second moment of area about the centroid/(width length^3)
}

// plates are the shapes that the laws know. A circle is an ellipse as long as it
// is wide.
var plates = [...]plate{
	{"rectangle", 1, 0.5, 1.0 / 12},
	{"ellipse", math.Pi / 4, 0.5, math.Pi / 64},
	{"triangle point up", 0.5, 2.0 / 3, 1.0 / 36},
	{"triangle point down", 0.5, 1.0 / 3, 1.0 / 36},
}

// plateLaws are those of the load of a liquid on flat walls.
func plateLaws() []*law.Law {
	const books = "White F.M., Fluid Mechanics, 5th ed. (2003), section 2.5; Cengel Y.A., Cimbala J.M., Fluid Mechanics: Fundamentals and Applications, 1st ed. (2006), section 3-5"
	names := make([]string, len(plates))
	for i := range plates {
		names[i] = plates[i].name
	}
	parameters := []law.Parameter{
		{Name: "shape", Meaning: "shape of the plate; a circle is an ellipse as long as it is wide", Type: law.Text, Choices: names},
		{Name: "width", Meaning: "greatest horizontal width", Unit: "m", Finite: law.Above(0)},
		{Name: "length", Meaning: "length from top to foot, down the slope", Unit: "m", Finite: law.Above(0)},
		{Name: "top_depth", Meaning: "vertical depth of the top below the liquid's surface", Unit: "m", Finite: law.AtLeast(0)},
		{Name: "density", Meaning: "density of the liquid", Unit: "kg/m^3", Finite: law.Above(0)},
		{Name: "inclination", Meaning: "angle of the plate from the horizontal", Unit: "deg", Finite: law.Within(0, 90), Default: "90[deg]"},
		{Name: "surface_pressure", Meaning: "pressure on the liquid above that on the dry side of the plate", Unit: "Pa(g)", Finite: law.AtLeast(0), Default: "0[Pa]"},
		{Name: "gravity", Meaning: "acceleration of gravity", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"},
	}
	return []*law.Law{
		{
			Name: "plate_force", Group: "fluid",
			Gives:      "force of a liquid on a flat plate, square to it",
			Parameters: parameters,
			Result:     law.Result{Unit: "kN"},
			Equation:   "F = (p_s + rho g z_c) A, z_c = z_t + y_c sin a; rectangle A = b L, y_c = L/2; ellipse A = pi b L/4, y_c = L/2; triangle A = b L/2, y_c = 2 L/3 (point up) or L/3 (point down); b width, L length, z_t top_depth, a inclination, p_s surface_pressure, rho density, g gravity",
			Source:     books, Caution: law.CautionPressure,
			Examples: []law.Example{
				{Formula: `plate_force("rectangle", 500[m], 80.0[m], 0[m], 1000[kg/m^3], gravity: 9.80[m/s^2])`, Gives: "1.568e10 N"},
			},
			Body: plateBody(plateForce),
		},
		{
			Name: "plate_centre", Group: "fluid",
			Gives:      "vertical depth of the centre of pressure of a flat plate below the liquid's surface",
			Parameters: parameters,
			Result:     law.Result{Unit: "m"},
			Equation:   "z_p = z_c + I sin^2 a/[(z_c + p_s/(rho g)) A], z_c = z_t + y_c sin a; I/A = L^2/12 (rectangle), L^2/16 (ellipse), L^2/18 (triangle); z_c depth of the centroid as in plate_force, L length, z_t top_depth, a inclination, p_s surface_pressure, rho density, g gravity",
			Source:     books, Caution: law.CautionPressure,
			Refusal: "a horizontal plate in the surface bears no load: it has no centre of pressure",
			Examples: []law.Example{
				{Formula: `plate_centre("rectangle", 2[m], 3[m], 2.5[m], 1000[kg/m^3])`, Gives: "4.1875 m"},
				{Formula: `plate_centre("rectangle", 1[m], 1.2[m], 8[m], 1000[kg/m^3])`, Gives: "8.61 m"},
			},
			Body: plateBody(plateCentre),
		},
		{
			Name: "wall_moment", Group: "fluid",
			Gives: "moment of a liquid's load about the foot of an upright wall that holds it back",
			Parameters: []law.Parameter{
				{Name: "width", Meaning: "horizontal width of the wall", Unit: "m", Finite: law.Above(0)},
				{Name: "depth", Meaning: "depth of the liquid at the wall", Unit: "m", Finite: law.AtLeast(0)},
				{Name: "density", Meaning: "density of the liquid", Unit: "kg/m^3", Finite: law.Above(0)},
				{Name: "gravity", Meaning: "acceleration of gravity", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"},
			},
			Result:   law.Result{Unit: "kN m"},
			Equation: "M = rho g b h^3/6; rho density, b width, h depth, g gravity",
			Source:   books, Caution: "At rest: waves and earthquakes load a wall more. " + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "wall_moment(1[m], 3[m], 1000[kg/m^3], gravity: 10[m/s^2])", Gives: "45 kN m"},
			},
			Body: law.Of4(func(width, depth, density, gravity float64) float64 {
				return density * gravity * width * (depth * depth * depth) / 6
			}),
		},
	}
}

// plateBody makes a body of a function of the plate and its load.
func plateBody(of func(p *plate, x []float64) float64) law.Body {
	inner := func(p *plate) law.Body { return law.OfMany(func(x []float64) float64 { return of(p, x) }) }
	return func(dst []float64, arguments []law.Argument, work *law.Work) {
		for i := range plates {
			if plates[i].name == arguments[0].Text {
				inner(&plates[i])(dst, arguments[1:], work)
			}
		}
	}
}

// plateForce gives the force in N; x is width, length, top depth, density,
// inclination, surface pressure and gravity.
func plateForce(p *plate, x []float64) float64 {
	centroid := x[2] + float64(p.centroid*x[1]*column.Sin(x[4]))
	pressure := x[5] + float64(x[3]*x[6]*centroid)
	return pressure * (p.area * x[0] * x[1])
}

// plateCentre gives the depth of the centre of pressure in m; x as in
// plateForce.
func plateCentre(p *plate, x []float64) float64 {
	sine := column.Sin(x[4])
	centroid := x[2] + float64(p.centroid*x[1]*sine)
	loaded := centroid + x[5]/(x[3]*x[6])
	if !(loaded > 0) {
		return math.NaN()
	}
	length := x[1] * sine
	return centroid + float64(p.second/p.area*length*length)/loaded
}
