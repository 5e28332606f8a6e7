package column

import (
	"math"
	"math/rand/v2"
	"testing"
)

// columnSizes are one row, blocks that divide nothing, and a long column.
var columnSizes = []int{0, 1, 7, 4097}

// TestColumnsAgree requires the bits of the scalar form from every column
// form, in place as well.
func TestColumnsAgree(t *testing.T) {
	for _, f := range elementaryFunctions {
		for _, size := range columnSizes {
			src := append(f.arguments(size), 0, negativeZero, infinity, -infinity, notANumber)[:size]
			dst := make([]float64, size)
			f.column(dst, src)
			inPlace := append([]float64(nil), src...)
			f.column(inPlace, inPlace)
			for i, x := range src {
				if want := f.scalar(x); !sameNumber(dst[i], want) || !sameNumber(inPlace[i], want) {
					t.Fatalf("%s of %v: scalar %v, column %v, in place %v", f.name, x, want, dst[i], inPlace[i])
				}
			}
		}
	}
}

// TestPairColumnsAgree does so for two arguments; dst may be either.
func TestPairColumnsAgree(t *testing.T) {
	for _, f := range elementaryPairs {
		for _, size := range columnSizes {
			random := rand.New(rand.NewPCG(3, 4))
			x, y := make([]float64, size), make([]float64, size)
			for i := range x {
				x[i], y[i] = f.draw(random, i)
			}
			dst := make([]float64, size)
			f.column(dst, x, y)
			first, second := append([]float64(nil), x...), append([]float64(nil), y...)
			f.column(first, first, y)
			f.column(second, x, second)
			for i := range x {
				want := f.scalar(x[i], y[i])
				if !sameNumber(dst[i], want) || !sameNumber(first[i], want) || !sameNumber(second[i], want) {
					t.Fatalf("%s(%v, %v): scalar %v, column %v, in place %v, %v", f.name, x[i], y[i], want, dst[i], first[i], second[i])
				}
			}
		}
	}
}

// TestPowColumnNumber covers the exponents with a loop of their own.
func TestPowColumnNumber(t *testing.T) {
	random := rand.New(rand.NewPCG(5, 6))
	x := []float64{0, negativeZero, infinity, -infinity, notANumber, -2, 1, -1, leastNumber}
	for range 1000 {
		x = append(x, wholeRange.draw(random), moderate.draw(random))
	}
	for _, y := range []float64{0, 1, 2, 3, -1, 0.5, -0.5, 1.0 / 3, 1000, infinity, notANumber} {
		dst, inPlace := make([]float64, len(x)), append([]float64(nil), x...)
		PowColumnNumber(dst, x, y)
		PowColumnNumber(inPlace, inPlace, y)
		for i := range x {
			if want := Pow(x[i], y); !sameNumber(dst[i], want) || !sameNumber(inPlace[i], want) {
				t.Fatalf("Pow(%v, %v) = %v, column %v, in place %v", x[i], y, want, dst[i], inPlace[i])
			}
		}
	}
}

// TestColumnLengths: the shorter length counts, and nothing beyond is touched.
func TestColumnLengths(t *testing.T) {
	for _, f := range elementaryFunctions {
		dst := []float64{7, 7, 7}
		f.column(dst, []float64{0.5, 0.25})
		f.column(dst[:1], []float64{0.5, 0.25})
		if dst[2] != 7 || dst[0] != f.scalar(0.5) || dst[1] != f.scalar(0.25) {
			t.Errorf("%s: columns of unequal length give %v", f.name, dst)
		}
	}
	for _, f := range elementaryPairs {
		dst := []float64{7, 7, 7}
		f.column(dst, []float64{0.5, 0.25}, []float64{2, 3, 4})
		if dst[2] != 7 || math.IsNaN(dst[0]) || dst[1] != f.scalar(0.25, 3) {
			t.Errorf("%s: columns of unequal length give %v", f.name, dst)
		}
	}
}
