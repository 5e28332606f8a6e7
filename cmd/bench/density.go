package main

import (
	"context"
	"math"

	"github.com/expr-lang/expr"
	"github.com/expr-lang/expr/vm"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
)

// isothermal is the sheet of the first lines: the density of an isothermal
// column of air.
const isothermal = `
known h [m] = 1000
known T [K] = 280
derive rho [kg/m^3] = 1.225[kg/m^3] * exp(-0.0289644[kg/mol] * 9.80665[m/s^2] * h / (nature.R * T))
`

// handDensity is the same by hand.
func handDensity(dst, h, t []float64) {
	const mg, r = 0.0289644 * 9.80665, 8.314462618
	for i := range dst {
		dst[i] = 1.225 * math.Exp(-mg*h[i]/(r*t[i]))
	}
}

// ramp gives n numbers from low to high.
func ramp(n int, low, high float64) []float64 {
	x := make([]float64, n)
	for i := range x {
		x[i] = low + (high-low)*float64(i)/float64(n)
	}
	return x
}

// run compiles a sheet and gives the work of running it once over columns,
// which are named in the order of the sheet's knowns.
func run(compiler rows.Compiler, text string, n int, columns ...[]float64) (func(), error) {
	program, err := compiler.Compile(context.Background(), text, nil)
	if err != nil {
		return nil, err
	}
	in := rows.Input{Rows: n, Values: columns}
	var out rows.Outcome
	if err := program.Run(context.Background(), in, &out); err != nil {
		return nil, err
	}
	return func() {
		if err := program.Run(context.Background(), in, &out); err != nil {
			panic(err)
		}
	}, nil
}

func native(workers int) engine.Native {
	return engine.Native{Catalogue: functions.All(), Workers: workers}
}

func densityLines(b *bench) ([]line, error) {
	h, t := ramp(b.rows, 0, 30_000), ramp(b.rows, 320, 200)
	dst := make([]float64, b.rows)
	hand := func() { handDensity(dst, h, t) }
	one, err := run(native(1), isothermal, b.rows, h, t)
	if err != nil {
		return nil, err
	}
	single, err := b.single()
	if err != nil {
		return nil, err
	}
	module, err := run(single, isothermal, b.rows, h, t)
	if err != nil {
		return nil, err
	}
	rowByRow, err := exprLoop(b.rows/16, h, t)
	if err != nil {
		return nil, err
	}
	oneSixteenth, err := run(native(1), isothermal, b.rows/16, h[:b.rows/16], t[:b.rows/16])
	if err != nil {
		return nil, err
	}
	return []line{
		{"isothermal density, native, 1 core / hand loop", 0.75, 0.45, one, hand},
		{"isothermal density, module, 1 instance / native hand loop", 1.6, 1.1, module, hand},
		{"isothermal density, native, 1 core / expr's VM (1/16 of the rows)", 0.05, 0.02, oneSixteenth, rowByRow},
	}, nil
}

// exprLoop is the same formula run row by row in the virtual machine of the
// library that parses our formulas.
func exprLoop(n int, h, t []float64) (func(), error) {
	type environment struct {
		H, T, R float64
		Exp     func(float64) float64
	}
	env := environment{R: 8.314462618, Exp: math.Exp}
	program, err := expr.Compile("1.225 * Exp(-0.0289644 * 9.80665 * H / (R * T))", expr.Env(env))
	if err != nil {
		return nil, err
	}
	dst := make([]float64, n)
	var machine vm.VM
	return func() {
		for i := range dst {
			env.H, env.T = h[i], t[i]
			value, err := machine.Run(program, env)
			if err != nil {
				panic(err)
			}
			dst[i] = value.(float64)
		}
	}, nil
}
