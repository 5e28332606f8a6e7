package column

import "math"

// Block is how many rows a column of a block holds.
const Block = 1024

// NaN is the value of a row that has no number.
func NaN() float64 { return math.NaN() }

// AbsOf gives the size of x without its sign.
func AbsOf(x float64) float64 { return math.Abs(x) }

// FloorOf gives the next whole number downwards.
func FloorOf(x float64) float64 { return math.Floor(x) }

// Min gives the smaller of two numbers, NaN where one is NaN, and −0 before +0.
func Min(a, b float64) float64 {
	switch {
	case a != a || b != b:
		return math.NaN()
	case a == 0 && b == 0:
		if math.Signbit(a) {
			return a
		}
		return b
	case a < b:
		return a
	}
	return b
}

// Max gives the larger of two numbers, NaN where one is NaN, and +0 before −0.
func Max(a, b float64) float64 {
	switch {
	case a != a || b != b:
		return math.NaN()
	case a == 0 && b == 0:
		if math.Signbit(a) {
			return b
		}
		return a
	case a > b:
		return a
	}
	return b
}

// RoundOf gives the nearest whole number, halves away from zero.
func RoundOf(x float64) float64 {
	whole := math.Trunc(x)
	if math.Abs(x-whole) >= 0.5 {
		return whole + math.Copysign(1, x)
	}
	return whole
}

// SignOf gives −1, 0 or 1; NaN for NaN.
func SignOf(x float64) float64 {
	switch {
	case x > 0:
		return 1
	case x < 0:
		return -1
	}
	return x
}

// The arithmetic kernels: an operand of length 1 serves all rows of dst.

// AddColumn gives a + b.
func AddColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(b) && len(a) == len(dst):
		a, b = a[:len(dst)], b[:len(dst)]
		for i := range dst {
			dst[i] = a[i] + b[i]
		}
	case len(b) == 1 && len(a) == len(dst):
		a, y := a[:len(dst)], b[0]
		for i := range dst {
			dst[i] = a[i] + y
		}
	default:
		x, b := a[0], b[:len(dst)]
		for i := range dst {
			dst[i] = x + b[i]
		}
	}
}

// SubColumn gives a − b.
func SubColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(b) && len(a) == len(dst):
		a, b = a[:len(dst)], b[:len(dst)]
		for i := range dst {
			dst[i] = a[i] - b[i]
		}
	case len(b) == 1 && len(a) == len(dst):
		a, y := a[:len(dst)], b[0]
		for i := range dst {
			dst[i] = a[i] - y
		}
	default:
		x, b := a[0], b[:len(dst)]
		for i := range dst {
			dst[i] = x - b[i]
		}
	}
}

// MulColumn gives a·b.
func MulColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(b) && len(a) == len(dst):
		a, b = a[:len(dst)], b[:len(dst)]
		for i := range dst {
			dst[i] = a[i] * b[i]
		}
	case len(b) == 1 && len(a) == len(dst):
		a, y := a[:len(dst)], b[0]
		for i := range dst {
			dst[i] = a[i] * y
		}
	default:
		x, b := a[0], b[:len(dst)]
		for i := range dst {
			dst[i] = x * b[i]
		}
	}
}

// DivColumn gives a/b.
func DivColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(b) && len(a) == len(dst):
		a, b = a[:len(dst)], b[:len(dst)]
		for i := range dst {
			dst[i] = a[i] / b[i]
		}
	case len(b) == 1 && len(a) == len(dst):
		a, y := a[:len(dst)], b[0]
		for i := range dst {
			dst[i] = a[i] / y
		}
	default:
		x, b := a[0], b[:len(dst)]
		for i := range dst {
			dst[i] = x / b[i]
		}
	}
}

// Map1 applies f to every row.
func Map1(dst, a []float64, f func(float64) float64) {
	a = a[:len(dst)]
	for i := range dst {
		dst[i] = f(a[i])
	}
}

// Map2 applies f to every pair of rows; an operand of length 1 serves all rows.
func Map2(dst, a, b []float64, f func(x, y float64) float64) {
	ia, ib := Stride(a), Stride(b)
	for i := range dst {
		dst[i] = f(a[i*ia], b[i*ib])
	}
}

// Stride is 1 for a column and 0 for a single number, so that one loop serves
// both.
func Stride(a []float64) int {
	if len(a) > 1 {
		return 1
	}
	return 0
}

// AllFinite says whether no row is infinite or NaN: x − x is 0 for every
// finite number and NaN for all others, so one sum tells.
func AllFinite(a []float64) bool {
	var s0, s1, s2, s3 float64
	i := 0
	for ; i+4 <= len(a); i += 4 {
		s0 += a[i] - a[i]
		s1 += a[i+1] - a[i+1]
		s2 += a[i+2] - a[i+2]
		s3 += a[i+3] - a[i+3]
	}
	for ; i < len(a); i++ {
		s0 += a[i] - a[i]
	}
	return s0+s1+s2+s3 == 0
}

// Span gives the smallest and the largest row; ok is false where a row is NaN.
func Span(a []float64) (low, high float64, ok bool) {
	low, high = a[0], a[0]
	finite := a[0] == a[0]
	for _, x := range a[1:] {
		if x < low {
			low = x
		}
		if x > high {
			high = x
		}
		if x != x {
			finite = false
		}
	}
	return low, high, finite
}

// Finite says whether x is a number that may be shown.
func Finite(x float64) bool { return x-x == 0 }
