package main

import (
	"bytes"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"plumbrule/engine/unit"
)

func (a *app) unitsCommand() *cobra.Command {
	const form = "units [WORD]"
	return &cobra.Command{
		Use:   form,
		Short: "list the units, or tell what one is",
		Long: `Lists the units that sheets may use, by group. With a WORD only those that have
it in their symbol, name, group or other spellings. With the text of a unit,
also one with prefix or put together as in "kJ/(mol K)", tells its dimension,
its kind and what one of it is in SI.`,
		Args: atLeast(0, 1, form),
		RunE: func(_ *cobra.Command, arguments []string) error {
			var text bytes.Buffer
			if err := a.units(&text, strings.TrimSpace(strings.Join(arguments, ""))); err != nil {
				return err
			}
			if _, err := a.stdout.Write(text.Bytes()); err != nil {
				return unreadable("cannot write standard output: " + err.Error())
			}
			return nil
		},
	}
}

// unitDocument tells what a unit is.
type unitDocument struct {
	Unit      string      `json:"unit"`
	SI        string      `json:"si"`
	Zero      *jsonNumber `json:"zero,omitempty"` // the scale's zero in SI, where it is shifted
	One       jsonNumber  `json:"one"`            // the size of one of it in SI
	Dimension string      `json:"dimension"`
	Kind      string      `json:"kind,omitempty"`
}

type unitListing struct {
	Group    string `json:"group"`
	Symbol   string `json:"symbol"`
	Name     string `json:"name"`
	Meaning  string `json:"meaning"`
	Prefixes bool   `json:"prefixes"`
	Aliases  string `json:"aliases,omitempty"`
	Note     string `json:"note,omitempty"`
	Source   string `json:"source,omitempty"`
}

type unitsDocument struct {
	Unit  *unitDocument `json:"unit,omitempty"`
	Units []unitListing `json:"units"`
}

func (a *app) units(w *bytes.Buffer, word string) error {
	doc := unitsDocument{Units: []unitListing{}}
	var wrong string
	if word != "" {
		u, hint, err := readUnit(word)
		if err == nil {
			doc.Unit = describe(u)
		}
		wrong = hint
	}
	for _, e := range unit.All() {
		// A word that is a unit already asks for that one alone.
		asked := e.Symbol == word || slices.Contains(strings.Fields(e.Aliases), word)
		if word == "" || asked || doc.Unit == nil && hasWord(word, e.Symbol, e.Name, e.Group, e.Aliases) {
			doc.Units = append(doc.Units, unitListing{e.Group, e.Symbol, e.Name, e.Meaning, e.Prefixes, e.Aliases, e.Note, e.Source})
		}
	}
	if doc.Unit == nil && len(doc.Units) == 0 {
		return usage("'"+clip(word)+"' is no unit, and no unit has it in its name", wrong)
	}
	if a.json {
		a.writeJSON(w, doc)
		return nil
	}
	if doc.Unit != nil {
		writeUnit(w, doc.Unit)
		if len(doc.Units) > 0 {
			fmt.Fprintln(w)
		}
	}
	if len(doc.Units) == 0 {
		return nil
	}
	table := newGrid("group", "symbol", "name", "is", "also", "note")
	group, prefixes := "", false
	for _, e := range doc.Units {
		shown := e.Group
		if e.Group == group {
			shown = ""
		} else {
			table.group()
		}
		group = e.Group
		symbol := e.Symbol
		if e.Prefixes {
			symbol += " *"
			prefixes = true
		}
		table.row(shown, symbol, e.Name, e.Meaning, e.Aliases, e.Note)
	}
	if err := table.write(w); err != nil {
		return err
	}
	if prefixes {
		fmt.Fprintln(w, "\n* takes the SI prefixes")
	}
	return nil
}

func describe(u unit.Unit) *unitDocument {
	doc := &unitDocument{Unit: u.Text(), SI: unit.CoherentText(u.Dimension()), Dimension: u.Dimension().String()}
	zero := u.ToSI(0)
	if zero != 0 {
		shifted := jsonNumber(zero)
		doc.Zero = &shifted
	}
	// A difference in the unit has the size of one without the zero's shift.
	doc.One = jsonNumber(u.Difference().ToSI(1))
	if u.Kind() != unit.Plain {
		doc.Kind = u.Kind().String()
	}
	return doc
}

func writeUnit(w *bytes.Buffer, doc *unitDocument) {
	fmt.Fprintln(w, doc.Unit)
	if doc.Zero != nil {
		fmt.Fprintln(w, "    a step of 1 is "+withUnit(shortest(float64(doc.One)), doc.SI))
		fmt.Fprintln(w, "    its zero is "+withUnit(shortest(float64(*doc.Zero)), doc.SI))
	} else {
		fmt.Fprintln(w, "    1 of it is "+withUnit(shortest(float64(doc.One)), doc.SI))
	}
	fmt.Fprintln(w, "    dimension: "+doc.Dimension)
	if doc.Kind != "" {
		fmt.Fprintln(w, "    kind: "+doc.Kind)
	}
}
