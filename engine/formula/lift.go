package formula

import (
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// Source is a formula's text with its place in the sheet: SpanOf maps a
// stretch of Value (byte offset and length) to where it stands.
type Source interface {
	SpanOf(offset, length int) problem.Span
}

// lifted is a formula made ready for the parser: unit brackets replaced by
// numbered ones and trailing names gathered in braces. origin tells for each
// character of text the byte of the user's formula that it stands for.
type lifted struct {
	text   []rune
	origin []int
	units  []bracket
	atByte map[int]int // byte offset of a unit bracket's "[" -> index in units
}

// bracket is a unit bracket: the unit's text and the bracket's place in the
// user's formula, in bytes, brackets included.
type bracket struct {
	unit           string
	offset, length int
	inner          int // byte offset of the unit's text
}

// open is a bracket that waits for its partner.
type open struct {
	character rune
	call      bool
	named     bool
	offset    int
}

type lifter struct {
	formula  string
	source   Source
	problems *problem.List
	out      lifted
	stack    []open
	failed   bool
	value    bool // the last token ends a value: a bracket that follows is a unit
	begins   bool // the last token opens an argument: a name with a colon names an option
	word     bool // the last token is a name: a parenthesis that follows is a call
	text     bool // the last token is a text, which has no unit
	comma    bool // the last token is a comma, which nothing closes behind
}

// lift makes formula text ready for the parser. It reports what cannot stand
// in a formula and then returns false.
func lift(formula string, source Source, problems *problem.List) (lifted, bool) {
	l := &lifter{formula: formula, source: source, problems: problems}
	l.out.atByte = make(map[int]int)
	for at := 0; at < len(formula) && !l.failed; {
		at = l.token(at)
	}
	if !l.failed && len(l.stack) > 0 {
		last := l.stack[len(l.stack)-1]
		l.fail(last.offset, 1, problem.Syntax, "this "+quote(string(last.character))+" is not closed", "add "+quote(string(partner(last.character))))
	}
	l.emitAt("  ", max(0, len(formula)-1)) // the end stands apart from the last token
	return l.out, !l.failed
}

func partner(r rune) rune {
	switch r {
	case '(':
		return ')'
	case '[':
		return ']'
	}
	return r
}

func quote(text string) string { return "'" + text + "'" }

func (l *lifter) fail(offset, length int, code problem.Code, message, suggestion string) {
	l.failed = true
	l.problems.Add(l.source.SpanOf(offset, length), code, message, suggestion)
}

func (l *lifter) emit(text string, origin int) {
	for i, r := range text {
		l.out.text = append(l.out.text, r)
		l.out.origin = append(l.out.origin, origin+i)
	}
}

// emitAt writes characters that stand for one place of the user's text.
func (l *lifter) emitAt(text string, origin int) {
	for _, r := range text {
		l.out.text = append(l.out.text, r)
		l.out.origin = append(l.out.origin, origin)
	}
}

// after keeps what the last token was.
func (l *lifter) after(value, begins, word bool) {
	l.value, l.begins, l.word, l.text, l.comma = value, begins, word, false, false
}

// token copies one token and gives the offset behind it.
func (l *lifter) token(at int) int {
	r, size := utf8.DecodeRuneInString(l.formula[at:])
	if l.begins && !unicode.IsSpace(r) && r != ')' && l.behindNamed(at) {
		return len(l.formula)
	}
	switch {
	case unicode.IsSpace(r):
		l.emitAt(" ", at)
		return at + size
	case r >= '0' && r <= '9' || r == '.' && l.digitAt(at+1):
		return l.number(at)
	case r == '_' || unicode.IsLetter(r):
		return l.name(at)
	case r == '"' || r == '\'':
		return l.quoted(at, r)
	case r == '(':
		l.emit("(", at)
		l.stack = append(l.stack, open{character: '(', call: l.word, offset: at})
		l.after(false, l.word, false)
		return at + 1
	case r == '[':
		return l.bracket(at)
	case r == ')' || r == ']':
		return l.close(at, r)
	}
	return l.operator(at, r)
}

func (l *lifter) digitAt(at int) bool {
	return at < len(l.formula) && l.formula[at] >= '0' && l.formula[at] <= '9'
}

// number copies a decimal number; one that a unit bracket follows is put in
// parentheses, since the parser takes no bracket behind a bare number.
func (l *lifter) number(at int) int {
	end := at
	for l.digitAt(end) {
		end++
	}
	whole := true
	if end < len(l.formula) && l.formula[end] == '.' {
		whole = false
		end++
		for l.digitAt(end) {
			end++
		}
	}
	if end < len(l.formula) && (l.formula[end] == 'e' || l.formula[end] == 'E') {
		exponent := end + 1
		if exponent < len(l.formula) && (l.formula[exponent] == '+' || l.formula[exponent] == '-') {
			exponent++
		}
		if l.digitAt(exponent) {
			whole = false
			for l.digitAt(exponent) {
				exponent++
			}
			end = exponent
		}
	}
	if r, size := utf8.DecodeRuneInString(l.formula[end:]); size > 0 && (r == '_' || r == '.' || unicode.IsLetter(r) || unicode.IsDigit(r)) {
		stop := end + size
		for stop < len(l.formula) {
			r, size := utf8.DecodeRuneInString(l.formula[stop:])
			if r != '_' && r != '.' && !unicode.IsLetter(r) && !unicode.IsDigit(r) {
				break
			}
			stop += size
		}
		l.notNumber(at, stop)
		return stop
	}
	text := l.formula[at:end]
	if !l.inRange(at, end) {
		return end
	}
	unitFollows := strings.HasPrefix(strings.TrimLeft(l.formula[end:], " \t\n"), "[")
	if unitFollows {
		l.emitAt("(", at)
	}
	l.emit(text, at)
	if whole {
		// The parser's whole numbers end at 63 bits; a formula's do not.
		l.emitAt(".0", end-1)
	}
	if unitFollows {
		l.emitAt(")", end-1)
	}
	l.after(true, false, false)
	return end
}

// notNumber reports what begins like a number and is none.
func (l *lifter) notNumber(at, stop int) {
	text := l.formula[at:stop]
	if first, last, is := strings.Cut(text, ".."); is && first != "" && last != "" {
		l.fail(at+len(first), 2, problem.Construct, "'..' is not part of a formula", foreignSigns[".."])
		return
	}
	advice := "write a unit in brackets, as in 250[m], and a product with *"
	if plain := strings.ReplaceAll(text, "_", ""); plain != text {
		if _, err := strconv.ParseFloat(plain, 64); err == nil {
			advice = "its digits are not to be grouped: write " + plain
		}
	}
	l.fail(at, stop-at, problem.Number, quote(text)+" is not a number", advice)
}

// inRange reports a number that 64 bits cannot hold.
func (l *lifter) inRange(at, end int) bool {
	text := l.formula[at:end]
	value, err := strconv.ParseFloat(text, 64)
	switch mantissa, _, _ := strings.Cut(strings.ToLower(text), "e"); {
	case err != nil || value-value != 0:
		l.fail(at, end-at, problem.Number, quote(text)+" is larger than any number of 64 bits", "write a magnitude below 1.8e308")
		return false
	case value == 0 && strings.ContainsAny(mantissa, "123456789"):
		l.fail(at, end-at, problem.Number, quote(text)+" is smaller than any number of 64 bits", "write 0 or a magnitude above 4.9e-324")
		return false
	}
	return true
}

// behindNamed reports an argument by position that follows one with a name.
func (l *lifter) behindNamed(at int) bool {
	if len(l.stack) == 0 || !l.stack[len(l.stack)-1].named {
		return false
	}
	end := l.wordEnd(at)
	if end > at && strings.HasPrefix(strings.TrimLeft(l.formula[end:], " \t\n"), ":") {
		return false
	}
	for end = at; end < len(l.formula) && !strings.ContainsRune(" \t\n,()[]", rune(l.formula[end])); {
		end++
	}
	l.fail(at, max(end-at, 1), problem.Arguments, "an argument without a name follows one with a name", "write the arguments without names first")
	return true
}

// wordEnd gives the end of the name at an offset.
func (l *lifter) wordEnd(at int) int {
	for at < len(l.formula) {
		r, size := utf8.DecodeRuneInString(l.formula[at:])
		if r != '_' && !unicode.IsLetter(r) && !unicode.IsDigit(r) {
			break
		}
		at += size
	}
	return at
}

func (l *lifter) name(at int) int {
	end := l.wordEnd(at)
	word := l.formula[at:end]
	member := at > 0 && l.formula[at-1] == '.'
	if !member {
		if advice, foreign := foreignWords[word]; foreign {
			l.fail(at, end-at, problem.Construct, quote(word)+" is not part of a formula", advice)
			return end
		}
	}
	switch word {
	case "and", "or", "not":
		l.emit(word, at)
		l.after(false, false, false)
		return end
	}
	rest := strings.TrimLeft(l.formula[end:], " \t\n")
	if l.begins && strings.HasPrefix(rest, ":") && len(l.stack) > 0 {
		top := &l.stack[len(l.stack)-1]
		if top.call && !top.named {
			top.named = true
			l.emitAt("{", at)
		}
	}
	l.emit(word, at)
	l.after(true, false, true)
	return end
}

func (l *lifter) quoted(at int, mark rune) int {
	for end := at + 1; end < len(l.formula); end++ {
		switch l.formula[end] {
		case byte(mark):
			l.emit(l.formula[at:end+1], at)
			l.after(false, false, false)
			l.text = true
			return end + 1
		case '\\':
			l.fail(end, 1, problem.Syntax, "a text holds no backslash", "write the text without it")
			return end
		case '\n':
			l.fail(at, end-at, problem.Syntax, "this text is not closed", "add "+string(mark))
			return end
		}
	}
	l.fail(at, len(l.formula)-at, problem.Syntax, "this text is not closed", "add "+string(mark))
	return len(l.formula)
}

// bracket copies a list's opening bracket, or lifts a unit bracket whole.
func (l *lifter) bracket(at int) int {
	if l.text {
		l.fail(at, 1, problem.Shape, "a text has no unit", "remove the bracket")
		return len(l.formula)
	}
	if !l.value {
		l.emit("[", at)
		l.stack = append(l.stack, open{character: '[', offset: at})
		l.after(false, false, false)
		return at + 1
	}
	end := strings.IndexByte(l.formula[at:], ']')
	if end < 0 {
		l.fail(at, len(l.formula)-at, problem.Syntax, "this unit bracket is not closed", "add "+quote("]"))
		return len(l.formula)
	}
	if inner := strings.TrimSpace(l.formula[at+1 : at+end]); l.indexes(inner) {
		l.fail(at, end+1, problem.Construct, "a bracket after a value is its unit; "+quote(inner)+" is none", "take an item of a list with item(list, n), counted from 1")
		return len(l.formula)
	}
	l.out.atByte[at] = len(l.out.units)
	l.out.units = append(l.out.units, bracket{unit: l.formula[at+1 : at+end], offset: at, length: end + 1, inner: at + 1})
	l.emitAt("[0]", at)
	l.after(true, false, false)
	return at + end + 1
}

// indexes says whether what stands in a bracket after a value is an index or a
// slice of other notations, and no unit.
func (l *lifter) indexes(inner string) bool {
	if strings.ContainsRune(inner, ':') {
		return true
	}
	n, err := strconv.Atoi(inner)
	return err == nil && n != 1
}

func (l *lifter) close(at int, r rune) int {
	if len(l.stack) == 0 || partner(l.stack[len(l.stack)-1].character) != r {
		l.fail(at, 1, problem.Syntax, "this "+quote(string(r))+" closes nothing", "remove it, or open it before")
		return at + 1
	}
	if l.comma {
		l.fail(at, 1, problem.Syntax, quote(string(r))+" does not fit here", misfitAdvice(string(r)))
		return at + 1
	}
	top := l.stack[len(l.stack)-1]
	l.stack = l.stack[:len(l.stack)-1]
	if top.named {
		l.emitAt("}", at)
	}
	l.emit(string(r), at)
	l.after(true, false, false)
	return at + 1
}
