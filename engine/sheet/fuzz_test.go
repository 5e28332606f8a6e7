package sheet

import (
	"math/rand"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine/problem"
)

func FuzzParse(f *testing.F) {
	for _, pattern := range []string{"testdata/sheets/*.plumb", "testdata/bad/*.plumb"} {
		files, _ := filepath.Glob(pattern)
		for _, file := range files {
			text, err := os.ReadFile(file)
			if err != nil {
				f.Fatal(err)
			}
			// Short seeds vary faster: a few lines each.
			lines := strings.SplitAfter(string(text), "\n")
			for i := 0; i < len(lines); i += 6 {
				f.Add(strings.Join(lines[i:min(i+8, len(lines))], ""))
			}
		}
	}
	f.Add("\uFEFFknown a = 1\r\n\n\n  # b\n")
	f.Add("seek x = 0 to\n 1 where\n a # b\n ==\n\n c")
	f.Fuzz(func(t *testing.T, text string) {
		checkTidy(t, text)
		checkPlaces(t, text)
	})
}

// checkPlaces checks that every text stands where its place says, and that
// every problem stands on a line of the sheet.
func checkPlaces(t *testing.T, text string) {
	t.Helper()
	var problems problem.List
	s := Parse(text, &problems)
	text = strings.TrimPrefix(text, byteOrderMark)
	lines := strings.Split(string([]rune(text)), "\n")
	at := func(span problem.Span) (string, bool) {
		if span.Line < 1 || span.Line > len(lines) || span.Column < 1 || span.Length < 0 {
			return "", false
		}
		runes := []rune(lines[span.Line-1])
		end := span.Column - 1 + span.Length
		if end > len(runes) {
			return "", false
		}
		return string(runes[span.Column-1 : end]), true
	}
	check := func(piece Text) {
		t.Helper()
		if !piece.Present() {
			return
		}
		for i, want := range strings.Split(piece.Value, "\n") {
			span := piece.Span
			if len(piece.Lines) > 0 {
				span = piece.Lines[i]
			}
			if got, ok := at(span); !ok || got != want {
				t.Errorf("%q: %q is not at %+v but %q", text, want, span, got)
			}
		}
		// Every character is found again through its offset.
		for offset, r := range piece.Value {
			if r == '\n' {
				continue
			}
			if offset > 200 {
				break
			}
			span := piece.SpanOf(offset, len(string(r)))
			if got, ok := at(span); !ok || got != string(r) {
				t.Errorf("%q: offset %d of %q is not at %+v but %q", text, offset, piece.Value, span, got)
				return
			}
		}
	}
	for _, statement := range s.Statements {
		for _, piece := range textsOf(statement) {
			check(piece)
		}
		for _, n := range statement.Notes() {
			if got, ok := at(n.Span); !ok || strings.TrimSpace(strings.TrimPrefix(got, "#")) != n.Value {
				t.Errorf("%q: the note %q is not at %+v but %q", text, n.Value, n.Span, got)
			}
		}
	}
	for _, p := range problems.Sorted() {
		p.Length = 0
		if _, ok := at(p.Span); !ok && p.Code != problem.Limit {
			t.Errorf("%q: outside of the sheet: %s", text, p)
		}
	}
}

// textsOf gives all texts of a statement but the quoted ones.
func textsOf(s Statement) []Text {
	switch s := s.(type) {
	case *Prose:
		return []Text{s.Text}
	case *Title:
		return []Text{s.Text}
	case *Known:
		texts := []Text{s.Name, s.Unit, s.NumberText, s.TruthText}
		if s.Uncertainty != nil {
			texts = append(texts, s.Uncertainty.NumberText, s.Uncertainty.CoverageText, s.Uncertainty.FreedomText)
		}
		if s.Within != nil {
			texts = append(texts, s.Within.LowText, s.Within.HighText)
		}
		return texts
	case *Derive:
		return []Text{s.Name, s.Unit, s.Formula}
	case *Law:
		texts := []Text{s.Name, s.Unit, s.Formula, s.Valid}
		for _, p := range s.Parameters {
			texts = append(texts, p.Name, p.Unit)
		}
		return texts
	case *Require:
		return []Text{s.Name, s.Condition}
	case *Table:
		texts := []Text{s.Name}
		for _, c := range s.Columns {
			texts = append(texts, c.Name, c.Unit)
		}
		for _, r := range s.Cells {
			texts = append(texts, r...)
		}
		return texts
	case *Vary:
		return append([]Text{s.Name, s.LowText, s.HighText, s.StepText, s.StepsText}, s.OverTexts...)
	case *Seek:
		return []Text{s.Name, s.Unit, s.LowText, s.HighText, s.Left, s.Right}
	case *Correlate:
		return []Text{s.A, s.B, s.CoefficientText}
	case *Draw:
		return append([]Text{s.Against}, s.Names...)
	case *Unread:
		return []Text{s.Text}
	}
	return nil
}

// writer makes sheets at random.
type writer struct {
	random *rand.Rand
	out    strings.Builder
}

func (w *writer) one(of ...string) string { return of[w.random.Intn(len(of))] }

func (w *writer) maybe(text string) string {
	if w.random.Intn(2) == 0 {
		return ""
	}
	return text
}

// gap gives blanks, or none where none are needed.
func (w *writer) gap() string { return w.one("", "", " ", "  ", "\t", "\u00a0 ") }

func (w *writer) name() string {
	return w.one("a", "b_2", "Ωé", "_", "depth", "to", "by", "steps", "k", "dof", "normal", strings.Repeat("long", 12))
}

func (w *writer) unit() string {
	return w.one("", "", "[m]", "[ kg/(m  s) ]", "[#/cm^3]", "[°C]", "["+strings.Repeat("m ", 20)+"]")
}

func (w *writer) number() string {
	return w.one("0", "1", "-2.5", "+3e4", ".5", "7.", "1E-3", strconv.FormatFloat(w.random.NormFloat64(), 'g', -1, 64))
}

func (w *writer) note() string {
	return w.one("", "", "", " # note", "#tight", " #  with \"quote ] and # more", "#")
}

// line ends a line and may add indented notes and empty lines.
func (w *writer) further() string {
	return w.note() + w.one("\n", "\n", "\r\n", "\n   # alone\n", "\n\n\n") + w.one(" ", "    ", "\t")
}

func (w *writer) formula() string {
	out := w.one("a", "f(a, b)", "\"x  # y\"", "1[m]")
	for w.random.Intn(2) == 0 {
		out += w.one(" ", "", "  ", w.further()) + w.one("+ ", "*", " - ") + w.one("b", "(c  <=  d)", "[1, 2][#/m]", "'q  r'", "g(a == b)")
	}
	return out
}

func (w *writer) low() string { return w.one("0", "-1", "1e-3") }

func (w *writer) high() string { return w.one("1", "2.5", "1e1") }

func (w *writer) statement() {
	n, g := w.name(), w.gap
	switch w.random.Intn(13) {
	case 0:
		w.out.WriteString("known " + n + g() + w.unit() + g() + w.maybe("="+g()+w.number()+w.maybe(g()+w.one("±", "+/-")+g()+w.one("0.1", "3", "1e2")+w.one("", " uniform", " triangular", " arcsine", " at k=2", " at  k = 1.96 dof 9", " dof 12.5"))+w.maybe(" within "+w.low()+" to "+w.high())))
	case 1:
		w.out.WriteString("known " + n + g() + "=" + g() + w.one(`"N2"`, `"N2"or  "He # 3"`, `"a\"b\\" or "c" or ""`, "true", "false"))
	case 2, 3:
		w.out.WriteString("derive " + n + g() + w.unit() + g() + "=" + w.one(g(), w.further()) + w.formula())
	case 4:
		w.out.WriteString("law " + n + "(" + w.maybe("x"+g()+w.unit()+w.maybe(g()+","+w.one(g(), w.further())+"y "+w.unit())) + ")" + w.unit() + " =" + g() + w.formula() + w.maybe(w.further()+"valid "+w.formula()))
	case 5:
		w.out.WriteString("require " + n + "=" + g() + w.formula())
	case 6:
		columns := 1 + w.random.Intn(4)
		w.out.WriteString("table " + n + w.further())
		for row := 0; row <= 1+w.random.Intn(4); row++ {
			if row > 0 {
				w.out.WriteString(w.further())
			}
			bar := w.one("|", " | ", "  ", "\t")
			for c := 0; c < columns; c++ {
				if c > 0 {
					w.out.WriteString(bar)
				}
				if row == 0 {
					w.out.WriteString("c" + strconv.Itoa(c) + w.unit())
				} else {
					w.out.WriteString(w.number())
				}
			}
		}
	case 7:
		w.out.WriteString("vary " + n + " = " + w.low() + " to  " + w.high() + w.one(" by 0.25", " in 10 steps"))
	case 8:
		w.out.WriteString("vary " + n + w.one(" over", "=over") + g() + "[" + w.number() + g() + w.maybe(","+g()+w.number()) + "]")
	case 9:
		w.out.WriteString("seek " + n + w.unit() + "=" + w.low() + " to" + w.one(" ", w.further()) + w.high() + w.one(" ", w.further()) + "where " + w.formula() + w.one(" ", w.further()) + "==" + w.one("", w.further()) + w.formula())
	case 10:
		w.out.WriteString("correlate " + n + " other" + g() + "=" + w.one("0.5", "-1", "1."))
	case 11:
		w.out.WriteString("draw " + n + w.maybe(g()+","+g()+w.name()) + " against " + w.name())
	case 12:
		w.out.WriteString("# prose\n#" + w.one("", " ", "  deep", "#", "\ttab"))
	}
	w.out.WriteString(w.note() + w.one("\n", "\n", "\r\n", "\n\n \n", "\n  # alone\n"))
}

func TestTidyOfSheetsMadeAtRandom(t *testing.T) {
	random := rand.New(rand.NewSource(20))
	kinds := map[string]int{}
	for i := 0; i < 3000 && !t.Failed(); i++ {
		w := &writer{random: random}
		for n := random.Intn(8); n >= 0; n-- {
			w.statement()
		}
		text := w.out.String()
		for _, s := range parse(t, text).Statements {
			kinds[s.Word()]++
		}
		checkTidy(t, text)
		checkPlaces(t, text)
	}
	for _, word := range Words()[1:] {
		if kinds[word] < 100 {
			t.Errorf("only %d sheets with %s", kinds[word], word)
		}
	}
}
