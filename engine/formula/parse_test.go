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
		return w.formula(depth-1).in("-", "")
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
	switch k := w.IntN(10); {
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
		v = written{"table.column", "table.column"}
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

// items are arguments, at times with a named one behind, or a list.
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
		value := w.formula(depth - 1)
		all.ours += "option: " + value.ours
		all.reference += "{option: " + value.reference + "}"
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
				pair := options.Pairs[0].(*ast.PairNode)
				parts = append(parts, pair.Key.(*ast.StringNode).Value+":"+shownTree(pair.Value))
				continue
			}
			parts = append(parts, shownTree(n))
		}
		return "<" + strings.Join(parts, " ") + ">"
	}
	switch n := node.(type) {
	case *ast.FloatNode:
		return strconv.FormatFloat(n.Value, 'g', -1, 64)
	case *ast.IdentifierNode:
		return n.Value
	case *ast.MemberNode:
		if field, is := n.Property.(*ast.StringNode); is {
			return shownTree(n.Node) + "." + field.Value
		}
		return shownTree(n.Node) + "[]"
	case *ast.UnaryNode:
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

// TestParse fixes what formulas are made of, by hand.
func TestParse(t *testing.T) {
	for _, test := range []struct{ formula, want string }{
		{"-2^2", "(- (^ 2 2))"},
		{"2^-1*3", "(* (^ 2 (- 1)) 3)"},
		{"2^3^2", "(^ 2 (^ 3 2))"},
		{"a-b-c", "(- (- a b) c)"},
		{"not a == b", "(== (not a) b)"},
		{"0 < x <= 1", "(and (< 0 x) (<= x 1))"},
		{"a or b and c", "(or a (and b c))"},
		{"a ? b : c ? d : e", "( a b ( c d e))"},
		{"+a*b", "(* a b)"},
		{"2*3[m]^2", "(* 2 (^ 3[] 2))"},
		{"(a+b)[kPa]", "(+ a b)[]"},
		{"a ?.5:2", "( a 0.5 2)"},
		{"f(a, h: 2[m])", "f<a h:2[]>"},
		{"[1, 2][m]", "<1 2>[]"},
		{"item(t.x, 2)", "item<t.x 2>"},
	} {
		var problems problem.List
		e := Parse(test.formula, fixedPlace{}, &problems)
		if e == nil {
			t.Errorf("%s: %v", test.formula, problems.Sorted())
			continue
		}
		if got := shown(e); got != test.want {
			t.Errorf("%s: %s, not %s", test.formula, got, test.want)
		}
	}
}

// TestPlacesOfParts fixes the characters that a part stands in: those of its
// operands with the parentheses around them, without its own.
func TestPlacesOfParts(t *testing.T) {
	for _, test := range []struct{ formula, word, place string }{
		{"((a)) + (b)", "+", "((a)) + (b)"},
		{"2 * (a + b)", "+", "a + b"},
		{"-(a)", "-", "-(a)"},
		{"f( (a), b ) * 2", "*", "f( (a), b ) * 2"},
		{"(a < b) and c", "<", "a < b"},
	} {
		var problems problem.List
		e := Parse(test.formula, wholeLine{}, &problems)
		if e == nil {
			t.Errorf("%s: %v", test.formula, problems.Sorted())
			continue
		}
		var find func(e *Expression) *Expression
		find = func(e *Expression) *Expression {
			if e.Word == test.word {
				return e
			}
			for _, part := range e.Parts {
				if found := find(part); found != nil {
					return found
				}
			}
			return nil
		}
		at := find(e).Span
		if got := test.formula[at.Column-1 : at.Column-1+at.Length]; got != test.place {
			t.Errorf("%s: %s stands in %q, not %q", test.formula, test.word, got, test.place)
		}
	}
}

// wholeLine is a source that stands alone in line 1.
type wholeLine struct{}

func (wholeLine) SpanOf(offset, length int) problem.Span {
	return problem.Span{Line: 1, Column: offset + 1, Length: length}
}

// TestMisfits fixes what is said of formulas that no one can read.
func TestMisfits(t *testing.T) {
	for _, test := range []struct{ formula, message string }{
		{"a +", "the formula ends before it is complete"},
		{"a ? b", "the formula ends before it is complete"},
		{"a ?: b", "':' does not fit here"},
		{"a b", "'b' does not fit here"},
		{"2(3)", "'(' does not fit here"},
		{"(a)(b)", "'(' does not fit here"},
		{"* a", "'*' does not fit here"},
		{"f(a b)", "'b' does not fit here"},
		{"[1 2]", "'2' does not fit here"},
		{"(a, b)", "',' does not fit here"},
		{"true[m]", "'[' does not fit here"},
		{"a not b", "'not' does not fit here"},
		{"(a + b).c", "only a table's column and a constant of nature are read with a dot"},
		{"a.b.c", "only a table's column and a constant of nature are read with a dot"},
		{"a.b(c)", "only a law's name is called"},
		{"a.(b)", "'(' does not fit here"},
		{"f(a,)", "')' does not fit here"},
		{"(a", "this '(' is not closed"},
		{"", "the formula ends before it is complete"},
	} {
		var problems problem.List
		if e := Parse(test.formula, wholeLine{}, &problems); e != nil {
			t.Errorf("%s: %s", test.formula, shown(e))
			continue
		}
		found := problems.Sorted()
		if len(found) != 1 || found[0].Message != test.message {
			t.Errorf("%s: %v, not %s", test.formula, found, test.message)
		}
	}
}

// FuzzParse parses any text: it ends without a panic, and what is wrong stands
// in the text.
func FuzzParse(f *testing.F) {
	for _, text := range []string{"a + b", "f(x, y: [1, 2][m])", "((", "2[", "'", "a ? b : c < d < e", "-é^²", "x.y.z(1)"} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		if strings.ContainsAny(text, "\n\r") {
			return
		}
		var problems problem.List
		e := Parse(text, wholeLine{}, &problems)
		if (e == nil) == problems.Empty() {
			t.Fatalf("%q: %v, problems %v", text, e, problems.Sorted())
		}
		for _, p := range problems.Sorted() {
			if p.Column < 1 || p.Column > len(text)+1 {
				t.Fatalf("%q: %v", text, p)
			}
		}
	})
}
