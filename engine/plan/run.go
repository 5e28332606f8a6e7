package plan

import (
	"context"
	"errors"
	"strconv"
	"strings"
	"sync"
	"sync/atomic"

	"plumbrule/engine/column"
	"plumbrule/engine/rows"
)

// run is one evaluation that several workers share.
type run struct {
	p   *Program
	in  rows.Input
	out *rows.Outcome
	mu  sync.Mutex // guards the making of states in out, and tallies
	all rows.Tallies
}

// Run evaluates rows into out with at most the given number of workers. The
// numbers do not depend on how many there are, nor on the size of blocks.
func (p *Program) Run(ctx context.Context, in rows.Input, out *rows.Outcome, workers int) error {
	if err := ctx.Err(); err != nil {
		return err
	}
	if in.Rows == 1 && p.runOne(in, out) {
		return nil
	}
	shape, err := p.shape(in)
	if err != nil {
		return err
	}
	out.Resize(len(p.entries), in.Rows)
	s := p.schedule(shape)
	blocks := (in.Rows + blockRows - 1) / blockRows
	workers = max(1, min(workers, blocks/minBlocks))
	if workers > 1 {
		shared := &run{p: p, in: in, out: out}
		shared.share(ctx, s, blocks, workers)
		out.Tallies = shared.all.Append(out.Tallies)
		return ctx.Err()
	}
	w := p.takeWorker(s)
	sound := w.begin(in)
	if sound && len(s.each) == 0 && len(s.inputs) == 0 {
		for e, slot := range p.outputs {
			column.Fill(out.Values[e], w.single[slot])
		}
		s.keep(w)
		return nil
	}
	r := &w.alone
	r.p, r.in, r.out = p, in, out
	for b := 0; b < blocks && ctx.Err() == nil; b++ {
		r.block(w, b)
	}
	if !w.tallies.Empty() {
		out.Tallies = w.tallies.Append(out.Tallies)
		w.tallies = rows.Tallies{}
	}
	r.in, r.out = rows.Input{}, nil
	w.rest()
	return ctx.Err()
}

// share hands the blocks to several workers.
func (r *run) share(ctx context.Context, s *schedule, blocks, workers int) {
	var next atomic.Int64
	var group sync.WaitGroup
	for range workers {
		group.Go(func() {
			w := r.p.takeWorker(s)
			w.begin(r.in)
			for b := int(next.Add(1)) - 1; b < blocks && ctx.Err() == nil; b = int(next.Add(1)) - 1 {
				r.block(w, b)
			}
			r.end(w)
		})
	}
	group.Wait()
}

// keep puts a worker by that holds nothing of the caller's.
func (s *schedule) keep(w *worker) {
	if !s.idle.CompareAndSwap(nil, w) {
		s.workers.Put(w)
	}
}

// takeWorker gives a worker that an earlier run has left, or a new one.
func (p *Program) takeWorker(s *schedule) *worker {
	if w := s.idle.Swap(nil); w != nil {
		return w
	}
	if w, ok := s.workers.Get().(*worker); ok {
		return w
	}
	return p.newWorker(s)
}

// block computes and writes block b.
func (r *run) block(w *worker, b int) {
	from := b * blockRows
	to := min(from+blockRows, r.in.Rows)
	mark := len(w.touched)
	w.block(r.in, r.out, from, to)
	r.write(w, from, to)
	w.release(mark)
}

// end takes over what a worker has counted and puts it by for later runs.
func (r *run) end(w *worker) {
	if !w.tallies.Empty() {
		r.mu.Lock()
		r.all.Merge(&w.tallies, r.p.reasons)
		r.mu.Unlock()
		w.tallies = rows.Tallies{}
	}
	w.rest()
}

// rest puts a worker by for later runs.
func (w *worker) rest() {
	w.forget()
	w.s.keep(w)
}

// minBlocks is how many blocks a worker must have before another one pays.
const minBlocks = 4

// inputShape tells which knowns are columns: one bit each, and beyond the
// first 64 knowns their numbers in words.
type inputShape struct {
	few  uint64
	many string
}

// column says whether known k is a column.
func (s inputShape) column(k int) bool {
	if k < 64 {
		return s.few>>k&1 == 1
	}
	return s.many[k-64] == 1
}

// noColumns is the shape of an input without columns.
func (p *Program) noColumns() inputShape {
	return inputShape{many: strings.Repeat("\x00", max(0, len(p.knowns)-64))}
}

// shape checks the input and tells which knowns are columns.
func (p *Program) shape(in rows.Input) (inputShape, error) {
	var shape inputShape
	if in.Rows < 0 {
		return shape, errors.New("the number of rows is negative")
	}
	if len(in.Values) > len(p.knowns) {
		return shape, errors.New("the input has " + strconv.Itoa(len(in.Values)) + " columns, the sheet " + strconv.Itoa(len(p.knowns)) + " knowns")
	}
	var many []byte
	if len(p.knowns) > 64 {
		many = make([]byte, len(p.knowns)-64)
	}
	for k, values := range in.Values {
		switch {
		case len(values) <= 1 && (len(values) == 0 || in.Rows != 1):
		case len(values) == in.Rows:
			if in.Rows > 1 && k < 64 {
				shape.few |= 1 << k
			} else if in.Rows > 1 {
				many[k-64] = 1
			}
		default:
			return shape, errors.New("the column of " + p.knowns[k].Name + " has " + strconv.Itoa(len(values)) + " rows, the run " + strconv.Itoa(in.Rows))
		}
	}
	shape.many = string(many)
	return shape, nil
}

// write brings a block's results to the outcome.
func (r *run) write(w *worker, from, to int) {
	n := to - from
	for e, slot := range r.p.outputs {
		dst := r.out.Values[e][from:to]
		values := w.values[slot]
		if w.quickly {
			values = w.values[w.s.quick.root[slot]]
		}
		switch {
		case len(values) == 1 && (n > 1 || !w.s.vary[slot]):
			column.Fill(dst, values[0])
		case &values[0] != &dst[0]:
			copy(dst, values)
		}
		if s := w.status[slot]; s != nil {
			r.writeStates(w, e, s, dst, from)
		}
	}
}

// writeStates brings a block's states, reasons and tallies to the outcome;
// rows without a number become NaN.
func (r *run) writeStates(w *worker, e int, s *status, dst []float64, from int) {
	r.mu.Lock()
	if r.out.States[e] == nil {
		r.out.States[e] = make([]rows.State, r.in.Rows)
		r.out.Reasons[e] = make([]int32, r.in.Rows)
	}
	r.mu.Unlock()
	states, reasons := r.out.States[e][from:from+len(dst)], r.out.Reasons[e][from:from+len(dst)]
	for i := range dst {
		k := s.at(i)
		state := s.state[k]
		if state == rows.Sound {
			continue
		}
		states[i], reasons[i] = state, s.reason[k]
		if !state.Computed() {
			dst[i] = column.NaN()
		}
		w.tallies.Add(rows.Tally{Entry: e, Reason: int(s.reason[k]), State: state, Rows: 1, Worst: s.amount[k], HasWorst: s.has[k]}, r.p.reasons[s.reason[k]].Below)
	}
}

// forget drops what points to the caller's memory.
func (w *worker) forget() {
	w.release(0)
	for _, k := range w.s.inputs {
		w.values[w.p.inputs[k]] = nil
	}
	for _, slot := range w.s.each {
		w.values[slot] = nil
	}
	for i := range w.calls {
		for _, p := range w.calls[i].pointers {
			p.argument.Values = nil
		}
	}
}
