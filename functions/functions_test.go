package functions

import (
	"context"
	"math"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"plumbrule/engine"
	"plumbrule/engine/formula"
	"plumbrule/engine/law"
	"plumbrule/engine/unit"
)

var fullName = regexp.MustCompile(`^[a-z][a-z0-9]*(_[a-z0-9]+)*$`)

// TestCatalogue looks over every law for what a reader, a page or a range
// check needs of it.
func TestCatalogue(t *testing.T) {
	all := All()
	if len(all.Laws()) < 40 || len(all.Constants()) < 10 {
		t.Fatalf("%d laws and %d constants", len(all.Laws()), len(all.Constants()))
	}
	groups := map[string]bool{"nature": true, "fluid": true, "air": true, "levels": true}
	seen := map[string]bool{}
	for i, l := range all.Laws() {
		wrong := func(what string) { t.Errorf("%s: %s", l.Name, what) }
		if i > 0 {
			if before := all.Laws()[i-1]; before.Group > l.Group || before.Group == l.Group && before.Name >= l.Name {
				wrong("stands behind " + before.Name)
			}
		}
		if seen[l.Name] {
			wrong("stands twice")
		}
		seen[l.Name] = true
		if !fullName.MatchString(l.Name) {
			wrong("the name is not one of full words in lower case with underscores")
		}
		if formula.IsStandard(l.Name) {
			wrong("the name hides a mathematical function")
		}
		if !groups[l.Group] {
			wrong("there is no group " + l.Group)
		}
		if l.Gives == "" || l.Equation == "" || l.Source == "" {
			wrong("what it gives, its equation or its source is missing")
		}
		if strings.HasSuffix(l.Gives, ".") {
			wrong("a full stop ends what it gives")
		}
		if (l.Body != nil) != (l.Result.Type == law.Number) {
			wrong("a law that gives a number has a body, no other has one")
		}
		if l.Result.Type != law.Made && len(l.Examples) == 0 {
			wrong("there is no example")
		}
		checkResult(t, l)
		names := map[string]bool{}
		optional := false
		for k := range l.Parameters {
			p := &l.Parameters[k]
			if names[p.Name] {
				wrong("two parameters " + p.Name)
			}
			names[p.Name] = true
			if optional && !p.Optional() {
				wrong(p.Name + " is required behind an optional parameter")
			}
			optional = optional || p.Optional()
			checkParameter(t, l, p)
		}
	}
	for _, c := range all.Constants() {
		if _, err := unit.Parse(c.Unit); err != nil || c.Meaning == "" || c.Source == "" || c.Value == 0 || c.Uncertainty < 0 {
			t.Errorf("constant %s: %+v, %v", c.Name, c, err)
		}
	}
}

func checkResult(t *testing.T, l *law.Law) {
	switch {
	case l.Result.Type == law.Made:
		if l.Result.Made == "" {
			t.Errorf("%s: what it makes has no name", l.Name)
		}
	case l.Result.SameAs != "":
		for k := range l.Parameters {
			if l.Parameters[k].Name == l.Result.SameAs {
				return
			}
		}
		t.Errorf("%s: no parameter %s, as which the result would be", l.Name, l.Result.SameAs)
	case l.Result.Type == law.List && (l.Result.Each == nil || l.Result.Each.Count == nil || l.Result.Each.Shared == nil || l.Result.Each.Item == nil):
		t.Errorf("%s: how the items are worked out is not told", l.Name)
	case l.Result.Type == law.Text:
		t.Errorf("%s: the result is a text", l.Name)
	default:
		if _, err := unit.Parse(l.Result.Unit); err != nil {
			t.Errorf("%s: the result's unit: %v", l.Name, err)
		}
	}
}

func checkParameter(t *testing.T, l *law.Law, p *law.Parameter) {
	wrong := func(what string) { t.Errorf("%s: %s: %s", l.Name, p.Name, what) }
	if p.Name == "" || p.Meaning == "" || strings.Contains(p.Meaning, "\n") {
		wrong("name or meaning is missing, or longer than a line")
	}
	switch p.Type {
	case law.Number, law.List:
		if _, err := unit.Parse(p.Unit); err != nil {
			wrong(err.Error())
		}
	case law.Made:
		if p.Made == "" {
			wrong("the made type has no name")
		}
	}
	for _, r := range []law.Range{p.Valid, p.Finite} {
		if r.Bounded() && p.Type != law.Number && p.Type != law.List {
			wrong("a range of what is no number")
		}
		if r.HasLow && r.HasHigh && !(r.Low < r.High) {
			wrong("the range " + r.Text(p.Unit) + " is not in order")
		}
	}
	if p.Finite.HasLow && p.Valid.HasLow && p.Valid.Low < p.Finite.Low || p.Finite.HasHigh && p.Valid.HasHigh && p.Valid.High > p.Finite.High {
		wrong("the stated range " + p.Valid.Text(p.Unit) + " is not inside of " + p.Finite.Text(p.Unit))
	}
	for k := range p.Accepts {
		a := &p.Accepts[k]
		if _, err := unit.Parse(a.Unit); err != nil {
			wrong(err.Error())
		}
		if (a.Factor != 0) == (a.By != nil) {
			wrong("a conversion is by a factor or by a law")
		}
	}
	if !p.Optional() {
		return
	}
	shown := ""
	switch {
	case p.Type == law.Text:
		found := len(p.Choices) == 0
		for _, choice := range p.Choices {
			found = found || p.Default == `"`+choice+`"`
		}
		if !found {
			wrong("the default " + p.Default + " is none of the choices")
		}
		return
	case p.Type == law.Number:
		shown = " [" + p.Unit + "]"
	}
	if _, err := engine.Compile("derive default_value"+shown+" = "+p.Default, All()); err != nil {
		wrong("the default: " + err.Error())
	}
}

// halfUnit is half a unit of the last printed digit of a number.
func halfUnit(printed string) float64 {
	mantissa, exponent := printed, 0
	if at := strings.IndexAny(printed, "eE"); at >= 0 {
		mantissa = printed[:at]
		exponent, _ = strconv.Atoi(printed[at+1:])
	}
	if _, decimals, ok := strings.Cut(mantissa, "."); ok {
		exponent -= len(decimals)
	}
	return 0.5 * math.Pow(10, float64(exponent))
}

// TestExamples runs every example of every law and demands its printed digits.
func TestExamples(t *testing.T) {
	run := 0
	for _, l := range All().Laws() {
		for _, example := range l.Examples {
			run++
			printed, unitText, hasUnit := strings.Cut(example.Gives, " ")
			bracket := ""
			if hasUnit {
				bracket = " [" + unitText + "]"
			}
			want, err := strconv.ParseFloat(printed, 64)
			if err != nil {
				t.Errorf("%s: %q gives no number", l.Name, example.Gives)
				continue
			}
			if !strings.Contains(example.Formula, l.Name+"(") {
				t.Errorf("%s: the example %s does not call it", l.Name, example.Formula)
			}
			program, err := engine.Compile("derive example"+bracket+" = "+example.Formula, All())
			if err != nil {
				t.Errorf("%s: %s: %v", l.Name, example.Formula, err)
				continue
			}
			var out engine.Outcome
			if err := program.Run(context.Background(), engine.Input{Rows: 1}, &out); err != nil {
				t.Errorf("%s: %v", example.Formula, err)
				continue
			}
			if state := out.State(0, 0); !state.Computed() {
				t.Errorf("%s: %s: %s", example.Formula, state, program.Reasons()[out.Reason(0, 0)].Text)
				continue
			}
			got := program.Describe().Entries[0].Scale.FromSI(out.Values[0][0])
			// The printed number and the half unit are decimal: a few last bits
			// of the computed number lie between them and their nearest floats.
			if tolerance := halfUnit(printed) + 1e-15*math.Abs(want); !(math.Abs(got-want) <= tolerance) {
				t.Errorf("%s: computed %v, printed %s", example.Formula, got, example.Gives)
			}
		}
	}
	if run < 40 {
		t.Errorf("only %d examples", run)
	}
}

func TestHalfUnit(t *testing.T) {
	for _, test := range []struct {
		printed string
		want    float64
	}{{"98066.5", 0.05}, {"300", 0.5}, {"1.380649e-23", 0.5e-29}, {"-0.0010", 0.00005}, {"2e3", 500}} {
		if got := halfUnit(test.printed); math.Abs(got-test.want) > 1e-12*test.want {
			t.Errorf("%s: %v", test.printed, got)
		}
	}
}
