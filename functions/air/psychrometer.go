package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// greenspan is the form of the enhancement factor of Greenspan (1976):
// f = exp(alpha (1 - e/p) + beta (p/e - 1)), alpha and ln beta cubic in t.
type greenspan struct {
	low, high   float64 // degC
	formula     *saturation
	alpha, beta [4]float64
}

// The coefficients of Greenspan L. (1976) J. Res. NBS 80A, 41 on IPTS-68 and of
// Hardy B. (1998) on ITS-90.
func greenspanNamed(method, phase string) *greenspan {
	switch {
	case method == "Greenspan 1976" && phase == "water":
		return &greenspan{
			low: 0, high: 100, formula: formulaNamed(overWater, "Hyland-Wexler 1983"),
			alpha: [4]float64{3.53624e-4, 2.93228e-5, 2.61474e-7, 8.57538e-9},
			beta:  [4]float64{-10.7588, 6.32529e-2, -2.53591e-4, 6.33784e-7},
		}
	case method == "Greenspan 1976":
		return &greenspan{
			low: -100, high: 0, formula: formulaNamed(overIce, "Hyland-Wexler 1983"),
			alpha: [4]float64{3.64449e-4, 2.93631e-5, 4.88635e-7, 4.36543e-9},
			beta:  [4]float64{-10.7271, 7.61989e-2, -1.74771e-4, 2.46721e-6},
		}
	case phase == "water":
		return &greenspan{
			low: 0, high: 100, formula: formulaNamed(overWater, "Hardy 1998"),
			alpha: [4]float64{3.53624e-4, 2.9328363e-5, 2.6168979e-7, 8.5813609e-9},
			beta:  [4]float64{-1.07588e1, 6.3268134e-2, -2.5368934e-4, 6.3405286e-7},
		}
	}
	return nil
}

func cubic(c *[4]float64, t float64) float64 {
	p := c[2] + float64(t*c[3])
	p = c[1] + float64(t*p)
	return c[0] + float64(t*p)
}

// factor gives f at a pressure in Pa and a temperature in K on ITS-90.
func (g *greenspan) factor(pressure, temperature float64) float64 {
	if g == nil {
		return notANumber
	}
	t := g.formula.onScale(temperature, scaleITS90) - celsiusOrigin
	// Half a millikelvin lets 0 degC and 100 degC of either scale in.
	if !(t >= g.low-0.0005 && t <= g.high+0.03) {
		return notANumber
	}
	e := column.Exp(g.formula.logarithm(t + celsiusOrigin))
	if !(pressure >= e) {
		return notANumber
	}
	alpha, beta := cubic(&g.alpha, t), column.Exp(cubic(&g.beta, t))
	return column.Exp(float64(alpha*(1-e/pressure)) + float64(beta*(pressure/e-1)))
}

// enhancementOfWMO gives f = 1.0016 + 3.15e-6 p - 0.074/p, p in hPa.
func enhancementOfWMO(pressure float64) float64 {
	return 1.0016 + float64(3.15e-8*pressure) - 7.4/pressure
}

// Coefficients of the aspirated psychrometer (WMO-No. 8, annex 4.B), over water
// and over ice.
func psychrometric(wet float64, ice bool) float64 {
	if ice {
		return 5.75e-4
	}
	return float64(6.53e-4 * (1 + float64(0.000944*(wet-celsiusOrigin))))
}

// vapourOfWetBulb gives the vapour pressure in Pa that a psychrometer tells.
func vapourOfWetBulb(dry, wet, pressure float64, formula *saturation, ice bool) float64 {
	saturated := float64(enhancementOfWMO(pressure) * column.Exp(formula.lnPressure(wet, scaleITS90)))
	return saturated - float64(psychrometric(wet, ice)*pressure*(dry-wet))
}

// wetBulb solves vapourOfWetBulb for the wet bulb's temperature in K: it lies
// between the coldest that the formula knows and the dry bulb's, and the vapour
// pressure rises with it.
func wetBulb(dry, humidity, pressure float64, formula *saturation, ice bool) float64 {
	e := float64(humidity * enhancementOfWMO(pressure) * column.Exp(formulaNamed(overWater, "WMO-No. 8").lnPressure(dry, scaleITS90)))
	if e != e {
		return notANumber
	}
	high := column.Min(dry, formula.high)
	root, ok := column.BracketedRoot(func(wet float64) float64 {
		return vapourOfWetBulb(dry, wet, pressure, formula, ice) - e
	}, formula.low, high)
	if !ok {
		return notANumber
	}
	return root
}

// psychrometerLaws are the enhancement factor and the wet bulb.
var psychrometerLaws = []*law.Law{
	{
		Name: "enhancement_factor", Group: group,
		Gives: "how much larger the saturation vapour pressure is in air than that of pure vapour",
		Parameters: []law.Parameter{
			{Name: "pressure", Meaning: "absolute pressure of the moist air", Unit: "hPa(a)", Valid: law.Within(300, 20000), Finite: law.Within(5, 100000)},
			{Name: "temperature", Meaning: "temperature of the air; WMO-No. 8 has none in its formula", Unit: "degC", Valid: law.Within(-100, 100), Finite: law.Within(-100, 100)},
			{
				Name: "method", Meaning: "which published formula; Hardy's is over water only", Type: law.Text,
				Default: `"Greenspan 1976"`, Choices: []string{"Greenspan 1976", "Hardy 1998", "WMO-No. 8"},
			},
			psychroPhase,
		},
		Result: law.Result{Unit: "1"},
		Equation: "Greenspan, Hardy: f = exp(alpha (1 - e/p) + beta (p/e - 1)), alpha and ln beta cubic in t, e saturation pressure (Hyland-Wexler; Hardy: Hardy); " +
			"WMO-No. 8: f = 1.0016 + 3.15e-6 p - 0.074/p, p in hPa",
		Source:  "Greenspan L. (1976) J. Res. NBS 80A, 41; Hardy B. (1998) Proc. 3rd Int. Symp. on Humidity and Moisture, vol. 1, 214; " + psychroWMO,
		Caution: "WMO-No. 8's formula is for pressures at the ground, about 500 hPa to 1100 hPa.",
		Refusal: "the formula does not reach that temperature (water 0 to 100 degC, ice -100 to 0 degC; Hardy: water only), or the pressure is below that of saturation",
		Examples: []law.Example{
			{Formula: "enhancement_factor(101325[Pa], 25[degC])", Gives: "1.0041"},
			{Formula: `enhancement_factor(1013.25[hPa], 20[degC], method: "WMO-No. 8")`, Gives: "1.0047"},
		},
		Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
			if arguments[2].Text == "WMO-No. 8" {
				for i := range dst {
					dst[i] = enhancementOfWMO(arguments[0].At(i))
				}
				return
			}
			formula := greenspanNamed(arguments[2].Text, arguments[3].Text)
			for i := range dst {
				dst[i] = formula.factor(arguments[0].At(i), arguments[1].At(i))
			}
		},
	},
	{
		Name: "vapour_pressure_from_wet_bulb", Group: group,
		Gives: "the pressure of the water vapour in air that an aspirated psychrometer tells",
		Parameters: []law.Parameter{
			psychroDry,
			{Name: "wet_bulb", Meaning: "temperature of the wet bulb", Unit: "degC", Valid: law.Within(-45, 60), Finite: law.Within(-65, 60)},
			psychroPressure, psychroPhase,
		},
		Result:   law.Result{Unit: "Pa(a)"},
		Equation: "e = f e_w(t_w) - 6.53e-4 (1 + 0.000944 t_w) p (t - t_w), over ice e = f e_i(t_w) - 5.75e-4 p (t - t_w), t in degC; f and e_w by WMO-No. 8",
		Source:   psychroWMO, Caution: psychroInstrument,
		Refusal:  "the wet bulb lies outside the formula (water -45 to 60 degC, ice -65 to 0.01 degC), is warmer than the dry one, or so much colder that no vapour is left",
		Examples: []law.Example{{Formula: "vapour_pressure_from_wet_bulb(0[degC], 0[degC], 1000[hPa])", Gives: "6.141 hPa"}},
		Body: psychroBulb(func(dry, wet, pressure float64, formula *saturation, ice bool) float64 {
			e := vapourOfWetBulb(dry, wet, pressure, formula, ice)
			if !(wet <= dry && e >= 0) {
				return notANumber
			}
			return e
		}),
	},
	{
		Name: "wet_bulb_temperature", Group: group,
		Gives: "the temperature of an aspirated psychrometer's wet bulb",
		Parameters: []law.Parameter{
			psychroDry,
			{Name: "relative_humidity", Meaning: "relative humidity over water", Unit: "1", Valid: law.Within(0, 1), Finite: law.Within(0, 1)},
			psychroPressure, psychroPhase,
		},
		Result:   law.Result{Unit: "degC"},
		Equation: "f e_w(t_w) - 6.53e-4 (1 + 0.000944 t_w) p (t - t_w) = U f e_w(t), solved for t_w; over ice f e_i(t_w) - 5.75e-4 p (t - t_w); f and e_w by WMO-No. 8",
		Source:   psychroWMO, Caution: psychroInstrument + " Below 0 degC tell whether the bulb carries water or ice.",
		Refusal:  "no wet bulb within the formula (water -45 to 60 degC, ice -65 to 0.01 degC), or the air is over-saturated over ice",
		Examples: []law.Example{{Formula: "wet_bulb_temperature(20[degC], 100[%], 1000[hPa])", Gives: "20.00 degC"}},
		Body:     psychroBulb(wetBulb),
	},
	{
		Name: "mixing_ratio_from_wet_bulb", Group: group,
		Gives: "the mass of water vapour for a mass of dry air from the thermodynamic wet-bulb temperature",
		Parameters: []law.Parameter{
			{Name: "temperature", Meaning: "temperature of the air, dry bulb", Unit: "degC", Valid: law.Within(0, 200), Finite: law.Within(0, 200)},
			{Name: "wet_bulb", Meaning: "thermodynamic wet-bulb temperature, that of adiabatic saturation", Unit: "degC", Valid: law.Within(0, 100), Finite: law.Within(0, 100)},
			pressureOfAir(),
		},
		Result:   law.Result{Unit: "1"},
		Equation: "W = ((2501 - 2.326 t*) W* - 1.006 (t - t*))/(2501 + 1.86 t - 4.186 t*), W* = 0.62198 e/(p - e), e by Hyland-Wexler at t*, t in degC",
		Source:   "ASHRAE Handbook Fundamentals (2009), chapter 1, equations 22 and 35; with the mass ratio of the 2005 edition",
		Caution:  "A psychrometer's wet bulb comes within some tenths of a kelvin of it only where it is well aspirated.",
		Refusal:  "the wet bulb is warmer than the dry one, boils at that pressure, or is so much colder that no vapour is left",
		Examples: []law.Example{{Formula: "mixing_ratio_from_wet_bulb(40[degC], 20[degC], 101.325[kPa])", Gives: "6.4e-3"}},
		Body: law.Of3(func(dry, wet, pressure float64) float64 {
			e := column.Exp(formulaNamed(overWater, "Hyland-Wexler 1983").lnPressure(wet, scaleIPTS68))
			t, ts := dry-celsiusOrigin, wet-celsiusOrigin
			saturated := waterToAir * e / (pressure - e)
			w := (float64((2501-float64(2.326*ts))*saturated) - float64(1.006*(t-ts))) / (2501 + float64(1.86*t) - float64(4.186*ts))
			if !(wet <= dry && e < pressure && w >= 0) {
				return notANumber
			}
			return w
		}),
	},
}

const psychroWMO = "WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation (2018 ed.), volume I, annex 4.B"

var psychroPhase = law.Parameter{
	Name: "phase", Meaning: "what covers the wet bulb", Type: law.Text, Default: `"water"`, Choices: []string{"water", "ice"},
}
var psychroDry = law.Parameter{Name: "temperature", Meaning: "temperature of the air, dry bulb", Unit: "degC", Valid: law.Within(-45, 60), Finite: law.Within(-65, 60)}
var psychroPressure = law.Parameter{Name: "pressure", Meaning: "absolute pressure of the air", Unit: "hPa(a)", Valid: law.Within(300, 1100), Finite: law.Within(50, 1200)}

const psychroInstrument = "For a psychrometer with a steady draught of 3 m/s or more past the bulb (Assmann): a still or whirled one needs its own coefficient."

func psychroBulb(body func(a, b, p float64, formula *saturation, ice bool) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		ice := arguments[3].Text == "ice"
		formula := formulaNamed(overWater, "WMO-No. 8")
		if ice {
			formula = formulaNamed(overIce, "WMO-No. 8")
		}
		for i := range dst {
			dst[i] = body(arguments[0].At(i), arguments[1].At(i), arguments[2].At(i), formula, ice)
		}
	}
}
