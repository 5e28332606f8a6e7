package column

import (
	"flag"
	"math"
	"math/big"
	"math/rand/v2"
	"testing"
)

var accuracyCount = flag.Int("accuracy.count", 10_000, "random arguments for each function of the accuracy tests")

// argumentRange draws arguments from low to high: evenly, or evenly in the
// exponent, with both signs if asked.
type argumentRange struct {
	low, high   float64
	logarithmic bool
	bothSigns   bool
}

// draw uses exactly rounded operations only, so that it gives the same
// arguments on every platform.
func (r argumentRange) draw(random *rand.Rand) float64 {
	var x float64
	if r.logarithmic {
		low, high := math.Float64bits(r.low), math.Float64bits(r.high)
		x = math.Float64frombits(low + random.Uint64N(high-low))
	} else {
		x = r.low + float64((r.high-r.low)*random.Float64())
	}
	if r.bothSigns && random.Uint64()&1 == 1 {
		x = -x
	}
	return x
}

// elementaryFunction is a function of one argument under test.
type elementaryFunction struct {
	name      string
	scalar    func(float64) float64
	column    func(dst, src []float64)
	reference func(x *big.Float) *big.Float
	ranges    []argumentRange
	// edges are arguments where the method changes; the tests take their
	// neighbours too.
	edges []float64
}

const (
	leastNumber = math.SmallestNonzeroFloat64
	leastNormal = 0x1p-1022
	halfLn2     = math.Ln2 / 256
)

// hardAngles: nearest to multiples of pi/2 are 6381956970095103 2^797 and
// 5419351 / 1725033 pi's convergents (Muller, Elementary Functions, section on
// worst cases of range reduction).
var hardAngles = []float64{
	0x1p-27, math.Pi / 4, math.Pi / 2, math.Pi, 3 * math.Pi / 2, 2 * math.Pi, 22, 355, 103993, 5419351.0 / 2,
	1e6, 1e5 * math.Pi, 3e5 * math.Pi, 1e22, 0x1p52, 0x1p53, 0x1p60, 0x1p120, 0x1p1000, math.MaxFloat64,
	6381956970095103 * 0x1p797,
}

var angleRanges = []argumentRange{
	{low: 0, high: math.Pi / 4, bothSigns: true}, {low: 0, high: 20, bothSigns: true},
	{low: 0, high: 1e6, bothSigns: true}, {low: 1e-9, high: math.MaxFloat64, logarithmic: true, bothSigns: true},
}

var positiveRanges = []argumentRange{
	{low: 0.5, high: 2}, {low: 0.99, high: 1.01}, {low: 0, high: 1000},
	{low: leastNumber, high: math.MaxFloat64, logarithmic: true},
	{low: leastNumber, high: leastNormal, logarithmic: true},
}

var logarithmEdges = []float64{
	leastNumber, leastNormal, math.MaxFloat64, 0.5, 0.6875, 0.69140625, 1 - 0x1p-9, 1 + 0x1p-8, 1 - 3*0x1p-9, 1 + 3*0x1p-8,
	1, 1.37, 1.375, 1.3828125, math.Sqrt2, 2, 10, 100, 1e22, 0.1, 1e-5, 1e300, math.E,
}

func referenceSin(x *big.Float) *big.Float { sine, _ := referenceSinCosBig(x); return sine }
func referenceCos(x *big.Float) *big.Float { _, cosine := referenceSinCosBig(x); return cosine }

func referenceTan(x *big.Float) *big.Float {
	sine, cosine := referenceSinCosBig(x)
	return bigQuo(sine, cosine)
}

// referenceExpm1 is 2 exp(x/2) sinh(x/2).
func referenceExpm1(x *big.Float) *big.Float {
	half := bigHalf(x)
	product := bigMul(referenceExpBig(half), referenceSinh(half))
	return bigAdd(product, product)
}

// referenceSinh takes the series below 1, where the exponentials cancel.
func referenceSinh(x *big.Float) *big.Float {
	if x.MantExp(nil) > 0 {
		up := referenceExpBig(x)
		return bigHalf(bigSub(up, bigQuo(bigOf(1), up)))
	}
	square, sum, term := bigMul(x, x), bigNew().Set(x), bigNew().Set(x)
	for k := 1.0; !bigIsSmall(term, sum); k++ {
		term = bigQuo(bigMul(term, square), bigOf(2*k*(2*k+1)))
		sum = bigAdd(sum, term)
	}
	return sum
}

func referenceCosh(x *big.Float) *big.Float {
	up := referenceExpBig(x)
	return bigHalf(bigAdd(up, bigQuo(bigOf(1), up)))
}

func referenceTanh(x *big.Float) *big.Float { return bigQuo(referenceSinh(x), referenceCosh(x)) }

// referenceLog1p: 1+x needs no more than 1100 bits, but below 2^-60 the series
// is shorter.
func referenceLog1p(x *big.Float) *big.Float {
	if x.MantExp(nil) < -60 {
		square := bigMul(x, x)
		sum := bigSub(x, bigHalf(square))
		return bigAdd(sum, bigQuo(bigMul(square, x), bigOf(3)))
	}
	return referenceLnBig(bigAdd(bigOf(1), x))
}

func referenceAsin(x *big.Float) *big.Float {
	cosine := bigNew().Sqrt(bigMul(bigSub(bigOf(1), x), bigAdd(bigOf(1), x)))
	if cosine.Sign() == 0 {
		return bigMul(x, referenceHalfPi)
	}
	return referenceAtanBig(x, cosine)
}

func referenceAcos(x *big.Float) *big.Float {
	if bigAdd(bigOf(1), x).Sign() == 0 {
		return bigAdd(referenceHalfPi, referenceHalfPi)
	}
	half := referenceAtanBig(bigNew().Sqrt(bigSub(bigOf(1), x)), bigNew().Sqrt(bigAdd(bigOf(1), x)))
	return bigAdd(half, half)
}

var elementaryFunctions = []elementaryFunction{
	{"Exp", Exp, ExpColumn, referenceExpBig,
		[]argumentRange{{low: -745.2, high: 709.79}, {low: -1, high: 1}, {low: -745.2, high: -708}, {low: 1e-20, high: 700, logarithmic: true, bothSigns: true}},
		[]float64{709.782712893384, -745.1332191019412, -708.3964185322641, 704, -704, halfLn2, -halfLn2, 3 * halfLn2, 1e-300, leastNumber}},
	{"Expm1", Expm1, Expm1Column, referenceExpm1,
		[]argumentRange{{low: -45, high: 709.79}, {low: -1, high: 1}, {low: -0.04, high: 0.04}, {low: leastNumber, high: 700, logarithmic: true, bothSigns: true}},
		[]float64{1.0 / 32, -1.0 / 32, 709.782712893384, -40, 45, halfLn2, -halfLn2, leastNumber, leastNormal}},
	{"Ln", Ln, LnColumn, referenceLnBig, positiveRanges, logarithmEdges},
	{"Log1p", Log1p, Log1pColumn, referenceLog1p,
		[]argumentRange{{low: -0.9999, high: 1}, {low: -0.01, high: 0.01}, {low: leastNumber, high: math.MaxFloat64, logarithmic: true}, {low: leastNumber, high: 0.9999, logarithmic: true, bothSigns: true}},
		[]float64{-0x1p-9, 0x1p-8, -0.5, 1, 0x1p52, 0x1p53, 0x1p60, 0x1p1000, math.MaxFloat64, leastNumber, -1 + 0x1p-50}},
	{"Log10", Log10, Log10Column, func(x *big.Float) *big.Float { return bigQuo(referenceLnBig(x), referenceLnBig(bigOf(10))) }, positiveRanges, logarithmEdges},
	{"Sin", Sin, SinColumn, referenceSin, angleRanges, hardAngles},
	{"Cos", Cos, CosColumn, referenceCos, angleRanges, hardAngles},
	{"Tan", Tan, TanColumn, referenceTan, angleRanges, hardAngles},
	{"Asin", Asin, AsinColumn, referenceAsin,
		[]argumentRange{{low: -1, high: 1}, {low: 0.4, high: 0.6, bothSigns: true}, {low: 1e-10, high: 1, logarithmic: true, bothSigns: true}},
		[]float64{0.5, 0x1p-27, 1 - 0x1p-50, leastNumber, leastNormal}},
	{"Acos", Acos, AcosColumn, referenceAcos,
		[]argumentRange{{low: -1, high: 1}, {low: 0.4, high: 0.6, bothSigns: true}, {low: 0.999, high: 1, bothSigns: true}, {low: 1e-10, high: 1, logarithmic: true, bothSigns: true}},
		[]float64{0.5, -0.5, 0x1p-27, 1 - 0x1p-50, -1 + 0x1p-50, leastNumber}},
	{"Atan", Atan, AtanColumn, func(x *big.Float) *big.Float { return referenceAtanBig(x, bigOf(1)) },
		[]argumentRange{{low: -2, high: 2}, {low: 0.05, high: 0.08}, {low: -100, high: 100}, {low: 1e-12, high: 1e25, logarithmic: true, bothSigns: true}},
		[]float64{1.0 / 16, 1, 9.0 / 128, 16, 127.0 / 128, 0x1p-27, 0x1p60, 1e300, leastNumber, leastNormal}},
	{"Sinh", Sinh, SinhColumn, referenceSinh,
		[]argumentRange{{low: -711, high: 711}, {low: -1, high: 1}, {low: 0, high: 25}, {low: leastNumber, high: 700, logarithmic: true, bothSigns: true}},
		[]float64{0.25, 22, 710.4758600739439, leastNumber, leastNormal}},
	{"Cosh", Cosh, CoshColumn, referenceCosh,
		[]argumentRange{{low: -711, high: 711}, {low: -1, high: 1}, {low: 0, high: 25}},
		[]float64{0.25, 22, 710.4758600739439, leastNumber}},
	{"Tanh", Tanh, TanhColumn, referenceTanh,
		[]argumentRange{{low: -1, high: 1}, {low: -25, high: 25}, {low: leastNumber, high: 25, logarithmic: true, bothSigns: true}},
		[]float64{0.25, 22, 0x1p-28, leastNumber, leastNormal}},
	{"Cbrt", Cbrt, CbrtColumn, referenceCubeRootBig,
		[]argumentRange{{low: -10, high: 10}, {low: 1, high: 8}, {low: leastNumber, high: math.MaxFloat64, logarithmic: true, bothSigns: true}},
		[]float64{1, 2, 4, 8, 27, 0.001, leastNumber, leastNormal, math.MaxFloat64}},
	{"Erf", Erf, ErfColumn, referenceErfBig,
		[]argumentRange{{low: -6.1, high: 6.1}, {low: -1, high: 1}, {low: 1e-300, high: 6, logarithmic: true, bothSigns: true}},
		[]float64{0.5, 0.625, 1, 2, 6, leastNumber, 1e-310, leastNormal}},
	{"Erfc", Erfc, ErfcColumn, referenceErfcBig,
		[]argumentRange{{low: -6.1, high: 27.3}, {low: -1, high: 1}, {low: 0.5, high: 6}, {low: 26.5, high: 27.3}},
		[]float64{0.5, -0.5, 0.625, 1, 2, 6, -6, 8, 16, 26.543258454250987, 27.226017111108365, leastNumber}},
}

// arguments returns the edges with their neighbours, and count random ones.
func (f *elementaryFunction) arguments(count int) []float64 {
	var list []float64
	for _, edge := range f.edges {
		below, above := edge, edge
		list = append(list, edge, -edge)
		for range 3 {
			below, above = math.Nextafter(below, math.Inf(-1)), math.Nextafter(above, math.Inf(1))
			list = append(list, below, above)
		}
	}
	random := rand.New(rand.NewPCG(20, 17))
	for i := range count {
		list = append(list, f.ranges[i%len(f.ranges)].draw(random))
	}
	return list
}

// TestAccuracy measures every function of one argument against the reference.
func TestAccuracy(t *testing.T) {
	for _, f := range elementaryFunctions {
		t.Run(f.name, func(t *testing.T) {
			t.Parallel()
			worst, at, measured := 0.0, 0.0, 0
			for _, x := range f.arguments(*accuracyCount) {
				computed := f.scalar(x)
				if math.IsNaN(computed) || math.IsInf(x, 0) || x == 0 || f.name == "Log1p" && x == -1 {
					continue // no number or a pole; the special values have their own table
				}
				measured++
				if units := unitsInLastPlace(computed, f.reference(bigOf(x))); units > worst {
					worst, at = units, x
				}
			}
			t.Logf("%s: worst %.4f units in the last place at %v (%x), %d arguments", f.name, worst, at, at, measured)
			if worst > 1 {
				t.Errorf("%s(%v) = %v is %.3f units in the last place off", f.name, at, f.scalar(at), worst)
			}
			if measured < *accuracyCount*9/10 {
				t.Errorf("only %d of %d arguments measured", measured, *accuracyCount)
			}
		})
	}
}

// elementaryPair is a function of two arguments under test, with a drawing of
// its arguments.
type elementaryPair struct {
	name      string
	scalar    func(x, y float64) float64
	column    func(dst, x, y []float64)
	reference func(x, y *big.Float) *big.Float
	draw      func(random *rand.Rand, i int) (x, y float64)
}

var (
	wholeRange = argumentRange{low: leastNumber, high: math.MaxFloat64, logarithmic: true}
	nearOne    = argumentRange{low: 0.9, high: 1.1}
	moderate   = argumentRange{low: 0, high: 100}
	tiny       = argumentRange{low: leastNumber, high: 0x1p-1000, logarithmic: true}
)

// drawPower draws bases of every magnitude, and exponents that keep the power
// within or just beyond the range.
func drawPower(random *rand.Rand, i int) (x, y float64) {
	x = []argumentRange{wholeRange, nearOne, moderate, tiny}[i%4].draw(random)
	if i%16 == 5 {
		x = math.Float64frombits(math.Float64bits(1) + random.Uint64N(1<<20))
	}
	switch i / 4 % 4 {
	case 0:
		return x, float64(random.IntN(41)-20) / 4
	case 1:
		return x, float64((random.Float64() - 0.5) * 4)
	}
	// The exponent of the base, roughly, decides; Ln is exact enough here and
	// the same everywhere.
	limit := 746 / math.Abs(Ln(x))
	if i/4%4 == 3 {
		y = float64(limit * (0.93 + float64(0.07*random.Float64())))
	} else {
		y = float64(limit * random.Float64())
	}
	if random.Uint64()&1 == 1 {
		y = -y
	}
	return x, y
}

func drawPoint(random *rand.Rand, i int) (x, y float64) {
	switch i % 4 {
	case 0:
		return moderate.draw(random) - 50, moderate.draw(random) - 50
	case 1:
		return tiny.draw(random), -tiny.draw(random)
	case 2:
		x = -wholeRange.draw(random)
		return x, math.Ldexp(nearOne.draw(random)*x, random.IntN(80)-40)
	}
	return wholeRange.draw(random), wholeRange.draw(random)
}

var elementaryPairs = []elementaryPair{
	{"Pow", Pow, PowColumn, func(x, y *big.Float) *big.Float {
		return referenceExpBig(bigMul(y, referenceLnBig(x)))
	}, drawPower},
	{"Atan2", Atan2, Atan2Column, func(y, x *big.Float) *big.Float {
		if x.Sign() > 0 {
			return referenceAtanBig(y, x)
		}
		pi := bigMul(bigOf(float64(2*y.Sign())), referenceHalfPi)
		return bigAdd(pi, referenceAtanBig(bigNew().Neg(y), bigNew().Neg(x)))
	}, drawPoint},
	{"Hypot", Hypot, HypotColumn, func(x, y *big.Float) *big.Float {
		return bigNew().Sqrt(bigAdd(bigMul(x, x), bigMul(y, y)))
	}, drawPoint},
}

// TestAccuracyOfPairs measures the functions of two arguments.
func TestAccuracyOfPairs(t *testing.T) {
	for _, f := range elementaryPairs {
		t.Run(f.name, func(t *testing.T) {
			t.Parallel()
			random := rand.New(rand.NewPCG(20, 26))
			worst, atX, atY := 0.0, 0.0, 0.0
			for i := range *accuracyCount {
				x, y := f.draw(random, i)
				if x == 0 || y == 0 || math.IsInf(x, 0) || math.IsInf(y, 0) {
					continue
				}
				if units := unitsInLastPlace(f.scalar(x, y), f.reference(bigOf(x), bigOf(y))); units > worst {
					worst, atX, atY = units, x, y
				}
			}
			t.Logf("%s: worst %.4f units in the last place at %v, %v (%x, %x)", f.name, worst, atX, atY, atX, atY)
			if worst > 1 {
				t.Errorf("%s(%v, %v) = %v is %.3f units in the last place off", f.name, atX, atY, f.scalar(atX, atY), worst)
			}
		})
	}
}
