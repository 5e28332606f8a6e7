package plan

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/rows"
)

// singleKnown sets a known that serves all rows and gives its number.
func (w *worker) singleKnown(k, slot int, in rows.Input) float64 {
	known := &w.p.knowns[k]
	value := known.Value
	if !known.HasValue {
		value = math.NaN()
	}
	if len(in.Values) > k && len(in.Values[k]) == 1 {
		value = in.Values[k][0]
	}
	w.single[slot] = value
	return value
}

// quickSingles computes what no row changes as if all of it were sound. It
// gives false where something may not be; it is then computed with care.
func (w *worker) quickSingles(in rows.Input) bool {
	for k := range w.p.knowns {
		slot := w.p.inputs[k]
		if slot < 0 || w.s.vary[slot] {
			continue
		}
		known := &w.p.knowns[k]
		value := w.singleKnown(k, slot, in)
		if !column.Finite(value) || known.HasRange && (value < known.Low || value > known.High) {
			return false
		}
		if known.Choices > 0 || known.Truth {
			w.checkChoice(k, slot, 1)
			if w.status[slot] != nil {
				return false
			}
		}
	}
	for _, i := range w.s.once {
		if !w.quickSingle(i) {
			return false
		}
	}
	return true
}

// quickSingle computes one slot of single numbers, all that it reads being
// sound. It gives false where the result may not be.
func (w *worker) quickSingle(i int) bool {
	s := &w.p.slots[i]
	switch s.op {
	case formula.Add:
		w.single[i] = w.single[s.args[0]] + w.single[s.args[1]]
		return true
	case formula.Sub:
		w.single[i] = w.single[s.args[0]] - w.single[s.args[1]]
		return true
	case formula.Mul:
		w.single[i] = float64(w.single[s.args[0]] * w.single[s.args[1]])
		return true
	case formula.Div:
		w.single[i] = w.single[s.args[0]] / w.single[s.args[1]]
	case formula.Apply:
		return w.singleLaw(i, s)
	case formula.Same, formula.Entry:
		w.single[i] = w.single[s.args[0]]
	case formula.Guard:
		w.single[i] = w.single[s.args[0]]
		return w.single[s.args[1]] == 1
	case formula.Select:
		// Only the branch that is taken must be sound, which care finds out.
		switch w.single[s.args[0]] {
		case 1:
			w.single[i] = w.single[s.args[1]]
		case 0:
			w.single[i] = w.single[s.args[2]]
		default:
			return false
		}
		return true
	default:
		w.single[i] = w.computeSingle(s)
	}
	return s.risk == 0 || column.Finite(w.single[i])
}

// singleLaw runs a law for single numbers.
func (w *worker) singleLaw(i int, s *slot) bool {
	for k := range s.checks {
		c := &s.checks[k]
		if x := w.single[c.slot]; !(x >= c.low && x <= c.high) {
			return false
		}
	}
	c := &w.calls[i]
	for _, p := range c.pointers {
		p.argument.Values = w.single[p.slot : p.slot+1 : p.slot+1]
	}
	s.law.Body(w.single[i:i+1:i+1], c.arguments, &c.work)
	return column.Finite(w.single[i])
}

// computeSingle computes one arithmetic step of single numbers, with the bits
// of the column kernels.
func (w *worker) computeSingle(s *slot) float64 {
	a := w.single[s.args[0]]
	switch s.op {
	case formula.Neg:
		return -a
	case formula.Exp:
		return column.Exp(a)
	case formula.Ln:
		return column.Ln(a)
	case formula.Sqrt:
		return math.Sqrt(a)
	case formula.Pow:
		return column.Pow(a, w.single[s.args[1]])
	}
	var dst [1]float64
	var b []float64
	if len(s.args) > 1 {
		b = w.single[s.args[1] : s.args[1]+1]
	}
	compute(s.op, dst[:], w.single[s.args[0]:s.args[0]+1], b, nil)
	return dst[0]
}
