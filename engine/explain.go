package engine

import (
	"errors"

	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/plan"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// Explanation is how one number came about: a name of the sheet, a law's call
// or a constant, with what it was made of.
type Explanation struct {
	Name     string  // of the known, entry, law or constant
	Formula  string  // the user's text, empty for a known and a constant
	HasValue bool    // false for lists, ladders and texts
	Value    float64 // coherent SI
	Form     rows.Form
	Choice   string // the chosen text of a text known
	Unit     string
	Scale    rows.Scale
	State    rows.State
	Reason   string
	Note     string
	Law      *law.Law // nil unless a law of the catalogue is called
	// Parts is what it was made of; empty where the name is explained earlier
	// in the same tree.
	Parts []*Explanation
}

// Explain evaluates one row and tells how the number of a known, an entry or a
// requirement came about.
func (p *Program) Explain(in rows.Input, name string) (*Explanation, error) {
	p, c, err := compile(p.source)
	if err != nil {
		return nil, err
	}
	s := c.symbols[name]
	if s == nil || s.Table != nil || s.Law != nil {
		message := "the sheet gives no entry '" + name + "'"
		if near := problem.Nearest(name, c.allNames()); near != "" {
			message += "; did you mean " + near + "?"
		}
		return nil, errors.New(message)
	}
	trace, err := p.plan.Trace(in)
	if err != nil {
		return nil, err
	}
	x := &explainer{p: p, c: c, trace: trace, seen: map[string]bool{}}
	return x.name(name), nil
}

type explainer struct {
	p     *Program
	c     *compilation
	trace *plan.Trace
	seen  map[string]bool
}

func (x *explainer) name(name string) *Explanation {
	s := x.c.symbols[name]
	e := &Explanation{Name: name, Unit: s.unit.Text(), Scale: scale(s.unit), Form: rows.Number}
	x.value(e, s.Node)
	if s.Node != nil && s.Node.Type.Shape == formula.TruthShape {
		e.Form, e.Unit = rows.Truth, "1"
	}
	switch {
	case s.derive != nil:
		e.Formula, e.Note = s.derive.Formula.Value, s.derive.Note()
	case s.require != nil:
		e.Formula, e.Note = s.require.Condition.Value, s.require.Note()
	default:
		x.known(e, name)
		return e
	}
	if !x.seen[name] {
		x.seen[name] = true
		e.Parts = x.parts(s.parsed)
	}
	return e
}

func (x *explainer) known(e *Explanation, name string) {
	i := x.p.description.KnownIndex(name)
	if i < 0 {
		return
	}
	known := &x.p.description.Knowns[i]
	e.Note, e.Form = known.Note, known.Form
	if known.Form == rows.Choice && e.HasValue && int(e.Value) < len(known.Choices) {
		e.Choice = known.Choices[int(e.Value)]
	}
}

// value takes a node's value from the traced row.
func (x *explainer) value(e *Explanation, n *formula.Node) {
	value, state, reason, found := x.trace.At(n)
	e.HasValue = found && state.Computed()
	e.Value, e.State, e.Reason = value, state, x.p.Reasons()[reason].Text
}

// parts explains the names, calls and constants of a formula, in its order.
func (x *explainer) parts(e *formula.Expression) []*Explanation {
	switch e.Form {
	case formula.Name:
		return []*Explanation{x.name(e.Word)}
	case formula.Member:
		return []*Explanation{x.member(e)}
	case formula.Call:
		if part := x.call(e); part != nil {
			return []*Explanation{part}
		}
	}
	return x.below(e)
}

func (x *explainer) below(e *formula.Expression) []*Explanation {
	var all []*Explanation
	for _, part := range e.Parts {
		all = append(all, x.parts(part)...)
	}
	for _, option := range e.Options {
		all = append(all, x.parts(option.Value)...)
	}
	return all
}

func (x *explainer) member(e *formula.Expression) *Explanation {
	part := &Explanation{Name: e.Word + "." + e.Field, Form: rows.Number}
	if constant, ok := x.c.catalogue.Constant(e.Field); ok && e.Word == "nature" {
		part.Note = constant.Meaning + "; " + constant.Source
		x.value(part, e.Node)
		x.unit(part, constant.Unit)
	}
	return part
}

func (x *explainer) unit(part *Explanation, text string) {
	u, err := unit.Parse(text)
	if err != nil {
		u = unit.One()
	}
	part.Unit, part.Scale = u.Text(), scale(u)
}

// call explains a law's call; the mathematical functions explain themselves.
func (x *explainer) call(e *formula.Expression) *Explanation {
	part := &Explanation{Name: e.Word, Formula: x.c.textAt(e.Whole()), Form: rows.Number}
	l := x.c.catalogue.Law(e.Word)
	own := x.c.symbols[e.Word]
	if l == nil && own == nil {
		return nil
	}
	x.value(part, e.Node)
	part.Law = l
	switch {
	case l == nil:
		part.Note = own.law.Note()
		part.Unit, part.Scale = own.Law.Unit.Text(), scale(own.Law.Unit)
	case l.Result.Type == law.Number && l.Result.SameAs == "":
		x.unit(part, l.Result.Unit)
	case e.Node != nil:
		u := unit.Coherent(e.Node.Type.Dimension)
		part.Unit, part.Scale = u.Text(), scale(u)
	}
	part.Parts = x.below(e)
	return part
}
