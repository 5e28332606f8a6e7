package main

import (
	"bytes"
	"io"
	"strconv"
)

// csvOutput writes CSV: the data's own cells, unchanged, the entries, the row's
// worst state and the first reason for it.
type csvOutput struct {
	w      io.Writer
	layout *layout
}

func (c *csvOutput) begin() error {
	line := []byte{}
	for _, i := range c.layout.kept {
		line = append(appendCell(line, c.layout.fields[i].title), ',')
	}
	for _, name := range c.layout.names {
		line = append(appendCell(line, name), ',')
	}
	_, err := c.w.Write(append(line, stateColumn+","+reasonColumn+"\n"...))
	return err
}

func (c *csvOutput) write(b *block) error {
	_, err := c.w.Write(b.text)
	return err
}

func (c *csvOutput) end() error { return nil }

func (c *csvOutput) print(b *block) {
	own, same := b.stretch.(*csvStretch)
	same = same && len(c.layout.kept) == len(c.layout.fields)
	sound := b.sound()
	to := b.text[:0]
	for row := range b.rows {
		record, well := []byte(nil), false
		if same {
			record, well = own.record(row)
		}
		if well {
			to = append(to, record...)
			to = append(to, ',')
		} else {
			for _, column := range c.layout.kept {
				to = append(appendField(to, b.stretch.cell(row, column)), ',')
			}
		}
		if sound {
			for e := range b.entries {
				to = append(appendResult(to, resultOf(&b.entries[e], b.out.Values[e][row])), ',')
			}
			to = append(to, "sound,\n"...)
			continue
		}
		for e := range b.entries {
			if b.computed(e, row) {
				to = appendResult(to, resultOf(&b.entries[e], b.out.Values[e][row]))
			}
			to = append(to, ',')
		}
		state, reason := b.worst(row)
		to = append(append(to, state.String()...), ',')
		to = append(appendCell(to, reason), '\n')
	}
	b.text = to
}

func appendResult(to []byte, r result) []byte {
	switch r.kind {
	case textCell:
		return append(to, r.text...)
	case truthCell:
		return append(to, truthText(r.number)...)
	}
	return appendShortest(to, r.number)
}

// appendField writes a cell of the data.
func appendField(to []byte, c cell) []byte {
	switch c.kind {
	case textCell, jsonCell:
		return appendCell(to, c.text)
	case numberCell:
		return appendShortest(to, c.number)
	case wholeCell:
		return strconv.AppendInt(to, c.whole, 10)
	case truthCell:
		return append(to, truthText(float64(c.whole))...)
	}
	return to
}

// appendCell writes a text as a cell of CSV, quoted only where it must be.
func appendCell[T string | []byte](to []byte, cell T) []byte {
	text := []byte(cell)
	if !bytes.ContainsAny(text, ",\"\r\n") && !bytes.HasPrefix(text, []byte(" ")) {
		return append(to, text...)
	}
	to = append(to, '"')
	for _, c := range text {
		if c == '"' {
			to = append(to, '"')
		}
		to = append(to, c)
	}
	return append(to, '"')
}
