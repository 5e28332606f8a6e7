package main

import (
	"context"
	"errors"
	"strconv"
	"sync"

	"plumbrule/engine/rows"
)

// mostTexts bounds how many texts that the sheet does not list one run takes
// for one known: each makes the program anew.
const mostTexts = 200

// choiceMaker lets data bring texts that the sheet does not list: the program
// is made anew with each. Choices are only ever added, so that an index stays
// right in every later program.
type choiceMaker struct {
	programs sync.RWMutex // held for reading while a program runs
	mu       sync.RWMutex // guards what follows
	o        *opened
	index    map[string]map[string]int // by known, then text
	refused  map[string]map[string]string
	turns    *turns
}

func newChoiceMaker(o *opened) *choiceMaker {
	m := &choiceMaker{o: o, index: map[string]map[string]int{}, refused: map[string]map[string]string{}, turns: newTurns()}
	m.list()
	return m
}

// list takes the choices from the program.
func (m *choiceMaker) list() {
	knowns := m.o.program.Describe().Knowns
	for i := range knowns {
		if knowns[i].Form != rows.Choice {
			continue
		}
		texts := map[string]int{}
		for n, text := range knowns[i].Choices {
			texts[text] = n
		}
		m.index[knowns[i].Name] = texts
		if m.refused[knowns[i].Name] == nil {
			m.refused[knowns[i].Name] = map[string]string{}
		}
	}
}

// hold gives the program for a run; release must be called after it.
func (m *choiceMaker) hold() (program rows.Program, release func()) {
	m.programs.RLock()
	return m.o.program, m.programs.RUnlock
}

// choose gives the index of a text that a block brings. A text that does not
// suit is a badCell. New texts are taken in the order of the data, whatever
// block comes first, so that the limit falls on the same texts in every run.
func (m *choiceMaker) choose(ctx context.Context, block int, s *source, text string) (float64, error) {
	if index, err, found := m.find(s, text); found {
		return index, err
	}
	if err := m.turns.wait(ctx, block); err != nil {
		return 0, err
	}
	if index, err, found := m.find(s, text); found {
		return index, err
	}
	m.mu.Lock()
	defer m.mu.Unlock()
	if len(m.o.choices[s.name])+len(m.refused[s.name]) >= mostTexts {
		return 0, badCell("'" + clip(text) + "' is one text too many: a run takes " + strconv.Itoa(mostTexts) + " that the sheet does not list")
	}
	index, err := m.add(ctx, s, text)
	var wrong *fault
	if errors.As(err, &wrong) {
		why := wrong.message
		m.refused[s.name][text] = why
		return 0, badCell(why)
	}
	return float64(index), err
}

// find gives what is known of a text already.
func (m *choiceMaker) find(s *source, text string) (index float64, err error, found bool) {
	m.mu.RLock()
	defer m.mu.RUnlock()
	if i, ok := m.index[s.name][text]; ok {
		return float64(i), nil, true
	}
	if why, ok := m.refused[s.name][text]; ok {
		return 0, badCell(why), true
	}
	return 0, nil, false
}

func (m *choiceMaker) add(ctx context.Context, s *source, text string) (int, error) {
	m.programs.Lock()
	defer m.programs.Unlock()
	before := append([]string(nil), m.o.choices[s.name]...)
	known := m.o.program.Describe().Knowns[s.known]
	index, err := m.o.choose(ctx, &known, text)
	if err != nil {
		m.o.choices[s.name] = before
		return 0, err
	}
	m.list()
	return index, nil
}

func (m *choiceMaker) close() { _ = m.o.program.Close() } // nothing is lost with it

// turns lets each block wait until all blocks before it are parsed.
type turns struct {
	mu     sync.Mutex
	next   int // the first block that is not parsed
	parsed map[int]bool
	moved  chan struct{} // closed when next moves on
}

func newTurns() *turns { return &turns{parsed: map[int]bool{}, moved: make(chan struct{})} }

// done tells that a block is parsed.
func (t *turns) done(block int) {
	t.mu.Lock()
	defer t.mu.Unlock()
	t.parsed[block] = true
	for t.parsed[t.next] {
		delete(t.parsed, t.next)
		t.next++
	}
	close(t.moved)
	t.moved = make(chan struct{})
}

// wait waits until all blocks before one are parsed. Workers take blocks in
// their order, so that the first of them never waits.
func (t *turns) wait(ctx context.Context, block int) error {
	for {
		t.mu.Lock()
		next, moved := t.next, t.moved
		t.mu.Unlock()
		if next >= block {
			return nil
		}
		select {
		case <-moved:
		case <-ctx.Done():
			return ctx.Err()
		}
	}
}
