package fluid_test

import (
	"context"
	"errors"
	"math"
	"os"
	"path/filepath"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

// sheetText reads one of the project's sheets, which must be laid out tidily.
func sheetText(t *testing.T, name string) string {
	t.Helper()
	text, err := os.ReadFile(filepath.Join("..", "..", "testdata", "sheets", name))
	if err != nil {
		t.Fatal(err)
	}
	tidy, err := engine.Tidy(string(text))
	if err != nil || tidy != string(text) {
		t.Errorf("%s is not laid out tidily: %v", name, err)
	}
	return string(text)
}

// ran is a sheet after a run of one row.
type ran struct {
	t       *testing.T
	program rows.Program
	out     rows.Outcome
}

// runSheet compiles a sheet and runs it with its own values.
func runSheet(t *testing.T, name string) *ran {
	t.Helper()
	program, err := engine.Compile(sheetText(t, name), functions.All())
	if err != nil {
		t.Fatal(err)
	}
	r := &ran{t: t, program: program}
	in := rows.Input{Rows: 1, Values: make([][]float64, len(program.Describe().Knowns))}
	if err := program.Run(context.Background(), in, &r.out); err != nil {
		t.Fatal(err)
	}
	return r
}

// entry gives an entry's value in its unit, its state and its reason.
func (r *ran) entry(name string) (float64, rows.State, rows.Reason) {
	r.t.Helper()
	d := r.program.Describe()
	i := d.EntryIndex(name)
	if i < 0 {
		r.t.Fatalf("no entry %s", name)
	}
	return d.Entries[i].Scale.FromSI(r.out.Values[i][0]), r.out.State(i, 0), r.program.Reasons()[r.out.Reason(i, 0)]
}

// TestPressureCaseSheet runs the demonstration: everything is sound, every
// requirement is met, and the cautions of pressure stand in the report.
func TestPressureCaseSheet(t *testing.T) {
	r := runSheet(t, "pressure-case.plumb")
	requirements := 0
	for i, e := range r.program.Describe().Entries {
		if state := r.out.State(i, 0); state != rows.Sound {
			t.Errorf("%s is %s", e.Name, state)
		}
		if e.Role == rows.Requirement {
			requirements++
			if r.out.Values[i][0] != 1 {
				t.Errorf("%s is missed", e.Name)
			}
		}
	}
	if requirements != 6 {
		t.Errorf("%d requirements", requirements)
	}
	// Warm water at the surface makes the column lighter than the standard
	// ocean's by 0.07 %.
	column, _, _ := r.entry("p_sea")
	standard, _, _ := r.entry("p_standard")
	if ratio := column / standard; !(ratio > 0.9985 && ratio < 1) {
		t.Errorf("column %g MPa, standard ocean %g MPa", column, standard)
	}
	// A wall of just the thickness that is asked for bears just the limit.
	needed, _, _ := r.entry("wall_needed")
	inner, outer := 80.0, 80+needed
	proof, _, _ := r.entry("p_proof")
	if stress := math.Sqrt(3) * proof / (1 - inner*inner/(outer*outer)); math.Abs(stress-828/1.5) > 1e-9 {
		t.Errorf("the wall asked for bears %g MPa", stress)
	}
	cautioned := map[string]bool{}
	for _, c := range r.program.Describe().Cautions {
		cautioned[c.Law] = true
	}
	for _, law := range []string{"sea_column_pressure", "thick_cylinder_wall", "thick_cylinder_stress", "cylinder_buckling_pressure"} {
		if !cautioned[law] {
			t.Errorf("no caution of %s", law)
		}
	}
}

// TestGaugeForAbsolute asks for the one problem of the sheet that takes a gauge
// pressure for an absolute one, at its place and with what to write instead.
func TestGaugeForAbsolute(t *testing.T) {
	_, err := engine.Compile(sheetText(t, "misuse/gauge-for-absolute.plumb"), functions.All())
	var sheet *rows.SheetError
	if !errors.As(err, &sheet) || len(sheet.Problems) != 1 {
		t.Fatalf("%v", err)
	}
	p := sheet.Problems[0]
	if p.Code != problem.Kind || p.Line != 10 || p.Length != len("lid") || p.Suggestion != "convert with absolute(p, ambient)" {
		t.Errorf("%s", p.String())
	}
}

// TestMisuseStates asks for the states of entries that misuse a law.
func TestMisuseStates(t *testing.T) {
	cases := []struct {
		sheet, entry string
		state        rows.State
		law          string // named in the reason
		bound        string
	}{
		{"salinity-mix-up", "right", rows.Sound, "", ""},
		{"salinity-mix-up", "grams", rows.Stretched, "sea_water_density", "42"},
		{"salinity-mix-up", "pure_number", rows.Refused, "sea_water_density_teos", "120 g/kg"},
		{"salinity-mix-up", "column", rows.Waiting, "", ""},
		{"salinity-mix-up", "old_as_new", rows.Stretched, "sea_water_density", "40 degC"},
		{"salinity-mix-up", "new_scale", rows.Sound, "", ""},
		{"beyond-depth", "p_shelf", rows.Sound, "", ""},
		{"beyond-depth", "p_trench", rows.Stretched, "sea_pressure_at_depth", "9726 m"},
		{"beyond-depth", "p_nowhere", rows.Refused, "sea_pressure_at_depth", "15000 m"},
		{"beyond-depth", "wall", rows.Waiting, "", ""},
		{"beyond-depth", "stands_trench", rows.Stretched, "sea_pressure_at_depth", "9726 m"},
		{"beyond-depth", "stands_nowhere", rows.Waiting, "", ""},
	}
	ran := map[string]*ran{}
	for _, c := range cases {
		if ran[c.sheet] == nil {
			ran[c.sheet] = runSheet(t, "misuse/"+c.sheet+".plumb")
		}
		value, state, reason := ran[c.sheet].entry(c.entry)
		if state != c.state || reason.Law != c.law || reason.Bound != c.bound || math.IsNaN(value) == state.Computed() {
			t.Errorf("%s: %s is %s (%s, %s, %s), %v", c.sheet, c.entry, state, reason.Law, reason.Bound, reason.Text, value)
		}
	}
}
