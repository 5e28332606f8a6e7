package main

import (
	"context"
	"errors"
	"io"
	"strconv"
)

// csvInput reads CSV (RFC 4180) with a header.
type csvInput struct {
	feed  *feed
	heads []field
}

// openCSV reads the header.
func openCSV(in io.Reader, file string, size int) (*csvInput, error) {
	c := &csvInput{feed: newFeed(in, file, size, cutRecords)}
	var text []byte
	var err error
	for {
		var s csvScanner
		if text, s.line, err = c.feed.fill(text); err != nil {
			if errors.Is(err, io.EOF) {
				err = unreadable(file+" is empty", "begin it with a header: name [unit],name [unit]")
			}
			return nil, err
		}
		s.text = text
		if !s.next() {
			continue
		}
		if s.torn {
			return nil, unreadable(rowText(file, s.begin)+": a quote stands where none belongs", `write a quote inside of a quoted cell twice, ""`)
		}
		for _, cell := range s.cells {
			title, _ := s.value(cell, nil)
			c.heads = append(c.heads, newField(string(title), anyField))
		}
		c.feed.giveBack(text[s.at:], s.line)
		return c, nil
	}
}

func (c *csvInput) fields() []field { return c.heads }

func (c *csvInput) taken() int64 { return c.feed.taken.Load() }

func (c *csvInput) newStretch(whole bool) stretch { return &csvStretch{in: c, whole: whole} }

// csvStretch is some rows of CSV.
type csvStretch struct {
	in      *csvInput
	whole   bool
	text    []byte
	line    int // the first
	scan    csvScanner
	lines   []int32     // for each row the line that it begins in
	records [][2]int32  // for each row where its text stands
	cells   []csvCell   // for each row its cells, where all are asked for
	scratch []byte      // cells whose quotes had to be undoubled
	torn    map[int]int // for each row with wrong quotes or a wrong number of cells, how many cells it has
	spare   []csvCell   // the cells of those rows
	spareAt map[int]int
}

func (c *csvStretch) fill(context.Context) error {
	var err error
	c.text, c.line, err = c.in.feed.fill(c.text)
	return err
}

func (c *csvStretch) parse(ctx context.Context, b *block) error {
	width := len(c.in.heads)
	sources := b.run.layout.sources
	c.scan.text, c.scan.at, c.scan.line = c.text, 0, c.line
	c.lines, c.records, c.cells, c.scratch, c.spare = c.lines[:0], c.records[:0], c.cells[:0], c.scratch[:0], c.spare[:0]
	c.torn, c.spareAt = map[int]int{}, map[int]int{}
	s := &c.scan
	for s.next() {
		row := b.rows
		if row%4096 == 0 && ctx.Err() != nil {
			return ctx.Err()
		}
		b.rows++
		c.lines = append(c.lines, int32(s.begin))
		c.records = append(c.records, [2]int32{int32(s.from), int32(s.to)})
		if s.torn || len(s.cells) != width {
			if s.torn {
				b.flaw(row, "a quote stands where none belongs")
			} else {
				b.flaw(row, "the row has "+counted(int64(len(s.cells)), "cell", "cells")+", the header "+strconv.Itoa(width))
			}
			c.torn[row], c.spareAt[row] = min(len(s.cells), width), len(c.spare)
			c.spare = append(c.spare, s.cells...)
			if c.whole {
				c.cells = append(c.cells, make([]csvCell, width)...)
			}
			for k := range sources {
				b.skip(k)
			}
			continue
		}
		if c.whole {
			c.cells = append(c.cells, s.cells...)
		}
		for k := range sources {
			cell := s.cells[sources[k].column]
			value := c.text[cell.from:cell.to]
			if cell.doubled {
				value, c.scratch = s.value(cell, c.scratch[:0])
			}
			if err := b.take(ctx, k, row, value); err != nil {
				return err
			}
		}
	}
	c.scratch = c.scratch[:0]
	return nil
}

func (c *csvStretch) place(row int) string { return "line " + strconv.Itoa(int(c.lines[row])) }

// record gives a row's own text, and whether it is one cell for each column.
func (c *csvStretch) record(row int) (text []byte, well bool) {
	_, torn := c.torn[row]
	at := c.records[row]
	return c.text[at[0]:at[1]], !torn
}

func (c *csvStretch) cell(row, column int) cell {
	var at csvCell
	if n, torn := c.torn[row]; torn {
		if column >= n {
			return cell{}
		}
		at = c.spare[c.spareAt[row]+column]
	} else {
		at = c.cells[row*len(c.in.heads)+column]
	}
	var value []byte
	value, c.scratch = c.scan.value(at, c.scratch)
	if len(value) == 0 {
		return cell{}
	}
	return cell{kind: textCell, text: value}
}
