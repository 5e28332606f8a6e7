package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

const degree = math.Pi / 180

// lawNamed finds a law of this room.
func lawNamed(t testing.TB, name string) *law.Law {
	t.Helper()
	for _, l := range Laws() {
		if l.Name == name {
			return l
		}
	}
	t.Fatalf("no law %s", name)
	return nil
}

// numbers makes arguments of single numbers in coherent SI units.
func numbers(values ...float64) []law.Argument {
	arguments := make([]law.Argument, len(values))
	for i, value := range values {
		arguments[i].Values = []float64{value}
	}
	return arguments
}

// one runs a law's body for a single row.
func one(t testing.TB, name string, arguments ...law.Argument) float64 {
	t.Helper()
	dst := []float64{math.NaN()}
	lawNamed(t, name).Body(dst, arguments, &law.Work{})
	return dst[0]
}

// near compares with a printed value: half a unit of its last digit.
func near(t *testing.T, what string, got, want, half float64, source string) {
	t.Helper()
	if !(math.Abs(got-want) <= half) {
		t.Errorf("%s = %.12g, want %.12g ± %g (%s)", what, got, want, half, source)
	}
}

// TestColumns holds the linear laws against worked examples, g = 9.81 or
// 9.80 m/s^2 as in the books.
func TestColumns(t *testing.T) {
	const (
		cengel   = "Cengel & Cimbala (2006) Fluid Mechanics, chapter 3"
		white    = "White (2003) Fluid Mechanics, 5th ed., chapter 2"
		openStax = "OpenStax College Physics, chapter 11"
		navy     = "U.S. Navy Diving Manual, SS521-AG-PRO-010"
	)
	cases := []struct {
		name       string
		arguments  []float64
		want, half float64
		source     string
	}{
		{"head_pressure", []float64{10, 1000, nature.StandardGravity}, 98066.5, 1e-9, "definition of the metre of water"},
		{"head_pressure", []float64{0.76, 13595.1, nature.StandardGravity}, 101325, 0.5, "definition of the millimetre of mercury"},
		{"head_pressure", []float64{0.740, 13570, 9.81}, 98.5e3, 50, cengel},
		{"head_pressure", []float64{0.8, 1040, 9.81}, 8.16e3, 5, cengel},
		{"head_pressure", []float64{40, 1000, 9.80}, 3.92e5, 500, openStax},
		{"head_pressure", []float64{0.3048, 64 * 0.45359237 / 0.028316846592, nature.StandardGravity}, 3064.3, 0.05, navy},
		{"pressure_at_depth", []float64{96e3, 0.55, 850, 9.81}, 100.6e3, 50, cengel},
		{"pressure_at_depth", []float64{91e3, 60, 9790 / 9.81, 9.81}, 678e3, 500, white},
		{"depth_at_pressure", []float64{1.01e5, 0, 1000, 9.80}, 10.3, 0.05, openStax},
		{"absolute", []float64{2e5, 1e5}, 3e5, 0, "definition"},
		{"absolute", []float64{-1e5, 1e5}, 0, 0, "definition"},
		{"gauge", []float64{3e5, 1e5}, 2e5, 0, "definition"},
	}
	for _, c := range cases {
		near(t, c.name, one(t, c.name, numbers(c.arguments...)...), c.want, c.half, c.source)
	}
	for what, refused := range map[string]float64{
		"absolute pressure below vacuum":     one(t, "absolute", numbers(-1.1e5, 1e5)...),
		"depth of less than surface's":       one(t, "depth_at_pressure", numbers(9e4, 1e5, 1000, 9.81)...),
		"depth_at_pressure of NaN":           one(t, "depth_at_pressure", numbers(math.NaN(), 1e5, 1000, 9.81)...),
		"normal gravity of no number at all": one(t, "normal_gravity", append(numbers(math.NaN(), 0), law.Argument{Text: "GRS80"})...),
	} {
		if !math.IsNaN(refused) {
			t.Errorf("%s = %v", what, refused)
		}
	}
}

// TestColumnInverses carries depths and pressures there and back.
func TestColumnInverses(t *testing.T) {
	for depth := 1e-3; depth < 2e4; depth *= 1.7 {
		for _, density := range []float64{680, 1000, 13600} {
			pressure := one(t, "pressure_at_depth", numbers(0, depth, density, 9.81)...)
			back := one(t, "depth_at_pressure", numbers(pressure, 0, density, 9.81)...)
			near(t, "depth there and back", back, depth, 1e-12*depth, "inverse")
			gauge := one(t, "gauge", numbers(pressure+101325, 101325)...)
			near(t, "gauge there and back", one(t, "absolute", numbers(gauge, 101325)...), pressure+101325, 1e-12*(pressure+101325), "inverse")
		}
	}
	if zero := one(t, "depth_at_pressure", numbers(101325, 101325, 1000, 9.81)...); zero != 0 {
		t.Errorf("depth of the surface's pressure is %v", zero)
	}
}

// TestNormalGravity holds normal gravity against printed values, and its fall
// with height against the closed form of the potential above the pole.
func TestNormalGravity(t *testing.T) {
	cases := []struct {
		latitude   float64 // deg
		ellipsoid  string
		want, half float64
		source     string
	}{
		{0, "WGS-84", 9.7803253359, 5e-11, "NIMA TR8350.2"},
		// printed one unit of the tenth digit lower than the formula gives
		{90, "WGS-84", 9.8321849378, 2e-10, "NIMA TR8350.2"},
		{-90, "WGS-84", 9.8321849378, 2e-10, "NIMA TR8350.2"},
		{0, "GRS80", 9.7803267715, 5e-11, "Moritz 2000"},
		{45, "GRS80", 9.806199203, 6e-10, "Moritz 2000"},
		{90, "GRS80", 9.8321863685, 5e-11, "Moritz 2000"},
	}
	for _, c := range cases {
		for _, sign := range []float64{1, -1} {
			got := one(t, "normal_gravity", append(numbers(sign*c.latitude*degree, 0), law.Argument{Text: c.ellipsoid})...)
			near(t, c.ellipsoid, got, c.want, c.half, c.source)
		}
	}
	// The free-air gradient is 0.3086 mGal/m on average (textbook; 1 mGal = 1e-5 m/s^2).
	low := one(t, "normal_gravity", append(numbers(45*degree, 0), law.Argument{Text: "WGS-84"})...)
	high := one(t, "normal_gravity", append(numbers(45*degree, 1), law.Argument{Text: "WGS-84"})...)
	near(t, "free-air gradient", (low-high)*1e5, 0.3086, 0.0001, "textbook")
	// Above the pole, where the centrifugal force is zero, gravity follows from
	// the closed potential (Heiskanen & Moritz 1967, Physical Geodesy, eq. 2-62).
	for _, height := range []float64{1000, 5000, 10000} {
		got := one(t, "normal_gravity", append(numbers(90*degree, height), law.Argument{Text: "WGS-84"})...)
		want := gravityAbovePole(height)
		// The third-order term left out is 4 (h/a)^3 gamma.
		left := 4 * math.Pow(height/wgs84.axis, 3) * want
		near(t, "gravity above the pole", got, want, 1.3*left+2e-8, "closed form")
	}
}

// gravityAbovePole differentiates the closed normal potential on the axis.
func gravityAbovePole(height float64) float64 {
	const (
		mass = 3.986004418e14 // GM, m^3/s^2, NIMA TR8350.2
		spin = 7.292115e-5    // omega, rad/s, NIMA TR8350.2
	)
	a, b := wgs84.axis, wgs84.axis*(1-wgs84.flatness)
	focus := math.Sqrt(a*a - b*b)
	heine := func(u float64) float64 { // q(u)
		return 0.5 * ((1+3*u*u/(focus*focus))*math.Atan(focus/u) - 3*u/focus)
	}
	heineSlope := func(u float64) float64 { // dq/du
		return 0.5 * (6*u/(focus*focus)*math.Atan(focus/u) - (1+3*u*u/(focus*focus))*focus/(u*u+focus*focus) - 3/focus)
	}
	u := b + height
	// U = (GM/E) arctan(E/u) + (omega^2 a^2/2)(q/q0)(sin^2 beta - 1/3), beta = 90 deg.
	return mass/(u*u+focus*focus) - spin*spin*a*a/2*heineSlope(u)/heine(b)*(2.0/3)
}
