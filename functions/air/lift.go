package air

import "plumbrule/engine/law"

// The lifts of functions to blocks of rows, kept whole: inlined, each law would
// carry a copy of the loop, which fills the module and gains a nanosecond.

//go:noinline
func of1(f func(a float64) float64) law.Body { return law.Of1(f) }

//go:noinline
func of2(f func(a, b float64) float64) law.Body { return law.Of2(f) }

//go:noinline
func of3(f func(a, b, c float64) float64) law.Body { return law.Of3(f) }

//go:noinline
func of4(f func(a, b, c, d float64) float64) law.Body { return law.Of4(f) }

//go:noinline
func ofMany(f func(x []float64) float64) law.Body { return law.OfMany(f) }
