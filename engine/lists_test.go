package engine_test

import (
	"context"
	"math"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

// TestListValuedLaws lays lists out before the first row and works them out row
// by row, with states and reasons of the law that was called.
func TestListValuedLaws(t *testing.T) {
	const text = `known T [K] = 300
known B [T] = 1
derive p = occupancies(spin_levels(2, 1.5, B), T)
derive all = sum(p)
derive lowest = item(p, 1)
derive alone = occupancy(spin_levels(2, 1.5, B), 0, T)
derive n = count(p)
derive double = item(2 * p, 1)
derive cold = item(occupancies(ladder([0, 1][K], [1, 3]), 1e-3[K]), 1)
`
	program, err := engine.Compile(text, functions.All())
	if err != nil {
		t.Fatal(err)
	}
	in := rows.Input{Rows: 3, Values: [][]float64{{300, 2, -1}, {0, 8, 1}}}
	var out rows.Outcome
	if err := program.Run(context.Background(), in, &out); err != nil {
		t.Fatal(err)
	}
	entry := func(name string) int { return program.Describe().EntryIndex(name) }
	for row := range 2 {
		if got := out.Values[entry("all")][row]; math.Abs(got-1) > 4e-16 {
			t.Errorf("row %d: the shares add up to %v", row, got)
		}
		lowest := out.Values[entry("lowest")][row]
		if alone := out.Values[entry("alone")][row]; lowest != alone || out.Values[entry("double")][row] != 2*lowest {
			t.Errorf("row %d: %v in the list, %v alone", row, lowest, alone)
		}
	}
	if out.Values[entry("lowest")][0] != 0.25 || out.Values[entry("n")][2] != 4 || out.Values[entry("cold")][0] != 1 {
		t.Errorf("%v", out.Values)
	}
	reason := program.Reasons()[out.Reason(entry("lowest"), 2)].Text
	if out.State(entry("lowest"), 2) != rows.Refused || !strings.Contains(reason, "temperature of occupancies lies at or below 0 K") {
		t.Errorf("below zero: %v, %q", out.State(entry("lowest"), 2), reason)
	}
}

// TestListValuedLawProblems fixes what is told of calls whose list has no
// length.
func TestListValuedLawProblems(t *testing.T) {
	for _, test := range []struct{ formula, message string }{
		{"sum(occupancies(rotor(2[cm^-1]), T))", "say how many"},
		{"sum(occupancies(spin_levels(2, S, 1[T]), T))", "not known before the first row"},
		{"sum(occupancies(oscillator(2[cm^-1]), T, first: 2000))", "at most 1,000"},
		{"sum(occupancies(oscillator(2[cm^-1]), T, first: S))", "'first' is fixed before the first row"},
		{"sum(occupancies(nuclear_spin_levels(nucleus, 1[T]), T))", "not known before the first row"},
		{"occupancies(oscillator(2[cm^-1]), T, first: 3) + 1[m]", "a pure number and m cannot be added"},
		{"sqrt(occupancies(oscillator(2[cm^-1]), T, first: 3))", "sqrt takes numbers"},
	} {
		_, err := engine.Compile("known T [K] = 300\nknown S = 1.5\nknown nucleus = \"1H\" or \"27Al\"\nderive x = "+test.formula, functions.All())
		if err == nil || !strings.Contains(err.Error(), test.message) {
			t.Errorf("%s: %v", test.formula, err)
		}
	}
}
