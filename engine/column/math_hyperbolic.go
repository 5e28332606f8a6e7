package column

import "math"

// hyperbolicOverflow lies just beyond the greatest argument whose hyperbolic
// sine is finite, ln of twice the greatest number.
const hyperbolicOverflow = 710.48

// hyperbolicLarge bounds the arguments for which exp(-x) matters beside exp x:
// exp(-44) is below 2^-63.
const hyperbolicLarge = 22

// sinhRemainder returns sinh x - x for |x| <= 1/4 from the Taylor polynomial
// of degree 13.
func sinhRemainder(x float64) float64 {
	square := float64(x * x)
	p := 1.0/39916800 + float64(square*(1.0/6227020800))
	p = 1.0/362880 + float64(square*p)
	p = 1.0/5040 + float64(square*p)
	p = 1.0/120 + float64(square*p)
	p = 1.0/6 + float64(square*p)
	return float64(float64(x*square) * p)
}

// expPair returns exp x and exp(-x) in double length for |x| up to 22.
func expPair(x float64) (up, down doubleDouble) {
	high, low, n := expParts(x, 0)
	factor := powerOfTwo(n)
	up = doubleDouble{float64(high * factor), float64(low * factor)}
	high, low, n = expParts(-x, 0)
	factor = powerOfTwo(n)
	return up, doubleDouble{float64(high * factor), float64(low * factor)}
}

// twiceSinhCosh returns 2 sinh x and 2 cosh x in double length for x from 0 to
// 22: (exp x - exp(-x)) and (exp x + exp(-x)) from Exp's table, the sine from
// its series up to 1/4.
func twiceSinhCosh(x float64) (sine, cosine doubleDouble) {
	up, down := expPair(x)
	sum, rest := fastTwoSum(up.high, down.high)
	cosine = doubleDouble{sum, rest + (up.low + down.low)}
	if x <= 0.25 {
		return doubleDouble{float64(2 * x), float64(2 * sinhRemainder(x))}, cosine
	}
	sum, rest = fastTwoSum(up.high, -down.high)
	return doubleDouble{sum, rest + (up.low - down.low)}, cosine
}

// halfExp returns exp(x)/2 for x from 22 on, where exp(x) may overflow first.
func halfExp(x float64) float64 {
	if x > hyperbolicOverflow {
		return math.Inf(1)
	}
	high, low, n := expParts(x, 0)
	return scaleSum(high, low, n-1)
}

// Sinh returns the hyperbolic sine of x, from the table of Exp in double
// length; near 0 from its series.
func Sinh(x float64) float64 {
	size := math.Abs(x)
	switch {
	case x == 0 || math.IsNaN(x):
		return x
	case size <= 0.25:
		return x + sinhRemainder(x)
	case size > hyperbolicLarge:
		return math.Copysign(halfExp(size), x)
	}
	sine, _ := twiceSinhCosh(size)
	return math.Copysign(float64(0.5*(sine.high+sine.low)), x)
}

// Cosh returns the hyperbolic cosine of x, from the table of Exp in double
// length.
func Cosh(x float64) float64 {
	size := math.Abs(x)
	switch {
	case math.IsNaN(x):
		return x
	case size > hyperbolicLarge:
		return halfExp(size)
	}
	_, cosine := twiceSinhCosh(size)
	return float64(0.5 * (cosine.high + cosine.low))
}

// Tanh returns the hyperbolic tangent of x: sine over cosine in double length.
func Tanh(x float64) float64 {
	size := math.Abs(x)
	switch {
	case size < 0x1p-28 || math.IsNaN(x):
		return x
	case size > hyperbolicLarge:
		return math.Copysign(1, x)
	}
	sine, cosine := twiceSinhCosh(size)
	return math.Copysign(divideDoubles(sine.high, sine.low, cosine.high, cosine.low), x)
}
