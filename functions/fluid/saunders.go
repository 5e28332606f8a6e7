package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// saundersLaws are those of the short form of depth and pressure in the sea.
func saundersLaws() []*law.Law {
	const (
		source   = "Saunders P.M. (1981) Practical conversion of pressure to depth, J. Phys. Oceanogr. 11, 573-574"
		equation = "z = (1 - c1) p - c2 p^2, c1 = (5.92 + 5.25 sin^2 phi) 1e-3, c2 = 2.21e-6; z depth in m, p sea pressure in dbar, phi latitude"
		caution  = "The short form for the slide rule: within 0.1 m of sea_depth_at_pressure. "
	)
	latitude := law.Parameter{
		Name: "latitude", Meaning: "geographic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90),
	}
	return []*law.Law{
		{
			Name: "saunders_depth", Group: "fluid",
			Gives: "depth in the sea from sea pressure and latitude, by the short form",
			Parameters: []law.Parameter{
				{Name: "sea_pressure", Meaning: "pressure above that at the surface", Unit: "dbar(g)", Valid: law.Within(0, 10000), Finite: law.Within(0, 20000)},
				latitude,
			},
			Result: law.Result{Unit: "m"}, Equation: equation, Source: source, Caution: caution + law.CautionPressure,
			Examples: []law.Example{{Formula: "saunders_depth(7500[dbar], 30[deg])", Gives: "7321.4 m"}},
			Body:     law.Of2(saundersDepth),
		},
		{
			Name: "saunders_pressure", Group: "fluid",
			Gives: "sea pressure from depth in the sea and latitude, by the short form",
			Parameters: []law.Parameter{
				// 10000 dbar lie at 9720 m on the equator.
				{Name: "depth", Meaning: "depth below the surface of the sea", Unit: "m", Valid: law.Within(0, 9720), Finite: law.Within(0, 18800)},
				latitude,
			},
			Result: law.Result{Unit: "dbar(g)"}, Equation: "p = 2 z/[1 - c1 + sqrt((1 - c1)^2 - 4 c2 z)], the inverse of " + equation, Source: source, Caution: caution + law.CautionPressure,
			Examples: []law.Example{{Formula: "saunders_pressure(7321.45[m], 30[deg])", Gives: "7500.0 dbar"}},
			Body:     law.Of2(saundersPressure),
		},
	}
}

// saundersSquare is c2 in 1/dbar.
const saundersSquare = 2.21e-6

// saundersRise gives 1 - c1 at a latitude in rad.
func saundersRise(latitude float64) float64 {
	sine := column.Sin(latitude)
	return 1 - float64((5.92+float64(5.25*float64(sine*sine)))*1e-3)
}

// saundersDepth gives the depth in m from sea pressure in Pa and latitude in rad.
func saundersDepth(pressure, latitude float64) float64 {
	p := pressure / pascalsPerDecibar
	return (saundersRise(latitude) - float64(saundersSquare*p)) * p
}

// saundersPressure gives the sea pressure in Pa at a depth in m.
func saundersPressure(depth, latitude float64) float64 {
	rise := saundersRise(latitude)
	root := math.Sqrt(float64(rise*rise) - float64(4*saundersSquare*depth))
	return pascalsPerDecibar * (2 * depth / (rise + root))
}
