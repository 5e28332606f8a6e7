// Package air is the room of everything above the ground: gas columns of one or
// of a changing temperature, profiles of one's own, geometric and geopotential
// height, the U.S. Standard Atmosphere 1976 from -5 km to 1000 km and the ICAO
// standard atmosphere, altimetry, humidity, ideal gases and their viscosity,
// kinetic theory and vacuum, escape and separation of gases, the same
// exponential law for suspended particles and rotors, and the atmospheres of
// other worlds.
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
		columnHeightLaws,
		localGeopotentialLaws,
		altimetryLaws,
		escapeLaws,
		sedimentLaws,
		profileLaws,
		worldLaws(),
		separationLaws,
		saturationLaws,
		kineticLaws,
		vacuumLaws(),
		gasLaws,
		transportLaws(),
		humidityLaws,
		psychrometerLaws,
	} {
		laws = append(laws, part...)
	}
	return laws
}
