package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// number, list and the makers below build arguments as a plan does.
func number(values ...float64) law.Argument { return law.Argument{Values: values} }

func list(values ...float64) law.Argument {
	items := make([]law.Argument, len(values))
	for i, x := range values {
		items[i] = number(x)
	}
	return law.Argument{Items: items}
}

func made(maker *law.Law, arguments ...law.Argument) law.Argument {
	return law.Argument{Maker: maker, Items: arguments}
}

// kelvin turns energies told in K into J.
func kelvin(values ...float64) []float64 {
	energies := make([]float64, len(values))
	for i, x := range values {
		energies[i] = x * nature.BoltzmannConstant
	}
	return energies
}

func ladderOf(energies, degeneracies []float64) law.Argument {
	return made(ladderLaw, list(energies...), list(degeneracies...))
}

func oscillatorOf(energy ...float64) law.Argument { return made(oscillatorLaw, number(energy...)) }

func rotorOf(constant, symmetry float64) law.Argument {
	return made(rotorLaw, number(constant), number(symmetry))
}

// run gives a law's rows.
func run(l *law.Law, rows int, arguments ...law.Argument) []float64 {
	dst := make([]float64, rows)
	l.Body(dst, arguments, &law.Work{})
	return dst
}

func one(l *law.Law, arguments ...law.Argument) float64 { return run(l, 1, arguments...)[0] }

func closeTo(t *testing.T, what string, got, want, relative float64) {
	t.Helper()
	if !(math.Abs(got-want) <= relative*math.Abs(want)) {
		t.Errorf("%s: %v, want %v to %g", what, got, want, relative)
	}
}

func within(t *testing.T, what string, got, want, half float64, source string) {
	t.Helper()
	if !(math.Abs(got-want) <= half) {
		t.Errorf("%s: %v, want %v ± %g (%s)", what, got, want, half, source)
	}
}

func TestEveryLawIsComplete(t *testing.T) {
	if _, err := law.NewCatalogue(Laws(), nil); err != nil {
		t.Fatal(err)
	}
	for _, l := range Laws() {
		maker := l.Result.Type == law.Made
		switch {
		case l.Group != group, l.Equation == "", l.Source == "", l.Gives == "", len(l.Examples) == 0:
			t.Errorf("%s: something is missing", l.Name)
		case (l.Result.Type == law.Number) != (l.Body != nil), maker != (l.Result.Made == madeLadder), !maker && l.Result.Unit == "":
			t.Errorf("%s: body and result do not fit", l.Name)
		}
		for _, p := range l.Parameters {
			if p.Name == "" || p.Meaning == "" || (p.Type == law.Made || p.Type == law.Text) != (p.Unit == "") {
				t.Errorf("%s: parameter %q is incomplete", l.Name, p.Name)
			}
		}
	}
}

const (
	perCentimetre = nature.PlanckConstant * nature.SpeedOfLight * 100 // J of 1 cm^-1
	electronvolt  = nature.ElementaryCharge                           // J
)

func TestPublishedPopulations(t *testing.T) {
	const (
		ebdon  = "Ebdon et al. (1998) An Introduction to Analytical Atomic Spectrometry, table 4.1"
		irodov = "Irodov, Problems in General Physics, 6.126"
		atkins = "Atkins, de Paula, Physical Chemistry, example on I2 at 25 C"
		para   = "equilibrium hydrogen from Dabrowski's term values, weights 1 and 3"
	)
	ratio := func(energy, upper, lower, temperature float64) float64 {
		return one(populationRatioLaw, number(energy), number(upper), number(lower), number(temperature))
	}
	within(t, "Cs 5000 K", ratio(2.34e-19, 2, 1, 5000*1.381e-23/nature.BoltzmannConstant), 6.75e-2, 5e-5, ebdon)
	within(t, "Ca 2000 K", ratio(4.66e-19, 3, 1, 2000*1.3806e-23/nature.BoltzmannConstant), 1.40e-7, 5e-10, ebdon)
	within(t, "Na 2400 K", ratio(nature.PlanckConstant*nature.SpeedOfLight/589e-9, 3, 1, 2400), 1.14e-4, 5e-7, irodov)
	within(t, "H 8000 K", ratio(10.2*electronvolt, 4, 1, 8000), 1.5009e-6, 5e-11, "Boltzmann's law")
	iodine := oscillatorOf(214.6 * perCentimetre)
	within(t, "I2 v=1", one(occupancyLaw, iodine, number(1), number(298.15)), 0.229, 0.0005, atkins)
	within(t, "I2 v=2", one(occupancyLaw, iodine, number(2), number(298.15)), 0.081, 0.0005, atkins)
	within(t, "HCl J=0", one(occupancyLaw, rotorOf(10.44*perCentimetre, 1), number(0), number(298.15)), 0.0495397, 5e-8, "rigid rotor, sum over 600 levels")

	hydrogen := []float64{0, 118.4868, 354.3733, 705.5189, 1168.798, 1740.187, 2414.89} // cm^-1
	for i := range hydrogen {
		hydrogen[i] *= perCentimetre
	}
	ladder := ladderOf(hydrogen, []float64{1, 9, 5, 21, 9, 33, 13})
	for _, c := range []struct{ temperature, percent float64 }{{20, 99.8215}, {60, 65.5897}, {100, 38.6299}, {300, 25.0717}} {
		even := 0.0
		for _, n := range []float64{0, 2, 4, 6} {
			even += one(occupancyLaw, ladder, number(n), number(c.temperature))
		}
		within(t, "para-hydrogen", 100*even, c.percent, 5e-5, para)
	}
}

func TestPublishedFunctions(t *testing.T) {
	const source = "Einstein's functions of theta/T"
	theta := oscillatorOf(kelvin(1)[0])
	within(t, "C/R at T = theta/20", one(heatCapacityLaw, theta, number(0.05))/nature.MolarGasConstant, 8.24461e-7, 5e-12, source)
	within(t, "S/R at x = 0.1", one(entropyLaw, theta, number(10))/nature.MolarGasConstant, 3.30300, 5e-6, source)
	within(t, "U/RT at x = 0.2", one(meanEnergyLaw, theta, number(5))/(5*nature.MolarGasConstant), 0.903331, 5e-7, source)
	oxygen := ladderOf([]float64{0, 158.265 * perCentimetre, 226.977 * perCentimetre}, []float64{5, 3, 1})
	closeTo(t, "atomic oxygen at 298.15 K", one(partitionSumLaw, oxygen, number(298.15)),
		5+3*math.Exp(-1.438776877*158.265/298.15)+math.Exp(-1.438776877*226.977/298.15), 1e-9)
	// NIST-JANAF, oxygen atom at 298.15 K: Cp = 21.911 J/(mol K), of which 5/2 R is translation.
	within(t, "Cp of O", 2.5*nature.MolarGasConstant+one(heatCapacityLaw, oxygen, number(298.15)), 21.911, 0.0007, "NIST-JANAF, 4th ed.")
}

// A list of an oscillator's or rotor's levels gives what the closed forms and
// series give.
func TestListsAgreeWithModels(t *testing.T) {
	vibration, rotation := make([]float64, 400), make([]float64, 400)
	single, states := make([]float64, 400), make([]float64, 400)
	for i := range vibration {
		n := float64(i)
		vibration[i], single[i] = 3*n, 1
		rotation[i], states[i] = 0.5*n*(n+1), 2*n+1
	}
	pairs := []struct{ list, model law.Argument }{
		{ladderOf(kelvin(vibration...), single), oscillatorOf(kelvin(3)[0])},
		{ladderOf(kelvin(rotation...), states), rotorOf(kelvin(0.5)[0], 1)},
	}
	for _, p := range pairs {
		for _, l := range []*law.Law{partitionSumLaw, meanEnergyLaw, heatCapacityLaw, entropyLaw} {
			for _, temperature := range []float64{0.02, 0.1, 1, 4, 10, 25} {
				closeTo(t, l.Name, one(l, p.list, number(temperature)), one(l, p.model, number(temperature)), 2e-13)
			}
		}
		for _, n := range []float64{0, 1, 2, 7} {
			closeTo(t, "occupancy", one(occupancyLaw, p.list, number(n), number(5)), one(occupancyLaw, p.model, number(n), number(5)), 1e-13)
		}
	}
}

// Heat capacity is the slope of the mean energy, and of entropy times T.
func TestThermodynamicIdentities(t *testing.T) {
	ladders := []law.Argument{
		ladderOf(kelvin(40, 5, 300), []float64{2, 1, 7}),
		oscillatorOf(kelvin(70)[0]),
		rotorOf(kelvin(0.3)[0], 2),
		made(combineLaw, rotorOf(kelvin(2)[0], 1), made(combineLaw, oscillatorOf(kelvin(100)[0]), ladderOf(kelvin(-3, 12), []float64{1, 3}))),
	}
	for i, ladder := range ladders {
		for _, temperature := range []float64{8, 20, 55, 150} {
			step := temperature * 1e-4
			up, down := number(temperature+step), number(temperature-step)
			capacity := one(heatCapacityLaw, ladder, number(temperature))
			slope := (one(meanEnergyLaw, ladder, up) - one(meanEnergyLaw, ladder, down)) / (2 * step)
			bend := (one(entropyLaw, ladder, up) - one(entropyLaw, ladder, down)) / (2 * step) * temperature
			if math.Abs(slope-capacity) > 1e-6*capacity || math.Abs(bend-capacity) > 1e-6*capacity {
				t.Errorf("ladder %d at %v K: C = %v, dU/dT = %v, T dS/dT = %v", i, temperature, capacity, slope, bend)
			}
			// S = R ln Q + U/T, both from the same zero.
			s := nature.MolarGasConstant*math.Log(one(partitionSumLaw, ladder, number(temperature))) + one(meanEnergyLaw, ladder, number(temperature))/temperature
			closeTo(t, "entropy", one(entropyLaw, ladder, number(temperature)), s, 1e-12)
		}
	}
}

func TestCombinedModes(t *testing.T) {
	a, b := rotorOf(kelvin(2)[0], 2), ladderOf(kelvin(7, -5, 30), []float64{1, 2, 5})
	both := made(combineLaw, a, b)
	temperature := number(11)
	closeTo(t, "Q", one(partitionSumLaw, both, temperature), one(partitionSumLaw, a, temperature)*one(partitionSumLaw, b, temperature), 1e-14)
	for _, l := range []*law.Law{meanEnergyLaw, heatCapacityLaw, entropyLaw} {
		closeTo(t, l.Name, one(l, both, temperature), one(l, a, temperature)+one(l, b, temperature), 1e-14)
	}
	if got := one(occupancyLaw, both, number(0), temperature); got == got {
		t.Errorf("a combined ladder has an occupancy: %v", got)
	}
}

// From a millikelvin to 1e8 K nothing overflows, and shares add up to one.
func TestColdAndHot(t *testing.T) {
	energies := []float64{500 * perCentimetre, -12000 * perCentimetre, 3 * electronvolt, 400 * electronvolt}
	states := []float64{4, 2, 1, 9}
	ladder := ladderOf(energies, states)
	for temperature := 1e-3; temperature <= 1.1e8; temperature *= 10 {
		sum := 0.0
		for n := range energies {
			share := one(occupancyLaw, ladder, number(float64(n)), number(temperature))
			if !(share >= 0 && share <= 1) {
				t.Errorf("share of level %d at %v K: %v", n, temperature, share)
			}
			sum += share
		}
		closeTo(t, "sum of shares", sum, 1, 1e-15)
		for _, l := range []*law.Law{meanEnergyLaw, heatCapacityLaw, entropyLaw} {
			for _, mode := range []law.Argument{ladder, oscillatorOf(kelvin(3000)[0]), rotorOf(0.037*perCentimetre, 2)} {
				if got := one(l, mode, number(temperature)); got != got || math.IsInf(got, 0) {
					t.Errorf("%s at %v K: %v", l.Name, temperature, got)
				}
			}
		}
	}
	closeTo(t, "cold entropy", one(entropyLaw, ladder, number(1e-3)), nature.MolarGasConstant*math.Log(2), 1e-15)
	closeTo(t, "cold energy", one(meanEnergyLaw, ladder, number(1e-3)), nature.AvogadroConstant*energies[1], 1e-15)
	closeTo(t, "hot entropy", one(entropyLaw, ladderOf(kelvin(0, 1), []float64{1, 2}), number(1e8)), nature.MolarGasConstant*math.Log(3), 1e-12)
	closeTo(t, "hot rotor", one(heatCapacityLaw, rotorOf(0.037*perCentimetre, 2), number(1e8)), nature.MolarGasConstant, 1e-15)
	// Far from the zero of energy the sum goes through logarithms.
	far := ladderOf(kelvin(-700, -690), []float64{1, 1})
	closeTo(t, "far zero", one(partitionSumLaw, far, number(1)), math.Exp(700)*(1+math.Exp(-10)), 1e-12)
	if got := one(partitionSumLaw, ladderOf(kelvin(800), []float64{1}), number(1e-3)); got != 0 {
		t.Errorf("a lone level far above the zero: Q = %v", got)
	}
}

func TestWhatIsNoNumber(t *testing.T) {
	good := ladderOf(kelvin(0, 1), []float64{1, 1})
	cases := []struct {
		why       string
		law       *law.Law
		arguments []law.Argument
	}{
		{"lengths differ", partitionSumLaw, []law.Argument{ladderOf(kelvin(0, 1), []float64{1}), number(300)}},
		{"lengths differ", occupancyLaw, []law.Argument{ladderOf(kelvin(0, 1), []float64{1}), number(0), number(300)}},
		{"no levels", entropyLaw, []law.Argument{ladderOf(nil, nil), number(300)}},
		{"degeneracy 0", partitionSumLaw, []law.Argument{ladderOf(kelvin(0, 1), []float64{1, 0}), number(300)}},
		{"degeneracy below 0", heatCapacityLaw, []law.Argument{ladderOf(kelvin(0, 1), []float64{-1, 1}), number(300)}},
		{"temperature 0", meanEnergyLaw, []law.Argument{good, number(0)}},
		{"temperature below 0", occupancyLaw, []law.Argument{good, number(0), number(-3)}},
		{"level 2 of 2", occupancyLaw, []law.Argument{good, number(2), number(300)}},
		{"half a level", occupancyLaw, []law.Argument{good, number(0.5), number(300)}},
		{"level below 0", occupancyLaw, []law.Argument{oscillatorOf(1e-20), number(-1), number(300)}},
		{"energy no number", entropyLaw, []law.Argument{ladderOf([]float64{0, math.NaN()}, []float64{1, 1}), number(300)}},
		{"no oscillator", partitionSumLaw, []law.Argument{oscillatorOf(0), number(300)}},
		{"no rotor", heatCapacityLaw, []law.Argument{rotorOf(-1e-20, 1), number(300)}},
		{"symmetry 0", entropyLaw, []law.Argument{rotorOf(1e-20, 0), number(300)}},
		{"factor at 0 K", boltzmannFactorLaw, []law.Argument{number(1e-20), number(0)}},
		{"ratio of no states", populationRatioLaw, []law.Argument{number(1e-20), number(1), number(0), number(300)}},
	}
	for _, c := range cases {
		if got := one(c.law, c.arguments...); got == got {
			t.Errorf("%s: %s gives %v", c.why, c.law.Name, got)
		}
	}
}
