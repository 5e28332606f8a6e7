package sheet

import (
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// parser reads one sheet.
type parser struct {
	text     string
	problems *problem.List
	reported int
	faulty   bool // something was reported since the statement began
	sheet    *Sheet
	count    int            // statements and paragraphs so far
	spans    []problem.Span // storage that the Lines of texts share
	group    []line         // the lines of the statement at hand
	start    int            // of the next line
	number   int            // of the next line
	peeked   bool
	ahead    line
	aheadEnd int
}

// report adds a problem. Once the list is surely full, nothing more is added,
// so that a text that is no sheet at all costs no more than its length.
func (p *parser) report(at problem.Span, code problem.Code, message, suggestion string) {
	p.faulty = true
	if p.reported < 2*problem.MostProblems {
		p.reported++
		p.problems.Add(at, code, message, suggestion)
	}
}

// Parse reads a sheet's text. It reports all that is wrong with it to problems
// and never gives nil. The time it takes grows with the text's length alone.
func Parse(text string, problems *problem.List) *Sheet {
	p := &parser{problems: problems, sheet: &Sheet{}, number: 1}
	if len(text) > MostText {
		p.report(problem.Span{}, problem.Limit, "the sheet has "+strconv.Itoa(len(text))+" bytes; at most "+strconv.Itoa(MostText)+" are read", "part the sheet")
		p.unread(text)
		return p.sheet
	}
	p.text = p.toCharacters(strings.TrimPrefix(text, byteOrderMark))
	for p.next() {
	}
	return p.sheet
}

// unread keeps text behind a limit, so that printing the sheet loses nothing.
func (p *parser) unread(rest string) {
	s := &Unread{Text: Text{Span: problem.Span{Line: p.number, Column: 1}}}
	s.entry = entry{Span: s.Text.Span, faulty: true, source: strings.TrimRight(rest, "\r\n")}
	p.sheet.Statements = append(p.sheet.Statements, s)
}

// toCharacters puts U+FFFD in the place of every byte that is not UTF-8, so
// that columns keep counting, and reports the first on each line.
func (p *parser) toCharacters(text string) string {
	if utf8.ValidString(text) {
		return text
	}
	out := make([]byte, 0, len(text)+64)
	number, column, last := 1, 1, 0
	for i := 0; i < len(text); {
		r, size := utf8.DecodeRuneInString(text[i:])
		if r == utf8.RuneError && size == 1 {
			if last != number {
				last = number
				p.report(problem.Span{Line: number, Column: column, Length: 1}, problem.Syntax, "the byte 0x"+strconv.FormatUint(uint64(text[i]), 16)+" is not UTF-8", "save the sheet as UTF-8")
			}
			out = append(out, "\uFFFD"...)
		} else {
			out = append(out, text[i:i+size]...)
		}
		column++
		if r == '\n' {
			number++
			column = 1
		}
		i += size
	}
	return string(out)
}

// peek reads the next line without passing over it.
func (p *parser) peek() (*line, bool) {
	if !p.peeked {
		if p.start >= len(p.text) {
			return nil, false
		}
		p.ahead, p.aheadEnd = nextLine(p.text, p.start, p.number)
		p.peeked = true
	}
	return &p.ahead, true
}

// pass goes on to the line behind the next one.
func (p *parser) pass() {
	p.start = p.aheadEnd
	p.number++
	p.peeked = false
}

// next reads one statement, paragraph or gap. It gives false at the end.
func (p *parser) next() bool {
	l, more := p.peek()
	if !more {
		return false
	}
	if l.empty() {
		p.gap()
		return true
	}
	p.count++
	if p.count > MostStatements {
		p.report(l.place(), problem.Limit, "the sheet has more than "+strconv.Itoa(MostStatements)+" statements and paragraphs; the rest is not read", "part the sheet")
		p.unread(p.text[l.start:])
		return false
	}
	p.faulty = false
	if cap(p.spans)-len(p.spans) < 64 {
		p.spans = make([]problem.Span, 0, 2048) // what is full stays with its texts
	}
	if l.body == "" && !l.long {
		p.prose()
		return true
	}
	p.gather()
	p.statement()
	return true
}

// place gives the place of a line's body, or of its note where it has none.
func (l *line) place() problem.Span {
	if l.body == "" {
		return problem.Span{Line: l.number, Column: l.noteColumn, Length: l.noteLength}
	}
	return problem.Span{Line: l.number, Column: l.column, Length: utf8.RuneCountInString(l.body)}
}

func (p *parser) gap() {
	b := &Blank{}
	b.Span = problem.Span{Line: p.number, Column: 1}
	for {
		l, more := p.peek()
		if !more || !l.empty() {
			break
		}
		b.Count++
		p.pass()
	}
	p.sheet.Statements = append(p.sheet.Statements, b)
}

// prose reads a paragraph.
func (p *parser) prose() {
	s := &Prose{}
	mark := len(p.spans)
	from, to := p.start, 0
	var pieces []string
	for {
		l, more := p.peek()
		if !more || l.body != "" || l.empty() {
			break
		}
		span := problem.Span{Line: l.number, Column: l.noteColumn + 1, Length: l.noteLength - 1}
		// The note is cut anew, for a paragraph keeps the indentation of its lines.
		text := strings.TrimRightFunc(p.text[l.start:l.end], unicode.IsSpace)
		text = text[strings.IndexByte(text, '#')+1:]
		if strings.HasPrefix(text, " ") || strings.HasPrefix(text, "\t") {
			text = text[1:]
			span.Column++
		}
		span.Length = utf8.RuneCountInString(text)
		pieces = append(pieces, text)
		p.spans = append(p.spans, span)
		to = l.end
		p.pass()
	}
	end := len(p.spans)
	s.Text = Text{Span: p.spans[mark], Value: strings.Join(pieces, "\n"), Lines: p.spans[mark:end:end]}
	s.Span = s.Text.Span
	s.source = p.text[from:to]
	p.sheet.Statements = append(p.sheet.Statements, s)
}

// gather collects the lines of the next statement: its first line and the
// indented ones below, empty lines between them included.
func (p *parser) gather() {
	p.group = p.group[:0]
	first, _ := p.peek()
	p.group = append(p.group, *first)
	table := firstName(first.body) == "table"
	p.pass()
	for {
		l, more := p.peek()
		if !more {
			break
		}
		if !l.empty() {
			if !l.indented || !table && isWord(firstName(l.body)) {
				break
			}
			p.group = append(p.group, *l)
			p.pass()
			continue
		}
		// Empty lines belong here only if an indented line follows.
		start, number := p.start, p.number
		for more && l.empty() {
			p.pass()
			l, more = p.peek()
		}
		if more && l.indented && (table || !isWord(firstName(l.body))) {
			p.group = append(p.group, line{number: number})
			continue
		}
		p.start, p.number, p.peeked = start, number, false
		break
	}
}

// statement reads the statement whose lines are gathered.
func (p *parser) statement() {
	first := &p.group[0]
	last := &p.group[len(p.group)-1]
	e := entry{Span: first.place(), source: p.text[first.start:last.end]}
	for i := range p.group {
		l := &p.group[i]
		switch {
		case l.note != "":
			at := problem.Span{Line: l.number, Column: l.noteColumn, Length: l.noteLength}
			e.notes = append(e.notes, Note{Span: at, Value: l.note, Alone: l.body == ""})
		case l.body == "" && l.noteColumn == 0:
			e.notes = append(e.notes, Note{Span: problem.Span{Line: l.number, Column: 1}, gap: true})
		}
	}
	s := p.read(first)
	if s == nil {
		p.faulty = true
		s = &Unread{Text: Text{Span: e.Span, Value: first.body}}
	}
	e.faulty = p.faulty
	*s.common() = e
	p.sheet.Statements = append(p.sheet.Statements, s)
}

// read gives the statement, or nil where there is none to be told.
func (p *parser) read(first *line) Statement {
	for i := range p.group {
		if l := &p.group[i]; l.long {
			p.report(problem.Span{Line: l.number, Column: MostLine + 1, Length: 1}, problem.Limit, "the line has more than "+strconv.Itoa(MostLine)+" characters", "let the formula run on over indented lines, or part the statement")
			return nil
		}
	}
	word := firstName(first.body)
	if first.indented {
		if isWord(word) {
			p.report(problem.Span{Line: first.number, Column: first.column, Length: len(word)}, problem.Syntax, "`"+word+"` is indented; a statement starts at the first column", "take the indentation away")
		} else {
			p.report(first.place(), problem.Syntax, "an indented line belongs to the statement above it, and there is none", "start the line at its first column with a statement word")
			return nil
		}
	}
	if !isWord(word) {
		p.noStatement(first, word)
		return nil
	}
	c := &cursor{parser: p, pos: len(word)}
	switch word {
	case "law":
		return p.law(c)
	case "derive", "require", "seek":
		c.whole = p.join(p.group)
		p.noValid(word)
	default:
		c.whole = p.join(p.group[:1])
		if word != "table" {
			p.noFurtherLines(word)
		}
	}
	switch word {
	case "title":
		return p.title(c)
	case "known":
		return p.known(c)
	case "derive":
		return p.derive(c)
	case "require":
		return p.require(c)
	case "table":
		return p.table(c)
	case "vary":
		return p.vary(c)
	case "seek":
		return p.seek(c)
	case "correlate":
		return p.correlate(c)
	}
	return p.draw(c)
}

// noStatement reports a line that no statement word begins.
func (p *parser) noStatement(first *line, word string) {
	at := first.place()
	rest := strings.TrimSpace(first.body[len(word):])
	if word == "" {
		p.report(at, problem.Statement, "the line does not begin with a statement word", "begin it with one of "+strings.Join(Words(), ", ")+", or with `#` for prose")
		return
	}
	at.Length = utf8.RuneCountInString(word)
	suggestion := "begin the line with one of " + strings.Join(Words(), ", ") + ", or with `#` for prose"
	lower := strings.ToLower(word)
	if isWord(lower) {
		suggestion = "write `" + lower + "`"
	} else if near := problem.Nearest(lower, Words()); near != "" && !strings.HasPrefix(rest, "=") {
		suggestion = "write `" + near + "`"
	} else if strings.HasPrefix(rest, "=") || strings.HasPrefix(rest, "[") {
		suggestion = "write `known " + short(word) + " …` for an input, `derive " + short(word) + " …` for a result"
	} else if word == "valid" {
		suggestion = "indent `valid` below the law it belongs to"
	}
	p.report(at, problem.Statement, "`"+short(word)+"` is not a statement word", suggestion)
}

// noFurtherLines reports indented lines below a statement that has none.
func (p *parser) noFurtherLines(word string) {
	for i := 1; i < len(p.group); i++ {
		if l := &p.group[i]; l.body != "" {
			p.report(l.place(), problem.Syntax, "`"+word+"` stands on one line; this indented line does not belong to it", "write it on the line of `"+word+"`, or start a statement at the first column")
			return
		}
	}
}

// startsWithValid says whether a line is the `valid` of a law.
func startsWithValid(l *line) bool { return firstName(l.body) == "valid" }

// noValid reports a `valid` below a statement that is no law.
func (p *parser) noValid(word string) {
	for i := 1; i < len(p.group); i++ {
		if l := &p.group[i]; startsWithValid(l) {
			p.report(problem.Span{Line: l.number, Column: l.column, Length: len("valid")}, problem.Syntax, "`valid` belongs to a law, not to `"+word+"`", "state the condition by `require NAME = CONDITION`")
			return
		}
	}
}

// join gives the lines' pieces as one text.
func (p *parser) join(lines []line) Text {
	mark := len(p.spans)
	var pieces []string
	for i := range lines {
		if l := &lines[i]; l.body != "" {
			p.spans = append(p.spans, l.place())
			if len(lines) > 1 {
				pieces = append(pieces, l.body)
			}
		}
	}
	end := len(p.spans)
	if end == mark {
		return Text{}
	}
	t := Text{Span: p.spans[mark], Lines: p.spans[mark:end:end]}
	if len(lines) == 1 {
		t.Value = lines[0].body
	} else {
		t.Value = strings.Join(pieces, "\n")
	}
	return t
}
