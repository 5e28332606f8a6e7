package unit

import (
	"math"
	"math/bits"
)

// term is an odd integer, no multiple of five, raised to a power in twelfths.
type term struct {
	number   uint64
	twelfths int
}

// factor is an exact positive number: 2^twos * 5^fives * pi^pis * product of
// the terms, all powers in twelfths. Keeping powers apart makes products,
// quotients and roots exact and cheap; only value rounds.
type factor struct {
	twos, fives, pis int
	terms            []term
}

// integerFactor returns the factor of a positive integer.
func integerFactor(number uint64) factor {
	var f factor
	for number%2 == 0 && number != 0 {
		number /= 2
		f.twos += wholePower
	}
	for number%5 == 0 && number != 0 {
		number /= 5
		f.fives += wholePower
	}
	if number != 1 {
		f.terms = []term{{number, wholePower}}
	}
	return f
}

// tenFactor returns the factor 10^power.
func tenFactor(power int) factor {
	return factor{twos: power * wholePower, fives: power * wholePower}
}

// timesPower multiplies f by other^(twelfths/12). It is false when a power is
// no whole number of twelfths.
func (f *factor) timesPower(other *factor, twelfths int) bool {
	sound := true
	scaled := func(power int) int {
		product := power * twelfths
		if product%wholePower != 0 {
			sound = false
		}
		return product / wholePower
	}
	f.twos += scaled(other.twos)
	f.fives += scaled(other.fives)
	f.pis += scaled(other.pis)
	for _, t := range other.terms {
		f.addTerm(term{t.number, scaled(t.twelfths)})
	}
	return sound
}

// addTerm multiplies f by one term.
func (f *factor) addTerm(added term) {
	for i := range f.terms {
		if f.terms[i].number == added.number {
			f.terms[i].twelfths += added.twelfths
			return
		}
	}
	f.terms = append(f.terms, added)
}

// inverse returns 1/f.
func (f *factor) inverse() factor {
	g := factor{twos: -f.twos, fives: -f.fives, pis: -f.pis, terms: make([]term, len(f.terms))}
	for i, t := range f.terms {
		g.terms[i] = term{t.number, -t.twelfths}
	}
	return g
}

// rootDegree returns the smallest q for which f^q has whole powers only: 1, 2,
// 3, 4, 6 or 12.
func (f *factor) rootDegree() int {
	common := greatestCommonDivisor(wholePower, f.twos)
	common = greatestCommonDivisor(common, f.fives)
	common = greatestCommonDivisor(common, f.pis)
	for _, t := range f.terms {
		common = greatestCommonDivisor(common, t.twelfths)
	}
	return wholePower / common
}

// piBits is floor(pi * 2^256), the first 258 bits of pi, the least word first. A
// test computes them anew by Machin's formula.
var piBits = natural{0x082efa98ec4e6c89, 0xa4093822299f31d0, 0x13198a2e03707344, 0x243f6a8885a308d3, 0x3}

// piFraction is how many of those bits stand behind the point.
const piFraction = 256

// ratio returns f^degree as numerator/denominator times 2^shift, where degree
// is the root degree.
func (f *factor) ratio(degree int) (numerator, denominator natural, shift int) {
	whole := func(twelfths int) int { return twelfths * degree / wholePower }
	numerator, denominator = one(), one()
	shift = whole(f.twos)
	put := func(number uint64, power int) {
		if power >= 0 {
			numerator = numerator.timesPower(number, power)
		} else {
			denominator = denominator.timesPower(number, -power)
		}
	}
	put(5, whole(f.fives))
	for _, t := range f.terms {
		put(t.number, whole(t.twelfths))
	}
	for power := whole(f.pis); power > 0; power-- {
		product, dropped := timesPi(numerator)
		numerator = product
		shift += dropped - piFraction
	}
	for power := whole(f.pis); power < 0; power++ {
		product, dropped := timesPi(denominator)
		denominator = product
		shift -= dropped - piFraction
	}
	return numerator, denominator, shift
}

// timesPi returns n * piBits, cut to at least its first 960 bits, and how many
// bits were dropped: behind pi's own cut they mean nothing.
func timesPi(n natural) (product natural, dropped int) {
	const kept = 16 // words
	product = n.times(piBits)
	if excess := len(product) - kept; excess > 0 {
		return product[excess:], 64 * excess
	}
	return product, 0
}

// value returns the float64 nearest to f (ties to even; with pi in it, nearest
// for pi cut to 258 bits), whether f is exactly that number, and false when f
// lies outside 2^-1000 to 2^1000.
//
// The root of the ratio is found bit by bit: the largest whole m with
// (m 2^e)^q <= f^q, at least 54 bits long, then rounded once with what is left
// over as a sticky bit.
func (f *factor) value() (nearest float64, exact, inRange bool) {
	degree := f.rootDegree()
	numerator, denominator, shift := f.ratio(degree)
	if degree == 1 && shift > -60 && shift < 60 {
		if nearest, exact, ok := smallQuotient(numerator, denominator, shift); ok {
			return nearest, exact && f.pis == 0, true
		}
	}
	// f^q lies between 2^(length-1) and 2^(length+1).
	length := numerator.bitLength() - denominator.bitLength() + shift
	if length > 1000*degree || length < -1000*degree {
		return 0, false, false
	}
	exponent := floorDivide(length-1, degree) - 54
	// compare m^q * denominator * 2^(q e) with numerator * 2^shift
	shift -= exponent * degree
	if shift >= 0 {
		numerator = numerator.shifted(shift)
	} else {
		denominator = denominator.shifted(-shift)
	}
	mantissa := uint64(0)
	for bit := uint64(1) << 58; bit != 0; bit >>= 1 {
		trial := denominator.timesPower(mantissa|bit, degree)
		switch trial.compare(numerator) {
		case -1:
			mantissa |= bit
		case 0:
			mantissa |= bit
			exact = true
			bit = 1 // the rest is zero
		}
	}
	rounded := mantissa << 1
	if !exact {
		rounded |= 1
	}
	nearest = math.Ldexp(float64(rounded), exponent-1)
	exact = exact && f.pis == 0 && bits.Len64(mantissa)-bits.TrailingZeros64(mantissa) <= 53
	return nearest, exact, true
}

// smallQuotient divides where both numbers are exact in a float64, so that one
// division rounds correctly; it is false where they are not.
func smallQuotient(numerator, denominator natural, shift int) (nearest float64, exact, ok bool) {
	if shift > 0 {
		numerator = numerator.shifted(shift)
	} else {
		denominator = denominator.shifted(-shift)
	}
	if numerator.bitLength() > 53 || denominator.bitLength() > 53 {
		return 0, false, false
	}
	over, under := numerator[0], denominator[0]
	nearest = float64(over) / float64(under)
	// the quotient of two such numbers is a float64 exactly when the odd part
	// of the denominator divides the numerator
	odd := under >> bits.TrailingZeros64(under)
	return nearest, over%odd == 0, true
}

// floorDivide returns the largest integer not above a/b, for b > 0.
func floorDivide(a, b int) int {
	quotient := a / b
	if a%b < 0 {
		quotient--
	}
	return quotient
}

// terminates reports whether f is a decimal number with finitely many digits.
// Denominators beyond one word count as not terminating.
func (f *factor) terminates() bool {
	if f.pis != 0 || f.rootDegree() != 1 {
		return false
	}
	numerator, denominator := one(), uint64(1)
	for _, t := range f.terms {
		power := t.twelfths / wholePower
		if power >= 0 {
			numerator = numerator.timesPower(t.number, power)
			continue
		}
		for ; power < 0; power++ {
			high, low := bits.Mul64(denominator, t.number)
			if high != 0 {
				return false
			}
			denominator = low
		}
	}
	return numerator.remainder(denominator) == 0
}

// split returns f as multiply/divide, one of which is 1. A factor that is a
// float64 multiplies; one whose reciprocal is a float64 divides (mm: 1000).
// Where neither is, the one that is a finite decimal is taken (degF: divide by
// 1.8; km/h: divide by 3.6), for that loses least on the numbers people write,
// and else the factor multiplies. It is false when f is too large or too small.
func (f *factor) split() (multiply, divide float64, ok bool) {
	value, exact, ok := f.value()
	if !ok {
		return 1, 1, false
	}
	if exact {
		return value, 1, true
	}
	reciprocal := f.inverse()
	under, exact, ok := reciprocal.value()
	if !ok {
		return 1, 1, false
	}
	if exact || reciprocal.terminates() && !f.terminates() {
		return 1, under, true
	}
	return value, 1, true
}
