package main

import (
	"bytes"
	"encoding/csv"
	"errors"
	"io"
	"slices"
	"strings"
	"testing"
)

// FuzzCSV compares the scanner with encoding/csv: the same records, the same
// cells, the same records with wrong quotes, wherever the text is cut.
func FuzzCSV(f *testing.F) {
	for _, text := range []string{
		"", "\n", "\r\n", "\r", "a,b\n1,2\n", "a,b\r\n1,2\r\n", "a\rb\n", "\"a\",\"b\"\n", "\"a\"\"b\"\n", "\"a\nb\",c\n", "\"a\r\nb\"\r\n",
		"\"a\"b,c\nd\n", "a\"b\nc\n", "a,\"b", "a,\"b\n", "\"\"\n", "\"\"\"\"\n", "\"\"", ",\n", ",,", "a,\n\n\nb,c", "\"a\"\r", "\"a\"\rb\n", "a\r", "a\r\r\n",
		"\"\na\n\"x\nb,c\n", "1,\"2\n3\"\"4\n\",5\n6\n",
	} {
		f.Add(text, 3)
	}
	f.Fuzz(func(t *testing.T, text string, cut int) {
		reader := csv.NewReader(strings.NewReader(text))
		reader.FieldsPerRecord = -1
		all := csvScanner{text: []byte(text), line: 1}
		for {
			want, err := reader.Read()
			var torn *csv.ParseError
			found := all.next()
			if errors.Is(err, io.EOF) {
				if found {
					t.Fatalf("%q: a record at %d where there is none", text, all.from)
				}
				break
			}
			if !found {
				t.Fatalf("%q: no record, not %q", text, want)
			}
			if all.torn != errors.As(err, &torn) {
				t.Fatalf("%q: torn %v, not %v", text, all.torn, err)
			}
			if all.torn {
				if all.begin != torn.StartLine {
					t.Fatalf("%q: a torn record in line %d, not %d", text, all.begin, torn.StartLine)
				}
				continue
			}
			if err != nil {
				t.Fatal(err)
			}
			if got := cellsOf(&all); !slices.Equal(got, want) {
				t.Fatalf("%q: %q, not %q", text, got, want)
			}
			if line, _ := reader.FieldPos(0); all.begin != line {
				t.Fatalf("%q: line %d, not %d", text, all.begin, line)
			}
		}
		// Cut anywhere, the whole records of the first part and what follows
		// them make up the same.
		cut = max(0, min(cut, len(text)))
		end := cutRecords([]byte(text[:cut]))
		whole := records([]byte(text))
		parts := append(records([]byte(text[:end])), records([]byte(text[end:]))...)
		if !slices.Equal(parts, whole) {
			t.Fatalf("%q cut at %d: %q, not %q", text, end, parts, whole)
		}
	})
}

// cellsOf gives the record's cells as encoding/csv does, which turns a carriage
// return and line feed inside of a cell into a line feed.
func cellsOf(s *csvScanner) []string {
	var cells []string
	for _, c := range s.cells {
		value, _ := s.value(c, nil)
		cells = append(cells, strings.ReplaceAll(string(value), "\r\n", "\n"))
	}
	return cells
}

func records(text []byte) []string {
	var list []string
	for s := (csvScanner{text: text, line: 1}); s.next(); {
		list = append(list, strings.Join(cellsOf(&s), "\x00"))
	}
	return list
}

const fourCells = "K-1,1180.25,38.52,0.21\n"

func BenchmarkCSVScanner(b *testing.B) {
	text := bytes.Repeat([]byte(fourCells), 10_000)
	b.SetBytes(int64(len(text)))
	s := csvScanner{}
	for b.Loop() {
		s.text, s.at, s.line = text, 0, 1
		for s.next() {
		}
	}
}

func BenchmarkEncodingCSV(b *testing.B) {
	text := bytes.Repeat([]byte(fourCells), 10_000)
	b.SetBytes(int64(len(text)))
	for b.Loop() {
		r := csv.NewReader(bytes.NewReader(text))
		r.ReuseRecord = true
		for {
			if _, err := r.Read(); err != nil {
				break
			}
		}
	}
}
