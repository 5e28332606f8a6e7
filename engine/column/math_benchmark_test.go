package column

import (
	"math"
	"math/rand/v2"
	"testing"
)

// benchmarkRows is the length of the columns measured.
const benchmarkRows = 4096

// benchmarkArguments returns rows evenly drawn from low to high.
func benchmarkArguments(low, high float64) []float64 {
	random := rand.New(rand.NewPCG(1, 2))
	list := make([]float64, benchmarkRows)
	for i := range list {
		list[i] = low + (high-low)*random.Float64()
	}
	return list
}

// measureColumn runs the column form beside a loop over the library's function
// and reports the time for one row.
func measureColumn(b *testing.B, low, high float64, column func(dst, src []float64), library func(float64) float64) {
	src, dst := benchmarkArguments(low, high), make([]float64, benchmarkRows)
	b.Run("column", func(b *testing.B) {
		for b.Loop() {
			column(dst, src)
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/benchmarkRows, "ns/row")
	})
	b.Run("library", func(b *testing.B) {
		for b.Loop() {
			for i, x := range src {
				dst[i] = library(x)
			}
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/benchmarkRows, "ns/row")
	})
}

func BenchmarkExpColumn(b *testing.B)   { measureColumn(b, -30, 30, ExpColumn, math.Exp) }
func BenchmarkExpm1Column(b *testing.B) { measureColumn(b, -3, 3, Expm1Column, math.Expm1) }
func BenchmarkLnColumn(b *testing.B)    { measureColumn(b, 0, 100, LnColumn, math.Log) }
func BenchmarkLog10Column(b *testing.B) { measureColumn(b, 0, 100, Log10Column, math.Log10) }
func BenchmarkSinColumn(b *testing.B)   { measureColumn(b, -10, 10, SinColumn, math.Sin) }
func BenchmarkCosColumn(b *testing.B)   { measureColumn(b, -10, 10, CosColumn, math.Cos) }
func BenchmarkTanColumn(b *testing.B)   { measureColumn(b, -10, 10, TanColumn, math.Tan) }
func BenchmarkAtanColumn(b *testing.B)  { measureColumn(b, -3, 3, AtanColumn, math.Atan) }
func BenchmarkAsinColumn(b *testing.B)  { measureColumn(b, -1, 1, AsinColumn, math.Asin) }
func BenchmarkTanhColumn(b *testing.B)  { measureColumn(b, -3, 3, TanhColumn, math.Tanh) }
func BenchmarkCbrtColumn(b *testing.B)  { measureColumn(b, 0, 100, CbrtColumn, math.Cbrt) }
func BenchmarkErfColumn(b *testing.B)   { measureColumn(b, -3, 3, ErfColumn, math.Erf) }

func BenchmarkPowColumn(b *testing.B) {
	y := benchmarkArguments(-5, 5)
	i := 0
	measureColumn(b, 0, 100,
		func(dst, src []float64) { PowColumn(dst, src, y) },
		func(x float64) float64 { i++; return math.Pow(x, y[i%benchmarkRows]) })
}

func BenchmarkPowColumnNumber(b *testing.B) {
	measureColumn(b, 0, 100,
		func(dst, src []float64) { PowColumnNumber(dst, src, 1.7) },
		func(x float64) float64 { return math.Pow(x, 1.7) })
}

func BenchmarkHypotColumn(b *testing.B) {
	measureColumn(b, 0, 100,
		func(dst, src []float64) { HypotColumn(dst, src, src) },
		func(x float64) float64 { return math.Hypot(x, x) })
}
