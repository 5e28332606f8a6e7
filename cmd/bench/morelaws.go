package main

import (
	"context"
	"fmt"
	"math"
	"strings"

	"plumbrule/engine/rows"
)

// moreLawLines are the lines of the rooms of laws beyond the first three.
func moreLawLines(b *bench) ([]line, error) {
	var lines []line
	add := func(name string, bar, aim float64, text string, n int, hand func(dst []float64), columns ...[]float64) error {
		subject, err := run(native(1), text, n, columns...)
		if err != nil {
			return fmt.Errorf("%s: %w", name, err)
		}
		dst := make([]float64, n)
		lines = append(lines, line{name, bar, aim, subject, func() { hand(dst) }})
		return nil
	}
	n := b.rows / 4
	kelvin, pascal := ramp(n, 280, 340), ramp(n, 1e5, 1e8)
	if err := add("water_density / hand function (1/4 of the rows)", 1.1, 0.8, "known T [K] = 300\nknown p [Pa] = 1e5\nderive rho [kg/m^3] = water_density(T, p)",
		n, func(dst []float64) { handWater(dst, kelvin, pascal) }, kelvin, pascal); err != nil {
		return nil, err
	}
	p, t, h := ramp(n, 9e4, 1.1e5), ramp(n, 288.15, 300.15), ramp(n, 0, 1)
	if err := add("moist_air_density / hand function (1/4 of the rows)", 1.1, 0.8, "known p [Pa] = 1e5\nknown T [K] = 293\nknown h [1] = 0.5\nderive rho [kg/m^3] = moist_air_density(p, T, h)",
		n, func(dst []float64) { handMoistAir(dst, p, t, h) }, p, t, h); err != nil {
		return nil, err
	}
	upper := ramp(n, 85_000, 860_000)
	const upperSheet = "known h [gpm] = 90000\nderive rho [kg/m^3] = standard_density(h)"
	heights := ramp(160, 84_900, 864_000)
	logarithms, err := values(upperSheet, heights)
	if err != nil {
		return nil, err
	}
	for i := range logarithms {
		logarithms[i] = math.Log(logarithms[i])
	}
	if err := add("standard_density above 86 km / hand table (1/4 of the rows)", 1.0, 0.8, upperSheet,
		n, func(dst []float64) { handTable(dst, upper, heights, logarithms) }, upper); err != nil {
		return nil, err
	}
	levels, temperatures := make([]float64, 100), make([]float64, 100)
	for i := range levels {
		levels[i] = 300 * float64(i)
		temperatures[i] = math.Round(290 - 0.002*levels[i] + 5*math.Sin(float64(i)))
	}
	asked := ramp(n, 0, 29_700)
	profile := "table sounding\n    z [m] | T [K]\n"
	for i := range levels {
		profile += fmt.Sprintf("    %g | %g\n", levels[i], temperatures[i])
	}
	profile += "known h [m] = 0\nderive p [Pa] = profile_pressure(sounding.z, sounding.T, 101325[Pa], h)"
	if err := add("profile_pressure of 100 levels / hand function (1/4 of the rows)", 1.0, 0.8, profile,
		n, func(dst []float64) { handProfile(dst, asked, levels, temperatures, 101325) }, asked); err != nil {
		return nil, err
	}
	few := b.rows / 4096
	hot := ramp(few, 300, 3000)
	const rotor = "known T [K] = 300\nderive Q = partition_sum(vibrating_rotor(2169.81358[cm^-1], 13.28831[cm^-1], 1.93128087[cm^-1], 0.01750441[cm^-1], dissociation: 11.09[eV]), T)"
	if err := add("partition_sum of a vibrating rotor / hand loop (1/4096 of the rows)", 0.8, 0.5, rotor,
		few, func(dst []float64) { handRotor(dst, hot) }, hot); err != nil {
		return nil, err
	}
	return lines, nil
}

// values evaluates the only entry of a sheet for a column of its only known.
func values(text string, column []float64) ([]float64, error) {
	program, err := native(1).Compile(context.Background(), strings.TrimSpace(text), nil)
	if err != nil {
		return nil, err
	}
	var out rows.Outcome
	if err := program.Run(context.Background(), rows.Input{Rows: len(column), Values: [][]float64{column}}, &out); err != nil {
		return nil, err
	}
	return append([]float64(nil), out.Values[0]...), nil
}
