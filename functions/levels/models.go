package levels

import (
	"math"

	"plumbrule/engine/column"
)

// oscillatorQuantity gives a quantity of a harmonic oscillator whose levels lie
// x = h c w/(k_B T) apart, in closed form. The sum over v is a geometric one:
// Q = 1/(1 - exp(-x)).
func oscillatorQuantity(x float64, want quantity) float64 {
	if !(x > 0) {
		return notANumber
	}
	gap := -column.Expm1(-x) // 1 - exp(-x), all digits of it
	switch want {
	case partition:
		return 1 / gap
	case meanLevel: // x/(exp(x) - 1)
		return float64(x*column.Exp(-x)) / gap
	case variance: // x² exp(x)/(exp(x) - 1)²
		root := x / gap
		return float64(float64(root*root) * column.Exp(-x))
	}
	// x/(exp(x) - 1) - ln(1 - exp(-x)), or the logarithm alone
	fall := column.Exp(-x)
	mean := 0.0
	if want == entropic {
		mean = float64(x*fall) / gap
	}
	if fall < 0.5 {
		return mean - column.Log1p(-fall)
	}
	return mean - column.Ln(gap)
}

// oscillatorOccupancy gives the share of level v: (1 - exp(-x)) exp(-v x).
func oscillatorOccupancy(x, v float64) float64 {
	if !(x > 0) || !wholeNumber(v) {
		return notANumber
	}
	return float64(-column.Expm1(-x) * column.Exp(float64(-v*x)))
}

// wholeNumber says whether n counts a level: 0, 1, 2, ...
func wholeNumber(n float64) bool { return n >= 0 && n == math.Floor(n) }

// The sums of the linear rigid rotor, a = B/(k_B T) > 0:
//
//	Q(a) = sum over J = 0, 1, 2, ... of (2J + 1) exp(-a J(J + 1)).
//
// Warm rotors have too many levels to add up; cold ones have few. Both ways end
// in a bound of what is left out.
//
// Direct sum, a >= warmRotor. With x = a y(y + 1) the terms are t(y) = (2y + 1)
// x^k exp(-x), k = 0, 1, 2 for the sum and its two moments. From level N on,
// where a N(N + 1) >= 52, they fall with y (dt/dy < 0 once (2y + 1)² a (1 - k/x)
// > 2, and (2N + 1)² a > 4 x_N >= 208), so the rest after the levels below N is
// at most t(N) plus the integral of t from N on,
//
//	(2N + 1) x^k exp(-x) + (1/a) (x^k + k x^(k-1) + k(k - 1) x^(k-2)) exp(-x), x = a N(N + 1).
//
// At a = 0.01, N is 72, x is 52.6, and for k = 2 this is 1.1e-17, while the
// moment itself is 200. In the cold the moments are as small as their first
// term, 3 (2a)^k exp(-2a): the limit is therefore x - 2a >= 52, counted from
// the level J = 1. Over all a >= 0.01 what is left out is below 1e-18 of each
// of the three sums.
//
// Euler-Maclaurin sum, a < warmRotor. Q(a) = exp(a/4) S(a), S(a) = sum of
// f(J + 1/2), f(m) = 2 m exp(-a m²). The Euler-Maclaurin formula at midpoints
// with the derivatives of f at 0 gives Mulholland's series
//
//	a S(a) = 1 + c_1 a + c_2 a² + ... + c_8 a^8 + a R, c_k = |B_2k(1/2)|/k!,
//	|R| <= |B_16|/16! times the integral of |f^(16)| over m > 0.
//
// With u = sqrt(a) m, f^(16) = a^(15/2) H_17(u) exp(-u²), and by Cramér's bound
// |H_n(u)| exp(-u²/2) < 1.0865 (2^n n!)^(1/2) the integral is below 9.3e9 a^7;
// |B_16|/16! = 3.4e-13. Hence |a R| < 3.2e-3 a^8 < 3.2e-19 for a < 0.01. The
// same bound for the two derivatives by a, with u H_18 and u² H_19 in place of
// H_17, leaves |a² R'| < 0.04 a^8 and |a³ R"| < 0.3 a^8 < 3e-17. No term is cut
// silently, and no rotor has more than 80 terms.
const warmRotor = 0.01

// What the direct sum leaves out lies below exp(-rotorReach) of its first
// excited term.
const rotorReach = 52.0

// mostRotorTerms bounds the direct sum: a N(N + 1) = 52 + 2a at a = 0.01.
const mostRotorTerms = 80

// Coefficients c_k of Mulholland's series: B_2k(1/2) = -(1 - 2^(1 - 2k)) B_2k,
// B_2 to B_16 = 1/6, -1/30, 1/42, -1/30, 5/66, -691/2730, 7/6, -3617/510.
const (
	rotor1 = (1 - 1.0/2) / 6
	rotor2 = (1 - 1.0/8) / 30 / 2
	rotor3 = (1 - 1.0/32) / 42 / 6
	rotor4 = (1 - 1.0/128) / 30 / 24
	rotor5 = (1 - 1.0/512) * 5 / 66 / 120
	rotor6 = (1 - 1.0/2048) * 691 / 2730 / 720
	rotor7 = (1 - 1.0/8192) * 7 / 6 / 5040
	rotor8 = (1 - 1.0/32768) * 3617 / 510 / 40320
)

// polynomial sums c[0] + c[1] x + c[2] x² + ... with every product rounded.
func polynomial(x float64, c ...float64) float64 {
	sum := 0.0
	for i := len(c) - 1; i >= 0; i-- {
		sum = float64(sum*x) + c[i]
	}
	return sum
}

// rotorQuantity gives a quantity of a rigid rotor with a = B/(k_B T) and a
// symmetry number.
func rotorQuantity(a, symmetry float64, want quantity) float64 {
	if !(a > 0) || !(symmetry > 0) {
		return notANumber
	}
	if a < warmRotor {
		return warmQuantity(a, symmetry, want)
	}
	return coldQuantity(a, symmetry, want)
}

// warmQuantity uses Mulholland's series: with s = c_1 a + c_2 a² + ...,
// ln Q = a/4 - ln a + ln(1 + s), mean = -a d ln Q/da, variance = a² d² ln Q/da².
func warmQuantity(a, symmetry float64, want quantity) float64 {
	s := float64(a * polynomial(a, rotor1, rotor2, rotor3, rotor4, rotor5, rotor6, rotor7, rotor8))
	if want == partition {
		return float64(column.Exp(a/4)*(1+s)) / float64(a*symmetry)
	}
	if want == logarithm {
		return float64(a/4) - column.Ln(a) + column.Log1p(s) - column.Ln(symmetry)
	}
	slope := polynomial(a, rotor1, 2*rotor2, 3*rotor3, 4*rotor4, 5*rotor5, 6*rotor6, 7*rotor7, 8*rotor8) / (1 + s)
	if want == variance {
		bend := polynomial(a, 2*rotor2, 6*rotor3, 12*rotor4, 20*rotor5, 30*rotor6, 42*rotor7, 56*rotor8) / (1 + s)
		return 1 + float64(float64(a*a)*(bend-float64(slope*slope)))
	}
	mean := 1 - float64(a*(0.25+slope))
	if want == meanLevel {
		return mean
	}
	return mean + float64(a/4) - column.Ln(a) + column.Log1p(s) - column.Ln(symmetry)
}

// coldQuantity adds the levels up.
func coldQuantity(a, symmetry float64, want quantity) float64 {
	var reduced, weight [mostRotorTerms]float64
	weight[0] = 1
	var excited, moment total // of all levels but J = 0
	n := 1
	for ; n < mostRotorTerms; n++ {
		j := float64(n)
		x := float64(a * float64(j*(j+1)))
		if n > 1 && x-float64(2*a) >= rotorReach {
			break
		}
		w := float64((float64(2*j) + 1) * column.Exp(-x))
		reduced[n], weight[n] = x, w
		excited.add(w)
		moment.add(float64(x * w))
	}
	sum := 1 + excited.value()
	mean := moment.value() / sum
	switch want {
	case partition:
		return sum / symmetry
	case meanLevel:
		return mean
	case entropic:
		return column.Log1p(excited.value()) + mean - column.Ln(symmetry)
	case logarithm:
		return column.Log1p(excited.value()) - column.Ln(symmetry)
	}
	var square total
	for i := range n {
		d := reduced[i] - mean
		square.add(float64(weight[i] * float64(d*d)))
	}
	return square.value() / sum
}

// rotorOccupancy gives the share of level J, from which the symmetry number
// cancels.
func rotorOccupancy(a, j float64) float64 {
	if !wholeNumber(j) {
		return notANumber
	}
	x := float64(a * float64(j*(j+1)))
	return float64((float64(2*j)+1)*column.Exp(-x)) / rotorQuantity(a, 1, partition)
}
