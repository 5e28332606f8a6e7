package formula

import (
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// foreignWords are words of other notations for constructs that sheets do not have.
var foreignWords = map[string]string{
	"let":        "a sheet has no local names: derive an entry of its own instead",
	"in":         "there is no membership test: compare with == and or",
	"matches":    "texts are only compared with == and !=",
	"contains":   "texts are only compared with == and !=",
	"startsWith": "texts are only compared with == and !=",
	"endsWith":   "texts are only compared with == and !=",
	"if":         choiceAdvice,
	"else":       choiceAdvice,
	"nil":        "there is no empty value",
}

// foreignSigns are signs that formulas do not have, with what to write instead.
var foreignSigns = map[string]string{
	"&&": "write and",
	"||": "write or",
	"**": "write a power with ^",
	"..": "there are no ranges: write the items of a list, as in [1, 2, 3]",
	"?.": "only a table's column and a constant of nature are read with a dot",
	"??": choiceAdvice,
	"//": "write a quotient with / and a note with #",
	"/*": "write a note with #",
	"::": choiceAdvice,
	"=>": "write >= to compare; there are no functions inside of a formula, but laws of the sheet's own",
	"=<": "write <= to compare",
	"<>": "write != to compare",
	"·":  "write a product with *",
	"×":  "write a product with *",
	"÷":  "write a quotient with /",
	"−":  "write the minus sign of the keyboard, -",
	"–":  "write the minus sign of the keyboard, -",
	"≤":  "write <=",
	"≥":  "write >=",
	"≠":  "write !=",
	"√":  "write sqrt(x)",
	"²":  "write a power with ^, as in x^2",
	"³":  "write a power with ^, as in x^3",
	"%":  "there is no remainder; a share in percent is written with its unit, as in 5[%]",
	"!":  "write not",
	"=":  "write == to compare",
	"±":  "give the uncertainty where the value is known",
	"{":  "a list stands in brackets, as in [1, 2, 3]; there are no maps and no functions inside of a formula",
	"}":  "a list stands in brackets, as in [1, 2, 3]; there are no maps and no functions inside of a formula",
	"|":  "write the call itself, as in exp(x); conditions are joined with or",
	"$":  "write the name alone",
	"@":  "write the name alone",
	"&":  "join conditions with and",
	";":  "a statement has one formula: derive an entry of its own for each",
	"#":  "write a note behind the formula",
	"`":  "texts stand in double quotes",
	"~":  "write not",
	"\\": "write a quotient with /",
}

// operator reads an operator, or says which construct a sheet does not have.
func (l *scanner) operator(at int, r rune) int {
	two := ""
	if at+2 <= len(l.formula) {
		two = l.formula[at : at+2]
	}
	switch two {
	case "<=", ">=", "==", "!=":
		l.sign(two, at)
		l.after(false, false, false)
		return at + 2
	case "?.":
		if l.digitAt(at + 2) { // a choice whose first value begins with a point
			l.sign("?", at)
			l.after(false, false, false)
			return at + 1
		}
	}
	size := max(1, utf8.RuneLen(r))
	for _, sign := range []string{two, string(r)} {
		if advice, foreign := foreignSigns[sign]; foreign {
			l.fail(at, len(sign), problem.Construct, quote(sign)+" is not part of a formula", advice)
			return at + len(sign)
		}
	}
	switch r {
	case '+', '-', '*', '/', '^', '<', '>', '?', ':', '.':
		l.sign(string(r), at)
		l.after(false, false, false)
	case ',':
		l.sign(",", at)
		l.after(false, len(l.stack) > 0 && l.stack[len(l.stack)-1].call, false)
		l.comma = true
	default:
		l.fail(at, size, problem.Syntax, "this character does not belong in a formula", "remove it")
	}
	return at + size
}

// foreignCalls are functions that other notations have under other names, with
// what to write instead.
var foreignCalls = map[string]string{
	"log":     "write ln for the natural and log10 for the decimal logarithm",
	"pow":     "write a power with ^",
	"len":     "write count(list)",
	"avg":     "write mean(list)",
	"average": "write mean(list)",
	"median":  "write mean(list), largest(list) or smallest(list)",
	"arcsin":  "write asin(x)",
	"arccos":  "write acos(x)",
	"arctan":  "write atan(x)",
	"arctan2": "write atan2(y, x)",
	"square":  "write a power with ^, as in x^2",
	"mod":     "there is no remainder",
	"map":     "write the operation on the list itself, as in 2 * list",
	"filter":  "there are no functions of a list's items: write the items, as in [1, 2, 3]",
	"all":     "join conditions with and",
	"any":     "join conditions with or",
	"none":    "join conditions with and not",
	"reduce":  "write sum(list), mean(list), largest(list) or smallest(list)",
}
