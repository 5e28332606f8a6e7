package main

import (
	"context"
	"errors"
	"math"
	"strings"

	"plumbrule/engine/rows"
)

// block is a stretch of rows on its way from text to text.
type block struct {
	run       *rowsRun
	width     int // columns of the data
	rows      int
	cells     []string // rows of width cells
	lines     []int    // the line of the data that a row begins in
	flaws     []string // why a row is refused before it is evaluated, or ""
	columns   [][]float64
	out       rows.Outcome
	entries   []rows.Entry
	reasons   []rows.Reason
	knownOf   []int // for each reason the known that it names, or -1
	text      []byte
	tally     *blockTally
	readBytes int64 // of the data, up to the end of the block
	done      chan error
}

func newBlock(r *rowsRun) *block {
	b := &block{run: r, width: len(r.layout.header), done: make(chan error, 1), tally: newBlockTally()}
	b.columns = make([][]float64, len(r.layout.sources))
	return b
}

// fill reads rows until the block is full or the data ends (io.EOF).
func (b *block) fill(ctx context.Context, in *reader) error {
	b.rows, b.cells, b.lines, b.flaws = 0, b.cells[:0], b.lines[:0], b.flaws[:0]
	defer func() { b.readBytes = in.count.total }()
	for b.rows < blockRows {
		if b.rows%1024 == 0 && ctx.Err() != nil {
			return ctx.Err()
		}
		cells, line, flaw, err := in.next()
		if err != nil {
			return err
		}
		if flaw == "" && len(cells) != b.width {
			flaw = "the row has " + counted(int64(len(cells)), "cell", "cells") + ", the header " + lineText(b.width)
		}
		for i := range b.width {
			cell := ""
			if i < len(cells) {
				cell = cells[i]
			}
			b.cells = append(b.cells, cell)
		}
		if flaw != "" {
			flaw = "line " + lineText(line) + ": " + flaw
		}
		b.lines = append(b.lines, line)
		b.flaws = append(b.flaws, flaw)
		b.rows++
	}
	return nil
}

// evaluate reads the block's numbers, runs the sheet and writes the rows.
func (b *block) evaluate(ctx context.Context) error {
	for s := range b.run.layout.sources {
		if err := b.readColumn(ctx, s); err != nil {
			return err
		}
	}
	program, release := b.run.maker.hold()
	defer release()
	b.entries, b.reasons = program.Describe().Entries, program.Reasons()
	b.knownOf = b.knownOf[:0]
	for i := range b.reasons {
		b.knownOf = append(b.knownOf, program.Describe().KnownIndex(b.reasons[i].Argument))
	}
	in := rows.Input{Rows: b.rows, Values: append([][]float64(nil), b.run.opened.input.Values...)}
	for s := range b.run.layout.sources {
		in.Values[b.run.layout.sources[s].known] = b.columns[s]
	}
	if err := program.Run(ctx, in, &b.out); err != nil {
		return err
	}
	b.write()
	return nil
}

// readColumn turns one column's cells into SI numbers.
func (b *block) readColumn(ctx context.Context, index int) error {
	s := &b.run.layout.sources[index]
	if cap(b.columns[index]) < b.rows {
		b.columns[index] = make([]float64, blockRows)
	}
	column := b.columns[index][:b.rows]
	b.columns[index] = column
	for i := range column {
		column[i] = math.NaN()
		cell := strings.TrimSpace(b.cells[i*b.width+s.column])
		if cell == "" {
			continue
		}
		x, err := b.read(ctx, s, cell)
		var bad badCell
		if errors.As(err, &bad) {
			if b.flaws[i] == "" {
				b.flaws[i] = "line " + lineText(b.lines[i]) + ": " + s.name + ": " + strings.TrimPrefix(string(bad), s.name+"="+clip(cell)+": ")
			}
			continue
		}
		if err != nil {
			return err
		}
		column[i] = x
	}
	return nil
}

// badCell says what is wrong with a cell.
type badCell string

func (b badCell) Error() string { return string(b) }

func (b *block) read(ctx context.Context, s *source, cell string) (float64, error) {
	switch s.form {
	case rows.Truth:
		if x, ok := readTruth(cell); ok {
			return x, nil
		}
		return 0, badCell("'" + clip(cell) + "' is neither true nor false")
	case rows.Choice:
		return b.run.maker.choose(ctx, s, cell)
	}
	x, err := readNumber(cell)
	if err != nil {
		if !errors.Is(err, errNotNumber) {
			return 0, badCell("'" + clip(cell) + "' is " + err.Error())
		}
		return 0, badCell("'" + clip(cell) + "' is not a number")
	}
	return s.scale.ToSI(x), nil
}

// write makes the block's text: the data's own cells, the entries, the row's
// worst state and the first reason for it.
func (b *block) write() {
	b.text = b.text[:0]
	b.tally.begin(b)
	entries, reasons := b.entries, b.reasons
	for row := range b.rows {
		for _, cell := range b.cells[row*b.width : (row+1)*b.width] {
			b.text = append(appendCell(b.text, cell), ',')
		}
		if flaw := b.flaws[row]; flaw != "" {
			for range entries {
				b.text = append(b.text, ',')
			}
			b.end(rows.Refused, flaw)
			b.tally.refuse()
			continue
		}
		worst, why := rows.Sound, 0
		for e := range entries {
			state, value := b.out.State(e, row), b.out.Values[e][row]
			if state > worst {
				worst, why = state, b.out.Reason(e, row)
			}
			if state.Computed() {
				b.text = appendValue(b.text, &entries[e], value)
			}
			b.text = append(b.text, ',')
		}
		reason := ""
		if why > 0 && why < len(reasons) {
			reason = reasons[why].Text
		}
		b.tally.row(b, row, worst)
		if worst == rows.Waiting {
			// What waits for a known waits for a cell of the data: the row is
			// refused for what is wrong with that cell.
			if lack := b.firstLack(row); lack != nil {
				worst, reason = rows.Refused, lack.text
			}
		}
		b.tally.states[worst]++
		b.end(worst, reason)
	}
}

// lack is a known without a usable value, for which entries wait.
type lack struct {
	text  string
	below bool
}

// firstLack counts the knowns that entries of a row wait for and gives the
// first of them, or nil.
func (b *block) firstLack(row int) *lack {
	var first *lack
	for e := range b.entries {
		if b.out.State(e, row) != rows.Waiting {
			continue
		}
		k := b.knownOf[b.out.Reason(e, row)]
		if k < 0 {
			continue
		}
		value := b.valueOf(k, row)
		l := b.run.lackOf(k, value)
		b.tally.lack(row, k, l, &b.run.knowns[k], value, b.entries[e].Name)
		if first == nil {
			first = l
		}
	}
	return first
}

// valueOf gives a known's SI value in a row, NaN where there is none.
func (b *block) valueOf(k, row int) float64 {
	for s := range b.run.layout.sources {
		if b.run.layout.sources[s].known == k {
			return b.columns[s][row]
		}
	}
	if given := b.run.opened.input.Values[k]; given != nil {
		return given[0]
	}
	if known := &b.run.knowns[k]; known.HasValue {
		return known.Value
	}
	return math.NaN()
}

// lackOf says what is wrong with a known's value.
func (r *rowsRun) lackOf(k int, value float64) *lack {
	known := &r.knowns[k]
	bound := func(x float64) string {
		return withUnit(readable(known.Scale.FromSI(x), defaultDigits), known.Unit)
	}
	switch {
	case known.HasRange && value < known.Low:
		return &lack{known.Name + " lies below " + bound(known.Low) + ", the bound it is known within", true}
	case known.HasRange && value > known.High:
		return &lack{known.Name + " lies above " + bound(known.High) + ", the bound it is known within", false}
	}
	return &lack{known.Name + " is missing", false}
}

func (b *block) end(state rows.State, reason string) {
	b.text = append(append(b.text, state.String()...), ',')
	b.text = append(appendCell(b.text, printable(reason)), '\n')
}

func appendValue(to []byte, e *rows.Entry, value float64) []byte {
	switch {
	case e.Role == rows.Requirement:
		return append(to, verdictOf(rows.Sound, value)...)
	case e.Form == rows.Truth:
		return append(to, truthText(value)...)
	}
	return appendShortest(to, e.Scale.FromSI(value))
}
