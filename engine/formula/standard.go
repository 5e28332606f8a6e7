package formula

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// rule says which arguments a standard function takes and what it gives.
type rule uint8

const (
	sameDimension rule = iota // any dimension in, the same out
	pureNumber                // pure number in and out
	fromAngle                 // angle or pure number in, pure number out
	toAngle                   // pure number in, angle out
	signOf                    // any dimension in, pure number out
	squareRoot
	cubeRoot
	alike   // two or more of one dimension, the same out
	twoSide // two of one dimension in, angle out
)

// standard is one of the functions that every sheet has.
type standard struct {
	name string
	op   Op
	rule rule
	help string
}

// Standard lists the names of the mathematical functions that every sheet has,
// with one line of help each.
func Standard() []struct{ Name, Help string } {
	var list []struct{ Name, Help string }
	for _, f := range standardFunctions {
		list = append(list, struct{ Name, Help string }{f.name, f.help})
	}
	for _, l := range listFunctions {
		list = append(list, struct{ Name, Help string }{l.Name, l.Gives})
	}
	return list
}

var standardFunctions = []standard{
	{"abs", Abs, sameDimension, "abs(x): size without sign"},
	{"acos", Acos, toAngle, "acos(x): angle whose cosine is x, 0 to 180 degrees"},
	{"asin", Asin, toAngle, "asin(x): angle whose sine is x, -90 to 90 degrees"},
	{"atan", Atan, toAngle, "atan(x): angle whose tangent is x, -90 to 90 degrees"},
	{"atan2", Atan2, twoSide, "atan2(y, x): angle of the point (x, y), -180 to 180 degrees"},
	{"cbrt", Cbrt, cubeRoot, "cbrt(x): cube root"},
	{"ceil", Ceil, pureNumber, "ceil(x): next whole number upwards"},
	{"cos", Cos, fromAngle, "cos(x): cosine"},
	{"cosh", Cosh, pureNumber, "cosh(x): hyperbolic cosine"},
	{"exp", Exp, pureNumber, "exp(x): e to the power x"},
	{"floor", Floor, pureNumber, "floor(x): next whole number downwards"},
	{"hypot", Hypot, alike, "hypot(x, y): root of the sum of the squares"},
	{"ln", Ln, pureNumber, "ln(x): natural logarithm"},
	{"log10", Log10, pureNumber, "log10(x): logarithm to the base 10"},
	{"max", Max, alike, "max(a, b, ...): the largest"},
	{"min", Min, alike, "min(a, b, ...): the smallest"},
	{"round", Round, pureNumber, "round(x): nearest whole number, halves away from zero"},
	{"sign", Sign, signOf, "sign(x): -1, 0 or 1"},
	{"sin", Sin, fromAngle, "sin(x): sine"},
	{"sinh", Sinh, pureNumber, "sinh(x): hyperbolic sine"},
	{"sqrt", Sqrt, squareRoot, "sqrt(x): square root"},
	{"tan", Tan, fromAngle, "tan(x): tangent"},
	{"tanh", Tanh, pureNumber, "tanh(x): hyperbolic tangent"},
}

// IsStandard says whether a name is one of the mathematical functions that
// every sheet has.
func IsStandard(name string) bool {
	_, ok := findStandard(name)
	return ok || findListFunction(name) != nil
}

func findStandard(name string) (standard, bool) {
	for _, f := range standardFunctions {
		if f.name == name {
			return f, true
		}
	}
	return standard{}, false
}

// listFunctions are the functions of lists. They are laws without a place in
// the catalogue; their dimensions are those of the list.
var listFunctions = []*law.Law{
	{Name: "count", Gives: "count(list): how many items", Body: func(dst []float64, a []law.Argument, _ *law.Work) {
		column.Fill(dst, float64(len(a[0].Items)))
	}},
	{Name: "interpolate", Gives: "interpolate(x, xs, ys): linear between the points of a table, xs rising; refuses outside",
		Refusal: "the argument lies outside the table, or the table's first list does not rise", Body: interpolateBody},
	{Name: "item", Gives: "item(list, n): the n-th item, counted from 1", Refusal: "there is no item of that number", Body: itemBody},
	{Name: "largest", Gives: "largest(list): the largest item", Body: foldBody(func(sum, x float64) float64 { return column.Max(sum, x) })},
	{Name: "mean", Gives: "mean(list): the arithmetic mean", Body: func(dst []float64, a []law.Argument, _ *law.Work) {
		n := float64(len(a[0].Items))
		for i := range dst {
			dst[i] = sumOf(a[0].Items, i) / n
		}
	}},
	{Name: "smallest", Gives: "smallest(list): the smallest item", Body: foldBody(func(sum, x float64) float64 { return column.Min(sum, x) })},
	{Name: "sum", Gives: "sum(list): the sum of the items", Body: func(dst []float64, a []law.Argument, _ *law.Work) {
		for i := range dst {
			dst[i] = sumOf(a[0].Items, i)
		}
	}},
}

func findListFunction(name string) *law.Law {
	for _, l := range listFunctions {
		if l.Name == name {
			return l
		}
	}
	return nil
}

// sumOf adds one row of a list with a running correction (Neumaier 1974), so
// that the order of the items does not matter to the last digits.
func sumOf(items []law.Argument, row int) float64 {
	sum, correction := 0.0, 0.0
	for k := range items {
		x := items[k].At(row)
		next := sum + x
		if column.AbsOf(sum) >= column.AbsOf(x) {
			correction += (sum - next) + x
		} else {
			correction += (x - next) + sum
		}
		sum = next
	}
	if correction != correction { // an infinite sum has no correction
		return sum
	}
	return sum + correction
}

func foldBody(f func(sum, x float64) float64) law.Body {
	return func(dst []float64, a []law.Argument, _ *law.Work) {
		items := a[0].Items
		for i := range dst {
			result := items[0].At(i)
			for k := 1; k < len(items); k++ {
				result = f(result, items[k].At(i))
			}
			dst[i] = result
		}
	}
}

func itemBody(dst []float64, a []law.Argument, _ *law.Work) {
	for i := range dst {
		n := a[1].At(i)
		if n >= 1 && n <= float64(len(a[0].Items)) && n == column.FloorOf(n) {
			dst[i] = a[0].Items[int(n)-1].At(i)
		} else {
			dst[i] = column.NaN()
		}
	}
}

// interpolateBody finds the interval by halving and interpolates linearly,
// exactly at the table's points.
func interpolateBody(dst []float64, a []law.Argument, _ *law.Work) {
	xs, ys := a[1].Items, a[2].Items
	rising := true
	checked := false
	for i := range dst {
		if !checked || a[1].Varies() {
			rising, checked = true, true
			for k := 1; k < len(xs); k++ {
				if !(xs[k-1].At(i) < xs[k].At(i)) {
					rising = false
				}
			}
		}
		x := a[0].At(i)
		if !rising || !(x >= xs[0].At(i) && x <= xs[len(xs)-1].At(i)) {
			dst[i] = column.NaN()
			continue
		}
		low, high := 0, len(xs)-1
		for high-low > 1 {
			middle := (low + high) / 2
			if xs[middle].At(i) <= x {
				low = middle
			} else {
				high = middle
			}
		}
		x0, x1 := xs[low].At(i), xs[high].At(i)
		y0, y1 := ys[low].At(i), ys[high].At(i)
		switch {
		case x == x0:
			dst[i] = y0
		case x == x1:
			dst[i] = y1
		default:
			dst[i] = y0 + float64((y1-y0)*((x-x0)/(x1-x0)))
		}
	}
}
