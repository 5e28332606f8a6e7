package host

import (
	"context"
	"errors"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strings"
	"sync"
	"testing"
	"time"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
	"plumbrule/wasm/abi"
	"plumbrule/wasm/moduletest"
)

func open(t testing.TB, config Config) *Module {
	t.Helper()
	code, err := os.ReadFile(moduletest.Path(t))
	if err != nil {
		t.Fatal(err)
	}
	m, err := Load(context.Background(), code, config)
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() { m.Close(context.Background()) })
	return m
}

// both compiles a sheet natively and in the module.
func both(t *testing.T, m *Module, text string, choices map[string][]string) (native, module rows.Program) {
	t.Helper()
	ctx := context.Background()
	native, err := engine.Native{Catalogue: functions.All()}.Compile(ctx, text, choices)
	if err != nil {
		t.Fatal(err)
	}
	module, err = m.Compile(ctx, text, choices)
	if err != nil {
		t.Fatal(err)
	}
	return native, module
}

// same demands equal numbers to the last bit, equal states, reasons and
// tallies of two runs.
func same(t *testing.T, a, b *rows.Outcome) {
	t.Helper()
	if len(a.Values) != len(b.Values) || a.Rows != b.Rows {
		t.Fatalf("%d entries of %d rows against %d of %d", len(a.Values), a.Rows, len(b.Values), b.Rows)
	}
	for e := range a.Values {
		for i := range a.Values[e] {
			x, y := a.Values[e][i], b.Values[e][i]
			if math.Float64bits(x) != math.Float64bits(y) && !(math.IsNaN(x) && math.IsNaN(y)) {
				t.Fatalf("entry %d row %d: %v (%x) against %v (%x)", e, i, x, math.Float64bits(x), y, math.Float64bits(y))
			}
			if a.State(e, i) != b.State(e, i) || a.Reason(e, i) != b.Reason(e, i) {
				t.Fatalf("entry %d row %d: state %v reason %d against %v %d", e, i, a.State(e, i), a.Reason(e, i), b.State(e, i), b.Reason(e, i))
			}
		}
	}
	if fmt.Sprint(a.Tallies) != fmt.Sprint(b.Tallies) {
		t.Fatalf("tallies %v against %v", a.Tallies, b.Tallies)
	}
}

// column gives n numbers around a value, some far outside, some missing.
func column(value float64, n, seed int) []float64 {
	numbers := make([]float64, n)
	for i := range numbers {
		step := float64((i*2654435761+seed*40503)%10007) / 10007
		switch {
		case i%97 == 13:
			numbers[i] = math.NaN()
		case i%89 == 7:
			numbers[i] = value * -3
		default:
			numbers[i] = value * (0.5 + step)
		}
	}
	return numbers
}

func TestDemoSheetsGiveTheSameBits(t *testing.T) {
	paths, _ := filepath.Glob("../../testdata/sheets/*.plumb")
	if len(paths) == 0 {
		t.Fatal("no demo sheets")
	}
	m := open(t, Config{})
	for _, path := range paths {
		t.Run(filepath.Base(path), func(t *testing.T) {
			text, err := os.ReadFile(path)
			if err != nil {
				t.Fatal(err)
			}
			native, module := both(t, m, string(text), nil)
			sizes := []int{0, 1, 7, 1100}
			if filepath.Base(path) == "release.plumb" {
				sizes = append(sizes, 300_000) // split over the pool's instances
			}
			for _, n := range sizes {
				in := rows.Input{Rows: n, Values: make([][]float64, len(native.Describe().Knowns))}
				for k, known := range native.Describe().Knowns {
					if n > 1 && k%2 == 0 && known.Form == rows.Number {
						in.Values[k] = column(known.Value, n, k)
					}
				}
				var a, b rows.Outcome
				if err := native.Run(context.Background(), in, &a); err != nil {
					t.Fatal(err)
				}
				if err := module.Run(context.Background(), in, &b); err != nil {
					t.Fatal(err)
				}
				same(t, &a, &b)
			}
			if fmt.Sprint(native.Describe()) != fmt.Sprint(module.Describe()) {
				t.Errorf("descriptions differ:\n%v\n%v", native.Describe(), module.Describe())
			}
			if fmt.Sprint(native.Reasons()) != fmt.Sprint(module.Reasons()) {
				t.Error("the tables of reasons differ")
			}
		})
	}
}

const choiceSheet = `
known gas = "N2" or "He"
known warm = true
known T [K] = 300
derive M [g/mol] = molar_mass(gas)
derive t [K] = warm ? T : T / 2
`

func TestChoicesTravelAsIndices(t *testing.T) {
	m := open(t, Config{})
	native, module := both(t, m, choiceSheet, map[string][]string{"gas": {"CO2"}})
	in := rows.Input{Rows: 4, Values: [][]float64{{0, 1, 2, 0}, {1, 0, 1, 0}, nil}}
	var a, b rows.Outcome
	if err := errors.Join(native.Run(context.Background(), in, &a), module.Run(context.Background(), in, &b)); err != nil {
		t.Fatal(err)
	}
	same(t, &a, &b)
	if got := a.Values[0][2]; math.Abs(got-0.044009) > 1e-9 {
		t.Errorf("molar mass of the added choice CO2: %v kg/mol", got)
	}
}

func TestProblemsComeThrough(t *testing.T) {
	m := open(t, Config{})
	const text = "known p [kPa] = 100\nderive x [m] = p + 1[s]\nderive y = nope"
	_, nativeErr := engine.Compile(text, functions.All())
	_, moduleErr := m.Compile(context.Background(), text, nil)
	var a, b *rows.SheetError
	if !errors.As(nativeErr, &a) || !errors.As(moduleErr, &b) {
		t.Fatalf("%v; %v", nativeErr, moduleErr)
	}
	if fmt.Sprint(a.Problems) != fmt.Sprint(b.Problems) || len(a.Problems) != 2 {
		t.Errorf("%v\n%v", a.Problems, b.Problems)
	}
}

func TestDeadlineIsKeptBetweenBlocks(t *testing.T) {
	m := open(t, Config{}.WithInstances(1))
	program, err := m.Compile(context.Background(), "known x [1] = 1\nderive y = exp(sin(x)) ^ 1.5", nil)
	if err != nil {
		t.Fatal(err)
	}
	ctx, cancel := context.WithTimeout(context.Background(), 20*time.Millisecond)
	defer cancel()
	n := 20_000_000
	in := rows.Input{Rows: n, Values: [][]float64{make([]float64, n)}}
	var out rows.Outcome
	if err := program.Run(ctx, in, &out); !errors.Is(err, context.DeadlineExceeded) {
		t.Fatalf("a run beyond its deadline gives %v", err)
	}
	if err := program.Run(context.Background(), rows.Input{Rows: 1}, &out); err != nil {
		t.Fatalf("the module does not go on after a deadline: %v", err)
	}
}

// TestTrapCostsOneInstance traps an instance by a call with a wrong pointer
// inside the engine's memory and shows that the pool goes on.
func TestTrapCostsOneInstance(t *testing.T) {
	m := open(t, Config{}.WithInstances(1))
	ctx := context.Background()
	program, err := m.Compile(ctx, "known x [1] = 2\nderive y = x * x", nil)
	if err != nil {
		t.Fatal(err)
	}
	i, err := m.take(ctx)
	if err != nil {
		t.Fatal(err)
	}
	// Overwriting the instance's memory is no call of the agreement; it stands
	// for a defect that corrupts the engine.
	size := i.memory.Size()
	junk := []byte(strings.Repeat("\xff", 1<<16))
	for at := uint32(0); at+uint32(len(junk)) <= size; at += uint32(len(junk)) {
		i.memory.Write(at, junk)
	}
	_, err = i.call(ctx, abi.ExportCatalogue)
	if err == nil || !i.dead {
		t.Fatal("a corrupted instance did not trap")
	}
	m.give(ctx, i)
	var out rows.Outcome
	if err := program.Run(ctx, rows.Input{Rows: 1}, &out); err != nil {
		t.Fatalf("the pool does not go on after a trap: %v", err)
	}
	if out.Values[0][0] != 4 {
		t.Errorf("y = %v", out.Values[0][0])
	}
}

func TestFaultsAreNoTraps(t *testing.T) {
	m := open(t, Config{}.WithInstances(1))
	ctx := context.Background()
	i, err := m.take(ctx)
	if err != nil {
		t.Fatal(err)
	}
	defer m.give(ctx, i)
	cases := []struct {
		name      string
		export    abi.Export
		arguments []uint64
		fault     string
	}{
		{"unknown program", abi.ExportReasons, []uint64{99}, "not open"},
		{"text outside any buffer", abi.ExportCompile, []uint64{12345, 10, 0, 0}, "reserved buffer"},
		{"length beyond the buffer", abi.ExportCompile, []uint64{uint64(i.in.place), 1 << 30, 0, 0}, "reserved buffer"},
		{"negative length", abi.ExportCompile, []uint64{0, uint64(uint32(0xFFFFFFFF)), 0, 0}, "reserved buffer"},
	}
	for _, c := range cases {
		doc, err := i.call(ctx, c.export, c.arguments...)
		if err != nil || doc != 0 {
			t.Fatalf("%s: %v, document %x", c.name, err, doc)
		}
		if fault := i.fault(ctx); !strings.Contains(fault.Error(), c.fault) {
			t.Errorf("%s: fault %v", c.name, fault)
		}
	}
	for _, arguments := range [][]uint64{{99, 1, 0, 0}, {1, 1, 4, 4}, {1, 1 << 21, 0, 0}, {1, uint64(uint32(0xFFFFFFFF)), 0, 0}} {
		code, err := i.call(ctx, abi.ExportRun, arguments...)
		if err != nil || code == 0 {
			t.Errorf("run%v: code %d, %v", arguments, code, err)
		}
	}
	if place, err := i.call(ctx, abi.ExportReserve, abi.MostBuffer+1); err != nil || place != 0 {
		t.Errorf("a buffer beyond the limit is at %d, %v", place, err)
	}
}

func TestMemoryIsCapped(t *testing.T) {
	m := open(t, Config{}.WithMemory(64<<20).WithInstances(1))
	ctx := context.Background()
	i, err := m.take(ctx)
	if err != nil {
		t.Fatal(err)
	}
	var failed error
	for range 40 {
		if _, failed = i.call(ctx, abi.ExportReserve, 8<<20); failed != nil {
			break
		}
	}
	if failed == nil {
		t.Error("an instance reserved 320 MB under a cap of 64 MB")
	}
	m.give(ctx, i)
	if _, err := m.Compile(ctx, "derive x = 1 + 1", nil); err != nil {
		t.Errorf("the pool does not go on: %v", err)
	}
}

func TestManyGoroutinesShareAProgram(t *testing.T) {
	m := open(t, Config{}.WithInstances(2))
	_, program := both(t, m, "known x [1] = 2\nderive y = exp(x)", nil)
	var group sync.WaitGroup
	for g := range 8 {
		group.Go(func() {
			var out rows.Outcome
			for n := range 20 {
				in := rows.Input{Rows: n + 1, Values: [][]float64{column(float64(g+1), n+1, g)}}
				if err := program.Run(context.Background(), in, &out); err != nil {
					t.Error(err)
				}
			}
		})
	}
	group.Wait()
}

func TestClosedModule(t *testing.T) {
	m := open(t, Config{})
	program, err := m.Compile(context.Background(), "derive x = 1 + 1", nil)
	if err != nil {
		t.Fatal(err)
	}
	m.Close(context.Background())
	var out rows.Outcome
	if err := program.Run(context.Background(), rows.Input{Rows: 1}, &out); !errors.Is(err, ErrClosed) {
		t.Errorf("a run after Close gives %v", err)
	}
	if _, err := Load(context.Background(), []byte("no module"), Config{}); err == nil {
		t.Error("any bytes are taken for a module")
	}
}
