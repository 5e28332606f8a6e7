package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// ellipsoid is what the normal gravity formula needs of a reference ellipsoid.
type ellipsoid struct {
	name     string
	equator  float64 // gamma_e, normal gravity on the equator, m/s^2
	rise     float64 // k = b gamma_p/(a gamma_e) - 1
	squared  float64 // e^2, first eccentricity squared
	axis     float64 // a, semi-major axis, m
	flatness float64 // f
	spin     float64 // m = omega^2 a^2 b/GM
}

// wgs84 is that of the World Geodetic System 1984 (NIMA TR8350.2, 3rd ed.,
// 2000, tables 3.1, 3.3 and 3.4), grs80 that of the Geodetic Reference System
// 1980 (Moritz H. (2000) J. Geodesy 74, 128-133).
var (
	wgs84 = ellipsoid{
		name: "WGS-84", equator: 9.7803253359, rise: 0.00193185265241, squared: 6.69437999014e-3,
		axis: 6378137, flatness: 1 / 298.257223563, spin: 0.00344978650684,
	}
	grs80 = ellipsoid{
		name: "GRS80", equator: 9.7803267715, rise: 0.001931851353, squared: 0.00669438002290,
		axis: 6378137, flatness: 1 / 298.257222101, spin: 0.00344978600308,
	}
)

// gravityLaws are those of gravity on the Earth.
func gravityLaws() []*law.Law {
	return []*law.Law{{
		Name:  "normal_gravity",
		Group: "fluid",
		Gives: "acceleration of gravity of the Earth's reference ellipsoid by latitude and height",
		Parameters: []law.Parameter{
			{Name: "latitude", Meaning: "geodetic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90)},
			{
				Name: "height", Meaning: "height above the ellipsoid", Unit: "m", Default: "0[m]",
				// The series ends at the second order: beyond 10 km its error
				// passes 1.5e-7 m/s^2; below the lowest shores the ground itself
				// pulls. It has its minimum near 2100 km.
				Valid: law.Within(-500, 10000), Finite: law.Within(-20000, 1e6),
			},
			{
				Name: "ellipsoid", Meaning: "reference ellipsoid", Type: law.Text,
				Default: `"` + wgs84.name + `"`, Choices: []string{wgs84.name, grs80.name},
			},
		},
		Result:   law.Result{Unit: "m/s^2"},
		Equation: "gamma = gamma_e (1 + k sin^2 phi)/sqrt(1 - e^2 sin^2 phi); gamma_h = gamma [1 - (2/a)(1 + f + m - 2 f sin^2 phi) h + 3 h^2/a^2]; phi latitude, h height; WGS-84: gamma_e = 9.7803253359 m/s^2, k = 0.00193185265241, e^2 = 0.00669437999014, a = 6378137 m, 1/f = 298.257223563, m = 0.00344978650684",
		Source:   "NIMA TR8350.2 (3rd ed., 2000) Department of Defense World Geodetic System 1984, chapter 4; Moritz H. (2000) Geodetic Reference System 1980, J. Geodesy 74, 128-133",
		Caution:  "A model of the whole Earth: true gravity differs by up to about 0.003 m/s^2 from place to place. Height counts from the ellipsoid, up to 110 m away from sea level.",
		Examples: []law.Example{
			{Formula: "normal_gravity(0[deg])", Gives: "9.7803253359 m/s^2"},
			{Formula: "normal_gravity(90[deg])", Gives: "9.832184938 m/s^2"},
		},
		Body: normalGravityBody,
	}}
}

// normalGravityBody takes latitude, height and the ellipsoid's name.
func normalGravityBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	earth := &wgs84
	if arguments[2].Text == grs80.name {
		earth = &grs80
	}
	latitude, height := &arguments[0], &arguments[1]
	if len(latitude.Values) == 1 {
		surface, slope := earth.gravity(latitude.At(0))
		for i := range dst {
			dst[i] = earth.raised(surface, slope, height.At(i))
		}
		return
	}
	for i := range dst {
		surface, slope := earth.gravity(latitude.At(i))
		dst[i] = earth.raised(surface, slope, height.At(i))
	}
}

// gravity gives normal gravity on the ellipsoid at a latitude in rad, in m/s^2
// (Somigliana's closed formula), and its relative decrease per semi-major axis
// of height.
func (e *ellipsoid) gravity(latitude float64) (surface, slope float64) {
	sine := column.Sin(latitude)
	square := sine * sine
	surface = e.equator * (1 + float64(e.rise*square)) / math.Sqrt(1-float64(e.squared*square))
	slope = 2 * (1 + e.flatness + e.spin - float64(2*e.flatness*square))
	return surface, slope
}

// raised carries normal gravity up to a height in m, to the second order.
func (e *ellipsoid) raised(surface, slope, height float64) float64 {
	h := height / e.axis
	return surface * (1 - float64(h*(slope-float64(3*h))))
}
