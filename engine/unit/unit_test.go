package unit

import (
	"math"
	"math/rand"
	"strconv"
	"testing"
)

// Exact conversions there and back, of numbers as people write them.
func TestExactConversions(t *testing.T) {
	for _, row := range []struct {
		x    float64
		unit string
		si   float64
	}{
		{250, "mm", 0.25},
		{0.1, "mm", 0.0001},
		{1.6, "km", 1600},
		{36, "km/h", 10},
		{37, "degC", 310.15},
		{-459.67, "degF", 0},
		{671.67, "degR", 373.15},
		{1, "atm", 101325},
		{760, "torr", 101325},
		{60, "MPa", 6e7},
		{10, "in", 0.254},
		{3, "ppm", 3e-6},
		{227, "cm^-1", 22700},
		{1, "kWh", 3.6e6},
		{34.7, "1", 34.7},
		{5, "g/cm^3", 5000},
	} {
		u, err := Parse(row.unit)
		if err != nil {
			t.Errorf("%s: %v", row.unit, err)
			continue
		}
		if got := u.ToSI(row.x); got != row.si {
			t.Errorf("%v %s = %v, want %v", row.x, row.unit, got, row.si)
		}
		if got := u.FromSI(row.si); got != row.x {
			t.Errorf("%v is %v %s, want %v", row.si, got, row.unit, row.x)
		}
	}
}

// Short decimals in units with a decimal prefix come back to the bit.
func TestDecimalRoundTrip(t *testing.T) {
	random := rand.New(rand.NewSource(5))
	var units []Unit
	for _, p := range prefixes {
		if p.power < -18 || p.power > 18 {
			continue // beyond what a short decimal and a float64 hold exactly
		}
		u, err := Parse(p.symbol + "m")
		if err != nil {
			t.Fatal(err)
		}
		units = append(units, u)
	}
	for range 50000 {
		text := strconv.Itoa(random.Intn(1_000_000)) + "e" + strconv.Itoa(random.Intn(7)-6)
		x, err := strconv.ParseFloat(text, 64)
		if err != nil {
			t.Fatal(err)
		}
		u := units[random.Intn(len(units))]
		if back := u.FromSI(u.ToSI(x)); back != x {
			// x*1000/1000 may be off by one rounding, but no more
			if math.Abs(back-x) > math.Abs(x)*0x1p-52 {
				t.Fatalf("%v %s comes back as %v", x, u.Text(), back)
			}
			if decimal := strconv.FormatFloat(back, 'g', 15, 64); decimal != strconv.FormatFloat(x, 'g', 15, 64) {
				t.Fatalf("%v %s comes back as %v", x, u.Text(), back)
			}
		}
	}
}

// Any number in any unit comes back within the roundings of the conversion: two
// of the number for the factor, and two of the shifted number for a shifted zero.
func TestRoundTrip(t *testing.T) {
	random := rand.New(rand.NewSource(6))
	for _, entry := range All() {
		u, err := Parse(entry.Symbol)
		if err != nil {
			t.Fatal(err)
		}
		before, _, _ := u.Affine()
		for range 200 {
			x := math.Ldexp(random.Float64()-0.5, random.Intn(41)-20)
			back := u.FromSI(u.ToSI(x))
			if bound := math.Abs(x+before)*0x1p-51 + math.Abs(x)*0x1p-53; math.Abs(back-x) > bound {
				t.Errorf("%v %s comes back as %v", x, entry.Symbol, back)
				break
			}
		}
	}
}

// randomUnitText builds unit text from the tables, with prefixes, powers and
// brackets.
func randomUnitText(random *rand.Rand, depth int) string {
	l := shared()
	text := ""
	slash := false
	for i := range 1 + random.Intn(4) {
		if i > 0 {
			if !slash && random.Intn(3) == 0 {
				text += "/"
				slash = true
			} else {
				text += []string{" ", "·", "*", ".", " * "}[random.Intn(5)]
			}
		}
		if depth > 0 && random.Intn(5) == 0 {
			text += "(" + randomUnitText(random, depth-1) + ")"
		} else {
			u := &l.units[random.Intn(len(l.units))]
			for u.symbol == "1" {
				u = &l.units[random.Intn(len(l.units))]
			}
			symbol := u.symbol
			if u.prefixes && random.Intn(2) == 0 {
				if prefixed := prefixes[random.Intn(len(prefixes))].symbol + symbol; prefixed != "mb" {
					symbol = prefixed
				}
			}
			if u.pressure && random.Intn(2) == 0 {
				symbol += []string{absoluteSuffix, gaugeSuffix}[random.Intn(2)]
			}
			text += symbol
		}
		if random.Intn(3) == 0 {
			text += []string{"^2", "^-1", "²", "⁻³", "^(1/2)", "^(-2/3)", "^0.5", "^1", "^0"}[random.Intn(9)]
		}
	}
	return text
}

// What is read is written back so that it reads as the equal unit.
func TestTextIsReadBack(t *testing.T) {
	random := rand.New(rand.NewSource(7))
	accepted := 0
	for range 20000 {
		text := randomUnitText(random, 2)
		u, err := Parse(text)
		if err != nil {
			continue // too fine a power, or out of range
		}
		accepted++
		again, err := Parse(u.Text())
		if err != nil || again != u {
			t.Fatalf("%q is written %q, which reads as %v, %v; want %v", text, u.Text(), again, err, u)
		}
		if before, multiply, divide := u.Affine(); multiply != 1 && divide != 1 || before != 0 && u.Kind() != TemperaturePoint {
			t.Fatalf("%q: before %v, multiply %v, divide %v", text, before, multiply, divide)
		}
	}
	if accepted < 15000 {
		t.Errorf("only %d texts of 20000 were units", accepted)
	}
}

func TestDifference(t *testing.T) {
	for _, row := range [][2]string{
		{"degC", "K"}, {"degF", "degR"}, {"K", "K"}, {"degR", "degR"},
		{"bara", "bar"}, {"barg", "bar"}, {"mbarg", "mbar"}, {"psig", "psi"}, {"psia", "psi"},
		{"kPa(a)", "kPa"}, {"MPa(g)", "MPa"}, {"atm(a)", "atm"}, {"mmHg(g)", "mmHg"},
		{"gpm", "gpm"}, {"deg", "deg"}, {"m/s", "m/s"}, {"1", "1"}, {"J/(kg degC)", "J/(kg degC)"},
	} {
		u, err := Parse(row[0])
		if err != nil {
			t.Fatal(err)
		}
		want, err := Parse(row[1])
		if err != nil {
			t.Fatal(err)
		}
		got := u.Difference()
		if got != want {
			t.Errorf("a difference in %s is in %s, want %s", row[0], got.Text(), row[1])
		}
		if before, _, _ := got.Affine(); before != 0 {
			t.Errorf("a difference in %s has a shifted zero", row[0])
		}
		if got.ToSI(1) != want.ToSI(1) || got.Dimension() != u.Dimension() {
			t.Errorf("a difference of one %s is %v", row[0], got.ToSI(1))
		}
	}
}

func TestEquivalent(t *testing.T) {
	for _, row := range []struct {
		a, b string
		want bool
	}{
		{"J", "N m", true}, {"1/s", "Hz", true}, {"L", "dm^3", true}, {"kn", "nmi/h", true}, {"psi", "lbf/in^2", true},
		{"bar", "bara", false}, {"m", "gpm", false}, {"m", "km", false}, {"m", "s", false}, {"K", "degC", false}, {"rad", "1", false},
	} {
		a, err := Parse(row.a)
		if err != nil {
			t.Fatal(err)
		}
		b, err := Parse(row.b)
		if err != nil {
			t.Fatal(err)
		}
		if a.Equivalent(b) != row.want || b.Equivalent(a) != row.want {
			t.Errorf("%s and %s are equivalent: %v", row.a, row.b, !row.want)
		}
	}
}

func TestZeroUnitIsOne(t *testing.T) {
	var zero Unit
	if zero.Text() != "1" || zero.ToSI(3) != 3 || zero.FromSI(3) != 3 || !zero.Dimension().IsNone() || zero.Kind() != Plain || !zero.Equivalent(One()) {
		t.Errorf("the zero unit is %+v", zero)
	}
	if parsed, err := Parse("1"); err != nil || parsed != One() || parsed != Coherent(None()) {
		t.Errorf("1 is read as %+v, %v", parsed, err)
	}
}

func TestKindsInWords(t *testing.T) {
	for kind, want := range []string{
		"a plain quantity", "a temperature point", "a temperature difference", "an absolute pressure",
		"a gauge pressure", "a geopotential height", "an angle", "an unknown kind",
	} {
		if got := Kind(kind).String(); got != want {
			t.Errorf("kind %d is %q, want %q", kind, got, want)
		}
	}
}

// Not-a-number and infinities pass through as such.
func TestSpecialNumbers(t *testing.T) {
	for _, entry := range All() {
		u, err := Parse(entry.Symbol)
		if err != nil {
			t.Fatal(err)
		}
		if !math.IsNaN(u.ToSI(math.NaN())) || !math.IsNaN(u.FromSI(math.NaN())) ||
			!math.IsInf(u.ToSI(math.Inf(1)), 1) || !math.IsInf(u.FromSI(math.Inf(-1)), -1) {
			t.Errorf("%s changes what is no number", entry.Symbol)
		}
	}
}

func BenchmarkParse(b *testing.B) {
	for _, text := range []string{"m", "W/(m K)", "Btu_IT/(h ft^2 degF)", "deg/h", "V/Hz^(1/2)"} {
		b.Run(text, func(b *testing.B) {
			for b.Loop() {
				if _, err := Parse(text); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkUnknown(b *testing.B) {
	for b.Loop() {
		if Nearest("milimetre") == "" {
			b.Fatal("nothing near")
		}
	}
}

func BenchmarkLibrary(b *testing.B) {
	for b.Loop() {
		buildLibrary()
	}
}
