package main

import (
	"bytes"
	"context"
	"fmt"
	"math"
	"strconv"
	"strings"

	"github.com/spf13/cobra"

	"plumbrule/engine"
	"plumbrule/engine/law"
	"plumbrule/engine/rows"
)

func (a *app) explainCommand() *cobra.Command {
	const form = "explain SHEET ENTRY [name=value ...]"
	var digits int
	c := &cobra.Command{
		Use:   form,
		Short: "tell how a number of a sheet came about",
		Long: `Prints a tree of how an entry's number came about: each formula with its value,
unit and state, down to the knowns and constants, and the laws that are called
with their ranges and sources. What occurs again is told once.`,
		Args: atLeast(2, -1, form),
		RunE: func(c *cobra.Command, arguments []string) error {
			if digits < 1 || digits > 17 {
				return usage("--digits "+strconv.Itoa(digits)+" is not from 1 to 17", "write --digits 7")
			}
			return a.explain(c.Context(), arguments[0], arguments[1], arguments[2:], digits)
		},
	}
	c.Flags().IntVar(&digits, "digits", defaultDigits, "significant digits, `N` from 1 to 17")
	return c
}

func (a *app) explain(ctx context.Context, file, entry string, assignments []string, digits int) error {
	o, err := a.open(ctx, file, a.native(0), assignments)
	if err != nil {
		return err
	}
	defer o.program.Close()
	program, ok := o.program.(*engine.Program)
	if !ok {
		return unreadable("only a sheet that runs in this process is explained")
	}
	e, err := program.Explain(o.input, entry)
	if err != nil {
		message, hint, _ := strings.Cut(err.Error(), "; ")
		return usage(o.file+": "+message, hint)
	}
	if err := putValues(ctx, o, e); err != nil {
		return err
	}
	var text bytes.Buffer
	if a.json {
		a.writeJSON(&text, explained(e))
	} else {
		t := &tree{w: &text, digits: digits, columns: a.width(), told: map[string]bool{}}
		t.write(e, "", "")
	}
	if _, err := a.stdout.Write(text.Bytes()); err != nil {
		return unreadable("cannot write standard output: " + err.Error())
	}
	if !e.State.Computed() {
		return verdict(statusMissed)
	}
	return nil
}

// tree prints an explanation, each part indented below what it is part of.
type tree struct {
	w       *bytes.Buffer
	digits  int
	columns int
	told    map[string]bool // laws whose particulars stand above already
}

// write prints a part. first stands before its first line, rest before all
// that belongs below it.
func (t *tree) write(e *engine.Explanation, first, rest string) {
	line := e.Name
	call := strings.HasPrefix(e.Formula, e.Name+"(")
	if call {
		line = flat(e.Formula)
	}
	if value := t.value(e); value != "" {
		line += " = " + value
	}
	if e.State != rows.Sound {
		line += "  (" + e.State.String() + ")"
	}
	fmt.Fprintln(t.w, first+printable(line))
	below := rest
	if len(e.Parts) > 0 {
		below += "│ "
	} else {
		below += "  "
	}
	if e.Formula != "" && !call {
		t.text("= "+e.Formula, below, "  ")
	}
	if e.Reason != "" {
		t.text(e.Reason, below, "  ")
	}
	if e.Note != "" {
		t.text("# "+e.Note, below, "# ")
	}
	if e.Law != nil {
		t.law(e.Law, below)
	}
	for i, part := range e.Parts {
		if i == len(e.Parts)-1 {
			t.write(part, rest+"└ ", rest+"  ")
		} else {
			t.write(part, rest+"├ ", rest+"│ ")
		}
	}
}

// text prints running text below a part; its further lines begin with indent.
func (t *tree) text(text, below, indent string) {
	t.w.WriteString(wrapped(text, below, below+indent, t.columns))
}

// law prints a law's equation, ranges and source, the first time it occurs.
func (t *tree) law(l *law.Law, below string) {
	if t.told[l.Name] {
		fmt.Fprintln(t.w, below+"law: "+l.Name+", told above")
		return
	}
	t.told[l.Name] = true
	t.text("law: "+l.Gives, below, "  ")
	for i := range l.Parameters {
		p := &l.Parameters[i]
		if valid := p.Valid.Text(p.Unit); valid != "" {
			fmt.Fprintln(t.w, below+"valid for: "+p.Name+" "+valid)
		}
		if finite := p.Finite.Text(p.Unit); finite != "" && p.Finite != p.Valid {
			fmt.Fprintln(t.w, below+"computed for: "+p.Name+" "+finite)
		}
	}
	t.text("source: "+l.Source, below, "  ")
}

// value is a part's value with its unit, or "" where it has none.
func (t *tree) value(e *engine.Explanation) string {
	switch {
	case e.Choice != "":
		return `"` + e.Choice + `"`
	case !e.HasValue:
		return ""
	case e.Form == rows.Truth:
		return truthText(e.Value)
	}
	text := readable(e.Scale.FromSI(e.Value), t.digits)
	if unit := shownUnit(e.Unit); unit != "" {
		text += " " + unit
	}
	return text
}

// flat puts a formula of several lines on one.
func flat(formula string) string { return strings.Join(strings.Fields(formula), " ") }

// explanationDocument is an explanation in JSON.
type explanationDocument struct {
	Name    string                `json:"name"`
	Formula string                `json:"formula,omitempty"`
	Value   any                   `json:"value"` // in unit; a text or a truth value for those
	Unit    string                `json:"unit,omitempty"`
	SI      jsonNumber            `json:"si"`
	State   string                `json:"state"`
	Reason  string                `json:"reason,omitempty"`
	Note    string                `json:"note,omitempty"`
	Law     *lawDocument          `json:"law,omitempty"`
	Parts   []explanationDocument `json:"parts,omitempty"`
}

func explained(e *engine.Explanation) explanationDocument {
	doc := explanationDocument{Name: e.Name, Formula: e.Formula, Unit: e.Unit, SI: jsonNumber(math.NaN()), State: e.State.String(), Reason: e.Reason, Note: e.Note}
	if e.HasValue {
		doc.SI, doc.Value = jsonNumber(e.Value), jsonNumber(e.Scale.FromSI(e.Value))
	}
	switch {
	case e.Choice != "":
		doc.Value = e.Choice
	case e.Form == rows.Truth && e.HasValue:
		doc.Value = e.Value != 0
	}
	if e.Law != nil {
		document := documentOf(e.Law)
		doc.Law = &document
	}
	for _, part := range e.Parts {
		doc.Parts = append(doc.Parts, explained(part))
	}
	return doc
}
