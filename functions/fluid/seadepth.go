package fluid

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// pascalsPerDecibar turns pressures out of the unit of the UNESCO equations.
const pascalsPerDecibar = 1e4

// seaDepthLaws are those of depth and pressure in the standard ocean.
func seaDepthLaws() []*law.Law {
	const (
		source   = "Fofonoff N.P., Millard R.C. (1983) Algorithms for computation of fundamental properties of seawater, UNESCO Technical Papers in Marine Science 44, eq. 25, after Saunders P.M., Fofonoff N.P. (1976) Deep-Sea Research 23, 109-111"
		equation = "z = (9.72659 p - 2.2512e-5 p^2 + 2.279e-10 p^3 - 1.82e-15 p^4)/(g + 1.092e-6 p); g = 9.780318 (1 + 5.2788e-3 sin^2 phi + 2.36e-5 sin^4 phi); z depth in m, p sea pressure in dbar, phi latitude"
		ocean    = "For an ocean of salinity 35 at 0 degC throughout; warmer or fresher water changes the depth by up to some metres (the dynamic height). "
	)
	latitude := law.Parameter{
		Name: "latitude", Meaning: "geographic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90),
	}
	return []*law.Law{
		{
			Name:  "sea_depth_at_pressure",
			Group: "fluid",
			Gives: "depth in the sea from sea pressure and latitude",
			Parameters: []law.Parameter{
				{
					Name: "sea_pressure", Meaning: "pressure above that at the surface", Unit: "dbar(g)",
					Valid: law.Within(0, 10000), Finite: law.Within(0, 20000),
				},
				latitude,
			},
			Result:   law.Result{Unit: "m"},
			Equation: equation,
			Source:   source,
			Caution:  ocean + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "sea_depth_at_pressure(10000[dbar], 30[deg])", Gives: "9712.653 m"},
				{Formula: "sea_depth_at_pressure(500[dbar], 90[deg])", Gives: "494.03 m"},
			},
			Body: seaDepthBody,
		},
		{
			Name:  "sea_pressure_at_depth",
			Group: "fluid",
			Gives: "sea pressure from depth in the sea and latitude",
			Parameters: []law.Parameter{
				{
					// 10000 dbar lie at 9725.5 m on the equator and, with its
					// stronger gravity, at 9674.2 m at the poles.
					Name: "depth", Meaning: "depth below the surface of the sea", Unit: "m",
					Valid: law.Within(0, 9726), Finite: law.Within(0, 15000),
				},
				latitude,
			},
			Result:   law.Result{Unit: "dbar(g)"},
			Equation: "the p that gives the depth z by " + equation,
			Source:   source,
			Caution:  ocean + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "sea_pressure_at_depth(9712.653[m], 30[deg])", Gives: "10000.00 dbar"},
				{Formula: "sea_pressure_at_depth(0[m], 30[deg])", Gives: "0 dbar"},
			},
			Body: seaPressureBody,
		},
	}
}

// Coefficients of UNESCO 44, eq. 25: the integral of the specific volume in
// m^2/s^2 from powers of the pressure in dbar, and the column's mean rise of
// gravity in m/s^2 per dbar.
const (
	volume1     = 9.72659
	volume2     = -2.2512e-5
	volume3     = 2.279e-10
	volume4     = -1.82e-15
	gravityRise = 1.092e-6
)

// seaDepthBody takes sea pressure and latitude.
func seaDepthBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	pressures := arguments[0].Values
	step := column.Stride(pressures)
	gravity := newSeaGravity(&arguments[1])
	for i := range dst {
		dst[i] = seaDepth(pressures[i*step]/pascalsPerDecibar, gravity.at(i))
	}
}

// seaPressureBody takes depth and latitude.
func seaPressureBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	depths := arguments[0].Values
	step := column.Stride(depths)
	gravity := newSeaGravity(&arguments[1])
	for i := range dst {
		dst[i] = pascalsPerDecibar * seaPressure(depths[i*step], gravity.at(i))
	}
}

// seaDepth gives the depth in m from the sea pressure in dbar and the gravity
// at the surface in m/s^2.
func seaDepth(p, gravity float64) float64 {
	return float64((float64((float64((float64(volume4*p)+volume3)*p)+volume2)*p)+volume1)*p) /
		(gravity + float64(gravityRise*p))
}

// seaPressure gives the sea pressure in dbar at a depth in m from the gravity
// at the surface in m/s^2.
//
// It is Newton's method on volume(p) - depth (gravity + gravityRise p) = 0. The
// start, the second-order inverse of the series, is within 3e-3 of the answer
// down to 15000 m, and each step squares the error, with a factor below 0.03:
// three steps reach the last bit. At depth zero every step is exactly zero.
func seaPressure(depth, gravity float64) float64 {
	p := depth * gravity / volume1
	p += float64(float64(p*p) * (gravityRise/gravity - volume2/volume1))
	pull := volume1 - float64(gravityRise*depth)
	weight := float64(depth * gravity)
	p = nearerSeaPressure(p, pull, weight)
	p = nearerSeaPressure(p, pull, weight)
	return nearerSeaPressure(p, pull, weight)
}

// nearerSeaPressure is one step of Newton's method.
func nearerSeaPressure(p, pull, weight float64) float64 {
	value := float64((float64((float64((float64(volume4*p)+volume3)*p)+volume2)*p)+pull)*p) - weight
	slope := float64((float64((float64(4*volume4*p)+3*volume3)*p)+2*volume2)*p) + pull
	return p - value/slope
}

// seaGravity gives gravity at the sea's surface row by row, computed once where
// the latitude is one for all rows.
type seaGravity struct {
	latitude *law.Argument
	constant float64
}

// newSeaGravity prepares the gravity of a latitude argument.
func newSeaGravity(latitude *law.Argument) seaGravity {
	g := seaGravity{latitude: latitude}
	if len(latitude.Values) == 1 {
		g.constant = surfaceGravity(latitude.Values[0])
	}
	return g
}

// at gives gravity in a row, in m/s^2.
func (g *seaGravity) at(row int) float64 {
	if g.constant != 0 {
		return g.constant
	}
	return g.varying(row)
}

// varying is kept apart from at, which so is no call where the latitude is one.
//
//go:noinline
func (g *seaGravity) varying(row int) float64 { return surfaceGravity(g.latitude.At(row)) }

// surfaceGravity gives gravity at sea level in m/s^2 from the latitude in rad,
// as UNESCO 44 takes it: the Geodetic Reference System 1967 (Anon. (1970)
// Bulletin Géodésique, special publication 3).
func surfaceGravity(latitude float64) float64 {
	sine := column.Sin(latitude)
	x := sine * sine
	return 9.780318 * (1 + float64((float64(2.36e-5*x)+5.2788e-3)*x))
}
