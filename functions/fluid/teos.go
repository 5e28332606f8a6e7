package fluid

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Sources and warnings of the laws of the Thermodynamic Equation of Seawater.
const (
	teosManual   = "IOC, SCOR and IAPSO (2010) The international thermodynamic equation of seawater - 2010 (TEOS-10), IOC Manuals and Guides 56"
	gibbsSource  = "IAPWS SR7-09 (2009), Supplementary Release on a Computationally Efficient Thermodynamic Formulation for Liquid Water for Oceanographic Use; IAPWS R13-08 (2008), Release on the IAPWS Formulation 2008 for the Thermodynamic Properties of Seawater; " + teosManual
	gibbsFormula = "g = sum of n_jk y^j z^k + sum of n_ijk X_i y^j z^k, X_1 = x^2 ln x, X_i = x^i, x^2 = S_A/(40.188617 g/kg), y = t/(40 degC), z = p/(10^8 Pa), 41 and 64 terms; S_A absolute_salinity, t temperature (in place), p sea_pressure, T = t + 273.15 K"
	teosCaution  = "Absolute salinity in g/kg is not practical salinity (35.165 g/kg against 35), and sea pressure is no absolute pressure."
)

// absoluteSalinityOf is the salinity that the laws of TEOS-10 take. Practical
// salinity given in its place lies a thousand times beyond the range.
func absoluteSalinityOf(finite law.Range) law.Parameter {
	return law.Parameter{
		Name: "absolute_salinity", Meaning: "mass of dissolved salt in a mass of sea water",
		Unit: "g/kg", Valid: law.Range{Low: 0, High: 42, HasLow: true, HasHigh: true, LowOpen: finite.LowOpen}, Finite: finite,
	}
}

// teosPressure is the sea pressure that the laws of TEOS-10 take.
func teosPressure(valid float64) law.Parameter {
	return law.Parameter{
		Name: "sea_pressure", Meaning: "absolute pressure less 101325 Pa: zero at the surface",
		Unit: "dbar(g)", Valid: law.Within(0, valid), Finite: law.Within(-10.1325, 12000),
	}
}

// teosLaws are those of salinity and of the Gibbs function.
func teosLaws() []*law.Law {
	// The saline part was fitted up to 80 degC. In so hot a brine the second
	// derivatives by temperature and pressure go astray first.
	inPlace := func(hottest float64) law.Parameter {
		return law.Parameter{
			Name: "temperature", Meaning: "temperature in place on ITS-90, neither potential nor conservative",
			Unit: "degC", Valid: law.Within(-2.65, 40), Finite: law.Within(-12, hottest),
		}
	}
	anomaly := law.Parameter{
		Name: "anomaly", Meaning: "salinity beyond that of the reference composition: 0 to 0.03 g/kg in the open ocean, by region",
		Unit: "g/kg", Valid: law.Within(-0.1, 0.1), Finite: law.Within(-10, 10), Default: "0[g/kg]",
	}
	const saltEquation = "S_A = (35.16504/35) g/kg S_P + dS_A; S_P practical salinity, dS_A anomaly"
	laws := []*law.Law{
		{
			Name: "absolute_salinity", Group: "fluid",
			Gives: "absolute salinity from practical salinity, for sea water of the reference composition",
			Parameters: []law.Parameter{
				practicalSalinity(law.Within(2, 42), law.Within(0, 100)), anomaly,
			},
			Result: law.Result{Unit: "g/kg"}, Equation: saltEquation,
			Source:  "Millero F.J., Feistel R., Wright D.G., McDougall T.J. (2008) The composition of standard seawater and the definition of the reference-composition salinity scale, Deep-Sea Research I 55, 50-72; " + teosManual,
			Caution: "Coastal, brackish and deep Pacific water have other compositions: give their anomaly.",
			Examples: []law.Example{
				{Formula: "absolute_salinity(35)", Gives: "35.16504 g/kg"},
			},
			Body: law.Of2(func(practical, anomaly float64) float64 {
				return float64(practical*saltPerPractical) + anomaly
			}),
		},
		{
			Name: "practical_salinity", Group: "fluid",
			Gives: "practical salinity from absolute salinity, for sea water of the reference composition",
			Parameters: []law.Parameter{
				{
					Name: "absolute_salinity", Meaning: "mass of dissolved salt in a mass of sea water", Unit: "g/kg",
					Valid: law.Within(2.01, 42.19), Finite: law.Within(0, 100),
				},
				anomaly,
			},
			Result: law.Result{Unit: "1"}, Equation: saltEquation,
			Source: "Millero F.J., Feistel R., Wright D.G., McDougall T.J. (2008) The composition of standard seawater and the definition of the reference-composition salinity scale, Deep-Sea Research I 55, 50-72; " + teosManual,
			Examples: []law.Example{
				{Formula: "practical_salinity(35.16504[g/kg])", Gives: "35"},
			},
			Body: law.Of2(func(absolute, anomaly float64) float64 { return (absolute - anomaly) / saltPerPractical }),
		},
	}
	type property struct {
		name, gives, unit, equation string
		example                     law.Example
		salt                        law.Range
		hottest                     float64 // degC
		of                          func(g seaGibbs, temperature float64) float64
	}
	fresh, salty := law.Within(0, 120), law.Range{Low: 0, High: 120, HasLow: true, HasHigh: true, LowOpen: true}
	for _, p := range []property{
		{
			"sea_gibbs_energy", "specific Gibbs energy of sea water by TEOS-10", "J/kg", "",
			law.Example{Formula: "sea_gibbs_energy(0[g/kg], 313.15[K], 0[dbar])", Gives: "-11619.8898 J/kg"}, fresh, 80,
			func(g seaGibbs, _ float64) float64 { return g.value },
		},
		{
			"sea_water_density_gibbs", "density of sea water by TEOS-10 from the temperature in place", "kg/m^3", "rho = 1/(dg/dp); ",
			law.Example{Formula: "sea_water_density_gibbs(0[g/kg], 313.15[K], 0[dbar])", Gives: "992.216354 kg/m^3"}, fresh, 80,
			func(g seaGibbs, _ float64) float64 { return 1 / g.p },
		},
		{
			"sea_entropy", "specific entropy of sea water by TEOS-10", "J/(kg K)", "s = -dg/dT; ",
			law.Example{Formula: "sea_entropy(0[g/kg], 313.15[K], 0[dbar])", Gives: "572.365181 J/(kg K)"}, fresh, 80,
			func(g seaGibbs, _ float64) float64 { return -g.t },
		},
		{
			"sea_enthalpy", "specific enthalpy of sea water by TEOS-10", "J/kg", "h = g - T dg/dT; ",
			law.Example{Formula: "sea_enthalpy(0[g/kg], 273.15[K], 0[dbar])", Gives: "61.0136242 J/kg"}, fresh, 80,
			func(g seaGibbs, temperature float64) float64 { return g.value - float64(temperature*g.t) },
		},
		{
			"sea_heat_capacity_gibbs", "specific heat capacity of sea water at constant pressure by TEOS-10", "J/(kg K)", "c_p = -T d2g/dT2; ",
			law.Example{Formula: "sea_heat_capacity_gibbs(0[g/kg], 313.15[K], 0[dbar])", Gives: "4179.42416 J/(kg K)"}, fresh, 50,
			func(g seaGibbs, temperature float64) float64 { return -temperature * g.tt },
		},
		{
			"sea_sound_speed_gibbs", "speed of sound in sea water by TEOS-10", "m/s", "c = (dg/dp) sqrt[g_TT/(g_Tp^2 - g_TT g_pp)]; ",
			law.Example{Formula: "sea_sound_speed_gibbs(0[g/kg], 273.15[K], gauge(1e8[Pa], 1[atm]))", Gives: "1575.43089 m/s"}, fresh, 50,
			gibbsSoundSpeed,
		},
		{
			"sea_compressibility", "isothermal compressibility of sea water by TEOS-10", "1/GPa", "kappa_T = -(d2g/dp2)/(dg/dp); ",
			law.Example{Formula: "sea_compressibility(0[g/kg], 273.15[K], 0[dbar]) / sea_water_density_gibbs(0[g/kg], 273.15[K], 0[dbar])", Gives: "5.08915308e-13 m^3/(kg Pa)"}, fresh, 50,
			func(g seaGibbs, _ float64) float64 { return -g.pp / g.p },
		},
		{
			"sea_thermal_expansion", "coefficient of thermal expansion of sea water by TEOS-10, at constant salinity and pressure", "1/K", "alpha = (d2g/dTdp)/(dg/dp); ",
			law.Example{Formula: "sea_thermal_expansion(0[g/kg], 313.15[K], 0[dbar]) / sea_water_density_gibbs(0[g/kg], 313.15[K], 0[dbar])", Gives: "3.88499694e-7 m^3/(kg K)"}, fresh, 50,
			func(g seaGibbs, _ float64) float64 { return g.tp / g.p },
		},
		{
			"sea_haline_contraction", "relative increase of the density of sea water with absolute salinity by TEOS-10", "kg/g", "beta = -(d2g/dS_Adp)/(dg/dp); ",
			law.Example{Formula: "-sea_haline_contraction(35.16504[g/kg], 273.15[K], 0[dbar]) / sea_water_density_gibbs(35.16504[g/kg], 273.15[K], 0[dbar])", Gives: "-7.59615412e-7 m^3/g"}, salty, 80,
			func(g seaGibbs, _ float64) float64 { return -g.sp / g.p },
		},
		{
			"sea_chemical_potential", "chemical potential of the salt in sea water relative to that of the water, by TEOS-10", "J/g", "mu = dg/dS_A; ",
			law.Example{Formula: "sea_chemical_potential(100[g/kg], 353[K], 0[dbar])", Gives: "251.957276 J/g"}, salty, 80,
			func(g seaGibbs, _ float64) float64 { return g.s },
		},
	} {
		of := p.of
		laws = append(laws, &law.Law{
			Name: p.name, Group: "fluid", Gives: p.gives,
			Parameters: []law.Parameter{absoluteSalinityOf(p.salt), inPlace(p.hottest), teosPressure(10000)},
			Result:     law.Result{Unit: p.unit}, Equation: p.equation + gibbsFormula, Source: gibbsSource, Caution: teosCaution,
			Examples: []law.Example{p.example},
			Body: law.Of3(func(salinity, temperature, pressure float64) float64 {
				g := seaGibbsAt(salinity, temperature, pressure)
				return of(g, temperature)
			}),
		})
	}
	return laws
}

// saltPerPractical is the absolute salinity in kg/kg of a practical salinity of
// one, in water of the reference composition.
const saltPerPractical = 35.16504e-3 / 35

// gibbsSoundSpeed gives the speed of sound in m/s.
func gibbsSoundSpeed(g seaGibbs, _ float64) float64 {
	return g.p * math.Sqrt(g.tt/(float64(g.tp*g.tp)-float64(g.tt*g.pp)))
}

// conservativeHeat is the specific heat capacity in J/(kg K) by which potential
// enthalpy is divided to give conservative temperature, exact by definition.
const conservativeHeat = 3991.86795711963

// potentialEnthalpy gives the enthalpy in J/kg at the surface's pressure.
func potentialEnthalpy(g seaGibbs, temperature float64) float64 {
	return g.value - float64(temperature*g.t)
}

// temperatureOfEntropy gives the temperature in K at which sea water of a
// salinity has an entropy under a sea pressure in Pa. Newton's method: the
// start lies within 3 K of the answer, where entropy is nearly linear, and each
// step squares the error; four reach the last bit.
func temperatureOfEntropy(salinity, entropy, pressure, start float64) float64 {
	temperature := start
	for range 4 {
		g := seaGibbsAt(salinity, temperature, pressure)
		temperature -= (g.t + entropy) / g.tt
	}
	return temperature
}

// conservativeTemperature gives the conservative temperature on the scale of K
// from that in place: potential temperature by equal entropy, then its
// enthalpy.
func conservativeTemperature(salinity, temperature, pressure float64) float64 {
	g := seaGibbsAt(salinity, temperature, pressure)
	potential := temperatureOfEntropy(salinity, -g.t, 0, temperature)
	g = seaGibbsAt(salinity, potential, 0)
	return potentialEnthalpy(g, potential)/conservativeHeat + nature.IcePoint
}

// temperatureInPlace gives the temperature in place in K from the conservative
// one on the scale of K: the potential temperature by Newton's method on the
// enthalpy, then that of equal entropy. The start is within 2 K (5 K in warm
// fresh water).
func temperatureInPlace(salinity, conservative, pressure float64) float64 {
	potential := conservative
	enthalpy := float64(conservativeHeat * (conservative - nature.IcePoint))
	g := seaGibbsAt(salinity, potential, 0)
	for range 4 {
		// dh/dT = -T g_TT
		potential += float64(potentialEnthalpy(g, potential)-enthalpy) / float64(potential*g.tt)
		g = seaGibbsAt(salinity, potential, 0)
	}
	return temperatureOfEntropy(salinity, -g.t, pressure, potential)
}
