package column

import "math"

// AllFinite says whether no row is infinite or NaN: x - x is 0 for every
// finite number and NaN for all others, so one sum tells.
func AllFinite(a []float64) bool {
	var s0, s1, s2, s3 float64
	for len(a) >= 8 {
		x := (*[8]float64)(a)
		s0 += (x[0] - x[0]) + (x[4] - x[4])
		s1 += (x[1] - x[1]) + (x[5] - x[5])
		s2 += (x[2] - x[2]) + (x[6] - x[6])
		s3 += (x[3] - x[3]) + (x[7] - x[7])
		a = a[8:]
	}
	for _, x := range a {
		s0 += x - x
	}
	return s0+s1+s2+s3 == 0
}

// AllInside says whether every row lies from low to high, both included; NaN
// does not.
func AllInside(a []float64, low, high float64) bool {
	// The bits of numbers that are not negative rise with them, so that one
	// comparison of whole numbers decides; what fails it is looked at exactly.
	switch {
	case low >= 0 && high >= low:
		from := math.Float64bits(math.Abs(low)) // a bound of -0 is 0
		if a = skipInside(a, from, math.Float64bits(math.Abs(high))-from, 0); len(a) == 0 {
			return true
		}
	case low == -high && high > 0:
		if a = skipInside(a, 0, math.Float64bits(high), 1<<63); len(a) == 0 {
			return true
		}
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

// skipInside gives the rest of a from the first eight rows of which the bits,
// without those of clear, do not all lie within span above from.
func skipInside(a []float64, from, span, clear uint64) []float64 {
	for len(a) >= 8 {
		x := (*[8]float64)(a)
		if math.Float64bits(x[0])&^clear-from > span || math.Float64bits(x[1])&^clear-from > span ||
			math.Float64bits(x[2])&^clear-from > span || math.Float64bits(x[3])&^clear-from > span ||
			math.Float64bits(x[4])&^clear-from > span || math.Float64bits(x[5])&^clear-from > span ||
			math.Float64bits(x[6])&^clear-from > span || math.Float64bits(x[7])&^clear-from > span {
			return a
		}
		a = a[8:]
	}
	return a
}
