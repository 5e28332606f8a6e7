package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

func word(text string) law.Argument { return law.Argument{Text: text} }

// wavenumbers turns cm^-1 into J.
func wavenumbers(x float64) law.Argument { return number(x * perCentimetre) }

// carbonMonoxide is CO's ground state, constants of Huber and Herzberg.
func carbonMonoxide() law.Argument {
	return made(vibratingRotorLaw, wavenumbers(2169.7559), wavenumbers(13.28803), wavenumbers(1.9316023), wavenumbers(0.01750513),
		wavenumbers(6.12147e-6), wavenumbers(0.0104109), number(0), number(0), number(11.117*electronvolt), number(1), number(1))
}

// ladders are one of each maker whose levels are worked out one by one.
func ladders() map[string]law.Argument {
	return map[string]law.Argument{
		"anharmonic":    made(anharmonicOscillatorLaw, wavenumbers(214.5), wavenumbers(0.61), number(0), wavenumbers(12400)),
		"morse":         made(morseLaw, wavenumbers(12500), wavenumbers(214.5)),
		"hydrogen":      made(hydrogenLikeLaw, number(1), number(20), number(1)),
		"spin rotor":    made(spinRotorLaw, wavenumbers(59.3), number(0.5), word("all"), wavenumbers(0.046)),
		"CO":            carbonMonoxide(),
		"spin":          made(spinLevelsLaw, number(2), number(2.5), number(3)),
		"nuclear spin":  made(nuclearSpinLevelsLaw, word("23Na"), number(9.4)),
		"iron":          made(atomLaw, word("Fe I"), word("all")),
		"oxygen":        made(moleculeLaw, word("O2"), word("all"), word("alternating")),
		"hydroxyl":      made(moleculeLaw, word("OH"), word("all"), word("average")),
		"listed":        ladderOf(kelvin(40, 5, 300), []float64{2, 1, 7}),
		"stretched":     made(rotorLaw, wavenumbers(1.93), number(2), wavenumbers(6e-6)),
		"small box":     made(boxLevelsLaw, number(9.1e-31), number(1e-9)),
		"cold prolate":  made(symmetricTopLaw, wavenumbers(5.2), wavenumbers(0.85), number(3)),
		"cold oblate":   made(symmetricTopLaw, wavenumbers(6.2), wavenumbers(9.9), number(3)),
		"water":         made(asymmetricTopLaw, wavenumbers(27.877), wavenumbers(14.512), wavenumbers(9.285), number(2)),
		"methyl group":  made(hinderedRotorLaw, wavenumbers(1000), number(3), wavenumbers(10), number(1)),
		"free rotation": made(hinderedRotorLaw, number(0), number(2), wavenumbers(10), number(1)),
	}
}

// plainSum adds all levels of a set up at one temperature, in no clever way.
func plainSum(set *levelSet, beta float64) (sum, mean, spread float64) {
	var q, m, v total
	for i, e := range set.energy {
		x := e * beta
		w := set.weight[i] * math.Exp(-x)
		q.add(w)
		m.add(w * x)
	}
	sum = q.value()
	mean = m.value() / sum
	for i, e := range set.energy {
		d := e*beta - mean
		v.add(set.weight[i] * math.Exp(-e*beta) * d * d)
	}
	return sum, mean, v.value() / sum
}

// What is left out beyond the reach does not show, and the shares of all levels
// add up to one.
func TestSetsAgainstAllTheirLevels(t *testing.T) {
	for name, ladder := range ladders() {
		for _, temperature := range []float64{5, 40, 300, 1500} {
			beta := inverseOf(temperature)
			var wide, set levelSet
			build := builderOf(ladder.Maker)
			if !wide.prepare(build, ladder.Items, 0, beta/3) || !set.prepare(build, ladder.Items, 0, beta) {
				t.Errorf("%s has no levels at %v K", name, temperature)
				continue
			}
			sum, mean, spread := plainSum(&wide, beta)
			closeTo(t, name+": sum", set.quantity(beta, partition), sum, 1e-14)
			closeTo(t, name+": mean", set.quantity(beta, meanLevel), mean, 1e-13)
			closeTo(t, name+": variance", set.quantity(beta, variance), spread, 1e-12)
			if entropy := set.quantity(beta, entropic); math.Abs(entropy-math.Log(sum)-mean) > 1e-13*math.Max(1, entropy) {
				t.Errorf("%s: entropy %v, want %v", name, entropy, math.Log(sum)+mean)
			}
			var shares total
			for k := range set.energy {
				shares.add(set.shareOf(k, beta))
			}
			closeTo(t, name+": shares", shares.value(), 1, 4e-15)
		}
	}
}

// Laws of tops, boxes and rotors that are summed in closed form when warm agree
// with their levels at the border.
func TestClosedFormsMeetTheirLevels(t *testing.T) {
	modes := []law.Argument{
		made(symmetricTopLaw, wavenumbers(5.2), wavenumbers(0.85), number(3)),
		made(symmetricTopLaw, wavenumbers(6.2), wavenumbers(9.9), number(3)),
		made(symmetricTopLaw, wavenumbers(5.24), wavenumbers(5.24), number(12)),
		made(boxLevelsLaw, number(6.6e-27), number(2e-9)),
		made(rotorLaw, wavenumbers(0.4), number(2), number(0)),
		oscillatorOf(300 * perCentimetre),
	}
	for i := range modes {
		m := &modes[i]
		constant := m.Items[0].Values[0]
		if m.Maker == symmetricTopLaw {
			constant = m.Items[1].Values[0]
		}
		if m.Maker == boxLevelsLaw {
			constant = boxUnit(m.Items[0].Values[0], m.Items[1].Values[0])
		}
		beta := 0.009 / constant
		for want := partition; want < quantities; want++ {
			closed, ok := closedForm(m, 0, beta, want)
			var set levelSet
			if !ok || !set.prepare(builderOf(m.Maker), m.Items, 0, beta) {
				t.Fatalf("%s: no closed form or no levels", m.Maker.Name)
			}
			closeTo(t, m.Maker.Name, closed, set.quantity(beta, want), 1e-13)
		}
	}
}

// From a millikelvin to 1e8 K every ladder that ends has its sums, and in the
// cold all is in the lowest level.
func TestEverySetColdAndHot(t *testing.T) {
	for name, ladder := range ladders() {
		for temperature := 1e-3; temperature < 1.1e8; temperature *= 10 {
			if name == "water" && temperature > 2e3 {
				break // it takes long to find that there are too many
			}
			sum := one(partitionSumLaw, ladder, number(temperature))
			ln := one(logPartitionSumLaw, ladder, number(temperature))
			entropy := one(entropyLaw, ladder, number(temperature))
			if sum != sum {
				if name == "water" && temperature > 1e4 {
					continue // more than a million levels, or a matrix too large
				}
				t.Errorf("%s at %v K: no sum", name, temperature)
				continue
			}
			if math.Abs(ln) < 600 && math.Abs(math.Log(sum)-ln) > 1e-12*math.Max(1, math.Abs(ln)) {
				t.Errorf("%s at %v K: ln of the sum %v, the logarithm %v", name, temperature, math.Log(sum), ln)
			}
			if !(entropy >= -20) {
				t.Errorf("%s at %v K: entropy %v", name, temperature, entropy)
			}
		}
		if cold := one(energySpreadLaw, ladder, number(1e-4)); !(cold < 1e-40) && name != "nuclear spin" && name != "methyl group" {
			t.Errorf("%s: energy spreads %v J at 0.1 mK", name, cold)
		}
	}
}

// A row gives the same bits alone, in a column, and after other rows, whether
// the temperature or a constant moves.
func TestSetsDoNotDependOnNeighbours(t *testing.T) {
	const rows = 23
	temperature := make([]float64, rows)
	for i := range temperature {
		temperature[i] = 20 + 400*float64((i*7)%rows)
	}
	for name, ladder := range ladders() {
		for _, l := range []*law.Law{partitionSumLaw, meanEnergyLaw, heatCapacityLaw, freeEnergyLaw, mostPopulatedLaw} {
			if name == "iron" && l == mostPopulatedLaw {
				continue
			}
			for i, got := range run(l, rows, ladder, number(temperature...)) {
				if want := one(l, ladder, number(temperature[i])); got != want && (got == got || want == want) {
					t.Fatalf("%s of %s in row %d: %v, alone %v", l.Name, name, i, got, want)
				}
			}
		}
		if len(ladder.Items[0].Values) != 1 || ladder.Maker == hydrogenLikeLaw {
			continue
		}
		moving := make([]float64, rows)
		for i := range moving {
			moving[i] = ladder.Items[0].Values[0] * (1 + 0.01*float64(i/2))
		}
		column := ladder
		column.Items = append([]law.Argument{number(moving...)}, ladder.Items[1:]...)
		for i, got := range run(partitionSumLaw, rows, column, number(300)) {
			single := ladder
			single.Items = append([]law.Argument{number(moving[i])}, ladder.Items[1:]...)
			if want := one(partitionSumLaw, single, number(300)); got != want {
				t.Fatalf("%s in row %d with a moving constant: %v, alone %v", name, i, got, want)
			}
		}
	}
}

func TestNothingIsAllocatedForABlockOfSets(t *testing.T) {
	temperature := make([]float64, 32)
	field := make([]float64, 32)
	for i := range temperature {
		temperature[i], field[i] = 200+float64(i), 1+float64(i)
	}
	dst := make([]float64, len(temperature))
	modes := ladders()
	modes["moving field"] = made(spinLevelsLaw, number(2), number(2.5), number(field...))
	modes["joined"] = made(combineLaw, made(repeatModeLaw, oscillatorOf(kelvin(900)[0]), number(2)), made(shiftLaw, carbonMonoxide(), number(1e-21)))
	for name, mode := range modes {
		for _, l := range []*law.Law{partitionSumLaw, heatCapacityLaw, logPartitionSumLaw} {
			var work law.Work
			arguments := []law.Argument{mode, number(temperature...)}
			l.Body(dst, arguments, &work)
			if n := testing.AllocsPerRun(3, func() { l.Body(dst, arguments, &work) }); n > 0 {
				t.Errorf("%s of %s: %v allocations for a block", l.Name, name, n)
			}
		}
	}
}

func TestRepeatedAndShiftedModes(t *testing.T) {
	mode, three := ladderOf(kelvin(7, -5, 30), []float64{1, 2, 5}), number(3)
	repeated := made(repeatModeLaw, mode, three)
	byHand := made(combineLaw, mode, made(combineLaw, mode, mode))
	shifted := made(shiftLaw, mode, number(kelvin(20)[0]))
	for _, temperature := range []float64{3, 50} {
		at := number(temperature)
		for _, l := range []*law.Law{partitionSumLaw, logPartitionSumLaw, meanEnergyLaw, heatCapacityLaw, entropyLaw, freeEnergyLaw} {
			closeTo(t, l.Name, one(l, repeated, at), one(l, byHand, at), 1e-14)
		}
		closeTo(t, "shifted sum", one(partitionSumLaw, shifted, at), one(partitionSumLaw, mode, at)*math.Exp(-20/temperature), 1e-14)
		closeTo(t, "shifted energy", one(meanEnergyLaw, shifted, at), one(meanEnergyLaw, mode, at)+20*nature.MolarGasConstant, 1e-13)
		closeTo(t, "shifted share", one(occupancyLaw, shifted, number(2), at), one(occupancyLaw, mode, number(2), at), 0)
		// F = U - T S
		closeTo(t, "free energy", one(freeEnergyLaw, repeated, at), one(meanEnergyLaw, repeated, at)-temperature*one(entropyLaw, repeated, at), 1e-12)
	}
	if got := one(partitionSumLaw, made(repeatModeLaw, mode, number(1.5)), number(300)); got == got {
		t.Errorf("one and a half modes have a sum: %v", got)
	}
}

func TestLabels(t *testing.T) {
	named := made(ladderLaw, list(kelvin(0, 228, 326)...), list(5, 3, 1), word("3P2, 3P1, 3P0"))
	co := carbonMonoxide()
	cases := []struct {
		ladder law.Argument
		label  string
		energy float64 // J, counted from the lowest level
		states float64
	}{
		{named, "3P1", kelvin(228)[0], 3},
		{oscillatorOf(kelvin(300)[0]), "v=2", kelvin(600)[0], 1},
		{rotorOf(kelvin(3)[0], 1), "J=4", kelvin(60)[0], 9},
		{co, "v=0 J=7", (1.92285*56 - 6.12e-6*3136) * perCentimetre, 15},
		{made(symmetricTopLaw, number(kelvin(9)[0]), number(kelvin(2)[0]), number(1)), "J=2 K=1", kelvin(19)[0], 10},
		{made(hydrogenLikeLaw, number(1), number(9), number(1)), "n=2", 0.75 * nature.HartreeEnergy / 2, 8},
		{made(spinLevelsLaw, number(2), number(0.5), number(5)), "m=1/2", 10 * nature.BohrMagneton, 1},
		{made(nuclearSpinLevelsLaw, word("1H"), number(5)), "m=1/2", 0, 1},
		{made(spinRotorLaw, number(kelvin(80)[0]), number(0.5), word("ortho"), number(0)), "J=1", 0, 9},
	}
	for _, c := range cases {
		for _, temperature := range []float64{30, 400} {
			got := one(occupancyOfLaw, c.ladder, word(c.label), number(temperature))
			lowest := one(meanEnergyLaw, c.ladder, number(1e-4)) / nature.AvogadroConstant
			q := one(partitionSumLaw, c.ladder, number(temperature)) * math.Exp(lowest*inverseOf(temperature))
			closeTo(t, c.label, got, c.states*math.Exp(-c.energy*inverseOf(temperature))/q, 2e-4)
		}
	}
	for _, label := range []string{"3P9", "J=1", "v=0", "v=-1 J=0", "v=0 J=1.5", "v=0 J=9999", "nonsense", "m=3/4"} {
		if got := one(occupancyOfLaw, co, word(label), number(300)); got == got {
			t.Errorf("CO has a level %q: %v", label, got)
		}
	}
	if checkLabels("a, b, a") == "" || checkLabels("a,,b") == "" || checkLabels("a, b") != "" {
		t.Error("labels are not checked")
	}
}

// A ladder without end or with too many levels is refused, not waited for.
func TestTooManyLevels(t *testing.T) {
	for _, c := range []law.Argument{
		made(spinRotorLaw, number(kelvin(1e-9)[0]), number(0.5), word("all"), number(0)),
		made(asymmetricTopLaw, number(kelvin(3e-6)[0]), number(kelvin(2e-6)[0]), number(kelvin(1e-6)[0]), number(1)),
		made(hinderedRotorLaw, number(kelvin(1e9)[0]), number(3), number(kelvin(1e-6)[0]), number(1)),
		made(anharmonicOscillatorLaw, number(kelvin(1e-6)[0]), number(0), number(0), number(0)),
	} {
		if got := one(partitionSumLaw, c, number(300)); got == got {
			t.Errorf("%s: %v", c.Maker.Name, got)
		}
	}
}
