package fluid

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// unesco44Source is the source of the sea-water algorithms of 1983.
const unesco44Source = "Fofonoff N.P., Millard R.C. (1983) Algorithms for computation of fundamental properties of seawater, UNESCO Technical Papers in Marine Science 44"

// Parameters that the sea-water laws of 1983 share.

func practicalSalinity(valid, finite law.Range) law.Parameter {
	return law.Parameter{
		Name: "practical_salinity", Meaning: "practical salinity (PSS-78), a pure number near grams of salt in a kilogram of sea water",
		Unit: "1", Valid: valid, Finite: finite,
	}
}

func seaTemperature(valid, finite law.Range) law.Parameter {
	return law.Parameter{
		Name: "temperature", Meaning: "temperature in the sea, on the scale told",
		Unit: "degC", Valid: valid, Finite: finite,
	}
}

func seaPressureAbove(valid, finite law.Range) law.Parameter {
	return law.Parameter{
		Name: "sea_pressure", Meaning: "pressure above that of one standard atmosphere: zero at the surface",
		Unit: "dbar(g)", Valid: valid, Finite: finite,
	}
}

func temperatureScale() law.Parameter {
	return law.Parameter{
		Name: "scale", Meaning: "temperature scale; ITS-90 is turned into IPTS-68 by t68 = 1.00024 t90",
		Type: law.Text, Default: `"` + scaleITS90 + `"`, Choices: []string{scaleITS90, scaleIPTS68},
	}
}

// scaleFactor gives what turns degrees Celsius on the scale told into those on
// IPTS-68.
func scaleFactor(scale *law.Argument) float64 {
	if scale.Text == scaleIPTS68 {
		return 1
	}
	return its90ToIPTS68
}

// ofSea lifts a function of practical salinity, temperature in degC on IPTS-68
// and sea pressure in bar to blocks of rows; the fourth argument is the scale.
func ofSea(f func(s, t, p float64) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		scale := scaleFactor(&arguments[3])
		salinities, temperatures, pressures := arguments[0].Values, arguments[1].Values, arguments[2].Values
		salinityStep, temperatureStep, pressureStep := column.Stride(salinities), column.Stride(temperatures), column.Stride(pressures)
		for i := range dst {
			dst[i] = f(
				salinities[i*salinityStep],
				float64((temperatures[i*temperatureStep]-nature.IcePoint)*scale),
				float64(pressures[i*pressureStep]*barsPerPascal))
		}
	}
}
