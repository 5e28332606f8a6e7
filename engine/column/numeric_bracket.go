package column

import "math"

// BracketedRoot gives where f changes its sign between a and b, as near as
// numbers of float64 allow. f(a) and f(b) must differ in sign, else ok is
// false; so it is where f gives NaN. It is Brent's method: inverse quadratic
// interpolation and secants, held within a shrinking bracket by bisection
// (Brent R.P. (1973) Algorithms for Minimization without Derivatives, chapter
// 4), with at most 200 evaluations.
func BracketedRoot(f func(float64) float64, a, b float64) (root float64, ok bool) {
	fa, fb := f(a), f(b)
	switch {
	case fa == 0:
		return a, true
	case fb == 0:
		return b, true
	case !(fa < 0 && fb > 0 || fa > 0 && fb < 0):
		return math.NaN(), false
	}
	c, fc := a, fa
	step := b - a
	before := step
	for range 200 {
		if math.Abs(fc) < math.Abs(fb) {
			a, b, c = b, c, b
			fa, fb, fc = fb, fc, fb
		}
		const half = 0x1p-53
		least := float64(2 * float64(half*math.Abs(b)))
		middle := float64(0.5 * (c - b))
		if math.Abs(middle) <= least || fb == 0 {
			return b, true
		}
		if math.Abs(before) >= least && math.Abs(fa) > math.Abs(fb) {
			var p, q float64
			s := fb / fa
			if a == c {
				p, q = float64(float64(2*middle)*s), 1-s
			} else {
				u, r := fa/fc, fb/fc
				p = float64(s * (float64(float64(2*middle)*float64(u*(u-r))) - float64((b-a)*(r-1))))
				q = float64(float64((u-1)*(r-1)) * (s - 1))
			}
			if p > 0 {
				q = -q
			}
			p = math.Abs(p)
			if float64(2*p) < min(float64(float64(3*middle)*q)-math.Abs(float64(least*q)), math.Abs(float64(before*q))) {
				before, step = step, p/q
			} else {
				before, step = middle, middle
			}
		} else {
			before, step = middle, middle
		}
		a, fa = b, fb
		if math.Abs(step) > least {
			b += step
		} else {
			b += math.Copysign(max(least, 0x1p-1022), middle)
		}
		fb = f(b)
		if fb != fb {
			return math.NaN(), false
		}
		if fb > 0 == (fc > 0) {
			c, fc = a, fa
			step = b - a
			before = step
		}
	}
	return b, true
}
