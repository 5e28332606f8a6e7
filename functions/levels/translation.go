package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

func molarMassParameter() law.Parameter {
	return law.Parameter{Name: "molar_mass", Meaning: "molar mass of the particles; 5.4857991e-7 kg/mol for electrons", Unit: "g/mol", Finite: law.Above(0)}
}

func pressureParameter(standard string) law.Parameter {
	return law.Parameter{Name: "pressure", Meaning: "pressure of the ideal gas", Unit: "Pa(a)", Finite: law.Above(0), Default: standard}
}

const sackur = "Sackur O. (1913) Ann. Phys. 345, 67; Tetrode H. (1912) Ann. Phys. 343, 434"

// thermalWavelength gives h/sqrt(2 pi m k_B T) in m.
func thermalWavelength(temperature, molarMass float64) float64 {
	if !(temperature > 0) || !(molarMass > 0) {
		return notANumber
	}
	mass := molarMass / nature.AvogadroConstant
	// Twice the root: the product of mass and k_B is near the smallest numbers.
	return nature.PlanckConstant / float64(math.Sqrt(float64(2*math.Pi*mass))*math.Sqrt(float64(nature.BoltzmannConstant*temperature)))
}

// translationLn gives ln of the translational partition sum of one particle in
// the room that it has at a pressure.
func translationLn(temperature, pressure, molarMass float64) float64 {
	wave := thermalWavelength(temperature, molarMass)
	room := float64(nature.BoltzmannConstant*temperature) / pressure
	return column.Ln(room) - float64(3*column.Ln(wave))
}

func translationalPartitionSum(temperature, pressure, molarMass float64) float64 {
	wave := thermalWavelength(temperature, molarMass)
	room := float64(nature.BoltzmannConstant*temperature) / pressure
	return room / wave / wave / wave
}

func translationalEntropy(temperature, pressure, molarMass float64) float64 {
	return float64(nature.MolarGasConstant * (2.5 + translationLn(temperature, pressure, molarMass)))
}

var thermalWavelengthLaw = &law.Law{
	Name:       "thermal_wavelength",
	Group:      group,
	Gives:      "the thermal de Broglie wavelength of particles",
	Parameters: []law.Parameter{temperatureParameter(), molarMassParameter()},
	Result:     law.Result{Unit: "m"},
	Equation:   "Lambda = h/sqrt(2 pi m k_B T), m = M/N_A",
	Source:     "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 5",
	Examples: []law.Example{
		{Formula: "thermal_wavelength(298.15[K], 4.002602[g/mol])", Gives: "5.05372e-11 m"},
	},
	Body: law.Of2(thermalWavelength),
}

var translationalPartitionSumLaw = &law.Law{
	Name:       "translational_partition_sum",
	Group:      group,
	Gives:      "the translational partition sum of one particle of an ideal gas, in the room that it has",
	Parameters: []law.Parameter{temperatureParameter(), pressureParameter(""), molarMassParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "q = (k_B T/p)/Lambda^3",
	Source:     "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 5",
	Caution:    "Below some 10 the gas is degenerate and no longer ideal.",
	Examples: []law.Example{
		{Formula: "translational_partition_sum(298.15[K], 1[bar], 4.002602[g/mol])", Gives: "318922"},
	},
	Body: law.Of3(translationalPartitionSum),
}

var translationalEntropyLaw = &law.Law{
	Name:       "translational_entropy",
	Group:      group,
	Gives:      "the molar entropy of translation of an ideal gas (Sackur and Tetrode)",
	Parameters: []law.Parameter{temperatureParameter(), pressureParameter(""), molarMassParameter()},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "S = R (5/2 + ln q), q = (k_B T/p)/Lambda^3",
	Source:     sackur,
	Caution:    "Where q is not large the gas is degenerate: the law may even give a negative entropy.",
	Examples: []law.Example{
		{Formula: "translational_entropy(298.15[K], 1[bar], 39.948[g/mol])", Gives: "154.8457 J/(mol K)"},
	},
	Body: law.Of3(translationalEntropy),
}
