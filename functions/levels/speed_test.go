package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Speed lines: a law over many temperatures, and beside it the loop that one
// would write by hand with math.Exp.

func fortyLevels() (energies, states []float64) {
	energies, states = make([]float64, 40), make([]float64, 40)
	for i := range energies {
		energies[i], states[i] = kelvin(120 * float64(i))[0], float64(2*i+1)
	}
	return energies, states
}

func manyTemperatures(n int) []float64 {
	temperature := make([]float64, n)
	for i := range temperature {
		temperature[i] = 200 + 3000*float64(i)/float64(n)
	}
	return temperature
}

func perRow(b *testing.B, rows int) {
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(rows), "ns/row")
}

func BenchmarkOccupancyOf40LevelsByLaw(b *testing.B) {
	energies, states := fortyLevels()
	temperature := manyTemperatures(1024)
	arguments := []law.Argument{ladderOf(energies, states), number(3), number(temperature...)}
	dst := make([]float64, len(temperature))
	var work law.Work
	for b.Loop() {
		occupancyLaw.Body(dst, arguments, &work)
	}
	perRow(b, len(dst))
}

func BenchmarkOccupancyOf40LevelsByHand(b *testing.B) {
	energies, states := fortyLevels()
	temperature := manyTemperatures(1024)
	dst := make([]float64, len(temperature))
	for b.Loop() {
		for i, t := range temperature {
			beta := 1 / (nature.BoltzmannConstant * t)
			sum := 0.0
			for k, e := range energies {
				sum += states[k] * math.Exp(-e*beta)
			}
			dst[i] = states[3] * math.Exp(-energies[3]*beta) / sum
		}
	}
	perRow(b, len(dst))
}

func BenchmarkVibratingRotorByLaw(b *testing.B) {
	temperature := manyTemperatures(256)
	arguments := []law.Argument{carbonMonoxide(), number(temperature...)}
	dst := make([]float64, len(temperature))
	var work law.Work
	for b.Loop() {
		partitionSumLaw.Body(dst, arguments, &work)
	}
	perRow(b, len(dst))
}

func BenchmarkVibratingRotorByHand(b *testing.B) {
	temperature := manyTemperatures(256)
	dst := make([]float64, len(temperature))
	co := carbonMonoxide()
	var set levelSet
	if !set.prepare(buildVibratingRotor, co.Items, 0, endless) {
		b.Fatal("no levels")
	}
	energies, states := set.energy, set.weight
	for b.Loop() {
		for i, t := range temperature {
			beta := 1 / (nature.BoltzmannConstant * t)
			sum := 0.0
			for k, e := range energies {
				sum += states[k] * math.Exp(-e*beta)
			}
			dst[i] = sum
		}
	}
	perRow(b, len(dst))
}
