package air

import "plumbrule/engine/law"

// effectiveRadius is r0 of the U.S. Standard Atmosphere 1976, section 1.2.4:
// the radius in m for which an inverse-square law reproduces gravity and its
// gradient at latitude 45 deg 32 min 33 s.
const effectiveRadius = 6356766.0

// geopotentialSource is where both conversions stand.
const geopotentialSource = "U.S. Standard Atmosphere, 1976 (NOAA/NASA/USAF, NOAA-S/T 76-1562), section 1.2.4, equations 18 and 19; ICAO Doc 7488/3"

// Geometric heights of the standard in m, and the geopotential heights in gpm
// that belong to them, rounded outwards in the second decimal place.
const (
	lowestGeometric     = -5000.0
	lowestGeopotential  = -5003.94
	highestGeopotential = 84852.05 // 86 km, the top of the standard's lower part
	topGeometric        = 1000000.0
	topGeopotential     = 864070.71
)

// geopotentialHeight gives the geopotential height in gpm of the geometric
// height z in m. At -r0 and below, under the centre of attraction, there is
// none.
func geopotentialHeight(z float64) float64 {
	if !(z > -effectiveRadius) {
		return notANumber
	}
	// z/(1 + z/r0) and r0*z/(r0 + z) are the same; this one does not overflow.
	return float64(z * (effectiveRadius / (effectiveRadius + z)))
}

// geometricHeight gives the geometric height in m of the geopotential height h
// in gpm. Work done against gravity from the ground to infinity is r0 in gpm:
// at and above it there is no height.
func geometricHeight(h float64) float64 {
	if !(h < effectiveRadius) {
		return notANumber
	}
	return float64(h * (effectiveRadius / (effectiveRadius - h)))
}

var geopotentialHeightLaw = &law.Law{
	Name:  "geopotential_height",
	Group: group,
	Gives: "the geopotential height that belongs to a geometric height",
	Parameters: []law.Parameter{{
		Name: "height", Meaning: "geometric height above mean sea level", Unit: "m",
		Valid:  law.Within(lowestGeometric, topGeometric),
		Finite: law.Above(-effectiveRadius),
	}},
	Result:   law.Result{Unit: "gpm"},
	Equation: "H = r0 z/(r0 + z), r0 = 6356766 m; z is the height",
	Source:   geopotentialSource,
	Examples: []law.Example{
		{Formula: "geopotential_height(86[km])", Gives: "84852.05 gpm"},
		{Formula: "geopotential_height(11019[m])", Gives: "10999.93 gpm"},
	},
	Body: law.Of1(geopotentialHeight),
}

var geometricHeightLaw = &law.Law{
	Name:  "geometric_height",
	Group: group,
	Gives: "the geometric height that belongs to a geopotential height",
	Parameters: []law.Parameter{{
		Name: "geopotential", Meaning: "geopotential height above mean sea level", Unit: "gpm",
		Valid:  law.Within(lowestGeopotential, topGeopotential),
		Finite: law.Below(effectiveRadius),
	}},
	Result:   law.Result{Unit: "m"},
	Equation: "z = r0 H/(r0 - H), r0 = 6356766 m; H is the geopotential",
	Source:   geopotentialSource,
	Examples: []law.Example{
		{Formula: "geometric_height(11000[gpm])", Gives: "11019.07 m"},
	},
	Body: law.Of1(geometricHeight),
}
