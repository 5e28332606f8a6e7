package main

import (
	"bytes"
	"go/format"
	"os"
	"testing"
)

// TestTablesAreCurrent requires the committed tables to be those the generator
// writes.
func TestTablesAreCurrent(t *testing.T) {
	want, err := format.Source(generate())
	if err != nil {
		t.Fatal(err)
	}
	got, err := os.ReadFile("../../math_tables.go")
	if err != nil {
		t.Fatal(err)
	}
	if !bytes.Equal(got, want) {
		t.Error("math_tables.go is not what the generator writes: run go generate in engine/column")
	}
}
