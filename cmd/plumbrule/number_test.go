package main

import (
	"math"
	"slices"
	"strconv"
	"testing"
	"testing/quick"

	"plumbrule/engine/unit"
)

func TestReadable(t *testing.T) {
	tests := []struct {
		x      float64
		digits int
		want   string
	}{
		{0, 7, "0"},
		{math.Copysign(0, -1), 7, "0"},
		{4300, 7, "4300"},
		{1.0 / 3, 7, "0.3333333"},
		{1.0 / 3, 3, "0.333"},
		{-2.0 / 3, 3, "-0.667"},
		{123456.789, 7, "123456.8"},
		{123456.789, 3, "123457"}, // figures before the point are not rounded away
		{9999999.6, 7, "1e7"},
		{9999999.4, 7, "9999999"},
		{12345678.9, 7, "1.234568e7"},
		{0.0001, 7, "0.0001"},
		{0.000099999996, 7, "0.0001"},
		{0.00009, 7, "9e-5"},
		{6.02214076e23, 7, "6.022141e23"},
		{5e-324, 3, "4.94e-324"},
		{0.30000000000000004, 17, "0.30000000000000004"},
		{math.NaN(), 7, "-"},
		{math.Inf(1), 7, "-"},
	}
	for _, test := range tests {
		if got := readable(test.x, test.digits); got != test.want {
			t.Errorf("readable(%v, %d) = %s, not %s", test.x, test.digits, got, test.want)
		}
	}
}

func TestShortestReadsBack(t *testing.T) {
	back := func(bits uint64) bool {
		x := math.Float64frombits(bits)
		if math.IsNaN(x) || math.IsInf(x, 0) {
			return true
		}
		y, err := strconv.ParseFloat(shortest(x), 64)
		return err == nil && math.Float64bits(y) == bits
	}
	if err := quick.Check(back, &quick.Config{MaxCount: 20000}); err != nil {
		t.Error(err)
	}
	tests := []struct {
		x    float64
		want string
	}{
		{1234567, "1234567"},
		{1e20, "100000000000000000000"},
		{1e21, "1e+21"},
		{0.000001, "0.000001"},
		{1e-7, "1e-07"},
		{math.NaN(), ""},
	}
	for _, test := range tests {
		if got := shortest(test.x); got != test.want {
			t.Errorf("shortest(%v) = %s, not %s", test.x, got, test.want)
		}
	}
}

func TestAligned(t *testing.T) {
	got := aligned([]string{"4300", "-0.25", "1.5e-9", "6e23", "polyester", "-", ""})
	// The whole parts are at most four characters wide.
	want := []string{"4300", "  -0.25", "   1.5e-9", "   6.0e23", "polyester", "-", ""}
	if !slices.Equal(got, want) {
		t.Errorf("%q, not %q", got, want)
	}
}

func TestReadNumber(t *testing.T) {
	tests := []struct {
		text string
		want float64
		bad  bool
	}{
		{text: "4300", want: 4300},
		{text: " -2.5e-3 ", want: -0.0025},
		{text: "+.5", want: 0.5},
		{text: "5.", want: 5},
		{text: "1E3", want: 1000},
		{text: "", bad: true},
		{text: ".", bad: true},
		{text: "1.2.3", bad: true},
		{text: "4,3", bad: true},
		{text: "0x10", bad: true},
		{text: "1_000", bad: true},
		{text: "inf", bad: true},
		{text: "NaN", bad: true},
		{text: "1e", bad: true},
		{text: "1e999", bad: true},
		{text: "3 m", bad: true},
	}
	for _, test := range tests {
		got, err := readNumber(test.text)
		if (err != nil) != test.bad || got != test.want && !test.bad {
			t.Errorf("readNumber(%q) = %v, %v", test.text, got, err)
		}
	}
}

func TestReadQuantity(t *testing.T) {
	tests := []struct {
		text, own string
		want      float64 // SI
		bad       bool
	}{
		{text: "4.3 km", own: "m", want: 4300},
		{text: "4.3[km]", own: "m", want: 4300},
		{text: "4300", own: "m", want: 4300},
		{text: "5eV", own: "J", want: 5 * 1.602176634e-19}, // e of the exact SI, 9th brochure
		{text: "\u22122 degC", own: "degC", want: -2 + 273.15},
		{text: "50 degF", own: "degC", want: 283.15},
		{text: "2 bara", own: "barg", bad: true},
		{text: "2 bar", own: "barg", want: 2e5},
		{text: "10 gpm", own: "m", bad: true},
		{text: "10 s", own: "m", bad: true},
		{text: "10 [m", own: "m", bad: true},
		{text: "m", own: "m", bad: true},
	}
	for _, test := range tests {
		own, err := unit.Parse(test.own)
		if err != nil {
			t.Fatal(err)
		}
		got, _, err := readQuantity(test.text, own)
		if (err != nil) != test.bad || !test.bad && math.Abs(got-test.want) > 1e-15*math.Abs(test.want) {
			t.Errorf("readQuantity(%q in %s) = %v, %v", test.text, test.own, got, err)
		}
	}
}
