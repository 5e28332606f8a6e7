package unit

// refused is the answer to a symbol that will not be read as a unit, because it
// means several or is no linear unit.
type refused struct {
	message    string
	suggestion string
}

// refusal returns the answer to a refused symbol.
func refusal(symbol string) (refused, bool) {
	switch symbol {
	case "dB", "B", "Np", "dBA", "dBm", "bel", "decibel", "neper":
		return refused{symbol + " is a level, the logarithm of a ratio, and no linear unit: give the ratio itself", ""}, true
	case "mb":
		return refused{"mb is written for millibar and for millibarn", "mbar"}, true
	case "ly":
		return refused{"ly is written for the light year and for the langley", "lightyear"}, true
	case "ton", "tons":
		return refused{"ton is short, long or metric: write ton_US, ton_UK or t", "t"}, true
	case "cwt":
		return refused{"cwt is short or long: write cwt_US or cwt_UK", ""}, true
	case "ata":
		return refused{"ata is written for atm and for at, counted from vacuum", "atm(a)"}, true
	case "R":
		return refused{"R is written for the roentgen, the revolution and the degree Rankine: write roentgen, rev or degR", ""}, true
	case "st":
		return refused{"st is written for the stere and the stone: write stere or stone; the stokes is St", ""}, true
	case "a":
		return refused{"a is written for the are and the year: write are or yr", ""}, true
	case "ppt":
		return refused{"ppt is written for parts per thousand and per trillion: write ‰ or 1e-12", ""}, true
	case "ppq":
		return refused{"ppq has no settled meaning: write the power of ten", ""}, true
	}
	return refused{}, false
}
