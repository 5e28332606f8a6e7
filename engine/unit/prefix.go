package unit

// prefix is one of the decimal prefixes of the SI.
type prefix struct {
	symbol string
	name   string
	power  int // of ten
}

// prefixes are the 24 prefixes of SI Brochure 9 (2019) with the four of the
// 27th CGPM (2022); the first stands for none. Their indices are kept in atoms.
var prefixes = [...]prefix{
	{"", "", 0},
	{"q", "quecto", -30},
	{"r", "ronto", -27},
	{"y", "yocto", -24},
	{"z", "zepto", -21},
	{"a", "atto", -18},
	{"f", "femto", -15},
	{"p", "pico", -12},
	{"n", "nano", -9},
	{"µ", "micro", -6},
	{"m", "milli", -3},
	{"c", "centi", -2},
	{"d", "deci", -1},
	{"da", "deca", 1},
	{"h", "hecto", 2},
	{"k", "kilo", 3},
	{"M", "mega", 6},
	{"G", "giga", 9},
	{"T", "tera", 12},
	{"P", "peta", 15},
	{"E", "exa", 18},
	{"Z", "zetta", 21},
	{"Y", "yotta", 24},
	{"R", "ronna", 27},
	{"Q", "quetta", 30},
}

// microSpellings are the ways to write micro: the letter u, the micro sign
// (U+00B5, which is written back) and the Greek letter mu (U+03BC).
var microSpellings = [...]string{"u", "µ", "μ"}

const microIndex = 9

// prefixAt returns what is left of text behind the prefix of the given index,
// and whether text begins with that prefix and goes on.
func prefixAt(text string, index int) (rest string, ok bool) {
	cut := func(symbol string) bool {
		if len(text) > len(symbol) && text[:len(symbol)] == symbol {
			rest = text[len(symbol):]
			return true
		}
		return false
	}
	if index != microIndex {
		return rest, cut(prefixes[index].symbol)
	}
	for _, symbol := range microSpellings {
		if cut(symbol) {
			return rest, true
		}
	}
	return "", false
}
