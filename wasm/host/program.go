package host

import (
	"context"
	"encoding/binary"
	"errors"
	"math"
	"sync"
	"unsafe"

	"plumbrule/engine/rows"
	"plumbrule/wasm/abi"
)

// Program is a sheet compiled in the module. It serves several goroutines at
// once; each instance of the pool compiles the sheet when it first runs it.
type Program struct {
	module      *Module
	id          int64
	text        string
	choices     string
	description rows.Description
	reasons     []rows.Reason
	rowsPerCall int
}

// Describe tells the program's knowns and entries.
func (p *Program) Describe() *rows.Description { return &p.description }

// Reasons is the table of reasons; index 0 is empty.
func (p *Program) Reasons() []rows.Reason { return p.reasons }

// Close forgets the program in every idle instance.
func (p *Program) Close() error {
	m := p.module
	m.mu.Lock()
	idle := m.idle
	m.idle = nil
	m.mu.Unlock()
	ctx := context.Background()
	var failed error
	for _, i := range idle {
		if number, ok := i.programs[p.id]; ok {
			if _, err := i.call(ctx, abi.ExportClose, uint64(number)); err != nil {
				failed = err
				continue
			}
			delete(i.programs, p.id)
		}
		m.mu.Lock()
		m.idle = append(m.idle, i)
		m.mu.Unlock()
	}
	return failed
}

// blockBytes is about how much one call moves in and out of an instance.
const blockBytes = 4 << 20

// rowsPerCall gives how many rows one call takes: enough to make the call's
// own cost small, few enough that the deadline is looked at often.
func rowsPerCall(d *rows.Description) int {
	perRow := 8*len(d.Knowns) + 13*len(d.Entries) + 1
	return max(1024, min(blockBytes/perRow, abi.MostRows)&^1023)
}

// Run evaluates rows into out; see rows.Program. Large runs are split over the
// pool's instances.
func (p *Program) Run(ctx context.Context, in rows.Input, out *rows.Outcome) error {
	if in.Rows <= p.rowsPerCall {
		return p.runInOne(ctx, in, out)
	}
	return p.runInParts(ctx, in, out)
}

// runInParts splits rows over the pool's instances.
func (p *Program) runInParts(ctx context.Context, in rows.Input, out *rows.Outcome) error {
	step := p.rowsPerCall
	r := &run{p: p, in: in, out: out}
	if err := r.readShape(); err != nil {
		return err
	}
	out.Resize(len(p.description.Entries), in.Rows)
	var group sync.WaitGroup
	starts := make(chan int)
	ctx, cancel := context.WithCancelCause(ctx)
	defer cancel(nil)
	for range min(cap(p.module.slots), (in.Rows+step-1)/step) {
		group.Go(func() {
			for from := range starts {
				if err := r.part(ctx, from, min(from+step, in.Rows)); err != nil {
					cancel(err)
				}
			}
		})
	}
feed:
	for from := 0; from < in.Rows; from += step {
		select {
		case starts <- from:
		case <-ctx.Done():
			break feed
		}
	}
	close(starts)
	group.Wait()
	if err := context.Cause(ctx); err != nil {
		return err
	}
	out.Tallies = r.all.Append(out.Tallies)
	return nil
}

// runInOne evaluates rows that one call takes.
func (p *Program) runInOne(ctx context.Context, in rows.Input, out *rows.Outcome) error {
	if err := ctx.Err(); err != nil {
		return err
	}
	i, err := p.module.take(ctx)
	if err != nil {
		return err
	}
	defer p.module.give(ctx, i)
	r := &i.job
	r.p, r.in, r.out = p, in, out
	if err = r.readShape(); err == nil {
		out.Resize(len(p.description.Entries), in.Rows)
		err = r.compute(ctx, i, 0, in.Rows)
	}
	if !r.all.Empty() {
		out.Tallies = r.all.Append(out.Tallies)
		r.all = rows.Tallies{}
	}
	r.in, r.out = rows.Input{}, nil
	return err
}

// run is one evaluation that several instances share.
type run struct {
	p     *Program
	in    rows.Input
	out   *rows.Outcome
	shape []byte
	mu    sync.Mutex
	all   rows.Tallies
}

// readShape checks the input and tells how each known is passed.
func (r *run) readShape() error {
	knowns := r.p.description.Knowns
	if r.in.Rows < 0 || len(r.in.Values) > len(knowns) {
		return errors.New("the input has more columns than the sheet has knowns, or a negative number of rows")
	}
	r.shape = r.shape[:0]
	for range knowns {
		r.shape = append(r.shape, abi.Own)
	}
	for k, values := range r.in.Values {
		switch {
		case len(values) == 0:
		case len(values) == 1:
			r.shape[k] = abi.Single
		case len(values) == r.in.Rows:
			r.shape[k] = abi.Column
		default:
			return errors.New("the column of " + knowns[k].Name + " is not as long as the run")
		}
	}
	return nil
}

// part computes the rows from from to to in an instance of the pool.
func (r *run) part(ctx context.Context, from, to int) error {
	if err := ctx.Err(); err != nil {
		return err
	}
	i, err := r.p.module.take(ctx)
	if err != nil {
		return err
	}
	defer r.p.module.give(ctx, i)
	return r.compute(ctx, i, from, to)
}

// compute computes the rows from from to to in one instance.
func (r *run) compute(ctx context.Context, i *instance, from, to int) error {
	number, ok := i.programs[r.p.id]
	if !ok {
		compiled, err := i.compile(ctx, r.p.text, r.p.choices)
		if err != nil {
			return err
		}
		number = int32(compiled.Program)
		i.programs[r.p.id] = number
	}
	n := to - from
	layout := abi.OutputLayout(len(r.out.Values), n)
	if err := i.ensure(ctx, &i.in, abi.InputSize(r.shape, n)); err != nil {
		return err
	}
	if err := i.ensure(ctx, &i.out, layout.Size); err != nil {
		return err
	}
	if err := r.writeInput(i, from, to); err != nil {
		return err
	}
	code, err := i.call(ctx, abi.ExportRun, uint64(uint32(number)), uint64(n), uint64(i.in.place), uint64(i.out.place))
	if err != nil {
		return err
	}
	if abi.Code(int32(code)) != abi.Done {
		return i.fault(ctx)
	}
	return r.readOutput(ctx, i, number, layout, from, to)
}

func (r *run) writeInput(i *instance, from, to int) error {
	at := i.in.place
	view, ok := i.memory.Read(at, uint32(abi.InputSize(r.shape, to-from)))
	if !ok {
		return errors.New("the input does not fit the module's memory")
	}
	copy(view, r.shape)
	view = view[(len(r.shape)+7)&^7:]
	for k, s := range r.shape {
		switch s {
		case abi.Single:
			copyFloats(view, r.in.Values[k][:1])
			view = view[8:]
		case abi.Column:
			copyFloats(view, r.in.Values[k][from:to])
			view = view[8*(to-from):]
		}
	}
	return nil
}

// littleEndian says whether this processor stores numbers as the module does.
var littleEndian = binary.NativeEndian.Uint16([]byte{1, 0}) == 1

// copyFloats writes numbers as the module stores them.
func copyFloats(dst []byte, src []float64) {
	if len(src) == 0 {
		return
	}
	if littleEndian {
		copy(dst, unsafe.Slice((*byte)(unsafe.Pointer(&src[0])), 8*len(src)))
		return
	}
	for i, x := range src {
		binary.LittleEndian.PutUint64(dst[8*i:], math.Float64bits(x))
	}
}

// readFloats reads numbers as the module stores them.
func readFloats(dst []float64, src []byte) {
	if len(dst) == 0 {
		return
	}
	if littleEndian {
		copy(unsafe.Slice((*byte)(unsafe.Pointer(&dst[0])), 8*len(dst)), src)
		return
	}
	for i := range dst {
		dst[i] = math.Float64frombits(binary.LittleEndian.Uint64(src[8*i:]))
	}
}

func (r *run) readOutput(ctx context.Context, i *instance, number int32, layout abi.Output, from, to int) error {
	n := to - from
	view, ok := i.memory.Read(i.out.place, uint32(layout.Size))
	if !ok {
		i.dead = true
		return errors.New("the output does not fit the module's memory")
	}
	marked := false
	for e := range r.out.Values {
		readFloats(r.out.Values[e][from:to], view[8*e*n:])
		if view[layout.Flags+e] == 0 {
			continue
		}
		marked = true
		r.mu.Lock()
		if r.out.States[e] == nil {
			r.out.States[e] = make([]rows.State, r.in.Rows)
			r.out.Reasons[e] = make([]int32, r.in.Rows)
		}
		r.mu.Unlock()
		states, reasons := r.out.States[e][from:to], r.out.Reasons[e][from:to]
		stateBytes, reasonBytes := view[layout.States+e*n:], view[layout.Reasons+4*e*n:]
		for row := range states {
			states[row] = rows.State(stateBytes[row])
			reasons[row] = int32(binary.LittleEndian.Uint32(reasonBytes[4*row:]))
		}
	}
	if !marked {
		return nil
	}
	var tallies []rows.Tally
	if err := i.read(ctx, &tallies, abi.ExportTallies, uint64(uint32(number))); err != nil {
		return err
	}
	r.mu.Lock()
	defer r.mu.Unlock()
	for _, t := range tallies {
		r.all.Add(t, r.p.reasons[t.Reason].Below)
	}
	return nil
}
