package host

import (
	"context"
	"errors"
	"math"
	"math/rand/v2"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"plumbrule/engine/rows"
	"plumbrule/wasm/abi"
)

// sessions begins a session natively and one in the module.
func sessions(t *testing.T, m *Module, text string) (program rows.Program, native, module rows.Session) {
	t.Helper()
	a, b := both(t, m, text, nil)
	native, err := a.NewSession(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	module, err = b.NewSession(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() { module.Close() })
	return b, native, module
}

// update updates both sessions and demands the same changes, bits, states and
// reasons.
func update(t *testing.T, program rows.Program, native, module rows.Session, restarted bool) {
	t.Helper()
	told, err := native.Update(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	toldToo, err := module.Update(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	if !restarted && !slices.Equal(told, toldToo) {
		t.Fatalf("changes: %v natively, %v in the module", told, toldToo)
	}
	for e := range program.Describe().Entries {
		x, state, reason := native.Entry(e)
		y, stateToo, reasonToo := module.Entry(e)
		if math.Float64bits(x) != math.Float64bits(y) && !(math.IsNaN(x) && math.IsNaN(y)) || state != stateToo || reason != reasonToo {
			t.Fatalf("%s: %v %v %d natively, %v %v %d in the module", program.Describe().Entries[e].Name, x, state, reason, y, stateToo, reasonToo)
		}
	}
}

func TestSessionsGiveTheSameBits(t *testing.T) {
	m := open(t, Config{})
	for _, name := range []string{"mooring", "gondola", "release", "pressure-case"} {
		t.Run(name, func(t *testing.T) {
			text, err := os.ReadFile(filepath.Join("../../testdata/sheets", name+".plumb"))
			if err != nil {
				t.Fatal(err)
			}
			program, native, module := sessions(t, m, string(text))
			random := rand.New(rand.NewPCG(7, 9))
			knowns := program.Describe().Knowns
			for range 50 {
				k := random.IntN(len(knowns))
				value := column(knowns[k].Value, 100, k)[random.IntN(100)]
				if err := errors.Join(native.Set(k, value), module.Set(k, value)); err != nil {
					t.Fatal(err)
				}
				update(t, program, native, module, false)
			}
		})
	}
}

// TestSessionBeginsAgain loses the session's instance and shows that the next
// update has all that was set.
func TestSessionBeginsAgain(t *testing.T) {
	m := open(t, Config{}.WithInstances(1))
	program, native, module := sessions(t, m, "known a = 1\nknown b = 2\nderive c = a + b\nderive d = 2 * c")
	if err := errors.Join(native.Set(0, 5), module.Set(0, 5)); err != nil {
		t.Fatal(err)
	}
	update(t, program, native, module, false)
	i := module.(*session).home
	junk := []byte(strings.Repeat("\xff", 1<<16))
	for at := uint32(0); at+uint32(len(junk)) <= i.memory.Size(); at += uint32(len(junk)) {
		i.memory.Write(at, junk)
	}
	if err := errors.Join(native.Set(1, 7), module.Set(1, 7)); err != nil {
		t.Fatal(err)
	}
	if _, err := module.Update(context.Background()); err == nil || !i.dead {
		t.Fatal("a corrupted instance did not trap")
	}
	update(t, program, native, module, true)
	if value, _, _ := module.Entry(1); value != 24 {
		t.Errorf("d = %v", value)
	}
}

func TestSessionFaults(t *testing.T) {
	m := open(t, Config{}.WithInstances(1))
	ctx := context.Background()
	_, _, module := sessions(t, m, "known a = 1\nderive b = 2 * a")
	if module.Set(1, 0) == nil || module.Set(-1, 0) == nil {
		t.Error("a known that is not there can be set")
	}
	i := module.(*session).home
	number, in, out := uint64(module.(*session).number), uint64(i.in.place), uint64(i.out.place)
	for _, test := range []struct {
		name      string
		arguments []uint64
		code      abi.Code
	}{
		{"no such session", []uint64{99, 0, in, out}, abi.NoSuch},
		{"negative number of changes", []uint64{number, uint64(uint32(0xFFFFFFFF)), in, out}, abi.BadInput},
		{"input outside any buffer", []uint64{number, 1, 3, out}, abi.BadInput},
		{"more changes than the buffer holds", []uint64{number, 1 << 20, in, out}, abi.BadInput},
		{"output outside any buffer", []uint64{number, 0, in, 3}, abi.BadInput},
	} {
		if code, err := i.call(ctx, abi.ExportUpdate, test.arguments...); err != nil || abi.Code(int32(code)) != test.code {
			t.Errorf("%s: code %d, %v", test.name, code, err)
		}
	}
	if number, err := i.call(ctx, abi.ExportSession, 99); err != nil || number != 0 {
		t.Errorf("a session of no program: %d, %v", number, err)
	}
	module.Close()
	if _, err := module.Update(ctx); err == nil {
		t.Error("a closed session updates")
	}
}
