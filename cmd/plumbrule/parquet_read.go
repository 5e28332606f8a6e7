package main

import (
	"context"
	"errors"
	"fmt"
	"io"
	"math"
	"os"
	"strconv"
	"sync/atomic"

	"github.com/parquet-go/parquet-go"

	"plumbrule/engine/rows"
)

// unitKey begins the name under which a Parquet file tells a column's unit
// among its particulars; the column's name follows.
const unitKey = "unit:"

// parquetInput reads a Parquet file of flat columns, one row group after the
// other.
type parquetInput struct {
	file      *parquet.File
	name      string
	heads     []field
	nodes     []parquet.Field
	blockRows int
	group     int   // the row group that is read
	left      int64 // of its rows
	columns   []parquetColumn
	given     atomic.Int64 // rows
	next      int64        // the row that is read next, counted from 1
}

// parquetColumn is a column of a row group that is read.
type parquetColumn struct {
	pages  parquet.Pages
	page   parquet.Page
	values parquet.ValueReader
}

// openParquet reads the columns and tells the number of rows.
func openParquet(in io.Reader, name string, size int64, blockRows int) (p *parquetInput, count int64, err error) {
	defer notParquet(name, &err)
	f, ok := in.(*os.File)
	if !ok || size < 0 {
		return nil, 0, unreadable("Parquet cannot be read from a pipe", "name a file: its particulars stand at its end")
	}
	file, err := parquet.OpenFile(f, size, parquet.SkipPageIndex(true), parquet.SkipBloomFilters(true))
	if err != nil {
		return nil, 0, unreadable("cannot read " + name + ": " + err.Error())
	}
	p = &parquetInput{file: file, name: name, blockRows: blockRows, nodes: file.Schema().Fields(), group: -1, next: 1}
	for _, node := range p.nodes {
		if !node.Leaf() || node.Repeated() {
			return nil, 0, unreadable(name+": column '"+clip(node.Name())+"' holds lists or groups", "leave it out: columns of single values are read")
		}
		f := newField(node.Name(), parquetKind(node.Type()))
		if u, told := file.Lookup(unitKey + node.Name()); told && !f.hasUnit {
			f.unit, f.hasUnit = u, true
		}
		p.heads = append(p.heads, f)
	}
	p.columns = make([]parquetColumn, len(p.nodes))
	return p, file.NumRows(), nil
}

// notParquet turns a panic of the library on a damaged file into an error.
func notParquet(name string, err *error) {
	if problem := recover(); problem != nil {
		*err = unreadable("cannot read " + name + ": the file is damaged: " + fmt.Sprint(problem))
	}
}

func (p *parquetInput) fields() []field { return p.heads }

func (p *parquetInput) taken() int64 { return p.given.Load() }

func (p *parquetInput) newStretch(bool) stretch {
	return &parquetStretch{in: p, values: make([][]parquet.Value, len(p.nodes))}
}

// parquetStretch is some rows of a row group.
type parquetStretch struct {
	in     *parquetInput
	first  int64 // row, counted from 1
	rows   int
	values [][]parquet.Value // for each column
	bytes  []byte            // what texts point to
}

func (s *parquetStretch) fill(context.Context) (err error) {
	p := s.in
	defer notParquet(p.name, &err)
	for p.left == 0 {
		p.close()
		groups := p.file.RowGroups()
		if p.group++; p.group >= len(groups) {
			return io.EOF
		}
		p.left = groups[p.group].NumRows()
		for i, chunk := range groups[p.group].ColumnChunks() {
			p.columns[i].pages = chunk.Pages()
		}
	}
	s.rows = int(min(p.left, int64(p.blockRows)))
	s.bytes = s.bytes[:0]
	for i := range p.columns {
		if cap(s.values[i]) < s.rows {
			s.values[i] = make([]parquet.Value, p.blockRows)
		}
		s.values[i] = s.values[i][:s.rows]
		if err := s.read(&p.columns[i], s.values[i]); err != nil {
			return unreadable("cannot read " + p.name + ": column '" + clip(p.heads[i].title) + "': " + err.Error())
		}
	}
	p.left -= int64(s.rows)
	s.first = p.next
	p.next += int64(s.rows)
	p.given.Add(int64(s.rows))
	return nil
}

// close lets go of the row group that is read.
func (p *parquetInput) close() {
	for i := range p.columns {
		c := &p.columns[i]
		if c.page != nil {
			parquet.Release(c.page)
		}
		if c.pages != nil {
			_ = c.pages.Close() // it was only read
		}
		*c = parquetColumn{}
	}
}

// read fills values from a column's pages. Texts are copied: a page's memory is
// used again.
func (s *parquetStretch) read(c *parquetColumn, values []parquet.Value) error {
	for n := 0; n < len(values); {
		if c.values == nil {
			page, err := c.pages.ReadPage()
			if errors.Is(err, io.EOF) {
				return errors.New("it has fewer values than its row group has rows")
			}
			if err != nil {
				return err
			}
			c.page, c.values = page, page.Values()
		}
		got, err := c.values.ReadValues(values[n:])
		for i := n; i < n+got; i++ {
			s.keep(&values[i])
		}
		n += got
		if errors.Is(err, io.EOF) || err == nil && got == 0 {
			parquet.Release(c.page)
			c.page, c.values = nil, nil
		} else if err != nil {
			return err
		}
	}
	return nil
}

// keep copies the bytes that a value points to.
func (s *parquetStretch) keep(v *parquet.Value) {
	if v.IsNull() {
		return
	}
	switch v.Kind() {
	case parquet.ByteArray, parquet.FixedLenByteArray:
		from := len(s.bytes)
		s.bytes = append(s.bytes, v.ByteArray()...)
		own := s.bytes[from:len(s.bytes):len(s.bytes)]
		copied := parquet.ByteArrayValue(own)
		if v.Kind() == parquet.FixedLenByteArray {
			copied = parquet.FixedLenByteArrayValue(own)
		}
		*v = copied.Level(v.RepetitionLevel(), v.DefinitionLevel(), v.Column())
	case parquet.Int96:
		*v = v.Clone()
	}
}

func (s *parquetStretch) parse(ctx context.Context, b *block) error {
	b.rows = s.rows
	sources := b.run.layout.sources
	for k := range sources {
		if ctx.Err() != nil {
			return ctx.Err()
		}
		if sources[k].form == rows.Number && s.numbers(b, k) {
			continue
		}
		for row := range s.rows {
			c := s.cell(row, sources[k].column)
			text := c.text
			switch c.kind {
			case noCell:
				b.skip(k)
				continue
			case truthCell:
				text = []byte(truthText(float64(c.whole)))
			case wholeCell:
				text = strconv.AppendInt(nil, c.whole, 10)
			case numberCell:
				text = strconv.AppendFloat(nil, c.number, 'g', -1, 64)
			}
			if err := b.take(ctx, k, row, text); err != nil {
				return err
			}
		}
	}
	return nil
}

// numbers brings a column of plain numbers into the block as it stands; it says
// false where the column holds something else. NaN is a missing value.
func (s *parquetStretch) numbers(b *block, source int) bool {
	column := b.run.layout.sources[source].column
	if kind := s.in.heads[column].kind; kind != numberField && kind != wholeField {
		return false
	}
	signed := !unsigned(s.in.nodes[column].Type())
	for row, v := range s.values[column] {
		x := math.NaN()
		if !v.IsNull() {
			switch v.Kind() {
			case parquet.Double:
				x = v.Double()
			case parquet.Float:
				x = float64(v.Float())
			case parquet.Int32:
				if x = float64(v.Int32()); !signed {
					x = float64(v.Uint32())
				}
			case parquet.Int64:
				if x = float64(v.Int64()); !signed {
					x = float64(v.Uint64())
				}
			}
		}
		if math.IsInf(x, 0) {
			b.flawCell(row, source, "the number is not finite")
			x = math.NaN()
		}
		b.columns[source] = append(b.columns[source], x)
	}
	return true
}

func (s *parquetStretch) place(row int) string {
	return "row " + strconv.FormatInt(s.first+int64(row), 10)
}
