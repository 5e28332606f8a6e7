package engine_test

import (
	"context"
	"math"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/law"
	"plumbrule/engine/rows"
)

// testCatalogue holds laws with the ranges that the tables below speak of.
func testCatalogue(t testing.TB) *law.Catalogue {
	t.Helper()
	double := law.Of1(func(a float64) float64 { return 2 * a })
	catalogue, err := law.NewCatalogue([]*law.Law{
		{Name: "ranged", Gives: "twice a temperature", Source: "made for this test", Body: double,
			Parameters: []law.Parameter{{Name: "temperature", Meaning: "a temperature", Unit: "degC", Valid: law.Within(0, 40), Finite: law.Between(-20, 90)}},
			Result:     law.Result{Unit: "K"}},
		{Name: "picky", Gives: "its argument below 5", Source: "made for this test", Refusal: "the argument is 5 or more",
			Parameters: []law.Parameter{{Name: "x", Meaning: "a number", Unit: "1"}},
			Result:     law.Result{Unit: "1"},
			Body: law.Of1(func(a float64) float64 {
				if a >= 5 {
					return math.NaN()
				}
				return a
			})},
		{Name: "listed", Gives: "the first item", Source: "made for this test",
			Parameters: []law.Parameter{{Name: "items", Meaning: "lengths", Type: law.List, Unit: "cm", Valid: law.AtLeast(1)}},
			Result:     law.Result{Unit: "m"},
			Body: func(dst []float64, a []law.Argument, _ *law.Work) {
				for i := range dst {
					dst[i] = a[0].Items[0].At(i)
				}
			}},
		{Name: "worded", Gives: "the length of a word", Source: "made for this test",
			Parameters: []law.Parameter{{Name: "word", Meaning: "a word", Type: law.Text, Choices: []string{"one", "three"}}},
			Result:     law.Result{Unit: "1"},
			Body: func(dst []float64, a []law.Argument, _ *law.Work) {
				for i := range dst {
					dst[i] = float64(len(a[0].Text))
				}
			}},
		{Name: "paired", Gives: "the length of two words", Source: "made for this test",
			Parameters: []law.Parameter{{Name: "a", Meaning: "a word", Type: law.Text}, {Name: "b", Meaning: "a word", Type: law.Text}},
			Result:     law.Result{Unit: "1"},
			Body: func(dst []float64, a []law.Argument, _ *law.Work) {
				for i := range dst {
					dst[i] = float64(len(a[0].Text) + len(a[1].Text))
				}
			}},
	}, nil)
	if err != nil {
		t.Fatal(err)
	}
	return catalogue
}

func mustCompile(t testing.TB, text string, catalogue *law.Catalogue) *engine.Program {
	t.Helper()
	program, err := engine.Compile(text, catalogue)
	if err != nil {
		t.Fatalf("%v\n%s", err, text)
	}
	return program
}

// runColumns runs a program over columns that are named by their knowns.
func runColumns(t testing.TB, program *engine.Program, n int, columns map[string][]float64) *engine.Outcome {
	t.Helper()
	in := engine.Input{Rows: n, Values: make([][]float64, len(program.Describe().Knowns))}
	for name, values := range columns {
		k := program.Describe().KnownIndex(name)
		if k < 0 {
			t.Fatalf("no known %s", name)
		}
		in.Values[k] = values
	}
	var out engine.Outcome
	if err := program.Run(context.Background(), in, &out); err != nil {
		t.Fatal(err)
	}
	return &out
}

// TestStates goes through what may become of an entry `y` in one row.
func TestStates(t *testing.T) {
	catalogue := testCatalogue(t)
	nan, inf := math.NaN(), math.Inf(1)
	for _, test := range []struct {
		sheet  string
		x      float64
		state  rows.State
		value  float64 // of y in coherent SI, where it is computed
		reason string  // the whole text; empty where it is sound
	}{
		{"derive y = 2 * x", 3, rows.Sound, 6, ""},
		// Missing and infinite inputs.
		{"derive y = 2 * x", nan, rows.Refused, 0, "x has no value"},
		{"derive y = 2 * x", inf, rows.Refused, 0, "x has no value"},
		{"derive z = 2 * x\nderive y = z + 1", nan, rows.Waiting, 0, "waits for z"},
		{"known m\nderive y = m + x", 1, rows.Refused, 0, "m has no value"},
		// A known outside of its bounds.
		{"known w = 1 within 0 to 2\nderive y = w + x", 1, rows.Sound, 2, ""},
		// Operations without a number.
		{"derive y = 1 / x", 0, rows.Refused, 0, "division by zero in 1 / x"},
		{"derive y = 1 + 1 / (x - 2)", 2, rows.Refused, 0, "division by zero in 1 / (x - 2)"},
		{"derive y = x / 0", 2, rows.Refused, 0, "division by zero in x / 0"},
		{"derive y = 1 / 0 + x", 2, rows.Refused, 0, "division by zero in 1 / 0"},
		{"derive y = x^-1", 0, rows.Refused, 0, "division by zero in x^-1"},
		{"derive y = 1e300 / x", 1e-300, rows.Refused, 0, "the formula of y gives no finite number: its size leaves the range of numbers"},
		{"derive y = 1e300 * x", 1e300, rows.Refused, 0, "the formula of y gives no finite number: its size leaves the range of numbers"},
		{"derive y = ln(x)", 0, rows.Refused, 0, "logarithm of a number that is not positive in ln(x)"},
		{"derive y = ln(x)", -1, rows.Refused, 0, "logarithm of a number that is not positive in ln(x)"},
		{"derive y = log10(x - 1)", 1, rows.Refused, 0, "logarithm of a number that is not positive in log10(x - 1)"},
		{"derive y = sqrt(x)", -1, rows.Refused, 0, "square root of a negative number in sqrt(x)"},
		{"derive y = x^0.5", -1, rows.Refused, 0, "square root of a negative number in x^0.5"},
		{"derive y = x^1.5", -1, rows.Refused, 0, "power without a finite result in x^1.5"},
		{"derive y = exp(x)", 1000, rows.Refused, 0, "the formula of y gives no finite number: its size leaves the range of numbers"},
		{"derive y = asin(x)", 2, rows.Refused, 0, "argument outside -1 to 1 in asin(x)"},
		{"derive y = item([1, 2, 3], x)", 4, rows.Refused, 0, "item: there is no item of that number"},
		{"derive y = item([1, 2, 3], x)", 2, rows.Sound, 2, ""},
		{"derive y = interpolate(x, [1, 2], [10, 30])", 1.5, rows.Sound, 20, ""},
		{"derive y = interpolate(x, [1, 2], [10, 30])", 2.5, rows.Refused, 0, "interpolate: the argument lies outside the table, or the table's first list does not rise"},
		// Waiting for what is refused, however far.
		{"derive y = 1 / (1 + exp(x))", 1000, rows.Sound, 0, ""},
		{"derive y = 1 / x^200", 1e3, rows.Sound, 0, ""},
		{"derive y = x^-200.5", 0, rows.Refused, 0, "power without a finite result in x^-200.5"},
		{"derive z = 1 / x\nderive y = z + 1", 0, rows.Waiting, 0, "waits for z"},
		{"derive z = 1 / x\nderive z2 = -z\nderive y = z2 + 1", 0, rows.Waiting, 0, "waits for z2"},
		// What is refused here outweighs what is waited for.
		{"derive z = 1 / x\nderive y = z + ln(x)", 0, rows.Refused, 0, "logarithm of a number that is not positive in ln(x)"},
		// Ranges of a law, in its own unit; open bounds.
		{"derive y = ranged(x[degC])", 20, rows.Sound, 2 * 293.15, ""},
		{"derive y = ranged(x[degC])", 40, rows.Sound, 2 * 313.15, ""},
		{"derive y = ranged(x[degC])", 41, rows.Stretched, 2 * 314.15, "temperature of ranged lies above 40 degC, outside its stated range"},
		{"derive y = ranged(x[degC])", -1, rows.Stretched, 2 * 272.15, "temperature of ranged lies below 0 degC, outside its stated range"},
		{"derive y = ranged(x[degC])", 90, rows.Refused, 0, "temperature of ranged lies at or above 90 degC, where the law means nothing"},
		{"derive y = ranged(x[degC])", -20, rows.Refused, 0, "temperature of ranged lies at or below -20 degC, where the law means nothing"},
		{"derive y = ranged(50[degC]) + x[K]", 0, rows.Stretched, 2 * 323.15, "temperature of ranged lies above 40 degC, outside its stated range"},
		{"derive y = ranged(95[degC]) + x[K]", 0, rows.Refused, 0, "temperature of ranged lies at or above 90 degC, where the law means nothing"},
		{"derive y = picky(x)", 4, rows.Sound, 4, ""},
		{"derive y = picky(x)", 5, rows.Refused, 0, "picky: the argument is 5 or more"},
		{"derive y = listed([3, 2][cm]) + x[m]", 0, rows.Sound, 0.03, ""},
		{"derive y = listed([3, 0.5][cm]) + x[m]", 0, rows.Stretched, 0.03, "items of listed lies below 1 cm, outside its stated range"},
		{"derive y = listed([2[cm], x[cm]])", 0.5, rows.Stretched, 0.02, "items of listed lies below 1 cm, outside its stated range"},
		// Stretched travels, and does not outweigh what is worse.
		{"derive z = ranged(x[degC])\nderive z2 = 2 * z\nderive y = z2", 41, rows.Stretched, 4 * 314.15, "temperature of ranged lies above 40 degC, outside its stated range"},
		{"derive z = ranged(x[degC])\nderive y = z / 0", 41, rows.Refused, 0, "division by zero in z / 0"},
		// A choice has the state of the value that is taken.
		{"derive y = x > 0 ? 1 / x : 0", 0, rows.Sound, 0, ""},
		{"derive y = x > 0 ? 1 / x : 0", 4, rows.Sound, 0.25, ""},
		{"derive y = x > 0 ? 0 : ln(x)", 0, rows.Refused, 0, "logarithm of a number that is not positive in ln(x)"},
		{"derive y = 1 / x > 0 ? 2 : 3", 0, rows.Refused, 0, "division by zero in 1 / x"},
		{"derive z = 1 / x\nderive y = x == 0 ? 7 : z", 0, rows.Sound, 7, ""},
		{"derive y = x > 30 ? ranged(x[degC]) : 1[K]", 20, rows.Sound, 1, ""},
		{"derive y = x > 30 ? ranged(x[degC]) : 1[K]", 41, rows.Stretched, 2 * 314.15, "temperature of ranged lies above 40 degC, outside its stated range"},
		// The second condition counts only where the first does not decide.
		{"derive y = x > 0 and 1 / x > 2", 0, rows.Sound, 0, ""},
		{"derive y = x > 0 and 1 / x > 2", 0.25, rows.Sound, 1, ""},
		{"derive y = x == 0 or 1 / x > 2", 0, rows.Sound, 1, ""},
		{"derive y = 1 / x > 2 or x == 0", 0, rows.Refused, 0, "division by zero in 1 / x"},
		{"derive y = not (x > 0)", 0, rows.Sound, 1, ""},
		{"derive y = not (1 / x > 0)", 0, rows.Refused, 0, "division by zero in 1 / x"},
		{"derive y = 0 < x < 2", 1, rows.Sound, 1, ""},
		{"derive y = 0 < x < 2", 3, rows.Sound, 0, ""},
		// The sheet's own laws and their ranges.
		{"law f(a) = 2 * a\n  valid a < 3\nderive y = f(x)", 2, rows.Sound, 4, ""},
		{"law f(a) = 2 * a\n  valid a < 3\nderive y = f(x)", 3, rows.Stretched, 6, "f is used outside its range: valid a < 3"},
		{"law f(a) = 5\n  valid a < 3\nderive y = -f(x)", 3, rows.Stretched, -5, "f is used outside its range: valid a < 3"},
		{"law f(a) = 5\n  valid a < 3\nderive y = f(x)", 3, rows.Stretched, 5, "f is used outside its range: valid a < 3"},
		{"law f(a) = 1 / (a - a)\n  valid a < 3\nderive y = f(2) + x", 3, rows.Refused, 0, "division by zero in 1 / (a - a)"},
		{"law f(a) = 2 * a\n  valid a < 3\nderive y = f(7) + x", 3, rows.Stretched, 17, "f is used outside its range: valid a < 3"},
		// Every argument of a sheet's law counts with its declared kind.
		{"law f(t [K]) [K] = t + t\nderive y = f(x[degC])", 0, rows.Sound, 546.3, ""},
	} {
		program := mustCompile(t, "known x = 1\n"+test.sheet, catalogue)
		entry := program.Describe().EntryIndex("y")
		if entry < 0 {
			t.Errorf("%s: no entry y", test.sheet)
			continue
		}
		// One row; a number for three rows; a column among other rows.
		column := make([]float64, 2050)
		for i := range column {
			column[i] = 1
		}
		column[0], column[1023], column[1024], column[2049] = test.x, test.x, test.x, test.x
		for _, run := range []struct {
			n      int
			values []float64
			look   []int
		}{
			{1, []float64{test.x}, []int{0}},
			{3, []float64{test.x}, []int{0, 2}},
			{2050, column, []int{0, 1023, 1024, 2049}},
			{2049, column[1:], []int{1022, 1023, 2048}},
		} {
			out := runColumns(t, program, run.n, map[string][]float64{"x": run.values})
			for _, i := range run.look {
				got, state, reason := out.Values[entry][i], out.State(entry, i), program.Reasons()[out.Reason(entry, i)].Text
				if state != test.state || reason != test.reason {
					t.Errorf("%s with x = %v, row %d of %d: %s (%s), not %s (%s)", test.sheet, test.x, i, run.n, state, reason, test.state, test.reason)
					break
				}
				if state.Computed() && math.Abs(got-test.value) > 1e-12*math.Abs(test.value) || !state.Computed() && got == got {
					t.Errorf("%s with x = %v, row %d of %d: %v, not %v", test.sheet, test.x, i, run.n, got, test.value)
					break
				}
			}
		}
	}
}

// TestKnownStates goes through inputs that are refused.
func TestKnownStates(t *testing.T) {
	const sheet = `known depth [m] = 3 within 0 to 11000
known gas = "N2" or "He" or "Ar"
known wet = true
known open [m]
derive d = depth
derive g = gas == "He" ? 2 : gas == "Ar" ? 3 : 1
derive w = wet ? 1 : 0
derive o = open
`
	program := mustCompile(t, sheet, testCatalogue(t))
	for _, test := range []struct {
		known, entry string
		in           float64
		value        float64 // where it is sound
		reason       string
	}{
		{"depth", "d", 11000, 11000, ""},
		{"depth", "d", 11001, 0, "depth lies above 11000 m, the bound it is known within"},
		{"depth", "d", -1, 0, "depth lies below 0 m, the bound it is known within"},
		{"depth", "d", math.NaN(), 0, "depth has no value"},
		{"gas", "g", 0, 1, ""},
		{"gas", "g", 1, 2, ""},
		{"gas", "g", 2, 3, ""},
		{"gas", "g", 3, 0, "gas is none of its 3 choices in this row"},
		{"gas", "g", 0.5, 0, "gas is none of its 3 choices in this row"},
		{"gas", "g", -1, 0, "gas is none of its 3 choices in this row"},
		{"gas", "g", math.NaN(), 0, "gas has no value"},
		{"wet", "w", 1, 1, ""},
		{"wet", "w", 0, 0, ""},
		{"wet", "w", 2, 0, "wet is neither true nor false in this row"},
		{"open", "o", math.Inf(-1), 0, "open has no value"},
	} {
		out := runColumns(t, program, 2, map[string][]float64{test.known: {test.in, test.in}})
		entry := program.Describe().EntryIndex(test.entry)
		explanation, err := program.Explain(engine.Input{Values: inputOf(program, test.known, test.in)}, test.known)
		if err != nil {
			t.Fatal(err)
		}
		if test.reason == "" {
			if out.State(entry, 1) != rows.Sound || out.Values[entry][1] != test.value || explanation.Value != test.in || !explanation.HasValue {
				t.Errorf("%s = %v: %s, %v, explained as %v", test.known, test.in, out.State(entry, 1), out.Values[entry][1], explanation)
			}
			continue
		}
		if out.State(entry, 1) != rows.Refused || explanation.State != rows.Refused || explanation.Reason != test.reason {
			t.Errorf("%s = %v: %s, known %s: %s", test.known, test.in, out.State(entry, 1), explanation.State, explanation.Reason)
		}
	}
}

// inputOf gives an input of one row in which one known is replaced.
func inputOf(program *engine.Program, known string, value float64) [][]float64 {
	values := make([][]float64, len(program.Describe().Knowns))
	values[program.Describe().KnownIndex(known)] = []float64{value}
	return values
}

// TestRequirements goes through met, missed and waiting, with margins.
func TestRequirements(t *testing.T) {
	for _, test := range []struct {
		condition string
		x         float64
		state     rows.State
		met       float64
		margin    float64 // in the margin's unit
		unit      string  // of the margin; empty where there is none
	}{
		{"limit >= x", 2, rows.Sound, 1, 3, "kPa"},
		{"limit >= x", 5, rows.Sound, 1, 0, "kPa"},
		{"limit > x", 5, rows.Sound, 0, 0, "kPa"},
		{"limit >= 2 * x", 3, rows.Sound, 0, -1, "kPa"},
		{"x <= limit", 2, rows.Sound, 1, 3, "kPa"},
		{"x < limit", 7, rows.Sound, 0, -2, "kPa"},
		{"x == limit", 5, rows.Sound, 1, 0, ""},
		{"x < limit and x > 0[kPa]", 2, rows.Sound, 1, 0, ""},
		{"2 * x < limit / 1", 2, rows.Sound, 1, 1000, "Pa"},
		{"limit >= 1[Pa^2] / x", 0, rows.Refused, 0, 0, "kPa"},
		{"limit >= y", 0, rows.Waiting, 0, 0, "kPa"},
		{"warm > 3[degC]", 0, rows.Sound, 1, 17, "K"},
	} {
		program := mustCompile(t, "known x [kPa] = 1\nknown limit [kPa] = 5\nknown warm [degC] = 20\nderive y = 1[Pa^2] / x\nrequire r = "+test.condition, testCatalogue(t))
		out := runColumns(t, program, 1, map[string][]float64{"x": {1000 * test.x}})
		d := program.Describe()
		r := d.EntryIndex("r")
		if d.Entries[r].Role != rows.Requirement || d.Entries[r].Form != rows.Truth || out.State(r, 0) != test.state {
			t.Errorf("%s: %v, %s", test.condition, d.Entries[r], out.State(r, 0))
		}
		if test.state.Computed() && out.Values[r][0] != test.met {
			t.Errorf("%s with %v: met is %v", test.condition, test.x, out.Values[r][0])
		}
		m := d.EntryIndex("r margin")
		if (m >= 0) != (test.unit != "") {
			t.Errorf("%s: margin at %d", test.condition, m)
			continue
		}
		if m < 0 {
			continue
		}
		margin := d.Entries[m].Scale.FromSI(out.Values[m][0])
		if m != r+1 || d.Entries[m].Role != rows.Margin || d.Entries[m].Unit != test.unit || out.State(m, 0) != test.state ||
			test.state.Computed() && math.Abs(margin-test.margin) > 1e-12 {
			t.Errorf("%s with %v: margin %v %s, %s", test.condition, test.x, margin, d.Entries[m].Unit, out.State(m, 0))
		}
	}
}

// TestTallies demands the counts, the worst values and their sides.
func TestTallies(t *testing.T) {
	program := mustCompile(t, "known x = 1\nderive y = ranged(x[degC])\nderive z = y / 1[K]", testCatalogue(t))
	const n = 5000
	column := make([]float64, n)
	for i := range column {
		column[i] = 20
		switch {
		case i%1000 == 1:
			column[i] = 50 + float64(i)/1000
		case i%1000 == 2:
			column[i] = -1 - float64(i)/1000
		case i == 3333:
			column[i] = 1000
		case i == 4444 || i == 10:
			column[i] = math.NaN()
		}
	}
	out := runColumns(t, program, n, map[string][]float64{"x": column})
	type row struct {
		entry, reason string
		state         rows.State
		rows          int
		worst         float64 // in the reason's unit
		has           bool
	}
	want := []row{
		{"y", "x has no value", rows.Refused, 2, 0, false},
		{"y", "lies below 0 degC", rows.Stretched, 5, -5.002, true},
		{"y", "lies above 40 degC", rows.Stretched, 5, 54.001, true},
		{"y", "lies at or above 90 degC", rows.Refused, 1, 1000, true},
		{"z", "lies below 0 degC", rows.Stretched, 5, -5.002, true},
		{"z", "lies above 40 degC", rows.Stretched, 5, 54.001, true},
		{"z", "waits for y", rows.Waiting, 3, 0, false},
	}
	if len(out.Tallies) != len(want) {
		t.Fatalf("tallies %v", out.Tallies)
	}
	for i, tally := range out.Tallies {
		reason := program.Reasons()[tally.Reason]
		worst := 0.0
		if tally.HasWorst {
			worst = reason.Scale.FromSI(tally.Worst)
		}
		name := program.Describe().Entries[tally.Entry].Name
		w := want[i]
		if name != w.entry || !strings.Contains(reason.Text, w.reason) || tally.State != w.state || tally.Rows != w.rows || tally.HasWorst != w.has || math.Abs(worst-w.worst) > 1e-9 {
			t.Errorf("tally %d: %s: %s, %s, %d rows, worst %v %v; wanted %+v", i, name, reason.Text, tally.State, tally.Rows, worst, tally.HasWorst, w)
		}
	}
}

// TestTextArguments runs a law for each choice of a text known.
func TestTextArguments(t *testing.T) {
	program := mustCompile(t, "known w = \"one\" or \"three\"\nderive y = worded(w)\nderive z = worded(\"three\")\nderive p = paired(w, w)\nderive q = paired(w, \"seven\")", testCatalogue(t))
	out := runColumns(t, program, 3, map[string][]float64{"w": {0, 1, 0}})
	for i, want := range []float64{3, 5, 3} {
		if out.Values[0][i] != want || out.Values[1][i] != 5 || out.Values[2][i] != 2*want || out.Values[3][i] != want+5 {
			t.Errorf("row %d: %v", i, out.Values)
		}
	}
}
