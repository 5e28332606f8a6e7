package nature

import (
	"strconv"
	"unicode/utf8"

	"plumbrule/engine/problem"
)

// Limits of a chemical formula. The number of atoms keeps every sum of weights
// below 2^53, so that it is exact in a float64.
const (
	longestFormula = 200           // characters
	mostAtoms      = 1_000_000_000 // atoms
	deepestBracket = 20            // brackets within brackets
)

// weigh adds up the atomic weights of a chemical formula, in ten-thousandths of
// a gram per mole. The complaint is empty where the formula is sound; else it
// says what is wrong, and at which character, counted from 1.
//
// A formula is made of element symbols, each with an optional count behind it,
// and of groups in brackets with an optional count: "Ca(OH)2",
// "K3[Fe(CN)6]". Parts joined by ".", "*" or "·" may begin with a count:
// "CuSO4.5H2O". Counts may be written as subscripts: "CO₂".
func weigh(text string) (weight int64, complaint string) {
	if utf8.RuneCountInString(text) > longestFormula {
		return 0, "a chemical formula has at most " + strconv.Itoa(longestFormula) + " characters"
	}
	if !utf8.ValidString(text) {
		return 0, "the chemical formula is not valid UTF-8"
	}
	r := reader{letters: []rune(text)}
	total := r.formula()
	return total.weight, r.complaint
}

// sum counts atoms and their weight.
type sum struct{ atoms, weight int64 }

// reader reads a formula from left to right; once there is a complaint nothing
// more is read.
type reader struct {
	letters   []rune
	at        int
	complaint string
}

// formula reads the parts of a whole formula.
func (r *reader) formula() sum {
	total := sum{}
	if len(r.letters) == 0 {
		r.complain(0, "the chemical formula is empty")
	}
	for first := true; r.complaint == ""; first = false {
		start := r.at
		times := r.count()
		if r.complaint == "" && first && r.at != start {
			r.complain(start, "a count stands behind what it counts, as in \"H2O\"")
		}
		r.add(&total, r.group(0), times, start)
		if r.complaint != "" || r.at == len(r.letters) {
			break
		}
		if !isJoint(r.letters[r.at]) {
			r.complainOf(r.at)
			break
		}
		r.at++
	}
	return total
}

// group reads symbols and brackets until the text, the bracket or the part ends.
func (r *reader) group(depth int) sum {
	total := sum{}
	start := r.at
	for r.complaint == "" && r.at < len(r.letters) {
		begin := r.at
		var one sum
		switch letter := r.letters[r.at]; {
		case isCapital(letter):
			one = r.symbol()
		case closing(letter) != 0:
			one = r.bracket(depth)
		default:
			if r.at == start {
				r.complainOf(r.at)
			}
			return total
		}
		r.add(&total, one, r.count(), begin)
	}
	if r.complaint == "" && r.at == start {
		r.complain(r.at, "the chemical formula ends where an element symbol is missing")
	}
	return total
}

// bracket reads a group in brackets, with the opening one next.
func (r *reader) bracket(depth int) sum {
	open := r.at
	if depth == deepestBracket {
		r.complain(open, "more than "+strconv.Itoa(deepestBracket)+" brackets within brackets")
		return sum{}
	}
	close := closing(r.letters[open])
	r.at++
	total := r.group(depth + 1)
	switch {
	case r.complaint != "":
	case r.at < len(r.letters) && r.letters[r.at] == close:
		r.at++
	case r.at < len(r.letters) && !isClosing(r.letters[r.at]):
		r.complainOf(r.at)
	default:
		r.complain(open, "the bracket \""+string(r.letters[open])+"\" is not closed by \""+string(close)+"\"")
	}
	return total
}

// symbol reads an element symbol, with its capital next.
func (r *reader) symbol() sum {
	start := r.at
	for r.at++; r.at < len(r.letters) && isSmall(r.letters[r.at]); r.at++ {
	}
	symbol := string(r.letters[start:r.at])
	found := elementOf(symbol)
	switch {
	case found == nil && (symbol == "D" || symbol == "T"):
		r.complain(start, "\""+symbol+"\" is an isotope; molar masses are those of the natural mixture of isotopes")
	case found == nil:
		r.complain(start, "unknown element symbol \""+symbol+"\""+likeness(symbol))
	case found.weight == 0:
		r.complain(start, "\""+symbol+"\": "+found.name+" has no stable isotope and no standard atomic weight; give the molar mass of the isotope at hand as a number")
	default:
		return sum{1, found.weight}
	}
	return sum{}
}

// likeness suggests what an unknown symbol may have meant, or gives "".
func likeness(symbol string) string {
	letters := []rune(symbol)
	for i := range elements {
		if elements[i].name == symbol || elements[i].name == string(letters[0]-'A'+'a')+string(letters[1:]) {
			return "; did you mean \"" + elements[i].symbol + "\"?"
		}
	}
	symbols := make([]string, len(elements))
	for i := range elements {
		symbols[i] = elements[i].symbol
	}
	if near := problem.Nearest(symbol, symbols); near != "" {
		return "; did you mean \"" + near + "\"?"
	}
	return ""
}

// count reads a whole number; 1 when there is none.
func (r *reader) count() int64 {
	start := r.at
	number := int64(0)
	for r.complaint == "" && r.at < len(r.letters) {
		digit := digitOf(r.letters[r.at])
		if digit < 0 {
			break
		}
		number = number*10 + digit
		if number > mostAtoms {
			r.complainMany(start)
		}
		r.at++
	}
	switch {
	case r.complaint != "" || r.at == start:
		return 1
	case number == 0:
		r.complain(start, "a count is a whole number from 1 on")
	}
	return number
}

// add puts times one onto the total.
func (r *reader) add(total *sum, one sum, times int64, at int) {
	if r.complaint != "" {
		return
	}
	// Both factors are at most mostAtoms, so the product fits 64 bits.
	if total.atoms+one.atoms*times > mostAtoms {
		r.complainMany(at)
		return
	}
	total.atoms += one.atoms * times
	total.weight += one.weight * times
}

// complain notes the first thing that is wrong.
func (r *reader) complain(at int, what string) {
	if r.complaint == "" {
		r.complaint = what + " (character " + strconv.Itoa(at+1) + ")"
	}
}

func (r *reader) complainMany(at int) {
	r.complain(at, "more than "+strconv.Itoa(mostAtoms)+" atoms")
}

// complainOf tells what is wrong with a character that fits nowhere.
func (r *reader) complainOf(at int) {
	letter := r.letters[at]
	switch quoted := "\"" + string(letter) + "\""; {
	case isSmall(letter):
		r.complain(at, quoted+": an element symbol begins with a capital letter, as in \"CO2\" or \"NaCl\"")
	case isClosing(letter):
		r.complain(at, "nothing stands in the bracket that "+quoted+" closes, or it was never opened")
	case letter == '+' || letter == '-' || letter == '−':
		r.complain(at, quoted+": charges are not written; the mass of electrons is left out")
	case letter == ' ' || letter == '\t':
		r.complain(at, "a chemical formula has no blanks")
	default:
		r.complain(at, quoted+" does not belong in a chemical formula")
	}
}

func isCapital(letter rune) bool { return 'A' <= letter && letter <= 'Z' }
func isSmall(letter rune) bool   { return 'a' <= letter && letter <= 'z' }
func isJoint(letter rune) bool {
	return letter == '.' || letter == '·' || letter == '*' || letter == '•'
}
func isClosing(letter rune) bool { return letter == ')' || letter == ']' || letter == '}' }

// closing gives the bracket that closes an opening one, 0 for other letters.
func closing(letter rune) rune {
	switch letter {
	case '(':
		return ')'
	case '[':
		return ']'
	case '{':
		return '}'
	}
	return 0
}

// digitOf gives the value of a digit, subscript or not, and -1 for others.
func digitOf(letter rune) int64 {
	switch {
	case '0' <= letter && letter <= '9':
		return int64(letter - '0')
	case '₀' <= letter && letter <= '₉':
		return int64(letter - '₀')
	}
	return -1
}
