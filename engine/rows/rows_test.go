package rows

import (
	"math/rand/v2"
	"reflect"
	"testing"

	"plumbrule/engine/problem"
)

// Counting the parts of a run in any order, in any grouping, gives the same.
func TestTallies(t *testing.T) {
	reasons := []Reason{{}, {Text: "below", Below: true}, {Text: "above"}, {Text: "no amount"}}
	parts := []Tally{
		{Entry: 1, Reason: 2, State: Stretched, Rows: 1, Worst: 5, HasWorst: true},
		{Entry: 0, Reason: 1, State: Refused, Rows: 1, Worst: -3, HasWorst: true},
		{Entry: 1, Reason: 2, State: Stretched, Rows: 2, Worst: 9, HasWorst: true},
		{Entry: 1, Reason: 2, State: Stretched, Rows: 1, Worst: 7, HasWorst: true},
		{Entry: 0, Reason: 1, State: Refused, Rows: 4, Worst: -8, HasWorst: true},
		{Entry: 0, Reason: 1, State: Refused, Rows: 1, Worst: -1, HasWorst: true},
		{Entry: 0, Reason: 3, State: Waiting, Rows: 1},
		{Entry: 0, Reason: 3, State: Waiting, Rows: 1},
		{Entry: 0, Reason: 3, State: Refused, Rows: 1},
	}
	want := []Tally{
		{Entry: 0, Reason: 1, State: Refused, Rows: 6, Worst: -8, HasWorst: true},
		{Entry: 0, Reason: 3, State: Waiting, Rows: 2},
		{Entry: 0, Reason: 3, State: Refused, Rows: 1},
		{Entry: 1, Reason: 2, State: Stretched, Rows: 4, Worst: 9, HasWorst: true},
	}
	random := rand.New(rand.NewPCG(1, 1))
	for round := 0; round < 50; round++ {
		random.Shuffle(len(parts), func(i, j int) { parts[i], parts[j] = parts[j], parts[i] })
		var first, second Tallies
		if !first.Empty() {
			t.Fatal("a new count is not empty")
		}
		for i, part := range parts {
			to := &first
			if i%2 == 1 {
				to = &second
			}
			to.Add(part, reasons[part.Reason].Below)
		}
		first.Merge(&second, reasons)
		kept := Tally{Entry: 7}
		if got := first.Append([]Tally{kept}); !reflect.DeepEqual(got[1:], want) || got[0] != kept {
			t.Fatalf("%v", got)
		}
	}
}

func TestScale(t *testing.T) {
	for _, test := range []struct {
		scale     Scale
		shown, si float64
	}{
		{Scale{0, 1, 1}, 3, 3},
		{Scale{0, 1000, 1}, 3, 3000},
		{Scale{0, 1, 1000}, 3, 0.003},
		{Scale{273.15, 1, 1}, 20, 293.15}, // degree Celsius, SI Brochure 9
		{Scale{459.67, 5, 9}, 32, 273.15}, // degree Fahrenheit, NIST SP 811, B.8
	} {
		if got := test.scale.ToSI(test.shown); got < test.si-1e-12 || got > test.si+1e-12 {
			t.Errorf("%v: %v is %v", test.scale, test.shown, got)
		}
		if got := test.scale.FromSI(test.si); got < test.shown-1e-12 || got > test.shown+1e-12 {
			t.Errorf("%v: %v is shown as %v", test.scale, test.si, got)
		}
	}
}

func TestStates(t *testing.T) {
	for state, want := range map[State]struct {
		word     string
		computed bool
	}{
		Sound: {"sound", true}, Stretched: {"stretched", true}, Waiting: {"waiting", false}, Refused: {"refused", false}, 9: {"unknown", false},
	} {
		if state.String() != want.word || state.Computed() != want.computed {
			t.Errorf("%d: %s, %v", state, state, state.Computed())
		}
	}
}

// An outcome that is used again keeps its memory and nothing else.
func TestOutcome(t *testing.T) {
	var o Outcome
	o.Resize(2, 5)
	o.Values[1][4] = 3
	o.States[1], o.Reasons[1] = make([]State, 5), make([]int32, 5)
	o.States[1][4], o.Reasons[1][4] = Refused, 7
	o.Tallies = append(o.Tallies, Tally{})
	if o.State(1, 4) != Refused || o.Reason(1, 4) != 7 || o.State(0, 4) != Sound || o.Reason(0, 4) != 0 {
		t.Errorf("%v", o)
	}
	memory := &o.Values[1][0]
	o.Resize(2, 3)
	if o.Rows != 3 || len(o.Values[1]) != 3 || &o.Values[1][0] != memory || o.State(1, 2) != Sound || len(o.Tallies) != 0 {
		t.Errorf("%v", o)
	}
	o.Resize(3, 6)
	if len(o.Values) != 3 || len(o.Values[2]) != 6 || len(o.States) != 3 || len(o.Reasons) != 3 {
		t.Errorf("%v", o)
	}
}

func TestIndex(t *testing.T) {
	d := Description{Knowns: []Known{{Name: "a"}, {Name: "b"}}, Entries: []Entry{{Name: "c"}, {Name: "c margin"}}}
	for _, test := range []struct {
		name         string
		known, entry int
	}{{"a", 0, -1}, {"b", 1, -1}, {"c", -1, 0}, {"c margin", -1, 1}, {"", -1, -1}} {
		if d.KnownIndex(test.name) != test.known || d.EntryIndex(test.name) != test.entry {
			t.Errorf("%q: %d, %d", test.name, d.KnownIndex(test.name), d.EntryIndex(test.name))
		}
	}
}

func TestSheetError(t *testing.T) {
	one := problem.Problem{Span: problem.Span{Line: 1, Column: 2, Length: 3}, Code: problem.Syntax, Message: "wrong"}
	for n, want := range []string{
		"the sheet has problems",
		"line 1, column 2: wrong [syntax]",
		"line 1, column 2: wrong [syntax] (and one more problem)",
		"line 1, column 2: wrong [syntax] (and more problems)",
	} {
		e := &SheetError{}
		for i := 0; i < n; i++ {
			e.Problems = append(e.Problems, one)
		}
		if e.Error() != want {
			t.Errorf("%d problems: %s", n, e.Error())
		}
	}
}
