package sheet

import (
	"strings"

	"plumbrule/engine/problem"
)

const knownForm = "write `known NAME [UNIT] = NUMBER`"

// known reads `known NAME [UNIT] = VALUE` and what follows the value.
func (p *parser) known(c *cursor) Statement {
	s := &Known{}
	s.Name, _ = c.name("a known", knownForm)
	if !s.Name.Present() {
		return s
	}
	var ok bool
	if s.Unit, ok = c.unit(); !ok || c.done() {
		return s
	}
	if c.word("within") {
		p.within(c, s)
		return s
	}
	if strings.HasPrefix(c.rest(), "±") || strings.HasPrefix(c.rest(), "+/-") {
		c.report(c.here(), problem.Syntax, "an uncertainty needs a value before it", "write `known NAME [UNIT] = NUMBER ± NUMBER`")
		return s
	}
	if !c.equals(knownForm) {
		return s
	}
	rest := c.rest()
	switch {
	case strings.HasPrefix(rest, `"`):
		p.choices(c, s)
	case firstName(rest) == "true" || firstName(rest) == "false":
		p.truth(c, s)
	case rest == "":
		c.report(c.here(), problem.Syntax, "the value is missing", "write a number, a text in quotes, true or false; or leave `=` out where the value is to be supplied")
	case numberEnd(rest, 0, true) == 0 || firstName(rest) != "" && !infinite(firstName(rest)):
		suggestion := "write `derive` for a formula, quotes around a text"
		if strings.HasPrefix(rest, "[") || strings.HasPrefix(rest, "(") || strings.HasPrefix(rest, "-") {
			suggestion = "write `derive` for a formula"
		}
		if strings.HasPrefix(rest, "'") {
			suggestion = "write the text in double quotes"
		}
		c.report(c.restSpan(), problem.Syntax, "the value of a known is a number, a text in quotes, true or false", suggestion)
	default:
		p.quantity(c, s)
	}
	return s
}

func infinite(word string) bool {
	switch strings.ToLower(word) {
	case "inf", "infinity", "nan":
		return true
	}
	return false
}

// quantity reads a number, its uncertainty and its bounds.
func (p *parser) quantity(c *cursor, s *Known) {
	var ok bool
	s.Number, s.NumberText, ok = c.number("the value", false)
	s.HasValue = ok
	if c.sign("±") || c.sign("+/-") {
		if !p.uncertainty(c, s) {
			return
		}
	}
	if c.word("within") {
		p.within(c, s)
		return
	}
	p.afterNumber(c, s)
}

// afterNumber reports what stands behind a known that is complete.
func (p *parser) afterNumber(c *cursor, s *Known) {
	rest := c.rest()
	suggestion := "write a note behind `#`"
	switch {
	case rest == "":
		return
	case strings.HasPrefix(rest, "["):
		suggestion = "the unit stands before `=`: write `known " + short(s.Name.Value) + " [UNIT] = NUMBER`"
	case strings.HasPrefix(rest, "+-"):
		suggestion = "write `±` or `+/-`"
	case rest == "%" || rest == "‰":
		suggestion = "the unit stands in brackets before `=`: write `known " + short(s.Name.Value) + " [" + rest + "] = NUMBER`"
	case strings.ContainsRune("+-*/^%(?<>=!", rune(rest[0])):
		suggestion = "write `derive` for a formula"
	case firstName(rest) == "to":
		suggestion = "write `within LOW to HIGH` for bounds"
	case firstName(rest) != "" && problem.Nearest(firstName(rest), []string{"within"}) != "":
		suggestion = "write `within LOW to HIGH`"
	case firstName(rest) != "" && !s.Unit.Present():
		suggestion = "the unit stands in brackets before `=`: write `known " + short(s.Name.Value) + " [" + short(firstName(rest)) + "] = NUMBER`"
	case firstName(rest) != "":
		suggestion = "leave it out: the number is in [" + short(s.Unit.Value) + "]; a note stands behind `#`"
	}
	c.end(suggestion)
}

// uncertainty reads what follows `±`. It gives false where reading on makes no
// sense.
func (p *parser) uncertainty(c *cursor, s *Known) bool {
	u := &Uncertainty{Distribution: Normal, Coverage: 1}
	var ok bool
	u.Number, u.NumberText, ok = c.number("the uncertainty", false)
	if !u.NumberText.Present() {
		return false
	}
	if ok && u.Number < 0 {
		c.report(u.NumberText.Span, problem.Number, "an uncertainty is not negative", "write `"+strings.TrimLeft(u.NumberText.Value, "-")+"`")
	}
	s.Uncertainty = u
	for _, shape := range []string{Uniform, Triangular, Arcsine} {
		if c.word(shape) {
			u.Distribution = shape
			break
		}
	}
	c.skip()
	start := c.pos
	if c.word("at") {
		if !c.word("k") || !c.sign("=") {
			c.report(c.here(), problem.Syntax, "`k=` is missing: "+c.instead(), "write `at k=2`")
			return false
		}
		u.Coverage, u.CoverageText, ok = c.number("the coverage factor", false)
		switch {
		case !u.CoverageText.Present():
			return false
		case !ok:
			u.Coverage = 1
		case u.Coverage <= 0:
			c.report(u.CoverageText.Span, problem.Number, "a coverage factor is positive", "write `at k=2`")
			u.Coverage = 1
		case u.Distribution != Normal:
			c.report(c.place(start, c.pos), problem.Syntax, "the half-width of a "+u.Distribution+" distribution has no coverage factor", "leave `"+short(c.whole.Value[start:c.pos])+"` out")
			u.Coverage, u.CoverageText = 1, Text{}
		}
	}
	if c.word("dof") {
		u.Freedom, u.FreedomText, ok = c.number("the number of degrees of freedom", false)
		if !u.FreedomText.Present() {
			return false
		}
		if ok && u.Freedom <= 0 {
			c.report(u.FreedomText.Span, problem.Number, "degrees of freedom are positive", "write `dof 9`, or leave it out for infinitely many")
			u.Freedom = 0
		}
	}
	rest := c.rest()
	if word := firstName(rest); word != "" && word != "within" {
		suggestion := ""
		if near := problem.Nearest(strings.ToLower(word), []string{Uniform, Triangular, Arcsine, "at", "dof", "within"}); near != "" {
			suggestion = "write `" + near + "`"
		} else if word == Normal {
			suggestion = "leave it out: without a word the distribution is normal"
		} else {
			suggestion = "behind an uncertainty stand `uniform`, `triangular`, `arcsine`, `at k=2`, `dof 9` or `within LOW to HIGH`, in this order"
		}
		c.report(c.here(), problem.Syntax, "`"+short(word)+"` does not belong behind an uncertainty", suggestion)
		return false
	}
	return true
}

// within reads `LOW to HIGH` behind `within`.
func (p *parser) within(c *cursor, s *Known) {
	w := &Within{}
	var ok bool
	w.Low, w.High, w.LowText, w.HighText, ok = c.bounds("the known")
	if ok {
		s.Within = w
	}
	if w.HighText.Present() {
		p.afterWithin(c)
	}
}

func (p *parser) afterWithin(c *cursor) {
	suggestion := "bounds stand last; write a note behind `#`"
	if strings.HasPrefix(c.rest(), "±") || strings.HasPrefix(c.rest(), "+/-") {
		suggestion = "write the uncertainty before `within`"
	} else if strings.HasPrefix(c.rest(), "=") {
		suggestion = "write `= NUMBER` before `within`"
	}
	c.end(suggestion)
}

// choices reads `"text" or "text"`.
func (p *parser) choices(c *cursor, s *Known) {
	if s.Unit.Present() {
		c.report(s.Unit.Span, problem.Syntax, "a text has no unit", "leave the unit bracket out")
	}
	seen := map[string]bool{}
	for {
		if !strings.HasPrefix(c.rest(), `"`) {
			c.report(c.here(), problem.Syntax, "a text is missing behind `or`: "+c.instead(), "write `\"text\" or \"text\"`")
			return
		}
		choice, ok := c.quoted()
		if !choice.Present() {
			return
		}
		if ok && seen[choice.Value] {
			c.report(choice.Span, problem.Duplicate, "the choice "+short(quote(choice.Value))+" is given twice", "leave the second one out")
		}
		seen[choice.Value] = true
		s.Choices = append(s.Choices, choice)
		if len(s.Choices) == 1 {
			s.Choice = choice
			s.HasValue = true
		}
		if !c.word("or") {
			break
		}
	}
	suggestion := "write `or` between choices, a note behind `#`"
	c.end(suggestion)
}

// quoted reads the quoted text that comes next. Its place includes the
// quotes, its value does not.
func (c *cursor) quoted() (Text, bool) {
	end := quoteEnd(c.whole.Value, c.pos)
	if end < 0 {
		c.report(c.restSpan(), problem.Syntax, "the quotes are not closed", "write `\"` behind the text")
		return Text{}, false
	}
	t := c.text(c.pos, end)
	inside := t.Value[1 : len(t.Value)-1]
	ok := true
	if strings.IndexByte(inside, '\\') >= 0 {
		out := make([]byte, 0, len(inside))
		for i := 0; i < len(inside); i++ {
			if inside[i] == '\\' {
				i++
				if inside[i] != '"' && inside[i] != '\\' {
					at := c.pos + 1 + i - 1
					c.report(c.place(at, at+2), problem.Syntax, "behind `\\` stands `\"` or `\\`, nothing else", "write `\\\\` for the sign itself")
					ok = false
				}
			}
			out = append(out, inside[i])
		}
		inside = string(out)
	}
	t.Value = inside
	c.pos = end
	return t, ok
}

// quote writes a text in quotes.
func quote(text string) string {
	return `"` + strings.ReplaceAll(strings.ReplaceAll(text, `\`, `\\`), `"`, `\"`) + `"`
}

// truth reads `true` or `false`.
func (p *parser) truth(c *cursor, s *Known) {
	if s.Unit.Present() {
		c.report(s.Unit.Span, problem.Syntax, "a truth value has no unit", "leave the unit bracket out")
	}
	start := c.pos
	c.pos = nameEnd(c.whole.Value, c.pos)
	s.TruthText = c.text(start, c.pos)
	value := s.TruthText.Value == "true"
	s.Truth, s.HasValue = &value, true
	c.end("write `derive` for a formula, a note behind `#`")
}
