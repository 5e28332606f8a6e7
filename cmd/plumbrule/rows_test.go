package main

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"time"
)

const boxSheet = "known length [m]\nknown width [m] = 2 within 0 to 5\nderive area [m^2] = length * width\n"

// written puts a text into a file of the test's own folder.
func written(t *testing.T, name, text string) string {
	t.Helper()
	file := filepath.Join(t.TempDir(), name)
	if err := os.WriteFile(file, []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
	return file
}

// TestManyBlocks runs data of several blocks, which are evaluated side by
// side: the rows must come out in their order, each with its own result.
func TestManyBlocks(t *testing.T) {
	const n = 3*blockRows + 17
	var data strings.Builder
	data.WriteString("id,length\n")
	for i := range n {
		switch {
		case i%1000 == 7:
			fmt.Fprintf(&data, "%d,oops\n", i)
		case i%1000 == 8:
			fmt.Fprintf(&data, "%d,\n", i)
		default:
			fmt.Fprintf(&data, "%d,%d.5\n", i, i)
		}
	}
	sheet := written(t, "box.plumb", boxSheet)
	var out, messages bytes.Buffer
	status := doMain([]string{"rows", sheet, "-"}, strings.NewReader(data.String()), &out, &messages)
	if status != statusMissed {
		t.Fatalf("exit status %d: %s", status, messages.String())
	}
	lines := strings.Split(strings.TrimSuffix(out.String(), "\n"), "\n")
	if len(lines) != n+1 {
		t.Fatalf("%d lines, not %d", len(lines), n+1)
	}
	for i, line := range lines[1:] {
		want := fmt.Sprintf("%d,%d.5,%d,sound,", i, i, 2*i+1)
		switch {
		case i%1000 == 7:
			want = fmt.Sprintf("%d,oops,,refused,line %d: length: 'oops' is not a number", i, i+2)
		case i%1000 == 8:
			want = fmt.Sprintf("%d,,,refused,length has no value", i)
		}
		if line != want {
			t.Fatalf("line %d is %q, not %q", i+2, line, want)
		}
	}
	const bad = n/1000 + 1 // the rows 7, 1007, ... below n
	for _, want := range []string{
		fmt.Sprintf("%d rows: %d sound, 0 stretched, 0 waiting, %d refused\n", n, n-2*bad, 2*bad),
		fmt.Sprintf("%d rows refused for a bad cell", bad),
	} {
		if !strings.Contains(messages.String(), want) {
			t.Errorf("%q is missing in %s", want, messages.String())
		}
	}
	if strings.ContainsAny(messages.String(), "\r\x1b") {
		t.Errorf("a progress bar in a pipe: %q", messages.String())
	}
}

// breaking gives some data and then fails, or waits for ever.
type breaking struct {
	data io.Reader
	fail error
	wait chan struct{}
}

func (b *breaking) Read(p []byte) (int, error) {
	n, err := b.data.Read(p)
	if n > 0 || !errors.Is(err, io.EOF) {
		return n, nil
	}
	if b.fail == nil {
		<-b.wait
	}
	return 0, b.fail
}

// TestOutputOnlyWhenWhole demands that a run that fails half-way leaves the
// earlier output as it was, and no other file beside it.
func TestOutputOnlyWhenWhole(t *testing.T) {
	sheet := written(t, "box.plumb", boxSheet)
	output := written(t, "out.csv", "earlier\n")
	in := &breaking{data: strings.NewReader("length\n" + strings.Repeat("1\n", 2*blockRows)), fail: errors.New("the disk has gone")}
	var out, messages bytes.Buffer
	status := doMain([]string{"rows", sheet, "-", "--output", output}, in, &out, &messages)
	if status != statusProblems || !strings.Contains(messages.String(), "the disk has gone") {
		t.Errorf("exit status %d: %s", status, messages.String())
	}
	text, err := os.ReadFile(output)
	if err != nil || string(text) != "earlier\n" {
		t.Errorf("the earlier output is now %q, %v", text, err)
	}
	files, err := os.ReadDir(filepath.Dir(output))
	if err != nil || len(files) != 1 {
		t.Errorf("files left behind: %v, %v", files, err)
	}
}

// TestCancelled demands that a run ends soon after its context, even while it
// waits for data that does not come.
func TestCancelled(t *testing.T) {
	sheet := written(t, "box.plumb", boxSheet)
	ctx, cancel := context.WithCancel(context.Background())
	in := &breaking{data: strings.NewReader("length\n1\n"), wait: make(chan struct{})}
	defer close(in.wait)
	status := make(chan int)
	var out, messages bytes.Buffer
	go func() { status <- doContext(ctx, []string{"rows", sheet, "-"}, in, &out, &messages) }()
	time.AfterFunc(50*time.Millisecond, cancel)
	select {
	case got := <-status:
		if got != statusInterrupted || messages.String() != "plumbrule: interrupted\n" {
			t.Errorf("exit status %d: %s", got, messages.String())
		}
	case <-time.After(10 * time.Second):
		t.Fatal("the run goes on after its context has ended")
	}
}

// TestUnclosedQuote demands that a quote that is never closed does not read
// data without end into memory.
func TestUnclosedQuote(t *testing.T) {
	sheet := written(t, "box.plumb", boxSheet)
	in := io.MultiReader(strings.NewReader("length\n1\n\"2\n"), &endless{})
	var out, messages bytes.Buffer
	status := doMain([]string{"rows", sheet, "-"}, in, &out, &messages)
	if status != statusProblems || !strings.Contains(messages.String(), errLongRow.Error()) {
		t.Errorf("exit status %d: %s", status, messages.String())
	}
}

// endless gives the same row for ever.
type endless struct{}

func (endless) Read(p []byte) (int, error) {
	for i := range p {
		p[i] = "3\n"[i%2]
	}
	return len(p), nil
}

// failing refuses to be written to.
type failing struct{}

func (failing) Write([]byte) (int, error) { return 0, errors.New("no space left") }

func TestOutputFails(t *testing.T) {
	sheet := written(t, "box.plumb", boxSheet)
	for _, arguments := range [][]string{
		{"run", sheet, "length=1"},
		{"rows", sheet, "-"},
		{"tidy", sheet},
		{"explain", sheet, "area", "length=1"},
		{"laws"},
		{"units"},
	} {
		var messages bytes.Buffer
		status := doMain(arguments, strings.NewReader("length\n1\n"), failing{}, &messages)
		if status != statusProblems || !strings.Contains(messages.String(), "no space left") {
			t.Errorf("%v: exit status %d: %s", arguments, status, messages.String())
		}
	}
}

// TestNoise feeds data of every sort of damage: each ends with a status of the
// command's own and a message, never with a panic.
func TestNoise(t *testing.T) {
	sheet := written(t, "box.plumb", boxSheet)
	for _, data := range []string{
		"", "\n", "\"", "length\n\"", "\xef\xbb\xbflength\n1\n", "length\r\n1\r\n2", "length\n\x00\n", "length\n\xff\xfe\n",
		"length,length\n1,2\n", "[m]\n1\n", "length [\n1\n", "length []\n1\n", ",\n1,2\n", "length\n" + strings.Repeat(",", 5000) + "\n",
	} {
		var out, messages bytes.Buffer
		status := doMain([]string{"rows", sheet, "-"}, strings.NewReader(data), &out, &messages)
		if status != statusWell && status != statusMissed && status != statusProblems || messages.Len() == 0 {
			t.Errorf("%q: exit status %d: %s", data, status, messages.String())
		}
	}
}
