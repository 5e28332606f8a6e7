package abi

import (
	"math"
	"strconv"
	"unicode/utf8"

	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
)

// The documents are written by plain appends, which keeps the module small.

// writer appends JSON. Commas are placed by what stands before.
type writer struct {
	text []byte
}

func (w *writer) comma() {
	if n := len(w.text); n > 0 && w.text[n-1] != '{' && w.text[n-1] != '[' && w.text[n-1] != ':' {
		w.text = append(w.text, ',')
	}
}

func (w *writer) open(bracket byte)  { w.comma(); w.text = append(w.text, bracket) }
func (w *writer) close(bracket byte) { w.text = append(w.text, bracket) }

func (w *writer) key(name string) {
	w.comma()
	w.text = appendText(w.text, name)
	w.text = append(w.text, ':')
}

func (w *writer) string(key, value string) { w.key(key); w.text = appendText(w.text, value) }

func (w *writer) number(key string, value float64) {
	w.key(key)
	if math.IsNaN(value) || math.IsInf(value, 0) {
		w.text = append(w.text, "null"...)
		return
	}
	w.text = strconv.AppendFloat(w.text, value, 'g', -1, 64)
}

func (w *writer) int(key string, value int) {
	w.key(key)
	w.text = strconv.AppendInt(w.text, int64(value), 10)
}

func (w *writer) bool(key string, value bool) {
	w.key(key)
	w.text = strconv.AppendBool(w.text, value)
}

func (w *writer) strings(key string, values []string) {
	w.key(key)
	w.text = append(w.text, '[')
	for i, value := range values {
		if i > 0 {
			w.text = append(w.text, ',')
		}
		w.text = appendText(w.text, value)
	}
	w.text = append(w.text, ']')
}

const hexDigits = "0123456789abcdef"

// appendText appends a JSON string; bytes that are no UTF-8 become U+FFFD.
func appendText(dst []byte, text string) []byte {
	dst = append(dst, '"')
	for _, r := range text {
		switch {
		case r == '"' || r == '\\':
			dst = append(dst, '\\', byte(r))
		case r == '\n':
			dst = append(dst, '\\', 'n')
		case r < 0x20:
			dst = append(dst, '\\', 'u', '0', '0', hexDigits[r>>4], hexDigits[r&15])
		default:
			dst = utf8.AppendRune(dst, r)
		}
	}
	return append(dst, '"')
}

func (w *writer) scale(s rows.Scale) {
	w.key("scale")
	w.open('{')
	w.number("before", s.Before)
	w.number("multiply", s.Multiply)
	w.number("divide", s.Divide)
	w.close('}')
}

func (w *writer) problems(key string, problems []problem.Problem) {
	w.key(key)
	w.open('[')
	for _, p := range problems {
		w.open('{')
		w.int("line", p.Line)
		w.int("column", p.Column)
		w.int("length", p.Length)
		w.string("code", string(p.Code))
		w.string("message", p.Message)
		w.string("suggestion", p.Suggestion)
		w.close('}')
	}
	w.close(']')
}

// Compiled is the document of plumbrule_compile: a program number, 0 where
// there are problems, and either the description or the problems.
type Compiled struct {
	Program int `json:"program"`
	rows.Description
	Problems []problem.Problem `json:"problems"`
}

// Append appends the document as JSON.
func (c *Compiled) Append(dst []byte) []byte {
	w := writer{text: dst}
	w.open('{')
	w.int("program", c.Program)
	w.string("title", c.Title)
	w.key("knowns")
	w.open('[')
	for i := range c.Knowns {
		k := &c.Knowns[i]
		w.open('{')
		w.string("name", k.Name)
		w.string("form", string(k.Form))
		w.string("unit", k.Unit)
		w.scale(k.Scale)
		w.string("note", k.Note)
		w.number("value", k.Value)
		w.bool("has_value", k.HasValue)
		w.strings("choices", k.Choices)
		w.bool("has_range", k.HasRange)
		w.number("low", k.Low)
		w.number("high", k.High)
		w.int("line", k.Line)
		w.close('}')
	}
	w.close(']')
	w.key("entries")
	w.open('[')
	for i := range c.Entries {
		e := &c.Entries[i]
		w.open('{')
		w.string("name", e.Name)
		w.string("role", string(e.Role))
		w.string("form", string(e.Form))
		w.string("unit", e.Unit)
		w.scale(e.Scale)
		w.string("note", e.Note)
		w.int("line", e.Line)
		w.close('}')
	}
	w.close(']')
	w.key("cautions")
	w.open('[')
	for _, caution := range c.Cautions {
		w.open('{')
		w.string("law", caution.Law)
		w.string("text", caution.Text)
		w.close('}')
	}
	w.close(']')
	w.problems("notices", c.Notices)
	w.problems("problems", c.Problems)
	w.int("cost", c.Cost)
	w.close('}')
	return w.text
}

// AppendReasons appends the table of reasons as JSON.
func AppendReasons(dst []byte, reasons []rows.Reason) []byte {
	w := writer{text: dst}
	w.open('[')
	for _, r := range reasons {
		w.open('{')
		w.string("text", r.Text)
		w.string("law", r.Law)
		w.string("argument", r.Argument)
		w.string("bound", r.Bound)
		w.string("unit", r.Unit)
		w.scale(r.Scale)
		w.bool("below", r.Below)
		w.close('}')
	}
	w.close(']')
	return w.text
}

// AppendTallies appends the tallies of a run as JSON.
func AppendTallies(dst []byte, tallies []rows.Tally) []byte {
	w := writer{text: dst}
	w.open('[')
	for _, t := range tallies {
		w.open('{')
		w.int("entry", t.Entry)
		w.int("reason", t.Reason)
		w.int("state", int(t.State))
		w.int("rows", t.Rows)
		w.number("worst", t.Worst)
		w.bool("has_worst", t.HasWorst)
		w.close('}')
	}
	w.close(']')
	return w.text
}

// AppendLimits appends the limits as JSON.
func AppendLimits(dst []byte, limits map[string]int, order []string) []byte {
	w := writer{text: dst}
	w.open('{')
	w.int("version", Version)
	for _, name := range order {
		w.int(name, limits[name])
	}
	w.close('}')
	return w.text
}

// AppendFault appends a fault in words as JSON.
func AppendFault(dst []byte, text string) []byte {
	w := writer{text: dst}
	w.open('{')
	w.string("fault", text)
	w.close('}')
	return w.text
}
