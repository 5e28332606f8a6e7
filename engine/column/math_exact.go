package column

import "math"

//go:generate go run ./internal/mathtables

// The functions in the files math_*.go give the same bits on every platform:
// they use only operations that IEEE 754 defines to the last bit, and every
// product is converted explicitly, because the language lets a compiler fuse
// a product with a sum unless the product is converted (Go specification,
// "Floating-point operators"). A quotient by a constant counts as a product:
// the compiler makes it one where the constant is a power of two.

// doubleDouble is an unevaluated sum of two numbers, the second within a
// rounding of the first (Dekker, Numerische Mathematik 18 (1971)).
type doubleDouble struct{ high, low float64 }

// twoSum returns a+b rounded, and the rounding error, exactly (Knuth, The Art
// of Computer Programming, volume 2, 4.2.2, theorem B).
func twoSum(a, b float64) (sum, rest float64) {
	sum = a + b
	part := sum - a
	return sum, (a - (sum - part)) + (b - part)
}

// fastTwoSum returns a+b rounded, and the rounding error, exactly, provided
// that a is 0 or not smaller than b in magnitude (Dekker 1971).
func fastTwoSum(a, b float64) (sum, rest float64) {
	sum = a + b
	return sum, b - (sum - a)
}

// twoProduct returns a*b rounded, and the rounding error, exactly, by
// Veltkamp's splitting into halves of 26 bits (Dekker 1971). Magnitudes must
// stay below 2^995 and the product's error above the underflow threshold.
func twoProduct(a, b float64) (product, rest float64) {
	const splitter = 1<<27 + 1
	shifted := float64(a * splitter)
	aHigh := shifted - (shifted - a)
	aLow := a - aHigh
	shifted = float64(b * splitter)
	bHigh := shifted - (shifted - b)
	bLow := b - bHigh
	product = float64(a * b)
	return product, (((float64(aHigh*bHigh) - product) + float64(aHigh*bLow)) + float64(aLow*bHigh)) + float64(aLow*bLow)
}

// divideDoubles returns (aHigh+aLow)/(bHigh+bLow) with about one rounding: a
// quotient, corrected by its own remainder.
func divideDoubles(aHigh, aLow, bHigh, bLow float64) float64 {
	quotient := aHigh / bHigh
	product, rest := twoProduct(quotient, bHigh)
	remainder := ((aHigh - product) - rest) + (aLow - float64(quotient*bLow))
	return quotient + remainder/bHigh
}

// powerOfTwo returns 2^n for -1022 <= n <= 1023.
func powerOfTwo(n int) float64 {
	return math.Float64frombits(uint64(n+1023) << 52)
}

// exponentOf returns the n of 2^n <= |x| < 2^(n+1) for a normal x.
func exponentOf(x float64) int {
	return int(math.Float64bits(x)>>52&0x7ff) - 1023
}

// scaleSum returns (high+low) 2^n for a positive high between 2^-500 and 2^500
// and a low within a rounding of it. A subnormal result is rounded once, at its
// own last place; a result beyond the range is infinite or 0.
func scaleSum(high, low float64, n int) float64 {
	exponent := exponentOf(high) + n
	switch {
	case exponent > 1024:
		return math.Inf(1)
	case exponent >= 1000:
		return float64(float64((high+low)*powerOfTwo(n-100)) * 0x1p100)
	case exponent >= -1022:
		return float64(float64((high+low)*powerOfTwo(n/2)) * powerOfTwo(n-n/2))
	case exponent < -1080:
		return 0
	}
	// Between magnitude and twice that, the last place is the least subnormal
	// number, before scaling: adding magnitude rounds there.
	magnitude := powerOfTwo(-1022 - n)
	sum, rest := fastTwoSum(magnitude, high)
	sum = (sum + (rest + low)) - magnitude
	return float64(float64(sum*powerOfTwo(n/2)) * powerOfTwo(n-n/2))
}
