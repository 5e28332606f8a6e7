package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// langevinOf gives coth x - 1/x.
func langevinOf(x float64) float64 {
	size := math.Abs(x)
	if size < 1 {
		// sum of 2^2k B_2k/(2k)! x^(2k - 1) = -2 sum of zeta(2k) (-1/pi^2)^k x^(2k - 1)
		y := -float64(float64(x/math.Pi) * (x / math.Pi))
		sum, power := 0.0, 1.0
		for k := 1.0; k < 30; k++ {
			term := float64(zetaEven(float64(2*k)) * power)
			sum += term
			power = float64(power * y)
			if math.Abs(term) < 1e-18 {
				break
			}
		}
		return float64(2*sum) * float64(x/(math.Pi*math.Pi))
	}
	return 1/column.Tanh(x) - 1/x
}

// brillouinOf gives B_J(x) = a coth(a x) - b coth(b x), a = (2J + 1)/(2J),
// b = 1/(2J), in which the poles of both at x = 0 cancel.
func brillouinOf(j, x float64) float64 {
	if !(j > 0) {
		return notANumber
	}
	twice := float64(2 * j)
	a, b := (twice+1)/twice, 1/twice
	return float64(a*langevinOf(a*x)) - float64(b*langevinOf(b*x))
}

var langevinLaw = &law.Law{
	Name:       "langevin",
	Group:      group,
	Gives:      "Langevin's function: the mean alignment of a classical dipole",
	Parameters: []law.Parameter{{Name: "x", Meaning: "energy of the dipole in the field over k_B T", Unit: "1"}},
	Result:     law.Result{Unit: "1"},
	Equation:   "L(x) = coth x - 1/x",
	Source:     "Langevin P. (1905) J. Phys. Theor. Appl. 4, 678",
	Examples:   []law.Example{{Formula: "langevin(1)", Gives: "0.3130353"}},
	Body:       law.Of1(langevinOf),
}

var brillouinLaw = &law.Law{
	Name:  "brillouin",
	Group: group,
	Gives: "Brillouin's function: the magnetisation of spins over that of all aligned",
	Parameters: []law.Parameter{
		{Name: "J", Meaning: "total angular momentum: 1/2, 1, 3/2, ...", Unit: "1", Finite: law.Within(0.5, 1000)},
		{Name: "x", Meaning: "g mu_B J B/(k_B T)", Unit: "1"},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "B_J(x) = ((2J + 1)/2J) coth((2J + 1) x/2J) - (1/2J) coth(x/2J)",
	Source:   "Brillouin L. (1927) J. Phys. Radium 8, 74",
	Caution:  "Some books write it for x/J.",
	Examples: []law.Example{{Formula: "brillouin(3.5, 1)", Gives: "0.3948421"}},
	Body:     law.Of2(brillouinOf),
}

var spinPolarisationLaw = &law.Law{
	Name:  "spin_polarisation",
	Group: group,
	Gives: "the polarisation of spins 1/2: the share in the lower level less that in the upper",
	Parameters: []law.Parameter{
		energyParameter("distance of the two levels: g mu_B B of electrons, hbar gamma B of nuclei, or h times the resonance frequency"),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "P = tanh(E/(2 k_B T))",
	Source:   "Abragam A. (1961) Principles of Nuclear Magnetism, chapter I",
	Examples: []law.Example{
		{Formula: "spin_polarisation(nature.hbar * 2.6752218708e8[s^-1 T^-1] * 7.0463[T], 300[K])", Gives: "2.39973e-5"},
	},
	Body: law.Of2(func(energy, temperature float64) float64 {
		if !(temperature > 0) {
			return notANumber
		}
		return column.Tanh(float64(0.5 * float64(energy*inverseOf(temperature))))
	}),
}

var siteOccupancyLaw = &law.Law{
	Name:  "site_occupancy",
	Group: group,
	Gives: "the share of adsorption or binding sites that are occupied (Langmuir)",
	Parameters: []law.Parameter{
		{Name: "pressure", Meaning: "pressure of the gas", Unit: "Pa(a)", Finite: law.AtLeast(0)},
		{Name: "half_pressure", Meaning: "pressure at which half of the sites are occupied, 1/K", Unit: "Pa(a)", Finite: law.Above(0)},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "theta = p/(p + p_1/2) = K p/(1 + K p)",
	Source:   "Langmuir I. (1918) J. Am. Chem. Soc. 40, 1361",
	Caution:  "Equal sites that do not feel each other, one molecule each.",
	Examples: []law.Example{{Formula: "site_occupancy(10[kPa], 1[kPa])", Gives: "0.909091"}},
	Body: law.Of2(func(pressure, half float64) float64 {
		if !(pressure >= 0) || !(half > 0) {
			return notANumber
		}
		return pressure / (pressure + half)
	}),
}

func entropyParameter(meaning string) law.Parameter {
	return law.Parameter{Name: "entropy", Meaning: meaning, Unit: "J/(mol K)", Default: "0[J/(mol K)]"}
}

var twoStateFractionLaw = &law.Law{
	Name:  "two_state_fraction",
	Group: group,
	Gives: "the share of the upper one of two states, as of an unfolded protein or a high spin",
	Parameters: []law.Parameter{
		energyParameter("energy (enthalpy) of the upper state above the lower"),
		temperatureParameter(),
		entropyParameter("molar entropy of the upper state above the lower"),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "f = 1/(1 + exp(E/(k_B T) - S/R))",
	Source:   sumsSource,
	Examples: []law.Example{{Formula: "two_state_fraction(300[kJ/mol], 300[K], entropy: 1000[J/(mol K)])", Gives: "0.5"}},
	Body: law.Of3(func(energy, temperature, entropy float64) float64 {
		return fermiOf(float64(energy*inverseOf(temperature)) - entropy/nature.MolarGasConstant)
	}),
}

var vacancyFractionLaw = &law.Law{
	Name:  "vacancy_fraction",
	Group: group,
	Gives: "the share of lattice sites that are empty in equilibrium",
	Parameters: []law.Parameter{
		energyParameter("energy of forming one vacancy"),
		temperatureParameter(),
		entropyParameter("entropy of forming vacancies, without that of their places"),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "n/N = exp(S/R) exp(-Q/(k_B T))",
	Source:   "Frenkel J. (1926) Z. Phys. 35, 652",
	Caution:  "Few vacancies, and time enough to come to equilibrium.",
	Examples: []law.Example{{Formula: "vacancy_fraction(0.90[eV], 1357[K])", Gives: "4.54e-4"}},
	Body: law.Of3(func(energy, temperature, entropy float64) float64 {
		return gasExp(entropy/nature.MolarGasConstant - float64(energy*inverseOf(temperature)))
	}),
}

var openFractionLaw = &law.Law{
	Name:  "open_fraction",
	Group: group,
	Gives: "the share of gates, as ion channels, that a voltage holds open",
	Parameters: []law.Parameter{
		{Name: "voltage", Meaning: "voltage across the membrane", Unit: "mV"},
		{Name: "half_voltage", Meaning: "voltage at which half of them are open", Unit: "mV"},
		{Name: "charge", Meaning: "gating charge in elementary charges", Unit: "1"},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "f = 1/(1 + exp(-z e (V - V_1/2)/(k_B T)))",
	Source:   "Hodgkin A.L., Huxley A.F. (1952) J. Physiol. 117, 500",
	Examples: []law.Example{{Formula: "open_fraction(-80[mV], -40[mV], 4, 293.15[K])", Gives: "0.00177231"}},
	Body: law.Of4(func(voltage, half, charge, temperature float64) float64 {
		return fermiOf(-float64(float64(charge*nature.ElementaryCharge)*(voltage-half)) * inverseOf(temperature))
	}),
}

var arrheniusRatioLaw = &law.Law{
	Name:  "arrhenius_ratio",
	Group: group,
	Gives: "how much faster an activated process runs at one temperature than at another",
	Parameters: []law.Parameter{
		energyParameter("activation energy"),
		{Name: "temperature", Meaning: "temperature", Unit: "K", Finite: law.Above(0)},
		{Name: "reference", Meaning: "temperature that it is compared with", Unit: "K", Finite: law.Above(0)},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "k(T)/k(T_0) = exp((E/k_B) (1/T_0 - 1/T))",
	Source:   "Arrhenius S. (1889) Z. Phys. Chem. 4, 226",
	Caution:  "One mechanism in the whole range: life tests at high temperature may start another.",
	Examples: []law.Example{{Formula: "arrhenius_ratio(300[K], 300[K], 150[K])", Gives: "2.71828183"}},
	Body: law.Of3(func(energy, temperature, reference float64) float64 {
		if !(temperature > 0) || !(reference > 0) {
			return notANumber
		}
		return gasExp(float64(energy/nature.BoltzmannConstant) * ((temperature - reference) / float64(temperature*reference)))
	}),
}
