package column

import "math"

// erfcxEntry is one row of erfcxTable: a polynomial about the centre of an
// interval.
type erfcxEntry struct {
	centre, rest float64
	coefficient  [erfcxDegree + 1]float64
}

// erfRemainder returns erf x - x for |x| <= 1/2: x times a polynomial in x^2,
// interpolated at Chebyshev nodes.
func erfRemainder(x float64) float64 {
	square := float64(x * x)
	p := erfCoefficient8 + float64(square*erfCoefficient9)
	p = erfCoefficient7 + float64(square*p)
	p = erfCoefficient6 + float64(square*p)
	p = erfCoefficient5 + float64(square*p)
	p = erfCoefficient4 + float64(square*p)
	p = erfCoefficient3 + float64(square*p)
	p = erfCoefficient2 + float64(square*p)
	p = erfCoefficient1 + float64(square*p)
	p = erfCoefficient0 + float64(square*p)
	return float64(x * p)
}

// erfcParts returns erfc x as (high+low) 2^n for 1/2 <= x < 32: exp(-x^2) in
// double length times exp(x^2) erfc x, which changes slowly, from a table of
// polynomials (the factoring of Cody, Mathematics of Computation 23 (1969)).
func erfcParts(x float64) (high, low float64, n int) {
	square, squareRest := twoProduct(x, x)
	power, powerRest, n := expParts(-square, -squareRest)
	// Sign, exponent and three bits number the intervals from that of 1/2.
	entry := &erfcxTable[math.Float64bits(x)>>49-0x3fe0000000000000>>49]
	t := x - entry.centre
	p := entry.coefficient[erfcxDegree]
	for i := erfcxDegree - 1; i > 0; i-- {
		p = entry.coefficient[i] + float64(t*p)
	}
	factor, factorRest := fastTwoSum(entry.coefficient[0], entry.rest+float64(t*p))
	product, rest := twoProduct(power, factor)
	high, low = fastTwoSum(product, rest+(float64(power*factorRest)+float64(powerRest*factor)))
	return high, low, n
}

// Erf returns the error function of x, 2/sqrt(pi) times the integral of
// exp(-t^2) from 0 to x: a polynomial up to 1/2, 1 - erfc x above.
func Erf(x float64) float64 {
	size := math.Abs(x)
	switch {
	case size <= 0.5:
		return x + erfRemainder(x)
	case math.IsNaN(x):
		return x
	case size > 6:
		return math.Copysign(1, x)
	}
	high, low, n := erfcParts(size)
	factor := powerOfTwo(n)
	sum, rest := fastTwoSum(1, -float64(high*factor))
	return math.Copysign(sum+(rest-float64(low*factor)), x)
}

// Erfc returns 1 - erf x without cancellation for positive x.
func Erfc(x float64) float64 {
	switch {
	case math.IsNaN(x):
		return x
	case x > 27.3:
		return 0
	case x < -6:
		return 2
	case math.Abs(x) <= 0.5:
		sum, rest := twoSum(1, -x)
		return sum + (rest - erfRemainder(x))
	}
	high, low, n := erfcParts(math.Abs(x))
	if x > 0 {
		return scaleSum(high, low, n)
	}
	factor := powerOfTwo(n)
	sum, rest := fastTwoSum(2, -float64(high*factor))
	return sum + (rest - float64(low*factor))
}
