package formula

import (
	"strings"

	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// checker checks one formula in a scope and builds its typed tree.
type checker struct {
	*Scope
	locals map[string]*Node // parameters of the sheet's own law that is being expanded
	within []string         // the sheet's own laws that are being expanded, outermost first
	quiet  bool             // expanding a law whose problems are told elsewhere
	place  problem.Span     // where expanded parts are said to stand
}

// Check checks a formula and gives its typed tree. Where a problem stands the
// node's shape is Invalid and the problem has been reported.
func Check(e *Expression, scope *Scope) *Node {
	c := &checker{Scope: scope}
	return c.check(e)
}

// CheckUserLaw checks the body of a sheet's own law with its declared
// parameters, so that problems are told once, at the law itself.
func CheckUserLaw(l *UserLaw, scope *Scope) *Node {
	c := &checker{Scope: scope, locals: map[string]*Node{}, within: []string{l.Name}}
	for i, p := range l.Parameters {
		c.locals[p.Name] = scope.Make(Node{Op: KnownOp, Index: -1 - i, Text: l.Name, Type: Type{Shape: NumberShape, Dimension: p.Unit.Dimension(), Kind: p.Unit.Kind()}})
	}
	value := c.check(l.Body)
	value = c.asResult(l, value)
	if l.Valid != nil {
		if valid := c.check(l.Valid); valid.Type.Shape != TruthShape && valid.Type.Shape != Invalid {
			c.report(l.Valid.Span, problem.Shape, "a law's range is a condition, not "+valid.Type.Describe(), "write a comparison, as in valid x > 0[m]")
		}
	}
	return value
}

// asResult checks that a sheet law's formula fits its declared unit.
func (c *checker) asResult(l *UserLaw, value *Node) *Node {
	if value.Type.Shape == Invalid {
		return value
	}
	if value.Type.Shape != NumberShape {
		return c.invalid(l.Body, problem.Shape, "a law of a sheet gives a number, not "+value.Type.Describe(), "")
	}
	if !l.HasUnit {
		return value
	}
	return c.fit(l.Body, value, l.Unit)
}

// fit checks that a number may be shown in a unit and gives it the unit's kind.
func (c *checker) fit(e *Expression, value *Node, u unit.Unit) *Node {
	if value.Type.Dimension != u.Dimension() {
		return c.invalid(e, problem.Dimension, "the formula gives "+dimensionText(value.Type.Dimension)+", the unit "+u.Text()+" is "+dimensionText(u.Dimension()), "")
	}
	kind, message, suggestion := Showable(value.Type.Kind, u.Kind())
	if message != "" {
		return c.invalid(e, problem.Kind, message, suggestion)
	}
	return c.withKind(value, kind)
}

// Fit checks that a checked number may be shown in a unit.
func Fit(e *Expression, value *Node, u unit.Unit, scope *Scope) *Node {
	c := &checker{Scope: scope}
	if value.Type.Shape == Invalid {
		return value
	}
	return c.fit(e, value, u)
}

func (c *checker) withKind(value *Node, kind unit.Kind) *Node {
	t := value.Type
	t.Kind = kind
	return c.retype(value, t)
}

func (c *checker) report(at problem.Span, code problem.Code, message, suggestion string) {
	if !c.quiet {
		c.Problems.Add(at, code, message, suggestion)
	}
}

var invalidNode = &Node{Op: Const, Type: Type{Shape: Invalid}}

func (c *checker) invalid(e *Expression, code problem.Code, message, suggestion string) *Node {
	c.report(e.Span, code, message, suggestion)
	return invalidNode
}

// node makes a node that stands where e stands.
func (c *checker) node(e *Expression, n Node) *Node {
	n.Place = e.Whole()
	c.made++
	if c.made == MostNodes {
		at := e.Span
		if c.within != nil {
			at = c.place
		}
		c.Problems.Add(at, problem.Limit, "the formulas of the sheet come to more than four million parts", "work on shorter lists, or part the sheet")
	}
	if c.made >= MostNodes {
		return invalidNode
	}
	if c.within != nil {
		c.expanded++
		if c.expanded == MostExpansion {
			c.Problems.Add(c.place, problem.Limit, "the sheet's own laws expand to more than a million parts", "let a law call another law once and keep the result in a parameter")
		}
		if c.expanded >= MostExpansion {
			return invalidNode
		}
	}
	return c.Make(n)
}

func (c *checker) number(e *Expression, value float64, t Type) *Node {
	return c.node(e, Node{Op: Const, Value: value, Type: t})
}

func (c *checker) check(e *Expression) *Node {
	if c.made >= MostNodes {
		return invalidNode
	}
	n := c.checkForm(e)
	if !c.quiet {
		e.Node = n
	}
	return n
}

func (c *checker) checkForm(e *Expression) *Node {
	switch e.Form {
	case Number:
		return c.number(e, e.Value, plain())
	case Truth:
		return c.number(e, e.Value, truth())
	case Text:
		return c.node(e, Node{Op: Word, Text: e.Word, Type: Type{Shape: TextShape}})
	case Name:
		return c.name(e)
	case Member:
		return c.member(e)
	case WithUnit:
		return c.withUnit(e)
	case Unary:
		return c.unary(e)
	case Binary:
		return c.binary(e)
	case Choice:
		return c.choice(e)
	case List:
		return c.list(e)
	}
	return c.call(e)
}

func (c *checker) name(e *Expression) *Node {
	if local, ok := c.locals[e.Word]; ok {
		return local
	}
	symbol, found := c.Lookup(e.Word)
	switch {
	case !found:
		return c.unknownName(e)
	case symbol.Broken:
		return invalidNode
	case symbol.Table != nil:
		return c.invalid(e, problem.Shape, quote(e.Word)+" is a table", "read one of its columns, as in "+e.Word+"."+firstColumn(symbol.Table))
	case symbol.Law != nil:
		return c.invalid(e, problem.Shape, quote(e.Word)+" is a law", "call it with its arguments in parentheses")
	}
	return symbol.Node
}

func firstColumn(t *Table) string {
	if len(t.Columns) == 0 {
		return "column"
	}
	return t.Columns[0].Name
}

func (c *checker) unknownName(e *Expression) *Node {
	names := func() []string {
		names := c.Names()
		for name := range c.locals {
			names = append(names, name)
		}
		return names
	}
	suggestion := ""
	if e.Form == Name && (IsStandard(e.Word) || c.Catalogue.Law(e.Word) != nil) {
		return c.invalid(e, problem.Shape, quote(e.Word)+" is a law", "call it with its arguments in parentheses")
	}
	if _, isConstant := c.Catalogue.Constant(e.Word); isConstant {
		suggestion = "write nature." + e.Word
	} else if near := c.Near(e.Word, names); near != "" {
		suggestion = "did you mean " + near + "?"
	} else if _, err := unit.Parse(e.Word); err == nil {
		suggestion = "a unit stands in brackets, as in 5[" + e.Word + "]"
	}
	return c.invalid(e, problem.Unknown, "no statement gives "+quote(e.Word), suggestion)
}

func (c *checker) member(e *Expression) *Node {
	if e.Word == "nature" {
		constant, ok := c.Catalogue.Constant(e.Field)
		if !ok {
			suggestion := ""
			if near := c.Catalogue.NearestConstant(e.Field); near != "" {
				suggestion = "did you mean nature." + near + "?"
			}
			return c.invalid(e, problem.Unknown, "there is no constant nature."+e.Field, suggestion)
		}
		u, err := unit.Parse(constant.Unit)
		if err != nil {
			return c.invalid(e, problem.UnknownUnit, "the constant's unit "+constant.Unit+" is not known", "")
		}
		return c.number(e, u.ToSI(constant.Value), Type{Shape: NumberShape, Dimension: u.Dimension()})
	}
	symbol, found := c.Lookup(e.Word)
	if !found {
		return c.unknownName(e)
	}
	if symbol.Broken {
		return invalidNode
	}
	if symbol.Table == nil {
		return c.invalid(e, problem.Shape, quote(e.Word)+" is not a table", "only a table's columns are read with a dot")
	}
	names := make([]string, 0, len(symbol.Table.Columns))
	for i := range symbol.Table.Columns {
		column := &symbol.Table.Columns[i]
		if column.Name == e.Field {
			return c.node(e, Node{Op: Items, Numbers: column.Numbers, Type: Type{Shape: ListShape, Dimension: column.Unit.Dimension(), Kind: column.Unit.Kind(), Length: len(column.Numbers)}})
		}
		names = append(names, column.Name)
	}
	suggestion := "its columns are " + strings.Join(names, ", ")
	if near := problem.Nearest(e.Field, names); near != "" {
		suggestion = "did you mean " + e.Word + "." + near + "?"
	}
	return c.invalid(e, problem.UnknownColumn, "the table "+e.Word+" has no column "+quote(e.Field), suggestion)
}

// withUnit gives a pure number, or a list of them, its unit.
func (c *checker) withUnit(e *Expression) *Node {
	inner := e.Parts[0]
	value := c.check(inner)
	t := value.Type
	if t.Shape == Invalid {
		return value
	}
	if t.Shape != NumberShape && t.Shape != ListShape {
		return c.invalid(e, problem.Shape, "a unit belongs to a number or a list, not to "+t.Describe(), "")
	}
	if !t.Dimension.IsNone() || t.Kind != unit.Plain {
		per := "rad"
		if !t.Dimension.IsNone() {
			per = unit.CoherentText(t.Dimension)
		}
		return c.invalid(e, problem.BracketOnUnits, "this value already is "+t.Describe(), "divide by a unit to get a pure number, as in (x / 1["+per+"])")
	}
	result := Type{Shape: NumberShape, Dimension: e.Unit.Dimension(), Kind: e.Unit.Kind()}
	if t.Shape == ListShape {
		return c.mapList(e, value, func(item *Node) *Node { return c.scaled(e, item, e.Unit, result) }, result)
	}
	return c.scaled(e, value, e.Unit, result)
}

// scaled gives the SI value of a pure number in a unit.
func (c *checker) scaled(e *Expression, value *Node, u unit.Unit, t Type) *Node {
	if value.IsConst() {
		return c.number(e, u.ToSI(value.Value), t)
	}
	before, multiply, divide := u.Affine()
	result := value
	if before != 0 {
		result = c.node(e, Node{Op: Add, Args: []*Node{result, c.number(e, before, plain())}, Type: t})
	}
	if multiply != 1 {
		result = c.node(e, Node{Op: Mul, Args: []*Node{result, c.number(e, multiply, plain())}, Type: t})
	}
	if divide != 1 {
		result = c.node(e, Node{Op: Div, Args: []*Node{result, c.number(e, divide, plain())}, Type: t})
	}
	return c.retype(result, t)
}

// retype gives a node another type without computing anything.
func (c *checker) retype(n *Node, t Type) *Node {
	if n.Type == t {
		return n
	}
	if n.Op == Const {
		changed := *n
		changed.Type = t
		return c.Make(changed)
	}
	return c.Make(Node{Op: Same, Args: []*Node{n}, Type: t, Place: n.Place})
}

// mapList applies f, which gives values of type t, to every item of a list.
func (c *checker) mapList(e *Expression, list *Node, f func(*Node) *Node, t Type) *Node {
	items := make([]*Node, 0, list.Length())
	for _, item := range c.spread(e, list) {
		mapped := f(item)
		if mapped.Type.Shape == Invalid {
			return invalidNode
		}
		items = append(items, mapped)
	}
	return c.listOf(e, items, t)
}

// spread gives the items of a list as nodes.
func (c *checker) spread(e *Expression, list *Node) []*Node {
	if list.Numbers == nil {
		return list.Args
	}
	items := make([]*Node, len(list.Numbers))
	t := Type{Shape: NumberShape, Dimension: list.Type.Dimension, Kind: list.Type.Kind}
	for i, x := range list.Numbers {
		items[i] = c.number(e, x, t)
	}
	return items
}

func (c *checker) list(e *Expression) *Node {
	if len(e.Parts) == 0 {
		return c.invalid(e, problem.Shape, "a list has at least one item", "")
	}
	items := make([]*Node, len(e.Parts))
	broken := false
	var t Type
	for i, part := range e.Parts {
		items[i] = c.check(part)
		item := items[i].Type
		switch {
		case item.Shape == Invalid:
			broken = true
			continue
		case item.Shape != NumberShape:
			c.invalid(part, problem.Shape, "a list holds numbers, not "+item.Describe(), "")
			broken = true
			continue
		}
		if t.Shape == Invalid {
			t = item
			continue
		}
		if item.Dimension != t.Dimension {
			c.invalid(part, problem.Dimension, "the items of a list have one dimension: this one is "+dimensionText(item.Dimension)+", those before are "+dimensionText(t.Dimension), "")
			broken = true
			continue
		}
		kind, why := alikeKinds(t.Kind, item.Kind)
		if why != fine {
			c.invalid(part, problem.Kind, why.message, why.suggestion)
			broken = true
		}
		t.Kind = kind
	}
	if broken {
		return invalidNode
	}
	return c.listOf(e, items, t)
}

// listOf makes a list of items of one type.
func (c *checker) listOf(e *Expression, items []*Node, item Type) *Node {
	t := Type{Shape: ListShape, Dimension: item.Dimension, Kind: item.Kind, Length: len(items)}
	numbers := make([]float64, 0, len(items))
	for _, item := range items {
		if item.IsConst() {
			numbers = append(numbers, item.Value)
		}
	}
	if len(items) > 0 && len(numbers) == len(items) {
		return c.node(e, Node{Op: Items, Numbers: numbers, Type: t})
	}
	return c.node(e, Node{Op: Items, Args: items, Type: t})
}
