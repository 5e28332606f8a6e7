package sheet

import (
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine/problem"
)

// expectation is one `#! column N length M code: part of message` line. It
// speaks of the line above it; expectation lines are no part of the sheet.
type expectation struct {
	at      problem.Span
	code    problem.Code
	message string
	line    int // in the file
	met     bool
}

func readBad(t *testing.T, file string) (text string, expected []*expectation) {
	t.Helper()
	content, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	var lines []string
	for i, l := range strings.Split(string(content), "\n") {
		if !strings.HasPrefix(l, "#! ") {
			lines = append(lines, l)
			continue
		}
		place, message, found := strings.Cut(l, ": ")
		f := strings.Fields(place)
		if !found || len(f) != 6 || f[1] != "column" || f[3] != "length" || message == "" {
			t.Fatalf("%s:%d: not an expectation: %s", file, i+1, l)
		}
		column, err1 := strconv.Atoi(f[2])
		length, err2 := strconv.Atoi(f[4])
		if err1 != nil || err2 != nil {
			t.Fatalf("%s:%d: not an expectation: %s", file, i+1, l)
		}
		expected = append(expected, &expectation{
			at:   problem.Span{Line: len(lines), Column: column, Length: length},
			code: problem.Code(f[5]), message: message, line: i + 1,
		})
	}
	return strings.Join(lines, "\n"), expected
}

func TestBadSheets(t *testing.T) {
	files, _ := filepath.Glob("testdata/bad/*.plumb")
	if len(files) < 8 {
		t.Fatalf("%d bad sheets found", len(files))
	}
	for _, file := range files {
		text, expected := readBad(t, file)
		var problems problem.List
		s := Parse(text, &problems)
		lines := strings.Split(text, "\n")
	next:
		for _, p := range problems.Sorted() {
			if p.Suggestion == "" {
				t.Errorf("%s: no suggestion: %s", file, p)
			}
			if strings.HasSuffix(p.Message, ".") {
				t.Errorf("%s: the message ends with a full stop: %s", file, p)
			}
			for _, e := range expected {
				if !e.met && e.at == p.Span && e.code == p.Code && strings.Contains(p.String(), e.message) {
					e.met = true
					continue next
				}
			}
			t.Errorf("%s: unexpected below %q:\n#! column %d length %d %s: %s", file, lines[p.Line-1], p.Column, p.Length, p.Code, p.Message+"; "+p.Suggestion)
		}
		for _, e := range expected {
			if !e.met {
				t.Errorf("%s:%d: missing: %s %s", file, e.line, e.code, e.message)
			}
		}
		// A statement is faulty if a problem stands on one of its lines.
		for i, statement := range s.Statements {
			last := 1 << 30
			if i+1 < len(s.Statements) {
				last = s.Statements[i+1].At().Line
			}
			found := false
			for _, p := range problems.Sorted() {
				found = found || p.Line >= statement.At().Line && p.Line < last && !strings.Contains(p.Message, "UTF-8")
			}
			if statement.Faulty() != found {
				t.Errorf("%s: line %d: faulty is %v", file, statement.At().Line, statement.Faulty())
			}
		}
		checkTidy(t, text)
	}
}
