package sheet

import (
	"strings"

	"plumbrule/engine/problem"
)

// The limits of a sheet. What is larger is reported with the code Limit.
const (
	MostText       = 4 << 20   // bytes of a sheet's text
	MostLine       = 10_000    // characters of a line
	MostStatements = 200_000   // statements and paragraphs of a sheet
	MostColumns    = 1_000     // columns of a table
	MostRows       = 1_000_000 // rows of a table below its header
	MostCells      = 1_000_000 // cells of a table below its header
	MostPoints     = 1_000_000 // points of one vary statement
)

// Sheet is a sheet's text, taken apart.
type Sheet struct {
	// Title is the text of the title statement, absent where there is none.
	Title Text
	// Statements stand in the order of the text, prose and blank lines among
	// them.
	Statements []Statement
}

// Statement is one statement, paragraph or gap of a sheet: a *Prose, *Blank,
// *Title, *Known, *Derive, *Law, *Require, *Table, *Vary, *Seek, *Correlate,
// *Draw or, for lines that no statement word begins, *Unread.
type Statement interface {
	// At gives the place of the statement's first line without its note.
	problem.Placed
	// Word gives the statement word, or "" for prose, gaps and what was not read.
	Word() string
	// Note gives the statement's note, those of its further lines joined by a
	// blank.
	Note() string
	// Notes gives each note with its place.
	Notes() []Note
	// Faulty says that a problem was reported for the statement, so that its
	// parts may be missing.
	Faulty() bool
	common() *entry
}

// Note is a note on one line of a statement.
type Note struct {
	problem.Span        // from the `#` to the end of the line
	Value        string // the note without `#` and the blanks around it
	Alone        bool   // the note stands on an indented line of its own
	gap          bool   // not a note: an empty line between indented lines
}

// entry is what all statements have in common.
type entry struct {
	problem.Span
	notes  []Note
	faulty bool
	source string // the lines as written
}

// Note gives the statement's note, those of its further lines joined by a blank.
func (e *entry) Note() string {
	if len(e.notes) == 1 {
		return e.notes[0].Value
	}
	var all []string
	for _, n := range e.notes {
		if !n.gap {
			all = append(all, n.Value)
		}
	}
	return strings.Join(all, " ")
}

// Notes gives each note with its place.
func (e *entry) Notes() []Note {
	var all []Note
	for _, n := range e.notes {
		if !n.gap {
			all = append(all, n)
		}
	}
	return all
}

// Faulty says that a problem was reported for the statement.
func (e *entry) Faulty() bool { return e.faulty }

func (e *entry) common() *entry { return e }

// Prose is a paragraph: lines that begin with `#`, one below the other.
type Prose struct {
	entry
	// Text is the paragraph, its lines without `#` and the blank after it,
	// joined by "\n".
	Text Text
}

// Blank is a run of empty lines.
type Blank struct {
	entry
	Count int // number of empty lines
}

// Title is `title TEXT`.
type Title struct {
	entry
	Text Text
}

// Known is `known NAME [UNIT] = VALUE`: an input. The value is a number, a
// choice of texts or a truth value, or is left to the host.
type Known struct {
	entry
	Name Text
	Unit Text // inside of the brackets, absent where there are none
	// HasValue says that a value stands after `=`: a choice where Choices is
	// not empty, a truth value where Truth is not nil, otherwise a number.
	HasValue   bool
	Number     float64
	NumberText Text
	Choice     Text   // the default, without its quotes
	Choices    []Text // all that may be chosen, the default first
	Truth      *bool
	TruthText  Text
	// Uncertainty and Within are nil where the sheet does not state them.
	Uncertainty *Uncertainty
	Within      *Within
}

// The distributions of an uncertainty.
const (
	Normal     = "normal"
	Uniform    = "uniform"
	Triangular = "triangular"
	Arcsine    = "arcsine"
)

// Uncertainty is `± NUMBER` with what follows it.
type Uncertainty struct {
	NumberText Text
	// Number is, in the known's unit, the standard uncertainty times Coverage
	// for a normal distribution and the half-width for the others. It is not
	// negative.
	Number       float64
	Distribution string  // Normal, Uniform, Triangular or Arcsine
	Coverage     float64 // the coverage factor k, 1 where none is stated
	CoverageText Text
	Freedom      float64 // degrees of freedom, 0 where none are stated: infinitely many
	FreedomText  Text
}

// Within is `within LOW to HIGH`, in the known's unit.
type Within struct {
	Low, High         float64
	LowText, HighText Text
}

// Derive is `derive NAME [UNIT] = FORMULA`.
type Derive struct {
	entry
	Name    Text
	Unit    Text // inside of the brackets, absent where there are none
	Formula Text
}

// Law is `law NAME(a [UNIT], b [UNIT]) [UNIT] = FORMULA`.
type Law struct {
	entry
	Name       Text
	Parameters []LawParameter
	Unit       Text // of the result
	Formula    Text
	Valid      Text // the condition after the indented `valid`, absent where there is none
}

// LawParameter is one parameter of a law of the sheet's own.
type LawParameter struct {
	Name Text
	Unit Text // inside of the brackets, absent where there are none
}

// Require is `require NAME = CONDITION`.
type Require struct {
	entry
	Name      Text
	Condition Text
}

// Table is `table NAME` with its indented rows.
type Table struct {
	entry
	Name    Text
	Columns []Column
	Rows    [][]float64 // a number a column, in the column's unit
	Cells   [][]Text    // the numbers as written
}

// Column is a column of a table.
type Column struct {
	Name Text
	Unit Text // inside of the brackets, absent where there are none
}

// Vary is `vary NAME = LOW to HIGH by STEP`, `vary NAME = LOW to HIGH in N
// steps` or `vary NAME over [a, b, c]`. All numbers are in the known's unit.
type Vary struct {
	entry
	Name              Text
	Low, High         float64
	LowText, HighText Text
	Step              float64 // positive, or 0 in the other two forms
	StepText          Text
	Steps             int // number of steps, one less than the points; 0 in the other two forms
	StepsText         Text
	Over              []float64 // the points, nil in the first two forms
	OverTexts         []Text
}

// Seek is `seek NAME [UNIT] = LOW to HIGH where LEFT == RIGHT`.
type Seek struct {
	entry
	Name              Text
	Unit              Text // inside of the brackets, absent where there are none
	Low, High         float64
	LowText, HighText Text
	Left, Right       Text
}

// Correlate is `correlate A B = COEFFICIENT`.
type Correlate struct {
	entry
	A, B            Text
	Coefficient     float64 // from -1 to 1
	CoefficientText Text
}

// Draw is `draw NAME, NAME against NAME`.
type Draw struct {
	entry
	Names   []Text
	Against Text
}

// Unread stands for lines that could not be read as any statement. It is
// always faulty.
type Unread struct {
	entry
	Text Text // the first line
}

// Word gives "": prose has no statement word.
func (*Prose) Word() string { return "" }

// Word gives "": a gap has no statement word.
func (*Blank) Word() string { return "" }

// Word gives "title".
func (*Title) Word() string { return "title" }

// Word gives "known".
func (*Known) Word() string { return "known" }

// Word gives "derive".
func (*Derive) Word() string { return "derive" }

// Word gives "law".
func (*Law) Word() string { return "law" }

// Word gives "require".
func (*Require) Word() string { return "require" }

// Word gives "table".
func (*Table) Word() string { return "table" }

// Word gives "vary".
func (*Vary) Word() string { return "vary" }

// Word gives "seek".
func (*Seek) Word() string { return "seek" }

// Word gives "correlate".
func (*Correlate) Word() string { return "correlate" }

// Word gives "draw".
func (*Draw) Word() string { return "draw" }

// Word gives "": what was not read has no statement word.
func (*Unread) Word() string { return "" }
