package engine_test

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/engine/rows"
)

// convertingCatalogue holds a law that takes lengths, and times through a law
// that makes a length of a time and has a range of its own.
func convertingCatalogue(t *testing.T) *law.Catalogue {
	t.Helper()
	fall := &law.Law{Name: "fall", Gives: "twice a time, as a length", Source: "made for this test",
		Parameters: []law.Parameter{{Name: "time", Meaning: "a time", Unit: "s", Valid: law.AtMost(10), Finite: law.AtMost(50)}},
		Result:     law.Result{Unit: "m"}, Body: law.Of1(func(a float64) float64 { return 2 * a })}
	accepts := []law.Conversion{{Unit: "s", By: fall}, {Unit: "kg", Factor: 3}}
	first := func(dst []float64, a []law.Argument, _ *law.Work) {
		for i := range dst {
			dst[i] = a[0].Items[0].At(i)
		}
	}
	catalogue, err := law.NewCatalogue([]*law.Law{fall,
		{Name: "first", Gives: "the first of some lengths", Source: "made for this test", Body: first,
			Parameters: []law.Parameter{{Name: "lengths", Meaning: "lengths", Type: law.List, Unit: "m", Accepts: accepts}}, Result: law.Result{Unit: "m"}},
		{Name: "long", Gives: "its argument", Source: "made for this test", Body: law.Of1(func(a float64) float64 { return a }),
			Parameters: []law.Parameter{{Name: "length", Meaning: "a length", Unit: "m", Accepts: accepts}}, Result: law.Result{Unit: "m"}},
	}, nil)
	if err != nil {
		t.Fatal(err)
	}
	return catalogue
}

// TestConversions takes arguments of other dimensions, alone and in lists.
func TestConversions(t *testing.T) {
	for _, test := range []struct {
		formula string
		value   float64
		state   rows.State
	}{
		{"long(5[m])", 5, rows.Sound},
		{"long(5[s])", 10, rows.Sound},
		{"long(x)", 8, rows.Sound},
		{"long(5[kg])", 15, rows.Sound},
		{"long(11[s])", 22, rows.Stretched},
		{"long(51[s])", 0, rows.Refused},
		{"long(3 * x)", 24, rows.Stretched},
		{"first([1, 2][m])", 1, rows.Sound},
		{"first([1, 2][s])", 2, rows.Sound},
		{"first([1, 2][kg])", 3, rows.Sound},
		{"first([11, 2][s])", 22, rows.Stretched},
		{"first([x, 2[s]])", 8, rows.Sound},
		{"first(2 * [x, 2[s]])", 16, rows.Sound},
		{"first(3 * [x, 2[s]])", 24, rows.Stretched},
		{"first(-[x, 2[s]])", -8, rows.Sound},
	} {
		// The list that leaves the range must not be taken for the known,
		// which is the sheet's first value.
		program := mustCompile(t, "known x [s] = 4\nderive y = first([12, 13][s])\nderive z = fall(x)\nderive w [m] = "+test.formula, convertingCatalogue(t))
		out := runColumns(t, program, 1, nil)
		if out.Values[0][0] != 24 || out.State(0, 0) != rows.Stretched || out.Values[1][0] != 8 || out.State(1, 0) != rows.Sound {
			t.Errorf("y is %v (%s), z %v (%s)", out.Values[0][0], out.State(0, 0), out.Values[1][0], out.State(1, 0))
		}
		if got := out.Values[2][0]; out.State(2, 0) != test.state || test.state.Computed() && math.Abs(got-test.value) > 1e-12 {
			t.Errorf("%s: %v (%s), not %v (%s)", test.formula, got, out.State(2, 0), test.value, test.state)
		}
	}
}
