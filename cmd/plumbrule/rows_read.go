package main

import (
	"bufio"
	"bytes"
	"encoding/csv"
	"errors"
	"io"
	"strconv"
	"strings"
	"unicode/utf8"

	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// mostRecord bounds one row of the data in bytes, so that a quote that is
// never closed does not read the whole file into memory.
const mostRecord = 16 << 20

// reader reads rows of CSV (RFC 4180), each with any number of cells.
type reader struct {
	file   string
	csv    *csv.Reader
	count  *meter
	header []string
}

// meter counts bytes and ends a row that grows without end.
type meter struct {
	in         io.Reader
	total      int64
	sinceStart int
}

var errLongRow = errors.New("a row is longer than 16 MiB; a quote may not be closed")

func (m *meter) Read(p []byte) (int, error) {
	if m.sinceStart > mostRecord {
		return 0, errLongRow
	}
	n, err := m.in.Read(p)
	m.total += int64(n)
	m.sinceStart += n
	return n, err
}

// newReader reads the header.
func newReader(in io.Reader, file string) (*reader, error) {
	buffered := bufio.NewReaderSize(in, 1<<18)
	if mark, err := buffered.Peek(3); err == nil && bytes.Equal(mark, []byte("\xef\xbb\xbf")) {
		_, _ = buffered.Discard(3) // the byte order mark that some programs write; Peek has it in store
	}
	r := &reader{file: file, count: &meter{in: buffered}}
	r.csv = csv.NewReader(r.count)
	r.csv.FieldsPerRecord = -1
	r.csv.ReuseRecord = true
	header, err := r.csv.Read()
	if errors.Is(err, io.EOF) {
		return nil, unreadable(file+" is empty", "begin it with a header: name [unit],name [unit]")
	}
	if err != nil {
		return nil, r.wrong(err)
	}
	r.header = append([]string(nil), header...)
	return r, nil
}

// next gives the cells of the next row, the line it begins in, and what is
// wrong with its quotes, if anything. The cells are good until the next call.
func (r *reader) next() (cells []string, line int, flaw string, err error) {
	r.count.sinceStart = 0
	cells, err = r.csv.Read()
	var parse *csv.ParseError
	if errors.As(err, &parse) {
		return cells, parse.StartLine, "a quote stands where none belongs", nil
	}
	if errors.Is(err, io.EOF) {
		return nil, 0, "", io.EOF
	}
	if err != nil {
		return nil, 0, "", r.wrong(err)
	}
	line, _ = r.csv.FieldPos(0)
	return cells, line, "", nil
}

func (r *reader) wrong(err error) error {
	line := ""
	var parse *csv.ParseError
	if errors.As(err, &parse) {
		return unreadable(rowText(r.file, parse.Line)+":"+strconv.Itoa(parse.Column)+": a quote stands where none belongs", `write a quote inside of a quoted cell twice, ""`)
	}
	if at, _ := r.csv.FieldPos(0); at > 0 {
		line = ":" + strconv.Itoa(at)
	}
	return unreadable("cannot read " + r.file + line + ": " + err.Error())
}

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
	header  []string // the data's own
	sources []source
	names   []string // of the entries, with their units
}

// layOut matches the data's header with the sheet.
func (r *rowsRun) layOut(header []string) (*layout, error) {
	d := r.opened.program.Describe()
	l := &layout{header: header}
	fed := map[int]string{}
	for i, cell := range header {
		name, unitText, hasUnit := splitHeader(cell)
		k := d.KnownIndex(name)
		if k < 0 {
			r.remarkUnknown(name, d)
			continue
		}
		place := rowText(r.data, 1) + ": column '" + clip(cell) + "'"
		switch {
		case fed[k] != "":
			return nil, unreadable(place+" gives "+name+", which column '"+clip(fed[k])+"' gives already", "rename one of the two")
		case r.opened.given[k]:
			return nil, usage(name+" is given on the command line and by "+place, "leave one of the two out")
		}
		fed[k] = cell
		s := source{column: i, known: k, name: name, form: d.Knowns[k].Form, scale: d.Knowns[k].Scale}
		if hasUnit {
			if s.form != rows.Number {
				return nil, unreadable(place+": "+name+" has no unit", "write "+name)
			}
			own, err := unit.Parse(d.Knowns[k].Unit)
			if err != nil {
				return nil, err
			}
			u, hint, err := readUnit(unitText)
			if err == nil {
				hint, err = fits(u, own)
			}
			if err != nil {
				return nil, unreadable(place+": "+err.Error(), hint)
			}
			s.scale.Before, s.scale.Multiply, s.scale.Divide = u.Affine()
		}
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
	return l, l.checkNames(rowText(r.data, 1))
}

// checkNames refuses data columns whose names the results need.
func (l *layout) checkNames(place string) error {
	taken := map[string]bool{stateColumn: true, reasonColumn: true}
	for _, name := range l.names {
		taken[name] = true
	}
	for _, cell := range l.header {
		if taken[strings.TrimSpace(cell)] {
			return unreadable(place+": column '"+clip(cell)+"' has the name of a column that is written", "rename it, or leave it out")
		}
	}
	return nil
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

// headerLine is the header of what is written.
func (l *layout) headerLine() []byte {
	line := []byte{}
	for _, cell := range l.header {
		line = append(appendCell(line, cell), ',')
	}
	for _, name := range l.names {
		line = append(appendCell(line, name), ',')
	}
	return append(line, stateColumn+","+reasonColumn+"\n"...)
}

// splitHeader takes "name [unit]" apart.
func splitHeader(cell string) (name, unitText string, hasUnit bool) {
	cell = strings.TrimSpace(cell)
	if open := strings.IndexByte(cell, '['); open >= 0 && strings.HasSuffix(cell, "]") {
		return strings.TrimSpace(cell[:open]), strings.TrimSpace(cell[open+1 : len(cell)-1]), true
	}
	return cell, "", false
}

// appendCell writes a cell of CSV, quoted only where it must be.
func appendCell(to []byte, cell string) []byte {
	if !strings.ContainsAny(cell, ",\"\r\n") && !strings.HasPrefix(cell, " ") {
		return append(to, cell...)
	}
	to = append(to, '"')
	for i := 0; i < len(cell); i++ {
		if cell[i] == '"' {
			to = append(to, '"')
		}
		to = append(to, cell[i])
	}
	return append(to, '"')
}
