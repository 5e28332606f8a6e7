package formula

import (
	"strconv"
	"strings"

	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// lawCall checks a call of a law of the catalogue: arguments by position, then
// options by name, defaults filled in, each with the parameter's dimension and
// kind.
func (c *checker) lawCall(e *Expression, l *law.Law) *Node {
	given, ok := c.arrange(e, l)
	if !ok {
		return invalidNode
	}
	c.use(l)
	args := make([]*Node, len(l.Parameters))
	broken := false
	for i := range l.Parameters {
		part := given[i]
		if part == nil {
			if d := c.defaultOf(l.Parameters[i].Default, e.Span); d != nil {
				args[i] = c.accept(e, d, l, &l.Parameters[i], c.checkForm(d))
			} else {
				args[i] = invalidNode
			}
		} else {
			args[i] = c.accept(e, part, l, &l.Parameters[i], c.check(part))
		}
		broken = broken || args[i].Type.Shape == Invalid
	}
	if broken {
		return invalidNode
	}
	if !c.listsAgree(e, l, given, args) {
		return invalidNode
	}
	if l.Result.Type == law.Made {
		return c.node(e, Node{Op: MadeOp, Law: l, Args: args, Type: Type{Shape: MadeShape, Made: l.Result.Made}})
	}
	result, ok := c.resultOf(e, l, args)
	if !ok {
		return invalidNode
	}
	if l.Result.Type == law.List {
		return c.lawList(e, l, args, result)
	}
	return c.applyForChoices(e, l, args, result)
}

// arrange puts a call's arguments in the order of the law's parameters.
func (c *checker) arrange(e *Expression, l *law.Law) ([]*Expression, bool) {
	given := make([]*Expression, len(l.Parameters))
	required := l.Required()
	if len(e.Parts) > required {
		message := l.Name + " takes " + counted(required, "argument") + " by position, not " + strconv.Itoa(len(e.Parts))
		suggestion := ""
		if len(l.Parameters) > required {
			option := &l.Parameters[required]
			suggestion = "pass the others by name, as in " + option.Name + ": " + option.Default
		}
		c.report(e.Parts[required].Span, problem.Arguments, message, suggestion)
		return nil, false
	}
	if len(e.Parts) < required {
		c.report(e.Span, problem.Arguments, l.Name+" needs "+quote(l.Parameters[len(e.Parts)].Name)+": "+l.Parameters[len(e.Parts)].Meaning, "write "+Signature(l))
		return nil, false
	}
	copy(given, e.Parts)
	for _, option := range e.Options {
		at := -1
		var names []string
		for i := range l.Parameters {
			if l.Parameters[i].Optional() {
				names = append(names, l.Parameters[i].Name)
			}
			if l.Parameters[i].Name == option.Name {
				at = i
			}
		}
		switch {
		case at < 0:
			suggestion := l.Name + " has no options"
			if near := problem.Nearest(option.Name, names); near != "" {
				suggestion = "did you mean " + near + "?"
			} else if len(names) > 0 {
				suggestion = "its options are " + strings.Join(names, ", ")
			}
			c.report(option.Span, problem.Arguments, l.Name+" has no option "+quote(option.Name), suggestion)
			return nil, false
		case given[at] != nil:
			c.report(option.Span, problem.Arguments, quote(option.Name)+" is given twice", "")
			return nil, false
		}
		given[at] = option.Value
	}
	return given, true
}

// Signature gives how a law is called: "normal_gravity(latitude, height: 0[m])".
func Signature(l *law.Law) string {
	var b strings.Builder
	b.WriteString(l.Name + "(")
	for i := range l.Parameters {
		if i > 0 {
			b.WriteString(", ")
		}
		b.WriteString(l.Parameters[i].Name)
		if l.Parameters[i].Optional() {
			b.WriteString(": " + l.Parameters[i].Default)
		}
	}
	b.WriteString(")")
	return b.String()
}

// accept checks one argument against its parameter and converts it where the
// parameter takes other dimensions or kinds too.
func (c *checker) accept(e, part *Expression, l *law.Law, p *law.Parameter, value *Node) *Node {
	t := value.Type
	if t.Shape == Invalid {
		return value
	}
	want := shapeOf(p.Type)
	if t.Shape != want {
		wanted := want.String()
		if p.Type == law.Made {
			wanted = "a " + p.Made
		}
		return c.invalid(part, problem.Shape, quote(p.Name)+" of "+l.Name+" is "+wanted+"; this is "+t.Describe(), "")
	}
	switch p.Type {
	case law.Text:
		return c.acceptText(part, l, p, value)
	case law.Made:
		if t.Made != p.Made {
			return c.invalid(part, problem.Shape, quote(p.Name)+" of "+l.Name+" is a "+p.Made+"; this is a "+t.Made, "")
		}
		return value
	}
	wanted, err := unit.Parse(p.Unit)
	if err != nil {
		return c.invalid(e, problem.UnknownUnit, "the law "+l.Name+" states its range in an unknown unit", "")
	}
	message, suggestion := argumentClash(t, wanted)
	if message == "" && t.Dimension == wanted.Dimension() {
		return value
	}
	for i := range p.Accepts {
		conversion := &p.Accepts[i]
		other, err := unit.Parse(conversion.Unit)
		if err != nil || other.Dimension() != t.Dimension {
			continue
		}
		if t.Kind == unit.TemperaturePoint && other.Kind() != unit.TemperaturePoint {
			// Kelvin as a measure of energy is no temperature on a scale.
			return c.invalid(part, problem.Kind, quote(p.Name)+" of "+l.Name+": a temperature on a scale is none", "give it in "+conversion.Unit+", as in 300["+conversion.Unit+"]")
		}
		if clash, _ := argumentClash(t, other); clash == "" {
			return c.converted(part, value, conversion, wanted)
		}
	}
	if t.Dimension != wanted.Dimension() {
		advice := ""
		switch {
		case !t.Dimension.IsNone():
		case part.Form == Number:
			advice = "give the number its unit in brackets, as in 5[" + p.Unit + "]"
		case part.Form == List:
			advice = "give the list its unit in brackets, as in [1, 2][" + p.Unit + "]"
		}
		return c.invalid(part, problem.Dimension, quote(p.Name)+" of "+l.Name+" is "+p.Meaning+" ("+dimensionText(wanted.Dimension())+"); this is "+dimensionText(t.Dimension), advice)
	}
	return c.invalid(part, problem.Kind, quote(p.Name)+" of "+l.Name+": "+message, suggestion)
}

func shapeOf(t law.Type) Shape {
	switch t {
	case law.List:
		return ListShape
	case law.Text:
		return TextShape
	case law.Made:
		return MadeShape
	}
	return NumberShape
}

// argumentClash says why a value of one kind cannot serve a parameter of
// another, dimensions alike.
func argumentClash(t Type, wanted unit.Unit) (message, suggestion string) {
	switch wanted.Kind() {
	case unit.Plain:
		if t.Kind == unit.Geopotential {
			return heightMix.message, "convert with geometric_height(h)"
		}
		return "", ""
	case unit.Angle:
		if t.Kind != unit.Angle {
			return "an angle is needed, not a pure number", "give the number its unit, as in 45[deg]"
		}
		return "", ""
	case unit.TemperaturePoint:
		if t.Kind == unit.TemperatureDifference {
			return "a temperature is needed, not a temperature difference", "add the difference to a temperature"
		}
		return "", ""
	}
	_, message, suggestion = Showable(t.Kind, wanted.Kind())
	return message, suggestion
}

func (c *checker) converted(part *Expression, value *Node, conversion *law.Conversion, wanted unit.Unit) *Node {
	t := Type{Shape: NumberShape, Dimension: wanted.Dimension(), Kind: wanted.Kind()}
	one := func(x *Node) *Node {
		if conversion.By != nil {
			return c.node(part, Node{Op: Apply, Law: conversion.By, Args: []*Node{x}, Type: t})
		}
		if conversion.Factor == 1 {
			return c.retype(x, t)
		}
		return c.node(part, Node{Op: Mul, Args: []*Node{x, c.number(part, conversion.Factor, plain())}, Type: t})
	}
	if value.Type.Shape == ListShape {
		return c.mapList(part, value, one, t)
	}
	return one(value)
}

// acceptText checks a text argument, or each choice of a text known.
func (c *checker) acceptText(part *Expression, l *law.Law, p *law.Parameter, value *Node) *Node {
	texts := []string{value.Text}
	if value.Op == KnownOp {
		texts = c.choicesOf(value)
	}
	for _, text := range texts {
		if p.Choices != nil {
			known := false
			for _, choice := range p.Choices {
				known = known || choice == text
			}
			if !known {
				suggestion := "its choices are \"" + strings.Join(p.Choices, "\", \"") + "\""
				if near := problem.Nearest(text, p.Choices); near != "" {
					suggestion = "did you mean \"" + near + "\"?"
				}
				return c.invalid(part, problem.Choice, "\""+text+"\" is not a choice of "+quote(p.Name)+" of "+l.Name, suggestion)
			}
		}
		if p.CheckText != nil {
			if wrong := p.CheckText(text); wrong != "" {
				return c.invalid(part, problem.Choice, "\""+text+"\": "+wrong, "")
			}
		}
	}
	return value
}

// listsAgree checks that the lists of one call are of one length.
func (c *checker) listsAgree(e *Expression, l *law.Law, given []*Expression, args []*Node) bool {
	length := -1
	for i := range args {
		if args[i].Type.Shape != ListShape {
			continue
		}
		if length >= 0 && args[i].Length() != length {
			at := e
			if given[i] != nil {
				at = given[i]
			}
			c.report(at.Span, problem.Shape, "the lists of "+l.Name+" have the same length: this one has "+strconv.Itoa(args[i].Length())+" items, the one before "+strconv.Itoa(length), "")
			return false
		}
		length = args[i].Length()
	}
	return true
}

// resultOf gives the type of what a law gives.
func (c *checker) resultOf(e *Expression, l *law.Law, args []*Node) (Type, bool) {
	if l.Result.SameAs != "" {
		for i := range l.Parameters {
			if l.Parameters[i].Name == l.Result.SameAs {
				t := args[i].Type
				return Type{Shape: NumberShape, Dimension: t.Dimension, Kind: t.Kind}, true
			}
		}
	}
	u, err := unit.Parse(l.Result.Unit)
	if err != nil {
		c.invalid(e, problem.UnknownUnit, "the law "+l.Name+" gives its result in an unknown unit", "")
		return Type{}, false
	}
	return Type{Shape: NumberShape, Dimension: u.Dimension(), Kind: u.Kind()}, true
}

// applyForChoices applies a law; where an argument is a text known, once for
// each of its choices, selected by the known's index.
func (c *checker) applyForChoices(e *Expression, l *law.Law, args []*Node, result Type) *Node {
	for i, a := range args {
		if a.Type.Shape != TextShape || a.Op != KnownOp {
			continue
		}
		choices := c.choicesOf(a)
		if c.tooManyChoices(args) {
			return c.invalid(e, problem.Limit, "the text knowns of this call have more than a thousand choices together", "give fewer choices, or the text itself")
		}
		var selected *Node
		for k := len(choices) - 1; k >= 0; k-- {
			fixed := append([]*Node(nil), args...)
			fixed[i] = c.node(e, Node{Op: Word, Text: choices[k], Type: Type{Shape: TextShape}})
			value := c.applyForChoices(e, l, fixed, result)
			if selected == nil {
				selected = value
				continue
			}
			index := c.number(e, float64(k), plain())
			is := c.node(e, Node{Op: Equal, Args: []*Node{a, index}, Type: truth()})
			selected = c.node(e, Node{Op: Select, Args: []*Node{is, value, selected}, Type: result})
		}
		return selected
	}
	return c.node(e, Node{Op: Apply, Law: l, Args: args, Type: result})
}

// mostChoices bounds how often one call is laid out for the choices of its
// text knowns.
const mostChoices = 1_000

// tooManyChoices says whether a call would have to be laid out too often.
func (c *checker) tooManyChoices(args []*Node) bool {
	all := 1
	for _, a := range args {
		if a.Type.Shape == TextShape && a.Op == KnownOp {
			all *= len(c.choicesOf(a))
		}
		if all > mostChoices {
			return true
		}
	}
	return false
}

// counted gives a number of things in words: "1 argument", "2 arguments".
func counted(n int, thing string) string {
	if n != 1 {
		thing += "s"
	}
	return strconv.Itoa(n) + " " + thing
}
