package column

import (
	"math"
	"math/big"
)

// The reference values of the accuracy tests: plain series and Newton steps in
// big floating-point numbers of referenceBits. They share nothing with the
// tables' generator.

// referenceBits leaves 60 correct bits in every result below, cancellations
// included; sines of great arguments take their own precision.
const referenceBits = 256

func bigOf(x float64) *big.Float { return bigNew().SetFloat64(x) }
func bigNew() *big.Float         { return new(big.Float).SetPrec(referenceBits) }

func bigAdd(x, y *big.Float) *big.Float { return bigNew().Add(x, y) }
func bigSub(x, y *big.Float) *big.Float { return bigNew().Sub(x, y) }
func bigMul(x, y *big.Float) *big.Float { return bigNew().Mul(x, y) }
func bigQuo(x, y *big.Float) *big.Float { return bigNew().Quo(x, y) }
func bigHalf(x *big.Float) *big.Float   { return bigNew().SetMantExp(x, -1) }

// bigIsSmall says whether a term is below 2^-240 of the sum.
func bigIsSmall(term, sum *big.Float) bool {
	return term.Sign() == 0 || sum.Sign() != 0 && term.MantExp(nil) < sum.MantExp(nil)-240
}

// referencePi has 1400 bits, from Machin's formula
// pi = 16 atan(1/5) - 4 atan(1/239).
var referencePi = func() *big.Float {
	const bits = 1400
	arcTangent := func(n int64) *big.Int {
		power := new(big.Int).Quo(new(big.Int).Lsh(big.NewInt(1), bits+32), big.NewInt(n))
		sum := new(big.Int).Set(power)
		for k := int64(1); power.Sign() != 0; k++ {
			power.Quo(power, big.NewInt(-n*n))
			sum.Add(sum, new(big.Int).Quo(power, big.NewInt(2*k+1)))
		}
		return sum
	}
	pi := new(big.Int).Mul(big.NewInt(16), arcTangent(5))
	pi.Sub(pi, new(big.Int).Mul(big.NewInt(4), arcTangent(239)))
	result := new(big.Float).SetPrec(bits).SetInt(pi)
	return result.SetMantExp(result, -(bits + 32))
}()

var referenceHalfPi = bigHalf(bigNew().Set(referencePi))

var referenceLn2 = func() *big.Float {
	// 2 artanh(1/3).
	sum, power := bigQuo(bigOf(1), bigOf(3)), bigQuo(bigOf(1), bigOf(3))
	for n := 3.0; ; n += 2 {
		power = bigQuo(power, bigOf(9))
		term := bigQuo(power, bigOf(n))
		if bigIsSmall(term, sum) {
			return bigAdd(sum, sum)
		}
		sum = bigAdd(sum, term)
	}
}()

// referenceExpBig reduces by ln 2 and by 2^8, sums Taylor's series, squares.
func referenceExpBig(x *big.Float) *big.Float {
	const halvings = 8
	approximate, _ := x.Float64()
	n := int(math.Round(approximate / math.Ln2))
	r := bigSub(x, bigMul(bigOf(float64(n)), referenceLn2))
	r.SetMantExp(r, -halvings)
	sum, term := bigAdd(bigOf(1), r), bigNew().Set(r)
	for k := 2.0; !bigIsSmall(term, sum); k++ {
		term = bigQuo(bigMul(term, r), bigOf(k))
		sum = bigAdd(sum, term)
	}
	for range halvings {
		sum = bigMul(sum, sum)
	}
	return sum.SetMantExp(sum, n)
}

// referenceLnBig corrects the library's logarithm y by ln(1+d) with
// d = x exp(-y) - 1, which is of the order 2^-43.
func referenceLnBig(x *big.Float) *big.Float {
	fraction := bigNew()
	exponent := x.MantExp(fraction)
	approximate, _ := fraction.Float64()
	if approximate < math.Sqrt2/2 {
		fraction.SetMantExp(fraction, 1)
		approximate *= 2
		exponent--
	}
	y := math.Log(approximate)
	d := bigSub(bigMul(fraction, referenceExpBig(bigOf(-y))), bigOf(1))
	correction, power := bigNew().Set(d), bigNew().Set(d)
	for k := 2.0; k <= 6; k++ {
		power = bigMul(power, d)
		power.Neg(power)
		correction = bigAdd(correction, bigQuo(power, bigOf(k)))
	}
	sum := bigAdd(bigOf(y), correction)
	return bigAdd(sum, bigMul(bigOf(float64(exponent)), referenceLn2))
}

// referenceSinCosBig returns the sine and cosine of x.
func referenceSinCosBig(x *big.Float) (sine, cosine *big.Float) {
	wide := func() *big.Float { return new(big.Float).SetPrec(1400) }
	halfPi := wide().SetMantExp(referencePi, -1)
	quotient := wide().Quo(wide().Set(x), halfPi)
	quotient.Add(quotient, wide().SetFloat64(math.Copysign(0.5, float64(x.Sign()))))
	n, _ := quotient.Int(nil) // towards 0
	r := bigNew().Set(wide().Sub(wide().Set(x), wide().Mul(wide().SetInt(n), halfPi)))
	square := bigMul(r, r)
	square.Neg(square)
	sine, cosine = bigNew().Set(r), bigOf(1)
	sineTerm, cosineTerm := bigNew().Set(r), bigOf(1)
	for k := 1.0; !bigIsSmall(sineTerm, sine) || !bigIsSmall(cosineTerm, cosine); k++ {
		cosineTerm = bigQuo(bigMul(cosineTerm, square), bigOf((2*k-1)*(2*k)))
		sineTerm = bigQuo(bigMul(sineTerm, square), bigOf((2*k)*(2*k+1)))
		cosine, sine = bigAdd(cosine, cosineTerm), bigAdd(sine, sineTerm)
	}
	switch new(big.Int).And(n, big.NewInt(3)).Int64() {
	case 1:
		sine, cosine = cosine, sine.Neg(sine)
	case 2:
		sine.Neg(sine)
		cosine.Neg(cosine)
	case 3:
		sine, cosine = cosine.Neg(cosine), sine
	}
	return sine, cosine
}

// referenceAtanBig returns atan(y/x) for x > 0: the library's value a, and the
// series of the small rest atan((y cos a - x sin a)/(x cos a + y sin a)).
func referenceAtanBig(y, x *big.Float) *big.Float {
	approximate, _ := bigQuo(y, x).Float64()
	a := math.Atan(approximate)
	sine, cosine := referenceSinCosBig(bigOf(a))
	t := bigQuo(bigSub(bigMul(y, cosine), bigMul(x, sine)), bigAdd(bigMul(x, cosine), bigMul(y, sine)))
	square := bigMul(t, t)
	cube := bigMul(square, t)
	t = bigSub(t, bigQuo(cube, bigOf(3)))
	t = bigAdd(t, bigQuo(bigMul(cube, square), bigOf(5)))
	return bigAdd(bigOf(a), t)
}

// referenceErfSeries returns erf x exp(x^2) sqrt(pi)/2 = sum over n of
// 2^n x^(2n+1)/(1 3 5 ... (2n+1)) (Abramowitz and Stegun 7.1.6).
func referenceErfSeries(x *big.Float) *big.Float {
	double := bigMul(x, x)
	double.Add(double, double)
	sum, term := bigNew().Set(x), bigNew().Set(x)
	for n := 1.0; !bigIsSmall(term, sum); n++ {
		term = bigQuo(bigMul(term, double), bigOf(2*n+1))
		sum = bigAdd(sum, term)
	}
	return sum
}

var referenceRootPi = bigNew().Sqrt(referencePi)

func referenceErfBig(x *big.Float) *big.Float {
	negativeSquare := bigMul(x, x)
	negativeSquare.Neg(negativeSquare)
	sum := bigMul(referenceErfSeries(x), referenceExpBig(negativeSquare))
	return bigQuo(bigAdd(sum, sum), referenceRootPi)
}

// referenceErfcBig uses 1 - erf x below 6, and above 6 the continued fraction
// sqrt(pi) exp(x^2) erfc x = 1/(x + (1/2)/(x + 1/(x + (3/2)/(x + ...
// (Abramowitz and Stegun 7.1.14), whose n terms leave about exp(-2 x sqrt(2n)).
func referenceErfcBig(x *big.Float) *big.Float {
	if value, _ := x.Float64(); value < 6 {
		return bigSub(bigOf(1), referenceErfBig(x))
	}
	fraction := bigNew().Set(x)
	for n := 50.0; n > 0; n-- {
		fraction = bigAdd(x, bigQuo(bigOf(n/2), fraction))
	}
	negativeSquare := bigMul(x, x)
	negativeSquare.Neg(negativeSquare)
	return bigQuo(referenceExpBig(negativeSquare), bigMul(fraction, referenceRootPi))
}

// referenceCubeRootBig takes two of Newton's steps from the library's value.
func referenceCubeRootBig(x *big.Float) *big.Float {
	fraction := bigNew()
	exponent := x.MantExp(fraction)
	third := exponent / 3
	fraction.SetMantExp(fraction, exponent-3*third)
	approximate, _ := fraction.Float64()
	root := bigOf(math.Cbrt(approximate))
	for range 2 {
		root = bigQuo(bigAdd(bigAdd(root, root), bigQuo(fraction, bigMul(root, root))), bigOf(3))
	}
	return root.SetMantExp(root, third)
}

// unitsInLastPlace returns |computed - exact| in units of the last place of a
// number of exact's magnitude, at least the least subnormal number. Infinity
// is right where the exact value rounds to it, and else stands for 2^1024.
func unitsInLastPlace(computed float64, exact *big.Float) float64 {
	if math.IsNaN(computed) {
		return math.Inf(1)
	}
	nearest, _ := exact.Float64()
	if math.IsInf(nearest, 0) && nearest == computed {
		return 0
	}
	value := bigNew()
	if math.IsInf(computed, 0) {
		value.SetMantExp(bigOf(math.Copysign(1, computed)), 1024)
	} else {
		value.SetFloat64(computed)
	}
	exponent := -1074
	if exact.Sign() != 0 {
		exponent = min(max(exponent, exact.MantExp(nil)-53), 1023-52)
	}
	difference := bigSub(value, exact)
	units, _ := difference.SetMantExp(difference, -exponent).Float64()
	return math.Abs(units)
}
