package main

import (
	"io"
	"os"
	"strconv"
	"time"

	"github.com/schollz/progressbar/v3"
	"golang.org/x/term"
)

// progress shows how far a run is, on a terminal only.
type progress struct {
	bar   *progressbar.ProgressBar
	sized bool
}

// newProgress makes the bar of a run over so many bytes; size < 0 where the
// length is not known. Rows that go to a terminal show by themselves how far
// the run is, and a bar would only disturb them.
func (a *app) newProgress(size int64, toFile bool) *progress {
	f := terminal(a.stderr)
	if f == nil || !toFile && terminal(a.stdout) != nil {
		return &progress{}
	}
	return &progress{sized: size >= 0, bar: progressbar.NewOptions64(size,
		progressbar.OptionSetWriter(f),
		progressbar.OptionShowBytes(size >= 0),
		progressbar.OptionSetWidth(30),
		progressbar.OptionThrottle(100*time.Millisecond),
		progressbar.OptionClearOnFinish(),
		progressbar.OptionSetDescription("rows"),
	)}
}

// terminal gives the terminal that w writes to, or nil.
func terminal(w io.Writer) *os.File {
	f, ok := w.(*os.File)
	if !ok || !term.IsTerminal(int(f.Fd())) {
		return nil
	}
	return f
}

// at moves the bar to a place in the data. A bar that cannot be drawn is no
// reason to stop a run.
func (p *progress) at(bytes, rows int64) {
	if p.bar == nil {
		return
	}
	p.bar.Describe(strconv.FormatInt(rows, 10) + " rows")
	if p.sized {
		_ = p.bar.Set64(bytes)
	} else {
		_ = p.bar.Set64(rows)
	}
}

// done clears the bar away.
func (p *progress) done() {
	if p.bar != nil {
		_ = p.bar.Finish()
	}
}
