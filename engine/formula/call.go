package formula

import (
	"strconv"

	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

func (c *checker) call(e *Expression) *Node {
	if f, ok := findStandard(e.Word); ok {
		return c.standardCall(e, f)
	}
	if l := findListFunction(e.Word); l != nil {
		return c.listCall(e, l)
	}
	if symbol, found := c.Lookup(e.Word); found {
		if symbol.Broken {
			return invalidNode
		}
		if symbol.Law != nil {
			return c.userCall(e, symbol.Law)
		}
		return c.invalid(e, problem.Shape, quote(e.Word)+" is not a law", "a product is written with *")
	}
	if l := c.Catalogue.Law(e.Word); l != nil {
		return c.lawCall(e, l)
	}
	suggestion := ""
	if near := c.Near(e.Word, c.callable); near != "" {
		suggestion = "did you mean " + near + "?"
	}
	if advice, foreign := foreignCalls[e.Word]; foreign {
		suggestion = advice
	}
	return c.invalid(e, problem.UnknownLaw, "there is no law "+quote(e.Word), suggestion)
}

// callable lists the names that may stand before arguments: the sheet's own
// laws, those of the catalogue and the mathematical functions.
func (s *Scope) callable() []string {
	if s.calls != nil {
		return s.calls
	}
	var names []string
	for _, name := range s.Names() {
		if symbol, found := s.Lookup(name); found && symbol.Law != nil {
			names = append(names, name)
		}
	}
	for _, l := range s.Catalogue.Laws() {
		names = append(names, l.Name)
	}
	for _, f := range Standard() {
		names = append(names, f.Name)
	}
	s.calls = names
	return names
}

// positional checks a standard function's number of arguments.
func (c *checker) positional(e *Expression, least, most int) ([]*Node, bool) {
	if len(e.Options) > 0 {
		c.report(e.Options[0].Span, problem.Arguments, e.Word+" takes no named arguments", "")
		return nil, false
	}
	if len(e.Parts) < least || len(e.Parts) > most {
		wants := strconv.Itoa(least)
		if most > 1000 {
			wants = "at least " + wants
		} else if most != least {
			wants += " to " + strconv.Itoa(most)
		}
		wants += " argument"
		if most != 1 {
			wants += "s"
		}
		c.report(e.Span, problem.Arguments, e.Word+" takes "+wants+", not "+strconv.Itoa(len(e.Parts)), "")
		return nil, false
	}
	args := make([]*Node, len(e.Parts))
	for i, part := range e.Parts {
		args[i] = c.check(part)
		if args[i].Type.Shape == Invalid {
			return nil, false
		}
	}
	return args, true
}

func (c *checker) standardCall(e *Expression, f standard) *Node {
	least, most := 1, 1
	switch {
	case f.op == Min || f.op == Max:
		least, most = 2, 1<<20
	case f.rule == alike || f.rule == twoSide:
		least, most = 2, 2
	}
	args, ok := c.positional(e, least, most)
	if !ok {
		return invalidNode
	}
	for i, a := range args {
		if a.Type.Shape != NumberShape {
			advice := ""
			if a.Type.Shape == ListShape && (f.op == Min || f.op == Max) {
				advice = "write smallest(list) or largest(list)"
			}
			return c.invalid(e.Parts[i], problem.Shape, f.name+" takes numbers; this is "+a.Type.Describe(), advice)
		}
	}
	t := args[0].Type
	result := t
	switch f.rule {
	case pureNumber, toAngle, fromAngle:
		if !t.Dimension.IsNone() || t.Kind == unit.Angle && f.rule != fromAngle {
			wants := "a pure number"
			if f.rule == fromAngle {
				wants = "an angle or a pure number"
			}
			advice := "divide by a quantity of the same dimension first"
			if t.Dimension.IsNone() {
				advice = "divide by 1[rad] first"
			}
			return c.invalid(e.Parts[0], problem.Dimension, f.name+" takes "+wants+"; this is "+t.Describe(), advice)
		}
		result = plain()
		if f.rule == toAngle {
			result.Kind = unit.Angle
		}
	case signOf:
		result = plain()
	case sameDimension:
		if t.Kind == unit.TemperaturePoint {
			result.Kind = unit.Plain
		}
	case squareRoot, cubeRoot:
		denominator := 2
		if f.rule == cubeRoot {
			denominator = 3
		}
		d, ok := t.Dimension.Power(1, denominator)
		if !ok {
			return c.invalid(e.Parts[0], problem.Dimension, "this root of "+dimensionText(t.Dimension)+" is not a unit", "")
		}
		result = Type{Shape: NumberShape, Dimension: d}
	case alike, twoSide:
		for i := 1; i < len(args); i++ {
			other := args[i].Type
			if other.Dimension != t.Dimension {
				return c.invalid(e.Parts[i], problem.Dimension, f.name+" takes values of one dimension; this is "+dimensionText(other.Dimension)+", the first is "+dimensionText(t.Dimension), "")
			}
			kind, why := alikeKinds(result.Kind, other.Kind)
			if why != fine {
				return c.invalid(e.Parts[i], problem.Kind, why.message, why.suggestion)
			}
			result.Kind = kind
		}
		if f.rule == twoSide {
			result = Type{Shape: NumberShape, Kind: unit.Angle}
		}
	}
	if len(args) == 1 {
		return c.node(e, Node{Op: f.op, Args: args, Type: result})
	}
	joined := args[0]
	for _, next := range args[1:] {
		joined = c.node(e, Node{Op: f.op, Args: []*Node{joined, next}, Type: result})
	}
	return joined
}

// listCall checks a function of lists and gives it the list's dimension.
func (c *checker) listCall(e *Expression, l *law.Law) *Node {
	n := 1
	switch l.Name {
	case "item":
		n = 2
	case "interpolate":
		n = 3
	}
	args, ok := c.positional(e, n, n)
	if !ok {
		return invalidNode
	}
	listAt := 0
	if l.Name == "interpolate" {
		listAt = 1
	}
	for i, a := range args {
		want := NumberShape
		if i == listAt || l.Name == "interpolate" && i == 2 {
			want = ListShape
		}
		if a.Type.Shape != want {
			return c.invalid(e.Parts[i], problem.Shape, l.Name+" takes "+want.String()+" here; this is "+a.Type.Describe(), "")
		}
	}
	list := args[listAt].Type
	result := Type{Shape: NumberShape, Dimension: list.Dimension, Kind: list.Kind}
	switch l.Name {
	case "count":
		return c.number(e, float64(args[0].Length()), plain())
	case "sum":
		if list.Kind == unit.TemperaturePoint || list.Kind == unit.AbsolutePressure {
			_, why := addKinds(list.Kind, list.Kind)
			return c.invalid(e.Parts[0], problem.Kind, why.message, why.suggestion)
		}
	case "item":
		if !args[1].Type.Dimension.IsNone() {
			return c.invalid(e.Parts[1], problem.Dimension, "an item's number is a pure number; this is "+dimensionText(args[1].Type.Dimension), "")
		}
	case "interpolate":
		x, ys := args[0].Type, args[2].Type
		if x.Dimension != list.Dimension {
			return c.invalid(e.Parts[0], problem.Dimension, "the argument is "+dimensionText(x.Dimension)+", the table's first list "+dimensionText(list.Dimension), "")
		}
		if _, why := alikeKinds(x.Kind, list.Kind); why != fine {
			return c.invalid(e.Parts[0], problem.Kind, why.message, why.suggestion)
		}
		if args[1].Length() != args[2].Length() {
			return c.invalid(e, problem.Shape, "the two lists of a table have the same length; these have "+strconv.Itoa(args[1].Length())+" and "+strconv.Itoa(args[2].Length())+" items", "")
		}
		result = Type{Shape: NumberShape, Dimension: ys.Dimension, Kind: ys.Kind}
	}
	return c.node(e, Node{Op: Apply, Law: l, Args: args, Type: result})
}

// userCall expands a law of the sheet's own.
func (c *checker) userCall(e *Expression, l *UserLaw) *Node {
	for _, name := range c.within {
		if name == l.Name {
			return c.invalid(e, problem.Circle, "the law "+l.Name+" calls itself", "a law of a sheet does not recur")
		}
	}
	args, ok := c.positional(e, len(l.Parameters), len(l.Parameters))
	if !ok {
		return invalidNode
	}
	locals := make(map[string]*Node, len(args))
	for i, a := range args {
		p := l.Parameters[i]
		if a.Type.Shape != NumberShape {
			return c.invalid(e.Parts[i], problem.Shape, l.Name+" takes numbers; this is "+a.Type.Describe(), "")
		}
		if a.Type.Dimension != p.Unit.Dimension() {
			return c.invalid(e.Parts[i], problem.Dimension, quote(p.Name)+" of "+l.Name+" is "+dimensionText(p.Unit.Dimension())+"; this is "+dimensionText(a.Type.Dimension), "")
		}
		if _, message, suggestion := Showable(a.Type.Kind, p.Unit.Kind()); message != "" {
			return c.invalid(e.Parts[i], problem.Kind, message, suggestion)
		}
		// Inside, the argument has the kind with which the law was checked.
		locals[p.Name] = c.withKind(a, p.Unit.Kind())
	}
	inner := &checker{Scope: c.Scope, locals: locals, within: append(append([]string(nil), c.within...), l.Name), quiet: true, place: e.Span}
	if l.Body == nil {
		return invalidNode
	}
	value := inner.asResult(l, inner.check(l.Body))
	if value.Type.Shape == Invalid || l.Valid == nil {
		return value
	}
	condition := inner.check(l.Valid)
	if condition.Type.Shape == Invalid {
		return value
	}
	return c.node(e, Node{Op: Guard, Args: []*Node{value, condition}, Type: value.Type, Text: l.Name + " is used outside its range: valid " + l.ValidText})
}
