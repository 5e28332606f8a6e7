//go:build wasip1

package main

import (
	"context"
	"strings"
	"unsafe"

	"plumbrule/engine"
	"plumbrule/engine/rows"
	"plumbrule/functions"
	"plumbrule/wasm/abi"
)

// instance is what one module instance holds. It serves one caller at a time.
type instance struct {
	buffers  map[uint32][]float64 // reserved buffers by their place
	programs map[int32]*open
	sessions map[int32]*session
	next     int32 // number of the last program or session
	recent   [2]recent
	latest   *open  // the program of the last run
	doc      []byte // the last document; valid until the next call
	fault    string
}

type recent struct {
	place  uint32
	buffer []float64
}

// open is a compiled program with what its runs use again.
type open struct {
	number  int32
	program *engine.Program
	knowns  int
	entries int
	in      rows.Input
	out     rows.Outcome
	placed  placement
}

// placement tells where in and out of a program point to. A host calls again
// and again with the same buffers and the same shape.
type placement struct {
	in, out uint32
	rows    int    // -1 where they point nowhere
	shape   string // of the knowns
	told    []byte // where the host writes it
	layout  abi.Output
	whole   []byte // the output
}

var module = instance{buffers: map[uint32][]float64{}, programs: map[int32]*open{}, sessions: map[int32]*session{}}

// guard turns a panic, which is a defect, into a fault and a failed result, so
// that the host never meets a trap from the engine's own code.
func guard[T any](result *T, failed T) {
	if r := recover(); r != nil {
		module.tell(r)
		*result = failed
	}
}

// tell makes a panic a fault.
func (m *instance) tell(r any) {
	m.fault = "a defect of the module"
	if err, ok := r.(error); ok {
		m.fault += ": " + err.Error()
	} else if text, ok := r.(string); ok {
		m.fault += ": " + text
	}
}

func (m *instance) document(text []byte) uint64 {
	m.doc = text
	if len(text) == 0 {
		return 0
	}
	return abi.Doc(uint32(uintptr(unsafe.Pointer(&m.doc[0]))), uint32(len(m.doc)))
}

// bufferAt gives the reserved buffer at a place, or nil. A host calls again
// and again with the same two.
func (m *instance) bufferAt(pointer uint32) []float64 {
	for i := range m.recent {
		if m.recent[i].place == pointer {
			return m.recent[i].buffer
		}
	}
	buffer := m.buffers[pointer]
	if buffer != nil {
		m.recent[1] = m.recent[0]
		m.recent[0] = recent{pointer, buffer}
	}
	return buffer
}

// bytesAt gives a stretch of a reserved buffer; nil where it leaves the buffer.
func (m *instance) bytesAt(pointer uint32, length int) []byte {
	if length == 0 {
		return []byte{}
	}
	buffer := m.bufferAt(pointer)
	if buffer == nil || length < 0 || length > 8*len(buffer) {
		return nil
	}
	return unsafe.Slice((*byte)(unsafe.Pointer(&buffer[0])), length)
}

func (m *instance) reserve(size int32) uint32 {
	if size <= 0 || int(size) > abi.MostBuffer {
		m.fault = "a buffer has 1 to 268435456 bytes"
		return 0
	}
	buffer := make([]float64, (int(size)+7)/8)
	place := uint32(uintptr(unsafe.Pointer(&buffer[0])))
	m.buffers[place] = buffer
	return place
}

func (m *instance) close(number int32) {
	delete(m.programs, number)
	m.latest = nil
	for k, s := range m.sessions {
		if s.program.number == number {
			delete(m.sessions, k)
		}
	}
}

func (m *instance) release(place uint32) {
	delete(m.buffers, place)
	m.recent = [2]recent{}
	for _, p := range m.programs {
		p.placed = placement{rows: -1}
	}
}

func (m *instance) compile(text, choices []byte) uint64 {
	var compiled abi.Compiled
	if len(m.programs) >= abi.MostPrograms {
		m.fault = "1000 programs are open: close some first"
		return 0
	}
	native := engine.Native{Catalogue: functions.All(), Workers: 1}
	program, err := native.Compile(context.Background(), string(text), readChoices(string(choices)))
	if err != nil {
		problems, ok := err.(*engine.SheetError)
		if !ok {
			m.fault = err.Error()
			return 0
		}
		compiled.Problems = problems.Problems
		return m.document(compiled.Append(m.doc[:0]))
	}
	m.next++
	described := program.Describe()
	m.programs[m.next] = &open{number: m.next, program: program.(*engine.Program), knowns: len(described.Knowns), entries: len(described.Entries), placed: placement{rows: -1}}
	compiled.Program = int(m.next)
	compiled.Description = *program.Describe()
	return m.document(compiled.Append(m.doc[:0]))
}

// readChoices reads lines "name=choice".
func readChoices(text string) map[string][]string {
	if text == "" {
		return nil
	}
	choices := map[string][]string{}
	for line := range strings.SplitSeq(text, "\n") {
		if name, choice, ok := strings.Cut(line, "="); ok {
			choices[name] = append(choices[name], choice)
		}
	}
	return choices
}

func (m *instance) run(number, count int32, in, out uint32) abi.Code {
	p := m.latest
	if p == nil || p.number != number {
		if p = m.programs[number]; p == nil {
			m.fault = "this program is not open"
			return abi.NoSuch
		}
		m.latest = p
	}
	if count < 0 || count > abi.MostRows {
		m.fault = "a run has 0 to 1048576 rows"
		return abi.BadInput
	}
	if at := &p.placed; at.rows != int(count) || at.in != in || at.out != out || at.shape != string(at.told) {
		if !m.place(p, int(count), in, out) {
			return abi.BadInput
		}
	}
	if err := p.program.Run(context.Background(), p.in, &p.out); err != nil {
		m.fault = err.Error()
		return abi.BadInput
	}
	p.writeStates()
	return abi.Done
}

// place lets a program's input and results point into the host's buffers.
func (m *instance) place(p *open, n int, in, out uint32) bool {
	shape := m.bytesAt(in, p.knowns)
	if shape == nil {
		m.fault = "the input is not a reserved buffer"
		return false
	}
	p.placed = placement{rows: -1}
	if !m.placeInput(p, n, in, shape) || !m.placeOutput(p, n, out) {
		return false
	}
	p.placed.in, p.placed.out, p.placed.rows = in, out, n
	p.placed.shape, p.placed.told = string(shape), shape
	return true
}

func (m *instance) placeInput(p *open, n int, in uint32, shape []byte) bool {
	if size := abi.InputSize(shape, n); m.bytesAt(in, size) == nil {
		m.fault = "the input buffer is too small for its columns"
		return false
	}
	if len(p.in.Values) != p.knowns {
		p.in.Values = make([][]float64, p.knowns)
	}
	p.in.Rows = n
	if p.knowns == 0 {
		return true
	}
	buffer := m.bufferAt(in)
	at := (p.knowns + 7) / 8
	for k, s := range shape {
		switch s {
		case abi.Single:
			p.in.Values[k] = buffer[at : at+1]
			at++
		case abi.Column:
			p.in.Values[k] = buffer[at : at+n]
			at += n
		default:
			p.in.Values[k] = nil
		}
	}
	return true
}

func (m *instance) placeOutput(p *open, n int, out uint32) bool {
	layout := abi.OutputLayout(p.entries, n)
	whole := m.bytesAt(out, layout.Size)
	if whole == nil {
		m.fault = "the output buffer is too small"
		return false
	}
	p.placed.layout, p.placed.whole = layout, whole
	if len(p.out.Values) != p.entries {
		p.out.Resize(p.entries, 0)
	}
	if layout.Size == 0 {
		return true
	}
	buffer := m.bufferAt(out)
	for e := range p.out.Values {
		p.out.Values[e] = buffer[e*n : (e+1)*n : (e+1)*n]
	}
	return true
}

// writeStates writes the states and reasons of a run behind its numbers.
func (p *open) writeStates() {
	layout, whole, n := &p.placed.layout, p.placed.whole, p.placed.rows
	for e, states := range p.out.States {
		if states == nil {
			whole[layout.Flags+e] = 0
			continue
		}
		whole[layout.Flags+e] = 1
		at := whole[layout.States+e*n:]
		for i, state := range states {
			at[i] = byte(state)
		}
		at = whole[layout.Reasons+4*e*n:]
		for i, reason := range p.out.Reasons[e] {
			at[4*i], at[4*i+1], at[4*i+2], at[4*i+3] = byte(reason), byte(reason>>8), byte(reason>>16), byte(reason>>24)
		}
	}
}
