package formula

import (
	"errors"
	"strings"

	"github.com/expr-lang/expr/ast"
	"github.com/expr-lang/expr/builtin"
	"github.com/expr-lang/expr/conf"
	"github.com/expr-lang/expr/file"
	"github.com/expr-lang/expr/parser"

	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// Limits on one formula.
const (
	MostCharacters = 10_000 // of text
	MostParts      = 10_000 // numbers, names, operators and calls
)

// Form says which construct an Expression is.
type Form uint8

// The constructs of a formula.
const (
	Number   Form = iota // Value
	Text                 // Word
	Truth                // Value 0 or 1
	Name                 // Word
	Member               // Word.Field
	WithUnit             // Parts[0] [Unit]
	Unary                // Word Parts[0]
	Binary               // Parts[0] Word Parts[1]
	Choice               // Parts[0] ? Parts[1] : Parts[2]
	Call                 // Word(Parts..., Options...)
	List                 // [Parts...]
)

// Expression is a parsed formula or a part of one, with its place in the sheet.
type Expression struct {
	Form    Form
	Value   float64
	Word    string
	Field   string
	Unit    unit.Unit
	Parts   []*Expression
	Options []Option
	Span    problem.Span
	Node    *Node        // what checking made of it; nil where a problem stands
	whole   problem.Span // of a call, with its arguments
	from    int          // bytes of the formula that it stands in
	to      int
}

// Option is an argument that is passed by name.
type Option struct {
	Name  string
	Span  problem.Span
	Value *Expression
}

// Whole gives the place of a call with its arguments; Span is its name's.
func (e *Expression) Whole() problem.Span {
	if e.Form == Call {
		return e.whole
	}
	return e.Span
}

// At gives the expression's place.
func (e *Expression) At() problem.Span { return e.Span }

// Names calls visit for every name that the expression reads or calls, tables
// included ("nature" is not a name).
func (e *Expression) Names(visit func(name string, called bool)) {
	switch e.Form {
	case Name, Call:
		visit(e.Word, e.Form == Call)
	case Member:
		if e.Word != "nature" {
			visit(e.Word, false)
		}
	}
	for _, part := range e.Parts {
		part.Names(visit)
	}
	for _, option := range e.Options {
		option.Value.Names(visit)
	}
}

// configuration switches every built-in function of the parser off: a name
// before a parenthesis is a call and nothing else.
func configuration() *conf.Config {
	config := &conf.Config{
		MaxNodes:  MostParts,
		Functions: conf.FunctionsTable{},
		Disabled:  map[string]bool{},
	}
	for _, f := range builtin.Builtins {
		config.Functions[f.Name] = f
		config.Disabled[f.Name] = true
	}
	return config
}

// Parser parses formulas. It is made once for a sheet; it serves one goroutine.
type Parser struct {
	config *conf.Config
	parser parser.Parser
}

// NewParser makes a parser.
func NewParser() *Parser { return &Parser{config: configuration()} }

// Parse parses one formula. It reports every problem and then gives nil.
func (p *Parser) Parse(formula string, source Source, problems *problem.List) *Expression {
	if len(formula) > MostCharacters {
		problems.Add(source.SpanOf(0, 1), problem.Limit, "the formula is longer than 10,000 characters", "split it into several entries")
		return nil
	}
	ready, ok := lift(formula, source, problems)
	if !ok {
		return nil
	}
	tree, err := p.parser.Parse(string(ready.text), p.config)
	c := &converter{lifted: ready, formula: formula, source: newPlaces(formula, source, &ready), problems: problems}
	if err != nil {
		c.syntax(err)
		p.parser = parser.Parser{}
		return nil
	}
	p.parser = parser.Parser{}
	expression := c.convert(tree.Node)
	if c.failed {
		return nil
	}
	return expression
}

type converter struct {
	lifted
	formula  string
	source   *places
	problems *problem.List
	failed   bool
}

// stretch maps a stretch of the parser's text to bytes of the user's.
func (c *converter) stretch(from, to int) (start, end int) {
	if from >= len(c.origin) {
		return len(c.formula), len(c.formula)
	}
	start = c.origin[from]
	end = start + 1
	if to > from && to-1 < len(c.origin) {
		end = c.origin[to-1] + 1
		for end < len(c.formula) && c.formula[end]&0xC0 == 0x80 {
			end++
		}
	}
	return start, end
}

// place maps a stretch of the parser's text to the user's.
func (c *converter) place(from, to int) problem.Span {
	start, end := c.stretch(from, to)
	return c.source.SpanOf(start, end-start)
}

// placed gives an expression the place from its first to its last byte,
// widened over the parentheses that the parser leaves out.
func (c *converter) placed(e *Expression, start, end int) *Expression {
	depth := c.source.unclosed(start, end)
	for at := end; depth > 0 && at < len(c.formula); at++ {
		if c.formula[at] == ')' {
			depth, end = depth-1, at+1
		} else if !blank(c.formula[at]) {
			break
		}
	}
	for at := start - 1; depth < 0 && at >= 0; at-- {
		if c.formula[at] == '(' {
			depth, start = depth+1, at
		} else if !blank(c.formula[at]) {
			break
		}
	}
	e.from, e.to, e.Span = start, end, c.source.SpanOf(start, end-start)
	return e
}

func blank(b byte) bool { return b == ' ' || b == '\t' || b == '\n' }

// syntax reports where the parser stopped. Only the place is taken from the
// parser; what stands there tells the rest.
func (c *converter) syntax(err error) {
	var e *file.Error
	from, to := len(c.text), len(c.text)
	if errors.As(err, &e) {
		from, to = e.From, e.To
	}
	if from >= len(c.text)-1 { // the blank behind the last token
		advice := "write what is missing behind it"
		if strings.Count(c.formula, "?") > strings.Count(c.formula, ":") {
			advice = choiceAdvice
		}
		last := len(strings.TrimRight(c.formula, " \t\n")) - 1
		c.problems.Add(c.source.SpanOf(max(0, last), 1), problem.Syntax, "the formula ends before it is complete", advice)
		return
	}
	start, end := c.stretch(from, to)
	token := c.formula[start:end]
	c.problems.Add(c.source.SpanOf(start, end-start), problem.Syntax, quote(token)+" does not fit here", misfitAdvice(token))
}

const choiceAdvice = "write a choice as condition ? value : other value"

// misfitAdvice says what may have been meant by a token that does not fit.
func misfitAdvice(token string) string {
	switch token {
	case "(":
		return "a product is written with *"
	case ")", "]":
		return "a value is missing before it"
	case ",":
		return "a comma parts arguments and items; decimals stand behind a point, and digits are not grouped"
	case ":":
		return choiceAdvice
	case "[":
		return "only a value has a unit; items and arguments are parted by commas"
	case "?":
		return choiceAdvice
	}
	if strings.Contains("+-*/^<>===!=<=>=and or.", token) {
		return "a value is missing before it"
	}
	if _, err := unit.Parse(token); err == nil {
		return "a unit stands in brackets, as in 5[" + token + "]"
	}
	return "join two values by an operator, or part them by a comma; a product is written with *"
}

func (c *converter) fail(at problem.Span, code problem.Code, message, suggestion string) *Expression {
	c.failed = true
	c.problems.Add(at, code, message, suggestion)
	return &Expression{Span: at}
}

func (c *converter) convert(node ast.Node) *Expression {
	from, to := c.stretch(node.Location().From, node.Location().To)
	at := c.source.SpanOf(from, to-from)
	switch n := node.(type) {
	case *ast.IntegerNode:
		return c.placed(&Expression{Form: Number, Value: float64(n.Value)}, from, to)
	case *ast.FloatNode:
		return c.placed(&Expression{Form: Number, Value: n.Value}, from, to)
	case *ast.StringNode:
		return c.placed(&Expression{Form: Text, Word: n.Value}, from, to)
	case *ast.BoolNode:
		value := 0.0
		if n.Value {
			value = 1
		}
		return c.placed(&Expression{Form: Truth, Value: value}, from, to)
	case *ast.IdentifierNode:
		return c.placed(&Expression{Form: Name, Word: n.Value}, from, to)
	case *ast.UnaryNode:
		inner := c.convert(n.Node)
		if n.Operator == "+" {
			return inner
		}
		return c.placed(&Expression{Form: Unary, Word: n.Operator, Parts: []*Expression{inner}}, from, inner.to)
	case *ast.BinaryNode:
		left, right := c.convert(n.Left), c.convert(n.Right)
		word := n.Operator
		if word == "&&" { // a chain of comparisons, as in 0 < x < 1
			word = "and"
		}
		return c.placed(&Expression{Form: Binary, Word: word, Parts: []*Expression{left, right}}, left.from, right.to)
	case *ast.ConditionalNode:
		parts := []*Expression{c.convert(n.Cond), c.convert(n.Exp1), c.convert(n.Exp2)}
		return c.placed(&Expression{Form: Choice, Parts: parts}, parts[0].from, parts[2].to)
	case *ast.ArrayNode:
		list := &Expression{Form: List}
		for _, item := range n.Nodes {
			list.Parts = append(list.Parts, c.convert(item))
		}
		return c.placed(list, from, c.source.closing(from))
	case *ast.MemberNode:
		return c.member(n, from, to)
	case *ast.CallNode:
		return c.call(n, from, to)
	case *ast.BuiltinNode:
		return c.fail(at, problem.Construct, quote(n.Name)+" cannot be used so", "")
	}
	return c.fail(at, problem.Construct, "this construct is not part of a formula", "")
}

// member is a unit bracket or the field of a table or of nature.
func (c *converter) member(n *ast.MemberNode, start, end int) *Expression {
	at := c.source.SpanOf(start, end-start)
	if from := n.Location().From; from < len(c.origin) {
		if i, isUnit := c.atByte[c.origin[from]]; isUnit && c.text[from] == '[' {
			return c.withUnit(c.convert(n.Node), c.units[i])
		}
	}
	owner, plain := n.Node.(*ast.IdentifierNode)
	field, named := n.Property.(*ast.StringNode)
	if !plain || !named || n.Optional || n.Method {
		return c.fail(at, problem.Construct, "only a table's column and a constant of nature are read with a dot", "")
	}
	start, _ = c.stretch(owner.Location().From, owner.Location().To)
	return c.placed(&Expression{Form: Member, Word: owner.Value, Field: field.Value}, start, end)
}

func (c *converter) withUnit(value *Expression, b bracket) *Expression {
	bracketSpan := c.source.SpanOf(b.offset, b.length)
	u, problemAt := c.unit(b)
	if problemAt {
		return &Expression{Span: bracketSpan}
	}
	return c.placed(&Expression{Form: WithUnit, Unit: u, Parts: []*Expression{value}}, value.from, b.offset+b.length)
}

func (c *converter) unit(b bracket) (unit.Unit, bool) {
	u, failed := ReadUnit(b.unit, func(offset, length int) problem.Span {
		return c.source.SpanOf(b.inner+offset, length)
	}, c.problems)
	c.failed = c.failed || failed
	return u, failed
}

// ReadUnit reads unit text that stands in a sheet and reports what is wrong
// with it at its place.
func ReadUnit(text string, place func(offset, length int) problem.Span, problems *problem.List) (unit.Unit, bool) {
	u, err := unit.Parse(text)
	if err == nil {
		return u, false
	}
	var e *unit.Error
	if errors.As(err, &e) {
		suggestion := ""
		if e.Suggestion != "" {
			suggestion = "write " + e.Suggestion
		}
		problems.Add(place(e.Offset, max(e.Length, 1)), problem.UnknownUnit, e.Message, suggestion)
	} else {
		problems.Add(place(0, max(len(text), 1)), problem.UnknownUnit, err.Error(), "")
	}
	return unit.One(), true
}

func (c *converter) call(n *ast.CallNode, from, to int) *Expression {
	at := c.source.SpanOf(from, to-from)
	callee, plain := n.Callee.(*ast.IdentifierNode)
	if !plain {
		return c.fail(at, problem.Construct, "only a law's name is called", "write the law's name alone before its arguments")
	}
	call := &Expression{Form: Call, Word: callee.Value, Span: at, from: from, to: to}
	if open := strings.IndexByte(c.formula[to:], '('); open >= 0 {
		call.to = c.source.closing(to + open)
	}
	call.whole = c.source.SpanOf(from, call.to-from)
	for i, argument := range n.Arguments {
		options, named := argument.(*ast.MapNode)
		if !named {
			call.Parts = append(call.Parts, c.convert(argument))
			continue
		}
		if i != len(n.Arguments)-1 {
			return c.fail(at, problem.Arguments, "arguments with names come last", "")
		}
		for _, pair := range options.Pairs {
			p := pair.(*ast.PairNode)
			key, plainKey := p.Key.(*ast.StringNode)
			if !plainKey {
				return c.fail(at, problem.Construct, "an option is named by a plain word", "")
			}
			keyAt := c.place(key.Location().From, key.Location().To)
			call.Options = append(call.Options, Option{Name: key.Value, Span: keyAt, Value: c.convert(p.Value)})
		}
	}
	return call
}
