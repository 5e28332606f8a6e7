package main

import (
	"strings"
	"unicode/utf8"

	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// source is a data column that gives a known.
type source struct {
	column int
	known  int
	name   string
	form   rows.Form
	scale  rows.Scale // from the column's unit
}

// layout says which column gives what, and what is written.
type layout struct {
	fields   []field
	sources  []source
	kept     []int    // the fields that are written
	sourceOf []int    // for each field the source that it is, or -1
	names    []string // of the entries, with their units
}

// layOut matches the data's columns with the sheet.
func (r *rowsRun) layOut(fields []field) (*layout, error) {
	d := r.opened.program.Describe()
	l := &layout{fields: fields}
	fed := map[int]string{}
	for i := range fields {
		f := &fields[i]
		l.sourceOf = append(l.sourceOf, -1)
		k := d.KnownIndex(f.name)
		if k < 0 {
			continue
		}
		place := r.place + ": column '" + clip(f.title) + "'"
		switch {
		case fed[k] != "":
			return nil, unreadable(place+" gives "+f.name+", which column '"+clip(fed[k])+"' gives already", "rename one of the two")
		case r.opened.given[k]:
			return nil, usage(f.name+" is given on the command line and by "+place, "leave one of the two out")
		}
		fed[k] = f.title
		s, err := sourceFor(f, &d.Knowns[k], place)
		if err != nil {
			return nil, err
		}
		s.column, s.known = i, k
		l.sourceOf[i] = len(l.sources)
		l.sources = append(l.sources, s)
	}
	for i := range d.Entries {
		e := &d.Entries[i]
		name := e.Name
		if e.Form == rows.Number {
			name += " [" + e.Unit + "]"
		}
		l.names = append(l.names, name)
	}
	r.keep(l)
	for _, i := range l.kept {
		if l.sourceOf[i] < 0 {
			r.remarkUnknown(fields[i].name, d)
		}
	}
	return l, nil
}

// sourceFor tells how a column gives a known.
func sourceFor(f *field, known *rows.Known, place string) (source, error) {
	s := source{name: f.name, form: known.Form, scale: known.Scale}
	suits := f.kind == anyField || f.kind == textField
	switch s.form {
	case rows.Number:
		suits = suits || f.kind == numberField || f.kind == wholeField
	case rows.Truth:
		suits = suits || f.kind == truthField || f.kind == wholeField
	}
	if !suits {
		return s, unreadable(place+" holds "+f.kind.String()+", and "+f.name+" is a "+formText(s.form), "rename it, or leave it out")
	}
	if !f.hasUnit {
		return s, nil
	}
	if s.form != rows.Number {
		return s, unreadable(place+": "+f.name+" has no unit", "write "+f.name)
	}
	own, err := unit.Parse(known.Unit)
	if err != nil {
		return s, err
	}
	u, hint, err := readUnit(f.unit)
	if err == nil {
		hint, err = fits(u, own)
	}
	if err != nil {
		return s, unreadable(place+": "+err.Error(), hint)
	}
	s.scale.Before, s.scale.Multiply, s.scale.Divide = u.Affine()
	return s, nil
}

func formText(form rows.Form) string {
	switch form {
	case rows.Truth:
		return "truth value"
	case rows.Choice:
		return "choice among texts"
	}
	return "number"
}

// keep chooses the data's columns that are written: all but those whose names
// the results need, as those of an earlier run.
func (r *rowsRun) keep(l *layout) {
	taken := map[string]bool{stateColumn: true, reasonColumn: true}
	for _, name := range l.names {
		taken[name] = true
	}
	var left []string
	for i := range l.fields {
		title := strings.TrimSpace(l.fields[i].title)
		if !taken[title] {
			l.kept = append(l.kept, i)
			continue
		}
		left = append(left, "'"+clip(title)+"'")
	}
	switch len(left) {
	case 0:
		return
	case 1:
		r.warn("column "+left[0]+" of "+r.data+" is left out: the run writes one of that name", "rename it to keep it")
	default:
		r.warn("columns "+shortList(left)+" of "+r.data+" are left out: the run writes some of these names", "rename them to keep them")
	}
	r.whole = true
}

// remarkUnknown names a column that passes through although it looks like a
// slip of the pen. Short names are alike by chance and are let pass.
func (r *rowsRun) remarkUnknown(name string, d *rows.Description) {
	const shortestAlike = 5
	var names []string
	hint := ""
	for i := range d.Knowns {
		names = append(names, d.Knowns[i].Name)
		if strings.EqualFold(name, d.Knowns[i].Name) {
			hint = "did you mean " + d.Knowns[i].Name + "?"
		}
	}
	if hint == "" && utf8.RuneCountInString(name) >= shortestAlike {
		hint = suggest(name, names)
	}
	if hint != "" {
		r.warn("column '"+clip(name)+"' of "+r.data+" is no known of "+r.sheet+" and passes through", hint)
	}
}

// The columns behind the entries.
const (
	stateColumn  = "state"
	reasonColumn = "reason"
)

// splitHeader takes "name [unit]" apart.
func splitHeader(title string) (name, unitText string, hasUnit bool) {
	title = strings.TrimSpace(title)
	if open := strings.IndexByte(title, '['); open >= 0 && strings.HasSuffix(title, "]") {
		return strings.TrimSpace(title[:open]), strings.TrimSpace(title[open+1 : len(title)-1]), true
	}
	return title, "", false
}
