package plan

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/rows"
)

// blockRows is how many rows a block has.
const blockRows = column.Block

// worker runs blocks of one schedule. It holds every column that a block
// needs, so that a block allocates nothing while its rows are sound.
type worker struct {
	p       *Program
	s       *schedule
	values  [][]float64 // by slot: a column of the block or a single number
	single  []float64   // the single numbers of slots
	scratch [][]float64
	calls   []call // by slot, for laws
	status  []*status
	touched []int
	spare   []*status
	tallies rows.Tallies
	alone   run // the run of a single worker

	quickly   bool // the block was run the quick way
	careful   int  // blocks that are run with care before the quick way is tried again
	out       *rows.Outcome
	from      int         // first row of the block
	compact   [][]float64 // columns of the rows that take one branch
	compacted int
	kept      [][]float64
}

// call is a law's arguments, laid out once; pointers tells which parts are set
// anew for each block.
type call struct {
	arguments []law.Argument
	pointers  []pointer
	work      law.Work
}

type pointer struct {
	argument *law.Argument
	slot     int
}

func (p *Program) newWorker(s *schedule) *worker {
	w := &worker{
		p: p, s: s,
		values: make([][]float64, len(p.slots)), single: make([]float64, len(p.slots)),
		scratch: make([][]float64, max(s.columns, s.quickColumns())), calls: make([]call, len(p.slots)),
		status: make([]*status, len(p.slots)),
	}
	for i := range p.slots {
		slot := &p.slots[i]
		w.single[i] = slot.value
		w.values[i] = w.single[i : i+1 : i+1]
		if slot.op == formula.Apply {
			c := &w.calls[i]
			c.arguments = make([]law.Argument, len(slot.arguments))
			for k := range slot.arguments {
				c.lay(&c.arguments[k], &slot.arguments[k])
			}
		}
	}
	return w
}

// lay puts one argument together.
func (c *call) lay(a *law.Argument, plan *argumentPlan) {
	a.Text, a.Maker = plan.text, plan.maker
	switch {
	case plan.slot >= 0:
		c.pointers = append(c.pointers, pointer{a, plan.slot})
	case plan.fixed != nil:
		a.Items = plan.fixed
	case plan.items != nil:
		a.Items = make([]law.Argument, len(plan.items))
		for i := range plan.items {
			c.lay(&a.Items[i], &plan.items[i])
		}
	}
}

// begin sets the single inputs and computes what no row changes. It says
// whether all of that is sound.
func (w *worker) begin(in rows.Input) (sound bool) {
	w.release(0)
	w.careful = 0
	if w.s.quick != nil && w.quickSingles(in.Values) {
		return true
	}
	w.release(0)
	for k := range w.p.knowns {
		if slot := w.p.inputs[k]; slot >= 0 && !w.s.vary[slot] {
			w.singleKnown(k, slot, in.Values)
			w.checkKnown(k, slot, 1)
		}
	}
	for _, slot := range w.s.once {
		w.values[slot] = w.single[slot : slot+1 : slot+1]
		w.step(slot, 1)
	}
	// What is read for each block is sound, or every block needs care.
	for _, slot := range w.touched {
		if w.s.quick == nil || w.s.quick.reads[slot] || w.s.quick.reads[w.s.quick.root[slot]] {
			w.careful = math.MaxInt
		}
	}
	return false
}

// mostCareful is how many blocks are run with care after one that was not
// sound.
const mostCareful = 8

// block computes rows from to to of the run: the quick way where every row is
// sound, otherwise with care.
func (w *worker) block(in rows.Input, out *rows.Outcome, from, to int) {
	w.quickly = false
	if w.careful == 0 {
		mark := len(w.touched)
		if w.quickBlock(in, out, from, to) {
			w.quickly = true
			return
		}
		w.release(mark)
		w.careful = mostCareful
	}
	mark := len(w.touched)
	w.carefulBlock(in, out, from, to)
	if len(w.touched) == mark {
		w.careful = max(0, w.careful-1)
	} else if w.careful < math.MaxInt/2 {
		w.careful = mostCareful
	}
}

// carefulBlock computes a block with every state and reason.
func (w *worker) carefulBlock(in rows.Input, out *rows.Outcome, from, to int) {
	n := to - from
	for _, k := range w.s.inputs {
		slot := w.p.inputs[k]
		w.values[slot] = in.Values[k][from:to]
		w.checkKnown(k, slot, n)
	}
	for _, slot := range w.s.each {
		if e := w.s.pinned[slot]; e >= 0 {
			w.values[slot] = out.Values[e][from:to]
		} else if c := w.s.scratch[slot]; c >= 0 {
			if w.scratch[c] == nil {
				w.scratch[c] = make([]float64, blockRows)
			}
			w.values[slot] = w.scratch[c][:n]
		}
		w.step(slot, n)
	}
}

// checkKnown refuses rows of a known that are missing or outside its bounds.
func (w *worker) checkKnown(k, slot, n int) {
	known := &w.p.knowns[k]
	values := w.values[slot]
	if known.listed() {
		w.checkChoice(k, slot, n)
		return
	}
	if column.AllInside(values, known.Low, known.High) {
		return
	}
	for i := 0; i < n; i++ {
		x := values[i]
		switch {
		case !column.Finite(x):
			w.statusOf(slot, n).worsen(i, rows.Refused, w.p.missing[k], 0, false)
		case known.HasRange && x < known.Low:
			w.statusOf(slot, n).worsen(i, rows.Refused, w.p.outside[k][0], x, true)
		case known.HasRange && x > known.High:
			w.statusOf(slot, n).worsen(i, rows.Refused, w.p.outside[k][1], x, true)
		}
	}
}

// checkChoice refuses rows in which a text known is none of its choices, or a
// truth value neither 1 nor 0.
func (w *worker) checkChoice(k, slot, n int) {
	last := 1.0
	if choices := w.p.knowns[k].Choices; choices > 0 {
		last = float64(choices - 1)
	}
	values := w.values[slot]
	for i := 0; i < n; i++ {
		x := values[i]
		switch {
		case !column.Finite(x):
			w.statusOf(slot, n).worsen(i, rows.Refused, w.p.missing[k], 0, false)
		case x < 0 || x > last || x != column.FloorOf(x):
			w.statusOf(slot, n).worsen(i, rows.Refused, w.p.outside[k][0], 0, false)
		}
	}
}

// step computes one slot over n rows.
func (w *worker) step(slot, n int) {
	s := &w.p.slots[slot]
	switch s.op {
	case formula.Apply:
		w.apply(slot, s, n)
		return
	case formula.Same, formula.Guard, formula.Entry:
		w.pass(slot, s.args[0])
		w.inherit(slot, n, s.args[:1])
		if s.op == formula.Guard {
			w.guard(slot, s, n)
		}
		if s.op == formula.Entry {
			w.mark(slot, s, n)
		}
		return
	case formula.Select:
		compute(s.op, w.values[slot], w.values[s.args[0]], w.values[s.args[1]], w.values[s.args[2]])
		w.inheritSelected(slot, n, s.args)
		return
	}
	var b []float64
	if len(s.args) > 1 {
		b = w.values[s.args[1]]
	}
	compute(s.op, w.values[slot], w.values[s.args[0]], b, nil)
	w.inherit(slot, n, s.args)
	if s.risk != 0 {
		w.mark(slot, s, n)
	}
}

// pass gives a slot the value of another. A single number becomes a column
// where the slot has one of its own: its rows then differ in their states.
func (w *worker) pass(slot, from int) {
	if w.s.pinned[slot] < 0 && w.s.scratch[slot] < 0 {
		w.values[slot] = w.values[from]
		return
	}
	column.Fill(w.values[slot], w.values[from][0])
}

// mark refuses rows in which a step made no finite number of finite ones.
func (w *worker) mark(slot int, s *slot, n int) {
	values := w.values[slot]
	if column.AllFinite(values) {
		return
	}
	for i := 0; i < n; i++ {
		if s.op == formula.Div && w.operand(s.args[1], i) != 0 || s.op == formula.Pow && math.IsInf(values[i], 0) && w.operand(s.args[0], i) != 0 {
			continue // too large a result: told where the entry ends
		}
		if !column.Finite(values[i]) && (w.status[slot] == nil || w.status[slot].state[i].Computed()) && w.finiteArguments(s, i) {
			w.statusOf(slot, n).worsen(i, rows.Refused, s.risk, 0, false)
		}
	}
}

// operand gives a slot's number in a row.
func (w *worker) operand(slot, row int) float64 {
	values := w.values[slot]
	return values[at(values, row)]
}

// finiteArguments says whether all that a step reads is finite in a row; an
// entry is marked whatever it reads.
func (w *worker) finiteArguments(s *slot, row int) bool {
	if s.op == formula.Entry {
		return true
	}
	for _, a := range s.args {
		if !column.Finite(w.operand(a, row)) {
			return false
		}
	}
	return true
}

// guard stretches rows in which a sheet law's range does not hold.
func (w *worker) guard(slot int, s *slot, n int) {
	condition := w.values[s.args[1]]
	for i := 0; i < n; i++ {
		if condition[at(condition, i)] != 1 {
			w.statusOf(slot, n).worsen(i, rows.Stretched, s.guard, 0, false)
		}
	}
}

// apply runs a law over n rows with its range checks.
func (w *worker) apply(slot int, s *slot, n int) {
	c := &w.calls[slot]
	for _, p := range c.pointers {
		p.argument.Values = w.values[p.slot]
	}
	w.inherit(slot, n, s.args)
	for k := range s.checks {
		w.check(slot, n, &s.checks[k])
	}
	dst := w.values[slot]
	s.law.Body(dst, c.arguments, &c.work)
	if column.AllFinite(dst) {
		return
	}
	for i := 0; i < n; i++ {
		if !column.Finite(dst[i]) && w.finiteArguments(s, i) {
			w.statusOf(slot, n).worsen(i, rows.Refused, s.refusal, 0, false)
		}
	}
}

// check compares one number of a law's argument with its ranges.
func (w *worker) check(slot, n int, c *check) {
	values := w.values[c.slot]
	if column.AllInside(values, c.low, c.high) {
		return
	}
	for i := 0; i < n; i++ {
		x := values[at(values, i)]
		switch {
		case x != x || x >= c.low && x <= c.high:
		case x < c.finiteLow:
			w.statusOf(slot, n).worsen(i, rows.Refused, c.finiteBelow, x, true)
		case x > c.finiteHigh:
			w.statusOf(slot, n).worsen(i, rows.Refused, c.finiteAbove, x, true)
		case x < c.validLow:
			w.statusOf(slot, n).worsen(i, rows.Stretched, c.below, x, true)
		case x > c.validHigh:
			w.statusOf(slot, n).worsen(i, rows.Stretched, c.above, x, true)
		}
	}
}
