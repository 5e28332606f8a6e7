package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

const unesco44 = "Fofonoff & Millard 1983, UNESCO Technical Papers in Marine Science 44"

// TestFreshWater holds the density of water against the printed table.
func TestFreshWater(t *testing.T) {
	const tanaka = "Tanaka et al. 2001, table 1"
	table := map[float64]float64{ // degC, kg/m^3
		1: 999.9017, 2: 999.9429, 3: 999.9672, 4: 999.9749, 6: 999.9431, 8: 999.8513, 10: 999.7027,
		12: 999.5005, 13: 999.3801, 14: 999.2474, 15: 999.1026, 16: 998.9459, 18: 998.5984, 19: 998.4079,
		21: 997.9950, 22: 997.7730, 24: 997.2988, 25: 997.0470, 27: 996.5151, 28: 996.2353, 29: 995.9465,
		31: 995.3424, 33: 994.7041, 34: 994.3724, 36: 993.6847, 37: 993.3290, 39: 992.5941, 40: 992.2152,
	}
	for celsius, want := range table {
		near(t, "water", one(t, "fresh_water_density", numbers(celsius+273.15)...), want, 0.00005, tanaka)
	}
	// Where the range is left, within 1 kg/m^3 of Kell's measured 958.3637 at 100 degC.
	near(t, "boiling water", one(t, "fresh_water_density", numbers(373.15)...), 958.3637, 1, "Kell 1975, J. Chem. Eng. Data 20, 97-105")
}

// seaDensity runs the law with S, degC and bar.
func seaDensity(t testing.TB, s, celsius, bars float64, scale string) float64 {
	return one(t, "sea_water_density", append(numbers(s, celsius+273.15, bars*1e5), law.Argument{Text: scale})...)
}

// TestSeaWater holds EOS-80 against its printed check values.
func TestSeaWater(t *testing.T) {
	densities := []struct{ s, t, p, want float64 }{ // p. 19: practical salinity, degC, bar, kg/m^3
		{0, 5, 1000, 1044.12802},
		{0, 25, 1000, 1037.90204},
		{35, 5, 1000, 1069.48914},
		{35, 25, 1000, 1062.53817},
	}
	for _, c := range densities {
		near(t, "density", seaDensity(t, c.s, c.t, c.p, scaleIPTS68), c.want, 0.000005, unesco44+" p. 19")
		// A point on ITS-90 is 1.00024 times higher on IPTS-68.
		near(t, "density on ITS-90", seaDensity(t, c.s, c.t/1.00024, c.p, scaleITS90), c.want, 0.000005, unesco44+" p. 19")
	}
	moduli := []struct{ s, t, p, want float64 }{ // p. 19: secant bulk modulus, bar
		{0, 5, 0, 20337.80375},
		{0, 5, 1000, 23643.52599},
		{0, 25, 0, 22100.72106},
		{35, 5, 0, 22185.93358},
		{35, 5, 1000, 25577.49819},
		{35, 25, 1000, 27108.94504},
	}
	for _, c := range moduli {
		modulus := func(p float64) float64 {
			return p / (1 - seaDensity(t, c.s, c.t, 0, scaleIPTS68)/seaDensity(t, c.s, c.t, p, scaleIPTS68))
		}
		got := 0.0
		if c.p == 0 {
			// The modulus is a quadratic in p: its third difference is zero.
			got = 3*modulus(100) - 3*modulus(200) + modulus(300)
		} else {
			got = modulus(c.p)
		}
		near(t, "secant bulk modulus", got, c.want, 0.000005, unesco44+" p. 19")
	}
	anomalies := []struct{ s, t, p, want float64 }{ // p. 22: specific volume anomaly, 1e-8 m^3/kg
		{0, 0, 1000, 2288.61},
		{0, 30, 0, 3170.58},
		{0, 30, 1000, 3147.85},
		{35, 0, 0, 0},
		{35, 30, 0, 607.14},
		{35, 30, 1000, 916.34},
	}
	for _, c := range anomalies {
		got := 1/seaDensity(t, c.s, c.t, c.p, scaleIPTS68) - 1/seaDensity(t, 35, 0, c.p, scaleIPTS68)
		near(t, "specific volume anomaly", got*1e8, c.want, 0.005, unesco44+" p. 22")
	}
	// One atmosphere: the polynomial of eq. 13 alone, with its constant term at 0 degC.
	near(t, "fresh water at 0 degC", seaDensity(t, 0, 0, 0, scaleITS90), 999.842594, 1e-9, unesco44+" eq. 14")
}

// TestSeaWaterFiniteRange asks over the whole range in which the law answers
// for densities that rise with pressure and salinity.
func TestSeaWaterFiniteRange(t *testing.T) {
	parameters := lawNamed(t, "sea_water_density").Parameters
	s, temperature, p := parameters[0].Finite, parameters[1].Finite, parameters[2].Finite
	const steps = 20
	at := func(low, high float64, i int) float64 { return low + (high-low)*float64(i)/steps }
	for i := 0; i <= steps; i++ {
		for j := 0; j <= steps; j++ {
			before := 0.0
			for k := 0; k <= steps; k++ {
				salinity, celsius, bars := at(s.Low, s.High, i), at(temperature.Low, temperature.High, j), at(p.Low, p.High, k)/10
				got := seaDensity(t, salinity, celsius, bars, scaleITS90)
				if !(got > before && got > 980 && got < 1160) {
					t.Fatalf("S %g, %g degC, %g bar: %g kg/m^3 after %g", salinity, celsius, bars, got, before)
				}
				if i > 0 && !(got > seaDensity(t, at(s.Low, s.High, i-1), celsius, bars, scaleITS90)) {
					t.Fatalf("S %g, %g degC, %g bar: no denser with salt", salinity, celsius, bars)
				}
				before = got
			}
		}
	}
}

// TestSeaDepth holds the depth of the standard ocean against the printed table.
func TestSeaDepth(t *testing.T) {
	table := []struct{ p, latitude, want float64 }{ // p. 28: dbar, deg, m
		{500, 0, 496.65}, {2000, 0, 1979.55}, {4000, 0, 3940.88}, {5000, 0, 4915.04}, {6000, 0, 5885.03},
		{7000, 0, 6850.95}, {10000, 0, 9725.47}, {500, 30, 496.00}, {2000, 30, 1976.94}, {3000, 30, 2958.52},
		{5000, 30, 4908.56}, {6000, 30, 5877.27}, {7000, 30, 6841.92}, {10000, 30, 9712.65}, {500, 45, 495.34},
		{1000, 45, 989.50}, {2000, 45, 1974.33}, {4000, 45, 3930.49}, {6000, 45, 5869.51}, {8000, 45, 7792.33},
		{10000, 45, 9699.84}, {500, 60, 494.69}, {1000, 60, 988.19}, {2000, 60, 1971.72}, {4000, 60, 3925.30},
		{5000, 60, 4895.60}, {7000, 60, 6823.86}, {9000, 60, 8736.40}, {500, 90, 494.03}, {2000, 90, 1969.11},
		{3000, 90, 2946.81}, {5000, 90, 4889.13}, {7000, 90, 6814.84}, {9000, 90, 8724.85}, {10000, 90, 9674.23},
	}
	for _, c := range table {
		for _, side := range []float64{1, -1} {
			got := one(t, "sea_depth_at_pressure", numbers(c.p*1e4, side*c.latitude*degree)...)
			near(t, "depth", got, c.want, 0.005, unesco44+" p. 28")
			back := one(t, "sea_pressure_at_depth", numbers(c.want, side*c.latitude*degree)...)
			// 0.005 m of depth are 0.0052 dbar.
			near(t, "pressure", back/1e4, c.p, 0.0053, unesco44+" p. 28, read backwards")
		}
	}
	near(t, "check value", one(t, "sea_depth_at_pressure", numbers(1e8, 30*degree)...), 9712.653, 0.0005, unesco44)
}

// TestSeaDepthInverse carries depths there and back over the whole range in
// which the laws answer; zero is exact.
func TestSeaDepthInverse(t *testing.T) {
	worst := 0.0
	for latitude := -90.0; latitude <= 90; latitude += 7.5 {
		for depth := 1e-6; depth < 15000; depth *= 1.13 {
			pressure := one(t, "sea_pressure_at_depth", numbers(depth, latitude*degree)...)
			back := one(t, "sea_depth_at_pressure", numbers(pressure, latitude*degree)...)
			worst = math.Max(worst, math.Abs(back/depth-1))
		}
		for _, name := range []string{"sea_pressure_at_depth", "sea_depth_at_pressure"} {
			if zero := one(t, name, numbers(0, latitude*degree)...); zero != 0 {
				t.Errorf("%s of zero is %v", name, zero)
			}
		}
	}
	if worst > 1e-15 {
		t.Errorf("there and back differ by %g", worst)
	}
	for depth := 100.0; depth <= 15000; depth += 100 {
		g := surfaceGravity(0)
		if p := seaPressure(depth, g); p >= 20000 {
			t.Errorf("%g m: %g dbar lies outside the other law's range", depth, p)
		}
	}
}

// plainSeaWaterDensity is what one writes by hand for one row: the same
// equation in Horner's form without regard to equal bits everywhere.
func plainSeaWaterDensity(s, t90, pascals float64) float64 {
	t := (t90 - 273.15) * 1.00024
	p := pascals / 1e5
	root := math.Sqrt(s)
	rho := 999.842594 + t*(6.793952e-2+t*(-9.095290e-3+t*(1.001685e-4+t*(-1.120083e-6+t*6.536332e-9)))) +
		s*(0.824493+t*(-4.0899e-3+t*(7.6438e-5+t*(-8.2467e-7+t*5.3875e-9)))+
			root*(-5.72466e-3+t*(1.0227e-4-t*1.6546e-6))+4.8314e-4*s)
	k := 19652.21 + t*(148.4206+t*(-2.327105+t*(1.360477e-2-t*5.155288e-5))) +
		s*(54.6746+t*(-0.603459+t*(1.09987e-2-t*6.1670e-5))+root*(7.944e-2+t*(1.6483e-2-t*5.3009e-4))) +
		p*(3.239908+t*(1.43713e-3+t*(1.16092e-4-t*5.77905e-7))+s*(2.2838e-3+t*(-1.0981e-5-t*1.6078e-6)+1.91075e-4*root)+
			p*(8.50935e-5+t*(-6.12293e-6+t*5.2787e-8)+s*(-9.9348e-7+t*(2.0816e-8+t*9.1697e-10))))
	return rho / (1 - p/k)
}

// seaBlock makes a block of rows from the ocean's range.
func seaBlock() (salinity, temperature, pressure []float64) {
	const rows = 1024
	salinity, temperature, pressure = make([]float64, rows), make([]float64, rows), make([]float64, rows)
	for i := range rows {
		part := float64(i) / rows
		salinity[i], temperature[i], pressure[i] = 42*part, nature.IcePoint+30*(1-part), 1e8*part*part
	}
	return salinity, temperature, pressure
}

// TestPlainSeaWaterDensity holds the body against the plain function.
func TestPlainSeaWaterDensity(t *testing.T) {
	salinity, temperature, pressure := seaBlock()
	dst := make([]float64, len(salinity))
	lawNamed(t, "sea_water_density").Body(dst, []law.Argument{{Values: salinity}, {Values: temperature}, {Values: pressure}, {Text: scaleITS90}}, &law.Work{})
	for i, got := range dst {
		if want := plainSeaWaterDensity(salinity[i], temperature[i], pressure[i]); math.Abs(got/want-1) > 1e-15 {
			t.Errorf("row %d: %v, plain %v", i, got, want)
		}
	}
}

// BenchmarkSeaWaterDensity measures the law's body against a plain loop.
func BenchmarkSeaWaterDensity(b *testing.B) {
	salinity, temperature, pressure := seaBlock()
	dst := make([]float64, len(salinity))
	b.Run("law", func(b *testing.B) {
		body := lawNamed(b, "sea_water_density").Body
		arguments := []law.Argument{{Values: salinity}, {Values: temperature}, {Values: pressure}, {Text: scaleITS90}}
		work := &law.Work{}
		b.ReportAllocs()
		for b.Loop() {
			body(dst, arguments, work)
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
	})
	b.Run("plain", func(b *testing.B) {
		for b.Loop() {
			for i := range dst {
				dst[i] = plainSeaWaterDensity(salinity[i], temperature[i], pressure[i])
			}
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
	})
}

// BenchmarkSeaPressureAtDepth measures the inverse by Newton's method.
func BenchmarkSeaPressureAtDepth(b *testing.B) {
	_, _, depth := seaBlock()
	for i := range depth {
		depth[i] /= 1e4
	}
	dst := make([]float64, len(depth))
	body := lawNamed(b, "sea_pressure_at_depth").Body
	arguments := []law.Argument{{Values: depth}, {Values: []float64{0.7}}}
	work := &law.Work{}
	b.ReportAllocs()
	for b.Loop() {
		body(dst, arguments, work)
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
}
