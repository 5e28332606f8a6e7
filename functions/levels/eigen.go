package levels

import "math"

// mostRows bounds the matrices whose eigenvalues are asked for.
const mostRows = 2000

// tridiagonalEigenvalues turns the diagonal of a symmetric tridiagonal matrix
// into its eigenvalues in ascending order; side[i] stands between rows i and
// i + 1 and is used up. It is the QL method with implicit shifts (Dubrulle A.,
// Martin R.S., Wilkinson J.H. (1968) Numer. Math. 12, 377), every product
// rounded. It says false if it has not come to an end after 60 steps for a row.
func tridiagonalEigenvalues(diagonal, side []float64) bool {
	n := len(diagonal)
	if n > mostRows || len(side) < n-1 {
		return false
	}
	for l := range n {
		for steps := 0; ; steps++ {
			m := l
			for ; m < n-1; m++ {
				size := math.Abs(diagonal[m]) + math.Abs(diagonal[m+1])
				if size+math.Abs(side[m]) == size {
					break
				}
			}
			if m == l {
				break
			}
			if steps == 60 {
				return false
			}
			shiftRows(diagonal, side, l, m)
		}
	}
	sortAscending(diagonal)
	return true
}

// shiftRows does one step with rows l to m.
func shiftRows(d, e []float64, l, m int) {
	g := (d[l+1] - d[l]) / float64(2*e[l])
	r := math.Sqrt(float64(g*g) + 1)
	g = d[m] - d[l] + e[l]/(g+math.Copysign(r, g))
	sine, cosine, p := 1.0, 1.0, 0.0
	for i := m - 1; i >= l; i-- {
		f, b := float64(sine*e[i]), float64(cosine*e[i])
		r = math.Sqrt(float64(f*f) + float64(g*g))
		if i+1 < len(d)-1 {
			e[i+1] = r
		}
		if r == 0 {
			d[i+1] -= p
			if m < len(d)-1 {
				e[m] = 0
			}
			return
		}
		sine, cosine = f/r, g/r
		g = d[i+1] - p
		r = float64((d[i]-g)*sine) + float64(float64(2*cosine)*b)
		p = float64(sine * r)
		d[i+1] = g + p
		g = float64(cosine*r) - b
	}
	d[l] -= p
	e[l] = g
	if m < len(d)-1 {
		e[m] = 0
	}
}

// sortAscending sorts by insertion: eigenvalues come nearly in order.
func sortAscending(x []float64) {
	for i := 1; i < len(x); i++ {
		value := x[i]
		k := i
		for ; k > 0 && x[k-1] > value; k-- {
			x[k] = x[k-1]
		}
		x[k] = value
	}
}
