// Package problem is the one funnel for what is wrong with a sheet: where it
// stands, a stable code, what and why, and what to write instead. Every room
// that reads text reports through it, so that all problems of a sheet look
// alike and none is told by matching words.
package problem

import (
	"sort"
	"strconv"
)

// Span is a stretch of the sheet's text. Line and Column count from 1, Column
// and Length in characters (Unicode code points). The zero Span stands for the
// sheet as a whole.
type Span struct {
	Line   int `json:"line"`
	Column int `json:"column"`
	Length int `json:"length"`
}

// At gives the span itself: anything with a position can be reported at.
func (s Span) At() Span { return s }

// To gives the stretch from the start of s to the end of other, where both
// stand on one line; otherwise s.
func (s Span) To(other Span) Span {
	if s.Line != other.Line || other.Column+other.Length <= s.Column {
		return s
	}
	s.Length = other.Column + other.Length - s.Column
	return s
}

// Placed is anything with a position in the sheet.
type Placed interface{ At() Span }

// Problem is one thing that is wrong with a sheet.
type Problem struct {
	Span
	Code       Code   `json:"code"`
	Message    string `json:"message"`    // what is wrong and why, one sentence without a full stop
	Suggestion string `json:"suggestion"` // what to write instead, or empty
}

// String gives the problem on one line: "line 3, column 7: message (suggestion) [code]".
func (p Problem) String() string {
	text := "line " + strconv.Itoa(p.Line) + ", column " + strconv.Itoa(p.Column) + ": " + p.Message
	if p.Suggestion != "" {
		text += "; " + p.Suggestion
	}
	return text + " [" + string(p.Code) + "]"
}

// List collects the problems of one sheet. The zero value is ready for use.
type List struct {
	found []Problem
}

// Add reports a problem at a place. The same problem is told once; those
// beyond MostProblems are not told.
func (l *List) Add(at Placed, code Code, message, suggestion string) {
	if l.Full() {
		return
	}
	p := Problem{Span: at.At(), Code: code, Message: message, Suggestion: suggestion}
	for _, known := range l.found {
		if known == p {
			return
		}
	}
	l.found = append(l.found, p)
}

// Full says whether the list takes no more, so that looking on is in vain.
func (l *List) Full() bool { return len(l.found) >= MostProblems }

// MostProblems bounds how many problems one sheet reports.
const MostProblems = 500

// Empty says whether nothing was reported.
func (l *List) Empty() bool { return len(l.found) == 0 }

// Sorted gives the problems in the order of their places.
func (l *List) Sorted() []Problem {
	sorted := append([]Problem(nil), l.found...)
	sort.SliceStable(sorted, func(i, j int) bool {
		a, b := sorted[i], sorted[j]
		if a.Line != b.Line {
			return a.Line < b.Line
		}
		return a.Column < b.Column
	})
	return sorted
}
