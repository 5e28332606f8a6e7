package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// herzberg is the source of the spectroscopic formulas of diatomic molecules.
const herzberg = "Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III"

func constantParameter(name, meaning, standard string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning + ", " + asLevelEnergy, Unit: "J", Default: standard, Accepts: levelEnergies()}
}

func positiveConstant(name, meaning string) law.Parameter {
	p := constantParameter(name, meaning, "")
	p.Finite = law.Above(0)
	return p
}

const noLevels = "The ladder is refused where it has more than 1,000,000 levels below what counts at the temperature."

var anharmonicOscillatorLaw = &law.Law{
	Name:  "anharmonic_oscillator",
	Group: group,
	Gives: "the ladder of an anharmonic oscillator, counted from v = 0",
	Parameters: []law.Parameter{
		positiveConstant("we", "vibrational constant"),
		constantParameter("wexe", "first anharmonicity constant", ""),
		constantParameter("weye", "second anharmonicity constant", "0[J]"),
		constantParameter("dissociation", "dissociation energy from v = 0; 0 where the levels end by themselves", "0[J]"),
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "G(v) = we (v + 1/2) - wexe (v + 1/2)^2 + weye (v + 1/2)^3, E_v = G(v) - G(0), v = 0, 1, ... while G rises and E_v is at most the dissociation energy",
	Source:   herzberg,
	Caution:  "Near dissociation the formula overshoots: trust it well below. " + noLevels,
	Examples: []law.Example{
		{Formula: "mean_energy(anharmonic_oscillator(2[K], 0[K]), 2[K]) / mean_energy(oscillator(2[K]), 2[K])", Gives: "1"},
	},
}

// vibration gives G(v) - G(0) without a difference of large numbers:
// (v + 1/2)^2 - 1/4 = v(v + 1), (v + 1/2)^3 - 1/8 = v(v^2 + 3v/2 + 3/4).
func vibration(v, we, wexe, weye float64) float64 {
	cubic := float64(weye * (float64(v*v) + float64(1.5*v) + 0.75))
	return float64(v * (we - float64(wexe*(v+1)) + cubic))
}

func buildAnharmonic(set *levelSet, _ []law.Argument, numbers []float64) bool {
	we, wexe, weye, dissociation := numbers[0], numbers[1], numbers[2], numbers[3]
	return addVibrations(set, we, wexe, weye, dissociation)
}

// addVibrations adds the levels of an oscillator while they rise.
func addVibrations(set *levelSet, we, wexe, weye, dissociation float64) bool {
	if !(we > 0) {
		return false
	}
	last := math.Inf(-1)
	for v := 0.0; ; v++ {
		energy := vibration(v, we, wexe, weye)
		if !(energy > last) || dissociation > 0 && energy > dissociation {
			return true
		}
		if energy > set.ceiling(we) {
			set.truncated = true
			return true
		}
		if !set.add(energy, 1) {
			return false
		}
		last = energy
	}
}

var morseLaw = &law.Law{
	Name:  "morse",
	Group: group,
	Gives: "the ladder of the bound levels of a Morse oscillator, counted from v = 0",
	Parameters: []law.Parameter{
		positiveConstant("well_depth", "depth D_e of the potential below the free atoms (D_0 + we/2 - wexe/4)"),
		positiveConstant("we", "vibrational constant"),
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "G(v) = we (v + 1/2) - we^2/(4 D_e) (v + 1/2)^2, v = 0, 1, ... below 2 D_e/we - 1/2",
	Source:   "Morse P.M. (1929) Phys. Rev. 34, 57",
	Caution:  "The true potential falls off otherwise at large distance: the highest levels are wrong. " + noLevels,
	Refusal:  "the well is too shallow to hold a level: we is not below 4 D_e",
	Examples: []law.Example{
		{Formula: "levels_below(morse(500[K], 100[K]), 1, 1e6[K])", Gives: "10"},
	},
}

func buildMorse(set *levelSet, _ []law.Argument, numbers []float64) bool {
	depth, we := numbers[0], numbers[1]
	if !(depth > 0) || !(we > 0) {
		return false
	}
	top := float64(2*depth)/we - 0.5 // v at the rim of the well
	wexe := float64(we*we) / float64(4*depth)
	for v := 0.0; v < top; v++ {
		energy := vibration(v, we, wexe, 0)
		if energy > set.ceiling(we) {
			set.truncated = true
			break
		}
		if !set.add(energy, 1) {
			return false
		}
	}
	return true
}

var boxLevelsLaw = &law.Law{
	Name:  "box_levels",
	Group: group,
	Gives: "the ladder of a particle in a box in one direction, counted from the lowest level",
	Parameters: []law.Parameter{
		{Name: "mass", Meaning: "mass of the particle", Unit: "kg", Finite: law.Above(0)},
		{Name: "length", Meaning: "length of the box", Unit: "m", Finite: law.Above(0)},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_n = h^2 (n^2 - 1)/(8 m L^2), n = 1, 2, 3, ..., one state each",
	Source:   "Schroedinger E. (1926) Ann. Phys. 384, 361; Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 3",
	Caution:  "One direction of motion between hard walls; combine three for a room. The energy h^2/(8 m L^2) of the lowest level is left out.",
	Examples: []law.Example{
		{Formula: "heat_capacity(box_levels(6.6e-27[kg], 1[cm]), 300[K])", Gives: "4.1572 J/(mol K)"},
	},
}

// boxUnit gives h^2/(8 m L^2) in J.
func boxUnit(mass, length float64) float64 {
	if !(mass > 0) || !(length > 0) {
		return notANumber
	}
	root := nature.PlanckConstant / length
	return float64(root/float64(8*mass)) * root
}

func buildBox(set *levelSet, _ []law.Argument, numbers []float64) bool {
	unit := boxUnit(numbers[0], numbers[1])
	if !(unit > 0) {
		return false
	}
	for n := 1.0; ; n++ {
		energy := float64(unit * float64((n-1)*(n+1)))
		if energy > set.ceiling(float64(3*unit)) {
			set.truncated = true
			return true
		}
		if !set.add(energy, 1) {
			return false
		}
	}
}

// roomyBox gives a quantity of a box whose unit energy is a in k_B T, a < 0.01.
// By the transformation of Jacobi's theta function the sum of exp(-a n^2) over
// n = 1, 2, ... is sqrt(pi/a)/2 - 1/2 to within sqrt(pi/a) exp(-pi^2/a), which
// is below 1e-420.
func roomyBox(a float64, want quantity) (value float64, ok bool) {
	if !(a > 0 && a < 0.01) {
		return 0, false
	}
	half := float64(0.5 * math.Sqrt(math.Pi/a))
	sum := half - 0.5
	mean := float64(0.5*half)/sum - a
	switch want {
	case partition:
		return sum * column.Exp(a), true
	case logarithm:
		return column.Ln(sum) + a, true
	case meanLevel:
		return mean, true
	case entropic:
		return column.Ln(sum) + a + mean, true
	}
	root := float64(0.5*half) / sum
	return float64(0.75*half)/sum - float64(root*root), true
}

var hydrogenLikeLaw = &law.Law{
	Name:  "hydrogen_like",
	Group: group,
	Gives: "the ladder of an atom or ion with one electron, counted from n = 1",
	Parameters: []law.Parameter{
		{Name: "Z", Meaning: "charge number of the nucleus", Unit: "1", Finite: law.Within(1, 150), Valid: law.Within(1, 30)},
		{Name: "highest", Meaning: "highest principal quantum number that is counted: the sum over all of them has no limit, so that it must end somewhere", Unit: "1", Finite: law.Within(1, 100000), Default: "20"},
		{Name: "mass", Meaning: "mass of the nucleus; 1 kg stands for an infinite one", Unit: "kg", Finite: law.Above(0), Default: "1[kg]"},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_n = R_inf h c Z^2 (1 - 1/n^2)/(1 + m_e/M), g_n = 2 n^2, n = 1, 2, ... up to the highest",
	Source:   "Bohr N. (1913) Phil. Mag. 26, 1; Herzberg G. (1944) Atomic Spectra and Atomic Structure, chapter I",
	Caution:  "Where k_B T is not small against the ionisation energy the sum grows with the cube of the highest n: in a real gas neighbours end the series. Fine structure, of relative size (Z/137)^2, is left out.",
	Examples: []law.Example{
		{Formula: "occupancy(hydrogen_like(1), 0, 5000[K])", Gives: "1.0000000"},
	},
}

func buildHydrogenLike(set *levelSet, _ []law.Argument, numbers []float64) bool {
	z, highest, mass := numbers[0], numbers[1], numbers[2]
	if !(z > 0) || !wholeNumber(highest) || highest < 1 || !(mass > 0) {
		return false
	}
	const rydberg = nature.RydbergConstant * nature.PlanckConstant * nature.SpeedOfLight // J
	bound := float64(rydberg*float64(z*z)) / (1 + nature.ElectronMass/mass)
	for n := 1.0; n <= highest; n++ {
		square := float64(n * n)
		if !set.add(float64(bound*(square-1))/square, 2*square) {
			return false
		}
	}
	return true
}
