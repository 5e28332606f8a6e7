package plan

import (
	"fmt"
	"strings"
	"testing"

	"plumbrule/engine/formula"
	"plumbrule/engine/law"
)

func TestEqualPartsAreOne(t *testing.T) {
	for _, test := range []struct {
		text  string
		op    formula.Op
		steps int
	}{
		{"u = exp(a) + exp(a)", formula.Exp, 1},
		{"u = exp(a)\nv = 2 * exp(a)\nw = exp(b)", formula.Exp, 2},
		{"u = (a + b) * (a + b)", formula.Add, 1},
		{"u = (a + b) * (b + a)", formula.Add, 2}, // the order of a sum may show in its bits
		{"u = a^2 + a^2 + a * a", formula.Mul, 1},
		{"u = exp(a)\nv = exp(a)", formula.Exp, 1},
		{"u = a > b ? 1 : 2\nv = b < a ? 3 : 4", formula.Less, 1},
		{"u = sum([a, b, a + b])\nv = sum([a, b, a + b])", formula.Apply, 1},
		{"u = sum([a, b, 3, 4, 5])\nv = sum([a, b, 3, 4, 6])", formula.Apply, 2},
		{"u = max(a, b, 2)\nv = max(a, b)", formula.Max, 2},
	} {
		if got := stepsOf(planned(t, "a b", test.text), test.op); got != test.steps {
			t.Errorf("%s: %d steps, not %d", test.text, got, test.steps)
		}
	}
}

func TestConstantsFold(t *testing.T) {
	twice := &law.Law{Name: "twice", Gives: "twice", Source: "made for this test", Body: law.Of1(func(a float64) float64 { return 2 * a }),
		Parameters: []law.Parameter{{Name: "a", Unit: "1", Valid: law.AtMost(10)}}, Result: law.Result{Unit: "1"}}
	for _, test := range []struct {
		text  string
		steps int // that run at all
		value float64
	}{
		{"u = 1 + 2 * 3", 0, 7},
		{"u = exp(0) + sqrt(4)", 0, 3},
		{"u = 2 > 1 ? 5 : 6", 0, 5},
		{"u = 2 > 1 ? 5 : a", 0, 5},
		{"u = sum([1, 2, 3]) + count([1, 1])", 0, 8},
		{"u = item([4, 5], 2)", 0, 5},
		{"u = twice(3)\nv = 2 * u", 0, 6},
		{"u = 2 > 1 and 3 > 2 ? 1 : 0", 0, 1},
		{"u = max(1, 2, 3)^2", 0, 9},
		// Outside of a range, or without a number, the run tells why.
		{"u = twice(11)", 2, 22},
	} {
		p := planned(t, "a", test.text, twice)
		s := scheduled(t, p, 0)
		if len(s.once)+len(s.each) != test.steps {
			t.Errorf("%s: %d steps run", test.text, len(s.once)+len(s.each))
		}
		if out := runs(t, p, 1, 3); out.Values[0][2] != test.value {
			t.Errorf("%s: %v", test.text, out.Values[0][2])
		}
	}
}

// What no column reaches runs once a run.
func TestOnce(t *testing.T) {
	p := planned(t, "a b", "u = exp(b) * 2\nv = a + u\nw = sin(b)")
	for _, test := range []struct {
		shape      []int
		once, each int
	}{
		{[]int{0, 0}, 7, 0}, // exp, *, sin, + and three entries
		{[]int{1, 0}, 5, 2},
		{[]int{0, 1}, 0, 7},
		{[]int{1, 1}, 0, 7},
	} {
		if s := scheduled(t, p, test.shape...); len(s.once) != test.once || len(s.each) != test.each {
			t.Errorf("shape %v: %d once, %d each", test.shape, len(s.once), len(s.each))
		}
	}
	if first, again := scheduled(t, p, 1, 0), scheduled(t, p, 1, 0); first != again {
		t.Error("a shape is scheduled twice")
	}
}

// Schedules of many shapes stay right beyond the number that is remembered.
func TestManyShapes(t *testing.T) {
	p := planned(t, "a b c d e", "u = a + 2 * b + 3 * c + 4 * d + 5 * e")
	for round := 0; round < 2; round++ {
		for shape := 0; shape < 32; shape++ {
			values := make([][]float64, 5)
			want := 0.0
			for k := range values {
				values[k] = []float64{float64(k + 1)}
				if shape>>k&1 == 1 {
					values[k] = []float64{0, float64(k + 1)}
				}
				want += float64((k + 1) * (k + 1))
			}
			if out := runs(t, p, 1, 2, values...); out.Values[0][1] != want {
				t.Errorf("shape %05b: %v, not %v", shape, out.Values[0][1], want)
			}
		}
	}
	if len(p.cache.known) > mostSchedules {
		t.Errorf("%d schedules are remembered", len(p.cache.known))
	}
}

// Scratch columns serve again once their last reader has run.
func TestScratchIsReused(t *testing.T) {
	formulaText := "a"
	for i := 0; i < 200; i++ {
		formulaText = fmt.Sprintf("sin(%s + %d)", formulaText, i)
	}
	for _, test := range []struct {
		text string
		most int
	}{
		{"u = " + formulaText, 3},
		{"u = " + strings.Repeat("exp(a) * sin(a) + ", 50) + "a", 4},
		{"u = exp(a)\nv = sin(u)\nw = cos(v)", 0}, // each lives in its entry's own column
	} {
		p := planned(t, "a", test.text)
		s := scheduled(t, p, 1)
		if s.columns > test.most {
			t.Errorf("%.40s: %d scratch columns for %d steps", test.text, s.columns, len(s.each))
		}
	}
}
