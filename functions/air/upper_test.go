package air

import (
	"math"
	"testing"
)

// The table of the upper atmosphere is held against another integration of the
// same equations, the classical method of Runge and Kutta in steps of 10 m to
// 130 km and of 50 m above, with the platform's functions.
func TestUpperAtmosphereAgainstRungeKutta(t *testing.T) {
	table := upperAtmosphere()
	type heightState struct {
		z     float64
		n     [upperGases]float64
		depth float64 // tau from 150 km
		flux  float64 // integral of the source of H without the factor of 500 km
	}
	rates := func(z, where float64, y [7]float64) (dy [7]float64) {
		temperature, gradient := upperTemperature(z, where)
		g := 9.80665 * math.Pow(6356.766/(6356.766+z), 2)
		k := 0.0
		if where < 95 {
			k = 120
		} else if d := 400 - (z-95)*(z-95); where < 115 && d > 0 {
			k = 120 * math.Exp(1-400/d)
		}
		mean := 28.9644
		if where >= 100 {
			mean = 28.0134
		}
		dy[0] = -mean * g / (8.31432 * temperature)
		n := [5]float64{}
		for i := range n {
			n[i] = math.Exp(y[i]) / temperature
		}
		for i := 1; i < 5; i++ {
			s := upperGasTable[i]
			density, m := n[0], mean
			if i > 2 {
				density = n[0] + n[1] + n[2]
				if where >= 100 {
					m = (n[0]*28.0134 + n[1]*15.9994 + n[2]*31.9988) / density
				}
			}
			d := s.a * math.Pow(temperature/273.15, s.b) / density
			f := g / (8.31432 * temperature) * d / (d + k) * (s.molarMass + m*k/d + s.thermal*8.31432/g*gradient)
			v := s.q * math.Pow(z-s.u, 2) * math.Exp(-s.w*math.Pow(z-s.u, 3))
			if i == 1 && where < 97 {
				v += s.lowerQ * math.Pow(97-z, 2) * math.Exp(-s.lowerW*math.Pow(97-z, 3))
			}
			dy[i] = -(f + v)
		}
		if where >= 150 {
			dy[5] = g * 1.00797 / (8.31432 * temperature)
			all := n[0] + n[1] + n[2] + n[3] + n[4]
			d := 3.305e21 * math.Sqrt(temperature/273.15) / all
			dy[6] = 1000 * 7.2e11 / d * math.Pow(temperature/999.2356, 0.75) * math.Exp(y[5])
		}
		return dy
	}
	var y [7]float64
	for i := range 5 {
		y[i] = math.Log(upperGasTable[i].base * 186.8673)
	}
	var states []heightState
	var anchor heightState
	for step := 0; ; step++ {
		z, h := 86+0.01*float64(step), 0.01
		if step >= 4400 {
			z, h = 130+0.05*float64(step-4400), 0.05
		}
		now := heightState{z: z, depth: y[5], flux: y[6]}
		temperature, _ := upperTemperature(z, z)
		for i := range 5 {
			now.n[i] = math.Exp(y[i]) / temperature
		}
		if math.Abs(z-500) < 1e-6 {
			anchor = now
		}
		if step%7 == 3 {
			states = append(states, now)
		}
		if z > 999.9 {
			break
		}
		where := z + h/2
		add := func(k [7]float64, f float64) (r [7]float64) {
			for i := range r {
				r[i] = y[i] + f*k[i]
			}
			return r
		}
		k1 := rates(z, where, y)
		k2 := rates(z+h/2, where, add(k1, h/2))
		k3 := rates(z+h/2, where, add(k2, h/2))
		k4 := rates(z+h, where, add(k3, h))
		for i := range y {
			y[i] += h / 6 * (k1[i] + 2*k2[i] + 2*k3[i] + k4[i])
		}
	}
	var worst [upperQuantities]float64
	for _, s := range states {
		temperature, _ := upperTemperature(s.z, s.z)
		number, weight := 0.0, 0.0
		if s.z >= 150 {
			tau := s.depth - anchor.depth
			escaped := 0.0
			if s.z < 500 {
				escaped = math.Exp(-anchor.depth) * (s.flux - anchor.flux)
			}
			s.n[hydrogen] = (8e10 - escaped) * math.Pow(999.2356/temperature, 0.75) * math.Exp(-tau)
		}
		h := geopotentialHeight(1000 * s.z)
		for i, n := range s.n {
			number += n
			weight += n * upperGasTable[i].molarMass
			if n > 0 {
				worst[i] = math.Max(worst[i], math.Abs(table.valueAt(i, h)/n-1))
			}
		}
		worst[upperPressure] = math.Max(worst[upperPressure], math.Abs(table.valueAt(upperPressure, h)/(number*1.380622e-23*temperature)-1))
		worst[upperDensity] = math.Max(worst[upperDensity], math.Abs(table.valueAt(upperDensity, h)/(weight/6.022169e26)-1))
	}
	for quantity, w := range worst {
		if !(w < 1e-9) {
			t.Errorf("quantity %d: %g apart", quantity, w)
		}
	}
	t.Logf("%d heights, worst relative differences %.2g", len(states), worst)
}

// Between cells nothing jumps but for what the standard itself makes jump:
// hydrogen's beginning at 150 km, and the temperature at 110 km.
func TestUpperCellsMeet(t *testing.T) {
	table := upperAtmosphere()
	for cell := 1; cell < upperCells; cell++ {
		tolerance := 1e-13
		switch upperEdge(cell) {
		case 110:
			tolerance = 2e-6
		case 150:
			tolerance = 1e-5
		}
		for quantity := range table.cells {
			if quantity == hydrogen && cell <= hydrogenCell {
				continue
			}
			below := &table.cells[quantity][cell-1]
			above := &table.cells[quantity][cell]
			if difference := math.Abs(below.logarithm.at(1) - above.logarithm.at(-1)); !(difference <= tolerance) {
				t.Errorf("quantity %d at %v km jumps by %g", quantity, upperEdge(cell), difference)
			}
		}
	}
}

// Every height finds its cell.
func TestUpperCellIsFound(t *testing.T) {
	table := upperAtmosphere()
	for i := range 200000 {
		h := upperBegin + float64(i)*(topGeopotential-upperBegin)/199999
		cell := table.cellAt(h)
		if h < table.edges[cell] || cell < upperCells-1 && h >= table.edges[cell+1] {
			t.Fatalf("%v gpm is looked up in cell %d, %v to %v", h, cell, table.edges[cell], table.edges[cell+1])
		}
	}
}

// The whole standard falls with height, but for the join of its parts at 86 km
// and the temperature's at 110 km.
func TestUpperAtmosphereFalls(t *testing.T) {
	before := math.Inf(1)
	for i := range 100001 {
		h := upperBegin + float64(i)*(864070-upperBegin)/100000
		if d := standardDensity(h); !(d < before) {
			t.Fatalf("density does not fall at %v gpm", h)
		} else {
			before = d
		}
	}
	below, above := standardPressure(math.Nextafter(upperBegin, 0)), standardPressure(upperBegin)
	if ratio := above/below - 1; !(ratio > 1.0e-5 && ratio < 1.2e-5) {
		t.Errorf("pressure jumps by %g at 86 km", ratio)
	}
}

func BenchmarkUpperAtmosphere(b *testing.B) {
	for b.Loop() {
		integrateUpperAtmosphere()
	}
}
