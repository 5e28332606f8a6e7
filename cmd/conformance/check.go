package main

import (
	"context"
	"errors"
	"fmt"
	"math"
	"strconv"
	"strings"

	"plumbrule/engine"
	"plumbrule/engine/rows"
)

// sizes are the numbers of rows that each formula is run with as columns: one
// row, a short block, and more than four blocks with a remainder.
var sizes = []int{1, 7, 4097}

// checkTable evaluates every row in every way and notes failures in the rows.
func checkTable(ctx context.Context, ways []way, table []*row) {
	for _, w := range ways {
		checkSheet(ctx, w, "constants", table, constantSheet(table), []int{1})
		checkSheet(ctx, w, "columns", table, columnSheet(table), sizes)
	}
}

// fail notes a row's first failure.
func (r *row) fail(format string, args ...any) {
	if r.failure == "" {
		r.failure = fmt.Sprintf(format, args...)
	}
}

// constantSheet derives every row from its formula as written.
func constantSheet(table []*row) string {
	var b strings.Builder
	for i, r := range table {
		fmt.Fprintf(&b, "derive row_%d [%s] = %s\n", i, r.unit, r.formula)
	}
	return b.String()
}

// checkSheet runs a sheet whose entries are the rows of a table. A row that
// does not compile has failed; the others are run without it.
func checkSheet(ctx context.Context, w way, what string, table []*row, text string, sizes []int) {
	program, err := w.Compile(ctx, text, nil)
	for attempt := 0; err != nil && attempt < 2; attempt++ {
		var sheet *rows.SheetError
		if !errors.As(err, &sheet) {
			break
		}
		lines := strings.Split(text, "\n")
		for _, p := range sheet.Problems {
			if i := rowOf(lines[p.Line-1]); i >= 0 {
				table[i].fail("%s, %s: %s", w.name, what, p.String())
			}
			lines[p.Line-1] = ""
		}
		text = strings.Join(lines, "\n")
		program, err = w.Compile(ctx, text, nil)
	}
	if err != nil {
		for _, r := range table {
			r.fail("%s, %s: %v", w.name, what, err)
		}
		return
	}
	defer program.Close()
	for _, n := range sizes {
		in := rows.Input{Rows: n, Values: make([][]float64, len(program.Describe().Knowns))}
		for k := range program.Describe().Knowns {
			in.Values[k] = make([]float64, n)
			for i := range in.Values[k] {
				in.Values[k][i] = program.Describe().Knowns[k].Value
			}
		}
		var out engine.Outcome
		if err := program.Run(ctx, in, &out); err != nil {
			for _, r := range table {
				r.fail("%s, %s, %d rows: %v", w.name, what, n, err)
			}
			return
		}
		compare(program, &out, fmt.Sprintf("%s, %s, %d rows", w.name, what, n), table)
	}
}

// rowOf gives the index of the row that a sheet's line belongs to.
func rowOf(line string) int {
	fields := strings.Fields(line)
	if len(fields) < 2 {
		return -1
	}
	_, number, _ := strings.Cut(fields[1], "_")
	number, _, _ = strings.Cut(number, "_")
	i, err := strconv.Atoi(number)
	if err != nil {
		return -1
	}
	return i
}

// compare holds a run's numbers against the printed ones and against the bits
// of the first way.
func compare(program rows.Program, out *rows.Outcome, what string, table []*row) {
	for e := range program.Describe().Entries {
		entry := &program.Describe().Entries[e]
		r := table[rowOf("derive "+entry.Name)]
		for i, value := range out.Values[e] {
			state := out.State(e, i)
			if !state.Computed() {
				r.fail("%s: %s: %s", what, state, program.Reasons()[out.Reason(e, i)].Text)
				break
			}
			if !r.done {
				r.done, r.bits = true, math.Float64bits(value)
				r.error = math.Abs(entry.Scale.FromSI(value)-r.expected) / r.halfUnit
				// The printed number and its tolerance are decimal: their
				// difference is known to a few last bits only.
				if !(r.error <= 1+1e-9) {
					r.fail("%s: computed %v, printed %v: %.3g half-units apart", what, entry.Scale.FromSI(value), r.expected, r.error)
				}
			}
			if math.Float64bits(value) != r.bits {
				r.fail("%s: row %d gives %v (%x), other bits than %v (%x)", what, i, value, math.Float64bits(value), math.Float64frombits(r.bits), r.bits)
				break
			}
		}
	}
}
