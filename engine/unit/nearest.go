package unit

import (
	"strings"
	"unicode/utf8"
)

// respellings are common writings that are no unit of ours, with what to write
// instead. Names of units are found without them.
var respellings = [...][2]string{
	{"amp", "A"}, {"amps", "A"}, {"angstroms", "Å"}, {"atmos", "atm"}, {"atmosphere", "atm"}, {"atmospheres", "atm"},
	{"BTU", "Btu"}, {"BTUs", "Btu"}, {"btu", "Btu"}, {"bars", "bar"},
	{"cc", "cm^3"}, {"ccm", "cm^3"}, {"celsius", "degC"}, {"Celsius", "degC"},
	{"centigrade", "degC"}, {"cfm", "ft^3/min"}, {"cfs", "ft^3/s"}, {"cft", "ft^3"},
	{"cu", "m^3"}, {"cuft", "ft^3"}, {"cbm", "m^3"}, {"cps", "1/s"}, {"cusec", "ft^3/s"},
	{"day", "d"}, {"days", "d"}, {"degs", "deg"}, {"degrees", "deg"}, {"deg_C", "degC"},
	{"deg_F", "degF"}, {"degc", "degC"}, {"degf", "degF"}, {"degK", "K"}, {"degk", "K"},
	{"Deg", "deg"}, {"Eh", "hartree"}, {"E_h", "hartree"}, {"Ha", "hartree"},
	{"fahrenheit", "degF"}, {"Fahrenheit", "degF"}, {"feet", "ft"}, {"foot", "ft"},
	{"fath", "fathom"}, {"fathoms", "fathom"}, {"ftm", "fathom"}, {"fps", "ft/s"},
	{"ftlb", "ft lbf"}, {"ft_lb", "ft lbf"}, {"ftlbf", "ft lbf"}, {"fpm", "ft/min"},
	{"gauß", "gauss"}, {"gm", "g"}, {"gms", "g"}, {"gpd", "gal/d"},
	{"grad", "gon"}, {"gallons", "gal"}, {"hr", "h"}, {"hrs", "h"}, {"hour", "h"}, {"hours", "h"},
	{"HP", "hp"}, {"inch", "in"}, {"inches", "in"}, {"kelvins", "K"}, {"Kelvin", "K"},
	{"Kg", "kg"}, {"KG", "kg"}, {"kgs", "kg"}, {"kilo", "kg"}, {"kilos", "kg"},
	{"Km", "km"}, {"KM", "km"}, {"kph", "km/h"}, {"kmh", "km/h"}, {"kmph", "km/h"}, {"Kj", "kJ"}, {"KJ", "kJ"},
	{"kpa", "kPa"}, {"KPa", "kPa"}, {"Kpa", "kPa"}, {"kts", "kn"}, {"knots", "kn"},
	{"kwh", "kWh"}, {"KWh", "kWh"}, {"kw", "kW"}, {"KW", "kW"}, {"lbs", "lb"}, {"lbm", "lb"}, {"pounds", "lb"},
	{"Lit", "L"}, {"lit", "L"}, {"ltr", "L"}, {"liters", "L"}, {"litres", "L"}, {"lpm", "L/min"}, {"LPM", "L/min"},
	{"Mpa", "MPa"}, {"mpa", "MPa"}, {"MPA", "MPa"}, {"mins", "min"},
	{"mph", "mi/h"}, {"mps", "m/s"}, {"meter", "m"}, {"meters", "m"}, {"metres", "m"}, {"mtr", "m"}, {"mts", "m"},
	{"mile", "mi"}, {"miles", "mi"}, {"mcg", "µg"}, {"microns", "µm"},
	{"M", "mol/L"}, {"mM", "mmol/L"}, {"uM", "µmol/L"}, {"amu", "u"}, {"AMU", "u"}, {"dalton", "Da"},
	{"NM", "nmi"}, {"naut", "nmi"}, {"nmile", "nmi"}, {"OZ", "oz"}, {"ozs", "oz"},
	{"pa", "Pa"}, {"PSI", "psi"}, {"Psi", "psi"}, {"PSIA", "psia"}, {"PSIG", "psig"},
	{"psf", "lbf/ft^2"}, {"pcf", "lb/ft^3"}, {"percent", "%"}, {"pct", "%"}, {"permil", "‰"}, {"permille", "‰"},
	{"PPM", "ppm"}, {"ppmv", "ppm"}, {"ppbv", "ppb"}, {"RPM", "rpm"}, {"rps", "1/s"}, {"rankine", "degR"},
	{"revs", "rev"}, {"sec", "s"}, {"secs", "s"}, {"seconds", "s"}, {"scfm", "ft^3/min"}, {"sqft", "ft^2"},
	{"sqm", "m^2"}, {"sqin", "in^2"}, {"TORR", "torr"}, {"tonnes", "t"}, {"turn", "rev"}, {"usec", "µs"},
	{"msec", "ms"}, {"nsec", "ns"}, {"volt", "V"}, {"volts", "V"}, {"watts", "W"}, {"wt%", "%"}, {"vol%", "%"},
	{"yards", "yd"}, {"yds", "yd"}, {"year", "yr"}, {"years", "yr"}, {"yrs", "yr"}, {"week", "wk"}, {"weeks", "wk"},
	{"wavenumber", "cm^-1"}, {"wn", "cm^-1"},
}

// Nearest returns what to write in place of an unknown unit symbol, or "" where
// nothing is near. It tries common other spellings, names of units, a power
// without its sign (m3), other letter case, and then the nearest symbol by
// edit distance.
func Nearest(text string) string {
	if text == "" || len(text) > MaximumLength || !utf8.ValidString(text) {
		return ""
	}
	return shared().nearest(text)
}

func (l *library) nearest(text string) string {
	for _, pair := range respellings {
		if pair[0] == text {
			return pair[1]
		}
	}
	if powered := l.powerWithoutSign(text); powered != "" {
		return powered
	}
	if named := l.byName(text); named != "" {
		return named
	}
	if end := len(text) - 1; end > 0 && (text[end] == 'a' || text[end] == 'g') {
		marked := text[:end] + "(" + text[end:] + ")"
		if _, ok := l.find(marked); ok {
			return marked
		}
	}
	return l.byDistance(text)
}

// powerWithoutSign turns m3 into m^3, and sec2 into s^2.
func (l *library) powerWithoutSign(text string) string {
	stem := strings.TrimRight(text, "0123456789")
	power := text[len(stem):]
	if stem == "" || power == "" || len(power) > 2 {
		return ""
	}
	if _, ok := l.find(stem); !ok {
		for _, pair := range respellings {
			if pair[0] == stem && !strings.ContainsAny(pair[1], "/^ ") {
				return pair[1] + "^" + power
			}
		}
		return ""
	}
	return stem + "^" + power
}

// byName finds a unit by its name, in either spelling of metre and litre, in
// the plural, with the name of a prefix before it.
func (l *library) byName(text string) string {
	name := plainName(text)
	for i := range l.units {
		if plainName(l.units[i].name) == name {
			return l.units[i].symbol
		}
	}
	for i := 1; i < len(prefixes); i++ {
		rest, ok := strings.CutPrefix(name, prefixes[i].name)
		if !ok {
			continue
		}
		for j := range l.units {
			if l.units[j].prefixes && plainName(l.units[j].name) == rest {
				return prefixes[i].symbol + l.units[j].symbol
			}
		}
	}
	return ""
}

// plainName brings a name to lower case, singular and British spelling.
func plainName(name string) string {
	name = strings.ToLower(name)
	if len(name) > 3 {
		name = strings.TrimSuffix(name, "s")
	}
	for _, ending := range [...][2]string{{"meter", "metre"}, {"liter", "litre"}} {
		if strings.HasSuffix(name, ending[0]) {
			name = name[:len(name)-len(ending[0])] + ending[1]
		}
	}
	return name
}

// byDistance finds the symbol, bare or with a common prefix, that takes the
// fewest edits; a change of letter case counts least. At most one edit in three
// letters is taken for a slip, and single letters are too short to guess from.
func (l *library) byDistance(text string) string {
	const edit = 4 // a change of case costs 1
	letters := []rune(text)
	if len(letters) > 24 {
		return ""
	}
	limit := len(letters) / 3 * edit
	if len(letters) == 2 {
		limit = 2 // letter case only
	}
	best, least := "", limit+1
	consider := func(symbol string) {
		if distance := editDistance(letters, []rune(symbol), edit, least); distance < least ||
			distance == least && best != "" && (len(symbol) < len(best) || len(symbol) == len(best) && symbol < best) {
			best, least = symbol, distance
		}
	}
	// longer words are worth comparing with names and other spellings too
	word := []rune(plainName(text))
	stands := func(name, symbol string) {
		if len(word) < 5 {
			return
		}
		if distance := editDistance(word, []rune(name), edit, least); distance < least {
			best, least = symbol, distance
		}
	}
	for _, pair := range respellings {
		stands(pair[0], pair[1])
	}
	for i := range l.units {
		u := &l.units[i]
		name := plainName(u.name)
		stands(name, u.symbol)
		consider(u.symbol)
		for alias := range strings.FieldsSeq(u.aliases) {
			consider(alias)
		}
		if u.shortMark {
			consider(u.symbol + "a")
			consider(u.symbol + "g")
		}
		if !u.prefixes {
			continue
		}
		for i := 1; i < len(prefixes); i++ {
			p := &prefixes[i]
			if p.power < -9 || p.power > 9 {
				continue // too rare to be meant by a slip
			}
			stands(p.name+name, p.symbol+u.symbol)
			if _, refused := refusal(p.symbol + u.symbol); !refused {
				consider(p.symbol + u.symbol)
			}
		}
	}
	return best
}

// editDistance is the distance of Damerau and Levenshtein with adjacent
// transpositions (optimal string alignment): inserting, deleting and replacing
// cost edit, swapping one less, a change of letter case 1. It may stop once the
// distance is above cutoff.
func editDistance(a, b []rune, edit, cutoff int) int {
	if difference := len(a) - len(b); max(difference, -difference)*edit > cutoff {
		return cutoff + 1
	}
	rows := make([]int, 3*(len(b)+1))
	before, last, row := rows[:len(b)+1], rows[len(b)+1:2*(len(b)+1)], rows[2*(len(b)+1):]
	for j := range last {
		last[j] = j * edit
	}
	for i := 1; i <= len(a); i++ {
		row[0] = i * edit
		for j := 1; j <= len(b); j++ {
			cost := edit
			switch {
			case a[i-1] == b[j-1]:
				cost = 0
			case lower(a[i-1]) == lower(b[j-1]):
				cost = 1
			}
			row[j] = min(last[j]+edit, row[j-1]+edit, last[j-1]+cost)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				row[j] = min(row[j], before[j-2]+edit-1)
			}
		}
		before, last, row = last, row, before
	}
	return last[len(b)]
}

// lower returns the lower case of an ASCII letter.
func lower(r rune) rune {
	if r >= 'A' && r <= 'Z' {
		return r + ('a' - 'A')
	}
	return r
}
