package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// textbookStatics is where the linear law of pressure in a liquid at rest comes
// from.
const textbookStatics = "Stevin S. (1586) De Beghinselen des Waterwichts; Landau L.D., Lifshitz E.M., Fluid Mechanics (2nd ed., 1987), section 2"

// constantDensity warns of what the linear law leaves out.
const constantDensity = "Density and gravity are taken as constant down the column: sea water at 10000 m is 4 % denser than at the surface, so use sea_pressure_at_depth for the deep sea. "

// columnLaws are those of a column of liquid of constant density.
func columnLaws() []*law.Law {
	density := law.Parameter{
		Name: "density", Meaning: "density of the liquid, constant over the column",
		Unit: "kg/m^3", Finite: law.Above(0),
	}
	gravity := law.Parameter{
		Name: "gravity", Meaning: "acceleration of gravity, constant over the column",
		Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n",
	}
	surface := law.Parameter{
		Name: "surface_pressure", Meaning: "absolute pressure on the liquid's surface",
		Unit: "Pa(a)", Finite: law.AtLeast(0),
	}
	return []*law.Law{
		{
			Name:  "head_pressure",
			Group: "fluid",
			Gives: "difference of pressure between the foot and the top of a column of liquid",
			Parameters: []law.Parameter{
				{Name: "height", Meaning: "vertical height of the column; negative upwards from the foot", Unit: "m"},
				density, gravity,
			},
			Result:   law.Result{Unit: "Pa"},
			Equation: "dp = rho g h; h height, rho density, g gravity",
			Source:   textbookStatics,
			Caution:  constantDensity + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "head_pressure(10[m], 1000[kg/m^3])", Gives: "98066.5 Pa"},
				{Formula: "head_pressure(760[mm], 13595.1[kg/m^3])", Gives: "101325 Pa"},
			},
			Body: law.Of3(headPressure),
		},
		{
			Name:  "pressure_at_depth",
			Group: "fluid",
			Gives: "absolute pressure at a depth in a liquid",
			Parameters: []law.Parameter{
				surface,
				{Name: "depth", Meaning: "vertical distance below the liquid's surface", Unit: "m", Finite: law.AtLeast(0)},
				density, gravity,
			},
			Result:   law.Result{Unit: "Pa(a)"},
			Equation: "p = p_s + rho g z; p_s surface_pressure, z depth, rho density, g gravity",
			Source:   textbookStatics,
			Caution:  constantDensity + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "pressure_at_depth(1[atm], 10[m], 1000[kg/m^3])", Gives: "199391.5 Pa"},
			},
			Body: law.Of4(pressureAtDepth),
		},
		{
			Name:  "depth_at_pressure",
			Group: "fluid",
			Gives: "depth below the surface of a liquid at which an absolute pressure reigns",
			Parameters: []law.Parameter{
				{Name: "pressure", Meaning: "absolute pressure at the depth sought", Unit: "Pa(a)", Finite: law.AtLeast(0)},
				surface, density, gravity,
			},
			Result:   law.Result{Unit: "m"},
			Equation: "z = (p - p_s)/(rho g); p pressure, p_s surface_pressure, rho density, g gravity",
			Source:   textbookStatics,
			Caution:  constantDensity + law.CautionPressure,
			Refusal:  "the pressure lies below that on the surface: nowhere in the liquid is it so low",
			Examples: []law.Example{
				{Formula: "depth_at_pressure(199391.5[Pa], 1[atm], 1000[kg/m^3])", Gives: "10 m"},
			},
			Body: law.Of4(depthAtPressure),
		},
	}
}

// headPressure gives the pressure of a column in Pa: height m, density kg/m^3,
// gravity m/s^2.
func headPressure(height, density, gravity float64) float64 {
	return density * gravity * height
}

// pressureAtDepth gives the absolute pressure in Pa at a depth in m.
func pressureAtDepth(surface, depth, density, gravity float64) float64 {
	return surface + float64(density*gravity*depth)
}

// depthAtPressure gives the depth in m of an absolute pressure in Pa; NaN where
// the pressure lies below that on the surface.
func depthAtPressure(pressure, surface, density, gravity float64) float64 {
	if pressure < surface {
		return math.NaN()
	}
	return (pressure - surface) / (density * gravity)
}
