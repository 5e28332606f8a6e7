// Command conformance checks every published number of testdata/conformance:
// each row's formula is evaluated natively and through the module, as a
// constant of the sheet and as a column of many rows, and all ways must give
// the printed number within its tolerance and the same bits.
//
//	conformance -module build/plumbrule.wasm testdata/conformance
//
// It prints a line a table with the number of rows and the worst error in
// half-units, and closes with "N passed, N failed". Exit status: 0 all passed,
// 1 a row failed, 64 wrong usage or an unreadable table.
package main

import (
	"context"
	"flag"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"sort"
	"strings"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
	"plumbrule/wasm/host"
)

func main() { os.Exit(doMain(os.Args[1:], os.Stdout, os.Stderr)) }

func doMain(args []string, stdout, stderr io.Writer) int {
	flags := flag.NewFlagSet("conformance", flag.ContinueOnError)
	flags.SetOutput(stderr)
	modulePath := flags.String("module", "build/plumbrule.wasm", "the module `file`")
	if flags.Parse(args) != nil {
		return 64
	}
	if flags.NArg() != 1 {
		fmt.Fprintln(stderr, "conformance: name the folder of tables")
		return 64
	}
	paths, err := filepath.Glob(filepath.Join(flags.Arg(0), "*.csv"))
	if err == nil && len(paths) == 0 {
		err = fmt.Errorf("no tables in %s", flags.Arg(0))
	}
	if err != nil {
		fmt.Fprintln(stderr, "conformance:", err)
		return 64
	}
	ctx := context.Background()
	module, err := host.Open(ctx, *modulePath)
	if err != nil {
		fmt.Fprintln(stderr, "conformance:", err)
		return 64
	}
	defer module.Close(ctx)
	sort.Strings(paths)
	ways := []way{{"native", engine.Native{Catalogue: functions.All()}}, {"module", module}}
	passed, failed := 0, 0
	fmt.Fprintf(stdout, "%-24s %6s %8s  %s\n", "table", "rows", "failed", "worst error, half-units")
	for _, path := range paths {
		name := strings.TrimSuffix(filepath.Base(path), ".csv")
		table, err := readTable(path)
		if err != nil {
			fmt.Fprintln(stderr, "conformance:", err)
			return 64
		}
		checkTable(ctx, ways, table)
		worst, bad := summary(table)
		passed += len(table) - bad
		failed += bad
		fmt.Fprintf(stdout, "%-24s %6d %8d  %.3f (%s)\n", name, len(table), bad, worst.error, worst.id)
		for _, row := range table {
			if row.failure != "" {
				fmt.Fprintf(stdout, "  %s:%d: %s: %s\n", path, row.line, row.id, row.failure)
			}
		}
	}
	fmt.Fprintf(stdout, "%d passed, %d failed\n", passed, failed)
	if failed > 0 {
		return 1
	}
	return 0
}

// way is one of the ways to evaluate a sheet.
type way struct {
	name string
	rows.Compiler
}

// summary finds the worst error of a table and counts the failures.
func summary(table []*row) (worst row, bad int) {
	for _, r := range table {
		if r.failure != "" {
			bad++
		} else if r.error >= worst.error {
			worst = *r
		}
	}
	return worst, bad
}
