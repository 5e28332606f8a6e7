package sheet

import (
	"strings"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// Text is a piece of the sheet's text with its place. The Span is that of the
// piece on its first line. The zero Text stands for a piece that is not there.
type Text struct {
	problem.Span
	// Value is the text as written. Where it runs on over indented lines the
	// pieces, without indentation and notes, are joined by "\n".
	Value string
	// Lines tells the place of each line's piece. It may be empty where the
	// text stands on one line; SpanOf serves in every case.
	Lines []problem.Span
}

// Present says whether the piece stands in the sheet.
func (t Text) Present() bool { return t.Line > 0 }

// SpanOf gives the place in the sheet of a stretch of Value, offset and length
// counted in bytes. A stretch over several lines is cut at the end of its
// first line; offsets outside of Value are moved to its ends. For a quoted
// text, whose Value is without the quotes, the place is that of the whole.
func (t Text) SpanOf(offset, length int) problem.Span {
	if offset < 0 {
		length += offset
		offset = 0
	}
	if offset > len(t.Value) {
		offset = len(t.Value)
	}
	if length < 0 {
		length = 0
	}
	if length > len(t.Value)-offset {
		length = len(t.Value) - offset
	}
	line, start := t.Span, 0
	if len(t.Lines) > 1 {
		n := strings.Count(t.Value[:offset], "\n")
		if n >= len(t.Lines) {
			n = len(t.Lines) - 1
		}
		line = t.Lines[n]
		start = strings.LastIndexByte(t.Value[:offset], '\n') + 1
	} else if t.Length != utf8.RuneCountInString(t.Value) {
		return t.Span // Value is not as written: a quoted text
	}
	stretch := t.Value[offset : offset+length]
	if cut := strings.IndexByte(stretch, '\n'); cut >= 0 {
		stretch = stretch[:cut]
	}
	line.Column += utf8.RuneCountInString(t.Value[start:offset])
	line.Length = utf8.RuneCountInString(stretch)
	return line
}

// pieces gives the text of each line.
func (t Text) pieces() []string {
	if !t.Present() {
		return nil
	}
	return strings.Split(t.Value, "\n")
}

// lineOf gives the line in the sheet of the piece with index i, or the line
// of the first piece plus i where the places are not known.
func (t Text) lineOf(i int) int {
	if i < len(t.Lines) {
		return t.Lines[i].Line
	}
	return t.Line + i
}
