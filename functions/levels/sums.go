package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

const sumsSource = "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapters 3 and 5"

var logPartitionSumLaw = &law.Law{
	Name:       "log_partition_sum",
	Group:      group,
	Gives:      "the natural logarithm of the partition sum of a ladder, from the zero from which its energies are counted",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "ln Q, Q = sum of g_i exp(-E_i/(k_B T))",
	Source:     sumsSource,
	Caution:    "For ladders whose sum is beyond what a number can hold: many modes, levels far below the zero.",
	Examples: []law.Example{
		{Formula: "log_partition_sum(repeat_mode(ladder([0, 0][J], [1, 1]), 1e6), 1[K]) / 1e6", Gives: "0.693147180560"},
	},
	Body: logPartitionSum,
}

func logPartitionSum(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], logarithm, dst)
	for i := range dst {
		dst[i] -= float64(s.offset[i] * s.beta[i])
	}
}

var freeEnergyLaw = &law.Law{
	Name:       "free_energy",
	Group:      group,
	Gives:      "the molar Helmholtz free energy of a ladder, above the zero from which its energies are counted",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "J/mol"},
	Equation:   "F = -R T ln Q = U - T S",
	Source:     sumsSource,
	Caution:    thermalCaution,
	Examples: []law.Example{
		{Formula: "free_energy(ladder([0, 0][J], [1, 1]), 300[K])", Gives: "-1728.94 J/mol"},
	},
	Body: freeEnergy,
}

func freeEnergy(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], logarithm, dst)
	for i, ln := range dst {
		warmth := float64(nature.MolarGasConstant * arguments[1].At(i))
		dst[i] = float64(nature.AvogadroConstant*s.offset[i]) - float64(warmth*ln)
	}
}

var energySpreadLaw = &law.Law{
	Name:       "energy_spread",
	Group:      group,
	Gives:      "the standard deviation of the energy of a single system with the levels of a ladder",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "J"},
	Equation:   "sigma_E = k_B T sqrt(C/R), C molar heat capacity of the ladder",
	Source:     "Gibbs J.W. (1902) Elementary Principles in Statistical Mechanics, chapter VII",
	Caution:    "Of one molecule; of N independent ones it is sqrt(N) times that.",
	Examples: []law.Example{
		{Formula: "energy_spread(rotor(1[K]), 1e6[K]) / nature.k_B", Gives: "1.0e6 K"},
	},
	Body: energySpread,
}

func energySpread(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	clear(dst)
	s.fold(&arguments[0], variance, dst)
	for i, square := range dst {
		dst[i] = math.Sqrt(square) / s.beta[i]
	}
}

var occupancyOfLaw = &law.Law{
	Name:  "occupancy_of",
	Group: group,
	Gives: "the share of the level of a name among all of a ladder",
	Parameters: []law.Parameter{
		ladderParameter(),
		{Name: "label", Meaning: "name of the level: one of a list's labels, or its quantum numbers: \"v=1\", \"J=3\", \"v=0 J=7\", \"J=2 K=1\", \"n=2\", \"m=-1/2\"", Type: law.Text,
			CheckText: func(text string) string {
				if text == "" {
					return "the label is empty"
				}
				return ""
			}},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "N_n/N = g_n exp(-E_n/(k_B T))/Q",
	Source:   boltzmannSource,
	Caution:  "Thermal equilibrium at one temperature, and only the levels that the ladder has.",
	Refusal:  "the ladder has no level of that name: labels stand in a list, other ladders have quantum numbers; joined ladders have neither",
	Examples: []law.Example{
		{Formula: `occupancy_of(ladder([0, 0][J], [1, 3], labels: "singlet, triplet"), "triplet", 300[K])`, Gives: "0.75"},
		{Formula: `occupancy_of(rotor(10.44[cm^-1]), "J=0", 298.15[K])`, Gives: "0.0495397"},
	},
	Body: occupancyOf,
}

func occupancyOf(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[2], len(dst))
	mode := soleMode(&arguments[0])
	label := arguments[1].Text
	named := -1
	if mode != nil && mode.Maker == ladderLaw && len(mode.Items) > 2 {
		named = labelled(mode.Items[2].Text, label)
	}
	numbers, readable := readQuantumNumbers(label)
	for i := range dst {
		dst[i] = notANumber
		switch {
		case mode == nil || !(s.beta[i] > 0):
		case mode.Maker == ladderLaw:
			if named >= 0 {
				if set := s.setOf(mode, i, s.beta[i]); set != nil && named < len(set.energy) {
					dst[i] = set.shareOf(named, s.beta[i])
				}
			}
		case readable:
			energy, states, ok := levelByNumbers(mode, i, &numbers)
			if !ok {
				continue
			}
			ln, lowest := s.sumRow(mode, i, s.beta[i], logarithm)
			dst[i] = float64(states * column.Exp(-float64((energy-lowest)*s.beta[i])-ln))
		}
	}
}

var mostPopulatedLaw = &law.Law{
	Name:       "most_populated",
	Group:      group,
	Gives:      "the number of the level that holds most, as occupancy counts levels",
	Parameters: []law.Parameter{ladderParameter(), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "the n with the largest g_n exp(-E_n/(k_B T)); of equal ones the lowest",
	Source:     herzberg,
	Refusal:    "the ladder is a joined one: ask each of its modes; or it has too many levels",
	Examples: []law.Example{
		{Formula: "most_populated(rotor(10.44[cm^-1]), 298.15[K])", Gives: "3"},
	},
	Body: mostPopulated,
}

func mostPopulated(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[1], len(dst))
	mode := soleMode(&arguments[0])
	for i := range dst {
		dst[i] = notANumber
		switch {
		case mode == nil || !(s.beta[i] > 0):
		case mode.Maker == oscillatorLaw:
			dst[i] = 0
		case isStiffRotor(mode):
			dst[i] = fullestRotation(mode.Items[0].At(i) * s.beta[i])
		default:
			if set := s.setOf(mode, i, s.beta[i]); set != nil {
				dst[i] = float64(set.place(mode.Maker, set.fullest(s.beta[i])))
			}
		}
	}
}

// fullestRotation gives the J with the largest (2J + 1) exp(-a J(J + 1)). The
// continuous function has its maximum at J = sqrt(1/(2a)) - 1/2.
func fullestRotation(a float64) float64 {
	if !(a > 0) {
		return notANumber
	}
	top := math.Floor(max(0, math.Sqrt(0.5/a)-0.5))
	// The next one holds more where ln((2J + 3)/(2J + 1)) > 2a (J + 1).
	if column.Log1p(2/(float64(2*top)+1)) > float64(2*a)*(top+1) {
		top++
	}
	return top
}

// fullest gives the level, as built, with the largest share.
func (b *levelSet) fullest(beta float64) int {
	best, most := 0, -1.0
	ceiling := b.first + reach/beta
	for i, e := range b.energy {
		if e > ceiling {
			continue
		}
		w := float64(b.weight[i] * column.Exp(-float64(e*beta)))
		if w > most || w == most && e < b.energy[best] {
			best, most = i, w
		}
	}
	return best
}

var levelsBelowLaw = &law.Law{
	Name:  "levels_below",
	Group: group,
	Gives: "how many of the lowest levels of a ladder hold a given share together",
	Parameters: []law.Parameter{
		ladderParameter(),
		{Name: "share", Meaning: "share that they hold at least: 0.99", Unit: "1", Finite: law.Within(0, 1)},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "the smallest n with N_0 + N_1 + ... + N_(n-1) >= share N, levels by energy",
	Source:   boltzmannSource,
	Caution:  "A share of 1 needs all levels: a ladder without end is refused, or told where it is cut at 1e-30.",
	Refusal:  "the ladder is a joined one, or has too many levels",
	Examples: []law.Example{
		{Formula: "levels_below(oscillator(100[K]), 0.5, 100[K])", Gives: "1"},
	},
	Body: levelsBelow,
}

func levelsBelow(dst []float64, arguments []law.Argument, work *law.Work) {
	s := begin(work, &arguments[2], len(dst))
	for i := range dst {
		dst[i] = notANumber
		if !(s.beta[i] > 0) {
			continue
		}
		if set := s.setOf(&arguments[0], i, s.beta[i]); set != nil {
			dst[i] = set.lowestWith(arguments[1].At(i), s.beta[i])
		}
	}
}

// lowestWith takes levels off from above while what is taken is no more than
// what may be missing.
func (b *levelSet) lowestWith(share, beta float64) float64 {
	if !(share >= 0 && share <= 1) {
		return notANumber
	}
	b.sort()
	spare := float64((1 - share) * b.quantity(beta, partition))
	var taken total
	n := len(b.order)
	for n > 0 {
		i := b.order[n-1]
		taken.add(float64(b.weight[i] * column.Exp(-float64(b.energy[i]*beta))))
		if taken.value() > spare {
			break
		}
		n--
	}
	return float64(n)
}
