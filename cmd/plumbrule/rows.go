package main

import (
	"bufio"
	"context"
	"errors"
	"io"
	"os"
	"runtime"
	"strconv"
	"sync"

	"github.com/spf13/cobra"

	"plumbrule/engine/rows"
)

// blockRows is how many rows are read, evaluated and written together. Memory
// depends on it and on the number of processors, not on the data's length.
const blockRows = 16384

func (a *app) rowsCommand() *cobra.Command {
	const form = "rows SHEET DATA [name=value ...]"
	var through, output string
	c := &cobra.Command{
		Use:   form,
		Short: "evaluate a sheet for every row of a CSV file",
		Long: `Evaluates a sheet for every row of a CSV file. DATA may be - for standard input.

The header names the columns as "name" or "name [unit]"; without a unit the
cells are in the known's own. Columns that the sheet does not know pass
through. Written are the data's own columns, unchanged, then each entry as
"name [unit]", then the row's worst state and the first reason for it.

A blank cell is a missing value: its row is refused if an entry needs it, and
what does not need it is computed. A cell that is no number, and a row that has
too many cells or too few, refuses its row as a whole, which is counted, and the
run goes on. Empty lines are left out.

name=value gives a known for all rows. A summary goes to standard error: rows,
states, and the reasons with how many rows they hold for and the worst value.`,
		Args: atLeast(2, -1, form),
		RunE: func(c *cobra.Command, arguments []string) error {
			if arguments[0] == "-" && arguments[1] == "-" {
				return usage("sheet and data cannot both be standard input", "name a file for one of them")
			}
			r := &rowsRun{app: a, sheet: arguments[0], data: arguments[1]}
			return r.start(c.Context(), arguments[2:], through, output)
		},
	}
	c.Flags().StringVar(&through, "through", "", "evaluate in the WebAssembly module `MODULE.wasm`")
	c.Flags().StringVarP(&output, "output", "o", "", "write to `FILE`, which is replaced only when all is written")
	return c
}

// rowsRun is one data file on its way through a sheet.
type rowsRun struct {
	*app
	sheet, data string
	opened      *opened
	knowns      []rows.Known
	maker       *choiceMaker
	layout      *layout
	in          *reader
	total       *summary
}

func (r *rowsRun) start(ctx context.Context, assignments []string, through, output string) error {
	// Blocks run side by side, so each is evaluated by one worker.
	compiler, release, err := r.compilerFor(ctx, through, 1)
	if err != nil {
		return err
	}
	defer release()
	if r.opened, err = r.open(ctx, r.sheet, compiler, assignments); err != nil {
		return err
	}
	r.knowns = r.opened.program.Describe().Knowns
	r.maker = newChoiceMaker(r.opened)
	defer r.maker.close()
	in, size := r.stdin, int64(-1)
	if r.data != "-" {
		f, err := os.Open(r.data)
		if err != nil {
			return cannot("read", r.data, err)
		}
		defer f.Close()
		in = f
		if info, err := f.Stat(); err == nil && info.Mode().IsRegular() {
			size = info.Size()
		}
	}
	r.sheet, r.data = shownFile(r.sheet), shownFile(r.data)
	if r.in, err = newReader(in, r.data); err != nil {
		return err
	}
	if r.layout, err = r.layOut(r.in.header); err != nil {
		return err
	}
	r.total = newSummary(r.opened.program.Describe())
	toFile := output != "" && output != "-"
	progress := r.newProgress(size, toFile)
	if !toFile {
		err = r.flow(ctx, r.stdout, progress)
	} else {
		err = r.flowToFile(ctx, output, progress)
	}
	progress.done()
	if err != nil {
		return err
	}
	if err := r.writeSummary(); err != nil {
		return err
	}
	if r.total.bad() {
		return verdict(statusMissed)
	}
	return nil
}

func (r *rowsRun) flowToFile(ctx context.Context, output string, progress *progress) error {
	target, err := resolved(output)
	if err != nil {
		return cannot("write", output, err)
	}
	return r.replace(ctx, target, func(w io.Writer) error { return r.flow(ctx, w, progress) })
}

// flow reads blocks one after the other, evaluates them side by side and
// writes them in their order. It does not wait for data that does not come
// when the run is cancelled.
func (r *rowsRun) flow(parent context.Context, to io.Writer, progress *progress) error {
	ctx, cancel := context.WithCancelCause(parent)
	var group sync.WaitGroup
	defer group.Wait() // no worker outlives the program
	defer cancel(nil)
	w := bufio.NewWriterSize(to, 1<<18)
	if _, err := w.Write(r.layout.headerLine()); err != nil {
		return unwritten(err)
	}
	workers := runtime.GOMAXPROCS(0)
	inFlight := workers + 2
	free := make(chan *block, inFlight)
	for range inFlight {
		free <- newBlock(r)
	}
	// Neither channel can be full: there are no more blocks than places.
	todo := make(chan *block, inFlight)
	ordered := make(chan *block, inFlight)
	go r.readBlocks(ctx, cancel, free, todo, ordered)
	for range workers {
		group.Go(func() { work(ctx, todo) })
	}
	for {
		var b *block
		var more bool
		select {
		case <-ctx.Done():
			return context.Cause(ctx)
		case b, more = <-ordered:
		}
		if !more {
			break
		}
		select {
		case <-ctx.Done():
			return context.Cause(ctx)
		case err := <-b.done:
			if err != nil {
				return err
			}
		}
		if _, err := w.Write(b.text); err != nil {
			return unwritten(err)
		}
		r.total.add(b)
		progress.at(b.readBytes, r.total.rows)
		free <- b
	}
	if err := context.Cause(ctx); err != nil {
		return err
	}
	if err := w.Flush(); err != nil {
		return unwritten(err)
	}
	return nil
}

// work evaluates blocks until there are no more.
func work(ctx context.Context, todo <-chan *block) {
	for {
		select {
		case <-ctx.Done():
			return
		case b, more := <-todo:
			if !more {
				return
			}
			b.done <- b.evaluate(ctx)
		}
	}
}

func unwritten(err error) error { return unreadable("cannot write the rows: " + err.Error()) }

// readBlocks fills free blocks with rows until the data ends.
func (r *rowsRun) readBlocks(ctx context.Context, cancel context.CancelCauseFunc, free, todo, ordered chan *block) {
	defer close(todo)
	defer close(ordered)
	for {
		var b *block
		select {
		case <-ctx.Done():
			return
		case b = <-free:
		}
		err := b.fill(ctx, r.in)
		if b.rows > 0 && (err == nil || errors.Is(err, io.EOF)) {
			ordered <- b
			todo <- b
		}
		if errors.Is(err, io.EOF) {
			return
		}
		if err != nil {
			cancel(err)
			return
		}
	}
}

// rowText names a row for messages: the line of the data it begins in.
func rowText(file string, line int) string { return file + ":" + strconv.Itoa(line) }
