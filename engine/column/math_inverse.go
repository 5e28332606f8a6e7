package column

import "math"

// asinRemainder returns asin r - r for |r| <= 1/2 and square = r^2: r^3 times
// a polynomial in r^2, interpolated at Chebyshev nodes.
func asinRemainder(r, square float64) float64 {
	// Two polynomials in the fourth power, side by side.
	fourth := float64(square * square)
	even := asinCoefficient10 + float64(fourth*asinCoefficient12)
	even = asinCoefficient8 + float64(fourth*even)
	even = asinCoefficient6 + float64(fourth*even)
	even = asinCoefficient4 + float64(fourth*even)
	even = asinCoefficient2 + float64(fourth*even)
	even = asinCoefficient0 + float64(fourth*even)
	odd := asinCoefficient11 + float64(fourth*asinCoefficient13)
	odd = asinCoefficient9 + float64(fourth*odd)
	odd = asinCoefficient7 + float64(fourth*odd)
	odd = asinCoefficient5 + float64(fourth*odd)
	odd = asinCoefficient3 + float64(fourth*odd)
	odd = asinCoefficient1 + float64(fourth*odd)
	return float64(float64(r*square) * (even + float64(square*odd)))
}

// asinOfHalfRoot returns root and rest with root+rest = asin(sqrt(z)) for
// 0 < z <= 1/4, the rounding error of the root included.
func asinOfHalfRoot(z float64) (root, rest float64) {
	root = math.Sqrt(z)
	product, productRest := twoProduct(root, root)
	correction := ((z - product) - productRest) / float64(2*root)
	return root, correction + asinRemainder(root, z)
}

// Asin returns the arc sine of x in radians: a near-minimax polynomial up to
// 1/2, and pi/2 - 2 asin(sqrt((1-x)/2)) above (Cody and Waite, Software Manual
// for the Elementary Functions, 1980). NaN outside -1 to 1.
func Asin(x float64) float64 {
	size := math.Abs(x)
	switch {
	case size < tinyAngle:
		return x
	case size <= 0.5:
		return x + asinRemainder(x, float64(x*x))
	case size == 1:
		return math.Copysign(halfPiHigh, x)
	case !(size < 1):
		return math.NaN()
	}
	root, rest := asinOfHalfRoot(float64(0.5 * (1 - size)))
	sum, sumRest := fastTwoSum(halfPiHigh, float64(-2*root))
	return math.Copysign(sum+(sumRest+(halfPiLow-float64(2*rest))), x)
}

// Acos returns the arc cosine of x in radians, 0 to pi, by the method of Asin.
// NaN outside -1 to 1.
func Acos(x float64) float64 {
	switch {
	case x == 1:
		return 0
	case x == -1:
		return 2 * halfPiHigh
	case !(math.Abs(x) < 1):
		return math.NaN()
	case x >= 0.5:
		root, rest := asinOfHalfRoot(float64(0.5 * (1 - x)))
		return float64(2 * (root + rest))
	case x <= -0.5:
		root, rest := asinOfHalfRoot(float64(0.5 * (1 + x)))
		sum, sumRest := fastTwoSum(2*halfPiHigh, float64(-2*root))
		return sum + (sumRest + (2*halfPiLow - float64(2*rest)))
	}
	sum, sumRest := fastTwoSum(halfPiHigh, -x)
	return sum + (sumRest + (halfPiLow - asinRemainder(x, float64(x*x))))
}

// atanQuotient returns high and low with high+low = atan(y/x) for
// 0 < y <= x, both between 2^-400 and 2^400. Below 1/16 the Taylor polynomial of
// the quotient in double length; above, the addition theorem
// atan(y/x) = atan c + atan((y-cx)/(x+cy)) at the nearest c = i/64 (Gal and
// Bachelis, ACM Transactions on Mathematical Software 17 (1991), use such a
// table).
func atanQuotient(y, x float64) (high, low float64) {
	quotient := y / x
	if quotient < 1.0/16 {
		product, rest := twoProduct(quotient, x)
		tail := ((y - product) - rest) / x
		square := float64(quotient * quotient)
		p := 1.0/11 - float64(square*(1.0/13))
		p = 1.0/9 - float64(square*p)
		p = 1.0/7 - float64(square*p)
		p = 1.0/5 - float64(square*p)
		p = 1.0/3 - float64(square*p)
		return quotient, tail - float64(float64(quotient*square)*p)
	}
	i := int(float64(quotient*64) + 0.5)
	centre := float64(float64(i) * (1.0 / 64))
	product, rest := twoProduct(centre, x)
	t := ((y - product) - rest) / (x + float64(centre*y))
	square := float64(t * t)
	p := 1.0/5 - float64(square*(1.0/7))
	p = 1.0/3 - float64(square*p)
	entry := &atanTable[i]
	return entry.high, entry.low + (t - float64(float64(t*square)*p))
}

// subtractFrom returns (aHigh+aLow) - (bHigh+bLow) for a not smaller than b.
func subtractFrom(aHigh, aLow, bHigh, bLow float64) (high, low float64) {
	sum, rest := fastTwoSum(aHigh, -bHigh)
	return sum, rest + (aLow - bLow)
}

// Atan returns the arc tangent of x in radians, -pi/2 to pi/2: a table of
// atan(i/64) and a Taylor polynomial, of 1/x where |x| > 1.
func Atan(x float64) float64 {
	size := math.Abs(x)
	var high, low float64
	switch {
	case size < tinyAngle || math.IsNaN(x):
		return x
	case size <= 1:
		high, low = atanQuotient(size, 1)
	case size < 0x1p60:
		high, low = atanQuotient(1, size)
		high, low = subtractFrom(halfPiHigh, halfPiLow, high, low)
	default:
		high = halfPiHigh
	}
	return math.Copysign(high+low, x)
}

// Atan2 returns the angle of the point (x, y) in radians, -pi to pi, by the
// method of Atan. Special values as in ISO C annex F.10.1.4.
func Atan2(y, x float64) float64 {
	if math.IsNaN(x) || math.IsNaN(y) {
		return math.NaN()
	}
	high, low := angleInFirstQuadrant(math.Abs(y), math.Abs(x))
	if math.Signbit(x) {
		high, low = subtractFrom(2*halfPiHigh, 2*halfPiLow, high, low)
	}
	return math.Copysign(high+low, y)
}

// angleInFirstQuadrant returns atan(y/x) in two parts for y and x from 0 to
// +Inf.
func angleInFirstQuadrant(y, x float64) (high, low float64) {
	switch {
	case y == 0:
		return 0, 0
	case x == 0:
		return halfPiHigh, halfPiLow
	case math.IsInf(x, 1) && math.IsInf(y, 1):
		return float64(0.5 * halfPiHigh), float64(0.5 * halfPiLow)
	case math.IsInf(x, 1):
		return 0, 0
	case math.IsInf(y, 1):
		return halfPiHigh, halfPiLow
	}
	if min(x, y) < 0x1p-400 || max(x, y) > 0x1p400 {
		yFraction, yExponent := math.Frexp(y)
		xFraction, xExponent := math.Frexp(x)
		difference := yExponent - xExponent
		switch {
		case difference > 60:
			return halfPiHigh, halfPiLow
		case difference < -60:
			return y / x, 0
		}
		y, x = float64(yFraction*powerOfTwo(difference)), xFraction
	}
	if y <= x {
		return atanQuotient(y, x)
	}
	high, low = atanQuotient(x, y)
	return subtractFrom(halfPiHigh, halfPiLow, high, low)
}
