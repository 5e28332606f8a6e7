package formula

import (
	"slices"
	"strings"
	"testing"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

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
		{"(true)[m]", "true[]"},
		{"(+(a))[m]", "a[]"},
		{"((t)).x", "t.x"},
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
		{"b - +a * b", "*", "+a * b"},
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
		{"t.[m]", "'[' does not fit here"},
		{"a not b", "'not' does not fit here"},
		{"(a + b).c", "only a table's column and a constant of nature are read with a dot"},
		{"a.b.c.d", "only a table's column and a constant of nature are read with a dot"},
		{"a.b.c.d.e.f", "only a table's column and a constant of nature are read with a dot"},
		{"a?", "the formula ends before it is complete"},
		{"(+a).b", "only a table's column and a constant of nature are read with a dot"},
		{"true.b", "only a table's column and a constant of nature are read with a dot"},
		{"a.b(c)", "only a law's name is called"},
		{"a.b.c(2)", "only a law's name is called"},
		{"f 3[m]", "'3' does not fit here"},
		{"f.3[m]", "'.3' does not fit here"},
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

// TestAllProblems demands that reading goes on behind what has a place of its
// own to be mended.
func TestAllProblems(t *testing.T) {
	for _, test := range []struct {
		formula string
		columns []int
	}{
		{"3[flurb] + 4[flarb]", []int{3, 14}},
		{"f(a.b.c, 2[flurb])", []int{7, 12}},
		{"a.b(c) + 2[flurb] *", []int{3, 12, 19}},
		{"[1[flurb], 2] < ) 3[flarb]", []int{17}}, // brackets come first
	} {
		var problems problem.List
		if e := Parse(test.formula, wholeLine{}, &problems); e != nil {
			t.Errorf("%s: %s", test.formula, shown(e))
		}
		var columns []int
		for _, p := range problems.Sorted() {
			columns = append(columns, p.Column)
		}
		if !slices.Equal(columns, test.columns) {
			t.Errorf("%s: %v", test.formula, problems.Sorted())
		}
	}
}

// TestAdvice fixes what is advised for a word that does not fit: a unit's
// symbol is told as one, even if it stands within the words of operators.
func TestAdvice(t *testing.T) {
	for _, test := range []struct{ formula, advice string }{
		{"3 d", "a unit stands in brackets, as in 5[d]"},
		{"3 n", "join two values by an operator, or part them by a comma; a product is written with *"},
		{"3 + and", "a value is missing before it"},
		{"3 * /", "a value is missing before it"},
		{"3 flurb", "join two values by an operator, or part them by a comma; a product is written with *"},
	} {
		var problems problem.List
		Parse(test.formula, wholeLine{}, &problems)
		if found := problems.Sorted(); len(found) != 1 || found[0].Suggestion != test.advice {
			t.Errorf("%s: %v", test.formula, found)
		}
	}
}

// visits counts the expressions of a tree as a walk meets them.
func visits(e *Expression) int {
	n := 1
	for _, part := range e.Parts {
		n += visits(part)
	}
	for _, option := range e.Options {
		n += visits(option.Value)
	}
	return n
}

// TestParts demands that no walk over a formula is longer than the limit on
// its parts, however chains of comparisons stand in chains.
func TestParts(t *testing.T) {
	nested := func(n int) string {
		return strings.Repeat("(0<", n) + "x" + strings.Repeat("<1?1:2)", n)
	}
	for _, test := range []struct {
		name, formula string
		fits          bool
	}{
		{"long sum", strings.Repeat("a+", MostCharacters/2-1) + "a", true},
		{"signs", strings.Repeat("-", MostCharacters-1) + "a", true},
		{"units", "a" + strings.Repeat("[1]", MostCharacters/3-1), true},
		{"deep parentheses", strings.Repeat("(", MostCharacters/2-1) + "a" + strings.Repeat(")", MostCharacters/2-1), true},
		{"deep lists", strings.Repeat("[", MostCharacters/2-1) + "a" + strings.Repeat("]", MostCharacters/2-1), true},
		{"deep calls", strings.Repeat("f(", MostCharacters/3-1) + "a" + strings.Repeat(")", MostCharacters/3-1), true},
		{"deep options", strings.Repeat("f(h:", MostCharacters/5-1) + "a" + strings.Repeat(")", MostCharacters/5-1), true},
		{"deep powers", strings.Repeat("a^", MostCharacters/2-1) + "a", true},
		{"choices behind", strings.Repeat("c?a:", MostCharacters/4-1) + "a", true},
		{"choices within", strings.Repeat("c?", MostCharacters/4-1) + "a" + strings.Repeat(":a", MostCharacters/4-1), true},
		{"chain", "-" + strings.Repeat("a<", 2_500) + "a", true}, // 4 n - 1 parts and the sign
		{"chain and one part", "--" + strings.Repeat("a<", 2_500) + "a", false},
		{"chains in chains", nested(10), true},
		{"more chains in chains", nested(11), false},
		{"very many chains in chains", nested(900), false},
	} {
		var problems problem.List
		e := Parse(test.formula, wholeLine{}, &problems)
		switch found := problems.Sorted(); {
		case test.fits && (e == nil || visits(e) > MostParts):
			t.Errorf("%s: %v", test.name, found)
		case !test.fits && (e != nil || len(found) != 1 || found[0].Code != problem.Limit):
			t.Errorf("%s: %v", test.name, found)
		}
	}
	nine, ten := visits(Parse(nested(9), wholeLine{}, new(problem.List))), visits(Parse(nested(10), wholeLine{}, new(problem.List)))
	if ten < 2*nine || 2*ten < MostParts {
		t.Errorf("the parts of nine chains in chains are met %d times, of ten %d times", nine, ten)
	}
}

// lines is a source over the lines of its own text.
type lines string

func (l lines) SpanOf(offset, length int) problem.Span {
	from := min(max(offset, 0), len(l))
	to := min(max(offset+length, from), len(l))
	before, stretch := string(l[:from]), string(l[from:to])
	stretch, _, _ = strings.Cut(stretch, "\n")
	start := strings.LastIndexByte(before, '\n') + 1
	return problem.Span{
		Line:   1 + strings.Count(before, "\n"),
		Column: 1 + utf8.RuneCountInString(before[start:]),
		Length: utf8.RuneCountInString(stretch),
	}
}

// holds says whether a place lies in the text, or right behind the end of a line.
func (l lines) holds(at problem.Span) bool {
	rows := strings.Split(string(l), "\n")
	return at.Line >= 1 && at.Line <= len(rows) && at.Column >= 1 && at.Length >= 0 &&
		at.Column-1+at.Length <= utf8.RuneCountInString(rows[at.Line-1])+1
}

// within says whether a place lies in another of one line.
func within(a, b problem.Span) bool {
	return a.Line != b.Line || a.Column >= b.Column && a.Column+a.Length <= b.Column+b.Length
}

// misplaced gives a part that does not stand in the text, on any character, or
// in its whole.
func misplaced(e *Expression, text lines) *Expression {
	if !text.holds(e.Span) || !text.holds(e.Whole()) || e.Span.Length == 0 || !within(e.Span, e.Whole()) {
		return e
	}
	parts := slices.Clone(e.Parts)
	for _, option := range e.Options {
		if !text.holds(option.Span) || !within(option.Span, e.Whole()) {
			return e
		}
		parts = append(parts, option.Value)
	}
	for _, part := range parts {
		if at := part.Whole(); at.Line == e.Whole().Line && !strings.Contains(string(text), "\n") && !within(at, e.Whole()) {
			return part
		}
		if found := misplaced(part, text); found != nil {
			return found
		}
	}
	return nil
}

// FuzzParse parses any text: it ends without a panic, and the parts and what
// is wrong stand in the text.
func FuzzParse(f *testing.F) {
	for _, text := range []string{
		"a + b", "f(x, y: [1, 2][m])", "((", "2[", "'", "a ? b : c < d < e", "-é^²", "x.y.z(1)",
		"(+a)[m] *\n  (é\n  + [2, Ω] [cm^-1])", "0 < (0 < x < 1 ? 1 : 2) < 3", "f(h: \"text\", k:-true)", "3[flurb] + a.b.c[", "1\u00a0[m]\xff",
	} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		var problems problem.List
		e := Parse(text, lines(text), &problems)
		if (e == nil) == problems.Empty() {
			t.Fatalf("%q: %v, problems %v", text, e, problems.Sorted())
		}
		if e != nil {
			if part := misplaced(e, lines(text)); part != nil {
				t.Fatalf("%q: %s at %v", text, shown(part), part.Span)
			}
			if n := visits(e); n > MostParts {
				t.Fatalf("%q: %d parts", text, n)
			}
		}
		for _, p := range problems.Sorted() {
			if !lines(text).holds(p.Span) {
				t.Fatalf("%q: %v", text, p)
			}
		}
	})
}

// BenchmarkParse measures the time for a formula as sheets hold them.
func BenchmarkParse(b *testing.B) {
	formulas := []string{
		"1[atm] * depth / 10[m]",
		"sea_water_density(salinity, cold, p_sea)",
		"sea_pressure_at_depth(depth, latitude, height: 2[m])",
		"rating >= 1.25 * p_sea and 0[m] < depth < 6000[m]",
		"(a - b)^2 + exp(-nature.h * nature.c * nu / (nature.k_B * T))",
		"T < 300[K] ? mean([158.3, 227.0, 310.5][cm^-1]) : item(levels.energy, 2)",
	}
	const n = 1_000
	for b.Loop() {
		for i := range n {
			var problems problem.List
			if text := formulas[i%len(formulas)]; Parse(text, lines(text), &problems) == nil {
				b.Fatal(problems.Sorted())
			}
		}
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/n, "ns/formula")
}
