package main

import (
	"fmt"
	"io"
	"os"
	"strconv"
	"time"

	"github.com/schollz/progressbar/v3"
	"golang.org/x/term"
)

// progress shows how far a run is: as a bar on a terminal, elsewhere, where it
// is asked for, as a line now and then.
type progress struct {
	bar   *progressbar.ProgressBar
	lines io.Writer
	size  int64 // of the data; below 0 where it is not known
	said  time.Time
	every time.Duration
}

// newProgress makes the bar of a run over so much data; size < 0 where that is
// not known. Rows that go to a terminal show by themselves how far the run is,
// and a bar would only disturb them, unless it is forced.
func (a *app) newProgress(size int64, toFile, forced bool) *progress {
	p := &progress{size: size, every: time.Second}
	f := terminal(a.stderr)
	switch {
	case f != nil && (forced || toFile || terminal(a.stdout) == nil):
		p.bar = progressbar.NewOptions64(size,
			progressbar.OptionSetWriter(f),
			progressbar.OptionSetWidth(30),
			progressbar.OptionThrottle(100*time.Millisecond),
			progressbar.OptionClearOnFinish(),
			progressbar.OptionSetDescription("rows"),
		)
	case f == nil && forced:
		p.lines = a.stderr
	}
	return p
}

// terminal gives the terminal that w writes to, or nil.
func terminal(w io.Writer) *os.File {
	f, ok := w.(*os.File)
	if !ok || !term.IsTerminal(int(f.Fd())) {
		return nil
	}
	return f
}

// at tells that so much of the data is done. Progress that cannot be shown is
// no reason to stop a run.
func (p *progress) at(taken, rows int64) {
	switch {
	case p.bar != nil:
		p.bar.Describe(strconv.FormatInt(rows, 10) + " rows")
		if p.size >= 0 {
			_ = p.bar.Set64(min(taken, p.size))
		} else {
			_ = p.bar.Set64(rows)
		}
	case p.lines != nil && time.Since(p.said) >= p.every:
		p.said = time.Now()
		share := ""
		if p.size > 0 {
			share = fmt.Sprintf(", %d %%", min(100, 100*taken/p.size))
		}
		fmt.Fprintln(p.lines, "plumbrule: "+counted(rows, "row", "rows")+" done"+share)
	}
}

// done clears the bar away.
func (p *progress) done() {
	if p.bar != nil {
		_ = p.bar.Finish()
	}
}
