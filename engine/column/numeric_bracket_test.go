package column

import (
	"math"
	"testing"
)

func TestBracketedRoot(t *testing.T) {
	cases := []struct {
		name       string
		f          func(float64) float64
		a, b, want float64
	}{
		{"square", func(x float64) float64 { return x*x - 2 }, 0, 2, math.Sqrt2},
		{"cosine", func(x float64) float64 { return math.Cos(x) }, 0, 3, math.Pi / 2},
		{"steep", func(x float64) float64 { return math.Exp(40*x) - 1e10 }, -3, 5, math.Log(1e10) / 40},
		{"flat", func(x float64) float64 { return (x - 0.3) * (x - 0.3) * (x - 0.3) }, -1, 1, 0.3},
		{"falling", func(x float64) float64 { return 1 - x }, 0, 10, 1},
		{"at the end", func(x float64) float64 { return x - 5 }, 0, 5, 5},
		// Brent's own example of a function that defeats secants: x^19.
		{"power", func(x float64) float64 { return math.Pow(x-0.5, 19) }, -1, 4, 0.5},
	}
	for _, c := range cases {
		got, ok := BracketedRoot(c.f, c.a, c.b)
		if !ok || math.Abs(got-c.want) > 4e-16*math.Max(1, math.Abs(c.want)) && math.Abs(c.f(got)) > 1e-40 {
			t.Errorf("%s: %v %v, want %v", c.name, got, ok, c.want)
		}
	}
	if _, ok := BracketedRoot(func(x float64) float64 { return x*x + 1 }, -1, 1); ok {
		t.Error("no sign change, but a root")
	}
	if _, ok := BracketedRoot(func(x float64) float64 { return math.NaN() }, -1, 1); ok {
		t.Error("no number, but a root")
	}
}
