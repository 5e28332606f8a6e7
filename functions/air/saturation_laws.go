package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// Sources of the formulas, and what each is worth.
const (
	waterSource = "Sonntag D. (1990) Z. Meteorol. 70, 340 (-100 to 100 degC); WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation, annex 4.B (-45 to 60 degC); " +
		"Goff J.A., Gratch S. (1946) Trans. ASHVE 52, 95, as in the Smithsonian Meteorological Tables, 6th ed., 1951 (-50 to 102 degC); Goff J.A. (1957) Trans. ASHVE 63, 347, as in WMO-No. 49 (-50 to 100 degC); " +
		"Hyland R.W., Wexler A. (1983) ASHRAE Trans. 89(2A), 500 (0 to 200 degC, IPTS-68); Hardy B. (1998) Proc. 3rd Int. Symp. on Humidity and Moisture, vol. 1, 214 (0 to 100 degC); " +
		"Murphy D.M., Koop T. (2005) Q. J. R. Meteorol. Soc. 131, 1539 (123 to 332 K); IAPWS SR1-86(1992), Wagner W., Pruss A. (1993) J. Phys. Chem. Ref. Data 22, 783 (0 degC to 647.096 K)"
	iceSource = "Sonntag D. (1990) Z. Meteorol. 70, 340 (from -100 degC); WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation, annex 4.B (from -65 degC); " +
		"Goff J.A., Gratch S. (1946) Trans. ASHVE 52, 95, as in the Smithsonian Meteorological Tables, 6th ed., 1951 (from -100 degC); Goff J.A. (1957) Trans. ASHVE 63, 347, as in WMO-No. 49 (from -100 degC); " +
		"Hyland R.W., Wexler A. (1983) ASHRAE Trans. 89(2A), 500 (from -100 degC, IPTS-68); Hardy B. (1998) Proc. 3rd Int. Symp. on Humidity and Moisture, vol. 1, 214 (from -100 degC); " +
		"Murphy D.M., Koop T. (2005) Q. J. R. Meteorol. Soc. 131, 1539 (from 110 K); IAPWS R14-08(2011) (from 50 K); all to the triple point"
	waterEquation = "Sonntag: ln(e/Pa) = -6096.9385/T + 21.2409642 - 2.711193e-2 T + 1.673952e-5 T^2 + 2.433502 ln T, T in K; WMO-No. 8: e = 6.112 hPa exp(17.62 t/(243.12 + t)), t in degC; the others as in their sources"
	iceEquation   = "Sonntag: ln(e/Pa) = -6024.5282/T + 29.32707 + 1.0613868e-2 T - 1.3198825e-5 T^2 - 0.49382577 ln T, T in K; WMO-No. 8: e = 6.112 hPa exp(22.46 t/(272.62 + t)), t in degC; the others as in their sources"
	pureCaution   = "Of pure vapour; in air at the same temperature it is larger by the enhancement factor, 0.4 % near sea level. The formulas differ by 0.02 % to 0.5 % between 0 and 50 degC, over supercooled water by more."
	ownRange      = "the formula that was chosen does not reach that temperature or pressure: its range stands in the source"
)

// saturationLaws are the saturation pressures and their inverses.
var saturationLaws = []*law.Law{
	{
		Name: "saturation_pressure_over_water", Group: group,
		Gives: "the pressure of water vapour in equilibrium with liquid water, supercooled below 0 degC",
		Parameters: []law.Parameter{
			{Name: "temperature", Meaning: "temperature of the water", Unit: "K", Valid: law.Within(123, 647.096), Finite: law.Within(123, 647.096)},
			methodParameter(overWater, "water"), scaleParameter(),
		},
		Result: law.Result{Unit: "Pa(a)"}, Equation: waterEquation, Source: waterSource, Caution: pureCaution, Refusal: ownRange,
		Examples: []law.Example{
			{Formula: "saturation_pressure_over_water(0.01[degC])", Gives: "611.657 Pa"},
			{Formula: `saturation_pressure_over_water(30[degC], method: "Hyland-Wexler 1983", scale: "IPTS-68")`, Gives: "4.2460 kPa"},
		},
		Body: saturationBody(overWater),
	},
	{
		Name: "saturation_pressure_over_ice", Group: group,
		Gives: "the pressure of water vapour in equilibrium with ice",
		Parameters: []law.Parameter{
			{Name: "temperature", Meaning: "temperature of the ice", Unit: "K", Valid: law.Within(50, triplePoint), Finite: law.Within(50, triplePoint)},
			methodParameter(overIce, "ice"), scaleParameter(),
		},
		Result: law.Result{Unit: "Pa(a)"}, Equation: iceEquation, Source: iceSource, Caution: pureCaution, Refusal: ownRange,
		Examples: []law.Example{
			{Formula: "saturation_pressure_over_ice(0.01[degC])", Gives: "611.657 Pa"},
			{Formula: `saturation_pressure_over_ice(230[K], method: "IAPWS 2011")`, Gives: "8.94735 Pa"},
		},
		Body: saturationBody(overIce),
	},
	{
		Name: "dew_point", Group: group,
		Gives:      "the temperature at which water vapour of a pressure begins to condense on water",
		Parameters: []law.Parameter{partialPressure(), methodParameter(overWater, "water"), scaleParameter()},
		Result:     law.Result{Unit: "degC"},
		Equation:   "e_w(t_d) = e, solved for t_d; e vapour_pressure; WMO-No. 8: t_d = 243.12 degC ln(e/6.112 hPa)/(17.62 - ln(e/6.112 hPa))",
		Source:     waterSource,
		Caution:    "For vapour in air divide its pressure by the enhancement factor first: 0.07 K at sea level. Below 0 degC a mirror may carry frost: see frost_point.",
		Refusal:    ownRange,
		Examples: []law.Example{
			{Formula: `dew_point(6.112[hPa], method: "WMO-No. 8")`, Gives: "0.000 degC"},
			{Formula: "dew_point(611.657[Pa])", Gives: "0.0100 degC"},
		},
		Body: saturatedBody(overWater),
	},
	{
		Name: "frost_point", Group: group,
		Gives:      "the temperature at which water vapour of a pressure begins to form frost on ice",
		Parameters: []law.Parameter{partialPressure(), methodParameter(overIce, "ice"), scaleParameter()},
		Result:     law.Result{Unit: "degC"},
		Equation:   "e_i(t_f) = e, solved for t_f; e vapour_pressure; WMO-No. 8: t_f = 272.62 degC ln(e/6.112 hPa)/(22.46 - ln(e/6.112 hPa))",
		Source:     iceSource,
		Caution:    "For vapour in air divide its pressure by the enhancement factor first. Above 611.66 Pa there is a dew point only.",
		Refusal:    ownRange,
		Examples: []law.Example{
			{Formula: `frost_point(0.3798[hPa], method: "Goff-Gratch 1946")`, Gives: "-30.0 degC"},
		},
		Body: saturatedBody(overIce),
	},
}

// partialPressure is the pressure of the vapour alone.
func partialPressure() law.Parameter {
	return law.Parameter{Name: "vapour_pressure", Meaning: "absolute pressure of the vapour alone", Unit: "Pa(a)", Finite: law.Above(0)}
}

// saturationBody takes temperature, method and scale.
//
//go:noinline
func saturationBody(formulas []saturation) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		formula, scale := formulaNamed(formulas, arguments[1].Text), arguments[2].Text
		temperature := &arguments[0]
		for i := range dst {
			dst[i] = column.Exp(formula.lnPressure(temperature.At(i), scale))
		}
	}
}

// saturatedBody takes a pressure, method and scale.
//
//go:noinline
func saturatedBody(formulas []saturation) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		formula, scale := formulaNamed(formulas, arguments[1].Text), arguments[2].Text
		pressure := &arguments[0]
		for i := range dst {
			dst[i] = formula.temperature(pressure.At(i), scale)
		}
	}
}
