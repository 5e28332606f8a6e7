package sheet

import (
	"os"
	"path/filepath"
	"reflect"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine/problem"
)

// describe writes all that a statement says, without places, so that two
// statements can be compared. Runs of blanks outside of quotes count as one.
func describe(s Statement) string {
	var out strings.Builder
	out.WriteString(s.Word())
	if s.Faulty() {
		out.WriteString(" (faulty)")
	}
	var walk func(v reflect.Value)
	walk = func(v reflect.Value) {
		switch v.Kind() {
		case reflect.Pointer:
			if v.IsNil() {
				out.WriteString(" none")
				return
			}
			walk(v.Elem())
		case reflect.Slice:
			out.WriteString(" [")
			for i := 0; i < v.Len(); i++ {
				walk(v.Index(i))
			}
			out.WriteString(" ]")
		case reflect.Struct:
			if t, ok := v.Interface().(Text); ok {
				if !t.Present() {
					out.WriteString(" -")
					return
				}
				lines := strings.Split(t.Value, "\n")
				for i := range lines {
					if _, prose := s.(*Prose); !prose {
						lines[i] = squeeze(lines[i])
					}
				}
				out.WriteString(" {" + strings.Join(lines, "\n") + "}")
				return
			}
			for i := 0; i < v.NumField(); i++ {
				if v.Type().Field(i).Name != "entry" {
					walk(v.Field(i))
				}
			}
		case reflect.Float64:
			out.WriteString(" " + strconv.FormatFloat(v.Float(), 'g', -1, 64))
		case reflect.Int:
			out.WriteString(" " + strconv.FormatInt(v.Int(), 10))
		case reflect.Bool:
			out.WriteString(" " + strconv.FormatBool(v.Bool()))
		case reflect.String:
			out.WriteString(" " + v.String())
		default:
			panic(v.Kind())
		}
	}
	walk(reflect.ValueOf(s))
	for _, n := range s.Notes() {
		out.WriteString(" #" + n.Value)
	}
	return out.String()
}

// all describes the statements of a sheet, gaps left out.
func all(s *Sheet) []string {
	var out []string
	for _, statement := range s.Statements {
		if _, gap := statement.(*Blank); !gap {
			out = append(out, describe(statement))
		}
	}
	return out
}

func parse(t *testing.T, text string) *Sheet {
	t.Helper()
	var problems problem.List
	s := Parse(text, &problems)
	for _, p := range problems.Sorted() {
		t.Errorf("%q: unexpected problem: %s", text, p)
	}
	return s
}

func TestGoodStatements(t *testing.T) {
	// Each row: spellings of one statement, and what it says. The order of the
	// parts is that of the fields in statement.go; `-` stands for an absent
	// text, `none` for an absent part. The forms are the rows of the sheet
	// language's table of statements.
	for _, row := range []struct {
		want      string
		spellings []string
	}{
		{"title {A mooring}", []string{"title A mooring", "title   A   mooring  "}},
		{`title {The "#1" float} #note`, []string{`title The "#1" float # note`}},
		{`title {A 5" pipe} #note`, []string{`title A 5" pipe # note`}},
		{"known {a} {m} true 3 {3} - [ ] none - none none", []string{"known a [m] = 3", "known a[m]=3", "known\ta\t[ m ] =\t3"}},
		{"known {a} - true -3000 {-3e3} - [ ] none - none none #x", []string{"known a = -3e3 # x", "known a=-3e3#x", "known a = -3e3 # x\n    #"}},
		{"known {a} {m} false 0 - - [ ] none - none none", []string{"known a [m]", "known a[m]"}},
		{"known {a} - false 0 - - [ ] none - none none", []string{"known a"}},
		{"known {a} {m} true 1.6 {1.6} - [ ] none - {0.2} 0.2 normal 1 - 0 - none", []string{"known a [m] = 1.6 ± 0.2", "known a [m] = 1.6±0.2", "known a [m] = 1.6 +/- 0.2", "known a [m] =1.6+/-0.2"}},
		{"known {a} - true 1 {1} - [ ] none - {.5} 0.5 uniform 1 - 0 - none", []string{"known a = 1 ± .5 uniform", "known a = 1+/-.5   uniform"}},
		{"known {a} - true 1 {1.} - [ ] none - {5} 5 triangular 1 - 0 - none", []string{"known a = 1. ± 5 triangular"}},
		{"known {a} - true 1 {+1} - [ ] none - {5} 5 arcsine 1 - 0 - -1 1 {-1} {1}", []string{"known a = +1 ± 5 arcsine within -1 to 1"}},
		{"known {a} - true 1 {1} - [ ] none - {5} 5 normal 2 {2} 0 - none", []string{"known a = 1 ± 5 at k=2", "known a = 1 ± 5 at k = 2"}},
		{"known {a} - true 1 {1} - [ ] none - {5} 5 normal 2 {2} 9 {9} none", []string{"known a = 1 ± 5 at k=2 dof 9"}},
		{"known {a} - true 1 {1} - [ ] none - {5} 5 normal 1 - 9.5 {9.5} none", []string{"known a = 1 ± 5 dof 9.5"}},
		{"known {a} - true 1 {1} - [ ] none - none 0 2 {0} {2}", []string{"known a = 1 within 0 to 2", "known a=1 within 0   to 2"}},
		{"known {a} {1} false 0 - - [ ] none - none 0 2 {0} {2}", []string{"known a [1] within 0 to 2"}},
		{"known {gas} - true 0 - {N2} [ {N2} ] none - none none", []string{`known gas = "N2"`, `known gas="N2"`}},
		{"known {gas} - true 0 - {N2} [ {N2} {He} {CO2} ] none - none none", []string{`known gas = "N2" or "He" or "CO2"`, `known gas="N2"or"He"or "CO2"`}},
		{`known {gas} - true 0 - {a"b\c#d} [ {a"b\c#d} ] none - none none`, []string{`known gas = "a\"b\\c#d"`}},
		{"known {on} - true 0 - - [ ] true {true} none none", []string{"known on = true", "known on=true"}},
		{"known {on} - true 0 - - [ ] false {false} none none #off", []string{"known on = false # off"}},
		{"known {Ωé_1} {#/m^3} true 1 {1} - [ ] none - none none #n", []string{"known Ωé_1 [#/m^3] = 1 # n"}},
		{"known {a} {\"} true 1 {1} - [ ] none - none none #5\" x", []string{"known a [\"] = 1 # 5\" x"}},
		{"derive {p} {MPa} {f(a, b) * 2}", []string{"derive p [MPa] = f(a, b) * 2", "derive p[MPa]=f(a,  b) *\t2"}},
		{"derive {p} - {a\n+ b\n+ c} #one #two", []string{"derive p = a # one\n  + b\n\t+ c # two", "derive p = a # one\n\n  + b # two\n\n\n  + c"}},
		{"derive {p} - {a}", []string{"derive p =\n  a", "derive p\n  = a"}},
		{"derive {p} - {g(\"a  # b\")} #n", []string{"derive p = g(\"a  # b\") # n"}},
		{"derive {p} - {[1,\n2][m]} #one #two", []string{"derive p = [1, # one\n 2][m] # two"}},
		{"law {f} [ {a} {m} {b} - ] {N} {a * b} -", []string{"law f(a [m], b) [N] = a * b", "law f ( a[m],b )[N]=a * b"}},
		{"law {f} [ ] - {1} -", []string{"law f() = 1"}},
		{"law {f} [ {a} {m} ] - {a\n+ 1} {a > 1\nand a < 2}", []string{"law f(a [m]) = a\n  + 1\n  valid a > 1\n  and a < 2"}},
		{"law {f} [ {a} {m} ] - {a} {a > 1} #range", []string{"law f(a [m]) = a\n  valid a > 1 # range", "law f(a [m])\n  = a\n  valid # range\n  a > 1"}},
		{"require {m} {a >= 1.25 * b}", []string{"require m = a >= 1.25 * b", "require m=a >= 1.25 * b"}},
		{"table {t} [ {a} {m} {b} - ] [ [ 1 2 ] [ -3 40 ] ] [ [ {1} {2} ] [ {-3} {4e1} ] ]", []string{
			"table t\n  a [m] | b\n  1 | 2\n  -3 | 4e1", "table t\n a[m]|b\n 1|2\n -3|4e1", "table t\n  a [m]  b\n  1  2\n  -3  4e1",
			"table t\n\ta [m]\tb\n\t1\t2\n\n\t-3\t4e1", "table t\n  | a [m] | b |\n  | 1 | 2 |\n  | -3 | 4e1 |", "table t\n  a  [m]   b\n  1 | 2\n  -3   4e1"}},
		{"table {t} [ {a} - ] [ [ 1 ] ] [ [ {1} ] ] #n #row", []string{"table t # n\n  a\n  1 # row", "table t\n  # n\n  a\n  1\n  # row"}},
		{"vary {a} 0 6 {0} {6} 0.5 {0.5} 0 - [ ] [ ]", []string{"vary a = 0 to 6 by 0.5", "vary a=0 to 6 by 0.5"}},
		{"vary {a} 0 6 {0} {6} 0 - 3 {3} [ ] [ ]", []string{"vary a = 0 to 6 in 3 steps"}},
		{"vary {a} 0 0 - - 0 - 0 - [ 1 2.5 -3 ] [ {1} {2.5} {-3} ]", []string{"vary a over [1, 2.5, -3]", "vary a = over [1,2.5,-3]", "vary a over[ 1 ,2.5 , -3 ]"}},
		{"seek {x} {m} 0 10 {0} {10} {f(x == 1) <= x} {3}", []string{"seek x [m] = 0 to 10 where f(x == 1) <= x == 3", "seek x[m]=0 to 10 where f(x == 1) <= x==3", "seek x [m] = 0 to 10\n  where f(x == 1) <= x\n  == 3"}},
		{"correlate {a} {b} -0.8 {-0.8}", []string{"correlate a b = -0.8", "correlate  a  b=-0.8"}},
		{"draw [ {y} ] {x}", []string{"draw y against x"}},
		{"draw [ {y} {against} ] {x} #n", []string{"draw y, against against x # n", "draw y,against against x#n"}},
		{" {one\n  two\n}", []string{"# one\n#   two\n#", "#one\n#   two  \n# ", "# one\r\n#   two\r\n#\r\n"}},
	} {
		for _, spelling := range row.spellings {
			s := parse(t, spelling)
			got := all(s)
			if len(got) != 1 || got[0] != row.want {
				t.Errorf("%q:\n got %q\nwant %q", spelling, got, row.want)
			}
			checkTidy(t, spelling)
		}
	}
}

// checkTidy checks that the tidied text says the same and is tidy.
func checkTidy(t *testing.T, text string) {
	t.Helper()
	var problems, again problem.List
	s := Parse(text, &problems)
	tidy := Tidy(s)
	s2 := Parse(tidy, &again)
	before, after := all(s), all(s2)
	if !reflect.DeepEqual(before, after) {
		for i := range before {
			if i >= len(after) || before[i] != after[i] {
				t.Errorf("statement %d differs:\nbefore %q", i, before[i])
				if i < len(after) {
					t.Errorf("after %q", after[i])
				}
				break
			}
		}
		t.Errorf("tidying changed the sheet:\n%q\n%q", text, tidy)
	}
	if problems.Empty() {
		for _, p := range again.Sorted() {
			t.Errorf("tidying made a problem: %s\n%q\n%q", p, text, tidy)
		}
	}
	if twice := Tidy(s2); twice != tidy {
		t.Errorf("tidying twice differs:\n%q\n%q\n%q", text, tidy, twice)
	}
}

func TestSheetsOnFile(t *testing.T) {
	// These sheets have no problems, and tidy they look as their twins do.
	files, _ := filepath.Glob("testdata/sheets/*.plumb")
	if len(files) == 0 {
		t.Fatal("no sheets")
	}
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		s := parse(t, string(text))
		checkTidy(t, string(text))
		want, err := os.ReadFile(strings.TrimSuffix(file, ".plumb") + ".tidy")
		if err != nil {
			t.Fatal(err)
		}
		if got := Tidy(s); got != string(want) {
			t.Errorf("%s:\n%s", file, got)
		}
	}
	// The project's sheets, where there are any.
	files, _ = filepath.Glob("../../testdata/sheets/*.plumb")
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		checkTidy(t, string(text))
	}
}
