package main

import (
	"flag"
	"math"
	"math/rand/v2"
	"strconv"
	"testing"
)

var manyNumbers = flag.Bool("many", false, "print a hundred million numbers")

// TestAppendShortest compares with strconv, whose digits are the fewest that
// read back bit for bit, and the nearest of those.
func TestAppendShortest(t *testing.T) {
	random := rand.New(rand.NewPCG(5, 6))
	check := func(x float64) {
		t.Helper()
		format := byte('f')
		if size := math.Abs(x); size != 0 && (size < 1e-6 || size >= 1e21) {
			format = 'e'
		}
		if got, want := string(appendShortest(nil, x)), strconv.FormatFloat(x, format, -1, 64); got != want {
			t.Errorf("%x is printed as %s, not %s", x, got, want)
		}
	}
	for exponent := -80; exponent <= 80; exponent++ {
		// About powers of two, below which the neighbour is nearer, and of ten.
		for _, x := range []float64{math.Ldexp(1, exponent), math.Pow10(exponent / 3)} {
			for _, y := range []float64{x, math.Nextafter(x, 0), math.Nextafter(x, math.Inf(1)), 3 * x, -x / 7} {
				check(y)
			}
		}
	}
	for _, x := range []float64{0, math.Copysign(0, -1), math.Inf(1), math.Inf(-1), 5e-324, math.MaxFloat64, 0.1, 0.3, 1.0 / 3, 9007199254740993, 123456789.125, 1e-6, 5e-7} {
		check(x)
	}
	n := 300_000
	if *manyNumbers {
		n = 100_000_000
	}
	for i := range n {
		x := math.Float64frombits(random.Uint64())
		switch i % 4 {
		case 1:
			x = float64(random.Int64() >> random.IntN(64))
		case 2:
			x = math.Round(random.NormFloat64()*1e6) / []float64{1e1, 1e3, 1e7}[random.IntN(3)]
		case 3:
			x = math.Ldexp(1+random.Float64(), random.IntN(92)-21)
		}
		if !math.IsNaN(x) {
			check(x)
		}
	}
	if text := appendShortest(nil, math.NaN()); len(text) != 0 {
		t.Errorf("NaN is printed as %s", text)
	}
}

func BenchmarkAppendShortest(b *testing.B) {
	var text []byte
	x := 1.0
	for b.Loop() {
		x = x*1.0000001 + 0.1
		text = appendShortest(text[:0], x)
	}
}
