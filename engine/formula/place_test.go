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
		p := newPlaces(source.Value, source)
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
	p := newPlaces("nature.g_n", fixedPlace{at})
	if got := p.SpanOf(2, 3); got != at {
		t.Error(got)
	}
}
