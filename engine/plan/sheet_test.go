package plan

import (
	"context"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// written is a formula whose parts stand in line 1.
type written string

func (w written) SpanOf(offset, length int) problem.Span {
	return problem.Span{Line: 1, Column: offset + 1, Length: length}
}

// planned plans entries, one a line as "name = formula", over knowns that are
// pure numbers; a known written "name=" has no value, the others have 1.
func planned(t testing.TB, knowns string, text string, laws ...*law.Law) *Program {
	t.Helper()
	catalogue, err := law.NewCatalogue(laws, nil)
	if err != nil {
		t.Fatal(err)
	}
	var problems problem.List
	graph := NewGraph()
	symbols := map[string]formula.Symbol{}
	number := formula.Type{Shape: formula.NumberShape}
	var specs []KnownSpec
	for _, name := range strings.Fields(knowns) {
		spec := KnownSpec{Name: strings.TrimSuffix(name, "="), HasValue: !strings.HasSuffix(name, "="), Value: 1, Unit: unit.One()}
		node := graph.Make(formula.Node{Op: formula.KnownOp, Index: len(specs), Text: spec.Name, Type: number})
		symbols[spec.Name] = formula.Symbol{Node: node}
		specs = append(specs, spec)
	}
	scope := &formula.Scope{
		Catalogue: catalogue, Make: graph.Make, Problems: &problems,
		Lookup: func(name string) (formula.Symbol, bool) { s, ok := symbols[name]; return s, ok },
		Names:  func() []string { return nil },
	}
	var entries []EntrySpec
	for _, line := range strings.Split(strings.TrimSpace(text), "\n") {
		name, body, _ := strings.Cut(line, " = ")
		name = strings.TrimSpace(name)
		e := formula.Parse(body, written(body), &problems)
		if e == nil {
			t.Fatalf("%s: %v", body, problems.Sorted())
		}
		value := formula.Check(e, scope)
		if !problems.Empty() {
			t.Fatalf("%s: %v", body, problems.Sorted())
		}
		node := graph.Make(formula.Node{Op: formula.Entry, Text: name, Args: []*formula.Node{value}, Type: value.Type})
		symbols[name] = formula.Symbol{Node: node}
		entries = append(entries, EntrySpec{Name: name, Node: node, Role: rows.Derived})
	}
	return Build(graph, specs, entries, func(problem.Span) string { return "" })
}

// runs evaluates a program and gives the outcome.
func runs(t testing.TB, p *Program, workers, n int, values ...[]float64) *rows.Outcome {
	t.Helper()
	var out rows.Outcome
	if err := p.Run(context.Background(), rows.Input{Rows: n, Values: values}, &out, workers); err != nil {
		t.Fatal(err)
	}
	return &out
}

// stepsOf counts the slots with an operation.
func stepsOf(p *Program, op formula.Op) int {
	n := 0
	for i := range p.slots {
		if p.slots[i].op == op {
			n++
		}
	}
	return n
}

// rising gives a column of numbers without a pattern, some of them 0.
func rising(seed uint64, n int) []float64 {
	random := rand.New(rand.NewPCG(seed, 7))
	column := make([]float64, n)
	for i := range column {
		column[i] = random.NormFloat64() * 3
		if random.IntN(9) == 0 {
			column[i] = 0
		}
	}
	return column
}

func sameBits(a, b float64) bool {
	return math.Float64bits(a) == math.Float64bits(b) || a != a && b != b
}

// scheduled gives the schedule of a shape of input: 1 for each known that is a
// column, 0 for the others.
func scheduled(t testing.TB, p *Program, columns ...int) *schedule {
	t.Helper()
	in := rows.Input{Rows: 2}
	for _, column := range columns {
		in.Values = append(in.Values, make([]float64, 1+column))
	}
	shape, err := p.shape(in)
	if err != nil {
		t.Fatal(err)
	}
	return p.schedule(shape)
}
