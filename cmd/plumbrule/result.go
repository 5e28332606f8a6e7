package main

import (
	"encoding/csv"
	"io"
	"math"
	"strconv"

	"plumbrule/engine/rows"
)

// The verdicts on a requirement.
const (
	met    = "met"
	missed = "missed"
	waits  = "waiting"
)

// The states of a known in a result.
const (
	stated  = "known"   // the sheet's own value
	given   = "given"   // from the command line
	lacking = "missing" // no value
)

// resultDocument is one evaluated sheet, as printed in JSON.
type resultDocument struct {
	Title        string            `json:"title"`
	File         string            `json:"file"`
	Well         bool              `json:"well"` // every entry has a number and every requirement is met
	Knowns       []valueDocument   `json:"knowns"`
	Entries      []valueDocument   `json:"entries"`
	Requirements []requireDocument `json:"requirements"`
	Notices      []problemDocument `json:"notices"`
	Cautions     []rows.Caution    `json:"cautions"`
}

// valueDocument is a known or an entry. Value is in Unit, SI in the coherent
// SI unit; both are null where there is no number.
type valueDocument struct {
	Name   string     `json:"name"`
	Form   rows.Form  `json:"form"`
	Value  any        `json:"value"` // a number, a text or a truth value
	Unit   string     `json:"unit"`
	SI     jsonNumber `json:"si"`
	State  string     `json:"state"`
	Reason string     `json:"reason,omitempty"`
	Note   string     `json:"note,omitempty"`
	Line   int        `json:"line"`

	Text  string  `json:"-"` // the chosen text
	shown float64 // in Unit
}

// requireDocument is a requirement with its margin, null where it has none.
type requireDocument struct {
	Name    string     `json:"name"`
	Verdict string     `json:"verdict"`
	State   string     `json:"state"`
	Margin  jsonNumber `json:"margin"`
	Unit    string     `json:"unit,omitempty"`
	Reason  string     `json:"reason,omitempty"`
	Note    string     `json:"note,omitempty"`
	Line    int        `json:"line"`

	margin    float64
	hasMargin bool
}

// gather turns a run of one row into a document.
func gather(o *opened, out *rows.Outcome) *resultDocument {
	d := o.program.Describe()
	result := &resultDocument{
		Title: d.Title, File: o.file, Well: true,
		Knowns: []valueDocument{}, Entries: []valueDocument{}, Requirements: []requireDocument{},
		Notices: documents(d.Notices), Cautions: d.Cautions,
	}
	if result.Cautions == nil {
		result.Cautions = []rows.Caution{}
	}
	for k := range d.Knowns {
		result.Knowns = append(result.Knowns, gatherKnown(o, k))
	}
	for e := range d.Entries {
		entry := &d.Entries[e]
		state, value := out.State(e, 0), out.Values[e][0]
		if !state.Computed() {
			value = math.NaN()
			result.Well = false
		}
		reason := reasonText(o.program, out, e)
		switch entry.Role {
		case rows.Requirement:
			q := requireDocument{Name: entry.Name, Verdict: verdictOf(state, value), State: state.String(), Reason: reason, Note: entry.Note, Line: entry.Line, Margin: jsonNumber(math.NaN())}
			result.Well = result.Well && q.Verdict == met
			result.Requirements = append(result.Requirements, q)
		case rows.Margin:
			// A margin stands right behind its requirement.
			q := &result.Requirements[len(result.Requirements)-1]
			q.hasMargin, q.margin, q.Unit = true, entry.Scale.FromSI(value), entry.Unit
			q.Margin = jsonNumber(q.margin)
		default:
			v := valueDocument{Name: entry.Name, Form: entry.Form, Unit: entry.Unit, SI: jsonNumber(value), State: state.String(), Reason: reason, Note: entry.Note, Line: entry.Line}
			v.set(entry.Form, entry.Scale, value, nil)
			result.Entries = append(result.Entries, v)
		}
	}
	return result
}

// verdictOf gives a requirement's verdict.
func verdictOf(state rows.State, value float64) string {
	switch {
	case !state.Computed():
		return waits
	case value != 0:
		return met
	}
	return missed
}

func gatherKnown(o *opened, k int) valueDocument {
	known := &o.program.Describe().Knowns[k]
	value, has := o.valueOf(k)
	v := valueDocument{Name: known.Name, Form: known.Form, Unit: known.Unit, Note: known.Note, Line: known.Line, State: stated}
	switch {
	case !has:
		v.State, value = lacking, math.NaN()
	case known.HasRange && (value < known.Low || value > known.High):
		v.State = rows.Refused.String()
		v.Reason = "lies outside of " + readable(known.Scale.FromSI(known.Low), defaultDigits) + " to " + readable(known.Scale.FromSI(known.High), defaultDigits)
		if unit := shownUnit(known.Unit); unit != "" {
			v.Reason += " " + unit
		}
	case o.given[k]:
		v.State = given
	}
	v.SI = jsonNumber(value)
	v.set(known.Form, known.Scale, value, known.Choices)
	return v
}

// set fills in the value as it is shown.
func (v *valueDocument) set(form rows.Form, scale rows.Scale, value float64, choices []string) {
	v.shown = scale.FromSI(value)
	switch {
	case math.IsNaN(value):
		v.Value = nil
	case form == rows.Truth:
		v.Value, v.shown = value != 0, value
	case form == rows.Choice && int(value) < len(choices):
		v.Text = choices[int(value)]
		v.Value = v.Text
	default:
		v.Value = jsonNumber(v.shown)
	}
}

// writeResultCSV prints a result as CSV: one line a known, entry or
// requirement. A requirement's value is its margin.
func writeResultCSV(w io.Writer, result *resultDocument) error {
	c := csv.NewWriter(w)
	lines := [][]string{{"role", "name", "value", "unit", "state", "reason", "note"}}
	add := func(role string, v *valueDocument) {
		value := shortest(v.shown)
		switch {
		case v.Text != "":
			value = v.Text
		case v.Form == rows.Truth && v.Value != nil:
			value = truthText(v.shown)
		}
		lines = append(lines, []string{role, v.Name, value, csvUnit(v.Form, v.Unit), v.State, v.Reason, v.Note})
	}
	for i := range result.Knowns {
		add("known", &result.Knowns[i])
	}
	for i := range result.Entries {
		add(string(rows.Derived), &result.Entries[i])
	}
	for i := range result.Requirements {
		q := &result.Requirements[i]
		margin := ""
		if q.hasMargin {
			margin = shortest(q.margin)
		}
		lines = append(lines, []string{string(rows.Requirement), q.Name, margin, q.Unit, q.Verdict, q.Reason, q.Note})
	}
	if err := c.WriteAll(lines); err != nil {
		return unreadable("cannot write the result: " + err.Error())
	}
	return nil
}

func csvUnit(form rows.Form, unit string) string {
	if form != rows.Number {
		return ""
	}
	return unit
}

// counted gives a number of things in words: "1 row", "12 rows".
func counted(n int64, one, many string) string {
	if n == 1 {
		return "1 " + one
	}
	return strconv.FormatInt(n, 10) + " " + many
}
