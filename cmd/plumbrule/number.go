package main

import (
	"encoding/json"
	"errors"
	"math"
	"strconv"
	"strings"
	"unicode/utf8"

	"plumbrule/engine/formula"
	"plumbrule/engine/unit"
)

// This file is the one place where numbers become text and text numbers.

// defaultDigits is how many significant digits tables show.
const defaultDigits = 7

// shortest gives the fewest digits that read back as the same float64, with an
// exponent only for sizes below 1e-6 or from 1e21 on. NaN gives "".
func shortest(x float64) string { return string(appendShortest(nil, x)) }

// jsonNumber is a number of a JSON document; one that is not finite is null.
type jsonNumber float64

// MarshalJSON gives the shortest digits that read back as the same float64.
func (n jsonNumber) MarshalJSON() ([]byte, error) {
	x := float64(n)
	if math.IsNaN(x) || math.IsInf(x, 0) {
		return []byte("null"), nil
	}
	return json.Marshal(x)
}

// readable gives a number with at most so many significant digits, trailing
// zeros left out; sizes below 1e-4 and those that need more digits before the
// point than are shown get an exponent.
func readable(x float64, digits int) string {
	switch {
	case math.IsNaN(x) || math.IsInf(x, 0):
		return "-"
	case x == 0:
		return "0"
	}
	text := strconv.FormatFloat(x, 'e', digits-1, 64)
	mantissa, power, _ := strings.Cut(text, "e")
	exponent, err := strconv.Atoi(power)
	if err != nil || exponent < -4 || exponent >= max(digits, 7) {
		return trimZeros(mantissa) + "e" + strconv.Itoa(exponent)
	}
	return trimZeros(strconv.FormatFloat(x, 'f', max(0, digits-1-exponent), 64))
}

func trimZeros(text string) string {
	if strings.Contains(text, ".") {
		text = strings.TrimRight(strings.TrimRight(text, "0"), ".")
	}
	return text
}

// aligned pads a column of readable numbers so that the points stand below
// each other, and the exponents too. Other texts begin where the numbers do.
func aligned(cells []string) []string {
	widest, decimals := 0, 0
	for _, cell := range cells {
		if !isNumber(cell) {
			continue
		}
		mantissa, _, scientific := strings.Cut(cell, "e")
		whole, fraction, _ := strings.Cut(mantissa, ".")
		widest = max(widest, len(whole))
		if scientific {
			decimals = max(decimals, len(fraction))
		}
	}
	padded := make([]string, len(cells))
	for i, cell := range cells {
		padded[i] = cell
		if !isNumber(cell) {
			continue
		}
		mantissa, power, scientific := strings.Cut(cell, "e")
		whole, fraction, _ := strings.Cut(mantissa, ".")
		if scientific {
			for len(fraction) < decimals {
				fraction += "0"
			}
			cell = whole
			if fraction != "" {
				cell += "." + fraction
			}
			cell += "e" + power
		}
		padded[i] = strings.Repeat(" ", widest-len(whole)) + cell
	}
	return padded
}

func isNumber(text string) bool {
	digits := strings.TrimLeft(text, "-+.")
	return digits != "" && digits[0] >= '0' && digits[0] <= '9'
}

var errNotNumber = errors.New("not a number")

// numberLength tells how many bytes at the start of a text are a decimal
// number: sign, digits, point, exponent.
func numberLength(text string) int {
	i := 0
	if i < len(text) && (text[i] == '+' || text[i] == '-') {
		i++
	}
	digits := 0
	for ; i < len(text) && (text[i] >= '0' && text[i] <= '9' || text[i] == '.'); i++ {
		if text[i] != '.' {
			digits++
		}
	}
	if digits == 0 {
		return 0
	}
	if i < len(text) && (text[i] == 'e' || text[i] == 'E') {
		j := i + 1
		if j < len(text) && (text[j] == '+' || text[j] == '-') {
			j++
		}
		if j < len(text) && text[j] >= '0' && text[j] <= '9' {
			for j < len(text) && text[j] >= '0' && text[j] <= '9' {
				j++
			}
			i = j
		}
	}
	return i
}

// readNumber reads a plain decimal number, blanks around it allowed.
func readNumber(text string) (float64, error) {
	text = strings.TrimSpace(text)
	if text == "" || numberLength(text) != len(text) {
		return 0, errNotNumber
	}
	x, err := strconv.ParseFloat(text, 64)
	if err != nil {
		if errors.Is(err, strconv.ErrRange) {
			return 0, errors.New("beyond the range of numbers")
		}
		return 0, errNotNumber
	}
	return x, nil
}

// readQuantity reads a number with or without a unit of its own, "4.3 km",
// "4.3[km]" or "4300", and gives it in coherent SI units. A bare number is in
// the unit own; a unit must fit it in dimension and kind.
func readQuantity(text string, own unit.Unit) (si float64, hint string, err error) {
	text = strings.TrimSpace(strings.ReplaceAll(text, "\u2212", "-")) // the minus sign of typeset text
	n := numberLength(text)
	if n == 0 {
		return 0, "write a number in " + ownText(own) + ", or a number with its unit", errors.New("'" + clip(text) + "' is not a number")
	}
	x, err := readNumber(text[:n])
	if err != nil {
		return 0, "", errors.New("'" + clip(text[:n]) + "' is " + err.Error())
	}
	rest := strings.TrimSpace(text[n:])
	if rest == "" {
		return own.ToSI(x), "", nil
	}
	if strings.HasPrefix(rest, "[") && strings.HasSuffix(rest, "]") {
		rest = strings.TrimSpace(rest[1 : len(rest)-1])
	}
	u, hint, err := readUnit(rest)
	if err != nil {
		return 0, hint, err
	}
	if hint, err := fits(u, own); err != nil {
		return 0, hint, err
	}
	return u.ToSI(x), "", nil
}

// readUnit reads unit text; the hint tells what to write instead.
func readUnit(text string) (u unit.Unit, hint string, err error) {
	u, err = unit.Parse(text)
	if err == nil {
		return u, "", nil
	}
	var wrong *unit.Error
	if !errors.As(err, &wrong) {
		return u, "", err
	}
	if corrected := wrong.Corrected(text); wrong.Suggestion != "" && corrected != text {
		hint = "write " + corrected
	} else {
		hint = "plumbrule units lists the units"
	}
	return u, hint, errors.New(wrong.Message)
}

// fits says whether a number in the unit given may stand for a quantity of the
// unit own: equal dimension, and kinds that do not contradict each other.
func fits(given, own unit.Unit) (hint string, err error) {
	if given.Dimension() != own.Dimension() {
		return "write a number in " + ownText(own) + ", or in a unit that converts to it", errors.New("the unit " + given.Text() + " does not fit: the quantity is in " + ownText(own))
	}
	if _, message, advice := formula.Showable(given.Kind(), own.Kind()); message != "" {
		return advice, errors.New("the unit " + given.Text() + " does not fit " + ownText(own) + ": " + message)
	}
	return "", nil
}

func ownText(u unit.Unit) string {
	if u.Text() == "1" {
		return "no unit (a pure number)"
	}
	return u.Text()
}

// shownUnit is a unit's text in a table; a pure number has none.
func shownUnit(text string) string {
	if text == "1" {
		return ""
	}
	return text
}

// clip shortens a text of a user to what a message can bear, without control
// characters.
func clip(text string) string {
	const most = 40
	if utf8.RuneCountInString(text) > most {
		text = string([]rune(text)[:most]) + "..."
	}
	return printable(text)
}
