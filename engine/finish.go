package engine

import (
	"plumbrule/engine/formula"
	"plumbrule/engine/plan"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/sheet"
	"plumbrule/engine/unit"
)

// scale gives a unit's conversion as plain data.
func scale(u unit.Unit) rows.Scale {
	before, multiply, divide := u.Affine()
	return rows.Scale{Before: before, Multiply: multiply, Divide: divide}
}

// finish checks a name's formula; all that it needs is finished.
func (c *compilation) finish(s *symbol) {
	s.ready = true
	if s.Broken {
		if s.parsed != nil && s.law == nil {
			formula.Check(s.parsed, c.scope) // its other problems are told too
		}
		return
	}
	switch {
	case s.law != nil:
		s.Broken = formula.CheckUserLaw(s.Law, c.scope).Type.Shape == formula.Invalid
	case s.derive != nil:
		c.finishDerive(s)
	case s.require != nil:
		c.finishRequire(s)
	}
}

func (c *compilation) finishDerive(s *symbol) {
	value := formula.Check(s.parsed, c.scope)
	switch value.Type.Shape {
	case formula.NumberShape:
		if !s.hasUnit {
			s.unit = unit.Coherent(value.Type.Dimension)
			if value.Type.Kind == unit.Geopotential {
				s.unit = geopotentialMetre()
			}
		}
		value = formula.Fit(s.parsed, value, s.unit, c.scope)
	case formula.TextShape:
		c.problems.Add(s.parsed, problem.Shape, "an entry is a number, a condition, a list or a ladder, not a text", "make it a known")
		value = nil
	case formula.Invalid:
		value = nil
	default:
		if s.hasUnit {
			c.problems.Add(s.derive.Unit, problem.Shape, value.Type.Describe()+" is shown without a unit", "remove the bracket")
			value = nil
		}
	}
	if value == nil || value.Type.Shape == formula.Invalid {
		s.Broken = true
		return
	}
	c.name(s, value)
}

// geopotentialMetre is the coherent unit of a geopotential height.
func geopotentialMetre() unit.Unit {
	u, err := unit.Parse("gpm")
	if err != nil {
		return unit.Coherent(unit.DimensionOf("m"))
	}
	return u
}

// name makes a value an entry of the sheet. Lists and ladders are entries
// without a number of their own: they live in what is made of them.
func (c *compilation) name(s *symbol, value *formula.Node) {
	if value.Type.Shape != formula.NumberShape && value.Type.Shape != formula.TruthShape {
		s.Node = value
		s.entry = -1
		return
	}
	s.entry = len(c.entries)
	s.Node = c.graph.Make(formula.Node{Op: formula.Entry, Text: s.name.Value, Args: []*formula.Node{value}, Type: value.Type, Place: s.name.Span})
	c.entries = append(c.entries, plan.EntrySpec{Name: s.name.Value, Node: s.Node, Role: rows.Derived})
}

func (c *compilation) finishRequire(s *symbol) {
	condition := formula.Check(s.parsed, c.scope)
	if condition.Type.Shape != formula.TruthShape {
		if condition.Type.Shape != formula.Invalid {
			c.problems.Add(s.parsed, problem.Shape, "a requirement is a condition, not "+condition.Type.Describe(), "write a comparison, as in rating >= 2 * load")
		}
		s.Broken = true
		return
	}
	c.name(s, condition)
	c.entries[s.entry].Role = rows.Requirement
}

// margin gives by how much a comparison is met, or nil where the requirement
// is no comparison of two numbers.
func (c *compilation) margin(s *symbol) (node *formula.Node, shown unit.Unit, ok bool) {
	e := s.parsed
	if e == nil || s.Broken || e.Form != formula.Binary || e.Parts[0].Node == nil || e.Parts[1].Node == nil {
		return nil, unit.Unit{}, false
	}
	left, right := e.Parts[0].Node, e.Parts[1].Node
	if left.Type.Shape != formula.NumberShape || right.Type.Shape != formula.NumberShape {
		return nil, unit.Unit{}, false
	}
	switch e.Word {
	case ">", ">=":
	case "<", "<=":
		left, right = right, left
	default:
		return nil, unit.Unit{}, false
	}
	t := formula.Type{Shape: formula.NumberShape, Dimension: left.Type.Dimension}
	difference := c.graph.Make(formula.Node{Op: formula.Sub, Args: []*formula.Node{left, right}, Type: t, Place: e.Span})
	return difference, c.marginUnit(e, t), true
}

// marginUnit shows a margin in the unit of the first named side.
func (c *compilation) marginUnit(e *formula.Expression, t formula.Type) unit.Unit {
	for _, part := range e.Parts {
		if part.Form != formula.Name {
			continue
		}
		if s := c.symbols[part.Word]; s != nil && s.hasUnit && s.unit.Dimension() == t.Dimension {
			return s.unit.Difference()
		}
	}
	return unit.Coherent(t.Dimension)
}

// listEntries describes the entries in the order of the sheet, margins behind
// their requirements, and gathers the cautions of the laws that are used.
func (c *compilation) listEntries() {
	made := c.entries
	c.entries = make([]plan.EntrySpec, 0, len(made))
	c.description.Entries = make([]rows.Entry, 0, len(made))
	for _, s := range c.results {
		if s.Broken || s.entry < 0 {
			continue
		}
		spec := made[s.entry]
		var note string
		var line int
		e := rows.Entry{Name: s.name.Value, Role: spec.Role, Form: rows.Number}
		if s.derive != nil {
			note, line = s.derive.Note(), s.derive.Line
		} else {
			note, line = s.require.Note(), s.require.Line
		}
		if spec.Node.Type.Shape == formula.TruthShape {
			e.Form, s.unit = rows.Truth, unit.One()
		}
		e.Unit, e.Scale, e.Note, e.Line = s.unit.Text(), scale(s.unit), note, line
		c.addEntry(spec, e)
		if s.require == nil {
			continue
		}
		if difference, shown, ok := c.margin(s); ok {
			name := s.name.Value + " margin"
			node := c.graph.Make(formula.Node{Op: formula.Entry, Text: name, Args: []*formula.Node{difference}, Type: difference.Type, Place: s.name.Span})
			c.addEntry(plan.EntrySpec{Name: name, Node: node, Role: rows.Margin},
				rows.Entry{Name: name, Role: rows.Margin, Form: rows.Number, Unit: shown.Text(), Scale: scale(shown), Line: line})
		}
	}
	c.gatherCautions()
}

// addEntry lists an entry.
func (c *compilation) addEntry(spec plan.EntrySpec, e rows.Entry) {
	c.entries = append(c.entries, spec)
	c.description.Entries = append(c.description.Entries, e)
}

func (c *compilation) gatherCautions() {
	for _, l := range c.scope.Used {
		if l.Caution != "" {
			c.description.Cautions = append(c.description.Cautions, rows.Caution{Law: l.Name, Text: l.Caution})
		}
	}
}

// checkOthers checks the statements that name entries without being entries.
func (c *compilation) checkOthers(read *sheet.Sheet) {
	for _, statement := range read.Statements {
		if c.problems.Full() {
			return
		}
		switch s := statement.(type) {
		case *sheet.Vary:
			if s.Name.Present() && c.needKnown(s.Name) {
				c.notice(s, "vary is not evaluated yet")
			}
		case *sheet.Correlate:
			c.needKnown(s.A)
			c.needKnown(s.B)
		case *sheet.Draw:
			for _, name := range append(append([]sheet.Text(nil), s.Names...), s.Against) {
				c.needName(name)
			}
			c.notice(s, "draw is not evaluated yet")
		case *sheet.Seek:
			c.checkSought(s)
		}
	}
}

func (c *compilation) needName(name sheet.Text) *symbol {
	if !name.Present() {
		return nil
	}
	s := c.symbols[name.Value]
	if s == nil {
		suggestion := ""
		if near := c.scope.Near(name.Value, c.scope.Names); near != "" {
			suggestion = "did you mean " + near + "?"
		}
		c.problems.Add(name, problem.Unknown, "no statement gives '"+name.Value+"'", suggestion)
	}
	return s
}

func (c *compilation) needKnown(name sheet.Text) bool {
	s := c.needName(name)
	if s == nil {
		return false
	}
	if s.Node != nil && s.Node.Op != formula.KnownOp || s.Table != nil || s.Law != nil {
		c.problems.Add(name, problem.Shape, "'"+name.Value+"' is not a known", "only a known is varied or correlated")
		return false
	}
	return true
}

// checkSought checks both sides of a seek statement.
func (c *compilation) checkSought(s *sheet.Seek) {
	left, right := c.parse(s.Left), c.parse(s.Right)
	if left == nil || right == nil {
		return
	}
	equation := &formula.Expression{Form: formula.Binary, Word: "==", Parts: []*formula.Expression{left, right}, Span: left.Span}
	formula.Check(equation, c.scope)
}
