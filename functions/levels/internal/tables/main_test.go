package main

import (
	"bytes"
	"os"
	"path/filepath"
	"testing"
)

// The packed tables are those of the sources.
func TestDataIsFresh(t *testing.T) {
	files, err := generate("source")
	if err != nil {
		t.Fatal(err)
	}
	if len(files) != 4 {
		t.Fatalf("%d files", len(files))
	}
	for name, content := range files {
		committed, err := os.ReadFile(filepath.Join("..", "..", "data", name))
		if err != nil {
			t.Error(err)
		} else if !bytes.Equal(committed, content) {
			t.Errorf("data/%s is stale: run this command again", name)
		}
	}
}
