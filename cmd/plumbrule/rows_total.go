package main

import (
	"bytes"
	"cmp"
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"plumbrule/engine/rows"
)

// reasonTotal is what one reason amounts to over a run.
type reasonTotal struct {
	reason   rows.Reason
	state    rows.State
	entry    string // the first entry, in the order of the sheet, that it befell
	rows     int64
	worst    float64 // SI
	hasWorst bool
}

// take keeps the value that lies farthest outside.
func (t *reasonTotal) take(worst float64) {
	if !t.hasWorst || t.reason.Below && worst < t.worst || !t.reason.Below && worst > t.worst {
		t.worst, t.hasWorst = worst, true
	}
}

// reasonKey tells reasons of different programs of one run apart by what they say.
type reasonKey struct {
	text  string
	state rows.State
}

// blockTally counts a block's rows by state and by reason.
type blockTally struct {
	states  [4]int64
	flawed  int64
	missed  int64
	found   map[reasonKey]*reasonTotal
	stamps  []int // for each reason, one more than the last row that it was counted in
	counts  [][4]int64
	entryOf [][4]int
	lacks   map[int]int // for each known the last row that its lack was counted in
}

func newBlockTally() *blockTally { return &blockTally{} }

func (t *blockTally) begin(b *block) {
	n := len(b.reasons)
	*t = blockTally{found: map[reasonKey]*reasonTotal{}, stamps: make([]int, 4*n), counts: make([][4]int64, n), entryOf: make([][4]int, n), lacks: map[int]int{}}
}

// refuse counts a row with a bad cell.
func (t *blockTally) refuse() {
	t.states[rows.Refused]++
	t.flawed++
}

// lack counts a row in which a known has no usable value.
func (t *blockTally) lack(row, k int, l *lack, known *rows.Known, value float64, entry string) {
	if last, ok := t.lacks[k]; ok && last == row {
		return
	}
	t.lacks[k] = row
	key := reasonKey{l.text, rows.Refused}
	total := t.found[key]
	if total == nil {
		total = &reasonTotal{reason: rows.Reason{Text: l.text, Argument: known.Name, Unit: known.Unit, Scale: known.Scale, Below: l.below}, state: rows.Refused, entry: entry}
		t.found[key] = total
	}
	total.rows++
	if !math.IsNaN(value) {
		total.take(value)
	}
}

// row counts an evaluated row: each reason once, and whether a requirement is
// missed. What waits is not counted: the reason stands with what it waits for.
func (t *blockTally) row(b *block, row int, worst rows.State) {
	entries := b.entries
	miss := false
	for e := range entries {
		if entries[e].Role == rows.Requirement && b.out.State(e, row).Computed() && b.out.Values[e][row] == 0 {
			miss = true
		}
		if worst == rows.Sound {
			continue
		}
		state, reason := b.out.State(e, row), b.out.Reason(e, row)
		if state == rows.Sound || state == rows.Waiting || reason >= len(t.counts) {
			continue
		}
		stamp := &t.stamps[4*reason+int(state)]
		if *stamp == row+1 {
			continue
		}
		*stamp = row + 1
		if t.counts[reason][state] == 0 || e < t.entryOf[reason][state] {
			t.entryOf[reason][state] = e
		}
		t.counts[reason][state]++
	}
	if miss {
		t.missed++
	}
}

// summary is what a whole run amounts to.
type summary struct {
	rows       int64
	states     [4]int64
	flawed     int64
	missed     int64
	requires   bool
	reasons    []*reasonTotal
	byKey      map[reasonKey]*reasonTotal
	entryOrder map[string]int
}

func newSummary(d *rows.Description) *summary {
	s := &summary{byKey: map[reasonKey]*reasonTotal{}, entryOrder: map[string]int{}}
	for i := range d.Entries {
		s.entryOrder[d.Entries[i].Name] = i
		s.requires = s.requires || d.Entries[i].Role == rows.Requirement
	}
	return s
}

// add joins a block's counts.
func (s *summary) add(b *block) {
	s.rows += int64(b.rows)
	for i, n := range b.tally.states {
		s.states[i] += n
	}
	s.flawed += b.tally.flawed
	s.missed += b.tally.missed
	entries, reasons := b.entries, b.reasons
	for reason := range b.tally.counts {
		for state, n := range b.tally.counts[reason] {
			if n == 0 {
				continue
			}
			total := s.of(reasons[reason], rows.State(state))
			s.befell(total, entries[b.tally.entryOf[reason][state]].Name)
			total.rows += n
		}
	}
	for _, found := range b.tally.found {
		total := s.of(found.reason, found.state)
		s.befell(total, found.entry)
		total.rows += found.rows
		if found.hasWorst {
			total.take(found.worst)
		}
	}
	for i := range b.out.Tallies {
		tally := &b.out.Tallies[i]
		key := reasonKey{reasons[tally.Reason].Text, tally.State}
		if total := s.byKey[key]; total != nil && tally.HasWorst {
			total.take(tally.Worst)
		}
	}
}

// befell keeps the first entry, in the order of the sheet, that a reason befell.
func (s *summary) befell(total *reasonTotal, entry string) {
	if total.entry == "" || s.entryOrder[entry] < s.entryOrder[total.entry] {
		total.entry = entry
	}
}

func (s *summary) of(reason rows.Reason, state rows.State) *reasonTotal {
	key := reasonKey{reason.Text, state}
	total := s.byKey[key]
	if total == nil {
		total = &reasonTotal{reason: reason, state: state}
		s.byKey[key] = total
		s.reasons = append(s.reasons, total)
	}
	return total
}

// sorted gives the reasons by the first entry that they befell, then by what
// they say, whatever the order was in which they turned up.
func (s *summary) sorted() []*reasonTotal {
	slices.SortFunc(s.reasons, func(a, b *reasonTotal) int {
		return cmp.Or(cmp.Compare(s.entryOrder[a.entry], s.entryOrder[b.entry]), cmp.Compare(b.state, a.state), strings.Compare(a.reason.Text, b.reason.Text))
	})
	return s.reasons
}

// bad says whether some row has an entry without a number.
func (s *summary) bad() bool { return s.states[rows.Waiting]+s.states[rows.Refused] > 0 }

type summaryDocument struct {
	Sheet   string           `json:"sheet"`
	Data    string           `json:"data"`
	Rows    int64            `json:"rows"`
	States  map[string]int64 `json:"states"`
	Flawed  int64            `json:"bad_rows"`
	Missed  int64            `json:"requirement_missed"`
	Reasons []reasonDocument `json:"reasons"`
}

type reasonDocument struct {
	Reason string      `json:"reason"`
	State  string      `json:"state"`
	Entry  string      `json:"entry"`
	Rows   int64       `json:"rows"`
	Worst  *jsonNumber `json:"worst"`
	Unit   string      `json:"unit,omitempty"`
}

// writeSummary prints what a run amounts to.
func (r *rowsRun) writeSummary() error {
	s := r.total
	if r.json {
		r.writeJSON(r.stderr, s.document(r.sheet, r.data))
		return nil
	}
	var w bytes.Buffer
	var parts []string
	for state := rows.Sound; state <= rows.Refused; state++ {
		parts = append(parts, strconv.FormatInt(s.states[state], 10)+" "+state.String())
	}
	fmt.Fprintln(&w, counted(s.rows, "row", "rows")+": "+strings.Join(parts, ", "))
	if s.flawed > 0 {
		fmt.Fprintln(&w, counted(s.flawed, "row", "rows")+" refused for a bad cell or a wrong number of cells")
	}
	if s.requires {
		fmt.Fprintln(&w, counted(s.missed, "row", "rows")+" with a requirement missed")
	}
	if len(s.reasons) > 0 {
		fmt.Fprintln(&w)
		table := newGrid("state", "rows", "worst", "unit", "reason", "first entry")
		table.numbers[1], table.numbers[2] = true, true
		for _, t := range s.sorted() {
			worst, unit := "", ""
			if t.hasWorst {
				worst, unit = readable(t.reason.Scale.FromSI(t.worst), defaultDigits), shownUnit(t.reason.Unit)
			}
			table.row(t.state.String(), strconv.FormatInt(t.rows, 10), worst, unit, t.reason.Text, t.entry)
		}
		if err := table.write(&w); err != nil {
			return err
		}
	}
	_, err := r.stderr.Write(w.Bytes())
	return err
}

func (s *summary) document(sheet, data string) summaryDocument {
	doc := summaryDocument{Sheet: sheet, Data: data, Rows: s.rows, States: map[string]int64{}, Flawed: s.flawed, Missed: s.missed, Reasons: []reasonDocument{}}
	for state := rows.Sound; state <= rows.Refused; state++ {
		doc.States[state.String()] = s.states[state]
	}
	for _, t := range s.sorted() {
		reason := reasonDocument{Reason: t.reason.Text, State: t.state.String(), Entry: t.entry, Rows: t.rows}
		if t.hasWorst {
			worst := jsonNumber(t.reason.Scale.FromSI(t.worst))
			reason.Worst, reason.Unit = &worst, t.reason.Unit
		}
		doc.Reasons = append(doc.Reasons, reason)
	}
	return doc
}
