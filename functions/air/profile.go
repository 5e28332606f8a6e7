package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// profile is a column whose temperature is piecewise linear between levels,
// with the logarithm of the pressure at each level over that at the first.
type profile struct {
	heights      []float64 // m, rising; with an inverse square geopotential
	temperatures []float64 // K
	slopes       []float64 // K/m above each level
	logarithms   []float64
	reciprocals  []float64 // 1/K
	pull         float64   // M g/R in K/m
	inverse      bool      // gravity falls with the square of the distance
	radius       float64   // m
	sound        bool      // heights rise and temperatures are above 0 K
}

// size makes room for n levels.
func (p *profile) size(n int) {
	if cap(p.heights) < n {
		p.heights, p.temperatures, p.slopes = make([]float64, n), make([]float64, n), make([]float64, n)
		p.logarithms, p.reciprocals = make([]float64, n), make([]float64, n)
	}
	p.heights, p.temperatures, p.slopes = p.heights[:n], p.temperatures[:n], p.slopes[:n]
	p.logarithms, p.reciprocals = p.logarithms[:n], p.reciprocals[:n]
}

// levelOf turns a geometric height into the one that the hydrostatic equation
// is integrated over.
func (p *profile) levelOf(height float64) float64 {
	if p.inverse {
		return float64(height * (p.radius / (p.radius + height)))
	}
	return height
}

// read takes one row of the arguments: heights, temperatures, base pressure,
// height, molar mass, gravity model, gravity, radius.
func (p *profile) read(arguments []law.Argument, row int) {
	heights, temperatures := arguments[0].Items, arguments[1].Items
	n := len(heights)
	p.size(n)
	p.inverse = arguments[5].Text == inverseSquare
	p.radius = arguments[7].At(row)
	p.pull = arguments[4].At(row) * arguments[6].At(row) / nature.MolarGasConstant
	p.sound = n > 0 && n == len(temperatures)
	if !p.sound {
		return
	}
	for i := range heights {
		p.heights[i], p.temperatures[i] = p.levelOf(heights[i].At(row)), temperatures[i].At(row)
		if !(p.temperatures[i] > 0) || i > 0 && !(p.heights[i] > p.heights[i-1]) {
			p.sound = false
			return
		}
		p.reciprocals[i] = 1 / p.temperatures[i]
		p.slopes[i] = 0
	}
	p.logarithms[0] = 0
	for i := 1; i < n; i++ {
		step := p.heights[i] - p.heights[i-1]
		p.slopes[i-1] = (p.temperatures[i] - p.temperatures[i-1]) / step
		p.logarithms[i] = p.logarithms[i-1] + p.change(i-1, step)
	}
}

// change gives the logarithm of the pressure at a distance above a level over
// that at the level: -(M g/R) times the integral of dh/T, which with T linear
// is d/T ln(1 + x)/x, x the relative change of T.
func (p *profile) change(level int, distance float64) float64 {
	x := float64(p.slopes[level] * distance * p.reciprocals[level])
	depth := float64(-p.pull * distance * p.reciprocals[level])
	if x == 0 {
		return depth
	}
	return float64(depth * (column.Log1p(x) / x))
}

// levelBelow finds the last level at or below a height by halving; -1 where
// the height is outside the profile.
func (p *profile) levelBelow(height float64) int {
	n := len(p.heights)
	if !p.sound || !(height >= p.heights[0] && height <= p.heights[n-1]) {
		return -1
	}
	low := 0
	for step := n; step > 1; {
		half := step / 2
		if p.heights[low+half] <= height {
			low += half
		}
		step -= half
	}
	return low
}

// ratioAt gives the pressure at a geometric height over that at the first
// level, and the temperature there in K.
func (p *profile) ratioAt(height float64) (ratio, temperature float64) {
	h := p.levelOf(height)
	level := p.levelBelow(h)
	if level < 0 {
		return notANumber, notANumber
	}
	distance := h - p.heights[level]
	temperature = p.temperatures[level] + float64(p.slopes[level]*distance)
	return column.Exp(p.logarithms[level] + p.change(level, distance)), temperature
}

const inverseSquare = "inverse square"

// profileBody reads the profile once a block where no level changes from row
// to row, and hands pressure, temperature and molar mass to what is asked.
//
//go:noinline
func profileBody(give func(pressure, temperature, molarMass float64) float64) law.Body {
	return func(dst []float64, arguments []law.Argument, work *law.Work) {
		p, _ := work.Keep.(*profile)
		if p == nil {
			p = &profile{}
			work.Keep = p
		}
		varies := false
		for _, i := range [...]int{0, 1, 4, 6, 7} {
			varies = varies || arguments[i].Varies()
		}
		for i := range dst {
			if i == 0 || varies {
				p.read(arguments, i)
			}
			ratio, temperature := p.ratioAt(arguments[3].At(i))
			dst[i] = give(arguments[2].At(i)*ratio, temperature, arguments[4].At(i))
		}
	}
}

// profileLaws integrate the hydrostatic equation over a profile of one's own.
var profileLaws = []*law.Law{
	{
		Name: "profile_pressure", Group: group, Gives: "the pressure at a height in a column of a measured or designed temperature profile",
		Parameters: profileParameters(), Result: law.Result{Unit: "Pa(a)"}, Equation: profileLayers, Source: profileSource, Caution: profileCaution, Refusal: profileRefusal,
		Examples: []law.Example{
			{Formula: "profile_pressure([0, 11000, 20000][gpm], [288.15, 216.65, 216.65][K], 101325[Pa], 20000[gpm], molar_mass: 28.9644[g/mol]*nature.R/8.31432[J/(mol K)])", Gives: "5474.89 Pa"},
		},
		Body: profileBody(func(pressure, _, _ float64) float64 { return pressure }),
	},
	{
		Name: "profile_density", Group: group, Gives: "the density at a height in a column of a measured or designed temperature profile",
		Parameters: profileParameters(), Result: law.Result{Unit: "kg/m^3"}, Equation: "rho = p M/(R T); " + profileLayers, Source: profileSource, Caution: profileCaution, Refusal: profileRefusal,
		Examples: []law.Example{
			{Formula: "profile_density([0, 11000][gpm], [288.15, 216.65][K], 101325[Pa], 11000[gpm], molar_mass: 28.9644[g/mol]*nature.R/8.31432[J/(mol K)])", Gives: "0.363918 kg/m^3"},
		},
		Body: profileBody(func(pressure, temperature, molarMass float64) float64 {
			return pressure * molarMass / (nature.MolarGasConstant * temperature)
		}),
	},
}

func profileParameters() []law.Parameter {
	return []law.Parameter{
		{Name: "heights", Meaning: "heights of the levels above the zero of height, rising", Type: law.List, Unit: "m", Accepts: []law.Conversion{{Unit: "gpm", Factor: 1}}},
		{Name: "temperatures", Meaning: "temperature at each level, for moist air its virtual temperature; linear between levels", Type: law.List, Unit: "K", Finite: law.Above(0)},
		{Name: "base_pressure", Meaning: "absolute pressure at the first level", Unit: "Pa(a)", Finite: law.AtLeast(0)},
		{Name: "height", Meaning: "height asked for, within the levels", Unit: "m", Accepts: []law.Conversion{{Unit: "gpm", Factor: 1}}},
		{Name: "molar_mass", Meaning: "mean molar mass of the gas, one over the whole height", Unit: "g/mol", Finite: law.Above(0), Default: "28.9644[g/mol]"},
		{Name: "gravity_model", Meaning: "gravity constant over the height, as with geopotential heights, or falling with the square of the distance from the body's centre", Type: law.Text, Default: `"constant"`, Choices: []string{"constant", inverseSquare}},
		{Name: "gravity", Meaning: "acceleration of gravity, at the zero of height", Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n"},
		{Name: "radius", Meaning: "distance of the zero of height from the body's centre, for the inverse square", Unit: "km", Finite: law.Above(0), Default: "6356.766[km]"},
	}
}

const (
	profileSource  = "hydrostatic equation and ideal gas; as U.S. Standard Atmosphere, 1976, equations 33a and 33b, with levels of one's own; Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., section 3.2"
	profileLayers  = "in each layer p = p_b (T/T_b)^(-g M/(R L)), or p_b exp(-g M (h - h_b)/(R T_b)) where L = 0; L = dT/dh; with the inverse square h is the geopotential height r z/(r + z) and T linear in it"
	profileRefusal = "the height lies outside the levels, the levels do not rise, or a list has another length than the other"
	profileCaution = "Ideal gas at rest of one composition: take virtual temperatures for moist air."
)
