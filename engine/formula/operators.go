package formula

import (
	"strconv"

	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

func (c *checker) unary(e *Expression) *Node {
	inner := e.Parts[0]
	if e.Word == "-" && inner.Form == WithUnit && inner.Parts[0].Form == Number && inner.Unit.Kind() == unit.TemperaturePoint {
		// The sign of -5[degC] belongs to the number on the scale.
		value := inner.Unit.ToSI(-inner.Parts[0].Value)
		return c.number(e, value, Type{Shape: NumberShape, Dimension: inner.Unit.Dimension(), Kind: inner.Unit.Kind()})
	}
	value := c.check(inner)
	t := value.Type
	if t.Shape == Invalid {
		return value
	}
	if e.Word == "not" {
		if t.Shape != TruthShape {
			return c.invalid(e, problem.Shape, "not takes a condition, not "+t.Describe(), "")
		}
		return c.node(e, Node{Op: Not, Args: []*Node{value}, Type: truth()})
	}
	if t.Shape != NumberShape && t.Shape != ListShape {
		return c.invalid(e, problem.Shape, "a sign belongs to a number, not to "+t.Describe(), "")
	}
	switch t.Kind {
	case unit.TemperaturePoint:
		return c.invalid(e, problem.Kind, "a temperature on a scale has no negative", "write the sign on the number, as in -5[degC]")
	case unit.AbsolutePressure:
		t.Kind = unit.Plain
	}
	item := t
	item.Shape, item.Length = NumberShape, 0
	negative := func(x *Node) *Node { return c.node(e, Node{Op: Neg, Args: []*Node{x}, Type: item}) }
	if t.Shape == ListShape {
		return c.mapList(e, value, negative, item)
	}
	return negative(value)
}

func (c *checker) binary(e *Expression) *Node {
	left, right := c.check(e.Parts[0]), c.check(e.Parts[1])
	a, b := left.Type, right.Type
	if a.Shape == Invalid || b.Shape == Invalid {
		return invalidNode
	}
	switch e.Word {
	case "and", "or":
		if a.Shape != TruthShape || b.Shape != TruthShape {
			wrong := e.Parts[0]
			if a.Shape == TruthShape {
				wrong, a = e.Parts[1], b
			}
			return c.invalid(wrong, problem.Shape, e.Word+" joins two conditions; this is "+a.Describe(), "")
		}
		// The second condition counts only where the first does not decide.
		if e.Word == "and" {
			return c.selected(e, left, right, c.number(e, 0, truth()))
		}
		return c.selected(e, left, c.number(e, 1, truth()), right)
	case "<", "<=", ">", ">=", "==", "!=":
		return c.compare(e, left, right)
	}
	for i, t := range []Type{a, b} {
		if t.Shape != NumberShape && t.Shape != ListShape {
			return c.invalid(e.Parts[i], problem.Shape, quote(e.Word)+" joins numbers; this is "+t.Describe(), "")
		}
	}
	if a.Shape == ListShape || b.Shape == ListShape {
		return c.elementwise(e, left, right)
	}
	return c.arithmetic(e, left, right)
}

// elementwise joins a list with a number, or two lists of one length, item by item.
func (c *checker) elementwise(e *Expression, left, right *Node) *Node {
	lists := left.Type.Shape == ListShape && right.Type.Shape == ListShape
	if lists && left.Length() != right.Length() {
		return c.invalid(e, problem.Shape, "two lists joined item by item have the same length; these have "+strconv.Itoa(left.Length())+" and "+strconv.Itoa(right.Length())+" items", "")
	}
	n := left.Length()
	if left.Type.Shape != ListShape {
		n = right.Length()
	}
	items := make([]*Node, n)
	lefts, rights := c.operands(e, left, n), c.operands(e, right, n)
	for i := range items {
		items[i] = c.arithmetic(e, lefts[i], rights[i])
		if items[i].Type.Shape == Invalid {
			return invalidNode
		}
	}
	return c.listOf(e, items, items[0].Type)
}

func (c *checker) operands(e *Expression, value *Node, n int) []*Node {
	if value.Type.Shape == ListShape {
		return c.spread(e, value)
	}
	same := make([]*Node, n)
	for i := range same {
		same[i] = value
	}
	return same
}

func (c *checker) arithmetic(e *Expression, left, right *Node) *Node {
	a, b := left.Type, right.Type
	result := Type{Shape: NumberShape}
	var op Op
	switch e.Word {
	case "+", "-":
		if a.Dimension != b.Dimension {
			verb := "added"
			if e.Word == "-" {
				verb = "subtracted"
			}
			return c.invalid(e, problem.Dimension, dimensionText(a.Dimension)+" and "+dimensionText(b.Dimension)+" cannot be "+verb, bareNumberAdvice(e, a, b))
		}
		result.Dimension = a.Dimension
		var why clash
		if e.Word == "+" {
			op = Add
			result.Kind, why = addKinds(a.Kind, b.Kind)
		} else {
			op = Sub
			result.Kind, why = subtractKinds(a.Kind, b.Kind)
		}
		if why != fine {
			return c.invalid(e, problem.Kind, why.message, why.suggestion)
		}
	case "*":
		op = Mul
		result.Dimension = a.Dimension.Times(b.Dimension)
		result.Kind = scaleKind(a, b)
		if result.Kind == unit.Plain {
			result.Kind = scaleKind(b, a)
		}
	case "/":
		op = Div
		result.Dimension = a.Dimension.Over(b.Dimension)
		result.Kind = scaleKind(a, b)
	default:
		return c.power(e, left, right)
	}
	return c.node(e, Node{Op: op, Args: []*Node{left, right}, Type: result})
}

// bareNumberAdvice helps where one side is a bare number and the other is not.
func bareNumberAdvice(e *Expression, a, b Type) string {
	for i, pairOf := range [][2]Type{{a, b}, {b, a}} {
		if pairOf[0].Dimension.IsNone() && len(e.Parts) == 2 && e.Parts[i].Form == Number {
			return "give the number its unit in brackets, as in 5[" + unit.CoherentText(pairOf[1].Dimension) + "]"
		}
	}
	return ""
}

// power checks a^b: the exponent is a pure number, and a fixed fraction of
// small whole numbers where the base has a dimension.
func (c *checker) power(e *Expression, left, right *Node) *Node {
	a, b := left.Type, right.Type
	if !b.Dimension.IsNone() {
		return c.invalid(e.Parts[1], problem.Dimension, "an exponent is a pure number; this is "+dimensionText(b.Dimension), "divide it by a quantity of the same dimension")
	}
	result := plain()
	if !a.Dimension.IsNone() {
		if !right.IsConst() {
			return c.invalid(e.Parts[1], problem.Dimension, "the exponent of a value with a unit is fixed before the first row", "write a number, or divide the base by a unit")
		}
		numerator, denominator, ok := fraction(right.Value)
		if ok {
			result.Dimension, ok = a.Dimension.Power(numerator, denominator)
		}
		if !ok {
			return c.invalid(e.Parts[1], problem.Dimension, "this power of "+dimensionText(a.Dimension)+" is not a unit", "use whole numbers, halves, thirds or quarters")
		}
	}
	if right.IsConst() {
		switch right.Value {
		case 1:
			return c.retype(left, result)
		case 2:
			return c.node(e, Node{Op: Mul, Args: []*Node{left, left}, Type: result})
		case -1:
			return c.node(e, Node{Op: Div, Args: []*Node{c.number(e, 1, plain()), left}, Type: result})
		case 0.5:
			return c.node(e, Node{Op: Sqrt, Args: []*Node{left}, Type: result})
		}
	}
	return c.node(e, Node{Op: Pow, Args: []*Node{left, right}, Type: result})
}

// fraction gives x as a fraction with a denominator up to 12.
func fraction(x float64) (numerator, denominator int, ok bool) {
	for denominator = 1; denominator <= 12; denominator++ {
		scaled := float64(x * float64(denominator))
		nearest := float64(int(scaled + 0.5))
		if scaled < 0 {
			nearest = float64(int(scaled - 0.5))
		}
		if nearest/float64(denominator) == x && nearest < 1000 && nearest > -1000 {
			return int(nearest), denominator, true
		}
	}
	return 0, 0, false
}

func (c *checker) compare(e *Expression, left, right *Node) *Node {
	a, b := left.Type, right.Type
	equality := e.Word == "==" || e.Word == "!="
	if a.Shape == TextShape || b.Shape == TextShape {
		return c.compareTexts(e, left, right, equality)
	}
	for i, t := range []Type{a, b} {
		if t.Shape != NumberShape {
			return c.invalid(e.Parts[i], problem.Shape, quote(e.Word)+" compares numbers; this is "+t.Describe(), "")
		}
	}
	if a.Dimension != b.Dimension {
		return c.invalid(e, problem.Dimension, dimensionText(a.Dimension)+" and "+dimensionText(b.Dimension)+" cannot be compared", bareNumberAdvice(e, a, b))
	}
	if _, why := alikeKinds(a.Kind, b.Kind); why != fine {
		return c.invalid(e, problem.Kind, why.message, why.suggestion)
	}
	n := Node{Args: []*Node{left, right}, Type: truth()}
	switch e.Word {
	case "<":
		n.Op = Less
	case "<=":
		n.Op = LessEqual
	case ">":
		n.Op, n.Args = Less, []*Node{right, left}
	case ">=":
		n.Op, n.Args = LessEqual, []*Node{right, left}
	case "==":
		n.Op = Equal
	case "!=":
		n.Op = NotEqual
	}
	return c.node(e, n)
}

// compareTexts compares two texts, or a text known with one of its choices.
func (c *checker) compareTexts(e *Expression, left, right *Node, equality bool) *Node {
	for i, n := range []*Node{left, right} {
		if n.Type.Shape != TextShape {
			return c.invalid(e.Parts[i], problem.Shape, "a text is compared with a text; this is "+n.Type.Describe(), "")
		}
	}
	if !equality {
		return c.invalid(e, problem.Shape, "texts have no order", "compare them with == or !=")
	}
	op := Equal
	if e.Word == "!=" {
		op = NotEqual
	}
	if left.Op == Word && right.Op == Word {
		same := 0.0
		if (left.Text == right.Text) == (op == Equal) {
			same = 1
		}
		return c.number(e, same, truth())
	}
	known, word, wordPart := left, right, e.Parts[1]
	if left.Op == Word {
		known, word, wordPart = right, left, e.Parts[0]
	}
	if word.Op != Word {
		return c.invalid(e, problem.Shape, "a text known is compared with a text in quotes", "write one of its choices")
	}
	for i, choice := range c.choicesOf(known) {
		if choice == word.Text {
			index := c.number(e, float64(i), plain())
			return c.node(e, Node{Op: op, Args: []*Node{known, index}, Type: truth()})
		}
	}
	return c.invalid(wordPart, problem.Choice, quote(word.Text)+" is not one of the choices of "+known.Text, "add or \""+word.Text+"\" where it is known")
}

// choicesOf gives the choices of a text known.
func (c *checker) choicesOf(known *Node) []string {
	symbol, found := c.Lookup(known.Text)
	if !found {
		return nil
	}
	return symbol.Choices
}

func (c *checker) choice(e *Expression) *Node {
	condition, yes, no := c.check(e.Parts[0]), c.check(e.Parts[1]), c.check(e.Parts[2])
	if condition.Type.Shape == Invalid || yes.Type.Shape == Invalid || no.Type.Shape == Invalid {
		return invalidNode
	}
	if condition.Type.Shape != TruthShape {
		return c.invalid(e.Parts[0], problem.Shape, "a choice needs a condition before '?'; this is "+condition.Type.Describe(), "")
	}
	a, b := yes.Type, no.Type
	if a.Shape != b.Shape || a.Shape != NumberShape && a.Shape != TruthShape {
		return c.invalid(e, problem.Shape, "the two values of a choice are two numbers or two conditions; these are "+a.Describe()+" and "+b.Describe(), "")
	}
	if a.Dimension != b.Dimension {
		return c.invalid(e, problem.Dimension, "the two values of a choice have one dimension; these are "+dimensionText(a.Dimension)+" and "+dimensionText(b.Dimension), "")
	}
	kind, why := alikeKinds(a.Kind, b.Kind)
	if why != fine {
		return c.invalid(e, problem.Kind, why.message, why.suggestion)
	}
	a.Kind = kind
	return c.selected(e, condition, c.retype(yes, a), c.retype(no, a))
}

// selected takes one of two values of one type by a condition.
func (c *checker) selected(e *Expression, condition, yes, no *Node) *Node {
	if condition.IsConst() {
		if condition.Value != 0 {
			return yes
		}
		return no
	}
	return c.node(e, Node{Op: Select, Args: []*Node{condition, yes, no}, Type: yes.Type})
}
