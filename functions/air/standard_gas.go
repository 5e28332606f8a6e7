package air

import (
	"math"

	"plumbrule/engine/column"
)

// What the standard derives from temperature, pressure and composition: how
// many particles there are, how they move and how heat passes through them.

// collisionDiameter is sigma of the standard and of ICAO Doc 7488, in m.
const collisionDiameter = 3.65e-10

// standardConductivityCoefficient is that of equation 53 in W/(m K^1.5).
const standardConductivityCoefficient = 2.64638e-3

// conductivityOfAir gives the thermal conductivity in W/(m K) (equation 53)
// with the coefficient in W/(m K^1.5).
func conductivityOfAir(t, coefficient float64) float64 {
	return coefficient * t * math.Sqrt(t) / (t + float64(245.4*column.Exp(float64(-12*math.Ln10)/t)))
}

// standardMolarMassAt gives the mean molar mass in kg/mol.
func standardMolarMassAt(altitude float64) float64 {
	switch {
	case inLower(altitude):
		return float64(standardMolarMass * molarMassRatio(altitude))
	case inUpper(altitude):
		t := upperAtmosphere()
		return t.valueAt(upperDensity, altitude) * (standardAvogadro / kilomole) / upperNumber(t, altitude)
	}
	return notANumber
}

// upperNumber gives the number density in 1/m^3 above 86 km: that of all six
// gases, which is the pressure over k T.
func upperNumber(t *upperTable, altitude float64) float64 {
	return t.valueAt(upperPressure, altitude) / (standardBoltzmann * standardTemperature(altitude))
}

// standardNumberDensity gives the number of particles in 1/m^3.
func standardNumberDensity(altitude float64) float64 {
	switch {
	case inLower(altitude):
		return (standardAvogadro / kilomole) * standardPressure(altitude) / (standardGasConstant * standardTemperature(altitude))
	case inUpper(altitude):
		return upperNumber(upperAtmosphere(), altitude)
	}
	return notANumber
}

// freePath gives the mean free path in m of particles of the standard's
// diameter, as many in 1/m^3 as told.
func freePath(number float64) float64 {
	return 1 / (math.Sqrt2 * math.Pi * collisionDiameter * collisionDiameter * number)
}

func standardMeanFreePath(altitude float64) float64 { return freePath(standardNumberDensity(altitude)) }

// standardCollisionRate gives how often a particle meets another, in 1/s.
func standardCollisionRate(altitude float64) float64 {
	return standardParticleSpeed(altitude) / standardMeanFreePath(altitude)
}

// molecularTemperature gives T M0/M in K.
func molecularTemperature(altitude float64) float64 {
	if inLower(altitude) {
		return ussa.layerAt(altitude).molecularTemperatureAt(altitude)
	}
	return standardTemperature(altitude) * standardMolarMass / standardMolarMassAt(altitude)
}

// standardParticleSpeed gives the mean speed of the particles in m/s.
func standardParticleSpeed(altitude float64) float64 {
	return math.Sqrt(8 / math.Pi * specificGasConstant * molecularTemperature(altitude))
}

// standardGravityAt gives the acceleration of gravity in m/s^2: with H the
// geopotential height, r0/(r0 + z) is 1 - H/r0.
func standardGravityAt(altitude float64) float64 {
	if !inLower(altitude) && !inUpper(altitude) {
		return notANumber
	}
	ratio := 1 - altitude/effectiveRadius
	return standardGravity * ratio * ratio
}

// standardScaleHeight gives R* T/(g M) in m.
func standardScaleHeight(altitude float64) float64 {
	return specificGasConstant * molecularTemperature(altitude) / standardGravityAt(altitude)
}

// standardConductivity gives the thermal conductivity in W/(m K).
func standardConductivity(altitude float64) float64 {
	if !inLayers(altitude) {
		return notANumber
	}
	return conductivityOfAir(standardTemperature(altitude), standardConductivityCoefficient)
}

// standardKinematicViscosity gives the viscosity over the density in m^2/s.
func standardKinematicViscosity(altitude float64) float64 {
	return standardViscosity(altitude) / standardDensity(altitude)
}

// speciesDensity gives the number density of one of the six gases in 1/m^3
// from 86 km upwards; hydrogen begins at 150 km.
func speciesDensity(gas int, altitude float64) float64 {
	if !(altitude >= lowestSpecies && altitude <= topGeopotential) {
		return notANumber
	}
	t := upperAtmosphere()
	if gas == hydrogen && altitude < t.edges[hydrogenCell] {
		return notANumber
	}
	return t.valueAt(gas, altitude)
}

// lowestSpecies is 86 km in gpm, rounded outwards.
const lowestSpecies = 84852.04
