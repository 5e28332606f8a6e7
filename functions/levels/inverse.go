package levels

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Inverse problems are solved for ln(1/(k_B T)), in which the sums are smooth
// from a microkelvin to 1e13 K.
const (
	coldest = 1e-6 // K
	hottest = 1e13 // K
)

// lnBeta gives ln(1/(k_B T)), 1/(k_B T) in 1/J.
func lnBeta(temperature float64) float64 {
	return -column.Ln(float64(nature.BoltzmannConstant * temperature))
}

// temperatureAt gives T from ln(1/(k_B T)).
func temperatureAt(ln float64) float64 {
	return column.Exp(-ln) / nature.BoltzmannConstant
}

// bracketAround widens a bracket from a start until f changes its sign, in
// steps that grow: few levels are built far from where the answer lies.
func bracketAround(f func(float64) float64, start, low, high float64) (a, b float64, ok bool) {
	at := min(max(start, low), high)
	value := f(at)
	if value != value {
		return 0, 0, false
	}
	step := 0.5
	// f falls with its argument where it is above 0: walk up, else down.
	for {
		next := at + step
		if value < 0 {
			next = at - step
		}
		next = min(max(next, low), high)
		if next == at {
			return 0, 0, false
		}
		following := f(next)
		if following != following {
			return 0, 0, false
		}
		if following == 0 || following > 0 != (value > 0) {
			return at, next, true
		}
		at, value = next, following
		step *= 2
	}
}

var temperatureFromRatioLaw = &law.Law{
	Name:  "temperature_from_ratio",
	Group: group,
	Gives: "the temperature at which an upper level holds a given number for one in a lower level; negative where the upper one is overfilled",
	Parameters: []law.Parameter{
		energyParameter("energy of the upper level above the lower one"),
		degeneracyParameter("upper_degeneracy", "states of the upper level"),
		degeneracyParameter("lower_degeneracy", "states of the lower level"),
		{Name: "ratio", Meaning: "how many are in the upper level for one in the lower", Unit: "1", Finite: law.Above(0)},
	},
	Result:   law.Result{Unit: "K"},
	Equation: "T = E/(k_B ln(g_u/(g_l r)))",
	Source:   boltzmannSource + "; negative temperatures: Purcell E.M., Pound R.V. (1951) Phys. Rev. 81, 279",
	Caution:  "A negative temperature tells a population inversion: hotter than any positive one, not colder. Two levels alone do not show whether the others are in equilibrium.",
	Refusal:  "the ratio is that of the degeneracies, which no finite temperature gives",
	Examples: []law.Example{
		{Formula: "temperature_from_ratio(300[K], 1, 1, exp(-1))", Gives: "300.000 K"},
		{Formula: "temperature_from_ratio(300[K], 1, 1, exp(1))", Gives: "-300.000 K"},
	},
	Body: law.Of4(temperatureFromRatio),
}

func temperatureFromRatio(energy, upper, lower, ratio float64) float64 {
	if !(ratio > 0) {
		return notANumber
	}
	ln := column.Ln(positive(upper) / float64(positive(lower)*ratio))
	if ln == 0 {
		return notANumber
	}
	return energy / float64(nature.BoltzmannConstant*ln)
}

var temperatureFromMeanEnergyLaw = &law.Law{
	Name:  "temperature_from_mean_energy",
	Group: group,
	Gives: "the temperature at which a ladder has a given mean energy; negative where its upper levels are overfilled",
	Parameters: []law.Parameter{
		ladderParameter(),
		{Name: "energy", Meaning: "mean energy per mole, from the zero from which the ladder's energies are counted; or per molecule in J, eV, cm^-1 or K", Unit: "J/mol",
			Accepts: []law.Conversion{
				{Unit: "J", Factor: nature.AvogadroConstant},
				{Unit: "cm^-1", Factor: nature.AvogadroConstant * nature.PlanckConstant * nature.SpeedOfLight},
				{Unit: "K", Factor: nature.MolarGasConstant},
			}},
	},
	Result:   law.Result{Unit: "K"},
	Equation: "mean_energy(ladder, T) = U, solved for T",
	Source:   sumsSource + "; negative temperatures: Ramsey N.F. (1956) Phys. Rev. 103, 20",
	Caution:  "A negative temperature tells a population inversion, which only a ladder with a highest level can have: more energy than at any positive temperature.",
	Refusal:  "no temperature gives this energy: it is not above the lowest level, not below the highest, or just that of equally filled states",
	Examples: []law.Example{
		{Formula: "temperature_from_mean_energy(oscillator(1[K]), 4.83882[J/mol])", Gives: "1.00000 K"},
	},
	Body: temperatureFromMeanEnergy,
}

func temperatureFromMeanEnergy(dst []float64, arguments []law.Argument, work *law.Work) {
	s, ok := work.Keep.(*scratch)
	if !ok {
		s = &scratch{}
		work.Keep = s
	}
	for i := range dst {
		dst[i] = s.temperatureOfMean(&arguments[0], i, arguments[1].At(i)/nature.AvogadroConstant)
	}
}

// temperatureOfMean solves for one row; energy in J a molecule.
func (s *scratch) temperatureOfMean(ladder *law.Argument, row int, energy float64) float64 {
	_, lowest := s.sumRow(ladder, row, 1/float64(nature.BoltzmannConstant), logarithm)
	excess := energy - lowest
	if !(excess > 0) || !column.Finite(excess) {
		return notANumber
	}
	// Solved for u = ln(excess/(k_B T)), which is small where the answer is any
	// classical mode's, so that it keeps its digits.
	ln := column.Ln(excess)
	f := func(u float64) float64 {
		mean, _ := s.sumRow(ladder, row, column.Exp(u)/excess, meanLevel)
		if mean == 0 {
			return -1e3
		}
		return column.Ln(mean) - u
	}
	low, high := lnBeta(hottest)+ln, lnBeta(coldest)+ln
	if a, b, found := bracketAround(f, 0, low, high); found {
		if u, solved := column.BracketedRoot(f, a, b); solved {
			return float64(excess*column.Exp(-u)) / nature.BoltzmannConstant
		}
		return notANumber
	}
	// At negative temperature the mean rises with ln(excess/(k_B |T|)).
	g := func(u float64) float64 {
		mean, _ := s.sumRow(ladder, row, -column.Exp(u)/excess, meanLevel)
		if !(mean < 0) {
			return notANumber
		}
		return u - column.Ln(-mean)
	}
	if a, b, found := bracketAround(g, 0, low, high); found {
		if u, solved := column.BracketedRoot(g, a, b); solved {
			return -float64(excess*column.Exp(-u)) / nature.BoltzmannConstant
		}
	}
	return notANumber
}

var temperatureFromOccupancyLaw = &law.Law{
	Name:  "temperature_from_occupancy",
	Group: group,
	Gives: "the temperature at which a level of a ladder holds a given share",
	Parameters: []law.Parameter{
		ladderParameter(),
		{Name: "n", Meaning: "which level, counted as occupancy counts", Unit: "1", Finite: law.AtLeast(0)},
		{Name: "share", Meaning: "its share among all", Unit: "1", Finite: law.Between(0, 1)},
		{Name: "side", Meaning: "an excited level fills as it warms and empties again: the colder or the hotter of the two temperatures", Type: law.Text, Default: `"cold"`, Choices: []string{"cold", "hot"}},
	},
	Result:   law.Result{Unit: "K"},
	Equation: "occupancy(ladder, n, T) = share, solved for T; the share is greatest where the mean energy is that of the level",
	Source:   boltzmannSource,
	Refusal:  "no positive temperature gives this share: the level never holds so much, or never so little; or the ladder is a joined one",
	Examples: []law.Example{
		{Formula: "temperature_from_occupancy(ladder([0, 300][K], [1, 1]), 1, 0.2689414213700)", Gives: "300.00000000 K"},
	},
	Body: temperatureFromOccupancy,
}

func temperatureFromOccupancy(dst []float64, arguments []law.Argument, work *law.Work) {
	s, ok := work.Keep.(*scratch)
	if !ok {
		s = &scratch{}
		work.Keep = s
	}
	hot := arguments[3].Text == "hot"
	for i := range dst {
		dst[i] = s.temperatureOfShare(soleMode(&arguments[0]), i, arguments[1].At(i), arguments[2].At(i), hot)
	}
}

// levelOf gives height above the lowest level (in J) and states of level n of a
// mode.
func (s *scratch) levelOf(mode *law.Argument, row int, n float64) (height, states float64, ok bool) {
	switch {
	case !wholeNumber(n):
		return 0, 0, false
	case mode.Maker == oscillatorLaw:
		return float64(n * mode.Items[0].At(row)), 1, true
	case isStiffRotor(mode):
		return rotation(n, mode.Items[0].At(row), 0), (float64(2*n) + 1) / mode.Items[1].At(row), true
	}
	// As far up as the level lies: levels within reach of ever more heat.
	for temperature := 1.0; temperature <= hottest; temperature *= 10 {
		set := s.setOf(mode, row, 1/float64(nature.BoltzmannConstant*temperature))
		if set == nil {
			return 0, 0, false
		}
		if n >= float64(len(set.energy)) {
			if !set.truncated {
				return 0, 0, false
			}
			continue
		}
		k := int(n)
		if mode.Maker != ladderLaw {
			set.sort()
			k = set.order[k]
			if set.truncated && set.energy[k] > set.span {
				continue // beyond the ceiling some levels are missing
			}
		}
		return set.energy[k], set.weight[k], true
	}
	return 0, 0, false
}

func (s *scratch) temperatureOfShare(mode *law.Argument, row int, n, share float64, hot bool) float64 {
	if mode == nil || !(share > 0 && share < 1) {
		return notANumber
	}
	height, states, ok := s.levelOf(mode, row, n)
	if !ok {
		return notANumber
	}
	ln := column.Ln(share / states)
	f := func(at float64) float64 {
		beta := column.Exp(at)
		sum, _ := s.sumRow(mode, row, beta, logarithm)
		return -float64(height*beta) - sum - ln
	}
	low, high := lnBeta(hottest), lnBeta(coldest)
	if height == 0 {
		// The lowest level only empties with warmth: f rises with ln beta.
		g := func(at float64) float64 { return -f(at) }
		return solveAt(g, lnBeta(300), low, high)
	}
	// The share is greatest where the mean height is the level's.
	peak := s.temperatureOfMeanHeight(mode, row, height)
	top := low
	if peak > 0 {
		top = lnBeta(peak)
	} else if hot {
		return notANumber // it fills up to the greatest heat
	}
	if hot {
		g := func(at float64) float64 { return -f(at) }
		if !(g(top) <= 0) {
			return notANumber
		}
		return solveAt(g, top-0.5, low, top)
	}
	if !(f(top) >= 0) {
		return notANumber
	}
	start := min(high, max(top, -column.Ln(height)))
	return solveAt(f, start, top, high)
}

func (s *scratch) temperatureOfMeanHeight(mode *law.Argument, row int, height float64) float64 {
	_, lowest := s.sumRow(mode, row, 1/float64(nature.BoltzmannConstant), logarithm)
	return s.temperatureOfMean(mode, row, lowest+height)
}

// solveAt solves f = 0, f falling, and gives the temperature.
func solveAt(f func(float64) float64, start, low, high float64) float64 {
	a, b, found := bracketAround(f, start, low, high)
	if !found {
		return notANumber
	}
	at, solved := column.BracketedRoot(f, a, b)
	if !solved {
		return notANumber
	}
	return temperatureAt(at)
}
