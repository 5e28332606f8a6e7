package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/engine/unit"
)

// columnOf makes the argument of a number a row.
func columnOf(values []float64) law.Argument { return law.Argument{Values: values} }

// listOf makes a list of numbers that serve all rows.
func listOf(values ...float64) law.Argument {
	items := make([]law.Argument, len(values))
	for i, value := range values {
		items[i].Values = []float64{value}
	}
	return law.Argument{Items: items}
}

func textOf(text string) law.Argument { return law.Argument{Text: text} }

// grid gives count numbers from low to high: evenly spread, or in equal ratios.
func grid(low, high float64, count int, ratios bool) []float64 {
	x := make([]float64, count)
	for i := range x {
		share := float64(i) / float64(count-1)
		if ratios {
			x[i] = low * math.Pow(high/low, share)
		} else {
			x[i] = low + (high-low)*share
		}
	}
	x[count-1] = high
	return x
}

// TestInversePairs carries numbers through a law and its inverse over the whole
// range in which both answer: the input must come back to 1e-12.
func TestInversePairs(t *testing.T) {
	const count = 3001
	its90, deep := textOf(scaleITS90), listOf(0, 100, 800, 2000, 15000)
	salt, warm := listOf(36, 35, 34.5, 34.9, 34.7), listOf(299, 290, 280, 276, 274.5)
	cases := []struct {
		forward, back string
		low, high     float64 // of the argument that is carried there and back, SI
		ratios        bool    // in equal ratios
		at            int     // its place in both laws' arguments
		rest          []law.Argument
		likeScale     float64 // the scale of the number where it may be near zero: 0 for itself
	}{
		{"pressure_at_depth", "depth_at_pressure", 1e-3, 1e5, true, -1, []law.Argument{{Values: []float64{0}}, {Values: []float64{1025}}, {Values: []float64{9.81}}}, 0},
		{"stiff_liquid_pressure", "stiff_liquid_depth", 1e-3, 1e5, true, -1, []law.Argument{{Values: []float64{0}}, {Values: []float64{1025}}, {Values: []float64{2.2e9}}, {Values: []float64{9.81}}}, 0},
		{"layered_pressure", "layered_depth", 1e-3, 1200, true, -1, []law.Argument{{Values: []float64{0}}, listOf(0.4, 100, 500, 599.6), listOf(680, 870, 1000, 13595.1), {Values: []float64{9.81}}}, 0},
		{"absolute", "gauge", 0, 5e6, false, 0, numbers(101325), 101325},
		{"water_saturation_pressure", "water_boiling_temperature", 235, criticalTemperature, false, 0, []law.Argument{textOf(industrialEquation)}, 0},
		{"water_boiling_temperature", "water_saturation_pressure", 15, criticalPressure, true, 0, []law.Argument{textOf(industrialEquation)}, 0},
		{"saunders_pressure", "saunders_depth", 1e-3, 18800, true, 0, numbers(0.7), 0},
		{"sea_pressure_at_depth", "sea_depth_at_pressure", 1e-3, 15000, true, 0, numbers(-1.2), 0},
		{"sea_column_pressure", "sea_column_depth", 1e-3, 15000, true, 0, []law.Argument{{Values: []float64{0.5}}, deep, salt, warm, its90}, 0},
		{"absolute_salinity", "practical_salinity", 1e-3, 100, true, 0, numbers(0.01e-3), 0.01},
		{"conservative_temperature", "sea_temperature_teos", 263.15, 333.15, false, 1, numbers(0.035, 0), 0},
		{"conservative_temperature", "sea_temperature_teos", 271, 313.15, false, 1, numbers(0.035, 1e8), 0},
		{"conservative_temperature", "sea_temperature_teos", 271, 313.15, false, 1, numbers(0, 5e7), 0},
		{"sea_pressure_teos", "sea_height_teos", -11500, -1e-3, false, 0, numbers(1.5), 0},
		{"balance_reading", "buoyancy_corrected_mass", 1e-6, 1e4, true, 0, numbers(1.2, 900, 8000), 0},
		{"conventional_mass", "mass_of_conventional", 1e-6, 1e4, true, 0, numbers(2700), 0},
	}
	for _, c := range cases {
		x := grid(c.low, c.high, count, c.ratios)
		if c.low < 0 && c.high < 0 {
			x = grid(-c.high, -c.low, count, true)
			for i := range x {
				x[i] = -x[i]
			}
		}
		y, back := make([]float64, count), make([]float64, count)
		lawNamed(t, c.forward).Body(y, placed(c.forward, c.at, x, c.rest), &law.Work{})
		lawNamed(t, c.back).Body(back, placed(c.back, c.at, y, c.rest), &law.Work{})
		worst, where := 0.0, 0.0
		for i := range x {
			e := math.Abs(back[i]-x[i]) / math.Max(math.Abs(x[i]), c.likeScale)
			if !(e <= worst) {
				worst, where = e, x[i]
			}
		}
		if !(worst <= 1e-12) {
			t.Errorf("%s and %s: %g comes back with a difference of %.2g", c.forward, c.back, where, worst)
		}
	}
}

// placed puts a column among the other arguments of a law. The laws of columns
// of liquid (place -1) have the surface's pressure before the depth and after
// the pressure.
func placed(name string, at int, x []float64, rest []law.Argument) []law.Argument {
	if at < 0 {
		at = 1
		if name == "depth_at_pressure" || name == "stiff_liquid_depth" || name == "layered_depth" {
			at = 0
		}
	}
	arguments := append([]law.Argument(nil), rest[:min(at, len(rest))]...)
	arguments = append(arguments, columnOf(x))
	arguments = append(arguments, rest[min(at, len(rest)):]...)
	if name == "water_boiling_temperature" {
		return arguments[:1]
	}
	return arguments
}

// TestFiniteRanges runs every law at points spread over the ranges where it is
// not refused: a number comes out, or the law says why there may be none.
func TestFiniteRanges(t *testing.T) {
	const rows = 512
	for _, l := range Laws() {
		arguments := make([]law.Argument, len(l.Parameters))
		bounded := true
		for j := range l.Parameters {
			p := &l.Parameters[j]
			if p.Type == law.Text {
				arguments[j].Text = p.Choices[0]
				continue
			}
			if p.Type == law.List || !p.Finite.HasLow || !p.Finite.HasHigh {
				bounded = false
				break
			}
			u, err := unit.Parse(p.Unit)
			if err != nil {
				t.Fatal(err)
			}
			low, high := u.ToSI(p.Finite.Low), u.ToSI(p.Finite.High)
			for i := range rows {
				// Multiples of square roots fill the ranges evenly; the first
				// rows are the corners.
				share := math.Mod(float64(i)*math.Sqrt(float64([]int{2, 3, 5, 7, 11, 13}[j])), 1)
				if i < 64 {
					share = float64(i >> j & 1)
				}
				if p.Finite.LowOpen {
					share = math.Max(share, 1e-9)
				}
				arguments[j].Values = append(arguments[j].Values, low+share*(high-low))
			}
		}
		if !bounded {
			continue
		}
		dst := make([]float64, rows)
		work := &law.Work{}
		if allocations := testing.AllocsPerRun(2, func() { l.Body(dst, arguments, work) }); allocations > 4 {
			t.Errorf("%s allocates %v times for %d rows", l.Name, allocations, rows)
		}
		for i := range dst {
			if math.IsInf(dst[i], 0) || math.IsNaN(dst[i]) && l.Refusal == "" {
				t.Errorf("%s gives %v of %v", l.Name, dst[i], rowOf(arguments, i))
				break
			}
		}
	}
}

// TestRisingLaws asks over the ranges where they are not refused that
// densities, speeds and pressures are positive and rise with what compresses or
// heats.
func TestRisingLaws(t *testing.T) {
	cases := []struct {
		name  string
		along int // the parameter with which it rises
		texts []string
	}{
		{"water_density", 1, nil},
		{"water_saturation_pressure", 0, []string{industrialEquation}},
		{"water_saturation_pressure", 0, []string{auxiliaryEquation}},
		{"water_boiling_temperature", 0, nil},
		{"ice_saturation_pressure", 0, nil},
		{"saturated_steam_density", 0, nil},
		{"steam_density", 1, nil},
		{"sea_sound_speed", 2, []string{scaleITS90}},
		{"sea_water_density_teos", 0, nil},
		{"sea_water_density_teos", 2, nil},
		{"sea_water_density_gibbs", 0, nil},
		{"sea_water_density_gibbs", 2, nil},
		{"conservative_temperature", 1, nil},
		{"sea_entropy", 1, nil},
		{"moist_air_density", 0, nil},
	}
	for _, c := range cases {
		l := lawNamed(t, c.name)
		const steps = 12
		next := 0
		arguments := make([]law.Argument, len(l.Parameters))
		spans := make([][2]float64, len(l.Parameters))
		for j := range l.Parameters {
			p := &l.Parameters[j]
			if p.Type == law.Text {
				arguments[j].Text = c.texts[next]
				next++
				continue
			}
			u, _ := unit.Parse(p.Unit)
			spans[j] = [2]float64{u.ToSI(p.Finite.Low), u.ToSI(p.Finite.High)}
			arguments[j].Values = []float64{0}
		}
		total := 1
		for j := range spans {
			if j != c.along && arguments[j].Values != nil {
				total *= steps + 1
			}
		}
		for point := range total {
			rest := point
			for j := range spans {
				if j != c.along && arguments[j].Values != nil {
					arguments[j].Values[0] = spans[j][0] + (spans[j][1]-spans[j][0])*float64(rest%(steps+1))/steps
					rest /= steps + 1
				}
			}
			before := math.Inf(-1)
			for k := 0; k <= 4*steps; k++ {
				arguments[c.along].Values[0] = spans[c.along][0] + (spans[c.along][1]-spans[c.along][0])*float64(k)/(4*steps)
				dst := []float64{0}
				l.Body(dst, arguments, &law.Work{})
				if math.IsNaN(dst[0]) {
					continue // the ranges are a box, the law's domain is not
				}
				if !(dst[0] > before) || dst[0] <= 0 && c.name != "sea_entropy" && arguments[c.along].Values[0] != 0 {
					t.Fatalf("%s%v = %v after %v", c.name, rowOf(arguments, 0), dst[0], before)
				}
				before = dst[0]
			}
		}
	}
}
