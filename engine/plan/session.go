package plan

import (
	"context"
	"errors"
	"math"
	"strconv"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/rows"
)

// Session is one row of a program whose numbers are kept, so that a change of
// a known computes again only what depends on it. It serves one goroutine.
type Session struct {
	p       *Program
	w       *worker
	first   []int32 // by slot: where its readers begin in readers
	readers []int32
	entry   []int32 // by slot: the entry that it is the value of, -1
	pending pending
	changed []int
	one     [1]int // the slot that is computed
	begun   bool
	broken  bool // the context ended an update: its changes are still to be told
}

// NewSession begins a session with the sheet's own values. Nothing is computed
// before the first update.
func (p *Program) NewSession() *Session {
	s := &Session{p: p, w: p.newWorker(p.schedule(p.noColumns())), pending: newPending(len(p.slots)), entry: make([]int32, len(p.slots))}
	s.listReaders()
	for i := range s.entry {
		s.entry[i] = -1
	}
	for e, slot := range p.outputs {
		if p.slots[slot].op != formula.Const {
			s.entry[slot] = int32(e)
		}
	}
	for k, slot := range p.inputs {
		if slot >= 0 {
			s.w.singleKnown(k, slot, nil)
		}
	}
	return s
}

// listReaders lists for each slot the slots that read it.
func (s *Session) listReaders() {
	s.first = make([]int32, len(s.p.slots)+1)
	for i := range s.p.slots {
		for _, a := range s.p.slots[i].args {
			s.first[a+1]++
		}
	}
	for i := range s.p.slots {
		s.first[i+1] += s.first[i]
	}
	s.readers = make([]int32, s.first[len(s.p.slots)])
	next := append([]int32(nil), s.first...)
	for i := range s.p.slots {
		for _, a := range s.p.slots[i].args {
			s.readers[next[a]] = int32(i)
			next[a]++
		}
	}
}

// Set gives a known an SI number (NaN: missing) from the next update on.
func (s *Session) Set(known int, value float64) error {
	if known < 0 || known >= len(s.p.knowns) {
		return errors.New("the sheet has no known number " + strconv.Itoa(known))
	}
	slot := s.p.inputs[known]
	if slot < 0 || same(s.w.single[slot], value) {
		return nil
	}
	s.w.single[slot] = value
	s.pending.put(slot)
	return nil
}

// Update computes what depends on the knowns that were set and gives the
// entries whose number, state or reason is another one than before; the first
// update gives all. The slice is valid until the next update. The context is
// looked at now and then; an update that it ends is finished by the next one.
func (s *Session) Update(ctx context.Context) ([]int, error) {
	if err := ctx.Err(); err != nil {
		return nil, err
	}
	if !s.broken {
		s.changed = s.changed[:0]
	}
	s.broken = false
	if !s.begun {
		s.begin()
		return s.changed, nil
	}
	taken := 0
	for slot, ok := s.pending.take(); ok; slot, ok = s.pending.take() {
		if taken++; taken%lookAfter == 0 && ctx.Err() != nil {
			s.pending.put(slot)
			s.broken = true
			break
		}
		if !s.refresh(slot) {
			continue
		}
		if e := s.entry[slot]; e >= 0 {
			s.changed = append(s.changed, int(e))
		}
		for _, reader := range s.readers[s.first[slot]:s.first[slot+1]] {
			s.pending.put(int(reader))
		}
	}
	s.w.touched = s.w.touched[:0]
	if s.broken {
		return nil, ctx.Err()
	}
	return s.changed, nil
}

// lookAfter is how many steps an update takes before it looks at the context.
const lookAfter = 256

// begin computes everything.
func (s *Session) begin() {
	values := make([][]float64, len(s.p.knowns))
	for k, slot := range s.p.inputs {
		if slot >= 0 {
			values[k] = []float64{s.w.single[slot]}
		}
	}
	s.w.begin(rows.Input{Rows: 1, Values: values})
	for _, slot := range s.w.s.once {
		s.own(slot)
	}
	s.w.touched = s.w.touched[:0]
	s.pending = newPending(len(s.p.slots))
	for e := range s.p.outputs {
		s.changed = append(s.changed, e)
	}
	s.begun = true
}

// own lets a slot hold its number itself, where it pointed to that of another.
func (s *Session) own(slot int) {
	w := s.w
	w.single[slot] = w.values[slot][0]
	w.values[slot] = w.single[slot : slot+1 : slot+1]
}

// refresh computes one slot again and says whether anything about it changed.
func (s *Session) refresh(slot int) bool {
	w := s.w
	of := &s.p.slots[slot]
	number, state := w.single[slot], w.status[slot]
	w.status[slot] = nil
	if of.op == formula.KnownOp {
		w.checkKnown(int(of.known), slot, 1)
	} else if !s.sound(of.args) || !s.quickly(slot) {
		w.step(slot, 1)
		s.own(slot)
	}
	changed := of.op == formula.KnownOp || !same(number, w.single[slot]) || !sameStatus(state, w.status[slot])
	if state != nil {
		w.spare = append(w.spare, state)
	}
	return changed
}

// quickly computes a slot all of whose operands are sound.
func (s *Session) quickly(slot int) bool {
	s.one[0] = slot
	return s.w.quickSlots(s.one[:])
}

func (s *Session) sound(slots []int) bool {
	for _, slot := range slots {
		if s.w.status[slot] != nil {
			return false
		}
	}
	return true
}

// same says whether two numbers are the same to a reader of either.
func same(a, b float64) bool {
	return math.Float64bits(a) == math.Float64bits(b) || a != a && b != b
}

func sameStatus(a, b *status) bool {
	if a == nil || b == nil {
		return a == b
	}
	return a.state[0] == b.state[0] && a.reason[0] == b.reason[0] && a.has[0] == b.has[0] && (!a.has[0] || same(a.amount[0], b.amount[0]))
}

// Close ends the session.
func (s *Session) Close() error { return nil }

// Entry gives an entry as of the last update: its SI number, NaN where there is
// none, its state and its reason, 0 where it is sound. Before the first update
// every entry waits.
func (s *Session) Entry(entry int) (value float64, state rows.State, reason int) {
	if !s.begun || entry < 0 || entry >= len(s.p.outputs) {
		return column.NaN(), rows.Waiting, 0
	}
	slot := s.p.outputs[entry]
	if st := s.w.status[slot]; st != nil {
		state, reason = st.state[0], int(st.reason[0])
	}
	if !state.Computed() {
		return column.NaN(), state, reason
	}
	return s.w.single[slot], state, reason
}
