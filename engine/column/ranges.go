package column

import (
	"math"
	"unsafe"
)

// AllFinite says whether no row is infinite or NaN.
func AllFinite(a []float64) bool {
	for _, x := range skipWithin(a, math.Float64bits(math.MaxFloat64)) {
		if x-x != 0 {
			return false
		}
	}
	return true
}

// AllInside says whether every row lies from low to high, both included; NaN
// does not.
func AllInside(a []float64, low, high float64) bool {
	// The bits of numbers that are not negative rise with them, so that one
	// comparison of whole numbers decides; what fails it is looked at exactly.
	switch {
	case low >= 0 && high >= low:
		from := math.Float64bits(math.Abs(low)) // a bound of -0 is 0
		a = skipInside(a, from, math.Float64bits(math.Abs(high))-from)
	case low == -high && high > 0:
		a = skipWithin(a, math.Float64bits(high))
	}
	for len(a) >= 8 {
		x := (*[8]float64)(a)
		if !(x[0] >= low && x[0] <= high && x[1] >= low && x[1] <= high &&
			x[2] >= low && x[2] <= high && x[3] >= low && x[3] <= high &&
			x[4] >= low && x[4] <= high && x[5] >= low && x[5] <= high &&
			x[6] >= low && x[6] <= high && x[7] >= low && x[7] <= high) {
			return false
		}
		a = a[8:]
	}
	for _, x := range a {
		if !(x >= low && x <= high) {
			return false
		}
	}
	return true
}

// skipInside gives the rest of a from the first eight rows of which the bits
// do not all lie within span above from; both lie below the sign bit.
func skipInside(a []float64, from, span uint64) []float64 {
	if inModule {
		return skipInsideJoined(a, from, span)
	}
	for len(a) >= 8 {
		x := bitsOf8(a)
		if x[0]-from > span {
			return a
		}
		if x[1]-from > span {
			return a
		}
		if x[2]-from > span {
			return a
		}
		if x[3]-from > span {
			return a
		}
		if x[4]-from > span {
			return a
		}
		if x[5]-from > span {
			return a
		}
		if x[6]-from > span {
			return a
		}
		if x[7]-from > span {
			return a
		}
		a = a[8:]
	}
	return a
}

// skipInsideJoined is skipInside by the sign bits of differences: a number
// without a sign below from or above high sets that of one, one with a sign
// that of the other.
func skipInsideJoined(a []float64, from, span uint64) []float64 {
	high := from + span
	for len(a) >= 8 {
		x := bitsOf8(a)
		outside := (x[0] - from) | (high - x[0]) |
			(x[1] - from) | (high - x[1]) |
			(x[2] - from) | (high - x[2]) |
			(x[3] - from) | (high - x[3]) |
			(x[4] - from) | (high - x[4]) |
			(x[5] - from) | (high - x[5]) |
			(x[6] - from) | (high - x[6]) |
			(x[7] - from) | (high - x[7])
		if int64(outside) < 0 {
			return a
		}
		a = a[8:]
	}
	return a
}

// skipWithin gives the rest of a from the first eight rows of which the bits
// without the sign do not all lie within span.
func skipWithin(a []float64, span uint64) []float64 {
	if inModule {
		return skipWithinJoined(a, span)
	}
	for len(a) >= 8 {
		x := bitsOf8(a)
		// Twice the bits are the bits without the sign, shifted.
		if 2*x[0] > 2*span {
			return a
		}
		if 2*x[1] > 2*span {
			return a
		}
		if 2*x[2] > 2*span {
			return a
		}
		if 2*x[3] > 2*span {
			return a
		}
		if 2*x[4] > 2*span {
			return a
		}
		if 2*x[5] > 2*span {
			return a
		}
		if 2*x[6] > 2*span {
			return a
		}
		if 2*x[7] > 2*span {
			return a
		}
		a = a[8:]
	}
	return a
}

// skipWithinJoined is skipWithin by the sign bits of differences.
func skipWithinJoined(a []float64, span uint64) []float64 {
	const sign = 1 << 63
	for len(a) >= 8 {
		x := bitsOf8(a)
		outside := (span - x[0]&^sign) |
			(span - x[1]&^sign) |
			(span - x[2]&^sign) |
			(span - x[3]&^sign) |
			(span - x[4]&^sign) |
			(span - x[5]&^sign) |
			(span - x[6]&^sign) |
			(span - x[7]&^sign)
		if int64(outside) < 0 {
			return a
		}
		a = a[8:]
	}
	return a
}

// bitsOf8 gives the first eight rows as whole numbers, so that they are loaded
// as such.
func bitsOf8(a []float64) *[8]uint64 { return (*[8]uint64)(unsafe.Pointer((*[8]float64)(a))) }
