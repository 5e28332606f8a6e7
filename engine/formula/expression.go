package formula

import (
	"errors"

	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// Limits on one formula.
const (
	MostCharacters = 10_000 // of text
	MostParts      = 10_000 // expressions, as often as a walk over the tree meets them
)

// Form says which construct an Expression is.
type Form uint8

// The constructs of a formula.
const (
	Number   Form = iota // Value
	Text                 // Word
	Truth                // Value 0 or 1
	Name                 // Word
	Member               // Word.Field
	WithUnit             // Parts[0] [Unit]
	Unary                // Word Parts[0]
	Binary               // Parts[0] Word Parts[1]
	Choice               // Parts[0] ? Parts[1] : Parts[2]
	Call                 // Word(Parts..., Options...)
	List                 // [Parts...]
)

// Expression is a parsed formula or a part of one, with its place in the sheet.
type Expression struct {
	Form    Form
	Value   float64
	Word    string
	Field   string
	Unit    unit.Unit
	Parts   []*Expression
	Options []Option
	Span    problem.Span
	Node    *Node        // what checking made of it; nil where a problem stands
	whole   problem.Span // of a call, with its arguments
}

// Option is an argument that is passed by name.
type Option struct {
	Name  string
	Span  problem.Span
	Value *Expression
}

// Whole gives the place of a call with its arguments; Span is its name's.
func (e *Expression) Whole() problem.Span {
	if e.Form == Call {
		return e.whole
	}
	return e.Span
}

// At gives the expression's place.
func (e *Expression) At() problem.Span { return e.Span }

// Names calls visit for every name that the expression reads or calls, tables
// included ("nature" is not a name).
func (e *Expression) Names(visit func(name string, called bool)) {
	switch e.Form {
	case Name, Call:
		visit(e.Word, e.Form == Call)
	case Member:
		if e.Word != "nature" {
			visit(e.Word, false)
		}
	}
	for _, part := range e.Parts {
		part.Names(visit)
	}
	for _, option := range e.Options {
		option.Value.Names(visit)
	}
}

// ReadUnit reads unit text that stands in a sheet and reports what is wrong
// with it at its place.
func ReadUnit(text string, place func(offset, length int) problem.Span, problems *problem.List) (unit.Unit, bool) {
	u, err := unit.Parse(text)
	if err == nil {
		return u, false
	}
	var e *unit.Error
	if errors.As(err, &e) {
		suggestion := ""
		if e.Suggestion != "" {
			suggestion = "write " + e.Suggestion
		}
		problems.Add(place(e.Offset, max(e.Length, 1)), problem.UnknownUnit, e.Message, suggestion)
	} else {
		problems.Add(place(0, max(len(text), 1)), problem.UnknownUnit, err.Error(), "")
	}
	return unit.One(), true
}
