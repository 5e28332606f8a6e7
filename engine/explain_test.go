package engine_test

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

const explained = `known depth [m] = 10 ± 1 # from the chart
known gas = "N2" or "He" # which gas
known wet = true
known spare [m] = 7
table t
  x [m]
  1
law half(a [m]) [m] = a / 2 # a note
derive p [kPa] = head_pressure(half(depth), 1000[kg/m^3]) # of the column
derive twice [kPa] = p + p
derive e [J] = 2 * nature.k_B * 300[K]
derive bad = 1[m] / (depth - depth)
derive worse = bad + 1
require deep = depth > 5[m] # enough
`

// outline gives an explanation as one line: names, values in their units,
// states that are not sound, and what each is made of.
func outline(e *engine.Explanation) string {
	text := e.Name
	switch {
	case e.Form == rows.Choice && e.HasValue:
		text += " = " + e.Choice
	case e.HasValue:
		text += " = " + strconv.FormatFloat(e.Scale.FromSI(e.Value), 'g', 10, 64) + " " + e.Unit
	}
	if e.State != rows.Sound {
		text += " " + e.State.String() + ": " + e.Reason
	}
	var parts []string
	for _, part := range e.Parts {
		parts = append(parts, outline(part))
	}
	if len(parts) > 0 {
		text += " <" + strings.Join(parts, ", ") + ">"
	}
	return text
}

func TestExplain(t *testing.T) {
	program := mustCompile(t, explained, functions.All())
	const column = "<head_pressure = 49033.25 Pa <half = 5 m <depth = 10 m>>>"
	for _, test := range []struct {
		name, formula, note, outline string
	}{
		// 1000 kg/m^3 times 5 m times the standard acceleration of free fall,
		// 9.80665 m/s^2 (3rd General Conference on Weights and Measures, 1901).
		{"p", "head_pressure(half(depth), 1000[kg/m^3])", "of the column", "p = 49.03325 kPa " + column},
		{"twice", "p + p", "", "twice = 98.0665 kPa <p = 49.03325 kPa " + column + ", p = 49.03325 kPa>"},
		// 2 times 1.380649e-23 J/K (SI, 2019) times 300 K.
		{"e", "2 * nature.k_B * 300[K]", "", "e = 8.283894e-21 J <nature.k_B = 1.380649e-23 J/K>"},
		{"bad", "1[m] / (depth - depth)", "", "bad refused: division by zero in 1[m] / (depth - depth) <depth = 10 m, depth = 10 m>"},
		{"worse", "bad + 1", "", "worse waiting: waits for bad <bad refused: division by zero in 1[m] / (depth - depth) <depth = 10 m, depth = 10 m>>"},
		{"deep", "depth > 5[m]", "enough", "deep = 1 1 <depth = 10 m>"},
		{"depth", "", "from the chart", "depth = 10 m"},
		{"spare", "", "", "spare = 7 m"},
		{"gas", "", "which gas", "gas = N2"},
		{"wet", "", "", "wet = 1 1"},
	} {
		e, err := program.Explain(engine.Input{}, test.name)
		if err != nil {
			t.Errorf("%s: %v", test.name, err)
			continue
		}
		if e.Formula != test.formula || e.Note != test.note || outline(e) != test.outline {
			t.Errorf("%s: formula %q, note %q,\n%s, not\n%s", test.name, e.Formula, e.Note, outline(e), test.outline)
		}
	}
}

// An input replaces a known's own value; what the sheet does not give is told
// with the name that may have been meant.
func TestExplainInput(t *testing.T) {
	program := mustCompile(t, explained, functions.All())
	for _, test := range []struct {
		known string
		value float64
		name  string
		want  string
	}{
		{"depth", 20, "depth", "depth = 20 m"},
		{"depth", 20, "p", "p = 98.0665 kPa <head_pressure = 98066.5 Pa <half = 10 m <depth = 20 m>>>"},
		{"spare", 8, "spare", "spare = 8 m"},
		{"spare", math.NaN(), "spare", "spare refused: spare has no value"},
		{"gas", 1, "gas", "gas = He"},
		{"gas", 2, "gas", "gas refused: gas is none of its 2 choices in this row"},
	} {
		e, err := program.Explain(engine.Input{Values: inputOf(program, test.known, test.value)}, test.name)
		if err != nil || outline(e) != test.want {
			t.Errorf("%s = %v: %v, %s", test.known, test.value, err, outline(e))
		}
	}
	for name, want := range map[string]string{
		"dpeth": "the sheet gives no entry 'dpeth'; did you mean depth?",
		"t":     "the sheet gives no entry 't'",
		"half":  "the sheet gives no entry 'half'",
		"":      "the sheet gives no entry ''",
	} {
		if _, err := program.Explain(engine.Input{}, name); err == nil || err.Error() != want {
			t.Errorf("%q: %v", name, err)
		}
	}
	if _, err := program.Explain(engine.Input{Values: make([][]float64, 99)}, "p"); err == nil {
		t.Error("an input with too many columns is explained")
	}
}
