package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// altimeter is the pair of constants of p0^n = p^n + c h, the standard
// atmosphere's pressure below 11 km: n = R L/g0 and c = p0^n L/T0, in Pa and
// gpm.
type altimeter struct{ power, rise float64 }

// altimeterNamed gives the constants of ICAO, exact, or of the National Weather
// Service, which are rounded: n = 0.1903, c = 1.313e-5 for inches of mercury
// and feet.
func altimeterNamed(method string) altimeter {
	if method == "NWS" {
		const inchOfMercury = 3386.389
		return altimeter{power: 0.1903, rise: 1.313e-5 / 0.3048 * column.Pow(inchOfMercury, 0.1903)}
	}
	const power = icaoGasConstant * 0.0065 / standardGravity
	return altimeter{power: power, rise: 0.0065 / 288.15 * column.Pow(seaLevelPressure, power)}
}

// raised gives the pressure whose power differs by sign times the rise over the
// elevation; NaN where nothing is left.
func (a altimeter) raised(pressure, elevation, sign float64) float64 {
	x := column.Pow(pressure, a.power) + float64(sign*a.rise*elevation)
	if !(x > 0) {
		return notANumber
	}
	return column.Pow(x, 1/a.power)
}

// altimetryLaws are those of altimeters and of pressure at sea level.
var altimetryLaws = []*law.Law{
	{
		Name: "altimeter_setting", Group: group, Gives: "the altimeter setting (QNH) that makes an altimeter on the ground read the field's elevation",
		Parameters: []law.Parameter{
			{Name: "field_pressure", Meaning: "absolute pressure at the field (QFE)", Unit: "hPa(a)", Valid: law.Within(500, 1100), Finite: law.Above(0)},
			altimetryElevation, altimetryMethod,
		},
		Result: law.Result{Unit: "hPa(a)"}, Equation: altimetryEquation, Source: altimetrySource, Caution: aviationCaution,
		Refusal:  "so far below sea level no pressure is left",
		Examples: []law.Example{{Formula: "altimeter_setting(1000[hPa], 0[m])", Gives: "1000 hPa"}},
		Body:     altimetryOfSign(1),
	},
	{
		Name: "field_pressure", Group: group, Gives: "the pressure at a field (QFE) from the altimeter setting (QNH)",
		Parameters: []law.Parameter{
			{Name: "altimeter_setting", Meaning: "altimeter setting (QNH)", Unit: "hPa(a)", Valid: law.Within(900, 1100), Finite: law.Above(0)},
			altimetryElevation, altimetryMethod,
		},
		Result: law.Result{Unit: "hPa(a)"}, Equation: altimetryEquation, Source: altimetrySource, Caution: aviationCaution,
		Refusal:  "the field lies above the air that the formula knows",
		Examples: []law.Example{{Formula: "field_pressure(30.37[inHg], 7014[ft])", Gives: "793.76 hPa"}},
		Body:     altimetryOfSign(-1),
	},
	{
		Name: "sea_level_pressure", Group: group, Gives: "the pressure at a station reduced to sea level",
		Parameters: []law.Parameter{
			{Name: "station_pressure", Meaning: "absolute pressure at the station", Unit: "hPa(a)", Finite: law.Above(0)},
			{Name: "elevation", Meaning: "geopotential height of the station above mean sea level, or its geometric one, which differs by less than 0.1 m", Unit: "gpm", Valid: law.Within(-500, 750), Finite: law.Within(-1000, 9000), Accepts: []law.Conversion{{Unit: "m", Factor: 1}}},
			{Name: "temperature", Meaning: "temperature at the station", Unit: "K", Finite: law.Above(100)},
			{Name: "vapour_pressure", Meaning: "absolute pressure of the water vapour at the station", Unit: "hPa(a)", Finite: law.AtLeast(0), Default: "0[hPa]"},
		},
		Result:   law.Result{Unit: "hPa(a)"},
		Equation: "log10(p0/p_S) = K_p H/T_mv, T_mv = T_S + a H/2 + e_S C_h; K_p = 0.0148275 K/gpm, a = 0.0065 K/gpm, C_h = 0.12 K/hPa; p_S station_pressure, H elevation",
		Source:   "WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation, annex 3.A (stations below about 750 m)",
		Caution:  "A fiction: there is no air below the station. K_p belongs to the older geopotential metre of 9.8 J/kg: 0.06 % less than with 9.80665. " + aviationCaution,
		Examples: []law.Example{{Formula: "sea_level_pressure(1000[hPa], 0[gpm], 288.15[K])", Gives: "1000 hPa"}},
		Body: law.Of4(func(p, h, t, e float64) float64 {
			mean := t + float64(0.0065/2*h) + float64(0.0012*e)
			return p * power10(0.0148275*h/mean)
		}),
	},
}

var altimetryElevation = law.Parameter{
	Name: "elevation", Meaning: "height of the field above mean sea level", Unit: "m", Valid: law.Within(-500, 5000), Finite: law.Within(-5000, 11000),
	Accepts: []law.Conversion{{Unit: "gpm", Factor: 1}},
}
var altimetryMethod = law.Parameter{
	Name: "method", Meaning: "constants: those of the ICAO atmosphere, or the rounded ones of the U.S. National Weather Service", Type: law.Text,
	Default: `"ICAO"`, Choices: []string{"ICAO", "NWS"},
}

const (
	altimetrySource   = "ICAO Doc 7488/3 (3rd ed., 1993); FAA and NWS, algorithms of the automated surface observing system: AS = (Pa^0.1903 + 1.313e-5 Ha)^(1/0.1903), inHg and ft; Smithsonian Meteorological Tables, 6th ed., 1951, p. 269"
	altimetryEquation = "QNH^n = QFE^n + (p0^n L/T0) H, n = R L/g0 = 0.190263, L = 6.5 K/km, T0 = 288.15 K, p0 = 1013.25 hPa; NWS: n = 0.1903 and 1.313e-5 inHg^n/ft; QFE field pressure, QNH altimeter setting"
)

func altimetryOfSign(sign float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		a := altimeterNamed(arguments[2].Text)
		for i := range dst {
			dst[i] = a.raised(arguments[0].At(i), arguments[1].At(i), sign)
		}
	}
}
