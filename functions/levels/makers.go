package levels

import (
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// madeLadder is the name of the made type.
const madeLadder = "ladder"

// levelEnergies are the other spellings of a level's energy: a wavenumber (h c),
// a temperature (k_B), a frequency (h), an energy per mole (1/N_A). Their
// factors turn m^-1, K, Hz and J/mol into J.
func levelEnergies() []law.Conversion {
	return []law.Conversion{
		{Unit: "cm^-1", Factor: nature.PlanckConstant * nature.SpeedOfLight},
		{Unit: "K", Factor: nature.BoltzmannConstant},
		{Unit: "Hz", Factor: nature.PlanckConstant},
		{Unit: "J/mol", Factor: 1 / nature.AvogadroConstant},
	}
}

// asLevelEnergy says how energies may be written.
const asLevelEnergy = "in J, eV, cm^-1, K, Hz, J/mol or hartree"

func ladderParameter() law.Parameter {
	return law.Parameter{Name: "ladder", Meaning: "the levels: made by ladder, oscillator, rotor, vibrating_rotor, atom, molecule, combine and their like", Type: law.Made, Made: madeLadder}
}

func temperatureParameter() law.Parameter {
	return law.Parameter{Name: "temperature", Meaning: "temperature", Unit: "K", Finite: law.Above(0)}
}

var ladderLaw = &law.Law{
	Name:  "ladder",
	Group: group,
	Gives: "a ladder of levels from a list of energies and a list of degeneracies",
	Parameters: []law.Parameter{
		{Name: "energies", Meaning: "energies of the levels, " + asLevelEnergy + ", in any order, from any zero", Type: law.List, Unit: "J", Accepts: levelEnergies()},
		{Name: "degeneracies", Meaning: "how many states each level has, 2J + 1 for an atomic level: as many as there are energies", Type: law.List, Unit: "1", Finite: law.Above(0)},
		{Name: "labels", Meaning: "names of the levels in the order given, parted by commas, for occupancy_of: \"3P2, 3P1, 3P0\"", Type: law.Text, Default: `""`, CheckText: checkLabels},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "levels E_i with g_i states each",
	Source:   "Boltzmann L. (1877) Sitzungsber. Akad. Wiss. Wien 76, 373; Herzberg G. (1944) Atomic Spectra and Atomic Structure, for the degeneracies",
	Caution:  "The list is all there is: levels left out are missing from every sum. Of an atom give all levels up to some ten k_B T.",
	Examples: []law.Example{
		{Formula: "partition_sum(ladder([0, 158.265, 226.977][cm^-1], [5, 3, 1]), 298.15[K])", Gives: "6.7322"},
	},
}

var oscillatorLaw = &law.Law{
	Name:  "oscillator",
	Group: group,
	Gives: "the ladder of a harmonic oscillator, counted from v = 0",
	Parameters: []law.Parameter{
		{Name: "wavenumber", Meaning: "distance between neighbouring levels, " + asLevelEnergy, Unit: "J", Finite: law.Above(0), Accepts: levelEnergies()},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_v = v h c w, v = 0, 1, 2, ..., one state each; the zero point energy h c w/2 is left out",
	Source:   "Einstein A. (1907) Ann. Phys. 327, 180; Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III",
	Caution:  "A real bond is anharmonic and breaks: well below its dissociation energy only.",
	Examples: []law.Example{
		{Formula: "occupancy(oscillator(214.6[cm^-1]), 1, 298.15[K])", Gives: "0.229"},
	},
}

var rotorLaw = &law.Law{
	Name:  "rotor",
	Group: group,
	Gives: "the ladder of a linear rigid rotor, counted from J = 0",
	Parameters: []law.Parameter{
		{Name: "rotational_constant", Meaning: "rotational constant B, " + asLevelEnergy, Unit: "J", Finite: law.Above(0), Accepts: levelEnergies()},
		{Name: "symmetry", Meaning: "symmetry number: 2 for a molecule with two equal ends, else 1", Unit: "1", Finite: law.Above(0), Default: "1"},
		{Name: "D", Meaning: "centrifugal constant D, " + asLevelEnergy + "; 0 for a rigid rotor", Unit: "J", Finite: law.AtLeast(0), Default: "0[J]", Accepts: levelEnergies()},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_J = B J(J + 1) - D (J(J + 1))^2 while it rises with J, g_J = (2J + 1)/symmetry, J = 0, 1, 2, ...",
	Source:   "Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III; Mulholland H.P. (1928) Proc. Camb. Phil. Soc. 24, 280",
	Caution: "The symmetry number stands for the alternation of weights with nuclear spin: good where k_B T is large against B. " +
		"For hydrogen, or in the cold, use spin_rotor.",
	Examples: []law.Example{
		{Formula: "partition_sum(rotor(1[K]), 10000[K])", Gives: "10000.33"},
	},
}

var combineLaw = &law.Law{
	Name:  "combine",
	Group: group,
	Gives: "the ladder of two independent modes together: each level of the one with each of the other",
	Parameters: []law.Parameter{
		{Name: "a", Meaning: "one mode", Type: law.Made, Made: madeLadder},
		{Name: "b", Meaning: "the other mode", Type: law.Made, Made: madeLadder},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_ij = E_i + E_j, g_ij = g_i g_j, so that Q = Q_a Q_b and energy, heat capacity and entropy add up",
	Source:   "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 5",
	Caution:  "Independent means that the one mode's levels do not depend on the other's: rotation and vibration are so only nearly.",
	Examples: []law.Example{
		{Formula: "partition_sum(combine(rotor(1[K]), rotor(1[K])), 10000[K])", Gives: "1.0000667e8"},
	},
}
