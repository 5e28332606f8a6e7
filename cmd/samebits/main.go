// Command samebits evaluates the conformance tables and random formulas and
// prints the SHA-256 of every result's bits, so that builds for different
// processors and the module can be compared:
//
//	samebits testdata/conformance
//	samebits -module build/plumbrule.wasm testdata/conformance
//
// Exit status: 0 when evaluated, 1 where something could not be, 64 wrong usage.
package main

import (
	"context"
	"crypto/sha256"
	"encoding/binary"
	"encoding/csv"
	"flag"
	"fmt"
	"hash"
	"io"
	"math"
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
	flags := flag.NewFlagSet("samebits", flag.ContinueOnError)
	flags.SetOutput(stderr)
	modulePath := flags.String("module", "", "evaluate through this module `file` instead of natively")
	formulas := flags.Int("formulas", 100_000, "how `many` random formulas")
	if flags.Parse(args) != nil || flags.NArg() != 1 {
		fmt.Fprintln(stderr, "samebits: name the folder of conformance tables")
		return 64
	}
	ctx := context.Background()
	var compiler rows.Compiler = engine.Native{Catalogue: functions.All(), Workers: 1}
	if *modulePath != "" {
		module, err := host.Open(ctx, *modulePath)
		if err != nil {
			fmt.Fprintln(stderr, "samebits:", err)
			return 64
		}
		defer module.Close(ctx)
		compiler = module
	}
	conformance, count, err := hashTables(ctx, compiler, flags.Arg(0))
	if err != nil {
		fmt.Fprintln(stderr, "samebits:", err)
		return 1
	}
	fmt.Fprintf(stdout, "conformance %x %d numbers\n", conformance, count)
	random, count, err := hashRandom(ctx, compiler, *formulas)
	if err != nil {
		fmt.Fprintln(stderr, "samebits:", err)
		return 1
	}
	fmt.Fprintf(stdout, "random      %x %d numbers\n", random, count)
	return 0
}

// digest hashes numbers; every NaN is one pattern.
type digest struct {
	hash.Hash
	count int
}

func (d *digest) add(x float64) {
	var b [8]byte
	bits := math.Float64bits(x)
	if math.IsNaN(x) {
		bits = 0x7ff8000000000001
	}
	binary.LittleEndian.PutUint64(b[:], bits)
	d.Write(b[:])
	d.count++
}

// addOutcome hashes numbers and states.
func (d *digest) addOutcome(out *rows.Outcome) {
	for e := range out.Values {
		for i, x := range out.Values[e] {
			d.add(x)
			d.Write([]byte{byte(out.State(e, i))})
		}
	}
}

// hashTables evaluates every formula of every table. Rows may be stretched or
// refused: only the bits matter here.
func hashTables(ctx context.Context, compiler rows.Compiler, folder string) ([]byte, int, error) {
	paths, err := filepath.Glob(filepath.Join(folder, "*.csv"))
	if err != nil || len(paths) == 0 {
		return nil, 0, fmt.Errorf("no tables in %s", folder)
	}
	sort.Strings(paths)
	d := &digest{Hash: sha256.New()}
	for _, path := range paths {
		file, err := os.Open(path)
		if err != nil {
			return nil, 0, err
		}
		records, err := csv.NewReader(file).ReadAll()
		file.Close()
		if err != nil {
			return nil, 0, fmt.Errorf("%s: %w", path, err)
		}
		var b strings.Builder
		for i, record := range records[1:] {
			fmt.Fprintf(&b, "derive row_%d [%s] = %s\n", i, record[3], record[1])
		}
		program, err := compiler.Compile(ctx, b.String(), nil)
		if err != nil {
			return nil, 0, fmt.Errorf("%s: %w", path, err)
		}
		var out rows.Outcome
		if err := program.Run(ctx, rows.Input{Rows: 1}, &out); err != nil {
			return nil, 0, err
		}
		d.addOutcome(&out)
		program.Close()
	}
	return d.Sum(nil), d.count, nil
}
