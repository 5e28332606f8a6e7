package unit

import (
	"strconv"
	"strings"
	"sync"
	"unicode/utf8"
)

// Limits of unit text. They bound the work of Parse.
const (
	// MaximumLength is the greatest length of unit text in bytes.
	MaximumLength = 200
	// MaximumDepth is the greatest depth of brackets.
	MaximumDepth = 16
	// MaximumPower is the greatest power of a single symbol, and of the absolute
	// powers of all symbols together.
	MaximumPower = 99
)

// Error tells what is wrong with unit text and where.
type Error struct {
	Offset     int    // of the first byte that is wrong
	Length     int    // in bytes; 0 at the end of the text
	Message    string // what is wrong, in words
	Suggestion string // what to write in place of those bytes, or ""
}

// Error returns the message, with the suggestion where there is one.
func (e *Error) Error() string {
	if e.Suggestion != "" {
		return e.Message + "; did you mean " + e.Suggestion + "?"
	}
	return e.Message
}

// Corrected returns text with the suggestion put in place of what is wrong, and
// text itself where there is no suggestion.
func (e *Error) Corrected(text string) string {
	end := e.Offset + e.Length
	if e.Suggestion == "" || e.Offset < 0 || end > len(text) || end < e.Offset {
		return text
	}
	return text[:e.Offset] + e.Suggestion + text[end:]
}

// Parse reads unit text: products by a blank, "·", "*" or ".", one "/" a
// bracket level with everything behind it below the line, powers such as ^2,
// ^-1, ^(1/2), ^0.5, ², ⁻¹, round brackets, and the number 1. The error is an
// *Error.
func Parse(text string) (Unit, error) {
	if u, known := parsed.get(text); known {
		return u, nil
	}
	u, err := parse(text)
	if err == nil {
		parsed.keep(text, u)
	}
	return u, err
}

// memory keeps units that were parsed, since a sheet writes the same few again
// and again.
type memory struct {
	mu     sync.RWMutex
	byText map[string]Unit
}

// mostKept bounds how many units are kept.
const mostKept = 1000

var parsed = memory{byText: map[string]Unit{}}

func (m *memory) get(text string) (Unit, bool) {
	m.mu.RLock()
	defer m.mu.RUnlock()
	u, ok := m.byText[text]
	return u, ok
}

func (m *memory) keep(text string, u Unit) {
	m.mu.Lock()
	defer m.mu.Unlock()
	if len(m.byText) < mostKept {
		m.byText[strings.Clone(text)] = u
	}
}

func parse(text string) (Unit, error) {
	l := shared()
	atoms, problem := readAtoms(l, text)
	if problem != nil {
		return Unit{}, problem
	}
	if !alone(atoms) {
		for i := range atoms {
			atoms[i].mark = unmarked
		}
		atoms = merged(atoms)
	}
	whole := func(message string) (Unit, error) {
		return Unit{}, &Error{Offset: 0, Length: len(text), Message: message}
	}
	f, d, ok := l.compose(atoms)
	if !ok {
		return whole("these powers are too fine: powers are kept as twelfths")
	}
	u := Unit{text: l.text(atoms), dimension: d}
	if len(u.text) > MaximumLength {
		return whole("a unit is limited to " + strconv.Itoa(MaximumLength) + " bytes")
	}
	u.multiply, u.divide, ok = f.split()
	if !ok {
		return whole("the factor of this unit is outside the range of numbers")
	}
	if alone(atoms) {
		entry := &l.units[atoms[0].unit]
		u.kind, u.before = entry.kind, entry.zero
		switch atoms[0].mark {
		case absolute:
			u.kind = AbsolutePressure
		case gauge:
			u.kind = GaugePressure
		}
	}
	return u, nil
}

// readAtoms reads unit text into merged atoms.
func readAtoms(l *library, text string) ([]atom, *Error) {
	if len(text) > MaximumLength {
		return nil, &Error{Offset: 0, Length: len(text), Message: "a unit is limited to " + strconv.Itoa(MaximumLength) + " bytes"}
	}
	p := &parser{library: l, text: text}
	atoms, problem := p.product(false)
	if problem != nil {
		return nil, problem
	}
	atoms = merged(atoms)
	total := 0
	for _, a := range atoms {
		total += max(a.twelfths, -a.twelfths)
	}
	if total > MaximumPower*wholePower {
		return nil, &Error{Offset: 0, Length: len(text), Message: "the powers of a unit are limited to " + strconv.Itoa(MaximumPower) + " in all"}
	}
	return atoms, nil
}

// parser walks through unit text once.
type parser struct {
	library *library
	text    string
	at      int
	depth   int
}

// wrong makes an Error for the bytes from start to the present place.
func (p *parser) wrong(start int, message, suggestion string) *Error {
	return &Error{Offset: start, Length: p.at - start, Message: message, Suggestion: suggestion}
}

// product reads to the end of the text or, where inBrackets, behind the closing
// bracket.
func (p *parser) product(inBrackets bool) ([]atom, *Error) {
	var atoms []atom
	open := p.at
	sign := 1
	slash := -1                // where the "/" of this level stands
	operator := max(open-1, 0) // where the operator that waits for a unit stands
	waiting, any := true, false
	for {
		blank := p.blanks() || !any
		start := p.at
		if p.at == len(p.text) {
			if inBrackets {
				return nil, &Error{Offset: open - 1, Length: 1, Message: "this bracket is not closed"}
			}
			break
		}
		switch operatorAt(p.text[p.at:]) {
		case ")":
			p.at++
			if !inBrackets {
				return nil, p.wrong(start, "there is no open bracket for this one", "")
			}
			if waiting {
				return nil, p.wrong(operator, "a unit is missing here", "")
			}
			return atoms, nil
		case "/":
			p.at++
			if waiting {
				return nil, p.wrong(start, "a unit is missing before /; write 1/… for a reciprocal", "")
			}
			if slash >= 0 {
				return nil, p.secondSlash(slash)
			}
			slash, sign, waiting, operator = start, -1, true, start
			continue
		case "**":
			p.at += 2
			return nil, p.wrong(start, "a power is written with ^", "^")
		case "*":
			_, width := utf8.DecodeRuneInString(p.text[p.at:])
			p.at += width
			if waiting {
				return nil, p.wrong(start, "a unit is missing before "+p.text[start:p.at], "")
			}
			waiting, operator = true, start
			continue
		}
		if any && !waiting && !blank && !strings.ContainsRune("^+-", rune(p.text[p.at])) {
			_, width := utf8.DecodeRuneInString(p.text[p.at:])
			p.at += width
			return nil, p.wrong(start, "a blank or * is missing before "+p.text[start:p.at], " "+p.text[start:p.at])
		}
		operand, problem := p.operand()
		if problem != nil {
			return nil, problem
		}
		for i := range operand {
			operand[i].twelfths *= sign
		}
		atoms = append(atoms, operand...)
		waiting, any = false, true
	}
	if waiting {
		if !any {
			return nil, &Error{Offset: 0, Length: len(p.text), Message: "the unit is empty; a pure number has the unit 1", Suggestion: "1"}
		}
		p.at = min(operator+1, len(p.text))
		for p.at < len(p.text) && !utf8.RuneStart(p.text[p.at]) {
			p.at++
		}
		return nil, p.wrong(operator, "a unit is missing behind "+p.text[operator:p.at], "")
	}
	return atoms, nil
}

// secondSlash tells of a second "/" on one level: what follows the first is to
// be put in brackets.
func (p *parser) secondSlash(first int) *Error {
	end, depth := len(p.text), 0
	for i := p.at; i < len(p.text); i++ {
		switch p.text[i] {
		case '(':
			depth++
		case ')':
			depth--
		}
		if depth < 0 {
			end = i
			break
		}
	}
	below := strings.TrimSpace(strings.ReplaceAll(p.text[first+1:end], "/", " "))
	e := &Error{
		Offset: first + 1, Length: end - first - 1,
		Message: "a second / is ambiguous: put what is below the line in brackets",
	}
	if !strings.ContainsAny(below, "()") {
		e.Suggestion = "(" + below + ")"
	}
	return e
}

// operand reads a symbol, a bracket or the number 1, with its power.
func (p *parser) operand() ([]atom, *Error) {
	start := p.at
	switch c := p.text[p.at]; {
	case c == '(':
		if p.depth == MaximumDepth {
			p.at++
			return nil, p.wrong(start, "brackets are limited to a depth of "+strconv.Itoa(MaximumDepth), "")
		}
		p.depth++
		p.at++
		atoms, problem := p.product(true)
		p.depth--
		if problem != nil {
			return nil, problem
		}
		return p.powered(atoms)
	case c >= '0' && c <= '9':
		for p.at < len(p.text) && (isDigit(p.text[p.at]) || p.text[p.at] == '.' && p.at+1 < len(p.text) && isDigit(p.text[p.at+1])) {
			p.at++
		}
		if p.text[start:p.at] != "1" {
			return nil, p.wrong(start, "a unit holds no number but 1", "")
		}
		return nil, nil
	}
	symbol, problem := p.symbol()
	if problem != nil {
		return nil, problem
	}
	a, ok := p.library.find(symbol)
	if !ok {
		return nil, p.unknown(start, symbol)
	}
	return p.powered([]atom{a})
}

// symbol reads the letters of a symbol, with the mark of a pressure behind it.
func (p *parser) symbol() (string, *Error) {
	start := p.at
	if strings.HasPrefix(p.text[p.at:], "l.y.") {
		p.at += len("l.y.")
		return p.text[start:p.at], nil
	}
	for p.at < len(p.text) {
		width := symbolRune(p.text[p.at:], p.at > start)
		if width == 0 {
			break
		}
		p.at += width
	}
	if p.at == start {
		r, width := utf8.DecodeRuneInString(p.text[p.at:])
		p.at += width
		if r == utf8.RuneError {
			return "", p.wrong(start, "this is not text in UTF-8", "")
		}
		switch r {
		case '\'':
			return "", p.wrong(start, "' may be a minute of arc or a foot: write arcmin or ft", "arcmin")
		case '"':
			return "", p.wrong(start, "\" may be a second of arc or an inch: write arcsec or in", "arcsec")
		case '^', '-', '+', '−':
			return "", p.wrong(start, "a power needs a unit before it", "")
		}
		return "", p.wrong(start, "a unit holds no "+string(r), "")
	}
	if rest := p.text[p.at:]; strings.HasPrefix(rest, absoluteSuffix) || strings.HasPrefix(rest, gaugeSuffix) {
		p.at += len(absoluteSuffix)
	}
	return p.text[start:p.at], nil
}

// unknown tells of a symbol that is no unit.
func (p *parser) unknown(start int, symbol string) *Error {
	if r, ok := refusal(symbol); ok {
		return p.wrong(start, r.message, r.suggestion)
	}
	if stem := strings.TrimSuffix(strings.TrimSuffix(symbol, absoluteSuffix), gaugeSuffix); stem != symbol {
		if _, ok := p.library.find(stem); ok {
			return p.wrong(start, "only a pressure may be marked absolute (a) or gauge (g), and only once", stem)
		}
		p.at -= len(absoluteSuffix)
		symbol = stem
	}
	return p.wrong(start, "the unit "+symbol+" is not known", p.library.nearest(symbol))
}

// isDigit reports whether c is a decimal digit.
func isDigit(c byte) bool { return c >= '0' && c <= '9' }

// blanks skips white space and reports whether there was any.
func (p *parser) blanks() bool {
	start := p.at
	for p.at < len(p.text) {
		r, width := utf8.DecodeRuneInString(p.text[p.at:])
		if !isBlank(r) {
			break
		}
		p.at += width
	}
	return p.at > start
}

// isBlank reports whether r separates factors: blank, tab, no-break space, thin
// space and narrow no-break space.
func isBlank(r rune) bool {
	switch r {
	case ' ', '\t', '\u00a0', '\u2009', '\u202f':
		return true
	}
	return false
}

// operatorAt returns the operator at the beginning of text: ")", "/", "**", "*"
// for any sign of multiplication, and "" for none.
func operatorAt(text string) string {
	if strings.HasPrefix(text, "**") {
		return "**"
	}
	r, _ := utf8.DecodeRuneInString(text)
	switch r {
	case ')':
		return ")"
	case '/', '∕':
		return "/"
	case '*', '.', '·', '⋅', '×':
		return "*"
	}
	return ""
}

// symbolRune returns the width of the character at the beginning of text if it
// may be part of a symbol, and 0 if not. Digits may stand behind the first.
func symbolRune(text string, inside bool) int {
	c := text[0]
	switch {
	case c >= 'a' && c <= 'z', c >= 'A' && c <= 'Z', c == '_', c == '%':
		return 1
	case isDigit(c):
		if inside {
			return 1
		}
		return 0
	case c < utf8.RuneSelf:
		return 0
	}
	r, width := utf8.DecodeRuneInString(text)
	if r == utf8.RuneError || isBlank(r) || operatorAt(text) != "" || superscript(r) != 0 || r == '−' {
		return 0
	}
	return width
}
