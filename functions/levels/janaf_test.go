package levels

import (
	"encoding/csv"
	"os"
	"regexp"
	"strconv"
	"testing"
)

// TestDiatomicsNearTheTables holds how far the entropies and heat capacities of
// diatomic gases may lie from the JANAF tables between 100 and 3000 K, in
// J/(mol K). The conformance run holds each row to its own tolerance; this
// holds the tolerances. The aim is 0.1, and 0.02 where the constants allow.
func TestDiatomicsNearTheTables(t *testing.T) {
	const (
		met      = ""
		levels   = "the constants describe the low levels; the table counts measured ones up to dissociation"
		weakBond = "levels near dissociation, a twentieth of D_0/k_B and above, which the table leaves out or counts otherwise"
		doublet  = "the splitting of the 2Pi state changes with v and J, the table takes one for all"
	)
	bounds := map[string]struct {
		entropy, capacity float64
		why               string
	}{
		"n2":  {0.005, 0.003, met},
		"co":  {0.009, 0.009, met},
		"cn":  {0.010, 0.006, met},
		"cl2": {0.010, 0.073, met},
		"c2":  {0.022, 0.040, met},
		"o2":  {0.041, 0.102, levels},
		"oh":  {0.029, 0.115, doublet},
		"hcl": {0.070, 0.19, levels},
		"hf":  {0.079, 0.23, levels},
		"no":  {0.13, 0.67, doublet},
		"d2":  {0.12, 0.30, levels},
		"hd":  {0.22, 0.63, levels},
		"h2":  {0.43, 1.21, levels},
		"f2":  {0.56, 1.87, weakBond},
		"i2":  {2.64, 6.91, weakBond},
		"na2": {2.75, 9.17, weakBond},
	}
	file, err := os.Open("../../testdata/conformance/thermochemistry-molecules.csv")
	if err != nil {
		t.Fatal(err)
	}
	defer file.Close()
	table, err := csv.NewReader(file).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	name := regexp.MustCompile(`^janaf-([a-z0-9]+)-(\d+)(?:p\d+)?-(s|cp)$`)
	seen := map[string]int{}
	for _, row := range table {
		parts := name.FindStringSubmatch(row[0])
		if parts == nil {
			continue
		}
		bound, known := bounds[parts[1]]
		kelvins, _ := strconv.Atoi(parts[2])
		if !known || kelvins < 100 || kelvins > 3000 {
			continue
		}
		seen[parts[1]]++
		most := bound.entropy
		if parts[3] == "cp" {
			most = bound.capacity
		}
		if half, err := strconv.ParseFloat(row[4], 64); err != nil || half > most {
			t.Errorf("%s: %s lies further from the table than %v", row[0], row[4], most)
		}
		if most > 0.1 && bound.why == "" {
			t.Errorf("%s misses the aim without a reason", parts[1])
		}
	}
	for species := range bounds {
		if seen[species] < 8 {
			t.Errorf("%s has %d rows", species, seen[species])
		}
	}
}
