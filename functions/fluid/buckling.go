package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// Names of the equations for the buckling of a tube.
const (
	windenburgTrilling = "Windenburg-Trilling"
	vonMises           = "von Mises"
)

// bucklingLaws are those of thin walls that give way under pressure from
// outside.
func bucklingLaws() []*law.Law {
	const imperfect = "Elastic buckling of a perfect shape. Out-of-round, dents and welds halve it or worse, and short or thick walls yield first: check both. "
	young := law.Parameter{Name: "young_modulus", Meaning: "Young's modulus of the wall", Unit: "GPa", Finite: law.Above(0)}
	poisson := law.Parameter{Name: "poisson", Meaning: "Poisson's ratio of the wall", Unit: "1", Valid: law.Within(0, 0.5), Finite: law.Between(-1, 1), Default: "0.3"}
	radius := law.Parameter{Name: "radius", Meaning: "radius of the middle of the wall", Unit: "mm", Finite: law.Above(0)}
	wall := law.Parameter{Name: "wall", Meaning: "thickness of the wall", Unit: "mm", Finite: law.Above(0)}
	return []*law.Law{
		{
			Name: "cylinder_buckling_pressure", Group: "fluid",
			Gives: "excess of pressure from outside, on wall and ends, at which a thin tube buckles",
			Parameters: []law.Parameter{
				radius, wall,
				{Name: "length", Meaning: "length between ends or stiff rings that keep the tube round", Unit: "mm", Finite: law.Above(0)},
				young, poisson,
				{
					Name: "equation", Meaning: "the short formula, or the least over the number of waves", Type: law.Text,
					Default: `"` + vonMises + `"`, Choices: []string{vonMises, windenburgTrilling},
				},
			},
			Result:   law.Result{Unit: "MPa(g)"},
			Equation: "von Mises: p = the least over n = 2, 3, ... of (E w/r)/(n^2 - 1 + q^2/2) {1/(n^2/q^2 + 1)^2 + w^2/[12 r^2 (1 - nu^2)] (n^2 - 1 + q^2)^2}, q = pi r/L; Windenburg-Trilling: p = 2.42 E (w/D)^2.5/{(1 - nu^2)^0.75 [L/D - 0.45 (w/D)^0.5]}, D = 2 r; r radius, w wall, L length, E young_modulus, nu poisson, n number of waves around",
			Source:   "von Mises R. (1929) Der kritische Außendruck für allseits belastete zylindrische Rohre, Fest-Zeitschrift Stodola, Zürich; Windenburg D.F., Trilling C. (1934) Collapse by instability of thin cylindrical shells under external pressure, Trans. ASME 56, 819-825",
			Caution:  imperfect + law.CautionPressure,
			Refusal:  "the tube is too short or its wall too thick for a formula of thin walls",
			Examples: []law.Example{
				// A long tube: E w^3/[4 (1 - nu^2) r^3].
				{Formula: "cylinder_buckling_pressure(100[mm], 2[mm], 1000[m], 200[GPa])", Gives: "0.43956 MPa"},
			},
			Body: cylinderBucklingBody,
		},
		{
			Name: "sphere_buckling_pressure", Group: "fluid",
			Gives: "excess of pressure from outside at which a thin hollow sphere buckles",
			Parameters: []law.Parameter{
				radius, wall, young, poisson,
				{Name: "knockdown", Meaning: "what is left of it in a real sphere: 1 for a perfect one, 0.2 to 0.7 in tests", Unit: "1", Valid: law.Within(0, 1), Finite: law.Within(0, 1), Default: "1"},
			},
			Result:   law.Result{Unit: "MPa(g)"},
			Equation: "p = k 2 E (w/r)^2/sqrt(3 (1 - nu^2)); k knockdown, E young_modulus, w wall, r radius, nu poisson",
			Source:   "Zoelly R. (1915) Über ein Knickungsproblem an der Kugelschale, dissertation, ETH Zürich; Timoshenko S., Gere J.M., Theory of Elastic Stability, 2nd ed. (1961), section 11.13",
			Caution:  imperfect + law.CautionPressure,
			Refusal:  "the wall is thicker than half the radius: this is no thin wall",
			Examples: []law.Example{
				// 2/sqrt(3 (1 - 0.09)) = 1.210455.
				{Formula: "sphere_buckling_pressure(1000[mm], 10[mm], 200[GPa])", Gives: "24.2091 MPa"},
			},
			Body: law.OfMany(func(x []float64) float64 {
				if x[1] > x[0]/2 {
					return math.NaN()
				}
				ratio := x[1] / x[0]
				return x[4] * 2 * x[2] * (ratio * ratio) / math.Sqrt(3*(1-float64(x[3]*x[3])))
			}),
		},
	}
}

// cylinderBucklingBody takes radius, wall, length, Young's modulus, Poisson's
// ratio and the equation's name.
func cylinderBucklingBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	of := misesPressure
	if arguments[5].Text == windenburgTrilling {
		of = windenburgPressure
	}
	for i := range dst {
		dst[i] = of(arguments[0].At(i), arguments[1].At(i), arguments[2].At(i), arguments[3].At(i), arguments[4].At(i))
	}
}

// mostWaves bounds the search for the number of waves; so many belong to tubes
// far shorter than any formula of thin walls allows.
const mostWaves = 1000

// misesPressure gives von Mises's pressure in Pa; NaN for walls thicker than
// half the radius and where even mostWaves waves are too few.
func misesPressure(radius, wall, length, young, poisson float64) float64 {
	if wall > radius/2 {
		return math.NaN()
	}
	q := math.Pi * radius / length
	square := float64(q * q)
	ratio := wall / radius
	bending := ratio * ratio / (12 * (1 - float64(poisson*poisson)))
	best := math.Inf(1)
	for n := 2.0; n <= mostWaves; n++ {
		waves := float64(n * n)
		stretch := waves/square + 1
		around := waves - 1 + square
		p := (1/(stretch*stretch) + float64(bending*(around*around))) / (waves - 1 + float64(square/2))
		if p >= best {
			// It falls to its one minimum, then rises.
			return young * ratio * best
		}
		best = p
	}
	return math.NaN()
}

// windenburgPressure gives Windenburg and Trilling's pressure in Pa; NaN where
// the tube is so short that its formula has none.
func windenburgPressure(radius, wall, length, young, poisson float64) float64 {
	slender := wall / (2 * radius)
	root := math.Sqrt(slender)
	long := length/(2*radius) - float64(0.45*root)
	if !(long > 0) || wall > radius/2 {
		return math.NaN()
	}
	return 2.42 * young * (slender * slender * root) / (column.Pow(1-float64(poisson*poisson), 0.75) * long)
}
