package plan

import (
	"math"
	"sync/atomic"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/rows"
)

// runOne evaluates a single row the quick way. It gives false where something
// may not be sound, or the input does not fit; the row is then run with care.
func (p *Program) runOne(in rows.Input, out *rows.Outcome) bool {
	if len(in.Values) > len(p.knowns) {
		return false
	}
	if !p.single.busy.CompareAndSwap(0, 1) {
		return false
	}
	w := p.single.w
	if w == nil {
		w = p.newWorker(p.schedule(p.noColumns()))
		p.single.w = w
	}
	if len(w.touched) > 0 {
		w.release(0)
	}
	sound := w.quickSingles(in.Values)
	if sound {
		out.Resize(len(p.outputs), 1)
		single, results := w.single, out.Values
		for e, slot := range p.outputs {
			results[e][0] = single[slot]
		}
	}
	p.single.busy.Store(0)
	return sound
}

// oneRow is the worker of runs of one row; the first to come takes it.
type oneRow struct {
	busy atomic.Int32
	w    *worker
}

// singleKnown sets a known that serves all rows.
func (w *worker) singleKnown(k, slot int, values [][]float64) {
	w.single[slot] = w.p.knowns[k].Value // NaN where it has none
	if len(values) > k && len(values[k]) == 1 {
		w.single[slot] = values[k][0]
	}
}

// quickSingles computes what no row changes as if all of it were sound. It
// gives false where something may not be; it is then computed with care.
func (w *worker) quickSingles(values [][]float64) bool {
	for k, slot := range w.p.inputs {
		if slot < 0 || w.s.vary[slot] {
			continue
		}
		known := &w.p.knowns[k]
		value := known.Value
		if k < len(values) && len(values[k]) > 0 {
			if len(values[k]) > 1 {
				return false // of another length than the run
			}
			value = values[k][0]
		}
		w.single[slot] = value
		if !(value >= known.Low && value <= known.High) {
			return false
		}
		if known.listed() {
			w.checkChoice(k, slot, 1)
			if w.status[slot] != nil {
				return false
			}
		}
	}
	return w.quickSlots(w.s.once)
}

// quickSlots computes slots of single numbers in turn, all that they read being
// sound. It gives false where a result may not be.
func (w *worker) quickSlots(slots []int) bool {
	single, all := w.single, w.p.slots
	for _, i := range slots {
		s := &all[i]
		// The usual steps first: a switch asks several times.
		if s.op == formula.Mul {
			single[i] = float64(single[s.a] * single[s.b])
			continue
		}
		if s.op == formula.Entry {
			single[i] = single[s.a]
			if !column.Finite(single[i]) {
				return false
			}
			continue
		}
		switch s.op {
		case formula.Add:
			single[i] = single[s.a] + single[s.b]
			continue
		case formula.Sub:
			single[i] = single[s.a] - single[s.b]
			continue
		case formula.Div:
			single[i] = single[s.a] / single[s.b]
		case formula.Apply:
			if !w.singleLaw(i, s) {
				return false
			}
			continue
		case formula.Same:
			single[i] = single[s.a]
		case formula.Guard:
			single[i] = single[s.a]
			if single[s.b] != 1 {
				return false
			}
			continue
		case formula.Select:
			// Only the branch that is taken must be sound, which care finds out.
			switch single[s.a] {
			case 1:
				single[i] = single[s.b]
			case 0:
				single[i] = single[s.args[2]]
			default:
				return false
			}
			continue
		case formula.Exp:
			single[i] = column.Exp(single[s.a])
		default:
			single[i] = w.computeSingle(s)
		}
		if s.risk != 0 && !column.Finite(single[i]) {
			return false
		}
	}
	return true
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
