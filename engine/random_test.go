package engine_test

import (
	"context"
	"fmt"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"github.com/expr-lang/expr"
	"github.com/expr-lang/expr/ast"
	"github.com/expr-lang/expr/vm"

	"plumbrule/engine"
	"plumbrule/engine/column"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

// The knowns of the random sheets.
var randomNames = []string{"a", "b", "c", "d", "p", "q"}

// oneArgument and twoArguments are the functions of random formulas.
var (
	oneArgument = map[string]func(float64) float64{
		"sqrt": math.Sqrt, "exp": column.Exp, "ln": column.Ln, "log10": column.Log10,
		"sin": column.Sin, "cos": column.Cos, "tan": column.Tan,
		"asin": column.Asin, "acos": column.Acos, "atan": column.Atan,
		"sinh": column.Sinh, "cosh": column.Cosh, "tanh": column.Tanh,
		"abs": math.Abs, "floor": math.Floor, "ceil": math.Ceil, "round": column.RoundOf,
		"sign": column.SignOf, "cbrt": column.Cbrt,
	}
	twoArguments = map[string]func(a, b float64) float64{
		"atan2": column.Atan2, "hypot": column.Hypot, "min": column.Min, "max": column.Max,
	}
	oneNames = []string{"sqrt", "exp", "ln", "log10", "sin", "cos", "tan", "asin", "acos", "atan", "sinh", "cosh", "tanh", "abs", "floor", "ceil", "round", "sign", "cbrt"}
	twoNames = []string{"atan2", "hypot", "min", "max"}
)

// powerByRule is the sheet language's power: exponents that are fixed before
// the first row have their own operation.
func powerByRule(x, y float64, fixed bool) float64 {
	if fixed {
		switch y {
		case 1:
			return x
		case 2:
			return x * x
		case -1:
			return 1 / x
		case 0.5:
			return math.Sqrt(x)
		}
	}
	return column.Pow(x, y)
}

// term is a random formula: its text, and a plain walk over it that tells
// whether a number that is not finite was met on the way.
type term struct {
	text  string
	fixed bool // no known in it
	walk  func(row []float64, met *bool) float64
}

func seen(x float64, met *bool) float64 {
	if x-x != 0 {
		*met = true
	}
	return x
}

func truthOf(holds bool) float64 {
	if holds {
		return 1
	}
	return 0
}

type grower struct{ *rand.Rand }

func (g grower) pick(from []string) string { return from[g.IntN(len(from))] }

func (g grower) constant() term {
	texts := []string{"0", "1", "2", "3", "0.5", "1e-3", "12.75", "1000000", "2.5e7", "9007199254740993", "0.1"}
	text := texts[g.IntN(len(texts))]
	var x float64
	fmt.Sscan(text, &x)
	return term{text, true, func([]float64, *bool) float64 { return x }}
}

// plainText calls a function. Where it gives an angle a sheet divides by one
// radian to get a pure number, which changes no bit.
func plainText(name, arguments string) string {
	text := name + "(" + arguments + ")"
	switch name {
	case "asin", "acos", "atan", "atan2":
		return "(" + text + " / 1[rad])"
	}
	return text
}

// number grows a formula that gives a number.
func (g grower) number(depth int) term {
	if depth == 0 || g.IntN(8) == 0 {
		if g.IntN(4) == 0 {
			return g.constant()
		}
		i := g.IntN(len(randomNames))
		return term{randomNames[i], false, func(row []float64, met *bool) float64 { return row[i] }}
	}
	switch g.IntN(10) {
	case 0, 1, 2, 3:
		x, y := g.number(depth-1), g.number(depth-1)
		sign := g.pick([]string{"+", "-", "*", "/"})
		return term{"(" + x.text + " " + sign + " " + y.text + ")", x.fixed && y.fixed, func(row []float64, met *bool) float64 {
			a, b := x.walk(row, met), y.walk(row, met)
			switch sign {
			case "+":
				return seen(a+b, met)
			case "-":
				return seen(a-b, met)
			case "*":
				return seen(a*b, met)
			}
			return seen(a/b, met)
		}}
	case 4:
		x := g.number(depth - 1)
		return term{"(-" + x.text + ")", x.fixed, func(row []float64, met *bool) float64 { return -x.walk(row, met) }}
	case 5:
		x, y := g.number(depth-1), g.number(depth-1)
		if g.IntN(3) > 0 {
			text := g.pick([]string{"1", "2", "(-1)", "0.5", "3", "0", "(-2)", "1.5"})
			var value float64
			fmt.Sscan(strings.Trim(text, "()"), &value)
			y = term{text, true, func([]float64, *bool) float64 { return value }}
		}
		return term{"(" + x.text + ")^(" + y.text + ")", x.fixed && y.fixed, func(row []float64, met *bool) float64 {
			return seen(powerByRule(x.walk(row, met), y.walk(row, met), y.fixed), met)
		}}
	case 6, 7:
		name, x := g.pick(oneNames), g.number(depth-1)
		f := oneArgument[name]
		return term{plainText(name, x.text), x.fixed, func(row []float64, met *bool) float64 { return seen(f(x.walk(row, met)), met) }}
	case 8:
		name, x, y := g.pick(twoNames), g.number(depth-1), g.number(depth-1)
		f := twoArguments[name]
		return term{plainText(name, x.text+", "+y.text), x.fixed && y.fixed, func(row []float64, met *bool) float64 {
			return seen(f(x.walk(row, met), y.walk(row, met)), met)
		}}
	}
	c, x, y := g.condition(depth-1), g.number(depth-1), g.number(depth-1)
	return term{"(" + c.text + " ? " + x.text + " : " + y.text + ")", c.fixed && x.fixed && y.fixed, func(row []float64, met *bool) float64 {
		if c.walk(row, met) != 0 {
			return x.walk(row, met)
		}
		return y.walk(row, met)
	}}
}

// condition grows a formula that gives a condition.
func (g grower) condition(depth int) term {
	if depth > 0 {
		switch g.IntN(4) {
		case 0:
			x, y := g.condition(depth-1), g.condition(depth-1)
			word := g.pick([]string{"and", "or"})
			return term{"(" + x.text + " " + word + " " + y.text + ")", x.fixed && y.fixed, func(row []float64, met *bool) float64 {
				first := x.walk(row, met)
				if (first != 0) == (word == "or") {
					return first
				}
				return y.walk(row, met)
			}}
		case 1:
			x := g.condition(depth - 1)
			return term{"not (" + x.text + ")", x.fixed, func(row []float64, met *bool) float64 { return 1 - x.walk(row, met) }}
		}
	}
	x, y := g.number(max(0, depth-1)), g.number(max(0, depth-1))
	sign := g.pick([]string{"<", "<=", ">", ">=", "==", "!="})
	return term{"(" + x.text + " " + sign + " " + y.text + ")", x.fixed && y.fixed, func(row []float64, met *bool) float64 {
		a, b := x.walk(row, met), y.walk(row, met)
		switch sign {
		case "<":
			return truthOf(a < b)
		case "<=":
			return truthOf(a <= b)
		case ">":
			return truthOf(a > b)
		case ">=":
			return truthOf(a >= b)
		case "==":
			return truthOf(a == b)
		}
		return truthOf(a != b)
	}}
}

// floats makes expr's own evaluator one of float64 with the sheet language's
// power: whole numbers become floats, and ^ a call.
type floats struct{}

func (floats) Visit(node *ast.Node) {
	switch n := (*node).(type) {
	case *ast.IntegerNode:
		ast.Patch(node, &ast.FloatNode{Value: float64(n.Value)})
	case *ast.BinaryNode:
		if n.Operator == "^" {
			fixed := 0.0
			if !readsNames(n.Right) {
				fixed = 1
			}
			ast.Patch(node, &ast.CallNode{Callee: &ast.IdentifierNode{Value: "power"}, Arguments: []ast.Node{n.Left, n.Right, &ast.FloatNode{Value: fixed}}})
		}
	}
}

// readsNames says whether a tree reads one of the knowns.
func readsNames(node ast.Node) bool {
	finder := nameFinder{}
	ast.Walk(&node, &finder)
	return finder.found
}

type nameFinder struct{ found bool }

func (f *nameFinder) Visit(node *ast.Node) {
	if n, is := (*node).(*ast.IdentifierNode); is {
		for _, name := range randomNames {
			f.found = f.found || n.Value == name
		}
	}
}

// referenceOptions give expr the engine's mathematical functions under the
// names of the sheet language.
func referenceOptions() []expr.Option {
	environment := map[string]any{}
	for _, name := range randomNames {
		environment[name] = 0.0
	}
	options := []expr.Option{expr.Env(environment), expr.DisableAllBuiltins(), expr.Patch(floats{}), expr.Optimize(false)}
	for name, f := range oneArgument {
		options = append(options, expr.Function(name, func(x ...any) (any, error) { return f(x[0].(float64)), nil }, new(func(float64) float64)))
	}
	for name, f := range twoArguments {
		options = append(options, expr.Function(name, func(x ...any) (any, error) { return f(x[0].(float64), x[1].(float64)), nil }, new(func(float64, float64) float64)))
	}
	return append(options, expr.Function("power", func(x ...any) (any, error) {
		return powerByRule(x[0].(float64), x[1].(float64), x[2].(float64) == 1), nil
	}, new(func(float64, float64, float64) float64)))
}

// randomColumns gives columns of several magnitudes, with negatives, zeros,
// whole numbers and equal numbers among them.
func randomColumns(g grower, n int) [][]float64 {
	columns := make([][]float64, len(randomNames))
	for k := range columns {
		columns[k] = make([]float64, n)
		for i := range columns[k] {
			x := g.NormFloat64()
			switch g.IntN(8) {
			case 0:
				x = 0
			case 1:
				x = math.Trunc(4 * x)
			case 2:
				x *= math.Pow(10, float64(g.IntN(40)-20))
			case 3:
				x = g.Float64()
			case 4:
				x = -x * 100
			case 5:
				if k > 0 {
					x = columns[k-1][i]
				}
			}
			columns[k][i] = x
		}
	}
	return columns
}

// TestRandomFormulas evaluates random formulas by columns and, row by row,
// with expr's own machine, and demands the same bits. A row that the engine
// refuses must have met a number that is not finite on its way.
func TestRandomFormulas(t *testing.T) {
	formulas, n := 2000, 1100
	if testing.Short() {
		formulas = 200
	}
	const perSheet = 50
	g := grower{rand.New(rand.NewPCG(1, 2))}
	options := referenceOptions()
	columns := randomColumns(g, n)
	row := make([]float64, len(randomNames))
	var computed, refused int
	for made := 0; made < formulas; made += perSheet {
		terms := make([]term, perSheet)
		var text strings.Builder
		for _, name := range randomNames {
			text.WriteString("known " + name + "\n")
		}
		for i := range terms {
			terms[i] = g.number(1 + g.IntN(6))
			if len(terms[i].text) > 5000 {
				terms[i] = g.number(3)
			}
			fmt.Fprintf(&text, "derive entry_%d = %s\n", i, terms[i].text)
		}
		program, err := engine.Compile(text.String(), functions.All())
		if err != nil {
			t.Fatalf("%v\n%s", err, text.String())
		}
		var out engine.Outcome
		if err := program.Run(context.Background(), engine.Input{Rows: n, Values: columns}, &out); err != nil {
			t.Fatal(err)
		}
		machine := vm.VM{}
		environment := map[string]any{}
		for e := range terms {
			reference, err := expr.Compile(strings.ReplaceAll(terms[e].text, "[rad]", ""), options...)
			if err != nil {
				t.Fatalf("%s: %v", terms[e].text, err)
			}
			for i := 0; i < n; i++ {
				for k, name := range randomNames {
					row[k] = columns[k][i]
					environment[name] = row[k]
				}
				met := false
				walked := terms[e].walk(row, &met)
				got, state := out.Values[e][i], out.State(e, i)
				if !state.Computed() {
					refused++
					if !met {
						t.Fatalf("%s\nrow %v: %s (%s), but every number on the way is finite; it gives %v", terms[e].text, row, state, program.Reasons()[out.Reason(e, i)].Text, walked)
					}
					if got == got {
						t.Fatalf("%s: a row without a number holds %v", terms[e].text, got)
					}
					continue
				}
				computed++
				if math.Float64bits(got) != math.Float64bits(walked) {
					t.Fatalf("%s\nrow %v: the engine gives %v, the walk %v", terms[e].text, row, got, walked)
				}
				want, err := machine.Run(reference, environment)
				if err != nil {
					t.Fatalf("%s: %v", terms[e].text, err)
				}
				if math.Float64bits(want.(float64)) != math.Float64bits(got) {
					t.Fatalf("%s\nrow %v: the engine gives %v, expr %v", terms[e].text, row, got, want)
				}
			}
			checkSoundRows(t, terms[e].text, columns, out.Values[e])
		}
	}
	t.Logf("%d rows computed, %d refused", computed, refused)
	if computed < 2*refused {
		t.Errorf("only %d rows computed, %d refused", computed, refused)
	}
}

// checkSoundRows runs a formula over those rows alone in which it has a number,
// so that no block has a row to refuse, and over the same rows with one that
// may be refused behind them. Neither may change a bit.
func checkSoundRows(t *testing.T, text string, columns [][]float64, values []float64) {
	t.Helper()
	var heading strings.Builder
	for _, name := range randomNames {
		heading.WriteString("known " + name + "\n")
	}
	program, err := engine.Compile(heading.String()+"derive alone = "+text, functions.All())
	if err != nil {
		t.Fatal(err)
	}
	in := engine.Input{Values: make([][]float64, len(columns))}
	var want []float64
	for i, x := range values {
		if x != x {
			continue
		}
		want = append(want, x)
		for k := range columns {
			in.Values[k] = append(in.Values[k], columns[k][i])
		}
	}
	for _, behind := range [][]float64{nil, {math.NaN()}} {
		for k := range in.Values {
			in.Values[k] = append(in.Values[k], behind...)
		}
		in.Rows = len(want) + len(behind)
		var out engine.Outcome
		if err := program.Run(context.Background(), in, &out); err != nil {
			t.Fatal(err)
		}
		for i, x := range want {
			if got := out.Values[0][i]; math.Float64bits(got) != math.Float64bits(x) || out.State(0, i) != rows.Sound {
				t.Fatalf("%s\nrow %d of %d: %v (%s), among other rows %v", text, i, in.Rows, got, out.State(0, i), x)
			}
		}
	}
}
