package air

import "plumbrule/engine/law"

const (
	standardSource  = "U.S. Standard Atmosphere, 1976 (NOAA/NASA/USAF, NOAA-S/T 76-1562)"
	standardCaution = "A mean atmosphere at middle latitude in a year of average sunshine: on a given day pressure, temperature and density differ by several percent, above 50 km by tens of percent, above 200 km by a factor of several with the sun's activity."

	// upperEquations tell how the standard goes on above 86 km.
	upperEquations = "above 86 km from the standard's equations of diffusion for N2, O, O2, Ar, He and H"
)

// altitudeInStandard is the parameter of every law of the standard. Geometric
// metres are turned into geopotential ones on the way in.
func altitudeInStandard() law.Parameter {
	return altitudeWithin(lowestGeopotential, topGeopotential, "-5 km to 1000 km geometric")
}

// altitudeInLowerPart is that of the laws which the standard ends at 86 km.
func altitudeInLowerPart() law.Parameter {
	return altitudeWithin(lowestGeopotential, highestGeopotential, "-5 km to 86 km geometric; the standard defines it no higher")
}

func altitudeWithin(low, high float64, words string) law.Parameter {
	return law.Parameter{
		Name:    "altitude",
		Meaning: "geopotential height above mean sea level, or a geometric one, which is converted; " + words,
		Unit:    "gpm",
		Valid:   law.Within(low, high),
		Finite:  law.Within(low, high),
		Accepts: []law.Conversion{{Unit: "m", By: geopotentialHeightLaw}},
	}
}

var standardTemperatureLaw = &law.Law{
	Name:       "standard_temperature",
	Group:      group,
	Gives:      "the temperature of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{altitudeInStandard()},
	Result:     law.Result{Unit: "K"},
	Equation: "T = TM M/M0, TM = TM,b + L_b (H - H_b) up to 86 km; M/M0 = 1 below 80 km, above by the standard's table, linear in geometric altitude; " +
		"86 to 91 km T = 186.8673 K; to 110 km T = 263.1905 K - 76.3232 K sqrt(1 - ((z - 91 km)/19.9429 km)^2); to 120 km T = 240 K + 12 K/km (z - 110 km); " +
		"to 1000 km T = 1000 K - 640 K exp(-0.01875 xi/km), xi = (z - 120 km)(r0 + 120 km)/(r0 + z)",
	Source:  standardSource + ", equations 22, 23, 25, 27, 29 and 31, tables 4 and 8",
	Caution: standardCaution + " The standard's tables print the molecular-scale temperature TM, which is up to 0.08 K higher between 80 km and 86 km.",
	Examples: []law.Example{
		{Formula: "standard_temperature(11000[gpm])", Gives: "216.65 K"},
		{Formula: "standard_temperature(86[km])", Gives: "186.867 K"},
		{Formula: "standard_temperature(115[km])", Gives: "300.00 K"},
	},
	Body: law.Of1(standardTemperature),
}

var standardPressureLaw = &law.Law{
	Name:       "standard_pressure",
	Group:      group,
	Gives:      "the pressure of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{altitudeInStandard()},
	Result:     law.Result{Unit: "Pa(a)"},
	Equation:   "P = P_b (TM,b/TM)^(g0 M0/(R* L_b)), or P = P_b exp(-g0 M0 (H - H_b)/(R* TM,b)) where L_b = 0; P_0 = 101325 Pa, R* = 8314.32 J/(kmol K), M0 = 28.9644 kg/kmol; above 86 km P = sum(n_i) k T, the n_i " + upperEquations,
	Source:     standardSource + ", equations 33a, 33b and 33c, table 4",
	Caution:    standardCaution,
	Examples: []law.Example{
		{Formula: "standard_pressure(11000[gpm])", Gives: "22632.06 Pa"},
		{Formula: "standard_pressure(86[km])", Gives: "0.373384 Pa"},
		{Formula: "standard_pressure(400[km])", Gives: "1.4518e-6 Pa"},
	},
	Body: standardBody(upperPressure, standardPressure),
}

var standardDensityLaw = &law.Law{
	Name:       "standard_density",
	Group:      group,
	Gives:      "the density of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{altitudeInStandard()},
	Result:     law.Result{Unit: "kg/m^3"},
	Equation:   "rho = P M0/(R* TM); above 86 km rho = sum(n_i M_i)/N_A, the n_i " + upperEquations,
	Source:     standardSource + ", equations 42 and 33c",
	Caution:    standardCaution,
	Examples: []law.Example{
		{Formula: "standard_density(0[m])", Gives: "1.2250 kg/m^3"},
		{Formula: "standard_density(86[km])", Gives: "6.95788e-6 kg/m^3"},
		{Formula: "standard_density(400[km])", Gives: "2.803e-12 kg/m^3"},
	},
	Body: standardBody(upperDensity, standardDensity),
}

var standardSoundSpeedLaw = &law.Law{
	Name:       "standard_sound_speed",
	Group:      group,
	Gives:      "the speed of sound of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{altitudeInLowerPart()},
	Result:     law.Result{Unit: "m/s"},
	Equation:   "Cs = sqrt(1.4 R* TM/M0)",
	Source:     standardSource + ", equation 50",
	Caution:    "Small amplitudes and audible frequencies; high up, where a wavelength is no longer long against the mean free path, sound is absorbed.",
	Examples: []law.Example{
		{Formula: "standard_sound_speed(0[m])", Gives: "340.294 m/s"},
	},
	Body: law.Of1(standardSoundSpeed),
}

var standardViscosityLaw = &law.Law{
	Name:       "standard_viscosity",
	Group:      group,
	Gives:      "the dynamic viscosity of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{altitudeInLowerPart()},
	Result:     law.Result{Unit: "Pa s"},
	Equation:   "mu = beta T^1.5/(T + S), beta = 1.458e-6 kg/(s m K^0.5), S = 110.4 K",
	Source:     standardSource + ", equation 51",
	Examples: []law.Example{
		{Formula: "standard_viscosity(0[m])", Gives: "1.78938e-5 Pa s"},
	},
	Body: law.Of1(standardViscosity),
}

var pressureAltitudeLaw = &law.Law{
	Name:  "pressure_altitude",
	Group: group,
	Gives: "the geopotential height at which the standard atmosphere has a pressure",
	Parameters: []law.Parameter{{
		Name: "pressure", Meaning: "absolute air pressure", Unit: "Pa(a)",
		Valid:  law.Within(lowestPressure, highestPressure),
		Finite: law.Within(lowestPressure, highestPressure),
	}},
	Result:   law.Result{Unit: "gpm"},
	Equation: "H with P(H) = pressure: in a layer H = H_b + (TM,b/L_b) ((P/P_b)^(-R* L_b/(g0 M0)) - 1), or H = H_b - (R* TM,b/(g0 M0)) ln(P/P_b) where L_b = 0",
	Source:   standardSource + ", equations 33a and 33b solved for the height; ICAO Doc 7488/3 (the same atmosphere below 80 km)",
	Caution:  "A reading of pressure, not a height: it is the true height only on a day when the air is the standard's.",
	Examples: []law.Example{
		{Formula: "pressure_altitude(1013.25[hPa])", Gives: "0 gpm"},
		{Formula: "pressure_altitude(500[hPa])", Gives: "5574 gpm"},
	},
	Body: law.Of1(pressureAltitude),
}

var densityAltitudeLaw = &law.Law{
	Name:  "density_altitude",
	Group: group,
	Gives: "the geopotential height at which the standard atmosphere has a density",
	Parameters: []law.Parameter{{
		Name: "density", Meaning: "density of the air", Unit: "kg/m^3",
		Valid:  law.Within(lowestDensity, highestDensity),
		Finite: law.Within(lowestDensity, highestDensity),
	}},
	Result:   law.Result{Unit: "gpm"},
	Equation: "H with rho(H) = density: in a layer H = H_b + (TM,b/L_b) ((rho/rho_b)^(-1/(1 + g0 M0/(R* L_b))) - 1), or H = H_b - (R* TM,b/(g0 M0)) ln(rho/rho_b) where L_b = 0",
	Source:   standardSource + ", equations 33a, 33b and 42 solved for the height",
	Caution:  "Lift, thrust and climb go with density: on a hot or moist day it stands far above the field's height. Use the aircraft's approved performance data, not this number, to decide on a take-off.",
	Examples: []law.Example{
		{Formula: "density_altitude(0.363918[kg/m^3])", Gives: "11000 gpm"},
	},
	Body: law.Of1(densityAltitude),
}
