package air

import (
	"math"

	"plumbrule/engine/law"
)

// The ICAO standard atmosphere (ICAO Doc 7488/3, 1993; ISO 2533:1975) is the
// U.S. Standard Atmosphere 1976 below 80 km but for the digits of three
// constants and for the molar mass, which stays that of sea level. Only what
// differs by that is here.

const (
	icaoGasConstant  = 287.05287   // R, J/(kg K)
	icaoAvogadro     = 602.257e21  // 1/mol
	icaoConductivity = 2.648151e-3 // W/(m K^1.5)
	icaoTop          = 80000.0     // gpm

	// icaoSoundCoefficient is that of the speed of sound in m/(s K^0.5).
	icaoSoundCoefficient = 20.046796

	icaoSource      = "Manual of the ICAO Standard Atmosphere extended to 80 kilometres, ICAO Doc 7488/3 (3rd ed., 1993); ISO 2533:1975"
	aviationCaution = "Not for navigation: fly by calibrated instruments and published procedures."
)

var icao = atmosphere{layers: standardLayers(icaoGasConstant)}

// ofICAO lifts a function of the layer and the geopotential height to a law's
// function of the height alone.
//
//go:noinline
func ofICAO(f func(l *layer, altitude float64) float64) law.Body {
	return law.Of1(func(altitude float64) float64 {
		if !(altitude >= lowestGeopotential && altitude <= icaoTop) {
			return notANumber
		}
		return f(icao.layerAt(altitude), altitude)
	})
}

// icaoNumber gives the number density in 1/m^3.
func icaoNumber(l *layer, altitude float64) float64 {
	return icaoAvogadro * l.pressureAt(altitude) / (standardGasConstant * l.molecularTemperatureAt(altitude))
}

func icaoLaws() []*law.Law {
	altitude := func() []law.Parameter {
		return []law.Parameter{{
			Name:    "altitude",
			Meaning: "geopotential height above mean sea level, or a geometric one, which is converted; -5 km geometric to 80 km geopotential",
			Unit:    "gpm",
			Valid:   law.Within(lowestGeopotential, icaoTop),
			Finite:  law.Within(lowestGeopotential, icaoTop),
			Accepts: []law.Conversion{{Unit: "m", By: geopotentialHeightLaw}},
		}}
	}
	make := func(name, gives, unit, equation, gave string, f func(l *layer, altitude float64) float64) *law.Law {
		return &law.Law{
			Name: "icao_" + name, Group: group, Gives: gives + " of the ICAO standard atmosphere",
			Parameters: altitude(), Result: law.Result{Unit: unit}, Equation: equation, Source: icaoSource,
			Caution:  aviationCaution + " A mean atmosphere of dry air: weather differs from it by several percent.",
			Examples: []law.Example{{Formula: "icao_" + name + "(0[m])", Gives: gave}},
			Body:     ofICAO(f),
		}
	}
	return []*law.Law{
		make("temperature", "the temperature", "K", "T = T_b + L_b (H - H_b); layers from -5, 0, 11, 20, 32, 47, 51, 71 km with -6.5, -6.5, 0, 1, 2.8, 0, -2.8, -2 K/km", "288.15 K",
			(*layer).molecularTemperatureAt),
		make("pressure", "the pressure", "Pa(a)", "p = p_b (T/T_b)^(-g0/(R L_b)), or p = p_b exp(-g0 (H - H_b)/(R T_b)) where L_b = 0; p_0 = 101325 Pa, R = 287.05287 J/(kg K)", "101325 Pa",
			(*layer).pressureAt),
		make("density", "the density", "kg/m^3", "rho = p/(R T), R = 287.05287 J/(kg K)", "1.225 kg/m^3",
			(*layer).densityAt),
		make("sound_speed", "the speed of sound", "m/s", "a = 20.046796 m/(s K^0.5) sqrt(T)", "340.294 m/s",
			func(l *layer, altitude float64) float64 {
				return icaoSoundCoefficient * math.Sqrt(l.molecularTemperatureAt(altitude))
			}),
		make("number_density", "the number of particles in a volume", "m^-3", "n = N_A p/(R* T), N_A = 602.257e24 kmol^-1, R* = 8314.32 J/(kmol K)", "2.5471e25 m^-3",
			icaoNumber),
		make("mean_free_path", "the mean free path of the particles", "m", "l = 1/(sqrt(2) pi sigma^2 n), sigma = 0.365 nm", "6.6328e-8 m",
			func(l *layer, altitude float64) float64 { return freePath(icaoNumber(l, altitude)) }),
		make("collision_rate", "how often a particle meets another", "s^-1", "omega = v/l, v = sqrt(8 R T/pi), l mean free path", "6.9193e9 s^-1",
			func(l *layer, altitude float64) float64 {
				speed := math.Sqrt(8 / math.Pi * icaoGasConstant * l.molecularTemperatureAt(altitude))
				return speed / freePath(icaoNumber(l, altitude))
			}),
		make("conductivity", "the thermal conductivity", "W/(m K)", "lambda = 2.648151e-3 T^1.5/(T + 245.4 10^(-12/T)), T in K", "2.5343e-2 W/(m K)",
			func(l *layer, altitude float64) float64 {
				return conductivityOfAir(l.molecularTemperatureAt(altitude), icaoConductivity)
			}),
	}
}
