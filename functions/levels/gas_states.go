package levels

import "math"

// natural is the word by which the laws of gases ask for the mixture of
// isotopes found in nature; the ladder itself is that of the lightest.
const natural = "natural"

// isotopeRatio gives the root of the reduced mass of a molecule's tabulated
// isotopes over that of the natural mixture. Chlorine is the one element of
// the table whose isotopes matter: 35Cl has 34.968853 u (Wang M. et al. (2021)
// Chinese Phys. C 45, 030003), the mixture 35.453.
func isotopeRatio(name string) float64 {
	switch name {
	case "Cl2":
		return math.Sqrt(34.968853 / 35.453)
	case "HCl":
		return math.Sqrt(34.968853 / 35.453 * (35.453 + 1.00794) / (34.968853 + 1.00794))
	}
	return 1
}

// scale turns the constants into those of another isotope: each goes with its
// power of the reduced mass (Dunham J.L. (1932) Phys. Rev. 41, 721).
func (e *electronicState) scale(ratio float64) {
	square := ratio * ratio
	e.we, e.wexe, e.weye = e.we*ratio, e.wexe*square, e.weye*square*ratio
	e.be, e.alpha, e.gamma = e.be*square, e.alpha*square*ratio, e.gamma*square*square
	e.de, e.beta = e.de*square*square, e.beta*square*square*ratio
}

// stretched is the least B_e/we of a state to which stretch applies. It is that
// of molecules with hydrogen; in all others the terms lie below what their
// constants leave open.
const stretched = 1.0 / 400

// stretch completes the constants of a state by those that follow from a
// potential near its minimum: where none was measured, the change of the
// centrifugal constant with v,
//
//	beta_e = D_e (8 wexe/we - 5 alpha_e/B_e - alpha_e^2 we/(24 B_e^3))
//
// (Pekeris C.L. (1934) Phys. Rev. 45, 98), and the factor of (J(J + 1))^3,
//
//	H_e = 2 D_e/(3 we^2) (12 B_e^2 - alpha_e we)
//
// (Dunham J.L. (1932) Phys. Rev. 41, 721), both as in Herzberg G. (1950)
// Spectra of Diatomic Molecules, 2nd ed., chapter III.
func (e *electronicState) stretch() {
	if !(e.be > stretched*e.we) {
		return
	}
	_, d := (&electronicState{we: e.we, be: e.be, de: e.de}).turning(0)
	if e.beta == 0 && e.alpha != 0 {
		cube := float64(e.be * float64(e.be*e.be))
		e.beta = float64(d * (float64(8*e.wexe)/e.we - float64(5*e.alpha)/e.be - float64(float64(e.alpha*e.alpha)*e.we)/float64(24*cube)))
	}
	e.third = max(0, float64(float64(2*d)*(float64(12*float64(e.be*e.be))-float64(e.alpha*e.we)))/float64(3*float64(e.we*e.we)))
}

// yielding gives H/D, by which the centrifugal constant d lessens with J.
func (e *electronicState) yielding(d float64) float64 {
	if e.third == 0 || !(d > 0) {
		return 0
	}
	return e.third / d
}

// lessened gives the centrifugal constant at x = J(J + 1). The series
// -D x^2 + H x^3 - ... does not converge at the levels near dissociation; its
// first Padé approximant -D x^2/(1 + x H/D) stays with the levels.
func lessened(d, yielding, x float64) float64 {
	if yielding == 0 {
		return d
	}
	return d / (1 + float64(yielding*x))
}
