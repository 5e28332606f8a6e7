package main

import (
	"bytes"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"plumbrule/wasm/moduletest"
)

// run runs the command and gives its status and what it printed.
func run(t *testing.T, args ...string) (status int, stdout, stderr string) {
	t.Helper()
	var out, errs bytes.Buffer
	status = doMain(append([]string{"-module", moduletest.Path(t)}, args...), &out, &errs)
	return status, out.String(), errs.String()
}

// TestEveryPublishedNumber runs the whole of testdata/conformance.
func TestEveryPublishedNumber(t *testing.T) {
	status, stdout, stderr := run(t, filepath.Join("..", "..", "testdata", "conformance"))
	if status != 0 {
		t.Fatalf("status %d\n%s%s", status, stdout, stderr)
	}
	if !regexp.MustCompile(`(?m)^[1-9]\d+ passed, 0 failed$`).MatchString(stdout) {
		t.Errorf("the closing line is missing:\n%s", stdout)
	}
	t.Log("\n" + stdout)
}

const header = "id,formula,expected,unit,half_unit,source,provenance,why\n"

// TestRowsCanFail shows that each way of being wrong is found.
func TestRowsCanFail(t *testing.T) {
	cases := []struct {
		name, row string
		status    int
		told      string
	}{
		{"a right number", "a,1[atm],101325,Pa,0.5,definition,published,", 0, "1 passed, 0 failed"},
		{"a wrong number", "a,1[atm],101326,Pa,0.5,definition,published,", 1, "0 passed, 1 failed"},
		{"just outside", "a,1[atm],101325.51,Pa,0.5,definition,published,wide", 1, "half-units apart"},
		{"a wrong unit", "a,1[atm],101325,K,0.5,definition,published,", 1, "dimension"},
		{"an unknown law", "a,atmosphere(1),101325,Pa,0.5,definition,published,", 1, "there is no law"},
		{"a refused number", "a,ln(0 * 1),1,1,0.5,definition,published,", 1, "refused"},
		{"a stretched number is a number", "a,\"sea_water_density(35, 45[degC], 0[bar])\",1018.8,kg/m^3,5,memory,memory,a test of the runner", 0, "1 passed"},
		{"no source", "a,1[atm],101325,Pa,0.5,,published,", 64, "names its source"},
		{"an unknown provenance", "a,1[atm],101325,Pa,0.5,definition,hearsay,", 64, "provenance"},
		{"no tolerance", "a,1[atm],101325,Pa,0,definition,published,", 64, "half_unit"},
		{"a number that is none", "a,1[atm],many,Pa,0.5,definition,published,", 64, "expected"},
		{"an id twice", "a,1[atm],101325,Pa,0.5,definition,published,\na,1[atm],101325,Pa,0.5,definition,published,", 64, "twice"},
		{"a wide tolerance without a reason", "a,1[atm],101325,Pa,5,definition,published,", 64, "why"},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			folder := t.TempDir()
			if err := os.WriteFile(filepath.Join(folder, "table.csv"), []byte(header+c.row+"\n"), 0o644); err != nil {
				t.Fatal(err)
			}
			status, stdout, stderr := run(t, folder)
			if status != c.status || !strings.Contains(stdout+stderr, c.told) {
				t.Errorf("status %d, want %d with %q:\n%s%s", status, c.status, c.told, stdout, stderr)
			}
		})
	}
}

func TestTablesMustBeWellFormed(t *testing.T) {
	folder := t.TempDir()
	if status, _, stderr := run(t, folder); status != 64 || !strings.Contains(stderr, "no tables") {
		t.Errorf("an empty folder: %d %s", status, stderr)
	}
	path := filepath.Join(folder, "table.csv")
	if err := os.WriteFile(path, []byte(strings.Replace(header, "why", "remark", 1)), 0o644); err != nil {
		t.Fatal(err)
	}
	if status, _, stderr := run(t, folder); status != 64 || !strings.Contains(stderr, "columns") {
		t.Errorf("an unknown column: %d %s", status, stderr)
	}
	if status := doMain([]string{"-module", "no such file", folder}, &bytes.Buffer{}, &bytes.Buffer{}); status != 64 {
		t.Errorf("a missing module: %d", status)
	}
}

func TestColumnSheetTurnsNumbersIntoKnowns(t *testing.T) {
	cases := []struct{ formula, want string }{
		{"2 * 3[m]", "known number_0_0 [m] = 3\nknown number_0_1 [1] = 2\nderive row_0 [m] = number_0_1 * number_0_0\n"},
		{"5[m]^2 / 1[m]", "known number_0_0 [m] = 1\nknown number_0_1 [m] = 5\nderive row_0 [m] = number_0_1^2 / number_0_0\n"},
		{"f(-5[degC])", "known number_0_0 [degC] = -5\nderive row_0 [m] = f(number_0_0)\n"},
		{"sum([1, 2][m])", "derive row_0 [m] = sum([1, 2][m])\n"},
	}
	for _, c := range cases {
		if got := columnSheet([]*row{{formula: c.formula, unit: "m"}}); got != c.want {
			t.Errorf("%s:\n%s", c.formula, got)
		}
	}
}
