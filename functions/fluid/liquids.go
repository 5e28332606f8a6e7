package fluid

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// liquid is a row of the handbook's table: density in kg/m^3, viscosity in
// Pa s, surface tension in N/m, vapour pressure in Pa and bulk modulus in Pa, all
// at 20 degC and one atmosphere; NaN where the table has no value.
type liquid struct {
	name                                         string
	density, viscosity, tension, vapour, modulus float64
}

// handbookLiquids is White F.M., Fluid Mechanics, 5th ed. (2003), table A.3.
func handbookLiquids() []liquid {
	none := math.NaN()
	return []liquid{
		{"ammonia", 608, 2.20e-4, 2.13e-2, 9.10e5, 1.82e9},
		{"benzene", 881, 6.51e-4, 2.88e-2, 1.01e4, 1.47e9},
		{"carbon tetrachloride", 1590, 9.67e-4, 2.70e-2, 1.20e4, 1.32e9},
		{"ethanol", 789, 1.20e-3, 2.28e-2, 5.7e3, 1.09e9},
		{"ethylene glycol", 1117, 2.14e-2, 4.84e-2, 1.2e1, 3.05e9},
		{"gasoline", 680, 2.92e-4, 2.16e-2, 5.51e4, 1.3e9},
		{"glycerol", 1260, 1.49, 6.33e-2, 1.4e-2, 4.35e9},
		{"kerosene", 804, 1.92e-3, 2.8e-2, 3.11e3, 1.41e9},
		{"mercury", 13550, 1.56e-3, 4.84e-1, 1.1e-3, 2.85e10},
		{"methanol", 791, 5.98e-4, 2.25e-2, 1.34e4, 1.03e9},
		{"SAE 10W oil", 870, 1.04e-1, 3.6e-2, none, 1.31e9},
		{"SAE 30W oil", 891, 2.9e-1, 3.5e-2, none, 1.38e9},
		{"SAE 50W oil", 902, 8.6e-1, none, none, none},
		{"water", 998, 1.00e-3, 7.28e-2, 2.34e3, 2.19e9},
		{"sea water", 1025, 1.07e-3, 7.28e-2, 2.34e3, 2.28e9},
	}
}

// liquidLaws are those of the handbook's liquids.
func liquidLaws() []*law.Law {
	const (
		source  = "White F.M., Fluid Mechanics, 5th ed. (2003), table A.3: properties of common liquids at 20 degC and 1 atm"
		digits  = "Two or three digits, for a first estimate: oils and fuels differ by several per cent from one maker to another. "
		missing = "the handbook's table has no value for this liquid"
	)
	table := handbookLiquids()
	names := make([]string, len(table))
	for i := range table {
		names[i] = table[i].name
	}
	type property struct {
		name, gives, unit, symbol string
		low, high                 float64 // degC in which the table's value serves
		caution                   string
		example                   law.Example
		of                        func(l *liquid) float64
	}
	var laws []*law.Law
	for _, p := range []property{
		{
			"liquid_density", "density of a common liquid, from a handbook", "kg/m^3", "rho", 18, 22,
			"Density falls by about 0.1 % a kelvin. ",
			law.Example{Formula: `liquid_density("glycerol", 20[degC])`, Gives: "1260 kg/m^3"},
			func(l *liquid) float64 { return l.density },
		},
		{
			"liquid_viscosity", "dynamic viscosity of a common liquid, from a handbook", "mPa s", "mu", 19.5, 20.5,
			"Viscosity falls by about 2 % a kelvin, that of oils and of glycerol by 8 %. ",
			law.Example{Formula: `liquid_viscosity("glycerol", 20[degC])`, Gives: "1.49 Pa s"},
			func(l *liquid) float64 { return l.viscosity },
		},
		{
			"liquid_surface_tension", "surface tension of a common liquid against air, from a handbook", "mN/m", "sigma", 18, 22,
			"Surface tension falls by about 0.3 % a kelvin; a little dirt halves it. ",
			law.Example{Formula: `liquid_surface_tension("mercury", 20[degC])`, Gives: "484 mN/m"},
			func(l *liquid) float64 { return l.tension },
		},
		{
			"liquid_vapour_pressure", "vapour pressure of a common liquid, from a handbook", "Pa(a)", "p_v", 19.5, 20.5,
			"Vapour pressure rises by about 5 % a kelvin. ",
			law.Example{Formula: `liquid_vapour_pressure("ethanol", 20[degC])`, Gives: "5700 Pa"},
			func(l *liquid) float64 { return l.vapour },
		},
		{
			"liquid_bulk_modulus", "isentropic bulk modulus of a common liquid, from a handbook", "GPa", "K", 18, 22,
			"Air bubbles in the liquid lower it many times over. ",
			law.Example{Formula: `liquid_bulk_modulus("water", 20[degC])`, Gives: "2.19 GPa"},
			func(l *liquid) float64 { return l.modulus },
		},
	} {
		of := p.of
		l := &law.Law{
			Name: p.name, Group: "fluid", Gives: p.gives,
			Parameters: []law.Parameter{
				{Name: "liquid", Meaning: "name of the liquid", Type: law.Text, Choices: names},
				{
					Name: "temperature", Meaning: "temperature of the liquid: the table is for 20 degC alone", Unit: "degC",
					Valid: law.Within(p.low, p.high), Finite: law.Within(0, 60),
				},
			},
			Result: law.Result{Unit: p.unit}, Equation: p.symbol + " = " + p.symbol + "(20 degC), as tabulated",
			Source: source, Caution: p.caution + digits,
			Examples: []law.Example{p.example},
			Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
				value := math.NaN()
				for i := range table {
					if table[i].name == arguments[0].Text {
						value = of(&table[i])
					}
				}
				for i := range dst {
					dst[i] = value
				}
			},
		}
		for i := range table {
			if math.IsNaN(of(&table[i])) {
				l.Refusal = missing
			}
		}
		laws = append(laws, l)
	}
	return laws
}

// mercuryLaws are those of mercury.
func mercuryLaws() []*law.Law {
	return []*law.Law{{
		Name: "mercury_density", Group: "fluid",
		Gives: "density of mercury",
		Parameters: []law.Parameter{
			{
				Name: "temperature", Meaning: "temperature of the mercury; IPTS-48, IPTS-68 and ITS-90 differ by less than 1e-6 of the density", Unit: "degC",
				// From freezing to boiling.
				Valid: law.Within(0, 100), Finite: law.Within(-38.83, 356.73),
			},
			{Name: "pressure", Meaning: "absolute pressure of the mercury", Unit: "MPa(a)", Valid: law.Within(0, 10), Finite: law.Within(0, 200), Default: "1[atm]"},
		},
		Result:   law.Result{Unit: "kg/m^3"},
		Equation: "rho = 13595.08 kg/m^3 [1 + k (p - 101325 Pa)]/(1 + 18150.36e-8 t + 0.70209e-8 t^2 + 2.8655e-11 t^3 + 2.621e-14 t^4), k = 4.0e-11 1/Pa; t temperature in degC, p pressure",
		Source:   "Bigg P.H. (1964) Density of mercury, Brit. J. Appl. Phys. 15, 1111-1113, after Cook A.H. (1961) Phil. Trans. R. Soc. A 254, 125-154; expansion of Beattie J.A. et al. (1941) Proc. Am. Acad. Arts Sci. 74, 371-388",
		Caution:  "Samples differ by 1e-6 through their isotopes; the compressibility is known here to two digits. Mercury and its vapour are poisonous: no open vessel without ventilation.",
		Examples: []law.Example{
			{Formula: "mercury_density(20[degC])", Gives: "13545.87 kg/m^3"},
			{Formula: "mercury_density(0[degC])", Gives: "13595.08 kg/m^3"},
		},
		Body: law.Of2(mercuryDensity),
	}}
}

// mercuryDensity gives the density of mercury in kg/m^3 from temperature in K
// and absolute pressure in Pa.
func mercuryDensity(temperature, pressure float64) float64 {
	t := temperature - nature.IcePoint
	growth := float64((float64((float64((float64(2.621e-14*t)+2.8655e-11)*t)+0.70209e-8)*t)+18150.36e-8)*t) + 1
	return 13595.08 * (1 + float64(4.0e-11*(pressure-nature.StandardAtmosphere))) / growth
}
