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
	index []place // by digest, with open addressing
}

// place is a place of the index: a node's digest, which tells most others apart
// without a look at them, and 1 + its ID, 0 where the place is free.
type place struct {
	digest uint32
	id     int32
}

// NewGraph makes an empty graph.
func NewGraph() *Graph { return &Graph{index: make([]place, 64)} }

// Make gives the node equal to n, made if it is new. It is the formula room's
// way of making nodes.
func (g *Graph) Make(n formula.Node) *formula.Node {
	if folded, ok := g.fold(&n); ok {
		n = folded
	}
	d := digest(&n)
	at := g.find(d, &n)
	if known := g.index[at].id; known > 0 {
		return g.nodes[known-1]
	}
	made := new(formula.Node)
	*made = n
	made.ID = len(g.nodes)
	g.nodes = append(g.nodes, made)
	g.index[at] = place{d, int32(len(g.nodes))}
	if 4*len(g.nodes) > 3*len(g.index) {
		g.grow()
	}
	return made
}

// find gives the place in the index of the node equal to n, or the free place
// where it belongs.
func (g *Graph) find(digest uint32, n *formula.Node) int {
	most := len(g.index) - 1
	for at := int(digest) & most; ; at = (at + 1) & most {
		p := &g.index[at]
		if p.id == 0 || p.digest == digest && equal(g.nodes[p.id-1], n) {
			return at
		}
	}
}

func (g *Graph) grow() {
	old := g.index
	g.index = make([]place, 2*len(old))
	most := len(g.index) - 1
	for _, p := range old {
		if p.id == 0 {
			continue
		}
		at := int(p.digest) & most
		for g.index[at].id != 0 {
			at = (at + 1) & most
		}
		g.index[at] = p
	}
}

// digest is a number that equal nodes share: what tells most nodes apart,
// mixed by multiplication (Knuth, The Art of Computer Programming 3, 6.4).
func digest(n *formula.Node) uint32 {
	const odd = 0x9E3779B97F4A7C15
	h := uint64(n.Op)*odd + math.Float64bits(n.Value)
	h = (h ^ h>>32) * odd
	h += uint64(n.Index) + uint64(len(n.Numbers))<<32
	for _, a := range n.Args {
		h = (h^h>>29)*odd + uint64(a.ID)
	}
	for i := range len(n.Text) {
		h = (h^h>>29)*odd + uint64(n.Text[i])
	}
	h = (h ^ h>>32) * odd
	return uint32(h >> 32)
}

// equal says whether two nodes compute the same: the operation, what it works
// on and its type.
func equal(a, b *formula.Node) bool {
	if a.Op != b.Op || a.Law != b.Law || math.Float64bits(a.Value) != math.Float64bits(b.Value) || a.Index != b.Index || len(a.Args) != len(b.Args) || a.Text != b.Text || a.Type != b.Type || len(a.Numbers) != len(b.Numbers) {
		return false
	}
	for i := range a.Args {
		if a.Args[i] != b.Args[i] {
			return false
		}
	}
	return len(a.Numbers) == 0 || &a.Numbers[0] == &b.Numbers[0]
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
		arguments[i] = formula.Known(a)
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
		argument := formula.Known(a)
		if !insideRanges(&argument, boundsOf(&n.Law.Parameters[i])) || !insideMade(a) {
			return false
		}
	}
	return true
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
