package main

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"math"
	"strconv"
	"strings"

	"github.com/spf13/cobra"

	"plumbrule/engine"
	"plumbrule/engine/rows"
)

func (a *app) runCommand() *cobra.Command {
	const form = "run SHEET [name=value ...]"
	var through, compare string
	var asCSV bool
	var digits int
	c := &cobra.Command{
		Use:   form,
		Short: "evaluate a sheet once and print it as a table",
		Long: `Evaluates a sheet once and prints the knowns, the entries, and the requirements
with their margins; notices and cautions follow.

name=value replaces a known's value. A bare number is in the known's own unit;
a unit may follow it and is converted: depth="4.3 km" or depth=4.3[km]. A
choice takes its text, a truth value true or false. SHEET may be - for standard
input.

--compare evaluates the sheet in this process and in the module, prints the
table once, and tells whether both gave the same bits.`,
		Args: atLeast(1, -1, form),
		RunE: func(c *cobra.Command, arguments []string) error {
			switch {
			case digits < 1 || digits > 17:
				return usage("--digits "+strconv.Itoa(digits)+" is not from 1 to 17", "write --digits 7")
			case asCSV && a.json:
				return usage("--csv and --json exclude each other", "leave one of the two out")
			case through != "" && compare != "":
				return usage("--through and --compare exclude each other", "--compare runs both ways already")
			}
			r := &runner{app: a, digits: digits, csv: asCSV}
			return r.run(c.Context(), arguments[0], arguments[1:], through, compare)
		},
	}
	c.Flags().StringVar(&through, "through", "", "evaluate in the WebAssembly module `MODULE.wasm`")
	c.Flags().StringVar(&compare, "compare", "", "evaluate also in the module `MODULE.wasm` and compare every bit")
	c.Flags().BoolVar(&asCSV, "csv", false, "print the result as CSV, with all digits")
	c.Flags().IntVar(&digits, "digits", defaultDigits, "significant digits in the table, `N` from 1 to 17")
	return c
}

// runner evaluates one row and prints it.
type runner struct {
	*app
	digits int
	csv    bool
}

func (r *runner) run(ctx context.Context, file string, assignments []string, through, compare string) error {
	compiler, release, err := r.compilerFor(ctx, through, 0)
	if err != nil {
		return err
	}
	defer release()
	o, err := r.open(ctx, file, compiler, assignments)
	if err != nil {
		return err
	}
	defer o.program.Close()
	var out rows.Outcome
	if err := o.program.Run(ctx, o.input, &out); err != nil {
		return err
	}
	result := gather(o, &out)
	var text bytes.Buffer
	switch {
	case r.json:
		r.writeJSON(&text, result)
	case r.csv:
		err = writeResultCSV(&text, result)
	default:
		err = r.writeTable(&text, result)
	}
	if err != nil {
		return err
	}
	if _, err := r.stdout.Write(text.Bytes()); err != nil {
		return unreadable("cannot write standard output: " + err.Error())
	}
	if compare != "" {
		if err := r.compare(ctx, o, &out, compare); err != nil {
			return err
		}
	}
	if !result.Well {
		return verdict(statusMissed)
	}
	return nil
}

// writeTable prints a result for people.
func (r *runner) writeTable(w *bytes.Buffer, result *resultDocument) error {
	if result.Title != "" {
		fmt.Fprintln(w, printable(result.Title))
		fmt.Fprintln(w)
	}
	values := newGrid("name", "value", "unit", "state", "note")
	values.numbers[1] = true
	values.group()
	for i := range result.Knowns {
		k := &result.Knowns[i]
		values.row(k.Name, r.shown(k.Form, k.shown, k.Text), shownUnit(k.Unit), k.State, remark(k.Reason, k.Note))
	}
	values.group()
	for i := range result.Entries {
		e := &result.Entries[i]
		values.row(e.Name, r.shown(e.Form, e.shown, e.Text), shownUnit(e.Unit), e.State, remark(e.Reason, e.Note))
	}
	if !values.empty() {
		if err := values.write(w); err != nil {
			return err
		}
	}
	if len(result.Requirements) > 0 {
		if !values.empty() {
			fmt.Fprintln(w)
		}
		table := newGrid("requirement", "verdict", "margin", "unit", "note")
		table.numbers[2] = true
		for i := range result.Requirements {
			q := &result.Requirements[i]
			verdict := q.Verdict
			if q.State == rows.Stretched.String() {
				verdict += ", " + q.State
			}
			margin, unit := "", ""
			if q.hasMargin && q.Verdict != waits {
				margin, unit = readable(q.margin, r.digits), shownUnit(q.Unit)
			}
			table.row(q.Name, verdict, margin, unit, remark(q.Reason, q.Note))
		}
		if err := table.write(w); err != nil {
			return err
		}
	}
	writeRemarks(w, result, r.width())
	return nil
}

// writeRemarks prints notices and cautions.
func writeRemarks(w *bytes.Buffer, result *resultDocument, columns int) {
	if len(result.Notices)+len(result.Cautions) > 0 && w.Len() > 0 {
		fmt.Fprintln(w)
	}
	for _, n := range result.Notices {
		w.WriteString(wrapped("line "+lineText(n.Line)+": "+n.Message, "notice: ", "    ", columns))
	}
	// Laws with one and the same caution share a line.
	var texts []string
	laws := map[string][]string{}
	for _, c := range result.Cautions {
		if laws[c.Text] == nil {
			texts = append(texts, c.Text)
		}
		laws[c.Text] = append(laws[c.Text], c.Law)
	}
	for _, text := range texts {
		w.WriteString(wrapped(strings.Join(laws[text], ", ")+": "+text, "caution: ", "    ", columns))
	}
}

// shown is a value's text in the table.
func (r *runner) shown(form rows.Form, value float64, text string) string {
	switch {
	case text != "":
		return text
	case form == rows.Truth && !math.IsNaN(value):
		return truthText(value)
	}
	return readable(value, r.digits)
}

// remark joins why a value is not sound with the author's note.
func remark(reason, note string) string {
	switch {
	case reason == "":
		return note
	case note == "":
		return reason
	}
	return reason + "; " + note
}

func truthText(x float64) string {
	if x != 0 {
		return "true"
	}
	return "false"
}

func lineText(line int) string { return strconv.Itoa(line) }

// compare runs the sheet in the module too and tells what differs.
func (r *runner) compare(ctx context.Context, o *opened, native *rows.Outcome, module string) error {
	compiler, release, err := r.compilerFor(ctx, module, 0)
	if err != nil {
		return err
	}
	defer release()
	program, err := compiler.Compile(ctx, o.text, o.choices)
	if err != nil {
		return ofSheet(err, o.file, o.text)
	}
	defer program.Close()
	var other rows.Outcome
	if err := program.Run(ctx, o.input, &other); err != nil {
		return err
	}
	entries := o.program.Describe().Entries
	if len(other.Values) != len(native.Values) {
		return unreadable(module+" gives "+strconv.Itoa(len(other.Values))+" values, this program "+strconv.Itoa(len(native.Values)), "build the module from the same sources as the command")
	}
	differ := newGrid("differs", "native", "module")
	for e := range entries {
		a, b := native.Values[e][0], other.Values[e][0]
		if !sameBits(a, b) {
			differ.row(entries[e].Name, bitsText(a), bitsText(b))
		}
		if a, b := native.State(e, 0), other.State(e, 0); a != b {
			differ.row(entries[e].Name+" (state)", a.String(), b.String())
		}
		if a, b := reasonText(o.program, native, e), reasonText(program, &other, e); a != b {
			differ.row(entries[e].Name+" (reason)", a, b)
		}
	}
	w := r.stdout
	if r.json || r.csv {
		w = r.stderr
	} else {
		fmt.Fprintln(w)
	}
	if differ.empty() {
		_, err = fmt.Fprintln(w, "native and module agree to the last bit: "+strconv.Itoa(len(entries))+" values")
		return err
	}
	return errors.Join(differ.write(w), verdict(statusMissed))
}

// sameBits compares two numbers bit for bit; NaN is one class.
func sameBits(a, b float64) bool {
	return math.Float64bits(a) == math.Float64bits(b) || math.IsNaN(a) && math.IsNaN(b)
}

func bitsText(x float64) string {
	if math.IsNaN(x) {
		return "none"
	}
	return shortest(x) + fmt.Sprintf(" (%016x)", math.Float64bits(x))
}

// native compiles in this process, with so many workers; 0 means one a processor.
func (a *app) native(workers int) rows.Compiler {
	return engine.Native{Catalogue: a.catalogue, Workers: workers}
}
