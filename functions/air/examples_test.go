package air_test

import (
	"context"
	"math"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/law"
	"plumbrule/functions/air"
	"plumbrule/functions/nature"
)

func catalogue(t *testing.T) *law.Catalogue {
	t.Helper()
	c, err := law.NewCatalogue(append(air.Laws(), nature.Laws()...), nature.Constants())
	if err != nil {
		t.Fatal(err)
	}
	return c
}

// value evaluates one formula in a unit; the state tells what became of it.
func value(t *testing.T, c *law.Catalogue, unit, formula string) (float64, engine.State, string) {
	t.Helper()
	program, err := engine.Compile("derive x ["+unit+"] = "+formula+"\n", c)
	if err != nil {
		t.Errorf("%s: %v", formula, err)
		return math.NaN(), 0, ""
	}
	var out engine.Outcome
	if err := program.Run(context.Background(), engine.Input{Rows: 1}, &out); err != nil {
		t.Fatal(err)
	}
	entry := &program.Describe().Entries[0]
	return entry.Scale.FromSI(out.Values[0][0]), out.State(0, 0), program.Reasons()[out.Reason(0, 0)].Text
}

// halfUnit gives half a unit of the last digit of a number's text.
func halfUnit(text string) float64 {
	mantissa, exponent, _ := strings.Cut(strings.ToLower(text), "e")
	power, _ := strconv.Atoi(exponent)
	if _, decimals, ok := strings.Cut(mantissa, "."); ok {
		power -= len(decimals)
	}
	half, _ := strconv.ParseFloat("0.5e"+strconv.Itoa(power), 64)
	return half
}

// Every example of every law gives what it says, to half a unit of its last
// digit.
func TestExamples(t *testing.T) {
	c := catalogue(t)
	for _, l := range air.Laws() {
		for _, example := range l.Examples {
			text, unit, _ := strings.Cut(example.Gives, " ")
			want, err := strconv.ParseFloat(text, 64)
			if err != nil {
				t.Errorf("%s: %v", example.Formula, err)
				continue
			}
			if unit == "" {
				unit = "1"
			}
			got, state, reason := value(t, c, unit, example.Formula)
			if !(math.Abs(got-want) <= halfUnit(text)*(1+1e-9)) {
				t.Errorf("%s = %v %s, want %s (%s %s)", example.Formula, got, unit, text, state, reason)
			}
		}
	}
}
