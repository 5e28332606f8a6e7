package unit

import "strings"

// Unit is a way to write a number of some dimension: a factor to coherent SI
// and, for a temperature scale, a shift of the zero. Units are values and may be
// compared with ==: equal units have the same text. The zero Unit is the unit 1.
type Unit struct {
	text      string
	dimension Dimension
	kind      Kind
	before    float64
	multiply  float64
	divide    float64
}

// One returns the unit of a pure number, "1".
func One() Unit { return Unit{text: "1", multiply: 1, divide: 1} }

// Coherent returns the coherent SI unit of a dimension, as CoherentText names it.
func Coherent(d Dimension) Unit {
	return Unit{text: CoherentText(d), dimension: d, multiply: 1, divide: 1}
}

// Text returns the canonical text of the unit. Parse reads it back as an equal
// unit.
func (u Unit) Text() string {
	if u.text == "" {
		return "1"
	}
	return u.text
}

// Dimension returns the dimension of the unit.
func (u Unit) Dimension() Dimension { return u.dimension }

// Kind returns the kind of a number written in the unit.
func (u Unit) Kind() Kind { return u.kind }

// Affine returns the conversion to coherent SI: SI = (x + before) * multiply /
// divide. One of multiply and divide is 1.
func (u Unit) Affine() (before, multiply, divide float64) {
	if u.multiply == 0 {
		return 0, 1, 1
	}
	return u.before, u.multiply, u.divide
}

// ToSI converts a number written in the unit to coherent SI.
func (u Unit) ToSI(x float64) float64 {
	before, multiply, divide := u.Affine()
	return float64((x+before)*multiply) / divide
}

// FromSI converts a number in coherent SI to the unit.
func (u Unit) FromSI(x float64) float64 {
	before, multiply, divide := u.Affine()
	return float64(x/multiply*divide) - before
}

// Difference returns the unit of a difference of two numbers written in u: K for
// degC, degR for degF, bar for bara and barg. Every other unit is its own.
func (u Unit) Difference() Unit {
	stem := ""
	switch u.kind {
	case TemperaturePoint:
		l := shared()
		if a, ok := l.find(u.text); ok {
			stem = l.units[a.unit].difference
		}
	case AbsolutePressure, GaugePressure:
		stem = strings.TrimSuffix(strings.TrimSuffix(u.text, absoluteSuffix), gaugeSuffix)
		if stem == u.text {
			stem = stem[:len(stem)-1]
		}
	default:
		return u
	}
	difference, err := Parse(stem)
	if err != nil {
		return u
	}
	return difference
}

// Equivalent reports whether numbers written in u and o mean the same, whatever
// the units are called: J and N m, 1/s and Hz.
func (u Unit) Equivalent(o Unit) bool {
	u.text, o.text = "", ""
	u.before, u.multiply, u.divide = u.Affine()
	o.before, o.multiply, o.divide = o.Affine()
	return u == o
}
