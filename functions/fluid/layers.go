package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// layerLaws are those of columns whose density is not one number: liquids that
// give under pressure, and liquids on top of each other.
func layerLaws() []*law.Law {
	const elastic = "Landau L.D., Lifshitz E.M., Fluid Mechanics (2nd ed., 1987), section 3, with K = rho dp/drho constant"
	surface := law.Parameter{Name: "surface_pressure", Meaning: "absolute pressure on the liquid's surface", Unit: "Pa(a)", Finite: law.AtLeast(0)}
	depth := law.Parameter{Name: "depth", Meaning: "vertical distance below the liquid's surface", Unit: "m", Finite: law.AtLeast(0)}
	pressure := law.Parameter{Name: "pressure", Meaning: "absolute pressure at the depth sought", Unit: "Pa(a)", Finite: law.AtLeast(0)}
	gravity := law.Parameter{Name: "gravity", Meaning: "acceleration of gravity, constant over the column", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"}
	surfaceDensity := law.Parameter{Name: "surface_density", Meaning: "density of the liquid at its surface", Unit: "kg/m^3", Finite: law.Above(0)}
	modulus := law.Parameter{Name: "bulk_modulus", Meaning: "bulk modulus of the liquid, as from liquid_bulk_modulus; the same at every depth", Unit: "GPa", Finite: law.Above(0)}
	thicknesses := law.Parameter{Name: "thicknesses", Meaning: "thickness of each layer, from the surface down", Type: law.List, Unit: "m", Finite: law.AtLeast(0)}
	densities := law.Parameter{Name: "densities", Meaning: "density of each layer, from the surface down", Type: law.List, Unit: "kg/m^3", Finite: law.Above(0)}
	return []*law.Law{
		{
			Name: "stiff_liquid_pressure", Group: "fluid",
			Gives:      "absolute pressure at a depth in a liquid of constant bulk modulus",
			Parameters: []law.Parameter{surface, depth, surfaceDensity, modulus, gravity},
			Result:     law.Result{Unit: "Pa(a)"},
			Equation:   "p = p_s - K ln(1 - rho_s g z/K), from rho = rho_s exp((p - p_s)/K); p_s surface_pressure, z depth, rho_s surface_density, K bulk_modulus, g gravity",
			Source:     elastic,
			Caution:    "The bulk modulus of real liquids rises with pressure, that of water by 6 to 7 times the pressure: for the deep sea use sea_pressure_at_depth. " + law.CautionPressure,
			Refusal:    "at that depth the equation has no pressure: rho_s g z reaches the bulk modulus",
			Examples: []law.Example{
				// K ln(1/(1 - 0.5)) = K ln 2.
				{Formula: "stiff_liquid_pressure(0[Pa], 100[km], 1000[kg/m^3], 2[GPa], gravity: 10[m/s^2])", Gives: "1.386294361 GPa"},
			},
			Body: law.OfMany(func(x []float64) float64 {
				ratio := x[2] * x[4] * x[1] / x[3]
				if !(ratio < 1) {
					return math.NaN()
				}
				return x[0] - float64(x[3]*column.Log1p(-ratio))
			}),
		},
		{
			Name: "stiff_liquid_depth", Group: "fluid",
			Gives:      "depth at which an absolute pressure reigns in a liquid of constant bulk modulus",
			Parameters: []law.Parameter{pressure, surface, surfaceDensity, modulus, gravity},
			Result:     law.Result{Unit: "m"},
			Equation:   "z = K [1 - exp(-(p - p_s)/K)]/(rho_s g); p pressure, p_s surface_pressure, rho_s surface_density, K bulk_modulus, g gravity",
			Source:     elastic,
			Caution:    "The bulk modulus of real liquids rises with pressure: for the deep sea use sea_depth_at_pressure. " + law.CautionPressure,
			Refusal:    "the pressure lies below that on the surface: nowhere in the liquid is it so low",
			Examples: []law.Example{
				{Formula: "stiff_liquid_depth(1.386294361[GPa], 0[Pa], 1000[kg/m^3], 2[GPa], gravity: 10[m/s^2])", Gives: "100 km"},
			},
			Body: law.OfMany(func(x []float64) float64 {
				if x[0] < x[1] {
					return math.NaN()
				}
				return -x[3] * column.Expm1((x[1]-x[0])/x[3]) / (x[2] * x[4])
			}),
		},
		{
			Name: "layered_pressure", Group: "fluid",
			Gives:      "absolute pressure at a depth under layers of liquids that do not mix",
			Parameters: []law.Parameter{surface, depth, thicknesses, densities, gravity},
			Result:     law.Result{Unit: "Pa(a)"},
			Equation:   "p = p_s + g sum of rho_i h_i down to the depth; p_s surface_pressure, rho_i densities, h_i thicknesses, g gravity",
			Source:     textbookStatics,
			Caution:    "Layers lie from light to heavy; a heavier one on top turns over. " + law.CautionPressure,
			Refusal:    "the depth lies below the lowest layer",
			Examples: []law.Example{
				{Formula: "layered_pressure(100[kPa], 3[m], [1, 5][m], [800, 1000][kg/m^3], gravity: 10[m/s^2])", Gives: "128 kPa"},
			},
			Body: layeredPressureBody,
		},
		{
			Name: "layered_depth", Group: "fluid",
			Gives:      "depth at which an absolute pressure reigns under layers of liquids that do not mix",
			Parameters: []law.Parameter{pressure, surface, thicknesses, densities, gravity},
			Result:     law.Result{Unit: "m"},
			Equation:   "the depth z for which p_s + g sum of rho_i h_i down to z is p; p pressure, p_s surface_pressure, rho_i densities, h_i thicknesses, g gravity",
			Source:     textbookStatics,
			Caution:    "Layers lie from light to heavy; a heavier one on top turns over. " + law.CautionPressure,
			Refusal:    "the pressure lies below that on the surface or above that under the lowest layer",
			Examples: []law.Example{
				{Formula: "layered_depth(128[kPa], 100[kPa], [1, 5][m], [800, 1000][kg/m^3], gravity: 10[m/s^2])", Gives: "3 m"},
			},
			Body: layeredDepthBody,
		},
	}
}

// layeredPressureBody takes surface pressure, depth, thicknesses, densities and
// gravity.
func layeredPressureBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	thicknesses, densities := arguments[2].Items, arguments[3].Items
	for i := range dst {
		depth, gravity := arguments[1].At(i), arguments[4].At(i)
		pressure, left := arguments[0].At(i), depth
		for k := 0; k < len(thicknesses) && left > 0; k++ {
			height := min(left, thicknesses[k].At(i))
			pressure += float64(densities[k].At(i) * gravity * height)
			left -= height
		}
		// What rounding leaves of the sum of the layers is no depth.
		if left > 1e-14*depth {
			pressure = math.NaN()
		}
		dst[i] = pressure
	}
}

// layeredDepthBody takes pressure, surface pressure, thicknesses, densities and
// gravity.
func layeredDepthBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	thicknesses, densities := arguments[2].Items, arguments[3].Items
	for i := range dst {
		pressure, gravity := arguments[0].At(i), arguments[4].At(i)
		left, depth := pressure-arguments[1].At(i), 0.0
		if left < 0 {
			depth = math.NaN()
		}
		for k := 0; k < len(thicknesses) && left > 0; k++ {
			weight := densities[k].At(i) * gravity
			height := min(left/weight, thicknesses[k].At(i))
			depth += height
			left -= float64(weight * height)
		}
		if left > 1e-14*pressure {
			depth = math.NaN()
		}
		dst[i] = depth
	}
}
