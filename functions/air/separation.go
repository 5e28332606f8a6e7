package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// separated sums, at a height, the gases that each stand on their own scale
// height: the wanted one's number, all together, and their mass in kg/mol
// times number. wanted counts from 0.
func separated(arguments []law.Argument, row, wanted int) (one, number, weight float64) {
	densities, masses := arguments[0].Items, arguments[1].Items
	height, temperature, gravity := arguments[2].At(row), arguments[3].At(row), arguments[4].At(row)
	// Over the lightest gas, so that nothing overflows; the factor is common.
	lightest := masses[0].At(row)
	for i := range masses {
		lightest = column.Min(lightest, masses[i].At(row))
	}
	for i := range densities {
		m := masses[i].At(row)
		n := float64(densities[i].At(row) * column.Exp(-((m - lightest) * gravity * height / (nature.MolarGasConstant * temperature))))
		if i == wanted {
			one = n
		}
		number += n
		weight += float64(n * m)
	}
	return one, number, weight
}

// separationLaws are those of gases that no wind mixes.
var separationLaws = []*law.Law{
	{
		Name: "diffusive_separation", Group: group, Gives: "the mole fraction of one gas at a height where each gas stands on its own scale height",
		Parameters: append(separationParameters(), law.Parameter{Name: "gas", Meaning: "which gas of the lists, counted from 1", Unit: "1", Finite: law.AtLeast(1), Default: "1"}),
		Result:     law.Result{Unit: "1"},
		Equation:   "x_j = n_j/sum(n_i), n_i = n_i,0 exp(-M_i g h/(R T)); n_i,0 base_densities", Source: separationSource, Caution: separationCaution,
		Refusal:  "there is no gas of that number, all densities are 0, or one is larger than a number can hold",
		Examples: []law.Example{{Formula: "diffusive_separation([3, 1], [28, 16][g/mol], 0[km], 1000[K])", Gives: "0.75"}},
		Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
			n := len(arguments[0].Items)
			for i := range dst {
				wanted := arguments[5].At(i)
				if k := int(wanted); n == len(arguments[1].Items) && wanted >= 1 && wanted <= float64(n) && float64(k) == wanted {
					one, number, _ := separated(arguments, i, k-1)
					dst[i] = one / number
				} else {
					dst[i] = notANumber
				}
			}
		},
	},
	{
		Name: "separated_molar_mass", Group: group, Gives: "the mean molar mass at a height where each gas stands on its own scale height",
		Parameters: separationParameters(), Result: law.Result{Unit: "g/mol"},
		Equation: "M = sum(n_i M_i)/sum(n_i), n_i = n_i,0 exp(-M_i g h/(R T)); n_i,0 base_densities", Source: separationSource, Caution: separationCaution,
		Refusal:  "the lists differ in length, all densities are 0, or one is larger than a number can hold",
		Examples: []law.Example{{Formula: "separated_molar_mass([1, 1], [28, 16][g/mol], 0[km], 1000[K])", Gives: "22 g/mol"}},
		Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
			for i := range dst {
				if n := len(arguments[0].Items); n == 0 || n != len(arguments[1].Items) {
					dst[i] = notANumber
					continue
				}
				_, number, weight := separated(arguments, i, -1)
				dst[i] = weight / number
			}
		},
	},
}

func separationParameters() []law.Parameter {
	return []law.Parameter{
		{Name: "base_densities", Meaning: "number density of each gas at the base level, or its mole fraction", Type: law.List, Unit: "1", Finite: law.AtLeast(0), Accepts: []law.Conversion{{Unit: "m^-3", Factor: 1}}},
		{Name: "molar_masses", Meaning: "molar mass of each gas, in the same order", Type: law.List, Unit: "g/mol", Finite: law.Above(0)},
		heightOfColumn(),
		temperatureOfColumn("temperature", "temperature of the column, the same at every height"), gravityOfColumn(),
	}
}

const (
	separationSource  = "Dalton J. (1802) Mem. Lit. Phil. Soc. Manchester 5, 535; Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., section 1.3.3; U.S. Standard Atmosphere, 1976, equation 36 without mixing, thermal diffusion and flow"
	separationCaution = "Above the turbopause only, at 100 km to 110 km on Earth: wind mixes the air below. One temperature and gravity over the height."
)
