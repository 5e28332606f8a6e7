package fluid

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Molar masses of breathing gases in kg/mol (IUPAC, Prohaska T. et al. (2022)
// Pure Appl. Chem. 94, 573-600, abridged standard atomic weights).
const (
	oxygenMass   = 31.998e-3
	nitrogenMass = 28.014e-3
	heliumMass   = 4.0026e-3
)

// divingLaws are those of gases that people breathe under pressure.
func divingLaws() []*law.Law {
	const practice = "U.S. Navy Diving Manual (SS521-AG-PRO-010), chapters 2 and 10; common practice"
	fraction := law.Parameter{Name: "fraction", Meaning: "mole fraction of the gas in the mixture", Unit: "1", Finite: law.Within(0, 1)}
	fractionAbove := fraction
	fractionAbove.Finite = law.Range{Low: 0, High: 1, HasLow: true, HasHigh: true, LowOpen: true}
	return []*law.Law{
		{
			Name: "gas_partial_pressure", Group: "fluid",
			Gives: "partial pressure of a gas in a mixture",
			Parameters: []law.Parameter{
				fraction,
				{Name: "pressure", Meaning: "absolute pressure of the mixture", Unit: "bar(a)", Valid: law.Within(0, 100), Finite: law.AtLeast(0)},
			},
			Result:   law.Result{Unit: "bar(a)"},
			Equation: "p_i = x_i p; x_i fraction, p pressure",
			Source:   "Dalton J. (1802) Mem. Lit. Phil. Soc. Manchester 5, 535-602; " + practice,
			Caution:  law.CautionDiving,
			Examples: []law.Example{
				{Formula: "gas_partial_pressure(0.32, 4[bara])", Gives: "1.28 bar"},
			},
			Body: law.Of2(func(fraction, pressure float64) float64 { return fraction * pressure }),
		},
		{
			Name: "depth_for_partial_pressure", Group: "fluid",
			Gives: "depth at which a gas of a breathing mixture reaches a partial pressure",
			Parameters: []law.Parameter{
				{Name: "partial_pressure", Meaning: "partial pressure of the gas", Unit: "bar(a)", Finite: law.AtLeast(0)},
				fractionAbove,
				{Name: "surface_pressure", Meaning: "absolute pressure of the air on the water", Unit: "bar(a)", Finite: law.AtLeast(0), Default: "1[atm]"},
				{Name: "density", Meaning: "density of the water: 64 lb/ft^3 for sea water in the trade, 1000 kg/m^3 for fresh water", Unit: "kg/m^3", Finite: law.Above(0), Default: "64[lb/ft^3]"},
				{Name: "gravity", Meaning: "acceleration of gravity", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"},
			},
			Result:   law.Result{Unit: "m"},
			Equation: "z = (p_i/x_i - p_s)/(rho g); p_i partial_pressure, x_i fraction, p_s surface_pressure, rho density, g gravity",
			Source:   practice,
			Caution:  "A depth, not one to go to. " + law.CautionDiving,
			Refusal:  "the partial pressure is exceeded at the surface already",
			Examples: []law.Example{
				// (1.4/0.32 - 1) bar under water of 1000 kg/m^3 and 10 m/s^2.
				{Formula: "depth_for_partial_pressure(1.4[bar], 0.32, surface_pressure: 1[bar], density: 1000[kg/m^3], gravity: 10[m/s^2])", Gives: "33.75 m"},
			},
			Body: law.OfMany(func(x []float64) float64 {
				excess := x[0]/x[1] - x[2]
				if excess < 0 {
					return math.NaN()
				}
				return excess / (x[3] * x[4])
			}),
		},
		{
			Name: "breathing_gas_density", Group: "fluid",
			Gives: "density of a breathing gas of oxygen, helium and nitrogen",
			Parameters: []law.Parameter{
				{Name: "oxygen", Meaning: "mole fraction of oxygen", Unit: "1", Finite: law.Within(0, 1)},
				{Name: "helium", Meaning: "mole fraction of helium; the rest is nitrogen", Unit: "1", Finite: law.Within(0, 1)},
				{Name: "pressure", Meaning: "absolute pressure of the gas", Unit: "bar(a)", Valid: law.Within(0, 60), Finite: law.Within(0, 1000)},
				{Name: "temperature", Meaning: "temperature of the gas: 0 degC is what the trade's limits are told for", Unit: "degC", Valid: law.Within(-20, 60), Finite: law.Within(-150, 500), Default: "0[degC]"},
			},
			Result:   law.Result{Unit: "g/L"},
			Equation: "rho = p (31.998 x_O2 + 4.0026 x_He + 28.014 x_N2) g/mol/(R T), x_N2 = 1 - x_O2 - x_He; p pressure, T temperature, x_O2 oxygen, x_He helium",
			Source:   "Clapeyron E. (1834) J. École Polytechnique 14 (23), 153-190 (ideal gas); molar masses of Prohaska T. et al. (2022) Pure Appl. Chem. 94, 573-600; " + practice,
			Caution:  "An ideal gas: real mixtures are 1 to 4 % lighter above 30 bar. " + law.CautionDiving,
			Refusal:  "oxygen and helium are more than the whole",
			Examples: []law.Example{
				{Formula: "breathing_gas_density(1, 0, 1[atm])", Gives: "1.42759 g/L"},
			},
			Body: law.Of4(breathingGasDensity),
		},
		{
			Name: "equivalent_air_depth", Group: "fluid",
			Gives: "depth at which air has the partial pressure of nitrogen that a mixture with more oxygen has",
			Parameters: []law.Parameter{
				{Name: "depth", Meaning: "depth in sea water", Unit: "m", Valid: law.Within(0, 60), Finite: law.AtLeast(0)},
				{Name: "oxygen", Meaning: "mole fraction of oxygen in the mixture, the rest nitrogen", Unit: "1", Valid: law.Within(0.21, 0.4), Finite: law.Within(0, 1)},
				{Name: "atmosphere", Meaning: "depth of water with the pressure of one atmosphere: 10 m or 33 ft of sea water in the trade", Unit: "m", Finite: law.Above(0), Default: "10[m]"},
			},
			Result:   law.Result{Unit: "m"},
			Equation: "z_e = (z + z_a)(1 - x_O2)/0.79 - z_a; z depth, z_a atmosphere, x_O2 oxygen",
			Source:   practice,
			Caution:  law.CautionDiving,
			Examples: []law.Example{
				{Formula: "equivalent_air_depth(30[m], 0.32)", Gives: "24.4304 m"},
				{Formula: "equivalent_air_depth(30[m], 0.21)", Gives: "30 m"},
			},
			Body: law.Of3(func(depth, oxygen, atmosphere float64) float64 {
				return float64((depth+atmosphere)*(1-oxygen))/0.79 - atmosphere
			}),
		},
	}
}

// breathingGasDensity gives the density in kg/m^3 from mole fractions of oxygen
// and helium, absolute pressure in Pa and temperature in K; NaN where the
// fractions are more than the whole.
func breathingGasDensity(oxygen, helium, pressure, temperature float64) float64 {
	nitrogen := 1 - oxygen - helium
	// Fractions that are decimal numbers add up to one but for the last bit.
	if nitrogen < -1e-12 {
		return math.NaN()
	}
	mass := float64(oxygenMass*oxygen) + float64(heliumMass*helium) + float64(nitrogenMass*nitrogen)
	return pressure * mass / (nature.MolarGasConstant * temperature)
}
