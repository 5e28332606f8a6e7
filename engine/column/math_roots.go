package column

import "math"

// Cbrt returns the cube root of x: a cubic polynomial, one step of Halley's
// iteration, and one of Newton's whose residual is in double length, which
// makes cubes of whole numbers exact. Special values are their own roots.
func Cbrt(x float64) float64 {
	size := math.Abs(x)
	if size == 0 || !(size <= math.MaxFloat64) {
		return x
	}
	// size = z 2^(3 third + remainder) with 1/2 <= z < 1.
	z, exponent := math.Frexp(size)
	third := (exponent+1200)/3 - 400
	root := cbrtCoefficient2 + float64(z*cbrtCoefficient3)
	root = cbrtCoefficient1 + float64(z*root)
	root = cbrtCoefficient0 + float64(z*root)
	switch exponent - 3*third {
	case 1:
		z, root = float64(2*z), float64(root*cbrt2)
	case 2:
		z, root = float64(4*z), float64(root*cbrt4)
	}
	cube := float64(float64(root*root) * root)
	root -= float64(root * ((cube - z) / (float64(2*cube) + z)))

	square, squareRest := twoProduct(root, root)
	cube, cubeRest := twoProduct(square, root)
	residual := ((z - cube) - cubeRest) - float64(squareRest*root)
	root += residual / float64(3*square)
	return math.Copysign(float64(root*powerOfTwo(third)), x)
}

// Hypot returns sqrt(x^2 + y^2) without overflow or underflow on the way: the
// root of the rounded sum, and one of Newton's steps whose residual is in
// double length. Hypot(±Inf, y) is +Inf even if y is NaN.
func Hypot(x, y float64) float64 {
	x, y = math.Abs(x), math.Abs(y)
	switch {
	case math.IsInf(x, 1) || math.IsInf(y, 1):
		return math.Inf(1)
	case math.IsNaN(x) || math.IsNaN(y):
		return math.NaN()
	case x < y:
		x, y = y, x
	}
	// A smaller leg adds less than a quarter of a unit, squares that neither
	// overflow nor lose their rounding errors need no scaling.
	if y <= float64(x*0x1p-60) {
		return x
	}
	exponent := 0
	switch {
	case x > 0x1p500:
		x, y, exponent = float64(x*0x1p-600), float64(y*0x1p-600), 600
	case y < 0x1p-450:
		x, y, exponent = float64(x*0x1p600), float64(y*0x1p600), -600
	}
	xSquare, xRest := twoProduct(x, x)
	ySquare, yRest := twoProduct(y, y)
	sum, sumRest := fastTwoSum(xSquare, ySquare)
	sumRest += xRest + yRest
	root := math.Sqrt(sum + sumRest)
	square, squareRest := twoProduct(root, root)
	correction := (((sum - square) - squareRest) + sumRest) / float64(2*root)
	if exponent != 0 {
		return scaleSum(root, correction, exponent)
	}
	return root + correction
}
