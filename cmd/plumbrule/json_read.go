package main

import (
	"context"
	"errors"
	"io"
	"strconv"

	"plumbrule/engine/rows"
)

// jsonSample is how many bytes of JSON lines are looked at for the columns: a
// fixed size, so that they do not depend on how the data is cut.
const jsonSample = 1 << 20

// jsonInput reads JSON lines: an object a line. Its columns are the keys of the
// first lines, in the order in which they turn up.
type jsonInput struct {
	feed  *feed
	heads []field
	index map[string]int // by key
}

// openJSON finds the columns.
func openJSON(in io.Reader, file string, size int) (*jsonInput, error) {
	j := &jsonInput{feed: newFeed(in, file, jsonSample, cutLines), index: map[string]int{}}
	text, line, err := j.feed.fill(nil)
	if errors.Is(err, io.EOF) {
		return nil, unreadable(file+" is empty", `write an object a line: {"name [unit]": 1}`)
	}
	if err != nil {
		return nil, err
	}
	s := jsonScanner{text: text, line: line}
	var kinds []jsonKinds
	objects := 0
	for s.next() {
		if !s.well {
			continue
		}
		objects++
		for _, m := range s.members {
			key := string(unquoted(text[m.nameFrom:m.nameTo]))
			at, found := j.index[key]
			if !found {
				at = len(kinds)
				j.index[key] = at
				kinds = append(kinds, jsonKinds{})
				j.heads = append(j.heads, newField(key, anyField))
			}
			kinds[at].see(text[m.from:m.to])
		}
	}
	if objects == 0 {
		return nil, unreadable(file+" has no JSON object among its first lines", `write an object a line: {"name [unit]": 1}`)
	}
	for i := range kinds {
		j.heads[i].kind = kinds[i].field()
	}
	j.feed.giveBack(text, line)
	j.feed.size = size
	return j, nil
}

// jsonKinds is what the values of a key are.
type jsonKinds struct{ texts, truths, numbers, wholes, large, others bool }

func (k *jsonKinds) see(value []byte) {
	const exact = 1 << 53 // integers up to it are float64s
	switch value[0] {
	case '"':
		k.texts = true
	case 't', 'f':
		k.truths = true
	case 'n':
	case '{', '[':
		k.others = true
	default:
		n, err := strconv.ParseInt(string(value), 10, 64)
		k.wholes = k.wholes || err == nil
		k.numbers = k.numbers || err != nil
		k.large = k.large || err == nil && (n > exact || n < -exact)
	}
}

// field gives the type that suits all values. Integers are numbers like
// others unless float64 cannot hold one of them.
func (k *jsonKinds) field() fieldType {
	number := k.numbers || k.wholes
	switch {
	case k.others:
		return anyField
	case k.texts && !k.truths && !number:
		return textField
	case k.truths && !k.texts && !number:
		return truthField
	case number && !k.texts && !k.truths && k.large && !k.numbers:
		return wholeField
	case number && !k.texts && !k.truths:
		return numberField
	}
	return anyField
}

func (j *jsonInput) fields() []field { return j.heads }

func (j *jsonInput) taken() int64 { return j.feed.taken.Load() }

func (j *jsonInput) newStretch(bool) stretch { return &jsonStretch{in: j} }

// jsonStretch is some rows of JSON lines.
type jsonStretch struct {
	in    *jsonInput
	text  []byte
	line  int
	scan  jsonScanner
	lines []int32    // for each row its line
	own   [][2]int32 // for each row where its text stands, or nowhere: it is not to be written as it is
	cells [][2]int32 // for each row where the values of its columns stand
}

func (j *jsonStretch) fill(context.Context) error {
	var err error
	j.text, j.line, err = j.in.feed.fill(j.text)
	return err
}

func (j *jsonStretch) parse(ctx context.Context, b *block) error {
	width := len(j.in.heads)
	sources := b.run.layout.sources
	j.scan.text, j.scan.at, j.scan.line = j.text, 0, j.line
	j.lines, j.own, j.cells = j.lines[:0], j.own[:0], j.cells[:0]
	s := &j.scan
	for s.next() {
		row := b.rows
		if row%4096 == 0 && ctx.Err() != nil {
			return ctx.Err()
		}
		b.rows++
		j.lines = append(j.lines, int32(s.begin))
		for range width {
			j.cells = append(j.cells, [2]int32{})
		}
		cells := j.cells[row*width:]
		own := [2]int32{int32(s.from), int32(s.to)}
		if !s.well {
			own = [2]int32{}
			b.flaw(row, "the line is no JSON object")
		}
		for _, m := range s.members {
			at, known := j.in.index[string(unquoted(j.text[m.nameFrom:m.nameTo]))]
			switch {
			case !known:
				own = [2]int32{}
				b.flaw(row, "the key '"+clip(string(unquoted(j.text[m.nameFrom:m.nameTo])))+"' is not among those of the first lines")
			case cells[at][1] != 0:
				own = [2]int32{}
				b.flaw(row, "the key '"+clip(j.in.heads[at].title)+"' stands twice")
			default:
				cells[at] = [2]int32{m.from, m.to}
				j.check(b, row, at)
			}
		}
		j.own = append(j.own, own)
		for k := range sources {
			c := j.cell(row, sources[k].column)
			if c.kind == noCell {
				b.skip(k)
				continue
			}
			text := c.text
			if c.kind == truthCell {
				text = []byte(truthText(float64(c.whole)))
			}
			if err := b.take(ctx, k, row, text); err != nil {
				return err
			}
		}
	}
	return nil
}

// check refuses a row whose cell an output with typed columns cannot hold.
func (j *jsonStretch) check(b *block, row, column int) {
	if b.run.to != parquetFormat || b.run.layout.sourceOf[column] >= 0 {
		return
	}
	f, c := &j.in.heads[column], j.cell(row, column)
	well := true
	switch f.kind {
	case numberField:
		_, err := strconv.ParseFloat(string(c.text), 64)
		well = c.kind == jsonCell && err == nil
	case wholeField:
		_, err := strconv.ParseInt(string(c.text), 10, 64)
		well = c.kind == jsonCell && err == nil
	case truthField:
		well = c.kind == truthCell
	case textField:
		well = c.kind == textCell
	}
	if !well && c.kind != noCell {
		b.flaw(row, f.title+": the column holds "+f.kind.String()+", and '"+clip(string(c.text))+"' is something else")
	}
}

func (j *jsonStretch) place(row int) string { return "line " + strconv.Itoa(int(j.lines[row])) }

func (j *jsonStretch) cell(row, column int) cell {
	at := j.cells[row*len(j.in.heads)+column]
	raw := j.text[at[0]:at[1]]
	if len(raw) == 0 {
		return cell{}
	}
	switch raw[0] {
	case 'n':
		return cell{}
	case 't':
		return cell{kind: truthCell, whole: 1}
	case 'f':
		return cell{kind: truthCell}
	case '"':
		text := unquoted(raw)
		if len(text) == 0 {
			return cell{}
		}
		return cell{kind: textCell, text: text}
	}
	return cell{kind: jsonCell, text: raw}
}

// typed gives a cell of the data as an output with types writes it: a known's
// number or truth value as such, and what could not be read as it stands.
func (b *block) typed(row, column int) cell {
	c := b.stretch.cell(row, column)
	s := b.run.layout.sourceOf[column]
	if s < 0 || c.kind == noCell {
		return c
	}
	x := b.shown[s][row]
	if x != x {
		return c
	}
	switch b.run.layout.sources[s].form {
	case rows.Number:
		return cell{kind: numberCell, number: x}
	case rows.Truth:
		return cell{kind: truthCell, whole: int64(x)}
	}
	return c
}
