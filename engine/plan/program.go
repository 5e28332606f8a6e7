package plan

import (
	"math"
	"strconv"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// KnownSpec is an input as the plan needs it, in coherent SI units.
type KnownSpec struct {
	Name     string
	Value    float64
	HasValue bool
	HasRange bool
	Low      float64
	High     float64
	Unit     unit.Unit
	Choices  int // of a text known; 0 otherwise
	Truth    bool
}

// listed says whether only certain whole numbers stand for a value.
func (k *KnownSpec) listed() bool { return k.Choices > 0 || k.Truth }

// EntrySpec is a result: its name, its finished node (formula.Entry, or a
// constant) and its role.
type EntrySpec struct {
	Name string
	Node *formula.Node
	Role rows.Role
}

// Program is a sheet as a flat list of column steps. It does not change and
// serves several goroutines.
type Program struct {
	knowns  []KnownSpec
	entries []string // their names
	slots   []slot   // in an order in which arguments come before users
	outputs []int    // slot of each entry
	inputs  []int    // slot of each known, -1 where nothing reads it
	reasons []rows.Reason
	missing []int32    // reason of each known without a value
	wait    []int32    // by slot: the reason "waits for NAME"; 0 for slots that are not an entry's
	outside [][2]int32 // reasons of each known below and above its bounds, or that is none of its choices
	slotOf  []int      // by node ID; -1 where nothing needs the node
	cost    int
	cache   scheduleCache
	single  oneRow
}

// slot is one step and the place of its value.
type slot struct {
	op       formula.Op
	alias    bool    // the value is that of args[0]
	risk     int32   // the reason when an operation makes no finite number of finite ones
	a, b     int32   // the first two of args, 0 where there are fewer
	value    float64 // of a constant
	args     []int   // slots
	known    int32
	guard    int32
	*lawPlan // of formula.Apply
}

// lawPlan is how a slot calls a law.
type lawPlan struct {
	law       *law.Law
	arguments []argumentPlan
	checks    []check
	refusal   int32 // the reason when the law gives no number
}

// argumentPlan says how one argument of a law is put together.
type argumentPlan struct {
	slot  int // a number; -1 for a composed argument
	text  string
	maker *law.Law
	items []argumentPlan
	fixed []law.Argument // a constant list
}

// check is a range check of one number of a law's argument.
type check struct {
	slot int
	bounds
	below, above             int32 // reasons of the stated range
	finiteBelow, finiteAbove int32 // reasons of the finite range
	of                       *law.Law
	parameter                *law.Parameter
}

// Build plans a sheet. Every node was made by one Graph; source gives the
// user's text of a place, for reasons.
func Build(graph *Graph, knowns []KnownSpec, entries []EntrySpec, source func(problem.Span) string) *Program {
	b := &builder{
		p:       &Program{knowns: bounded(knowns), reasons: make([]rows.Reason, 1, 2+2*len(entries))},
		slotOf:  make([]int, len(graph.nodes)),
		reasons: map[reasonKey]int32{},
		texts:   map[string]int32{},
		source:  source,
	}
	for i := range b.slotOf {
		b.slotOf[i] = -1
	}
	needed := make([]bool, len(graph.nodes))
	for _, e := range entries {
		needed[e.Node.ID] = true
	}
	for id := len(graph.nodes) - 1; id >= 0; id-- {
		if n := graph.nodes[id]; n.Op == formula.KnownOp && n.Index >= 0 {
			needed[id] = true // a known that nothing reads can be explained too
		}
		if !needed[id] {
			continue
		}
		for _, a := range graph.nodes[id].Args {
			needed[a.ID] = true
		}
	}
	steps := 0
	for _, n := range needed {
		if n {
			steps++
		}
	}
	b.p.slots, b.p.wait = make([]slot, 0, steps), make([]int32, 0, steps)
	b.p.inputs = make([]int, len(knowns))
	for k := range knowns {
		b.p.inputs[k] = -1
		b.p.missing = append(b.p.missing, b.text(rows.Reason{Text: knowns[k].Name + " has no value", Argument: knowns[k].Name}))
		b.p.outside = append(b.p.outside, b.rangeReasons(&knowns[k]))
	}
	for id, node := range graph.nodes {
		if needed[id] {
			b.place(node)
		}
	}
	b.p.slotOf = b.slotOf
	for _, e := range entries {
		b.p.entries = append(b.p.entries, e.Name)
		b.p.outputs = append(b.p.outputs, b.slotOf[e.Node.ID])
	}
	return b.p
}

// bounded gives the knowns with NaN for a missing value and, where a known has
// no range, that of all numbers.
func bounded(knowns []KnownSpec) []KnownSpec {
	knowns = append([]KnownSpec(nil), knowns...)
	for k := range knowns {
		known := &knowns[k]
		if !known.HasValue {
			known.Value = column.NaN()
		}
		if !known.HasRange {
			known.Low, known.High = -math.MaxFloat64, math.MaxFloat64
		}
	}
	return knowns
}

// Reasons is the table of reasons; index 0 is empty.
func (p *Program) Reasons() []rows.Reason { return p.reasons }

// Cost is the cost of one row in operations.
func (p *Program) Cost() int { return p.cost }

type reasonKey struct {
	law       *law.Law
	parameter int
	side      int
}

type builder struct {
	p       *Program
	slotOf  []int
	reasons map[reasonKey]int32
	texts   map[string]int32
	source  func(problem.Span) string
	free    []int // room for the operands of slots
}

// room gives room for n operands; many slots share one piece of memory.
func (b *builder) room(n int) []int {
	if len(b.free) < n {
		b.free = make([]int, max(n, 1024))
	}
	room := b.free[:n:n]
	b.free = b.free[n:]
	return room
}

// text gives the reason with these words, added where it is new.
func (b *builder) text(r rows.Reason) int32 {
	if known, ok := b.texts[r.Text]; ok {
		return known
	}
	index := b.reason(r)
	b.texts[r.Text] = index
	return index
}

// reason adds a reason that no other part of the sheet has.
func (b *builder) reason(r rows.Reason) int32 {
	b.p.reasons = append(b.p.reasons, r)
	return int32(len(b.p.reasons) - 1)
}

func (b *builder) rangeReasons(k *KnownSpec) [2]int32 {
	switch {
	case k.Choices > 0:
		none := b.text(rows.Reason{Text: k.Name + " is none of its " + strconv.Itoa(k.Choices) + " choices in this row", Argument: k.Name})
		return [2]int32{none, none}
	case k.Truth:
		none := b.text(rows.Reason{Text: k.Name + " is neither true nor false in this row", Argument: k.Name})
		return [2]int32{none, none}
	case !k.HasRange:
		return [2]int32{}
	}
	show := func(x float64, below bool) int32 {
		word := "above"
		if below {
			word = "below"
		}
		bound := showNumber(k.Unit.FromSI(x), k.Unit)
		return b.text(rows.Reason{Text: k.Name + " lies " + word + " " + bound + ", the bound it is known within", Argument: k.Name, Bound: bound, Unit: k.Unit.Text(), Scale: scaleOf(k.Unit), Below: below})
	}
	return [2]int32{show(k.Low, true), show(k.High, false)}
}

// place makes the slot of a node whose arguments have theirs.
func (b *builder) place(n *formula.Node) {
	s := slot{op: n.Op, known: -1}
	wait := int32(0)
	switch n.Op {
	case formula.Word, formula.Items, formula.MadeOp:
		return // these live in the arguments of the law that takes them
	case formula.Const:
		s.value = n.Value
	case formula.KnownOp:
		s.known = int32(n.Index)
		b.p.inputs[n.Index] = len(b.p.slots)
	case formula.Apply:
		b.placeLaw(n, &s)
	default:
		s.args = b.room(len(n.Args))
		for i, a := range n.Args {
			s.args[i] = b.slotOf[a.ID]
		}
		s.alias = n.Op == formula.Same || n.Op == formula.Entry || n.Op == formula.Guard
		if n.Op == formula.Entry {
			wait = b.reason(rows.Reason{Text: "waits for " + n.Text, Argument: n.Text})
			s.risk = b.reason(rows.Reason{Text: "the formula of " + n.Text + " gives no finite number: its size leaves the range of numbers"})
		}
		if n.Op == formula.Guard {
			s.guard = b.text(rows.Reason{Text: n.Text})
		}
		if words := riskOf(n); words != "" {
			s.risk = b.text(rows.Reason{Text: words + b.inFormula(n)})
		}
		b.p.cost += costOf(n.Op)
	}
	if len(s.args) > 0 {
		s.a = int32(s.args[0])
	}
	if len(s.args) > 1 {
		s.b = int32(s.args[1])
	}
	b.slotOf[n.ID] = len(b.p.slots)
	b.p.slots = append(b.p.slots, s)
	b.p.wait = append(b.p.wait, wait)
}

func (b *builder) inFormula(n *formula.Node) string {
	text := b.source(n.Place)
	if text == "" {
		return ""
	}
	return " in " + text
}

// riskOf says what it means when an operation makes no finite number of finite
// ones; empty for operations that do so only by size.
func riskOf(n *formula.Node) string {
	switch n.Op {
	case formula.Div:
		if n.Args[1].IsConst() && n.Args[1].Value != 0 {
			return ""
		}
		return "division by zero"
	case formula.Sqrt:
		return "square root of a negative number"
	case formula.Ln, formula.Log10:
		return "logarithm of a number that is not positive"
	case formula.Pow:
		return "power without a finite result"
	case formula.Asin, formula.Acos:
		return "argument outside -1 to 1"
	}
	return ""
}

func costOf(op formula.Op) int {
	switch op {
	case formula.Exp, formula.Ln, formula.Log10, formula.Sin, formula.Cos, formula.Tan, formula.Asin, formula.Acos, formula.Atan, formula.Atan2, formula.Sinh, formula.Cosh, formula.Tanh, formula.Cbrt, formula.Hypot:
		return 10
	case formula.Pow:
		return 20
	case formula.Same, formula.Entry:
		return 0
	}
	return 1
}

// lawCost is what a call of a law counts for, and each number it takes.
const lawCost, numberCost = 50, 2

func (b *builder) placeLaw(n *formula.Node, s *slot) {
	s.lawPlan = &lawPlan{law: n.Law}
	for i, a := range n.Args {
		s.arguments = append(s.arguments, b.argument(a))
		if i < len(n.Law.Parameters) {
			b.addChecks(s, n.Law, i, a)
		}
	}
	b.gather(s, s.arguments)
	words := n.Law.Refusal
	if words == "" {
		words = "it gives no finite number for these arguments"
	}
	s.refusal = b.text(rows.Reason{Text: n.Law.Name + ": " + words, Law: n.Law.Name})
	b.p.cost += lawCost + numberCost*len(s.args)
}

func (b *builder) argument(n *formula.Node) argumentPlan {
	switch n.Op {
	case formula.Word:
		return argumentPlan{slot: -1, text: n.Text}
	case formula.Items, formula.MadeOp:
		if n.Numbers != nil {
			return argumentPlan{slot: -1, fixed: formula.NumbersAsItems(n.Numbers)}
		}
		a := argumentPlan{slot: -1, items: make([]argumentPlan, len(n.Args))}
		if n.Op == formula.MadeOp {
			a.maker = n.Law
		}
		for i, part := range n.Args {
			a.items[i] = b.argument(part)
		}
		return a
	}
	return argumentPlan{slot: b.slotOf[n.ID]}
}

// gather lists every slot that a law's arguments read.
func (b *builder) gather(s *slot, arguments []argumentPlan) {
	for i := range arguments {
		if arguments[i].slot >= 0 {
			s.args = append(s.args, arguments[i].slot)
		}
		b.gather(s, arguments[i].items)
	}
}

// addChecks lists the range checks of one argument: of a number itself, of
// each item of a list, of every argument of the laws that made a made value.
func (b *builder) addChecks(s *slot, l *law.Law, parameter int, n *formula.Node) {
	switch n.Op {
	case formula.Word:
	case formula.MadeOp:
		for i, part := range n.Args {
			b.addChecks(s, n.Law, i, part)
		}
	case formula.Items:
		for _, item := range n.Args {
			b.addChecks(s, l, parameter, item)
		}
		if n.Numbers != nil {
			b.addConstantChecks(s, l, parameter, n)
		}
	default:
		b.addCheck(s, l, parameter, b.slotOf[n.ID])
	}
}

func (b *builder) addCheck(s *slot, l *law.Law, parameter, of int) {
	p := &l.Parameters[parameter]
	limits := boundsOf(p)
	if !limits.any {
		return
	}
	c := check{slot: of, bounds: limits, of: l, parameter: p}
	side := func(index int, r law.Range, has, below, finite bool) int32 {
		if !has {
			return 0
		}
		k := reasonKey{l, parameter, index}
		if known, ok := b.reasons[k]; ok {
			return known
		}
		made := b.text(boundReason(l, p, r, limits.shown, below, finite))
		b.reasons[k] = made
		return made
	}
	c.below = side(0, p.Valid, p.Valid.HasLow, true, false)
	c.above = side(1, p.Valid, p.Valid.HasHigh, false, false)
	c.finiteBelow = side(2, p.Finite, p.Finite.HasLow, true, true)
	c.finiteAbove = side(3, p.Finite, p.Finite.HasHigh, false, true)
	s.checks = append(s.checks, c)
}

// addConstantChecks keeps a check only for the items of a constant list that
// lie outside: the others can never matter.
func (b *builder) addConstantChecks(s *slot, l *law.Law, parameter int, n *formula.Node) {
	limits := boundsOf(&l.Parameters[parameter])
	if !limits.any {
		return
	}
	for _, x := range n.Numbers {
		if x >= limits.low && x <= limits.high {
			continue
		}
		b.p.slots = append(b.p.slots, slot{op: formula.Const, value: x, known: -1})
		b.p.wait = append(b.p.wait, 0)
		b.addCheck(s, l, parameter, len(b.p.slots)-1)
	}
}
