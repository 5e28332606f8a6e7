package engine

import (
	"strings"

	"plumbrule/engine/formula"
	"plumbrule/engine/plan"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/sheet"
	"plumbrule/engine/unit"
)

// compilation is a sheet on its way to a program.
type compilation struct {
	source
	problems    problem.List
	lines       []string
	symbols     map[string]*symbol
	declared    []*symbol // in the order of the sheet
	scope       *formula.Scope
	graph       *plan.Graph
	knowns      []plan.KnownSpec
	entries     []plan.EntrySpec
	description rows.Description
	results     []*symbol // entries and requirements in the order of the sheet
	noticed     map[string]bool
}

// symbol is a name of the sheet, with what is known of it so far.
type symbol struct {
	formula.Symbol
	name    sheet.Text
	derive  *sheet.Derive
	require *sheet.Require
	law     *sheet.Law
	parsed  *formula.Expression
	valid   *formula.Expression
	unit    unit.Unit // the unit it is shown in
	hasUnit bool
	reads   []reading // names of its formula
	needs   []*symbol // those with formulas that its formula reads
	users   []*symbol // those whose formulas read it
	waiting int       // how many of needs are not in order yet
	// neededBy is the latest one that listed it, so that each is listed once.
	neededBy *symbol
	ready    bool
	entry    int // index among the entries
}

// compile makes a program; the compilation, with its trees, serves what asks
// how a number came about.
func compile(from source) (*Program, *compilation, error) {
	c := &compilation{
		source: from, lines: strings.Split(strings.TrimPrefix(from.text, byteOrderMark), "\n"),
		symbols: map[string]*symbol{}, noticed: map[string]bool{}, graph: plan.NewGraph(),
	}
	read := sheet.Parse(from.text, &c.problems)
	c.scope = &formula.Scope{
		Catalogue: from.catalogue,
		Lookup: func(name string) (formula.Symbol, bool) {
			s, ok := c.symbols[name]
			if !ok {
				return formula.Symbol{}, false
			}
			return s.Symbol, true
		},
		Names:    c.allNames,
		Make:     c.graph.Make,
		Problems: &c.problems,
	}
	c.description.Title = read.Title.Value
	c.declareAll(read)
	for _, s := range c.ordered() {
		if c.problems.Full() {
			break
		}
		c.finish(s)
	}
	c.checkOthers(read)
	if !c.problems.Empty() {
		return nil, nil, &SheetError{Problems: c.problems.Sorted()}
	}
	c.listEntries()
	built := plan.Build(c.graph, c.knowns, c.entries, c.textAt)
	c.description.Cost = built.Cost()
	return &Program{plan: built, description: c.description, source: from}, c, nil
}

// byteOrderMark may stand before a sheet's first character.
const byteOrderMark = "\uFEFF"

// textAt gives the user's text of a place, shortened to one readable line.
func (c *compilation) textAt(at problem.Span) string {
	if at.Line < 1 || at.Line > len(c.lines) {
		return ""
	}
	const most = 60
	line, length, more := c.lines[at.Line-1], at.Length, ""
	if length > most {
		length, more = most, "..."
	}
	from, to, character := -1, -1, 1
	for offset := range line {
		if character == at.Column {
			from = offset
		}
		if character == at.Column+length {
			to = offset
			break
		}
		character++
	}
	if to < 0 && character == at.Column+length {
		to = len(line)
	}
	if from < 0 || to <= from {
		return ""
	}
	return line[from:to] + more
}

// allNames lists the sheet's names.
func (c *compilation) allNames() []string {
	names := make([]string, len(c.declared))
	for i, s := range c.declared {
		names[i] = s.name.Value
	}
	return names
}

// declare gives a name to the sheet; it reports one that is taken.
func (c *compilation) declare(name sheet.Text, s *symbol) bool {
	if !name.Present() {
		return false
	}
	s.name = name
	if earlier, taken := c.symbols[name.Value]; taken {
		c.problems.Add(name, problem.Duplicate, "'"+name.Value+"' is already given in line "+itoa(earlier.name.Line), "choose another name")
		return false
	}
	if c.catalogue.Law(name.Value) != nil || formula.IsStandard(name.Value) {
		c.problems.Add(name, problem.Name, "'"+name.Value+"' is the name of a law", "choose another name")
	}
	c.symbols[name.Value] = s
	c.declared = append(c.declared, s)
	return true
}

// unitOf reads a statement's unit; a missing one gives the pure number.
func (c *compilation) unitOf(text sheet.Text) (u unit.Unit, ok bool) {
	if !text.Present() {
		return unit.One(), true
	}
	u, failed := formula.ReadUnit(text.Value, text.SpanOf, &c.problems)
	return u, !failed
}

func (c *compilation) declareAll(read *sheet.Sheet) {
	for _, statement := range read.Statements {
		if c.problems.Full() {
			return
		}
		switch s := statement.(type) {
		case *sheet.Known:
			c.declareKnown(s)
		case *sheet.Seek:
			c.declareSought(s)
		case *sheet.Table:
			c.declareTable(s)
		case *sheet.Derive:
			d := &symbol{derive: s}
			d.parsed = c.parse(s.Formula)
			d.reads = readBy(nil, d.parsed)
			d.unit, d.hasUnit = unit.One(), s.Unit.Present()
			d.Broken = d.parsed == nil
			if u, ok := c.unitOf(s.Unit); ok {
				d.unit = u
			} else {
				d.Broken = true
			}
			if c.declare(s.Name, d) {
				c.results = append(c.results, d)
			}
		case *sheet.Require:
			r := &symbol{require: s}
			r.parsed = c.parse(s.Condition)
			r.reads = readBy(nil, r.parsed)
			r.Broken = r.parsed == nil
			if c.declare(s.Name, r) {
				c.results = append(c.results, r)
			}
		case *sheet.Law:
			c.declareLaw(s)
		}
	}
}

func (c *compilation) parse(text sheet.Text) *formula.Expression {
	if !text.Present() {
		return nil
	}
	return formula.Parse(text.Value, text, &c.problems)
}

func (c *compilation) declareKnown(s *sheet.Known) {
	u, ok := c.unitOf(s.Unit)
	k := &symbol{unit: u, hasUnit: true}
	k.Broken = !ok || s.Faulty()
	known := rows.Known{Name: s.Name.Value, Form: rows.Number, Unit: u.Text(), Scale: scale(u), Note: s.Note(), Line: s.Line}
	spec := plan.KnownSpec{Name: s.Name.Value, Unit: u, HasValue: s.HasValue}
	t := formula.Type{Shape: formula.NumberShape, Dimension: u.Dimension(), Kind: u.Kind()}
	switch {
	case len(s.Choices) > 0:
		known.Form = rows.Choice
		for _, choice := range s.Choices {
			known.Choices = append(known.Choices, choice.Value)
		}
		for _, more := range c.choices[s.Name.Value] {
			known.Choices = appendNew(known.Choices, more)
		}
		k.Choices, spec.Choices = known.Choices, len(known.Choices)
		t = formula.Type{Shape: formula.TextShape}
	case s.Truth != nil:
		known.Form, spec.Truth = rows.Truth, true
		if *s.Truth {
			spec.Value = 1
		}
		t = formula.Type{Shape: formula.TruthShape}
	case s.HasValue:
		spec.Value = u.ToSI(s.Number)
		if spec.Value-spec.Value != 0 {
			c.problems.Add(s.NumberText, problem.Number, "in coherent SI units this value is larger than any number of 64 bits", "write a smaller magnitude")
			k.Broken = true
		}
	}
	if s.Within != nil {
		spec.HasRange, spec.Low, spec.High = true, u.ToSI(s.Within.Low), u.ToSI(s.Within.High)
		switch {
		case s.Within.Low > s.Within.High:
			c.problems.Add(s.Within.LowText, problem.RangeOrder, "the lower bound lies above the upper one", "write within "+s.Within.HighText.Value+" to "+s.Within.LowText.Value)
		case s.HasValue && known.Form == rows.Number && (s.Number < s.Within.Low || s.Number > s.Within.High):
			c.problems.Add(s.NumberText, problem.RangeOrder, "the value lies outside of its own bounds", "widen the bounds, or give another value")
		}
	}
	known.Value, known.HasValue = spec.Value, spec.HasValue
	known.HasRange, known.Low, known.High = spec.HasRange, spec.Low, spec.High
	if !c.declare(s.Name, k) {
		return
	}
	if s.Uncertainty != nil {
		c.notice(s.Uncertainty.NumberText, "uncertainties are read but not propagated yet")
	}
	c.addKnown(k, known, spec, t)
}

func appendNew(list []string, more string) []string {
	for _, known := range list {
		if known == more {
			return list
		}
	}
	return append(list, more)
}

func (c *compilation) addKnown(k *symbol, known rows.Known, spec plan.KnownSpec, t formula.Type) {
	k.ready = true
	if k.Broken {
		return
	}
	k.Node = c.graph.Make(formula.Node{Op: formula.KnownOp, Index: len(c.knowns), Text: known.Name, Type: t})
	c.knowns = append(c.knowns, spec)
	c.description.Knowns = append(c.description.Knowns, known)
}

// declareSought makes the unknown of a seek statement a known without a value:
// what needs it waits.
func (c *compilation) declareSought(s *sheet.Seek) {
	u, ok := c.unitOf(s.Unit)
	k := &symbol{unit: u, hasUnit: true}
	k.Broken = !ok
	if !c.declare(s.Name, k) {
		return
	}
	c.notice(s, "seek is not evaluated yet: "+s.Name.Value+" has no value")
	known := rows.Known{Name: s.Name.Value, Form: rows.Number, Unit: u.Text(), Scale: scale(u), Note: s.Note(), Line: s.Line}
	c.addKnown(k, known, plan.KnownSpec{Name: s.Name.Value, Unit: u}, formula.Type{Shape: formula.NumberShape, Dimension: u.Dimension(), Kind: u.Kind()})
}

func (c *compilation) declareTable(s *sheet.Table) {
	t := &formula.Table{}
	k := &symbol{ready: true}
	k.Table = t
	seen := map[string]bool{}
	for i, column := range s.Columns {
		u, ok := c.unitOf(column.Unit)
		k.Broken = k.Broken || !ok
		if seen[column.Name.Value] {
			c.problems.Add(column.Name, problem.Duplicate, "the table has two columns '"+column.Name.Value+"'", "choose another name")
		}
		seen[column.Name.Value] = true
		numbers := make([]float64, 0, len(s.Rows))
		for _, row := range s.Rows {
			if i < len(row) {
				numbers = append(numbers, u.ToSI(row[i]))
			}
		}
		t.Columns = append(t.Columns, formula.TableColumn{Name: column.Name.Value, Unit: u, Numbers: numbers})
	}
	k.Broken = k.Broken || s.Faulty()
	c.declare(s.Name, k)
}

func (c *compilation) declareLaw(s *sheet.Law) {
	l := &formula.UserLaw{Name: s.Name.Value, ValidText: s.Valid.Value, Span: s.Name.Span, HasUnit: s.Unit.Present()}
	k := &symbol{law: s}
	var ok bool
	l.Unit, ok = c.unitOf(s.Unit)
	k.Broken = !ok || s.Faulty()
	seen := map[string]bool{}
	for _, p := range s.Parameters {
		u, ok := c.unitOf(p.Unit)
		k.Broken = k.Broken || !ok
		if seen[p.Name.Value] {
			c.problems.Add(p.Name, problem.Duplicate, "the law has two parameters '"+p.Name.Value+"'", "choose another name")
		}
		seen[p.Name.Value] = true
		l.Parameters = append(l.Parameters, formula.UserParameter{Name: p.Name.Value, Unit: u})
	}
	l.Body = c.parse(s.Formula)
	k.Broken = k.Broken || l.Body == nil
	if s.Valid.Present() {
		l.Valid = c.parse(s.Valid)
		k.Broken = k.Broken || l.Valid == nil
	}
	k.parsed, k.valid = l.Body, l.Valid
	k.reads = readBy(readBy(nil, l.Body), l.Valid)
	k.Law = l
	c.declare(s.Name, k)
}

// notice tells once of what is read but not evaluated yet.
func (c *compilation) notice(at problem.Placed, message string) {
	if c.noticed[message] || len(c.noticed) == problem.MostProblems {
		return
	}
	c.noticed[message] = true
	c.description.Notices = append(c.description.Notices, problem.Problem{Span: at.At(), Code: problem.NotYet, Message: message})
}
