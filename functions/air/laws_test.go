package air

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// give runs a law's body for one row.
func give(l *law.Law, arguments ...float64) float64 {
	row := make([]law.Argument, len(arguments))
	for i, x := range arguments {
		row[i].Values = []float64{x}
	}
	var dst [1]float64
	l.Body(dst[:], row, &law.Work{})
	return dst[0]
}

func TestEveryLawIsComplete(t *testing.T) {
	if _, err := law.NewCatalogue(Laws(), nil); err != nil {
		t.Fatal(err)
	}
	for _, l := range Laws() {
		switch {
		case l.Group != group, l.Equation == "", l.Source == "", l.Gives == "", l.Body == nil:
			t.Errorf("%s: something is missing", l.Name)
		case len(l.Examples) == 0:
			t.Errorf("%s: no example", l.Name)
		case l.Result.Unit == "":
			t.Errorf("%s: no unit of the result", l.Name)
		}
		optional := false
		for _, p := range l.Parameters {
			if p.Name == "" || p.Meaning == "" || p.Unit == "" && p.Type != law.Text {
				t.Errorf("%s: parameter %q is incomplete", l.Name, p.Name)
			}
			if optional && !p.Optional() {
				t.Errorf("%s: required parameter %s after an optional one", l.Name, p.Name)
			}
			optional = p.Optional()
		}
	}
}

func TestPublishedValues(t *testing.T) {
	const (
		tableOne = "U.S. Standard Atmosphere 1976, table I"
		tableTwo = "U.S. Standard Atmosphere 1976, table 4"
		upper    = "U.S. Standard Atmosphere 1976, appendix A and table 26"
		icao     = "ICAO Doc 7488/3"
		isobaric = "ICAO standard isobaric surfaces"
	)
	cases := []struct {
		law       *law.Law
		arguments []float64
		want      float64
		half      float64
		source    string
	}{
		{standardTemperatureLaw, []float64{0}, 288.15, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{11000}, 216.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{20000}, 216.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{32000}, 228.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{47000}, 270.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{51000}, 270.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{71000}, 214.65, 1e-12, tableTwo},
		{standardTemperatureLaw, []float64{geopotentialHeight(-1000)}, 294.651, 0.0005, tableOne},
		{standardTemperatureLaw, []float64{geopotentialHeight(5000)}, 255.676, 0.0005, tableOne},
		{standardTemperatureLaw, []float64{geopotentialHeight(60000)}, 247.021, 0.0005, tableOne},
		{standardTemperatureLaw, []float64{geopotentialHeight(85000)}, 188.893 * 0.999694, 0.0005, tableOne + " and table 8"},
		{standardTemperatureLaw, []float64{geopotentialHeight(86000)}, 186.87, 0.005, tableOne},
		{standardPressureLaw, []float64{0}, 101325, 1e-9, tableTwo},
		{standardPressureLaw, []float64{geopotentialHeight(3500)}, 65780, 0.5, tableOne},
		{standardPressureLaw, []float64{geopotentialHeight(20000)}, 5529.3, 0.05, tableOne},
		{standardPressureLaw, []float64{geopotentialHeight(47000)}, 115.85, 0.005, tableOne},
		{standardPressureLaw, []float64{geopotentialHeight(70000)}, 5.2209, 0.00005, tableOne},
		{standardPressureLaw, []float64{geopotentialHeight(85500)}, 0.40802, 0.000005, tableOne},
		{standardDensityLaw, []float64{0}, 1.2250, 0.00005, tableOne},
		{standardDensityLaw, []float64{geopotentialHeight(45000)}, 1.9663e-3, 5e-8, tableOne},
		{standardDensityLaw, []float64{geopotentialHeight(86000)}, 6.957880e-6, 1e-10, upper},
		{standardSoundSpeedLaw, []float64{geopotentialHeight(-5000)}, 358.99, 0.005, tableOne},
		{standardSoundSpeedLaw, []float64{80000}, 281.120, 0.0005, icao},
		{standardViscosityLaw, []float64{geopotentialHeight(-1000)}, 1.8206e-5, 5e-10, tableOne},
		{standardViscosityLaw, []float64{geopotentialHeight(15000)}, 1.4216e-5, 5e-10, icao},
		{geopotentialHeightLaw, []float64{-5000}, -5004, 0.5, tableOne},
		{geopotentialHeightLaw, []float64{200000}, 193899, 0.5, tableOne},
		{geopotentialHeightLaw, []float64{500000}, 463540, 0.5, "U.S. Standard Atmosphere 1976, table 5"},
		{geometricHeightLaw, []float64{32000}, 32162, 0.5, icao},
		{pressureAltitudeLaw, []float64{101325}, 0, 0, "definition"},
		{pressureAltitudeLaw, []float64{85000}, 1457, 0.5, isobaric},
		{pressureAltitudeLaw, []float64{50000}, 5574, 0.5, isobaric},
		{pressureAltitudeLaw, []float64{10000}, 16180, 0.5, isobaric},
		{pressureAltitudeLaw, []float64{2000}, 26481, 0.5, isobaric},
		{densityAltitudeLaw, []float64{8.80345e-2}, 20000, 0.5, icao},
		{scaleHeightLaw, []float64{737, 0.04345, 8.87}, 15900, 50, "NASA Venus fact sheet"},
	}
	for _, c := range cases {
		if got := give(c.law, c.arguments...); !(math.Abs(got-c.want) <= c.half) {
			t.Errorf("%s%v = %v, want %v ± %v (%s)", c.law.Name, c.arguments, got, c.want, c.half, c.source)
		}
	}
}

// A layer of the standard is a lapsed column: with the standard's gas constant
// in the molar mass, the laws of columns give the standard's numbers.
func TestColumnsGiveTheStandard(t *testing.T) {
	molarMass := standardMolarMass * 8.31446261815324 / standardGasConstant // so that M/R is the standard's
	gradients := []float64{-0.0065, 0, 0.001, 0.0028, 0, -0.0028, -0.002}   // table 4, K/gpm
	for i, gradient := range gradients {
		base := ussa.layers[i].base
		for _, d := range []float64{100, 900, 2500} {
			pressure := give(lapsedPressureLaw, standardPressure(base), d, ussa.layers[i].temperature, -gradient, molarMass, standardGravity)
			density := give(lapsedDensityLaw, standardDensity(base), d, ussa.layers[i].temperature, -gradient, molarMass, standardGravity)
			closeTo(t, "pressure", pressure, standardPressure(base+d), 1e-14)
			closeTo(t, "density", density, standardDensity(base+d), 1e-14)
		}
	}
}

func TestSmallLapseRates(t *testing.T) {
	const (
		base, height, temperature, molarMass, gravity = 101325.0, 3000.0, 250.0, 0.0289644, 9.80665
	)
	still := give(barometricPressureLaw, base, height, temperature, molarMass, gravity)
	if got := give(lapsedPressureLaw, base, height, temperature, 0, molarMass, gravity); got != still {
		t.Errorf("lapse rate 0 gives %v, the isothermal law %v", got, still)
	}
	u := height / scaleHeight(temperature, molarMass, gravity)
	for _, rate := range []float64{1e-300, 1e-18, -1e-14, 1e-12, -1e-10, 1e-8, -1e-7, 1e-6} {
		// ln(p/p0) = -u (1 + x/2 + x²/3 + x³/4 + ...), the series of -ln(1-x)/x.
		x := rate * height / temperature
		series := 1 + x/2 + x*x/3 + x*x*x/4 + x*x*x*x/5
		closeTo(t, "pressure", give(lapsedPressureLaw, base, height, temperature, rate, molarMass, gravity), base*math.Exp(-u*series), 1e-14)
		closeTo(t, "density", give(lapsedDensityLaw, base, height, temperature, rate, molarMass, gravity), base*math.Exp(-u*series)/(1-x), 1e-14)
	}
}

func TestOutsideIsNoNumber(t *testing.T) {
	nan := math.NaN()
	cases := []struct {
		law       *law.Law
		arguments []float64
	}{
		{standardTemperatureLaw, []float64{-5004}}, {standardPressureLaw, []float64{864070.8}},
		{standardDensityLaw, []float64{nan}}, {standardSoundSpeedLaw, []float64{1e9}}, {standardViscosityLaw, []float64{-1e9}}, {standardSoundSpeedLaw, []float64{84852.1}},
		{pressureAltitudeLaw, []float64{0}}, {pressureAltitudeLaw, []float64{2e5}}, {densityAltitudeLaw, []float64{-1}},
		{geopotentialHeightLaw, []float64{-effectiveRadius}}, {geometricHeightLaw, []float64{effectiveRadius}},
		{lapsedPressureLaw, []float64{1e5, 50000, 288, 0.0065, 0.029, 9.8}}, // colder than 0 K
		{lapsedDensityLaw, []float64{1, 44500, 288, 0.0065, 0.029, 9.8}},
		{barometricPressureLaw, []float64{1e5, 10, 0, 0.029, 9.8}},
	}
	for _, c := range cases {
		if got := give(c.law, c.arguments...); got == got {
			t.Errorf("%s%v = %v, want no number", c.law.Name, c.arguments, got)
		}
	}
	for _, z := range []float64{-5000, 86000} {
		h := give(geopotentialHeightLaw, z)
		for _, l := range []*law.Law{standardTemperatureLaw, standardPressureLaw, standardDensityLaw, standardSoundSpeedLaw, standardViscosityLaw} {
			if p := l.Parameters[0]; give(l, h) != give(l, h) || p.Finite.TooLow(h) || p.Finite.TooHigh(h) {
				t.Errorf("%s refuses %v m", l.Name, z)
			}
		}
		if p := standardPressure(h); pressureAltitudeLaw.Parameters[0].Finite.TooLow(p) || pressureAltitudeLaw.Parameters[0].Finite.TooHigh(p) {
			t.Errorf("pressure_altitude refuses %v Pa", p)
		}
		if d := standardDensity(h); densityAltitudeLaw.Parameters[0].Finite.TooLow(d) || densityAltitudeLaw.Parameters[0].Finite.TooHigh(d) {
			t.Errorf("density_altitude refuses %v kg/m^3", d)
		}
	}
}

func TestInversePairs(t *testing.T) {
	for i := 0; i <= 9000; i++ {
		h := lowestGeopotential + float64(i)*(84852-lowestGeopotential)/9000
		if back := give(pressureAltitudeLaw, give(standardPressureLaw, h)); !(math.Abs(back-h) <= 1e-12*math.Max(math.Abs(h), 10000)) {
			t.Fatalf("pressure_altitude(standard_pressure(%v)) = %v", h, back)
		}
		if back := give(densityAltitudeLaw, give(standardDensityLaw, h)); !(math.Abs(back-h) <= 1e-12*math.Max(math.Abs(h), 10000)) {
			t.Fatalf("density_altitude(standard_density(%v)) = %v", h, back)
		}
	}
	for i := -1000; i <= 1000; i++ {
		z := math.Copysign(math.Pow(10, math.Abs(float64(i))/1000*8-2), float64(i))
		if z <= -effectiveRadius {
			continue
		}
		closeTo(t, "geometric_height(geopotential_height)", give(geometricHeightLaw, give(geopotentialHeightLaw, z)), z, 1e-12)
	}
}

// Pressure and density fall without a step where layers meet, but for the
// rounding of the powers.
func TestLayersMeet(t *testing.T) {
	for _, l := range ussa.layers[1:] {
		below, above := math.Nextafter(l.base, 0), l.base
		closeTo(t, "pressure", standardPressure(below), standardPressure(above), 4e-15)
		closeTo(t, "density", standardDensity(below), standardDensity(above), 4e-15)
		closeTo(t, "temperature", standardTemperature(below), standardTemperature(above), 4e-15)
	}
	for i := 1; i <= 100000; i++ {
		h := lowestGeopotential + float64(i)*(84852-lowestGeopotential)/100000
		before := lowestGeopotential + float64(i-1)*(84852-lowestGeopotential)/100000
		if standardPressure(h) >= standardPressure(before) || standardDensity(h) >= standardDensity(before) {
			t.Fatalf("pressure or density does not fall at %v gpm", h)
		}
	}
}

func closeTo(t *testing.T, what string, got, want, relative float64) {
	t.Helper()
	if !(math.Abs(got-want) <= relative*math.Abs(want)) {
		t.Errorf("%s: %v, want %v to %g", what, got, want, relative)
	}
}

func BenchmarkStandardPressure(b *testing.B) {
	h := make([]float64, 1024)
	for i := range h {
		h[i] = float64(i) * 80
	}
	dst := make([]float64, len(h))
	arguments := []law.Argument{{Values: h}}
	var work law.Work
	for b.Loop() {
		standardPressureLaw.Body(dst, arguments, &work)
	}
}
