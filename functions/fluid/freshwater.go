package fluid

import (
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// freshWaterLaws are those of pure water.
func freshWaterLaws() []*law.Law {
	return []*law.Law{{
		Name:  "fresh_water_density",
		Group: "fluid",
		Gives: "density of pure, air-free water at 101325 Pa",
		Parameters: []law.Parameter{{
			Name: "temperature", Meaning: "temperature on ITS-90", Unit: "degC",
			// Outside, from deep supercooling to the boiling point, the formula
			// stays within 1 kg/m^3 of what was measured.
			Valid: law.Within(0, 40), Finite: law.Within(-20, 100),
		}},
		Result:   law.Result{Unit: "kg/m^3"},
		Equation: "rho = a5 [1 - (t + a1)^2 (t + a2)/(a3 (t + a4))]; t temperature in degC, a1 = -3.983035, a2 = 301.797, a3 = 522528.9, a4 = 69.34881, a5 = 999.974950 kg/m^3",
		Source:   "Tanaka M., Girard G., Davis R., Peuto A., Bignell N. (2001) Recommended table for the density of water between 0 degC and 40 degC based on recent experimental reports, Metrologia 38, 301-309",
		Caution:  "For water of the isotopic composition of standard mean ocean water, without dissolved air or salt; relative uncertainty about 1e-6. Water saturated with air is up to 0.0046 kg/m^3 lighter; each bar more makes it 0.05 kg/m^3 denser.",
		Examples: []law.Example{
			{Formula: "fresh_water_density(4[degC])", Gives: "999.9749 kg/m^3"},
			{Formula: "fresh_water_density(25[degC])", Gives: "997.0470 kg/m^3"},
		},
		Body: law.Of1(freshWaterDensity),
	}}
}

// freshWaterDensity gives the density of water in kg/m^3 at 101325 Pa from the
// temperature in K: Tanaka et al. 2001, eq. 1.
func freshWaterDensity(temperature float64) float64 {
	const (
		a1 = -3.983035
		a2 = 301.797
		a3 = 522528.9
		a4 = 69.34881
		a5 = 999.974950
	)
	t := temperature - nature.IcePoint
	fromMaximum := t + a1
	return a5 * (1 - fromMaximum*fromMaximum*(t+a2)/(a3*(t+a4)))
}
