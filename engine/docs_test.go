package engine_test

import (
	"errors"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/functions"
)

// codesOf gives the codes of all that compiling a sheet tells: its problems
// and its notices.
func codesOf(t *testing.T, text string) []problem.Problem {
	t.Helper()
	return codesIn(t, text, functions.All())
}

func codesIn(t *testing.T, text string, catalogue *law.Catalogue) []problem.Problem {
	t.Helper()
	program, err := engine.Compile(text, catalogue)
	if err == nil {
		return program.Describe().Notices
	}
	var sheet *engine.SheetError
	if !errors.As(err, &sheet) {
		t.Fatalf("not a sheet's error: %v", err)
	}
	return sheet.Problems
}

// Every code is documented by a sheet that raises that code and no other.
func TestDocumentedCodes(t *testing.T) {
	seen := map[problem.Code]bool{}
	for _, doc := range problem.Docs() {
		if seen[doc.Code] {
			t.Errorf("%s is documented twice", doc.Code)
		}
		seen[doc.Code] = true
		if doc.Meaning == "" || doc.Sheet == "" {
			t.Errorf("%s: meaning or sheet is missing", doc.Code)
			continue
		}
		found := codesOf(t, doc.Sheet)
		if len(found) != 1 || found[0].Code != doc.Code {
			t.Errorf("%s: the sheet\n%s\nraises %v", doc.Code, doc.Sheet, found)
		}
	}
}

// What is read but not evaluated yet is told as a notice and does not keep a
// sheet from running.
func TestNotices(t *testing.T) {
	for _, test := range []struct{ text, message string }{
		{"known a = 1\nvary a = 0 to 1 by 0.5", "vary is not evaluated yet"},
		{"known a = 1 ± 0.5", "uncertainties are read but not propagated yet"},
		{"known a = 1\nderive b = 2 * a\ndraw b against a", "draw is not evaluated yet"},
		{"seek x [m] = 0 to 3 where x * x == 2[m^2]", "seek is not evaluated yet: x has no value"},
	} {
		program, err := engine.Compile(test.text, functions.All())
		if err != nil {
			t.Errorf("%s: %v", test.text, err)
			continue
		}
		notices := program.Describe().Notices
		if len(notices) != 1 || notices[0].Message != test.message || notices[0].Code != problem.NotYet || notices[0].Line == 0 {
			t.Errorf("%s: notices %v", test.text, notices)
		}
	}
}
