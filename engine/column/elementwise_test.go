package column

import (
	"math"
	"math/rand/v2"
	"testing"
)

// special are numbers at which comparisons and range checks are easily wrong.
var special = []float64{0, math.Copysign(0, -1), 1, -1, 2.5, 5e-324, -5e-324, math.MaxFloat64, -math.MaxFloat64, math.Inf(1), math.Inf(-1), math.NaN(), math.Copysign(math.NaN(), -1)}

// draw gives n numbers, some of them special.
func draw(random *rand.Rand, n int, usual float64) []float64 {
	a := make([]float64, n)
	for i := range a {
		if a[i] = usual * random.Float64(); random.IntN(20) == 0 {
			a[i] = special[random.IntN(len(special))]
		}
	}
	return a
}

// TestElementwise holds the column kernels to one row at a time.
func TestElementwise(t *testing.T) {
	random := rand.New(rand.NewPCG(5, 7))
	truth := func(holds bool, x, y float64) float64 {
		switch {
		case math.IsNaN(x) || math.IsNaN(y):
			return math.NaN()
		case holds:
			return 1
		}
		return 0
	}
	alike := func(x, y float64) bool {
		return math.Float64bits(x) == math.Float64bits(y) || math.IsNaN(x) && math.IsNaN(y)
	}
	for range 300 {
		n := 1 + random.IntN(40)
		a, b := draw(random, n, 3), draw(random, n, 3)
		dst := make([]float64, n)
		for name, unary := range map[string]struct {
			column func(dst, a []float64)
			one    func(x float64) float64
		}{
			"neg": {NegColumn, func(x float64) float64 { return -x }}, "sqrt": {SqrtColumn, math.Sqrt},
			"abs": {AbsColumn, math.Abs}, "not": {NotColumn, func(x float64) float64 { return 1 - x }},
		} {
			unary.column(dst, a)
			for i := range dst {
				if !alike(dst[i], unary.one(a[i])) {
					t.Fatalf("%s of %v: %v", name, a[i], dst[i])
				}
			}
		}
		for name, binary := range map[string]struct {
			column func(dst, a, b []float64)
			one    func(x, y float64) bool
		}{
			"<": {LessColumn, func(x, y float64) bool { return x < y }}, "<=": {LessEqualColumn, func(x, y float64) bool { return x <= y }},
			"==": {EqualColumn, func(x, y float64) bool { return x == y }}, "!=": {NotEqualColumn, func(x, y float64) bool { return x != y }},
		} {
			for _, operands := range [][2][]float64{{a, b}, {a, b[:1]}, {a[:1], b}} {
				binary.column(dst, operands[0], operands[1])
				for i := range dst {
					x, y := operands[0][i*Stride(operands[0])], operands[1][i*Stride(operands[1])]
					if !alike(dst[i], truth(binary.one(x, y), x, y)) {
						t.Fatalf("%v %s %v: %v", x, name, y, dst[i])
					}
				}
			}
		}
	}
}

// TestTrues counts conditions.
func TestTrues(t *testing.T) {
	for _, test := range []struct {
		condition []float64
		count     int
		all       bool
	}{
		{nil, 0, true},
		{[]float64{1, 0, 1, 1, 0, 1}, 4, true},
		{[]float64{1, 1, 1, 1, math.NaN()}, 0, false},
	} {
		count, all := Trues(test.condition)
		if all != test.all || all && count != test.count {
			t.Errorf("%v: %d, %v", test.condition, count, all)
		}
	}
}

// TestSkipsAgree holds both forms of each range check to one row at a time:
// what is skipped lies inside, and where no row of eight lies outside all is
// skipped.
func TestSkipsAgree(t *testing.T) {
	random := rand.New(rand.NewPCG(15, 17))
	bounds := []float64{0, 5e-324, 0.5, 1, 2.5, math.MaxFloat64}
	for range 3000 {
		a := draw(random, 8*(1+random.IntN(3)), 3)
		low, high := bounds[random.IntN(len(bounds))], bounds[random.IntN(len(bounds))]
		if low > high {
			low, high = high, low
		}
		from, span := math.Float64bits(low), math.Float64bits(high)-math.Float64bits(low)
		inside, within := len(a), len(a)
		for i := len(a) - 1; i >= 0; i-- {
			if x := a[i]; !(x >= low && x <= high) || math.Signbit(x) {
				inside = i &^ 7
			}
			if x := math.Abs(a[i]); !(x <= high) {
				within = i &^ 7
			}
		}
		for name, rest := range map[string]int{
			"inside": len(skipInside(a, from, span)), "inside joined": len(skipInsideJoined(a, from, span)),
		} {
			if rest != len(a)-inside {
				t.Fatalf("%s of %v to %v: %d of %v are left, not %d", name, low, high, rest, a, len(a)-inside)
			}
		}
		for name, rest := range map[string]int{
			"within": len(skipWithin(a, math.Float64bits(high))), "within joined": len(skipWithinJoined(a, math.Float64bits(high))),
		} {
			if rest != len(a)-within {
				t.Fatalf("%s %v: %d of %v are left, not %d", name, high, rest, a, len(a)-within)
			}
		}
	}
}
