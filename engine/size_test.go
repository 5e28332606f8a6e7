package engine_test

import (
	"errors"
	"fmt"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/functions"
)

// chainSheet derives each entry from the one before.
func chainSheet(n int) string {
	var b strings.Builder
	b.WriteString("known e0 [m] = 1\n")
	for i := 1; i <= n; i++ {
		fmt.Fprintf(&b, "derive e%d [m] = e%d * 1.01 + 1[mm]\n", i, i-1)
	}
	return b.String()
}

// backwardSheet is a chain whose last link stands first.
func backwardSheet(n int) string {
	lines := strings.Split(strings.TrimSpace(chainSheet(n)), "\n")
	for i, j := 0, len(lines)-1; i < j; i, j = i+1, j-1 {
		lines[i], lines[j] = lines[j], lines[i]
	}
	return strings.Join(lines, "\n")
}

// fanSheet derives every entry from the same two knowns, in many units.
func fanSheet(n int) string {
	var b strings.Builder
	b.WriteString("known a [m] = 1\nknown b [kPa] = 2\n")
	units := []string{"m bar", "ft psi", "km Pa", "fathom kPa"}
	for i := 1; i <= n; i++ {
		fmt.Fprintf(&b, "derive e%d [%s] = a*b*%d\n", i, units[i%len(units)], i)
	}
	return b.String()
}

// requireSheet requires something of each known.
func requireSheet(n int) string {
	var b strings.Builder
	for i := 0; i < n/2; i++ {
		fmt.Fprintf(&b, "known k%d [m] = %d within 0 to 1e6\nrequire r%d = k%d >= 2 * k%d\n", i, i, i, i, i/2)
	}
	return b.String()
}

// longFormula is one sum as long as a formula may be.
func longFormula() string {
	return "known a = 1\nderive b = a" + strings.Repeat("+a/2", formula.MostCharacters/4-10)
}

// deepFormula nests parentheses as deep as a formula may be long.
func deepFormula() string {
	n := formula.MostCharacters/2 - 10
	return "known a = 1\nderive b = " + strings.Repeat("(", n) + "a" + strings.Repeat(")", n)
}

// deepSums nests sums in parentheses.
func deepSums() string {
	n := formula.MostCharacters/6 - 10
	return "known a = 1\nderive b = " + strings.Repeat("(a/2+", n) + "a" + strings.Repeat(")", n)
}

// deepCalls nests calls.
func deepCalls() string {
	n := formula.MostCharacters/5 - 10
	return "known a = 1\nderive b = " + strings.Repeat("sin(", n) + "a" + strings.Repeat(")", n)
}

// The sheets that grow; each is linear in its number of entries.
var growing = []struct {
	name string
	text func(n int) string
}{{"chain", chainSheet}, {"backward", backwardSheet}, {"fan", fanSheet}, {"require", requireSheet}}

// BenchmarkCompile measures the compile time an entry, which should not grow
// with the number of entries.
func BenchmarkCompile(b *testing.B) {
	for _, sheet := range growing {
		for _, n := range []int{1_000, 10_000, 100_000} {
			b.Run(sheet.name+"/"+strconv.Itoa(n), func(b *testing.B) {
				text := sheet.text(n)
				for b.Loop() {
					if _, err := engine.Compile(text, functions.All()); err != nil {
						b.Fatal(err)
					}
				}
				b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/entry")
			})
		}
	}
	for _, one := range []struct{ name, text string }{{"long", longFormula()}, {"deep", deepFormula()}, {"sums", deepSums()}, {"calls", deepCalls()}} {
		b.Run(one.name, func(b *testing.B) {
			for b.Loop() {
				if _, err := engine.Compile(one.text, functions.All()); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(len(one.text)), "ns/byte")
		})
	}
}

// badSheets are sheets with a problem in each of their lines.
func badSheets(n int) map[string]string {
	lines := map[string]func(i int) string{
		"names":      func(i int) string { return fmt.Sprintf("derive pa_%d = p_a%d + 1", i, i) },
		"calls":      func(i int) string { return fmt.Sprintf("derive p%d = sea_densty(%d)", i, i) },
		"units":      func(i int) string { return fmt.Sprintf("known a%d [metre] = 1", i) },
		"statements": func(i int) string { return fmt.Sprintf("deriv a%d = 1", i) },
		"draws":      func(i int) string { return fmt.Sprintf("draw q%d against k0", i) },
		"dimensions": func(i int) string { return fmt.Sprintf("derive a%d = 1[m] + %d[s]", i, i) },
		"syntax":     func(i int) string { return fmt.Sprintf("derive a%d = (1 + %d", i, i) },
		"circles":    func(i int) string { return fmt.Sprintf("derive a%d = a%d", i, i^1) },
		"duplicates": func(i int) string { return "known a = 1" },
	}
	sheets := map[string]string{}
	for name, line := range lines {
		var b strings.Builder
		if name == "draws" {
			for i := 0; i < n; i++ {
				fmt.Fprintf(&b, "known k%d = 1\n", i)
			}
		}
		for i := 0; i < n; i++ {
			b.WriteString(line(i) + "\n")
		}
		sheets[name] = b.String()
	}
	return sheets
}

// BenchmarkBadSheet measures sheets with 100,000 problems.
func BenchmarkBadSheet(b *testing.B) {
	for name, text := range badSheets(100_000) {
		b.Run(name, func(b *testing.B) {
			for b.Loop() {
				if _, err := engine.Compile(text, functions.All()); err == nil {
					b.Fatal("no problem")
				}
			}
		})
	}
}

// A sheet that is wrong in very many places tells the first of them and no
// more than the stated number.
func TestManyProblems(t *testing.T) {
	for name, text := range badSheets(2_000) {
		_, err := engine.Compile(text, functions.All())
		var sheet *engine.SheetError
		if !errors.As(err, &sheet) || len(sheet.Problems) != problem.MostProblems {
			t.Errorf("%s: %v", name, err)
		}
	}
}

// Formulas as long and as deep as the limits allow compile; longer ones are
// reported.
func TestFormulaLimits(t *testing.T) {
	for _, test := range []struct {
		name, text string
		code       problem.Code
		catalogue  *law.Catalogue
	}{
		{"deep", deepFormula(), "", functions.All()},
		{"sums", deepSums(), "", functions.All()},
		{"calls", deepCalls(), "", functions.All()},
		{"long", longFormula(), "", functions.All()},
		{"too long", "derive a = 1" + strings.Repeat("\n  + 1", formula.MostCharacters/3), problem.Limit, functions.All()},
		{"line", "derive a = 1" + strings.Repeat(" ", 10_000) + " + 1", problem.Limit, functions.All()},
		{"many choices", manyChoices(), problem.Limit, testCatalogue(t)},
	} {
		found := codesIn(t, test.text, test.catalogue)
		if test.code == "" && len(found) != 0 || test.code != "" && (len(found) != 1 || found[0].Code != test.code) {
			t.Errorf("%s: %v", test.name, found)
		}
	}
}

// manyChoices is a sheet whose call would be laid out for 1,600 pairs of choices.
func manyChoices() string {
	var b strings.Builder
	for _, gas := range []string{"first", "second"} {
		fmt.Fprintf(&b, "known %s = \"H1\"", gas)
		for i := 2; i <= 40; i++ {
			fmt.Fprintf(&b, " or \"H%d\"", i)
		}
		b.WriteByte('\n')
	}
	b.WriteString("derive m = paired(first, second)\n")
	return b.String()
}
