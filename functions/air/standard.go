package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// The defining constants of the U.S. Standard Atmosphere 1976 (table 2). The
// gas constant is the standard's own and not the CODATA one; the molar mass
// and the gas constant are written per mole.
const (
	standardGasConstant = 8.31432   // J/(mol K)
	standardMolarMass   = 0.0289644 // kg/mol, of air below 80 km
	standardGravity     = 9.80665   // m^2/(s^2 gpm)
	standardGamma       = 1.4       // cp/cv
	sutherlandBeta      = 1.458e-6  // kg/(s m K^0.5)
	sutherlandS         = 110.4     // K
	seaLevelPressure    = 101325.0  // Pa

	specificGasConstant = standardGasConstant / standardMolarMass // J/(kg K)
)

// layer is one layer of linear temperature. Within it, with x = 1 + warming*d
// and d the height above the base,
//
//	TM = temperature x
//	p  = pressure x^-power            or pressure exp(-fall d)
//	ρ  = density x^-(power + 1)       or density exp(-fall d)
//
// the second form where warming is 0.
type layer struct {
	base        float64 // gpm
	temperature float64 // K, molecular-scale temperature at the base
	pressure    float64 // Pa at the base
	density     float64 // kg/m^3 at the base
	warming     float64 // 1/gpm: dTM/dH over the base temperature
	power       float64 // g0 M0/(R* dTM/dH); 0 where warming is 0
	fall        float64 // 1/gpm: g0 M0/(R* TM) at the base
}

// atmosphere is a standard atmosphere of seven layers.
type atmosphere struct{ layers [7]layer }

// ussa is the lower part of the U.S. Standard Atmosphere 1976.
var ussa = atmosphere{layers: standardLayers(specificGasConstant)}

// standardLayers gives the layers of table 4 with the pressures that follow
// from sea level for a specific gas constant in J/(kg K).
func standardLayers(gasConstant float64) [7]layer {
	// Pressure falls by g0/R in K per gpm over T.
	hydrostatic := standardGravity / gasConstant
	// Table 4: base in gpm, TM there in K, dTM/dH in K/gpm.
	table := [7]struct{ base, temperature, gradient float64 }{
		{0, 288.15, -0.0065},
		{11000, 216.65, 0},
		{20000, 216.65, 0.001},
		{32000, 228.65, 0.0028},
		{47000, 270.65, 0},
		{51000, 270.65, -0.0028},
		{71000, 214.65, -0.002},
	}
	var made [7]layer
	pressure := seaLevelPressure
	for i, row := range table {
		l := &made[i]
		if i > 0 {
			pressure = made[i-1].pressureAt(row.base)
		}
		l.base, l.temperature, l.pressure = row.base, row.temperature, pressure
		l.density = pressure / (gasConstant * row.temperature)
		l.fall = hydrostatic / row.temperature
		if row.gradient != 0 {
			l.warming = row.gradient / row.temperature
			l.power = hydrostatic / row.gradient
		}
	}
	return made
}

// layerAt finds the layer of a geopotential height. The lowest serves below
// sea level too.
func (a *atmosphere) layerAt(altitude float64) *layer {
	i := len(a.layers) - 1
	for i > 0 && altitude < a.layers[i].base {
		i--
	}
	return &a.layers[i]
}

// molecularTemperatureAt gives TM = T M0/M in K.
func (l *layer) molecularTemperatureAt(altitude float64) float64 {
	return l.temperature + float64(l.temperature*float64(l.warming*(altitude-l.base)))
}

// pressureAt gives the pressure in Pa.
func (l *layer) pressureAt(altitude float64) float64 {
	d := altitude - l.base
	if l.warming == 0 {
		return l.pressure * column.Exp(float64(-l.fall*d))
	}
	return l.pressure * column.Exp(float64(-l.power*column.Log1p(float64(l.warming*d))))
}

// densityAt gives the density in kg/m^3: P M0/(R* TM), in which the powers of
// pressure and temperature are one.
func (l *layer) densityAt(altitude float64) float64 {
	d := altitude - l.base
	if l.warming == 0 {
		return l.density * column.Exp(float64(-l.fall*d))
	}
	return l.density * column.Exp(float64(-(l.power+1)*column.Log1p(float64(l.warming*d))))
}

// altitudeOfPressure inverts pressureAt.
func (l *layer) altitudeOfPressure(pressure float64) float64 {
	return l.altitudeOf(column.Ln(pressure/l.pressure), l.power)
}

// altitudeOfDensity inverts the density.
func (l *layer) altitudeOfDensity(density float64) float64 {
	return l.altitudeOf(column.Ln(density/l.density), l.power+1)
}

// altitudeOf gives the height where a quantity that goes with x^-power, or in
// an isothermal layer with exp(-fall d), has changed by the logarithm given.
func (l *layer) altitudeOf(logarithm, power float64) float64 {
	if l.warming == 0 {
		return l.base - logarithm/l.fall
	}
	return l.base + column.Expm1(-logarithm/power)/l.warming
}

// upperBegin is 86 km in gpm, where the upper part of the standard begins. Its
// own equations hold there already: the pressure that they begin with is 1.1e-5
// higher than the one that the layers below end with.
var upperBegin = geopotentialHeight(86000)

// inLower says whether the layers tell of a geopotential height: from -5 km to
// below 86 km.
func inLower(altitude float64) bool {
	return altitude >= lowestGeopotential && altitude < upperBegin
}

// inLayers is inLower with 86 km, where what the standard ends there is still
// defined.
func inLayers(altitude float64) bool {
	return altitude >= lowestGeopotential && altitude <= highestGeopotential
}

// inUpper says whether a geopotential height lies in the upper part, from
// 86 km to 1000 km.
func inUpper(altitude float64) bool {
	return altitude >= upperBegin && altitude <= topGeopotential
}

// Ratio of the mean molar mass to that at sea level, M/M0, every 500 m of
// geometric altitude from 80 km to 86 km (table 8), where the air begins to
// separate into its gases.
const (
	separationBase   = 80000.0 // m
	separationHeight = 79000.0 // gpm, a little below 80 km: under it the ratio is 1
	separationStep   = 500.0   // m
)

var molarMassRatios = [13]float64{
	1.000000, 0.999996, 0.999989, 0.999971, 0.999941, 0.999909, 0.999870,
	0.999829, 0.999786, 0.999741, 0.999694, 0.999641, 0.999579,
}

// molarMassRatio interpolates M/M0 linearly in geometric altitude, as the
// standard demands.
func molarMassRatio(altitude float64) float64 {
	if altitude < separationHeight {
		return 1
	}
	steps := (geometricHeight(altitude) - separationBase) / separationStep
	if steps <= 0 {
		return 1
	}
	i := min(int(steps), len(molarMassRatios)-2)
	return molarMassRatios[i] + float64((steps-float64(i))*(molarMassRatios[i+1]-molarMassRatios[i]))
}

// standardTemperature gives the kinetic temperature in K: TM below 80 km, TM
// M/M0 up to 86 km, and the upper part's own above.
func standardTemperature(altitude float64) float64 {
	switch {
	case inLower(altitude):
		return float64(ussa.layerAt(altitude).molecularTemperatureAt(altitude) * molarMassRatio(altitude))
	case inUpper(altitude):
		z := geometricHeight(altitude) / 1000
		t, _ := upperTemperature(z, z)
		return t
	}
	return notANumber
}

// standardPressure gives the pressure in Pa.
func standardPressure(altitude float64) float64 {
	switch {
	case inLower(altitude):
		return ussa.layerAt(altitude).pressureAt(altitude)
	case inUpper(altitude):
		return upperAtmosphere().valueAt(upperPressure, altitude)
	}
	return notANumber
}

// standardDensity gives the density in kg/m^3.
func standardDensity(altitude float64) float64 {
	switch {
	case inLower(altitude):
		return ussa.layerAt(altitude).densityAt(altitude)
	case inUpper(altitude):
		return upperAtmosphere().valueAt(upperDensity, altitude)
	}
	return notANumber
}

// standardBody gives a quantity for a block of rows: the layers' value below
// 86 km, and above the table's, whose exponentials are taken together where
// all rows are there. Each row gets the same bits either way.
//
//go:noinline
func standardBody(quantity int, below func(altitude float64) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		altitudes := arguments[0].Values
		if len(altitudes) != len(dst) {
			var value float64
			if h := altitudes[0]; inUpper(h) {
				value = upperAtmosphere().valueAt(quantity, h)
			} else {
				value = below(h)
			}
			for i := range dst {
				dst[i] = value
			}
			return
		}
		var table *upperTable
		upper := 0
		for i, h := range altitudes {
			if !inUpper(h) {
				dst[i] = below(h)
				continue
			}
			if table == nil {
				table = upperAtmosphere()
			}
			dst[i] = table.logarithmAt(quantity, h)
			upper++
		}
		switch upper {
		case 0:
		case len(dst):
			column.ExpColumn(dst, dst)
		default:
			for i, h := range altitudes {
				if inUpper(h) {
					dst[i] = column.Exp(dst[i])
				}
			}
		}
	}
}

// standardSoundSpeed gives the speed of sound in m/s. It goes with TM: the
// molar mass is in it.
func standardSoundSpeed(altitude float64) float64 {
	if !inLayers(altitude) {
		return notANumber
	}
	return math.Sqrt(standardGamma * specificGasConstant * ussa.layerAt(altitude).molecularTemperatureAt(altitude))
}

// standardViscosity gives the dynamic viscosity in Pa s by Sutherland's
// formula with the kinetic temperature.
func standardViscosity(altitude float64) float64 {
	if !inLayers(altitude) {
		return notANumber
	}
	return viscosityOfAir(standardTemperature(altitude))
}

// viscosityOfAir is Sutherland's formula with the standard's constants, in
// Pa s.
func viscosityOfAir(t float64) float64 {
	return sutherlandBeta * t * math.Sqrt(t) / (t + sutherlandS)
}

// Pressures in Pa and densities in kg/m^3 at the ends of the standard, rounded
// outwards.
const (
	lowestPressure, highestPressure = 0.37338017, 177761.58
	lowestDensity, highestDensity   = 6.9578188e-6, 1.931123
)

// pressureAltitude gives the geopotential height in gpm where the standard has
// the pressure.
func pressureAltitude(pressure float64) float64 {
	if !(pressure >= lowestPressure && pressure <= highestPressure) {
		return notANumber
	}
	i := len(ussa.layers) - 1
	for i > 0 && pressure > ussa.layers[i].pressure {
		i--
	}
	return ussa.layers[i].altitudeOfPressure(pressure)
}

// densityAltitude gives the geopotential height in gpm where the standard has
// the density, which falls with height in every layer.
func densityAltitude(density float64) float64 {
	if !(density >= lowestDensity && density <= highestDensity) {
		return notANumber
	}
	i := len(ussa.layers) - 1
	for i > 0 && density > ussa.layers[i].density {
		i--
	}
	return ussa.layers[i].altitudeOfDensity(density)
}
