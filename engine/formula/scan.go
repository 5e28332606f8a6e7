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

// tokenKind says what a token is.
type tokenKind uint8

const (
	endToken    tokenKind = iota
	numberToken           // value
	nameToken             // text
	textToken             // text, without its quotes
	unitToken             // a unit's bracket: text is the unit's
	signToken             // an operator, a bracket or a word like and: text
)

// token is a piece of a formula with its place in it, in bytes.
type token struct {
	kind     tokenKind
	text     string
	value    float64
	from, to int
}

// open is a bracket that waits for its partner.
type open struct {
	character rune
	call      bool
	named     bool
	offset    int
}

// scanner takes a formula apart. What follows a value in brackets is a unit,
// everywhere else a bracket opens a list.
type scanner struct {
	formula  string
	source   Source
	problems *problem.List
	tokens   []token
	stack    []open
	failed   bool
	value    bool // the last token ends a value: a bracket that follows is a unit
	begins   bool // the last token opens an argument: a name with a colon names an option
	word     bool // the last token is a name: a parenthesis that follows is a call
	text     bool // the last token is a text, which has no unit
	comma    bool // the last token is a comma, which nothing closes behind
}

// scan gives the tokens of a formula, an endToken last. It reports what cannot
// stand in a formula and then returns false.
func scan(formula string, source Source, problems *problem.List) ([]token, bool) {
	l := &scanner{formula: formula, source: source, problems: problems, tokens: make([]token, 0, 1+len(formula)/3)}
	for at := 0; at < len(formula) && !l.failed; {
		at = l.token(at)
	}
	if !l.failed && len(l.stack) > 0 {
		last := l.stack[len(l.stack)-1]
		l.fail(last.offset, 1, problem.Syntax, "this "+quote(string(last.character))+" is not closed", "add "+quote(string(partner(last.character))))
	}
	l.add(token{kind: endToken, from: len(formula), to: len(formula)})
	return l.tokens, !l.failed
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

func (l *scanner) fail(offset, length int, code problem.Code, message, suggestion string) {
	l.failed = true
	l.problems.Add(l.source.SpanOf(offset, length), code, message, suggestion)
}

func (l *scanner) add(t token) { l.tokens = append(l.tokens, t) }

// sign adds an operator, bracket or word that stands as such in the formula.
func (l *scanner) sign(text string, at int) {
	l.add(token{kind: signToken, text: text, from: at, to: at + len(text)})
}

// after keeps what the last token was.
func (l *scanner) after(value, begins, word bool) {
	l.value, l.begins, l.word, l.text, l.comma = value, begins, word, false, false
}

// token reads one token and gives the offset behind it.
func (l *scanner) token(at int) int {
	r, size := utf8.DecodeRuneInString(l.formula[at:])
	if l.begins && !unicode.IsSpace(r) && r != ')' && l.behindNamed(at) {
		return len(l.formula)
	}
	switch {
	case unicode.IsSpace(r):
		return at + size
	case r >= '0' && r <= '9' || r == '.' && l.digitAt(at+1):
		return l.number(at)
	case r == '_' || unicode.IsLetter(r):
		return l.name(at)
	case r == '"' || r == '\'':
		return l.quoted(at, r)
	case r == '(':
		l.sign("(", at)
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

func (l *scanner) digitAt(at int) bool {
	return at < len(l.formula) && l.formula[at] >= '0' && l.formula[at] <= '9'
}

// number reads a decimal number.
func (l *scanner) number(at int) int {
	end := at
	for l.digitAt(end) {
		end++
	}
	if end < len(l.formula) && l.formula[end] == '.' {
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
	if value, ok := l.inRange(at, end); ok {
		l.add(token{kind: numberToken, value: value, from: at, to: end})
	}
	l.after(true, false, false)
	return end
}

// notNumber reports what begins like a number and is none.
func (l *scanner) notNumber(at, stop int) {
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

// inRange gives a number's value; it reports one that 64 bits cannot hold.
func (l *scanner) inRange(at, end int) (value float64, ok bool) {
	text := l.formula[at:end]
	value, err := strconv.ParseFloat(text, 64)
	switch mantissa, _, _ := strings.Cut(strings.ToLower(text), "e"); {
	case err != nil || value-value != 0:
		l.fail(at, end-at, problem.Number, quote(text)+" is larger than any number of 64 bits", "write a magnitude below 1.8e308")
		return 0, false
	case value == 0 && strings.ContainsAny(mantissa, "123456789"):
		l.fail(at, end-at, problem.Number, quote(text)+" is smaller than any number of 64 bits", "write 0 or a magnitude above 4.9e-324")
		return 0, false
	}
	return value, true
}

// behindNamed reports an argument by position that follows one with a name.
func (l *scanner) behindNamed(at int) bool {
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
func (l *scanner) wordEnd(at int) int {
	for at < len(l.formula) {
		r, size := utf8.DecodeRuneInString(l.formula[at:])
		if r != '_' && !unicode.IsLetter(r) && !unicode.IsDigit(r) {
			break
		}
		at += size
	}
	return at
}

func (l *scanner) name(at int) int {
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
		l.sign(word, at)
		l.after(false, false, false)
		return end
	}
	rest := strings.TrimLeft(l.formula[end:], " \t\n")
	if l.begins && strings.HasPrefix(rest, ":") && len(l.stack) > 0 {
		top := &l.stack[len(l.stack)-1]
		top.named = top.named || top.call
	}
	l.add(token{kind: nameToken, text: word, from: at, to: end})
	l.after(true, false, true)
	return end
}

func (l *scanner) quoted(at int, mark rune) int {
	for end := at + 1; end < len(l.formula); end++ {
		switch l.formula[end] {
		case byte(mark):
			l.add(token{kind: textToken, text: l.formula[at+1 : end], from: at, to: end + 1})
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

// bracket reads a list's opening bracket, or a unit's bracket whole.
func (l *scanner) bracket(at int) int {
	if l.text {
		l.fail(at, 1, problem.Shape, "a text has no unit", "remove the bracket")
		return len(l.formula)
	}
	if !l.value {
		l.sign("[", at)
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
	l.add(token{kind: unitToken, text: l.formula[at+1 : at+end], from: at, to: at + end + 1})
	l.after(true, false, false)
	return at + end + 1
}

// indexes says whether what stands in a bracket after a value is an index or a
// slice of other notations, and no unit.
func (l *scanner) indexes(inner string) bool {
	if strings.ContainsRune(inner, ':') {
		return true
	}
	n, err := strconv.Atoi(inner)
	return err == nil && n != 1
}

func (l *scanner) close(at int, r rune) int {
	if len(l.stack) == 0 || partner(l.stack[len(l.stack)-1].character) != r {
		l.fail(at, 1, problem.Syntax, "this "+quote(string(r))+" closes nothing", "remove it, or open it before")
		return at + 1
	}
	if l.comma {
		l.fail(at, 1, problem.Syntax, quote(string(r))+" does not fit here", misfitAdvice(string(r)))
		return at + 1
	}
	l.stack = l.stack[:len(l.stack)-1]
	l.sign(string(r), at)
	l.after(true, false, false)
	return at + 1
}
