package levels

import (
	"strings"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// standardTemperature is the reference temperature of thermochemistry in K.
const standardTemperature = 298.15

// gasSpecies is a gas whose thermochemistry follows from a ladder.
type gasSpecies struct {
	name      string
	molarMass float64 // kg/mol
	ladder    law.Argument
	atoms     []elementCount
}

type elementCount struct {
	symbol string
	count  float64
}

// heavy hydrogen: molar masses in kg/mol (Wang M. et al. (2021) Chinese Phys. C
// 45, 030003: 2.0141017781 u).
var heavy = [...]struct {
	name string
	mass float64
}{
	{"D", 2.0141017781e-3},
	{"D2", 2 * 2.0141017781e-3},
	{"HD", 2.0141017781e-3 + 1.00794e-3},
}

// gasOf gives the gas of a name: an atom, a diatomic or a polyatomic molecule.
func gasOf(name string) (g gasSpecies, ok bool) {
	g.name = name
	g.atoms, ok = countElements(name)
	if !ok {
		return g, false
	}
	text := func(words ...string) []law.Argument {
		items := make([]law.Argument, len(words))
		for i, word := range words {
			items[i] = law.Argument{Text: word}
		}
		return items
	}
	switch {
	case name == "D":
		g.ladder = law.Argument{Maker: atomLaw, Items: text("H I", "bound")}
	case atomOf(name+" I") != nil:
		g.ladder = law.Argument{Maker: atomLaw, Items: text(name+" I", "bound")}
	case diatomicOf(name) != nil, polyatomicOf(name) != nil:
		g.ladder = law.Argument{Maker: moleculeLaw, Items: text(name, "all", "alternating", natural)}
	default:
		return g, false
	}
	g.molarMass = nature.MolarMass(name)
	for _, h := range heavy {
		if h.name == name {
			g.molarMass = h.mass
		}
	}
	return g, g.molarMass > 0
}

// countElements reads a formula of symbols and counts: "C2H2". Heavy hydrogen,
// D, is an element of its own.
func countElements(formula string) (atoms []elementCount, ok bool) {
	for i := 0; i < len(formula); {
		if formula[i] < 'A' || formula[i] > 'Z' {
			return nil, false
		}
		end := i + 1
		for end < len(formula) && formula[end] >= 'a' && formula[end] <= 'z' {
			end++
		}
		symbol, count := formula[i:end], 0.0
		for i = end; i < len(formula) && formula[i] >= '0' && formula[i] <= '9'; i++ {
			count = float64(10*count) + float64(formula[i]-'0')
		}
		if i == end {
			count = 1
		}
		atoms = append(atoms, elementCount{symbol, count})
	}
	return atoms, len(atoms) > 0
}

func gasNames() []string {
	var names []string
	for _, name := range atomNames() {
		if symbol, neutral := strings.CutSuffix(name, " I"); neutral {
			names = append(names, symbol)
		}
	}
	names = append(names, "D")
	for _, name := range moleculeNames() {
		if !strings.HasSuffix(name, "+") {
			names = append(names, name)
		}
	}
	return names
}

func checkGas(text string) string {
	if _, ok := gasOf(text); ok {
		return ""
	}
	return checkName("gas", text, gasNames())
}

func gasParameter() law.Parameter {
	return law.Parameter{Name: "species", Meaning: "an atom or molecule of the tables: \"He\", \"N\", \"N2\", \"H2O\"", Type: law.Text, CheckText: checkGas}
}

func gasTemperature() law.Parameter {
	p := temperatureParameter()
	p.Valid = law.Within(100, 6000)
	return p
}

func referenceParameter() law.Parameter {
	return law.Parameter{Name: "reference", Meaning: "temperature from which the enthalpy is counted", Unit: "K", Finite: law.Above(0), Default: "298.15[K]"}
}

const (
	gasSource  = "levels: atom and molecule of this catalogue, diatomic hydrides with beta_e (Pekeris C.L. (1934) Phys. Rev. 45, 98) and H_e (Dunham J.L. (1932) Phys. Rev. 41, 721), chlorine as the natural mixture; " + sackur + "; " + sumsSource + "; conventions of Chase M.W. (1998) NIST-JANAF Thermochemical Tables, 4th ed."
	gasCaution = "Ideal gas. Atoms and most diatomic molecules agree with the JANAF tables to their last digit at room temperature, up to 3000 K within 0.1 J/(mol K), O2, HF and HCl within 0.16 in the heat capacity; the rigid rotors and harmonic oscillators of molecules with three and more atoms " +
		"are off by some 0.1 J/(mol K) there and by 1 to 5 J/(mol K) above 3000 K, weakly bound ones (I2, Na2, F2) above a twentieth of D_0/k_B likewise."
)

// gasWork is a worker's room for the laws of a gas: its levels at the row's
// temperature and, apart from them, at the reference temperature.
type gasWork struct {
	name          string
	gas           gasSpecies
	ok            bool
	at, reference scratch
}

// gasIn gives the work of a gas, looked up when the law is first called.
func gasIn(work *law.Work, name string) *gasWork {
	w, known := work.Keep.(*gasWork)
	if !known || w.name != name {
		w = &gasWork{name: name}
		w.gas, w.ok = gasOf(name)
		work.Keep = w
	}
	return w
}

// capacity gives Cp/R.
func (w *gasWork) capacity(temperature float64) float64 {
	value, _ := w.at.sumRow(&w.gas.ladder, 0, inverseOf(temperature), variance)
	return 2.5 + value
}

// entropy gives S/R.
func (w *gasWork) entropy(temperature, pressure float64) float64 {
	value, _ := w.at.sumRow(&w.gas.ladder, 0, inverseOf(temperature), entropic)
	return 2.5 + translationLn(temperature, pressure, w.gas.molarMass) + value
}

// increment gives (H(T) - H(Tr))/R in K.
func (w *gasWork) increment(temperature, reference float64) float64 {
	here, _ := w.at.sumRow(&w.gas.ladder, 0, inverseOf(temperature), meanLevel)
	there, _ := w.reference.sumRow(&w.gas.ladder, 0, inverseOf(reference), meanLevel)
	return float64(2.5*(temperature-reference)) + (float64(here*temperature) - float64(there*reference))
}

// ofGas lifts a function of a gas to blocks of rows.
func ofGas(f func(w *gasWork, arguments []law.Argument, row int) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, work *law.Work) {
		w := gasIn(work, arguments[0].Text)
		for i := range dst {
			if !w.ok || !(arguments[1].At(i) > 0) {
				dst[i] = notANumber
				continue
			}
			dst[i] = float64(nature.MolarGasConstant * f(w, arguments, i))
		}
	}
}

var gasHeatCapacityLaw = &law.Law{
	Name:       "gas_heat_capacity",
	Group:      group,
	Gives:      "the molar heat capacity at constant pressure of an ideal gas",
	Parameters: []law.Parameter{gasParameter(), gasTemperature()},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "Cp = R (5/2 + mean of x^2 - square of the mean of x), x = E/(k_B T) over the levels",
	Source:     gasSource,
	Caution:    gasCaution,
	Examples: []law.Example{
		{Formula: `gas_heat_capacity("N2", 298.15[K])`, Gives: "29.12 J/(mol K)"},
		{Formula: `gas_heat_capacity("He", 298.15[K])`, Gives: "20.786 J/(mol K)"},
	},
	Body: ofGas(func(w *gasWork, a []law.Argument, row int) float64 { return w.capacity(a[1].At(row)) }),
}

var gasEntropyLaw = &law.Law{
	Name:       "gas_entropy",
	Group:      group,
	Gives:      "the molar entropy of an ideal gas",
	Parameters: []law.Parameter{gasParameter(), gasTemperature(), pressureParameter("100000[Pa(a)]")},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "S = R (5/2 + ln((k_B T/p)/Lambda^3)) + R ln Q + U/T, Q and U of the levels, nuclear spin left out",
	Source:     gasSource,
	Caution:    gasCaution + " Standard pressure is 1 bar; of 1 atm it is 0.1094 J/(mol K) less.",
	Examples: []law.Example{
		{Formula: `gas_entropy("N2", 298.15[K])`, Gives: "191.61 J/(mol K)"},
		{Formula: `gas_entropy("Ar", 298.15[K])`, Gives: "154.846 J/(mol K)"},
	},
	Body: ofGas(func(w *gasWork, a []law.Argument, row int) float64 { return w.entropy(a[1].At(row), a[2].At(row)) }),
}

var gasEnthalpyIncrementLaw = &law.Law{
	Name:       "gas_enthalpy_increment",
	Group:      group,
	Gives:      "the molar enthalpy of an ideal gas above that at a reference temperature",
	Parameters: []law.Parameter{gasParameter(), gasTemperature(), referenceParameter()},
	Result:     law.Result{Unit: "kJ/mol"},
	Equation:   "H(T) - H(Tr) = R (5/2) (T - Tr) + U(T) - U(Tr), U of the levels",
	Source:     gasSource,
	Caution:    gasCaution,
	Examples: []law.Example{
		{Formula: `gas_enthalpy_increment("N2", 1000[K])`, Gives: "21.46 kJ/mol"},
	},
	Body: ofGas(func(w *gasWork, a []law.Argument, row int) float64 { return w.increment(a[1].At(row), a[2].At(row)) }),
}

var gasGibbsFunctionLaw = &law.Law{
	Name:       "gas_gibbs_function",
	Group:      group,
	Gives:      "the Gibbs energy function of an ideal gas, -(G - H(Tr))/T",
	Parameters: []law.Parameter{gasParameter(), gasTemperature(), referenceParameter(), pressureParameter("100000[Pa(a)]")},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "phi = S(T) - (H(T) - H(Tr))/T",
	Source:     gasSource,
	Caution:    gasCaution,
	Examples: []law.Example{
		{Formula: `gas_gibbs_function("N2", 1000[K])`, Gives: "206.71 J/(mol K)"},
	},
	Body: ofGas(func(w *gasWork, a []law.Argument, row int) float64 {
		t := a[1].At(row)
		return w.entropy(t, a[3].At(row)) - w.increment(t, a[2].At(row))/t
	}),
}

// formation lists enthalpies of formation at 298.15 K in kJ/mol.
var formation = [...]struct {
	name     string
	enthalpy float64
}{
	{"H2", 0}, {"D2", 0}, {"N2", 0}, {"O2", 0}, {"F2", 0}, {"Cl2", 0},
	{"He", 0}, {"Ne", 0}, {"Ar", 0}, {"Kr", 0}, {"Xe", 0},
	{"H", 217.999}, {"D", 221.720}, {"N", 472.683}, {"O", 249.173}, {"F", 79.390}, {"Cl", 121.302},
	{"C", 716.670}, {"S", 276.980}, {"Br", 111.860}, {"I", 106.762}, {"Na", 107.300}, {"K", 89.000},
	{"NO", 90.291}, {"OH", 38.987}, {"HF", -272.546}, {"HCl", -92.312}, {"HD", 0.320},
	{"CO", -110.527}, {"I2", 62.421}, {"Na2", 142.070},
	{"CO2", -393.522}, {"H2O", -241.826}, {"NH3", -45.898}, {"N2O", 82.048}, {"NO2", 33.095},
	{"O3", 142.674}, {"CH4", -74.873}, {"C2H2", 226.731}, {"SO2", -296.842}, {"H2S", -20.502},
}

// enthalpyOfFormation gives it at 298.15 K in J/mol: of the table, or of a
// diatomic molecule from its atoms and its dissociation energy.
func (w *gasWork) enthalpyOfFormation() float64 {
	for _, f := range formation {
		if f.name == w.name {
			return f.enthalpy * 1000
		}
	}
	d := diatomicOf(w.name)
	if d == nil {
		return notANumber
	}
	// H(298.15 K) - H(0) of each, over R.
	warmth := func(g *gasSpecies) float64 {
		var s scratch
		mean, _ := s.sumRow(&g.ladder, 0, inverseOf(standardTemperature), meanLevel)
		return float64(standardTemperature * (2.5 + mean))
	}
	sum := float64(nature.MolarGasConstant*warmth(&w.gas)) - float64(d.dissociation*nature.AvogadroConstant)
	for _, a := range w.gas.atoms {
		atom := gasWork{name: a.symbol}
		atom.gas, atom.ok = gasOf(a.symbol)
		if !atom.ok || diatomicOf(a.symbol) != nil {
			return notANumber
		}
		sum += float64(a.count * (atom.enthalpyOfFormation() - float64(nature.MolarGasConstant*warmth(&atom.gas))))
	}
	return sum
}

// lnStandard gives ln(q/N) of a gas at a pressure of 1 bar, with its levels
// counted from J = 0 of the ground state.
func (w *gasWork) lnStandard(temperature float64) float64 {
	beta := inverseOf(temperature)
	sum, lowest := w.at.sumRow(&w.gas.ladder, 0, beta, logarithm)
	return translationLn(temperature, nature.StandardStatePressure, w.gas.molarMass) + sum - float64(lowest*beta)
}

// groundEnergy gives the energy of v = 0, J = 0 below the free atoms, in J:
// 0 for atoms; no number for molecules of which it is not known.
func (w *gasWork) groundEnergy() float64 {
	if d := diatomicOf(w.name); d != nil {
		return -d.dissociation
	}
	if w.gas.ladder.Maker == atomLaw {
		return 0
	}
	return notANumber
}

// gasExp is e^x for results that may lie beyond the numbers: no number then.
func gasExp(x float64) float64 {
	if y := column.Exp(x); column.Finite(y) {
		return y
	}
	return notANumber
}
