package main

import "math/big"

// precision is the working precision, in bits, of every reference value. The
// largest cancellation met is that of the scaled complementary error function
// near 32: exp(1024) against 1/57, about 1490 bits.
const precision = 1700

// terms bounds the error of every series below: a sum stops when its terms
// are smaller than the sum by this many bits.
const terms = precision - 16

func number(x float64) *big.Float {
	return new(big.Float).SetPrec(precision).SetFloat64(x)
}

func zero() *big.Float { return number(0) }

func add(x, y *big.Float) *big.Float { return zero().Add(x, y) }
func sub(x, y *big.Float) *big.Float { return zero().Sub(x, y) }
func mul(x, y *big.Float) *big.Float { return zero().Mul(x, y) }
func quo(x, y *big.Float) *big.Float { return zero().Quo(x, y) }
func sqrt(x *big.Float) *big.Float   { return zero().Sqrt(x) }

// scale returns x times 2 to the power n.
func scale(x *big.Float, n int) *big.Float { return zero().SetMantExp(x, n) }

// negligible says whether term no longer changes sum.
func negligible(term, sum *big.Float) bool {
	return term.Sign() == 0 || sum.Sign() != 0 && term.MantExp(nil) < sum.MantExp(nil)-terms
}

// exponential sums the Taylor series of exp after halving the argument until
// it is below 2^-16, and squares the sum as often.
func exponential(x *big.Float) *big.Float {
	halvings := max(0, x.MantExp(nil)+16)
	reduced := scale(x, -halvings)
	sum, term := number(1), number(1)
	for n := 1; !negligible(term, sum); n++ {
		term = quo(mul(term, reduced), number(float64(n)))
		sum = add(sum, term)
	}
	for range halvings {
		sum = mul(sum, sum)
	}
	return sum
}

// areaTangent sums artanh x = x + x^3/3 + x^5/5 + ... for |x| < 1.
func areaTangent(x *big.Float) *big.Float {
	square := mul(x, x)
	power, sum := x, x
	for n := 3; ; n += 2 {
		power = mul(power, square)
		term := quo(power, number(float64(n)))
		if negligible(term, sum) {
			return sum
		}
		sum = add(sum, term)
	}
}

// logarithm returns ln x = 2 artanh((x-1)/(x+1)).
func logarithm(x *big.Float) *big.Float {
	return scale(areaTangent(quo(sub(x, number(1)), add(x, number(1)))), 1)
}

// arcTangent sums x - x^3/3 + x^5/5 - ... after three halvings of the angle,
// atan x = 2 atan(x/(1+sqrt(1+x^2))).
func arcTangent(x *big.Float) *big.Float {
	const halvings = 3
	for range halvings {
		x = quo(x, add(number(1), sqrt(add(number(1), mul(x, x)))))
	}
	square := mul(x, x)
	power, sum := x, x
	for n := 3; ; n += 2 {
		power = zero().Neg(mul(power, square))
		term := quo(power, number(float64(n)))
		if negligible(term, sum) {
			return scale(sum, halvings)
		}
		sum = add(sum, term)
	}
}

// circle is pi = 4 atan 1.
var circle = scale(arcTangent(number(1)), 2)

// series sums a power series in u from the ratio of each coefficient to the
// one before.
func series(u *big.Float, first *big.Float, ratio func(n int) (numerator, denominator float64)) *big.Float {
	sum, term := first, first
	for n := 1; ; n++ {
		numerator, denominator := ratio(n)
		term = quo(mul(mul(term, u), number(numerator)), number(denominator))
		if negligible(term, sum) {
			return sum
		}
		sum = add(sum, term)
	}
}

// sineRemainder is (sin r - r)/r^3 as a function of u = r^2.
func sineRemainder(u *big.Float) *big.Float {
	return series(u, quo(number(-1), number(6)), func(n int) (float64, float64) {
		return -1, float64((2*n + 2) * (2*n + 3))
	})
}

// cosineRemainder is (cos r - 1 + r^2/2)/r^4 as a function of u = r^2.
func cosineRemainder(u *big.Float) *big.Float {
	return series(u, quo(number(1), number(24)), func(n int) (float64, float64) {
		return -1, float64((2*n + 3) * (2*n + 4))
	})
}

// arcSineRemainder is (asin r - r)/r^3 as a function of u = r^2, from
// asin r = sum over k of C(2k,k)/4^k r^(2k+1)/(2k+1).
func arcSineRemainder(u *big.Float) *big.Float {
	return series(u, quo(number(1), number(6)), func(n int) (float64, float64) {
		k := float64(n)
		return (2*k + 1) * (2*k + 1), (2*k + 2) * (2*k + 3)
	})
}

// errorRemainder is erf r / r - 1 as a function of u = r^2.
func errorRemainder(u *big.Float) *big.Float {
	var ratio *big.Float
	if u.Sign() != 0 {
		ratio = quo(mul(scaledErrorSeries(sqrt(u)), exponential(zero().Neg(u))), sqrt(u))
	} else {
		ratio = quo(number(2), sqrt(circle))
	}
	return sub(ratio, number(1))
}

// scaledErrorSeries is exp(x^2) erf x = 2/sqrt(pi) x sum over n of
// (2 x^2)^n / (1 3 5 ... (2n+1)), whose terms are all positive
// (Abramowitz and Stegun 7.1.6).
func scaledErrorSeries(x *big.Float) *big.Float {
	u := mul(x, x)
	sum := series(u, number(1), func(n int) (float64, float64) { return 2, float64(2*n + 1) })
	return mul(mul(sum, x), quo(number(2), sqrt(circle)))
}

// scaledComplement is exp(x^2) erfc x for x > 0.
func scaledComplement(x *big.Float) *big.Float {
	return sub(exponential(mul(x, x)), scaledErrorSeries(x))
}

// cubeRoot returns the cube root of x > 0 by Newton's iteration.
func cubeRoot(x *big.Float) *big.Float {
	root := number(1)
	for range 20 {
		root = quo(add(scale(root, 1), quo(x, mul(root, root))), number(3))
	}
	return root
}

// interpolate returns the coefficients, lowest first, of the polynomial of the
// given degree that agrees with f(centre+t) at the Chebyshev nodes of
// low <= t <= high: within a small factor of the best uniform approximation
// (Powell, Computer Journal 9 (1967)). Newton's divided differences.
func interpolate(f func(*big.Float) *big.Float, centre, low, high float64, degree int) []*big.Float {
	nodes := chebyshevNodes(degree + 1)
	middle, half := number((low+high)/2), number((high-low)/2)
	differences := make([]*big.Float, len(nodes))
	for i := range nodes {
		nodes[i] = add(middle, mul(half, nodes[i]))
		differences[i] = f(add(number(centre), nodes[i]))
	}
	for step := 1; step < len(nodes); step++ {
		for i := len(nodes) - 1; i >= step; i-- {
			differences[i] = quo(sub(differences[i], differences[i-1]), sub(nodes[i], nodes[i-step]))
		}
	}
	coefficients := make([]*big.Float, len(nodes))
	for i := range coefficients {
		coefficients[i] = zero()
	}
	// Horner over the Newton form: multiply by (t - node) and add.
	for i := len(nodes) - 1; i >= 0; i-- {
		for j := len(coefficients) - 1; j > 0; j-- {
			coefficients[j] = sub(coefficients[j-1], mul(coefficients[j], nodes[i]))
		}
		coefficients[0] = sub(differences[i], mul(coefficients[0], nodes[i]))
	}
	return coefficients
}

// chebyshevNodes returns cos((i+1/2) pi/n) for i = 0 ... n-1.
func chebyshevNodes(n int) []*big.Float {
	nodes := make([]*big.Float, n)
	for i := range nodes {
		angle := quo(mul(circle, number(float64(2*i+1))), number(float64(2*n)))
		square := zero().Neg(mul(angle, angle))
		nodes[i] = series(square, number(1), func(k int) (float64, float64) {
			return 1, float64((2*k - 1) * (2 * k))
		})
	}
	return nodes
}
