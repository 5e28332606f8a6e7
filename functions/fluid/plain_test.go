package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// The plain functions are what one writes by hand for one row: the same
// equations, without regard to equal bits everywhere.

// plainWaterDensity is region 1 of IAPWS-IF97 with the test that the water is
// liquid.
func plainWaterDensity(kelvin, pascals float64) float64 {
	th := kelvin - 0.23855557567849/(kelvin-650.17534844798)
	a := th*th + 1167.0521452767*th - 724213.16703206
	b := -17.073846940092*th*th + 12020.824702470*th - 3232555.0322333
	c := 14.915108613530*th*th - 4823.2657361591*th + 405113.40542057
	root := 2 * c / (-b + math.Sqrt(b*b-4*a*c))
	if pascals < root*root*root*root*1e6 {
		return math.NaN()
	}
	x, y := 7.1-pascals/16.53e6, 1386/kelvin-1.222
	z := 1 / y
	x2 := x * x
	x4 := x2 * x2
	x16 := x4 * x4 * x4 * x4
	y2 := y * y
	y3 := y2 * y
	y6 := y3 * y3
	y10 := y6 * y3 * y
	z2 := z * z
	z4 := z2 * z2
	z5 := z4 * z
	z6 := z4 * z2
	z8 := z4 * z4
	r := x * z
	sum := 0.28319080123804e-3*z8*z - 0.60706301565874e-3*z5*z2 - 0.18990068218419e-1*z - 0.32529748770505e-1 - 0.21841717175414e-1*y - 0.52838357969930e-4*y3 +
		2*x*(-0.47184321073267e-3*z2*z-0.30001780793026e-3+0.47661393906987e-4*y-0.44141845330846e-5*y3-0.72694996297594e-15*y10*y6*y) +
		3*x2*(-0.31679644845054e-4*z4-0.28270797985312e-5-0.85205128120103e-9*y6) +
		4*x2*x*(-0.22425281908000e-5*z5-0.65171222895601e-6*z2-0.14341729937924e-12*y10) -
		5*0.40516996860117e-6*x4*z8 +
		8*x4*x2*x*(-0.12734301741641e-8*z6*z5-0.17424871230634e-9*z6) +
		x16*x4*z8*z8*z8*z5*(-21*0.68762131295531e-18+x2*z2*(23*0.14478307828521e-19+x4*x2*z5*z2*(29*0.26335781662795e-22+r*(-30*0.11947622640071e-22+r*(31*0.18228094581404e-23-32*0.93537087292458e-25*r)))))
	return -16.53e6 / (461.526 * kelvin * sum)
}

// plainMoistAirDensity is CIPM-2007 with the exponential of the standard
// library.
func plainMoistAirDensity(p, kelvin, h, dioxide float64) float64 {
	t := kelvin - 273.15
	saturated := math.Exp(1.2378847e-5*kelvin*kelvin - 1.9121316e-2*kelvin + 33.93711047 - 6.3431645e3/kelvin)
	xv := h * (1.00062 + 3.14e-8*p + 5.6e-7*t*t) * saturated / p
	if xv > 1 {
		return math.NaN()
	}
	q := p / kelvin
	z := 1 - q*(1.58123e-6-2.9331e-8*t+1.1043e-10*t*t+(5.707e-6-2.051e-8*t)*xv+(1.9898e-4-2.376e-6*t)*xv*xv) + q*q*(1.83e-11-0.765e-8*xv*xv)
	ma := 28.96546e-3 + 12.011e-3*(dioxide-0.0004)
	return q * ma / (z * 8.314472) * (1 - xv*(1-18.01528e-3/ma))
}

// block makes columns of rows, out of step with each other.
func block(spans ...[2]float64) []law.Argument {
	const rows = 1024
	columns := make([]law.Argument, len(spans))
	for j, span := range spans {
		columns[j].Values = make([]float64, rows)
		for i := range rows {
			columns[j].Values[i] = span[0] + (span[1]-span[0])*float64((i*(2*j+1)+j*311)%rows)/rows
		}
	}
	return columns
}

func waterBlock() []law.Argument { return block([2]float64{273.15, 620}, [2]float64{17e6, 1e8}) }

func airBlock() []law.Argument {
	return block([2]float64{6e4, 1.1e5}, [2]float64{288.15, 300.15}, [2]float64{0, 1}, [2]float64{3e-4, 1e-3})
}

// TestPlainFunctions holds the bodies against the plain functions.
func TestPlainFunctions(t *testing.T) {
	water, air := waterBlock(), airBlock()
	dst := make([]float64, 1024)
	lawNamed(t, "water_density").Body(dst, water, &law.Work{})
	for i, got := range dst {
		if want := plainWaterDensity(water[0].At(i), water[1].At(i)); !(math.Abs(got/want-1) <= 1e-14) {
			t.Errorf("water, row %d: %v, plain %v", i, got, want)
		}
	}
	lawNamed(t, "moist_air_density").Body(dst, air, &law.Work{})
	for i, got := range dst {
		if want := plainMoistAirDensity(air[0].At(i), air[1].At(i), air[2].At(i), air[3].At(i)); !(math.Abs(got/want-1) <= 1e-14) {
			t.Errorf("air, row %d: %v, plain %v", i, got, want)
		}
	}
}

// TestAboveSaturation asks that what decides most rows lies above saturation.
func TestAboveSaturation(t *testing.T) {
	for kelvin := 253.15; kelvin <= 623.15; kelvin += 0.01 {
		if ratio := aboveSaturation(kelvin) / saturationPressure(kelvin); !(ratio > 1.003 && ratio < 1.07) {
			t.Fatalf("%g K: %g times saturation", kelvin, ratio)
		}
	}
}

// compare measures a law's body and a plain loop in one run.
func compare(b *testing.B, name string, arguments []law.Argument, plain func(i int) float64) {
	dst := make([]float64, 1024)
	body, work := lawNamed(b, name).Body, &law.Work{}
	b.Run("law", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			body(dst, arguments, work)
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
	})
	b.Run("plain", func(b *testing.B) {
		for b.Loop() {
			for i := range dst {
				dst[i] = plain(i)
			}
		}
		b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*len(dst)), "ns/row")
	})
}

// BenchmarkWaterDensity measures liquid water against a plain loop.
func BenchmarkWaterDensity(b *testing.B) {
	a := waterBlock()
	kelvins, pascals := a[0].Values, a[1].Values
	compare(b, "water_density", a, func(i int) float64 { return plainWaterDensity(kelvins[i], pascals[i]) })
}

// BenchmarkMoistAirDensity measures moist air against a plain loop.
func BenchmarkMoistAirDensity(b *testing.B) {
	a := airBlock()
	p, t, h, x := a[0].Values, a[1].Values, a[2].Values, a[3].Values
	compare(b, "moist_air_density", a, func(i int) float64 { return plainMoistAirDensity(p[i], t[i], h[i], x[i]) })
}
