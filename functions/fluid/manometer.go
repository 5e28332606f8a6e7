package fluid

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// manometerLaws are those of pressures read from columns of liquid.
func manometerLaws() []*law.Law {
	const weather = "WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation (2008), part I, chapter 3 (reduction of mercury barometer readings)"
	liquidDensity := law.Parameter{Name: "liquid_density", Meaning: "density of the manometer's liquid", Unit: "kg/m^3", Finite: law.Above(0)}
	fluidDensity := law.Parameter{Name: "fluid_density", Meaning: "density of the fluid above it in both legs; 0 for a gas", Unit: "kg/m^3", Finite: law.AtLeast(0), Default: "0[kg/m^3]"}
	gravity := law.Parameter{Name: "gravity", Meaning: "acceleration of gravity", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"}
	return []*law.Law{
		{
			Name: "manometer_difference", Group: "fluid",
			Gives: "difference of pressure between the legs of a U-tube manometer",
			Parameters: []law.Parameter{
				{Name: "reading", Meaning: "vertical distance between the liquid's two surfaces", Unit: "mm"},
				liquidDensity, fluidDensity, gravity,
			},
			Result:   law.Result{Unit: "Pa"},
			Equation: "dp = (rho_m - rho_f) g h; rho_m liquid_density, rho_f fluid_density, h reading, g gravity",
			Source:   textbookStatics,
			Caution:  "A difference, neither gauge nor absolute: add the pressure of the other leg. Mercury and its vapour are poisonous.",
			Examples: []law.Example{
				{Formula: "manometer_difference(760[mm], 13595.1[kg/m^3])", Gives: "101325 Pa"},
				{Formula: "manometer_difference(100[mm], 13600[kg/m^3], fluid_density: 1000[kg/m^3], gravity: 10[m/s^2])", Gives: "12600 Pa"},
			},
			Body: law.Of4(func(reading, liquid, fluid, gravity float64) float64 {
				return (liquid - fluid) * gravity * reading
			}),
		},
		{
			Name: "inclined_manometer_difference", Group: "fluid",
			Gives: "difference of pressure between the well and the inclined tube of a manometer",
			Parameters: []law.Parameter{
				{Name: "reading", Meaning: "distance along the tube from where the liquid stands without pressure", Unit: "mm"},
				{Name: "inclination", Meaning: "angle of the tube from the horizontal", Unit: "deg", Valid: law.Within(2, 90), Finite: law.Within(0, 90)},
				liquidDensity,
				{Name: "area_ratio", Meaning: "cross-section of the tube divided by that of the well, whose level falls; 0 where the scale allows for it", Unit: "1", Finite: law.Within(0, 1), Default: "0"},
				fluidDensity, gravity,
			},
			Result:   law.Result{Unit: "Pa"},
			Equation: "dp = (rho_m - rho_f) g L (sin a + A_t/A_w); rho_m liquid_density, rho_f fluid_density, L reading, a inclination, A_t/A_w area_ratio, g gravity",
			Source:   textbookStatics,
			Caution:  "At small inclinations an error of level is one of pressure: 0.1 deg at 10 deg are 1 %.",
			Examples: []law.Example{
				{Formula: "inclined_manometer_difference(100[mm], 30[deg], 800[kg/m^3], gravity: 10[m/s^2])", Gives: "400 Pa"},
			},
			Body: law.OfMany(func(x []float64) float64 {
				rise := float64(x[0] * (column.Sin(x[1]) + x[3]))
				return (x[2] - x[4]) * x[5] * rise
			}),
		},
		{
			Name: "barometer_pressure", Group: "fluid",
			Gives: "pressure of the air from a mercury barometer, reduced for temperature and gravity",
			Parameters: []law.Parameter{
				{Name: "reading", Meaning: "height of the mercury as read on the scale, corrected for its index and capillarity", Unit: "mm", Valid: law.Within(400, 820), Finite: law.AtLeast(0)},
				{Name: "temperature", Meaning: "temperature of the mercury and the scale", Unit: "degC", Valid: law.Within(0, 100), Finite: law.Within(-38.83, 150)},
				{Name: "latitude", Meaning: "geodetic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90), Default: "45[deg]"},
				{Name: "elevation", Meaning: "height of the barometer above the ellipsoid (nearly: above sea level)", Unit: "m", Valid: law.Within(-500, 10000), Finite: law.Within(-20000, 1e6), Default: "0[m]"},
				{Name: "scale_expansion", Meaning: "linear expansion of the scale, true at 0 degC: 18.4e-6 1/K for brass, 0 for a reading already reduced", Unit: "1/K", Finite: law.Within(-1e-4, 1e-4), Default: "18.4e-6[1/K]"},
			},
			Result:   law.Result{Unit: "hPa(a)"},
			Equation: "p = rho(t) g h (1 + b t); rho mercury_density at one atmosphere, g normal_gravity at latitude and elevation (WGS-84), h reading, b scale_expansion, t temperature in degC",
			Source:   weather + "; mercury and gravity as in mercury_density and normal_gravity",
			Caution:  "The pressure at the barometer, not at sea level. The mercury is taken as still standing under a vacuum. Mercury and its vapour are poisonous.",
			Examples: []law.Example{
				// 13595.08 kg/m^3 times 9.806198 m/s^2 times 0.76 m.
				{Formula: "barometer_pressure(760[mm], 0[degC])", Gives: "1013.202 hPa"},
			},
			Body: barometerBody,
		},
	}
}

// barometerBody takes reading, temperature, latitude, elevation and the scale's
// expansion.
func barometerBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	for i := range dst {
		reading, temperature := arguments[0].At(i), arguments[1].At(i)
		surface, slope := wgs84.gravity(arguments[2].At(i))
		gravity := wgs84.raised(surface, slope, arguments[3].At(i))
		stretched := 1 + float64(arguments[4].At(i)*(temperature-nature.IcePoint))
		dst[i] = mercuryDensity(temperature, nature.StandardAtmosphere) * gravity * reading * stretched
	}
}
