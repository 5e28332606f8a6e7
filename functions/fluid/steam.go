package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// industrialFormulation is the source of the laws of water and steam.
const industrialFormulation = "IAPWS R7-97(2012), Revised Release on the IAPWS Industrial Formulation 1997 for the Thermodynamic Properties of Water and Steam"

// Texts that the laws of one region share.
const (
	liquidRegion = "region 1: gamma = sum of n_i (7.1 - pi)^I_i (tau - 1.222)^J_i, pi = p/16.53 MPa, tau = 1386 K/T, 34 terms; R = 461.526 J/(kg K), p pressure, T temperature (ITS-90)"
	steamRegion  = "region 2: gamma = ln(pi) + sum of n0_i tau^J0_i + sum of n_i pi^I_i (tau - 0.5)^J_i, pi = p/1 MPa, tau = 540 K/T, 9 and 43 terms; R = 461.526 J/(kg K), p pressure, T temperature (ITS-90)"

	liquidRefusal = "the pressure lies below that of saturation: water boils there, ask the laws of steam"
	steamRefusal  = "the pressure lies above that of saturation or of the boundary with region 3: steam condenses there or is near its critical point; ask the laws of water for the liquid"

	liquidCaution = "Pure water, absolute pressure. Sea water, and water saturated with air at its sixth digit, differ. "
	steamCaution  = "Pure, dry steam, absolute pressure: wet steam is a mixture of both phases. "
)

// steamLaws are those of liquid water and of steam by IAPWS-IF97.
func steamLaws() []*law.Law {
	type property struct {
		name, gives, unit, equation string
		example                     law.Example
		of                          func(temperature, pressure float64) float64
	}
	law1 := func(p property) *law.Law {
		return &law.Law{
			Name: p.name, Group: "fluid", Gives: p.gives,
			Parameters: []law.Parameter{
				{
					Name: "temperature", Meaning: "temperature of the water on ITS-90", Unit: "K",
					// Supercooled water follows the equation smoothly; above, region 3 begins.
					Valid: law.Within(273.15, 623.15), Finite: law.Within(253.15, 623.15),
				},
				{
					Name: "pressure", Meaning: "absolute pressure, at least that of saturation", Unit: "MPa(a)",
					Valid: law.AtMost(100), Finite: law.Range{Low: 0, High: 120, HasLow: true, HasHigh: true, LowOpen: true},
				},
			},
			Result: law.Result{Unit: p.unit}, Equation: p.equation + "; " + liquidRegion,
			Source: industrialFormulation + ", section 5", Caution: liquidCaution + law.CautionPressure,
			Refusal: liquidRefusal, Examples: []law.Example{p.example}, Body: law.Of2(p.of),
		}
	}
	law2 := func(p property) *law.Law {
		return &law.Law{
			Name: p.name, Group: "fluid", Gives: p.gives,
			Parameters: []law.Parameter{
				{
					Name: "temperature", Meaning: "temperature of the steam on ITS-90", Unit: "K",
					Valid: law.Within(273.15, 1073.15), Finite: law.Within(253.15, 1273.15),
				},
				{
					Name: "pressure", Meaning: "absolute pressure, at most that of saturation", Unit: "MPa(a)",
					Valid: law.AtMost(100), Finite: law.Range{Low: 0, High: 100, HasLow: true, HasHigh: true, LowOpen: true},
				},
			},
			Result: law.Result{Unit: p.unit}, Equation: p.equation + "; " + steamRegion,
			Source: industrialFormulation + ", section 6", Caution: steamCaution + law.CautionPressure,
			Refusal: steamRefusal, Examples: []law.Example{p.example}, Body: law.Of2(p.of),
		}
	}
	const (
		density  = "rho = p/(R T pi dgamma/dpi)"
		enthalpy = "h = R T tau dgamma/dtau"
		energy   = "u = R T (tau dgamma/dtau - pi dgamma/dpi)"
		entropy  = "s = R (tau dgamma/dtau - gamma)"
		heat     = "c_p = -R tau^2 d2gamma/dtau2"
		sound    = "w^2 = R T (dgamma/dpi)^2/[(dgamma/dpi - tau d2gamma/dpidtau)^2/(tau^2 d2gamma/dtau2) - d2gamma/dpi2]"
	)
	return []*law.Law{
		law1(property{
			"water_density", "density of liquid water at any pressure", "kg/m^3", density,
			law.Example{Formula: "1 / water_density(300[K], 80[MPa])", Gives: "0.971180894e-3 m^3/kg"}, waterDensity,
		}),
		law1(property{
			"water_enthalpy", "specific enthalpy of liquid water, zero energy and entropy of the liquid at the triple point", "kJ/kg", enthalpy,
			law.Example{Formula: "water_enthalpy(300[K], 80[MPa])", Gives: "184.142828 kJ/kg"}, liquidProperty(liquidEnthalpy),
		}),
		law1(property{
			"water_internal_energy", "specific internal energy of liquid water, zero for the liquid at the triple point", "kJ/kg", energy,
			law.Example{Formula: "water_internal_energy(500[K], 3[MPa])", Gives: "971.934985 kJ/kg"}, liquidProperty(liquidEnergy),
		}),
		law1(property{
			"water_entropy", "specific entropy of liquid water, zero for the liquid at the triple point", "kJ/(kg K)", entropy,
			law.Example{Formula: "water_entropy(500[K], 3[MPa])", Gives: "2.58041912 kJ/(kg K)"}, liquidProperty(liquidEntropy),
		}),
		law1(property{
			"water_heat_capacity", "specific heat capacity of liquid water at constant pressure", "kJ/(kg K)", heat,
			law.Example{Formula: "water_heat_capacity(300[K], 3[MPa])", Gives: "4.17301218 kJ/(kg K)"}, liquidProperty(liquidHeat),
		}),
		law1(property{
			"water_sound_speed", "speed of sound in liquid water", "m/s", sound,
			law.Example{Formula: "water_sound_speed(300[K], 3[MPa])", Gives: "1507.73921 m/s"}, liquidProperty(soundSpeed(liquidTemperature)),
		}),
		law2(property{
			"steam_density", "density of dry steam", "kg/m^3", density,
			law.Example{Formula: "1 / steam_density(700[K], 30[MPa])", Gives: "0.542946619e-2 m^3/kg"}, steamProperty(steamDensity),
		}),
		law2(property{
			"steam_enthalpy", "specific enthalpy of dry steam, zero energy and entropy of the liquid at the triple point", "kJ/kg", enthalpy,
			law.Example{Formula: "steam_enthalpy(700[K], 0.0035[MPa])", Gives: "3335.68375 kJ/kg"}, steamProperty(steamEnthalpy),
		}),
		law2(property{
			"steam_internal_energy", "specific internal energy of dry steam, zero for the liquid at the triple point", "kJ/kg", energy,
			law.Example{Formula: "steam_internal_energy(300[K], 0.0035[MPa])", Gives: "2411.69160 kJ/kg"}, steamProperty(steamEnergy),
		}),
		law2(property{
			"steam_entropy", "specific entropy of dry steam, zero for the liquid at the triple point", "kJ/(kg K)", entropy,
			law.Example{Formula: "steam_entropy(700[K], 0.0035[MPa])", Gives: "10.1749996 kJ/(kg K)"}, steamProperty(steamEntropy),
		}),
		law2(property{
			"steam_heat_capacity", "specific heat capacity of dry steam at constant pressure", "kJ/(kg K)", heat,
			law.Example{Formula: "steam_heat_capacity(300[K], 0.0035[MPa])", Gives: "1.91300162 kJ/(kg K)"}, steamProperty(steamHeat),
		}),
		law2(property{
			"steam_sound_speed", "speed of sound in dry steam", "m/s", sound,
			law.Example{Formula: "steam_sound_speed(700[K], 30[MPa])", Gives: "480.386523 m/s"}, steamProperty(soundSpeed(steamTemperature)),
		}),
	}
}

// nearSaturation widens the bounds of the regions, so that a state computed to
// lie on the curve is taken by both.
const nearSaturation = 1e-9

// aboveSaturation gives a pressure in Pa that lies above that of saturation by
// 0.4 % to 6 %, at a temperature in K of region 1: the fourth power of a
// polynomial. It decides most rows without the root of saturationPressure.
func aboveSaturation(temperature float64) float64 {
	u := (temperature - 438) * 1e-3
	root := float64((float64((float64((float64(1045.2*u)-470.8)*u)+100.45)*u)+180.06)*u) + 29.052
	square := root * root
	return square * square
}

// isLiquid says whether water at a temperature in K and a pressure in Pa is a
// liquid.
func isLiquid(temperature, pressure float64) bool {
	return pressure > aboveSaturation(temperature) || pressure >= saturationPressure(temperature)*(1-nearSaturation)
}

// isSteam says whether water at a temperature in K and a pressure in Pa lies in
// region 2.
func isSteam(temperature, pressure float64) bool {
	switch {
	case temperature > 863.15:
		return true
	case temperature > 623.15:
		return pressure <= boundaryPressure(temperature)*(1+nearSaturation)
	}
	return pressure <= saturationPressure(temperature)*(1+nearSaturation)
}

// waterDensity gives the density of liquid water in kg/m^3; NaN where it is
// steam.
func waterDensity(temperature, pressure float64) float64 {
	if !isLiquid(temperature, pressure) {
		return math.NaN()
	}
	return liquidDensity(temperature, pressure)
}

// state is a point of the surface of states: temperature in K, pressure in Pa.
type state struct {
	temperature, pressure float64
	reducedGibbs
}

// liquidProperty makes a law's function of a property of region 1.
func liquidProperty(of func(s state) float64) func(temperature, pressure float64) float64 {
	return func(temperature, pressure float64) float64 {
		if !isLiquid(temperature, pressure) {
			return math.NaN()
		}
		return of(state{temperature, pressure, liquidGibbs(temperature, pressure)})
	}
}

// steamProperty makes a law's function of a property of region 2.
func steamProperty(of func(s state) float64) func(temperature, pressure float64) float64 {
	return func(temperature, pressure float64) float64 {
		if !isSteam(temperature, pressure) {
			return math.NaN()
		}
		return of(state{temperature, pressure, steamGibbs(temperature, pressure)})
	}
}

// Properties in coherent SI units (tables 3 and 12 of the release). With tau =
// T*/T, R T tau = R T*; with pi = p/p*, p/pi = p*.

func liquidEnthalpy(s state) float64 { return steamGasConstant * liquidTemperature * s.t }
func steamEnthalpy(s state) float64  { return steamGasConstant * steamTemperature * s.t }

func liquidEnergy(s state) float64 {
	flow := float64(s.pressure/liquidPressure) * s.p
	return steamGasConstant * (float64(liquidTemperature*s.t) - float64(s.temperature*flow))
}

func steamEnergy(s state) float64 {
	flow := float64(s.pressure/steamPressure) * s.p
	return steamGasConstant * (float64(steamTemperature*s.t) - float64(s.temperature*flow))
}

func liquidEntropy(s state) float64 {
	return steamGasConstant * (float64(liquidTemperature/s.temperature*s.t) - s.value)
}

func steamEntropy(s state) float64 {
	value := s.value + column.Ln(s.pressure/steamPressure)
	return steamGasConstant * (float64(steamTemperature/s.temperature*s.t) - value)
}

func liquidHeat(s state) float64 {
	tau := liquidTemperature / s.temperature
	return -steamGasConstant * tau * tau * s.tt
}

func steamHeat(s state) float64 {
	tau := steamTemperature / s.temperature
	return -steamGasConstant * tau * tau * s.tt
}

func steamDensity(s state) float64 {
	return steamPressure / (steamGasConstant * s.temperature * s.p)
}

// soundSpeed makes the speed of sound in m/s of the region reduced by a
// temperature in K.
func soundSpeed(reducing float64) func(s state) float64 {
	return func(s state) float64 {
		tau := reducing / s.temperature
		mixed := s.p - float64(tau*s.pt)
		bend := float64(mixed*mixed)/float64(tau*tau*s.tt) - s.pp
		return s.p * math.Sqrt(steamGasConstant*s.temperature/bend)
	}
}
