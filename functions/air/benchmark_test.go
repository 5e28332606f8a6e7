package air

import (
	"math"
	"sort"
	"testing"

	"plumbrule/engine/law"
)

// Laws against what a Go programmer writes by hand: run
//
//	go test -run '^$' -bench Hand ./functions/air
//
// and compare each pair.

// handLower is the density of the standard below 86 km by hand.
func handLower(dst, altitude []float64) {
	const g, m, r = 9.80665, 0.0289644, 8.31432
	base := [...]float64{0, 11000, 20000, 32000, 47000, 51000, 71000}
	temperature := [...]float64{288.15, 216.65, 216.65, 228.65, 270.65, 270.65, 214.65}
	lapse := [...]float64{-0.0065, 0, 0.001, 0.0028, 0, -0.0028, -0.002}
	pressure := [...]float64{101325, 22632.064, 5474.8887, 868.01870, 110.90631, 66.938874, 3.9564205}
	for i, h := range altitude {
		b := len(base) - 1
		for b > 0 && h < base[b] {
			b--
		}
		t := temperature[b] + lapse[b]*(h-base[b])
		var p float64
		if lapse[b] == 0 {
			p = pressure[b] * math.Exp(-g*m*(h-base[b])/(r*t))
		} else {
			p = pressure[b] * math.Pow(temperature[b]/t, g*m/(r*lapse[b]))
		}
		dst[i] = p * m / (r * t)
	}
}

// handUpper is the density above 86 km by hand: the printed table every 2 km
// to 10 km, its logarithm interpolated.
func handUpper(dst, altitude, heights, logarithms []float64) {
	for i, h := range altitude {
		j := sort.SearchFloat64s(heights, h)
		j = max(1, min(j, len(heights)-1))
		f := (h - heights[j-1]) / (heights[j] - heights[j-1])
		dst[i] = math.Exp(logarithms[j-1] + f*(logarithms[j]-logarithms[j-1]))
	}
}

// handProfile is the pressure in a profile by hand, with the levels' pressures
// made once.
func handProfile(dst, height, heights, temperatures []float64, base float64) {
	const gmr = 9.80665 * 0.0289644 / 8.314462618
	pressures := make([]float64, len(heights))
	pressures[0] = base
	above := func(i int, h float64) float64 {
		lapse := (temperatures[i+1] - temperatures[i]) / (heights[i+1] - heights[i])
		if lapse == 0 {
			return pressures[i] * math.Exp(-gmr*(h-heights[i])/temperatures[i])
		}
		return pressures[i] * math.Pow(1+lapse*(h-heights[i])/temperatures[i], -gmr/lapse)
	}
	for i := 1; i < len(heights); i++ {
		pressures[i] = above(i-1, heights[i])
	}
	for i, h := range height {
		j := sort.SearchFloat64s(heights, h)
		dst[i] = above(max(0, min(j-1, len(heights)-2)), h)
	}
}

const benchmarkRows = 1024

// scattered gives heights in no order.
func scattered(low, high float64) []float64 {
	h := make([]float64, benchmarkRows)
	for i := range h {
		h[i] = low + (high-low)*math.Mod(float64(i)*0.6180339887, 1)
	}
	return h
}

func perRow(b *testing.B, body func()) {
	b.Helper()
	for b.Loop() {
		body()
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/benchmarkRows, "ns/row")
}

func BenchmarkHand(b *testing.B) {
	dst := make([]float64, benchmarkRows)
	var work law.Work
	for _, part := range []struct {
		name      string
		low, high float64
	}{{"Below86km", -5000, 84000}, {"Above86km", 85000, 860000}} {
		h := scattered(part.low, part.high)
		ordered := append([]float64(nil), h...)
		sort.Float64s(ordered)
		var heights, logarithms []float64
		for z := upperBegin; z < topGeopotential; z += 5000 {
			heights, logarithms = append(heights, z), append(logarithms, math.Log(standardDensity(z)))
		}
		for _, order := range []struct {
			name   string
			column []float64
		}{{"Scattered", h}, {"Rising", ordered}} {
			arguments := []law.Argument{{Values: order.column}}
			b.Run("Density"+part.name+order.name+"/law", func(b *testing.B) {
				perRow(b, func() { standardDensityLaw.Body(dst, arguments, &work) })
			})
			b.Run("Density"+part.name+order.name+"/hand", func(b *testing.B) {
				perRow(b, func() {
					if part.low < 0 {
						handLower(dst, order.column)
					} else {
						handUpper(dst, order.column, heights, logarithms)
					}
				})
			})
		}
	}
	heights, temperatures := make([]float64, 100), make([]float64, 100)
	var h, t law.Argument
	for i := range heights {
		heights[i] = 300 * float64(i)
		temperatures[i] = 290 - 0.002*heights[i] + 5*math.Sin(float64(i))
		h.Items = append(h.Items, law.Argument{Values: heights[i : i+1]})
		t.Items = append(t.Items, law.Argument{Values: temperatures[i : i+1]})
	}
	asked := scattered(0, 29700)
	arguments := []law.Argument{h, t, {Values: []float64{101325}}, {Values: asked}, {Values: []float64{0.0289644}}, {Text: "constant"}, {Values: []float64{9.80665}}, {Values: []float64{6356766}}}
	pressure := profileLaws[0]
	var kept law.Work
	b.Run("Profile100/law", func(b *testing.B) {
		perRow(b, func() { pressure.Body(dst, arguments, &kept) })
	})
	b.Run("Profile100/hand", func(b *testing.B) {
		perRow(b, func() { handProfile(dst, asked, heights, temperatures, 101325) })
	})
}
