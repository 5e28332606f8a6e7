package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// centrifugeExponent gives M (1 - v rho) omega^2 (r2^2 - r1^2)/(2 R T).
func centrifugeExponent(x []float64) float64 {
	buoyant := x[0] * (1 - float64(x[1]*x[2]))
	return buoyant * x[4] * x[4] * ((x[6] - x[5]) * (x[6] + x[5])) / (2 * nature.MolarGasConstant * x[3])
}

// sedimentLaws are the exponential law of columns for particles and rotors, and
// for gases that separate.
var sedimentLaws = []*law.Law{
	{
		Name: "buoyant_mass", Group: group, Gives: "the mass of a round particle above that of the liquid it displaces",
		Parameters: []law.Parameter{
			{Name: "radius", Meaning: "radius of the particle", Unit: "um", Finite: law.AtLeast(0)},
			{Name: "density_difference", Meaning: "density of the particle less that of the liquid", Unit: "kg/m^3"},
		},
		Result: law.Result{Unit: "kg"}, Equation: "m = (4/3) pi a^3 (Delta - delta); a radius", Source: sedimentPerrin,
		Examples: []law.Example{{Formula: "buoyant_mass(0[um], 63[kg/m^3])", Gives: "0 kg"}},
		Body:     law.Of2(func(a, d float64) float64 { return 4.0 / 3 * math.Pi * a * a * a * d }),
	},
	{
		Name: "sedimentation_length", Group: group, Gives: "the height over which the number of suspended particles falls to 1/e",
		Parameters: []law.Parameter{sedimentMass, sedimentTemperature, sedimentGravity},
		Result:     law.Result{Unit: "um"}, Equation: "L = k_B T/(m g); m buoyant_mass", Source: sedimentPerrin, Caution: sedimentRest,
		Examples: []law.Example{{Formula: "sedimentation_length(1.380649e-23[kg], 9.80665[K])", Gives: "1 m"}},
		Body:     law.Of3(func(m, t, g float64) float64 { return nature.BoltzmannConstant * t / (m * g) }),
	},
	{
		Name: "sediment_fraction_above", Group: group, Gives: "the fraction of suspended particles that float above a height, and the concentration there against that at the bottom",
		Parameters: []law.Parameter{
			{Name: "height", Meaning: "height above the bottom", Unit: "um", Finite: law.AtLeast(0)}, sedimentMass, sedimentTemperature, sedimentGravity,
		},
		Result: law.Result{Unit: "1"}, Equation: "exp(-m g h/(k_B T)); m buoyant_mass", Source: sedimentPerrin,
		Caution:  sedimentRest + " The fraction is that of a vessel many sedimentation lengths high.",
		Examples: []law.Example{{Formula: "sediment_fraction_above(0[um], 1e-17[kg], 293.15[K])", Gives: "1"}},
		Body: law.Of4(func(h, m, t, g float64) float64 {
			return column.Exp(-(m * g * h / (nature.BoltzmannConstant * t)))
		}),
	},
	{
		Name: "centrifuge_ratio", Group: group, Gives: "the concentration at an outer place of a rotor against that at an inner one",
		Parameters: append([]law.Parameter{molarMassOfParticles()}, sedimentRotor...),
		Result:     law.Result{Unit: "1"},
		Equation:   "c2/c1 = exp(M (1 - v rho) omega^2 (x2^2 - x1^2)/(2 R T)); v specific_volume, omega angular_speed, x1 inner, x2 outer", Source: sedimentSvedberg,
		Caution:  "At equilibrium, an ideal dilute solution of one solute. Rotors burst: keep to the maker's speed.",
		Refusal:  "the ratio is larger than a number can hold",
		Examples: []law.Example{{Formula: "centrifuge_ratio(67670[g/mol], 0.749[cm^3/g], 0.9988[g/cm^3], 293.3[K], 8708[rev/min], 4.51[cm], 4.56[cm])", Gives: "1.141"}},
		Body:     law.OfMany(func(x []float64) float64 { return column.Exp(centrifugeExponent(x)) }),
	},
	{
		Name: "centrifuge_molar_mass", Group: group, Gives: "the molar mass that a ratio of concentrations in a rotor tells",
		Parameters: append([]law.Parameter{{Name: "ratio", Meaning: "concentration at the outer place over that at the inner one", Unit: "1", Finite: law.Above(0)}}, sedimentRotor...),
		Result:     law.Result{Unit: "g/mol"},
		Equation:   "M = 2 R T ln(c2/c1)/((1 - v rho) omega^2 (x2^2 - x1^2)); v specific_volume, omega angular_speed, x1 inner, x2 outer", Source: sedimentSvedberg,
		Caution:  "At equilibrium, an ideal dilute solution of one solute.",
		Refusal:  "the solute neither sinks nor floats, or both places are one",
		Examples: []law.Example{{Formula: "centrifuge_molar_mass(1.061/0.93, 0.749[cm^3/g], 0.9988[g/cm^3], 293.3[K], 8708[rev/min], 4.51[cm], 4.56[cm])", Gives: "6.77e4 g/mol"}},
		Body: law.OfMany(func(x []float64) float64 {
			y := column.Ln(x[0])
			x[0] = 1
			unit := centrifugeExponent(x)
			if unit == 0 {
				return notANumber
			}
			return y / unit
		}),
	},
}

var sedimentMass = law.Parameter{Name: "buoyant_mass", Meaning: "mass of a particle above that of the liquid it displaces", Unit: "kg", Finite: law.Above(0)}
var sedimentTemperature = law.Parameter{Name: "temperature", Meaning: "temperature of the liquid", Unit: "K", Finite: law.Above(0)}
var sedimentGravity = gravityOfColumn()

const (
	sedimentPerrin = "Perrin J. (1909) Mouvement brownien et réalité moléculaire, Ann. Chim. Phys. 18, 5; Perrin J. (1913) Les Atomes, Alcan, Paris, pp. 147-154"
	sedimentRest   = "At rest and after long waiting, few particles that do not push each other."
)

var sedimentRotor = []law.Parameter{
	{Name: "specific_volume", Meaning: "partial specific volume of the solute", Unit: "cm^3/g", Finite: law.AtLeast(0)},
	{Name: "density", Meaning: "density of the solution", Unit: "g/cm^3", Finite: law.AtLeast(0)},
	sedimentTemperature,
	{Name: "angular_speed", Meaning: "angular speed of the rotor", Unit: "rad/s", Finite: law.Above(0)},
	{Name: "inner", Meaning: "distance of the inner place from the axis", Unit: "cm", Finite: law.AtLeast(0)},
	{Name: "outer", Meaning: "distance of the outer place from the axis", Unit: "cm", Finite: law.AtLeast(0)},
}

const sedimentSvedberg = "Svedberg T., Fåhraeus R. (1926) J. Am. Chem. Soc. 48, 430"
