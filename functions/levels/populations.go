package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// farZero is the largest size of lowest energy/kT at which exp of it is
// multiplied to the sum; beyond, logarithms are added first.
const farZero = 600.0

var partitionSumLaw = &law.Law{
	Name:       "partition_sum",
	Group:      group,
	Gives:      "the partition sum of a ladder, from the zero from which its energies are counted",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "Q = sum of g_i exp(-E_i/(k_B T)); oscillator 1/(1 - exp(-h c w/(k_B T))); rotor (1/symmetry) sum of (2J + 1) exp(-B J(J + 1)/(k_B T)); combined modes: the product",
	Source: "Boltzmann L. (1877) Sitzungsber. Akad. Wiss. Wien 76, 373; Mayer J.E., Mayer M.G. (1940) Statistical Mechanics; " +
		"warm rotors: Mulholland H.P. (1928) Proc. Camb. Phil. Soc. 24, 280",
	Caution: "It depends on the zero of energy: compare only sums counted from the same one. Tables differ in whether nuclear spin is in it.",
	Refusal: "the lowest energy lies so far below the zero that the sum is beyond what a number can hold",
	Examples: []law.Example{
		{Formula: "partition_sum(ladder([0, 0][J], [2, 4]), 300[K])", Gives: "6"},
	},
	Body: partitionSum,
}

func partitionSum(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	column.Fill(dst, 1)
	s.fold(&arguments[0], partition, dst)
	for i, sum := range dst {
		shift := float64(-s.offset[i] * s.beta[i])
		switch {
		case s.offset[i] == 0:
		case math.Abs(shift) <= farZero:
			dst[i] = sum * column.Exp(shift)
		default:
			dst[i] = column.Exp(shift + column.Ln(sum))
		}
	}
}

var occupancyLaw = &law.Law{
	Name:  "occupancy",
	Group: group,
	Gives: "the share of one level among all of a ladder",
	Parameters: []law.Parameter{
		ladderParameter(),
		{Name: "n", Meaning: "which level, counted from 0: of a list in the order given, of an oscillator v, of a rotor J, of all others from the lowest level upwards", Unit: "1", Finite: law.AtLeast(0)},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "N_n/N = g_n exp(-E_n/(k_B T))/Q",
	Source:   "Boltzmann L. (1877) Sitzungsber. Akad. Wiss. Wien 76, 373; Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III",
	Caution:  "Thermal equilibrium at one temperature, and only the levels that the ladder has.",
	Refusal:  "n is no whole number or counts beyond the list; or the ladder is a combined one: its modes are independent, so take the occupancy of each and multiply",
	Examples: []law.Example{
		{Formula: "occupancy(ladder([0, 0][J], [1, 3]), 1, 300[K])", Gives: "0.75"},
		{Formula: "occupancy(rotor(10.44[cm^-1]), 0, 298.15[K])", Gives: "0.0495397"},
	},
	Body: occupancy,
}

func occupancy(dst []float64, arguments []law.Argument, work *law.Work) {
	mode, n := unshifted(&arguments[0]), &arguments[1]
	s := begin(work, &arguments[2], len(dst))
	switch {
	case mode.Maker == ladderLaw && len(mode.Items) >= 2:
		s.listedOccupancy(mode, n, dst)
	case hasClosedShares(mode):
		s.closedShares(mode, n, dst)
	default:
		s.workedShares(mode, n, nil, dst)
	}
}

// workedShares puts the shares of level n of a ladder whose levels are worked
// out into dst; where the sum of all is known, it is not computed again.
func (s *scratch) workedShares(mode, n, sum *law.Argument, dst []float64) {
	s.used = 0
	set := s.nextSet()
	for i := range dst {
		level, none := set.find(mode, n.At(i), i, s.beta[i])
		switch {
		case level < 0:
			dst[i] = none
		case sum == nil:
			dst[i] = set.shareOf(level, s.beta[i])
		default:
			dst[i] = set.shareOver(level, s.beta[i], sum.At(i))
		}
	}
}

// hasClosedShares says whether a share is told without the other levels.
func hasClosedShares(mode *law.Argument) bool {
	return mode.Maker == oscillatorLaw && len(mode.Items) == 1 || isStiffRotor(mode)
}

// closedShares puts the shares of level n of such a ladder into dst.
func (s *scratch) closedShares(mode, n *law.Argument, dst []float64) {
	share := rotorOccupancy
	if mode.Maker == oscillatorLaw {
		share = oscillatorOccupancy
	}
	for i := range dst {
		dst[i] = share(mode.Items[0].At(i)*s.beta[i], n.At(i))
	}
}

// find gives the place of the n-th level, counted from the lowest upwards, of a
// ladder whose levels are worked out. Where there is none the place is below 0
// and none is its share: 0 so high that nothing is there, else no number.
func (b *levelSet) find(mode *law.Argument, n float64, row int, beta float64) (level int, none float64) {
	mode = unshifted(mode)
	build := builderOf(mode.Maker)
	if build == nil || !wholeNumber(n) || !b.prepare(build, mode.Items, row, beta) {
		return -1, notANumber
	}
	if n >= float64(len(b.energy)) {
		if b.truncated {
			return -1, 0
		}
		return -1, notANumber
	}
	b.sort()
	return b.order[int(n)], 0
}

// unshifted takes off what a ladder was shifted by: it moves no share.
func unshifted(mode *law.Argument) *law.Argument {
	for mode.Maker == shiftLaw && len(mode.Items) == 2 {
		mode = &mode.Items[0]
	}
	return mode
}

const boltzmannSource = "Boltzmann L. (1877) Sitzungsber. Akad. Wiss. Wien 76, 373; Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III"

// boltzmannFactor gives exp(-E/(k_B T)) for E in J and T in K.
func boltzmannFactor(energy, temperature float64) float64 {
	if !(temperature > 0) {
		return notANumber
	}
	return column.Exp(-energy / float64(nature.BoltzmannConstant*temperature))
}

// populationRatio gives (g_u/g_l) exp(-E/(k_B T)).
func populationRatio(energy, upper, lower, temperature float64) float64 {
	return float64(positive(upper) / positive(lower) * boltzmannFactor(energy, temperature))
}

func energyParameter(meaning string) law.Parameter {
	return law.Parameter{Name: "energy", Meaning: meaning + ", " + asLevelEnergy, Unit: "J", Accepts: levelEnergies()}
}

func degeneracyParameter(name, meaning string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning, Unit: "1", Finite: law.Above(0)}
}

var boltzmannFactorLaw = &law.Law{
	Name:       "boltzmann_factor",
	Group:      group,
	Gives:      "the Boltzmann factor of an energy",
	Parameters: []law.Parameter{energyParameter("energy above the level it is compared with"), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "exp(-E/(k_B T))",
	Source:     boltzmannSource,
	Caution:    "The ratio of populations of two single states; of levels with several states use population_ratio.",
	Refusal:    "the energy lies so far below zero that the factor is beyond what a number can hold",
	Examples: []law.Example{
		{Formula: "boltzmann_factor(0[J], 300[K])", Gives: "1"},
		{Formula: "boltzmann_factor(300[K], 300[K])", Gives: "0.367879441"},
	},
	Body: law.Of2(boltzmannFactor),
}

var populationRatioLaw = &law.Law{
	Name:  "population_ratio",
	Group: group,
	Gives: "how many are in an upper level for one in a lower level",
	Parameters: []law.Parameter{
		energyParameter("energy of the upper level above the lower one"),
		degeneracyParameter("upper_degeneracy", "states of the upper level"),
		degeneracyParameter("lower_degeneracy", "states of the lower level"),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "N_u/N_l = (g_u/g_l) exp(-E/(k_B T))",
	Source:   boltzmannSource,
	Caution:  "Thermal equilibrium: a laser, a discharge or thin gas in strong light has other populations.",
	Refusal:  "the energy lies so far below zero that the ratio is beyond what a number can hold",
	Examples: []law.Example{
		{Formula: "population_ratio(0[J], 6, 2, 300[K])", Gives: "3"},
		{Formula: "population_ratio(10.2[eV], 4, 1, 8000[K])", Gives: "1.5009e-6"},
	},
	Body: law.Of4(populationRatio),
}
