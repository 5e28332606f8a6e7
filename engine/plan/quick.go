package plan

import (
	"plumbrule/engine/column"
	"plumbrule/engine/formula"
)

// The quick way runs a block as if every row were sound: no states, checks
// only where a number that is not finite could hide, products by numbers
// joined with the step that reads them, and the branches of a choice only for
// the rows that take them. As soon as a check fails the block is run again
// with care, which finds every state and reason. Both ways give the same bits.

// quickKind says how a step of the quick way is run.
type quickKind uint8

const (
	plainStep  quickKind = iota
	scaledStep           // two operands, each times a number
	expStep              // exp, times a number
	lawStep
	guardStep // demands a condition, computes nothing
	chooseStep
)

// quickStep is a step of the quick way.
type quickStep struct {
	kind   quickKind
	op     formula.Op
	slot   int
	a, b   int // slots of the operands; -1 for none
	ka, kb int // slots of the numbers that they are multiplied by; -1 for none
	check  bool
	choose *choose
}

// choose is a choice with the steps that only one of its branches needs.
type choose struct {
	condition int
	yes, no   branch
}

// branch is one side of a choice.
type branch struct {
	value int
	own   bool // the value is computed by the branch's own steps
	steps []quickStep
	reads []int // varying slots from outside that the steps read
}

// quick is the quick way of a schedule.
type quick struct {
	steps   []quickStep
	root    []int // by slot: where its value lives
	pinned  []int // by slot: entry whose output column holds the value, -1
	scratch []int // by slot
	columns int
	checked []bool // by known: its column is looked at
	reads   []bool // by slot: a step for each block reads it
}

// quickPlanner plans the quick way of one schedule.
type quickPlanner struct {
	p      *Program
	s      *schedule
	q      *quick
	users  [][]int // by root slot: the steps that read it
	output []bool  // by root slot
	home   []int   // by slot: the choice whose branch alone needs it, -1
	side   []bool  // by slot with a home: the branch, true for yes
	joined []bool  // slots that are computed inside the step that reads them
	found  []bool  // by slot: a number that is not finite cannot pass unseen
}

// planQuick makes the quick way of a schedule.
func (p *Program) planQuick(s *schedule) *quick {
	n := len(p.slots)
	q := &quick{root: make([]int, n), pinned: make([]int, n), scratch: make([]int, n), checked: make([]bool, len(p.knowns)), reads: make([]bool, n)}
	c := &quickPlanner{p: p, s: s, q: q, users: make([][]int, n), output: make([]bool, n), home: make([]int, n), side: make([]bool, n), joined: make([]bool, n), found: make([]bool, n)}
	for i := range p.slots {
		q.root[i], q.pinned[i], q.scratch[i], c.home[i] = i, -1, -1, -1
		if p.slots[i].alias {
			q.root[i] = q.root[p.slots[i].args[0]]
		}
	}
	for e, out := range p.outputs {
		r := q.root[out]
		c.output[r] = true
		if s.vary[r] && q.pinned[r] < 0 && p.slots[r].op != formula.KnownOp {
			q.pinned[r] = e
		}
	}
	for _, i := range s.each {
		for _, a := range c.args(i) {
			c.users[a] = append(c.users[a], i)
		}
	}
	c.findHomes()
	c.join()
	c.findChecks()
	q.steps = c.list(-1, false)
	c.assign()
	for k := range p.knowns {
		if slot := p.inputs[k]; slot >= 0 && s.vary[slot] {
			known := &p.knowns[k]
			q.checked[k] = known.HasRange || known.Choices > 0 || known.Truth || !c.found[slot]
		}
	}
	return q
}

// args gives the roots of what a step reads; an alias reads nothing but what
// its guard asks.
func (c *quickPlanner) args(i int) []int {
	slot := &c.p.slots[i]
	from := slot.args
	if slot.alias {
		from = nil
		if slot.op == formula.Guard {
			from = slot.args[1:]
		}
	}
	roots := make([]int, len(from))
	for k, a := range from {
		roots[k] = c.q.root[a]
	}
	return roots
}

// findHomes finds, from the last step to the first, the steps that only one
// branch of one choice needs.
func (c *quickPlanner) findHomes() {
	for k := len(c.s.each) - 1; k >= 0; k-- {
		i := c.s.each[k]
		if c.p.slots[i].alias || c.output[i] || len(c.users[i]) == 0 {
			continue
		}
		home, side, ok := -1, false, true
		for n, u := range c.users[i] {
			h, sd := c.home[u], c.side[u]
			if slot := &c.p.slots[u]; slot.op == formula.Select && c.s.vary[c.q.root[slot.args[0]]] {
				roots := c.args(u)
				switch {
				case roots[0] == i || roots[1] == i && roots[2] == i:
				case roots[1] == i:
					h, sd = u, true
				case roots[2] == i:
					h, sd = u, false
				}
			} else if slot.op == formula.Guard {
				h = -1
			}
			if n == 0 {
				home, side = h, sd
			} else if h != home || sd != side {
				ok = false
			}
		}
		if ok {
			c.home[i], c.side[i] = home, side
		}
	}
}

// sameHome says whether two steps run for the same rows.
func (c *quickPlanner) sameHome(a, b int) bool {
	return c.home[a] == c.home[b] && (c.home[a] < 0 || c.side[a] == c.side[b])
}

// alone gives the only reader of a step that runs for the same rows, or -1.
func (c *quickPlanner) alone(i int) int {
	if c.output[i] || len(c.users[i]) != 1 || !c.sameHome(i, c.users[i][0]) {
		return -1
	}
	return c.users[i][0]
}

// scaling tells whether a step is a varying column times a number, and which.
func (c *quickPlanner) scaling(i int) (column, number int, ok bool) {
	if c.p.slots[i].op != formula.Mul || !c.s.vary[i] {
		return 0, 0, false
	}
	args := c.args(i)
	switch {
	case c.s.vary[args[0]] && !c.s.vary[args[1]]:
		return args[0], args[1], true
	case c.s.vary[args[1]] && !c.s.vary[args[0]]:
		return args[1], args[0], true
	}
	return 0, 0, false
}

// join marks the products that the step that reads them computes itself, and
// the exponentials that are only multiplied by a number.
func (c *quickPlanner) join() {
	for _, i := range c.s.each {
		slot := &c.p.slots[i]
		switch slot.op {
		case formula.Exp:
			if u := c.alone(i); u >= 0 {
				if x, _, ok := c.scaling(u); ok && x == i {
					c.joined[i] = true
				}
			}
		case formula.Mul:
			if x, _, ok := c.scaling(i); ok && !c.joined[x] {
				if u := c.alone(i); u >= 0 && c.takesScaled(u, i) {
					c.joined[i] = true
				}
			}
		}
	}
}

// takesScaled says whether a step has a form that multiplies operand i itself.
func (c *quickPlanner) takesScaled(u, i int) bool {
	switch c.p.slots[u].op {
	case formula.Add, formula.Sub, formula.Div:
		return true
	case formula.Mul:
		args := c.args(u)
		return c.s.vary[args[0]] && c.s.vary[args[1]] && args[0] != args[1]
	}
	return false
}

// propagates says whether a step gives no finite number where operand a is
// not finite.
func (c *quickPlanner) propagates(u, a int) bool {
	slot := &c.p.slots[u]
	switch slot.op {
	case formula.Add, formula.Sub, formula.Mul, formula.Neg, formula.Sqrt, formula.Ln, formula.Log10, formula.Sin, formula.Cos, formula.Tan,
		formula.Asin, formula.Acos, formula.Sinh, formula.Cosh, formula.Abs, formula.Floor, formula.Ceil, formula.Round, formula.Cbrt, formula.Hypot:
		return true
	case formula.Div:
		return c.q.root[slot.args[0]] == a
	}
	return false
}

// findChecks decides, from the last step to the first, which results are
// looked at: those that may not be finite and whose trace could be lost.
func (c *quickPlanner) findChecks() {
	for i := len(c.p.slots) - 1; i >= 0; i-- {
		if !c.s.vary[i] || c.p.slots[i].alias {
			continue
		}
		for _, u := range c.users[i] {
			if c.sameHome(i, u) && c.looksAt(u, i) {
				c.found[i] = true
			}
			if c.sameHome(i, u) && c.propagates(u, i) && (c.found[u] || c.mustCheck(u)) {
				c.found[i] = true
			}
		}
	}
}

// looksAt says whether a step itself finds an operand that is not finite: that
// of exp tells, and a law whose range is bounded on both sides.
func (c *quickPlanner) looksAt(u, operand int) bool {
	slot := &c.p.slots[u]
	if slot.op == formula.Exp {
		return true
	}
	if slot.op != formula.Apply {
		return false
	}
	for k := range slot.checks {
		check := &slot.checks[k]
		if c.q.root[check.slot] == operand && column.Finite(check.low) && column.Finite(check.high) {
			return true
		}
	}
	return false
}

// mustCheck says whether a step's result may be infinite or no number though
// what it reads is finite.
func (c *quickPlanner) mustCheck(i int) bool {
	slot := &c.p.slots[i]
	return !slot.alias && (slot.risk != 0 || slot.op == formula.Apply || slot.op == formula.Tan || c.output[i])
}

// list gives the steps of a branch (of the whole block for home -1) in order.
func (c *quickPlanner) list(home int, side bool) []quickStep {
	var steps []quickStep
	for _, i := range c.s.each {
		slot := &c.p.slots[i]
		if slot.op == formula.Guard && home < 0 {
			steps = append(steps, quickStep{kind: guardStep, slot: i, a: c.q.root[slot.args[1]], b: -1, ka: -1, kb: -1})
		}
		if slot.alias || c.joined[i] || c.home[i] != home || home >= 0 && c.side[i] != side {
			continue
		}
		steps = append(steps, c.step(i))
	}
	return steps
}

// step makes the quick step of a slot.
func (c *quickPlanner) step(i int) quickStep {
	slot := &c.p.slots[i]
	q := quickStep{op: slot.op, slot: i, a: -1, b: -1, ka: -1, kb: -1, check: c.mustCheck(i) && !c.found[i]}
	args := c.args(i)
	switch slot.op {
	case formula.Apply:
		q.kind = lawStep
		return q
	case formula.Select:
		if c.s.vary[args[0]] {
			q.kind = chooseStep
			q.choose = &choose{condition: args[0], yes: c.branch(i, args[1], true), no: c.branch(i, args[2], false)}
			return q
		}
		q.a = args[0]
		return q
	case formula.Exp:
		q.kind, q.a = expStep, args[0]
		return q
	}
	q.a = args[0]
	if len(args) > 1 {
		q.b = args[1]
	}
	if x, number, ok := c.scaling(i); ok && c.joined[x] && c.p.slots[x].op == formula.Exp {
		q.kind, q.a, q.b, q.ka = expStep, c.args(x)[0], -1, number
		return q
	}
	if c.joined[q.a] {
		q.kind = scaledStep
		q.a, q.ka, _ = c.scaling(q.a)
	}
	if q.b >= 0 && c.joined[q.b] {
		q.kind = scaledStep
		q.b, q.kb, _ = c.scaling(q.b)
	}
	return q
}

func (c *quickPlanner) branch(choice, value int, side bool) branch {
	b := branch{value: value, own: c.home[value] == choice && c.side[value] == side && c.s.vary[value]}
	b.steps = c.list(choice, side)
	inside, seen := map[int]bool{}, map[int]bool{}
	c.eachSlot(b.steps, func(slot int) { inside[slot] = true })
	c.eachRead(b.steps, func(slot int) {
		if c.s.vary[slot] && !inside[slot] && !seen[slot] {
			seen[slot] = true
			b.reads = append(b.reads, slot)
		}
	})
	return b
}

// eachSlot visits the slots that steps compute.
func (c *quickPlanner) eachSlot(steps []quickStep, visit func(int)) {
	for k := range steps {
		if steps[k].choose != nil {
			c.eachSlot(steps[k].choose.yes.steps, visit)
			c.eachSlot(steps[k].choose.no.steps, visit)
		}
		if steps[k].kind != guardStep {
			visit(steps[k].slot)
		}
	}
}

// eachRead visits the slots that steps read.
func (c *quickPlanner) eachRead(steps []quickStep, visit func(int)) {
	for k := range steps {
		c.readsOf(&steps[k], visit)
		if ch := steps[k].choose; ch != nil {
			c.eachRead(ch.yes.steps, visit)
			c.eachRead(ch.no.steps, visit)
		}
	}
}

// readsOf visits the slots that one step reads itself.
func (c *quickPlanner) readsOf(step *quickStep, visit func(int)) {
	switch step.kind {
	case lawStep:
		for _, a := range c.args(step.slot) {
			visit(a)
		}
		return
	case chooseStep:
		visit(step.choose.condition)
		visit(step.choose.yes.value)
		visit(step.choose.no.value)
		return
	case plainStep:
		if step.op == formula.Select {
			for _, a := range c.args(step.slot) {
				visit(a)
			}
			return
		}
	}
	for _, a := range []int{step.a, step.b, step.ka, step.kb} {
		if a >= 0 {
			visit(a)
		}
	}
}

// assign gives every computed slot a scratch column for as long as it is read.
// A choice's own column is taken before the steps of its branches: one branch
// writes its rows there before the other runs.
func (c *quickPlanner) assign() {
	type turn struct {
		*quickStep
		opens bool // a choice whose branches follow
	}
	var order []turn
	var flatten func(steps []quickStep)
	flatten = func(steps []quickStep) {
		for k := range steps {
			if ch := steps[k].choose; ch != nil {
				order = append(order, turn{&steps[k], true})
				flatten(ch.yes.steps)
				flatten(ch.no.steps)
			}
			order = append(order, turn{&steps[k], false})
		}
	}
	flatten(c.q.steps)
	last := make([]int, len(c.p.slots))
	for at, step := range order {
		last[step.slot] = max(last[step.slot], at)
		if !step.opens {
			c.readsOf(step.quickStep, func(slot int) { last[slot], c.q.reads[slot] = at, true })
		}
	}
	for r, out := range c.output {
		if out {
			last[r] = len(order)
		}
	}
	ends := make([][]int, len(order)+1)
	var free []int
	for at, step := range order {
		if i := step.slot; step.kind != guardStep && step.opens == (step.choose != nil) && c.q.pinned[i] < 0 {
			if len(free) > 0 {
				c.q.scratch[i] = free[len(free)-1]
				free = free[:len(free)-1]
			} else {
				c.q.scratch[i] = c.q.columns
				c.q.columns++
			}
			ends[last[i]] = append(ends[last[i]], c.q.scratch[i])
		}
		free = append(free, ends[at]...)
	}
}
