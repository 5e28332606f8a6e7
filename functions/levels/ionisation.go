package levels

import (
	_ "embed"
	"strings"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

//go:embed data/ionisation.txt
var ionisationTable string

// ionisationEnergy gives the energy in J that takes the stage-th electron off
// an element, stage 1 to 3; no number where the table has none.
func ionisationEnergy(symbol string, stage int) float64 {
	for line := range strings.Lines(ionisationTable) {
		f := strings.Split(strings.TrimSpace(line), "|")
		if f[0] == symbol && stage >= 1 && stage < len(f) && f[stage] != "" {
			return readNumber(f[stage]) * nature.ElementaryCharge
		}
	}
	return notANumber
}

func elementNames() []string {
	var names []string
	for line := range strings.Lines(ionisationTable) {
		symbol, _, _ := strings.Cut(line, "|")
		names = append(names, symbol)
	}
	return names
}

const (
	sahaSource     = "Saha M.N. (1920) Phil. Mag. 40, 472; Mihalas D. (1978) Stellar Atmospheres, 2nd ed., chapter 5"
	ionisingSource = "CRC Handbook of Chemistry and Physics, 91st ed. (2010), as tabulated by Barklem P.S., Collet R. (2016) Astron. Astrophys. 588, A96, table 4"
)

func electronPressureParameter() law.Parameter {
	return law.Parameter{Name: "electron_pressure", Meaning: "partial pressure of the electrons, n_e k_B T", Unit: "Pa(a)", Finite: law.Above(0)}
}

func sumParameter(name, meaning string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning, Unit: "1", Finite: law.Above(0)}
}

// electronMolarMass is the molar mass of electrons in kg/mol.
const electronMolarMass = nature.ElectronMass * nature.AvogadroConstant

// lnSaha gives the logarithm of the ratio of ions to atoms.
func lnSaha(energy, temperature, electronPressure, lnSums float64) float64 {
	return lnTwo + lnSums + translationLn(temperature, electronPressure, electronMolarMass) - float64(energy*inverseOf(temperature))
}

const lnTwo = 0.69314718055994530942

var sahaRatioLaw = &law.Law{
	Name:  "saha_ratio",
	Group: group,
	Gives: "how many ions of a stage there are for one atom or ion of the stage below",
	Parameters: []law.Parameter{
		energyParameter("ionisation energy"),
		temperatureParameter(),
		electronPressureParameter(),
		sumParameter("lower_sum", "partition sum of the stage below: 2 for hydrogen"),
		sumParameter("upper_sum", "partition sum of the ion: 1 for the proton"),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "N_(i+1)/N_i = (2 U_(i+1)/U_i) (k_B T/p_e) (2 pi m_e k_B T/h^2)^(3/2) exp(-chi/(k_B T))",
	Source:   sahaSource,
	Caution:  "Local thermal equilibrium. In dense plasma the ionisation energy is lower.",
	Refusal:  "the ratio is beyond what a number can hold",
	Examples: []law.Example{
		{Formula: "saha_ratio(13.6[eV], 9000[K], 20[Pa], 2, 1) / (1 + saha_ratio(13.6[eV], 9000[K], 20[Pa], 2, 1))", Gives: "0.23685"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		return gasExp(lnSaha(x[0], x[1], x[2], column.Ln(positive(x[4])/positive(x[3]))))
	}),
}

// ionisable lists elements whose atom and ion both have a partition sum here.
func ionisable() []string {
	var names []string
	for _, symbol := range elementNames() {
		if atomOf(symbol+" I") != nil && (symbol == "H" || atomOf(symbol+" II") != nil) {
			names = append(names, symbol)
		}
	}
	return names
}

var ionisedFractionLaw = &law.Law{
	Name:  "ionised_fraction",
	Group: group,
	Gives: "the share of an element that has lost one electron, at a given electron pressure",
	Parameters: []law.Parameter{
		{Name: "element", Meaning: "symbol of an element whose atom and ion are both in the tables: \"H\", \"Na\", \"Ca\", \"Fe\", ...", Type: law.Text,
			CheckText: func(text string) string {
				return checkName("element with levels of atom and ion", text, ionisable())
			}},
		{Name: "temperature", Meaning: "temperature", Unit: "K", Finite: law.Above(0), Valid: law.Within(1000, 12000)},
		electronPressureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "N_II/(N_I + N_II) with Saha's ratio, partition sums of the bound levels",
	Source:   sahaSource + "; ionisation energies: " + ionisingSource + "; levels: " + atomSource,
	Caution:  "Local thermal equilibrium, no second ionisation. In dense plasma the ionisation energy is lower and high levels are lost.",
	Examples: []law.Example{
		{Formula: `ionised_fraction("H", 9600[K], 20[Pa])`, Gives: "0.52"},
		{Formula: `ionised_fraction("Na", 2500[K], 1[Pa])`, Gives: "4.5e-4"},
	},
	Body: ionisedFraction,
}

// ionisedWork is a worker's room: the levels of atom and ion.
type ionisedWork struct {
	name        string
	energy      float64
	atom, ion   law.Argument
	bare        bool // the ion is a nucleus
	lower, high scratch
}

func ionisedFraction(dst []float64, arguments []law.Argument, work *law.Work) {
	name := arguments[0].Text
	w, known := work.Keep.(*ionisedWork)
	if !known || w.name != name {
		bound := law.Argument{Text: "bound"}
		w = &ionisedWork{name: name, energy: ionisationEnergy(name, 1), bare: name == "H"}
		w.atom = law.Argument{Maker: atomLaw, Items: []law.Argument{{Text: name + " I"}, bound}}
		w.ion = law.Argument{Maker: atomLaw, Items: []law.Argument{{Text: name + " II"}, bound}}
		work.Keep = w
	}
	for i := range dst {
		temperature := arguments[1].At(i)
		ln, _ := w.lower.sumRow(&w.atom, 0, inverseOf(temperature), logarithm)
		ln = -ln
		if !w.bare {
			ion, _ := w.high.sumRow(&w.ion, 0, inverseOf(temperature), logarithm)
			ln += ion
		}
		dst[i] = fermiOf(-lnSaha(w.energy, temperature, arguments[2].At(i), ln))
	}
}

var ionisationEnergyLaw = &law.Law{
	Name:  "ionisation_energy",
	Group: group,
	Gives: "the energy that takes an electron off a free atom or ion",
	Parameters: []law.Parameter{
		{Name: "element", Meaning: "symbol of an element from H to U", Type: law.Text,
			CheckText: func(text string) string { return checkName("element", text, elementNames()) }},
		{Name: "stage", Meaning: "1 for the first electron, 2 for the second, 3 for the third", Unit: "1", Finite: law.Within(1, 3), Default: "1"},
	},
	Result:   law.Result{Unit: "eV"},
	Equation: "table",
	Source:   ionisingSource,
	Refusal:  "the table has no such stage for the element",
	Examples: []law.Example{
		{Formula: `ionisation_energy("Na")`, Gives: "5.1391 eV"},
		{Formula: `ionisation_energy("He", stage: 2)`, Gives: "54.418 eV"},
	},
	Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
		var stages [4]float64
		for k := 1; k <= 3; k++ {
			stages[k] = ionisationEnergy(arguments[0].Text, k)
		}
		for i := range dst {
			dst[i] = notANumber
			if n := arguments[1].At(i); wholeNumber(n) && n >= 1 && n <= 3 {
				dst[i] = stages[int(n)]
			}
		}
	},
}
