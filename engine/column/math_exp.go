package column

import "math"

// expEntry is one row of expTable: the bits of 2^(j/128) and the rest of the
// power as a fraction of it.
type expEntry struct {
	bits uint64
	rest float64
}

const (
	// expShift rounds a number below 2^51 to an integer when it is added, and
	// leaves the integer in the low bits of the sum.
	expShift = 0x1.8p52
	// expUsual bounds the arguments whose exponential is so far above the
	// subnormal numbers that the products on the way to it keep their precision.
	expUsual = 704
	// expOverflow and expUnderflow lie just beyond ln of the greatest number
	// and ln of half the least one.
	expOverflow  = 709.79
	expUnderflow = -745.14
)

// expNumbers are the constants of Exp. Where the machine code must build a
// constant anew at each use, as in the module, loops load them once from here.
var expNumbers = [...]float64{expSteps, expShift, expStepHigh, expStepLow, 0.5, 1.0 / 6, 1.0 / 24, 1.0 / 120}

// expReduce writes x as n ln2/128 + r with |r| <= ln2/256 and returns n, as a
// two's complement number in the low bits, and r with an error below 2^-61.
func expReduce(x float64) (n uint64, r float64) {
	return expReduceBy(x, expSteps, expShift, expStepHigh, expStepLow)
}

func expReduceBy(x, steps, shift, high, low float64) (n uint64, r float64) {
	shifted := float64(x*steps) + shift
	multiple := shifted - shift
	return math.Float64bits(shifted), (x - float64(multiple*high)) - float64(multiple*low)
}

// expRemainder returns exp(r) - 1 for |r| <= ln2/256 from the Taylor
// polynomial of degree 5; the next term is below 2^-60.
func expRemainder(r float64) float64 {
	return expRemainderBy(r, 0.5, 1.0/6, 1.0/24, 1.0/120)
}

func expRemainderBy(r, c2, c3, c4, c5 float64) float64 {
	square := float64(r * r)
	return r + float64(square*((c2+float64(r*c3))+float64(square*(c4+float64(r*c5)))))
}

// expAssemble returns 2^(n/128) (1+remainder) where the result is normal.
func expAssemble(n uint64, remainder float64) float64 {
	entry := &expTable[n&127]
	power := math.Float64frombits(entry.bits + (n&^127)<<45)
	return power + float64(power*(entry.rest+remainder))
}

// Exp returns e to the power x, within 0.52 units in the last place:
// Tang's table-driven method (ACM Transactions on Mathematical Software 15
// (1989)) with 128 entries. Beyond the range the result is +Inf or 0;
// Exp(NaN) is NaN.
func Exp(x float64) float64 {
	if !(math.Abs(x) <= expUsual) {
		return expSpecial(x)
	}
	n, r := expReduce(x)
	return expAssemble(n, expRemainder(r))
}

// ExpColumn sets dst[i] = Exp(src[i]) over the shorter length; dst may be src.
func ExpColumn(dst, src []float64) { ExpScaledColumn(dst, src, 1) }

// ExpScaledColumn sets dst[i] = scale*Exp(src[i]) over the shorter length; dst
// may be src. It says whether all arguments were so small that every
// exponential is a normal number, which also says that all were finite.
func ExpScaledColumn(dst, src []float64, scale float64) (usual bool) {
	n := min(len(dst), len(src))
	dst, src = dst[:n], src[:n]
	usual = true
	var steps, shift, high, low, c2, c3, c4, c5 float64 = expSteps, expShift, expStepHigh, expStepLow, 0.5, 1.0 / 6, 1.0 / 24, 1.0 / 120
	if inModule {
		k := &expNumbers
		steps, shift, high, low, c2, c3, c4, c5 = k[0], k[1], k[2], k[3], k[4], k[5], k[6], k[7]
	}
	const sign = 1 << 63
	limit := math.Float64bits(expUsual)
	for len(dst) >= 4 && len(src) >= 4 {
		d, s := (*[4]float64)(dst), (*[4]float64)(src)
		x0, x1, x2, x3 := s[0], s[1], s[2], s[3]
		// The sign bit of a difference tells a size above the limit.
		far := (limit - math.Float64bits(x0)&^sign) | (limit - math.Float64bits(x1)&^sign) |
			(limit - math.Float64bits(x2)&^sign) | (limit - math.Float64bits(x3)&^sign)
		if int64(far) >= 0 {
			n0, r0 := expReduceBy(x0, steps, shift, high, low)
			n1, r1 := expReduceBy(x1, steps, shift, high, low)
			n2, r2 := expReduceBy(x2, steps, shift, high, low)
			n3, r3 := expReduceBy(x3, steps, shift, high, low)
			d[0] = float64(scale * expAssemble(n0, expRemainderBy(r0, c2, c3, c4, c5)))
			d[1] = float64(scale * expAssemble(n1, expRemainderBy(r1, c2, c3, c4, c5)))
			d[2] = float64(scale * expAssemble(n2, expRemainderBy(r2, c2, c3, c4, c5)))
			d[3] = float64(scale * expAssemble(n3, expRemainderBy(r3, c2, c3, c4, c5)))
		} else {
			usual = false
			d[0], d[1], d[2], d[3] = float64(scale*Exp(x0)), float64(scale*Exp(x1)), float64(scale*Exp(x2)), float64(scale*Exp(x3))
		}
		dst, src = dst[4:], src[4:]
	}
	for i, x := range src {
		usual = usual && math.Abs(x) <= expUsual
		dst[i] = float64(scale * Exp(x))
	}
	return usual
}

// expSpecial is Exp for arguments whose result may not be a normal number.
func expSpecial(x float64) float64 {
	switch {
	case math.IsNaN(x):
		return x
	case x > expOverflow:
		return math.Inf(1)
	case x < expUnderflow:
		return 0
	}
	high, low, n := expParts(x, 0)
	return scaleSum(high, low, n)
}

// expParts returns exp(x+tail) as (high+low) 2^n with 1 <= high <= 2 and a
// relative error below 2^-59, for |x| below 1000 and a tail within a rounding
// of x.
func expParts(x, tail float64) (high, low float64, n int) {
	steps, r := expReduce(x)
	entry := &expTable[steps&127]
	power := math.Float64frombits(entry.bits)
	high, low = fastTwoSum(power, float64(power*(entry.rest+expRemainder(r+tail))))
	return high, low, int(int32(uint32(steps))) >> 7
}

// Expm1 returns exp(x) - 1 without cancellation near 0: Tang's method (ACM
// Transactions on Mathematical Software 18 (1992)), a Taylor polynomial for
// |x| < 1/32 and the table of Exp elsewhere.
func Expm1(x float64) float64 {
	switch {
	case x == 0 || math.IsNaN(x):
		return x
	case x > expOverflow:
		return math.Inf(1)
	case x < -40:
		return -1
	case math.Abs(x) < 1.0/32:
		p := 1.0/40320 + float64(x*(1.0/362880))
		p = 1.0/5040 + float64(x*p)
		p = 1.0/720 + float64(x*p)
		p = 1.0/120 + float64(x*p)
		p = 1.0/24 + float64(x*p)
		p = 1.0/6 + float64(x*p)
		p = 0.5 + float64(x*p)
		return x + float64(float64(x*x)*p)
	}
	high, low, n := expParts(x, 0)
	if n > 64 {
		return scaleSum(high, low, n)
	}
	factor := powerOfTwo(n)
	sum, rest := twoSum(float64(high*factor), -1)
	return sum + (rest + float64(low*factor))
}
