package sheet

import (
	"math"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// cell is a stretch of a row, in bytes of the row's body.
type cell struct{ from, to int }

// table reads `table NAME` and its rows.
func (p *parser) table(c *cursor) Statement {
	s := &Table{}
	s.Name, _ = c.name("a table", "write `table NAME`, and the rows indented below")
	if s.Name.Present() {
		c.end("write the columns on an indented line below")
	}
	var cells []cell
	header := false
	columns := 0
	count := 0
	for i := 1; i < len(p.group); i++ {
		l := &p.group[i]
		if l.body == "" {
			continue
		}
		if !header {
			header = true
			columns = p.header(s, l)
			continue
		}
		if columns == 0 {
			continue // nothing to compare the row with
		}
		if count+columns > MostCells {
			p.report(l.place(), problem.Limit, "the table has more than "+strconv.Itoa(MostCells)+" cells", "part the table, or read it as a data file")
			break
		}
		count += columns
		cells = splitRow(l.body, cells[:0])
		if len(cells) != columns {
			suggestion := "write a number a column, parted by `|` or by two blanks"
			p.report(l.place(), problem.Table, "the row has "+counted(len(cells), "cell")+", the header has "+counted(columns, "column"), suggestion)
			continue
		}
		p.row(s, l, cells)
	}
	switch {
	case !header && !s.Name.Present(): // the name is missed already
	case !header:
		p.report(s.Name.Span, problem.Table, "the table has no header row", "write the columns on an indented line below, as in `depth [m] | temperature [degC]`")
	case len(s.Rows) == 0 && !p.faulty:
		p.report(s.Name.Span, problem.Table, "the table has no rows below its header", "write a row of numbers, indented")
	}
	return s
}

func counted(n int, what string) string {
	if n == 1 {
		return "1 " + what
	}
	return strconv.Itoa(n) + " " + what + "s"
}

// splitRow parts a row into cells: by `|` where it has one, otherwise by two
// or more blanks or a tab. A `|` at the row's start or end encloses it.
func splitRow(body string, cells []cell) []cell {
	if strings.IndexByte(body, '|') >= 0 {
		from := 0
		for i := 0; i <= len(body); i++ {
			if i == len(body) || body[i] == '|' {
				outer := i == 0 || i == len(body) && from == len(body)
				if !outer {
					cells = append(cells, trimCell(body, from, i))
				}
				from = i + 1
			}
		}
		return cells
	}
	from := 0
	for i := 0; i < len(body); {
		r, size := utf8.DecodeRuneInString(body[i:])
		if !unicode.IsSpace(r) {
			i += size
			continue
		}
		end, blanks, tab := i, 0, false
		for end < len(body) {
			r, size := utf8.DecodeRuneInString(body[end:])
			if !unicode.IsSpace(r) {
				break
			}
			tab = tab || r == '\t'
			blanks++
			end += size
		}
		if blanks > 1 || tab {
			cells = append(cells, cell{from, i})
			from = end
		}
		i = end
	}
	return append(cells, cell{from, len(body)})
}

func trimCell(body string, from, to int) cell {
	text := strings.TrimLeftFunc(body[from:to], unicode.IsSpace)
	from = to - len(text)
	return cell{from, from + len(strings.TrimRightFunc(text, unicode.IsSpace))}
}

// header reads the row of column names and gives the number of columns, 0
// where they are not to be known.
func (p *parser) header(s *Table, l *line) int {
	if isNumber(l.body[:numberEnd(l.body, 0, false)]) {
		p.report(l.place(), problem.Table, "the first row of a table names its columns", "write the names above, as in `depth [m] | temperature [degC]`")
		return 0
	}
	c := &cursor{parser: p, whole: p.join([]line{*l})}
	bars := strings.IndexByte(l.body, '|') >= 0
	c.sign("|")
	for {
		var column Column
		column.Name, _ = c.name("a column", "write the columns as in `depth [m] | temperature [degC]`")
		if !column.Name.Present() {
			return 0
		}
		before := c.pos
		var ok bool
		column.Unit, ok = c.unit()
		if !ok {
			return 0
		}
		if column.Unit.Present() {
			before = c.pos
		}
		if len(s.Columns) == MostColumns {
			p.report(column.Name.Span, problem.Limit, "the table has more than "+strconv.Itoa(MostColumns)+" columns", "part the table")
			return 0
		}
		s.Columns = append(s.Columns, column)
		if c.done() {
			break
		}
		if bars {
			if !c.sign("|") {
				c.report(c.here(), problem.Table, c.found()+" between columns", "part the columns by `|`")
				return 0
			}
			if c.done() {
				break
			}
			continue
		}
		if gap := c.whole.Value[before:c.pos]; !parts(gap) {
			c.report(c.here(), problem.Table, c.found()+" between columns", "part the columns by `|` or by two blanks")
			return 0
		}
	}
	return len(s.Columns)
}

// parts says whether a run of blanks parts two cells.
func parts(gap string) bool {
	return strings.IndexByte(gap, '\t') >= 0 || utf8.RuneCountInString(gap) > 1
}

// row reads a row of numbers.
func (p *parser) row(s *Table, l *line, cells []cell) {
	values := make([]float64, len(cells))
	texts := make([]Text, len(cells))
	column, at := l.column, 0
	good := true
	for i, c := range cells {
		column += utf8.RuneCountInString(l.body[at:c.from])
		at = c.from
		value := l.body[c.from:c.to]
		t := Text{Span: problem.Span{Line: l.number, Column: column, Length: utf8.RuneCountInString(value)}, Value: value}
		if value == "" {
			t.Length = 1
			p.report(t.Span, problem.Table, "the cell is empty", "write a number in column `"+short(s.Columns[i].Name.Value)+"`")
			good = false
		} else if fields := strings.Fields(value); len(fields) > 1 {
			p.report(t.Span, problem.Table, "`"+short(value)+"` is not one number", "part cells by `|` or by two blanks")
			good = false
		} else {
			var ok bool
			values[i], ok = p.toNumber(t)
			good = good && ok
		}
		texts[i] = t
	}
	if good {
		s.Rows = append(s.Rows, values)
		s.Cells = append(s.Cells, texts)
	}
}

// vary reads `vary NAME = LOW to HIGH by STEP`, `… in N steps` or `vary NAME
// over [a, b, c]`.
func (p *parser) vary(c *cursor) Statement {
	const form = "write `vary NAME = LOW to HIGH by STEP`, `vary NAME = LOW to HIGH in N steps` or `vary NAME over [a, b, c]`"
	s := &Vary{}
	s.Name, _ = c.name("what varies", form)
	if !s.Name.Present() {
		return s
	}
	if strings.HasPrefix(c.rest(), "[") {
		c.report(c.place(c.pos, c.pos+1), problem.Syntax, "`vary` has no unit bracket: its numbers are in the unit of the known", "leave the bracket out")
		return s
	}
	if c.word("over") {
		p.over(c, s)
		return s
	}
	if !c.equals(form) {
		return s
	}
	if c.word("over") {
		p.over(c, s)
		return s
	}
	if strings.HasPrefix(c.rest(), "[") {
		c.report(c.here(), problem.Syntax, "`over` is missing before the list", "write `vary "+short(s.Name.Value)+" over [a, b, c]`")
		return s
	}
	var ok bool
	s.Low, s.High, s.LowText, s.HighText, ok = c.bounds("the span")
	if !s.HighText.Present() {
		return s
	}
	switch {
	case c.word("by"):
		var isNumber bool
		s.Step, s.StepText, isNumber = c.number("the step", false)
		if !s.StepText.Present() {
			return s
		}
		if isNumber && s.Step <= 0 {
			c.report(s.StepText.Span, problem.Number, "a step is positive", "write a number above 0")
		} else if isNumber && ok && (s.High-s.Low)/s.Step > MostPoints-1 {
			c.report(s.StepText.Span, problem.Limit, "the step makes more than "+strconv.Itoa(MostPoints)+" points", "write a larger step")
		}
	case c.word("in"):
		var steps float64
		var isNumber bool
		steps, s.StepsText, isNumber = c.number("the number of steps", false)
		if !s.StepsText.Present() {
			return s
		}
		switch {
		case !isNumber:
		case steps < 1 || steps != math.Floor(steps):
			c.report(s.StepsText.Span, problem.Number, "the number of steps is a whole number above 0", "write `in 10 steps`")
		case steps > MostPoints-1:
			c.report(s.StepsText.Span, problem.Limit, "the steps make more than "+strconv.Itoa(MostPoints)+" points", "write fewer steps")
		default:
			s.Steps = int(steps)
		}
		if !c.word("steps") {
			c.report(c.here(), problem.Syntax, "`steps` is missing: "+c.instead(), "write `in N steps`")
			return s
		}
	default:
		c.report(c.here(), problem.Syntax, "the step is missing: "+c.instead(), "write `by STEP` or `in N steps`")
		return s
	}
	c.end("write a note behind `#`")
	return s
}

// over reads the list behind `over`.
func (p *parser) over(c *cursor, s *Vary) {
	open := c.here()
	if !c.sign("[") {
		c.report(open, problem.Syntax, "the list is missing: "+c.instead(), "write `over [a, b, c]`")
		return
	}
	if c.sign("]") {
		c.report(open, problem.Syntax, "the list is empty", "write `over [a, b, c]`")
		return
	}
	for {
		value, text, ok := c.number("a number of the list", true)
		if !text.Present() {
			return
		}
		if ok {
			s.Over = append(s.Over, value)
			s.OverTexts = append(s.OverTexts, text)
		}
		if c.sign(",") {
			continue
		}
		if c.sign("]") {
			break
		}
		if c.done() {
			c.report(open, problem.Syntax, "the list is not closed", "write `]` behind its last number")
		} else {
			c.report(c.here(), problem.Syntax, c.found()+" between the numbers of the list", "part numbers by `,`")
		}
		return
	}
	c.end("write a note behind `#`")
}
