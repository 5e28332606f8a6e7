package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// Names of the ways in which density is taken between measured depths.
const (
	straightLines = "trapezoid"
	smoothCurve   = "spline"
)

// profileLaws are those of a liquid whose density was measured at depths.
func profileLaws() []*law.Law {
	return []*law.Law{{
		Name: "profile_liquid_pressure", Group: "fluid",
		Gives: "absolute pressure at a depth in a liquid whose density was measured at several depths",
		Parameters: []law.Parameter{
			{Name: "depths", Meaning: "depths of the measurements, from the surface down, each below the one before; above the first its density is taken", Type: law.List, Unit: "m", Finite: law.AtLeast(0)},
			{Name: "densities", Meaning: "density at each depth, under the pressure there", Type: law.List, Unit: "kg/m^3", Finite: law.Above(0)},
			{Name: "depth", Meaning: "vertical distance below the liquid's surface, at most the last of the depths", Unit: "m", Finite: law.AtLeast(0)},
			{Name: "surface_pressure", Meaning: "absolute pressure on the liquid's surface", Unit: "Pa(a)", Finite: law.AtLeast(0), Default: "1[atm]"},
			{Name: "gravity", Meaning: "acceleration of gravity, constant over the column", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"},
			{
				Name: "method", Meaning: "density between the measurements: straight lines, or the natural cubic spline", Type: law.Text,
				Default: `"` + straightLines + `"`, Choices: []string{straightLines, smoothCurve},
			},
		},
		Result:   law.Result{Unit: "Pa(a)"},
		Equation: "p = p_s + g integral of rho(z) dz from 0 to depth, exact for the curve that method draws through the measurements. With h the largest spacing and z the depth of the next measurement down, the error is at most g z h^2 max|rho''|/12 for the trapezoid and g [5/384 z h^4 max|rho''''| + h^3 (|rho''| at the first depth + |rho''| at the last)/8] for the spline",
		Source:   "Davis P.J., Rabinowitz P. (1984) Methods of Numerical Integration, 2nd ed., section 2.1 (trapezoid); Hall C.A., Meyer W.W. (1976) Optimal error bounds for cubic spline interpolation, J. Approx. Theory 16, 105-122 (spline)",
		Caution:  "The spline swings beyond the measurements where density jumps: use the trapezoid there. " + law.CautionPressure,
		Refusal:  "the depth lies below the last measurement, or the depths do not each lie below the one before",
		Examples: []law.Example{
			{Formula: "profile_liquid_pressure([0, 10][m], [1000, 1020][kg/m^3], 10[m], surface_pressure: 0[Pa], gravity: 10[m/s^2])", Gives: "101 kPa"},
			{Formula: `profile_liquid_pressure([0, 5, 10][m], [1000, 1010, 1020][kg/m^3], 10[m], surface_pressure: 0[Pa], gravity: 10[m/s^2], method: "spline")`, Gives: "101 kPa"},
		},
		Body: profilePressureBody,
	}}
}

// curve is a density that was measured at depths: a straight line or a cubic
// between each two of them.
type curve struct {
	depth, density []float64
	bend           []float64 // second derivative at each depth; zero for straight lines
	pivot          []float64 // scratch of the elimination
	above          []float64 // integral of the density from the surface to each depth
	ordered        bool      // each depth lies below the one before
}

// profilePressureBody takes depths, densities, depth, surface pressure, gravity
// and the method.
func profilePressureBody(dst []float64, arguments []law.Argument, work *law.Work) {
	c, _ := work.Keep.(*curve)
	if c == nil {
		c = &curve{}
		work.Keep = c
	}
	depths, densities := &arguments[0], &arguments[1]
	smooth := arguments[5].Text == smoothCurve
	every := depths.Varies() || densities.Varies()
	for i := range dst {
		if i == 0 || every {
			c.draw(depths.Items, densities.Items, i, smooth)
		}
		head := float64(arguments[4].At(i) * c.integral(arguments[2].At(i)))
		dst[i] = arguments[3].At(i) + head
	}
}

// draw lays the curve through the measurements of a row.
func (c *curve) draw(depths, densities []law.Argument, row int, smooth bool) {
	n := min(len(depths), len(densities))
	if cap(c.depth) < n {
		c.depth, c.density, c.bend = make([]float64, n), make([]float64, n), make([]float64, n)
		c.pivot, c.above = make([]float64, n), make([]float64, n)
	}
	c.depth, c.density, c.bend, c.pivot, c.above = c.depth[:n], c.density[:n], c.bend[:n], c.pivot[:n], c.above[:n]
	c.ordered = n > 0
	for k := range n {
		c.depth[k], c.density[k], c.bend[k] = depths[k].At(row), densities[k].At(row), 0
		if k > 0 && !(c.depth[k] > c.depth[k-1]) {
			c.ordered = false
		}
	}
	if !c.ordered {
		return
	}
	if smooth {
		c.smooth()
	}
	c.above[0] = float64(c.density[0] * c.depth[0])
	for k := 1; k < n; k++ {
		c.above[k] = c.above[k-1] + c.part(k-1, 1)
	}
}

// smooth finds the second derivatives of the natural cubic spline: the
// tridiagonal equations h_k M_(k-1) + 2 (h_k + h_(k+1)) M_k + h_(k+1) M_(k+1) =
// 6 (slope_(k+1) - slope_k), M = 0 at both ends, by elimination without
// exchange of rows, which the dominant diagonal needs not.
func (c *curve) smooth() {
	n := len(c.depth)
	if n < 3 {
		return
	}
	slope := func(k int) float64 { return (c.density[k] - c.density[k-1]) / (c.depth[k] - c.depth[k-1]) }
	c.pivot[0] = 0
	for k := 1; k < n-1; k++ {
		before, after := c.depth[k]-c.depth[k-1], c.depth[k+1]-c.depth[k]
		diagonal := float64(2*(before+after)) - float64(before*c.pivot[k-1])
		c.pivot[k] = after / diagonal
		c.bend[k] = (float64(6*(slope(k+1)-slope(k))) - float64(before*c.bend[k-1])) / diagonal
	}
	c.bend[n-1] = 0
	for k := n - 2; k > 0; k-- {
		c.bend[k] -= float64(c.pivot[k] * c.bend[k+1])
	}
}

// part gives the integral of the density over the first share of interval k.
// On it the spline is a + (b - a) x - (h^2/6)[A x (1 - x)(2 - x) + B x (1 - x^2)]
// with the densities a, b and second derivatives A, B at its ends.
func (c *curve) part(k int, share float64) float64 {
	h := c.depth[k+1] - c.depth[k]
	a, b := c.density[k], c.density[k+1]
	square := share * share
	line := a + float64(float64(share*(b-a))/2)
	first := float64(square * (1 - share + float64(square/4)))
	second := float64(square * (0.5 - float64(square/4)))
	sag := float64(c.bend[k]*first) + float64(c.bend[k+1]*second)
	return float64(h * (float64(share*line) - float64(h*h*sag)/6))
}

// integral gives the integral of the density from the surface to a depth, in
// kg/m^2; NaN below the last measurement.
func (c *curve) integral(depth float64) float64 {
	n := len(c.depth)
	if !c.ordered || !(depth <= c.depth[n-1]) {
		return math.NaN()
	}
	if depth <= c.depth[0] {
		return float64(c.density[0] * depth)
	}
	low, high := 0, n-1
	for high-low > 1 {
		if middle := (low + high) / 2; c.depth[middle] <= depth {
			low = middle
		} else {
			high = middle
		}
	}
	share := (depth - c.depth[low]) / (c.depth[low+1] - c.depth[low])
	return c.above[low] + c.part(low, share)
}
