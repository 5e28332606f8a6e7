// Package plan turns typed trees into a flat list of column steps: equal parts
// become one, constant parts are computed once and for all, parts that no row
// changes are computed once a run, and the rest runs over blocks of rows.
package plan

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/law"
)

// Graph collects the typed nodes of a sheet. Equal nodes are one node; a node
// whose value is known before the first row is a constant.
type Graph struct {
	nodes []*formula.Node
	index map[key]*formula.Node
}

// key tells equal nodes: the operation, what it works on and its type.
type key struct {
	op         formula.Op
	law        *law.Law
	bits       uint64
	index      int
	text       string
	t          formula.Type
	a, b, c    int
	more       string // IDs of further arguments
	numbers    *float64
	numberSize int
}

// NewGraph makes an empty graph.
func NewGraph() *Graph {
	return &Graph{index: map[key]*formula.Node{}}
}

// Make gives the node equal to n, made if it is new. It is the formula room's
// way of making nodes.
func (g *Graph) Make(n formula.Node) *formula.Node {
	if folded, ok := g.fold(&n); ok {
		n = folded
	}
	k := key{op: n.Op, law: n.Law, bits: math.Float64bits(n.Value), index: n.Index, text: n.Text, t: n.Type, a: -1, b: -1, c: -1}
	for i, a := range n.Args {
		switch i {
		case 0:
			k.a = a.ID
		case 1:
			k.b = a.ID
		case 2:
			k.c = a.ID
		}
	}
	if len(n.Args) > 3 {
		more := make([]byte, 0, 4*len(n.Args))
		for _, a := range n.Args[3:] {
			more = append(more, byte(a.ID), byte(a.ID>>8), byte(a.ID>>16), byte(a.ID>>24))
		}
		k.more = string(more)
	}
	if len(n.Numbers) > 0 {
		k.numbers, k.numberSize = &n.Numbers[0], len(n.Numbers)
	}
	if known, ok := g.index[k]; ok {
		return known
	}
	made := n
	made.ID = len(g.nodes)
	g.nodes = append(g.nodes, &made)
	g.index[k] = &made
	return &made
}

// fold computes a node whose arguments are constant. A call outside a law's
// ranges, or a result that is no number, stays a step: the run tells why.
func (g *Graph) fold(n *formula.Node) (formula.Node, bool) {
	switch n.Op {
	case formula.Const, formula.KnownOp, formula.Word, formula.MadeOp, formula.Items:
		return formula.Node{}, false
	case formula.Guard:
		if n.Args[1].IsConst() && n.Args[1].Value == 1 && n.Args[0].IsConst() {
			return constant(n, n.Args[0].Value), true
		}
		return formula.Node{}, false
	case formula.Apply:
		if !fixed(n) {
			return formula.Node{}, false
		}
		value, ok := applyOnce(n)
		return constant(n, value), ok
	}
	for _, a := range n.Args {
		if !a.IsConst() {
			return formula.Node{}, false
		}
	}
	var dst [1]float64
	var operands [3][]float64
	for i, a := range n.Args {
		operands[i] = []float64{a.Value}
	}
	if n.Op == formula.Same || n.Op == formula.Entry {
		dst[0] = n.Args[0].Value
	} else {
		compute(n.Op, dst[:], operands[0], operands[1], operands[2])
	}
	return constant(n, dst[0]), column.Finite(dst[0])
}

func constant(n *formula.Node, value float64) formula.Node {
	return formula.Node{Op: formula.Const, Value: value, Type: n.Type, Place: n.Place}
}

// fixed says whether nothing below the node depends on a known.
func fixed(n *formula.Node) bool {
	for _, a := range n.Args {
		switch a.Op {
		case formula.Const, formula.Word:
		case formula.Items, formula.MadeOp:
			if !fixed(a) {
				return false
			}
		default:
			return false
		}
	}
	return true
}

// applyOnce applies a law to constant arguments; ok is false where it leaves a
// range or gives no number.
func applyOnce(n *formula.Node) (float64, bool) {
	arguments := make([]law.Argument, len(n.Args))
	for i, a := range n.Args {
		arguments[i] = constantArgument(a)
		if i < len(n.Law.Parameters) && !insideRanges(&arguments[i], boundsOf(&n.Law.Parameters[i])) {
			return 0, false
		}
	}
	for _, a := range n.Args {
		if !insideMade(a) {
			return 0, false
		}
	}
	var dst [1]float64
	var work law.Work
	n.Law.Body(dst[:], arguments, &work)
	return dst[0], column.Finite(dst[0])
}

// insideMade checks the ranges of the laws that made a made value.
func insideMade(n *formula.Node) bool {
	if n.Op != formula.MadeOp {
		return true
	}
	for i, a := range n.Args {
		argument := constantArgument(a)
		if !insideRanges(&argument, boundsOf(&n.Law.Parameters[i])) || !insideMade(a) {
			return false
		}
	}
	return true
}

func constantArgument(n *formula.Node) law.Argument {
	switch n.Op {
	case formula.Word:
		return law.Argument{Text: n.Text}
	case formula.MadeOp:
		a := law.Argument{Maker: n.Law, Items: make([]law.Argument, len(n.Args))}
		for i, part := range n.Args {
			a.Items[i] = constantArgument(part)
		}
		return a
	case formula.Items:
		if n.Numbers != nil {
			return law.Argument{Items: numbersAsItems(n.Numbers)}
		}
		a := law.Argument{Items: make([]law.Argument, len(n.Args))}
		for i, part := range n.Args {
			a.Items[i] = constantArgument(part)
		}
		return a
	}
	return law.Argument{Values: []float64{n.Value}}
}

func numbersAsItems(numbers []float64) []law.Argument {
	items := make([]law.Argument, len(numbers))
	for i := range numbers {
		items[i].Values = numbers[i : i+1 : i+1]
	}
	return items
}

func insideRanges(a *law.Argument, b bounds) bool {
	if !b.any {
		return true
	}
	if a.Items != nil && a.Maker == nil {
		for i := range a.Items {
			if !insideRanges(&a.Items[i], b) {
				return false
			}
		}
		return true
	}
	if len(a.Values) == 0 {
		return true
	}
	x := a.Values[0]
	return x >= b.low && x <= b.high
}
