package main

import (
	"io"
	"strings"
	"unicode"

	"github.com/jedib0t/go-pretty/v6/table"
	"github.com/jedib0t/go-pretty/v6/text"
)

// plainLook draws no boxes: columns with two blanks between them, a thin rule
// under the header and between groups of rows.
func plainLook() table.Style {
	return table.Style{
		Name: "plain",
		Box: table.BoxStyle{
			MiddleHorizontal: "─",
			PaddingRight:     "  ",
		},
		Format:  table.FormatOptions{Header: text.FormatDefault, Row: text.FormatDefault},
		Options: table.Options{SeparateHeader: true},
	}
}

// grid is a table in the making. Groups of rows are split by a thin rule.
type grid struct {
	header []string
	groups [][][]string
	// numbers names the columns whose numbers are aligned.
	numbers map[int]bool
}

func newGrid(header ...string) *grid { return &grid{header: header, numbers: map[int]bool{}} }

func (g *grid) group() {
	if n := len(g.groups); n == 0 || len(g.groups[n-1]) > 0 {
		g.groups = append(g.groups, nil)
	}
}

func (g *grid) row(cells ...string) {
	if len(g.groups) == 0 {
		g.group()
	}
	last := len(g.groups) - 1
	g.groups[last] = append(g.groups[last], cells)
}

func (g *grid) empty() bool { return len(g.groups) == 0 || len(g.groups[0]) == 0 }

// write draws the table. Columns without any text are left out.
func (g *grid) write(w io.Writer) error {
	keep := g.used()
	for column := range g.numbers {
		g.align(column)
	}
	t := table.NewWriter()
	t.SetStyle(plainLook())
	t.SuppressTrailingSpaces()
	t.AppendHeader(pick(g.header, keep))
	for i, rows := range g.groups {
		if i > 0 && len(rows) > 0 {
			t.AppendSeparator()
		}
		for _, cells := range rows {
			t.AppendRow(pick(cells, keep))
		}
	}
	_, err := io.WriteString(w, t.Render()+"\n")
	return err
}

func (g *grid) used() []bool {
	keep := make([]bool, len(g.header))
	for _, rows := range g.groups {
		for _, cells := range rows {
			for i, cell := range cells {
				keep[i] = keep[i] || cell != ""
			}
		}
	}
	return keep
}

func (g *grid) align(column int) {
	var cells []string
	for _, rows := range g.groups {
		for _, row := range rows {
			cells = append(cells, row[column])
		}
	}
	padded := aligned(cells)
	for _, rows := range g.groups {
		for _, row := range rows {
			row[column], padded = padded[0], padded[1:]
		}
	}
}

func pick(cells []string, keep []bool) table.Row {
	var row table.Row
	for i, cell := range cells {
		if keep[i] {
			row = append(row, printable(cell))
		}
	}
	return row
}

// printable replaces control characters, which could change what a terminal
// shows, by blanks.
func printable(s string) string {
	return strings.Map(func(c rune) rune {
		if unicode.IsControl(c) {
			return ' '
		}
		return c
	}, s)
}

// runeWidth is how many columns a character takes on a terminal.
func runeWidth(c rune) int {
	if unicode.IsControl(c) {
		return 1
	}
	return text.StringWidthWithoutEscSequences(string(c))
}
