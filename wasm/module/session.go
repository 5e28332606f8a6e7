//go:build wasip1

package main

import (
	"context"
	"math"

	"plumbrule/engine"
	"plumbrule/wasm/abi"
)

// session is one row of a program that is kept between updates.
type session struct {
	program *open
	session engine.Session
}

// begin begins a session and gives its number.
func (m *instance) begin(number int32) int32 {
	p := m.programs[number]
	if p == nil {
		m.fault = "this program is not open"
		return 0
	}
	if len(m.sessions) >= abi.MostSessions {
		m.fault = "1000 sessions are open: end some first"
		return 0
	}
	s, err := p.program.NewSession(context.Background())
	if err != nil {
		m.fault = err.Error()
		return 0
	}
	m.next++
	m.sessions[m.next] = &session{program: p, session: s}
	return m.next
}

// update gives knowns new numbers and writes the entries that change. Buffers
// are read and written by words of eight bytes, the lower half first.
func (m *instance) update(number, changes int32, in, out uint32) abi.Code {
	s := m.sessions[number]
	if s == nil {
		m.fault = "this session is not open"
		return abi.NoSuch
	}
	if changes < 0 || changes > abi.MostBuffer/abi.ChangeSize {
		m.fault = "the number of changes is negative or too large"
		return abi.BadInput
	}
	if m.bytesAt(in, abi.ChangeSize*int(changes)) == nil || m.bytesAt(out, abi.UpdateSize(s.program.entries)) == nil {
		m.fault = "the input or output buffer is too small or not reserved"
		return abi.BadInput
	}
	input := m.bufferAt(in)
	for k := range int(changes) {
		known := uint32(math.Float64bits(input[2*k+1]))
		if err := s.session.Set(int(known), input[2*k]); err != nil {
			m.fault = err.Error()
			return abi.BadInput
		}
	}
	changed, err := s.session.Update(context.Background())
	if err != nil {
		m.fault = err.Error()
		return abi.Failed
	}
	output := m.bufferAt(out)
	output[0] = math.Float64frombits(uint64(len(changed)))
	for k, e := range changed {
		value, state, reason := s.session.Entry(e)
		at := output[1+3*k : 4+3*k]
		at[0] = value
		at[1] = math.Float64frombits(uint64(e) | uint64(state)<<32)
		at[2] = math.Float64frombits(uint64(reason))
	}
	return abi.Done
}
