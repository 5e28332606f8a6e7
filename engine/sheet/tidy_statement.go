package sheet

import "strings"

// lay gives the lines of one statement.
func lay(s Statement) layout {
	e := s.common()
	l := &layer{first: e.Line}
	word := s.Word()
	switch s := s.(type) {
	case *Title:
		l.head([]string{word}, squeeze(s.Text.Value))
	case *Known:
		l.head([]string{word, s.Name.Value, brackets(s.Unit)}, knownTail(s))
	case *Derive:
		l.head([]string{word, s.Name.Value, brackets(s.Unit)}, "=")
		l.formula("", s.Formula)
	case *Law:
		l.head([]string{word, lawHead(s), brackets(s.Unit)}, "=")
		l.formula("", s.Formula)
		l.valid(s.Valid)
	case *Require:
		l.head([]string{word, s.Name.Value}, "=")
		l.formula("", s.Condition)
	case *Table:
		l.head(nil, word+" "+s.Name.Value)
		l.table(s)
	case *Vary:
		l.head([]string{word, s.Name.Value}, varyTail(s))
	case *Seek:
		l.head([]string{word, s.Name.Value, brackets(s.Unit)}, "= "+s.LowText.Value+" to "+s.HighText.Value)
		l.formula("where", s.Left)
		l.formula("==", s.Right)
	case *Correlate:
		l.head([]string{word, s.A.Value, s.B.Value}, "= "+s.CoefficientText.Value)
	case *Draw:
		names := make([]string, len(s.Names))
		for i, n := range s.Names {
			names[i] = n.Value
		}
		l.head([]string{word}, strings.Join(names, ", ")+" against "+s.Against.Value)
	}
	return layout{rows: l.withNotes(e.notes), source: e.source}
}

// brackets gives a unit in its brackets, or nothing where there is none.
func brackets(unit Text) string {
	if !unit.Present() {
		return ""
	}
	return "[" + squeeze(unit.Value) + "]"
}

func lawHead(s *Law) string {
	parameters := make([]string, len(s.Parameters))
	for i, p := range s.Parameters {
		parameters[i] = named(p.Name, p.Unit)
	}
	return s.Name.Value + "(" + strings.Join(parameters, ", ") + ")"
}

func named(name, unit Text) string {
	if !unit.Present() {
		return name.Value
	}
	return name.Value + " " + brackets(unit)
}

func knownTail(s *Known) string {
	var parts []string
	switch {
	case !s.HasValue:
	case len(s.Choices) > 0:
		for i, c := range s.Choices {
			if i == 0 {
				parts = append(parts, "=", quote(c.Value))
			} else {
				parts = append(parts, "or", quote(c.Value))
			}
		}
	case s.Truth != nil && *s.Truth:
		parts = append(parts, "= true")
	case s.Truth != nil:
		parts = append(parts, "= false")
	default:
		parts = append(parts, "=", s.NumberText.Value)
	}
	if u := s.Uncertainty; u != nil {
		parts = append(parts, "±", u.NumberText.Value)
		if u.Distribution != Normal {
			parts = append(parts, u.Distribution)
		}
		if u.CoverageText.Present() {
			parts = append(parts, "at k="+u.CoverageText.Value)
		}
		if u.FreedomText.Present() {
			parts = append(parts, "dof", u.FreedomText.Value)
		}
	}
	if w := s.Within; w != nil {
		parts = append(parts, "within", w.LowText.Value, "to", w.HighText.Value)
	}
	return strings.Join(parts, " ")
}

func varyTail(s *Vary) string {
	if s.Over != nil {
		points := make([]string, len(s.OverTexts))
		for i, t := range s.OverTexts {
			points[i] = t.Value
		}
		return "over [" + strings.Join(points, ", ") + "]"
	}
	tail := "= " + s.LowText.Value + " to " + s.HighText.Value
	if s.StepText.Present() {
		return tail + " by " + s.StepText.Value
	}
	return tail + " in " + s.StepsText.Value + " steps"
}

// layer lays the lines of one statement, each with the line of the sheet that
// it came from, so that notes find their lines again.
type layer struct {
	first int
	rows  []row
	lines []int
}

func (l *layer) head(cells []string, tail string) {
	l.rows = append(l.rows, row{cells: cells, tail: tail})
	l.lines = append(l.lines, l.first)
}

// formula adds a formula's pieces, each to its own line.
func (l *layer) formula(word string, t Text) {
	for i, piece := range t.pieces() {
		piece = squeeze(piece)
		if word != "" {
			piece = word + " " + piece
			word = ""
		}
		l.add(t.lineOf(i), piece)
	}
}

// add puts a piece on the last line if it came from there, otherwise on a new
// one.
func (l *layer) add(line int, piece string) {
	last := len(l.rows) - 1
	if line <= l.lines[last] {
		r := &l.rows[last]
		if r.tail != "" {
			r.tail += " "
		}
		r.tail += piece
		return
	}
	l.rows = append(l.rows, row{tail: piece, deep: true})
	l.lines = append(l.lines, line)
}

// valid adds a law's condition, which always begins a line.
func (l *layer) valid(t Text) {
	for i, piece := range t.pieces() {
		piece = squeeze(piece)
		if i == 0 {
			line := t.lineOf(0)
			if last := l.lines[len(l.lines)-1]; line <= last {
				line = last + 1
			}
			l.rows = append(l.rows, row{tail: "valid " + piece, deep: true})
			l.lines = append(l.lines, line)
			continue
		}
		l.add(t.lineOf(i), piece)
	}
}

func (l *layer) table(s *Table) {
	header := make([]string, len(s.Columns))
	for i, c := range s.Columns {
		header[i] = named(c.Name, c.Unit)
	}
	line := l.first + 1
	if len(s.Columns) > 0 {
		line = s.Columns[0].Name.Line
	}
	l.rows = append(l.rows, row{cells: header, deep: true})
	l.lines = append(l.lines, line)
	for _, cells := range s.Cells {
		texts := make([]string, len(cells))
		for i, c := range cells {
			texts[i] = c.Value
		}
		l.rows = append(l.rows, row{cells: texts, deep: true})
		l.lines = append(l.lines, cells[0].Line)
	}
}

// withNotes gives the rows with the notes and empty lines of the statement
// among them.
func (l *layer) withNotes(notes []Note) []row {
	if len(notes) == 0 {
		return l.rows
	}
	var all []row
	n := 0
	alone := func(note Note) {
		switch {
		case !note.gap:
			all = append(all, row{note: note.Value, deep: true})
		case len(all) > 0 && !all[len(all)-1].gap:
			all = append(all, row{gap: true, deep: true})
		}
	}
	for i := range l.rows {
		for n < len(notes) && notes[n].Line < l.lines[i] {
			alone(notes[n])
			n++
		}
		r := l.rows[i]
		if n < len(notes) && notes[n].Line == l.lines[i] && !notes[n].gap {
			r.note = notes[n].Value
			n++
		}
		all = append(all, r)
	}
	for ; n < len(notes); n++ {
		alone(notes[n])
	}
	for len(all) > 0 && all[len(all)-1].gap {
		all = all[:len(all)-1]
	}
	return all
}
