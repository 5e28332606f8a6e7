package main

import (
	"context"
	"strings"

	"plumbrule/engine/rows"
)

// The forms of data files.
const (
	csvFormat     = "csv"
	jsonFormat    = "jsonl"
	parquetFormat = "parquet"
)

// formatOf gives the form of a data file: the one asked for, or that of the
// file's extension, or else CSV.
func formatOf(flag, asked, file string) (string, error) {
	switch asked {
	case csvFormat, jsonFormat, parquetFormat:
		return asked, nil
	case "":
	default:
		return "", usage(flag+" "+asked+": data is in csv, jsonl or parquet", "write "+flag+" csv")
	}
	name := strings.ToLower(file)
	switch {
	case strings.HasSuffix(name, ".jsonl"), strings.HasSuffix(name, ".ndjson"):
		return jsonFormat, nil
	case strings.HasSuffix(name, ".parquet"):
		return parquetFormat, nil
	}
	return csvFormat, nil
}

// fieldType says what a column of data holds, as far as its file tells.
type fieldType byte

const (
	anyField    fieldType = iota // texts that may stand for anything, as in CSV
	textField                    // texts
	numberField                  // floating-point numbers
	wholeField                   // integers of 64 bits
	truthField                   // true or false
)

// String names what a column holds.
func (t fieldType) String() string {
	switch t {
	case textField:
		return "texts"
	case numberField:
		return "numbers"
	case wholeField:
		return "integers"
	case truthField:
		return "truth values"
	}
	return "cells"
}

// field is a column of the data: its name as written, the quantity's name and
// unit taken from it, and its type.
type field struct {
	title   string // "depth [m]"
	name    string // "depth"
	unit    string // "m"; from the title, or from the file's own particulars
	hasUnit bool
	kind    fieldType
}

// newField takes a column's title apart.
func newField(title string, kind fieldType) field {
	f := field{title: title, kind: kind}
	f.name, f.unit, f.hasUnit = splitHeader(title)
	return f
}

// cellKind says what a cell holds.
type cellKind byte

const (
	noCell     cellKind = iota // nothing
	textCell                   // text
	numberCell                 // number
	wholeCell                  // whole
	truthCell                  // whole: 1 or 0
	jsonCell                   // text is a JSON value: a number, an object, an array
)

// cell is one cell of the data. Its text is good until the block is filled again.
type cell struct {
	kind   cellKind
	text   []byte
	number float64
	whole  int64
}

// input reads a data file.
type input interface {
	fields() []field
	// newStretch makes room for some rows. whole: cells of all columns will be
	// asked for.
	newStretch(whole bool) stretch
	// taken is how much of the data is read: bytes, or rows where row says so.
	taken() int64
}

// stretch is some rows of the data.
type stretch interface {
	// fill takes the next rows from the data, one stretch after the other;
	// io.EOF at the end.
	fill(ctx context.Context) error
	// parse finds the rows, counts them, and brings the cells of the known
	// columns into the block. Stretches are parsed side by side.
	parse(ctx context.Context, b *block) error
	// place names a row in messages: "line 7".
	place(row int) string
	// cell gives a cell of a row, once the stretch is parsed.
	cell(row, column int) cell
}

// output writes the evaluated rows.
type output interface {
	// begin writes what stands before the first row.
	begin() error
	// print makes a block's bytes, side by side with other blocks.
	print(b *block)
	// write writes a block, one after the other in their order.
	write(b *block) error
	// end writes what stands behind the last row.
	end() error
}

// result is what an entry came to in a row, as it is written: in its unit.
type result struct {
	kind   cellKind // noCell, numberCell, truthCell, or textCell for a verdict
	text   string
	number float64
}

// resultOf gives an entry's result; the state says that there is one.
func resultOf(e *rows.Entry, value float64) result {
	switch {
	case e.Role == rows.Requirement:
		return result{kind: textCell, text: verdictOf(rows.Sound, value)}
	case e.Form == rows.Truth:
		return result{kind: truthCell, number: value}
	}
	return result{kind: numberCell, number: e.Scale.FromSI(value)}
}
