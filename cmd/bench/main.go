// Command bench measures the engine against what a Go programmer would write
// by hand in five minutes, both in the same run and in turn, and prints one
// table of ratios. Quote the ratios, not the seconds: machines differ and
// drift.
//
//	bench -module build/plumbrule.wasm [-command build/plumbrule] [-rows 4194304] [-repeat 5]
//
// Exit status: 0 when measured, whatever the ratios; 64 wrong usage.
package main

import (
	"context"
	"flag"
	"fmt"
	"io"
	"os"
	"runtime"
	"sort"
	"time"

	"plumbrule/wasm/host"
)

func main() { os.Exit(doMain(os.Args[1:], os.Stdout, os.Stderr)) }

// bench is what the lines of the table share.
type bench struct {
	module *host.Module
	path   string
	rows   int
	repeat int
}

// line is a line of the table: two pieces of work whose times are compared.
type line struct {
	name    string
	bar     float64
	aim     float64
	subject func() // what is measured
	against func() // what it is compared with
}

func doMain(args []string, stdout, stderr io.Writer) int {
	flags := flag.NewFlagSet("bench", flag.ContinueOnError)
	flags.SetOutput(stderr)
	path := flags.String("module", "build/plumbrule.wasm", "the module `file`")
	command := flags.String("command", "", "the command `file`, to measure it on a data file; none is left out")
	count := flags.Int("rows", 1<<22, "`rows` of a column")
	repeat := flags.Int("repeat", 5, "how often each pair is run")
	if flags.Parse(args) != nil || flags.NArg() > 0 || *count < 1 || *repeat < 1 {
		return 64
	}
	ctx := context.Background()
	module, err := host.Open(ctx, *path)
	if err != nil {
		fmt.Fprintln(stderr, "bench:", err)
		return 64
	}
	defer module.Close(ctx)
	b := &bench{module: module, path: *path, rows: *count, repeat: *repeat}
	fmt.Fprintf(stdout, "%s, %s/%s, %d processors, %d rows, median of %d pairs\n\n", runtime.Version(), runtime.GOOS, runtime.GOARCH, runtime.GOMAXPROCS(0), b.rows, b.repeat)
	fmt.Fprintf(stdout, "%-62s %9s %9s %7s %6s %6s\n", "subject / compared with", "ns/row", "ns/row", "ratio", "bar", "aim")
	for _, make := range []func(*bench) ([]line, error){densityLines, lawLines, moreLawLines, sheetLines, coreLines} {
		lines, err := make(b)
		if err != nil {
			fmt.Fprintln(stderr, "bench:", err)
			return 64
		}
		for _, l := range lines {
			subject, against, ratio := b.pair(l)
			perRow := float64(b.rows)
			fmt.Fprintf(stdout, "%-62s %9.2f %9.2f %7.3f %6.2f %6.2f\n", l.name, subject*1e9/perRow, against*1e9/perRow, ratio, l.bar, l.aim)
		}
	}
	if err := printCalls(b, stdout); err != nil {
		fmt.Fprintln(stderr, "bench:", err)
		return 64
	}
	if err := printSession(b, stdout); err != nil {
		fmt.Fprintln(stderr, "bench:", err)
		return 64
	}
	if err := printModule(b, stdout); err != nil {
		fmt.Fprintln(stderr, "bench:", err)
		return 64
	}
	if *command != "" {
		if err := printRows(b, *command, stdout); err != nil {
			fmt.Fprintln(stderr, "bench:", err)
			return 64
		}
	}
	return 0
}

// pair runs both pieces of work in turn and gives the median times and the
// median of the ratios pair by pair, which holds when the machine drifts.
func (b *bench) pair(l line) (subject, against, ratio float64) {
	l.subject()
	l.against()
	var subjects, againsts, ratios []float64
	for range b.repeat {
		s, a := timed(l.subject), timed(l.against)
		subjects, againsts, ratios = append(subjects, s), append(againsts, a), append(ratios, s/a)
	}
	return median(subjects), median(againsts), median(ratios)
}

func timed(work func()) float64 {
	start := time.Now()
	work()
	return time.Since(start).Seconds()
}

func median(x []float64) float64 {
	sort.Float64s(x)
	return x[len(x)/2]
}
