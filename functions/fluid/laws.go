// Package fluid holds the laws of liquids at rest: columns of liquid, gauge
// and absolute pressure, fresh and sea water, the depth of the sea and the
// gravity that pulls on them.
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
