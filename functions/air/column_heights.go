package air

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// barometricHeight gives the height in m over which an isothermal column's
// pressure falls from base to pressure.
func barometricHeight(base, pressure, temperature, molarMass, gravity float64) float64 {
	return scaleHeight(temperature, molarMass, gravity) * column.Ln(base/pressure)
}

// lapsedHeight inverts lapsed: with y = R T0 ln(p0/p)/(M g) and a = R L/(M g),
// h = (T0/L)(1 - exp(-a ln(p0/p))), which is y where L is 0.
func lapsedHeight(base, pressure, temperature, lapseRate, molarMass, gravity float64) float64 {
	y := barometricHeight(base, pressure, temperature, molarMass, gravity)
	x := lapseRate * y / temperature
	if x == 0 {
		return y
	}
	return y * (column.Expm1(-x) / -x)
}

// columnHeightLaws are the inverses of the laws of columns, the column of
// particles, and what meteorology makes of them.
var columnHeightLaws = []*law.Law{
	{
		Name: "barometric_height", Group: group, Gives: "the height over which the pressure of an isothermal gas column falls to a pressure",
		Parameters: []law.Parameter{columnBase, columnPressure, temperatureOfColumn("temperature", "temperature of the column, the same at every height"), molarMassOfGas(), gravityOfColumn()},
		Result:     law.Result{Unit: "m"},
		Equation:   "h = (R T/(M g)) ln(p0/p)", Source: barometricSource, Caution: columnCaution,
		Examples: []law.Example{{Formula: "barometric_height(1000[hPa], 1000[hPa], 250[K], 28.9644[g/mol])", Gives: "0 m"}},
		Body: law.OfMany(func(x []float64) float64 {
			return barometricHeight(x[0], x[1], x[2], x[3], x[4])
		}),
	},
	{
		Name: "lapsed_height", Group: group, Gives: "the height at which a gas column whose temperature falls linearly has a pressure",
		Parameters: []law.Parameter{columnBase, columnPressure, temperatureOfColumn("base_temperature", "temperature at the base level"), lapseRateOfColumn(), molarMassOfGas(), gravityOfColumn()},
		Result:     law.Result{Unit: "m"},
		Equation:   "h = (T0/L) (1 - (p/p0)^(R L/(g M))); for L = 0, h = (R T0/(M g)) ln(p0/p)", Source: lapsedSource, Caution: columnCaution,
		Examples: []law.Example{{Formula: "lapsed_height(101325[Pa], 22632.06[Pa], 288.15[K], 6.5[K/km], 28.9644[g/mol]*nature.R/8.31432[J/(mol K)])", Gives: "11000.00 m"}},
		Body: law.OfMany(func(x []float64) float64 {
			return lapsedHeight(x[0], x[1], x[2], x[3], x[4], x[5])
		}),
	},
	{
		Name: "barometric_number_density", Group: group, Gives: "the number of particles in a volume at a height in an isothermal column",
		Parameters: []law.Parameter{
			{Name: "base", Meaning: "number of particles in a volume at the base level", Unit: "m^-3", Finite: law.AtLeast(0)},
			heightOfColumn(),
			{Name: "particle_mass", Meaning: "mass of one particle; in a liquid the mass above that of the liquid it displaces", Unit: "kg"},
			temperatureOfColumn("temperature", "temperature of the column, the same at every height"), gravityOfColumn(),
		},
		Result:   law.Result{Unit: "m^-3"},
		Equation: "n = n0 exp(-m g h/(k_B T)); n0 base, m particle_mass", Caution: columnCaution, Refusal: columnOverflow,
		Source:   "Boltzmann L. (1879) Sitzungsber. Akad. Wiss. Wien 78, 7; Perrin J. (1909) Mouvement brownien et réalité moléculaire, Ann. Chim. Phys. 18, 5",
		Examples: []law.Example{{Formula: "barometric_number_density(1e25[m^-3], 0[m], 4.65e-26[kg], 250[K])", Gives: "1e25 m^-3"}},
		Body: law.OfMany(func(x []float64) float64 {
			return x[0] * isothermal(x[1], x[3], x[2]*nature.AvogadroConstant, x[4])
		}),
	},
	{
		Name: "layer_thickness", Group: group, Gives: "the thickness of the air between two pressures",
		Parameters: []law.Parameter{
			{Name: "lower_pressure", Meaning: "absolute pressure at the foot of the layer", Unit: "hPa(a)", Finite: law.Above(0)},
			{Name: "upper_pressure", Meaning: "absolute pressure at the top of the layer", Unit: "hPa(a)", Finite: law.Above(0)},
			{Name: "mean_virtual_temperature", Meaning: "virtual temperature of the layer, averaged over the logarithm of pressure", Unit: "K", Valid: law.Within(180, 320), Finite: law.Above(0)},
			{Name: "gas_constant", Meaning: "specific gas constant of dry air", Unit: "J/(kg K)", Finite: law.Above(0), Default: "287.05[J/(kg K)]"},
		},
		Result:   law.Result{Unit: "gpm"},
		Equation: "Z2 - Z1 = (R T_v/g0) ln(p1/p2), g0 = 9.80665 m/s^2; R gas_constant", Source: "WMO-No. 8, Guide to Meteorological Instruments and Methods of Observation; Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., equation 3.29",
		Caution:  "Hydrostatic: not inside a thunderstorm.",
		Examples: []law.Example{{Formula: "layer_thickness(1000[hPa], 500[hPa], 288.15[K])", Gives: "5846 gpm"}},
		Body: law.Of4(func(lower, upper, t, r float64) float64 {
			return r * t / standardGravity * column.Ln(lower/upper)
		}),
	},
	{
		Name: "virtual_temperature", Group: group, Gives: "the temperature at which dry air has the density of moist air",
		Parameters: []law.Parameter{
			{Name: "temperature", Meaning: "temperature of the air", Unit: "K", Finite: law.Above(0)},
			{Name: "mixing_ratio", Meaning: "mass of water vapour for a mass of dry air", Unit: "1", Valid: law.Within(0, 0.1), Finite: law.AtLeast(0)},
			{Name: "mass_ratio", Meaning: "molar mass of water over that of dry air", Unit: "1", Finite: law.Above(0), Default: "0.62198"},
		},
		Result:   law.Result{Unit: "K"},
		Equation: "T_v = T (1 + r/epsilon)/(1 + r), about T (1 + 0.61 r); r mixing_ratio, epsilon mass_ratio", Source: "Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., equations 3.16 and 3.59",
		Examples: []law.Example{{Formula: "virtual_temperature(300[K], 0)", Gives: "300 K"}},
		Body:     law.Of3(func(t, r, epsilon float64) float64 { return t * ((1 + r/epsilon) / (1 + r)) }),
	},
}

var columnPressure = law.Parameter{Name: "pressure", Meaning: "absolute pressure at the height sought", Unit: "Pa(a)", Finite: law.Above(0)}
var columnBase = law.Parameter{Name: "base_pressure", Meaning: "absolute pressure at the base level", Unit: "Pa(a)", Finite: law.Above(0)}
