package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// speedScale gives sqrt(R T/M) in m/s, of which every mean speed is a multiple.
func speedScale(temperature, molarMass float64) float64 {
	return math.Sqrt(nature.MolarGasConstant * temperature / molarMass)
}

// twoOverRootPi is 2/sqrt(pi).
const twoOverRootPi = 1.12837916709551257389615890312154517

// fasterThan gives the fraction of particles faster than s times the most
// probable speed.
func fasterThan(s float64) float64 {
	if s < 1 {
		return 1 - slowerThan(s)
	}
	if s > 30 {
		return 0 // below the smallest number
	}
	return column.Erfc(s) + float64(twoOverRootPi*s*column.Exp(float64(-s*s)))
}

// slowerThan gives the fraction slower than s times the most probable speed.
// Below 1 it sums the series of Abramowitz M., Stegun I.A. (1964) Handbook of
// Mathematical Functions, 7.1.6, whose first term cancels: no digit is lost as
// s goes to 0.
func slowerThan(s float64) float64 {
	if !(s < 1) {
		return 1 - fasterThan(s)
	}
	twice := 2 * s * s
	term, sum := float64(twice*s)/3, 0.0
	for n := 2; term > sum*1e-17 && n < 60; n++ {
		sum += term
		term = term * twice / float64(2*n+1)
	}
	return float64(twoOverRootPi * column.Exp(float64(-s*s)) * sum)
}

// fractionBetween gives the fraction with speeds from a to b times the most
// probable one, from the tails that lose fewer digits.
func fractionBetween(a, b float64) float64 {
	if !(b >= a) {
		return notANumber
	}
	if b < 1 {
		return slowerThan(b) - slowerThan(a)
	}
	return fasterThan(a) - fasterThan(b)
}

func temperatureOfGas() law.Parameter {
	return law.Parameter{Name: "temperature", Meaning: "temperature of the gas", Unit: "K", Finite: law.Above(0)}
}

func molarMassOfParticles() law.Parameter {
	return law.Parameter{Name: "molar_mass", Meaning: "molar mass of the particles", Unit: "g/mol", Finite: law.Above(0)}
}

func pressureOfGas() law.Parameter {
	return law.Parameter{Name: "pressure", Meaning: "absolute pressure of the gas", Unit: "Pa(a)", Finite: law.Above(0)}
}

// Sources of kinetic theory.
const (
	maxwellSource = "Maxwell J.C. (1860) Phil. Mag. 19, 19; Atkins P., de Paula J. (2014) Physical Chemistry, 10th ed., section 1B"
	maxwellOnly   = "A gas in equilibrium at rest, below a tenth of its critical density and at speeds far below that of light."
)

// kineticLaws are the speeds of particles and how far they fly.
var kineticLaws = []*law.Law{
	kineticSpeed("mean_speed", "the mean speed of the particles of a gas", "v = sqrt(8 R T/(pi M))", math.Sqrt(8/math.Pi),
		law.Example{Formula: "mean_speed(298.15[K], 28.02[g/mol])", Gives: "475 m/s"}),
	kineticSpeed("root_mean_square_speed", "the root of the mean square of the speeds of the particles of a gas", "v = sqrt(3 R T/M)", math.Sqrt(3),
		law.Example{Formula: "root_mean_square_speed(300[K], 44.0[g/mol])", Gives: "412 m/s"}),
	kineticSpeed("most_probable_speed", "the most probable speed of the particles of a gas", "v = sqrt(2 R T/M)", math.Sqrt2,
		law.Example{Formula: "most_probable_speed(300[K], 32.0[g/mol])", Gives: "395 m/s"}),
	{
		Name: "fraction_faster", Group: group, Gives: "the fraction of the particles of a gas that are faster than a speed",
		Parameters: []law.Parameter{kineticLimit("speed", "speed that they exceed"), temperatureOfGas(), molarMassOfParticles()},
		Result:     law.Result{Unit: "1"},
		Equation:   "erfc(s) + (2/sqrt(pi)) s exp(-s^2), s = speed/sqrt(2 R T/M)", Source: maxwellSource, Caution: maxwellOnly,
		Examples: []law.Example{{Formula: "fraction_faster(most_probable_speed(300[K], 28[g/mol]), 300[K], 28[g/mol])", Gives: "0.5724"}},
		Body: law.Of3(func(v, t, m float64) float64 {
			return fasterThan(v / (math.Sqrt2 * speedScale(t, m)))
		}),
	},
	{
		Name: "fraction_between", Group: group, Gives: "the fraction of the particles of a gas with speeds between two limits",
		Parameters: []law.Parameter{kineticLimit("lower", "lower limit of the speed"), kineticLimit("upper", "upper limit of the speed"), temperatureOfGas(), molarMassOfParticles()},
		Result:     law.Result{Unit: "1"},
		Equation:   "F(lower) - F(upper), F(v) = erfc(s) + (2/sqrt(pi)) s exp(-s^2), s = v/sqrt(2 R T/M)", Source: maxwellSource, Caution: maxwellOnly,
		Refusal:  "the upper limit lies below the lower one",
		Examples: []law.Example{{Formula: "fraction_between(0[m/s], most_probable_speed(300[K], 28[g/mol]), 300[K], 28[g/mol])", Gives: "0.4276"}},
		Body: law.Of4(func(a, b, t, m float64) float64 {
			scale := math.Sqrt2 * speedScale(t, m)
			return fractionBetween(a/scale, b/scale)
		}),
	},
	{
		Name: "mean_free_path", Group: group, Gives: "how far a particle of a gas flies between collisions, in the mean",
		Parameters: []law.Parameter{pressureOfGas(), temperatureOfGas(), kineticDiameter},
		Result:     law.Result{Unit: "m"},
		Equation:   "l = k_B T/(sqrt(2) pi d^2 p); d diameter, p pressure", Source: maxwellSource,
		Caution:  "Hard spheres of one kind. The diameter that fits viscosity shrinks as it grows hotter; handbook values of l differ by 10 %.",
		Examples: []law.Example{{Formula: "mean_free_path(1.0[atm], 300[K], 290[pm])", Gives: "1.1e-7 m"}},
		Body:     law.Of3(hardSpherePath),
	},
	{
		Name: "collision_rate", Group: group, Gives: "how often a particle of a gas meets another",
		Parameters: []law.Parameter{pressureOfGas(), temperatureOfGas(), kineticDiameter, molarMassOfParticles()},
		Result:     law.Result{Unit: "s^-1"},
		Equation:   "z = v/l, v = sqrt(8 R T/(pi M)), l = k_B T/(sqrt(2) pi d^2 p); d diameter, p pressure", Source: maxwellSource,
		Caution:  "Hard spheres of one kind.",
		Examples: []law.Example{{Formula: "collision_rate(101325[Pa], 288.15[K], 0.365[nm], 28.9644[g/mol])", Gives: "6.919e9 s^-1"}},
		Body: law.Of4(func(p, t, d, m float64) float64 {
			return math.Sqrt(8/math.Pi) * speedScale(t, m) / hardSpherePath(p, t, d)
		}),
	},
	{
		Name: "impingement_rate", Group: group, Gives: "how many particles of a gas strike an area of wall in a time",
		Parameters: []law.Parameter{pressureOfGas(), temperatureOfGas(), molarMassOfParticles()},
		Result:     law.Result{Unit: "m^-2 s^-1"},
		Equation:   "Z = p/sqrt(2 pi m k_B T), m = M/N_A; p pressure", Source: "Hertz H. (1882) Ann. Phys. 253, 177; Knudsen M. (1909) Ann. Phys. 333, 75",
		Caution:  maxwellOnly,
		Examples: []law.Example{{Formula: "impingement_rate(1[Pa], 300[K], 28.0134[g/mol])", Gives: "2.87e22 m^-2 s^-1"}},
		Body:     law.Of3(impingement),
	},
	{
		Name: "effusion_rate", Group: group, Gives: "how many particles of a gas leave through a small hole into vacuum in a time",
		Parameters: []law.Parameter{
			pressureOfGas(), temperatureOfGas(), molarMassOfParticles(),
			{Name: "area", Meaning: "area of the hole in a thin wall", Unit: "m^2", Finite: law.AtLeast(0)},
		},
		Result:   law.Result{Unit: "s^-1"},
		Equation: "dN/dt = p A/sqrt(2 pi m k_B T), m = M/N_A; p pressure, A area", Source: "Knudsen M. (1909) Ann. Phys. 333, 75",
		Caution:  "The hole must be small against the mean free path, the wall thin against the hole. " + law.CautionVacuum,
		Examples: []law.Example{{Formula: "effusion_rate(1[Pa], 300[K], 28.0134[g/mol], 1[mm^2])", Gives: "2.87e16 s^-1"}},
		Body:     law.Of4(func(p, t, m, area float64) float64 { return area * impingement(p, t, m) }),
	},
}

func kineticSpeed(name, gives, equation string, factor float64, example law.Example) *law.Law {
	return &law.Law{
		Name: name, Group: group, Gives: gives,
		Parameters: []law.Parameter{temperatureOfGas(), molarMassOfParticles()},
		Result:     law.Result{Unit: "m/s"}, Equation: equation, Source: maxwellSource, Caution: maxwellOnly,
		Examples: []law.Example{example},
		Body:     law.Of2(func(t, m float64) float64 { return factor * speedScale(t, m) }),
	}
}
func kineticLimit(name, meaning string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning, Unit: "m/s", Finite: law.AtLeast(0)}
}

var kineticDiameter = law.Parameter{
	Name: "diameter", Meaning: "effective diameter of the particles as hard spheres: 0.365 nm for air in the U.S. Standard Atmosphere 1976",
	Unit: "nm", Finite: law.Above(0),
}

// hardSpherePath gives the mean free path in m.
func hardSpherePath(pressure, temperature, diameter float64) float64 {
	return nature.BoltzmannConstant * temperature / (math.Sqrt2 * math.Pi * diameter * diameter * pressure)
}

// impingement gives p/sqrt(2 pi m k T) in 1/(m^2 s).
func impingement(pressure, temperature, molarMass float64) float64 {
	return nature.AvogadroConstant * pressure / math.Sqrt(2*math.Pi*molarMass*nature.MolarGasConstant*temperature)
}
