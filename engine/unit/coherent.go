package unit

// customaryUnits are the dimensions for which custom has settled on one coherent
// unit, with the powers of kg, m, s, A, K, mol, cd.
var customaryUnits = [...]struct {
	powers [baseCount]int8
	text   string
}{
	{[baseCount]int8{0, 0, 0, 0, 0, 0, 0}, "1"},
	{[baseCount]int8{1, 1, -2, 0, 0, 0, 0}, "N"},
	{[baseCount]int8{1, -1, -2, 0, 0, 0, 0}, "Pa"},
	{[baseCount]int8{1, 2, -2, 0, 0, 0, 0}, "J"},
	{[baseCount]int8{1, 2, -3, 0, 0, 0, 0}, "W"},
	{[baseCount]int8{0, 0, 1, 1, 0, 0, 0}, "C"},
	{[baseCount]int8{1, 2, -3, -1, 0, 0, 0}, "V"},
	{[baseCount]int8{-1, -2, 4, 2, 0, 0, 0}, "F"},
	{[baseCount]int8{1, 2, -3, -2, 0, 0, 0}, "Ω"},
	{[baseCount]int8{-1, -2, 3, 2, 0, 0, 0}, "S"},
	{[baseCount]int8{1, 2, -2, -1, 0, 0, 0}, "Wb"},
	{[baseCount]int8{1, 0, -2, -1, 0, 0, 0}, "T"},
	{[baseCount]int8{1, 2, -2, -2, 0, 0, 0}, "H"},
	{[baseCount]int8{0, 2, -2, 0, 0, 0, 0}, "J/kg"},
	{[baseCount]int8{0, 2, -2, 0, -1, 0, 0}, "J/(kg K)"},
	{[baseCount]int8{1, 2, -2, 0, -1, 0, 0}, "J/K"},
	{[baseCount]int8{1, 2, -2, 0, 0, -1, 0}, "J/mol"},
	{[baseCount]int8{1, 2, -2, 0, -1, -1, 0}, "J/(mol K)"},
	{[baseCount]int8{1, 2, -1, 0, 0, 0, 0}, "J s"},
	{[baseCount]int8{1, 0, -3, 0, 0, 0, 0}, "W/m^2"},
	{[baseCount]int8{1, 1, -3, 0, -1, 0, 0}, "W/(m K)"},
	{[baseCount]int8{1, 0, -3, 0, -1, 0, 0}, "W/(m^2 K)"},
	{[baseCount]int8{1, 0, -3, 0, -4, 0, 0}, "W/(m^2 K^4)"},
	{[baseCount]int8{-1, 0, 3, 0, 1, 0, 0}, "m^2 K/W"},
	{[baseCount]int8{-1, -1, 3, 0, 1, 0, 0}, "m K/W"},
	{[baseCount]int8{1, 0, -2, 0, 0, 0, 0}, "N/m"},
	{[baseCount]int8{1, -2, -2, 0, 0, 0, 0}, "Pa/m"},
	{[baseCount]int8{1, -1, -1, 0, 0, 0, 0}, "Pa s"},
	{[baseCount]int8{-1, 1, 2, 0, 0, 0, 0}, "1/Pa"},
	{[baseCount]int8{1, -2, -1, 0, 0, 0, 0}, "kg/(m^2 s)"},
	{[baseCount]int8{1, 1, -1, 0, 0, 0, 0}, "kg m/s"},
	{[baseCount]int8{1, 2, 0, 0, 0, 0, 0}, "kg m^2"},
	{[baseCount]int8{1, 1, -3, -1, 0, 0, 0}, "V/m"},
	{[baseCount]int8{1, 1, -2, -2, 0, 0, 0}, "H/m"},
	{[baseCount]int8{-1, -3, 4, 2, 0, 0, 0}, "F/m"},
	{[baseCount]int8{-1, -3, 3, 2, 0, 0, 0}, "S/m"},
	{[baseCount]int8{1, 3, -3, -2, 0, 0, 0}, "Ω m"},
	{[baseCount]int8{0, 1, 1, 1, 0, 0, 0}, "C m"},
	{[baseCount]int8{0, -2, 1, 1, 0, 0, 0}, "C/m^2"},
	{[baseCount]int8{0, -3, 1, 1, 0, 0, 0}, "C/m^3"},
	{[baseCount]int8{-1, 0, 1, 1, 0, 0, 0}, "C/kg"},
	{[baseCount]int8{0, 0, 1, 1, 0, -1, 0}, "C/mol"},
	{[baseCount]int8{0, 2, 0, 1, 0, 0, 0}, "A m^2"},
	{[baseCount]int8{-1, 0, 2, 1, 0, 0, 0}, "m^2/(V s)"},
}

// The derived units that may stand before base units where custom has settled
// nothing: indices into customaryUnits.
const (
	firstLeading = 1  // N
	lastLeading  = 12 // H
)

// leadingPowers are the powers, in twelfths, in which they may stand.
var leadingPowers = [...]int{wholePower, -wholePower, 2 * wholePower, -2 * wholePower, wholePower / 2, -wholePower / 2}

// A symbol is as heavy to read as symbolWeight, a derived one more so, a power
// as much as it is above one, a root as rootWeight. A derived unit has to make
// the text lighter by worthwhile.
const (
	symbolWeight  = 3
	derivedWeight = 4
	rootWeight    = 4
	worthwhile    = 3
)

// CoherentText returns the customary text of the coherent SI unit of a
// dimension: "Pa", "J/(mol K)", "kg/m^3", "m/s^2", "1". Where several quantities
// share a dimension it names the commonest (J rather than N m, 1/s rather than
// Hz). Parse reads it back with the same dimension and a factor of exactly 1.
func CoherentText(d Dimension) string {
	for i := range customaryUnits {
		if d == wholePowers(customaryUnits[i].powers) {
			return customaryUnits[i].text
		}
	}
	best, least := coherentProduct("", 0, d)
	least -= worthwhile
	for i := firstLeading; i <= lastLeading; i++ {
		entry := &customaryUnits[i]
		for _, power := range leadingPowers {
			leading, ok := wholePowers(entry.powers).Power(power, wholePower)
			if !ok {
				continue
			}
			if text, weight := coherentProduct(entry.text, power, d.Over(leading)); weight < least {
				best, least = text, weight
			}
		}
	}
	return best
}

// wholePowers returns the dimension with the given powers.
func wholePowers(powers [baseCount]int8) Dimension {
	var d Dimension
	for i, power := range powers {
		d.twelfths[i] = int16(power) * wholePower
	}
	return d
}

// coherentProduct writes a derived unit, to a power in twelfths, and the base
// units of d, and weighs the text.
func coherentProduct(derived string, power int, d Dimension) (text string, weight int) {
	over, under, below := "", "", 0
	put := func(symbol string, twelfths, symbolWeight int) {
		if twelfths == 0 {
			return
		}
		size := max(twelfths, -twelfths)
		weight += symbolWeight
		if size%wholePower != 0 {
			weight += rootWeight
		} else {
			weight += size/wholePower - 1
		}
		word := symbol + powerText(size)
		if twelfths > 0 {
			if over != "" {
				over += " "
			}
			over += word
			return
		}
		if under != "" {
			under += " "
		}
		under += word
		below++
	}
	put(derived, power, derivedWeight)
	for place, exponent := range d.twelfths {
		put(baseSymbols[place], int(exponent), symbolWeight)
	}
	if over == "" {
		over = "1"
		weight++
	}
	switch below {
	case 0:
		return over, weight
	case 1:
		return over + "/" + under, weight
	}
	return over + "/(" + under + ")", weight
}
