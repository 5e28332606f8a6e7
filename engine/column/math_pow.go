package column

import "math"

// Bit patterns of 2^-65 and 2^63. A smaller exponent gives a power that rounds
// to 1, a greater one a power that is 1 or out of range.
const (
	bitsLeastPower    = 0x3be0000000000000
	bitsGreatestPower = 0x43e0000000000000
)

// Pow returns x to the power y, within 0.55 units in the last place: the
// logarithm of x in double length, its product with y in double length, and
// the exponential of both parts (the scheme of Tang's methods, with Dekker's
// products). The exponents 1, 2, -1 and 1/2 are one rounded operation.
// Special values as in ISO C annex F.10.4.4: Pow(x, 0) and Pow(1, y) are 1,
// a negative x with an exponent that is not whole gives NaN.
func Pow(x, y float64) float64 {
	switch y {
	case 1:
		return x
	case 2:
		return float64(x * x)
	case -1:
		return 1 / x
	case 0.5:
		if x > 0 {
			return math.Sqrt(x)
		}
	}
	bits := math.Float64bits(x)
	if bits-bitsLeastNormal >= bitsInfinity-bitsLeastNormal ||
		math.Float64bits(math.Abs(y))-bitsLeastPower >= bitsGreatestPower-bitsLeastPower {
		return powSpecial(x, y)
	}
	return powPositive(bits, 0, y)
}

// PowColumn sets dst[i] = Pow(x[i], y[i]) over the shortest length; dst may be
// x or y.
func PowColumn(dst, x, y []float64) {
	n := min(len(dst), len(x), len(y))
	dst, x, y = dst[:n], x[:n], y[:n]
	for i := range dst {
		dst[i] = Pow(x[i], y[i])
	}
}

// PowColumnNumber sets dst[i] = Pow(x[i], y) over the shorter length; dst may
// be x.
func PowColumnNumber(dst, x []float64, y float64) {
	n := min(len(dst), len(x))
	dst, x = dst[:n], x[:n]
	switch y {
	case 1:
		copy(dst, x)
	case 2:
		for i, value := range x {
			dst[i] = float64(value * value)
		}
	case -1:
		for i, value := range x {
			dst[i] = 1 / value
		}
	default:
		for i, value := range x {
			dst[i] = Pow(value, y)
		}
	}
}

// powPositive is Pow for the positive normal number of the given bits times
// 2^scale and an exponent of usual magnitude.
func powPositive(bits uint64, scale, y float64) float64 {
	lnHigh, lnLow := lnExtended(bits, scale)
	high, low := twoProduct(y, lnHigh)
	low += float64(y * lnLow)
	if math.Abs(high) <= expUsual {
		n, r := expReduce(high)
		return expAssemble(n, expRemainder(r+low))
	}
	switch {
	case high > expOverflow:
		return math.Inf(1)
	case high < expUnderflow:
		return 0
	}
	power, rest, n := expParts(high, low)
	return scaleSum(power, rest, n)
}

// powSpecial is Pow where x is not a positive normal number, or y is not of
// usual magnitude.
func powSpecial(x, y float64) float64 {
	switch {
	case y == 0 || x == 1:
		return 1
	case math.IsNaN(x) || math.IsNaN(y):
		return math.NaN()
	case math.IsInf(y, 0):
		switch size := math.Abs(x); {
		case size == 1:
			return 1
		case size > 1 == (y > 0):
			return math.Inf(1)
		}
		return 0
	}
	whole, odd := wholeness(y)
	sign := 1.0
	if odd && math.Signbit(x) {
		sign = -1
	}
	switch size := math.Abs(x); {
	case size == 0 || math.IsInf(x, 0):
		if size == 0 == (y > 0) {
			return math.Copysign(0, sign)
		}
		return math.Inf(int(sign))
	case x < 0 && !whole:
		return math.NaN()
	case size == 1 || math.Abs(y) < 0x1p-65:
		return sign
	case math.Abs(y) >= 0x1p63:
		if size > 1 == (y > 0) {
			return math.Inf(1) // so great a y is even
		}
		return 0
	case size < 0x1p-1022:
		return float64(sign * powPositive(math.Float64bits(float64(size*0x1p54)), -54, y))
	default:
		return float64(sign * powPositive(math.Float64bits(size), 0, y))
	}
}

// wholeness says whether a finite y is a whole number, and an odd one.
func wholeness(y float64) (whole, odd bool) {
	if math.Abs(y) >= 0x1p53 {
		return true, false
	}
	whole = math.Trunc(y) == y
	half := float64(0.5 * y)
	return whole, whole && math.Trunc(half) != half
}
