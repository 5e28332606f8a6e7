package main

import (
	"bytes"
	"fmt"
	"strings"

	"github.com/spf13/cobra"

	"plumbrule/engine/formula"
	"plumbrule/engine/law"
)

func (a *app) lawsCommand() *cobra.Command {
	const form = "laws [WORD]"
	return &cobra.Command{
		Use:   form,
		Short: "list the laws, or show one in full",
		Long: `Lists the laws, mathematical functions and constants that sheets may use, one in
a line, by group. With a WORD only those that have it in their name, in what
they give or as their group. With the name of a law, that law in full: its
parameters with units and ranges, equation, source, caution and examples. Outside
of what it is valid for, a law's result is stretched; outside of what it is
computed for, refused.`,
		Args: atLeast(0, 1, form),
		RunE: func(_ *cobra.Command, arguments []string) error {
			var text bytes.Buffer
			var err error
			word := strings.Join(arguments, "")
			if l := a.catalogue.Law(word); l != nil {
				err = a.showLaw(&text, l)
			} else {
				err = a.listLaws(&text, word)
			}
			if err != nil {
				return err
			}
			if _, err := a.stdout.Write(text.Bytes()); err != nil {
				return unreadable("cannot write standard output: " + err.Error())
			}
			return nil
		},
	}
}

// The groups that are no rooms of laws.
const (
	functionsGroup = "mathematics"
	constantsGroup = "constants"
)

// listing is one line of the list.
type listing struct {
	Group string `json:"group"`
	Name  string `json:"name"`
	Call  string `json:"call"`
	Gives string `json:"gives"`
}

// listings gives all that formulas can call or name.
func (a *app) listings() []listing {
	var all []listing
	for _, l := range a.catalogue.Laws() {
		all = append(all, listing{l.Group, l.Name, formula.Signature(l), l.Gives})
	}
	for _, f := range formula.Standard() {
		call, gives, _ := strings.Cut(f.Help, ": ")
		all = append(all, listing{functionsGroup, f.Name, call, gives})
	}
	for _, c := range a.catalogue.Constants() {
		all = append(all, listing{constantsGroup, "nature." + c.Name, "nature." + c.Name, c.Meaning + ", " + withUnit(shortest(c.Value), c.Unit)})
	}
	return all
}

func withUnit(number, unit string) string {
	if unit = shownUnit(unit); unit != "" {
		return number + " " + unit
	}
	return number
}

func (a *app) listLaws(w *bytes.Buffer, word string) error {
	found := []listing{}
	constants := 0
	for _, l := range a.listings() {
		if word == "" && l.Group == constantsGroup && !a.json {
			constants++ // too many to be listed unasked
			continue
		}
		if word == "" || hasWord(word, l.Name, l.Gives) || strings.EqualFold(word, l.Group) {
			found = append(found, l)
		}
	}
	if len(found) == 0 {
		near := a.catalogue.NearestLaw(word)
		hint := "plumbrule laws lists them all"
		if near != "" {
			hint = "did you mean " + near + "?"
		}
		return usage("no law, function or constant has '"+clip(word)+"' in its name or description", hint)
	}
	if a.json {
		a.writeJSON(w, found)
		return nil
	}
	table := newGrid("group", "name", "gives")
	group := ""
	for _, l := range found {
		if l.Group != group {
			table.group()
			table.row(l.Group, l.Name, l.Gives)
			group = l.Group
			continue
		}
		table.row("", l.Name, l.Gives)
	}
	if err := table.write(w); err != nil {
		return err
	}
	if constants > 0 {
		fmt.Fprintf(w, "\n%d constants of nature: plumbrule laws %s\n", constants, constantsGroup)
	}
	return nil
}

// hasWord looks for a word in texts, in any letter case.
func hasWord(word string, texts ...string) bool {
	word = strings.ToLower(word)
	for _, text := range texts {
		if strings.Contains(strings.ToLower(text), word) {
			return true
		}
	}
	return false
}

type parameterDocument struct {
	Name    string   `json:"name"`
	Meaning string   `json:"meaning"`
	Takes   string   `json:"takes"`
	Unit    string   `json:"unit,omitempty"`
	Also    []string `json:"also,omitempty"` // units of other dimensions that are converted
	Valid   string   `json:"valid,omitempty"`
	Finite  string   `json:"finite,omitempty"`
	Default string   `json:"default,omitempty"`
	Choices []string `json:"choices,omitempty"`
}

type exampleDocument struct {
	Formula string `json:"formula"`
	Gives   string `json:"gives"`
}

type lawDocument struct {
	Name       string              `json:"name"`
	Group      string              `json:"group"`
	Signature  string              `json:"signature"`
	Gives      string              `json:"gives"`
	Result     string              `json:"result"`
	Parameters []parameterDocument `json:"parameters"`
	Equation   string              `json:"equation"`
	Source     string              `json:"source"`
	Caution    string              `json:"caution,omitempty"`
	Refusal    string              `json:"refusal,omitempty"`
	Examples   []exampleDocument   `json:"examples"`
}

// documentOf tells all of a law.
func documentOf(l *law.Law) lawDocument {
	doc := lawDocument{Name: l.Name, Group: l.Group, Signature: formula.Signature(l), Gives: l.Gives, Result: lawResult(l),
		Equation: l.Equation, Source: l.Source, Caution: l.Caution, Refusal: l.Refusal, Parameters: []parameterDocument{}, Examples: []exampleDocument{}}
	for i := range l.Parameters {
		p := &l.Parameters[i]
		d := parameterDocument{Name: p.Name, Meaning: p.Meaning, Takes: takes(p), Unit: p.Unit, Valid: p.Valid.Text(p.Unit), Finite: p.Finite.Text(p.Unit), Default: p.Default, Choices: p.Choices}
		for _, other := range p.Accepts {
			d.Also = append(d.Also, other.Unit)
		}
		doc.Parameters = append(doc.Parameters, d)
	}
	for _, e := range l.Examples {
		doc.Examples = append(doc.Examples, exampleDocument(e))
	}
	return doc
}

func takes(p *law.Parameter) string {
	switch p.Type {
	case law.List:
		return "list"
	case law.Text:
		return "text"
	case law.Made:
		return p.Made
	}
	return "number"
}

func lawResult(l *law.Law) string {
	switch {
	case l.Result.Type == law.Made:
		return "a " + l.Result.Made
	case l.Result.Type == law.List && shownUnit(l.Result.Unit) == "":
		return "a list of pure numbers"
	case l.Result.Type == law.List:
		return "a list in " + l.Result.Unit
	case l.Result.SameAs != "":
		return "in the unit of " + l.Result.SameAs
	case shownUnit(l.Result.Unit) == "":
		return "a pure number"
	}
	return "in " + l.Result.Unit
}

func (a *app) showLaw(w *bytes.Buffer, l *law.Law) error {
	doc := documentOf(l)
	if a.json {
		a.writeJSON(w, doc)
		return nil
	}
	fmt.Fprintln(w, doc.Signature)
	fmt.Fprintln(w, "    "+doc.Gives+", "+doc.Result)
	if len(doc.Parameters) > 0 {
		fmt.Fprintln(w)
		table := newGrid("parameter", "takes", "unit", "valid for", "computed for", "default", "meaning")
		for _, p := range doc.Parameters {
			unit := shownUnit(p.Unit)
			if len(p.Also) > 0 {
				unit += " (or " + strings.Join(p.Also, ", ") + ")"
			}
			meaning := p.Meaning
			if len(p.Choices) > 0 {
				meaning += ": " + strings.Join(p.Choices, ", ")
			}
			table.row(p.Name, p.Takes, unit, p.Valid, p.Finite, p.Default, meaning)
		}
		if err := table.write(w); err != nil {
			return err
		}
	}
	columns := a.width()
	section(w, "equation", doc.Equation, columns)
	section(w, "source", doc.Source, columns)
	section(w, "caution", doc.Caution, columns)
	section(w, "refused when", doc.Refusal, columns)
	for i, e := range doc.Examples {
		if i == 0 {
			fmt.Fprintln(w, "\nexamples")
		}
		fmt.Fprintln(w, "    "+e.Formula+" = "+e.Gives)
	}
	return nil
}

// section prints a text under its name; an empty one is left out.
func section(w *bytes.Buffer, name, text string, columns int) {
	if text == "" {
		return
	}
	fmt.Fprintln(w, "\n"+name)
	for _, line := range strings.Split(text, "\n") {
		w.WriteString(wrapped(line, "    ", "    ", columns))
	}
}
