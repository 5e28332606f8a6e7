package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// localGeopotential gives, at a latitude in rad, the normal gravity of the
// WGS-84 ellipsoid in m/s^2 and the radius in m with which an inverse square
// follows its decrease with height.
func localGeopotential(latitude float64) (gravity, radius float64) {
	const (
		axis      = 6378137.0
		flatness  = 1 / 298.257223563
		spin      = 0.00344978650684
		equator   = 9.7803253359
		rise      = 0.00193185265241
		eccentric = 6.69437999013e-3
	)
	sine := column.Sin(latitude)
	square := float64(sine * sine)
	gravity = equator * (1 + float64(rise*square)) / math.Sqrt(1-float64(eccentric*square))
	return gravity, axis / (1 + flatness + spin - float64(2*flatness*square))
}

// localGeopotentialLaws are the conversions at a latitude.
var localGeopotentialLaws = []*law.Law{
	{
		Name: "local_geopotential_height", Group: group, Gives: "the geopotential height that belongs to a geometric height at a latitude",
		Parameters: []law.Parameter{
			{Name: "height", Meaning: "geometric height above mean sea level", Unit: "m", Valid: law.Within(-5000, 100000), Finite: law.Within(-6e6, 1e9)}, localLatitude,
		},
		Result: law.Result{Unit: "gpm"}, Equation: "H = (gamma/9.80665 m/s^2) R z/(R + z); " + localSymbols, Source: localSource, Caution: localCaution,
		Examples: []law.Example{{Formula: "local_geopotential_height(0[m], 45[deg])", Gives: "0 gpm"}},
		Body: law.Of2(func(z, latitude float64) float64 {
			gravity, radius := localGeopotential(latitude)
			return gravity / standardGravity * (z * (radius / (radius + z)))
		}),
	},
	{
		Name: "local_geometric_height", Group: group, Gives: "the geometric height that belongs to a geopotential height at a latitude",
		Parameters: []law.Parameter{
			{Name: "geopotential", Meaning: "geopotential height above mean sea level", Unit: "gpm", Valid: law.Within(-5004, 98500), Finite: law.Within(-1e8, 6.3e6)}, localLatitude,
		},
		Result: law.Result{Unit: "m"}, Equation: "z = R H/(gamma R/9.80665 m/s^2 - H); " + localSymbols, Source: localSource, Caution: localCaution,
		Examples: []law.Example{{Formula: "local_geometric_height(0[gpm], 45[deg])", Gives: "0 m"}},
		Body: law.Of2(func(h, latitude float64) float64 {
			gravity, radius := localGeopotential(latitude)
			own := float64(h * (standardGravity / gravity))
			return own * (radius / (radius - own))
		}),
	},
}

var localLatitude = law.Parameter{Name: "latitude", Meaning: "geodetic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90)}

const (
	localSource  = "Mahoney M.J. (2001) A discussion of various measures of altitude, Jet Propulsion Laboratory; gravity of NIMA TR8350.2 (3rd ed., 2000) Department of Defense World Geodetic System 1984"
	localSymbols = "R = a/(1 + f + m - 2 f sin^2 phi), gamma = 9.7803253359 m/s^2 (1 + 0.00193185265241 sin^2 phi)/sqrt(1 - 0.00669437999013 sin^2 phi), a = 6378137 m, 1/f = 298.257223563, m = 0.00344978650684; phi latitude, z geometric height"
	localCaution = "Of the ellipsoid: true gravity differs by up to 0.0003 of itself. The standard atmosphere is defined with geopotential_height, which knows no latitude."
)
