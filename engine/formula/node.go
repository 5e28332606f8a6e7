package formula

import (
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
)

// Op is what a node computes.
type Op uint8

// The operations of the typed tree. The arithmetic and functions take and give
// coherent SI values; conditions are 1, 0 or, where an operand is no number,
// NaN.
const (
	Const   Op = iota // Value
	KnownOp           // the known Index of the sheet
	Entry             // the finished value of the entry Text, Args[0]
	Items             // a list: Args, or Numbers where all are constant
	MadeOp            // a made value: Law and its arguments
	Word              // a text: Text
	Same              // Args[0] under another type
	Neg
	Add
	Sub
	Mul
	Div
	Pow
	Less
	LessEqual
	Equal
	NotEqual
	Not
	Select // Args[0] ? Args[1] : Args[2]
	Guard  // Args[0], stretched where Args[1] does not hold
	Apply  // the law Law of Args, one a parameter
	Sqrt
	Exp
	Ln
	Log10
	Sin
	Cos
	Tan
	Asin
	Acos
	Atan
	Atan2
	Sinh
	Cosh
	Tanh
	Abs
	Min
	Max
	Floor
	Ceil
	Round
	Sign
	Hypot
	Cbrt
)

// Node is a part of the typed tree: an operation on other nodes. Nodes are
// made through Make, so that equal ones can be one.
type Node struct {
	Op      Op
	Type    Type
	Args    []*Node
	Value   float64
	Numbers []float64 // the items of a constant list
	Text    string
	Law     *law.Law
	Index   int
	Place   problem.Span // where it first stands, for reasons
	ID      int          // given by Make, rising from arguments to users
}

// IsConst says whether the node is a number or truth fixed before the first row.
func (n *Node) IsConst() bool { return n.Op == Const }

// Make makes a node or gives an equal one that exists. It may answer with a
// constant where the value is already known.
type Make func(Node) *Node

// Length gives the number of a list's items.
func (n *Node) Length() int {
	if n.Numbers != nil {
		return len(n.Numbers)
	}
	return len(n.Args)
}
