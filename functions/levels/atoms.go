package levels

import (
	_ "embed"
	"encoding/binary"
	"strconv"
	"strings"
	"sync"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

//go:embed data/atoms.bin
var atomLevels string

//go:embed data/atoms.txt
var atomIndex string

// reciprocal is the energy of 1 cm^-1 in J.
const reciprocal = nature.PlanckConstant * nature.SpeedOfLight * 100

// atomRow is one atom or ion of the table.
type atomRow struct {
	name     string  // "Fe I" is neutral iron, "Fe II" the ion with one charge
	levels   int     // how many
	decimals int     // of the energies in cm^-1
	from     int     // its first byte in the levels
	limit    float64 // first ionisation limit in cm^-1
}

// atomRows lists the atoms and ions of the table.
var atomRows = sync.OnceValue(func() []atomRow {
	var rows []atomRow
	at := 0
	for line := range strings.Lines(atomIndex) {
		fields := strings.Split(strings.TrimSpace(line), "|")
		if len(fields) != 4 {
			continue
		}
		row := atomRow{name: fields[0], from: at, limit: readNumber(fields[3])}
		row.levels, _ = strconv.Atoi(fields[1])
		row.decimals, _ = strconv.Atoi(fields[2])
		rows = append(rows, row)
		at = skipLevels(at, row.levels)
	}
	return rows
})

// readNumber reads a number of an embedded table; an empty field is 0.
func readNumber(text string) float64 {
	x, err := strconv.ParseFloat(text, 64)
	if err != nil {
		return 0
	}
	return x
}

// step reads one level: how far it lies above the one before, in units of the
// last decimal, and its degeneracy byte.
func step(at int) (height uint64, states byte, next int) {
	var packed [binary.MaxVarintLen64]byte
	n := copy(packed[:], atomLevels[at:])
	height, used := binary.Uvarint(packed[:n])
	if used <= 0 || at+used >= len(atomLevels) {
		return 0, 0, len(atomLevels)
	}
	return height, atomLevels[at+used], at + used + 1
}

func skipLevels(at, levels int) int {
	for range levels {
		_, _, at = step(at)
	}
	return at
}

func atomOf(name string) *atomRow {
	rows := atomRows()
	for i := range rows {
		if rows[i].name == name {
			return &rows[i]
		}
	}
	return nil
}

func atomNames() []string {
	rows := atomRows()
	names := make([]string, len(rows))
	for i := range rows {
		names[i] = rows[i].name
	}
	return names
}

const atomSource = "Kramida A., Ralchenko Yu., Reader J. and NIST ASD Team, NIST Atomic Spectra Database, version 5, levels with known J, " +
	"as used by Barklem P.S., Collet R. (2016) Astron. Astrophys. 588, A96"

var atomLaw = &law.Law{
	Name:  "atom",
	Group: group,
	Gives: "the ladder of the known levels of an atom or ion, counted from its ground level",
	Parameters: []law.Parameter{
		{Name: "species", Meaning: "symbol and stage of ionisation: \"Fe I\" is neutral iron, \"Fe II\" its ion with one charge", Type: law.Text,
			CheckText: func(text string) string { return checkName("atom or ion", text, atomNames()) }},
		{Name: "levels", Meaning: "all known ones, or only those below the first ionisation limit", Type: law.Text, Default: `"all"`, Choices: []string{"all", "bound"}},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "levels E_i with 2 J_i + 1 states each",
	Source:   atomSource,
	Caution: "Known levels only, some of them calculated or doubtful; nuclear spin is left out. Above about 8000 K, for alkalis above 2500 K, the sum depends on how many of the high levels " +
		"near the limit are counted, which in a gas depends on its density.",
	Examples: []law.Example{
		{Formula: `partition_sum(atom("O I"), 300[K])`, Gives: "6.74"},
		{Formula: `partition_sum(atom("Fe I"), 130[K])`, Gives: "9.07"},
	},
}

func buildAtom(set *levelSet, items []law.Argument, _ []float64) bool {
	row := atomOf(items[0].Text)
	if row == nil {
		return false
	}
	bound := items[1].Text == "bound"
	unit := 1.0
	for range row.decimals {
		unit *= 10
	}
	energy, at := uint64(0), row.from
	for range row.levels {
		var height uint64
		var states byte
		height, states, at = step(at)
		energy += height
		if bound && states&1 == 1 {
			continue
		}
		// The division gives the energy in cm^-1 as rightly rounded as the
		// source's text itself.
		if !set.add(float64(energy)/unit*reciprocal, float64(states>>1)) {
			return false
		}
	}
	return true
}
