package engine_test

import (
	"context"
	"fmt"
	"math"
	"math/rand/v2"
	"os"
	"path/filepath"
	"runtime"
	"slices"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

// sheetsWithStates are small sheets in which changes move states about.
var sheetsWithStates = map[string]string{
	"choice":   "known a = 1\nknown b = 2\nknown on = true\nderive x = on ? ln(a) : 1 / b\nderive y = x + 1\nderive z = min(a, b)\nderive w = z * 2\nrequire r = w > 1",
	"range":    "known h [m] = 100 within 0 to 1e4\nknown T [K]\nderive p [Pa] = 1[atm] * exp(-h / (29.27[m/K] * T))\nderive q = p / 1[bar]\nderive n = h / 1[km]",
	"guard":    "known a = 1\nlaw half(x) = x / 2\n    valid x >= 0\nderive b = half(a)\nderive c = b + 1\nderive d = a > 0 or b > 0 ? 1 : 0",
	"law":      "known s = 35\nknown t [degC] = 10\nknown p [dbar] = 0\nderive rho = sea_water_density(s, t, p)\nderive twice = 2 * rho\nderive other = t - 1[degC]",
	"constant": "known a = 1\nderive b = 1 + 1\nderive c = 2",
}

// TestSessionIsARunOfOneRow changes knowns at random and demands the numbers,
// states and reasons of a run of one row, and that every entry that changed is
// told.
func TestSessionIsARunOfOneRow(t *testing.T) {
	sheets := map[string]string{}
	for name, text := range sheetsWithStates {
		sheets[name] = text
	}
	paths, _ := filepath.Glob("../testdata/sheets/*.plumb")
	if len(paths) == 0 {
		t.Fatal("no demo sheets")
	}
	for _, path := range paths {
		text, err := os.ReadFile(path)
		if err != nil {
			t.Fatal(err)
		}
		sheets[filepath.Base(path)] = string(text)
	}
	for name, text := range sheets {
		t.Run(name, func(t *testing.T) {
			program, err := engine.Compile(text, functions.All())
			if err != nil {
				t.Fatal(err)
			}
			session, err := program.NewSession(context.Background())
			if err != nil {
				t.Fatal(err)
			}
			defer session.Close()
			random := rand.New(rand.NewPCG(1, uint64(len(text))))
			knowns := program.Describe().Knowns
			in := rows.Input{Rows: 1, Values: make([][]float64, len(knowns))}
			var before, now rows.Outcome
			for step := range 200 {
				for range min(step, 1+random.IntN(2)) {
					k := random.IntN(len(knowns))
					value := changedValue(random, &knowns[k])
					in.Values[k] = []float64{value}
					if err := session.Set(k, value); err != nil {
						t.Fatal(err)
					}
				}
				if err := program.Run(context.Background(), in, &now); err != nil {
					t.Fatal(err)
				}
				changed, err := session.Update(context.Background())
				if err != nil {
					t.Fatal(err)
				}
				for e := range now.Values {
					value, state, reason := session.Entry(e)
					if want := now.Values[e][0]; !sameNumber(value, want) || state != now.State(e, 0) || reason != now.Reason(e, 0) {
						t.Fatalf("step %d, %s: %v %v %q, the run gives %v %v %q", step, program.Describe().Entries[e].Name,
							value, state, program.Reasons()[reason].Text, want, now.State(e, 0), program.Reasons()[now.Reason(e, 0)].Text)
					}
					other := step == 0 || !sameNumber(before.Values[e][0], now.Values[e][0]) || before.State(e, 0) != now.State(e, 0) || before.Reason(e, 0) != now.Reason(e, 0)
					if other && !slices.Contains(changed, e) {
						t.Fatalf("step %d: the change of %s is not told", step, program.Describe().Entries[e].Name)
					}
				}
				before, now = now, rows.Outcome{}
			}
		})
	}
}

func sameNumber(a, b float64) bool {
	return math.Float64bits(a) == math.Float64bits(b) || math.IsNaN(a) && math.IsNaN(b)
}

// changedValue gives a known another value: usually near its own, now and then
// far outside or missing.
func changedValue(random *rand.Rand, known *rows.Known) float64 {
	switch {
	case random.IntN(10) == 0:
		return math.NaN()
	case known.Form == rows.Truth:
		return float64(random.IntN(2))
	case known.Form == rows.Choice:
		return float64(random.IntN(len(known.Choices) + 1))
	case random.IntN(8) == 0:
		return -3 * known.Value
	case random.IntN(8) == 0:
		return known.Value
	}
	return known.Value*(0.8+0.4*random.Float64()) + float64(random.IntN(2))
}

// TestSessionTellsWhatChanged lists, in sheets where it is plain, the entries
// that a change reaches.
func TestSessionTellsWhatChanged(t *testing.T) {
	const text = "known a = 1\nknown b = 2\nderive x = a + 1\nderive y = x * b\nderive z = min(b, 5)\nderive w = 2 * z\nderive fixed = 3"
	for _, test := range []struct {
		name   string
		known  int
		value  float64
		expect []string
	}{
		{"all that reads a", 0, 4, []string{"x", "y"}},
		{"a has this value already", 0, 1, nil},
		{"all that reads b", 1, 3, []string{"w", "y", "z"}},
		{"a missing value", 1, math.NaN(), []string{"w", "y", "z"}},
	} {
		t.Run(test.name, func(t *testing.T) {
			program, err := engine.Compile(text, functions.All())
			if err != nil {
				t.Fatal(err)
			}
			session, _ := program.NewSession(context.Background())
			if _, state, _ := session.Entry(0); state != rows.Waiting {
				t.Errorf("before the first update x is %v", state)
			}
			if all, err := session.Update(context.Background()); err != nil || len(all) != 5 {
				t.Fatalf("the first update tells %v, %v", all, err)
			}
			session.Set(test.known, test.value)
			changed, err := session.Update(context.Background())
			if err != nil {
				t.Fatal(err)
			}
			var names []string
			for _, e := range changed {
				names = append(names, program.Describe().Entries[e].Name)
			}
			slices.Sort(names)
			if fmt.Sprint(names) != fmt.Sprint(test.expect) {
				t.Errorf("told: %v, not %v", names, test.expect)
			}
		})
	}
}

// A change that does not reach beyond a smallest of two ends there.
func TestSessionStopsWhereNothingChanges(t *testing.T) {
	program, err := engine.Compile("known b = 7\nderive z = min(b, 5)\nderive w = 2 * z", functions.All())
	if err != nil {
		t.Fatal(err)
	}
	session, _ := program.NewSession(context.Background())
	session.Update(context.Background())
	session.Set(0, 8)
	if changed, err := session.Update(context.Background()); err != nil || len(changed) != 0 {
		t.Errorf("told: %v, %v", changed, err)
	}
}

// TestSessionGoesOnAfterItsContext breaks an update off and finishes it with
// the next one, which tells the changes of both.
func TestSessionGoesOnAfterItsContext(t *testing.T) {
	program, err := engine.Compile(chainSheet(2000), functions.All())
	if err != nil {
		t.Fatal(err)
	}
	session, _ := program.NewSession(context.Background())
	if _, err := session.Update(context.Background()); err != nil {
		t.Fatal(err)
	}
	if session.Set(0, 2) != nil || session.Set(1, 0) == nil || session.Set(-1, 0) == nil {
		t.Error("a known that is not there can be set")
	}
	if _, err := session.Update(&endsLater{Context: context.Background(), looks: 3}); err == nil {
		t.Fatal("the context did not end the update")
	}
	changed, err := session.Update(context.Background())
	if err != nil || len(changed) != 2000 {
		t.Fatalf("%d changes told, %v", len(changed), err)
	}
	var out rows.Outcome
	if err := program.Run(context.Background(), rows.Input{Rows: 1, Values: [][]float64{{2}}}, &out); err != nil {
		t.Fatal(err)
	}
	if value, _, _ := session.Entry(1999); value != out.Values[1999][0] {
		t.Errorf("%v, the run gives %v", value, out.Values[1999][0])
	}
}

// endsLater is a context that has ended when it is looked at for the last time.
type endsLater struct {
	context.Context
	looks int
}

func (c *endsLater) Err() error {
	if c.looks--; c.looks <= 0 {
		return context.Canceled
	}
	return nil
}

// TestManyRefusedEntriesTakeLittleMemory refuses all entries of a long sheet in
// one row: states are kept for as many rows as there are.
func TestManyRefusedEntriesTakeLittleMemory(t *testing.T) {
	program, err := engine.Compile(strings.Replace(chainSheet(20_000), "e0 [m] = 1", "e0 [m]", 1), functions.All())
	if err != nil {
		t.Fatal(err)
	}
	var out rows.Outcome
	var before, after runtime.MemStats
	runtime.ReadMemStats(&before)
	if err := program.Run(context.Background(), rows.Input{Rows: 1}, &out); err != nil {
		t.Fatal(err)
	}
	runtime.ReadMemStats(&after)
	if out.State(19_999, 0) != rows.Waiting {
		t.Fatal("the last entry does not wait")
	}
	if took := after.TotalAlloc - before.TotalAlloc; took > 64<<20 {
		t.Errorf("the run takes %d bytes", took)
	}
}
