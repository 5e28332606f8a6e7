package formula

import (
	"strings"
	"testing"

	"plumbrule/engine/problem"
	"plumbrule/engine/sheet"
)

// The places that are found in one pass are those that the sheet's text gives.
func TestPlaces(t *testing.T) {
	for _, text := range []string{
		"a + b * (c - 2)",
		"é² + Ω * \"text ) (\" [m]",
		"a +\n  2[J/(kg K)] *\n  (é +\n  b)",
		"x",
	} {
		var problems problem.List
		read := sheet.Parse("derive y = "+text+"\n", &problems)
		source := read.Statements[0].(*sheet.Derive).Formula
		p := newPlaces(source.Value, source, &lifted{})
		for from := 0; from <= len(source.Value); from++ {
			for length := 0; from+length <= len(source.Value); length++ {
				cut := source.Value[from : from+length]
				if strings.ToValidUTF8(cut, "") != cut || from < len(source.Value) && source.Value[from]&0xC0 == 0x80 {
					continue // inside of a character
				}
				if got, want := p.SpanOf(from, length), source.SpanOf(from, length); got != want {
					t.Fatalf("%q: %d to %d: %v, not %v", text, from, from+length, got, want)
				}
			}
		}
	}
}

// A source with one place for all, as that of a law's default, keeps it.
func TestFixedPlace(t *testing.T) {
	at := problem.Span{Line: 3, Column: 9, Length: 4}
	p := newPlaces("nature.g_n", fixedPlace{at}, &lifted{})
	if got := p.SpanOf(2, 3); got != at {
		t.Error(got)
	}
}

// Brackets in texts and in units are no brackets of the formula.
func TestPartners(t *testing.T) {
	const text = `f("a)", 2[J/(kg K)], (b))`
	var problems problem.List
	ready, ok := lift(text, fixedPlace{}, &problems)
	if !ok {
		t.Fatal(problems.Sorted())
	}
	p := newPlaces(text, fixedPlace{}, &ready)
	for _, test := range []struct{ from, want int }{
		{1, len(text)},
		{strings.Index(text, "[J"), strings.Index(text, "]") + 1},
		{strings.Index(text, "(b"), len(text) - 1},
	} {
		if got := p.closing(test.from); got != test.want {
			t.Errorf("%d closes at %d, not %d", test.from, got, test.want)
		}
	}
	if p.unclosed(0, len(text)) != 0 || p.unclosed(0, 3) != 1 || p.unclosed(len(text)-1, len(text)) != -1 {
		t.Error("parentheses are counted wrongly")
	}
}
