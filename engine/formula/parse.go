package formula

import (
	"strings"

	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// Parse parses one formula. It reports every problem and then gives nil.
func Parse(formula string, source Source, problems *problem.List) *Expression {
	if len(formula) > MostCharacters {
		problems.Add(source.SpanOf(0, 1), problem.Limit, "the formula is longer than 10,000 characters", "split it into several entries")
		return nil
	}
	tokens, ok := scan(formula, source, problems)
	if !ok {
		return nil
	}
	p := &parser{formula: formula, tokens: tokens, source: newPlaces(formula, source), problems: problems}
	whole := p.expression(lowest)
	if !p.failed && p.now().kind != endToken {
		p.misfit()
	}
	if p.wrong {
		return nil
	}
	return whole.Expression
}

// parser reads tokens by the precedence of operators (Pratt, Top down operator
// precedence, 1973).
type parser struct {
	formula  string
	tokens   []token
	at       int
	source   *places
	problems *problem.List
	parts    int  // expressions, each as often as a walk over the tree meets it
	wrong    bool // a problem has been reported
	failed   bool // nothing more can be read
}

// operand is a part of the formula with the bytes that it stands in, the
// parentheses and the plus signs around it included.
type operand struct {
	*Expression
	from, to int
	signed   bool // a plus sign stands before it
	told     bool // the dot behind it has been reported
}

// What binds tighter has the higher number. A choice binds least of all and
// stands only where a whole formula may.
const (
	lowest   = 0
	orPower  = 10
	andPower = 15
	compares = 20
	addPower = 30
	notPower = 50
	mulPower = 60
	negPower = 90
	powPower = 100
)

// power tells how tight an operator between two values binds, 0 for all else.
func power(operator string) int {
	switch operator {
	case "or":
		return orPower
	case "and":
		return andPower
	case "==", "!=", "<", ">", "<=", ">=":
		return compares
	case "+", "-":
		return addPower
	case "*", "/":
		return mulPower
	case "^":
		return powPower
	}
	return 0
}

// ordering says whether an operator compares by size; such ones form chains,
// as in 0 < x < 1.
func ordering(operator string) bool {
	return operator == "<" || operator == ">" || operator == "<=" || operator == ">="
}

func (p *parser) now() *token { return &p.tokens[p.at] }

// take gives the current token and goes on.
func (p *parser) take() *token {
	t := p.now()
	if t.kind != endToken {
		p.at++
	}
	return t
}

// is says whether the current token is that sign.
func (p *parser) is(sign string) bool {
	t := p.now()
	return t.kind == signToken && t.text == sign
}

// expect takes a sign and gives the byte behind it.
func (p *parser) expect(sign string) int {
	if !p.is(sign) {
		p.misfit()
		return p.now().to
	}
	return p.take().to
}

func (p *parser) span(from, to int) problem.Span { return p.source.SpanOf(from, to-from) }

// made counts an expression and gives it its place.
func (p *parser) made(e *Expression, from, to int) operand {
	if p.parts++; p.parts > MostParts {
		p.fail(p.span(0, 1), problem.Limit, "the formula has more than 10,000 parts", "split it into several entries")
	}
	e.Span = p.span(from, to)
	return operand{Expression: e, from: from, to: to}
}

// expression reads what binds at least as tight as least.
func (p *parser) expression(least int) operand {
	left := p.unary()
	for !p.failed && p.now().kind == signToken {
		binds := power(p.now().text)
		if binds == 0 || binds < least {
			break
		}
		operator := p.take().text
		switch {
		case ordering(operator):
			left = p.chain(left, operator)
		case operator == "^": // to the right: a^b^c is a^(b^c)
			left = p.binary(operator, left, p.expression(binds))
		default:
			left = p.binary(operator, left, p.expression(binds+1))
		}
	}
	if least == lowest {
		left = p.choice(left)
	}
	return left
}

func (p *parser) binary(operator string, left, right operand) operand {
	return p.made(&Expression{Form: Binary, Word: operator, Parts: []*Expression{left.Expression, right.Expression}}, left.from, right.to)
}

// chain reads a comparison and those that follow on its right side: each pair
// must hold. What stands between two signs is a part of both comparisons, so
// that chains within chains double with each level: they are counted so. All
// else has no more parts than the formula has characters.
func (p *parser) chain(left operand, operator string) operand {
	right, parts := p.compared()
	all := p.binary(operator, left, right)
	for !p.failed && p.now().kind == signToken && ordering(p.now().text) {
		p.parts += parts
		operator, left = p.take().text, right
		right, parts = p.compared()
		all = p.binary("and", all, p.binary(operator, left, right))
	}
	return all
}

// compared reads the right side of a comparison and counts its parts.
func (p *parser) compared() (right operand, parts int) {
	before := p.parts
	right = p.expression(compares + 1)
	return right, p.parts - before
}

// choice reads what follows a condition.
func (p *parser) choice(condition operand) operand {
	if p.failed || !p.is("?") {
		return condition
	}
	p.take()
	yes := p.expression(lowest)
	p.expect(":")
	no := p.expression(lowest)
	return p.made(&Expression{Form: Choice, Parts: []*Expression{condition.Expression, yes.Expression, no.Expression}}, condition.from, no.to)
}

// unary reads a value with the signs before it.
func (p *parser) unary() operand {
	if p.failed {
		return operand{Expression: &Expression{}}
	}
	binds := 0
	switch t := p.now(); {
	case t.kind != signToken:
	case t.text == "-" || t.text == "+":
		binds = negPower
	case t.text == "not":
		binds = notPower
	}
	if binds == 0 {
		return p.postfix(p.primary())
	}
	sign := p.take()
	of := p.expression(binds)
	if sign.text == "+" {
		return operand{Expression: of.Expression, from: sign.from, to: of.to, signed: true}
	}
	return p.made(&Expression{Form: Unary, Word: sign.text, Parts: []*Expression{of.Expression}}, sign.from, of.to)
}

// primary reads a number, name, text, call, list or what stands in parentheses.
func (p *parser) primary() operand {
	t := p.now()
	switch {
	case t.kind == numberToken:
		p.take()
		return p.made(&Expression{Form: Number, Value: t.value}, t.from, t.to)
	case t.kind == textToken:
		p.take()
		return p.made(&Expression{Form: Text, Word: t.text}, t.from, t.to)
	case t.kind == nameToken:
		p.take()
		return p.name(t)
	case p.is("("):
		p.take()
		inner := p.expression(lowest)
		inner.from, inner.to = t.from, p.expect(")")
		return inner
	case p.is("["):
		p.take()
		list := &Expression{Form: List}
		to := p.items("]", func() { list.Parts = append(list.Parts, p.expression(lowest).Expression) })
		return p.made(list, t.from, to)
	}
	p.misfit()
	return operand{Expression: &Expression{}}
}

// items reads what commas part up to the closing bracket and gives the byte
// behind it.
func (p *parser) items(closing string, item func()) int {
	for n := 0; !p.failed && !p.is(closing); n++ {
		if n > 0 {
			p.expect(",")
		}
		item()
	}
	return p.expect(closing)
}

// name reads what begins with a name.
func (p *parser) name(t *token) operand {
	switch {
	case t.text == "true":
		return p.made(&Expression{Form: Truth, Value: 1}, t.from, t.to)
	case t.text == "false":
		return p.made(&Expression{Form: Truth}, t.from, t.to)
	case p.is("("):
		return p.call(t)
	}
	return p.made(&Expression{Form: Name, Word: t.text}, t.from, t.to)
}

// call reads the arguments of a call: first those by position, then those by
// name, which the scanner has made sure of.
func (p *parser) call(name *token) operand {
	p.take()
	call := &Expression{Form: Call, Word: name.text}
	to := p.items(")", func() {
		t := p.now()
		if next := &p.tokens[min(p.at+1, len(p.tokens)-1)]; t.kind != nameToken || next.kind != signToken || next.text != ":" {
			call.Parts = append(call.Parts, p.expression(lowest).Expression)
			return
		}
		p.take()
		p.take()
		option := Option{Name: t.text, Span: p.span(t.from, t.to)}
		option.Value = p.expression(lowest).Expression
		call.Options = append(call.Options, option)
	})
	all := p.made(call, name.from, to)
	call.Span, call.whole = p.span(name.from, name.to), call.Span
	return all
}

// postfix reads the units and the field that follow a value.
func (p *parser) postfix(value operand) operand {
	for !p.failed {
		t := p.now()
		switch {
		case t.kind == unitToken:
			p.take()
			u, wrong := ReadUnit(t.text, func(offset, length int) problem.Span {
				return p.span(t.from+1+offset, t.from+1+offset+length)
			}, p.problems)
			p.wrong = p.wrong || wrong
			value = p.made(&Expression{Form: WithUnit, Unit: u, Parts: []*Expression{value.Expression}}, value.from, t.to)
		case p.is("."):
			p.take()
			value = p.field(value)
		default:
			return value
		}
	}
	return value
}

// field reads the column of a table or a constant of nature.
func (p *parser) field(owner operand) operand {
	t := p.now()
	if t.kind != nameToken {
		p.misfit()
		return owner
	}
	p.take()
	at := p.span(t.from, t.to)
	switch {
	case p.is("("):
		p.report(at, problem.Construct, "only a law's name is called", "write the law's name alone before its arguments")
		return p.call(t)
	case owner.told: // further dots are the same mistake
		return owner
	case owner.Form != Name || owner.signed:
		p.report(at, problem.Construct, "only a table's column and a constant of nature are read with a dot", "")
		owner.told = true
		return owner
	}
	return p.made(&Expression{Form: Member, Word: owner.Word, Field: t.text}, owner.from, t.to)
}

// report tells a problem behind which reading goes on: all of them are told.
func (p *parser) report(at problem.Span, code problem.Code, message, suggestion string) {
	if !p.failed {
		p.wrong = true
		p.problems.Add(at, code, message, suggestion)
	}
}

// fail tells a problem behind which nothing can be read.
func (p *parser) fail(at problem.Span, code problem.Code, message, suggestion string) {
	p.report(at, code, message, suggestion)
	p.failed = true
}

// misfit reports that the current token does not fit. It is asked again on each
// way out of a formula that is broken off deep inside.
func (p *parser) misfit() {
	if p.failed {
		return
	}
	t := p.now()
	if t.kind == endToken {
		advice := "write what is missing behind it"
		if strings.Count(p.formula, "?") > strings.Count(p.formula, ":") {
			advice = choiceAdvice
		}
		last := len(strings.TrimRight(p.formula, " \t\n")) - 1
		p.fail(p.source.SpanOf(max(0, last), 1), problem.Syntax, "the formula ends before it is complete", advice)
		return
	}
	word := p.formula[t.from:t.to]
	p.fail(p.span(t.from, t.to), problem.Syntax, quote(word)+" does not fit here", misfitAdvice(word))
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
	if power(token) > 0 || token == "." {
		return "a value is missing before it"
	}
	if _, err := unit.Parse(token); err == nil {
		return "a unit stands in brackets, as in 5[" + token + "]"
	}
	return "join two values by an operator, or part them by a comma; a product is written with *"
}
