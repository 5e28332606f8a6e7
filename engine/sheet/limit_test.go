package sheet

import (
	"strconv"
	"strings"
	"testing"
	"time"

	"plumbrule/engine/problem"
)

func TestLimits(t *testing.T) {
	row := strings.Repeat("1|", 999) + "1"
	header := strings.TrimSuffix(strings.Repeat("c|", 1000), "|")
	for _, c := range []struct {
		name, text string
		at         problem.Span // zero: no problem
		message    string
	}{
		{"line", "known a = 1 #" + strings.Repeat("é", MostLine-13), problem.Span{}, ""},
		{"long line", "known a = 1\nknown b = 1 #" + strings.Repeat("é", MostLine-12), problem.Span{Line: 2, Column: MostLine + 1, Length: 1}, "10000 characters"},
		{"long row", "table t\n  a\n " + strings.Repeat("1", MostLine), problem.Span{Line: 3, Column: MostLine + 1, Length: 1}, "10000 characters"},
		{"blank ends do not count", "known a = 1" + strings.Repeat(" ", MostLine), problem.Span{}, ""},
		{"text", strings.Repeat("#\n", MostStatements) + strings.Repeat("\n", MostText-2*MostStatements), problem.Span{}, ""},
		{"long text", strings.Repeat("\n", MostText+1), problem.Span{Line: 0, Column: 0, Length: 0}, "4194304 are read"},
		{"statements", strings.Repeat("known a\n", MostStatements), problem.Span{}, ""},
		{"many statements", strings.Repeat("known a\n", MostStatements) + "\nderive b = 1\n", problem.Span{Line: MostStatements + 2, Column: 1, Length: 12}, "200000 statements"},
		{"columns", "table t\n " + header + "\n " + row, problem.Span{}, ""},
		{"many columns", "table t\n " + header + "|d\n " + row + "|1", problem.Span{Line: 2, Column: 2002, Length: 1}, "1000 columns"},
		{"cells", "table t\n " + header + "\n" + strings.Repeat(" "+row+"\n", MostCells/1000), problem.Span{}, ""},
		{"many cells", "table t\n " + header + "\n" + strings.Repeat(" "+row+"\n", MostCells/1000+1), problem.Span{Line: MostCells/1000 + 3, Column: 2, Length: 1999}, "1000000 cells"},
		{"rows", "table t\n a\n" + strings.Repeat(" 1\n", MostRows), problem.Span{}, ""},
		{"many rows", "table t\n a\n" + strings.Repeat(" 1\n", MostRows+1), problem.Span{Line: MostRows + 3, Column: 2, Length: 1}, "1000000 cells"},
		{"points", "vary a = 0 to 999999 by 1", problem.Span{}, ""},
		{"many points", "vary a = 0 to 1000000 by 1", problem.Span{Line: 1, Column: 26, Length: 1}, "1000000 points"},
	} {
		var problems problem.List
		s := Parse(c.text, &problems)
		found := problems.Sorted()
		if c.message == "" {
			if len(found) > 0 {
				t.Errorf("%s: %s", c.name, found[0])
			}
			continue
		}
		if len(found) != 1 || found[0].Span != c.at || found[0].Code != problem.Limit || !strings.Contains(found[0].Message, c.message) {
			t.Errorf("%s: %v", c.name, found)
		}
		// What is behind a limit is not lost.
		if c.name == "many statements" && Tidy(s) != c.text {
			t.Errorf("%s: tidying lost text", c.name)
		}
	}
}

// hundredThousand gives a sheet of that many statements of several kinds.
func hundredThousand(n int) string {
	var text strings.Builder
	for i := 0; i < n/4; i++ {
		k := strconv.Itoa(i)
		text.WriteString("known k" + k + " [m]=1 ±0.1\nderive d" + k + " [m]=k" + k + "*2 # n\nderive e" + k + "=d" + k + "\nrequire r" + k + "=d" + k + ">1\n")
	}
	return text.String()
}

func TestTimeGrowsWithLength(t *testing.T) {
	if testing.Short() {
		t.Skip("long texts")
	}
	// Texts that invite looking at the same place again and again. Each has
	// nearly the most bytes of a sheet. A linear pass needs some tenths of a
	// second, one that is quadratic minutes; the bound tells these apart on a
	// busy machine too.
	fill := func(piece string) string { return strings.Repeat(piece, (MostText-20_000)/len(piece)) }
	line := func(piece string) string { return fill(strings.Repeat(piece, (MostLine-20)/len(piece)) + "\n") }
	for name, text := range map[string]string{
		"statements":         hundredThousand(100_000),
		"parameters":         fill("law f(a" + strings.Repeat(",a [m]", 1600) + ") = 1\n"),
		"lines of a formula": "derive a = 1\n" + fill(" + 1\n"),
		"lines of a law":     "law f(a\n" + fill(" ,a [m]\n") + " ) = 1",
		"open brackets":      line("[#"),
		"open quotes":        line(`\"`),
		"units not closed":   fill("known a [m\n"),
		"bytes not UTF-8":    fill("\xff\n"),
		"one line":           fill("\xff"),
		"no statements":      fill("x\n"),
		"gaps":               "known a\n" + fill("\n\n\n# a\n"),
		"choices":            fill("known a = \"a\"" + strings.Repeat(` or "a"`, 1400) + "\n"),
		"lists":              fill("vary a over [1" + strings.Repeat(",1", 4900) + "]\n"),
		"names":              fill("draw a" + strings.Repeat(",a", 4900) + " against b\n"),
		"wide and narrow":    "known " + strings.Repeat("a", 9000) + " = 1\n" + fill("known a = 1 # n\n"),
		"wide cells":         "table t\n a | b\n 1" + strings.Repeat("0", 300) + " | 1\n" + fill(" 1 | 1 # n\n"),
	} {
		start := time.Now()
		var problems problem.List
		s := Parse(text, &problems)
		parsed := time.Since(start)
		start = time.Now()
		tidy := Tidy(s)
		tidied := time.Since(start)
		t.Logf("%s: %d bytes, %d statements: parsed in %v, tidied in %v to %d bytes", name, len(text), len(s.Statements), parsed, tidied, len(tidy))
		if parsed > 15*time.Second || tidied > 15*time.Second {
			t.Errorf("%s: parsed in %v, tidied in %v", name, parsed, tidied)
		}
		if len(tidy) > 10*MostText {
			t.Errorf("%s: tidied to %d bytes", name, len(tidy))
		}
	}
}

func TestWideLinesKeepTheirLimit(t *testing.T) {
	// Tidying lengthens lines; where one would pass the limit it stays as written.
	wide := strings.Repeat("1|", 900) + "1"
	header := strings.TrimSuffix(strings.Repeat(strings.Repeat("c", 9)+"|", 901), "|")
	for _, text := range []string{
		"table t\n " + header + "\n " + wide + "\n",
		"vary a over [1" + strings.Repeat(",1", 4980) + "]\nvary b over [1]\n",
		"#" + strings.Repeat("x", MostLine-1) + "\n",
		"known a = 1 # n\nknown " + strings.Repeat("b", MostLine-9) + "=1\n",
		"known a=1#" + strings.Repeat("x", MostLine-10) + "\n",
	} {
		parse(t, text)
		checkTidy(t, text)
	}
}

func BenchmarkParse(b *testing.B) {
	text := hundredThousand(100_000)
	b.SetBytes(int64(len(text)))
	b.ReportAllocs()
	for b.Loop() {
		var problems problem.List
		Parse(text, &problems)
	}
}

func BenchmarkTidy(b *testing.B) {
	var problems problem.List
	s := Parse(hundredThousand(100_000), &problems)
	b.ReportAllocs()
	for b.Loop() {
		Tidy(s)
	}
}
