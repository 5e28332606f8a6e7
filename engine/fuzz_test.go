package engine_test

import (
	"context"
	"errors"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/sheet"
	"plumbrule/functions"
)

// FuzzCompile compiles whole sheets. None may end in a panic; every problem
// stands inside of the text; a sheet without problems runs, gives each of its
// entries, and gives no number that is not finite.
func FuzzCompile(f *testing.F) {
	for _, pattern := range []string{"sheet/testdata/sheets/*.plumb", "sheet/testdata/bad/*.plumb", "testdata/bad/*.plumb"} {
		files, _ := filepath.Glob(pattern)
		if len(files) == 0 {
			f.Fatalf("no sheets in %s", pattern)
		}
		for _, file := range files {
			text, err := os.ReadFile(file)
			if err != nil {
				f.Fatal(err)
			}
			f.Add(string(text))
			for _, line := range strings.Split(string(text), "\n") {
				if strings.HasPrefix(line, "derive ") || strings.HasPrefix(line, "require ") {
					f.Add("known x [m] = 1\n" + line)
				}
			}
		}
	}
	for _, doc := range problem.Docs() {
		f.Add(doc.Sheet)
	}
	f.Add(explained)
	f.Fuzz(func(t *testing.T, text string) {
		if len(text) <= 20_000 {
			checkSheet(t, text)
		}
	})
}

// checkSheet compiles any text and demands what FuzzCompile tells.
func checkSheet(t *testing.T, text string) (compiled bool) {
	t.Helper()
	program, err := engine.Compile(text, functions.All())
	if err == nil {
		checkProgram(t, text, program)
		return true
	}
	var sheetError *engine.SheetError
	if !errors.As(err, &sheetError) || len(sheetError.Problems) == 0 {
		t.Fatalf("%v", err)
	}
	if !strings.ContainsRune(text, '\r') {
		checkPlaces(t, text, sheetError.Problems)
	}
	for _, p := range sheetError.Problems {
		if p.Message == "" || p.Code == "" {
			t.Fatalf("%q", p)
		}
	}
	return false
}

// checkProgram runs a program with and without its knowns replaced.
func checkProgram(t *testing.T, text string, program *engine.Program) {
	d := program.Describe()
	for _, statement := range sheet.Parse(text, &problem.List{}).Statements {
		name := ""
		switch s := statement.(type) {
		case *sheet.Derive:
			name = s.Name.Value
		case *sheet.Require:
			name = s.Name.Value
		default:
			continue
		}
		if _, err := program.Explain(engine.Input{}, name); err != nil {
			t.Fatalf("%s is not explained: %v", name, err)
		}
	}
	if d.Cost > 100_000 {
		return
	}
	column := []float64{0, 1, -1, 1e300, -1e-300, 0.5}
	for _, n := range []int{1, len(column)} {
		in := engine.Input{Rows: n}
		if n > 1 {
			for range d.Knowns {
				in.Values = append(in.Values, column)
			}
		}
		var out engine.Outcome
		if err := program.Run(context.Background(), in, &out); err != nil {
			t.Fatal(err)
		}
		for e := range out.Values {
			for i, x := range out.Values[e] {
				state := out.State(e, i)
				if finite := x-x == 0; finite != state.Computed() || (out.Reason(e, i) != 0) != (state != rows.Sound) {
					t.Fatalf("%s, row %d: %v is %s: %d", d.Entries[e].Name, i, x, state, out.Reason(e, i))
				}
			}
		}
	}
}

// TestTokens compiles sheets of tokens in random order: more of them come to
// be checked as formulas than of random bytes.
func TestTokens(t *testing.T) {
	tokens := strings.Split(`x|y|deg1|gas|wet|t.a|t.b|t|half|list|rungs|nature.k_B|nature.R|unknown|1|2|0|0.5|1e300|3|`+
		`[m]|[s]|[degC]|[deg]|[bara]|[barg]|[gpm]|[1]|[K]|[cm^-1]|[J]|[, 1]|(|)|(|)|,|[1, 2]|[0, 20][K]|"N2"|"He"|true|false|`+
		`+|-|*|/|^|+|*|-|<|>=|==|!=|and|or|not|?|:|? 1 : 2|? x : y|sqrt(|exp(|atan2(|max(|sum(|item(|interpolate(|half(|half(x)|count(|`+
		`normal_gravity(|height:|ladder(|partition_sum(|oscillator(|rungs, 300[K])|molar_mass("H2O")|sea_water_density(35, 5[degC], 0[dbar])|mean(list)|é|_|#`, "|")
	const head = `known x [m] = 2
known y = 3
known deg1 [deg] = 4
known gas = "N2" or "He"
known wet = true
table t
  a [m] | b
  1 | 2
  3 | 4
law half(a [m]) [m] = a / 2
  valid a < 9[m]
derive list = [y, 2, x / 1[m]]
derive rungs = oscillator(2331[cm^-1])
`
	random := rand.New(rand.NewPCG(3, 4))
	sheets, compiled := 20_000, 0
	if testing.Short() {
		sheets = 2_000
	}
	for i := 0; i < sheets; i++ {
		var b strings.Builder
		b.WriteString(head)
		b.WriteString([]string{"derive z = ", "derive z [m] = ", "require z = ", "law z(x [m]) = ", "derive z [degC] = "}[random.IntN(5)])
		for n := 1 + random.IntN(8); n > 0; n-- {
			b.WriteString(tokens[random.IntN(len(tokens))])
			if random.IntN(2) == 0 {
				b.WriteByte(' ')
			}
		}
		if checkSheet(t, b.String()) {
			compiled++
		}
		if t.Failed() {
			t.Fatal(b.String())
		}
	}
	t.Logf("%d of %d sheets have no problem", compiled, sheets)
	if compiled < sheets/100 {
		t.Errorf("only %d of %d sheets compile", compiled, sheets)
	}
}
