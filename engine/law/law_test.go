package law

import (
	"math"
	"testing"
)

func TestRange(t *testing.T) {
	nan := math.NaN()
	for _, test := range []struct {
		r          Range
		text       string
		low, high  []float64 // lie outside
		inside     []float64
		hasNoBound bool
	}{
		{Range{}, "", nil, nil, []float64{0, -1e300, 1e300, nan}, true},
		{Within(-2, 40), "-2 to 40 degC", []float64{-2.1, math.Inf(-1)}, []float64{40.1, math.Inf(1)}, []float64{-2, 0, 40, nan}, false},
		{Between(0, 1), "between 0 and 1 degC, both excluded", []float64{0, -1}, []float64{1, 2}, []float64{0.5, nan}, false},
		{AtLeast(3), "at least 3 degC", []float64{2.9}, nil, []float64{3, 1e300, nan}, false},
		{Above(3), "above 3 degC", []float64{3, 2}, nil, []float64{3.1, math.Inf(1)}, false},
		{AtMost(3), "at most 3 degC", nil, []float64{3.1}, []float64{3, -1e300}, false},
		{Below(3), "below 3 degC", nil, []float64{3, 4}, []float64{2.9, math.Inf(-1)}, false},
	} {
		if got := test.r.Text("degC"); got != test.text || test.r.Bounded() == test.hasNoBound {
			t.Errorf("%+v: %q", test.r, got)
		}
		for _, x := range test.low {
			if !test.r.TooLow(x) || test.r.TooHigh(x) {
				t.Errorf("%s: %v does not lie below", test.text, x)
			}
		}
		for _, x := range test.high {
			if test.r.TooLow(x) || !test.r.TooHigh(x) {
				t.Errorf("%s: %v does not lie above", test.text, x)
			}
		}
		for _, x := range test.inside {
			if test.r.TooLow(x) || test.r.TooHigh(x) {
				t.Errorf("%s: %v does not lie inside", test.text, x)
			}
		}
	}
	if got := Within(1, 2).Text("1"); got != "1 to 2" {
		t.Error(got)
	}
}

// TestLifts runs every lift with each argument as a column and as a number.
func TestLifts(t *testing.T) {
	weigh := func(x []float64) float64 {
		sum, weight := 0.0, 1.0
		for _, v := range x {
			sum += weight * v
			weight *= 10
		}
		return sum
	}
	for _, lift := range []struct {
		name string
		n    int
		body Body
	}{
		{"Of1", 1, Of1(func(a float64) float64 { return weigh([]float64{a}) })},
		{"Of2", 2, Of2(func(a, b float64) float64 { return weigh([]float64{a, b}) })},
		{"Of3", 3, Of3(func(a, b, c float64) float64 { return weigh([]float64{a, b, c}) })},
		{"Of4", 4, Of4(func(a, b, c, d float64) float64 { return weigh([]float64{a, b, c, d}) })},
		{"OfMany", 5, OfMany(weigh)},
	} {
		var work Work
		for _, rows := range []int{1, 2, 7} {
			for shape := 0; shape < 1<<lift.n; shape++ {
				arguments := make([]Argument, lift.n)
				for k := range arguments {
					length := 1
					if shape>>k&1 == 1 {
						length = rows
					}
					for i := 0; i < length; i++ {
						arguments[k].Values = append(arguments[k].Values, float64(i+k))
					}
					if arguments[k].Varies() != (length > 1) {
						t.Errorf("%s: a column of %d varies: %v", lift.name, length, arguments[k].Varies())
					}
				}
				dst := make([]float64, rows)
				lift.body(dst, arguments, &work)
				for i := range dst {
					x := make([]float64, lift.n)
					for k := range x {
						x[k] = arguments[k].At(i)
					}
					if dst[i] != weigh(x) {
						t.Fatalf("%s, shape %b, row %d: %v, not %v", lift.name, shape, i, dst[i], weigh(x))
					}
				}
			}
		}
	}
}

// A made value or a list varies where anything in it does.
func TestVaries(t *testing.T) {
	number, column := Argument{Values: []float64{1}}, Argument{Values: []float64{1, 2}}
	for _, test := range []struct {
		a    Argument
		want bool
	}{
		{Argument{}, false},
		{Argument{Text: "x"}, false},
		{Argument{Items: []Argument{number, number}}, false},
		{Argument{Items: []Argument{number, column}}, true},
		{Argument{Items: []Argument{number, {Items: []Argument{column}}}}, true},
	} {
		if test.a.Varies() != test.want {
			t.Errorf("%+v: %v", test.a, test.a.Varies())
		}
	}
}

func TestCatalogue(t *testing.T) {
	law := func(group, name string) *Law { return &Law{Group: group, Name: name, Gives: "it", Source: "this test"} }
	c, err := NewCatalogue([]*Law{law("b", "x"), law("a", "z"), law("a", "y")}, []Constant{{Name: "k_B", Value: 2}, {Name: "h"}})
	if err != nil {
		t.Fatal(err)
	}
	order := ""
	for _, l := range c.Laws() {
		order += l.Name
	}
	if order != "yzx" || c.Law("x") == nil || c.Law("w") != nil || len(c.Constants()) != 2 {
		t.Errorf("%s", order)
	}
	if k, ok := c.Constant("k_B"); !ok || k.Value != 2 {
		t.Errorf("%v", k)
	}
	if _, ok := c.Constant("kB"); ok || c.NearestConstant("kB") != "k_B" {
		t.Error(c.NearestConstant("kB"))
	}
	for _, test := range []struct {
		laws      []*Law
		constants []Constant
	}{
		{[]*Law{law("a", "x"), law("b", "x")}, nil},
		{[]*Law{{Name: "x", Gives: "it"}}, nil},
		{[]*Law{{Name: "x", Source: "this test"}}, nil},
		{[]*Law{{Gives: "it", Source: "this test"}}, nil},
		{nil, []Constant{{Name: "c"}, {Name: "c"}}},
	} {
		if _, err := NewCatalogue(test.laws, test.constants); err == nil {
			t.Errorf("%v %v make a catalogue", test.laws, test.constants)
		}
	}
}

// Required counts what has no default.
func TestRequired(t *testing.T) {
	l := &Law{Parameters: []Parameter{{Name: "a"}, {Name: "b", Default: "1"}, {Name: "c"}}}
	if l.Required() != 2 || l.Parameters[0].Optional() || !l.Parameters[1].Optional() {
		t.Error(l.Required())
	}
}
