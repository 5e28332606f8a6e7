// Package air is the room of gas columns and the standard atmosphere: how
// pressure and density fall with height in an isothermal column and in one
// whose temperature changes linearly, geometric and geopotential height, the
// U.S. Standard Atmosphere 1976 from -5 km to 86 km, and its inverses, pressure
// altitude and density altitude.
package air

import "plumbrule/engine/law"

// group is the name under which the catalogue lists this room's laws.
const group = "air"

// Laws lists every law of the room.
func Laws() []*law.Law {
	laws := []*law.Law{
		scaleHeightLaw,
		barometricPressureLaw,
		barometricDensityLaw,
		lapsedPressureLaw,
		lapsedDensityLaw,
		geopotentialHeightLaw,
		geometricHeightLaw,
		standardTemperatureLaw,
		standardPressureLaw,
		standardDensityLaw,
		standardSoundSpeedLaw,
		standardViscosityLaw,
		pressureAltitudeLaw,
		densityAltitudeLaw,
	}
	for _, part := range [][]*law.Law{
		standardGasLaws(),
		icaoLaws(),
		columnHeightLaws(),
		localGeopotentialLaws(),
		altimetryLaws(),
		escapeLaws(),
		sedimentLaws(),
		profileLaws(),
		worldLaws(),
		separationLaws(),
		saturationLaws(),
		kineticLaws(),
		vacuumLaws(),
		gasLaws(),
		transportLaws(),
		humidityLaws(),
		psychrometerLaws(),
	} {
		laws = append(laws, part...)
	}
	return laws
}
