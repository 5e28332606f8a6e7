package main

import (
	"fmt"
	"sort"
	"strings"

	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/functions"
)

// line is a formula that stands alone on one line.
type line struct{}

// SpanOf gives the place of a stretch of plain text.
func (line) SpanOf(offset, length int) problem.Span {
	return problem.Span{Line: 1, Column: offset + 1, Length: length}
}

// literal is a number of a formula, with its unit.
type literal struct {
	from, to int
	value    string
	unit     string
}

// columnSheet derives every row from its formula with the numbers turned into
// knowns, so that a run computes it in columns instead of folding it away.
func columnSheet(table []*row) string {
	var b strings.Builder
	for i, r := range table {
		text := r.formula
		literals := literalsOf(text)
		sort.Slice(literals, func(a, b int) bool { return literals[a].from > literals[b].from })
		for k, l := range literals {
			name := fmt.Sprintf("number_%d_%d", i, k)
			fmt.Fprintf(&b, "known %s [%s] = %s\n", name, l.unit, l.value)
			text = text[:l.from] + name + text[l.to:]
		}
		fmt.Fprintf(&b, "derive row_%d [%s] = %s\n", i, r.unit, text)
	}
	return b.String()
}

// literalsOf finds the numbers of a formula that may vary: not exponents,
// not the items of lists, and not what a list's length hangs on.
func literalsOf(text string) []literal {
	var problems problem.List
	e := formula.Parse(text, line{}, &problems)
	if e == nil {
		return nil
	}
	var found []literal
	var visit func(e *formula.Expression)
	visit = func(e *formula.Expression) {
		switch {
		case e.Form == formula.List:
			return
		case e.Form == formula.Number:
			found = append(found, place(text, e, "1"))
			return
		case e.Form == formula.WithUnit && e.Parts[0].Form == formula.Number:
			found = append(found, place(text, e, e.Unit.Text()))
			return
		case e.Form == formula.Unary && e.Word == "-" && e.Parts[0].Form == formula.WithUnit && e.Parts[0].Parts[0].Form == formula.Number:
			// A sign on a temperature scale belongs to the number.
			l := place(text, e.Parts[0], e.Parts[0].Unit.Text())
			l.from, l.value = e.Span.Column-1, "-"+l.value
			found = append(found, l)
			return
		case e.Form == formula.Binary && e.Word == "^":
			visit(e.Parts[0])
			return
		}
		for _, part := range e.Parts {
			visit(part)
		}
		if l := functions.All().Law(e.Word); e.Form == formula.Call && l != nil && l.Result.Type == law.List {
			return // its options tell how many items there are
		}
		for _, option := range e.Options {
			visit(option.Value)
		}
	}
	visit(e)
	return found
}

func place(text string, e *formula.Expression, unit string) literal {
	from, to := e.Span.Column-1, e.Span.Column-1+e.Span.Length
	value, _, _ := strings.Cut(text[from:to], "[")
	return literal{from: from, to: to, value: strings.TrimSpace(value), unit: unit}
}
