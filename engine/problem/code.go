package problem

// Code names a class of problem. Codes are public and stable.
type Code string

// The codes, each with the sheet line that raises it in Codes.
const (
	Statement      Code = "statement"
	Syntax         Code = "syntax"
	Name           Code = "name"
	Duplicate      Code = "duplicate"
	Unknown        Code = "unknown-name"
	UnknownLaw     Code = "unknown-law"
	UnknownUnit    Code = "unknown-unit"
	UnknownColumn  Code = "unknown-column"
	Circle         Code = "circle"
	Dimension      Code = "dimension"
	Kind           Code = "kind"
	Shape          Code = "shape"
	Arguments      Code = "arguments"
	Choice         Code = "choice"
	Construct      Code = "construct"
	Number         Code = "number"
	Table          Code = "table"
	Limit          Code = "limit"
	NotYet         Code = "not-evaluated-yet"
	RangeOrder     Code = "range"
	BracketOnUnits Code = "unit-bracket"
)

// Doc tells what a code means and shows a sheet that raises it.
type Doc struct {
	Code    Code
	Meaning string
	Sheet   string // a sheet with exactly this problem
}

// Docs lists every code with its meaning and a sheet that raises it.
func Docs() []Doc {
	return []Doc{
		{Statement, "a line does not begin with a statement word", "deriv a = 1"},
		{Syntax, "a statement or formula is not complete or has a character that does not belong", "derive a = (1 + 2"},
		{Name, "a name is reserved or not well formed", "known if = 1"},
		{Duplicate, "a name is given twice", "known a = 1\nknown a = 2"},
		{Unknown, "a formula uses a name that no statement gives", "derive a = b + 1"},
		{UnknownLaw, "a formula calls a law that is not in the catalogue", "derive a = expp(1)"},
		{UnknownUnit, "a unit is not known", "known a [metre] = 1"},
		{UnknownColumn, "a table has no column of that name", "table t\n  a [m]\n  1\nderive b = sum(t.c)"},
		{Circle, "entries need each other in a circle", "derive a = b\nderive b = a"},
		{Dimension, "dimensions do not fit", "derive a = 1[m] + 1[s]"},
		{Kind, "dimensions fit but the kinds do not, as with two temperatures on a scale", "derive a = 1[degC] + 2[degC]"},
		{Shape, "a number stands where a list, a text or a condition belongs, or the other way round", "derive a = sum(3)"},
		{Arguments, "a law is called with too few, too many or misnamed arguments", "derive a = exp()"},
		{Choice, "a text is not one of the choices", "known gas = \"N2\" or \"He\"\nderive a = gas == \"Ar\" ? 1 : 2"},
		{Construct, "a construct that sheets do not have", "derive a = 7 % 2"},
		{Number, "a number is not well formed or out of range", "known a = 1e999"},
		{Table, "a table's rows do not fit its header", "table t\n  a [m] | b [s]\n  1 | 2 | 3"},
		{Limit, "a sheet, formula or list is larger than the stated limits", "known a = 1\nvary a = 0 to 1 by 1e-7"},
		{NotYet, "a statement that is read but not evaluated yet", "known a = 1\nvary a = 0 to 1 by 0.5"},
		{RangeOrder, "a lower bound lies above its upper bound", "known a = 1 within 3 to 2"},
		{BracketOnUnits, "a unit bracket stands on a value that already has a dimension", "derive a = (2[m])[s]"},
	}
}
