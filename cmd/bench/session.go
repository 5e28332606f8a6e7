package main

import (
	"context"
	"fmt"
	"io"
	"strings"

	"plumbrule/engine/rows"
)

// chains is a sheet of chains of ten entries, each from a known of its own.
func chains(n int) string {
	var b strings.Builder
	for c := range n {
		fmt.Fprintf(&b, "known a%d = 1\n", c)
		for i := range 10 {
			if i == 0 {
				fmt.Fprintf(&b, "derive b%d_0 = 1.5 * a%d + 1\n", c, c)
			} else {
				fmt.Fprintf(&b, "derive b%d_%d = 1.5 * b%d_%d + 1\n", c, i, c, i-1)
			}
		}
	}
	return b.String()
}

// printSession tells what a change of one known costs in a session over
// 100,000 entries of which it touches ten, against a run of a sheet that has
// only ten, both in one place.
func printSession(b *bench, stdout io.Writer) error {
	single, err := b.single()
	if err != nil {
		return err
	}
	ctx := context.Background()
	for _, place := range []struct {
		name     string
		compiler rows.Compiler
	}{{"native", native(1)}, {"module", single}} {
		small, err := place.compiler.Compile(ctx, chains(1), nil)
		if err != nil {
			return err
		}
		large, err := place.compiler.Compile(ctx, chains(10_000), nil)
		if err != nil {
			return err
		}
		session, err := large.NewSession(ctx)
		if err != nil {
			return err
		}
		if all, err := session.Update(ctx); err != nil || len(all) != 100_000 {
			return fmt.Errorf("the first update tells %d entries, %v", len(all), err)
		}
		const calls = 20_000
		var failed error
		in, value, turn := rows.Input{Rows: 1, Values: [][]float64{{1}}}, 1.0, 0
		var out rows.Outcome
		change, run, ratio := b.pair(line{
			subject: func() {
				for range calls {
					turn = (turn + 4099) % 10_000
					value++
					session.Set(turn, value)
					if told, err := session.Update(ctx); err != nil || len(told) != 10 {
						failed = fmt.Errorf("an update tells %d entries, %v", len(told), err)
					}
				}
			},
			against: func() {
				for range calls {
					if err := small.Run(ctx, in, &out); err != nil {
						failed = err
					}
				}
			},
		})
		session.Close()
		if failed != nil {
			return failed
		}
		fmt.Fprintf(stdout, "a change that touches 10 of 100,000 entries, %s: %.0f ns, a run of a sheet of 10 entries: %.0f ns, ratio %.1f (bar 20)\n", place.name, change/calls*1e9, run/calls*1e9, ratio)
	}
	return nil
}
