package rows

import "sort"

// Tallies counts the rows that are not sound, by entry, reason and state. The
// zero value is ready for use; it serves one goroutine.
type Tallies struct {
	of map[tallyKey]*Tally
}

type tallyKey struct {
	entry, reason int
	state         State
}

// Empty says whether nothing was counted.
func (t *Tallies) Empty() bool { return len(t.of) == 0 }

// Add counts what one tally tells; below says that its reason is a lower
// bound, so that the smaller value lies farther outside. Counting the parts of
// a run in any order gives the same.
func (t *Tallies) Add(one Tally, below bool) {
	if t.of == nil {
		t.of = map[tallyKey]*Tally{}
	}
	k := tallyKey{one.Entry, one.Reason, one.State}
	all := t.of[k]
	if all == nil {
		all = &Tally{Entry: one.Entry, Reason: one.Reason, State: one.State}
		t.of[k] = all
	}
	all.Rows += one.Rows
	if one.HasWorst && (!all.HasWorst || below && one.Worst < all.Worst || !below && one.Worst > all.Worst) {
		all.Worst, all.HasWorst = one.Worst, true
	}
}

// Merge counts what another has counted.
func (t *Tallies) Merge(other *Tallies, reasons []Reason) {
	for _, one := range other.of {
		t.Add(*one, reasons[one.Reason].Below)
	}
}

// Append appends the tallies by entry, reason and state.
func (t *Tallies) Append(list []Tally) []Tally {
	if len(t.of) == 0 {
		return list
	}
	from := len(list)
	for _, one := range t.of {
		list = append(list, *one)
	}
	added := list[from:]
	sort.Slice(added, func(i, j int) bool {
		a, b := added[i], added[j]
		if a.Entry != b.Entry {
			return a.Entry < b.Entry
		}
		if a.Reason != b.Reason {
			return a.Reason < b.Reason
		}
		return a.State < b.State
	})
	return list
}
