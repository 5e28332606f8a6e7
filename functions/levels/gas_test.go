package levels

import (
	"math"
	"testing"

	"plumbrule/functions/nature"
)

func TestReactions(t *testing.T) {
	for _, c := range []struct {
		text  string
		sound bool
	}{
		{"N2 + 3 H2 = 2 NH3", true},
		{"I2 -> 2 I", true},
		{"1/2 N2 + 0.5 O2 = NO", true},
		{"H2 + D2 = 2 HD", true},
		{"CO + H2O = CO2 + H2", true},
		{"N2 = N", false},         // does not balance
		{"N2 + H2 = NH3", false},  // nor does this
		{"N2", false},             // one side
		{"N2 = 2 Xy", false},      // no such gas
		{"N2 = -2 N", false},      // no such coefficient
		{"N2 = 2 N = 2 N", false}, // three sides
		{"", false},
		{"= N2", false},
		{"2 3 N2 = 6 N", false},
	} {
		if _, complaint := readReaction(c.text); (complaint == "") != c.sound {
			t.Errorf("%q: %q", c.text, complaint)
		}
	}
}

// Every gas, atom and molecule of the tables has its functions, which obey the
// laws of thermodynamics.
func TestEveryGas(t *testing.T) {
	for _, name := range gasNames() {
		for _, temperature := range []float64{298.15, 1200} {
			capacity := one(gasHeatCapacityLaw, word(name), number(temperature))
			if !(capacity > 2.4*nature.MolarGasConstant && capacity < 100) {
				t.Errorf("%s at %v K: Cp %v", name, temperature, capacity)
			}
			entropy := func(at float64) float64 { return one(gasEntropyLaw, word(name), number(at), number(1e5)) }
			enthalpy := func(at float64) float64 {
				return one(gasEnthalpyIncrementLaw, word(name), number(at), number(298.15))
			}
			h := temperature * 1e-4
			closeTo(t, name+": dH/dT", (enthalpy(temperature+h)-enthalpy(temperature-h))/(2*h), capacity, 2e-6)
			closeTo(t, name+": T dS/dT", (entropy(temperature+h)-entropy(temperature-h))/(2*h)*temperature, capacity, 2e-6)
			phi := one(gasGibbsFunctionLaw, word(name), number(temperature), number(298.15), number(1e5))
			closeTo(t, name+": phi", phi, entropy(temperature)-enthalpy(temperature)/temperature, 1e-14)
		}
		g := gasWork{name: name}
		g.gas, g.ok = gasOf(name)
		if heat := g.enthalpyOfFormation(); name != "" && !(math.Abs(heat) < 1e6) && diatomicOf(name) != nil && dissociation(name) != "" {
			if f := g.gas.atoms[0].symbol; f != "Li" && f != "B" && f != "P" && f != "Si" && f != "Ti" && f != "Al" {
				t.Errorf("%s: enthalpy of formation %v", name, heat)
			}
		}
	}
	if checkGas("Q7") == "" || checkGas("N2O4") == "" {
		t.Error("gases are not checked")
	}
}

// Hess's law: the constant of a sum of reactions is the product.
func TestHess(t *testing.T) {
	at := number(1500)
	k := func(reaction string) float64 {
		return one(equilibriumConstantLaw, word(reaction), at, word("formation"))
	}
	closeTo(t, "water gas", k("CO + H2O = CO2 + H2"), k("CO + 1/2 O2 = CO2")/k("H2 + 1/2 O2 = H2O"), 1e-11)
	closeTo(t, "reverse", k("N2 = 2 N"), 1/k("2 N = N2"), 1e-12)
	closeTo(t, "double", k("2 O2 = 4 O"), k("O2 = 2 O")*k("O2 = 2 O"), 1e-11)
	levels := one(equilibriumConstantLaw, word("O2 = 2 O"), at, word("dissociation"))
	closeTo(t, "both ways to the heat", math.Log10(levels), math.Log10(k("O2 = 2 O")), 2e-3)
	// alpha²/(1 - alpha²) 4 p = K
	alpha := one(dissociatedFractionLaw, word("O2"), number(3000), number(2e4), word("formation"))
	hot := one(equilibriumConstantLaw, word("O2 = 2 O"), number(3000), word("formation"))
	closeTo(t, "dissociation", 4*alpha*alpha/(1-alpha*alpha)*0.2, hot, 1e-12)
}

// The packed table: its first and last levels, counted as the source does.
func TestAtoms(t *testing.T) {
	all := 0
	for _, row := range atomRows() {
		all += row.levels
		ladder := made(atomLaw, word(row.name), word("bound"))
		var set levelSet
		if !set.prepare(buildAtom, ladder.Items, 0, endless) {
			t.Fatalf("%s has no levels", row.name)
		}
		for i, e := range set.energy {
			if e > row.limit*1.000001*reciprocal || i > 0 && e < set.energy[i-1] {
				t.Errorf("%s: level %d lies at %v cm^-1", row.name, i, e/reciprocal)
			}
		}
	}
	if len(atomRows()) != 38 || all != 13090 {
		t.Errorf("%d atoms with %d levels", len(atomRows()), all)
	}
	var set levelSet
	hydrogen := made(atomLaw, word("H I"), word("all"))
	set.prepare(buildAtom, hydrogen.Items, 0, endless)
	within(t, "2p 1/2 of hydrogen", set.energy[1]/reciprocal, 82258.9191133, 1e-9, "NIST ASD")
	if g := set.weight[0]; g != 2 {
		t.Errorf("hydrogen's ground level has %v states", g)
	}
}
