package main

import (
	"bytes"
	"os"
	"strings"
	"testing"
)

// TestReadmeShowsWhatIsPrinted holds README.md to the sheet that it shows and
// to what the command prints for it.
func TestReadmeShowsWhatIsPrinted(t *testing.T) {
	readme, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	const path = "../../testdata/sheets/release.plumb"
	sheet, err := os.ReadFile(path)
	if err != nil {
		t.Fatal(err)
	}
	var stdout, stderr bytes.Buffer
	if status := doMain([]string{"run", path}, strings.NewReader(""), &stdout, &stderr); status != 0 {
		t.Fatalf("status %d: %s", status, stderr.String())
	}
	for what, text := range map[string]string{"the sheet": string(sheet), "its output": stdout.String()} {
		if !strings.Contains(string(readme), "```\n"+strings.TrimRight(text, "\n")+"\n```") {
			t.Errorf("README.md does not show %s as it is:\n%s", what, text)
		}
	}
}
