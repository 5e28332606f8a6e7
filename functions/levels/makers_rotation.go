package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// rotation gives B J(J + 1) - D (J(J + 1))^2.
func rotation(j, b, d float64) float64 {
	x := float64(j * (j + 1))
	return float64(x * (b - float64(d*x)))
}

// addRotations adds the levels J = 0, 1, 2, ... of one state while they rise,
// up to top and to the set's ceiling, as one run. Even and odd J have weights
// of their own; those of weight 0 do not exist. The centrifugal constant d
// lessens with J where yielding is above 0.
func addRotations(set *levelSet, base, b, d, yielding, even, odd, top, ceiling float64) bool {
	last := math.Inf(-1)
	for j := 0.0; ; j++ {
		turn := rotation(j, b, lessened(d, yielding, float64(j*(j+1))))
		energy := base + turn
		if !(turn > last) || energy > top {
			break
		}
		if energy > ceiling {
			set.truncated = true
			break
		}
		weight := even
		if math.Floor(j/2) != j/2 {
			weight = odd
		}
		if weight != 0 && !set.add(energy, float64((float64(2*j)+1)*weight)) {
			return false
		}
		last = turn
	}
	set.endRun()
	return true
}

func buildRotor(set *levelSet, _ []law.Argument, numbers []float64) bool {
	b, symmetry, d := numbers[0], numbers[1], 0.0
	if len(numbers) > 2 {
		d = numbers[2]
	}
	if !(b > 0) || !(symmetry > 0) || !(d >= 0) {
		return false
	}
	return addRotations(set, 0, b, d, 0, 1/symmetry, 1/symmetry, math.Inf(1), set.ceiling(float64(2*b)))
}

var spinRotorLaw = &law.Law{
	Name:  "spin_rotor",
	Group: group,
	Gives: "the ladder of a linear rotor with two equal nuclei, with the weights of their spins",
	Parameters: []law.Parameter{
		positiveConstant("B", "rotational constant"),
		{Name: "nuclear_spin", Meaning: "spin I of one nucleus: 1/2 for hydrogen, 1 for deuterium and nitrogen-14, 0 for oxygen-16", Unit: "1", Finite: law.Within(0, 20)},
		{Name: "species", Meaning: "all levels, or those of one species: ortho has the greater weight, para the smaller", Type: law.Text, Default: `"all"`, Choices: []string{"all", "ortho", "para"}},
		constantParameter("D", "centrifugal constant", "0[J]"),
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_J = B J(J + 1) - D (J(J + 1))^2 while it rises, from J = 0 in every species; g_J = (2J + 1) w; half-integer I: w = I(2I + 1) for even J, (I + 1)(2I + 1) for odd J; integer I: the other way round",
	Source:   "Dennison D.M. (1927) Proc. Roy. Soc. A 115, 483; Herzberg G. (1950) Spectra of Diatomic Molecules, 2nd ed., chapter III",
	Caution: "For a ground state 1Sigma_g+ (hydrogen, nitrogen); oxygen has only odd levels. \"all\" is the equilibrium of both species, which takes days without a catalyst. " +
		"The nuclear spins are counted in full: divide the sum by (2I + 1)^2 to leave them out. " + noLevels,
	Refusal: "twice the spin is no whole number; or para is asked for where I = 0, which has none",
	Examples: []law.Example{
		{Formula: "partition_sum(spin_rotor(87.6[K], 0.5, species: \"para\"), 1[K])", Gives: "1"},
	},
}

func buildSpinRotor(set *levelSet, items []law.Argument, numbers []float64) bool {
	b, spin, d := numbers[0], numbers[1], numbers[2]
	twice := float64(2 * spin)
	if !(b > 0) || !wholeNumber(twice) || !(d >= 0) {
		return false
	}
	even, odd := spinWeights(spin, items[2].Text)
	return addRotations(set, 0, b, d, 0, even, odd, math.Inf(1), set.ceiling(float64(12*b)))
}

// spinWeights gives the weights of even and odd J of a species.
func spinWeights(spin float64, species string) (even, odd float64) {
	twice := float64(2 * spin)
	few, many := float64(spin*(twice+1)), float64((spin+1)*(twice+1))
	switch species {
	case "ortho":
		few = 0
	case "para":
		many = 0
	}
	if wholeNumber(spin) {
		return many, few
	}
	return few, many
}

var symmetricTopLaw = &law.Law{
	Name:  "symmetric_top",
	Group: group,
	Gives: "the ladder of a rigid symmetric or spherical top, counted from J = 0",
	Parameters: []law.Parameter{
		positiveConstant("A", "rotational constant about the axis of symmetry (A of a prolate, C of an oblate top)"),
		positiveConstant("B", "rotational constant about the other two axes"),
		{Name: "symmetry", Meaning: "symmetry number: 3 for ammonia, 12 for methane", Unit: "1", Finite: law.Above(0), Default: "1"},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E_JK = B J(J + 1) + (A - B) K^2, g_JK = (2J + 1)/symmetry for K = 0, twice that for K = 1 ... J",
	Source: "Dennison D.M. (1926) Phys. Rev. 28, 318; Herzberg G. (1945) Infrared and Raman Spectra of Polyatomic Molecules, chapter I; " +
		"warm tops: McDowell R.S. (1990) J. Chem. Phys. 93, 2801",
	Caution: "The symmetry number stands for the weights of nuclear spin: good where k_B T is large against B, wrong in the cold.",
	Examples: []law.Example{
		{Formula: "partition_sum(symmetric_top(1[K], 1[K]), 1e6[K])", Gives: "1.7724543e9"},
	},
}

// buildSymmetricTop adds a run for each K. The lowest level of K, J = K, lies at
// K (A K + B), which rises with K.
func buildSymmetricTop(set *levelSet, _ []law.Argument, numbers []float64) bool {
	a, b, symmetry := numbers[0], numbers[1], numbers[2]
	if !(a > 0) || !(b > 0) || !(symmetry > 0) {
		return false
	}
	ceiling := set.ceiling(float64(2 * b))
	for k := 0.0; ; k++ {
		states := 2 / symmetry
		if k == 0 {
			states = 1 / symmetry
		}
		for j := k; ; j++ {
			energy := float64(b*float64(j*(j+1))) + float64((a-b)*float64(k*k))
			if energy > ceiling {
				set.truncated = true
				if j == k {
					return true
				}
				break
			}
			if !set.add(energy, float64((float64(2*j)+1)*states)) {
				return false
			}
		}
		set.endRun()
	}
}

// warmTop gives a quantity of a symmetric top with a = A/(k_B T) and
// b = B/(k_B T) < warmRotor. Summed by the Euler-Maclaurin formula over J from
// K, each term is then a sum over K of a Gauss function times a polynomial,
// which is its integral to within exp(-pi^2/a):
//
//	Q = exp(b/4) sqrt(pi/a)/b (1 + c_1 y + c_2 y² + ...), y = b (1 - b/a),
//
// with the coefficients of Mulholland's series for the linear rotor. For tops,
// a >= b/2, y is at most b and the remainder is that of the linear rotor.
func warmTop(a, b, symmetry float64, want quantity) (value float64, ok bool) {
	if !(b > 0 && b < warmRotor && a >= b/2 && a < 0.2 && symmetry > 0) {
		return 0, false
	}
	y := float64(b * (1 - b/a))
	s := float64(y * polynomial(y, rotor1, rotor2, rotor3, rotor4, rotor5, rotor6, rotor7, rotor8))
	if want == partition {
		return float64(column.Exp(b/4)*math.Sqrt(math.Pi/a)) * (1 + s) / float64(b*symmetry), true
	}
	ln := 0.0
	if want == logarithm || want == entropic {
		ln = float64(b/4) + float64(0.5*column.Ln(math.Pi/a)) - column.Ln(b) + column.Log1p(s) - column.Ln(symmetry)
	}
	slope := polynomial(y, rotor1, 2*rotor2, 3*rotor3, 4*rotor4, 5*rotor5, 6*rotor6, 7*rotor7, 8*rotor8) / (1 + s)
	mean := 1.5 - float64(b/4) - float64(y*slope)
	switch want {
	case logarithm:
		return ln, true
	case meanLevel:
		return mean, true
	case entropic:
		return ln + mean, true
	}
	bend := polynomial(y, 2*rotor2, 6*rotor3, 12*rotor4, 20*rotor5, 30*rotor6, 42*rotor7, 56*rotor8) / (1 + s)
	return 1.5 + float64(float64(y*y)*(bend-float64(slope*slope))), true
}

var vibratingRotorLaw = &law.Law{
	Name:  "vibrating_rotor",
	Group: group,
	Gives: "the ladder of a diatomic molecule that vibrates and rotates: its bound levels, counted from v = 0, J = 0",
	Parameters: []law.Parameter{
		positiveConstant("we", "vibrational constant"),
		constantParameter("wexe", "first anharmonicity constant", ""),
		positiveConstant("Be", "rotational constant at the minimum of the potential"),
		constantParameter("alpha_e", "change of the rotational constant with v", ""),
		constantParameter("De", "centrifugal constant; 0 stands for Kratzer's 4 Be^3/we^2", "0[J]"),
		constantParameter("weye", "second anharmonicity constant", "0[J]"),
		constantParameter("gamma_e", "second change of the rotational constant with v", "0[J]"),
		constantParameter("beta_e", "change of the centrifugal constant with v", "0[J]"),
		constantParameter("dissociation", "dissociation energy from v = 0, J = 0; 0 where levels end only as they cease to rise", "0[J]"),
		{Name: "even", Meaning: "weight of even J: 1/2 with odd 1/2 for a symmetry number of 2, or the weights of nuclear spin", Unit: "1", Finite: law.AtLeast(0), Default: "1"},
		{Name: "odd", Meaning: "weight of odd J", Unit: "1", Finite: law.AtLeast(0), Default: "1"},
	},
	Result: law.Result{Type: law.Made, Made: madeLadder},
	Equation: "E(v, J) = G(v) - G(0) + B_v J(J + 1) - D_v (J(J + 1))^2, G(v) = we (v + 1/2) - wexe (v + 1/2)^2 + weye (v + 1/2)^3, " +
		"B_v = Be - alpha_e (v + 1/2) + gamma_e (v + 1/2)^2, D_v = De + beta_e (v + 1/2); v while G rises, J while E rises, both up to the dissociation energy; g = (2J + 1) times the weight",
	Source:  herzberg + "; centrifugal constant: Kratzer A. (1920) Z. Phys. 3, 289",
	Caution: "Near dissociation the formulas overshoot: good to about a twentieth of the dissociation energy over k_B. " + noLevels,
	Examples: []law.Example{
		{Formula: "partition_sum(vibrating_rotor(2169.7559[cm^-1], 13.28803[cm^-1], 1.9316023[cm^-1], 0.01750513[cm^-1], De: 6.12147e-6[cm^-1], weye: 0.0104109[cm^-1], dissociation: 11.117[eV]), 296[K])", Gives: "107.4"},
	},
}

func buildVibratingRotor(set *levelSet, _ []law.Argument, numbers []float64) bool {
	state, top := stateOf(numbers[0], numbers[1], numbers[2], numbers[3], numbers[4], numbers[5],
		numbers[6], numbers[7], numbers[8], numbers[9], numbers[10])
	return state.add(set, 0, top)
}

// stateOf gives the state of a vibrating rotor's arguments and its dissociation
// energy, infinite where none is told.
func stateOf(we, wexe, be, alpha, de, weye, gamma, beta, dissociation, even, odd float64) (state electronicState, top float64) {
	if top = dissociation; !(top > 0) {
		top = math.Inf(1)
	}
	return electronicState{
		we: we, wexe: wexe, be: be, alpha: alpha, de: de,
		weye: weye, gamma: gamma, beta: beta, even: even, odd: odd,
	}, top
}

// electronicState holds the constants of one electronic state of a diatomic
// molecule, all energies in J.
type electronicState struct {
	we, wexe, weye   float64
	be, alpha, gamma float64
	de, beta, third  float64 // third: of (J(J + 1))^3, known to gases alone
	even, odd        float64 // weights of even and odd J
	mostVibration    float64 // bound of G(v) - G(0); 0: the dissociation energy alone
}

// add adds the levels of the state, the lowest of which lies base above the
// zero, up to top above the zero.
func (e *electronicState) add(set *levelSet, base, top float64) bool {
	if !(e.we > 0) || !(e.be > 0) || !(e.even >= 0) || !(e.odd >= 0) || e.even+e.odd == 0 {
		return false
	}
	ceiling := set.ceiling(float64(12 * e.be))
	last := math.Inf(-1)
	for v := 0.0; ; v++ {
		swing := vibration(v, e.we, e.wexe, e.weye)
		if !(swing > last) || base+swing > top || e.mostVibration > 0 && swing > e.mostVibration {
			return true
		}
		if base+swing > ceiling {
			set.truncated = true
			return true
		}
		b, d := e.turning(v)
		if !addRotations(set, base+swing, b, d, e.yielding(d), e.even, e.odd, top, ceiling) {
			return false
		}
		last = swing
	}
}

// turning gives the rotational and the centrifugal constant of a vibrational
// level.
func (e *electronicState) turning(v float64) (b, d float64) {
	d = e.de
	if d == 0 {
		d = float64(4*float64(e.be*float64(e.be*e.be))) / float64(e.we*e.we)
	}
	half := v + 0.5
	return e.be - float64(half*(e.alpha-float64(e.gamma*half))), d + float64(e.beta*half)
}
