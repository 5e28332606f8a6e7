package formula

import (
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/engine/unit"
)

// Symbol is what a name of the sheet stands for. Exactly one of the pointers
// is set, or Broken where its own statement has a problem.
type Symbol struct {
	Node   *Node    // a known or an entry
	Table  *Table   // a table
	Law    *UserLaw // a law of the sheet's own
	Broken bool     // its own statement has a problem, which is reported there
	// Choices are a text known's choices; its Node gives their index.
	Choices []string
}

// Table is a sheet's table: columns of constant numbers in SI.
type Table struct {
	Columns []TableColumn
}

// TableColumn is one column of a table.
type TableColumn struct {
	Name    string
	Unit    unit.Unit
	Numbers []float64
}

// UserLaw is a law of the sheet's own: a formula with checked parameters.
type UserLaw struct {
	Name       string
	Parameters []UserParameter
	Unit       unit.Unit
	HasUnit    bool
	Body       *Expression
	Valid      *Expression // nil: no stated range
	ValidText  string
	Span       problem.Span
}

// UserParameter is a parameter of a sheet's own law.
type UserParameter struct {
	Name string
	Unit unit.Unit
}

// Scope is what formulas of one sheet may use.
type Scope struct {
	Catalogue *law.Catalogue
	Lookup    func(name string) (Symbol, bool)
	// Names lists all names of the sheet, for suggestions.
	Names    func() []string
	Make     Make
	Problems *problem.List
	// defaults holds the parsed default values of laws.
	defaults map[string]*Expression
	// made counts the parts that formulas came to, against MostNodes; expanded
	// those of expanded sheet laws, against MostExpansion.
	made, expanded int
	compared       int      // names compared for suggestions, against mostCompared
	calls          []string // what callable lists
	// Used lists the laws of the catalogue that formulas call, in the order of
	// their first call.
	Used  []*law.Law
	used  map[*law.Law]bool
	parts map[*law.Law]listParts
}

func (s *Scope) use(l *law.Law) {
	if s.used == nil {
		s.used = map[*law.Law]bool{}
	}
	if !s.used[l] {
		s.used[l] = true
		s.Used = append(s.Used, l)
	}
}

// Near gives the candidate that may have been meant by a word, or "". A sheet
// that is wrong in very many places gets no more suggestions after a while, so
// that they do not outweigh its reading.
func (s *Scope) Near(word string, candidates func() []string) string {
	if s.compared >= mostCompared {
		return ""
	}
	names := candidates()
	s.compared += len(names)
	return problem.Nearest(word, names)
}

// mostCompared bounds how many names a sheet's suggestions are looked up among.
const mostCompared = 500_000

// MostNodes bounds how many parts all formulas of a sheet may come to; each
// item of a list that a formula works on is one.
const MostNodes = 4_000_000

// MostExpansion bounds how many parts the sheet's own laws may expand to in all.
const MostExpansion = 1_000_000

// fixedPlace is a source whose every part stands at one place: a law's default.
type fixedPlace struct{ problem.Span }

func (f fixedPlace) SpanOf(int, int) problem.Span { return f.Span }

// defaultOf parses the default of a law's parameter.
func (s *Scope) defaultOf(text string, at problem.Span) *Expression {
	if s.defaults == nil {
		s.defaults = map[string]*Expression{}
	}
	if known, ok := s.defaults[text]; ok {
		return known
	}
	e := Parse(text, fixedPlace{at}, s.Problems)
	s.defaults[text] = e
	return e
}
