package column

import "math"

// tinyAngle bounds the arguments whose sine, tangent and inverses round to the
// argument itself: the next term of the series is below a third of x^3.
const tinyAngle = 0x1p-27

// sinRemainder returns sin r - r for |r| <= pi/4: r^3 times a polynomial in
// r^2, interpolated at Chebyshev nodes.
func sinRemainder(r, square float64) float64 {
	p := sinCoefficient5 + float64(square*sinCoefficient6)
	p = sinCoefficient4 + float64(square*p)
	p = sinCoefficient3 + float64(square*p)
	p = sinCoefficient2 + float64(square*p)
	p = sinCoefficient1 + float64(square*p)
	p = sinCoefficient0 + float64(square*p)
	return float64(float64(r*square) * p)
}

// cosRemainder returns cos r - 1 + r^2/2 for |r| <= pi/4 likewise.
func cosRemainder(square float64) float64 {
	p := cosCoefficient4 + float64(square*cosCoefficient5)
	p = cosCoefficient3 + float64(square*p)
	p = cosCoefficient2 + float64(square*p)
	p = cosCoefficient1 + float64(square*p)
	p = cosCoefficient0 + float64(square*p)
	return float64(float64(square*square) * p)
}

// sinReduced returns sin(r+tail) for |r| <= pi/4.
func sinReduced(r, tail float64) float64 {
	square := float64(r * r)
	return r + (sinRemainder(r, square) + (tail - float64(float64(0.5*square)*tail)))
}

// cosReduced returns cos(r+tail) for |r| <= pi/4.
func cosReduced(r, tail float64) float64 {
	square := float64(r * r)
	sum, rest := fastTwoSum(1, float64(-0.5*square))
	return sum + (rest + (cosRemainder(square) - float64(r*tail)))
}

// Sin returns the sine of x radians: argument reduction by multiples of pi/2,
// then near-minimax polynomials. Sin(±Inf) and Sin(NaN) are NaN.
func Sin(x float64) float64 {
	size := math.Abs(x)
	if size <= quarterPi {
		if size < tinyAngle {
			return x
		}
		return sinReduced(x, 0)
	}
	if !(size <= math.MaxFloat64) {
		return math.NaN()
	}
	quadrant, r, tail := reduceByHalfPi(x)
	switch quadrant {
	case 0:
		return sinReduced(r, tail)
	case 1:
		return cosReduced(r, tail)
	case 2:
		return -sinReduced(r, tail)
	}
	return -cosReduced(r, tail)
}

// Cos returns the cosine of x radians, by the method of Sin. Cos(±Inf) and
// Cos(NaN) are NaN.
func Cos(x float64) float64 {
	size := math.Abs(x)
	if size <= quarterPi {
		return cosReduced(x, 0)
	}
	if !(size <= math.MaxFloat64) {
		return math.NaN()
	}
	quadrant, r, tail := reduceByHalfPi(x)
	switch quadrant {
	case 0:
		return cosReduced(r, tail)
	case 1:
		return -sinReduced(r, tail)
	case 2:
		return -cosReduced(r, tail)
	}
	return sinReduced(r, tail)
}

// Tan returns the tangent of x radians: sine over cosine of the reduced
// argument, both in double length. Tan(±Inf) and Tan(NaN) are NaN.
func Tan(x float64) float64 {
	size := math.Abs(x)
	if size < tinyAngle {
		return x
	}
	if !(size <= math.MaxFloat64) {
		return math.NaN()
	}
	quadrant, r, tail := 0, x, 0.0
	if size > quarterPi {
		quadrant, r, tail = reduceByHalfPi(x)
	}
	square, squareRest := twoProduct(r, r)
	sine, sineRest := fastTwoSum(r, sinRemainder(r, square))
	sineRest += tail - float64(float64(0.5*square)*tail)
	cosine, cosineRest := fastTwoSum(1, float64(-0.5*square))
	cosineRest += (cosRemainder(square) - float64(0.5*squareRest)) - float64(r*tail)
	cosine, cosineRest = fastTwoSum(cosine, cosineRest)
	if quadrant&1 == 1 {
		return -divideDoubles(cosine, cosineRest, sine, sineRest)
	}
	return divideDoubles(sine, sineRest, cosine, cosineRest)
}
