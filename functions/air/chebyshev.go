package air

import (
	"math"

	"plumbrule/engine/column"
)

// samples is at how many Chebyshev nodes an integrand is taken in each cell.
const samples = 10

// sampling holds the nodes x_j = cos((2j + 1) pi/(2n)) of (-1, 1) and the
// cosines that turn values there into coefficients of Chebyshev polynomials
// (Trefethen L.N. (2013) Approximation Theory and Approximation Practice, SIAM,
// chapters 3 and 19).
type sampling struct {
	nodes   [samples]float64
	cosines [samples][samples]float64 // 2/n T_k(x_j), the row of k = 0 halved
}

func newSampling() *sampling {
	s := &sampling{}
	for j := range s.nodes {
		angle := float64(2*j+1) * math.Pi / (2 * samples)
		s.nodes[j] = column.Cos(angle)
		for k := range s.cosines {
			s.cosines[k][j] = 2.0 / samples * column.Cos(float64(float64(k)*angle))
		}
		s.cosines[0][j] = 1.0 / samples
	}
	return s
}

// series is a sum of Chebyshev polynomials over (-1, 1).
type series [samples + 1]float64

// integral gives the integral from -1 to x of the function that has these
// values at the nodes, times scale.
func (s *sampling) integral(values *[samples]float64, scale float64) series {
	var c [samples + 2]float64
	for k := range samples {
		for j, f := range values {
			c[k] += float64(s.cosines[k][j] * f)
		}
	}
	// The integral of T_k is T_(k+1)/(2(k+1)) - T_(k-1)/(2(k-1)).
	var b series
	b[1] = float64(scale * (c[0] - float64(c[2]/2)))
	for k := 2; k <= samples; k++ {
		b[k] = scale * (c[k-1] - c[k+1]) / float64(2*k)
	}
	sign := 1.0
	for k := 1; k <= samples; k++ {
		b[0] += float64(sign * b[k])
		sign = -sign
	}
	return b
}

// at sums the series at x by Clenshaw's recurrence.
func (b *series) at(x float64) float64 {
	var next, after float64
	for k := samples; k >= 1; k-- {
		next, after = b[k]+float64(2*x*next)-after, next
	}
	return b[0] + float64(x*next) - after
}

// degree is that of the polynomials that rows are computed with.
const degree = 6

// polynomial holds the coefficients of powers of x in (-1, 1).
type polynomial [degree + 1]float64

// at sums the polynomial at x.
func (p *polynomial) at(x float64) float64 {
	square := x * x
	low := p[0] + float64(x*p[1])
	middle := p[2] + float64(x*p[3])
	high := p[4] + float64(x*p[5]) + float64(square*p[6])
	return low + float64(square*(middle+float64(square*high)))
}

// fitting turns values at the points -cos(i pi/degree), ends included, into
// the polynomial through them.
type fitting struct {
	points [degree + 1]float64
	powers [degree + 1][degree + 1]float64 // coefficient of x^k for a value 1 at point i
}

func newFitting() *fitting {
	f := &fitting{}
	// Powers of x in T_k: T_(k+1) = 2 x T_k - T_(k-1).
	var t [degree + 1]polynomial
	t[0][0], t[1][1] = 1, 1
	for k := 2; k <= degree; k++ {
		for i := range t[k] {
			if i > 0 {
				t[k][i] = 2 * t[k-1][i-1]
			}
			t[k][i] -= t[k-2][i]
		}
	}
	for i := range f.points {
		angle := math.Pi - float64(float64(i)*math.Pi/degree)
		f.points[i] = column.Cos(angle)
		weight := 2.0 / degree
		if i == 0 || i == degree {
			weight = 1.0 / degree
		}
		for k := 0; k <= degree; k++ {
			w := weight * column.Cos(float64(float64(k)*angle))
			if k == 0 || k == degree {
				w /= 2
			}
			for power := range f.powers {
				f.powers[power][i] += float64(w * t[k][power])
			}
		}
	}
	f.points[0], f.points[degree] = -1, 1
	f.points[degree/2] = 0
	return f
}

// through gives the polynomial with these values at the points.
func (f *fitting) through(values *[degree + 1]float64) polynomial {
	// What all values share is left out, so that it is not rounded many times.
	base := values[degree/2]
	var p polynomial
	for k := range p {
		for i, v := range values {
			p[k] += float64(f.powers[k][i] * (v - base))
		}
	}
	p[0] += base
	return p
}
