package column

import "math"

// Block is how many rows a column of a block holds.
const Block = 1024

// NaN is the value of a row that has no number.
func NaN() float64 { return math.NaN() }

// Fill sets every row to x. It copies what it has filled already, which the
// module does much faster than row by row.
func Fill(dst []float64, x float64) {
	if len(dst) == 0 {
		return
	}
	dst[0] = x
	for n := 1; n < len(dst); n *= 2 {
		copy(dst[n:], dst[:n])
	}
}

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

// Finite says whether x is a number that may be shown.
func Finite(x float64) bool { return x-x == 0 }
