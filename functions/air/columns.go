package air

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// notANumber answers arguments that a law cannot take.
var notANumber = math.NaN()

// scaleHeight gives R T/(M g) in m: the height over which the pressure of an
// isothermal column falls to 1/e.
func scaleHeight(temperature, molarMass, gravity float64) float64 {
	return nature.MolarGasConstant * temperature / (molarMass * gravity)
}

// heightInScales gives M g h/(R T), the height in units of the scale height.
func heightInScales(height, temperature, molarMass, gravity float64) float64 {
	return molarMass * gravity * height / (nature.MolarGasConstant * temperature)
}

// isothermal gives the factor by which pressure, density and number of
// particles of an isothermal column fall over the height.
func isothermal(height, temperature, molarMass, gravity float64) float64 {
	if !(temperature > 0) {
		return notANumber
	}
	return column.Exp(-heightInScales(height, temperature, molarMass, gravity))
}

// lapsed gives the factors by which pressure and density fall over the height
// where the temperature is T0 - L h.
//
// The textbook's (1 - L h/T0)^(g M/(R L)) loses all digits as L approaches
// zero. With x = L h/T0 it is written exp(-(M g h/(R T0)) phi(x)), where phi(x)
// = -ln(1 - x)/x goes smoothly to 1 and log1p keeps every digit of it. At x = 0
// the factor is the isothermal one, to the bit. Density falls by the same
// factor divided by T/T0 = 1 - x.
func lapsed(height, temperature, lapseRate, molarMass, gravity float64) (pressure, density float64) {
	if !(temperature > 0) {
		return notANumber, notANumber
	}
	u := heightInScales(height, temperature, molarMass, gravity)
	x := lapseRate * height / temperature
	if x == 0 {
		factor := column.Exp(-u)
		return factor, factor
	}
	if !(x < 1) { // the temperature has fallen to 0 K
		return notANumber, notANumber
	}
	logarithm := column.Log1p(-x)
	exponent := float64(u * (logarithm / x))
	return column.Exp(exponent), column.Exp(exponent - logarithm)
}

// Parameters that several laws of gas columns share.

func temperatureOfColumn(name, meaning string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning, Unit: "K", Finite: law.Above(0)}
}

func molarMassOfGas() law.Parameter {
	return law.Parameter{
		Name: "molar_mass", Meaning: "mean molar mass of the gas; for grains in a liquid the buoyant mass of a mole of them",
		Unit: "kg/mol", Finite: law.Above(0),
	}
}

func gravityOfColumn() law.Parameter {
	return law.Parameter{
		Name: "gravity", Meaning: "acceleration of gravity, constant over the height",
		Unit: "m/s^2", Finite: law.Above(0), Default: "nature.g_n",
	}
}

func heightOfColumn() law.Parameter {
	return law.Parameter{
		Name: "height",
		Meaning: "height above the base level, with gravity constant over it; a difference of geopotential heights is taken as it stands, " +
			"which is exact with the gravity g_n",
		Unit:    "m",
		Accepts: []law.Conversion{{Unit: "gpm", Factor: 1}},
	}
}

func basePressure() law.Parameter {
	return law.Parameter{Name: "base_pressure", Meaning: "absolute pressure at the base level", Unit: "Pa(a)", Finite: law.AtLeast(0)}
}

func baseDensity() law.Parameter {
	return law.Parameter{Name: "base_density", Meaning: "density at the base level", Unit: "kg/m^3", Finite: law.AtLeast(0)}
}

func lapseRateOfColumn() law.Parameter {
	return law.Parameter{
		Name:    "lapse_rate",
		Meaning: "fall of temperature with height: positive where it grows colder upwards, 0 for an isothermal column",
		Unit:    "K/km",
	}
}

// Sources and warnings that the laws of gas columns share.
const (
	barometricSource = "Laplace P.S. (1805) Traité de mécanique céleste, vol. 4, book 10 (barometric formula); Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., section 3.2"
	lapsedSource     = "U.S. Standard Atmosphere, 1976 (NOAA/NASA/USAF, NOAA-S/T 76-1562), equations 33a and 42 with a gas, gravity and lapse rate of one's own; Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., section 3.2"
	columnCaution    = "Ideal gas at rest, one composition, one gravity over the whole height. Over tens of kilometres give the height as a geopotential difference, or gravity's mean."
	columnOverflow   = "so deep below the base level the column is heavier than a number can hold"
	coldTop          = "the temperature falls to 0 K at or below that height: the lapse rate does not reach so high; or " + columnOverflow
)

var scaleHeightLaw = &law.Law{
	Name:  "scale_height",
	Group: group,
	Gives: "the height over which the pressure of an isothermal gas column falls to 1/e",
	Parameters: []law.Parameter{
		temperatureOfColumn("temperature", "temperature of the gas"), molarMassOfGas(), gravityOfColumn(),
	},
	Result:   law.Result{Unit: "m"},
	Equation: "H = R T/(M g)",
	Source:   "Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., equation 3.27, with R and M in place of the specific gas constant; R of CODATA 2022, exact",
	Examples: []law.Example{
		{Formula: "scale_height(288.15[K], 28.9644[g/mol])", Gives: "8434.66 m"},
	},
	Body: law.Of3(scaleHeight),
}

var barometricPressureLaw = &law.Law{
	Name:  "barometric_pressure",
	Group: group,
	Gives: "the pressure at a height in an isothermal gas column",
	Parameters: []law.Parameter{
		basePressure(), heightOfColumn(), temperatureOfColumn("temperature", "temperature of the column, the same at every height"),
		molarMassOfGas(), gravityOfColumn(),
	},
	Result:   law.Result{Unit: "Pa(a)"},
	Equation: "p = p0 exp(-M g h/(R T))",
	Source:   barometricSource,
	Caution:  columnCaution,
	Refusal:  columnOverflow,
	Examples: []law.Example{
		{Formula: "barometric_pressure(1000[hPa], 0[m], 250[K], 28.9644[g/mol])", Gives: "100000 Pa"},
		{Formula: "barometric_pressure(22632.06[Pa], 1000[gpm], 216.65[K], 28.9644[g/mol])", Gives: "19330.45 Pa"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		return x[0] * isothermal(x[1], x[2], x[3], x[4])
	}),
}

var barometricDensityLaw = &law.Law{
	Name:  "barometric_density",
	Group: group,
	Gives: "the density at a height in an isothermal gas column",
	Parameters: []law.Parameter{
		baseDensity(), heightOfColumn(), temperatureOfColumn("temperature", "temperature of the column, the same at every height"),
		molarMassOfGas(), gravityOfColumn(),
	},
	Result:   law.Result{Unit: "kg/m^3"},
	Equation: "rho = rho0 exp(-M g h/(R T))",
	Source:   barometricSource + "; for grains in a liquid: Perrin J. (1909) Mouvement brownien et réalité moléculaire, Ann. Chim. Phys. 18, 5",
	Caution:  columnCaution,
	Refusal:  columnOverflow,
	Examples: []law.Example{
		{Formula: "barometric_density(1.2[kg/m^3], 0[m], 250[K], 28.9644[g/mol])", Gives: "1.2 kg/m^3"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		return x[0] * isothermal(x[1], x[2], x[3], x[4])
	}),
}

var lapsedPressureLaw = &law.Law{
	Name:  "lapsed_pressure",
	Group: group,
	Gives: "the pressure at a height in a gas column whose temperature falls linearly",
	Parameters: []law.Parameter{
		basePressure(), heightOfColumn(), temperatureOfColumn("base_temperature", "temperature at the base level"),
		lapseRateOfColumn(), molarMassOfGas(), gravityOfColumn(),
	},
	Result:   law.Result{Unit: "Pa(a)"},
	Equation: "p = p0 (1 - L h/T0)^(g M/(R L)); for L = 0, p = p0 exp(-M g h/(R T0))",
	Source:   lapsedSource,
	Caution:  columnCaution,
	Refusal:  coldTop,
	Examples: []law.Example{
		{Formula: "lapsed_pressure(101325[Pa], 11000[gpm], 288.15[K], 6.5[K/km], 28.9644[g/mol]*nature.R/8.31432[J/(mol K)])", Gives: "22632.06 Pa"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		pressure, _ := lapsed(x[1], x[2], x[3], x[4], x[5])
		return x[0] * pressure
	}),
}

var lapsedDensityLaw = &law.Law{
	Name:  "lapsed_density",
	Group: group,
	Gives: "the density at a height in a gas column whose temperature falls linearly",
	Parameters: []law.Parameter{
		baseDensity(), heightOfColumn(), temperatureOfColumn("base_temperature", "temperature at the base level"),
		lapseRateOfColumn(), molarMassOfGas(), gravityOfColumn(),
	},
	Result:   law.Result{Unit: "kg/m^3"},
	Equation: "rho = rho0 (1 - L h/T0)^(g M/(R L) - 1); for L = 0, rho = rho0 exp(-M g h/(R T0))",
	Source:   lapsedSource,
	Caution:  columnCaution,
	Refusal:  coldTop,
	Examples: []law.Example{
		{Formula: "lapsed_density(1.225[kg/m^3], 11000[gpm], 288.15[K], 6.5[K/km], 28.9644[g/mol]*nature.R/8.31432[J/(mol K)])", Gives: "0.363918 kg/m^3"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		_, density := lapsed(x[1], x[2], x[3], x[4], x[5])
		return x[0] * density
	}),
}
