package problem

import (
	"strconv"
	"strings"
	"testing"
)

func TestNearest(t *testing.T) {
	names := []string{"depth", "density", "ambient", "a", "T", "p_sea", "rating", "überdruck"}
	for _, test := range []struct{ word, want string }{
		{"dpeth", "depth"},    // an exchange
		{"deph", "depth"},     // a letter missing
		{"deepth", "depth"},   // one too many
		{"debth", "depth"},    // another letter
		{"densty", "density"}, // and not depth
		{"p_see", "p_sea"},    //
		{"psea", "p_sea"},     //
		{"uberdruck", "überdruck"},
		{"Depth", "depth"},  // letter case
		{"t", "T"},          // a single letter only in the other case
		{"b", ""},           // and for no other
		{"ab", ""},          //
		{"depth", ""},       // the word itself is no suggestion
		{"temperature", ""}, //
		{"", ""},            //
		{"dxxxx", ""},       //
		{"amb", ""},         // too short for what is missing
	} {
		if got := Nearest(test.word, names); got != test.want {
			t.Errorf("%q: %q, not %q", test.word, got, test.want)
		}
	}
	// Of equally near ones the first by name, whatever their order.
	if got := Nearest("xat", []string{"rat", "cat", "bat"}); got != "bat" {
		t.Errorf("xat: %q", got)
	}
	if got := Nearest("x", nil); got != "" {
		t.Errorf("of none: %q", got)
	}
}

// TestEdits holds the counting, with its early end, against a plain recursion.
func TestEdits(t *testing.T) {
	var plain func(a, b string) int
	plain = func(a, b string) int {
		if a == "" || b == "" {
			return len(a) + len(b)
		}
		cost := 1
		if a[0] == b[0] {
			cost = 0
		}
		best := min(plain(a[1:], b[1:])+cost, plain(a[1:], b)+1, plain(a, b[1:])+1)
		if len(a) > 1 && len(b) > 1 && a[0] == b[1] && a[1] == b[0] {
			best = min(best, plain(a[2:], b[2:])+1)
		}
		return best
	}
	var words []string
	for n := 0; n < 4*4*4*4; n++ {
		word := ""
		for rest := n; rest > 0; rest /= 4 {
			word += string(rune('a' + rest%4))
		}
		words = append(words, word)
	}
	var work edits
	for _, a := range words {
		for _, b := range words[:64] {
			want := plain(a, b)
			for limit := 0; limit < 4; limit++ {
				if got := work.between([]rune(a), []rune(b), limit); got != want && (got <= limit || want <= limit) {
					t.Fatalf("%q to %q within %d: %d, not %d", a, b, limit, got, want)
				}
			}
		}
	}
}

func TestList(t *testing.T) {
	var l List
	if !l.Empty() || l.Full() || len(l.Sorted()) != 0 {
		t.Error("a new list holds problems")
	}
	l.Add(Span{3, 2, 1}, Syntax, "third", "")
	l.Add(Span{1, 9, 1}, Syntax, "second", "")
	l.Add(Span{1, 4, 1}, Kind, "first", "")
	l.Add(Span{3, 2, 1}, Name, "fourth", "in the order of telling")
	l.Add(Span{3, 2, 1}, Syntax, "third", "") // told once
	var order []string
	for _, p := range l.Sorted() {
		order = append(order, p.Message)
	}
	if got := strings.Join(order, " "); got != "first second third fourth" {
		t.Error(got)
	}
	if got := l.Sorted()[3].String(); got != "line 3, column 2: fourth; in the order of telling [name]" {
		t.Error(got)
	}
	for i := 0; i < 2*MostProblems; i++ {
		l.Add(Span{i + 10, 1, 1}, Syntax, "one of many", "")
	}
	if len(l.Sorted()) != MostProblems || !l.Full() || l.Empty() {
		t.Errorf("%d problems", len(l.Sorted()))
	}
}

func TestSpan(t *testing.T) {
	for _, test := range []struct{ from, to, want Span }{
		{Span{1, 2, 3}, Span{1, 7, 2}, Span{1, 2, 7}},
		{Span{1, 2, 3}, Span{2, 7, 2}, Span{1, 2, 3}}, // another line
		{Span{1, 7, 2}, Span{1, 2, 3}, Span{1, 7, 2}}, // before it
	} {
		if got := test.from.To(test.to); got != test.want || got.At() != got {
			t.Errorf("%v to %v: %v", test.from, test.to, got)
		}
	}
}

// BenchmarkNearest looks a word up among many like it.
func BenchmarkNearest(b *testing.B) {
	names := make([]string, 100_000)
	for i := range names {
		names[i] = "pressure_" + strconv.Itoa(i)
	}
	for b.Loop() {
		Nearest("pressure_x123x", names)
	}
}
