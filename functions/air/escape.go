package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// escapeParameter gives G M m/(k T r): the depth of the well in units of k T.
func escapeParameter(gm, radius, temperature, molarMass float64) float64 {
	return gm / radius * molarMass / (nature.MolarGasConstant * temperature)
}

// escapeLaws are those of exospheres.
var escapeLaws = []*law.Law{
	{
		Name: "escape_speed", Group: group, Gives: "the speed that leaves a body for good", Parameters: []law.Parameter{escapeGM, escapeRadius},
		Result: law.Result{Unit: "m/s"}, Equation: "v = sqrt(2 G M/r)", Source: "conservation of energy; Laplace P.S. (1796) Exposition du système du monde",
		Caution:  "Without air, rotation and other bodies.",
		Examples: []law.Example{{Formula: "escape_speed(3.986e14[m^3/s^2], 6371[km])", Gives: "11.19 km/s"}},
		Body:     law.Of2(func(gm, r float64) float64 { return math.Sqrt(2 * gm / r) }),
	},
	{
		Name: "escape_parameter", Group: group, Gives: "a particle's energy of escape over k_B T (Jeans)",
		Parameters: []law.Parameter{escapeGM, escapeRadius, escapeExobase, molarMassOfParticles()},
		Result:     law.Result{Unit: "1"}, Equation: "lambda = G M m/(k_B T r), m = M_mol/N_A; M_mol molar_mass", Source: escapeJeans, Caution: escapeCaution,
		Examples: []law.Example{{Formula: "escape_parameter(3.986e14[m^3/s^2], 6871[km], 900[K], 1.008[g/mol])", Gives: "8"}},
		Body:     law.Of4(escapeParameter),
	},
	{
		Name: "escape_flux", Group: group, Gives: "how many particles escape through an area of the exobase in a time (Jeans)",
		Parameters: []law.Parameter{
			{Name: "number_density", Meaning: "number of particles in a volume at the exobase", Unit: "m^-3", Finite: law.AtLeast(0)},
			escapeGM, escapeRadius, escapeExobase, molarMassOfParticles(),
		},
		Result:   law.Result{Unit: "m^-2 s^-1"},
		Equation: "phi = n v_p (1 + lambda) exp(-lambda)/(2 sqrt(pi)), v_p = sqrt(2 R T/M_mol), lambda = G M m/(k_B T r)", Source: escapeJeans, Caution: escapeCaution,
		Examples: []law.Example{{Formula: "escape_flux(0[m^-3], 3.986e14[m^3/s^2], 6871[km], 1000[K], 1.008[g/mol])", Gives: "0 m^-2 s^-1"}},
		Body: law.OfMany(func(x []float64) float64 {
			lambda := escapeParameter(x[1], x[2], x[3], x[4])
			return x[0] * (math.Sqrt2 * speedScale(x[3], x[4])) * (1 + lambda) * column.Exp(-lambda) * (twoOverRootPi / 4)
		}),
	},
}

var escapeGM = law.Parameter{Name: "gravitational_parameter", Meaning: "gravitational constant times the mass of the body: 3.986e14 m^3/s^2 for the Earth", Unit: "m^3/s^2", Finite: law.Above(0)}
var escapeRadius = law.Parameter{Name: "radius", Meaning: "distance from the body's centre", Unit: "m", Finite: law.Above(0)}
var escapeExobase = law.Parameter{Name: "temperature", Meaning: "temperature at the exobase", Unit: "K", Finite: law.Above(0)}

const (
	escapeJeans   = "Jeans J.H. (1916) The Dynamical Theory of Gases, 2nd ed., chapter 15; de Pater I., Lissauer J.J. (2015) Planetary Sciences, 2nd ed., section 4.8"
	escapeCaution = "Thermal escape from a body at rest with a Maxwellian exobase: below a parameter of 2 the gas streams away as a whole, and other escapes may be greater."
)
