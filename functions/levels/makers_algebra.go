package levels

import (
	"strings"

	"plumbrule/engine/law"
)

// builderOf gives what works out the levels of a maker's ladder one by one;
// nil for makers that join ladders.
func builderOf(maker *law.Law) builder {
	switch maker {
	case ladderLaw:
		return buildListed
	case oscillatorLaw:
		return buildOscillator
	case rotorLaw:
		return buildRotor
	case anharmonicOscillatorLaw:
		return buildAnharmonic
	case morseLaw:
		return buildMorse
	case boxLevelsLaw:
		return buildBox
	case hydrogenLikeLaw:
		return buildHydrogenLike
	case spinRotorLaw:
		return buildSpinRotor
	case symmetricTopLaw:
		return buildSymmetricTop
	case asymmetricTopLaw:
		return buildAsymmetricTop
	case hinderedRotorLaw:
		return buildHinderedRotor
	case vibratingRotorLaw:
		return buildVibratingRotor
	case spinLevelsLaw:
		return buildSpinLevels
	case nuclearSpinLevelsLaw:
		return buildNuclearSpinLevels
	case atomLaw:
		return buildAtom
	case moleculeLaw:
		return buildMolecule
	}
	return nil
}

// closedForm gives a quantity of a mode that needs no levels: warm tops and
// boxes, whose sums are known in closed form.
func closedForm(mode *law.Argument, row int, beta float64, want quantity) (value float64, ok bool) {
	switch {
	case mode.Maker == oscillatorLaw && len(mode.Items) == 1:
		return oscillatorQuantity(mode.Items[0].At(row)*beta, want), true
	case mode.Maker == rotorLaw && (len(mode.Items) == 2 || len(mode.Items) == 3 && mode.Items[2].At(row) == 0):
		return rotorQuantity(mode.Items[0].At(row)*beta, mode.Items[1].At(row), want), true
	case mode.Maker == symmetricTopLaw && len(mode.Items) == 3:
		return warmTop(mode.Items[0].At(row)*beta, mode.Items[1].At(row)*beta, mode.Items[2].At(row), want)
	case mode.Maker == boxLevelsLaw && len(mode.Items) == 2:
		return roomyBox(boxUnit(mode.Items[0].At(row), mode.Items[1].At(row))*beta, want)
	case mode.Maker == moleculeLaw && len(mode.Items) >= 3:
		if p := polyatomicOf(mode.Items[0].Text); p != nil && beta > 0 {
			return p.quantity(beta, want), true
		}
	}
	return 0, false
}

// isStiffRotor says whether a mode is a rotor without stretching in any row.
func isStiffRotor(mode *law.Argument) bool {
	if mode.Maker != rotorLaw {
		return false
	}
	return len(mode.Items) == 2 || len(mode.Items) == 3 && len(mode.Items[2].Values) == 1 && mode.Items[2].Values[0] == 0
}

// buildListed takes the levels of a list in the order given, each a run of its
// own unless it lies above the one before.
func buildListed(set *levelSet, items []law.Argument, numbers []float64) bool {
	n := len(items[0].Items)
	if n == 0 || len(items) < 2 || n != len(items[1].Items) || len(numbers) < 2*n {
		return false
	}
	for i, energy := range numbers[:n] {
		if i > 0 && energy < numbers[i-1] {
			set.endRun()
		}
		if !set.add(energy, numbers[n+i]) {
			return false
		}
	}
	return true
}

// buildOscillator takes v = 0, 1, 2, ... up to the ceiling.
func buildOscillator(set *levelSet, _ []law.Argument, numbers []float64) bool {
	spacing := numbers[0]
	if !(spacing > 0) {
		return false
	}
	for v := 0.0; ; v++ {
		energy := float64(v * spacing)
		if energy > set.ceiling(spacing) {
			set.truncated = true
			return true
		}
		if !set.add(energy, 1) {
			return false
		}
	}
}

// checkLabels says what is wrong with the labels of a list.
func checkLabels(text string) string {
	if text == "" {
		return ""
	}
	parts := strings.Split(text, ",")
	if len(parts) > 1000 {
		return "at most 1000 labels"
	}
	for i, part := range parts {
		part = strings.TrimSpace(part)
		if part == "" {
			return "a label is empty: labels are parted by single commas"
		}
		for _, other := range parts[:i] {
			if strings.TrimSpace(other) == part {
				return "the label \"" + part + "\" stands twice"
			}
		}
	}
	return ""
}

// labelled gives the place of a label in the labels of a list, -1 for none.
func labelled(labels, label string) int {
	for i := 0; ; i++ {
		part, rest, more := strings.Cut(labels, ",")
		if strings.TrimSpace(part) == strings.TrimSpace(label) && label != "" {
			return i
		}
		if !more {
			return -1
		}
		labels = rest
	}
}

var repeatModeLaw = &law.Law{
	Name:  "repeat_mode",
	Group: group,
	Gives: "the ladder of n equal independent modes",
	Parameters: []law.Parameter{
		{Name: "ladder", Meaning: "one of the modes", Type: law.Made, Made: madeLadder},
		{Name: "n", Meaning: "how many: 2 for a doubly degenerate vibration", Unit: "1", Finite: law.Within(0, 1e9)},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "Q = Q_1^n; energy, heat capacity and entropy n times those of one mode",
	Source:   "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 5",
	Caution:  "Distinguishable modes, such as vibrations of one molecule or atoms of a crystal; the molecules of a gas need 1/n! besides.",
	Examples: []law.Example{
		{Formula: "partition_sum(repeat_mode(ladder([0, 0][J], [1, 1]), 3), 300[K])", Gives: "8"},
	},
}

var shiftLaw = &law.Law{
	Name:  "shift",
	Group: group,
	Gives: "a ladder with all its energies moved by the same amount",
	Parameters: []law.Parameter{
		{Name: "ladder", Meaning: "the ladder", Type: law.Made, Made: madeLadder},
		{Name: "energy", Meaning: "what is added to every level, " + asLevelEnergy, Unit: "J", Accepts: levelEnergies()},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_i + E; Q is multiplied by exp(-E/(k_B T)), occupancies and entropy stay",
	Source:   "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 3",
	Examples: []law.Example{
		{Formula: "partition_sum(shift(ladder([0][J], [1]), 300[K]), 300[K])", Gives: "0.367879441"},
	},
}
