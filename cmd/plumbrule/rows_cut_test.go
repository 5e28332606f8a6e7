package main

import (
	"bytes"
	"context"
	"fmt"
	"io"
	"math/rand/v2"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"plumbrule/functions"
)

const gasSheet = `known gas = "N2"
known t [degC]
known wet = false
derive mass [g/mol] = molar_mass(gas) * (wet ? 2 : 1)
derive rho [kg/m^3] = sea_water_density(35, t, 0[dbar])
derive cold = t < 4[degC]
require light = mass < 40[g/mol]
`

// gasData gives rows with every sort of trouble, and more texts than a run takes.
func gasData(n int) string {
	random := rand.New(rand.NewPCG(7, 8))
	var b strings.Builder
	b.WriteString("remark,gas,t,wet\r\n")
	gases := []string{"N2", "CO2", "He", "CH4", "Zx", "Ar"}
	for i := range n {
		remark := []string{"plain", "", `"of two` + "\n" + `lines"`, `"a ""word"""`, `"a, comma"`, "été"}[random.IntN(6)]
		gas := gases[random.IntN(len(gases))]
		if random.IntN(4) == 0 {
			gas = fmt.Sprintf("C%dH%d", 1+random.IntN(30), 2+random.IntN(20))
		}
		t := fmt.Sprintf("%.3f", random.Float64()*60-5)
		if random.IntN(30) == 0 {
			t = []string{"", "n/a", "1e999", "90", " 12 ", "123456789.123456789e-7"}[random.IntN(6)]
		}
		line := remark + "," + gas + "," + t + "," + []string{"true", "FALSE", "0"}[random.IntN(3)]
		switch random.IntN(60) {
		case 0:
			line += ",more"
		case 1:
			line = `br"oken,` + line
		case 2:
			line = "\n" + line
		}
		b.WriteString(line + []string{"\n", "\r\n"}[i/50%2])
	}
	return b.String()
}

// TestCuts demands the same bytes, in every form of data, for any number of
// workers and however the data is cut.
func TestCuts(t *testing.T) {
	folder := t.TempDir()
	sheet := written(t, "gas.plumb", gasSheet)
	first := map[string]string{"csv": filepath.Join(folder, "data.csv")}
	if err := os.WriteFile(first["csv"], []byte(gasData(1500)), 0o644); err != nil {
		t.Fatal(err)
	}
	const reread = "known t [degC]\nderive u [K] = t\n"
	plain := written(t, "plain.plumb", reread)
	cuts := []struct{ bytes, rows, workers int }{{1 << 18, 8192, 1}, {100, 1, 3}, {997, 7, 2}, {5000, 333, 5}}
	run := func(sheet, from, to string, cut int) (output []byte, summary string) {
		t.Helper()
		file := filepath.Join(folder, "out")
		var messages bytes.Buffer
		c := cuts[cut]
		a := &app{stdin: strings.NewReader(""), stdout: io.Discard, stderr: &messages, catalogue: functions.All(), blockBytes: c.bytes, blockRows: c.rows}
		status := a.execute(context.Background(), []string{"rows", sheet, first[from], "--from", from, "--to", to, "-o", file, "--workers", fmt.Sprint(c.workers)})
		if status != statusMissed {
			t.Fatalf("%s to %s: exit status %d: %s", from, to, status, messages.String())
		}
		output, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		// The rate of a slow run is its own.
		return output, regexp.MustCompile("(?m)^.* rows per second\n").ReplaceAllString(messages.String(), "")
	}
	compare := func(sheet, from, to string) []byte {
		t.Helper()
		want, summary := run(sheet, from, to, 0)
		for cut := 1; cut < len(cuts); cut++ {
			got, other := run(sheet, from, to, cut)
			if !bytes.Equal(got, want) {
				t.Errorf("%s to %s, cut as %v: other bytes", from, to, cuts[cut])
			}
			if other != summary {
				t.Errorf("%s to %s, cut as %v:\n%s\nnot\n%s", from, to, cuts[cut], other, summary)
			}
		}
		return want
	}
	for _, to := range []string{jsonFormat, parquetFormat, csvFormat} {
		result := compare(sheet, csvFormat, to)
		first[to+" result"] = filepath.Join(folder, "first."+to)
		if err := os.WriteFile(first[to+" result"], result, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	for _, form := range []string{jsonFormat, parquetFormat} {
		first[form] = first[form+" result"]
	}
	var texts [2][]byte
	for i, from := range []string{jsonFormat, parquetFormat} {
		for _, to := range []string{jsonFormat, parquetFormat, csvFormat} {
			result := compare(plain, from, to)
			if to == csvFormat {
				texts[i] = result
			}
		}
	}
	if len(texts[0]) == 0 || bytes.Count(texts[0], []byte{'\n'}) != bytes.Count(texts[1], []byte{'\n'}) {
		t.Error("JSON lines and Parquet give different numbers of rows")
	}
}

// TestDamagedParquet demands an error, and no panic, of files in which bytes
// are changed or missing.
func TestDamagedParquet(t *testing.T) {
	folder := t.TempDir()
	sheet, data := written(t, "gas.plumb", gasSheet), written(t, "data.csv", gasData(200))
	whole := filepath.Join(folder, "whole.parquet")
	var out, messages bytes.Buffer
	if status := doMain([]string{"rows", sheet, data, "-o", whole}, strings.NewReader(""), &out, &messages); status != statusMissed {
		t.Fatalf("exit status %d: %s", status, messages.String())
	}
	text, err := os.ReadFile(whole)
	if err != nil {
		t.Fatal(err)
	}
	random := rand.New(rand.NewPCG(9, 10))
	damaged := filepath.Join(folder, "damaged.parquet")
	refused := 0
	for i := range 150 {
		bad := bytes.Clone(text)
		if i%3 == 0 {
			bad = bad[:random.IntN(len(bad))]
		} else {
			for range 1 + random.IntN(4) {
				bad[random.IntN(len(bad))] ^= byte(1 << random.IntN(8))
			}
		}
		if err := os.WriteFile(damaged, bad, 0o644); err != nil {
			t.Fatal(err)
		}
		messages.Reset()
		status := doMain([]string{"rows", sheet, damaged, "--to", "csv"}, strings.NewReader(""), io.Discard, &messages)
		if status != statusMissed && status != statusProblems || messages.Len() == 0 {
			t.Errorf("exit status %d: %s", status, messages.String())
		}
		if status == statusProblems {
			refused++
		}
	}
	if refused < 50 {
		t.Errorf("only %d damaged files were refused", refused)
	}
}
