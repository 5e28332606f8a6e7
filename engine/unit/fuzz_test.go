package unit

import (
	"testing"
	"unicode/utf8"
)

// FuzzParse reads any text: no panic, an error with its place inside the text, a
// correction that is at least text, or a unit that reads back as itself.
func FuzzParse(f *testing.F) {
	for _, text := range []string{
		"", "1", "m", "kg/m^3", "J/(kg K)", "J/kg/K", "m^(1/2)", "V/Hz^0.5", "m²·s⁻¹", "degC", "bar(a)", "barg/m",
		"l.y.", "µm", "((m))", "m^-", "m^(1/", "1/s", "%", "°C", "Btu_IT/(h ft^2 degF)", "m3", "dB", "\xff", "m\u00a0s",
		"Qm^30", "deg^(1/12)", "lb^33 ft^33/h^33", "(((((((((((((((((m", "a^99 b^99", "m−2", "′", "m^0", "kPa(g)(g)",
		"degC degC/K", "bara bara/bar", "u^99", "angstrom^-12", "A²·A⁻\xc2", "1/1/00", "Bdu_IT 0", "pc^(595/12)/lightyear^(593/12)",
	} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		u, err := Parse(text)
		if err != nil {
			e, ok := err.(*Error)
			if !ok {
				t.Fatalf("%q: %v is no *Error", text, err)
			}
			if e.Message == "" || e.Offset < 0 || e.Length < 0 || e.Offset+e.Length > len(text) {
				t.Fatalf("%q: %+v", text, e)
			}
			if utf8.ValidString(text) && !utf8.ValidString(e.Corrected(text)+e.Message) {
				t.Fatalf("%q: the place %d+%d is inside a character", text, e.Offset, e.Length)
			}
			return
		}
		again, err := Parse(u.Text())
		if err != nil || again != u {
			t.Fatalf("%q is written %q, which reads as %+v, %v; want %+v", text, u.Text(), again, err, u)
		}
		if x := u.ToSI(1); x != x || u.Dimension().IsNone() && u.Kind() == TemperaturePoint {
			t.Fatalf("%q: %+v", text, u)
		}
		if d := u.Difference(); d.Dimension() != u.Dimension() {
			t.Fatalf("%q: a difference is of another dimension", text)
		}
	})
}
