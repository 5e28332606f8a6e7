package host_test

import (
	"context"
	"fmt"
	"log"
	"testing"

	"plumbrule/engine/rows"
	"plumbrule/wasm/host"
	"plumbrule/wasm/moduletest"
)

const towedSheet = `
known depth    [m]   = 100
known latitude [deg] = 45
derive p_sea   [bar] = sea_pressure_at_depth(depth, latitude)
`

// A program that embeds the module: open it, compile a sheet, run three rows.
func Example() {
	ctx := context.Background()
	module, err := host.Open(ctx, moduletest.Path(&testing.B{}))
	if err != nil {
		log.Fatal(err)
	}
	defer module.Close(ctx)
	program, err := module.Compile(ctx, towedSheet, nil)
	if err != nil {
		log.Fatal(err)
	}
	defer program.Close()
	in := rows.Input{Rows: 3, Values: make([][]float64, len(program.Describe().Knowns))}
	in.Values[program.Describe().KnownIndex("depth")] = []float64{10, 1000, 4000} // m, the coherent SI unit
	var out rows.Outcome
	if err := program.Run(ctx, in, &out); err != nil {
		log.Fatal(err)
	}
	entry := program.Describe().Entries[0]
	for row := range in.Rows {
		fmt.Printf("%.2f %s %s\n", entry.Scale.FromSI(out.Values[0][row]), entry.Unit, out.State(0, row))
	}
	// Output:
	// 1.01 bar sound
	// 101.06 bar sound
	// 407.14 bar sound
}
