package sheet

import (
	"strings"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// title reads `title TEXT`.
func (p *parser) title(c *cursor) Statement {
	s := &Title{}
	if c.done() {
		c.report(c.here(), problem.Syntax, "the text of the title is missing", "write `title TEXT`")
		return s
	}
	s.Text = c.text(c.pos, len(c.whole.Value))
	if p.sheet.Title.Present() {
		c.report(s.Text.Span, problem.Duplicate, "the sheet has a title already", "make it prose, with `#` in the place of `title`")
		return s
	}
	p.sheet.Title = s.Text
	return s
}

// formula reads all that is left as a formula or condition.
func (c *cursor) formula(what, suggestion string) Text {
	if c.done() {
		c.report(c.here(), problem.Syntax, what+" is missing", suggestion)
		return Text{}
	}
	t := c.text(c.pos, len(c.whole.Value))
	c.pos = len(c.whole.Value)
	return t
}

// derive reads `derive NAME [UNIT] = FORMULA`.
func (p *parser) derive(c *cursor) Statement {
	const form = "write `derive NAME [UNIT] = FORMULA`"
	s := &Derive{}
	s.Name, _ = c.name("a derived entry", form)
	if !s.Name.Present() {
		return s
	}
	var ok bool
	if s.Unit, ok = c.unit(); !ok || !c.equals(form) {
		return s
	}
	s.Formula = c.formula("the formula", form)
	return s
}

// require reads `require NAME = CONDITION`.
func (p *parser) require(c *cursor) Statement {
	const form = "write `require NAME = CONDITION`"
	s := &Require{}
	s.Name, _ = c.name("a requirement", form)
	if !s.Name.Present() {
		return s
	}
	if strings.HasPrefix(c.rest(), "[") {
		c.report(c.place(c.pos, c.pos+1), problem.Syntax, "a requirement has no unit", form)
		return s
	}
	if !c.equals(form) {
		return s
	}
	s.Condition = c.formula("the condition", form)
	return s
}

// law reads `law NAME(a [UNIT], b [UNIT]) [UNIT] = FORMULA` and the condition
// of its `valid`.
func (p *parser) law(c *cursor) Statement {
	const form = "write `law NAME(a [UNIT], b [UNIT]) [UNIT] = FORMULA`"
	s := &Law{}
	lines, condition := p.group, []line(nil)
	for i := 1; i < len(lines); i++ {
		if startsWithValid(&lines[i]) {
			lines, condition = p.group[:i], p.group[i:]
			break
		}
	}
	c.whole = p.join(lines)
	if p.lawHead(c, s, form) {
		s.Formula = c.formula("the formula", form)
	}
	if condition == nil {
		return s
	}
	for i := 1; i < len(condition); i++ {
		if l := &condition[i]; startsWithValid(l) {
			p.report(problem.Span{Line: l.number, Column: l.column, Length: len("valid")}, problem.Syntax, "the law has a `valid` already", "join the conditions by `and`")
			return s
		}
	}
	v := &cursor{parser: p, whole: p.join(condition), pos: len("valid")}
	s.Valid = v.formula("the condition", "write `valid CONDITION`")
	return s
}

// lawHead reads a law up to its `=`.
func (p *parser) lawHead(c *cursor, s *Law, form string) bool {
	s.Name, _ = c.name("a law", form)
	if !s.Name.Present() {
		return false
	}
	open := c.here()
	if !c.sign("(") {
		c.report(open, problem.Syntax, "the parameters of the law are missing: "+c.instead(), form)
		return false
	}
	if !c.sign(")") {
		for {
			var parameter LawParameter
			var ok bool
			parameter.Name, _ = c.name("a parameter", form)
			if !parameter.Name.Present() {
				return false
			}
			parameter.Unit, ok = c.unit()
			s.Parameters = append(s.Parameters, parameter)
			if !ok {
				return false
			}
			if c.sign(",") {
				continue
			}
			if c.sign(")") {
				break
			}
			if c.done() || strings.HasPrefix(c.rest(), "=") {
				c.report(open, problem.Syntax, "the bracket of the parameters is not closed", "write `)` behind the last parameter")
			} else {
				c.report(c.here(), problem.Syntax, c.found()+" between parameters", "part the parameters by `,`")
			}
			return false
		}
	}
	var ok bool
	s.Unit, ok = c.unit()
	return ok && c.equals(form)
}

// seek reads `seek NAME [UNIT] = LOW to HIGH where FORMULA == FORMULA`.
func (p *parser) seek(c *cursor) Statement {
	const form = "write `seek NAME [UNIT] = LOW to HIGH where FORMULA == FORMULA`"
	s := &Seek{}
	s.Name, _ = c.name("an unknown", form)
	if !s.Name.Present() {
		return s
	}
	var ok bool
	if s.Unit, ok = c.unit(); !ok || !c.equals(form) {
		return s
	}
	s.Low, s.High, s.LowText, s.HighText, ok = c.bounds("the unknown")
	if !ok && !s.HighText.Present() {
		return s
	}
	if !c.word("where") {
		c.report(c.here(), problem.Syntax, "`where` is missing: "+c.instead(), form)
		return s
	}
	if c.done() {
		c.report(c.here(), problem.Syntax, "the equation is missing", "write `FORMULA == FORMULA`")
		return s
	}
	start, sides := c.pos, c.whole.Value[c.pos:]
	at, second, single := equality(sides)
	switch {
	case at < 0 && single >= 0:
		c.report(c.place(start+single, start+single+1), problem.Syntax, "an equation has `==`, not `=`", "write `==`")
	case at < 0:
		c.report(c.restSpan(), problem.Syntax, "`==` is missing: an unknown is sought where one formula equals another", "write `FORMULA == FORMULA`")
	case second >= 0:
		c.report(c.place(start+second, start+second+2), problem.Syntax, "the equation has a second `==`", "write one `FORMULA == FORMULA`")
	case strings.TrimSpace(sides[:at]) == "":
		c.report(c.place(start+at, start+at+2), problem.Syntax, "the formula before `==` is missing", "write `FORMULA == FORMULA`")
	case strings.TrimSpace(sides[at+2:]) == "":
		c.report(c.place(start+at, start+at+2), problem.Syntax, "the formula behind `==` is missing", "write `FORMULA == FORMULA`")
	default:
		s.Left = c.text(start, start+at)
		s.Right = c.text(start+at+2, len(c.whole.Value))
	}
	return s
}

// equality finds the first and the second `==` outside of brackets and quotes,
// and a `=` that stands alone there; -1 for what is not found.
func equality(text string) (first, second, single int) {
	first, second, single = -1, -1, -1
	depth := 0
	quotes := true
	for i := 0; i < len(text); i++ {
		switch text[i] {
		case '"':
			if !quotes {
				break
			}
			if end := quoteEnd(text, i); end > 0 {
				i = end - 1
			} else {
				quotes = false
			}
		case '(', '[', '{':
			depth++
		case ')', ']', '}':
			depth--
		case '<', '>', '!':
			if i+1 < len(text) && text[i+1] == '=' {
				i++
			}
		case '=':
			if depth != 0 {
				break
			}
			if i+1 < len(text) && text[i+1] == '=' {
				if first < 0 {
					first = i
				} else if second < 0 {
					second = i
				}
				i++
			} else if single < 0 {
				single = i
			}
		}
	}
	return first, second, single
}

// bounds reads `LOW to HIGH` and reports a lower bound above its upper one.
// ok is false where anything was reported.
func (c *cursor) bounds(of string) (low, high float64, lowText, highText Text, ok bool) {
	low, lowText, ok = c.number("the lower bound of "+of, false)
	if !lowText.Present() {
		return
	}
	if !c.word("to") {
		c.report(c.here(), problem.Syntax, "`to` is missing: "+c.instead(), "write `LOW to HIGH`")
		ok = false
		return
	}
	lowIsNumber := ok
	high, highText, ok = c.number("the upper bound of "+of, false)
	ok = ok && lowIsNumber
	if ok && low > high {
		c.report(lowText.Span.To(highText.Span), problem.RangeOrder, "the lower bound "+lowText.Value+" lies above the upper bound "+highText.Value, "write `"+highText.Value+" to "+lowText.Value+"`")
		ok = false
	}
	return
}

// correlate reads `correlate A B = COEFFICIENT`.
func (p *parser) correlate(c *cursor) Statement {
	const form = "write `correlate A B = COEFFICIENT`"
	s := &Correlate{}
	s.A, _ = c.name("the first known", form)
	if !s.A.Present() {
		return s
	}
	s.B, _ = c.name("the second known", form)
	if !s.B.Present() || !c.equals(form) {
		return s
	}
	if s.A.Value == s.B.Value {
		c.report(s.B.Span, problem.Syntax, "a known is not correlated with itself", "name two knowns")
	}
	var ok bool
	s.Coefficient, s.CoefficientText, ok = c.number("the coefficient", false)
	if ok && (s.Coefficient < -1 || s.Coefficient > 1) {
		c.report(s.CoefficientText.Span, problem.Number, "a correlation coefficient lies from -1 to 1", "write a number from -1 to 1")
		ok = false
	}
	if s.CoefficientText.Present() {
		c.end(form)
	}
	return s
}

// draw reads `draw NAME, NAME against NAME`.
func (p *parser) draw(c *cursor) Statement {
	const form = "write `draw Y, Y2 against X`"
	s := &Draw{}
	for {
		name, _ := c.name("what is drawn", form)
		if !name.Present() {
			return s
		}
		s.Names = append(s.Names, name)
		if !c.sign(",") {
			break
		}
	}
	if !c.word("against") {
		message := "`against` is missing: " + c.instead()
		suggestion := form
		if r, _ := utf8.DecodeRuneInString(c.rest()); r != utf8.RuneError && nameEnd(c.rest(), 0) > 0 {
			suggestion = "part names by `,`, and write `against` before the last"
		}
		c.report(c.here(), problem.Syntax, message, suggestion)
		return s
	}
	s.Against, _ = c.name("what it is drawn against", form)
	if s.Against.Present() {
		c.end("one name stands behind `against`")
	}
	return s
}
