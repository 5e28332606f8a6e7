package formula

import (
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// places tells where the parts of one formula stand, each in constant time, so
// that a long formula is placed in time proportional to its length. It is a
// Source itself.
type places struct {
	source Source
	length int            // bytes of the formula
	fixed  bool           // the source has one place for all parts
	lines  []problem.Span // the place of each line of the formula
	of     []mark         // by byte, and one behind the last; nil where every byte is a character of one line
}

// mark is what is known of one byte of a formula.
type mark struct {
	line      int32
	character int32 // characters of the line before it
}

// newPlaces reads a formula once.
func newPlaces(formula string, source Source) *places {
	p := &places{source: source, length: len(formula)}
	p.addLines(formula)
	if len(p.lines) == 1 && p.lines[0].Length == len(formula) {
		return p
	}
	p.of = make([]mark, len(formula)+1)
	var line, character int32
	for at := 0; at <= len(formula); at++ {
		p.of[at] = mark{line, character}
		switch {
		case at == len(formula):
		case formula[at] == '\n':
			line, character = line+1, 0
		case at+1 == len(formula) || utf8.RuneStart(formula[at+1]):
			character++
		}
	}
	return p
}

// addLines asks the source once for each line.
func (p *places) addLines(formula string) {
	for start := 0; ; {
		end := start
		for end < len(formula) && formula[end] != '\n' {
			end++
		}
		span := p.source.SpanOf(start, end-start)
		if span.Length != utf8.RuneCountInString(formula[start:end]) {
			p.fixed = true
			return
		}
		p.lines = append(p.lines, span)
		if end == len(formula) {
			return
		}
		start = end + 1
	}
}

// SpanOf gives the place of a stretch of the formula, cut at the end of its
// first line.
func (p *places) SpanOf(offset, length int) problem.Span {
	if p.fixed {
		return p.source.SpanOf(offset, length)
	}
	from := min(max(offset, 0), p.length)
	to := min(max(offset+length, from), p.length)
	if p.of == nil {
		span := p.lines[0]
		return problem.Span{Line: span.Line, Column: span.Column + from, Length: to - from}
	}
	first, last := &p.of[from], &p.of[to]
	span := p.lines[first.line]
	span.Column += int(first.character)
	if last.line == first.line {
		span.Length = int(last.character - first.character)
	} else {
		span.Length -= int(first.character)
	}
	return span
}
