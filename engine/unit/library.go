package unit

import (
	"slices"
	"strings"
	"sync"
)

// definition is one named unit as the tables give it. Number and Of define it:
// one of the unit is Number times Of, as in "101325/760" "Pa". A base unit has
// no Of.
type definition struct {
	symbol  string
	name    string
	number  string // product of decimal numbers and pi, one "/" allowed
	of      string // unit text
	source  string
	aliases string // other spellings, split by blanks, read but never written
	note    string // a remark for the list of units

	prefixes   bool    // takes the SI prefixes
	pressure   bool    // may be marked absolute (a) or gauge (g)
	shortMark  bool    // the mark is written a, g without brackets
	kind       Kind    // the kind of the unit standing alone
	zero       float64 // added before multiplying, where the unit stands alone
	difference string  // unit of a difference, where the zero is shifted
	base       int     // 1 + place of the base quantity, for a base unit
}

// named is a definition with its factor and dimension worked out.
type named struct {
	definition
	group     string
	factor    factor
	dimension Dimension
	state     int8 // of being worked out
}

const (
	pending = int8(iota)
	resolving
	resolved
	broken
)

// library is every named unit and the ways to find it. It never changes once
// it is built.
type library struct {
	units    []named
	bySymbol map[string]int // symbols and aliases
}

// shared builds the library at its first use.
var shared = sync.OnceValue(buildLibrary)

// buildLibrary gathers the tables and works out every factor from its
// definition. A definition that cannot be worked out is left out of the index;
// a test demands that there is none.
func buildLibrary() *library {
	groups := []struct {
		name  string
		units []definition
	}{
		{"SI base", baseUnits()},
		{"SI derived", derivedUnits()},
		{"accepted with SI", acceptedUnits()},
		{"ratio", ratioUnits()},
		{"angle", angleUnits()},
		{"length", lengthUnits()},
		{"geopotential height", geopotentialUnits()},
		{"area", areaUnits()},
		{"volume", volumeUnits()},
		{"time", timeUnits()},
		{"speed and acceleration", motionUnits()},
		{"mass", massUnits()},
		{"force", forceUnits()},
		{"pressure", pressureUnits()},
		{"energy", energyUnits()},
		{"power", powerUnits()},
		{"temperature", temperatureUnits()},
		{"flow", flowUnits()},
		{"electricity and magnetism", electricUnits()},
		{"light", lightUnits()},
		{"radiation", radiationUnits()},
	}
	l := &library{bySymbol: make(map[string]int, 700)}
	for _, group := range groups {
		for _, d := range group.units {
			index := len(l.units)
			l.units = append(l.units, named{definition: d, group: group.name})
			l.bySymbol[d.symbol] = index
			for alias := range strings.FieldsSeq(d.aliases) {
				l.bySymbol[alias] = index
			}
		}
	}
	for i := range l.units {
		l.resolve(i)
	}
	for symbol, index := range l.bySymbol {
		if l.units[index].state != resolved {
			delete(l.bySymbol, symbol)
		}
	}
	return l
}

// resolve works out one unit, and before it those it is defined by.
func (l *library) resolve(index int) bool {
	u := &l.units[index]
	switch u.state {
	case resolved:
		return true
	case resolving, broken:
		return false
	}
	u.state = resolving
	if u.base > 0 {
		u.dimension = base(u.base - 1)
		u.state = resolved
		return true
	}
	u.state = broken
	number, ok := parseNumber(u.number)
	if !ok {
		return false
	}
	u.state = resolving
	atoms, problem := readAtoms(l, u.of)
	if problem == nil {
		u.factor, u.dimension, ok = l.compose(atoms)
	}
	if problem != nil || !ok || !u.factor.timesPower(&number, wholePower) {
		u.state = broken
		return false
	}
	u.state = resolved
	return true
}

// compose multiplies the factors and dimensions of atoms. It is false where a
// power is no whole number of twelfths or a unit is not worked out.
func (l *library) compose(atoms []atom) (f factor, d Dimension, ok bool) {
	ok = true
	for _, a := range atoms {
		if !l.resolve(a.unit) {
			return f, d, false
		}
		u := &l.units[a.unit]
		ten := tenFactor(prefixes[a.prefix].power)
		ok = f.timesPower(&ten, a.twelfths) && f.timesPower(&u.factor, a.twelfths) && ok
		power, sound := u.dimension.Power(a.twelfths, wholePower)
		ok = ok && sound
		d = d.Times(power)
	}
	return f, d, ok
}

// find returns the atom a symbol stands for, to the power of one.
func (l *library) find(symbol string) (atom, bool) {
	if a, ok := l.findUnmarked(symbol); ok {
		return a, true
	}
	mark := unmarked
	stem, long := symbol, false
	switch {
	case strings.HasSuffix(symbol, absoluteSuffix):
		stem, mark, long = symbol[:len(symbol)-len(absoluteSuffix)], absolute, true
	case strings.HasSuffix(symbol, gaugeSuffix):
		stem, mark, long = symbol[:len(symbol)-len(gaugeSuffix)], gauge, true
	case strings.HasSuffix(symbol, "a"):
		stem, mark = symbol[:len(symbol)-1], absolute
	case strings.HasSuffix(symbol, "g"):
		stem, mark = symbol[:len(symbol)-1], gauge
	default:
		return atom{}, false
	}
	a, ok := l.findUnmarked(stem)
	if !ok || !l.units[a.unit].pressure || !long && !l.units[a.unit].shortMark {
		return atom{}, false
	}
	a.mark = mark
	return a, true
}

// findUnmarked returns the atom of a symbol with or without a prefix. A symbol
// that is in the tables as it stands goes before one with a prefix; a refused
// symbol is none.
func (l *library) findUnmarked(symbol string) (atom, bool) {
	if index, ok := l.bySymbol[symbol]; ok {
		return atom{unit: index, twelfths: wholePower}, true
	}
	if _, refused := refusal(symbol); refused {
		return atom{}, false
	}
	for i := 1; i < len(prefixes); i++ {
		rest, ok := prefixAt(symbol, i)
		if !ok {
			continue
		}
		if index, ok := l.bySymbol[rest]; ok && l.units[index].prefixes {
			return atom{unit: index, prefix: i, twelfths: wholePower}, true
		}
	}
	return atom{}, false
}

// Entry describes one named unit, for lists.
type Entry struct {
	Symbol   string // as Text writes it
	Name     string
	Group    string
	Meaning  string // what one of it is, such as "101325/760 Pa"
	Source   string // of the definition
	Prefixes bool   // whether it takes the SI prefixes
	Aliases  string // other accepted spellings, split by blanks
	Note     string // what to know before using it, often empty
}

// All returns every named unit, sorted by group and symbol.
func All() []Entry {
	l := shared()
	entries := make([]Entry, len(l.units))
	for i := range l.units {
		u := &l.units[i]
		entries[i] = Entry{
			Symbol: u.symbol, Name: u.name, Group: u.group, Meaning: u.meaning(),
			Source: u.source, Prefixes: u.prefixes, Aliases: u.aliases, Note: u.note,
		}
	}
	slices.SortFunc(entries, func(a, b Entry) int {
		if order := strings.Compare(a.Group, b.Group); order != 0 {
			return order
		}
		return strings.Compare(a.Symbol, b.Symbol)
	})
	return entries
}

// meaning writes a definition for people.
func (d *definition) meaning() string {
	if d.base > 0 {
		return "base unit of the SI"
	}
	if d.number == "1" {
		if d.of == "1" {
			return "1"
		}
		return "1 " + d.of
	}
	if d.of == "1" {
		return d.number
	}
	return d.number + " " + d.of
}
