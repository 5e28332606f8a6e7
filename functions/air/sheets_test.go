package air_test

import (
	"context"
	"os"
	"path/filepath"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/rows"
)

// The demo sheets of this room are tidy, and every entry is sound.
func TestDemoSheets(t *testing.T) {
	c := catalogue(t)
	for _, name := range []string{"vacuum-chamber", "lander"} {
		path := filepath.Join("..", "..", "testdata", "sheets", name+".plumb")
		text, err := os.ReadFile(path)
		if err != nil {
			t.Fatal(err)
		}
		tidy, err := engine.Tidy(string(text))
		if err != nil {
			t.Fatal(err)
		}
		if tidy != string(text) {
			t.Errorf("%s is not tidy", name)
		}
		program, err := engine.Compile(tidy, c)
		if err != nil {
			t.Fatal(err)
		}
		var out engine.Outcome
		if err := program.Run(context.Background(), engine.Input{Rows: 1}, &out); err != nil {
			t.Fatal(err)
		}
		for i, entry := range program.Describe().Entries {
			if state := out.State(i, 0); state != rows.Sound {
				t.Errorf("%s: %s is %v: %s", name, entry.Name, state, program.Reasons()[out.Reason(i, 0)].Text)
			}
		}
	}
}
