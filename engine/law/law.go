// Package law says what a law is: one value that holds its name, parameters
// with dimensions and ranges, result, equation, source, caution, examples and
// the function itself. The catalogue, its pages, the command line's help, the
// module's description, the range checks and the conformance run are derived
// from that one value.
package law

// Type is what a parameter takes or a law gives.
type Type uint8

// The types of arguments and results.
const (
	Number Type = iota // one number a row, with a dimension and a kind
	List               // a list of numbers of one dimension; its length is fixed before the first row
	Text               // a text, known before the first row
	Made               // a value made by other laws, named in Parameter.Made or Result.Made: a ladder
)

// Law is one law in one place.
type Law struct {
	Name       string // as it is called in a formula
	Group      string // the room it stands in: "nature", "fluid", "air", "levels"
	Gives      string // one line: what it gives, beginning in lower case, no full stop
	Parameters []Parameter
	Result     Result
	Equation   string // as written in the source, with the parameters' symbols explained where they differ
	Source     string // author, year, title or number of the standard; "textbook" only where no single source exists
	Caution    string // what may go wrong or hurt; empty where nothing special
	Refusal    string // what it means when the function gives NaN for arguments inside their finite ranges; empty: it cannot
	Examples   []Example
	Body       Body // nil for a law that makes a value: its arguments are the value
}

// Parameter is one argument of a law.
type Parameter struct {
	Name    string
	Meaning string // one line
	Type    Type
	Unit    string // unit in which Valid and Finite are stated; it fixes dimension and kind. "1" for a pure number
	Made    string // for Type Made: the name of the made type, "ladder"
	Valid   Range  // the range that the source states, in Unit: outside, the result is stretched
	Finite  Range  // the range in which the equation still means something, in Unit: outside, the result is refused
	Default string // a formula ("nature.g_n", "0[m]", `"ITS-90"`): makes the parameter optional, passed by name
	Choices []string
	// CheckText says what is wrong with a text argument, or "".
	CheckText func(text string) string
	// Accepts lists other dimensions or kinds that are taken and converted.
	Accepts []Conversion
}

// Conversion lets a parameter take a value of another dimension or kind:
// either multiplied by Factor (both in coherent SI units) or handed through
// the one-argument law By.
type Conversion struct {
	Unit   string
	Factor float64
	By     *Law
}

// Result is what a law gives. Unit fixes dimension and kind and is the unit in
// which pages show it; the function itself gives coherent SI units.
type Result struct {
	Type Type
	Unit string
	Made string
	// SameAs names the parameter whose kind (and dimension) the result takes
	// on, as with a law that only scales; empty for a result of its own.
	SameAs string
	// Each tells, for Type List, how the items are worked out.
	Each *Each
}

// Each tells how the items of a list-valued law are worked out. A call is laid
// out as one number an item before the first row.
type Each struct {
	// Count gives how many items a call has, or says why that cannot be told.
	// Of the arguments it gets what is known before the first row: a number
	// that is not known has no values.
	Count func(arguments []Argument) (items int, wrong string)
	// Shared works out, once for all items, a number that each of them needs,
	// from the call's arguments.
	Shared Body
	// Item works out one item from the call's arguments, the item's number
	// counted from 0, and what Shared gave.
	Item Body
}

// Example is a call and what it gives, with as many digits as are right:
// {"head_pressure(10[m], 1000[kg/m^3])", "98066.5 Pa"}. A test runs each.
type Example struct {
	Formula string
	Gives   string
}

// Optional says whether the argument may be left out.
func (p *Parameter) Optional() bool { return p.Default != "" }

// Required counts the arguments that must be given by position.
func (l *Law) Required() int {
	n := 0
	for i := range l.Parameters {
		if !l.Parameters[i].Optional() {
			n++
		}
	}
	return n
}

// Constant is a constant of nature, read in formulas as nature.NAME.
type Constant struct {
	Name        string  // "k_B"
	Meaning     string  // "Boltzmann constant"
	Value       float64 // in Unit
	Uncertainty float64 // standard uncertainty in Unit; 0 for exact ones
	Unit        string
	Source      string
}
