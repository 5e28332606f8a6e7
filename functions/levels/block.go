package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// notANumber answers arguments that a law cannot take.
var notANumber = math.NaN()

// quantity is what a law asks of a ladder. Each is told for one mode; of
// independent modes partition sums multiply and the others add up. All are
// counted from the lowest energy of the mode.
type quantity uint8

const (
	partition quantity = iota // sum of g exp(-(E - lowest)/kT)
	meanLevel                 // mean of (E - lowest)/kT
	variance                  // variance of E/kT: the heat capacity over R
	entropic                  // entropy over R: ln of the partition sum + mean
	logarithm                 // ln of the partition sum

	quantities = iota // how many
)

// scratch is a worker's own room for one law. Every column has a place a row.
type scratch struct {
	beta   []float64 // 1/(k_B T) in 1/J; NaN where T is not above 0
	value  []float64 // the quantity of one mode
	lowest []float64 // lowest energy of one mode in J
	offset []float64 // lowest energy of all modes in J

	reduced []float64 // (E - lowest)/kT of one level
	weight  []float64 // g exp(-reduced) of one level
	deviate []float64 // what is summed up for one level

	sums, moments, ground totals

	sets    []*levelSet     // one for each mode whose levels are worked out
	used    int             // how many of them the walk has met
	repeats []*law.Argument // how often the mode that the walk is at counts
}

// begin gives the scratch of a law's call with 1/(k_B T) of every row in it.
func begin(work *law.Work, temperature *law.Argument, rows int) *scratch {
	s, ok := work.Keep.(*scratch)
	if !ok {
		s = &scratch{}
		work.Keep = s
	}
	for _, each := range []*[]float64{&s.beta, &s.value, &s.lowest, &s.offset, &s.reduced, &s.weight, &s.deviate} {
		*each = room(*each, rows)
	}
	if len(temperature.Values) == 1 {
		column.Fill(s.beta, inverseOf(temperature.Values[0]))
	} else {
		for i, t := range temperature.Values[:rows] {
			s.beta[i] = inverseOf(t)
		}
	}
	clear(s.offset)
	return s
}

// inverseOf gives 1/(k_B T) in 1/J.
func inverseOf(temperature float64) float64 {
	if !(temperature > 0) {
		return notANumber
	}
	return 1 / float64(nature.BoltzmannConstant*temperature)
}

// fold gathers a quantity of all modes of a ladder in dst, which holds 1 in
// every row for partition sums and 0 for the others, and their lowest energies
// in offset.
func (s *scratch) fold(mode *law.Argument, want quantity, dst []float64) {
	s.used = 0
	s.repeats = s.repeats[:0]
	s.walk(mode, want, dst)
}

func (s *scratch) walk(mode *law.Argument, want quantity, dst []float64) {
	switch {
	case mode.Maker == combineLaw && len(mode.Items) == 2:
		s.walk(&mode.Items[0], want, dst)
		s.walk(&mode.Items[1], want, dst)
		return
	case mode.Maker == repeatModeLaw && len(mode.Items) == 2:
		s.repeats = append(s.repeats, &mode.Items[1])
		s.walk(&mode.Items[0], want, dst)
		s.repeats = s.repeats[:len(s.repeats)-1]
		return
	case mode.Maker == shiftLaw && len(mode.Items) == 2:
		for i := range dst {
			s.offset[i] += float64(s.times(i) * mode.Items[1].At(i))
		}
		s.walk(&mode.Items[0], want, dst)
		return
	}
	s.single(mode, want, len(dst))
	if len(s.repeats) == 0 {
		for i, value := range s.value {
			if want == partition {
				dst[i] *= value
			} else {
				dst[i] += value
			}
			s.offset[i] += s.lowest[i]
		}
		return
	}
	for i, value := range s.value {
		times := s.times(i)
		if want == partition {
			dst[i] *= column.Pow(value, times)
		} else {
			dst[i] += float64(times * value)
		}
		s.offset[i] += float64(times * s.lowest[i])
	}
}

// times gives how often the mode that the walk is at counts in a row; NaN
// where that is no whole number.
func (s *scratch) times(row int) float64 {
	times := 1.0
	for _, each := range s.repeats {
		n := each.At(row)
		if !wholeNumber(n) {
			return notANumber
		}
		times *= n
	}
	return times
}

// single puts a quantity of one mode into value and its lowest energy into
// lowest.
func (s *scratch) single(mode *law.Argument, want quantity, rows int) {
	switch {
	case mode.Maker == ladderLaw && len(mode.Items) >= 2:
		s.listed(mode, want, rows)
		return
	case mode.Maker == oscillatorLaw && len(mode.Items) == 1:
		for i := range rows {
			s.value[i] = oscillatorQuantity(mode.Items[0].At(i)*s.beta[i], want)
		}
	case isStiffRotor(mode):
		for i := range rows {
			s.value[i] = rotorQuantity(mode.Items[0].At(i)*s.beta[i], mode.Items[1].At(i), want)
		}
	default:
		s.built(mode, want, rows)
		return
	}
	clear(s.lowest)
}

// built does it for a mode whose levels are worked out.
func (s *scratch) built(mode *law.Argument, want quantity, rows int) {
	build := builderOf(mode.Maker)
	set := s.nextSet()
	for i := range rows {
		s.value[i], s.lowest[i] = notANumber, 0
		if value, ok := closedForm(mode, i, s.beta[i], want); ok {
			s.value[i] = value
		} else if build != nil && set.prepare(build, mode.Items, i, s.beta[i]) {
			s.value[i], s.lowest[i] = set.quantity(s.beta[i], want), set.lowest
		}
	}
}

// nextSet gives the set of the next mode that the walk meets.
func (s *scratch) nextSet() *levelSet {
	if s.used == len(s.sets) {
		s.sets = append(s.sets, &levelSet{})
	}
	s.used++
	return s.sets[s.used-1]
}

// twoSum gives the rounded sum of a and b and exactly what rounding took from
// it (Knuth D.E., The Art of Computer Programming, vol. 2, section 4.2.2). It
// is Neumaier's compensated summation without his question which is larger
// (Neumaier A. (1974) Z. angew. Math. Mech. 54, 39): the errors of all steps
// are added up apart and put back at the end.
func twoSum(a, b float64) (sum, rest float64) {
	a, b = float64(a), float64(b) // a product that a caller passes is rounded first
	sum = a + b
	part := sum - a
	return sum, (a - (sum - part)) + (b - part)
}

// total is a compensated sum of one row.
type total struct{ sum, rest float64 }

func (t *total) add(x float64) {
	sum, rest := twoSum(t.sum, x)
	t.sum, t.rest = sum, t.rest+rest
}

func (t *total) value() float64 { return t.sum + t.rest }

// totals is a compensated sum for each row of a block.
type totals struct{ sum, rest []float64 }

func (t *totals) clear(rows int) {
	t.sum, t.rest = room(t.sum, rows), room(t.rest, rows)
	clear(t.sum)
	clear(t.rest)
}

// add adds x[i] to row i.
func (t *totals) add(x []float64) {
	sum, rest := t.sum[:len(x)], t.rest[:len(x)]
	for i, value := range x {
		s, r := twoSum(sum[i], value)
		sum[i], rest[i] = s, rest[i]+r
	}
}

// settle puts the errors back and gives the sums.
func (t *totals) settle() []float64 {
	for i, r := range t.rest {
		t.sum[i] += r
		t.rest[i] = 0
	}
	return t.sum
}

// room gives a column for a block of rows, the old one where it is large enough.
func room(old []float64, rows int) []float64 {
	if cap(old) < rows {
		return make([]float64, rows)
	}
	return old[:rows]
}
