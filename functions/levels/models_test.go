package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// bruteRotor adds the rotor's levels up, far beyond the last that counts, and
// gives the sum without J = 0, and mean and variance of the reduced energy.
func bruteRotor(a float64) (excited, mean, spread float64) {
	var q, m total
	last := int(math.Sqrt(760/a)) + 3
	for j := range last {
		y := float64(j)
		x := a * y * (y + 1)
		w := (2*y + 1) * math.Exp(-x)
		if j > 0 {
			q.add(w)
		}
		m.add(x * w)
	}
	excited = q.value()
	mean = m.value() / (1 + excited)
	var v total
	for j := range last {
		y := float64(j)
		x := a * y * (y + 1)
		v.add((2*y + 1) * math.Exp(-x) * (x - mean) * (x - mean))
	}
	return excited, mean, v.value() / (1 + excited)
}

func TestRotorAgainstAllLevels(t *testing.T) {
	for a := 1e-8; a < 300; a *= 1.37 {
		excited, mean, spread := bruteRotor(a)
		sum := 1 + excited
		closeTo(t, "Q", rotorQuantity(a, 1, partition), sum, 4e-15)
		closeTo(t, "mean", rotorQuantity(a, 1, meanLevel), mean, 1e-13)
		closeTo(t, "variance", rotorQuantity(a, 1, variance), spread, 2e-13)
		closeTo(t, "entropy", rotorQuantity(a, 1, entropic), math.Log1p(excited)+mean, 1e-13)
		closeTo(t, "symmetry", rotorQuantity(a, 2, partition), sum/2, 4e-15)
	}
}

// At the border both ways give the same.
func TestRotorSeriesMeetsSum(t *testing.T) {
	for _, a := range []float64{0.009, warmRotor, 0.011, 0.012} {
		for want := partition; want <= entropic; want++ {
			closeTo(t, "border", warmQuantity(a, 2, want), coldQuantity(a, 2, want), 2e-15)
		}
	}
}

// The rest after the last level of the direct sum, by the integral bound, is
// below 1e-18 of the sum and of its first two moments.
func TestRotorRest(t *testing.T) {
	for a := warmRotor; a < 300; a *= 1.01 {
		n := 2.0
		for a*n*(n+1)-2*a < rotorReach {
			n++
		}
		if n >= mostRotorTerms {
			t.Fatalf("a = %v: %v terms", a, n)
		}
		excited, mean, spread := bruteRotor(a)
		sum := 1 + excited
		x := a * n * (n + 1)
		fall := math.Exp(-x)
		for k, whole := range []float64{sum, sum * mean, sum * (spread + mean*mean)} {
			term := (2*n + 1) * math.Pow(x, float64(k)) * fall
			integral := []float64{1, x + 1, x*x + 2*x + 2}[k] / a * fall
			if term+integral > 1e-18*whole {
				t.Errorf("a = %v: rest of moment %d is %g of it", a, k, (term+integral)/whole)
			}
		}
	}
}

// One call over rows gives what calls row by row give, whether the ladder or
// the temperature is a column, and again in the next block.
func TestRowsAreIndependent(t *testing.T) {
	const rows = 37
	temperature, moving, states, level := make([]float64, rows), make([]float64, rows), make([]float64, rows), make([]float64, rows)
	for i := range temperature {
		temperature[i] = 0.5 + 3*float64(i)
		moving[i] = float64(10-i) * nature.BoltzmannConstant
		states[i] = 1 + float64(i%4)
		level[i] = float64(i % 3)
	}
	energies := kelvin(4, 0, 21)
	modes := []func(i int) law.Argument{
		func(i int) law.Argument {
			middle, weight := number(moving[max(i, 0)]), number(states[max(i, 0)])
			if i < 0 {
				middle, weight = number(moving...), number(states...)
			}
			return made(ladderLaw,
				law.Argument{Items: []law.Argument{number(energies[0]), middle, number(energies[2])}},
				law.Argument{Items: []law.Argument{number(2), weight, number(1)}})
		},
		func(int) law.Argument { return ladderOf(energies, []float64{1, 3, 5}) },
		func(i int) law.Argument {
			if i < 0 {
				return oscillatorOf(kelvin(temperature...)...)
			}
			return oscillatorOf(kelvin(temperature[i])...)
		},
		func(int) law.Argument { return rotorOf(energies[0], 2) },
	}
	for m, mode := range modes {
		for _, l := range []*law.Law{partitionSumLaw, meanEnergyLaw, heatCapacityLaw, entropyLaw, occupancyLaw} {
			var work law.Work
			for range 2 {
				arguments := []law.Argument{mode(-1), number(temperature...)}
				if l == occupancyLaw {
					arguments = []law.Argument{mode(-1), number(level...), number(temperature...)}
				}
				dst := make([]float64, rows)
				l.Body(dst, arguments, &work)
				for i, got := range dst {
					single := []law.Argument{mode(i), number(temperature[i])}
					if l == occupancyLaw {
						single = []law.Argument{mode(i), number(level[i]), number(temperature[i])}
					}
					if want := one(l, single...); got != want && (got == got || want == want) {
						t.Fatalf("%s of mode %d in row %d: %v in a column, %v alone", l.Name, m, i, got, want)
					}
				}
			}
		}
	}
}

func TestNothingIsAllocatedForABlock(t *testing.T) {
	temperature := make([]float64, 256)
	for i := range temperature {
		temperature[i] = 1 + float64(i)
	}
	mode := made(combineLaw, rotorOf(kelvin(2)[0], 1), ladderOf(kelvin(0, 3, 9), []float64{1, 3, 5}))
	dst := make([]float64, len(temperature))
	for _, l := range []*law.Law{partitionSumLaw, meanEnergyLaw, heatCapacityLaw, entropyLaw} {
		var work law.Work
		arguments := []law.Argument{mode, number(temperature...)}
		l.Body(dst, arguments, &work)
		if n := testing.AllocsPerRun(5, func() { l.Body(dst, arguments, &work) }); n > 0 {
			t.Errorf("%s: %v allocations for a block", l.Name, n)
		}
	}
}

func benchmarkLaw(b *testing.B, l *law.Law, extra ...law.Argument) {
	energies, states := make([]float64, 40), make([]float64, 40)
	for i := range energies {
		energies[i], states[i] = 120*float64(i), float64(2*i+1)
	}
	temperature := make([]float64, 1024)
	for i := range temperature {
		temperature[i] = 200 + 5*float64(i)
	}
	arguments := append([]law.Argument{ladderOf(kelvin(energies...), states)}, extra...)
	arguments = append(arguments, number(temperature...))
	dst := make([]float64, len(temperature))
	var work law.Work
	for b.Loop() {
		l.Body(dst, arguments, &work)
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(len(temperature)*len(energies)), "ns/level")
}

func BenchmarkOccupancyOf40Levels(b *testing.B)    { benchmarkLaw(b, occupancyLaw, number(3)) }
func BenchmarkHeatCapacityOf40Levels(b *testing.B) { benchmarkLaw(b, heatCapacityLaw) }
