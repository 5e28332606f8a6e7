package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Molar masses of water and of dry air: their ratio in WMO-No. 8 and the molar
// mass of water in CIPM-2007, in kg/mol.
const (
	waterToAir     = 0.62198
	waterMolarMass = 0.01801528
)

// humidityLaws are the measures of the water vapour in air.
var humidityLaws = []*law.Law{
	{
		Name: "vapour_pressure", Group: group,
		Gives:      "the pressure of the water vapour in air of a relative humidity",
		Parameters: []law.Parameter{humidityOfAir, humidAirTemperature, methodParameter(overWater, "water"), enhancementParameter()},
		Result:     law.Result{Unit: "Pa(a)"},
		Equation:   "e = U f e_w(t); U relative_humidity, f enhancement, e_w saturation pressure over water",
		Source:     humidWMO, Caution: pureCaution, Refusal: ownRange,
		Examples: []law.Example{{Formula: `vapour_pressure(50[%], 0[degC], method: "WMO-No. 8")`, Gives: "305.6 Pa"}},
		Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
			formula := formulaNamed(overWater, arguments[2].Text)
			for i := range dst {
				dst[i] = arguments[0].At(i) * arguments[3].At(i) * column.Exp(formula.lnPressure(arguments[1].At(i), scaleITS90))
			}
		},
	},
	{
		Name: "relative_humidity_from_dew_point", Group: group,
		Gives: "the relative humidity of air of a temperature and dew point",
		Parameters: []law.Parameter{
			{Name: "dew_point", Meaning: "dew point over water", Unit: "K", Finite: law.Within(123, 647.096)},
			humidAirTemperature, methodParameter(overWater, "water"),
		},
		Result:   law.Result{Unit: "1"},
		Equation: "U = e_w(t_d)/e_w(t); t_d dew_point",
		Source:   humidWMO, Refusal: ownRange,
		Caution:  "Over liquid water at every temperature, as WMO defines it: of a frost point give relative_humidity as saturation_pressure_over_ice/saturation_pressure_over_water.",
		Examples: []law.Example{{Formula: "relative_humidity_from_dew_point(10[degC], 10[degC])", Gives: "1"}},
		Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
			formula := formulaNamed(overWater, arguments[2].Text)
			for i := range dst {
				dew, air := formula.lnPressure(arguments[0].At(i), scaleITS90), formula.lnPressure(arguments[1].At(i), scaleITS90)
				dst[i] = column.Exp(dew - air)
			}
		},
	},
	{
		Name: "mixing_ratio", Group: group,
		Gives:      "the mass of water vapour for a mass of dry air",
		Parameters: []law.Parameter{humidVapour, pressureOfAir(), humidRatio},
		Result:     law.Result{Unit: "1"},
		Equation:   "r = epsilon e/(p - e); epsilon mass_ratio, e vapour_pressure, p pressure",
		Source:     humidWMO, Refusal: humidNoRoom,
		Examples: []law.Example{{Formula: "mixing_ratio(0[Pa], 1000[hPa])", Gives: "0"}, {Formula: "mixing_ratio(500[hPa], 1000[hPa])", Gives: "0.62198"}},
		Body: law.Of3(func(e, p, epsilon float64) float64 {
			if !(e < p) {
				return notANumber
			}
			return epsilon * e / (p - e)
		}),
	},
	{
		Name: "specific_humidity", Group: group,
		Gives:      "the mass of water vapour in a mass of moist air",
		Parameters: []law.Parameter{humidVapour, pressureOfAir(), humidRatio},
		Result:     law.Result{Unit: "1"},
		Equation:   "q = epsilon e/(p - (1 - epsilon) e); epsilon mass_ratio, e vapour_pressure, p pressure",
		Source:     humidWMO, Refusal: humidNoRoom,
		Examples: []law.Example{{Formula: "specific_humidity(1000[hPa], 1000[hPa])", Gives: "1"}},
		Body: law.Of3(func(e, p, epsilon float64) float64 {
			if !(e <= p) {
				return notANumber
			}
			return epsilon * e / (p - float64((1-epsilon)*e))
		}),
	},
	{
		Name: "absolute_humidity", Group: group,
		Gives:      "the mass of water vapour in a volume of air",
		Parameters: []law.Parameter{humidVapour, {Name: "temperature", Meaning: "temperature of the air", Unit: "K", Finite: law.Above(0)}},
		Result:     law.Result{Unit: "kg/m^3"},
		Equation:   "rho_v = e M_v/(R T), M_v = 18.01528 g/mol; e vapour_pressure",
		Source:     humidWMO + "; M_v as in Picard A. et al. (2008) Metrologia 45, 149 (CIPM-2007)",
		Caution:    "Vapour as an ideal gas: 0.1 % at room temperature, more near saturation above 50 degC.",
		Examples:   []law.Example{{Formula: "absolute_humidity(1000[Pa], 293.15[K])", Gives: "7.3912e-3 kg/m^3"}},
		Body:       law.Of2(func(e, t float64) float64 { return e * waterMolarMass / (nature.MolarGasConstant * t) }),
	},
}

var humidityOfAir = law.Parameter{
	Name: "relative_humidity", Meaning: "vapour pressure over that of saturation over liquid water at the same temperature, also below 0 degC (WMO)",
	Unit: "1", Valid: law.Within(0, 1), Finite: law.Within(0, 2),
}
var humidAirTemperature = law.Parameter{Name: "temperature", Meaning: "temperature of the air", Unit: "K", Finite: law.Within(123, 647.096)}
var humidRatio = law.Parameter{
	Name: "mass_ratio", Meaning: "molar mass of water over that of dry air: 0.62198 in WMO-No. 8, 0.621945 in ASHRAE's handbook since 2009",
	Unit: "1", Finite: law.Above(0), Default: "0.62198",
}

const (
	humidWMO    = "WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation (2018 ed.), volume I, annexes 4.A and 4.B"
	humidNoRoom = "the vapour pressure is not below the air's: there is no dry air"
)

var humidVapour = law.Parameter{Name: "vapour_pressure", Meaning: "absolute pressure of the vapour alone", Unit: "Pa(a)", Finite: law.AtLeast(0)}

// enhancementParameter is f, given by the law enhancement_factor.
func enhancementParameter() law.Parameter {
	return law.Parameter{
		Name: "enhancement", Meaning: "enhancement factor of vapour in air, as enhancement_factor gives it; 1 for pure vapour",
		Unit: "1", Valid: law.Within(0.99, 1.1), Finite: law.Above(0), Default: "1",
	}
}

// pressureOfAir is the pressure of the moist air.
func pressureOfAir() law.Parameter {
	return law.Parameter{Name: "pressure", Meaning: "absolute pressure of the moist air", Unit: "Pa(a)", Finite: law.Above(0)}
}
