package main

import (
	"context"
	"crypto/sha256"
	"fmt"
	"math/rand/v2"
	"strconv"
	"strings"

	"plumbrule/engine/rows"
)

const (
	formulasPerSheet = 500
	rowsPerFormula   = 8
	deepest          = 5
)

var names = []string{"a", "b", "c", "d"}

// random draws formulas and numbers. Its sequence depends on nothing but the
// seed.
type random struct{ *rand.Rand }

// formula draws a formula of pure numbers.
func (r random) formula(depth int) string {
	if depth <= 0 || r.IntN(8) == 0 {
		if r.IntN(3) == 0 {
			return strconv.FormatFloat(r.number(), 'g', 6, 64)
		}
		return names[r.IntN(len(names))]
	}
	one := func() string { return r.formula(depth - 1) }
	switch k := r.IntN(20); {
	case k < 9:
		return "(" + one() + " " + []string{"+", "-", "*", "/"}[r.IntN(4)] + " " + one() + ")"
	case k < 15:
		f := []string{"sqrt", "exp", "ln", "log10", "sin", "cos", "tan", "asin", "acos", "atan", "sinh", "cosh", "tanh", "abs", "floor", "ceil", "round", "sign", "cbrt"}
		name := f[r.IntN(len(f))]
		if name == "asin" || name == "acos" || name == "atan" {
			return "(" + name + "(" + one() + ") / 1[rad])"
		}
		return name + "(" + one() + ")"
	case k < 17:
		return []string{"min", "max", "hypot"}[r.IntN(3)] + "(" + one() + ", " + one() + ")"
	case k < 18:
		return "abs(" + one() + ") ^ " + one()
	case k < 19:
		return "(atan2(" + one() + ", " + one() + ") / 1[rad])"
	}
	return "(" + one() + []string{" < ", " <= ", " == "}[r.IntN(3)] + one() + " ? " + one() + " : " + one() + ")"
}

// number draws a number of varying size; never negative where a formula would
// need parentheses.
func (r random) number() float64 {
	return float64(int64(r.Float64()*1e6)) / 1e6 * []float64{0.001, 0.1, 1, 10, 1000}[r.IntN(5)]
}

// hashRandom evaluates random formulas over random rows.
func hashRandom(ctx context.Context, compiler rows.Compiler, formulas int) ([]byte, int, error) {
	r := random{rand.New(rand.NewPCG(2026, 1976))}
	d := &digest{Hash: sha256.New()}
	for done := 0; done < formulas; done += formulasPerSheet {
		var b strings.Builder
		for _, name := range names {
			fmt.Fprintf(&b, "known %s [1] = 1\n", name)
		}
		for i := range min(formulasPerSheet, formulas-done) {
			fmt.Fprintf(&b, "derive f%d [1] = %s\n", i, r.formula(deepest))
		}
		program, err := compiler.Compile(ctx, b.String(), nil)
		if err != nil {
			return nil, 0, err
		}
		in := rows.Input{Rows: rowsPerFormula, Values: make([][]float64, len(names))}
		for k := range in.Values {
			in.Values[k] = make([]float64, rowsPerFormula)
			for i := range in.Values[k] {
				in.Values[k][i] = r.number() * float64(1-2*r.IntN(2))
			}
		}
		var out rows.Outcome
		if err := program.Run(ctx, in, &out); err != nil {
			return nil, 0, err
		}
		d.addOutcome(&out)
		program.Close()
	}
	return d.Sum(nil), d.count, nil
}
