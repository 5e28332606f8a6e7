package plan

import (
	"plumbrule/engine/rows"
)

// status holds a state, a reason and an amount a row, beside a value that is
// not sound in every row of a block. A status of length 1 serves all rows.
type status struct {
	state  []rows.State
	reason []int32
	amount []float64 // the value that lies outside; meaningful where hasAmount
	has    []bool
}

func (s *status) at(row int) int {
	if len(s.state) == 1 {
		return 0
	}
	return row
}

// worsen sets a row's state where the new one is worse.
func (s *status) worsen(row int, state rows.State, reason int32, amount float64, has bool) {
	if state > s.state[row] {
		s.state[row], s.reason[row], s.amount[row], s.has[row] = state, reason, amount, has
	}
}

// fresh gives a status of n sound rows.
func (w *worker) fresh(n int) *status {
	if k := len(w.spare); k > 0 && cap(w.spare[k-1].state) >= n {
		s := w.spare[k-1]
		w.spare = w.spare[:k-1]
		s.state, s.reason, s.amount, s.has = s.state[:n], s.reason[:n], s.amount[:n], s.has[:n]
		clear(s.state)
		clear(s.reason)
		clear(s.has)
		return s
	}
	return &status{make([]rows.State, n), make([]int32, n), make([]float64, n), make([]bool, n)}
}

// statusOf gives a slot's status, made where there is none yet.
func (w *worker) statusOf(slot, n int) *status {
	if w.status[slot] == nil {
		w.status[slot] = w.fresh(n)
		w.touched = append(w.touched, slot)
	}
	return w.status[slot]
}

// release makes every status that was set since mark sound again.
func (w *worker) release(mark int) {
	for _, slot := range w.touched[mark:] {
		w.spare = append(w.spare, w.status[slot])
		w.status[slot] = nil
	}
	w.touched = w.touched[:mark]
}

// inherit gives a slot the worst state of those it reads. Reading an entry that
// has no number is waiting for it; reading a known that has none is refused
// with the known's own reason.
func (w *worker) inherit(slot, n int, args []int) {
	any := false
	for _, a := range args {
		if w.status[a] != nil {
			any = true
			break
		}
	}
	if !any {
		return
	}
	s := w.statusOf(slot, n)
	for _, a := range args {
		from := w.status[a]
		if from == nil {
			continue
		}
		for i := 0; i < n; i++ {
			w.passOn(s, i, from, a)
		}
	}
}

// passOn worsens one row by what it reads.
func (w *worker) passOn(s *status, row int, from *status, arg int) {
	k := from.at(row)
	state := from.state[k]
	if state == rows.Sound {
		return
	}
	if wait := w.p.wait[arg]; wait != 0 && !state.Computed() {
		s.worsen(row, rows.Waiting, wait, 0, false)
		return
	}
	s.worsen(row, state, from.reason[k], from.amount[k], from.has[k])
}

// inheritSelected gives a choice the states of its condition and of the branch
// that each row takes.
func (w *worker) inheritSelected(slot, n int, args []int) {
	condition, yes, no := args[0], args[1], args[2]
	if w.status[condition] == nil && w.status[yes] == nil && w.status[no] == nil {
		return
	}
	s := w.statusOf(slot, n)
	values := w.values[condition]
	for i := 0; i < n; i++ {
		if from := w.status[condition]; from != nil {
			w.passOn(s, i, from, condition)
		}
		branch := no
		if values[at(values, i)] == 1 {
			branch = yes
		}
		if from := w.status[branch]; from != nil {
			w.passOn(s, i, from, branch)
		}
	}
}

func at(values []float64, row int) int {
	if len(values) == 1 {
		return 0
	}
	return row
}
