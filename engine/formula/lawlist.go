package formula

import (
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
)

// MostItems bounds the items of a list that a law gives.
const MostItems = 1_000

// lawList lays out a list-valued law: a number that all items share, then one
// number an item. Each is a law of its own that stands in no catalogue; to the
// reader of a reason it is the law that was called.
func (c *checker) lawList(e *Expression, l *law.Law, args []*Node, item Type) *Node {
	known := make([]law.Argument, len(args))
	for i, a := range args {
		if a.Op == KnownOp && a.Type.Shape == TextShape {
			return c.invalid(e, problem.Shape, l.Name+" takes a text itself, not one of several: its list would have several lengths", "write the text in the call")
		}
		known[i] = Known(a)
	}
	n, wrong := l.Result.Each.Count(known)
	switch {
	case wrong != "":
		return c.invalid(e, problem.Shape, l.Name+": "+wrong, "")
	case n > MostItems:
		return c.invalid(e, problem.Limit, l.Name+" would give "+counted(n, "item")+"; a list that a law gives has at most 1,000", "ask for fewer, or for single ones")
	}
	parts := c.partsOf(l)
	shared := c.node(e, Node{Op: Apply, Law: parts.shared, Args: args, Type: plain()})
	items := make([]*Node, n)
	for i := range items {
		with := append(append([]*Node(nil), args...), c.number(e, float64(i), plain()), shared)
		items[i] = c.node(e, Node{Op: Apply, Law: parts.item, Args: with, Type: item})
	}
	return c.listOf(e, items, item)
}

// listParts are the laws that a list-valued law is laid out to.
type listParts struct{ shared, item *law.Law }

// partsOf gives the same laws for each call, so that equal items are one.
func (s *Scope) partsOf(l *law.Law) listParts {
	if parts, ok := s.parts[l]; ok {
		return parts
	}
	of := func(body law.Body, result law.Result) *law.Law {
		return &law.Law{Name: l.Name, Group: l.Group, Gives: l.Gives, Parameters: l.Parameters, Result: result, Source: l.Source, Refusal: l.Refusal, Body: body}
	}
	parts := listParts{of(l.Result.Each.Shared, law.Result{Unit: "1"}), of(l.Result.Each.Item, law.Result{Unit: l.Result.Unit})}
	if s.parts == nil {
		s.parts = map[*law.Law]listParts{}
	}
	s.parts[l] = parts
	return parts
}

// Known gives of a node what is known of it before the first row, as a law's
// argument: a number that is not known has no values.
func Known(n *Node) law.Argument {
	switch n.Op {
	case Const:
		return law.Argument{Values: []float64{n.Value}}
	case Word:
		return law.Argument{Text: n.Text}
	case Items, MadeOp:
		if n.Numbers != nil {
			return law.Argument{Items: NumbersAsItems(n.Numbers)}
		}
		a := law.Argument{Items: make([]law.Argument, len(n.Args))}
		if n.Op == MadeOp {
			a.Maker = n.Law
		}
		for i, part := range n.Args {
			a.Items[i] = Known(part)
		}
		return a
	}
	return law.Argument{}
}

// NumbersAsItems gives the items of a constant list as a law takes them.
func NumbersAsItems(numbers []float64) []law.Argument {
	items := make([]law.Argument, len(numbers))
	for i := range numbers {
		items[i].Values = numbers[i : i+1 : i+1]
	}
	return items
}
