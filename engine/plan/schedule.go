package plan

import (
	"sync"
	"sync/atomic"

	"plumbrule/engine/formula"
)

// schedule is the order of steps for one shape of input: which knowns are
// columns and which are single numbers. What no column reaches runs once; the
// rest runs for each block, in scratch columns that are used again as soon as
// their last reader has run.
type schedule struct {
	shape   inputShape
	vary    []bool // by slot
	once    []int  // slots computed once a run
	each    []int  // slots computed for each block
	inputs  []int  // knowns that are columns
	scratch []int  // by slot: scratch column, -1 where the value lives elsewhere
	pinned  []int  // by slot: entry whose output column holds the value, -1
	columns int
	quick   *quick
	idle    atomic.Pointer[worker] // the worker of the latest run
	workers sync.Pool              // of runs that several workers share
}

// scheduleCache keeps the schedules of the latest shapes.
type scheduleCache struct {
	latest atomic.Pointer[schedule]
	mu     sync.Mutex
	known  []*schedule
}

// mostSchedules bounds how many shapes of input are remembered.
const mostSchedules = 16

// schedule gives the schedule of a shape.
func (p *Program) schedule(shape inputShape) *schedule {
	if s := p.cache.latest.Load(); s != nil && s.shape == shape {
		return s
	}
	p.cache.mu.Lock()
	defer p.cache.mu.Unlock()
	for i, s := range p.cache.known {
		if s.shape == shape {
			p.cache.known[0], p.cache.known[i] = p.cache.known[i], p.cache.known[0]
			p.cache.latest.Store(s)
			return s
		}
	}
	s := p.arrange(shape, false)
	s.quick = p.planQuick(s)
	if len(p.cache.known) >= mostSchedules {
		p.cache.known = p.cache.known[:mostSchedules-1]
	}
	p.cache.known = append(p.cache.known, s)
	p.cache.latest.Store(s)
	return s
}

// arrange makes a schedule. With keep every value stays to the end of the
// block, for tracing; nothing is then written to outputs in place.
func (p *Program) arrange(shape inputShape, keep bool) *schedule {
	n := len(p.slots)
	s := &schedule{shape: shape, vary: make([]bool, n), scratch: make([]int, n), pinned: make([]int, n)}
	root := make([]int, n) // where an alias's value lives
	for i := range p.slots {
		slot := &p.slots[i]
		s.scratch[i], s.pinned[i], root[i] = -1, -1, i
		if slot.op == formula.KnownOp {
			s.vary[i] = shape.column(int(slot.known))
			if s.vary[i] {
				s.inputs = append(s.inputs, int(slot.known))
			}
			continue
		}
		for _, a := range slot.args {
			s.vary[i] = s.vary[i] || s.vary[a]
		}
		if slot.alias && s.vary[slot.args[0]] == s.vary[i] {
			root[i] = root[slot.args[0]]
		}
		if slot.op == formula.Const {
			continue
		}
		if s.vary[i] {
			s.each = append(s.each, i)
		} else {
			s.once = append(s.once, i)
		}
	}
	if !keep {
		for e, out := range p.outputs {
			r := root[out]
			if s.vary[r] && s.pinned[r] < 0 && p.slots[r].op != formula.KnownOp {
				s.pinned[r] = e
			}
		}
	}
	p.assign(s, root, keep)
	return s
}

// assign gives each varying slot a scratch column for as long as it is read.
func (p *Program) assign(s *schedule, root []int, keep bool) {
	last := make([]int, len(p.slots))
	for _, i := range s.each {
		for _, a := range p.slots[i].args {
			last[root[a]] = i
		}
		last[root[i]] = max(last[root[i]], i)
	}
	for _, out := range p.outputs {
		last[root[out]] = len(p.slots) // read when the block is written out
	}
	ends := map[int][]int{} // by the slot after which a column is free
	var free []int
	for _, i := range s.each {
		if root[i] == i && s.pinned[i] < 0 {
			if len(free) > 0 {
				s.scratch[i] = free[len(free)-1]
				free = free[:len(free)-1]
			} else {
				s.scratch[i] = s.columns
				s.columns++
			}
			if !keep {
				ends[last[i]] = append(ends[last[i]], s.scratch[i])
			}
		}
		free = append(free, ends[i]...)
	}
}

func (s *schedule) quickColumns() int {
	if s.quick == nil {
		return 0
	}
	return s.quick.columns
}
