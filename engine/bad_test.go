package engine_test

import (
	"os"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine/problem"
)

// expectation is a line `#! column N length M code: message` of a bad sheet.
// It speaks of the line above it and is no part of the sheet.
type expectation struct {
	at      problem.Span
	code    problem.Code
	message string
	line    int // in the file
	met     bool
}

var expectationLine = regexp.MustCompile(`^#! column (\d+) length (\d+) ([a-z-]+): (.+)$`)

// readBad parts a file into the sheet and what is expected of it.
func readBad(t *testing.T, file string) (text string, expected []*expectation) {
	t.Helper()
	content, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	var lines []string
	for i, line := range strings.Split(string(content), "\n") {
		if !strings.HasPrefix(line, "#!") {
			lines = append(lines, line)
			continue
		}
		parts := expectationLine.FindStringSubmatch(line)
		if parts == nil {
			t.Fatalf("%s:%d: not an expectation: %s", file, i+1, line)
		}
		column, _ := strconv.Atoi(parts[1])
		length, _ := strconv.Atoi(parts[2])
		expected = append(expected, &expectation{
			at:   problem.Span{Line: len(lines), Column: column, Length: length},
			code: problem.Code(parts[3]), message: parts[4], line: i + 1,
		})
	}
	return strings.Join(lines, "\n"), expected
}

// TestBadSheets demands of every bad sheet exactly the problems that stand in
// it, each at its place, and each place inside of the text.
func TestBadSheets(t *testing.T) {
	files, _ := filepath.Glob("testdata/bad/*.plumb")
	if len(files) < 12 {
		t.Fatalf("%d bad sheets found", len(files))
	}
	for _, file := range files {
		text, expected := readBad(t, file)
		found := codesOf(t, text)
		checkPlaces(t, text, found)
	next:
		for _, p := range found {
			message := p.Message
			if p.Suggestion != "" {
				message += "; " + p.Suggestion
			}
			if strings.HasSuffix(message, ".") {
				t.Errorf("%s: a full stop ends: %s", file, message)
			}
			for _, e := range expected {
				if !e.met && e.at == p.Span && e.code == p.Code && strings.Contains(message, e.message) {
					e.met = true
					continue next
				}
			}
			t.Errorf("%s: unexpected: %s", file, p)
		}
		for _, e := range expected {
			if !e.met {
				t.Errorf("%s:%d: missing: %s: %s", file, e.line, e.code, e.message)
			}
		}
	}
}

// checkPlaces demands that every problem stands on characters of the sheet; at
// the end of a line it may stand right behind the last.
func checkPlaces(t *testing.T, text string, found []problem.Problem) {
	t.Helper()
	lines := strings.Split(strings.TrimPrefix(text, "\uFEFF"), "\n")
	for _, p := range found {
		if p.Span == (problem.Span{}) {
			continue // speaks of the sheet as a whole
		}
		if p.Line < 1 || p.Line > len(lines) || p.Column < 1 || p.Length < 1 {
			t.Errorf("%v: no place in %q", p, text)
			continue
		}
		characters := len([]rune(lines[p.Line-1]))
		if end := p.Column + p.Length - 1; end > characters+1 || end == characters+1 && p.Length > 1 {
			t.Errorf("%v: the place is longer than line %q", p, lines[p.Line-1])
		}
	}
}
