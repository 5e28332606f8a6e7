package unit

import (
	"strings"
	"testing"
)

// Texts, what they are written back as, and their coherent unit and kind.
func TestParse(t *testing.T) {
	for _, row := range []struct {
		text, canonical, coherent string
		kind                      Kind
		before, multiply, divide  float64
	}{
		// products, quotients, powers
		{"m", "m", "m", Plain, 0, 1, 1},
		{"1", "1", "1", Plain, 0, 1, 1},
		{"1/s", "1/s", "1/s", Plain, 0, 1, 1},
		{"s^-1", "1/s", "1/s", Plain, 0, 1, 1},
		{"cm^-1", "cm^-1", "1/m", Plain, 0, 100, 1},
		{"1/cm", "cm^-1", "1/m", Plain, 0, 100, 1},
		{"N m", "N m", "J", Plain, 0, 1, 1},
		{"N·m", "N m", "J", Plain, 0, 1, 1},
		{"N⋅m", "N m", "J", Plain, 0, 1, 1},
		{"N × m", "N m", "J", Plain, 0, 1, 1},
		{"N*m", "N m", "J", Plain, 0, 1, 1},
		{"N.m", "N m", "J", Plain, 0, 1, 1},
		{"  N\u00a0m  ", "N m", "J", Plain, 0, 1, 1},
		{"J/kg K", "J/(kg K)", "J/(kg K)", Plain, 0, 1, 1},
		{"J/(kg K)", "J/(kg K)", "J/(kg K)", Plain, 0, 1, 1},
		{"J kg^-1 K^-1", "J/(kg K)", "J/(kg K)", Plain, 0, 1, 1},
		{"J·kg⁻¹·K⁻¹", "J/(kg K)", "J/(kg K)", Plain, 0, 1, 1},
		{"kg.m^-3", "kg/m^3", "kg/m^3", Plain, 0, 1, 1},
		{"kg m−3", "", "", Plain, 0, 0, 0},
		{"m^−2", "1/m^2", "1/m^2", Plain, 0, 1, 1},
		{"m²", "m^2", "m^2", Plain, 0, 1, 1},
		{"m⁺²", "m^2", "m^2", Plain, 0, 1, 1},
		{"m¹²", "m^12", "m^12", Plain, 0, 1, 1},
		{"(m/s)^2", "m^2/s^2", "J/kg", Plain, 0, 1, 1},
		{"(kg m)/(s (m s))", "kg/s^2", "N/m", Plain, 0, 1, 1},
		{"m^(1/2)", "m^(1/2)", "m^(1/2)", Plain, 0, 1, 1},
		{"m^0.5", "m^(1/2)", "m^(1/2)", Plain, 0, 1, 1},
		{"m^(-3/2)", "1/m^(3/2)", "1/m^(3/2)", Plain, 0, 1, 1},
		{"m^( 3 / 12 )", "m^(1/4)", "m^(1/4)", Plain, 0, 1, 1},
		{"m^1.25", "m^(5/4)", "m^(5/4)", Plain, 0, 1, 1},
		{"V/Hz^0.5", "V/Hz^(1/2)", "", Plain, 0, 1, 1},
		{"ha^(1/2)", "ha^(1/2)", "m", Plain, 0, 100, 1},
		{"(mm^2)^(1/2)", "mm", "m", Plain, 0, 1, 1000},
		{"m m", "m^2", "m^2", Plain, 0, 1, 1},
		{"m/m", "1", "1", Plain, 0, 1, 1},
		{"m^0", "1", "1", Plain, 0, 1, 1},
		{"1 m/1", "m", "m", Plain, 0, 1, 1},
		{"g/kg", "g/kg", "1", Plain, 0, 1, 1000},
		{"m3/m^3", "", "", Plain, 0, 0, 0},
		// prefixes, spellings
		{"kg", "kg", "kg", Plain, 0, 1, 1},
		{"mg", "mg", "kg", Plain, 0, 1, 1e6},
		{"Mg", "Mg", "kg", Plain, 0, 1000, 1},
		{"kohm", "kΩ", "Ω", Plain, 0, 1000, 1},
		{"\u2126", "Ω", "Ω", Plain, 0, 1, 1},
		{"ul", "µL", "m^3", Plain, 0, 1, 1e9},
		{"dam", "dam", "m", Plain, 0, 10, 1},
		{"min", "min", "s", Plain, 0, 60, 1},
		{"mmin", "", "", Plain, 0, 0, 0},
		{"angstrom", "Å", "m", Plain, 0, 1, 1e10},
		{"Torr", "torr", "Pa", Plain, 0, 133.32236842105263, 1},
		{"kWh", "kWh", "J", Plain, 0, 3.6e6, 1},
		{"l.y.", "lightyear", "m", Plain, 0, 9460730472580800, 1},
		{"l.y./yr", "lightyear/yr", "m/s", Plain, 0, 299792458, 1},
		{"u", "u", "kg", Plain, 0, 1.66053906892e-27, 1},
		{"kDa", "kDa", "kg", Plain, 0, 1.66053906892e-24, 1},
		{"mD", "mD", "C m", Plain, 0, 1, 2.99792458e32},
		{"kG", "kG", "T", Plain, 0, 1, 10},
		{"%", "%", "1", Plain, 0, 1, 100},
		{"‰", "‰", "1", Plain, 0, 1, 1000},
		{"%/K", "%/K", "1/K", Plain, 0, 1, 100},
		{"ppm", "ppm", "1", Plain, 0, 1, 1e6},
		// a finite decimal is preferred where neither way is exact
		{"km/h", "km/h", "m/s", Plain, 0, 1, 3.6},
		{"kn", "kn", "m/s", Plain, 0, 1852.0 / 3600, 1},
		// temperatures
		{"degC", "degC", "K", TemperaturePoint, 273.15, 1, 1},
		{"°C", "degC", "K", TemperaturePoint, 273.15, 1, 1},
		{"degF", "degF", "K", TemperaturePoint, 459.67, 1, 1.8},
		{"degR", "degR", "K", Plain, 0, 1, 1.8},
		{"K", "K", "K", Plain, 0, 1, 1},
		{"mK", "mK", "K", Plain, 0, 1, 1000},
		{"degC^2", "degC^2", "K^2", Plain, 0, 1, 1},
		{"1/degC", "1/degC", "1/K", Plain, 0, 1, 1},
		{"J/(kg degC)", "J/(kg degC)", "J/(kg K)", Plain, 0, 1, 1},
		{"degF/ft", "degF/ft", "K/m", Plain, 0, 1, 0.54864},
		// pressures
		{"bar", "bar", "Pa", Plain, 0, 1e5, 1},
		{"bara", "bara", "Pa", AbsolutePressure, 0, 1e5, 1},
		{"bar(a)", "bara", "Pa", AbsolutePressure, 0, 1e5, 1},
		{"barg", "barg", "Pa", GaugePressure, 0, 1e5, 1},
		{"mbar(g)", "mbarg", "Pa", GaugePressure, 0, 100, 1},
		{"psia", "psia", "Pa", AbsolutePressure, 0, 6894.757293168362, 1},
		{"psi(g)", "psig", "Pa", GaugePressure, 0, 6894.757293168362, 1},
		{"Pa(a)", "Pa(a)", "Pa", AbsolutePressure, 0, 1, 1},
		{"kPa(g)", "kPa(g)", "Pa", GaugePressure, 0, 1000, 1},
		{"MPa(a)", "MPa(a)", "Pa", AbsolutePressure, 0, 1e6, 1},
		{"atm(a)", "atm(a)", "Pa", AbsolutePressure, 0, 101325, 1},
		{"(barg)", "barg", "Pa", GaugePressure, 0, 1e5, 1},
		{"barg/m", "bar/m", "Pa/m", Plain, 0, 1e5, 1},
		{"barg/bara", "1", "1", Plain, 0, 1, 1},
		{"bara^2/bar", "bar", "Pa", Plain, 0, 1e5, 1},
		{"msw", "msw", "Pa", Plain, 0, 10000, 1},
		// heights and angles
		{"gpm", "gpm", "m", Geopotential, 0, 1, 1},
		{"kgpm", "kgpm", "m", Geopotential, 0, 1000, 1},
		{"gpft", "gpft", "m", Geopotential, 0, 0.3048, 1},
		{"gpm/s", "gpm/s", "m/s", Plain, 0, 1, 1},
		{"rad", "rad", "1", Angle, 0, 1, 1},
		{"mrad", "mrad", "1", Angle, 0, 1, 1000},
		{"deg", "deg", "1", Angle, 0, 0.017453292519943295, 1},
		{"°", "deg", "1", Angle, 0, 0.017453292519943295, 1},
		{"arcmin", "arcmin", "1", Angle, 0, 0.0002908882086657216, 1},
		{"deg/s", "deg/s", "1/s", Plain, 0, 0.017453292519943295, 1},
		{"rpm", "rpm", "1/s", Plain, 0, 0.10471975511965978, 1},
	} {
		u, err := Parse(row.text)
		if row.canonical == "" { // no unit after all
			if err == nil {
				t.Errorf("%q is read as %s", row.text, u.Text())
			}
			continue
		}
		if err != nil {
			t.Errorf("%q: %v", row.text, err)
			continue
		}
		if u.Text() != row.canonical {
			t.Errorf("%q is written back as %q, want %q", row.text, u.Text(), row.canonical)
		}
		if row.coherent != "" && CoherentText(u.Dimension()) != row.coherent {
			t.Errorf("%q has the coherent unit %q, want %q", row.text, CoherentText(u.Dimension()), row.coherent)
		}
		if u.Kind() != row.kind {
			t.Errorf("%q is %v, want %v", row.text, u.Kind(), row.kind)
		}
		if before, multiply, divide := u.Affine(); before != row.before || multiply != row.multiply || divide != row.divide {
			t.Errorf("%q: (x + %v) * %v / %v, want (x + %v) * %v / %v", row.text, before, multiply, divide, row.before, row.multiply, row.divide)
		}
	}
}

// Errors with their place and what to write instead.
func TestErrors(t *testing.T) {
	for _, row := range []struct {
		text           string
		offset, length int
		message        string // a part of it
		suggestion     string
		corrected      string
	}{
		{"", 0, 0, "empty", "1", "1"},
		{"  ", 0, 2, "empty", "1", "1"},
		{"m3", 0, 2, "m3", "m^3", "m^3"},
		{"kg/m3", 3, 2, "m3", "m^3", "kg/m^3"},
		{"kg m-3", 4, 2, "^", "^-3", "kg m^-3"},
		{"kg m−3", 4, 4, "^", "^-3", "kg m^-3"},
		{"m**2", 1, 2, "^", "^", "m^2"},
		{"J/kg/K", 2, 4, "bracket", "(kg K)", "J/(kg K)"},
		{"W/(m/s/K)", 5, 3, "bracket", "(s K)", "W/(m/(s K))"},
		{"(J/kg)/K", 0, 0, "", "", ""},
		{"m^1/2", 1, 4, "bracket", "^(1/2)", "m^(1/2)"},
		{"m^0.333", 1, 6, "twelfth", "^(1/3)", "m^(1/3)"},
		{"m^0.67", 1, 5, "twelfth", "^(2/3)", "m^(2/3)"},
		{"m^0.37", 1, 5, "twelfth", "", ""},
		{"m^(1/5)", 1, 6, "twelfth", "", ""},
		{"m^", 1, 1, "no power", "", ""},
		{"m^x", 1, 1, "no power", "", ""},
		{"m^(1/0)", 1, 5, "no power", "", ""},
		{"m^(1", 1, 3, "no power", "", ""},
		{"m^1234567", 1, 8, "no power", "", ""},
		{"m^100", 1, 4, "too large", "", ""},
		{"m⁻", 1, 3, "no power", "", ""},
		{"m^60 s^60", 0, 9, "limited", "", ""},
		{"Qm^40", 0, 5, "range", "", ""},
		{"(m/s", 0, 1, "not closed", "", ""},
		{"m (s", 2, 1, "not closed", "", ""},
		{"m)", 1, 1, "no open bracket", "", ""},
		{"()", 0, 2, "missing", "", ""},
		{"(m/)", 2, 2, "missing", "", ""},
		{"m/", 1, 1, "missing behind /", "", ""},
		{"m ·", 2, 2, "missing behind ·", "", ""},
		{"/s", 0, 1, "1/", "", ""},
		{"m*/s", 2, 1, "missing before /", "", ""},
		{"m·*s", 3, 1, "missing before *", "", ""},
		{"m(s)", 1, 1, "blank", " (", "m (s)"},
		{"m²s", 3, 1, "blank", " s", "m² s"},
		{"10 m", 0, 2, "no number but 1", "", ""},
		{"1.5 m", 0, 3, "no number but 1", "", ""},
		{"m 2", 2, 1, "no number but 1", "", ""},
		{"1^2", 1, 1, "needs a unit", "", ""},
		{"kg,m", 2, 1, ",", " ,", ""},
		{"m ?", 2, 1, "no ?", "", ""},
		{"m \xff", 2, 1, "UTF-8", "", ""},
		{"'", 0, 1, "foot", "arcmin", "arcmin"},
		{"5\"", 0, 1, "no number", "", ""},
		{"dB", 0, 2, "level", "", ""},
		{"V/Np", 2, 2, "level", "", ""},
		{"m(g)", 0, 4, "pressure", "m", "m"},
		{"bara(a)", 0, 7, "once", "bara", "bara"},
		{"kPag", 0, 4, "kPag", "kPa(g)", "kPa(g)"},
		{"foo(a)", 0, 3, "foo", "", ""},
		{"kg/celsius", 3, 7, "celsius", "degC", "kg/degC"},
		{"Kelvin", 0, 6, "Kelvin", "K", "K"},
		{strings.Repeat("m ", 101), 0, 202, "200 bytes", "", ""},
		{strings.Repeat("(", 17) + "m" + strings.Repeat(")", 17), 16, 1, "depth", "", ""},
	} {
		_, err := Parse(row.text)
		if row.message == "" && row.length == 0 {
			if err != nil {
				t.Errorf("%q: %v", row.text, err)
			}
			continue
		}
		e, ok := err.(*Error)
		if !ok {
			t.Errorf("%q: no error of ours: %v", row.text, err)
			continue
		}
		if e.Offset != row.offset || e.Length != row.length {
			t.Errorf("%q: %q at %d+%d, want %d+%d", row.text, e.Message, e.Offset, e.Length, row.offset, row.length)
		}
		if !strings.Contains(e.Message, row.message) {
			t.Errorf("%q: message %q lacks %q", row.text, e.Message, row.message)
		}
		if e.Suggestion != row.suggestion {
			t.Errorf("%q: suggestion %q, want %q", row.text, e.Suggestion, row.suggestion)
		}
		if row.suggestion != "" && !strings.Contains(e.Error(), row.suggestion) {
			t.Errorf("%q: %q lacks the suggestion", row.text, e.Error())
		}
		if row.corrected != "" {
			if got := e.Corrected(row.text); got != row.corrected {
				t.Errorf("%q is corrected to %q, want %q", row.text, got, row.corrected)
			}
			if _, err := Parse(row.corrected); err != nil {
				t.Errorf("%q: the corrected text is wrong too: %v", row.text, err)
			}
		}
	}
}

func TestNearest(t *testing.T) {
	for _, row := range [][2]string{
		{"celsius", "degC"}, {"Celsius", "degC"}, {"celcius", "degC"}, {"degreeC", ""},
		{"Kelvin", "K"}, {"kelvins", "K"}, {"sec", "s"}, {"hr", "h"}, {"kph", "km/h"}, {"mph", "mi/h"},
		{"lbs", "lb"}, {"cc", "cm^3"}, {"meters", "m"}, {"kilometers", "km"}, {"Kilometre", "km"},
		{"millilitres", "mL"}, {"pascal", "Pa"}, {"Megapascals", "MPa"}, {"electronvolts", "eV"},
		{"psai", "psia"}, {"Mpa", "MPa"}, {"mpA", "mPa"}, {"HPA", "hPa"}, {"kpa", "kPa"}, {"mmhg", "mmHg"}, {"inhg", "inHg"},
		{"bra", "bar"}, {"milimetre", "mm"}, {"milimeters", "mm"}, {"kilopascel", "kPa"}, {"kilogramm", "kg"}, {"m2", "m^2"}, {"sec2", "s^2"}, {"ft3", "ft^3"}, {"s12", "s^12"},
		{"kcl", ""}, {"fathm", "fathom"}, {"faraday", "Fd"}, {"hartre", "hartree"}, {"gaus", "gauss"}, {"kwh", "kWh"},
		{"micrometer", "µm"}, {"atmosphere", "atm"}, {"nautical mile", "nmi"}, {"ev", "eV"}, {"hz", "Hz"}, {"khz", "kHz"},
		{"xyzzy", ""}, {"q", ""}, {"", ""}, {"\xff", ""}, {strings.Repeat("x", 300), ""},
	} {
		got := Nearest(row[0])
		if row[1] != "" && got != row[1] {
			t.Errorf("nearest to %q is %q, want %q", row[0], got, row[1])
		}
		if row[1] == "" && got != "" {
			if _, err := Parse(got); err != nil {
				t.Errorf("nearest to %q is %q: %v", row[0], got, err)
			}
		}
	}
	for _, text := range []string{"xyzzy", "q", "", "\xff"} {
		if got := Nearest(text); got != "" {
			t.Errorf("nearest to %q is %q, want nothing", text, got)
		}
	}
}
