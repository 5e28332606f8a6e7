package levels

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/functions/nature"
)

func fieldParameter() law.Parameter {
	return law.Parameter{Name: "field", Meaning: "magnetic flux density", Unit: "T", Finite: law.AtLeast(0)}
}

func spinParameter(meaning string) law.Parameter {
	return law.Parameter{Name: "spin", Meaning: meaning, Unit: "1", Finite: law.Within(0, 1000)}
}

var spinLevelsLaw = &law.Law{
	Name:  "spin_levels",
	Group: group,
	Gives: "the ladder of a spin in a magnetic field, counted from zero field",
	Parameters: []law.Parameter{
		{Name: "g_factor", Meaning: "g factor: 2.002319 for a free electron, Lande's for an ion", Unit: "1"},
		spinParameter("spin or total angular momentum S: 1/2, 1, 3/2, ..."),
		fieldParameter(),
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_m = g mu_B B m, m = -S, -S + 1, ..., S, one state each",
	Source:   "Zeeman P. (1897) Phil. Mag. 43, 226; Kittel C. (2005) Introduction to Solid State Physics, 8th ed., chapter 11",
	Caution:  "A single spin in its field: no splitting in zero field, no neighbours. Levels are counted from the lowest, whatever the sign of g.",
	Refusal:  "twice the spin is no whole number",
	Examples: []law.Example{
		{Formula: "occupancy(spin_levels(2, 0.5, 0[T]), 0, 4.2[K])", Gives: "0.5"},
	},
}

func buildSpinLevels(set *levelSet, _ []law.Argument, numbers []float64) bool {
	return addZeeman(set, math.Abs(float64(numbers[0]*nature.BohrMagneton)), numbers[1], numbers[2])
}

// addZeeman adds the 2S + 1 levels of a spin whose neighbouring levels lie
// moment times field apart.
func addZeeman(set *levelSet, moment, spin, field float64) bool {
	twice := float64(2 * spin)
	step := float64(moment * field)
	if !wholeNumber(twice) || !(step >= 0) {
		return false
	}
	for k := 0.0; k <= twice; k++ {
		if !set.add(float64((k-spin)*step), 1) {
			return false
		}
	}
	return true
}

// nucleus is a nucleus with a magnetic moment.
type nucleus struct {
	name      string
	spin      float64
	magnetism float64 // gyromagnetic ratio in 1e7 rad/(s T)
}

// nuclei are those of common use: hydrogen and helium-3 (shielded value for the
// latter's gas) from CODATA 2022, the others from Harris et al.
var nuclei = [...]nucleus{
	{"1H", 0.5, 26.752218708},
	{"2H", 1, 4.10662791},
	{"3He", 0.5, -20.3801587},
	{"7Li", 1.5, 10.3977013},
	{"11B", 1.5, 8.5847044},
	{"13C", 0.5, 6.728284},
	{"14N", 1, 1.9337792},
	{"15N", 0.5, -2.71261804},
	{"17O", 2.5, -3.62808},
	{"19F", 0.5, 25.18148},
	{"23Na", 1.5, 7.0808493},
	{"27Al", 2.5, 6.9762715},
	{"29Si", 0.5, -5.3190},
	{"31P", 0.5, 10.8394},
	{"129Xe", 0.5, -7.452103},
	{"133Cs", 3.5, 3.5332539},
}

func nucleusOf(name string) *nucleus {
	for i := range nuclei {
		if nuclei[i].name == name {
			return &nuclei[i]
		}
	}
	return nil
}

func nucleusNames() []string {
	names := make([]string, len(nuclei))
	for i := range nuclei {
		names[i] = nuclei[i].name
	}
	return names
}

// checkName says what is wrong with a name that must be one of a list.
func checkName(kind, text string, names []string) string {
	for _, name := range names {
		if name == text {
			return ""
		}
	}
	complaint := "\"" + text + "\" is no " + kind + " of the table"
	if near := problem.Nearest(text, names); near != "" {
		return complaint + "; did you mean \"" + near + "\"?"
	}
	if len(names) > 24 {
		return complaint + "; it has \"" + names[0] + "\", \"" + names[1] + "\" and others"
	}
	complaint += "; it has "
	for i, name := range names {
		if i > 0 {
			complaint += ", "
		}
		complaint += name
	}
	return complaint
}

var nuclearSpinLevelsLaw = &law.Law{
	Name:  "nuclear_spin_levels",
	Group: group,
	Gives: "the ladder of a nuclear spin in a magnetic field, counted from zero field",
	Parameters: []law.Parameter{
		{Name: "nucleus", Meaning: "mass number and symbol: \"1H\", \"13C\", \"19F\", \"31P\"", Type: law.Text,
			CheckText: func(text string) string { return checkName("nucleus", text, nucleusNames()) }},
		fieldParameter(),
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_m = -gamma hbar B m, m = -I, -I + 1, ..., I, one state each",
	Source:   "gyromagnetic ratios: CODATA 2022 for 1H, else Harris R.K. et al. (2001) Pure Appl. Chem. 73, 1795; levels: Abragam A. (1961) Principles of Nuclear Magnetism, chapter I",
	Caution:  "The bare nucleus: shielding by electrons (some ppm) and quadrupole splitting are left out.",
	Examples: []law.Example{
		{Formula: `occupancy(nuclear_spin_levels("1H", 7.0463[T]), 0, 300[K]) - occupancy(nuclear_spin_levels("1H", 7.0463[T]), 1, 300[K])`, Gives: "2.39973e-5"},
	},
}

func buildNuclearSpinLevels(set *levelSet, items []law.Argument, numbers []float64) bool {
	n := nucleusOf(items[0].Text)
	if n == nil {
		return false
	}
	moment := math.Abs(float64(n.magnetism*1e7)) * nature.ReducedPlanckConstant
	return addZeeman(set, moment, n.spin, numbers[0])
}
