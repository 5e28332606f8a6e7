package main

import (
	"bytes"
	"context"
	"errors"
	"math"
	"strings"
	"unsafe"

	"github.com/parquet-go/parquet-go"

	"plumbrule/engine/rows"
)

// block is a stretch of rows on its way through the sheet.
type block struct {
	run     *rowsRun
	stretch stretch
	number  int // its place among the blocks
	rows    int
	flaws   map[int]string // why a row is refused before it is evaluated
	columns [][]float64    // for each source, SI
	shown   [][]float64    // for each source, in the column's unit, if the output asks for it
	out     rows.Outcome
	entries []rows.Entry
	reasons []rows.Reason
	values  [][]float64
	text    []byte            // what an output of text made of it
	leaves  [][]parquet.Value // what an output of Parquet made of it, for each column
	tally   *blockTally
	taken   int64 // of the data, up to the end of the block
	choices []lastChoice
	done    chan error
}

// lastChoice remembers the text that a column of choices gave last.
type lastChoice struct {
	text  string
	index float64
}

func newBlock(r *rowsRun) *block {
	n := len(r.layout.sources)
	b := &block{run: r, stretch: r.in.newStretch(r.whole), done: make(chan error, 1), tally: &blockTally{}, flaws: map[int]string{}}
	b.columns, b.shown, b.choices = make([][]float64, n), make([][]float64, n), make([]lastChoice, n)
	return b
}

// evaluate parses the block, runs the sheet and prints the rows.
func (b *block) evaluate(ctx context.Context) error {
	clear(b.flaws)
	b.rows = 0
	for s := range b.columns {
		b.columns[s] = b.columns[s][:0]
	}
	err := b.stretch.parse(ctx, b)
	if err != nil {
		return err
	}
	b.run.maker.turns.done(b.number)
	b.finish()
	program, release := b.run.maker.hold()
	defer release()
	b.entries, b.reasons = program.Describe().Entries, program.Reasons()
	b.values = append(b.values[:0], b.run.opened.input.Values...)
	for s := range b.run.layout.sources {
		b.values[b.run.layout.sources[s].known] = b.columns[s]
	}
	if err := program.Run(ctx, rows.Input{Rows: b.rows, Values: b.values}, &b.out); err != nil {
		return err
	}
	b.tally.count(b)
	b.run.out.print(b)
	return nil
}

// finish turns the columns into SI numbers. A row with a flaw has none at all,
// so that nothing is counted for it.
func (b *block) finish() {
	for s, column := range b.columns {
		if b.run.whole {
			b.shown[s] = append(b.shown[s][:0], column...)
		}
		for row := range b.flaws {
			column[row] = math.NaN()
		}
		source := &b.run.layout.sources[s]
		if source.form != rows.Number || source.scale == (rows.Scale{Multiply: 1, Divide: 1}) {
			continue
		}
		scale := source.scale
		for i, x := range column {
			column[i] = scale.ToSI(x)
		}
	}
}

// flaw refuses a row; the first word on it stays.
func (b *block) flaw(row int, why string) {
	if b.flaws[row] == "" {
		b.flaws[row] = b.stretch.place(row) + ": " + why
	}
}

// flawCell refuses a row for a cell of a source.
func (b *block) flawCell(row, source int, why string) {
	b.flaw(row, b.run.layout.sources[source].name+": "+why)
}

// badCell says what is wrong with a cell.
type badCell string

func (b badCell) Error() string { return string(b) }

// take appends the number that the text of a cell stands for to a source's
// column; NaN for a blank cell and for one that is no number.
func (b *block) take(ctx context.Context, source, row int, text []byte) error {
	s := &b.run.layout.sources[source]
	x, ok := 0.0, false
	if s.form == rows.Number {
		x, ok = scanNumber(text)
	}
	if !ok {
		var err error
		x, err = b.read(ctx, source, bytes.TrimSpace(text))
		var bad badCell
		if errors.As(err, &bad) {
			b.flawCell(row, source, strings.TrimPrefix(string(bad), s.name+"="+clip(string(text))+": "))
			x = math.NaN()
		} else if err != nil {
			return err
		}
	}
	b.columns[source] = append(b.columns[source], x)
	return nil
}

// skip appends a missing value to a source's column.
func (b *block) skip(source int) { b.columns[source] = append(b.columns[source], math.NaN()) }

// read reads a cell without blanks around it.
func (b *block) read(ctx context.Context, source int, text []byte) (float64, error) {
	if len(text) == 0 {
		return math.NaN(), nil
	}
	s := &b.run.layout.sources[source]
	switch s.form {
	case rows.Truth:
		if x, ok := readTruth(string(text)); ok {
			return x, nil
		}
		return 0, badCell("'" + clip(string(text)) + "' is neither true nor false")
	case rows.Choice:
		last := &b.choices[source]
		if last.text == string(text) && last.text != "" {
			return last.index, nil
		}
		index, err := b.run.maker.choose(ctx, b.number, s, string(text))
		if err == nil {
			*last = lastChoice{string(text), index}
		}
		return index, err
	}
	// The view of the text is not kept: an error speaks of a copy.
	x, err := readNumber(unsafe.String(unsafe.SliceData(text), len(text)))
	if err != nil {
		if !errors.Is(err, errNotNumber) {
			return 0, badCell("'" + clip(string(text)) + "' is " + err.Error())
		}
		return 0, badCell("'" + clip(string(text)) + "' is not a number")
	}
	return x, nil
}

// worst gives a row's worst state and why it is so.
func (b *block) worst(row int) (worst rows.State, reason string) {
	if flaw := b.flaws[row]; flaw != "" {
		return rows.Refused, flaw
	}
	why := 0
	for e := range b.entries {
		if state := b.out.State(e, row); state > worst {
			worst, why = state, b.out.Reason(e, row)
		}
	}
	if why > 0 && why < len(b.reasons) {
		reason = printable(b.reasons[why].Text)
	}
	return worst, reason
}

// sound says that all entries of all rows are.
func (b *block) sound() bool {
	for e := range b.entries {
		if b.out.States[e] != nil {
			return false
		}
	}
	return len(b.flaws) == 0
}

// computed says whether an entry has a number in a row that has no flaw.
func (b *block) computed(entry, row int) bool {
	return b.out.State(entry, row).Computed() && (len(b.flaws) == 0 || b.flaws[row] == "")
}
