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
	of     []mark         // by byte, and one behind the last
}

// mark is what is known of one byte of a formula.
type mark struct {
	line      int32
	character int32 // characters of the line before it
	depth     int32 // parentheses opened and not closed before it
	partner   int32 // the byte behind the bracket that closes the one here, 0 for other bytes
}

// newPlaces reads a formula once. Brackets in texts and in units are no
// brackets of the formula.
func newPlaces(formula string, source Source, l *lifted) *places {
	p := &places{source: source, length: len(formula), of: make([]mark, len(formula)+1)}
	p.addLines(formula)
	var (
		line, character, depth int32
		open                   []int
		quote                  byte
		skip                   int // bytes of a unit bracket that are left
	)
	for at := 0; at <= len(formula); at++ {
		m := &p.of[at]
		m.line, m.character, m.depth = line, character, depth
		if at == len(formula) {
			break
		}
		b := formula[at]
		switch {
		case b == '\n':
			line, character = line+1, 0
			skip = max(0, skip-1)
			continue
		case skip > 0:
			skip--
		case quote != 0:
			if b == quote {
				quote = 0
			}
		case b == '"' || b == '\'':
			quote = b
		case b == '[' && l.isUnit(at):
			bracket := &l.units[l.atByte[at]]
			m.partner, skip = int32(at+bracket.length), bracket.length-1
		case b == '(' || b == '[':
			open = append(open, at)
			if b == '(' {
				depth++
			}
		case b == ')' || b == ']':
			if b == ')' {
				depth--
			}
			if len(open) > 0 {
				p.of[open[len(open)-1]].partner = int32(at + 1)
				open = open[:len(open)-1]
			}
		}
		if at+1 == len(formula) || utf8.RuneStart(formula[at+1]) {
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

// isUnit says whether a unit's bracket opens at a byte of the formula.
func (l *lifted) isUnit(at int) bool {
	_, unit := l.atByte[at]
	return unit
}

// SpanOf gives the place of a stretch of the formula, cut at the end of its
// first line.
func (p *places) SpanOf(offset, length int) problem.Span {
	if p.fixed {
		return p.source.SpanOf(offset, length)
	}
	from := min(max(offset, 0), p.length)
	to := min(max(offset+length, from), p.length)
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

// closing gives the byte behind the bracket that closes the one at from.
func (p *places) closing(from int) int {
	if from < p.length && p.of[from].partner > 0 {
		return int(p.of[from].partner)
	}
	return p.length
}

// unclosed counts the parentheses that a stretch opens and does not close; it
// is negative where it closes more.
func (p *places) unclosed(from, to int) int {
	return int(p.of[to].depth - p.of[from].depth)
}
