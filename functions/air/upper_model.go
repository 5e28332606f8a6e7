package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/functions/nature"
)

// The model of the U.S. Standard Atmosphere 1976 from 86 km to 1000 km:
// temperature, eddy diffusion and the equations of diffusion for six gases.
// Heights here are geometric and in km, as the standard's constants are; molar
// masses are in kg/kmol.

// Heights in km where the model changes its formulas (tables 3 and 5).
const (
	upperBase      = 86.0
	isothermalTop  = 91.0
	mixingFull     = 95.0
	oxygenTop      = 97.0
	mixedMassTop   = 100.0
	ellipseTop     = 110.0
	mixingTop      = 115.0
	linearTop      = 120.0
	hydrogenBase   = 150.0
	hydrogenAnchor = 500.0
	upperTop       = 1000.0
	radiusKm       = effectiveRadius / 1000
)

// Temperatures in K and what belongs to them (equations 25 to 31).
const (
	upperBaseTemperature = 186.8673
	ellipseCentre        = 263.1905
	ellipseHeight        = -76.3232
	ellipseWidth         = -19.9429 // km
	linearBase           = 240.0
	linearGradient       = 12.0 // K/km
	exosphereBase        = 360.0
	exosphereTemperature = 1000.0
	exosphereRate        = 0.01875 // 1/km
	anchorTemperature    = 999.2356
)

// Constants of diffusion (tables 3, 6 and 7).
const (
	fullMixing        = 120.0 // K, eddy diffusion up to 95 km, m^2/s
	standardBoltzmann = 1.380622e-23
	standardAvogadro  = 6.022169e26 // 1/kmol
	hydrogenFlux      = 7.2e11      // phi, upward, 1/(m^2 s)
	hydrogenDensity   = 8.0e10      // at 500 km, 1/m^3
	kilomole          = 1000.0      // mol
)

// upperGas is one of the six gases with its constants (tables 3, 6, 7 and 9).
type upperGas struct {
	name      string
	molarMass float64 // kg/kmol
	base      float64 // number density at 86 km, 1/m^3
	thermal   float64 // alpha, thermal diffusion coefficient
	a, b      float64 // D = a (T/273.15 K)^b/N; a in 1/(m s)

	// Vertical transport, with Q and q in 1/km^3, U and u in km, W and w in
	// 1/km^3: Q (z - U)^2 exp(-W (z - U)^3) + q (u - z)^2 exp(-w (u - z)^3), the
	// second only below 97 km.
	q, u, w                float64
	lowerQ, lowerU, lowerW float64
}

// The six gases by index.
const (
	nitrogen = iota
	atomicOxygen
	oxygen
	argon
	helium
	hydrogen
	upperGases
)

var upperGasTable = [upperGases]upperGas{
	{name: "N2", molarMass: 28.0134, base: 1.129794e20},
	{
		name: "O", molarMass: 15.9994, base: 8.6e16, a: 6.986e20, b: 0.750,
		q: -5.809644e-4, u: 56.90311, w: 2.706240e-5,
		lowerQ: -3.416248e-3, lowerU: 97.0, lowerW: 5.008765e-4,
	},
	{
		name: "O2", molarMass: 31.9988, base: 3.030898e19, a: 4.863e20, b: 0.750,
		q: 1.366212e-4, u: 86.000, w: 8.333333e-5,
	},
	{
		name: "Ar", molarMass: 39.948, base: 1.351400e18, a: 4.487e20, b: 0.870,
		q: 9.434079e-5, u: 86.000, w: 8.333333e-5,
	},
	{
		name: "He", molarMass: 4.0026, base: 7.5817e14, thermal: -0.40, a: 1.700e21, b: 0.691,
		q: -2.457369e-4, u: 86.000, w: 6.666667e-4,
	},
	{name: "H", molarMass: 1.00797, thermal: -0.25, a: 3.305e21, b: 0.500},
}

// upperTemperature gives the kinetic temperature in K and its gradient in K/km
// at the height z. The formula is the one that holds at the height where, so
// that both sides of a boundary can be had.
func upperTemperature(z, where float64) (temperature, gradient float64) {
	switch {
	case where < isothermalTop:
		return upperBaseTemperature, 0
	case where < ellipseTop:
		u := (z - isothermalTop) / ellipseWidth
		root := math.Sqrt(1 - float64(u*u))
		return ellipseCentre + float64(ellipseHeight*root), -ellipseHeight * u / (ellipseWidth * root)
	case where < linearTop:
		return linearBase + float64(linearGradient*(z-ellipseTop)), linearGradient
	}
	stretch := (radiusKm + linearTop) / (radiusKm + z)
	fall := column.Exp(float64(-exosphereRate * (z - linearTop) * stretch))
	missing := float64((exosphereTemperature - exosphereBase) * fall)
	return exosphereTemperature - missing, exosphereRate * missing * stretch * stretch
}

// eddyDiffusion gives K in m^2/s.
func eddyDiffusion(z float64) float64 {
	switch {
	case z < mixingFull:
		return fullMixing
	case z < mixingTop:
		d := z - mixingFull
		rest := 400 - float64(d*d)
		if !(rest > 0) {
			return 0
		}
		return fullMixing * column.Exp(1-400/rest)
	}
	return 0
}

// gravityKm gives g in m/s^2 at a height in km.
func gravityKm(z float64) float64 {
	ratio := radiusKm / (radiusKm + z)
	return standardGravity * ratio * ratio
}

// upperAir is what the equations of diffusion need to know of a height.
type upperAir struct {
	z           float64 // km
	temperature float64 // K
	gradient    float64 // K/km
	pull        float64 // g/(R* T) in 1/km for 1 kg/kmol
	gravity     float64 // m/s^2
	mixing      float64 // K, m^2/s
}

func newUpperAir(z, where float64) upperAir {
	a := upperAir{z: z, gravity: gravityKm(z), mixing: eddyDiffusion(z)}
	a.temperature, a.gradient = upperTemperature(z, where)
	a.pull = a.gravity / (standardGasConstant * a.temperature) // R* in J/(mol K): 1/m for 1 kg/mol, 1/km for 1 kg/kmol
	return a
}

// transport gives v_i in 1/km (equation 37).
func (s *upperGas) transport(z float64) float64 {
	if s.q == 0 {
		return 0
	}
	d := z - s.u
	v := float64(s.q * d * d * column.Exp(float64(-s.w*d*d*d)))
	if s.lowerQ != 0 && z < oxygenTop {
		d = s.lowerU - z
		v += float64(s.lowerQ * d * d * column.Exp(float64(-s.lowerW*d*d*d)))
	}
	return v
}

// fall gives f_i + v_i in 1/km: how fast the logarithm of n T falls with
// height (equation 36), in air of the number density 1/m^3 and the molar mass
// kg/kmol.
func (s *upperGas) fall(a *upperAir, density, molarMass float64) float64 {
	// R*/g dT/dz in kg/kmol: R* in J/(mol K) and the gradient in K/km make up
	// for the thousand of either.
	thermal := s.thermal * standardGasConstant * a.gradient / a.gravity
	own := s.molarMass + thermal
	if a.mixing == 0 {
		return float64(a.pull*own) + s.transport(a.z)
	}
	diffusion := s.a * column.Pow(a.temperature/nature.IcePoint, s.b) / density
	mean := (float64(diffusion*own) + float64(a.mixing*molarMass)) / (diffusion + a.mixing)
	return float64(a.pull*mean) + s.transport(a.z)
}
