package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// airLaws are those of the density of the air that things are weighed in.
func airLaws() []*law.Law {
	return []*law.Law{
		{
			Name: "moist_air_density", Group: "fluid",
			Gives: "density of moist air by the formula of the metrologists, CIPM-2007",
			Parameters: []law.Parameter{
				{Name: "pressure", Meaning: "absolute pressure of the air", Unit: "hPa(a)", Valid: law.Within(600, 1100), Finite: law.Within(0, 2000)},
				{Name: "temperature", Meaning: "temperature of the air on ITS-90", Unit: "degC", Valid: law.Within(15, 27), Finite: law.Within(-40, 80)},
				{Name: "humidity", Meaning: "relative humidity over liquid water", Unit: "1", Valid: law.Within(0, 1), Finite: law.Within(0, 1)},
				{Name: "carbon_dioxide", Meaning: "mole fraction of carbon dioxide, which takes the place of oxygen", Unit: "1", Valid: law.Within(0, 0.01), Finite: law.Within(0, 0.2), Default: "0.0004"},
			},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "rho = p M_a/(Z R T) [1 - x_v (1 - M_v/M_a)]; M_a = [28.96546 + 12.011 (x_CO2 - 0.0004)] g/mol, M_v = 18.01528 g/mol, R = 8.314472 J/(mol K); x_v = h f p_sv/p; p_sv = 1 Pa exp(A T^2 + B T + C + D/T), A = 1.2378847e-5, B = -1.9121316e-2, C = 33.93711047, D = -6.3431645e3; f = 1.00062 + 3.14e-8 p + 5.6e-7 t^2; Z = 1 - (p/T)[a0 + a1 t + a2 t^2 + (b0 + b1 t) x_v + (c0 + c1 t) x_v^2] + (p/T)^2 (d + e x_v^2); p pressure in Pa, T temperature in K, t in degC, h humidity",
			Source:   "Picard A., Davis R.S., Glaeser M., Fujii K. (2008) Revised formula for the density of moist air (CIPM-2007), Metrologia 45, 149-155",
			Caution:  "The relative standard uncertainty of the formula is 22e-6. The pressure is that at the balance, not reduced to sea level.",
			Refusal:  "at that humidity the vapour alone would have more than the whole pressure",
			Examples: []law.Example{
				// Ma/R of the simplified form times p/T; at 1 Pa Z is 1 to 1e-8.
				{Formula: "moist_air_density(1[Pa], 293.15[K], 0) * 293.15[K] / 1[Pa]", Gives: "3.483740e-3 kg K/J"},
			},
			Body: moistAirBody,
		},
		{
			Name: "oiml_air_density", Group: "fluid",
			Gives: "density of moist air by the approximation of legal metrology",
			Parameters: []law.Parameter{
				{Name: "pressure", Meaning: "absolute pressure of the air", Unit: "hPa(a)", Valid: law.Within(900, 1100), Finite: law.Within(0, 2000)},
				{Name: "temperature", Meaning: "temperature of the air", Unit: "degC", Valid: law.Within(10, 30), Finite: law.Within(-40, 60)},
				{Name: "humidity", Meaning: "relative humidity", Unit: "1", Valid: law.Within(0, 0.8), Finite: law.Within(0, 1)},
			},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "rho = [0.34848 p - 0.009 h exp(0.061 t)]/(273.15 + t); p pressure in hPa, h humidity in %, t temperature in degC",
			Source:   "OIML R 111-1 (2004) Weights of classes E1 to M3, annex E, equation E.3-1",
			Caution:  "Relative uncertainty 2e-4; moist_air_density is ten times better.",
			Refusal:  "at so low a pressure the approximation falls below zero",
			Examples: []law.Example{
				{Formula: "oiml_air_density(1000[hPa], 20[degC], 0)", Gives: "1.18874 kg/m^3"},
			},
			Body: law.Of3(oimlAirDensity),
		},
	}
}

// moistAirBody takes pressure, temperature, humidity and carbon dioxide.
func moistAirBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	pressures, temperatures := arguments[0].Values, arguments[1].Values
	humidities, dioxides := arguments[2].Values, arguments[3].Values
	pressureStep, temperatureStep := column.Stride(pressures), column.Stride(temperatures)
	humidityStep, dioxideStep := column.Stride(humidities), column.Stride(dioxides)
	for i := range dst {
		dst[i] = moistAirDensity(pressures[i*pressureStep], temperatures[i*temperatureStep],
			humidities[i*humidityStep], dioxides[i*dioxideStep])
	}
}

// moistAirDensity gives the density of air in kg/m^3 from pressure in Pa,
// temperature in K, relative humidity and the mole fraction of carbon dioxide
// (Picard et al. 2008, appendix A1, equation A1.1). The gas constant is that of
// CODATA 2006, with which the formula was fitted.
func moistAirDensity(pressure, temperature, humidity, dioxide float64) float64 {
	const (
		gasConstant = 8.314472    // J/(mol K)
		vapourMass  = 18.01528e-3 // kg/mol
		dryMass     = 28.96546e-3 // kg/mol at a carbon dioxide content of 0.0004
		carbonMass  = 12.011e-3   // kg/mol: carbon dioxide less oxygen
		usual       = 0.0004      // carbon dioxide content of dryMass
	)
	t := temperature - nature.IcePoint
	inverse := 1 / temperature
	saturated := column.Exp(float64((float64(1.2378847e-5*temperature)-1.9121316e-2)*temperature) + 33.93711047 - float64(6.3431645e3*inverse))
	enhancement := float64(3.14e-8*pressure) + float64(5.6e-7*float64(t*t)) + 1.00062
	vapour := float64(humidity * enhancement * saturated)
	if vapour > pressure {
		return math.NaN()
	}
	share := 0.0
	if vapour > 0 {
		share = vapour / pressure
	}
	ratio := pressure * inverse
	first := float64((float64(1.1043e-10*t)-2.9331e-8)*t) + 1.58123e-6 +
		float64((float64((float64(-2.376e-6*t)+1.9898e-4)*share)+float64(-2.051e-8*t)+5.707e-6)*share)
	second := float64(-0.765e-8*float64(share*share)) + 1.83e-11
	compression := 1 - float64((first-float64(second*ratio))*ratio)
	mass := float64(carbonMass*(dioxide-usual)) + dryMass
	return float64((mass-float64(share*(mass-vapourMass)))*ratio) / float64(gasConstant*compression)
}

// oimlAirDensity gives the density of air in kg/m^3 from pressure in Pa,
// temperature in K and relative humidity.
func oimlAirDensity(pressure, temperature, humidity float64) float64 {
	t := temperature - nature.IcePoint
	density := (float64(0.0034848*pressure) - float64(0.9*humidity*column.Exp(float64(0.061*t)))) / temperature
	if density < 0 {
		return math.NaN()
	}
	return density
}
