package unit

import "strings"

// parseNumber reads the number of a definition exactly: decimal numbers and
// "pi", multiplied by standing side by side, with one "/" before the divisors,
// as in "0.3048", "101325/760", "2 pi/60", "1e-21/299792458".
func parseNumber(text string) (factor, bool) {
	over, under, _ := strings.Cut(text, "/")
	var f factor
	if !multiplyNumbers(&f, over, wholePower) || !multiplyNumbers(&f, under, -wholePower) {
		return factor{}, false
	}
	return f, true
}

// multiplyNumbers multiplies f by each word of text to the given power.
func multiplyNumbers(f *factor, text string, twelfths int) bool {
	for word := range strings.FieldsSeq(text) {
		if word == "pi" {
			f.pis += twelfths
			continue
		}
		number, ok := parseDecimal(word)
		if !ok {
			return false
		}
		f.timesPower(&number, twelfths)
	}
	return true
}

// parseDecimal reads one positive decimal number such as "6.02e23" exactly; its
// digits must fit in 64 bits.
func parseDecimal(text string) (factor, bool) {
	mantissa, power, digits := uint64(0), 0, 0
	behindPoint := false
	at := 0
	for ; at < len(text) && text[at] != 'e'; at++ {
		switch {
		case text[at] == '.' && !behindPoint:
			behindPoint = true
		case text[at] >= '0' && text[at] <= '9':
			if mantissa > (1<<63)/10 {
				return factor{}, false
			}
			mantissa = mantissa*10 + uint64(text[at]-'0')
			digits++
			if behindPoint {
				power--
			}
		default:
			return factor{}, false
		}
	}
	if digits == 0 || mantissa == 0 {
		return factor{}, false
	}
	if at < len(text) {
		exponent, sign := 0, 1
		at++
		if at < len(text) && (text[at] == '-' || text[at] == '+') {
			if text[at] == '-' {
				sign = -1
			}
			at++
		}
		if at == len(text) {
			return factor{}, false
		}
		for ; at < len(text); at++ {
			if text[at] < '0' || text[at] > '9' || exponent > 99 {
				return factor{}, false
			}
			exponent = exponent*10 + int(text[at]-'0')
		}
		power += sign * exponent
	}
	f := integerFactor(mantissa)
	ten := tenFactor(power)
	f.timesPower(&ten, wholePower)
	return f, true
}
