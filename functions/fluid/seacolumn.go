package fluid

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// seaColumnLaws are those of pressure and depth under a cast of salinity and
// temperature.
func seaColumnLaws() []*law.Law {
	const (
		method = "dp/dz = rho(S(z), t(z), p) (g(phi) + 2.184e-6 p) from p = 0 at z = 0; rho sea_water_density, S and t straight lines between the measurements, g = 9.780318 m/s^2 (1 + 5.2788e-3 sin^2 phi + 2.36e-5 sin^4 phi), p sea pressure in dbar, z depth in m, phi latitude; fourth-order Runge-Kutta steps from measurement to measurement, of at most 250 m. For the straight lines the steps err by less than 1e-11 of the pressure (1e-7 beside water without salt, where density goes with S^1.5); the straight lines themselves by at most h^2/12 (1e-3 |S''| + 5e-4 |t''|) of the pressure at the measurement below; h largest spacing in m, |S''| in 1/m^2 and |t''| in K/m^2 the greatest second derivatives by depth"
		source = unesco44Source + ", eqs. 15 to 19 and 25; Saunders P.M. (1981) Practical conversion of pressure to depth, J. Phys. Oceanogr. 11, 573-574; Kutta W. (1901) Beitrag zur näherungsweisen Integration totaler Differentialgleichungen, Z. Math. Phys. 46, 435-453"
	)
	latitude := law.Parameter{Name: "latitude", Meaning: "geographic latitude, north or south", Unit: "deg", Finite: law.Within(-90, 90)}
	depths := law.Parameter{Name: "depths", Meaning: "depths of the measurements, from the surface down, each below the one before; above the first its values are taken", Type: law.List, Unit: "m", Finite: law.Within(0, deepestCast)}
	salinities := practicalSalinity(law.Within(0, 42), law.Within(0, 80))
	salinities.Name, salinities.Type, salinities.Meaning = "salinities", law.List, "practical salinity at each depth"
	temperatures := seaTemperature(law.Within(-2, 40), law.Within(-10, 60))
	temperatures.Name, temperatures.Type, temperatures.Meaning = "temperatures", law.List, "temperature in place at each depth, on the scale told"
	const below = "below the last measurement, or the depths do not each lie below the one before"
	return []*law.Law{
		{
			Name: "sea_column_pressure", Group: "fluid",
			Gives: "sea pressure at a depth under measured salinity and temperature",
			Parameters: []law.Parameter{
				{Name: "depth", Meaning: "depth below the surface of the sea, at most the last of the depths", Unit: "m", Valid: law.Within(0, 9726), Finite: law.Within(0, 15000)},
				latitude, depths, salinities, temperatures, temperatureScale(),
			},
			Result: law.Result{Unit: "dbar(g)"}, Equation: method, Source: source,
			Caution: "Density is good to 5e-6 at best, true gravity differs from the formula by up to 5e-5, tide and weather move the surface. " + law.CautionPressure,
			Refusal: "the depth lies " + below,
			Examples: []law.Example{
				// The standard ocean of sea_pressure_at_depth.
				{Formula: "sea_column_pressure(4908.56[m], 30[deg], [0, 5000][m], [35, 35], [0, 0][degC])", Gives: "5000 dbar"},
			},
			Body: seaColumnPressureBody,
		},
		{
			Name: "sea_column_depth", Group: "fluid",
			Gives: "depth of a sea pressure under measured salinity and temperature",
			Parameters: []law.Parameter{
				{Name: "sea_pressure", Meaning: "pressure above that at the surface", Unit: "dbar(g)", Valid: law.Within(0, 10000), Finite: law.Within(0, 20000)},
				latitude, depths, salinities, temperatures, temperatureScale(),
			},
			Result: law.Result{Unit: "m"}, Equation: "the depth at which sea_column_pressure gives the pressure: " + method, Source: source,
			Caution: "Density is good to 5e-6 at best, true gravity differs from the formula by up to 5e-5, tide and weather move the surface. " + law.CautionPressure,
			Refusal: "the pressure is reached " + below,
			Examples: []law.Example{
				{Formula: "sea_column_depth(5000[dbar], 30[deg], [0, 5000][m], [35, 35], [0, 0][degC])", Gives: "4909 m"},
			},
			Body: seaColumnDepthBody,
		},
	}
}

// deepestCast bounds the depths of a cast in m, and with it the number of steps.
const deepestCast = 20000.0

// longestStep is the longest step of the integration in m.
const longestStep = 250.0

// cast is measured salinity and temperature and what its column weighs.
type cast struct {
	depth, salinity, temperature []float64 // m, practical salinity, degC on IPTS-68
	gravity                      float64   // at the surface, m/s^2
	ordered                      bool      // each depth lies below the one before
	node, pressure               []float64 // depths in m of the steps' ends, sea pressure in dbar there
	span                         []int     // the measurement above each step, -1 above the first
}

// seaColumnPressureBody takes depth, latitude, depths, salinities, temperatures
// and the scale.
func seaColumnPressureBody(dst []float64, arguments []law.Argument, work *law.Work) {
	c := keptCast(work)
	every := castVaries(arguments)
	for i := range dst {
		if i == 0 || every {
			c.prepare(arguments, i)
		}
		dst[i] = pascalsPerDecibar * c.pressureAt(arguments[0].At(i))
	}
}

// seaColumnDepthBody takes sea pressure, latitude, depths, salinities,
// temperatures and the scale.
func seaColumnDepthBody(dst []float64, arguments []law.Argument, work *law.Work) {
	c := keptCast(work)
	every := castVaries(arguments)
	for i := range dst {
		if i == 0 || every {
			c.prepare(arguments, i)
		}
		dst[i] = c.depthAt(arguments[0].At(i) / pascalsPerDecibar)
	}
}

// keptCast gives the scratch of a body's worker.
func keptCast(work *law.Work) *cast {
	c, _ := work.Keep.(*cast)
	if c == nil {
		c = &cast{}
		work.Keep = c
	}
	return c
}

// castVaries says whether the rows of a call have casts or latitudes of their
// own.
func castVaries(arguments []law.Argument) bool {
	return arguments[1].Varies() || arguments[2].Varies() || arguments[3].Varies() || arguments[4].Varies()
}

// prepare lays out the cast of a row and integrates it down to its last
// measurement.
func (c *cast) prepare(arguments []law.Argument, row int) {
	scale := scaleFactor(&arguments[5])
	depths, salinities, temperatures := arguments[2].Items, arguments[3].Items, arguments[4].Items
	n := min(len(depths), len(salinities), len(temperatures))
	c.depth, c.salinity, c.temperature = c.depth[:0], c.salinity[:0], c.temperature[:0]
	c.node, c.pressure, c.span = append(c.node[:0], 0), append(c.pressure[:0], 0), c.span[:0]
	c.gravity = surfaceGravity(arguments[1].At(row))
	c.ordered = n > 0
	for k := range n {
		z := depths[k].At(row)
		if !(z >= 0 && z <= deepestCast) || k > 0 && !(z > c.depth[k-1]) {
			c.ordered = false
			return
		}
		c.depth = append(c.depth, z)
		c.salinity = append(c.salinity, salinities[k].At(row))
		c.temperature = append(c.temperature, float64((temperatures[k].At(row)-nature.IcePoint)*scale))
	}
	from := 0.0
	for k, to := range c.depth {
		steps := math.Ceil((to - from) / longestStep)
		for s := 1.0; s <= steps; s++ {
			end := to
			if s < steps {
				end = from + float64((to-from)*s/steps)
			}
			last := len(c.node) - 1
			p := c.advance(c.node[last], c.pressure[last], end-c.node[last], k-1)
			c.node, c.pressure, c.span = append(c.node, end), append(c.pressure, p), append(c.span, k-1)
		}
		from = to
	}
}

// slope gives dp/dz in dbar/m at a depth in m and a sea pressure in dbar, on
// the straight lines below measurement k.
func (c *cast) slope(z, p float64, k int) float64 {
	s, t := c.salinity[max(k, 0)], c.temperature[max(k, 0)]
	if k >= 0 && k+1 < len(c.depth) {
		share := (z - c.depth[k]) / (c.depth[k+1] - c.depth[k])
		s += float64(share * (c.salinity[k+1] - s))
		t += float64(share * (c.temperature[k+1] - t))
	}
	gravity := c.gravity + float64(2*gravityRise*p)
	return seaWaterDensity(s, t, float64(p*0.1)) * gravity / pascalsPerDecibar
}

// advance carries the sea pressure in dbar from a depth down by h in one step
// of the classical Runge-Kutta method.
func (c *cast) advance(z, p, h float64, k int) float64 {
	half := float64(h / 2)
	k1 := c.slope(z, p, k)
	k2 := c.slope(z+half, p+float64(half*k1), k)
	k3 := c.slope(z+half, p+float64(half*k2), k)
	k4 := c.slope(z+h, p+float64(h*k3), k)
	return p + float64(h*(k1+float64(2*(k2+k3))+k4))/6
}

// step gives the last step that begins at or above x in ends, an ascending
// list of one more ends than steps; -1 where x lies beyond the last end.
func (c *cast) step(ends []float64, x float64) int {
	last := len(ends) - 1
	if !c.ordered || !(x <= ends[last]) {
		return -1
	}
	low, high := 0, last
	for high-low > 1 {
		if middle := (low + high) / 2; ends[middle] <= x {
			low = middle
		} else {
			high = middle
		}
	}
	return low
}

// pressureAt gives the sea pressure in dbar at a depth in m: one step from the
// end of the last whole one.
func (c *cast) pressureAt(depth float64) float64 {
	i := c.step(c.node, depth)
	if i < 0 {
		return math.NaN()
	}
	if depth == c.node[i] {
		return c.pressure[i]
	}
	return c.advance(c.node[i], c.pressure[i], depth-c.node[i], c.span[i])
}

// depthAt gives the depth in m of a sea pressure in dbar: the length of the
// step that pressureAt would take, by Newton's method. The slope changes by
// a few parts in a thousand over a step, so that four steps reach the last bit.
func (c *cast) depthAt(pressure float64) float64 {
	i := c.step(c.pressure, pressure)
	if i < 0 {
		return math.NaN()
	}
	z, p, k := c.node[i], c.pressure[i], c.span[min(i, len(c.span)-1)]
	if pressure == p {
		return z
	}
	h := (pressure - p) / c.slope(z, p, k)
	for range 4 {
		reached := c.advance(z, p, h, k)
		h += (pressure - reached) / c.slope(z+h, reached, k)
	}
	return z + h
}
