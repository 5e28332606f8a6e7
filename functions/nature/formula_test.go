package nature

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine/law"
)

// TestMolarMasses compares with printed molar masses in g/mol that were summed
// from the IUPAC abridged standard atomic weights 2021.
func TestMolarMasses(t *testing.T) {
	cases := []struct{ formula, want, source string }{
		{"H2", "2.016", "memory"},
		{"CH4", "16.043", "memory"},
		{"NH3", "17.031", "memory"},
		{"H2O", "18.015", "memory"},
		{"Ne", "20.180", "IUPAC 2021, memory"},
		{"CO2", "44.009", "memory"},
		{"CO₂", "44.009", "memory"},
		{"C3H8", "44.097", "memory"},
		{"SO2", "64.058", "memory"},
		{"Cl2", "70.90", "memory"},
		{"Kr", "83.798", "IUPAC 2021, memory"},
		{"Xe", "131.29", "IUPAC 2021, memory"},
		{"U", "238.03", "IUPAC 2021, memory"},
		// sums by hand of the weights of the table
		{"Ca(OH)2", "74.092", "40.078 + 2 (15.999 + 1.0080)"},
		{"K3[Fe(CN)6]", "329.247", "3 39.098 + 55.845 + 6 (12.011 + 14.007)"},
		{"CuSO4.5H2O", "249.677", "63.546 + 32.06 + 4 15.999 + 5 18.015"},
		{"CuSO4·5H2O", "249.677", "as before"},
		{"NaCl*2H2O", "94.470", "22.990 + 35.45 + 2 18.015"},
		{"{(H2)2}3", "12.096", "12 1.0080"},
		{"Co", "58.933", "cobalt, not carbon monoxide"},
		{"CO", "28.010", "12.011 + 15.999"},
	}
	for _, c := range cases {
		got := MolarMass(c.formula) * 1000
		point := strings.IndexByte(c.want, '.')
		if text := strconv.FormatFloat(got, 'f', len(c.want)-point-1, 64); text != c.want {
			t.Errorf("%s = %s g/mol, want %s (%s)", c.formula, text, c.want, c.source)
		}
		if particle := ParticleMass(c.formula); math.Abs(particle*AvogadroConstant/(got/1000)-1) > 5e-16 {
			t.Errorf("%s: particle mass %g kg", c.formula, particle)
		}
	}
	// A mole of hydrogen atoms weighs what its proton and electron do; the
	// natural mixture holds some deuterium, at most 0.03 %.
	if ratio := ParticleMass("H") / (ProtonMass + ElectronMass); ratio < 1 || ratio > 1.0003 {
		t.Errorf("hydrogen atom / (proton + electron) = %v", ratio)
	}
}

// TestComplaints asks for what is wrong and where.
func TestComplaints(t *testing.T) {
	cases := []struct{ formula, what string }{
		{"", "empty"},
		{"co2", `"c": an element symbol begins with a capital letter, as in "CO2" or "NaCl" (character 1)`},
		{"CXy2", `unknown element symbol "Xy"`},
		{"CXy2", "(character 2)"},
		{"CO2Vv", "(character 4)"},
		{"Iron", `did you mean "Fe"?`},
		{"NA", `unknown element symbol "A"`},
		{"NaCL", `unknown element symbol "L"`},
		{"Tc", "technetium has no stable isotope"},
		{"RnF2", "radon"},
		{"D2O", "isotope"},
		{"2H2O", "a count stands behind what it counts"},
		{"H0", "a whole number from 1 on (character 2)"},
		{"CuSO4.", "ends where an element symbol is missing"},
		{"CuSO4.5", "ends where an element symbol is missing"},
		{"CaSO4.0.5H2O", "a whole number from 1 on (character 7)"},
		{"Ca(OH", `the bracket "(" is not closed by ")" (character 3)`},
		{"Ca(OH]2", `the bracket "(" is not closed by ")" (character 3)`},
		{"Ca)2", "was never opened (character 3)"},
		{"Ca()2", "nothing stands in the bracket"},
		{"Ca(OH)(", "ends where an element symbol is missing (character 8)"},
		{"Na+", "charges are not written"},
		{"H2 O", "no blanks"},
		{"H2$", `"$" does not belong in a chemical formula (character 3)`},
		{"H99999999999999999999", "more than 1000000000 atoms"},
		{"((C99999)99999)99999", "more than 1000000000 atoms"},
		{strings.Repeat("(", 25) + "C" + strings.Repeat(")", 25), "brackets within brackets"},
		{strings.Repeat("C", 201), "at most 200 characters"},
		{"H\xff", "UTF-8"},
	}
	check := formulaParameter().CheckText
	for _, c := range cases {
		if got := check(c.formula); !strings.Contains(got, c.what) {
			t.Errorf("%q: %q, want %q in it", c.formula, got, c.what)
		}
		if !math.IsNaN(MolarMass(c.formula)) || !math.IsNaN(ParticleMass(c.formula)) {
			t.Errorf("%q has a mass", c.formula)
		}
	}
	if complaint := check(strings.Repeat("C", 200)); complaint != "" {
		t.Errorf("200 characters: %s", complaint)
	}
}

// TestElements asks whether the table is the periodic table.
func TestElements(t *testing.T) {
	if len(elements) != 118 || elementOf("W") != &elements[73] || elementOf("Pb") != &elements[81] {
		t.Fatalf("the elements do not stand at their atomic numbers")
	}
	without := 0
	for i := range elements {
		if elementOf(elements[i].symbol) != &elements[i] {
			t.Errorf("%s stands twice", elements[i].symbol)
		}
		if elements[i].weight == 0 {
			without++
			continue
		}
		// Between hydrogen's 1 and uranium's 2.59 nucleons to a proton.
		if perProton := float64(elements[i].weight) / weightUnits / float64(i+1); perProton < 1 || perProton > 2.65 {
			t.Errorf("%s: weight %d at number %d", elements[i].symbol, elements[i].weight, i+1)
		}
	}
	// The abridged table 2021 gives 84 elements a standard atomic weight.
	if without != 118-84 {
		t.Errorf("%d elements without a weight", without)
	}
}

// FuzzFormula asks for an answer, never a panic, and for exact sums.
func FuzzFormula(f *testing.F) {
	for _, seed := range []string{"CO2", "Ca(OH)2", "CuSO4.5H2O", "((", "9", "H₂", "\xff", "C((H)2"} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, text string) {
		weight, complaint := weigh(text)
		if complaint == "" && (weight <= 0 || weight >= 1<<53) {
			t.Errorf("%q weighs %d", text, weight)
		}
	})
}

// TestLaws asks of every law what the catalogue needs, and that the body
// serves all rows.
func TestLaws(t *testing.T) {
	if _, err := law.NewCatalogue(Laws(), Constants()); err != nil {
		t.Fatal(err)
	}
	for _, l := range Laws() {
		if l.Equation == "" || len(l.Examples) == 0 || l.Group != "nature" || l.Result.Unit == "" {
			t.Errorf("%s is not fully told", l.Name)
		}
		dst := make([]float64, 5)
		l.Body(dst, []law.Argument{{Text: "N2"}}, &law.Work{})
		want := 28.014e-3
		if l.Name == "particle_mass" {
			want = 28.014e-3 / 6.02214076e23
		}
		for _, got := range dst {
			if math.Abs(got/want-1) > 1e-15 {
				t.Errorf("%s = %g, want %g", l.Name, got, want)
			}
		}
	}
}
