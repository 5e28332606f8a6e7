package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

var hinderedRotorLaw = &law.Law{
	Name:  "hindered_rotor",
	Group: group,
	Gives: "the ladder of an internal rotation with a barrier, counted from its lowest level",
	Parameters: []law.Parameter{
		{Name: "barrier", Meaning: "height of the barrier, " + asLevelEnergy, Unit: "J", Finite: law.AtLeast(0), Accepts: levelEnergies()},
		{Name: "fold", Meaning: "how many equal barriers a full turn has: 3 for a methyl group", Unit: "1", Finite: law.Within(1, 12)},
		positiveConstant("B", "rotational constant of the internal rotation, h^2/(8 pi^2 I_r)"),
		{Name: "symmetry", Meaning: "symmetry number of the internal rotation", Unit: "1", Finite: law.Above(0), Default: "1"},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "eigenvalues of -B d^2/dphi^2 + (V/2)(1 - cos(n phi)), Mathieu's equation, over one full turn; 1/symmetry states each",
	Source:   "Pitzer K.S., Gwinn W.D. (1942) J. Chem. Phys. 10, 428; Abramowitz M., Stegun I.A. (1964) Handbook of Mathematical Functions, chapter 20",
	Caution:  "One rotation on a stiff frame. Worked out once for the constants; with constants that vary from row to row that is slow.",
	Refusal:  "fold is no whole number, or a matrix of more than 2000 rows or more than 1,000,000 levels are needed: the barrier is too high, or it is too hot, for the constant",
	Examples: []law.Example{
		{Formula: "partition_sum(hindered_rotor(0[K], 3, 1[K]), 1000[K])", Gives: "56.050"},
	},
}

func buildHinderedRotor(set *levelSet, _ []law.Argument, numbers []float64) bool {
	barrier, fold, b, symmetry := numbers[0], numbers[1], numbers[2], numbers[3]
	if !(barrier >= 0) || !wholeNumber(fold) || fold < 1 || !(b > 0) || !(symmetry > 0) {
		return false
	}
	// The first excited level lies no higher than that of free rotation and
	// the barrier allow.
	ceiling := set.ceiling(float64(4*b)+barrier) + barrier
	lowest := math.Inf(1)
	for each := 0.0; each < fold; each++ {
		class := each // the remainders of m that are smallest in size
		if 2*class > fold {
			class -= fold
		}
		last, ok := hinderedClass(set, class, fold, barrier, b)
		if !ok {
			return false
		}
		for _, energy := range set.diagonal {
			if energy > ceiling {
				break
			}
			lowest = min(lowest, energy)
			if !set.add(energy, 1/symmetry) {
				return false
			}
		}
		set.endRun()
		for _, sign := range [...]float64{1, -1} {
			for l := last + 1; ; l++ {
				energy := fastRotation(class+float64(float64(sign*fold)*l), fold, barrier, b)
				if energy > ceiling {
					break
				}
				if !set.add(energy, 1/symmetry) {
					return false
				}
			}
			set.endRun()
		}
	}
	set.truncated = true
	for i := range set.energy {
		set.energy[i] -= lowest
	}
	return true
}

// hinderedClass puts those energies into the set's diagonal that grow out of
// the free rotations m = class + fold l, |l| <= last, of the infinitely many
// that the barrier mixes. Up to there m passes fold/2 (20 sqrt(q) + 40), q =
// V/(B fold²); the matrix goes on for 40 rows on each side, through which the
// levels that are kept mix by less than (V/4)^40 over the product of as many
// energy differences. Its size depends on the constants alone, so that a level
// has the same bits at every temperature.
func hinderedClass(set *levelSet, class, fold, barrier, b float64) (last float64, ok bool) {
	q := barrier / float64(b*float64(fold*fold))
	last = math.Ceil(float64(10*math.Sqrt(q))) + 20
	most := last + 40
	if !(float64(2*most)+1 <= mostRows) {
		set.tooMany = true
		return 0, false
	}
	set.diagonal, set.side = set.diagonal[:0], set.side[:0]
	for l := -most; l <= most; l++ {
		m := class + float64(fold*l)
		set.diagonal = append(set.diagonal, float64(b*float64(m*m))+float64(0.5*barrier))
		if l < most {
			set.side = append(set.side, -float64(0.25*barrier))
		}
	}
	ok = tridiagonalEigenvalues(set.diagonal, set.side)
	// |class| is at most fold/2, so that the lowest 2 last + 1 are those of
	// l = -last ... last.
	set.diagonal = set.diagonal[:int(2*last)+1]
	return last, ok
}

// fastRotation gives the energy of a rotation m far above the barrier: with r =
// 2m/fold, Mathieu's characteristic value r² + q²/(2(r² - 1)) + (5r² + 7)
// q⁴/(32 (r² - 1)³ (r² - 4)) + ... (Abramowitz, Stegun, 20.2.26); for r beyond
// 20 sqrt(q) + 40 the next term, 9 q⁶/(64 r^10), is below 1e-15 of it.
func fastRotation(m, fold, barrier, b float64) float64 {
	q := barrier / float64(b*float64(fold*fold))
	r := float64(2*m) / fold
	square := float64(r * r)
	less := square - 1
	second := float64(q*q) / float64(2*less)
	fourth := float64(float64(float64(q*q)/float64(less*less))*float64(q*q)) * (float64(5*square) + 7) / float64(float64(32*less)*(square-4))
	return float64(float64(b*float64(fold*fold))*0.25*(square+second+fourth)) + float64(0.5*barrier)
}

// besselRatio gives I_1(u)/I_0(u), and ln I_0(u) - u.
func besselRatio(u float64) (ratio, ln float64) {
	if u > 25 {
		// Hankel's expansion (Abramowitz, Stegun 9.7.1), whose terms fall to
		// exp(-2u): (-1)^k (4n² - 1)(4n² - 9) .../(k! (8u)^k).
		series := func(four float64) float64 {
			sum, term := 1.0, 1.0
			for k := 1.0; k < 40; k++ {
				odd := float64(2*k) - 1
				term = float64(term * (-(four - float64(odd*odd)) / float64(k*float64(8*u))))
				sum += term
				if math.Abs(term) < 1e-18 {
					break
				}
			}
			return sum
		}
		zero := series(0)
		return series(4) / zero, column.Ln(zero) - float64(0.5*column.Ln(float64(2*math.Pi*u)))
	}
	// I_n(u) = sum of (u/2)^(2k + n)/(k! (k + n)!), all terms above 0.
	quarter := float64(0.25 * float64(u*u))
	zero, one, a, c := 1.0, 1.0, 1.0, 1.0
	for k := 1.0; k < 200; k++ {
		a = float64(a * (quarter / float64(k*k)))
		c = float64(c * (quarter / float64(k*(k+1))))
		zero += a
		one += c
		if a < 1e-18*zero {
			break
		}
	}
	return float64(0.5*u) * one / zero, column.Ln(zero) - u
}

var classicalHinderedRotorLaw = &law.Law{
	Name:  "classical_hindered_rotor",
	Group: group,
	Gives: "a molar thermodynamic function of an internal rotation with a barrier, in the classical limit",
	Parameters: []law.Parameter{
		{Name: "barrier", Meaning: "height of the barrier, " + asLevelEnergy, Unit: "J", Finite: law.AtLeast(0), Accepts: levelEnergies()},
		temperatureParameter(),
		{Name: "function", Meaning: "the heat capacity, the mean energy over T, or the entropy that the barrier takes from free rotation", Type: law.Text, Default: `"heat capacity"`,
			Choices: []string{"heat capacity", "energy over T", "entropy lost"}},
	},
	Result:   law.Result{Unit: "J/(mol K)"},
	Equation: "u = V/(2 R T), r = I_1(u)/I_0(u): U/(R T) = 1/2 + u (1 - r); C/R = 1/2 + u^2 (1 - r/u - r^2); (S_free - S)/R = 1/2 - (ln I_0(u) - u) - U/(R T)",
	Source:   "Pitzer K.S., Gwinn W.D. (1942) J. Chem. Phys. 10, 428",
	Caution:  "The limit of a large moment of inertia; where k_B T is not large against the level distance use hindered_rotor.",
	Examples: []law.Example{
		{Formula: "classical_hindered_rotor(3000[K], 1000[K]) / nature.R", Gives: "1.05621"},
		{Formula: `classical_hindered_rotor(3000[K], 1000[K], function: "entropy lost") / nature.R`, Gives: "0.395412"},
	},
	Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
		function := arguments[2].Text
		for i := range dst {
			u := float64(0.5*arguments[0].At(i)) * inverseOf(arguments[1].At(i))
			if !(u >= 0 && u < 1e9) {
				dst[i] = notANumber
				continue
			}
			r, ln := besselRatio(u)
			energy := 0.5 + float64(u*(1-r))
			value := energy
			switch function {
			case "heat capacity":
				value = 0.5 + (float64(float64(u*u)*(1-float64(r*r))) - float64(u*r))
			case "entropy lost":
				value = 0.5 - ln - energy
			}
			dst[i] = float64(nature.MolarGasConstant * value)
		}
	},
}
