package unit

import "strconv"

// wholePower is how many steps of an exponent make a power of one: exponents
// are kept as twelfths, so that square, cube, fourth and sixth roots are exact.
const wholePower = 12

// The places of the base quantities in a Dimension, in the order in which a
// dimension is written.
const (
	placeMass = iota
	placeLength
	placeTime
	placeCurrent
	placeTemperature
	placeAmount
	placeLuminousIntensity
	baseCount
)

// baseSymbols are the base units of the places above.
var baseSymbols = [baseCount]string{"kg", "m", "s", "A", "K", "mol", "cd"}

// Dimension is the product of powers of the seven base quantities of the SI.
// The zero value is the dimension of a pure number. Dimensions are compared
// with ==.
type Dimension struct {
	twelfths [baseCount]int16
}

// clamp keeps an exponent inside int16; unit text and formulas stay far inside,
// and an exponent at the edge matches no dimension that a unit can have.
func clamp(exponent int) int16 {
	return int16(min(max(exponent, -32767), 32767))
}

// Times returns the dimension of a product.
func (d Dimension) Times(o Dimension) Dimension {
	for i := range d.twelfths {
		d.twelfths[i] = clamp(int(d.twelfths[i]) + int(o.twelfths[i]))
	}
	return d
}

// Over returns the dimension of a quotient.
func (d Dimension) Over(o Dimension) Dimension {
	for i := range d.twelfths {
		d.twelfths[i] = clamp(int(d.twelfths[i]) - int(o.twelfths[i]))
	}
	return d
}

// Power returns the dimension raised to numerator/denominator. It is false when
// the denominator is zero, when an exponent would be no whole number of
// twelfths, or when it would be too large.
func (d Dimension) Power(numerator, denominator int) (Dimension, bool) {
	const limit = 1 << 30
	if denominator == 0 || numerator > limit || numerator < -limit {
		return Dimension{}, false
	}
	for i, exponent := range d.twelfths {
		product := int64(exponent) * int64(numerator)
		if product%int64(denominator) != 0 {
			return Dimension{}, false
		}
		product /= int64(denominator)
		if product > 32767 || product < -32767 {
			return Dimension{}, false
		}
		d.twelfths[i] = int16(product)
	}
	return d, true
}

// IsNone reports whether the dimension is that of a pure number.
func (d Dimension) IsNone() bool { return d == Dimension{} }

// String returns the dimension in SI base units with signed powers, such as
// "kg m^-1 s^-2", and "1" for a pure number. CoherentText gives the customary
// unit instead.
func (d Dimension) String() string {
	text := ""
	for place, exponent := range d.twelfths {
		if exponent == 0 {
			continue
		}
		if text != "" {
			text += " "
		}
		text += baseSymbols[place] + powerText(int(exponent))
	}
	if text == "" {
		return "1"
	}
	return text
}

// powerText writes an exponent given in twelfths as the tail of a symbol:
// nothing for one, "^2", "^-1", "^(1/2)".
func powerText(twelfths int) string {
	if twelfths == wholePower {
		return ""
	}
	if twelfths%wholePower == 0 {
		return "^" + strconv.Itoa(twelfths/wholePower)
	}
	common := greatestCommonDivisor(twelfths, wholePower)
	return "^(" + strconv.Itoa(twelfths/common) + "/" + strconv.Itoa(wholePower/common) + ")"
}

// greatestCommonDivisor returns the positive common divisor of a and b, and 1
// when both are zero.
func greatestCommonDivisor(a, b int) int {
	for b != 0 {
		a, b = b, a%b
	}
	if a < 0 {
		return -a
	}
	if a == 0 {
		return 1
	}
	return a
}

// base returns the dimension of one base quantity.
func base(place int) Dimension {
	var d Dimension
	d.twelfths[place] = wholePower
	return d
}
