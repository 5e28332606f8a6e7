// Package rows is the vocabulary that the native engine, the module and their
// hosts share: what a compiled sheet tells of itself, what a run takes and what
// it gives. It holds plain data and depends on nothing that evaluates.
package rows

import (
	"context"

	"plumbrule/engine/problem"
)

// State says whether an entry's number in a row may be trusted.
type State byte

// The states, from best to worst.
const (
	Sound     State = iota // computed, every law inside its stated range
	Stretched              // computed, but a law on the way was used outside its stated range
	Waiting                // no number: an entry that it needs has none
	Refused                // no number: an argument that a law cannot take, a missing input, no finite result
)

// String gives the state's word.
func (s State) String() string {
	switch s {
	case Sound:
		return "sound"
	case Stretched:
		return "stretched"
	case Waiting:
		return "waiting"
	case Refused:
		return "refused"
	}
	return "unknown"
}

// Computed says whether there is a number.
func (s State) Computed() bool { return s <= Stretched }

// Scale converts between a shown unit and coherent SI units:
// SI = (shown + Before)·Multiply/Divide.
type Scale struct {
	Before   float64 `json:"before"`
	Multiply float64 `json:"multiply"`
	Divide   float64 `json:"divide"`
}

// ToSI gives the SI value of a number in the shown unit.
func (s Scale) ToSI(x float64) float64 {
	if s.Before != 0 {
		x += s.Before
	}
	if s.Multiply != 1 {
		x *= s.Multiply
	}
	if s.Divide != 1 {
		x /= s.Divide
	}
	return x
}

// FromSI gives the number in the shown unit of an SI value.
func (s Scale) FromSI(x float64) float64 {
	if s.Divide != 1 {
		x *= s.Divide
	}
	if s.Multiply != 1 {
		x /= s.Multiply
	}
	if s.Before != 0 {
		x -= s.Before
	}
	return x
}

// Form says how a known or an entry is read and shown.
type Form string

// The forms.
const (
	Number Form = "number"
	Truth  Form = "truth"  // 1 or 0
	Choice Form = "choice" // the index of one of the choices
)

// Known is an input of a sheet.
type Known struct {
	Name     string   `json:"name"`
	Form     Form     `json:"form"`
	Unit     string   `json:"unit"` // unit text; "1" for a pure number
	Scale    Scale    `json:"scale"`
	Note     string   `json:"note"`
	Value    float64  `json:"value"` // SI; meaningful where HasValue
	HasValue bool     `json:"has_value"`
	Choices  []string `json:"choices"`
	HasRange bool     `json:"has_range"` // values outside Low to High are refused
	Low      float64  `json:"low"`       // SI
	High     float64  `json:"high"`      // SI
	Line     int      `json:"line"`
}

// Role says which statement an entry comes from.
type Role string

// The roles.
const (
	Derived     Role = "derive"
	Requirement Role = "require" // 1 met, 0 missed
	Margin      Role = "margin"  // by how much the requirement before it is met (negative: missed)
)

// Entry is a result of a sheet.
type Entry struct {
	Name  string `json:"name"`
	Role  Role   `json:"role"`
	Form  Form   `json:"form"`
	Unit  string `json:"unit"`
	Scale Scale  `json:"scale"`
	Note  string `json:"note"`
	Line  int    `json:"line"`
}

// Caution is what a law that the sheet uses warns of.
type Caution struct {
	Law  string `json:"law"`
	Text string `json:"text"`
}

// Description is what a compiled sheet tells of itself.
type Description struct {
	Title    string    `json:"title"`
	Knowns   []Known   `json:"knowns"`
	Entries  []Entry   `json:"entries"`
	Cautions []Caution `json:"cautions"`
	// Notices tell of statements that are read but not evaluated yet.
	Notices []problem.Problem `json:"notices"`
	Cost    int               `json:"cost"` // of one row, in operations
}

// KnownIndex gives the place of a known, or -1.
func (d *Description) KnownIndex(name string) int {
	for i := range d.Knowns {
		if d.Knowns[i].Name == name {
			return i
		}
	}
	return -1
}

// EntryIndex gives the place of an entry, or -1.
func (d *Description) EntryIndex(name string) int {
	for i := range d.Entries {
		if d.Entries[i].Name == name {
			return i
		}
	}
	return -1
}

// Input is what a run takes: for each known, in the order of the description,
// nothing (nil: the sheet's own value), one SI number that serves all rows, or
// a column of Rows SI numbers. NaN is a missing value.
type Input struct {
	Rows   int
	Values [][]float64
}

// Reason says why a number is not sound. It is one row of a program's fixed
// table; a run gives indices into it.
type Reason struct {
	Text     string `json:"text"`     // "temperature of sea_water_density lies above 40 degC"
	Law      string `json:"law"`      // the law, or empty
	Argument string `json:"argument"` // the law's parameter or the known, or empty
	Bound    string `json:"bound"`    // "40 degC", or empty
	Unit     string `json:"unit"`     // of Worst in a tally
	Scale    Scale  `json:"scale"`
	Below    bool   `json:"below"` // the value lies under the bound
}

// Tally counts, in one run, the rows of an entry that a reason explains.
type Tally struct {
	Entry    int     `json:"entry"`
	Reason   int     `json:"reason"`
	State    State   `json:"state"`
	Rows     int     `json:"rows"`
	Worst    float64 `json:"worst"` // the value farthest outside, SI
	HasWorst bool    `json:"has_worst"`
}

// Outcome is what a run gives. Its slices are used again when the outcome is
// passed to another run.
type Outcome struct {
	Rows    int
	Values  [][]float64 // for each entry, Rows SI numbers; NaN where there is none
	States  [][]State   // for each entry nil (all rows sound) or Rows states
	Reasons [][]int32   // for each entry nil or, for each row, an index into Program.Reasons; 0 where sound
	Tallies []Tally     // by entry, then by reason
}

// State gives an entry's state in a row.
func (o *Outcome) State(entry, row int) State {
	if o.States[entry] == nil {
		return Sound
	}
	return o.States[entry][row]
}

// Reason gives the reason's index of an entry in a row, 0 where it is sound.
func (o *Outcome) Reason(entry, row int) int {
	if o.Reasons[entry] == nil {
		return 0
	}
	return int(o.Reasons[entry][row])
}

// Resize prepares the outcome for a run of n rows and the given entries.
func (o *Outcome) Resize(entries, n int) {
	o.Rows = n
	if len(o.Values) != entries {
		o.Values = make([][]float64, entries)
		o.States = make([][]State, entries)
		o.Reasons = make([][]int32, entries)
	}
	for e := range o.Values {
		if cap(o.Values[e]) < n {
			o.Values[e] = make([]float64, n)
		}
		o.Values[e] = o.Values[e][:n]
		o.States[e], o.Reasons[e] = nil, nil
	}
	o.Tallies = o.Tallies[:0]
}

// Program is a compiled sheet, native or in the module. Both give the same
// bits. A program serves several goroutines.
type Program interface {
	// Describe tells the program's knowns and entries.
	Describe() *Description
	// Reasons is the program's table of reasons; index 0 is empty.
	Reasons() []Reason
	// Run evaluates rows into out. The context is looked at between blocks of
	// rows; rows already computed are then lost and the context's error is
	// given.
	Run(ctx context.Context, in Input, out *Outcome) error
	// NewSession begins a session: one row whose numbers are kept.
	NewSession(ctx context.Context) (Session, error)
	// Close gives the program's memory back.
	Close() error
}

// Session is one row of a program whose numbers are kept: a change computes
// again only what depends on it. It begins with the sheet's own values, has the
// bits, states and reasons of a run of one row, and serves one goroutine.
type Session interface {
	// Set gives a known an SI number, or NaN for a missing value, from the next
	// update on.
	Set(known int, value float64) error
	// Update computes what depends on the knowns that were set and gives the
	// entries whose number, state or reason changed, in no special order, the
	// first time all of them. The slice is valid until the next update. An update that the
	// context ends is finished by the next one.
	Update(ctx context.Context) ([]int, error)
	// Entry gives an entry as of the last update: its SI number (NaN where
	// there is none), its state and its reason (0 where it is sound). Before
	// the first update every entry waits.
	Entry(entry int) (value float64, state State, reason int)
	// Close gives the session's memory back.
	Close() error
}

// Compiler turns sheet text into a program, natively or in the module.
// Choices adds choices to text knowns, by name.
type Compiler interface {
	Compile(ctx context.Context, text string, choices map[string][]string) (Program, error)
}

// SheetError is the error of a sheet with problems.
type SheetError struct {
	Problems []problem.Problem
}

// Error tells the first problem and how many there are.
func (e *SheetError) Error() string {
	if len(e.Problems) == 0 {
		return "the sheet has problems"
	}
	text := e.Problems[0].String()
	if len(e.Problems) == 2 {
		text += " (and one more problem)"
	} else if len(e.Problems) > 2 {
		text += " (and more problems)"
	}
	return text
}
