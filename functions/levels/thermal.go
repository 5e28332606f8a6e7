package levels

import (
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

const (
	thermalSource  = "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapters 3 and 5; oscillator: Einstein A. (1907) Ann. Phys. 327, 180; warm rotors: Mulholland H.P. (1928) Proc. Camb. Phil. Soc. 24, 280"
	thermalCaution = "Of the ladder alone: a gas has its translation besides, 5/2 R in the heat capacity at constant pressure."
)

var meanEnergyLaw = &law.Law{
	Name:       "mean_energy",
	Group:      group,
	Gives:      "the mean energy of a ladder per mole, above the zero from which its energies are counted",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "J/mol"},
	Equation:   "U = N_A sum of g_i E_i exp(-E_i/(k_B T))/Q; oscillator N_A h c w/(exp(h c w/(k_B T)) - 1)",
	Source:     thermalSource,
	Caution:    "Zero is v = 0 of an oscillator and J = 0 of a rotor; the zero point energy is not in it. " + thermalCaution,
	Examples: []law.Example{
		{Formula: "mean_energy(oscillator(1[K]), 1[K])", Gives: "4.83882 J/mol"},
	},
	Body: meanEnergy,
}

func meanEnergy(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], meanLevel, dst)
	for i, mean := range dst {
		warmth := float64(nature.MolarGasConstant * arguments[1].At(i))
		dst[i] = float64(nature.AvogadroConstant*s.offset[i]) + float64(warmth*mean)
	}
}

var heatCapacityLaw = &law.Law{
	Name:       "heat_capacity",
	Group:      group,
	Gives:      "the molar heat capacity of a ladder",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "C = R (mean of x² - square of the mean of x), x = E/(k_B T); oscillator R x² exp(x)/(exp(x) - 1)²",
	Source:     thermalSource,
	Caution:    thermalCaution,
	Examples: []law.Example{
		{Formula: "heat_capacity(rotor(1[K]), 1e6[K])", Gives: "8.314463 J/(mol K)"},
	},
	Body: heatCapacity,
}

func heatCapacity(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], variance, dst)
	for i := range dst {
		dst[i] *= nature.MolarGasConstant
	}
}

var entropyLaw = &law.Law{
	Name:       "entropy",
	Group:      group,
	Gives:      "the molar entropy of a ladder",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "S = R ln Q + U/T, U counted from the same zero as Q",
	Source:     thermalSource,
	Caution: "Of the ladder alone: a gas has the entropy of its translation besides. A symmetry number takes R ln of it away at every temperature, " +
		"which is wrong in the cold.",
	Examples: []law.Example{
		{Formula: "entropy(ladder([0, 0][J], [1, 1]), 300[K])", Gives: "5.76315 J/(mol K)"},
	},
	Body: entropy,
}

func entropy(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], entropic, dst)
	for i := range dst {
		dst[i] *= nature.MolarGasConstant
	}
}
