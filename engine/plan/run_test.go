package plan

import (
	"context"
	"errors"
	"math"
	"strings"
	"sync"
	"testing"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/engine/rows"
)

// mixed is a sheet with every kind of step, and with rows in every state.
const mixed = `u = exp(a) / b + c
v = a > 0 ? ln(a) : b * c
w = u * v - hypot(a, c)^1.5
list = sum([a, b, c, w]) + interpolate(a, [-1, 0, 1], [b, 1, 2])
truth = u > v and not (w == 0) or c < a
low = limited(a) + limited(2)
same = a
fixed = 2 * sqrt(2) + limited(12)
once = exp(c) + 1 / c`

func limited() *law.Law {
	return &law.Law{Name: "limited", Gives: "three times its argument", Source: "made for this test", Body: law.Of1(func(a float64) float64 { return 3 * a }),
		Parameters: []law.Parameter{{Name: "a", Unit: "1", Valid: law.Within(-2, 2), Finite: law.AtMost(20)}}, Result: law.Result{Unit: "1"}}
}

// TestRowByRow holds runs of every length, with every number of workers, with
// inputs as columns and as single numbers, against rows that run alone.
func TestRowByRow(t *testing.T) {
	p := planned(t, "a b c", mixed, limited())
	const most = 10_000
	a, b, c := rising(1, most), rising(2, most), []float64{0.75}
	a[5], a[1500], b[9000] = math.NaN(), math.Inf(1), math.NaN()
	constant := make([]float64, most)
	for i := range constant {
		constant[i] = c[0]
	}
	// The reference: each row alone.
	type cell struct {
		value  float64
		state  rows.State
		reason int
	}
	reference := make([][]cell, most)
	var out rows.Outcome
	for i := range reference {
		if err := p.Run(context.Background(), rows.Input{Rows: 1, Values: [][]float64{a[i : i+1], b[i : i+1], c}}, &out, 1); err != nil {
			t.Fatal(err)
		}
		reference[i] = make([]cell, len(p.entries))
		for e := range p.entries {
			reference[i][e] = cell{out.Values[e][0], out.State(e, 0), out.Reason(e, 0)}
		}
	}
	states := map[rows.State]int{}
	for _, n := range []int{1, 2, 7, 1023, 1024, 1025, 2048, 4097, most} {
		for _, workers := range []int{1, 2, 5} {
			for _, third := range [][]float64{c, constant[:n]} {
				if err := p.Run(context.Background(), rows.Input{Rows: n, Values: [][]float64{a[:n], b[:n], third}}, &out, workers); err != nil {
					t.Fatal(err)
				}
				counted := map[[2]int]int{}
				for e := range p.entries {
					for i := 0; i < n; i++ {
						want := reference[i][e]
						if !sameBits(out.Values[e][i], want.value) || out.State(e, i) != want.state || out.Reason(e, i) != want.reason {
							t.Fatalf("%s, row %d of %d, %d workers: %v %s %s, alone %v %s %s", p.entries[e], i, n, workers,
								out.Values[e][i], out.State(e, i), p.reasons[out.Reason(e, i)].Text, want.value, want.state, p.reasons[want.reason].Text)
						}
						states[want.state]++
						if want.state != rows.Sound {
							counted[[2]int{e, want.reason}]++
						}
					}
				}
				for _, tally := range out.Tallies {
					if tally.Rows != counted[[2]int{tally.Entry, tally.Reason}] {
						t.Errorf("%d rows, %d workers: tally %v, counted %d", n, workers, tally, counted[[2]int{tally.Entry, tally.Reason}])
					}
					delete(counted, [2]int{tally.Entry, tally.Reason})
				}
				if len(counted) > 0 {
					t.Errorf("%d rows, %d workers: no tally for %v", n, workers, counted)
				}
			}
		}
	}
	for state := rows.Sound; state <= rows.Refused; state++ {
		if states[state] == 0 {
			t.Errorf("no row was %s", state)
		}
	}
}

// sound is a sheet whose every row is sound for inputs between 0 and 2: sums of
// products by numbers, nested choices, branches that share parts with entries,
// and values that are entries themselves.
const sound = `u = 3 * a + 2 * b
v = exp(-2 * a) * 5 - c * b
w = a > b ? exp(b) * 2 + u : (b > 1 ? -(-b) - a / 3 : sin(u) * v)
x = a > b ? 1 / (a - b) : w
y = limited(a) * c + (u > 4 ? limited(b) : u)
z = w
same = a
twice = 2 * w + 2 * w
p = a > 1 ? (b > 1 ? -(-a) : -(-b)) : (b > 1 ? a * b * 3 : a * 4 / (b * 5))
q = 2 * a - 7
r = 7 - 2 * a
s = (2 * a) * (3 * b) / (4 * c)
t = (c > 0.5 ? a : b) + (b > 0.5 or a > 1.5 ? p : q)`

// TestSoundBlocks holds blocks without any row to refuse, and the same blocks
// with one such row in them, against rows that run alone.
func TestSoundBlocks(t *testing.T) {
	p := planned(t, "a b c", sound, limited())
	const most = 5000
	a, b, c := make([]float64, most), make([]float64, most), []float64{0.75}
	for i := range a {
		a[i], b[i] = 1+math.Sin(float64(i*i)), 1+math.Cos(float64(3*i))
	}
	for _, test := range []struct {
		name string
		c    []float64
		bad  int // row with a missing input
	}{{"sound", c, -1}, {"refused", c, 4444}, {"refused", c, 0}} {
		in := append([]float64(nil), a...)
		if test.bad >= 0 {
			in[test.bad] = math.NaN()
		}
		column := make([]float64, most)
		for i := range column {
			column[i] = test.c[0]
		}
		for _, third := range [][]float64{test.c, column} {
			out := runs(t, p, 2, most, in, b, third)
			for i := range in {
				one := runs(t, p, 1, 1, in[i:i+1], b[i:i+1], test.c)
				for e := range p.entries {
					if !sameBits(out.Values[e][i], one.Values[e][0]) || out.State(e, i) != one.State(e, 0) || (i != test.bad && one.State(e, 0) != rows.Sound) {
						t.Fatalf("%s, %s, row %d: %v (%s), alone %v (%s)", test.name, p.entries[e], i, out.Values[e][i], out.State(e, i), one.Values[e][0], one.State(e, 0))
					}
				}
			}
		}
	}
}

func TestInputs(t *testing.T) {
	p := planned(t, "a b=", "u = a + b")
	nan := math.NaN()
	for _, test := range []struct {
		n      int
		values [][]float64
		want   []float64 // NaN: no number
		fails  string
	}{
		{0, nil, []float64{}, ""},
		{0, [][]float64{{}, {}}, []float64{}, ""},
		{0, [][]float64{{1}, {2}}, []float64{}, ""},
		{1, [][]float64{nil, {2}}, []float64{3}, ""},
		{1, nil, []float64{nan}, ""},
		{2, [][]float64{{1, 2}}, []float64{nan, nan}, ""},
		{2, [][]float64{{1, 2}, {10}}, []float64{11, 12}, ""},
		{2, [][]float64{nil, {10, 20}}, []float64{11, 21}, ""},
		{2, [][]float64{{1, nan}, {10, 20}}, []float64{11, nan}, ""},
		{2, [][]float64{{nan}, {10, 20}}, []float64{nan, nan}, ""},
		{-1, nil, nil, "the number of rows is negative"},
		{2, [][]float64{{1, 2, 3}}, nil, "the column of a has 3 rows, the run 2"},
		{1, [][]float64{nil, {1, 2}}, nil, "the column of b has 2 rows, the run 1"},
		{0, [][]float64{{1, 2}}, nil, "the column of a has 2 rows, the run 0"},
		{2, [][]float64{nil, nil, nil}, nil, "the input has 3 columns, the sheet 2 knowns"},
	} {
		var out rows.Outcome
		err := p.Run(context.Background(), rows.Input{Rows: test.n, Values: test.values}, &out, 2)
		if test.fails != "" {
			if err == nil || err.Error() != test.fails {
				t.Errorf("%d rows of %v: %v", test.n, test.values, err)
			}
			continue
		}
		if err != nil || out.Rows != test.n || len(out.Values[0]) != len(test.want) {
			t.Errorf("%d rows of %v: %v, %v", test.n, test.values, err, out.Values)
			continue
		}
		for i, want := range test.want {
			if !sameBits(out.Values[0][i], want) || out.State(0, i).Computed() != (want == want) {
				t.Errorf("%d rows of %v: row %d: %v, %s", test.n, test.values, i, out.Values[0][i], out.State(0, i))
			}
		}
	}
}

// A run looks at its context between blocks of rows.
func TestCancelled(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	blocks := 0
	stop := &law.Law{Name: "stop", Gives: "its argument", Source: "made for this test", Parameters: []law.Parameter{{Name: "a", Unit: "1"}}, Result: law.Result{Unit: "1"},
		Body: func(dst []float64, a []law.Argument, _ *law.Work) {
			copy(dst, a[0].Values)
			if blocks++; blocks == 3 {
				cancel()
			}
		}}
	p := planned(t, "a", "u = stop(a)", stop)
	var out rows.Outcome
	in := rows.Input{Rows: 100 * blockRows, Values: [][]float64{make([]float64, 100*blockRows)}}
	if err := p.Run(ctx, in, &out, 1); !errors.Is(err, context.Canceled) || blocks != 3 {
		t.Errorf("%v after %d blocks", err, blocks)
	}
	if err := p.Run(ctx, in, &out, 1); !errors.Is(err, context.Canceled) || blocks != 3 {
		t.Errorf("%v after %d blocks", err, blocks)
	}
	// The program serves on.
	if err := p.Run(context.Background(), in, &out, 1); err != nil || blocks != 103 {
		t.Errorf("%v after %d blocks", err, blocks)
	}
}

// TestConcurrentRuns runs one program in many goroutines with other shapes and
// lengths at once; the race detector watches it where it is on.
func TestConcurrentRuns(t *testing.T) {
	p := planned(t, "a b c", mixed, limited())
	const n = 6000
	a, b := rising(1, n), rising(2, n)
	want := runs(t, p, 1, n, a, b, []float64{0.75})
	var group sync.WaitGroup
	for g := 0; g < 8; g++ {
		group.Go(func() {
			var out rows.Outcome
			for round := 0; round < 4; round++ {
				length := n - 700*round - 13*g
				third := []float64{0.75}
				if (round+g)%2 == 1 {
					third = make([]float64, length)
					for i := range third {
						third[i] = 0.75
					}
				}
				if err := p.Run(context.Background(), rows.Input{Rows: length, Values: [][]float64{a[:length], b[:length], third}}, &out, 1+g%3); err != nil {
					t.Error(err)
					return
				}
				for e := range out.Values {
					for i := 0; i < length; i++ {
						if !sameBits(out.Values[e][i], want.Values[e][i]) || out.State(e, i) != want.State(e, i) {
							t.Errorf("%s, row %d: %v, not %v", p.entries[e], i, out.Values[e][i], want.Values[e][i])
							return
						}
					}
				}
			}
		})
	}
	group.Wait()
}

// The bodies of laws get columns as long as the block, or single numbers, and
// never their own result as an argument.
func TestBodiesSeeBlocks(t *testing.T) {
	checked := &law.Law{Name: "checked", Gives: "the sum of its arguments", Source: "made for this test", Parameters: []law.Parameter{{Name: "a", Unit: "1"}, {Name: "b", Unit: "1"}}, Result: law.Result{Unit: "1"}}
	checked.Body = func(dst []float64, a []law.Argument, _ *law.Work) {
		for k := range a {
			values := a[k].Values
			if len(values) != 1 && len(values) != len(dst) || &values[0] == &dst[0] {
				t.Errorf("argument %d has %d rows, the block %d", k, len(values), len(dst))
			}
		}
		for i := range dst {
			dst[i] = a[0].At(i) + a[1].At(i)
		}
	}
	p := planned(t, "a b", "u = checked(checked(a, b), checked(b, 2))\nv = checked(u, u)\nw = checked(checked(b, b), v)", checked)
	for _, n := range []int{1, 5, 1025, 3000} {
		a := rising(3, n)
		out := runs(t, p, 2, n, a, []float64{4})
		for i := range a {
			if u := (a[i] + 4) + 6; out.Values[1][i] != u+u || out.Values[2][i] != 8+(u+u) {
				t.Fatalf("row %d: %v", i, out.Values)
			}
		}
	}
}

// A program's cost counts its operations.
func TestCost(t *testing.T) {
	for _, test := range []struct {
		text string
		cost int
	}{
		{"u = a", 0}, {"u = a + b", 1}, {"u = a + b + 1", 2}, {"u = exp(a)", 10}, {"u = a^b", 20}, {"u = 2 * 3", 0}, {"u = sum([a, b])", 54},
	} {
		if got := planned(t, "a b", test.text).Cost(); got != test.cost {
			t.Errorf("%s costs %d, not %d", test.text, got, test.cost)
		}
	}
}

// Every reason that a run gives is told once in the table.
func TestReasons(t *testing.T) {
	p := planned(t, "a b c", mixed, limited())
	seen := map[string]bool{}
	for i, reason := range p.Reasons() {
		if i > 0 && reason.Text == "" || seen[reason.Text] {
			t.Errorf("reason %d: %q", i, reason.Text)
		}
		seen[reason.Text] = true
		if strings.HasSuffix(reason.Text, ".") {
			t.Errorf("a full stop ends %q", reason.Text)
		}
	}
}

// BenchmarkRun measures the column path of a formula with a division, an
// exponential and a choice, with one worker.
func BenchmarkRun(b *testing.B) {
	p := planned(b, "a b", "u = exp(-a * a) / (1 + b * b) + (a > b ? a : b)")
	const n = 100_000
	in := rows.Input{Rows: n, Values: [][]float64{rising(1, n), rising(2, n)}}
	var out rows.Outcome
	for b.Loop() {
		if err := p.Run(context.Background(), in, &out, 1); err != nil {
			b.Fatal(err)
		}
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/n, "ns/row")
}

// TestOneRowByManyGoroutines runs one program of one row in many goroutines:
// one at a time has the worker that is kept for it, the others do without.
func TestOneRowByManyGoroutines(t *testing.T) {
	p := planned(t, "a b", "x = a * exp(b)\ny = x + 1\nz = a > b ? x : y")
	var group sync.WaitGroup
	for g := range 8 {
		group.Go(func() {
			var out rows.Outcome
			a, b := float64(g), 1/float64(g+1)
			for range 500 {
				if err := p.Run(context.Background(), rows.Input{Rows: 1, Values: [][]float64{{a}, {b}}}, &out, 1); err != nil {
					t.Error(err)
					return
				}
				if x := float64(a * column.Exp(b)); out.Values[0][0] != x || out.Values[1][0] != x+1 {
					t.Errorf("goroutine %d: %v", g, out.Values)
					return
				}
			}
		})
	}
	group.Wait()
}
