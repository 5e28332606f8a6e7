package host

import (
	"context"
	"encoding/binary"
	"errors"
	"math"
	"strconv"

	"plumbrule/engine/rows"
	"plumbrule/wasm/abi"
)

// session is one row of a program that an instance of its own keeps. Should the
// instance be lost, the next update begins again in a fresh one with all that
// was set.
type session struct {
	program *Program
	values  []float64 // of the knowns that were set
	set     []bool    // by known: it was set at some time
	pending []bool    // by known: the instance does not know its value yet
	changes []int     // the pending ones
	entries []entryNow
	changed []int
	home    *instance // nil before the first update and after a loss
	number  int32     // in the instance
	closed  bool
}

// entryNow is an entry as of the last update.
type entryNow struct {
	value  float64
	state  rows.State
	reason int
}

// NewSession begins a session; see rows.Session. It has an instance of its own
// until it is closed.
func (p *Program) NewSession(ctx context.Context) (rows.Session, error) {
	knowns := len(p.description.Knowns)
	s := &session{program: p, values: make([]float64, knowns), set: make([]bool, knowns), pending: make([]bool, knowns), entries: make([]entryNow, len(p.description.Entries))}
	for e := range s.entries {
		s.entries[e] = entryNow{math.NaN(), rows.Waiting, 0}
	}
	if err := s.whileOpen(ctx, func() error { return s.begin(ctx) }); err != nil {
		return nil, err
	}
	return s, nil
}

// begin starts an instance for the session and compiles the sheet in it.
func (s *session) begin(ctx context.Context) error {
	i, err := s.program.module.start(ctx)
	if err != nil {
		return err
	}
	number, err := i.beginSession(ctx, s.program)
	if err != nil {
		i.module.Close(ctx)
		return err
	}
	s.home, s.number = i, number
	s.changes = s.changes[:0]
	for k, set := range s.set {
		if s.pending[k] = set; set {
			s.changes = append(s.changes, k)
		}
	}
	return nil
}

func (i *instance) beginSession(ctx context.Context, p *Program) (int32, error) {
	compiled, err := i.compile(ctx, p.text, p.choices)
	if err != nil {
		return 0, err
	}
	number, err := i.call(ctx, abi.ExportSession, uint64(compiled.Program))
	if err != nil {
		return 0, err
	}
	if number == 0 {
		return 0, i.fault(ctx)
	}
	return int32(number), i.ensure(ctx, &i.out, abi.UpdateSize(len(p.description.Entries)))
}

// Set gives a known an SI number from the next update on.
func (s *session) Set(known int, value float64) error {
	if known < 0 || known >= len(s.values) {
		return errors.New("the sheet has no known number " + strconv.Itoa(known))
	}
	s.values[known], s.set[known] = value, true
	if !s.pending[known] {
		s.pending[known] = true
		s.changes = append(s.changes, known)
	}
	return nil
}

// Update computes what depends on the knowns that were set.
func (s *session) Update(ctx context.Context) ([]int, error) {
	if s.closed {
		return nil, errors.New("the session is closed")
	}
	err := s.whileOpen(ctx, func() error {
		if s.home == nil {
			if err := s.begin(ctx); err != nil {
				return err
			}
		}
		return s.update(ctx)
	})
	if err != nil && s.home != nil && s.home.dead {
		s.home.module.Close(ctx)
		s.home = nil
	}
	if err != nil {
		return nil, err
	}
	return s.changed, nil
}

// whileOpen does what needs the session's instance while the module is open
// and as few instances run as were asked for.
func (s *session) whileOpen(ctx context.Context, work func() error) error {
	m := s.program.module
	if err := m.hold(ctx); err != nil {
		return err
	}
	defer func() { <-m.slots }()
	select {
	case <-m.ended:
		return ErrClosed
	default:
		return work()
	}
}

func (s *session) update(ctx context.Context) error {
	i := s.home
	size := abi.ChangeSize * len(s.changes)
	if err := i.ensure(ctx, &i.in, size); err != nil {
		return err
	}
	view, ok := i.memory.Read(i.in.place, uint32(size))
	if !ok {
		return errors.New("the changes do not fit the module's memory")
	}
	for at, known := range s.changes {
		change := view[abi.ChangeSize*at:]
		binary.LittleEndian.PutUint64(change, math.Float64bits(s.values[known]))
		binary.LittleEndian.PutUint64(change[abi.ChangeKnown:], uint64(known))
	}
	code, err := i.call(ctx, abi.ExportUpdate, uint64(uint32(s.number)), uint64(len(s.changes)), uint64(i.in.place), uint64(i.out.place))
	if err != nil {
		return err
	}
	if abi.Code(int32(code)) != abi.Done {
		return i.fault(ctx)
	}
	for _, known := range s.changes {
		s.pending[known] = false
	}
	s.changes = s.changes[:0]
	return s.read(i)
}

// read takes over the entries that an update has changed.
func (s *session) read(i *instance) error {
	s.changed = s.changed[:0]
	count, ok := i.memory.ReadUint32Le(i.out.place)
	view, fits := i.memory.Read(i.out.place+abi.EntriesAt, abi.EntrySize*count)
	if !ok || !fits || int(count) > len(s.entries) {
		i.dead = true
		return errors.New("the module gave an update outside its memory")
	}
	for ; len(view) > 0; view = view[abi.EntrySize:] {
		e := int(binary.LittleEndian.Uint32(view[abi.EntryPlace:]))
		if e >= len(s.entries) {
			i.dead = true
			return errors.New("the module gave an entry that the sheet does not have")
		}
		s.entries[e] = entryNow{
			value:  math.Float64frombits(binary.LittleEndian.Uint64(view)),
			state:  rows.State(binary.LittleEndian.Uint32(view[abi.EntryState:])),
			reason: int(binary.LittleEndian.Uint32(view[abi.EntryReason:])),
		}
		s.changed = append(s.changed, e)
	}
	return nil
}

// Entry gives an entry as of the last update.
func (s *session) Entry(entry int) (value float64, state rows.State, reason int) {
	if entry < 0 || entry >= len(s.entries) {
		return math.NaN(), rows.Waiting, 0
	}
	now := &s.entries[entry]
	return now.value, now.state, now.reason
}

// Close ends the session's instance.
func (s *session) Close() error {
	s.closed = true
	if s.home == nil {
		return nil
	}
	err := s.home.module.Close(context.Background())
	s.home = nil
	return err
}
