package main

import (
	"bufio"
	"context"
	"io"
	"os"
	"runtime"
	"strconv"
	"time"

	"github.com/parquet-go/parquet-go"
	"github.com/spf13/cobra"

	"plumbrule/engine/rows"
)

func (a *app) rowsCommand() *cobra.Command {
	const form = "rows SHEET DATA [name=value ...]"
	r := &rowsRun{app: a}
	c := &cobra.Command{
		Use:   form,
		Short: "evaluate a sheet for every row of a data file",
		Long: `Evaluates a sheet for every row of a data file. DATA may be - for standard input.

DATA and FILE are CSV, JSON lines (.jsonl, .ndjson: an object a line) or Parquet
(.parquet), by their extension or by --from and --to; without either they are
CSV, and standard output is in the form of DATA, Parquet as CSV.

The columns (the keys of JSON lines) are named "name" or "name [unit]"; without
a unit the cells are in the known's own. Columns that the sheet does not know
pass through. Written are the data's own columns, unchanged, then each entry as
"name [unit]", then the row's worst state and the first reason for it; a column of
the data that has one of those names is left out, as that of an earlier run. In
Parquet the unit of a column stands in the file's particulars too, under
"unit:" and the column's name, and is read from there.

A blank cell is a missing value: its row is refused if an entry needs it, and
what does not need it is computed. A cell that is no number, and a row that has
too many cells or too few, refuses its row as a whole, which is counted, and the
run goes on. Empty lines are left out.

name=value gives a known for all rows. A summary goes to standard error: rows,
states, rows per second, and the reasons with how many rows they hold for and
the worst value. Memory does not grow with the data. What is written depends
neither on the number of workers nor on how the data is cut.`,
		Args: atLeast(2, -1, form),
		RunE: func(c *cobra.Command, arguments []string) error {
			switch {
			case arguments[0] == "-" && arguments[1] == "-":
				return usage("sheet and data cannot both be standard input", "name a file for one of them")
			case r.workers < 0:
				return usage("--workers "+strconv.Itoa(r.workers)+" is below 0", "write --workers 2, or leave it out for one a processor")
			}
			r.sheet, r.data = arguments[0], arguments[1]
			return r.start(c.Context(), arguments[2:])
		},
	}
	c.Flags().StringVar(&r.through, "through", "", "evaluate in the WebAssembly module `MODULE.wasm`")
	c.Flags().StringVarP(&r.output, "output", "o", "", "write to `FILE`, which is replaced only when all is written")
	c.Flags().StringVar(&r.from, "from", "", "the data is in `FORM`: csv, jsonl or parquet")
	c.Flags().StringVar(&r.to, "to", "", "write `FORM`: csv, jsonl or parquet")
	c.Flags().BoolVar(&r.progress, "progress", false, "tell how far the run is, in a pipe too")
	c.Flags().IntVar(&r.workers, "workers", 0, "evaluate `N` blocks of rows side by side; 0 means one a processor")
	return c
}

// rowsRun is one data file on its way through a sheet.
type rowsRun struct {
	*app
	sheet, data     string
	through, output string
	from, to        string
	progress        bool
	workers         int

	opened *opened
	maker  *choiceMaker
	place  string // of the columns' names, in messages
	in     input
	out    output
	layout *layout
	whole  bool // the output asks for cells of all columns
	total  *summary
}

func (r *rowsRun) start(ctx context.Context, assignments []string) error {
	if err := r.chooseFormats(); err != nil {
		return err
	}
	if r.workers == 0 {
		r.workers = runtime.GOMAXPROCS(0)
	}
	// Blocks run side by side, so each is evaluated by one worker.
	compiler, release, err := r.compilerFor(ctx, r.through, 1)
	if err != nil {
		return err
	}
	defer release()
	if r.opened, err = r.open(ctx, r.sheet, compiler, assignments); err != nil {
		return err
	}
	r.maker = newChoiceMaker(r.opened)
	defer r.maker.close()
	size, closeData, err := r.openDataUnder(ctx)
	if err != nil {
		return err
	}
	defer closeData()
	if r.layout, err = r.layOut(r.in.fields()); err != nil {
		return err
	}
	r.total = newSummary(r.opened.program.Describe())
	toFile := r.output != "" && r.output != "-"
	begun := time.Now()
	progress := r.newProgress(size, toFile, r.progress)
	if !toFile {
		err = r.flow(ctx, r.stdout, progress)
	} else {
		err = r.flowToFile(ctx, r.output, progress)
	}
	progress.done()
	if err != nil {
		return err
	}
	r.total.took = time.Since(begun)
	if err := r.writeSummary(); err != nil {
		return err
	}
	if r.total.bad() {
		return verdict(statusMissed)
	}
	return nil
}

// chooseFormats decides what the data is in and what is written.
func (r *rowsRun) chooseFormats() error {
	asked := r.to
	var err error
	if r.from, err = formatOf("--from", r.from, r.data); err != nil {
		return err
	}
	switch {
	case asked != "" || r.output != "" && r.output != "-":
		if r.to, err = formatOf("--to", asked, r.output); err != nil {
			return err
		}
	case r.from == jsonFormat:
		r.to = jsonFormat
	default:
		r.to = csvFormat
	}
	if r.to == parquetFormat && (r.output == "" || r.output == "-") && terminal(r.stdout) != nil {
		return usage("Parquet is no text for a terminal", "write it to a file with --output FILE")
	}
	r.whole = r.to != r.from || r.from == parquetFormat
	return nil
}

// openDataUnder opens the data and does not wait for data that does not come
// when the run is cancelled.
func (r *rowsRun) openDataUnder(ctx context.Context) (size int64, close func(), err error) {
	type opening struct {
		run   rowsRun
		size  int64
		close func()
		err   error
	}
	done := make(chan opening, 1)
	o := opening{run: *r} // what comes too late is not looked at
	go func() {
		o.size, o.close, o.err = o.run.openData()
		done <- o
	}()
	select {
	case <-ctx.Done():
		return 0, nil, ctx.Err()
	case o := <-done:
		*r = o.run
		return o.size, o.close, o.err
	}
}

// openData opens the data and tells its size: bytes, or rows of Parquet; -1
// where it is not known.
func (r *rowsRun) openData() (size int64, close func(), err error) {
	in, size, close := r.stdin, int64(-1), func() {}
	if r.data != "-" {
		f, err := os.Open(r.data)
		if err != nil {
			return 0, nil, cannot("read", r.data, err)
		}
		close = func() { _ = f.Close() } // it was only read
		in = f
		if info, err := f.Stat(); err == nil && info.Mode().IsRegular() {
			size = info.Size()
		}
	}
	r.sheet, r.data = shownFile(r.sheet), shownFile(r.data)
	r.place = rowText(r.data, 1)
	switch r.from {
	case jsonFormat:
		r.place = r.data
		r.in, err = openJSON(in, r.data, r.blockBytes)
	case parquetFormat:
		r.place = r.data
		var file *parquetInput
		if file, size, err = openParquet(in, r.data, size, r.blockRows); err == nil {
			r.in = file
		}
	default:
		r.in, err = openCSV(in, r.data, r.blockBytes)
	}
	if err != nil {
		close()
		return 0, nil, err
	}
	return size, close, nil
}

func (r *rowsRun) flowToFile(ctx context.Context, output string, progress *progress) error {
	target, err := resolved(output)
	if err != nil {
		return cannot("write", output, err)
	}
	return r.replace(ctx, target, func(w io.Writer) error { return r.flow(ctx, w, progress) })
}

// newOutput gives what writes the rows.
func (r *rowsRun) newOutput(w *bufio.Writer) output {
	switch r.to {
	case jsonFormat:
		return newJSONOutput(w, r.layout)
	case parquetFormat:
		var nodes []parquet.Field
		if same, is := r.in.(*parquetInput); is {
			nodes = same.nodes
		}
		return newParquetOutput(w, r.layout, r.opened.program.Describe(), nodes)
	}
	return &csvOutput{w: w, layout: r.layout}
}

// rowText names a row for messages: the line of the data it begins in.
func rowText(file string, line int) string { return file + ":" + strconv.Itoa(line) }

// sourceForm is the form of the known that a column gives, or "".
func (l *layout) sourceForm(column int) rows.Form {
	if s := l.sourceOf[column]; s >= 0 {
		return l.sources[s].form
	}
	return ""
}
