package main

import (
	"context"
	"errors"
	"io"
	"io/fs"
	"math"
	"os"
	"strings"

	"plumbrule/engine/rows"
	"plumbrule/engine/sheet"
	"plumbrule/engine/unit"
)

// opened is a compiled sheet with the values given on the command line.
type opened struct {
	file     string
	text     string
	compiler rows.Compiler
	program  rows.Program
	choices  map[string][]string // texts that the sheet does not list, by known
	input    rows.Input          // one row: what the command line gives
	given    []bool              // for each known, whether the command line gives it
}

// readSheet reads a sheet's text; "-" stands for standard input.
func (a *app) readSheet(file string) (string, error) {
	in := a.stdin
	if file != "-" {
		f, err := os.Open(file)
		if err != nil {
			return "", cannot("read", file, err)
		}
		defer f.Close()
		in = f
	}
	// One byte more than the limit lets the sheet's own check speak.
	text, err := io.ReadAll(io.LimitReader(in, sheet.MostText+1))
	if err != nil {
		return "", cannot("read", shownFile(file), err)
	}
	return string(text), nil
}

// shownFile is a file's name in messages.
func shownFile(file string) string {
	if file == "-" {
		return "standard input"
	}
	return file
}

// cannot tells that a file cannot be read or written, and why.
func cannot(do, file string, err error) error {
	hint := ""
	switch {
	case errors.Is(err, fs.ErrNotExist):
		hint = "check the path"
	case errors.Is(err, fs.ErrPermission):
		hint = "check the permissions"
	}
	var detail *fs.PathError
	if errors.As(err, &detail) {
		err = detail.Err
	}
	return unreadable("cannot "+do+" "+file+": "+err.Error(), hint)
}

// open compiles a sheet and fills in what the command line gives.
func (a *app) open(ctx context.Context, file string, compiler rows.Compiler, assignments []string) (*opened, error) {
	text, err := a.readSheet(file)
	if err != nil {
		return nil, err
	}
	o := &opened{file: shownFile(file), text: text, compiler: compiler, choices: map[string][]string{}}
	if err := o.compile(ctx); err != nil {
		return nil, err
	}
	if err := o.assign(ctx, assignments); err != nil {
		return nil, errors.Join(err, o.program.Close())
	}
	return o, nil
}

// compile makes the program anew, with the choices gathered so far.
func (o *opened) compile(ctx context.Context) error {
	program, err := o.compiler.Compile(ctx, o.text, o.choices)
	if err != nil {
		return ofSheet(err, o.file, o.text)
	}
	if o.program != nil {
		if err := o.program.Close(); err != nil {
			return err
		}
	}
	o.program = program
	return nil
}

// assign fills the input's row from the arguments name=value.
func (o *opened) assign(ctx context.Context, assignments []string) error {
	knowns := o.program.Describe().Knowns
	o.input = rows.Input{Rows: 1, Values: make([][]float64, len(knowns))}
	o.given = make([]bool, len(knowns))
	for _, assignment := range assignments {
		name, value, found := strings.Cut(assignment, "=")
		name = strings.TrimSpace(name)
		if !found || name == "" {
			return usage("'"+clip(assignment)+"' does not give a value", `write name=value, as in depth=4300 or depth="4.3 km"`)
		}
		k, err := o.known(name)
		if err != nil {
			return err
		}
		if o.given[k] {
			return usage(name+" is given twice", "leave one of the two out")
		}
		si, err := o.value(ctx, &knowns[k], value)
		if err != nil {
			return err
		}
		o.given[k], o.input.Values[k] = true, []float64{si}
	}
	return nil
}

// known finds a known by name.
func (o *opened) known(name string) (int, error) {
	d := o.program.Describe()
	if k := d.KnownIndex(name); k >= 0 {
		return k, nil
	}
	if d.EntryIndex(name) >= 0 {
		return 0, usage("'"+name+"' is derived by "+o.file+", not a known of it", "only a known takes a value")
	}
	var names []string
	for i := range d.Knowns {
		names = append(names, d.Knowns[i].Name)
	}
	hint := suggest(name, names)
	if hint == "" && len(names) > 0 {
		hint = "its knowns are " + shortList(names)
	}
	return 0, usage(o.file+" has no known '"+clip(name)+"'", hint)
}

// value reads the text of a known's value from the command line.
func (o *opened) value(ctx context.Context, k *rows.Known, text string) (float64, error) {
	switch k.Form {
	case rows.Truth:
		truth, ok := readTruth(text)
		if !ok {
			return 0, usage(k.Name+"="+clip(text)+": "+k.Name+" is true or false", "write "+k.Name+"=true or "+k.Name+"=false")
		}
		return truth, nil
	case rows.Choice:
		index, err := o.choose(ctx, k, text)
		if err != nil {
			return 0, err
		}
		return float64(index), nil
	}
	u, err := unit.Parse(k.Unit)
	if err != nil {
		return 0, err
	}
	si, hint, err := readQuantity(text, u)
	if err != nil {
		return 0, usage(k.Name+"="+clip(text)+": "+err.Error(), hint)
	}
	return si, nil
}

// choose gives the index of a text among a known's choices. A known with one
// text alone, not a list of choices, takes any text; the program is then made
// anew with it.
func (o *opened) choose(ctx context.Context, k *rows.Known, text string) (int, error) {
	for i, choice := range k.Choices {
		if choice == text {
			return i, nil
		}
	}
	if len(k.Choices)-len(o.choices[k.Name]) > 1 {
		hint := suggest(text, k.Choices)
		if hint == "" {
			hint = "the choices are " + shortList(k.Choices)
		}
		return 0, usage(k.Name+"="+clip(text)+": '"+clip(text)+"' is no choice of "+k.Name+" ("+rowText(o.file, k.Line)+")", hint)
	}
	o.choices[k.Name] = append(o.choices[k.Name], text)
	if err := o.compile(ctx); err != nil {
		var wrong *sheetFault
		if errors.As(err, &wrong) && len(wrong.problems) > 0 {
			first := wrong.problems[0]
			return 0, usage(k.Name+"="+clip(text)+": '"+clip(text)+"' does not suit "+place(o.file, first)+": "+first.Message, first.Suggestion)
		}
		return 0, err
	}
	k = &o.program.Describe().Knowns[o.program.Describe().KnownIndex(k.Name)]
	return o.choose(ctx, k, text)
}

// readTruth reads true or false as 1 or 0.
func readTruth(text string) (float64, bool) {
	switch strings.ToLower(strings.TrimSpace(text)) {
	case "true", "1":
		return 1, true
	case "false", "0":
		return 0, true
	}
	return 0, false
}

// valueOf gives a known's SI value in the row, and whether there is one.
func (o *opened) valueOf(k int) (float64, bool) {
	if o.given[k] {
		return o.input.Values[k][0], true
	}
	known := &o.program.Describe().Knowns[k]
	return known.Value, known.HasValue && !math.IsNaN(known.Value)
}

// shortList joins names, at most a dozen of them.
func shortList(names []string) string {
	const most = 12
	if len(names) > most {
		return strings.Join(names[:most], ", ") + ", ..."
	}
	return strings.Join(names, ", ")
}
