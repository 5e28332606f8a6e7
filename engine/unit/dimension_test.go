package unit

import (
	"math/rand"
	"reflect"
	"testing"
	"testing/quick"
)

// Generate makes dimensions with exponents up to ten either way, in twelfths.
func (Dimension) Generate(random *rand.Rand, size int) reflect.Value {
	var d Dimension
	for i := range d.twelfths {
		switch random.Intn(3) {
		case 0:
			d.twelfths[i] = int16(random.Intn(21)-10) * wholePower
		case 1:
			d.twelfths[i] = int16(random.Intn(241) - 120)
		}
	}
	return reflect.ValueOf(d)
}

// Dimensions are a commutative group under Times, with Power as its scaling.
func TestDimensionLaws(t *testing.T) {
	for name, law := range map[string]any{
		"Times commutes":      func(a, b Dimension) bool { return a.Times(b) == b.Times(a) },
		"Times associates":    func(a, b, c Dimension) bool { return a.Times(b).Times(c) == a.Times(b.Times(c)) },
		"None is neutral":     func(a Dimension) bool { return a.Times(None()) == a && a.Over(None()) == a },
		"Over undoes Times":   func(a, b Dimension) bool { return a.Times(b).Over(b) == a && a.Over(b).Times(b) == a },
		"a over a is none":    func(a Dimension) bool { return a.Over(a).IsNone() },
		"power of two":        func(a Dimension) bool { p, ok := a.Power(2, 1); return ok && p == a.Times(a) },
		"power of minus one":  func(a Dimension) bool { p, ok := a.Power(-1, 1); return ok && p == None().Over(a) },
		"power of zero":       func(a Dimension) bool { p, ok := a.Power(0, 5); return ok && p.IsNone() },
		"root undoes a power": func(a Dimension) bool { p, _ := a.Power(3, 1); q, ok := p.Power(1, 3); return ok && q == a },
		"power distributes": func(a, b Dimension, n int8) bool {
			k := int(n) % 20
			p, ok := a.Power(k, 1)
			q, fine := b.Power(k, 1)
			r, good := a.Times(b).Power(k, 1)
			return ok && fine && good && p.Times(q) == r
		},
		"text is read back": func(a Dimension) bool {
			u, err := Parse(a.String())
			return err == nil && u.Dimension() == a && u.ToSI(1) == 1
		},
		"coherent text is read back": func(a Dimension) bool {
			u, err := Parse(CoherentText(a))
			return err == nil && u == Coherent(a) && u.Dimension() == a && u.ToSI(1) == 1 && u.FromSI(1) == 1
		},
	} {
		if err := quick.Check(law, &quick.Config{MaxCount: 1000, Rand: rand.New(rand.NewSource(4))}); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func TestPower(t *testing.T) {
	for _, row := range []struct {
		d                      Dimension
		numerator, denominator int
		want                   string
		ok                     bool
	}{
		{Length(), 1, 2, "m^(1/2)", true},
		{Length(), -1, 3, "m^(-1/3)", true},
		{Length(), 1, 5, "", false},
		{Length(), 1, 12, "m^(1/12)", true},
		{Length(), 1, 24, "", false},
		{Area(), 1, 24, "m^(1/12)", true},
		{Area(), 1, 2, "m", true},
		{Area(), 2, -4, "m^-1", true},
		{Area(), 1, 0, "", false},
		{Area(), 100000, 1, "", false},
		{Area(), 1 << 40, 1 << 40, "", false},
		{None(), 7, 11, "1", true},
	} {
		got, ok := row.d.Power(row.numerator, row.denominator)
		if ok != row.ok || ok && got.String() != row.want {
			t.Errorf("%v to the power %d/%d is %v, %v", row.d, row.numerator, row.denominator, got, ok)
		}
	}
}

// The dimensions with names, their base units and their customary units.
func TestNamedDimensions(t *testing.T) {
	for _, row := range []struct {
		d              Dimension
		base, coherent string
	}{
		{None(), "1", "1"},
		{Length(), "m", "m"},
		{Area(), "m^2", "m^2"},
		{Volume(), "m^3", "m^3"},
		{Wavenumber(), "m^-1", "1/m"},
		{Mass(), "kg", "kg"},
		{Density(), "kg m^-3", "kg/m^3"},
		{Time(), "s", "s"},
		{Frequency(), "s^-1", "1/s"},
		{Speed(), "m s^-1", "m/s"},
		{Acceleration(), "m s^-2", "m/s^2"},
		{Force(), "kg m s^-2", "N"},
		{Pressure(), "kg m^-1 s^-2", "Pa"},
		{Energy(), "kg m^2 s^-2", "J"},
		{SpecificEnergy(), "m^2 s^-2", "J/kg"},
		{EnergyPower(), "kg m^2 s^-3", "W"},
		{Viscosity(), "kg m^-1 s^-1", "Pa s"},
		{SurfaceTension(), "kg s^-2", "N/m"},
		{Current(), "A", "A"},
		{Charge(), "s A", "C"},
		{Temperature(), "K", "K"},
		{Entropy(), "kg m^2 s^-2 K^-1", "J/K"},
		{SpecificEntropy(), "m^2 s^-2 K^-1", "J/(kg K)"},
		{Amount(), "mol", "mol"},
		{MolarMass(), "kg mol^-1", "kg/mol"},
		{MolarEnergy(), "kg m^2 s^-2 mol^-1", "J/mol"},
		{MolarEntropy(), "kg m^2 s^-2 K^-1 mol^-1", "J/(mol K)"},
		{LuminousIntensity(), "cd", "cd"},
	} {
		if row.d.String() != row.base || CoherentText(row.d) != row.coherent {
			t.Errorf("%v, %s; want %s, %s", row.d, CoherentText(row.d), row.base, row.coherent)
		}
		if DimensionOf(row.base) != row.d || DimensionOf(row.coherent) != row.d {
			t.Errorf("%s or %s is not of the dimension %v", row.base, row.coherent, row.d)
		}
	}
	if !DimensionOf("no unit").IsNone() {
		t.Error("text that is no unit has a dimension")
	}
}

// The customary coherent unit of what the text measures.
func TestCoherentText(t *testing.T) {
	for _, row := range [][2]string{
		{"kJ/(kg K)", "J/(kg K)"}, {"Btu_IT/(h ft degF)", "W/(m K)"}, {"W/(m^2 K)", "W/(m^2 K)"}, {"cal/(mol K)", "J/(mol K)"},
		{"kV/cm", "V/m"}, {"uF/m", "F/m"}, {"H/m", "H/m"}, {"Ω cm", "Ω m"}, {"mS/cm", "S/m"}, {"D", "C m"}, {"G", "T"},
		{"dbar/m", "Pa/m"}, {"1/bar", "1/Pa"}, {"bar/K", "Pa/K"}, {"N/m^3", "Pa/m"}, {"L/min", "m^3/s"}, {"mol/L", "mol/m^3"},
		{"kg/h", "kg/s"}, {"kg/(m^2 s)", "kg/(m^2 s)"}, {"kg m/s", "kg m/s"}, {"kg m^2", "kg m^2"}, {"J s", "J s"},
		{"N m^2/kg^2", "m^3/(kg s^2)"}, {"W/(m^2 K^4)", "W/(m^2 K^4)"}, {"1/degC", "1/K"}, {"m^2/s", "m^2/s"},
		{"Pa m^3/mol", "J/mol"}, {"lx", "cd/m^2"}, {"cm^2/(V s)", "m^2/(V s)"}, {"J/T", "A m^2"}, {"A/m", "A/m"},
		{"Pa^(1/2)", "Pa^(1/2)"}, {"Wb m", "Wb m"}, {"V^2", "V^2"}, {"J/m^3", "Pa"}, {"g/mol", "kg/mol"}, {"m^3/mol", "m^3/mol"},
		{"J m^3", "J m^3"}, {"W/K", "W/K"}, {"K/W", "K/W"}, {"m K/W", "m K/W"}, {"m^2 K/W", "m^2 K/W"}, {"V/K", "V/K"}, {"s^-2", "1/s^2"}, {"1/K^2", "1/K^2"},
	} {
		d := DimensionOf(row[0])
		got := CoherentText(d)
		if u, err := Parse(got); err != nil || u.Dimension() != d || u.ToSI(1) != 1 {
			t.Errorf("%s is not the coherent unit of %s", got, row[0])
		}
		if got != row[1] {
			t.Errorf("the coherent unit of %s is %s, want %s", row[0], got, row[1])
		}
	}
	for i, entry := range customaryUnits {
		u, err := Parse(entry.text)
		if err != nil || u.Dimension() != wholePowers(entry.powers) || u.Text() != entry.text || u.ToSI(1) != 1 {
			t.Errorf("customary unit %d, %s: %v, %v", i, entry.text, u, err)
		}
	}
}
