package sheet

import (
	"math"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// cursor reads one statement's text from left to right. Line ends inside of
// the text count as blanks.
type cursor struct {
	parser *parser
	whole  Text
	pos    int

	// The last place that was looked up, so that the places of a long
	// statement are found in one pass.
	seenOffset int
	seenLine   int // index into whole.Lines
	seenColumn int // characters since the start of that line
}

// place gives the place of the stretch between two offsets, cut at the end of
// its first line.
func (c *cursor) place(from, to int) problem.Span {
	if from < c.seenOffset {
		c.seenOffset, c.seenLine, c.seenColumn = 0, 0, 0
	}
	for c.seenOffset < from {
		b := c.whole.Value[c.seenOffset]
		if b == '\n' {
			c.seenLine++
			c.seenColumn = 0
			c.seenOffset++
			continue
		}
		size := 1
		if b >= utf8.RuneSelf {
			_, size = utf8.DecodeRuneInString(c.whole.Value[c.seenOffset:])
		}
		c.seenOffset += size
		c.seenColumn++
	}
	span := c.whole.Lines[c.seenLine]
	span.Column += c.seenColumn
	stretch := c.whole.Value[from:to]
	if cut := strings.IndexByte(stretch, '\n'); cut >= 0 {
		stretch = stretch[:cut]
	}
	span.Length = utf8.RuneCountInString(stretch)
	return span
}

// text gives the piece between two offsets without the blanks around it.
func (c *cursor) text(from, to int) Text {
	value := c.whole.Value[from:to]
	trimmed := strings.TrimLeftFunc(value, unicode.IsSpace)
	from += len(value) - len(trimmed)
	trimmed = strings.TrimRightFunc(trimmed, unicode.IsSpace)
	first := c.place(from, from+len(trimmed))
	t := Text{Span: first, Value: trimmed}
	mark := len(c.parser.spans)
	c.parser.spans = append(c.parser.spans, first)
	if more := strings.Count(trimmed, "\n"); more > 0 {
		n := c.seenLine
		c.parser.spans = append(c.parser.spans, c.whole.Lines[n+1:n+more+1]...)
		last := &c.parser.spans[len(c.parser.spans)-1]
		last.Length = utf8.RuneCountInString(trimmed[strings.LastIndexByte(trimmed, '\n')+1:])
	}
	end := len(c.parser.spans)
	t.Lines = c.parser.spans[mark:end:end]
	return t
}

// skip passes over blanks.
func (c *cursor) skip() {
	for c.pos < len(c.whole.Value) {
		b := c.whole.Value[c.pos]
		if b == ' ' || b == '\n' || b == '\t' {
			c.pos++
			continue
		}
		r, size := utf8.DecodeRuneInString(c.whole.Value[c.pos:])
		if !unicode.IsSpace(r) {
			return
		}
		c.pos += size
	}
}

// rest gives what is left after blanks.
func (c *cursor) rest() string {
	c.skip()
	return c.whole.Value[c.pos:]
}

// done says whether nothing is left.
func (c *cursor) done() bool { return c.rest() == "" }

// here gives the place of the next word, number, text or sign; at the end of
// the statement the place right behind it, one character long.
func (c *cursor) here() problem.Span {
	if c.done() {
		end := strings.TrimRightFunc(c.whole.Value, unicode.IsSpace)
		span := c.place(len(end), len(end))
		span.Length = 1
		return span
	}
	return c.place(c.pos, c.tokenEnd())
}

// tokenEnd gives the end of the next word, number, text or sign.
func (c *cursor) tokenEnd() int {
	text := c.whole.Value
	if end := nameEnd(text, c.pos); end > c.pos {
		return end
	}
	if text[c.pos] == '"' {
		if end := quoteEnd(text, c.pos); end > 0 {
			return end
		}
	}
	for _, sign := range []string{"==", ">=", "<=", "!=", "+/-"} {
		if strings.HasPrefix(text[c.pos:], sign) {
			return c.pos + len(sign)
		}
	}
	if end := numberEnd(text, c.pos, true); end > c.pos {
		return end
	}
	_, size := utf8.DecodeRuneInString(text[c.pos:])
	return c.pos + size
}

// restSpan gives the place of all that is left on the line.
func (c *cursor) restSpan() problem.Span {
	if c.done() {
		return c.here()
	}
	return c.place(c.pos, len(c.whole.Value))
}

// found names the next word, number, text or sign for a message.
func (c *cursor) found() string {
	return "`" + short(c.whole.Value[c.pos:c.tokenEnd()]) + "` stands"
}

// instead tells what stands in the place of what is missing.
func (c *cursor) instead() string {
	if c.done() {
		return "the statement ends before it"
	}
	return c.found() + " in its place"
}

// short cuts a text so that a message stays on one line.
func short(text string) string {
	if utf8.RuneCountInString(text) <= 40 {
		return text
	}
	runes := []rune(text)
	return string(runes[:39]) + "…"
}

// report adds a problem at a place.
func (c *cursor) report(at problem.Span, code problem.Code, message, suggestion string) {
	c.parser.report(at, code, message, suggestion)
}

// sign passes over a sign if it comes next.
func (c *cursor) sign(sign string) bool {
	if strings.HasPrefix(c.rest(), sign) {
		c.pos += len(sign)
		return true
	}
	return false
}

// word passes over a word if it comes next.
func (c *cursor) word(word string) bool {
	c.skip()
	end := nameEnd(c.whole.Value, c.pos)
	if c.whole.Value[c.pos:end] != word || end == c.pos {
		return false
	}
	c.pos = end
	return true
}

// name reads a name. What it is a name of, with its article, is told in the
// messages. A reserved or malformed name is reported and given all the same.
func (c *cursor) name(what, suggestion string) (Text, bool) {
	c.skip()
	text := c.whole.Value
	end := nameEnd(text, c.pos)
	if end == c.pos {
		if c.pos < len(text) && '0' <= text[c.pos] && text[c.pos] <= '9' {
			end = numberEnd(text, c.pos, false)
			t := c.text(c.pos, end)
			c.report(t.Span, problem.Name, "`"+short(t.Value)+"` is no name: a name begins with a letter or `_`", "write a name such as `_"+short(t.Value)+"`")
			c.pos = end
			return t, false
		}
		c.report(c.here(), problem.Syntax, "the name of "+what+" is missing: "+c.instead(), suggestion)
		return Text{}, false
	}
	t := c.text(c.pos, end)
	// A character that names do not have, right behind the name.
	if r, _ := utf8.DecodeRuneInString(text[end:]); end < len(text) && !unicode.IsSpace(r) && !strings.ContainsRune("[](){}=,|#±+-*/<>!\"", r) {
		stop := end
		for stop < len(text) {
			r, size := utf8.DecodeRuneInString(text[stop:])
			if unicode.IsSpace(r) || strings.ContainsRune("[](){}=,|#\"", r) {
				break
			}
			stop += size
		}
		t = c.text(c.pos, stop)
		bad := string(r)
		suggestion := "leave `" + bad + "` out or write `_`"
		if unicode.Is(unicode.Mn, r) {
			suggestion = "write the accented letter as one character"
		}
		c.report(c.place(end, end+len(bad)), problem.Name, "a name has letters, digits and `_` only, not `"+bad+"`", suggestion)
		c.pos = stop
		return t, false
	}
	c.pos = end
	if why := Reserved(t.Value); why != "" {
		c.report(t.Span, problem.Name, "`"+t.Value+"` cannot be a name: "+why, "choose another name, such as `"+t.Value+"_1`")
		return t, false
	}
	return t, true
}

// unit reads the unit bracket that may come next. ok is false where it is not
// well formed.
func (c *cursor) unit() (unit Text, ok bool) {
	if !strings.HasPrefix(c.rest(), "[") {
		return Text{}, true
	}
	text := c.whole.Value
	depth := 0
	for i := c.pos; i < len(text) && text[i] != '\n' && text[i] != '='; i++ {
		switch text[i] {
		case '[':
			depth++
		case ']':
			depth--
		}
		if depth == 0 {
			unit = c.text(c.pos+1, i)
			if unit.Value == "" {
				c.report(c.place(c.pos, i+1), problem.Syntax, "the unit bracket is empty", "write `[1]` for a pure number, or leave the bracket out")
				c.pos = i + 1
				return Text{}, false
			}
			c.pos = i + 1
			return unit, true
		}
	}
	inside := text[c.pos+1:]
	if cut := strings.IndexAny(inside, "=\n"); cut >= 0 {
		inside = inside[:cut]
	}
	if first := strings.Fields(inside); len(first) > 0 {
		inside = first[0]
	} else {
		inside = "1"
	}
	c.report(c.place(c.pos, c.pos+1), problem.Syntax, "the unit bracket is not closed", "write `["+short(strings.Trim(inside, "[],()"))+"]`")
	return Text{}, false
}

// equals passes over the `=` that has to come next.
func (c *cursor) equals(suggestion string) bool {
	rest := c.rest()
	if strings.HasPrefix(rest, "==") {
		c.report(c.here(), problem.Syntax, "`==` compares; a value is given by one `=`", "write `=`")
		return false
	}
	if c.sign("=") {
		return true
	}
	c.report(c.here(), problem.Syntax, "`=` is missing: "+c.instead(), suggestion)
	return false
}

// end reports what is left behind a statement that is complete.
func (c *cursor) end(suggestion string) bool {
	if c.done() {
		return true
	}
	c.report(c.restSpan(), problem.Syntax, "the statement is complete before `"+short(firstLine(c.rest()))+"`", suggestion)
	return false
}

func firstLine(text string) string {
	if cut := strings.IndexByte(text, '\n'); cut >= 0 {
		return text[:cut]
	}
	return text
}

// number reads a number. What it is, with its article, is told in the
// messages. Inside of a list a comma parts numbers.
func (c *cursor) number(what string, inList bool) (float64, Text, bool) {
	c.skip()
	text := c.whole.Value
	end := numberEnd(text, c.pos, !inList)
	if word := firstName(text[c.pos:]); end == c.pos || word != "" && !infinite(word) {
		c.report(c.here(), problem.Syntax, what+" is missing: "+c.instead(), "write a number")
		return 0, Text{}, false
	}
	t := c.text(c.pos, end)
	c.pos = end
	value, ok := c.parser.toNumber(t)
	return value, t, ok
}

// toNumber gives the number that a text stands for. What is not one is
// reported.
func (p *parser) toNumber(t Text) (float64, bool) {
	if isNumber(t.Value) {
		value, err := strconv.ParseFloat(t.Value, 64)
		if err != nil || math.IsInf(value, 0) {
			p.report(t.Span, problem.Number, "`"+short(t.Value)+"` is larger than any number of 64 bits", "write a magnitude below 1.8e308")
			return 0, false
		}
		if value == 0 && strings.ContainsAny(mantissa(t.Value), "123456789") {
			p.report(t.Span, problem.Number, "`"+short(t.Value)+"` is smaller than any number of 64 bits", "write 0 or a magnitude above 4.9e-324")
			return 0, false
		}
		return value, true
	}
	message, suggestion := notANumber(t.Value)
	p.report(t.Span, problem.Number, message, suggestion)
	return 0, false
}

func mantissa(number string) string {
	if cut := strings.IndexAny(number, "eE"); cut >= 0 {
		return number[:cut]
	}
	return number
}

// notANumber says what is wrong with a number that is not well formed.
func notANumber(text string) (message, suggestion string) {
	message = "`" + short(text) + "` is not a number"
	bare := strings.ToLower(strings.TrimLeft(text, "+-"+string(minusSign)))
	switch {
	case bare == "inf" || bare == "infinity" || bare == "∞" || bare == "nan":
		return message + " that a sheet can have", "write a finite number"
	case strings.ContainsRune(text, minusSign):
		fixed := strings.ReplaceAll(text, string(minusSign), "-")
		return message + ": it has the typographic minus sign", "write `" + short(fixed) + "`"
	}
	if fixed := strings.ReplaceAll(text, "_", ""); fixed != text && isNumber(fixed) {
		return message + ": its digits are not to be grouped by `_`", "write `" + short(fixed) + "`"
	}
	if strings.Contains(text, ",") {
		if fixed := strings.ReplaceAll(text, ",", "."); isNumber(fixed) {
			return message + ": decimals stand behind a point", "write `" + short(fixed) + "`"
		}
		if fixed := strings.ReplaceAll(text, ",", ""); isNumber(fixed) {
			return message + ": its digits are not to be grouped by commas", "write `" + short(fixed) + "`"
		}
	}
	end := 0
	for end < len(text) && (text[end] >= '0' && text[end] <= '9' || text[end] == '.' || end == 0 && (text[end] == '+' || text[end] == '-')) {
		end++
	}
	if isNumber(text[:end]) && !strings.ContainsAny(text[end:], "0123456789.") && strings.ToLower(text[end:]) != "e" {
		return message, "write `" + text[:end] + "`, and a unit in brackets behind the name"
	}
	return message, "write digits with at most one point, and an exponent such as `e-3` where it is needed"
}
