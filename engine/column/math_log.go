package column

import "math"

// lnEntry is one row of lnTable: a reciprocal 1/c of at most nine bits, and
// ln c in two parts.
type lnEntry struct{ reciprocal, high, low float64 }

const (
	bitsLeastNormal = 0x0010000000000000
	bitsInfinity    = 0x7ff0000000000000
	bitsExponent    = 0xfff << 52
	// bitsUpper keeps 26 bits of a number's 53.
	bitsUpper = ^uint64(1<<27 - 1)
)

// lnReduce writes the positive normal number of the given bits as 2^m c (1+r)
// with c of the entry of lnTable and |r| < 2^-7. The reciprocal is so short
// that its products with the two halves of the argument are exact, as is r
// near 1, where c is 1.
func lnReduce(bits uint64) (r, m float64, entry *lnEntry) {
	offset := bits - lnFirst
	entry = &lnTable[offset>>45&127]
	bits -= offset & bitsExponent
	upper := math.Float64frombits(bits & bitsUpper)
	lower := math.Float64frombits(bits) - upper
	r = (float64(upper*entry.reciprocal) - 1) + float64(lower*entry.reciprocal)
	return r, float64(int64(offset) >> 52), entry
}

// lnAssemble returns leading + rest + ln(1+r) from the Taylor polynomial of
// degree 7.
func lnAssemble(r, leading, rest float64) float64 {
	sum := leading + r
	rest += r - (sum - leading)
	square := float64(r * r)
	p := (1.0/4 - float64(r*(1.0/5))) + float64(square*(1.0/6-float64(r*(1.0/7))))
	p = (0.5 - float64(r*(1.0/3))) + float64(square*p)
	return sum + (rest - float64(square*p))
}

// Ln returns the natural logarithm of x, within 0.53 units in the last place:
// Tang's table-driven method (ACM Transactions on Mathematical Software 16
// (1990)) with 128 entries, in the form that multiplies by a short reciprocal
// in place of a division. Ln(0) is -Inf; of a negative number NaN.
func Ln(x float64) float64 {
	bits := math.Float64bits(x)
	if bits-bitsLeastNormal >= bitsInfinity-bitsLeastNormal {
		return lnSpecial(x)
	}
	r, m, entry := lnReduce(bits)
	return lnAssemble(r, float64(m*ln2High)+entry.high, float64(m*ln2Low)+entry.low)
}

// LnColumn sets dst[i] = Ln(src[i]) over the shorter length; dst may be src.
func LnColumn(dst, src []float64) {
	n := min(len(dst), len(src))
	dst, src = dst[:n], src[:n]
	for i, x := range src {
		bits := math.Float64bits(x)
		if bits-bitsLeastNormal >= bitsInfinity-bitsLeastNormal {
			dst[i] = lnSpecial(x)
			continue
		}
		r, m, entry := lnReduce(bits)
		dst[i] = lnAssemble(r, float64(m*ln2High)+entry.high, float64(m*ln2Low)+entry.low)
	}
}

// lnSpecial is Ln for arguments that are not positive normal numbers.
func lnSpecial(x float64) float64 {
	switch {
	case x == 0:
		return math.Inf(-1)
	case x < 0:
		return math.NaN()
	case x < 0x1p-1022:
		r, m, entry := lnReduce(math.Float64bits(float64(x * 0x1p54)))
		m -= 54
		return lnAssemble(r, float64(m*ln2High)+entry.high, float64(m*ln2Low)+entry.low)
	}
	return x // +Inf or NaN
}

// lnExtended returns the natural logarithm of the positive normal number of
// the given bits times 2^scale, in two parts with a relative error below
// 2^-67: the method of Ln with the square of r kept to double length and two
// more terms.
func lnExtended(bits uint64, scale float64) (high, low float64) {
	offset := bits - lnFirst
	entry := &lnTable[offset>>45&127]
	m := float64(int64(offset)>>52) + scale
	bits -= offset & bitsExponent
	upper := math.Float64frombits(bits & bitsUpper)
	lower := float64((math.Float64frombits(bits) - upper) * entry.reciprocal)
	upper = float64(upper*entry.reciprocal) - 1
	r := upper + lower
	tail := (upper - r) + lower
	leading := float64(m*ln2High) + entry.high
	sum, rest := fastTwoSum(leading, r)
	square, squareRest := twoProduct(r, r)
	p := 1.0/8 - float64(r*(1.0/9))
	p = 1.0/7 - float64(r*p)
	p = 1.0/6 - float64(r*p)
	p = 1.0/5 - float64(r*p)
	p = 1.0/4 - float64(r*p)
	p = 1.0/3 - float64(r*p)
	sum, sumRest := fastTwoSum(sum, float64(-0.5*square))
	rest = (rest + (float64(m*ln2Low) + entry.low)) + sumRest
	rest += (tail - float64(tail*r)) - float64(0.5*squareRest)
	return fastTwoSum(sum, rest+float64(float64(r*square)*p))
}

// Log1p returns ln(1+x) without cancellation near 0. The rounding error of
// 1+x enters as a correction to first order.
func Log1p(x float64) float64 {
	switch {
	case x == 0 || math.IsNaN(x) || math.IsInf(x, 1):
		return x
	case x < -1:
		return math.NaN()
	case x == -1:
		return math.Inf(-1)
	case x >= -0x1p-9 && x < 0x1p-8:
		return lnAssemble(x, 0, 0)
	}
	sum, missing := twoSum(1, x)
	r, m, entry := lnReduce(math.Float64bits(sum))
	return lnAssemble(r, float64(m*ln2High)+entry.high, (float64(m*ln2Low)+entry.low)+missing/sum)
}

// Log10 returns the decimal logarithm of x: the natural one in double length
// times 1/ln 10 in double length, so that powers of ten give whole numbers.
// Special values as for Ln.
func Log10(x float64) float64 {
	bits, scale := math.Float64bits(x), 0.0
	if bits-bitsLeastNormal >= bitsInfinity-bitsLeastNormal {
		if !(x > 0 && x < 1) {
			return lnSpecial(x)
		}
		bits, scale = math.Float64bits(float64(x*0x1p54)), -54
	}
	high, low := lnExtended(bits, scale)
	product, rest := twoProduct(high, log10EHigh)
	return product + (rest + (float64(high*log10ELow) + float64(low*log10EHigh)))
}
