package column

import (
	"math"
	"testing"
)

var (
	infinity     = math.Inf(1)
	notANumber   = math.NaN()
	negativeZero = math.Copysign(0, -1)
	piRounded    = 0x1.921fb54442d18p+1 // pi rounded to 53 bits, OEIS A000796
)

// sameNumber compares bits, but takes all NaN as one.
func sameNumber(a, b float64) bool {
	return math.IsNaN(a) && math.IsNaN(b) || math.Float64bits(a) == math.Float64bits(b)
}

// specialValues come from ISO/IEC 9899:2018 (C), annex F.10, in its order;
// exact values at whole arguments follow from the definitions.
var specialValues = []struct {
	name      string
	f         func(float64) float64
	arguments []float64
	results   []float64
}{
	{"Acos", Acos, []float64{1, -1, 2, -infinity}, []float64{0, piRounded, notANumber, notANumber}},
	{"Asin", Asin, []float64{0, negativeZero, 1, -1, 1.5, infinity}, []float64{0, negativeZero, piRounded / 2, -piRounded / 2, notANumber, notANumber}},
	{"Atan", Atan, []float64{0, negativeZero, infinity, -infinity}, []float64{0, negativeZero, piRounded / 2, -piRounded / 2}},
	{"Cos", Cos, []float64{0, negativeZero, infinity, -infinity}, []float64{1, 1, notANumber, notANumber}},
	{"Sin", Sin, []float64{0, negativeZero, infinity, -infinity}, []float64{0, negativeZero, notANumber, notANumber}},
	{"Tan", Tan, []float64{0, negativeZero, infinity, -infinity}, []float64{0, negativeZero, notANumber, notANumber}},
	{"Cosh", Cosh, []float64{0, negativeZero, infinity, -infinity, 711, -711}, []float64{1, 1, infinity, infinity, infinity, infinity}},
	{"Sinh", Sinh, []float64{0, negativeZero, infinity, -infinity, 711, -711}, []float64{0, negativeZero, infinity, -infinity, infinity, -infinity}},
	{"Tanh", Tanh, []float64{0, negativeZero, infinity, -infinity, 100}, []float64{0, negativeZero, 1, -1, 1}},
	{"Exp", Exp, []float64{0, negativeZero, infinity, -infinity, 710, -746, 1e308, -1e308, leastNumber}, []float64{1, 1, infinity, 0, infinity, 0, infinity, 0, 1}},
	{"Expm1", Expm1, []float64{0, negativeZero, infinity, -infinity, 710, -100}, []float64{0, negativeZero, infinity, -1, infinity, -1}},
	{"Ln", Ln, []float64{0, negativeZero, 1, -1, -infinity, infinity}, []float64{-infinity, -infinity, 0, notANumber, notANumber, infinity}},
	{"Log10", Log10, []float64{0, negativeZero, 1, -1, -infinity, infinity}, []float64{-infinity, -infinity, 0, notANumber, notANumber, infinity}},
	{"Log1p", Log1p, []float64{0, negativeZero, -1, -2, -infinity, infinity}, []float64{0, negativeZero, -infinity, notANumber, notANumber, infinity}},
	{"Cbrt", Cbrt, []float64{0, negativeZero, infinity, -infinity, -8, 1e-300, 0x1p-1074}, []float64{0, negativeZero, infinity, -infinity, -2, 1e-100, 0x1p-358}},
	{"Erf", Erf, []float64{0, negativeZero, infinity, -infinity, 7}, []float64{0, negativeZero, 1, -1, 1}},
	{"Erfc", Erfc, []float64{0, negativeZero, infinity, -infinity, 28, -7}, []float64{1, 1, 0, 2, 0, 2}},
}

// TestSpecialValues runs every row through the scalar and the column form.
func TestSpecialValues(t *testing.T) {
	column := map[string]func(dst, src []float64){}
	for _, f := range elementaryFunctions {
		column[f.name] = f.column
	}
	if len(specialValues) != len(elementaryFunctions) {
		t.Errorf("%d functions have special values, %d exist", len(specialValues), len(elementaryFunctions))
	}
	for _, row := range specialValues {
		arguments, results := append(row.arguments, notANumber), append(row.results, notANumber)
		got := make([]float64, len(arguments))
		column[row.name](got, arguments)
		for i, x := range arguments {
			if y := row.f(x); !sameNumber(y, results[i]) || !sameNumber(got[i], results[i]) {
				t.Errorf("%s(%v) = %v, in a column %v, want %v", row.name, x, y, got[i], results[i])
			}
		}
	}
}

// TestSpecialPairs: rows x, y, result from the same annex.
func TestSpecialPairs(t *testing.T) {
	const quarter = math.Pi / 4
	for _, table := range []struct {
		name string
		f    func(x, y float64) float64
		rows [][3]float64
	}{
		{"Pow", Pow, [][3]float64{ // F.10.4.4
			{0, -3, infinity}, {negativeZero, -3, -infinity}, {0, -2, infinity}, {negativeZero, -2, infinity},
			{0, -0.7, infinity}, {negativeZero, -0.7, infinity}, {0, -infinity, infinity}, {negativeZero, -infinity, infinity},
			{0, 3, 0}, {negativeZero, 3, negativeZero}, {0, 4, 0}, {negativeZero, 4, 0}, {negativeZero, 0.7, 0},
			{negativeZero, 0.5, 0}, {negativeZero, 1, negativeZero}, {negativeZero, -1, -infinity}, {negativeZero, 2, 0},
			{-1, infinity, 1}, {-1, -infinity, 1}, {1, infinity, 1}, {1, notANumber, 1}, {1, -3.3, 1},
			{notANumber, 0, 1}, {infinity, negativeZero, 1}, {0, 0, 1}, {-7, 0, 1},
			{-2, 1.5, notANumber}, {-2, 0.5, notANumber}, {-1e-310, 0.25, notANumber},
			{0.5, -infinity, infinity}, {-0.5, -infinity, infinity}, {2, -infinity, 0}, {-2, -infinity, 0},
			{0.5, infinity, 0}, {-0.5, infinity, 0}, {2, infinity, infinity}, {-2, infinity, infinity},
			{-infinity, -3, negativeZero}, {-infinity, -2, 0}, {-infinity, -0.7, 0}, {-infinity, -1, negativeZero},
			{-infinity, 3, -infinity}, {-infinity, 2, infinity}, {-infinity, 0.7, infinity}, {-infinity, 0.5, infinity},
			{infinity, -3, 0}, {infinity, 0.7, infinity}, {infinity, 0.5, infinity},
			{notANumber, 1, notANumber}, {notANumber, 2, notANumber}, {2, notANumber, notANumber}, {notANumber, 0.5, notANumber},
			// Beyond the range, signs, and exact powers.
			{-2, 1025, -infinity}, {-2, -1075, negativeZero}, {-2, 3, -8}, {-2, -3, -0.125}, {2, 1023, 0x1p1023},
			{2, 1024, infinity}, {2, -1074, leastNumber}, {2, -1076, 0}, {10, 3, 1000}, {10, 22, 1e22},
			{1 + 0x1p-52, 1e300, infinity}, {1 - 0x1p-53, 1e300, 0}, {-1, 0x1p60, 1}, {-1, 0x1p53 - 1, -1}, {-1, 1e300, 1},
			{leastNumber, -0.5, 0x1p537}, {leastNumber, 3, 0}, {-leastNumber, -3, -infinity}, {3, 1e-300, 1}, {-3, 1e-300, notANumber},
			{math.MaxFloat64, 1, math.MaxFloat64}, {math.MaxFloat64, -1, 1 / math.MaxFloat64}, {leastNumber, -1, infinity},
		}},
		{"Atan2", Atan2, [][3]float64{ // F.10.1.4, y before x
			{0, -1, piRounded}, {negativeZero, -1, -piRounded}, {0, negativeZero, piRounded}, {negativeZero, negativeZero, -piRounded},
			{0, 1, 0}, {negativeZero, 1, negativeZero}, {0, 0, 0}, {negativeZero, 0, negativeZero},
			{-1, 0, -piRounded / 2}, {-1, negativeZero, -piRounded / 2}, {1, 0, piRounded / 2}, {1, negativeZero, piRounded / 2},
			{1, -infinity, piRounded}, {-1, -infinity, -piRounded}, {1, infinity, 0}, {-1, infinity, negativeZero},
			{infinity, 3, piRounded / 2}, {-infinity, -3, -piRounded / 2},
			{infinity, -infinity, 3 * quarter}, {-infinity, -infinity, -3 * quarter}, {infinity, infinity, quarter}, {-infinity, infinity, -quarter},
			{notANumber, 1, notANumber}, {1, notANumber, notANumber}, {notANumber, infinity, notANumber},
			{1, 1, quarter}, {-1, 1, -quarter}, {1, -1, 3 * quarter},
			{leastNumber, 1e308, 0}, {1e308, leastNumber, piRounded / 2}, {leastNumber, leastNumber, quarter}, {leastNumber, -1, piRounded},
		}},
		{"Hypot", Hypot, [][3]float64{ // F.10.4.3
			{infinity, notANumber, infinity}, {notANumber, -infinity, infinity}, {notANumber, 1, notANumber}, {0, notANumber, notANumber},
			{0, 0, 0}, {negativeZero, -3, 3}, {3, -4, 5}, {3e300, 4e300, 5e300}, {3 * leastNumber, 4 * leastNumber, 5 * leastNumber},
			{math.MaxFloat64, math.MaxFloat64, infinity}, {math.MaxFloat64, 1, math.MaxFloat64}, {leastNumber, 0, leastNumber},
		}},
	} {
		for _, row := range table.rows {
			if got := table.f(row[0], row[1]); !sameNumber(got, row[2]) {
				t.Errorf("%s(%v, %v) = %v, want %v", table.name, row[0], row[1], got, row[2])
			}
		}
	}
}

// TestExactValues: powers of ten and cubes are representable, and an error
// below half a unit finds them.
func TestExactValues(t *testing.T) {
	power := 1.0
	for n := range 23 {
		if got := Log10(power); got != float64(n) {
			t.Errorf("Log10(1e%d) = %v", n, got)
		}
		if got := Pow(10, float64(n)); got != power {
			t.Errorf("Pow(10, %d) = %v", n, got)
		}
		power *= 10
	}
	for n := -1000.0; n <= 1000; n++ {
		if got := Cbrt(n * n * n); got != n {
			t.Errorf("Cbrt(%v^3) = %v", n, got)
		}
	}
	for n := -1074; n < 1024; n++ {
		if got := Pow(2, float64(n)); got != math.Ldexp(1, n) {
			t.Errorf("Pow(2, %d) = %v", n, got)
		}
	}
}
