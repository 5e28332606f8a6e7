package plan

import (
	"plumbrule/engine/formula"
	"plumbrule/engine/rows"
)

// Trace is one row with the value and state of every node.
type Trace struct {
	w *worker
}

// Trace evaluates one row and keeps every value on the way.
func (p *Program) Trace(in rows.Input) (*Trace, error) {
	in.Rows = 1
	if _, err := p.shape(in); err != nil {
		return nil, err
	}
	// A single row has no columns.
	w := p.newWorker(p.arrange(p.noColumns(), true))
	w.begin(in)
	return &Trace{w}, nil
}

// At gives a node's value in coherent SI units, its state and its reason;
// found is false for a node that the program does not compute by itself.
func (t *Trace) At(n *formula.Node) (value float64, state rows.State, reason int, found bool) {
	if n == nil || n.ID >= len(t.w.p.slotOf) {
		return 0, 0, 0, false
	}
	if n.Op == formula.Const {
		return n.Value, rows.Sound, 0, true
	}
	slot := t.w.p.slotOf[n.ID]
	if slot < 0 {
		return 0, 0, 0, false
	}
	value = t.w.values[slot][0]
	if s := t.w.status[slot]; s != nil {
		state, reason = s.state[0], int(s.reason[0])
	}
	return value, state, reason, true
}
