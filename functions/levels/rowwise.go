package levels

import (
	"math"

	"plumbrule/engine/law"
)

// sumRow gives a quantity of a whole ladder in one row at 1/(k_B T) = beta,
// counted from its lowest level, and that level's energy in J. Partition sums
// are asked for by their logarithm.
func (s *scratch) sumRow(ladder *law.Argument, row int, beta float64, want quantity) (value, lowest float64) {
	s.used = 0
	return s.addRow(ladder, row, beta, want)
}

func (s *scratch) addRow(mode *law.Argument, row int, beta float64, want quantity) (value, lowest float64) {
	switch {
	case mode.Maker == combineLaw && len(mode.Items) == 2:
		a, lowA := s.addRow(&mode.Items[0], row, beta, want)
		b, lowB := s.addRow(&mode.Items[1], row, beta, want)
		return a + b, lowA + lowB
	case mode.Maker == repeatModeLaw && len(mode.Items) == 2:
		n := mode.Items[1].At(row)
		if !wholeNumber(n) {
			n = notANumber
		}
		a, low := s.addRow(&mode.Items[0], row, beta, want)
		return float64(n * a), float64(n * low)
	case mode.Maker == shiftLaw && len(mode.Items) == 2:
		a, low := s.addRow(&mode.Items[0], row, beta, want)
		return a, low + mode.Items[1].At(row)
	}
	if beta < 0 {
		return s.addMirrored(mode, row, beta, want)
	}
	if value, ok := closedForm(mode, row, beta, want); ok {
		return value, 0
	}
	set := s.nextSet()
	build := builderOf(mode.Maker)
	if build == nil || !set.prepare(build, mode.Items, row, beta) {
		return notANumber, 0
	}
	return set.quantity(beta, want), set.lowest
}

// endless is an inverse temperature, in 1/J, at which every level of a ladder
// that has an end is within reach: 1e12 K.
const endless = 1 / (1.380649e-23 * 1e12)

// addMirrored does it for a negative temperature, at which a ladder of levels E
// is filled as one of levels -E at the positive one. Only a ladder that ends
// has one. What it gives is counted from the lowest level, as always.
func (s *scratch) addMirrored(mode *law.Argument, row int, beta float64, want quantity) (value, lowest float64) {
	if mode.Maker == oscillatorLaw || isStiffRotor(mode) || mode.Maker == symmetricTopLaw || mode.Maker == boxLevelsLaw {
		return notANumber, 0
	}
	set, mirror := s.nextSet(), s.nextSet()
	build := builderOf(mode.Maker)
	if build == nil || !set.prepare(build, mode.Items, row, endless) || set.truncated {
		return notANumber, 0
	}
	highest := 0.0
	for _, e := range set.energy {
		highest = max(highest, e)
	}
	if !sameNumbers(mirror.numbers, set.numbers) || !mirror.usable {
		mirror.mirror(set, highest)
	}
	if !mirror.usable {
		return notANumber, 0
	}
	value = mirror.quantity(-beta, want)
	switch want {
	case meanLevel: // (E - lowest)/kT, from (highest - E)/k|T|
		value += float64(highest * beta)
	case logarithm:
		value -= float64(highest * beta)
	}
	return value, set.lowest
}

// mirror makes the set of the levels of another turned upside down.
func (b *levelSet) mirror(of *levelSet, highest float64) {
	b.numbers = append(b.numbers[:0], of.numbers...)
	b.energy, b.weight, b.runs = b.energy[:0], b.weight[:0], b.runs[:0]
	b.span, b.truncated, b.tooMany, b.sorted = math.Inf(1), false, false, false
	b.known = [quantities]bool{}
	for k := len(of.runs) - 1; k >= 0; k-- {
		from := 0
		if k > 0 {
			from = of.runs[k-1]
		}
		for i := of.runs[k] - 1; i >= from; i-- {
			b.add(highest-of.energy[i], of.weight[i])
		}
		b.endRun()
	}
	b.usable = len(b.energy) > 0 && b.settle()
}

// single mode of a ladder that is one, whatever it was shifted by; nil for
// modes that were joined.
func soleMode(ladder *law.Argument) *law.Argument {
	mode := unshifted(ladder)
	if builderOf(mode.Maker) == nil {
		return nil
	}
	return mode
}

// setOf gives the set of a ladder of one mode, built for a row; nil where there
// is none.
func (s *scratch) setOf(ladder *law.Argument, row int, beta float64) *levelSet {
	mode := soleMode(ladder)
	s.used = 0
	set := s.nextSet()
	if mode == nil || !set.prepare(builderOf(mode.Maker), mode.Items, row, beta) {
		return nil
	}
	return set
}

// place gives the number under which occupancy knows the level that was built
// as the k-th: that of a list in the order given, else the rank by energy.
func (b *levelSet) place(maker *law.Law, k int) int {
	if maker == ladderLaw {
		return k
	}
	b.sort()
	for rank, i := range b.order {
		if i == k {
			return rank
		}
	}
	return -1
}
