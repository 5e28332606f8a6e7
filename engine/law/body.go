package law

// Body computes a law for a block of rows: dst[i] from row i of the arguments,
// all in coherent SI units, one argument for each parameter of the law with
// the defaults filled in. It does not keep dst or the arguments, does not
// allocate for each row, and answers arguments that it cannot take with NaN;
// the ranges declared beside it say why. dst never overlaps an argument.
type Body func(dst []float64, arguments []Argument, work *Work)

// Argument is the value of one parameter over a block of rows.
type Argument struct {
	// Values holds a number a row, or a single number that serves all rows.
	Values []float64
	// Items holds a list's items, or for a made value the arguments of its maker.
	Items []Argument
	// Maker is the law that made a made value.
	Maker *Law
	// Text is a text argument.
	Text string
}

// At gives the argument's number in a row.
func (a *Argument) At(row int) float64 {
	if len(a.Values) == 1 {
		return a.Values[0]
	}
	return a.Values[row]
}

// Varies says whether the argument, or anything it is made of, differs from
// row to row.
func (a *Argument) Varies() bool {
	if len(a.Values) > 1 {
		return true
	}
	for i := range a.Items {
		if a.Items[i].Varies() {
			return true
		}
	}
	return false
}

// Work is a body's own scratch for one call in one worker: what it keeps here
// is there again at the next block, so that nothing is allocated for each
// block. It must not carry results from block to block.
type Work struct {
	Keep any
}

// stride is 1 for a column and 0 for a single number, so that one loop serves
// both.
func (a *Argument) stride() int {
	if len(a.Values) > 1 {
		return 1
	}
	return 0
}

// Of1 lifts a function of the first argument to blocks of rows.
//
//go:noinline
func Of1(f func(a float64) float64) Body {
	return func(dst []float64, arguments []Argument, _ *Work) {
		a, ia := arguments[0].Values, arguments[0].stride()
		for i := range dst {
			dst[i] = f(a[i*ia])
		}
	}
}

// Of2 lifts a function of the first two arguments to blocks of rows.
//
//go:noinline
func Of2(f func(a, b float64) float64) Body {
	return func(dst []float64, arguments []Argument, _ *Work) {
		a, ia := arguments[0].Values, arguments[0].stride()
		b, ib := arguments[1].Values, arguments[1].stride()
		for i := range dst {
			dst[i] = f(a[i*ia], b[i*ib])
		}
	}
}

// Of3 lifts a function of the first three arguments to blocks of rows.
//
//go:noinline
func Of3(f func(a, b, c float64) float64) Body {
	return func(dst []float64, arguments []Argument, _ *Work) {
		a, ia := arguments[0].Values, arguments[0].stride()
		b, ib := arguments[1].Values, arguments[1].stride()
		c, ic := arguments[2].Values, arguments[2].stride()
		for i := range dst {
			dst[i] = f(a[i*ia], b[i*ib], c[i*ic])
		}
	}
}

// Of4 lifts a function of the first four arguments to blocks of rows.
//
//go:noinline
func Of4(f func(a, b, c, d float64) float64) Body {
	return func(dst []float64, arguments []Argument, _ *Work) {
		a, ia := arguments[0].Values, arguments[0].stride()
		b, ib := arguments[1].Values, arguments[1].stride()
		c, ic := arguments[2].Values, arguments[2].stride()
		d, id := arguments[3].Values, arguments[3].stride()
		for i := range dst {
			dst[i] = f(a[i*ia], b[i*ib], c[i*ic], d[i*id])
		}
	}
}

// OfMany lifts a function of any number of number arguments to blocks of rows.
// The slice that f gets is used again for the next row.
//
//go:noinline
func OfMany(f func(x []float64) float64) Body {
	return func(dst []float64, arguments []Argument, work *Work) {
		x, _ := work.Keep.([]float64)
		if len(x) != len(arguments) {
			x = make([]float64, len(arguments))
			work.Keep = x
		}
		for i := range dst {
			for j := range arguments {
				if len(arguments[j].Values) > 0 {
					x[j] = arguments[j].At(i)
				}
			}
			dst[i] = f(x)
		}
	}
}
