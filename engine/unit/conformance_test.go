package unit

import (
	"encoding/csv"
	"math"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"testing"
)

// table reads a table of published factors and demands exactly these columns.
func table(t *testing.T, name string, columns ...string) [][]string {
	t.Helper()
	file, err := os.Open(filepath.Join("testdata", name))
	if err != nil {
		t.Fatal(err)
	}
	defer file.Close()
	records, err := csv.NewReader(file).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	if !slices.Equal(records[0], columns) {
		t.Fatalf("%s has the columns %q, want %q", name, records[0], columns)
	}
	seen := map[string]bool{}
	for _, record := range records[1:] {
		if seen[record[0]] {
			t.Errorf("%s: %s stands twice", name, record[0])
		}
		seen[record[0]] = true
	}
	return records[1:]
}

// number reads a cell.
func number(t *testing.T, cell string) float64 {
	t.Helper()
	x, err := strconv.ParseFloat(cell, 64)
	if err != nil {
		t.Fatal(err)
	}
	return x
}

// Every published factor is met within half a unit of its last printed digit,
// and every exact one to the bit.
func TestPublishedFactors(t *testing.T) {
	rows := table(t, "units.csv", "id", "unit", "factor", "half_unit", "exact", "source", "provenance")
	if len(rows) < 200 {
		t.Fatalf("only %d rows", len(rows))
	}
	for _, row := range rows {
		t.Run(row[0], func(t *testing.T) {
			u, err := Parse(row[1])
			if err != nil {
				t.Fatalf("%s: %v", row[1], err)
			}
			before, multiply, divide := u.Affine()
			factor := multiply / divide
			if u.Kind() != TemperaturePoint && before != 0 {
				t.Errorf("%s shifts its zero by %v", row[1], before)
			}
			printed, half := number(t, row[2]), number(t, row[3])
			// half the spacing of float64 is the printed number's own rounding
			if difference := math.Abs(factor - printed); difference > half+math.Abs(printed)*0x1p-53 {
				t.Errorf("%s: factor %v, printed %v, off by %v of at most %v", row[1], factor, printed, difference, half)
			}
			if row[4] != "" && factor != number(t, row[4]) {
				t.Errorf("%s: factor %v is not exactly %v", row[1], factor, row[4])
			}
		})
	}
}

// Conversions from unit to unit, temperatures with their shifted zeros among
// them.
func TestPublishedConversions(t *testing.T) {
	rows := table(t, "unit-conversions.csv", "id", "value", "from", "expected", "to", "half_unit", "source", "provenance")
	if len(rows) < 90 {
		t.Fatalf("only %d rows", len(rows))
	}
	for _, row := range rows {
		t.Run(row[0], func(t *testing.T) {
			from, err := Parse(row[2])
			if err != nil {
				t.Fatalf("%s: %v", row[2], err)
			}
			to, err := Parse(row[4])
			if err != nil {
				t.Fatalf("%s: %v", row[4], err)
			}
			if from.Dimension() != to.Dimension() {
				t.Fatalf("%s is %v, %s is %v", row[2], from.Dimension(), row[4], to.Dimension())
			}
			got, want, half := to.FromSI(from.ToSI(number(t, row[1]))), number(t, row[3]), number(t, row[5])
			if math.Abs(got-want) > half {
				t.Errorf("%s %s = %v %s, want %v within %v", row[1], row[2], got, row[4], want, half)
			}
		})
	}
}
