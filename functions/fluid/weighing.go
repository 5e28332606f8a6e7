package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// Reference values of legal metrology (OIML D 28), kg/m^3.
const (
	referenceAir    = 1.2
	referenceWeight = 8000.0
)

// weighingLaws are those of mass and of what a balance in air shows.
func weighingLaws() []*law.Law {
	const (
		guide   = "OIML R 111-1 (2004) Weights of classes E1 to M3, section 10 and annex E; OIML D 28 (2004) Conventional value of the result of weighing in air"
		lighter = "the density does not lie above that of the air: such a body rises and no balance weighs it"
	)
	airDensity := law.Parameter{Name: "air_density", Meaning: "density of the air at the balance, as from moist_air_density", Unit: "kg/m^3", Valid: law.Within(0, 1.5), Finite: law.Within(0, 100)}
	objectDensity := law.Parameter{Name: "object_density", Meaning: "density of the body", Unit: "kg/m^3", Finite: law.Above(0)}
	weightDensity := law.Parameter{Name: "weight_density", Meaning: "density of the weights that the balance was adjusted with; the convention is 8000 kg/m^3", Unit: "kg/m^3", Finite: law.Above(0), Default: "8000[kg/m^3]"}
	return []*law.Law{
		{
			Name: "buoyancy_corrected_mass", Group: "fluid",
			Gives: "mass of a body from the reading of a balance in air",
			Parameters: []law.Parameter{
				{Name: "reading", Meaning: "what the balance shows, adjusted in the same air", Unit: "kg", Finite: law.AtLeast(0)},
				airDensity, objectDensity, weightDensity,
			},
			Result:   law.Result{Unit: "kg"},
			Equation: "m = W (1 - rho_a/rho_w)/(1 - rho_a/rho_o); W reading, rho_a air_density, rho_o object_density, rho_w weight_density",
			Source:   guide, Refusal: lighter,
			Caution: "A balance that was adjusted in other air has the error of that air as well.",
			Examples: []law.Example{
				{Formula: "buoyancy_corrected_mass(1[kg], 1.2[kg/m^3], 8000[kg/m^3])", Gives: "1 kg"},
				{Formula: "buoyancy_corrected_mass(1[kg], 1.2[kg/m^3], 1000[kg/m^3])", Gives: "1.0010513 kg"},
			},
			Body: law.Of4(func(reading, air, object, weight float64) float64 {
				return reading * lift(air, weight, object)
			}),
		},
		{
			Name: "balance_reading", Group: "fluid",
			Gives: "what a balance in air shows for a body",
			Parameters: []law.Parameter{
				{Name: "mass", Meaning: "mass of the body", Unit: "kg", Finite: law.AtLeast(0)},
				airDensity, objectDensity, weightDensity,
			},
			Result:   law.Result{Unit: "kg"},
			Equation: "W = m (1 - rho_a/rho_o)/(1 - rho_a/rho_w); m mass, rho_a air_density, rho_o object_density, rho_w weight_density",
			Source:   guide, Refusal: lighter,
			Examples: []law.Example{
				{Formula: "balance_reading(1[kg], 1.2[kg/m^3], 1000[kg/m^3])", Gives: "0.9989498 kg"},
			},
			Body: law.Of4(func(mass, air, object, weight float64) float64 {
				return mass / lift(air, weight, object)
			}),
		},
		{
			Name: "conventional_mass", Group: "fluid",
			Gives: "conventional mass of a weight: the mass of 8000 kg/m^3 that it balances in air of 1.2 kg/m^3",
			Parameters: []law.Parameter{
				{Name: "mass", Meaning: "mass of the weight", Unit: "kg", Finite: law.AtLeast(0)},
				{Name: "density", Meaning: "density of the weight at 20 degC", Unit: "kg/m^3", Finite: law.Above(referenceAir)},
			},
			Result:   law.Result{Unit: "kg"},
			Equation: "m_c = m (1 - 1.2/rho)/(1 - 1.2/8000); m mass, rho density in kg/m^3",
			Source:   guide,
			Examples: []law.Example{
				{Formula: "conventional_mass(1[kg], 8000[kg/m^3])", Gives: "1 kg"},
				{Formula: "conventional_mass(1[kg], 2000[kg/m^3])", Gives: "0.99954993 kg"},
			},
			Body: law.Of2(func(mass, density float64) float64 { return mass / lift(referenceAir, referenceWeight, density) }),
		},
		{
			Name: "mass_of_conventional", Group: "fluid",
			Gives: "mass of a weight from its conventional mass",
			Parameters: []law.Parameter{
				{Name: "conventional_mass", Meaning: "conventional mass of the weight", Unit: "kg", Finite: law.AtLeast(0)},
				{Name: "density", Meaning: "density of the weight at 20 degC", Unit: "kg/m^3", Finite: law.Above(referenceAir)},
			},
			Result:   law.Result{Unit: "kg"},
			Equation: "m = m_c (1 - 1.2/8000)/(1 - 1.2/rho); m_c conventional_mass, rho density in kg/m^3",
			Source:   guide,
			Examples: []law.Example{
				{Formula: "mass_of_conventional(1[kg], 8000[kg/m^3])", Gives: "1 kg"},
			},
			Body: law.Of2(func(mass, density float64) float64 { return mass * lift(referenceAir, referenceWeight, density) }),
		},
	}
}

// lift gives (1 - air/weight)/(1 - air/object) from densities in kg/m^3; NaN
// where one of them floats in the air.
func lift(air, weight, object float64) float64 {
	if !(object > air) || !(weight > air) {
		return math.NaN()
	}
	return (1 - air/weight) / (1 - air/object)
}
