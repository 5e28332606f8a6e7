package main

import (
	"io"
	"math"
	"strconv"

	"plumbrule/engine/rows"
)

// jsonOutput writes JSON lines: the data's own members, each entry, the row's
// worst state and the first reason for it. What has no value is null.
type jsonOutput struct {
	w       io.Writer
	layout  *layout
	own     [][]byte // the names of the data's columns, as members begin with
	entries [][]byte
}

func newJSONOutput(w io.Writer, l *layout) *jsonOutput {
	j := &jsonOutput{w: w, layout: l}
	for i := range l.fields {
		j.own = append(j.own, append(appendJSONText(nil, l.fields[i].title), ':'))
	}
	for _, name := range l.names {
		j.entries = append(j.entries, append(appendJSONText(nil, name), ':'))
	}
	return j
}

func (j *jsonOutput) begin() error { return nil }

func (j *jsonOutput) write(b *block) error {
	_, err := j.w.Write(b.text)
	return err
}

func (j *jsonOutput) end() error { return nil }

func (j *jsonOutput) print(b *block) {
	same, _ := b.stretch.(*jsonStretch)
	raw := same != nil && len(j.layout.kept) == len(j.layout.fields)
	to := b.text[:0]
	for row := range b.rows {
		if raw && same.own[row][1] != 0 {
			at := same.own[row]
			to = append(to, same.text[at[0]:at[1]-1]...) // without the bracket that closes it
			for jsonBlank(to[len(to)-1]) {
				to = to[:len(to)-1]
			}
			if to[len(to)-1] != '{' {
				to = append(to, ',')
			}
		} else {
			to = append(to, '{')
			for _, column := range j.layout.kept {
				to = append(appendJSONCell(append(to, j.own[column]...), b.typedOrOwn(row, column, same != nil)), ',')
			}
		}
		for e := range b.entries {
			to = append(to, j.entries[e]...)
			if b.computed(e, row) {
				to = appendJSONResult(to, resultOf(&b.entries[e], b.out.Values[e][row]))
			} else {
				to = append(to, "null"...)
			}
			to = append(to, ',')
		}
		state, reason := b.worst(row)
		to = append(append(append(to, `"`+stateColumn+`":"`...), state.String()...), `","`+reasonColumn+`":`...)
		if state == rows.Sound {
			to = append(to, "null}\n"...)
		} else {
			to = append(appendJSONText(to, reason), "}\n"...)
		}
	}
	b.text = to
}

// typedOrOwn gives a cell as it stands where the data is in the same form, and
// else typed.
func (b *block) typedOrOwn(row, column int, own bool) cell {
	if own {
		return b.stretch.cell(row, column)
	}
	return b.typed(row, column)
}

func appendJSONResult(to []byte, r result) []byte {
	switch r.kind {
	case textCell:
		return appendJSONText(to, r.text)
	case truthCell:
		return append(to, truthText(r.number)...)
	}
	return appendJSONNumber(to, r.number)
}

func appendJSONNumber(to []byte, x float64) []byte {
	if math.IsNaN(x) || math.IsInf(x, 0) {
		return append(to, "null"...)
	}
	return appendShortest(to, x)
}

func appendJSONCell(to []byte, c cell) []byte {
	switch c.kind {
	case textCell:
		return appendJSONText(to, c.text)
	case jsonCell:
		return append(to, c.text...)
	case numberCell:
		return appendJSONNumber(to, c.number)
	case wholeCell:
		return strconv.AppendInt(to, c.whole, 10)
	case truthCell:
		return append(to, truthText(float64(c.whole))...)
	}
	return append(to, "null"...)
}
