package main

import (
	"context"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"runtime"
	"time"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
	"plumbrule/wasm/host"
)

// twelve is a sheet of twelve entries.
const twelve = `
known depth [m] = 1000
known cold [degC] = 4
known salinity [1] = 35
derive p [MPa] = sea_pressure_at_depth(depth, 45[deg])
derive rho [kg/m^3] = sea_water_density(salinity, cold, p)
derive head [MPa] = rho * nature.g_n * depth
derive excess [1] = head / p - 1
derive volume [m^3] = 0.1[m^3] * exp(-p / 2.3[GPa])
derive lift [N] = rho * volume * nature.g_n
derive weight [N] = 80[kg] * nature.g_n
derive net [N] = lift - weight
derive speed [m/s] = sqrt(abs(2 * net / (rho * 0.5[m^2])))
derive time [s] = depth / (speed + 0.1[m/s])
derive deep = depth > 500[m] ? ln(depth / 1[m]) : 0
require floats = net > 0[N]
`

// single loads the module again with a single instance.
func (b *bench) single() (*host.Module, error) {
	code, err := os.ReadFile(b.path)
	if err != nil {
		return nil, err
	}
	return host.Load(context.Background(), code, host.Config{}.WithInstances(1))
}

func sheetLines(b *bench) ([]line, error) {
	n := b.rows / 4
	depth, cold, salinity := ramp(n, 0, 5000), ramp(n, 275, 290), ramp(n, 33, 37)
	one, err := run(native(1), twelve, n, depth, cold, salinity)
	if err != nil {
		return nil, err
	}
	single, err := b.single()
	if err != nil {
		return nil, err
	}
	module, err := run(single, twelve, n, depth, cold, salinity)
	if err != nil {
		return nil, err
	}
	return []line{{"a sheet of 12 entries, module / native, 1 core (1/4 of the rows)", 2.5, 2.0, module, one}}, nil
}

func coreLines(b *bench) ([]line, error) {
	h, t := ramp(b.rows, 0, 30_000), ramp(b.rows, 320, 200)
	one, err := run(native(1), isothermal, b.rows, h, t)
	if err != nil {
		return nil, err
	}
	two, err := run(native(2), isothermal, b.rows, h, t)
	if err != nil {
		return nil, err
	}
	return []line{{"isothermal density, 2 cores / 1 core, native", 0.56, 0.52, two, one}}, nil
}

// printCalls tells what one formula over one row costs, called again and again.
func printCalls(b *bench, stdout io.Writer) error {
	single, err := b.single()
	if err != nil {
		return err
	}
	var times []float64
	for _, compiler := range []rows.Compiler{native(1), single} {
		program, err := compiler.Compile(context.Background(), isothermal, nil)
		if err != nil {
			return err
		}
		const calls = 20_000
		in := rows.Input{Rows: 1, Values: [][]float64{{1000}, {280}}}
		var out rows.Outcome
		var failed error
		var rounds []float64
		for range b.repeat + 1 {
			rounds = append(rounds, timed(func() {
				for range calls {
					if err := program.Run(context.Background(), in, &out); err != nil {
						failed = err
					}
				}
			})/calls)
		}
		if failed != nil {
			return failed
		}
		times = append(times, median(rounds[1:])*1e9)
	}
	fmt.Fprintf(stdout, "\none formula, one row: native call %.0f ns, module call %.0f ns, difference %.0f ns (bar 1000, aim 300)\n", times[0], times[1], times[1]-times[0])
	return nil
}

// printModule tells the module's size and how long it takes to start.
func printModule(b *bench, stdout io.Writer) error {
	code, err := os.ReadFile(b.path)
	if err != nil {
		return err
	}
	zipped, err := gzipped(code)
	if err != nil {
		return err
	}
	folder, err := os.MkdirTemp("", "plumbrule-bench-")
	if err != nil {
		return err
	}
	defer os.RemoveAll(folder)
	ctx := context.Background()
	config := host.Config{}.WithCache(filepath.Join(folder, "cache"))
	var starts, instances []float64
	for range b.repeat + 1 {
		start := time.Now()
		m, err := host.Load(ctx, code, config)
		if err != nil {
			return err
		}
		starts = append(starts, time.Since(start).Seconds())
		instance, err := startInstance(ctx, m)
		if err != nil {
			return err
		}
		instances = append(instances, instance)
		m.Close(ctx)
	}
	fmt.Fprintf(stdout, "module: %.2f MB (bar 8), %.2f MB gzipped (bar 2.2); start without cache %.0f ms, with cache %.0f ms (bar 150); an instance with a small sheet %.1f ms (bar 15)\n",
		float64(len(code))/1e6, float64(zipped)/1e6, starts[0]*1e3, median(starts[1:])*1e3, median(instances)*1e3)
	return printCompile(b, stdout)
}

// startInstance tells how long a session of a small sheet takes to begin,
// which starts an instance of its own and compiles the sheet in it.
func startInstance(ctx context.Context, m *host.Module) (float64, error) {
	program, err := m.Compile(ctx, isothermal, nil)
	if err != nil {
		return 0, err
	}
	start := time.Now()
	session, err := program.NewSession(ctx)
	if err != nil {
		return 0, err
	}
	took := time.Since(start).Seconds()
	return took, session.Close()
}

// printCompile tells how the time to compile a sheet grows with its length.
// Sheets of each length together have the same number of entries, and their
// programs are kept, so that the garbage collector has alike to do.
func printCompile(b *bench, stdout io.Writer) error {
	const entries = 100_000
	for _, n := range []int{1_000, 10_000, entries} {
		text := chain(n)
		var times []float64
		for range b.repeat {
			programs := make([]*engine.Program, entries/n)
			start := time.Now()
			for i := range programs {
				program, err := engine.Compile(text, functions.All())
				if err != nil {
					return err
				}
				programs[i] = program
			}
			times = append(times, time.Since(start).Seconds())
			runtime.KeepAlive(programs)
		}
		took := median(times)
		fmt.Fprintf(stdout, "compile %3d chains of %6d entries: %6.1f ms each, %.2f us an entry\n", entries/n, n, took*1e3*float64(n)/entries, took*1e6/entries)
	}
	return nil
}
