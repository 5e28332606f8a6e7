package unit

import (
	"slices"
	"strings"
	"testing"
)

// Every definition can be worked out, and no spelling stands for two units.
func TestDefinitions(t *testing.T) {
	l := shared()
	seen := map[string]string{}
	for i := range l.units {
		u := &l.units[i]
		if u.state != resolved {
			t.Errorf("%s: the definition %s cannot be worked out", u.symbol, u.meaning())
		}
		if u.source == "" || u.name == "" {
			t.Errorf("%s lacks a name or a source", u.symbol)
		}
		for _, spelling := range append(strings.Fields(u.aliases), u.symbol) {
			if other, twice := seen[spelling]; twice {
				t.Errorf("%s stands for %s and %s", spelling, other, u.symbol)
			}
			seen[spelling] = u.symbol
			if _, is := refusal(spelling); is {
				t.Errorf("%s is refused and defined", spelling)
			}
			if u.symbol == "1" {
				continue
			}
			p, err := Parse(spelling)
			if err != nil {
				t.Errorf("%s: %v", spelling, err)
			} else if p.Text() != u.symbol {
				t.Errorf("%s is written back as %s, want %s", spelling, p.Text(), u.symbol)
			}
		}
	}
}

// What is listed is what is used: number times unit of the meaning is the factor.
func TestMeaningIsTheFactor(t *testing.T) {
	for _, entry := range All() {
		u, err := Parse(entry.Symbol)
		if err != nil {
			t.Errorf("%s: %v", entry.Symbol, err)
			continue
		}
		if entry.Meaning == "base unit of the SI" {
			if u.ToSI(1) != 1 || u.FromSI(1) != 1 {
				t.Errorf("%s is not coherent", entry.Symbol)
			}
			continue
		}
		number, of, found := "", "", false
		for at := len(entry.Meaning); at >= 0 && !found; at-- { // the longest text that is a number
			if _, ok := parseNumber(entry.Meaning[:at]); ok && (at == len(entry.Meaning) || entry.Meaning[at] == ' ') {
				number, of, found = entry.Meaning[:at], strings.TrimSpace(entry.Meaning[at:]), true
			}
		}
		if of == "" {
			of = "1"
		}
		definition, err := Parse(of)
		if !found || err != nil {
			t.Errorf("%s: the meaning %q is not read: %v", entry.Symbol, entry.Meaning, err)
			continue
		}
		if definition.Dimension() != u.Dimension() {
			t.Errorf("%s: the meaning %q has another dimension", entry.Symbol, entry.Meaning)
		}
		f, _ := parseNumber(number)
		x, _, _ := f.value()
		got, want := u.ToSI(1)-u.ToSI(0), x*(definition.ToSI(1)-definition.ToSI(0))
		if difference := got - want; difference > 1e-15*want+1e-12*u.ToSI(0) || -difference > 1e-15*want+1e-12*u.ToSI(0) {
			t.Errorf("%s: %v, but %s is %v", entry.Symbol, got, entry.Meaning, want)
		}
	}
}

// customaryWins are spellings that could also be read as a prefix and a unit;
// the tables give them another meaning, known to everybody.
var customaryWins = []string{
	"at", // technical atmosphere, not attotonne
	"ct", // carat, not centitonne
	"ft", // foot, not femtotonne
	"pt", // pint, not picotonne
	"qt", // quart, not quectotonne
	"kg", // kilogram, which is both
}

// No other spelling can be read in two ways.
func TestPrefixesAreUnambiguous(t *testing.T) {
	l := shared()
	spellings := make([]string, 0, len(l.bySymbol))
	for spelling := range l.bySymbol {
		spellings = append(spellings, spelling)
	}
	slices.Sort(spellings)
	readings := map[string][]string{}
	for _, spelling := range spellings {
		readings[spelling] = append(readings[spelling], "itself")
	}
	for _, spelling := range spellings {
		if !l.units[l.bySymbol[spelling]].prefixes {
			continue
		}
		for i := 1; i < len(prefixes); i++ {
			writings := []string{prefixes[i].symbol}
			if i == microIndex {
				writings = microSpellings[:]
			}
			for _, writing := range writings {
				readings[writing+spelling] = append(readings[writing+spelling], prefixes[i].name+" "+l.units[l.bySymbol[spelling]].name)
			}
		}
	}
	for text, ways := range readings {
		if known := slices.Contains(customaryWins, text); known && len(ways) < 2 {
			t.Errorf("%s can be read in one way only", text)
		} else if len(ways) > 1 && !known {
			t.Errorf("%s may be %s", text, strings.Join(ways, " or "))
		}
	}
}

// All SI units take all prefixes.
func TestPrefixesOfSI(t *testing.T) {
	symbols := strings.Fields("m g s A K mol cd Hz N Pa J W C V F Ω S Wb T H lm lx Bq Gy Sv kat rad sr")
	for _, symbol := range symbols {
		whole, err := Parse(symbol)
		if err != nil {
			t.Fatal(err)
		}
		for _, p := range prefixes[1:] {
			text := p.symbol + symbol
			if text == "cd" { // centi is no prefix of the day, but the text is a candela
				continue
			}
			u, err := Parse(text)
			if err != nil {
				t.Errorf("%s: %v", text, err)
				continue
			}
			f := tenFactor(p.power)
			g, _ := parseDecimal("1e-3")
			if symbol == "g" {
				f.timesPower(&g, wholePower)
			}
			multiply, divide, _ := f.split()
			if _, m, d := u.Affine(); m != multiply || d != divide || u.Dimension() != whole.Dimension() {
				t.Errorf("%s is %v/%v %v", text, m, d, u.Dimension())
			}
			if u.Text() != text {
				t.Errorf("%s is written back as %s", text, u.Text())
			}
		}
	}
	for _, writing := range microSpellings {
		if u, err := Parse(writing + "m"); err != nil || u.Text() != "µm" || u.FromSI(1) != 1e6 {
			t.Errorf("%sm: %v, %v", writing, u, err)
		}
	}
}

func TestAllIsSorted(t *testing.T) {
	entries := All()
	if len(entries) < 250 {
		t.Errorf("only %d units", len(entries))
	}
	if !slices.IsSortedFunc(entries, func(a, b Entry) int {
		if c := strings.Compare(a.Group, b.Group); c != 0 {
			return c
		}
		return strings.Compare(a.Symbol, b.Symbol)
	}) {
		t.Error("the list of units is not sorted")
	}
	entries[0].Symbol = "changed"
	if All()[0].Symbol == "changed" {
		t.Error("the list of units can be changed from outside")
	}
}

// What is refused says why, and what it suggests is a unit.
func TestRefused(t *testing.T) {
	for _, symbol := range strings.Fields("dB B Np dBA dBm bel decibel neper mb ly ton tons cwt ata R st a ppt ppq") {
		answer, ok := refusal(symbol)
		if !ok || answer.message == "" {
			t.Errorf("%s is not refused", symbol)
		}
		_, err := Parse(symbol)
		e, isError := err.(*Error)
		if !isError || e.Message != answer.message || e.Suggestion != answer.suggestion {
			t.Errorf("%s: %v", symbol, err)
		}
		if answer.suggestion != "" {
			if _, err := Parse(answer.suggestion); err != nil {
				t.Errorf("%s suggests %s: %v", symbol, answer.suggestion, err)
			}
		}
	}
}

// A respelling is no unit already, and what it suggests is one.
func TestRespellings(t *testing.T) {
	l := shared()
	seen := map[string]bool{}
	for _, pair := range respellings {
		if seen[pair[0]] {
			t.Errorf("%s stands twice", pair[0])
		}
		seen[pair[0]] = true
		if a, ok := l.find(pair[0]); ok {
			t.Errorf("%s is the unit %s", pair[0], l.symbolText(a))
		}
		if _, is := refusal(pair[0]); is {
			t.Errorf("%s is refused: its respelling is never used", pair[0])
		}
		if _, err := Parse(pair[1]); err != nil {
			t.Errorf("%s suggests %s: %v", pair[0], pair[1], err)
		}
	}
}
