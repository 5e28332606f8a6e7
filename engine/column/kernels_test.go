package column

import (
	"math"
	"math/rand/v2"
	"testing"
)

// sample gives n numbers of all sizes, with zeros, infinities and NaN.
func sample(n int, seed uint64) []float64 {
	random := rand.New(rand.NewPCG(seed, 7))
	numbers := make([]float64, n)
	for i := range numbers {
		switch random.IntN(12) {
		case 0:
			numbers[i] = []float64{0, math.Copysign(0, -1), math.Inf(1), math.Inf(-1), math.NaN(), math.MaxFloat64, 5e-324}[random.IntN(7)]
		default:
			numbers[i] = math.Ldexp(random.Float64()*2-1, random.IntN(80)-40)
		}
	}
	return numbers
}

func equalBits(x, y float64) bool {
	return math.Float64bits(x) == math.Float64bits(y) || math.IsNaN(x) && math.IsNaN(y)
}

// TestKernelsGiveEachRow compares every kernel, in every shape and at lengths
// around its stride, with the operation of one row.
func TestKernelsGiveEachRow(t *testing.T) {
	kernels := []struct {
		name string
		run  func(dst, a, b []float64)
		row  func(x, y float64) float64
	}{
		{"add", AddColumn, func(x, y float64) float64 { return x + y }},
		{"sub", SubColumn, func(x, y float64) float64 { return x - y }},
		{"mul", MulColumn, func(x, y float64) float64 { return x * y }},
		{"div", DivColumn, func(x, y float64) float64 { return x / y }},
		{"map", func(dst, a, b []float64) { Map2(dst, a, b, Max) }, Max},
	}
	for _, k := range kernels {
		for _, n := range []int{1, 2, 7, 8, 9, 16, 1023, 1024} {
			a, b := sample(n, 1), sample(n, 2)
			for _, shape := range [][2][]float64{{a, b}, {a, b[:1]}, {a[:1], b}} {
				if n == 1 || len(shape[0]) == n || len(shape[1]) == n {
					dst := make([]float64, n)
					k.run(dst, shape[0], shape[1])
					for i := range dst {
						want := k.row(shape[0][i*Stride(shape[0])], shape[1][i*Stride(shape[1])])
						if !equalBits(dst[i], want) {
							t.Fatalf("%s, %d rows, row %d: %v, want %v", k.name, n, i, dst[i], want)
						}
					}
				}
			}
		}
	}
}

// TestScaledKernelsRoundEachProduct compares the scaled kernels with separate
// steps.
func TestScaledKernelsRoundEachProduct(t *testing.T) {
	const ka, kb, y = 1.0 / 3, 1e5 / 7, 0.1
	for _, n := range []int{1, 7, 8, 17, 1024} {
		a, b := sample(n, 3), sample(n, 4)
		pa, pb := make([]float64, n), make([]float64, n)
		MulColumn(pa, a, []float64{ka})
		MulColumn(pb, b, []float64{kb})
		cases := []struct {
			name   string
			scaled func(dst []float64)
			steps  func(dst []float64)
		}{
			{"add", func(dst []float64) { AddScaledColumns(dst, a, ka, b, kb) }, func(dst []float64) { AddColumn(dst, pa, pb) }},
			{"sub", func(dst []float64) { SubScaledColumns(dst, a, ka, b, kb) }, func(dst []float64) { SubColumn(dst, pa, pb) }},
			{"mul", func(dst []float64) { MulScaledColumns(dst, a, ka, b, kb) }, func(dst []float64) { MulColumn(dst, pa, pb) }},
			{"div", func(dst []float64) { DivScaledColumns(dst, a, ka, b, kb) }, func(dst []float64) { DivColumn(dst, pa, pb) }},
			{"add number", func(dst []float64) { AddScaledNumber(dst, a, ka, y) }, func(dst []float64) { AddColumn(dst, pa, []float64{y}) }},
			{"div number", func(dst []float64) { DivScaledNumber(dst, a, ka, y) }, func(dst []float64) { DivColumn(dst, pa, []float64{y}) }},
			{"number sub", func(dst []float64) { SubFromNumberScaled(dst, y, b, kb) }, func(dst []float64) { SubColumn(dst, []float64{y}, pb) }},
			{"number div", func(dst []float64) { DivNumberScaled(dst, y, b, kb) }, func(dst []float64) { DivColumn(dst, []float64{y}, pb) }},
		}
		for _, c := range cases {
			got, want := make([]float64, n), make([]float64, n)
			c.scaled(got)
			c.steps(want)
			for i := range got {
				if !equalBits(got[i], want[i]) {
					t.Fatalf("%s, %d rows, row %d: %v, want %v", c.name, n, i, got[i], want[i])
				}
			}
		}
	}
}

func TestExpScaledColumn(t *testing.T) {
	for _, n := range []int{1, 3, 4, 5, 1023} {
		src := sample(n, 5)
		dst := make([]float64, n)
		ExpScaledColumn(dst, src, 1.225)
		for i := range dst {
			if want := float64(1.225 * Exp(src[i])); !equalBits(dst[i], want) {
				t.Fatalf("%d rows, row %d: %v, want %v", n, i, dst[i], want)
			}
		}
		for i := range src {
			src[i] = float64(i%9) - 4
		}
		if !ExpScaledColumn(dst, src, 1) {
			t.Errorf("%d small arguments are called unusual", n)
		}
		for _, odd := range []float64{math.NaN(), math.Inf(1), math.Inf(-1), 705, -705} {
			src[n-1] = odd
			if ExpScaledColumn(dst, src, 1) {
				t.Errorf("%d rows with %v are called usual", n, odd)
			}
			src[n-1] = 0
		}
	}
}

func TestRanges(t *testing.T) {
	for _, n := range []int{1, 7, 8, 9, 1000} {
		a := make([]float64, n)
		for i := range a {
			a[i] = float64(i % 5)
		}
		if !AllFinite(a) || !AllInside(a, 0, 4) || AllInside(a, -1, -0.5) {
			t.Errorf("%d sound rows are taken for unsound ones", n)
		}
		for _, at := range []int{0, n / 2, n - 1} {
			for _, odd := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
				kept := a[at]
				a[at] = odd
				if AllFinite(a) || AllInside(a, 0, 4) {
					t.Errorf("%v in row %d of %d is not seen", odd, at, n)
				}
				a[at] = kept
			}
		}
	}
}

// TestAllInsideAtItsBounds compares AllInside with one comparison a row, at
// bounds of every sign and size.
func TestAllInsideAtItsBounds(t *testing.T) {
	bounds := []float64{math.Inf(-1), -math.MaxFloat64, -2.5, -1e-300, math.Copysign(0, -1), 0, 5e-324, 1, 2.5, 313.15, math.MaxFloat64, math.Inf(1)}
	values := append([]float64{math.NaN(), -1, 0.5, 100}, bounds...)
	for _, low := range bounds {
		for _, high := range bounds {
			for _, x := range values {
				for _, n := range []int{1, 8, 11} {
					a := make([]float64, n)
					for i := range a {
						a[i] = x
					}
					if got, want := AllInside(a, low, high), x >= low && x <= high; got != want {
						t.Errorf("%d rows of %v from %v to %v: %v", n, x, low, high, got)
					}
				}
			}
		}
	}
}

func TestSmallFunctions(t *testing.T) {
	negativeZero := math.Copysign(0, -1)
	cases := []struct {
		name      string
		got, want float64
	}{
		{"min of zeros", Min(0, negativeZero), negativeZero},
		{"max of zeros", Max(negativeZero, 0), 0},
		{"min with NaN", Min(1, math.NaN()), math.NaN()},
		{"max with NaN", Max(math.NaN(), 1), math.NaN()},
		{"round half up", RoundOf(2.5), 3},
		{"round half down", RoundOf(-2.5), -3},
		{"round just below a half", RoundOf(0.49999999999999994), 0},
		{"sign", SignOf(-3), -1},
		{"sign of zero", SignOf(negativeZero), negativeZero},
		{"sign of NaN", SignOf(math.NaN()), math.NaN()},
	}
	for _, c := range cases {
		if !equalBits(c.got, c.want) {
			t.Errorf("%s: %v, want %v", c.name, c.got, c.want)
		}
	}
}
