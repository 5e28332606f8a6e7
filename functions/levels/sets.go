package levels

import (
	"math"
	"slices"
	"sync"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// A ladder whose levels have to be worked out one by one is a set: energies and
// degeneracies in ascending runs (one run for each vibrational state of a
// rotating molecule). A set is built once for one choice of its maker's
// arguments and used for all temperatures; only where an argument moves from
// row to row is it built anew.
//
// What a sum leaves out. At an inverse temperature beta the levels above the
// first excited one by more than reach/beta are left out. There are at most
// mostLevels of them with at most 1e12 states, so that what is left out lies
// below 1e12 exp(-80) = 2e-23 of the first excited level's own share, and below
// 2e-19 of its first two moments. An infinite series is ended by the same rule.
// Which levels count depends on the row alone, never on its neighbours.
const reach = 80.0

// mostLevels bounds a set: beyond, the ladder is refused.
const mostLevels = 1_000_000

// builder works out the levels of a maker's ladder. It takes the arguments of
// the maker, the numbers among them in one line, and adds every level up to
// set.ceiling(first), where first is no less than the height of the first
// excited level. It says false to arguments that make no ladder.
type builder func(set *levelSet, items []law.Argument, numbers []float64) bool

// levelSet is the set of one ladder in one worker.
type levelSet struct {
	energy []float64 // J above the lowest level
	weight []float64 // states
	runs   []int     // where each ascending run ends

	lowest float64 // energy of the lowest level in J, from the maker's zero
	first  float64 // J from the lowest to the next level above it
	ground float64 // states at the lowest energy

	excited []float64 // weight, and 0 for levels at the lowest energy
	share   []float64 // of one run: excited times exp(-energy beta)
	order   []int     // levels by energy, made when first asked for
	sorted  bool

	diagonal, side []float64 // of a matrix

	numbers, next []float64 // the arguments that the set was built for
	span          float64   // J above the first excited level that were asked for
	truncated     bool      // levels above were left out
	tooMany       bool
	usable        bool
	borrowed      bool // energy, weight, runs and excited belong to a fixed set

	// Rows like the one before are not computed again.
	known              [quantities]bool
	knownBeta, knownAs [quantities]float64
}

// gather puts all numbers of a maker's arguments in a row into next.
func (b *levelSet) gather(items []law.Argument, row int) {
	for i := range items {
		switch {
		case len(items[i].Items) > 0:
			b.gather(items[i].Items, row)
		case len(items[i].Values) > 0:
			b.next = append(b.next, items[i].At(row))
		}
	}
}

// sameNumbers says whether two lines of numbers have the same bits.
func sameNumbers(a, b []float64) bool {
	if len(a) != len(b) {
		return false
	}
	for i := range a {
		if math.Float64bits(a[i]) != math.Float64bits(b[i]) {
			return false
		}
	}
	return true
}

// prepare makes the set fit for a row at 1/(k_B T) = beta. It says false where
// the arguments make no ladder.
func (b *levelSet) prepare(build builder, items []law.Argument, row int, beta float64) bool {
	if !(beta > 0) {
		return false
	}
	span := reach / beta
	b.next = b.next[:0]
	b.gather(items, row)
	if same := b.usable && sameNumbers(b.next, b.numbers); same {
		if !b.truncated || span <= b.span {
			return true
		}
		span *= 4 // a rising temperature shall not build at each row
	}
	if len(b.next) == 0 {
		return b.borrow(fixedSet(build, items))
	}
	if b.borrowed {
		b.energy, b.weight, b.runs, b.excited, b.borrowed = nil, nil, nil, nil, false
	}
	b.numbers = append(b.numbers[:0], b.next...)
	b.energy, b.weight, b.runs = b.energy[:0], b.weight[:0], b.runs[:0]
	b.span, b.truncated, b.tooMany, b.sorted = span, false, false, false
	b.known = [quantities]bool{}
	b.usable = build(b, items, b.numbers) && !b.tooMany && len(b.energy) > 0 && b.settle()
	return b.usable
}

// fixedSets holds the sets of ladders that no number tells, only names: atoms
// and molecules of the tables. Each is built once, whole, when first asked for,
// and does not change: all workers and all calls of a sheet read the same one.
var fixedSets struct {
	sync.Mutex
	of map[string]*levelSet
}

// fixedSet gives the whole set of a ladder that is told by names alone.
func fixedSet(build builder, items []law.Argument) *levelSet {
	key := ""
	for i := range items {
		key += items[i].Text + "|"
	}
	fixedSets.Lock()
	defer fixedSets.Unlock()
	if set := fixedSets.of[key]; set != nil {
		return set
	}
	set := &levelSet{span: math.Inf(1)}
	set.usable = build(set, items, nil) && !set.tooMany && len(set.energy) > 0 && set.settle()
	if fixedSets.of == nil {
		fixedSets.of = map[string]*levelSet{}
	}
	fixedSets.of[key] = set
	return set
}

// borrow takes over the levels of a fixed set.
func (b *levelSet) borrow(from *levelSet) bool {
	b.energy, b.weight, b.runs, b.excited, b.borrowed = from.energy, from.weight, from.runs, from.excited, true
	b.lowest, b.first, b.ground = from.lowest, from.first, from.ground
	b.span, b.truncated, b.tooMany, b.sorted = from.span, false, from.tooMany, false
	b.numbers = b.numbers[:0]
	b.known = [quantities]bool{}
	b.share = room(b.share, from.longestRun())
	b.usable = from.usable
	return b.usable
}

// longestRun gives how many levels the longest run has.
func (b *levelSet) longestRun() int {
	longest, from := 0, 0
	for _, to := range b.runs {
		longest = max(longest, to-from)
		from = to
	}
	return longest
}

// ceiling gives the energy up to which levels are wanted, from that of the
// lowest level and a height that is no less than the first excited one's.
func (b *levelSet) ceiling(first float64) float64 { return first + b.span }

// add adds a level to the run. It says false when there are too many.
func (b *levelSet) add(energy, weight float64) bool {
	if len(b.energy) >= mostLevels {
		b.tooMany = true
		return false
	}
	b.energy = append(b.energy, energy)
	b.weight = append(b.weight, weight)
	return true
}

// endRun ends an ascending run.
func (b *levelSet) endRun() {
	if n := len(b.energy); len(b.runs) == 0 && n > 0 || len(b.runs) > 0 && b.runs[len(b.runs)-1] < n {
		b.runs = append(b.runs, n)
	}
}

// settle counts all energies from the lowest and finds the ground level.
func (b *levelSet) settle() bool {
	b.endRun()
	lowest := b.energy[0]
	for _, e := range b.energy {
		lowest = min(lowest, e)
	}
	if !column.Finite(lowest) {
		return false
	}
	b.lowest, b.first, b.ground = lowest, math.Inf(1), 0
	b.excited = append(b.excited[:0], b.weight...)
	b.share = room(b.share, b.longestRun())
	for i, e := range b.energy {
		height := e - lowest
		b.energy[i] = height
		switch {
		case height == 0:
			b.ground += b.weight[i]
			b.excited[i] = 0
		case height < b.first:
			b.first = height
		}
		if !(height >= 0) || !(b.weight[i] > 0) {
			return false
		}
	}
	if math.IsInf(b.first, 1) {
		b.first = 0
	}
	return true
}

// countUpTo counts the ascending energies that are at most ceiling.
func countUpTo(energy []float64, ceiling float64) int {
	low, high := 0, len(energy)
	if high > 0 && energy[high-1] <= ceiling {
		return high
	}
	for low < high {
		if middle := (low + high) / 2; energy[middle] <= ceiling {
			low = middle + 1
		} else {
			high = middle
		}
	}
	return low
}

// quantity gives a quantity of the set at 1/(k_B T) = beta.
func (b *levelSet) quantity(beta float64, want quantity) float64 {
	if b.known[want] && b.knownBeta[want] == beta {
		return b.knownAs[want]
	}
	value := b.compute(beta, want)
	b.known[want], b.knownBeta[want], b.knownAs[want] = true, beta, value
	return value
}

func (b *levelSet) compute(beta float64, want quantity) float64 {
	var excited, moment total
	ceiling := b.first + reach/beta
	from := 0
	for _, to := range b.runs {
		n := countUpTo(b.energy[from:to], ceiling)
		energy, weight := b.energy[from:from+n], b.excited[from:from+n]
		share := b.exponentials(energy, beta)
		if want == partition || want == logarithm {
			addShares(&excited, share, weight)
		} else {
			addMoments(&excited, &moment, share, weight, energy, beta)
		}
		from = to
	}
	rest := excited.value()
	sum := b.ground + rest
	switch want {
	case partition:
		return sum
	case logarithm:
		return column.Ln(b.ground) + column.Log1p(rest/b.ground)
	}
	mean := moment.value() / sum
	switch want {
	case meanLevel:
		return mean
	case entropic:
		return column.Ln(b.ground) + column.Log1p(rest/b.ground) + mean
	}
	// About the mean in a second pass: no difference of large numbers.
	var square total
	square.add(float64(b.ground * float64(mean*mean)))
	from = 0
	for _, to := range b.runs {
		n := countUpTo(b.energy[from:to], ceiling)
		energy, weight := b.energy[from:from+n], b.excited[from:from+n]
		share := b.exponentials(energy, beta)
		for i, e := range energy {
			d := float64(e*beta) - mean
			square.add(float64(float64(share[i]*weight[i]) * float64(d*d)))
		}
		from = to
	}
	return square.value() / sum
}

// exponentials gives exp(-energy beta) of the levels of a run.
func (b *levelSet) exponentials(energy []float64, beta float64) []float64 {
	share := b.share[:len(energy)]
	for i, e := range energy {
		share[i] = -float64(e * beta)
	}
	column.ExpColumn(share, share)
	return share
}

// addShares turns exponentials into shares weight times exponential and adds
// them up in four compensated sums, one beside the other.
func addShares(sum *total, share, weight []float64) {
	var s, r [4]float64
	n := len(share) &^ 3
	weight = weight[:len(share)]
	for i := 0; i < n; i += 4 {
		x, w := (*[4]float64)(share[i:]), (*[4]float64)(weight[i:])
		x[0] = float64(x[0] * w[0])
		x[1] = float64(x[1] * w[1])
		x[2] = float64(x[2] * w[2])
		x[3] = float64(x[3] * w[3])
		var rest float64
		s[0], rest = twoSum(s[0], x[0])
		r[0] += rest
		s[1], rest = twoSum(s[1], x[1])
		r[1] += rest
		s[2], rest = twoSum(s[2], x[2])
		r[2] += rest
		s[3], rest = twoSum(s[3], x[3])
		r[3] += rest
	}
	for i := n; i < len(share); i++ {
		share[i] = float64(share[i] * weight[i])
		sum.add(share[i])
	}
	for k := range s {
		sum.add(s[k])
		sum.rest += r[k]
	}
}

// addMoments does the same and adds up energy/kT times share besides.
func addMoments(sum, moment *total, share, weight, energy []float64, beta float64) {
	var first, second, firstMoment, secondMoment total
	n := len(share) &^ 1
	weight, energy = weight[:len(share)], energy[:len(share)]
	for i := 0; i < n; i += 2 {
		a, b := float64(share[i]*weight[i]), float64(share[i+1]*weight[i+1])
		share[i], share[i+1] = a, b
		first.add(a)
		second.add(b)
		firstMoment.add(float64(float64(energy[i]*beta) * a))
		secondMoment.add(float64(float64(energy[i+1]*beta) * b))
	}
	if n < len(share) {
		a := float64(share[n] * weight[n])
		share[n] = a
		first.add(a)
		firstMoment.add(float64(float64(energy[n]*beta) * a))
	}
	for _, t := range [...]*total{&first, &second} {
		sum.add(t.sum)
		sum.rest += t.rest
	}
	for _, t := range [...]*total{&firstMoment, &secondMoment} {
		moment.add(t.sum)
		moment.rest += t.rest
	}
}

// sort makes the order of the levels by energy; equal ones stay as built.
func (b *levelSet) sort() {
	if b.sorted {
		return
	}
	b.order = b.order[:0]
	for i := range b.energy {
		b.order = append(b.order, i)
	}
	slices.SortStableFunc(b.order, func(i, j int) int {
		switch {
		case b.energy[i] < b.energy[j]:
			return -1
		case b.energy[i] > b.energy[j]:
			return 1
		}
		return 0
	})
	b.sorted = true
}

// shareOf gives the share of one level among all.
func (b *levelSet) shareOf(level int, beta float64) float64 {
	return b.shareOver(level, beta, b.quantity(beta, partition))
}

// shareOver gives the share of one level from the sum of all.
func (b *levelSet) shareOver(level int, beta, sum float64) float64 {
	return float64(b.weight[level]*column.Exp(-float64(b.energy[level]*beta))) / sum
}
