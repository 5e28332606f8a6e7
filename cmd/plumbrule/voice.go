package main

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"strconv"
	"strings"

	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
)

// fault is an error of the command itself: what is wrong, what to do about it
// and the exit status.
type fault struct {
	message string
	hints   []string
	status  int
}

func (f *fault) Error() string { return f.message }

// usage is the fault of a wrong command line. Empty hints are left out.
func usage(message string, hints ...string) error {
	return newFault(statusUsage, message, hints...)
}

// unreadable is the fault of a file that cannot be read, written or understood.
func unreadable(message string, hints ...string) error {
	return newFault(statusProblems, message, hints...)
}

func newFault(status int, message string, hints ...string) error {
	f := &fault{message: message, status: status}
	for _, hint := range hints {
		if hint != "" {
			f.hints = append(f.hints, hint)
		}
	}
	return f
}

// verdict is a run that went to its end with something missed; all is said
// already.
type verdict int

func (verdict) Error() string { return "" }

// sheetFault is a sheet with problems.
type sheetFault struct {
	file     string
	text     string
	problems []problem.Problem
}

func (s *sheetFault) Error() string { return s.file + " has problems" }

// ofSheet turns a compiler's error into one that knows its sheet.
func ofSheet(err error, file, text string) error {
	var found *rows.SheetError
	if errors.As(err, &found) {
		return &sheetFault{file: file, text: text, problems: found.Problems}
	}
	return err
}

// report prints an error and gives its exit status.
func (a *app) report(err error) int {
	var v verdict
	var sheet *sheetFault
	var f *fault
	switch {
	case errors.As(err, &v):
		return int(v)
	case errors.As(err, &sheet):
		a.reportProblems(sheet)
		return statusProblems
	case errors.As(err, &f):
	default:
		f = &fault{message: err.Error(), status: statusProblems}
	}
	if a.json {
		a.writeJSON(a.stderr, faultDocument{Error: f.message, Hints: f.hints, Status: f.status})
		return f.status
	}
	fmt.Fprintln(a.stderr, "plumbrule: "+f.message)
	for _, hint := range f.hints {
		if !a.brief {
			fmt.Fprintln(a.stderr, "    "+hint)
		}
	}
	return f.status
}

type faultDocument struct {
	Error  string   `json:"error"`
	Hints  []string `json:"hints,omitempty"`
	Status int      `json:"status"`
}

type problemDocument struct {
	Line       int    `json:"line"`
	Column     int    `json:"column"`
	Length     int    `json:"length"`
	Code       string `json:"code"`
	Message    string `json:"message"`
	Suggestion string `json:"suggestion,omitempty"`
}

type problemsDocument struct {
	File     string            `json:"file"`
	Problems []problemDocument `json:"problems"`
}

// documents gives problems as they stand in JSON.
func documents(problems []problem.Problem) []problemDocument {
	list := []problemDocument{}
	for _, p := range problems {
		list = append(list, problemDocument{p.Line, p.Column, p.Length, string(p.Code), p.Message, p.Suggestion})
	}
	return list
}

func (a *app) reportProblems(s *sheetFault) {
	if a.json {
		a.writeJSON(a.stderr, problemsDocument{File: s.file, Problems: documents(s.problems)})
		return
	}
	lines := strings.Split(s.text, "\n")
	for _, p := range s.problems {
		if a.brief {
			fmt.Fprintln(a.stderr, briefly(s.file, p))
			continue
		}
		fmt.Fprintln(a.stderr, place(s.file, p)+": "+printable(p.Message)+" ["+string(p.Code)+"]")
		if p.Line >= 1 && p.Line <= len(lines) {
			writeSource(a.stderr, lines[p.Line-1], p)
		}
		if p.Suggestion != "" {
			fmt.Fprintln(a.stderr, "    "+printable(p.Suggestion))
		}
	}
	if !a.brief {
		count := "one problem"
		if len(s.problems) != 1 {
			count = strconv.Itoa(len(s.problems)) + " problems"
		}
		fmt.Fprintln(a.stderr, "plumbrule: "+s.file+" has "+count+"; nothing was evaluated")
	}
}

// place gives FILE:LINE:COLUMN, or the file alone for the sheet as a whole.
func place(file string, p problem.Problem) string {
	if p.Line < 1 {
		return file
	}
	return file + ":" + strconv.Itoa(p.Line) + ":" + strconv.Itoa(max(1, p.Column))
}

func briefly(file string, p problem.Problem) string {
	line := place(file, p) + ": " + printable(p.Message)
	if p.Suggestion != "" {
		line += "; " + printable(p.Suggestion)
	}
	return line + " [" + string(p.Code) + "]"
}

// mostShown bounds how much of a source line is shown, in characters.
const mostShown = 100

// writeSource prints a line of the sheet with carets under the problem's
// columns. A long line is cut around them.
func writeSource(w io.Writer, line string, p problem.Problem) {
	characters := []rune(strings.TrimRight(line, "\r"))
	from := min(max(p.Column-1, 0), len(characters))
	to := min(from+max(p.Length, 1), max(len(characters), from+1))
	start, end := 0, len(characters)
	before, after := "", ""
	if len(characters) > mostShown {
		start = max(0, from-mostShown/3)
		end = min(len(characters), start+mostShown)
		to = min(to, max(end, from+1))
		if start > 0 {
			before = "..."
		}
		if end < len(characters) {
			after = "..."
		}
	}
	number := fmt.Sprintf("%6d | ", p.Line)
	blank := strings.Repeat(" ", 6) + " | "
	under := strings.Builder{}
	under.WriteString(strings.Repeat(" ", len(before)))
	for _, c := range characters[start:from] {
		under.WriteString(strings.Repeat(" ", runeWidth(c)))
	}
	for i := from; i < to; i++ {
		width := 1
		if i < len(characters) {
			width = runeWidth(characters[i])
		}
		under.WriteString(strings.Repeat("^", width))
	}
	fmt.Fprintln(w, number+before+printable(string(characters[start:end]))+after)
	fmt.Fprintln(w, blank+under.String())
}

// suggest names the candidate that was likely meant, as a hint, or gives "".
func suggest(word string, candidates []string) string {
	if near := problem.Nearest(word, candidates); near != "" {
		return "did you mean " + near + "?"
	}
	return ""
}

// writeJSON prints a document, indented, with a line end.
func (a *app) writeJSON(w io.Writer, document any) {
	var text bytes.Buffer
	encoder := json.NewEncoder(&text)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	if err := encoder.Encode(document); err != nil {
		// Documents hold no value that JSON cannot: numbers go through jsonNumber.
		fmt.Fprintln(a.stderr, "plumbrule: "+err.Error())
		return
	}
	_, _ = w.Write(text.Bytes())
}

// warn prints a remark that stops nothing.
func (a *app) warn(message string, hints ...string) {
	fmt.Fprintln(a.stderr, "plumbrule: "+message)
	for _, hint := range hints {
		if hint != "" && !a.brief {
			fmt.Fprintln(a.stderr, "    "+hint)
		}
	}
}
