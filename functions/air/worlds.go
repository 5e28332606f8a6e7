package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// world is a body with an atmosphere that has been measured.
type world struct {
	name    string
	levels  []worldLevel
	gravity float64 // m/s^2 at the zero of height
	radius  float64 // km, of the zero of height
}

// worlds: gravity and radius of the zero of height by VIRA for Venus, GM 4.2828e13
// m^3/s^2 and radius 3389.5 km for Mars, and NASA's planetary fact sheets for
// Titan and Jupiter (there at the equator, with its rotation).
var worlds = []world{
	{"Venus", venusLevels, 8.869, 6052},
	{"Mars", marsLevels, 3.7279, 3389.5},
	{"Titan", titanLevels, 1.354, 2575},
	{"Jupiter", jupiterLevels, 23.12, 71492},
}

// Mars by a curve: a fit to Mars Global Surveyor's soundings (NASA Glenn
// Research Center), from the ground.
const (
	marsFit      = "Mars fit"
	marsFitTop   = 30000.0 // m
	marsFitJoint = 7000.0  // m
)

func worldNamed(name string) *world {
	for i := range worlds {
		if worlds[i].name == name {
			return &worlds[i]
		}
	}
	return &worlds[1] // the fit's planet
}

// worldState is what is known at a height, in SI units.
type worldState struct{ temperature, pressure, density float64 }

var noState = worldState{notANumber, notANumber, notANumber}

// at interpolates between two levels: temperature linear in height; the
// logarithm of pressure linear in the integral of dz/T, as the hydrostatic
// equation has it for one gas, so that both levels' pressures are met; and
// p/(rho T), the gas constant over the molar mass with what the gas lacks of an
// ideal one, linear in height.
func (w *world) at(height float64) worldState {
	z := height / 1000
	levels := w.levels
	last := len(levels) - 1
	if !(z >= levels[0].height-1e-9 && z <= levels[last].height+1e-9) {
		return noState
	}
	i := 0
	for i < last-1 && z >= levels[i+1].height {
		i++
	}
	a, b := &levels[i], &levels[i+1]
	share := (z - a.height) / (b.height - a.height)
	change := (b.temperature - a.temperature) / a.temperature
	t := a.temperature + float64(share*(b.temperature-a.temperature))
	weight := share
	if change != 0 {
		weight = column.Log1p(float64(share*change)) / column.Log1p(change)
	}
	pressure := a.pressure * column.Exp(float64(weight*column.Ln(b.pressure/a.pressure)))
	below, above := a.pressure/(a.density*a.temperature), b.pressure/(b.density*b.temperature)
	gas := below + float64(share*(above-below))
	return worldState{t, 1e5 * pressure, pressure / (gas * t)}
}

// marsByFit gives the curve's values.
func marsByFit(height float64) worldState {
	if !(height >= 0 && height <= marsFitTop) {
		return noState
	}
	celsius := -31 - float64(0.000998*height)
	if height >= marsFitJoint {
		celsius = -23.4 - float64(0.00222*height)
	}
	pressure := 699 * column.Exp(-0.00009*height)
	return worldState{celsius + celsiusOrigin, pressure, pressure / (192.1 * (celsius + 273.1))}
}

// worldBody takes the world's name and the height.
//
//go:noinline
func worldBody(give func(worldState) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		fit := arguments[0].Text == marsFit
		w := worldNamed(arguments[0].Text)
		for i := range dst {
			height := arguments[1].At(i)
			if fit {
				dst[i] = give(marsByFit(height))
			} else {
				dst[i] = give(w.at(height))
			}
		}
	}
}

// worldLaws are the atmospheres of other worlds.
func worldLaws() []*law.Law {
	parameters := func(low, high float64) []law.Parameter {
		return []law.Parameter{
			{Name: "world", Meaning: "which world: Venus, Titan, Jupiter and Mars as measured, or Mars by a curve from the ground", Type: law.Text, Choices: []string{"Venus", "Mars", "Titan", "Jupiter", marsFit}},
			{
				Name: "altitude", Meaning: "geometric height: Venus above the radius 6052 km, Mars above Pathfinder's landing site (fit: above the mean ground), Titan above the ground, Jupiter above the level of 1 bar",
				Unit: "km", Valid: law.Within(low, high), Finite: law.Within(low, high),
			},
		}
	}
	const (
		source = "Venus: Seiff A. et al. (1985) Adv. Space Res. 5 (11), 3, table 1-1 (VIRA, latitude 0 to 30 deg); Mars: Magalhaes J.A., Schofield J.T., Seiff A. (1999) J. Geophys. Res. 104, 8943 (Pathfinder, 4 July 1997); " +
			"Titan: Fulchignoni M. et al. (2005) Nature 438, 785 (Huygens, 14 January 2005); Jupiter: Seiff A. et al. (1998) J. Geophys. Res. 103, 22857 (Galileo probe, 7 December 1995); " +
			"Mars fit: NASA Glenn Research Center, Mars atmosphere model (after Mars Global Surveyor)"
		caution = "One mean, or one descent at one place and hour, of which selected levels are interpolated: wide gaps (Mars 15 to 33 km, Titan 3.5 to 66 km, Jupiter -54 to 45 km) hold what lies between only roughly. Seasons, storms and day change thin air by tens of percent. Not for the design of an entry."
		refusal = "the profile does not reach that height: Venus 0 to 72 km, Mars 9.226 to 100.161 km (fit 0 to 30 km), Titan 0.003 to 146.8 km, Jupiter -130.74 to 1018.3 km"
		between = "; between levels T is linear in height and ln p linear in the integral of dz/T"
		fit     = "; Mars fit: t = -31 degC - 0.998 K/km z below 7 km, -23.4 degC - 2.22 K/km z above, p = 699 Pa exp(-0.00009 z/m), rho = p/(192.1 J/(kg K) (t + 273.1 K))"
	)
	one := func(name, gives, unit, equation, gave string, give func(worldState) float64) *law.Law {
		return &law.Law{
			Name: "world_" + name, Group: group, Gives: gives + " of the atmosphere of another world",
			Parameters: parameters(-130.74, 1018.3), Result: law.Result{Unit: unit},
			Equation: equation + between + fit, Source: source, Caution: caution, Refusal: refusal,
			Examples: []law.Example{{Formula: `world_` + name + `("Venus", 0[km])`, Gives: gave}},
			Body:     worldBody(give),
		}
	}
	return []*law.Law{
		one("temperature", "the temperature", "K", "T of the profile", "735.3 K", func(s worldState) float64 { return s.temperature }),
		one("pressure", "the pressure", "Pa(a)", "p of the profile", "92.10 bar", func(s worldState) float64 { return s.pressure }),
		one("density", "the density", "kg/m^3", "rho of the profile, between levels p over T and p/(rho T) linear in height", "64.79 kg/m^3", func(s worldState) float64 { return s.density }),
		{
			Name: "world_gravity", Group: group, Gives: "the acceleration of gravity of another world",
			Parameters: parameters(-200, 10000), Result: law.Result{Unit: "m/s^2"},
			Equation: "g = g0 (r/(r + z))^2; Venus g0 = 8.869 m/s^2, r = 6052 km; Mars 3.7279 m/s^2, 3389.5 km; Titan 1.354 m/s^2, 2575 km; Jupiter 23.12 m/s^2, 71492 km",
			Source:   "Venus: Seiff A. et al. (1985) Adv. Space Res. 5 (11), 3; Mars: G M = 4.2828e13 m^3/s^2; Titan, Jupiter: NASA planetary fact sheets (NSSDCA)",
			Caution:  "Spheres without rotation, Jupiter with that of its equator: gravity differs by latitude, on Jupiter by 15 %.",
			Examples: []law.Example{{Formula: `world_gravity("Venus", 0[km])`, Gives: "8.869 m/s^2"}},
			Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
				w := worldNamed(arguments[0].Text)
				radius := float64(w.radius * 1000)
				for i := range dst {
					ratio := radius / (radius + arguments[1].At(i))
					dst[i] = w.gravity * ratio * ratio
				}
			},
		},
	}
}
