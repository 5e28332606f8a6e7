package plan

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/rows"
)

// quickBlock runs a block the quick way. It gives false where some row may not
// be sound; the block is then run with care. Columns are checked after they
// were used: whoever reads them first waits for memory, and arithmetic waits
// for less than a check does, since it can go on meanwhile.
func (w *worker) quickBlock(in rows.Input, out *rows.Outcome, from, to int) bool {
	n := to - from
	for _, k := range w.s.inputs {
		slot := w.p.inputs[k]
		w.values[slot] = in.Values[k][from:to]
		if w.p.knowns[k].listed() && !w.knownIsSound(k, slot, n) {
			return false // choices are taken by such numbers
		}
	}
	w.out, w.from, w.compacted = out, from, 0
	if !w.quickSteps(w.s.quick.steps, n) {
		return false
	}
	for _, k := range w.s.inputs {
		if w.s.quick.checked[k] && !w.p.knowns[k].listed() && !w.knownIsSound(k, w.p.inputs[k], n) {
			return false
		}
	}
	return true
}

// knownIsSound says whether every row of a known may be used.
func (w *worker) knownIsSound(k, slot, n int) bool {
	known := &w.p.knowns[k]
	if !known.listed() {
		return column.AllInside(w.values[slot], known.Low, known.High)
	}
	w.checkChoice(k, slot, n)
	return w.status[slot] == nil
}

// place points a slot at the column that its step writes.
func (w *worker) place(slot, n int) []float64 {
	if e := w.s.quick.pinned[slot]; e >= 0 {
		w.values[slot] = w.out.Values[e][w.from : w.from+n]
	} else {
		c := w.s.quick.scratch[slot]
		if w.scratch[c] == nil {
			w.scratch[c] = make([]float64, blockRows)
		}
		w.values[slot] = w.scratch[c][:n]
	}
	return w.values[slot]
}

// quickSteps runs steps over n rows.
func (w *worker) quickSteps(steps []quickStep, n int) bool {
	for k := range steps {
		s := &steps[k]
		sound := true
		switch s.kind {
		case plainStep:
			dst := w.place(s.slot, n)
			switch {
			case s.op == formula.Select:
				args := w.p.slots[s.slot].args
				root := w.s.quick.root
				compute(s.op, dst, w.values[root[args[0]]], w.values[root[args[1]]], w.values[root[args[2]]])
			case s.b >= 0:
				compute(s.op, dst, w.values[s.a], w.values[s.b], nil)
			default:
				compute(s.op, dst, w.values[s.a], nil, nil)
			}
			sound = !s.check || column.AllFinite(dst)
		case scaledStep:
			dst := w.place(s.slot, n)
			w.scaled(s, dst)
			sound = !s.check || column.AllFinite(dst)
		case expStep:
			sound = w.quickExp(s, w.place(s.slot, n))
		case lawStep:
			sound = w.quickLaw(s, w.place(s.slot, n))
		case guardStep:
			sound = column.AllInside(w.values[s.a], 1, 1)
		case chooseStep:
			sound = w.quickChoose(s, n)
		}
		if !sound {
			return false
		}
	}
	return true
}

// factor gives the number that scales an operand; 1 leaves it as it is.
func (w *worker) factor(slot int) float64 {
	if slot < 0 {
		return 1
	}
	return w.values[slot][0]
}

// scaled runs a step whose operands are multiplied on the way.
func (w *worker) scaled(s *quickStep, dst []float64) {
	a, b := w.values[s.a], w.values[s.b]
	ka, kb := w.factor(s.ka), w.factor(s.kb)
	varyA, varyB := w.s.vary[s.a], w.s.vary[s.b]
	switch {
	case varyA && varyB:
		switch s.op {
		case formula.Add:
			column.AddScaledColumns(dst, a, ka, b, kb)
		case formula.Sub:
			column.SubScaledColumns(dst, a, ka, b, kb)
		case formula.Mul:
			column.MulScaledColumns(dst, a, ka, b, kb)
		default:
			column.DivScaledColumns(dst, a, ka, b, kb)
		}
	case varyA:
		switch s.op {
		case formula.Add:
			column.AddScaledNumber(dst, a, ka, b[0])
		case formula.Sub:
			column.AddScaledNumber(dst, a, ka, -b[0])
		default:
			column.DivScaledNumber(dst, a, ka, b[0])
		}
	default:
		switch s.op {
		case formula.Add:
			column.AddScaledNumber(dst, b, kb, a[0])
		case formula.Sub:
			column.SubFromNumberScaled(dst, a[0], b, kb)
		default:
			column.DivNumberScaled(dst, a[0], b, kb)
		}
	}
}

// mostScale times the largest exponential of the usual range is finite.
const mostScale = 300

// quickExp runs an exponential, times a number.
func (w *worker) quickExp(s *quickStep, dst []float64) bool {
	x, scale := w.values[s.a], w.factor(s.ka)
	if column.ExpScaledColumn(dst, x, scale) && math.Abs(scale) <= mostScale {
		return true
	}
	return column.AllFinite(x) && (!s.check || column.AllFinite(dst))
}

// quickLaw runs a law inside its ranges.
func (w *worker) quickLaw(s *quickStep, dst []float64) bool {
	slot, root := &w.p.slots[s.slot], w.s.quick.root
	c := &w.calls[s.slot]
	for _, p := range c.pointers {
		p.argument.Values = w.values[root[p.slot]]
	}
	slot.law.Body(dst, c.arguments, &c.work)
	for k := range slot.checks {
		c := &slot.checks[k]
		if !column.AllInside(w.values[root[c.slot]], c.low, c.high) {
			return false
		}
	}
	return !s.check || column.AllFinite(dst)
}

// quickChoose runs each branch of a choice for the rows that take it.
func (w *worker) quickChoose(s *quickStep, n int) bool {
	ch := s.choose
	condition := w.values[ch.condition]
	taken, all := column.Trues(condition)
	if !all {
		return false
	}
	if taken == 0 || taken == n {
		b := &ch.yes
		if taken == 0 {
			b = &ch.no
		}
		if !w.quickSteps(b.steps, n) {
			return false
		}
		value, dst := w.values[b.value], w.place(s.slot, n)
		if len(value) == 1 && n > 1 {
			column.Fill(dst, value[0])
		} else {
			copy(dst, value)
		}
		return !s.check || column.AllFinite(dst)
	}
	dst := w.place(s.slot, n)
	if !w.quickBranch(dst, condition, 1, &ch.yes, taken) || !w.quickBranch(dst, condition, 0, &ch.no, n-taken) {
		return false
	}
	return !s.check || column.AllFinite(dst)
}

// quickBranch runs one branch over the count rows whose condition is side and
// writes its values into those rows of dst.
func (w *worker) quickBranch(dst, condition []float64, side float64, b *branch, count int) bool {
	mark := w.compacted
	kept := w.kept
	for _, slot := range b.reads {
		whole := w.values[slot]
		w.kept = append(w.kept, whole)
		if len(w.compact) == w.compacted {
			w.compact = append(w.compact, make([]float64, blockRows))
		}
		part := w.compact[w.compacted][:0]
		w.compacted++
		for i, c := range condition {
			if c == side {
				part = append(part, whole[i])
			}
		}
		w.values[slot] = part
	}
	sound := w.quickSteps(b.steps, count)
	value := w.values[b.value]
	for k, slot := range b.reads {
		w.values[slot] = w.kept[len(kept)+k]
	}
	w.kept, w.compacted = kept, mark
	if !sound {
		return false
	}
	if !b.own {
		value = w.values[b.value] // a number, or a column of all rows
	}
	next := 0
	for i, c := range condition {
		if c != side {
			continue
		}
		switch {
		case len(value) == 1 && (!b.own || count == 1):
			dst[i] = value[0]
		case b.own:
			dst[i] = value[next]
		default:
			dst[i] = value[i]
		}
		next++
	}
	return true
}
