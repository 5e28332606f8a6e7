package main

import (
	"io"
	"reflect"
	"strconv"

	"github.com/parquet-go/parquet-go"

	"plumbrule/engine/rows"
)

// Pages and row groups end after fixed numbers of rows, so that the bytes do
// not depend on how the data is cut. A row group is what is held in memory.
const (
	parquetPageRows  = 8192
	parquetGroupRows = 16 * parquetPageRows
)

// parquetOutput writes Parquet: the data's own columns, the entries, the row's
// worst state and the first reason for it. Texts of CSV stay texts; columns of
// Parquet keep their types.
type parquetOutput struct {
	layout  *layout
	writer  *parquet.GenericWriter[any]
	columns []*parquet.ColumnWriter
	levels  []int // for each column the definition level of a value
	rows    int
}

// orderedGroup is a schema's root whose columns keep their order.
type orderedGroup struct {
	parquet.Group
	columns []parquet.Field
}

func (g orderedGroup) Fields() []parquet.Field { return g.columns }

// GoType is no struct that rows would be made of: columns are written.
func (g orderedGroup) GoType() reflect.Type { return reflect.TypeFor[struct{}]() }

// namedColumn is a column of a schema.
type namedColumn struct {
	parquet.Node
	name string
}

func (c namedColumn) Name() string { return c.name }

// Value gives the column's value in a struct; there are none.
func (c namedColumn) Value(base reflect.Value) reflect.Value { return base }

func newParquetOutput(w io.Writer, l *layout, d *rows.Description, nodes []parquet.Field) *parquetOutput {
	p := &parquetOutput{layout: l}
	root := orderedGroup{Group: parquet.Group{}}
	options := []parquet.WriterOption{
		parquet.Compression(&parquet.Snappy),
		parquet.PageBufferSize(1 << 30), // pages are ended here, by their rows
		parquet.CreatedBy("plumbrule", "", ""),
	}
	add := func(name string, node parquet.Node, unit string) {
		root.columns = append(root.columns, namedColumn{node, name})
		root.Group[name] = node
		level := 0
		if node.Optional() {
			level = 1
		}
		p.levels = append(p.levels, level)
		if unit != "" {
			options = append(options, parquet.KeyValueMetadata(unitKey+name, unit))
		}
	}
	for _, i := range l.kept {
		f := &l.fields[i]
		unit := f.unit
		if s := l.sourceOf[i]; s >= 0 && !f.hasUnit && l.sources[s].form == rows.Number {
			unit = d.Knowns[l.sources[s].known].Unit
		}
		if nodes != nil {
			node := parquet.Leaf(nodes[i].Type())
			if nodes[i].Optional() {
				node = parquet.Optional(node)
			}
			add(f.title, node, unit)
			continue
		}
		add(f.title, parquet.Optional(fieldNode(f, l.sourceForm(i))), unit)
	}
	for i, name := range l.names {
		unit := ""
		if d.Entries[i].Form == rows.Number {
			unit = d.Entries[i].Unit
		}
		add(name, parquet.Optional(entryNode(&d.Entries[i])), unit)
	}
	add(stateColumn, parquet.Optional(fewTexts()), "")
	add(reasonColumn, parquet.Optional(fewTexts()), "")
	options = append(options, parquet.NewSchema("rows", root))
	p.writer = parquet.NewGenericWriter[any](w, options...)
	p.columns = p.writer.ColumnWriters()
	return p
}

// fewTexts is a column of texts that are often the same.
func fewTexts() parquet.Node { return parquet.Encoded(parquet.String(), &parquet.RLEDictionary) }

// fieldNode is the column for a column of other data.
func fieldNode(f *field, form rows.Form) parquet.Node {
	switch {
	case form == rows.Number, form == "" && f.kind == numberField:
		return parquet.Leaf(parquet.DoubleType)
	case form == rows.Truth, form == "" && f.kind == truthField:
		return parquet.Leaf(parquet.BooleanType)
	case form == rows.Choice:
		return fewTexts()
	case f.kind == wholeField:
		return parquet.Leaf(parquet.Int64Type)
	}
	return parquet.String()
}

func entryNode(e *rows.Entry) parquet.Node {
	switch {
	case e.Role == rows.Requirement:
		return fewTexts()
	case e.Form == rows.Truth:
		return parquet.Leaf(parquet.BooleanType)
	}
	return parquet.Leaf(parquet.DoubleType)
}

func (p *parquetOutput) begin() error { return nil }

// print makes a block's values, column by column.
func (p *parquetOutput) print(b *block) {
	same, _ := b.stretch.(*parquetStretch)
	if b.leaves == nil {
		b.leaves = make([][]parquet.Value, len(p.levels))
	}
	column := 0
	next := func() (at int, values []parquet.Value) {
		if cap(b.leaves[column]) < b.rows {
			b.leaves[column] = make([]parquet.Value, b.rows+b.rows/4)
		}
		b.leaves[column] = b.leaves[column][:b.rows]
		column++
		return column - 1, b.leaves[column-1]
	}
	put := func(to *parquet.Value, v parquet.Value, column int) {
		level := 0
		if !v.IsNull() {
			level = p.levels[column]
		}
		*to = v.Level(0, level, column)
	}
	for _, i := range p.layout.kept {
		at, values := next()
		kind := anyField
		if same == nil {
			kind = columnKind(&p.layout.fields[i], p.layout.sourceForm(i))
		}
		for row := range values {
			if same != nil {
				put(&values[row], same.values[i][row], at)
				continue
			}
			put(&values[row], leafOf(b.typed(row, i), kind), at)
		}
	}
	for e := range b.entries {
		at, values := next()
		for row := range values {
			v := parquet.NullValue()
			if b.computed(e, row) {
				v = leafOfResult(resultOf(&b.entries[e], b.out.Values[e][row]))
			}
			put(&values[row], v, at)
		}
	}
	at, states := next()
	_, reasons := next()
	for row := range states {
		state, reason := b.worst(row)
		put(&states[row], parquet.ByteArrayValue([]byte(state.String())), at)
		v := parquet.NullValue()
		if reason != "" {
			v = parquet.ByteArrayValue([]byte(reason))
		}
		put(&reasons[row], v, at+1)
	}
}

// columnKind is what the column holds that fieldNode makes.
func columnKind(f *field, form rows.Form) fieldType {
	switch form {
	case rows.Number:
		return numberField
	case rows.Truth:
		return truthField
	case rows.Choice:
		return textField
	}
	if f.kind == anyField {
		return textField
	}
	return f.kind
}

// leafOf gives a cell as a value of a column's type; none where it does not
// suit, which the row's reason tells.
func leafOf(c cell, kind fieldType) parquet.Value {
	switch {
	case c.kind == noCell:
	case kind == textField:
		return parquet.ByteArrayValue(textOf(c))
	case kind == truthField && c.kind == truthCell:
		return parquet.BooleanValue(c.whole != 0)
	case kind == numberField && c.kind == numberCell:
		return parquet.DoubleValue(c.number)
	case kind == numberField && c.kind == jsonCell:
		if x, err := strconv.ParseFloat(string(c.text), 64); err == nil {
			return parquet.DoubleValue(x)
		}
	case kind == wholeField && c.kind == jsonCell:
		if x, err := strconv.ParseInt(string(c.text), 10, 64); err == nil {
			return parquet.Int64Value(x)
		}
	}
	return parquet.NullValue()
}

// textOf gives a cell as a text.
func textOf(c cell) []byte {
	switch c.kind {
	case truthCell:
		return []byte(truthText(float64(c.whole)))
	case numberCell:
		return appendShortest(nil, c.number)
	case wholeCell:
		return strconv.AppendInt(nil, c.whole, 10)
	}
	return c.text
}

func leafOfResult(r result) parquet.Value {
	switch r.kind {
	case textCell:
		return parquet.ByteArrayValue([]byte(r.text))
	case truthCell:
		return parquet.BooleanValue(r.number != 0)
	}
	return parquet.DoubleValue(r.number)
}

// write brings a block's values to the columns, in pieces that end where pages
// and row groups do.
func (p *parquetOutput) write(b *block) error {
	for from := 0; from < b.rows; {
		to := min(b.rows, from+parquetPageRows-p.rows%parquetPageRows)
		for i, column := range p.columns {
			if _, err := column.WriteRowValues(b.leaves[i][from:to]); err != nil {
				return err
			}
		}
		p.rows += to - from
		from = to
		if p.rows%parquetGroupRows == 0 {
			if err := p.writer.Flush(); err != nil {
				return err
			}
		} else if p.rows%parquetPageRows == 0 {
			for _, column := range p.columns {
				if err := column.Flush(); err != nil {
					return err
				}
			}
		}
	}
	return nil
}

func (p *parquetOutput) end() error { return p.writer.Close() }
