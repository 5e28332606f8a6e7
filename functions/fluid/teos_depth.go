package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// teosOceanLaws are those of conservative temperature, density and height of
// TEOS-10.
func teosOceanLaws() []*law.Law {
	conservative := law.Parameter{
		Name: "conservative_temperature", Meaning: "conservative temperature: potential enthalpy divided by 3991.868 J/(kg K), ITS-90",
		Unit: "degC", Valid: law.Within(-2.65, 40), Finite: law.Within(-10, 60),
	}
	latitude := law.Parameter{
		Name: "latitude", Meaning: "geodetic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90),
	}
	const (
		roquet       = "Roquet F., Madec G., McDougall T.J., Barker P.M. (2015) Accurate polynomial expressions for the density and specific volume of seawater using the TEOS-10 standard, Ocean Modelling 90, 29-43"
		heightSource = teosManual + ", appendix D and section 3.32; Moritz H. (2000) Geodetic Reference System 1980, J. Geodesy 74, 128-133; " + roquet
		heightLaw    = "g0 z - 2.26e-7 g0 z^2/2 + integral of v(35.16504 g/kg, 0 degC, p) dp from 0 to p = 0; g0 = 9.780327 m/s^2 (1 + 5.2792e-3 sin^2 phi + 2.32e-5 sin^4 phi); z height, p sea_pressure, phi latitude, v specific volume"
		ocean        = "For an ocean of absolute salinity 35.16504 g/kg at 0 degC throughout; warmer or fresher water changes the height by up to some metres (the dynamic height). "
	)
	return []*law.Law{
		{
			Name: "conservative_temperature", Group: "fluid",
			Gives: "conservative temperature of sea water from the temperature in place",
			Parameters: []law.Parameter{
				absoluteSalinityOf(law.Within(0, 120)),
				{
					Name: "temperature", Meaning: "temperature in place on ITS-90", Unit: "degC",
					Valid: law.Within(-2.65, 40), Finite: law.Within(-10, 60),
				},
				teosPressure(10000),
			},
			Result:   law.Result{Unit: "degC"},
			Equation: "CT = h(S_A, theta, 0)/c_p0, entropy(S_A, theta, 0) = entropy(S_A, t, p), h = g - T dg/dT, entropy = -dg/dT, c_p0 = 3991.86795711963 J/(kg K); g the Gibbs function of sea_gibbs_energy, theta potential temperature",
			Source:   "McDougall T.J. (2003) Potential enthalpy: a conservative oceanic variable for evaluating heat content and heat fluxes, J. Phys. Oceanogr. 33, 945-963; " + gibbsSource,
			Caution:  teosCaution,
			Examples: []law.Example{
				{Formula: "conservative_temperature(34.7118[g/kg], 28.7856[degC], 10[dbar])", Gives: "28.809919827 degC"},
			},
			Body: law.Of3(conservativeTemperature),
		},
		{
			Name: "sea_temperature_teos", Group: "fluid",
			Gives:      "temperature in place of sea water from its conservative temperature",
			Parameters: []law.Parameter{absoluteSalinityOf(law.Within(0, 120)), conservative, teosPressure(10000)},
			Result:     law.Result{Unit: "degC"},
			Equation:   "the t for which conservative_temperature(S_A, t, p) is the conservative temperature",
			Source:     "McDougall T.J. (2003) Potential enthalpy: a conservative oceanic variable for evaluating heat content and heat fluxes, J. Phys. Oceanogr. 33, 945-963; " + gibbsSource,
			Caution:    teosCaution,
			Examples: []law.Example{
				{Formula: "sea_temperature_teos(34.7118[g/kg], 28.809919827[degC], 10[dbar])", Gives: "28.7856 degC"},
			},
			Body: law.Of3(temperatureInPlace),
		},
		{
			Name: "sea_water_density_teos", Group: "fluid",
			Gives:      "density of sea water by TEOS-10 from the conservative temperature",
			Parameters: []law.Parameter{absoluteSalinityOf(law.Within(0, 120)), conservative, teosPressure(8000)},
			Result:     law.Result{Unit: "kg/m^3"},
			Equation:   "1/rho = sum of v_ijk x^i y^j z^k, 75 terms, x = sqrt((S_A + 24 g/kg)/(40.188617 g/kg)), y = CT/(40 degC), z = p/(10^4 dbar); S_A absolute_salinity, CT conservative_temperature, p sea_pressure",
			Source:     roquet + "; " + teosManual,
			Caution:    teosCaution + " Conservative temperature is not that of a thermometer: convert with conservative_temperature.",
			Examples: []law.Example{
				{Formula: "1 / sea_water_density_teos(30[g/kg], 10[degC], 1000[dbar])", Gives: "9.732819628e-4 m^3/kg"},
			},
			Body: seaDensityTeosBody,
		},
		{
			Name: "sea_gravity_teos", Group: "fluid",
			Gives: "acceleration of gravity in the sea by TEOS-10",
			Parameters: []law.Parameter{
				latitude,
				{Name: "height", Meaning: "height above the surface of the sea, negative below", Unit: "m", Valid: law.Within(-11000, 0), Finite: law.Within(-20000, 20000), Default: "0[m]"},
			},
			Result:   law.Result{Unit: "m/s^2"},
			Equation: "g = 9.780327 m/s^2 (1 + 5.2792e-3 sin^2 phi + 2.32e-5 sin^4 phi)(1 - 2.26e-7 z); z height in m, phi latitude",
			Source:   teosManual + ", appendix D; Moritz H. (2000) Geodetic Reference System 1980, J. Geodesy 74, 128-133",
			Caution:  "Downwards in the sea only: in the air gravity falls with height by 3.086e-6 1/s^2, see normal_gravity.",
			Examples: []law.Example{
				{Formula: "sea_gravity_teos(90[deg])", Gives: "9.832186205885 m/s^2"},
			},
			Body: law.Of2(func(latitude, height float64) float64 {
				return teosGravity(latitude) * (1 - float64(teosGradient*height))
			}),
		},
		{
			Name: "sea_height_teos", Group: "fluid",
			Gives: "height (negative: depth below the surface) in the standard ocean from sea pressure and latitude, by TEOS-10",
			Parameters: []law.Parameter{
				{Name: "sea_pressure", Meaning: "absolute pressure less 101325 Pa: zero at the surface", Unit: "dbar(g)", Valid: law.Within(0, 8000), Finite: law.Within(0, 12000)},
				latitude,
			},
			Result: law.Result{Unit: "m"}, Equation: heightLaw, Source: heightSource, Caution: ocean + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "sea_height_teos(1000[dbar], 4[deg])", Gives: "-992.091906072 m"},
			},
			Body: law.Of2(teosHeight),
		},
		{
			Name: "sea_pressure_teos", Group: "fluid",
			Gives: "sea pressure in the standard ocean from height (negative: depth below the surface) and latitude, by TEOS-10",
			Parameters: []law.Parameter{
				{Name: "height", Meaning: "height above the surface of the sea: negative", Unit: "m", Valid: law.Within(-7800, 0), Finite: law.Within(-11500, 0)},
				latitude,
			},
			Result: law.Result{Unit: "dbar(g)"}, Equation: heightLaw, Source: heightSource, Caution: ocean + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "sea_pressure_teos(-1000[m], 4[deg])", Gives: "1007.99033769 dbar"},
			},
			Body: law.Of2(teosPressureAt),
		},
	}
}

// seaDensityTeosBody takes absolute salinity, conservative temperature and sea
// pressure.
func seaDensityTeosBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	salinities, temperatures, pressures := arguments[0].Values, arguments[1].Values, arguments[2].Values
	salinityStep, temperatureStep, pressureStep := column.Stride(salinities), column.Stride(temperatures), column.Stride(pressures)
	for i := range dst {
		dst[i] = 1 / seaSpecificVolume(
			salinities[i*salinityStep]*1e3,
			temperatures[i*temperatureStep]-nature.IcePoint,
			pressures[i*pressureStep]/pascalsPerDecibar)
	}
}

// teosGradient is the relative decrease of gravity with height in the sea, 1/m.
const teosGradient = 2.26e-7

// teosGravity gives gravity at the surface of the sea in m/s^2 at a latitude in
// rad.
func teosGravity(latitude float64) float64 {
	sine := column.Sin(latitude)
	x := float64(sine * sine)
	return 9.780327 * (1 + float64((float64(2.32e-5*x)+5.2792e-3)*x))
}

// standardDynamicHeight gives the integral in J/kg of the standard ocean's
// specific volume from the surface down to a sea pressure of z in 10^8 Pa.
func standardDynamicHeight(z float64) float64 {
	sum := 0.0
	for k := len(standardVolume) - 1; k >= 0; k-- {
		sum = float64(sum*z) + standardVolume[k]/float64(k+1)
	}
	return float64(gibbsPressure * z * sum)
}

// standardVolumeAt gives the standard ocean's specific volume in m^3/kg.
func standardVolumeAt(z float64) float64 {
	sum := 0.0
	for k := len(standardVolume) - 1; k >= 0; k-- {
		sum = float64(sum*z) + standardVolume[k]
	}
	return sum
}

// teosHeight gives the height in m, negative in the sea, from sea pressure in
// Pa and latitude in rad.
func teosHeight(pressure, latitude float64) float64 {
	gravity := teosGravity(latitude)
	work := standardDynamicHeight(pressure / gibbsPressure)
	if work == 0 {
		return 0
	}
	return -2 * work / (gravity + math.Sqrt(float64(gravity*gravity)+float64(2*teosGradient*gravity*work)))
}

// teosPressureAt gives the sea pressure in Pa at a height in m and a latitude in
// rad: Newton's method on the integral of the specific volume. The start is
// within 3 % of the answer, the specific volume varies by 4 %, so that each
// step more than squares the error.
func teosPressureAt(height, latitude float64) float64 {
	gravity := teosGravity(latitude)
	work := float64(-gravity * height * (1 - float64(teosGradient/2*height)))
	z := work / (gibbsPressure * standardVolume[0])
	for range 4 {
		z += (work - standardDynamicHeight(z)) / (gibbsPressure * standardVolumeAt(z))
	}
	return z * gibbsPressure
}
