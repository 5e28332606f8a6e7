package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Temperatures come back from mean energies and shares to twelve digits, as far
// as these tell a temperature at all: where the heat capacity is not too small.
func TestTemperaturesComeBack(t *testing.T) {
	modes := ladders()
	modes["oscillator"] = oscillatorOf(kelvin(300)[0])
	modes["rotor"] = rotorOf(kelvin(2)[0], 2)
	modes["joined"] = made(combineLaw, oscillatorOf(kelvin(300)[0]), made(repeatModeLaw, oscillatorOf(kelvin(900)[0]), number(2)))
	modes["shifted"] = made(shiftLaw, rotorOf(kelvin(2)[0], 2), number(kelvin(5000)[0]))
	delete(modes, "water") // slow at many temperatures; the tops stand for it
	for name, ladder := range modes {
		checked := 0
		for temperature := 0.01; temperature < 3000; temperature *= 2.3 {
			capacity := one(heatCapacityLaw, ladder, number(temperature)) / nature.MolarGasConstant
			energy := one(meanEnergyLaw, ladder, number(temperature))
			lowest := one(meanEnergyLaw, ladder, number(1e-5))
			scale := (math.Abs(energy) + math.Abs(lowest)) / (nature.MolarGasConstant * temperature * capacity)
			if !(scale < 1e3) || energy-lowest < 1e-280 {
				continue
			}
			checked++
			closeTo(t, name+" from its mean energy", one(temperatureFromMeanEnergyLaw, ladder, number(energy)), temperature, 1e-13+1e-15*scale) // the sums have thousands of terms
			if name == "joined" {
				continue
			}
			for _, n := range []float64{0, 1, 3} {
				share := one(occupancyLaw, ladder, number(n), number(temperature))
				if !(share > 1e-200 && share < 0.999) {
					continue
				}
				// How steeply the share runs with temperature: 1e-12 where it does.
				near := one(occupancyLaw, ladder, number(n), number(temperature*1.001))
				slope := math.Abs(near/share-1) / 0.001
				if slope < 1e-2 {
					continue
				}
				cold := one(temperatureFromOccupancyLaw, ladder, number(n), number(share), word("cold"))
				hot := one(temperatureFromOccupancyLaw, ladder, number(n), number(share), word("hot"))
				if math.Abs(cold/temperature-1) > 1e-12/slope && math.Abs(hot/temperature-1) > 1e-12/slope {
					t.Errorf("%s: share %v of level %v at %v K gives %v and %v", name, share, n, temperature, cold, hot)
				}
			}
		}
		if checked == 0 && name != "iron" && name != "hydrogen" {
			t.Errorf("%s was not checked", name)
		}
	}
}

func TestNegativeTemperatures(t *testing.T) {
	two := ladderOf(kelvin(0, 100), []float64{1, 1})
	// Three quarters of all in the upper level: T = -100 K/ln 3.
	upper := nature.MolarGasConstant * 75
	closeTo(t, "two levels", one(temperatureFromMeanEnergyLaw, two, number(upper)), -100/math.Log(3), 1e-13)
	closeTo(t, "the same by their ratio", one(temperatureFromRatioLaw, number(kelvin(100)[0]), number(1), number(1), number(3)), -100/math.Log(3), 1e-14)
	closeTo(t, "the other way round", one(temperatureFromMeanEnergyLaw, two, number(nature.MolarGasConstant*25)), 100/math.Log(3), 1e-13)
	spin := made(spinLevelsLaw, number(2), number(2.5), number(3))
	warm := one(meanEnergyLaw, spin, number(4))
	closeTo(t, "a spin upside down", one(temperatureFromMeanEnergyLaw, spin, number(-warm)), -4, 1e-12)
	for _, c := range []struct {
		what   string
		got    float64
		ladder law.Argument
	}{
		{"below the lowest level", one(temperatureFromMeanEnergyLaw, two, number(-1)), two},
		{"above the highest level", one(temperatureFromMeanEnergyLaw, two, number(nature.MolarGasConstant*100.1)), two},
		{"equal shares", one(temperatureFromRatioLaw, number(kelvin(100)[0]), number(3), number(1), number(3)), two},
		{"never so full", one(temperatureFromOccupancyLaw, two, number(1), number(0.51), word("cold")), two},
		{"a level that is not", one(temperatureFromOccupancyLaw, two, number(2), number(0.1), word("cold")), two},
	} {
		if c.got == c.got {
			t.Errorf("%s: %v K", c.what, c.got)
		}
	}
}

func TestCarriersComeBack(t *testing.T) {
	const effective, temperature = 2.8e25, 300.0
	for eta := -40.0; eta < 60; eta += 1.7 {
		energy := eta * nature.BoltzmannConstant * temperature
		density := one(carrierDensityLaw, number(effective), number(energy), number(temperature))
		back := one(fermiLevelForDensityLaw, number(effective), number(density), number(temperature))
		if math.Abs(back-energy) > 1e-12*math.Max(math.Abs(energy), nature.BoltzmannConstant*temperature) {
			t.Errorf("eta = %v comes back as %v", eta, back/(nature.BoltzmannConstant*temperature))
		}
	}
}

// The derivative of F_j is F_(j-1), and the ways of computing it agree where
// one takes over from the other.
func TestFermiIntegrals(t *testing.T) {
	for _, order := range []float64{0.5, 1, 1.5, 2, 3.3, 6} {
		for _, x := range []float64{-12, -3, -0.6, 0.4, 2, 9, 25, 70, 300} {
			h := 1e-3 * math.Max(1, math.Abs(x)/20)
			slope := (8*(fermiIntegral(order, x+h)-fermiIntegral(order, x-h)) - (fermiIntegral(order, x+2*h) - fermiIntegral(order, x-2*h))) / (12 * h)
			closeTo(t, "derivative", slope, fermiIntegral(order-1, x), 3e-11)
		}
		closeTo(t, "at zero", fermiQuadrature(order, 0), fermiSeries(order, 0), 3e-15)
		border := 40 + order*order
		closeTo(t, "at Sommerfeld's border", fermiQuadrature(order, border), fermiSommerfeld(order, border), 1e-14)
	}
	// eta(3/2) = 0.7651470246254 (mathematics: (1 - 2^(-1/2)) zeta(3/2))
	within(t, "F_1/2(0)", fermiIntegral(0.5, 0), 0.7651470246254079, 1e-15, "(1 - 1/sqrt 2) zeta(3/2)")
	for _, c := range []struct{ x, want float64 }{{0.5, math.Sqrt(math.Pi)}, {1, 1}, {5, 24}, {2.5, 0.75 * math.Sqrt(math.Pi)}, {1.25, 0.906402477055477077}} {
		closeTo(t, "gamma", gammaOf(c.x), c.want, 3e-15)
	}
}

// Both ways to Debye's function and to Langevin's agree where one takes over.
func TestFunctionsMeetAtTheirBorders(t *testing.T) {
	for n := 1; n <= 10; n++ {
		closeTo(t, "Debye", debyeFunction(n, 4), debyeFunction(n, math.Nextafter(4, 5)), 3e-13)
	}
	closeTo(t, "Langevin", langevinOf(math.Nextafter(1, 0)), langevinOf(1), 1e-15)
	for _, j := range []float64{0.5, 1, 2.5, 7} {
		for _, x := range []float64{-3, 1e-9, 0.02, 0.4, 2, 30} {
			// The mean of m/J over the levels of the spin.
			sum, mean := 0.0, 0.0
			for m := -j; m <= j; m++ {
				w := math.Exp((m/j - 1) * math.Abs(x))
				sum += w
				mean += m / j * w
			}
			closeTo(t, "Brillouin", brillouinOf(j, x), math.Copysign(mean/sum, x), 1e-14+1e-16/math.Abs(x))
		}
	}
}
