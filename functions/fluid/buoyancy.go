package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// buoyancyLaws are those of bodies in a liquid.
func buoyancyLaws() []*law.Law {
	const archimedes = "Archimedes, On Floating Bodies, book 1, propositions 5 to 7; Landau L.D., Lifshitz E.M., Fluid Mechanics (2nd ed., 1987), section 2"
	volume := law.Parameter{Name: "volume", Meaning: "volume of liquid that the body displaces, under the pressure where it is", Unit: "m^3", Finite: law.AtLeast(0)}
	mass := law.Parameter{Name: "mass", Meaning: "mass of the body", Unit: "kg", Finite: law.AtLeast(0)}
	fluid := law.Parameter{Name: "fluid_density", Meaning: "density of the fluid around", Unit: "kg/m^3", Finite: law.AtLeast(0)}
	gravity := law.Parameter{Name: "gravity", Meaning: "acceleration of gravity", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"}
	return []*law.Law{
		{
			Name: "buoyant_force", Group: "fluid",
			Gives:      "force upwards of a fluid at rest on what displaces it",
			Parameters: []law.Parameter{volume, fluid, gravity},
			Result:     law.Result{Unit: "N"},
			Equation:   "F = rho g V; V volume, rho fluid_density, g gravity",
			Source:     archimedes,
			Caution:    "Cases and floats grow smaller under pressure. A body that lies on the bottom without liquid under it has no lift.",
			Examples: []law.Example{
				{Formula: "buoyant_force(1.00e5[m^3], 1000[kg/m^3], gravity: 9.80[m/s^2])", Gives: "9.80e8 N"},
			},
			Body: law.Of3(func(volume, density, gravity float64) float64 { return density * gravity * volume }),
		},
		{
			Name: "net_buoyancy", Group: "fluid",
			Gives:      "lift of a body in a fluid less its weight: positive where it rises",
			Parameters: []law.Parameter{volume, mass, fluid, gravity},
			Result:     law.Result{Unit: "N"},
			Equation:   "F = (rho V - m) g; V volume, m mass, rho fluid_density, g gravity",
			Source:     archimedes,
			Caution:    "A small difference of large numbers: ask for its uncertainty.",
			Examples: []law.Example{
				{Formula: "net_buoyancy(1[m^3], 1000[kg], 1025[kg/m^3], gravity: 10[m/s^2])", Gives: "250 N"},
			},
			Body: law.Of4(func(volume, mass, density, gravity float64) float64 {
				return (float64(density*volume) - mass) * gravity
			}),
		},
		{
			Name: "ballast_for_neutral", Group: "fluid",
			Gives: "mass of ballast with which a body neither rises nor sinks; negative: so much of it must be taken away",
			Parameters: []law.Parameter{
				volume, mass, fluid,
				{Name: "ballast_density", Meaning: "density of the ballast, which displaces fluid itself", Unit: "kg/m^3", Finite: law.Above(0)},
			},
			Result:   law.Result{Unit: "kg"},
			Equation: "m_b = (rho V - m)/(1 - rho/rho_b); V volume, m mass, rho fluid_density, rho_b ballast_density",
			Source:   archimedes,
			Refusal:  "ballast that is no denser than the fluid does not weigh a body down",
			Examples: []law.Example{
				{Formula: "ballast_for_neutral(1[m^3], 900[kg], 1000[kg/m^3], 8000[kg/m^3])", Gives: "114.285714 kg"},
			},
			Body: law.Of4(ballastForNeutral),
		},
		{
			Name: "floating_fraction", Group: "fluid",
			Gives: "share of a floating body's volume below the liquid's surface",
			Parameters: []law.Parameter{
				{Name: "object_density", Meaning: "mass of the body divided by its whole volume", Unit: "kg/m^3", Finite: law.AtLeast(0)},
				{Name: "fluid_density", Meaning: "density of the liquid", Unit: "kg/m^3", Finite: law.Above(0)},
			},
			Result:   law.Result{Unit: "1"},
			Equation: "f = rho_o/rho; rho_o object_density, rho fluid_density; the lift of the air is left out",
			Source:   archimedes,
			Caution:  "Says nothing of how it floats: a body may float upside down.",
			Refusal:  "the body is denser than the liquid: it sinks",
			Examples: []law.Example{
				{Formula: "floating_fraction(917[kg/m^3], 1025[kg/m^3])", Gives: "0.894634"},
			},
			Body: law.Of2(func(object, fluid float64) float64 {
				if object > fluid {
					return math.NaN()
				}
				return object / fluid
			}),
		},
		{
			Name: "weighed_density", Group: "fluid",
			Gives: "density of a body from weighing it in air and in a liquid",
			Parameters: []law.Parameter{
				{Name: "in_air", Meaning: "reading of the balance with the body in air", Unit: "kg", Finite: law.Above(0)},
				{Name: "in_liquid", Meaning: "reading of the balance with the body in the liquid; negative where it floats up", Unit: "kg"},
				{Name: "liquid_density", Meaning: "density of the liquid", Unit: "kg/m^3", Finite: law.Above(0)},
			},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "rho = W_a rho_l/(W_a - W_l); W_a in_air, W_l in_liquid, rho_l liquid_density; the lift of the air is left out",
			Source:   archimedes,
			Caution:  "Bubbles on the body and the wire that holds it weigh as well. For better than 1e-3 take the lift of the air into account.",
			Refusal:  "the body weighs no less in the liquid than in air",
			Examples: []law.Example{
				{Formula: "weighed_density(8.630[g], 7.800[g], 1.000[g/cm^3])", Gives: "10.4 g/cm^3"},
			},
			Body: law.Of3(func(air, liquid, density float64) float64 {
				if !(air > liquid) {
					return math.NaN()
				}
				return air * density / (air - liquid)
			}),
		},
	}
}

// ballastForNeutral gives the mass of ballast in kg; NaN for ballast that
// floats.
func ballastForNeutral(volume, mass, fluid, ballast float64) float64 {
	if !(ballast > fluid) {
		return math.NaN()
	}
	return (float64(fluid*volume) - mass) / (1 - fluid/ballast)
}
