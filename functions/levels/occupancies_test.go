package levels

import (
	"math"
	"strings"
	"testing"

	"plumbrule/engine/law"
)

// shares works out a list-valued law as the engine does: what all items share,
// then each.
func shares(t *testing.T, ladder law.Argument, temperature, first float64) []float64 {
	t.Helper()
	arguments := []law.Argument{ladder, number(temperature), number(first)}
	each := occupanciesLaw.Result.Each
	n, wrong := each.Count(arguments)
	if wrong != "" {
		t.Fatal(wrong)
	}
	all, shared := make([]float64, n), make([]float64, 1)
	each.Shared(shared, arguments, &law.Work{})
	for k := range all {
		with := append(append([]law.Argument(nil), arguments...), number(float64(k)), number(shared[0]))
		each.Item(all[k:k+1], with, &law.Work{})
	}
	return all
}

// TestOccupanciesAreThoseOfEachLevel demands the bits of occupancy of every
// share, and that the shares of all levels add up to one, however cold or hot.
func TestOccupanciesAreThoseOfEachLevel(t *testing.T) {
	temperatures := []float64{1e-3, 0.04, 1, 4.2, 77, 298.15, 5000, 1e6, 1e8}
	for _, test := range []struct {
		name   string
		ladder law.Argument
		first  float64
	}{
		{"three levels", ladderOf(kelvin(0, 228, 326), []float64{5, 3, 1}), 0},
		{"levels in no order", ladderOf(kelvin(30, -7, 2, 0), []float64{2, 1, 4, 6}), 0},
		{"spin in a field", made(spinLevelsLaw, number(2), number(3.5), number(1.5)), 0},
		{"nucleus in a field", made(nuclearSpinLevelsLaw, word("27Al"), number(9.4)), 0},
		{"oxygen", made(atomLaw, word("O I"), word("all")), 0},
		{"shifted", made(shiftLaw, ladderOf(kelvin(0, 10), []float64{1, 1}), number(kelvin(500)[0])), 0},
		{"oscillator", oscillatorOf(kelvin(300)[0]), 7},
		{"rotor", rotorOf(kelvin(2)[0], 1), 12},
		{"vibrating rotor", ladders()["hydrogen"], 9},
	} {
		for _, temperature := range temperatures {
			var sum total
			all := shares(t, test.ladder, temperature, test.first)
			for n, share := range all {
				if want := one(occupancyLaw, test.ladder, number(float64(n)), number(temperature)); math.Float64bits(share) != math.Float64bits(want) && !(math.IsNaN(share) && math.IsNaN(want)) {
					t.Fatalf("%s at %v K: level %d has the share %v, occupancy gives %v", test.name, temperature, n, share, want)
				}
				sum.add(share)
			}
			if got := sum.value(); test.first == 0 && !(math.Abs(got-1) <= 4e-16) {
				t.Errorf("%s at %v K: the %d shares add up to 1 %+.2g", test.name, temperature, len(all), got-1)
			}
		}
	}
}

// TestCountOfOccupancies fixes what is said of ladders whose levels are not
// counted before the first row.
func TestCountOfOccupancies(t *testing.T) {
	row := law.Argument{} // a number of the row
	for _, test := range []struct {
		name   string
		ladder law.Argument
		first  law.Argument
		levels int
		wrong  string
	}{
		{"list", ladderOf(kelvin(0, 1, 2), []float64{1, 1, 1}), number(0), 3, ""},
		{"first of a list", ladderOf(kelvin(0, 1, 2), []float64{1, 1, 1}), number(2), 2, ""},
		{"energies of the row", made(ladderLaw, law.Argument{Items: []law.Argument{row, row}}, law.Argument{Items: []law.Argument{number(1), row}}), number(0), 2, ""},
		{"field of the row", made(spinLevelsLaw, number(2), number(1.5), row), number(0), 4, ""},
		{"spin of the row", made(spinLevelsLaw, number(2), row, number(1)), number(0), 0, "not known before the first row"},
		{"rotor", rotorOf(kelvin(2)[0], 1), number(0), 0, "it has no end"},
		{"first of a rotor", rotorOf(kelvin(2)[0], 1), number(20), 20, ""},
		{"joined", made(combineLaw, oscillatorOf(1), oscillatorOf(2)), number(3), 0, "independent"},
		{"too many", ladderOf(kelvin(0, 1), []float64{1, 1}), number(3), 0, "only 2 levels"},
		{"half a level", ladderOf(kelvin(0, 1), []float64{1, 1}), number(1.5), 0, "whole number"},
		{"first of the row", ladderOf(kelvin(0, 1), []float64{1, 1}), row, 0, "before the first row"},
	} {
		levels, wrong := countOccupancies([]law.Argument{test.ladder, row, test.first})
		if levels != test.levels || (wrong == "") != (test.wrong == "") || !strings.Contains(wrong, test.wrong) {
			t.Errorf("%s: %d, %q", test.name, levels, wrong)
		}
	}
}
