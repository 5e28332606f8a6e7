package formula

import (
	"math/rand/v2"
	"strconv"
	"strings"
	"testing"

	"github.com/expr-lang/expr/ast"
	reference "github.com/expr-lang/expr/parser"

	"plumbrule/engine/problem"
)

// written is a formula in two spellings: ours, and that of the library whose
// grammar is the reference.
type written struct{ ours, reference string }

func (w written) in(before, after string) written {
	return written{before + w.ours + after, before + w.reference + after}
}

// join writes two formulas with something between them.
func (w written) join(between string, other written) written {
	return written{w.ours + between + other.ours, w.reference + between + other.reference}
}

// writer writes random formulas.
type writer struct{ *rand.Rand }

func (w writer) one(of ...string) string { return of[w.IntN(len(of))] }

// blank is a blank or nothing.
func (w writer) blank() string { return w.one("", " ") }

func (w writer) formula(depth int) written {
	if depth <= 0 {
		return w.value(0)
	}
	switch w.IntN(12) {
	case 0:
		return w.formula(depth-1).in(w.one("-", "+"), "")
	case 1:
		return w.formula(depth-1).in("not ", "")
	case 2:
		return w.formula(depth-1).join(" ? ", w.formula(depth-1)).join(" : ", w.formula(depth-1))
	case 3, 4:
		return w.value(depth)
	}
	operator := w.one("+", "-", "*", "/", "^", "<", ">", "<=", ">=", "==", "!=", " and ", " or ", "*", "+", "^", "<")
	return w.formula(depth-1).join(w.blank()+operator+w.blank(), w.formula(depth-1))
}

// value is a formula that something may follow.
func (w writer) value(depth int) written {
	var v written
	number := false
	switch k := w.IntN(12); {
	case k == 10: // a bracket stands only behind a truth or a text in parentheses
		text := w.one("true", "false")
		return written{text, text}
	case k == 11:
		text := w.one(`"N2"`, "'sea water'", "'a ? (b'")
		return written{text, text}
	case k < 3 || depth <= 0 && k > 5:
		text := w.one("2", "0.5", "1e3", "7.25", "12")
		v, number = written{text, text}, true
		if !strings.ContainsAny(text, ".e") {
			v.reference += ".0"
		}
	case k < 5 || depth <= 0:
		name := w.one("a", "b", "length", "Ω", "x1")
		v = written{name, name}
	case k == 5:
		name := w.one("table.column", "nature.k_B", "table . x")
		v = written{name, name}
	case k == 6:
		v = w.items(depth, w.one("f", "g")+"(", ")")
	case k == 7:
		v = w.items(depth, "[", "]")
	default:
		v = w.formula(depth-1).in("("+w.blank(), w.blank()+")")
	}
	if w.IntN(4) == 0 {
		v.ours += w.blank() + "[m]"
		if number {
			v.reference = "(" + v.reference + ")"
		}
		v.reference += "[0]"
	}
	return v
}

// items are arguments, at times with named ones behind, or a list.
func (w writer) items(depth int, opening, closing string) written {
	all := written{opening, opening}
	n := w.IntN(4)
	for i := range n {
		if i > 0 {
			all = all.join(", ", written{})
		}
		all = all.join("", w.formula(depth-1))
	}
	if closing == ")" && w.IntN(3) == 0 {
		if n > 0 {
			all = all.join(", ", written{})
		}
		all = all.join("", written{"", "{"})
		for i, name := range []string{"option", "other"}[:1+w.IntN(2)] {
			if i > 0 {
				all = all.join(", ", written{})
			}
			all = all.join(name+":"+w.blank(), w.formula(depth-1))
		}
		all = all.join("", written{"", "}"})
	}
	return all.join("", written{closing, closing})
}

// shown writes an expression with every parenthesis.
func shown(e *Expression) string {
	parts := make([]string, 0, 3)
	for _, part := range e.Parts {
		parts = append(parts, shown(part))
	}
	switch e.Form {
	case Number:
		return strconv.FormatFloat(e.Value, 'g', -1, 64)
	case Text:
		return strconv.Quote(e.Word)
	case Truth:
		return strconv.FormatBool(e.Value == 1)
	case Name:
		return e.Word
	case Member:
		return e.Word + "." + e.Field
	case WithUnit:
		return parts[0] + "[]"
	case Unary, Binary, Choice:
		return "(" + e.Word + " " + strings.Join(parts, " ") + ")"
	case Call, List:
		for _, option := range e.Options {
			parts = append(parts, option.Name+":"+shown(option.Value))
		}
		return e.Word + "<" + strings.Join(parts, " ") + ">"
	}
	return "?"
}

// shownTree writes the library's tree in the same way.
func shownTree(node ast.Node) string {
	list := func(nodes []ast.Node) string {
		var parts []string
		for _, n := range nodes {
			if options, is := n.(*ast.MapNode); is {
				for _, option := range options.Pairs {
					pair := option.(*ast.PairNode)
					parts = append(parts, pair.Key.(*ast.StringNode).Value+":"+shownTree(pair.Value))
				}
				continue
			}
			parts = append(parts, shownTree(n))
		}
		return "<" + strings.Join(parts, " ") + ">"
	}
	switch n := node.(type) {
	case *ast.FloatNode:
		return strconv.FormatFloat(n.Value, 'g', -1, 64)
	case *ast.StringNode:
		return strconv.Quote(n.Value)
	case *ast.BoolNode:
		return strconv.FormatBool(n.Value)
	case *ast.IdentifierNode:
		return n.Value
	case *ast.MemberNode:
		if field, is := n.Property.(*ast.StringNode); is {
			return shownTree(n.Node) + "." + field.Value
		}
		return shownTree(n.Node) + "[]"
	case *ast.UnaryNode:
		if n.Operator == "+" {
			return shownTree(n.Node)
		}
		return "(" + n.Operator + " " + shownTree(n.Node) + ")"
	case *ast.BinaryNode:
		operator := n.Operator
		if operator == "&&" { // a chain of comparisons
			operator = "and"
		}
		return "(" + operator + " " + shownTree(n.Left) + " " + shownTree(n.Right) + ")"
	case *ast.ConditionalNode:
		return "( " + shownTree(n.Cond) + " " + shownTree(n.Exp1) + " " + shownTree(n.Exp2) + ")"
	case *ast.CallNode:
		return shownTree(n.Callee) + list(n.Arguments)
	case *ast.ArrayNode:
		return list(n.Nodes)
	}
	return "?"
}

// TestGrammarIsThatOfTheReference parses random formulas as expr-lang/expr
// does: precedence, associativity, chains of comparisons, choices, calls.
func TestGrammarIsThatOfTheReference(t *testing.T) {
	w := writer{rand.New(rand.NewPCG(11, 13))}
	longest := 0
	for range 20_000 {
		f := w.formula(1 + w.IntN(5))
		longest = max(longest, len(f.ours))
		var problems problem.List
		e := Parse(f.ours, fixedPlace{}, &problems)
		tree, err := reference.Parse(f.reference)
		if e == nil || err != nil {
			t.Fatalf("%s: %v; %s: %v", f.ours, problems.Sorted(), f.reference, err)
		}
		if got, want := shown(e), shownTree(tree.Node); got != want {
			t.Fatalf("%s\n%s\n%s", f.ours, got, want)
		}
	}
	if longest < 200 {
		t.Errorf("the longest formula has only %d characters", longest)
	}
}
