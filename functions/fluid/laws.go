// Package fluid holds the laws of fluids at rest: columns of liquid, gauge and
// absolute pressure, manometers, loads on walls and lift; the gravity that pulls
// on them; water, steam, ice, sea water and other liquids; moist air and what a
// balance in it shows; gases breathed under pressure; and first checks of a
// case that stands it.
package fluid

import "plumbrule/engine/law"

// Laws lists the laws of this room.
func Laws() []*law.Law {
	var laws []*law.Law
	for _, part := range [][]*law.Law{
		columnLaws(),
		gaugeLaws(),
		layerLaws(),
		profileLaws(),
		manometerLaws(),
		plateLaws(),
		buoyancyLaws(),
		gravityLaws(),
		freshWaterLaws(),
		steamLaws(),
		saturationLaws(),
		waterLaws(),
		seaWaterLaws(),
		seaDepthLaws(),
		saundersLaws(),
		seaSoundLaws(),
		seaThermalLaws(),
		seaColumnLaws(),
		teosLaws(),
		teosOceanLaws(),
		mercuryLaws(),
		liquidLaws(),
		airLaws(),
		weighingLaws(),
		caseLaws(),
		bucklingLaws(),
		divingLaws(),
	} {
		laws = append(laws, part...)
	}
	return laws
}
