package air

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// named finds a law of the room.
func named(t *testing.T, name string) *law.Law {
	t.Helper()
	for _, l := range Laws() {
		if l.Name == name {
			return l
		}
	}
	t.Fatalf("no law %s", name)
	return nil
}

// call runs a law's body for one row; a text is a text argument, a slice a
// list.
func call(t *testing.T, name string, arguments ...any) float64 {
	t.Helper()
	row := make([]law.Argument, len(arguments))
	for i, a := range arguments {
		switch a := a.(type) {
		case string:
			row[i].Text = a
		case float64:
			row[i].Values = []float64{a}
		case []float64:
			for _, x := range a {
				row[i].Items = append(row[i].Items, law.Argument{Values: []float64{x}})
			}
		}
	}
	var dst [1]float64
	named(t, name).Body(dst[:], row, &law.Work{})
	return dst[0]
}

func TestSaturationInverts(t *testing.T) {
	for _, side := range []struct {
		formulas       []saturation
		law, inversion string
	}{
		{overWater, "saturation_pressure_over_water", "dew_point"},
		{overIce, "saturation_pressure_over_ice", "frost_point"},
	} {
		for _, formula := range side.formulas {
			for _, scale := range []string{scaleITS90, scaleIPTS68} {
				low, high := formula.offScale(formula.low, scale), formula.offScale(formula.high, scale)
				before := 0.0
				for i := range 401 {
					temperature := low + 1e-7 + (high-low-2e-7)*float64(i)/400
					e := call(t, side.law, temperature, formula.name, scale)
					if !(e > before) {
						t.Fatalf("%s %s: %v Pa at %v K does not rise", side.law, formula.name, e, temperature)
					}
					before = e
					back := call(t, side.inversion, e, formula.name, scale)
					if !(math.Abs(back-temperature) <= 1e-12*temperature) {
						t.Fatalf("%s %s: %v K comes back as %v", side.inversion, formula.name, temperature, back)
					}
				}
			}
			for _, outside := range []float64{formula.low - 0.1, formula.high + 0.1} {
				if e := call(t, side.law, outside, formula.name, scaleITS90); formula.scale != onIPTS68 && e == e {
					t.Errorf("%s %s answers %v at %v K", side.law, formula.name, e, outside)
				}
			}
		}
	}
}

// At 0.01 degC water and ice have one vapour pressure; elsewhere ice the
// smaller one.
func TestTriplePoint(t *testing.T) {
	for _, pair := range [][2]string{
		{"Sonntag 1990", "Sonntag 1990"}, {"Goff 1957", "Goff 1957"}, {"Hardy 1998", "Hardy 1998"},
		{"Murphy-Koop 2005", "Murphy-Koop 2005"}, {"IAPWS 1992", "IAPWS 2011"},
	} {
		water := call(t, "saturation_pressure_over_water", triplePoint, pair[0], scaleITS90)
		ice := call(t, "saturation_pressure_over_ice", triplePoint, pair[1], scaleITS90)
		closeTo(t, pair[0], water, ice, 2e-5)
	}
}

func TestHumidityInverts(t *testing.T) {
	for i := range 41 {
		temperature := 233.15 + 2*float64(i)
		for _, humidity := range []float64{0.01, 0.2, 0.5, 0.9, 1} {
			for _, pressure := range []float64{50000, 101325} {
				wet := call(t, "wet_bulb_temperature", temperature, humidity, pressure, "water")
				if wet != wet {
					if temperature > 240 {
						t.Errorf("no wet bulb at %v K, %v", temperature, humidity)
					}
					continue
				}
				e := call(t, "vapour_pressure_from_wet_bulb", temperature, wet, pressure, "water")
				want := call(t, "vapour_pressure", humidity, temperature, "WMO-No. 8", enhancementOfWMO(pressure))
				// The difference of two terms that are each larger than it.
				if !(math.Abs(e-want) <= 1e-12*call(t, "vapour_pressure", 1.0, temperature, "WMO-No. 8", 1.0)+1e-10) {
					t.Errorf("wet bulb %v K at %v K, %v: %v Pa, want %v", wet, temperature, humidity, e, want)
				}
			}
			e := call(t, "vapour_pressure", humidity, temperature, "Sonntag 1990", 1.0)
			if dew := call(t, "dew_point", e, "Sonntag 1990", scaleITS90); dew == dew {
				closeTo(t, "relative_humidity_from_dew_point", call(t, "relative_humidity_from_dew_point", dew, temperature, "Sonntag 1990"), humidity, 2e-12)
			}
			r := call(t, "mixing_ratio", e, 1e5, waterToAir)
			closeTo(t, "specific humidity", call(t, "specific_humidity", e, 1e5, waterToAir), r/(1+r), 1e-14)
		}
	}
}

func TestColumnHeightsInvert(t *testing.T) {
	const m, g = 0.0289644, 9.80665
	for _, temperature := range []float64{150, 250, 330} {
		for i := -40; i <= 40; i++ {
			h := math.Copysign(math.Pow(10, math.Abs(float64(i))/10)-0.9, float64(i))
			p := give(barometricPressureLaw, 1e5, h, temperature, m, g)
			closeAbsolute(t, "barometric_height", call(t, "barometric_height", 1e5, p, temperature, m, g), h, 1e-12*math.Max(math.Abs(h), 10000))
			for _, lapse := range []float64{-0.01, -1e-9, 0, 1e-12, 0.0065} {
				if p := give(lapsedPressureLaw, 1e5, h, temperature, lapse, m, g); p == p {
					closeAbsolute(t, "lapsed_height", call(t, "lapsed_height", 1e5, p, temperature, lapse, m, g), h, 1e-12*math.Max(math.Abs(h), 10000))
				}
			}
			for _, latitude := range []float64{-1.5, 0, 0.7} {
				gp := call(t, "local_geopotential_height", h, latitude)
				closeTo(t, "local_geometric_height", call(t, "local_geometric_height", gp, latitude), h, 1e-12)
			}
		}
	}
	for _, method := range []string{"ICAO", "NWS"} {
		for elevation := -400.0; elevation < 8000; elevation += 100 {
			field := call(t, "field_pressure", 101900.0, elevation, method)
			closeTo(t, "altimeter_setting", call(t, "altimeter_setting", field, elevation, method), 101900, 1e-12)
		}
	}
	// On a standard day the field's pressure is the standard's.
	closeTo(t, "field_pressure", call(t, "field_pressure", 101325.0, 3000.0, "ICAO"), icao.layers[0].pressureAt(3000), 1e-13)
}

// A profile of two levels is a lapsed column; cutting it into more levels
// changes nothing; the standard's levels give the standard.
func TestProfileIsHydrostatic(t *testing.T) {
	const m, g = 0.0289644, 9.80665
	two := call(t, "profile_pressure", []float64{0, 9000}, []float64{290, 240}, 1e5, 7000.0, m, "constant", g, 6356766.0)
	closeTo(t, "two levels", two, give(lapsedPressureLaw, 1e5, 7000, 290, 50.0/9000, m, g), 1e-14)
	four := call(t, "profile_pressure", []float64{0, 1000, 6300, 9000}, []float64{290, 290 - 50.0/9, 290 - 35, 240}, 1e5, 7000.0, m, "constant", g, 6356766.0)
	closeTo(t, "four levels", four, two, 1e-13)
	standard := m * 8.31446261815324 / standardGasConstant
	heights := []float64{0, 11000, 20000, 32000, 47000, 51000, 71000, 84000}
	temperatures := []float64{288.15, 216.65, 216.65, 228.65, 270.65, 270.65, 214.65, 188.65}
	for h := 0.0; h <= 84000; h += 700 {
		p := call(t, "profile_pressure", heights, temperatures, 101325.0, h, standard, "constant", standardGravity, effectiveRadius)
		closeTo(t, "standard levels", p, ussa.layerAt(h).pressureAt(h), 1e-13)
	}
	// With the inverse square an isothermal column is one over geopotential
	// height.
	p := call(t, "profile_pressure", []float64{0, 50000}, []float64{250, 250}, 1e5, 40000.0, m, inverseSquare, g, effectiveRadius)
	closeTo(t, "inverse square", p, give(barometricPressureLaw, 1e5, geopotentialHeight(40000), 250, m, g), 1e-13)
	for _, outside := range []float64{-1, 9001} {
		if p := call(t, "profile_density", []float64{0, 9000}, []float64{290, 240}, 1e5, outside, m, "constant", g, 6356766.0); p == p {
			t.Errorf("profile answers %v at %v m", p, outside)
		}
	}
	if p := call(t, "profile_pressure", []float64{0, 9000, 8000}, []float64{290, 240, 230}, 1e5, 10.0, m, "constant", g, 6356766.0); p == p {
		t.Errorf("a falling level is answered with %v", p)
	}
}

// A profile gives the same bits whether its levels are one for all rows or a
// column each.
func TestProfileOfColumns(t *testing.T) {
	single := []law.Argument{
		{Items: []law.Argument{{Values: []float64{0}}, {Values: []float64{9000}}}},
		{Items: []law.Argument{{Values: []float64{290}}, {Values: []float64{240}}}},
		{Values: []float64{1e5}}, {Values: []float64{100, 4000, 8999}}, {Values: []float64{0.029}}, {Text: "constant"}, {Values: []float64{9.8}}, {Values: []float64{6.4e6}},
	}
	each := append([]law.Argument(nil), single...)
	each[1] = law.Argument{Items: []law.Argument{{Values: []float64{290, 290, 290}}, {Values: []float64{240, 240, 240}}}}
	var a, b [3]float64
	l := named(t, "profile_pressure")
	l.Body(a[:], single, &law.Work{})
	l.Body(b[:], each, &law.Work{})
	if a != b || a[0] != a[0] {
		t.Errorf("%v and %v", a, b)
	}
}

func TestSpeedsAddUp(t *testing.T) {
	for i := range 300 {
		s := math.Pow(10, float64(i)/100-2)
		closeTo(t, "slower and faster", slowerThan(s)+fasterThan(s), 1, 4e-16)
		if s < 3 {
			// Simpson's rule over the density of speeds.
			sum, n := 0.0, 2000
			for k := 0; k <= n; k++ {
				x := s * float64(k) / float64(n)
				w := 2.0 + 2*float64(k%2)
				if k == 0 || k == n {
					w = 1
				}
				sum += w * x * x * math.Exp(-x*x)
			}
			closeTo(t, "slowerThan", slowerThan(s), 4/math.Sqrt(math.Pi)*sum*s/float64(n)/3, 1e-11)
		}
	}
	closeTo(t, "fraction_between", call(t, "fraction_between", 300.0, 500.0, 300.0, 0.028),
		call(t, "fraction_faster", 300.0, 300.0, 0.028)-call(t, "fraction_faster", 500.0, 300.0, 0.028), 1e-12)
}

func TestRotorInverts(t *testing.T) {
	rotor := []any{7.49e-4, 998.8, 293.3, 911.9, 0.0451, 0.0456}
	for _, m := range []float64{0.1, 5, 67.67, 900} {
		ratio := call(t, "centrifuge_ratio", append([]any{m}, rotor...)...)
		closeTo(t, "centrifuge_molar_mass", call(t, "centrifuge_molar_mass", append([]any{ratio}, rotor...)...), m, 1e-12)
	}
}

// A world's profile meets its levels as printed and falls between them.
func TestWorldsMeetTheirLevels(t *testing.T) {
	for i := range worlds {
		w := &worlds[i]
		for j, l := range w.levels {
			s := w.at(l.height * 1000)
			closeTo(t, w.name+" temperature", s.temperature, l.temperature, 1e-12)
			closeTo(t, w.name+" pressure", s.pressure, 1e5*l.pressure, 1e-10)
			closeTo(t, w.name+" density", s.density, l.density, 1e-10)
			if j == 0 {
				continue
			}
			before := w.at(w.levels[j-1].height * 1000)
			for k := 1; k <= 8; k++ {
				z := w.levels[j-1].height + (l.height-w.levels[j-1].height)*float64(k)/8
				now := w.at(1000 * z)
				if !(now.pressure < before.pressure && now.density < before.density) {
					t.Errorf("%s: pressure or density does not fall at %v km", w.name, z)
				}
				before = now
			}
		}
	}
}

// Each gas alone keeps its share; heavy gases stay below; one gas is a
// barometric column.
func TestSeparation(t *testing.T) {
	densities, masses := []float64{3e18, 1e18, 2e16}, []float64{0.028, 0.016, 0.004}
	sum, mean := 0.0, 0.0
	for gas := 1.0; gas <= 3; gas++ {
		x := call(t, "diffusive_separation", densities, masses, 2e5, 900.0, 9.2, gas)
		sum += x
		mean += x * masses[int(gas)-1]
	}
	closeTo(t, "sum of shares", sum, 1, 1e-15)
	closeTo(t, "separated_molar_mass", call(t, "separated_molar_mass", densities, masses, 2e5, 900.0, 9.2), mean, 1e-14)
	if far := call(t, "separated_molar_mass", densities, masses, 1e8, 900.0, 9.2); !(math.Abs(far-0.004) < 1e-12) {
		t.Errorf("far up the molar mass is %v kg/mol", far)
	}
}

func closeAbsolute(t *testing.T, what string, got, want, absolute float64) {
	t.Helper()
	if !(math.Abs(got-want) <= absolute) {
		t.Errorf("%s: %v, want %v to %g", what, got, want, absolute)
	}
}
