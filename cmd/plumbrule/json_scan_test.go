package main

import (
	"bytes"
	"encoding/json"
	"reflect"
	"testing"
)

// FuzzJSONLines compares the scanner with encoding/json: the same lines are
// objects, with the same members.
func FuzzJSONLines(f *testing.F) {
	for _, text := range []string{
		"", "{}", "{ }\n", `{"a":1}`, ` { "a" : 1 , "b" : "x,}\"\\" }` + "\r\n", `{"a":{"b":[1,{"c":"}"}]},"d":null}`, `{"\u0061":"\ud800"}`,
		"{\"a\":\"\xff\"}", `[1]`, `{"a":1}{"b":2}`, `{"a":tru}`, "\n\n{\"a\":true}\n", `{"a":-1.5e+3,"b":false}`, `{"a":1,"a":2}`,
	} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		s := jsonScanner{text: []byte(text), line: 1}
		for _, line := range bytes.Split([]byte(text), []byte{'\n'}) {
			if len(bytes.Trim(line, " \t\r")) == 0 {
				continue
			}
			if !s.next() {
				t.Fatalf("%q: no line, not %q", text, line)
			}
			var want map[string]any
			well := json.Unmarshal(line, &want) == nil && want != nil
			if s.well != well {
				t.Fatalf("%q: an object %v, not %v", line, s.well, well)
			}
			if !well {
				continue
			}
			got := map[string]any{}
			for _, m := range s.members {
				var value any
				if err := json.Unmarshal(s.text[m.from:m.to], &value); err != nil {
					t.Fatalf("%q: value %q: %v", line, s.text[m.from:m.to], err)
				}
				if text, is := value.(string); is && string(unquoted(s.text[m.from:m.to])) != text {
					t.Fatalf("%q: text %q", line, unquoted(s.text[m.from:m.to]))
				}
				got[string(unquoted(s.text[m.nameFrom:m.nameTo]))] = value
			}
			if !reflect.DeepEqual(got, want) {
				t.Fatalf("%q: %v, not %v", line, got, want)
			}
		}
		if s.next() {
			t.Fatalf("%q: one line too many", text)
		}
		quoted := appendJSONText(nil, text)
		var back string
		if err := json.Unmarshal(quoted, &back); err != nil || back != string(bytes.ToValidUTF8([]byte(text), nil)) && back != string([]rune(text)) {
			t.Fatalf("%q is written as %s and read as %q", text, quoted, back)
		}
	})
}
