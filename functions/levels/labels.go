package levels

import (
	"strconv"
	"strings"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// quantumNumbers are those that a label names; the others are unknown.
type quantumNumbers struct {
	v, j, k, n, m                     float64
	hasV, hasJ, hasK, hasN, hasM, any bool
}

// readQuantumNumbers reads "v=1 J=3" or "m=-1/2".
func readQuantumNumbers(label string) (q quantumNumbers, ok bool) {
	for _, part := range strings.FieldsFunc(label, func(r rune) bool { return r == ' ' || r == ',' }) {
		name, value, found := strings.Cut(part, "=")
		x, err := readHalf(value)
		if !found || err {
			return q, false
		}
		switch name {
		case "v":
			q.v, q.hasV = x, true
		case "J":
			q.j, q.hasJ = x, true
		case "K":
			q.k, q.hasK = x, true
		case "n":
			q.n, q.hasN = x, true
		case "m":
			q.m, q.hasM = x, true
		default:
			return q, false
		}
		q.any = true
	}
	return q, q.any
}

// readHalf reads a number or one over two.
func readHalf(text string) (x float64, bad bool) {
	over, halved := strings.CutSuffix(text, "/2")
	x, err := strconv.ParseFloat(over, 64)
	if halved {
		x /= 2
	}
	return x, err != nil || x-x != 0
}

// has says whether just the given numbers are named.
func (q *quantumNumbers) has(v, j, k, n, m bool) bool {
	return q.hasV == v && q.hasJ == j && q.hasK == k && q.hasN == n && q.hasM == m
}

// levelByNumbers gives energy (in J, from the maker's zero) and states of the
// level of a mode with given quantum numbers.
func levelByNumbers(mode *law.Argument, row int, q *quantumNumbers) (energy, states float64, ok bool) {
	at := func(i int) float64 { return mode.Items[i].At(row) }
	justV := q.has(true, false, false, false, false) && wholeNumber(q.v)
	justJ := q.has(false, true, false, false, false) && wholeNumber(q.j)
	switch mode.Maker {
	case oscillatorLaw:
		return float64(q.v * at(0)), 1, justV
	case anharmonicOscillatorLaw:
		return vibration(q.v, at(0), at(1), at(2)), 1, justV && risesTo(q.v, at(0), at(1), at(2), at(3))
	case morseLaw:
		wexe := float64(at(1)*at(1)) / float64(4*at(0))
		return vibration(q.v, at(1), wexe, 0), 1, justV && q.v < float64(2*at(0))/at(1)-0.5
	case rotorLaw:
		d := 0.0
		if len(mode.Items) > 2 {
			d = at(2)
		}
		return rotation(q.j, at(0), d), (float64(2*q.j) + 1) / at(1), justJ && turnsTo(q.j, at(0), d)
	case spinRotorLaw:
		return spinRotorLevel(mode, row, q.j, justJ)
	case symmetricTopLaw:
		double := 2.0
		if q.k == 0 {
			double = 1
		}
		fits := q.has(false, true, true, false, false) && wholeNumber(q.j) && wholeNumber(q.k) && q.k <= q.j
		return float64(at(1)*float64(q.j*(q.j+1))) + float64((at(0)-at(1))*float64(q.k*q.k)),
			double * (float64(2*q.j) + 1) / at(2), fits
	case hydrogenLikeLaw:
		const rydberg = nature.RydbergConstant * nature.PlanckConstant * nature.SpeedOfLight
		bound := float64(rydberg*float64(at(0)*at(0))) / (1 + nature.ElectronMass/at(2))
		square := float64(q.n * q.n)
		fits := q.has(false, false, false, true, false) && wholeNumber(q.n) && q.n >= 1 && q.n <= at(1)
		return float64(bound*(square-1)) / square, 2 * square, fits
	case boxLevelsLaw:
		fits := q.has(false, false, false, true, false) && wholeNumber(q.n) && q.n >= 1
		return float64(boxUnit(at(0), at(1)) * float64((q.n-1)*(q.n+1))), 1, fits
	case vibratingRotorLaw:
		return vibratingLevel(mode, row, q)
	case spinLevelsLaw:
		spin := at(1)
		fits := q.has(false, false, false, false, true) && wholeNumber(q.m+spin) && q.m <= spin
		return float64(float64(float64(at(0)*nature.BohrMagneton)*at(2)) * q.m), 1, fits
	case nuclearSpinLevelsLaw:
		n := nucleusOf(mode.Items[0].Text)
		if n == nil {
			return 0, 0, false
		}
		moment := float64(n.magnetism*1e7) * nature.ReducedPlanckConstant
		fits := q.has(false, false, false, false, true) && wholeNumber(q.m+n.spin) && q.m <= n.spin
		return -float64(float64(moment*at(1)) * q.m), 1, fits
	}
	return 0, 0, false
}

// risesTo says whether the levels of an oscillator rise up to v.
func risesTo(v, we, wexe, weye, dissociation float64) bool {
	for u := 1.0; u <= v && u <= mostLevels; u++ {
		g := vibration(u, we, wexe, weye)
		if !(g > vibration(u-1, we, wexe, weye)) || dissociation > 0 && g > dissociation {
			return false
		}
	}
	return v <= mostLevels
}

// turnsTo says whether the levels of a stretched rotor rise up to J: from J - 1
// to J by 2J (B - 2 D J^2).
func turnsTo(j, b, d float64) bool {
	return j == 0 || b > float64(2*float64(d*float64(j*j)))
}

func spinRotorLevel(mode *law.Argument, row int, j float64, justJ bool) (energy, states float64, ok bool) {
	b, spin, d := mode.Items[0].At(row), mode.Items[1].At(row), mode.Items[3].At(row)
	even, odd := spinWeights(spin, mode.Items[2].Text)
	weight := even
	if !wholeNumber(j / 2) {
		weight = odd
	}
	return rotation(j, b, d), float64((float64(2*j) + 1) * weight), justJ && weight > 0 && turnsTo(j, b, d)
}

func vibratingLevel(mode *law.Argument, row int, q *quantumNumbers) (energy, states float64, ok bool) {
	at := func(i int) float64 { return mode.Items[i].At(row) }
	state, top := stateOf(at(0), at(1), at(2), at(3), at(4), at(5), at(6), at(7), at(8), at(9), at(10))
	if !q.has(true, true, false, false, false) || !wholeNumber(q.v) || !wholeNumber(q.j) ||
		!risesTo(q.v, state.we, state.wexe, state.weye, top) {
		return 0, 0, false
	}
	b, d := state.turning(q.v)
	energy = vibration(q.v, state.we, state.wexe, state.weye) + rotation(q.j, b, d)
	weight := state.even
	if !wholeNumber(q.j / 2) {
		weight = state.odd
	}
	return energy, float64((float64(2*q.j) + 1) * weight), energy <= top && weight > 0 && turnsTo(q.j, b, d)
}
