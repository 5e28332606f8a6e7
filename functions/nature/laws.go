// Package nature holds what nature sets: the CODATA constants, the elements
// and their atomic weights, and the laws that read a chemical formula.
package nature

import (
	"math"

	"plumbrule/engine/law"
)

// Laws lists the laws of this room.
func Laws() []*law.Law {
	return []*law.Law{molarMassLaw(), particleMassLaw()}
}

// formulaParameter is the chemical formula that both laws take.
func formulaParameter() law.Parameter {
	return law.Parameter{
		Name:    "formula",
		Meaning: "chemical formula of at most 200 characters: element symbols, counts, brackets, parts joined by a dot, as \"CO2\", \"Ca(OH)2\", \"CuSO4.5H2O\"",
		Type:    law.Text,
		CheckText: func(text string) string {
			_, complaint := weigh(text)
			return complaint
		},
	}
}

func molarMassLaw() *law.Law {
	return &law.Law{
		Name:       "molar_mass",
		Group:      "nature",
		Gives:      "molar mass of a substance of natural isotopic composition",
		Parameters: []law.Parameter{formulaParameter()},
		Result:     law.Result{Unit: "g/mol"},
		Equation:   "M = sum of n_i A_r,i g/mol; n_i number of atoms of element i in the formula, A_r,i its abridged standard atomic weight",
		Source:     atomicWeights,
		Caution:    "Standard atomic weights are those of normal terrestrial material, with five digits at most: enriched or depleted isotopes differ. Elements without a standard atomic weight are refused.",
		Examples: []law.Example{
			{Formula: `molar_mass("CO2")`, Gives: "44.009 g/mol"},
			{Formula: `molar_mass("CuSO4.5H2O")`, Gives: "249.677 g/mol"},
		},
		Body: ofFormula(MolarMass),
	}
}

func particleMassLaw() *law.Law {
	return &law.Law{
		Name:       "particle_mass",
		Group:      "nature",
		Gives:      "mean mass of one particle of a substance of natural isotopic composition",
		Parameters: []law.Parameter{formulaParameter()},
		Result:     law.Result{Unit: "kg"},
		Equation:   "m = M/N_A; M molar mass of the formula, N_A Avogadro constant",
		Source:     atomicWeights + "; N_A exact since 2019 (SI Brochure, 9th ed., BIPM 2019)",
		Caution:    "The mean over the natural mixture of isotopes, not the mass of one isotope, and without the mass defect of the chemical bond (below 1e-8) or of a charge.",
		Examples: []law.Example{
			{Formula: `particle_mass("N2")`, Gives: "4.6518e-26 kg"},
		},
		Body: ofFormula(ParticleMass),
	}
}

// MolarMass gives the molar mass of a chemical formula in kg/mol; NaN where
// the formula is not sound or holds an element without a standard atomic
// weight.
func MolarMass(formula string) float64 {
	weight, complaint := weigh(formula)
	if complaint != "" {
		return math.NaN()
	}
	return float64(weight) / (weightUnits * 1000)
}

// ParticleMass gives the mean mass of one particle of a chemical formula in
// kg; NaN as with MolarMass.
func ParticleMass(formula string) float64 {
	return MolarMass(formula) / AvogadroConstant
}

// ofFormula lifts a function of the text argument: one number for all rows.
func ofFormula(f func(formula string) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, _ *law.Work) {
		mass := f(arguments[0].Text)
		for i := range dst {
			dst[i] = mass
		}
	}
}
