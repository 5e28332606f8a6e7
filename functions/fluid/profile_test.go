package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// measured is a density by depth in closed form: with its second and fourth
// derivatives and its integral from the surface.
type measured struct {
	name                          string
	density, second, fourth, head func(z float64) float64
}

// measuredDensities are a liquid of constant bulk modulus and a layer in which
// density rises between two levels, z in m.
func measuredDensities() []measured {
	const scale, rise, middle, width = 5000.0, 8.0, 60.0, 25.0
	hump := func(z float64) float64 { return math.Tanh((z - middle) / width) }
	return []measured{
		{
			"exponential",
			func(z float64) float64 { return 1000 * math.Exp(z/scale) },
			func(z float64) float64 { return 1000 * math.Exp(z/scale) / (scale * scale) },
			func(z float64) float64 { return 1000 * math.Exp(z/scale) / math.Pow(scale, 4) },
			func(z float64) float64 { return 1000 * scale * math.Expm1(z/scale) },
		},
		{
			"layer",
			func(z float64) float64 { return 1020 + rise*hump(z) },
			func(z float64) float64 { h := hump(z); return rise * -2 * h * (1 - h*h) / (width * width) },
			func(z float64) float64 {
				h := hump(z)
				return rise * 8 * h * (1 - h*h) * (2 - 3*h*h) / math.Pow(width, 4)
			},
			func(z float64) float64 {
				lnCosh := func(x float64) float64 { return math.Abs(x) + math.Log1p(math.Exp(-2*math.Abs(x))) - math.Ln2 }
				return 1020*z + rise*width*(lnCosh((z-middle)/width)-lnCosh(-middle/width))
			},
		},
	}
}

// greatest gives the greatest size of f from 0 to a depth.
func greatest(f func(z float64) float64, depth float64) float64 {
	most := 0.0
	for i := 0; i <= 20000; i++ {
		most = math.Max(most, math.Abs(f(depth*float64(i)/20000)))
	}
	return most
}

// TestProfileErrorBound holds the pressure under measured densities against the
// closed form: never further off than the bounds that the law states, and near
// enough to them that they mean something.
func TestProfileErrorBound(t *testing.T) {
	const bottom, gravity = 200.0, 9.81
	for _, m := range measuredDensities() {
		closest := map[string]float64{}
		for _, n := range []int{5, 9, 17, 40, 100} {
			depths, densities := make([]float64, n), make([]float64, n)
			for k := range n {
				share := float64(k) / float64(n-1)
				depths[k] = bottom * share * (0.6 + 0.4*share) // closer near the surface
				densities[k] = m.density(depths[k])
			}
			h := depths[n-1] - depths[n-2]
			for _, method := range []string{straightLines, smoothCurve} {
				for z := 0.5; z <= bottom; z += 0.73 {
					next := 0
					for depths[next] < z {
						next++
					}
					below := depths[next]
					bound := gravity * below * h * h * greatestOf[m.name].second / 12
					if method == smoothCurve {
						ends := math.Abs(m.second(0)) + math.Abs(m.second(bottom))
						bound = gravity * (5.0/384*below*math.Pow(h, 4)*greatestOf[m.name].fourth + h*h*h*ends/8)
					}
					arguments := []law.Argument{listOf(depths...), listOf(densities...), {Values: []float64{z}}, {Values: []float64{101325}}, {Values: []float64{gravity}}, textOf(method)}
					got := one(t, "profile_liquid_pressure", arguments...)
					miss := math.Abs(got - 101325 - gravity*m.head(z))
					if !(miss <= bound+1e-15*got*10) {
						t.Fatalf("%s by %s of %d at %g m: %g Pa off, the bound is %g", m.name, method, n, z, miss, bound)
					}
					closest[method] = math.Max(closest[method], miss/bound)
				}
			}
		}
		for method, share := range closest {
			if share < 0.01 {
				t.Errorf("%s by %s: never nearer to the bound than %g of it", m.name, method, share)
			}
		}
	}
}

// greatestOf holds the greatest derivatives of the measured densities above
// 200 m.
var greatestOf = func() map[string]struct{ second, fourth float64 } {
	all := map[string]struct{ second, fourth float64 }{}
	for _, m := range measuredDensities() {
		all[m.name] = struct{ second, fourth float64 }{greatest(m.second, 200), greatest(m.fourth, 200)}
	}
	return all
}()

// TestProfileRefusals asks for no number where the measurements give none.
func TestProfileRefusals(t *testing.T) {
	pressure := func(depths []float64, z float64) float64 {
		densities := make([]float64, len(depths))
		for k := range densities {
			densities[k] = 1000
		}
		return one(t, "profile_liquid_pressure", listOf(depths...), listOf(densities...), law.Argument{Values: []float64{z}}, law.Argument{Values: []float64{0}}, law.Argument{Values: []float64{10}}, textOf(smoothCurve))
	}
	for what, got := range map[string]float64{
		"below the last":   pressure([]float64{0, 10, 20}, 20.001),
		"depths in a mess": pressure([]float64{0, 20, 10}, 5),
		"one depth twice":  pressure([]float64{0, 10, 10}, 5),
		"none":             pressure(nil, 5),
		"no number":        pressure([]float64{0, math.NaN(), 10}, 5),
	} {
		if !math.IsNaN(got) {
			t.Errorf("%s: %v", what, got)
		}
	}
	if got := pressure([]float64{5, 10}, 2); got != 20000 {
		t.Errorf("above the first measurement: %v", got)
	}
	if got := pressure([]float64{5}, 5); got != 50000 {
		t.Errorf("one measurement: %v", got)
	}
}

// castOf makes the lists of a cast whose salinity and temperature are functions
// of depth, measured every h down to the bottom.
func castOf(h, bottom float64, salinity, temperature func(z float64) float64) (depths, salinities, temperatures law.Argument) {
	var z, s, t []float64
	for k := 0; float64(k)*h <= bottom; k++ {
		d := float64(k) * h
		z, s, t = append(z, d), append(s, salinity(d)), append(t, temperature(d)+273.15)
	}
	return listOf(z...), listOf(s...), listOf(t...)
}

// TestSeaColumnErrorBounds holds the integrated column against far shorter
// steps, and casts of straight lines against the curves they were read from.
func TestSeaColumnErrorBounds(t *testing.T) {
	const bottom, latitude = 6000.0, 0.6
	salinity := func(z float64) float64 { return 34.7 + 1.2*math.Exp(-z/300) }
	temperature := func(z float64) float64 { return 1.5 + 22*math.Exp(-z/400) }
	const salinityBend, temperatureBend = 1.2 / (300 * 300), 22.0 / (400 * 400) // at the surface, where they are greatest
	reference := fineColumn(bottom, latitude, salinity, temperature)
	closest := 0.0
	for _, h := range []float64{25, 50, 100, 200, 400} {
		depths, salinities, temperatures := castOf(h, bottom, salinity, temperature)
		for _, z := range []float64{100, 730, 1500, 2977.5, 6000} {
			got := one(t, "sea_column_pressure", law.Argument{Values: []float64{z}}, law.Argument{Values: []float64{latitude}}, depths, salinities, temperatures, textOf(scaleITS90)) / 1e4
			below := math.Ceil(z/h) * h
			bound := h * h / 12 * (1e-3*salinityBend + 5e-4*temperatureBend) * below * 1.01
			miss := math.Abs(got - reference(z))
			if !(miss <= bound+1e-8) {
				t.Errorf("cast every %g m, %g m: %g dbar off, the bound is %g", h, z, miss, bound)
			}
			closest = math.Max(closest, miss/bound)
		}
	}
	if closest < 0.03 {
		t.Errorf("never nearer to the bound than %g of it", closest)
	}
	// The steps alone: on straight lines nothing but they err.
	line := func(from, to float64) func(z float64) float64 {
		return func(z float64) float64 { return from + (to-from)*z/bottom }
	}
	for _, c := range [][4]float64{{35, 35, 0, 0}, {34, 36, 25, 1}, {0, 40, 0, 30}} {
		s, temp := line(c[0], c[1]), line(c[2], c[3])
		depths, salinities, temperatures := castOf(bottom, bottom, s, temp)
		exact := fineColumn(bottom, latitude, s, temp)
		for _, z := range []float64{125, 250, 1999, 6000} {
			got := one(t, "sea_column_pressure", law.Argument{Values: []float64{z}}, law.Argument{Values: []float64{latitude}}, depths, salinities, temperatures, textOf(scaleITS90)) / 1e4
			allowed := 1e-11
			if c[0] == 0 {
				allowed = 1e-7 // the second derivative by salinity has no bound there
			}
			if off := math.Abs(got/exact(z) - 1); !(off <= allowed) {
				t.Errorf("straight lines %v, %g m: steps err by %g", c, z, off)
			}
		}
	}
}

// fineColumn integrates a column in steps of half a metre by the midpoint rule
// with Richardson's extrapolation, and gives the sea pressure in dbar.
func fineColumn(bottom, latitude float64, salinity, temperature func(z float64) float64) func(z float64) float64 {
	slope := func(z, p float64) float64 {
		gravity := surfaceGravity(latitude) + 2.184e-6*p
		return plainSeaWaterDensity(salinity(z), temperature(z)+273.15, p*1e4) * gravity / 1e4
	}
	midpoint := func(z float64, n int) float64 {
		p, h := 0.0, z/float64(n)
		for i := range n {
			at := float64(i) * h
			p += h * slope(at+h/2, p+h/2*slope(at, p))
		}
		return p
	}
	return func(z float64) float64 {
		n := int(math.Ceil(z))
		coarse, fine := midpoint(z, n), midpoint(z, 2*n)
		return fine + (fine-coarse)/3
	}
}

// TestSeaColumnOfStandardOcean holds the column of salinity 35 at 0 degC
// against the depth that UNESCO 44 prints: its formula fits that ocean within
// 0.1 m.
func TestSeaColumnOfStandardOcean(t *testing.T) {
	for _, c := range []struct{ p, latitude, want float64 }{{500, 0, 496.65}, {5000, 30, 4908.56}, {10000, 30, 9712.65}, {10000, 90, 9674.23}} {
		depth := one(t, "sea_column_depth", law.Argument{Values: []float64{c.p * 1e4}}, law.Argument{Values: []float64{c.latitude * degree}}, listOf(0, 10000), listOf(35, 35), listOf(273.15, 273.15), textOf(scaleITS90))
		near(t, "depth of the standard ocean", depth, c.want, 0.1, unesco44+" p. 28")
	}
}

// BenchmarkSeaColumn measures the pressure under one cast, and the depth.
func BenchmarkSeaColumn(b *testing.B) {
	depths, salinities, temperatures := castOf(500, 6000, func(z float64) float64 { return 35 }, func(z float64) float64 { return 20 - z/400 })
	column := block([2]float64{0, 6000})[0]
	dst := make([]float64, 1024)
	for name, scale := range map[string]float64{"sea_column_pressure": 1, "sea_column_depth": 1e4} {
		b.Run(name, func(b *testing.B) {
			values := append([]float64(nil), column.Values...)
			for i := range values {
				values[i] *= scale
			}
			arguments := []law.Argument{{Values: values}, {Values: []float64{0.6}}, depths, salinities, temperatures, textOf(scaleITS90)}
			body, work := lawNamed(b, name).Body, &law.Work{}
			b.ReportAllocs()
			for b.Loop() {
				body(dst, arguments, work)
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
		})
	}
}
