package main

import (
	"bytes"
	"cmp"
	"fmt"
	"slices"
	"strconv"
	"strings"
	"time"

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
	stamps  []int // for each reason and state, one more than the last row that it was counted in
	counts  [][4]int64
	entryOf [][4]int
}

// count counts an evaluated block.
func (t *blockTally) count(b *block) {
	n := len(b.reasons)
	*t = blockTally{stamps: zeroed(t.stamps, 4*n), counts: zeroed(t.counts, n), entryOf: zeroed(t.entryOf, n)}
	t.countMissed(b)
	if b.sound() {
		t.states[rows.Sound] = int64(b.rows)
		return
	}
	for row := range b.rows {
		if b.flaws[row] != "" {
			t.states[rows.Refused]++
			t.flawed++
			continue
		}
		t.states[t.row(b, row)]++
	}
}

// zeroed gives n zero values, in the memory of an earlier slice if it is enough.
func zeroed[T any](old []T, n int) []T {
	if cap(old) < n {
		return make([]T, n)
	}
	old = old[:n]
	clear(old)
	return old
}

// countMissed counts the rows in which a requirement is missed.
func (t *blockTally) countMissed(b *block) {
	var required []int
	for e := range b.entries {
		if b.entries[e].Role == rows.Requirement {
			required = append(required, e)
		}
	}
	if len(required) == 0 {
		return
	}
	for row := range b.rows {
		if len(b.flaws) > 0 && b.flaws[row] != "" {
			continue
		}
		for _, e := range required {
			if b.out.Values[e][row] == 0 && b.out.State(e, row).Computed() {
				t.missed++
				break
			}
		}
	}
}

// row counts each reason of a row once and gives the row's worst state. What
// waits is not counted: the reason stands with what it waits for.
func (t *blockTally) row(b *block, row int) (worst rows.State) {
	for e := range b.entries {
		state, reason := b.out.State(e, row), b.out.Reason(e, row)
		worst = max(worst, state)
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
	return worst
}

// summary is what a whole run amounts to.
type summary struct {
	took       time.Duration
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

// rate is how many rows were written in a second. It is told where it was asked
// for and of runs that are long enough for it to mean something.
func (r *rowsRun) rate() (rate float64, told bool) {
	const shortest = time.Second
	took := r.total.took
	return float64(r.total.rows) / took.Seconds(), took > 0 && (r.progress || took >= shortest)
}

// bad says whether some row has an entry without a number.
func (s *summary) bad() bool { return s.states[rows.Waiting]+s.states[rows.Refused] > 0 }

type summaryDocument struct {
	Sheet   string           `json:"sheet"`
	Data    string           `json:"data"`
	Rows    int64            `json:"rows"`
	Rate    *jsonNumber      `json:"rows_per_second,omitempty"`
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
		doc := s.document(r.sheet, r.data)
		if rate, told := r.rate(); told {
			number := jsonNumber(rate)
			doc.Rate = &number
		}
		r.writeJSON(r.stderr, doc)
		return nil
	}
	var w bytes.Buffer
	var parts []string
	for state := rows.Sound; state <= rows.Refused; state++ {
		parts = append(parts, strconv.FormatInt(s.states[state], 10)+" "+state.String())
	}
	fmt.Fprintln(&w, counted(s.rows, "row", "rows")+": "+strings.Join(parts, ", "))
	if rate, told := r.rate(); told {
		fmt.Fprintln(&w, readable(rate, 3)+" rows per second")
	}
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
