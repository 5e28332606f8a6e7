package air

import "plumbrule/engine/law"

// pathConstant is the mean free path of a gas times its pressure as measured,
// in m Pa: at 0 degC (Pfeiffer Vacuum, Vacuum Technology Know How, table 1.5)
// and at 20 degC (Leybold, Fundamentals of Vacuum Technology, table III), 0
// where the table has none.
type pathConstant struct {
	name       string
	cold, warm float64
}

var pathConstants = []pathConstant{
	{"air", 6.7e-3, 6.67e-3},
	{"H2", 11.5e-3, 12.00e-3},
	{"He", 17.5e-3, 18.00e-3},
	{"N2", 5.9e-3, 6.10e-3},
	{"O2", 6.5e-3, 6.50e-3},
	{"Ne", 12.7e-3, 12.30e-3},
	{"Ar", 6.4e-3, 6.40e-3},
	{"Kr", 4.9e-3, 4.80e-3},
	{"Xe", 3.6e-3, 3.60e-3},
	{"Hg", 3.1e-3, 3.05e-3},
	{"H2O", 6.8e-3, 3.95e-3},
	{"CO", 6.0e-3, 0},
	{"CO2", 4.0e-3, 3.95e-3},
	{"HCl", 3.3e-3, 4.35e-3},
	{"NH3", 3.2e-3, 4.60e-3},
	{"Cl2", 2.1e-3, 3.05e-3},
}

// vacuumLaws are those of vacuum practice.
func vacuumLaws() []*law.Law {
	names := make([]string, len(pathConstants))
	for i := range pathConstants {
		names[i] = pathConstants[i].name
	}
	return []*law.Law{
		{
			Name: "vacuum_mean_free_path", Group: group,
			Gives: "the mean free path of a gas by the constants of the vacuum handbooks",
			Parameters: []law.Parameter{
				{Name: "gas", Meaning: "the gas", Type: law.Text, Choices: names},
				{Name: "pressure", Meaning: "absolute pressure of the gas", Unit: "Pa(a)", Valid: law.Within(1e-12, 101325), Finite: law.Above(0)},
				{Name: "at", Meaning: "temperature that the constant was measured at; the second table has no CO", Type: law.Text, Default: `"0 degC"`, Choices: []string{"0 degC", "20 degC"}},
			},
			Result:   law.Result{Unit: "m"},
			Equation: "l = c/p; c = l p as tabulated for the gas (air 6.7e-3 m Pa at 0 degC, 6.67e-3 m Pa at 20 degC), p pressure",
			Source:   "Pfeiffer Vacuum, The Vacuum Technology Book, volume II: Know How, table 1.5 (0 degC); Umrath W. (2007) Fundamentals of Vacuum Technology, Leybold, table III (20 degC)",
			Caution:  "Handbooks differ by 10 %, for water, ammonia and chlorine by half. " + law.CautionVacuum,
			Refusal:  "the table at 20 degC has no value for that gas",
			Examples: []law.Example{{Formula: `vacuum_mean_free_path("air", 1[hPa])`, Gives: "67 um"}},
			Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
				product := notANumber
				for i := range pathConstants {
					if c := &pathConstants[i]; c.name == arguments[0].Text {
						product = c.cold
						if arguments[2].Text == "20 degC" {
							product = c.warm
						}
					}
				}
				if product == 0 {
					product = notANumber
				}
				for i := range dst {
					dst[i] = product / arguments[1].At(i)
				}
			},
		},
		{
			Name: "knudsen_number", Group: group,
			Gives: "the mean free path against the width of a channel or the size of a body",
			Parameters: []law.Parameter{
				{Name: "mean_free_path", Meaning: "mean free path of the gas", Unit: "m", Finite: law.AtLeast(0)},
				{Name: "width", Meaning: "width of the channel, gap or body", Unit: "m", Finite: law.Above(0)},
			},
			Result:   law.Result{Unit: "1"},
			Equation: "Kn = l/d; l mean_free_path, d width",
			Source:   "Knudsen M. (1909) Ann. Phys. 333, 75; regimes as in the vacuum handbooks (DIN 28400-1)",
			Caution:  "Vacuum practice: below 0.01 viscous flow, above 0.5 molecular, between them transitional. Gas dynamics: below 0.01 continuum, to 0.1 slip, to 10 transition, above free molecular. " + law.CautionVacuum,
			Examples: []law.Example{{Formula: "knudsen_number(66[nm], 66[um])", Gives: "0.001"}},
			Body:     law.Of2(func(l, d float64) float64 { return l / d }),
		},
	}
}
