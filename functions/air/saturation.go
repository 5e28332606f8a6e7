package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// saturation is one published formula for the pressure of water vapour in
// equilibrium with water or ice, without air.
type saturation struct {
	name      string
	low, high float64 // K, the range that the source states
	scale     int     // of its temperature
	logarithm func(t float64) float64
}

// Temperature scales that a formula may stand on.
const (
	asGiven = iota // older than 1968: taken as it stands
	onITS90
	onIPTS68
)

const (
	scaleITS90    = "ITS-90"
	scaleIPTS68   = "IPTS-68"
	triplePoint   = 273.16 // K
	lnHundred     = 4.605170185988091368
	celsiusOrigin = 273.15

	lnCriticalPressure = 16.9094578790152201016 // ln 22.064e6
	lnTriplePressure   = 6.41617166788096546287 // ln 611.657
	logSteamPressure   = 3.00571489794903135896 // log10 1013.246
	logIcePressure     = 0.78583503135866618924 // log10 6.1071
)

// rangeRounding lets the ends of a range in, in K, however degrees Celsius were
// rounded to kelvin.
const rangeRounding = 1e-9

// scaleRatio is t68/t90 in Celsius (Saunders P.M. (1990), WOCE Newsletter 10),
// exact to 0.5 mK from 0 to 100 degC.
const scaleRatio = 1.00024

// onScale turns a temperature in K that is told on a scale into one on the
// formula's scale.
func (s *saturation) onScale(t float64, told string) float64 {
	switch {
	case s.scale == onIPTS68 && told == scaleITS90:
		return celsiusOrigin + float64((t-celsiusOrigin)*scaleRatio)
	case s.scale == onITS90 && told == scaleIPTS68:
		return celsiusOrigin + (t-celsiusOrigin)/scaleRatio
	}
	return t
}

// offScale inverts onScale.
func (s *saturation) offScale(t float64, told string) float64 {
	switch {
	case s.scale == onIPTS68 && told == scaleITS90:
		return celsiusOrigin + (t-celsiusOrigin)/scaleRatio
	case s.scale == onITS90 && told == scaleIPTS68:
		return celsiusOrigin + float64((t-celsiusOrigin)*scaleRatio)
	}
	return t
}

// lnPressure gives the logarithm of the pressure in Pa; NaN outside the
// formula's own range.
func (s *saturation) lnPressure(t float64, told string) float64 {
	t = s.onScale(t, told)
	if !(t >= s.low-rangeRounding && t <= s.high+rangeRounding) {
		return notANumber
	}
	return s.logarithm(t)
}

// temperature gives the temperature in K at which the formula gives a pressure
// in Pa; NaN where it does not reach it.
func (s *saturation) temperature(pressure float64, told string) float64 {
	wanted := column.Ln(pressure)
	// The logarithm is almost straight over 1/T: so little is left to search.
	root, ok := column.BracketedRoot(func(inverse float64) float64 {
		return s.logarithm(column.Max(s.low, column.Min(s.high, 1/inverse))) - wanted
	}, 1/s.high, 1/s.low)
	if !ok {
		return notANumber
	}
	return s.offScale(1/root, told)
}

// power10 gives 10^x.
func power10(x float64) float64 { return column.Exp(float64(x * math.Ln10)) }

// magnus gives the form of WMO-No. 8: 6.112 hPa exp(a t/(b + t)), t in degC.
func magnus(a, b float64) func(t float64) float64 {
	constant := column.Ln(611.2)
	return func(t float64) float64 {
		t -= celsiusOrigin
		return constant + float64(a*t)/(b+t)
	}
}

// overWater are the formulas over liquid water, below 0 degC supercooled.
var overWater = []saturation{
	{name: "Sonntag 1990", low: 173.15, high: 373.15, scale: onITS90, logarithm: func(t float64) float64 {
		return -6096.9385/t + 21.2409642 + float64(t*(-2.711193e-2+float64(1.673952e-5*t))) + float64(2.433502*column.Ln(t))
	}},
	{name: "WMO-No. 8", low: celsiusOrigin - 45, high: celsiusOrigin + 60, scale: onITS90, logarithm: magnus(17.62, 243.12)},
	{name: "Goff-Gratch 1946", low: celsiusOrigin - 50, high: celsiusOrigin + 102, logarithm: func(t float64) float64 {
		t += 0.01 // the formula's ice point is 273.16 K
		x := 373.16 / t
		l := float64(-7.90298*(x-1)) + float64(5.02808*column.Log10(x)) -
			float64(1.3816e-7*(power10(float64(11.344*(1-t/373.16)))-1)) +
			float64(8.1328e-3*(power10(float64(-3.49149*(x-1)))-1)) + logSteamPressure
		return float64(math.Ln10*l) + lnHundred
	}},
	{name: "Goff 1957", low: celsiusOrigin - 50, high: celsiusOrigin + 100, logarithm: func(t float64) float64 {
		x := triplePoint / t
		l := float64(10.79574*(1-x)) - float64(5.02800*column.Log10(t/triplePoint)) +
			float64(1.50475e-4*(1-power10(float64(-8.2969*(t/triplePoint-1))))) +
			float64(0.42873e-3*(power10(float64(4.76955*(1-x)))-1)) + 0.78614
		return float64(math.Ln10*l) + lnHundred
	}},
	{name: "Hyland-Wexler 1983", low: 273.15, high: 473.15, scale: onIPTS68, logarithm: func(t float64) float64 {
		p := 0.41764768e-4 - float64(0.14452093e-7*t)
		p = -0.48640239e-1 + float64(t*p)
		return -0.58002206e4/t + 0.13914993e1 + float64(t*p) + float64(0.65459673e1*column.Ln(t))
	}},
	{name: "Hardy 1998", low: 273.15, high: 373.15, scale: onITS90, logarithm: func(t float64) float64 {
		p := 7.0229056e-10 - float64(1.8680009e-13*t)
		p = 1.6261698e-5 + float64(t*p)
		p = -2.737830188e-2 + float64(t*p)
		return (-6.028076559e3-2.8365744e3/t)/t + 1.954263612e1 + float64(t*p) + float64(2.7150305*column.Ln(t))
	}},
	{name: "Murphy-Koop 2005", low: 123, high: 332, scale: onITS90, logarithm: func(t float64) float64 {
		ln := column.Ln(t)
		cold := 53.878 - 1331.22/t - float64(9.44523*ln) + float64(0.014025*t)
		return 54.842763 - 6763.22/t - float64(4.210*ln) + float64(0.000367*t) + float64(column.Tanh(float64(0.0415*(t-218.8)))*cold)
	}},
	{name: "IAPWS 1992", low: 273.15, high: 647.096, scale: onITS90, logarithm: func(t float64) float64 {
		v := 1 - t/647.096
		root := math.Sqrt(v)
		cube := v * v * v
		sum := float64(-7.85951783*v) + float64(1.84408259*v*root) + float64(cube*
			(-11.7866497+float64(22.6807411*root)-float64(15.9618719*v)+float64(1.80122502*cube*v*root)))
		return lnCriticalPressure + float64(647.096/t*sum)
	}},
}

// overIce are the formulas over ice.
var overIce = []saturation{
	{name: "Sonntag 1990", low: 173.15, high: triplePoint, scale: onITS90, logarithm: func(t float64) float64 {
		return -6024.5282/t + 29.32707 + float64(t*(1.0613868e-2-float64(1.3198825e-5*t))) - float64(0.49382577*column.Ln(t))
	}},
	{name: "WMO-No. 8", low: celsiusOrigin - 65, high: triplePoint, scale: onITS90, logarithm: magnus(22.46, 272.62)},
	{name: "Goff-Gratch 1946", low: celsiusOrigin - 100, high: triplePoint, logarithm: func(t float64) float64 {
		t += 0.01 // the formula's ice point is 273.16 K
		x := 273.16 / t
		l := float64(-9.09718*(x-1)) - float64(3.56654*column.Log10(x)) + float64(0.876793*(1-t/273.16)) + logIcePressure
		return float64(math.Ln10*l) + lnHundred
	}},
	{name: "Goff 1957", low: celsiusOrigin - 100, high: triplePoint, logarithm: func(t float64) float64 {
		x := triplePoint / t
		l := float64(-9.09685*(x-1)) - float64(3.56654*column.Log10(x)) + float64(0.87682*(1-t/triplePoint)) + 0.78614
		return float64(math.Ln10*l) + lnHundred
	}},
	{name: "Hyland-Wexler 1983", low: 173.15, high: triplePoint, scale: onIPTS68, logarithm: func(t float64) float64 {
		p := 0.20747825e-8 - float64(0.94840240e-12*t)
		p = 0.62215701e-6 + float64(t*p)
		p = -0.96778430e-2 + float64(t*p)
		return -0.56745359e4/t + 0.63925247e1 + float64(t*p) + float64(0.41635019e1*column.Ln(t))
	}},
	{name: "Hardy 1998", low: celsiusOrigin - 100, high: triplePoint, scale: onITS90, logarithm: func(t float64) float64 {
		p := -3.4262402e-5 + float64(2.7040955e-8*t)
		p = 1.39387003e-2 + float64(t*p)
		return -5.8666426e3/t + 2.232870244e1 + float64(t*p) + float64(6.7063522e-1*column.Ln(t))
	}},
	{name: "Murphy-Koop 2005", low: 110, high: triplePoint, scale: onITS90, logarithm: func(t float64) float64 {
		return 9.550426 - 5723.265/t + float64(3.53068*column.Ln(t)) - float64(0.00728332*t)
	}},
	{name: "IAPWS 2011", low: 50, high: triplePoint, scale: onITS90, logarithm: func(t float64) float64 {
		v := t / triplePoint
		ln := column.Ln(v)
		sum := float64(-0.212144006e2*column.Exp(float64(0.333333333e-2*ln))) +
			float64(0.273203819e2*column.Exp(float64(0.120666667e1*ln))) -
			float64(0.610598130e1*column.Exp(float64(0.170333333e1*ln)))
		return lnTriplePressure + sum/v
	}},
}

// formulaNamed finds a formula; the first one where there is none of the name.
func formulaNamed(formulas []saturation, name string) *saturation {
	for i := range formulas {
		if formulas[i].name == name {
			return &formulas[i]
		}
	}
	return &formulas[0]
}

// formulaNames lists the names for a parameter's choices.
func formulaNames(formulas []saturation) []string {
	names := make([]string, len(formulas))
	for i := range formulas {
		names[i] = formulas[i].name
	}
	return names
}

// methodParameter lets a formula be chosen.
func methodParameter(formulas []saturation, over string) law.Parameter {
	return law.Parameter{
		Name: "method", Meaning: "which published formula for the saturation pressure over " + over, Type: law.Text,
		Default: `"` + formulas[0].name + `"`, Choices: formulaNames(formulas),
	}
}

func scaleParameter() law.Parameter {
	return law.Parameter{
		Name: "scale", Type: law.Text, Default: `"` + scaleITS90 + `"`, Choices: []string{scaleITS90, scaleIPTS68},
		Meaning: "temperature scale of the temperature; a formula on the other scale gets t68 = 1.00024 t90, one older than both takes it as it stands",
	}
}
