package host

import (
	"context"
	"os"
	"regexp"
	"strconv"
	"testing"

	"plumbrule/wasm/abi"
	"plumbrule/wasm/moduletest"
)

// TestAgreement holds the document, the constants and the built module
// together: every export and limit that one names, the others have.
func TestAgreement(t *testing.T) {
	document, err := os.ReadFile("../abi/MODULE.md")
	if err != nil {
		t.Fatal(err)
	}
	var told []string
	for _, match := range regexp.MustCompile("(?m)^\\| `(plumbrule_[a-z]+)\\(").FindAllStringSubmatch(string(document), -1) {
		told = append(told, match[1])
	}
	exports := abi.Exports()
	if len(told) != len(exports) {
		t.Fatalf("the document tells %d exports, the constants %d", len(told), len(exports))
	}
	for i := range told {
		if told[i] != exports[i] {
			t.Errorf("export %d: the document says %s, the constants %s", i, told[i], exports[i])
		}
	}
	ctx := context.Background()
	module, err := Open(ctx, moduletest.Path(t))
	if err != nil {
		t.Fatal(err)
	}
	defer module.Close(ctx)
	has := module.compiled.ExportedFunctions()
	for name := range has {
		if name == "_initialize" {
			continue
		}
		known := false
		for _, export := range exports {
			known = known || export == name
		}
		if !known {
			t.Errorf("the module exports %s, which the document does not tell", name)
		}
	}
	for _, f := range module.compiled.ImportedFunctions() {
		if from, name, _ := f.Import(); from != "wasi_snapshot_preview1" {
			t.Errorf("the module imports %s.%s", from, name)
		}
	}
	limits, err := module.Limits(ctx)
	if err != nil {
		t.Fatal(err)
	}
	rows := regexp.MustCompile(`(?m)^\| ([a-z]+) \| (\d+) \|`).FindAllStringSubmatch(string(document), -1)
	if len(rows) != len(limits)-1 {
		t.Errorf("the document tells %d limits, the module %d", len(rows), len(limits)-1)
	}
	for _, row := range rows {
		if number, _ := strconv.Atoi(row[2]); limits[row[1]] != number {
			t.Errorf("limit %s: the document says %s, the module %d", row[1], row[2], limits[row[1]])
		}
	}
	if limits["version"] != abi.Version {
		t.Errorf("the module speaks version %d", limits["version"])
	}
}
