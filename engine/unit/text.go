package unit

// marks of a pressure.
const (
	unmarked = uint8(iota)
	absolute
	gauge
)

const (
	absoluteSuffix = "(a)"
	gaugeSuffix    = "(g)"
)

// atom is one named unit with its prefix, mark and power.
type atom struct {
	unit     int // index into the library
	prefix   int // index into prefixes
	mark     uint8
	twelfths int
}

// sameSymbol reports whether two atoms are the same unit to any power.
func (a atom) sameSymbol(b atom) bool {
	return a.unit == b.unit && a.prefix == b.prefix && a.mark == b.mark
}

// merged gathers equal symbols, at the place of the first, and drops those that
// cancel.
func merged(atoms []atom) []atom {
	var gathered []atom
	for _, a := range atoms {
		found := false
		for i := range gathered {
			if gathered[i].sameSymbol(a) {
				gathered[i].twelfths += a.twelfths
				found = true
				break
			}
		}
		if !found {
			gathered = append(gathered, a)
		}
	}
	kept := gathered[:0]
	for _, a := range gathered {
		if a.twelfths != 0 {
			kept = append(kept, a)
		}
	}
	return kept
}

// alone reports whether atoms are a single unit to the power of one.
func alone(atoms []atom) bool {
	return len(atoms) == 1 && atoms[0].twelfths == wholePower
}

// symbolText writes an atom without its power.
func (l *library) symbolText(a atom) string {
	u := &l.units[a.unit]
	text := prefixes[a.prefix].symbol + u.symbol
	switch {
	case a.mark == absolute && u.shortMark:
		return text + "a"
	case a.mark == gauge && u.shortMark:
		return text + "g"
	case a.mark == absolute:
		return text + absoluteSuffix
	case a.mark == gauge:
		return text + gaugeSuffix
	}
	return text
}

// text writes merged atoms in canonical form: what has positive powers, then
// "/" and the rest with positive powers, in brackets where there are several:
// "W/(m K)", "1/s". Wavenumbers keep their customary "cm^-1".
func (l *library) text(atoms []atom) string {
	over, under, below := "", "", 0
	for _, a := range atoms {
		if a.twelfths > 0 {
			if over != "" {
				over += " "
			}
			over += l.symbolText(a) + powerText(a.twelfths)
			continue
		}
		if under != "" {
			under += " "
		}
		under += l.symbolText(a) + powerText(-a.twelfths)
		below++
	}
	switch {
	case below == 0 && over == "":
		return "1"
	case below == 0:
		return over
	case over == "" && under == "cm":
		return "cm^-1"
	case over == "":
		over = "1"
	}
	if below > 1 {
		return over + "/(" + under + ")"
	}
	return over + "/" + under
}
