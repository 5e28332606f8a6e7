package main

// The powers of ten that float64 holds exactly.
var exactPowers = [...]float64{
	1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11,
	1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
}

// scanNumber reads a plain decimal number whose nearest float64 one product or
// quotient of two exact numbers gives: digits that make an integer below 2^53,
// times or through a power of ten up to 1e22. Method: Clinger W.D. (1990) How to
// read floating point numbers accurately, PLDI '90, 92-101. All else, right or
// wrong, is left to readNumber.
func scanNumber(text []byte) (x float64, ok bool) {
	i := 0
	negative := false
	if len(text) > 0 && (text[0] == '-' || text[0] == '+') {
		negative = text[0] == '-'
		i = 1
	}
	const mostDigits = 18 // a uint64 holds them
	var mantissa uint64
	start := i
	for i < len(text) && text[i]-'0' <= 9 {
		mantissa = mantissa*10 + uint64(text[i]-'0')
		i++
	}
	digits, exponent := i-start, 0
	if i < len(text) && text[i] == '.' {
		i++
		start = i
		for i < len(text) && text[i]-'0' <= 9 {
			mantissa = mantissa*10 + uint64(text[i]-'0')
			i++
		}
		exponent = start - i
		digits += i - start
	}
	if digits == 0 || digits > mostDigits {
		return 0, false
	}
	if i < len(text) && text[i]|0x20 == 'e' {
		i++
		minus := false
		if i < len(text) && (text[i] == '-' || text[i] == '+') {
			minus = text[i] == '-'
			i++
		}
		start = i
		power := 0
		for i < len(text) && text[i]-'0' <= 9 && i-start < 4 {
			power = power*10 + int(text[i]-'0')
			i++
		}
		if i == start {
			return 0, false
		}
		if minus {
			power = -power
		}
		exponent += power
	}
	if i != len(text) || mantissa >= 1<<53 {
		return 0, false
	}
	x = float64(mantissa)
	switch {
	case exponent == 0:
	case exponent > 0 && exponent < len(exactPowers):
		x *= exactPowers[exponent]
	case exponent < 0 && -exponent < len(exactPowers):
		x /= exactPowers[-exponent]
	default:
		return 0, false
	}
	if negative {
		x = -x
	}
	return x, true
}
