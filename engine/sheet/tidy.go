package sheet

import (
	"bytes"
	"strings"
	"unicode"
	"unicode/utf8"
)

// What is wider than these, in characters, stands out of its column rather
// than to push all others aside.
const (
	widestName = 40
	widestUnit = 24
	widestCell = 40
	widestHead = 120 // what notes are lined up behind
)

const indentation = "    "

// Tidy prints a sheet in the canonical layout. Statements keep their order,
// their prose and their notes; runs of empty lines become one; the parts of
// neighbours with the same statement word stand in columns. Parsed again the
// text gives the same statements, and printed again the same text. A faulty
// statement is printed as it was written.
func Tidy(s *Sheet) string {
	t := &tidier{}
	t.sheet(s, false)
	if len(t.out) > MostText {
		t.out = t.out[:0]
		t.sheet(s, true)
	}
	if bytes.HasPrefix(t.out, []byte(byteOrderMark)) {
		return byteOrderMark + string(t.out) // the first one is not read as text
	}
	return string(t.out)
}

// byteOrderMark may stand before a sheet's text.
const byteOrderMark = "\uFEFF"

// tidier gathers the printed sheet.
type tidier struct {
	out []byte
}

// row is one line to be printed: the cells of its columns, what follows them,
// and its note.
type row struct {
	cells []string
	tail  string
	note  string
	deep  bool // an indented line
	gap   bool // an empty line
}

// layout is one statement to be printed.
type layout struct {
	rows   []row
	source string
}

func (t *tidier) sheet(s *Sheet, asWritten bool) {
	blank := false
	for i := 0; i < len(s.Statements); {
		statement := s.Statements[i]
		if _, ok := statement.(*Blank); ok {
			blank = len(t.out) > 0
			i++
			continue
		}
		if blank {
			t.out = append(t.out, '\n')
			blank = false
		}
		if asWritten || !tidied(statement) {
			t.written(statement.common().source)
			i++
			continue
		}
		if prose, ok := statement.(*Prose); ok {
			t.prose(prose)
			i++
			continue
		}
		end := i + 1
		for end < len(s.Statements) && s.Statements[end].Word() == statement.Word() && tidied(s.Statements[end]) {
			end++
		}
		t.block(s.Statements[i:end])
		i = end
	}
}

// tidied says whether a statement is printed from its parts.
func tidied(s Statement) bool {
	if _, ok := s.(*Unread); ok {
		return false
	}
	return !s.Faulty()
}

// written prints lines as they were written, without blanks at their ends.
func (t *tidier) written(source string) {
	for _, l := range strings.Split(source, "\n") {
		t.out = append(t.out, strings.TrimRightFunc(l, unicode.IsSpace)...)
		t.out = append(t.out, '\n')
	}
}

func (t *tidier) prose(p *Prose) {
	for _, l := range strings.Split(p.Text.Value, "\n") {
		if utf8.RuneCountInString(l)+2 > MostLine {
			t.written(p.source)
			return
		}
	}
	for _, l := range strings.Split(p.Text.Value, "\n") {
		t.out = append(t.out, '#')
		if l != "" {
			t.out = append(t.out, ' ')
			t.out = append(t.out, l...)
		}
		t.out = append(t.out, '\n')
	}
}

// block prints neighbours with the same statement word.
func (t *tidier) block(statements []Statement) {
	layouts := make([]layout, len(statements))
	for i, s := range statements {
		layouts[i] = lay(s)
	}
	// Tables are lined up each by itself, all else as one block.
	if statements[0].Word() == "table" {
		for i := range layouts {
			t.lines(layouts[i:i+1], true)
		}
		return
	}
	t.lines(layouts, false)
}

// lines prints statements with their columns lined up.
func (t *tidier) lines(layouts []layout, table bool) {
	var widths []int
	for i := range layouts {
		for j := range layouts[i].rows {
			for k, c := range layouts[i].rows[j].cells {
				if k == len(widths) {
					widths = append(widths, 0)
				}
				if w := utf8.RuneCountInString(c); w > widths[k] && w <= widest(k, table) {
					widths[k] = w
				}
			}
		}
	}
	texts := make([][]string, len(layouts))
	noteAt, deepNoteAt := 0, 0
	for i := range layouts {
		texts[i] = make([]string, len(layouts[i].rows))
		for j := range layouts[i].rows {
			r := &layouts[i].rows[j]
			text := r.text(widths, table)
			texts[i][j] = text
			if r.note == "" || text == "" {
				continue
			}
			if w := utf8.RuneCountInString(text); w <= widestHead {
				if r.deep {
					deepNoteAt = max(deepNoteAt, w+2)
				} else {
					noteAt = max(noteAt, w+2)
				}
			}
		}
	}
	for i := range layouts {
		mark := len(t.out)
		for j := range layouts[i].rows {
			r := &layouts[i].rows[j]
			text := texts[i][j]
			width := utf8.RuneCountInString(text)
			if r.note != "" {
				switch {
				case text == "":
					text, width = indentation, len(indentation)
				case r.deep:
					text = pad(text, max(width+2, deepNoteAt))
				default:
					text = pad(text, max(width+2, noteAt))
				}
				text += "# " + r.note
			}
			if len(text) > MostLine && utf8.RuneCountInString(text) > MostLine {
				t.out = t.out[:mark]
				t.written(layouts[i].source)
				break
			}
			t.out = append(t.out, text...)
			t.out = append(t.out, '\n')
		}
	}
}

func widest(column int, table bool) int {
	switch {
	case table:
		return widestCell
	case column <= 1:
		return widestName
	}
	return widestUnit
}

// text prints a line without its note.
func (r *row) text(widths []int, table bool) string {
	if r.gap || len(r.cells) == 0 && r.tail == "" {
		return ""
	}
	var out []byte
	if r.deep {
		out = append(out, indentation...)
	}
	for k, c := range r.cells {
		room := widths[k] - utf8.RuneCountInString(c)
		if table {
			if k > 0 {
				out = append(out, " | "...)
			}
			number := isNumber(c)
			if number {
				out = blanks(out, room)
			}
			out = append(out, c...)
			if !number {
				out = blanks(out, room)
			}
			continue
		}
		if widths[k] == 0 && c == "" {
			continue // no statement of the block has this part
		}
		if k > 0 {
			out = append(out, ' ')
		}
		out = append(out, c...)
		out = blanks(out, room)
	}
	if r.tail != "" {
		if len(r.cells) > 0 {
			out = append(out, ' ')
		}
		out = append(out, r.tail...)
	}
	return strings.TrimRight(string(out), " ")
}

func blanks(out []byte, n int) []byte {
	for ; n > 0; n-- {
		out = append(out, ' ')
	}
	return out
}

// pad lengthens a text with blanks to a width in characters.
func pad(text string, width int) string {
	return text + strings.Repeat(" ", max(0, width-utf8.RuneCountInString(text)))
}
