package unit

import (
	"strings"
	"unicode/utf8"
)

// superscript returns the plain character of a raised one, and 0 for any other.
func superscript(r rune) byte {
	switch r {
	case '⁰':
		return '0'
	case '¹':
		return '1'
	case '²':
		return '2'
	case '³':
		return '3'
	case '⁴', '⁵', '⁶', '⁷', '⁸', '⁹':
		return byte('4' + (r - '⁴'))
	case '⁻':
		return '-'
	case '⁺':
		return '+'
	}
	return 0
}

// powered reads the power behind an operand, if there is one, and applies it.
func (p *parser) powered(atoms []atom) ([]atom, *Error) {
	start := p.at
	numerator, denominator, found, problem := p.power()
	if problem != nil || !found {
		return atoms, problem
	}
	for i := range atoms {
		product := atoms[i].twelfths * numerator
		if product%denominator != 0 {
			return nil, p.wrong(start, "this power is too fine: powers are kept as twelfths, write for instance ^(1/3)", p.twelfth(start, numerator, denominator))
		}
		product /= denominator
		if product > MaximumPower*wholePower || product < -MaximumPower*wholePower {
			return nil, p.wrong(start, "this power is too large", "")
		}
		atoms[i].twelfths = product
	}
	return atoms, nil
}

// twelfth suggests the fraction that a rounded decimal power stands for.
func (p *parser) twelfth(start, numerator, denominator int) string {
	if !strings.Contains(p.text[start:p.at], ".") {
		return ""
	}
	nearest := floorDivide(2*wholePower*numerator+denominator, 2*denominator)
	// within a hundredth of a whole
	if off := numerator*wholePower - nearest*denominator; nearest == 0 || max(off, -off)*100 > denominator*wholePower {
		return ""
	}
	return powerText(nearest)
}

// power reads a power as a ratio of integers with a positive denominator.
func (p *parser) power() (numerator, denominator int, found bool, problem *Error) {
	if p.at == len(p.text) {
		return 1, 1, false, nil
	}
	start := p.at
	if p.text[p.at] == '^' {
		p.at++
		numerator, denominator, problem = p.written(start)
		return numerator, denominator, true, problem
	}
	if raised := p.raised(); raised != "" {
		sign, digits := splitSign(raised)
		number, ok := smallInteger(digits)
		if !ok {
			return 1, 1, true, p.wrong(start, "this is no power", "")
		}
		return sign * number, 1, true, nil
	}
	// m-1 and m+2: the sign of a power without the ^
	r, width := utf8.DecodeRuneInString(p.text[p.at:])
	if r == '-' || r == '−' || r == '+' {
		p.at += width
		digits := p.digits()
		sign := ""
		if r != '+' {
			sign = "-"
		}
		if digits == "" {
			return 1, 1, true, p.wrong(start, "a unit holds no "+string(r), "")
		}
		return 1, 1, true, p.wrong(start, "a power is written with ^", "^"+sign+digits)
	}
	return 1, 1, false, nil
}

// written reads what stands behind "^": a signed integer or decimal number, or
// a ratio of integers in brackets.
func (p *parser) written(start int) (numerator, denominator int, problem *Error) {
	if p.at < len(p.text) && p.text[p.at] == '(' {
		p.at++
		return p.ratio(start)
	}
	sign := p.sign()
	digits := p.digits()
	decimals := ""
	if p.at+1 < len(p.text) && p.text[p.at] == '.' && isDigit(p.text[p.at+1]) {
		p.at++
		decimals = p.digits()
	}
	number, ok := smallInteger(digits + decimals)
	if !ok {
		return 1, 1, p.wrong(start, "this is no power: write an integer, a decimal number or a ratio such as (1/2), with few digits", "")
	}
	denominator = 1
	for range decimals {
		denominator *= 10
	}
	// m^1/2 is no root: what follows is below the line, where no number stands
	if rest := p.text[p.at:]; decimals == "" && len(rest) > 1 && rest[0] == '/' && isDigit(rest[1]) {
		p.at++
		below := p.digits()
		return 1, 1, p.wrong(start, "a ratio as a power stands in brackets", "^("+p.text[start+1:p.at-len(below)-1]+"/"+below+")")
	}
	return reduced(sign*number, denominator)
}

// ratio reads a ratio of integers behind its opening bracket.
func (p *parser) ratio(start int) (numerator, denominator int, problem *Error) {
	const help = "this is no power: write an integer, a decimal number or a ratio such as (1/2), with few digits"
	p.blanks()
	sign := p.sign()
	over, ok := smallInteger(p.digits())
	under := 1
	p.blanks()
	if ok && p.at < len(p.text) && p.text[p.at] == '/' {
		p.at++
		p.blanks()
		under, ok = smallInteger(p.digits())
		p.blanks()
	}
	if !ok || under == 0 || p.at == len(p.text) || p.text[p.at] != ')' {
		return 1, 1, p.wrong(start, help, "")
	}
	p.at++
	return reduced(sign*over, under)
}

// reduced returns a ratio in lowest terms.
func reduced(numerator, denominator int) (int, int, *Error) {
	common := greatestCommonDivisor(numerator, denominator)
	return numerator / common, denominator / common, nil
}

// sign reads a sign, if there is one.
func (p *parser) sign() int {
	r, width := utf8.DecodeRuneInString(p.text[p.at:])
	switch r {
	case '+':
		p.at += width
	case '-', '−':
		p.at += width
		return -1
	}
	return 1
}

// digits reads the digits at the present place.
func (p *parser) digits() string {
	start := p.at
	for p.at < len(p.text) && isDigit(p.text[p.at]) {
		p.at++
	}
	return p.text[start:p.at]
}

// raised reads raised characters and returns them as plain ones.
func (p *parser) raised() string {
	plain := ""
	for p.at < len(p.text) {
		r, width := utf8.DecodeRuneInString(p.text[p.at:])
		c := superscript(r)
		if c == 0 {
			break
		}
		plain += string(rune(c))
		p.at += width
	}
	return plain
}

// splitSign returns the sign of a number and the rest of it.
func splitSign(text string) (int, string) {
	switch text[0] {
	case '-':
		return -1, text[1:]
	case '+':
		return 1, text[1:]
	}
	return 1, text
}

// smallInteger reads one to six digits.
func smallInteger(digits string) (int, bool) {
	if len(digits) == 0 || len(digits) > 6 {
		return 0, false
	}
	number := 0
	for i := range len(digits) {
		if !isDigit(digits[i]) {
			return 0, false
		}
		number = number*10 + int(digits[i]-'0')
	}
	return number, true
}
