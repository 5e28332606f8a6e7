// Package abi is what the module and its hosts agree on: names, layouts,
// limits and the version. Both sides use these constants; MODULE.md in this
// folder says the same in words and a test holds the two together.
package abi

// Version is the version of the agreement.
const Version = 1

// Export is one of the module's functions.
type Export int

// The module's exports.
const (
	ExportVersion Export = iota
	ExportLimits
	ExportReserve
	ExportRelease
	ExportCatalogue
	ExportCompile
	ExportRun
	ExportReasons
	ExportTallies
	ExportSession
	ExportUpdate
	ExportEnd
	ExportFault
	ExportClose
)

var exportNames = [...]string{
	ExportVersion:   "plumbrule_abi",
	ExportLimits:    "plumbrule_limits",
	ExportReserve:   "plumbrule_reserve",
	ExportRelease:   "plumbrule_release",
	ExportCatalogue: "plumbrule_catalogue",
	ExportCompile:   "plumbrule_compile",
	ExportRun:       "plumbrule_run",
	ExportReasons:   "plumbrule_reasons",
	ExportTallies:   "plumbrule_tallies",
	ExportSession:   "plumbrule_session",
	ExportUpdate:    "plumbrule_update",
	ExportEnd:       "plumbrule_end",
	ExportFault:     "plumbrule_fault",
	ExportClose:     "plumbrule_close",
}

// String gives the name under which the module exports the function.
func (e Export) String() string { return exportNames[e] }

// Exports lists the names of the module's exports in the order of the document.
func Exports() []string { return exportNames[:] }

// The limits of one module instance. What is larger is answered with a fault.
const (
	MostBuffer   = 256 << 20 // bytes of one reserved buffer
	MostRows     = 1 << 20   // rows of one run
	MostPrograms = 1000      // open programs
	MostSessions = 1000      // open sessions
)

// Code is what plumbrule_run and plumbrule_update give.
type Code int32

// The codes of a run or an update.
const (
	Done     Code = iota // all is computed
	NoSuch               // the program or session is not open
	BadInput             // the input does not fit the program or a limit
	Failed               // a defect of the module; the instance goes on
)

// How a known is passed to a run.
const (
	Own    byte = 0 // the sheet's own value
	Single byte = 1 // one number for all rows
	Column byte = 2 // a number a row
)

// align rounds up to a multiple of eight bytes.
func align(n int) int { return (n + 7) &^ 7 }

// InputSize gives the bytes of a run's input: a byte for each known (Own,
// Single or Column), up to a multiple of eight, then for each known in order
// one float64 (Single) or a float64 a row (Column).
func InputSize(shape []byte, rows int) int {
	size := align(len(shape))
	for _, s := range shape {
		switch s {
		case Single:
			size += 8
		case Column:
			size += 8 * rows
		}
	}
	return size
}

// Output tells where the parts of a run's output begin, in bytes, and its
// size: a float64 a row for each entry; a byte for each entry that says
// whether any row is not sound; then for each entry a state byte a row; then
// for each entry a 32-bit reason a row. States and reasons of an entry whose
// rows are all sound are not written.
type Output struct {
	Flags, States, Reasons, Size int
}

// OutputLayout gives the layout for a number of entries and rows.
func OutputLayout(entries, rows int) Output {
	var o Output
	o.Flags = 8 * entries * rows
	o.States = o.Flags + align(entries)
	o.Reasons = o.States + align(entries*rows)
	o.Size = o.Reasons + align(4*entries*rows)
	return o
}

// A change of a known that goes into an update: its SI number, a float64, and
// the known's place, an unsigned 32-bit number; its size in bytes and where
// the parts stand.
const (
	ChangeSize  = 16
	ChangeKnown = 8
)

// An entry that comes out of an update: its SI number, a float64, and its
// place, state and reason, unsigned 32-bit numbers; its size in bytes and where
// the parts stand. The number of entries, 32 bits, stands before the first.
const (
	EntriesAt   = 8
	EntrySize   = 24
	EntryPlace  = 8
	EntryState  = 12
	EntryReason = 16
)

// UpdateSize gives the bytes of an update's output for a program's entries.
func UpdateSize(entries int) int { return EntriesAt + EntrySize*entries }

// Doc packs where a document stands in the module's memory.
func Doc(pointer, length uint32) uint64 { return uint64(pointer)<<32 | uint64(length) }

// DocAt unpacks where a document stands.
func DocAt(doc uint64) (pointer, length uint32) { return uint32(doc >> 32), uint32(doc) }
