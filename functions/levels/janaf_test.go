package levels

import (
	"encoding/csv"
	"math"
	"os"
	"regexp"
	"strconv"
	"testing"

	"plumbrule/functions/nature"
)

// tabulated is one number of the NIST-JANAF tables (Chase M.W. (1998), 4th ed.).
type tabulated struct{ temperature, value float64 }

// janafTables reads, by species and quantity (cp, s, phi: J/(mol K); h: kJ/mol),
// the diatomic gases of the conformance table between 100 and 5000 K.
func janafTables(t *testing.T) map[string]map[string][]tabulated {
	t.Helper()
	file, err := os.Open("../../testdata/conformance/thermochemistry-molecules.csv")
	if err != nil {
		t.Fatal(err)
	}
	defer file.Close()
	rows, err := csv.NewReader(file).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	call := regexp.MustCompile(`^gas_[a-z_]+\("([A-Za-z0-9]+)", ([0-9.]+)\[K\]\)$`)
	quantityOf := regexp.MustCompile(`-(cp|s|phi|h)$`)
	tables := map[string]map[string][]tabulated{}
	for _, row := range rows[1:] {
		parts, which := call.FindStringSubmatch(row[1]), quantityOf.FindStringSubmatch(row[0])
		if parts == nil || which == nil || diatomicOf(parts[1]) == nil {
			continue
		}
		temperature, err := strconv.ParseFloat(parts[2], 64)
		value, err2 := strconv.ParseFloat(row[2], 64)
		if err != nil || err2 != nil {
			t.Fatal(row)
		}
		if temperature < 100 || temperature > 5000 {
			continue
		}
		if tables[parts[1]] == nil {
			tables[parts[1]] = map[string][]tabulated{}
		}
		tables[parts[1]][which[1]] = append(tables[parts[1]][which[1]], tabulated{temperature, value})
	}
	return tables
}

// gasQuantity works out one quantity of a gas as the tables have it.
func gasQuantity(species, which string, temperature float64) float64 {
	at, reference, bar := number(temperature), number(standardTemperature), number(1e5)
	switch which {
	case "cp":
		return one(gasHeatCapacityLaw, word(species), at)
	case "s":
		return one(gasEntropyLaw, word(species), at, bar)
	case "phi":
		return one(gasGibbsFunctionLaw, word(species), at, reference, bar)
	}
	return one(gasEnthalpyIncrementLaw, word(species), at, reference) / 1000
}

// TestDiatomicsNearTheTables holds how far each diatomic gas lies from the
// JANAF tables between 100 and 3000 K: the measured deviations, rounded up, with
// what the constants of 1973 cause (up to 0.002 in the entropy). The aim is 0.1
// J/(mol K), and 0.02 where the constants allow.
func TestDiatomicsNearTheTables(t *testing.T) {
	const (
		firstOrder = "the table has first-order corrections, see TestTablesOfFirstOrder"
		weakBond   = "levels near dissociation, see TestWeakBondsBetweenTheSums"
		unknown    = "not explained: the table's entropy at 298.15 K lies 0.025 below that of the levels, and nearer when hotter"
	)
	tables := janafTables(t)
	for _, test := range []struct {
		species       string
		cp, s, phi, h float64 // h in kJ/mol
		missed        string  // why the aim is missed
	}{
		{"N2", 0.0021, 0.0032, 0.0024, 0.0027, ""},
		{"CO", 0.0073, 0.0076, 0.0060, 0.0130, ""},
		{"CN", 0.0047, 0.0090, 0.0083, 0.0042, ""},
		{"D2", 0.0069, 0.0021, 0.0020, 0.0022, ""},
		{"H2", 0.0282, 0.0116, 0.0077, 0.0115, ""},
		{"HD", 0.0350, 0.0129, 0.0042, 0.0233, ""},
		{"C2", 0.0388, 0.0208, 0.0073, 0.0251, ""},
		{"NO", 0.0514, 0.0301, 0.0130, 0.0406, ""},
		{"Cl2", 0.0724, 0.0094, 0.0045, 0.0108, ""},
		{"OH", 0.1002, 0.0267, 0.0267, 0.0231, unknown},
		{"O2", 0.1010, 0.0396, 0.0120, 0.0687, firstOrder},
		{"HCl", 0.1549, 0.0557, 0.0137, 0.1038, firstOrder},
		{"HF", 0.1573, 0.0488, 0.0102, 0.1148, firstOrder},
		{"F2", 1.867, 0.5546, 0.1099, 1.3353, weakBond},
		{"I2", 6.902, 2.6259, 0.5486, 6.2321, weakBond},
		{"Na2", 9.157, 2.7432, 0.6892, 6.1621, weakBond},
	} {
		for which, most := range map[string]float64{"cp": test.cp, "s": test.s, "phi": test.phi, "h": test.h} {
			rows := 0
			for _, row := range tables[test.species][which] {
				if row.temperature > 3000 {
					continue
				}
				rows++
				if got := gasQuantity(test.species, which, row.temperature); !(math.Abs(got-row.value) <= most) {
					t.Errorf("%s, %s at %v K: %.5f, the table has %v, further than %v", test.species, which, row.temperature, got, row.value, most)
				}
			}
			if rows < 8 {
				t.Errorf("%s, %s: %d rows", test.species, which, rows)
			}
		}
		if missed := max(test.cp, test.s, test.phi) > 0.1; missed != (test.missed != "") {
			t.Errorf("%s: the aim is missed: %v, and why: %q", test.species, missed, test.missed)
		}
	}
}

// firstOrderSum gives ln Q of a rigid rotor and harmonic oscillator with the
// corrections of first order for stretching, rotation-vibration and
// anharmonicity (Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 7),
// summed over the electronic states.
func firstOrderSum(d *diatomic, temperature float64) float64 {
	sum, scale := 0.0, 1/(nature.BoltzmannConstant*temperature)
	ground := d.states[0].electronicState
	ground.scale(isotopeRatio(d.name))
	for i := range d.states {
		state := d.states[i].electronicState
		state.scale(isotopeRatio(d.name))
		base := 0.0
		if i > 0 {
			base = d.states[i].term + zeroPoint(&state) - zeroPoint(&ground)
		}
		_, stretching := state.turning(0)
		first := vibration(1, state.we, state.wexe, state.weye)
		turn := state.be - state.alpha/2
		u, y := first*scale, turn*scale
		q := d.states[i].degeneracy / y / -math.Expm1(-u) * (1 + y/3 + y*y/15)
		if d.equal {
			q /= 2
		}
		swings := math.Expm1(u)
		correction := 2*stretching/(turn*y) + state.alpha/turn/swings + 2*state.wexe/first*u/(swings*swings)
		sum += q * math.Exp(correction-base*scale)
	}
	return math.Log(sum)
}

// TestTablesOfFirstOrder shows where the deviations of O2, HCl and HF come from:
// with first-order corrections to the rigid rotor and harmonic oscillator the
// same constants give the tables several times closer than their levels do.
func TestTablesOfFirstOrder(t *testing.T) {
	tables := janafTables(t)
	for _, test := range []struct {
		species string
		most    float64 // of the heat capacity with first-order corrections, J/(mol K)
		from    float64 // K, from where the levels deviate more
	}{
		{"O2", 0.027, 1500},
		{"HCl", 0.020, 1200},
		{"HF", 0.012, 2000},
	} {
		d := diatomicOf(test.species)
		for _, row := range tables[test.species]["cp"] {
			if row.temperature < 300 || row.temperature > 3000 {
				continue
			}
			const h = 1e-3
			below, here, above := firstOrderSum(d, row.temperature*math.Exp(-h)), firstOrderSum(d, row.temperature), firstOrderSum(d, row.temperature*math.Exp(h))
			got := nature.MolarGasConstant * (2.5 + (above-below)/(2*h) + (above-2*here+below)/(h*h))
			off := math.Abs(got - row.value)
			if !(off <= test.most) {
				t.Errorf("%s at %v K: %.4f with first-order corrections, the table has %v", test.species, row.temperature, got, row.value)
			}
			levels := math.Abs(gasQuantity(test.species, "cp", row.temperature) - row.value)
			if row.temperature >= test.from && !(levels > 3*off) {
				t.Errorf("%s at %v K: the levels are off by %.4f, the first order by %.4f", test.species, row.temperature, levels, off)
			}
		}
	}
}

// TestNitricOxideOfTwoStates shows where the deviation of cold NO comes from:
// two separate states, 121.1 cm^-1 apart, give the table's entropy closer than
// the levels between Hund's cases do. (121.1 cm^-1: memory.)
func TestNitricOxideOfTwoStates(t *testing.T) {
	state := diatomicOf("NO").states[0].electronicState
	for _, row := range janafTables(t)["NO"]["s"] {
		if row.temperature > 300 {
			continue
		}
		var sum, mean, scale = 0.0, 0.0, 1 / (nature.BoltzmannConstant * row.temperature)
		for _, base := range []float64{0, 121.1 * perCentimetre} {
			for v := range 3 {
				b, _ := state.turning(float64(v))
				for j := range 100 {
					x := (base + vibration(float64(v), state.we, state.wexe, state.weye) + rotation(float64(j), b, 5.4e-6*perCentimetre)) * scale
					weight := 2 * float64(2*j+1) * math.Exp(-x)
					sum, mean = sum+weight, mean+weight*x
				}
			}
		}
		got := nature.MolarGasConstant * (2.5 + translationLn(row.temperature, 1e5, nature.MolarMass("NO")) + math.Log(sum) + mean/sum)
		levels := gasQuantity("NO", "s", row.temperature)
		if off := math.Abs(got - row.value); !(off <= 0.009 && math.Abs(levels-row.value) > 2*off) {
			t.Errorf("NO at %v K: %.4f of two states, %.4f of the levels, the table has %v", row.temperature, got, levels, row.value)
		}
	}
}

// capacityOfAll gives Cp of a molecule whose levels rotate as long as their
// energy rises, also above the dissociation limit, up to which they vibrate.
func capacityOfAll(d *diatomic, temperature float64) float64 {
	var sum, first, second, scale = 0.0, 0.0, 0.0, 1 / (nature.BoltzmannConstant * temperature)
	ground := &d.states[0].electronicState
	for i := range d.states {
		state := &d.states[i].electronicState
		base := 0.0
		if i > 0 {
			base = d.states[i].term + zeroPoint(state) - zeroPoint(ground)
		}
		last := math.Inf(-1)
		for v := 0.0; v < 400; v++ {
			swing := vibration(v, state.we, state.wexe, state.weye)
			if !(swing > last) || base+swing > d.dissociation {
				break
			}
			last = swing
			b, stretching := state.turning(v)
			highest := math.Inf(-1)
			for j := 0.0; j < 2000; j++ {
				turn := rotation(j, b, stretching)
				x := (base + swing + turn) * scale
				if !(turn > highest) || x > 60 {
					break
				}
				highest = turn
				weight := d.states[i].degeneracy * (2*j + 1) * math.Exp(-x)
				sum, first, second = sum+weight, first+weight*x, second+weight*x*x
			}
		}
	}
	return nature.MolarGasConstant * (2.5 + second/sum - first/sum*first/sum)
}

// TestWeakBondsBetweenTheSums shows where the deviations of F2, I2 and Na2 come
// from: the tables lie between the sum over the bound levels, which the laws
// take, and the sum that also has all levels which rotate above the
// dissociation limit. Two rows lie above both, I2 at 1500 K by 0.09 and Na2 at
// 3000 K by 0.7 J/(mol K): excited states whose constants are not known well.
func TestWeakBondsBetweenTheSums(t *testing.T) {
	tables := janafTables(t)
	for _, test := range []struct {
		species  string
		from, to float64 // K
	}{
		{"F2", 1800, 5000},
		{"I2", 1800, 5000},
		{"Na2", 900, 2000},
	} {
		between := 0
		for _, row := range tables[test.species]["cp"] {
			if row.temperature < test.from || row.temperature > test.to {
				continue
			}
			bound, all := gasQuantity(test.species, "cp", row.temperature), capacityOfAll(diatomicOf(test.species), row.temperature)
			if !(bound < row.value && row.value < all) {
				t.Errorf("%s at %v K: %.3f of bound levels, %.3f of all, the table has %v", test.species, row.temperature, bound, all, row.value)
			}
			between++
		}
		if between < 3 {
			t.Errorf("%s: %d rows", test.species, between)
		}
	}
}

// TestStretch holds the constants of theory against measured ones of H2: H_e
// 4.9e-5 cm^-1 within a third (memory: Dabrowski I. (1984) Can. J. Phys. 62, 1639), and
// leaves molecules without hydrogen as they are.
func TestStretch(t *testing.T) {
	state := diatomicOf("H2").states[0].electronicState
	state.stretch()
	if h := state.third / perCentimetre; !(math.Abs(h-4.9e-5) < 1.7e-5) {
		t.Errorf("H_e of H2 is %v cm^-1", h)
	}
	if !(state.beta < 0) {
		t.Errorf("beta_e of H2 is %v cm^-1", state.beta/perCentimetre)
	}
	plain := diatomicOf("N2").states[0].electronicState
	plain.stretch()
	if plain != diatomicOf("N2").states[0].electronicState {
		t.Error("N2 is stretched")
	}
}
