package levels

import (
	"strconv"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

var occupanciesLaw = &law.Law{
	Name:  "occupancies",
	Group: group,
	Gives: "the shares of all levels of a ladder, or of the first ones",
	Parameters: []law.Parameter{
		ladderParameter(),
		temperatureParameter(),
		{Name: "first", Meaning: "how many levels, from level 0 on; 0: all, which a ladder without end does not have", Unit: "1", Default: "0", Finite: law.AtLeast(0)},
	},
	Result: law.Result{Type: law.List, Unit: "1", Each: &law.Each{
		Count:  countOccupancies,
		Shared: sharedSum,
		Item:   sharedOccupancy,
	}},
	Equation: "N_n/N = g_n exp(-E_n/(k_B T))/Q, n = 0, 1, ...",
	Source:   occupancyLaw.Source,
	Caution:  "Thermal equilibrium at one temperature, and only the levels that the ladder has. Levels are counted as occupancy counts them.",
	Refusal:  "the ladder has no such levels",
	Examples: []law.Example{
		{Formula: "item(occupancies(ladder([0, 0][J], [1, 3]), 300[K]), 2)", Gives: "0.75"},
		{Formula: "sum(occupancies(ladder([0, 0, 0][J], [1, 2, 5]), 300[K]))", Gives: "1"},
		{Formula: "item(occupancies(rotor(10.44[cm^-1]), 298.15[K], first: 3), 1)", Gives: "0.0495397"},
	},
}

// countOccupancies tells how many levels are listed.
func countOccupancies(arguments []law.Argument) (levels int, wrong string) {
	first := &arguments[2]
	if len(first.Values) == 0 {
		return 0, "'first' is fixed before the first row; write a number"
	}
	asked := first.Values[0]
	if !wholeNumber(asked) {
		return 0, "'first' is a whole number"
	}
	mode := unshifted(&arguments[0])
	if mode.Maker == combineLaw || mode.Maker == repeatModeLaw {
		return 0, "the modes of a combined ladder are independent; take the occupancies of each"
	}
	all, known := countLevels(mode)
	switch {
	case known && asked > float64(all):
		return 0, "the ladder has only " + strconv.Itoa(all) + " levels"
	case asked > 0:
		return int(min(asked, mostLevels)), ""
	case !known:
		return 0, "how many levels this ladder has is not known before the first row, or it has no end; say how many, as in first: 20"
	}
	return all, ""
}

// countLevels tells how many levels a ladder has where that is known before
// the first row.
func countLevels(mode *law.Argument) (levels int, known bool) {
	switch mode.Maker {
	case ladderLaw:
		return len(mode.Items[0].Items), true
	case spinLevelsLaw:
		if spin := mode.Items[1].Values; len(spin) == 1 && wholeNumber(2*spin[0]) {
			return int(2*spin[0]) + 1, true
		}
	case nuclearSpinLevelsLaw:
		if n := nucleusOf(mode.Items[0].Text); n != nil {
			return int(2*n.spin) + 1, true
		}
	case atomLaw, moleculeLaw:
		for i := range mode.Items {
			if mode.Items[i].Text == "" {
				return 0, false
			}
		}
		if set := fixedSet(builderOf(mode.Maker), mode.Items); set.usable {
			return len(set.energy), true
		}
	}
	return 0, false
}

// sharedSum gives the partition sum from the lowest level up, which every
// share is over; 1 for ladders whose shares have a closed form.
func sharedSum(dst []float64, arguments []law.Argument, work *law.Work) {
	mode := unshifted(&arguments[0])
	s := begin(work, &arguments[1], len(dst))
	switch {
	case mode.Maker == ladderLaw && len(mode.Items) >= 2:
		s.listed(mode, partition, len(dst))
		copy(dst, s.value)
	case hasClosedShares(mode):
		column.Fill(dst, 1)
	default:
		s.used = 0
		set, build := s.nextSet(), builderOf(mode.Maker)
		for i := range dst {
			dst[i] = notANumber
			if build != nil && set.prepare(build, mode.Items, i, s.beta[i]) {
				dst[i] = set.quantity(s.beta[i], partition)
			}
		}
	}
}

// sharedOccupancy gives the share of one level over the sum that all share,
// with the bits of occupancy.
func sharedOccupancy(dst []float64, arguments []law.Argument, work *law.Work) {
	mode, n, sum := unshifted(&arguments[0]), &arguments[3], &arguments[4]
	s := begin(work, &arguments[1], len(dst))
	switch {
	case mode.Maker == ladderLaw && len(mode.Items) >= 2:
		energies, degeneracies, at := mode.Items[0].Items, mode.Items[1].Items, int(n.Values[0])
		if at >= len(energies) || len(energies) != len(degeneracies) {
			column.Fill(dst, notANumber)
			return
		}
		s.findLowest(energies)
		for row := range dst {
			dst[row] = s.listedShare(&energies[at], &degeneracies[at], row, sum.At(row))
		}
	case hasClosedShares(mode):
		s.closedShares(mode, n, dst)
	default:
		s.workedShares(mode, n, sum, dst)
	}
}

// listedShare gives the share of a level of a list over the partition sum.
func (s *scratch) listedShare(energy, degeneracy *law.Argument, row int, sum float64) float64 {
	x := float64((energy.At(row) - s.lowest[row]) * s.beta[row])
	return float64(degeneracy.At(row)*column.Exp(-x)) / sum
}
