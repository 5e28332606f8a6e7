package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// waterLaws are those of flow and surface of water and of its ice.
func waterLaws() []*law.Law {
	return []*law.Law{
		{
			Name: "water_viscosity", Group: "fluid",
			Gives: "dynamic viscosity of water and steam from temperature and density",
			Parameters: []law.Parameter{
				{
					Name: "temperature", Meaning: "temperature on ITS-90", Unit: "K",
					Valid: law.Within(273.15, 1173.15), Finite: law.Within(253.15, 1300),
				},
				{
					Name: "density", Meaning: "density of the water or steam, as from water_density or steam_density", Unit: "kg/m^3",
					Valid: law.Within(0, 1200), Finite: law.Within(0, 1300),
				},
			},
			Result:   law.Result{Unit: "uPa s"},
			Equation: "mu = 1 uPa s mu0 mu1; mu0 = 100 sqrt(Tr)/sum of H_i/Tr^i, i = 0..3; mu1 = exp[r sum over i = 0..5 of (1/Tr - 1)^i sum over j = 0..6 of H_ij (r - 1)^j]; Tr = T/647.096 K, r = rho/(322 kg/m^3)",
			Source:   "IAPWS R12-08, Release on the IAPWS Formulation 2008 for the Viscosity of Ordinary Water Substance (2008)",
			Caution:  "Without the critical enhancement, which matters within a few kelvin of the critical point only. About 1 % for liquid water at ordinary pressures.",
			Examples: []law.Example{
				{Formula: "water_viscosity(298.15[K], 998[kg/m^3])", Gives: "889.735100 uPa s"},
				{Formula: "water_viscosity(873.15[K], 100[kg/m^3])", Gives: "35.802262 uPa s"},
			},
			Body: law.Of2(waterViscosity),
		},
		{
			Name: "water_surface_tension", Group: "fluid",
			Gives: "surface tension of water against its vapour",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: "temperature on ITS-90", Unit: "K",
				// The release finds the equation in accord with measurements of
				// supercooled water down to -25 degC.
				Valid: law.Within(273.16, criticalTemperature), Finite: law.Within(248.15, criticalTemperature),
			}},
			Result:   law.Result{Unit: "mN/m"},
			Equation: "sigma = 235.8 mN/m x^1.256 (1 - 0.625 x), x = 1 - T/647.096 K",
			Source:   "IAPWS R1-76(2014), Revised Release on Surface Tension of Ordinary Water Substance",
			Caution:  "Clean water: traces of soap or oil halve it. About 0.5 % below 100 degC.",
			Examples: []law.Example{
				{Formula: "water_surface_tension(300[K])", Gives: "71.6859625 mN/m"},
			},
			Body: law.Of1(waterSurfaceTension),
		},
		{
			Name: "ice_saturation_pressure", Group: "fluid",
			Gives: "vapour pressure of ice: the absolute pressure at which it sublimates",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: "temperature of the ice on ITS-90", Unit: "K",
				Valid: law.Within(50, triplePointTemperature), Finite: law.Within(20, triplePointTemperature),
			}},
			Result:   law.Result{Unit: "Pa(a)"},
			Equation: "ln(p/p_t) = (1/th)(a1 th^b1 + a2 th^b2 + a3 th^b3), th = T/273.16 K, p_t = 611.657 Pa, a = -21.2144006, 27.3203819, -6.10598130, b = 0.00333333333, 1.20666667, 1.70333333",
			Source:   iceRelease,
			Examples: []law.Example{
				{Formula: "ice_saturation_pressure(230[K])", Gives: "8.94735 Pa"},
				{Formula: "ice_saturation_pressure(273.16[K])", Gives: "611.657 Pa"},
			},
			Body: law.Of1(icePressure),
		},
		{
			Name: "ice_melting_pressure", Group: "fluid",
			Gives: "absolute pressure under which ice (Ih) melts",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: "temperature of the ice on ITS-90; below 251.165 K it turns into ice III first", Unit: "K",
				Valid: law.Within(251.165, triplePointTemperature), Finite: law.Within(251.165, triplePointTemperature),
			}},
			Result:   law.Result{Unit: "MPa(a)"},
			Equation: "p/p_t = 1 + sum of a_i (1 - th^b_i), th = T/273.16 K, p_t = 611.657 Pa, a = 1195393.37, 80818.3159, 3338.26860, b = 3, 25.75, 103.75",
			Source:   iceRelease,
			Caution:  "Water that freezes in a closed vessel builds up this pressure. " + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "ice_melting_pressure(260[K])", Gives: "138.268 MPa"},
			},
			Body: law.Of1(meltingPressure),
		},
		{
			Name: "kell_water_density", Group: "fluid",
			Gives: "density of pure, air-free water at 101325 Pa up to 150 degC",
			Parameters: []law.Parameter{
				{
					Name: "temperature", Meaning: "temperature on the scale told; above 100 degC the liquid under one atmosphere is superheated", Unit: "degC",
					Valid: law.Within(0, 150), Finite: law.Within(-20, 180),
				},
				{
					Name: "scale", Meaning: "temperature scale: the equation of 1975 on IPTS-68, or as fitted again to ITS-90 in 1992", Type: law.Text,
					Default: `"` + scaleITS90 + `"`, Choices: []string{scaleITS90, scaleIPTS68},
				},
			},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "rho = (n0 + n1 t + n2 t^2 + n3 t^3 + n4 t^4 + n5 t^5)/(1 + d1 t); t temperature in degC; IPTS-68: n = 999.83952, 16.945176, -7.9870401e-3, -46.170461e-6, 105.56302e-9, -280.54253e-12, d1 = 16.879850e-3; ITS-90: n = 999.83952, 16.952577, -7.9905127e-3, -46.241757e-6, 105.84601e-9, -281.03006e-12, d1 = 16.887236e-3",
			Source:   "Kell G.S. (1975) Density, thermal expansivity, and compressibility of liquid water from 0 degC to 150 degC, J. Chem. Eng. Data 20, 97-105; Spieweck F., Bettin H. (1992) Review: Solid and liquid density determination, tm - Technisches Messen 59, 285-292",
			Caution:  "Relative uncertainty about 1e-5; below 40 degC fresh_water_density is ten times better and 0.004 kg/m^3 higher at 25 degC.",
			Examples: []law.Example{
				{Formula: `kell_water_density(100[degC], scale: "IPTS-68")`, Gives: "958.3637 kg/m^3"},
				{Formula: `kell_water_density(25[degC], scale: "IPTS-68")`, Gives: "997.0449 kg/m^3"},
			},
			Body: kellBody,
		},
	}
}

// viscosityTerms are H_ij of R12-08, table 2: a row for each power of 1/Tr - 1.
var viscosityTerms = [6][7]float64{
	{5.20094e-1, 2.22531e-1, -2.81378e-1, 1.61913e-1, -3.25372e-2, 0, 0},
	{8.50895e-2, 9.99115e-1, -9.06851e-1, 2.57399e-1, 0, 0, 0},
	{-1.08374, 1.88797, -7.72479e-1, 0, 0, 0, 0},
	{-2.89555e-1, 1.26613, -4.89837e-1, 0, 6.98452e-2, 0, -4.35673e-3},
	{0, 0, -2.57040e-1, 0, 0, 8.72102e-3, 0},
	{0, 1.20573e-1, 0, 0, 0, 0, -5.93264e-4},
}

// waterViscosity gives the dynamic viscosity in Pa s from temperature in K and
// density in kg/m^3 (R12-08, eqs. 10 to 12).
func waterViscosity(temperature, density float64) float64 {
	tr := temperature / criticalTemperature
	inverse := 1 / tr
	dilute := 100 * math.Sqrt(tr) / (float64((float64((float64(-0.241605*inverse)+0.6366564)*inverse)+2.20462)*inverse) + 1.67752)

	r := density / criticalDensity
	x, y := inverse-1, r-1
	sum := 0.0
	for i := len(viscosityTerms) - 1; i >= 0; i-- {
		h := &viscosityTerms[i]
		row := h[6]
		for j := 5; j >= 0; j-- {
			row = float64(row*y) + h[j]
		}
		sum = float64(sum*x) + row
	}
	return 1e-6 * dilute * column.Exp(float64(r*sum))
}

// waterSurfaceTension gives the surface tension in N/m at a temperature in K.
func waterSurfaceTension(temperature float64) float64 {
	x := 1 - temperature/criticalTemperature
	return 0.2358 * column.Pow(x, 1.256) * (1 - float64(0.625*x))
}

// iceRelease is the source of the laws of ice.
const iceRelease = "IAPWS R14-08(2011), Revised Release on the Pressure along the Melting and Sublimation Curves of Ordinary Water Substance; Wagner W., Riethmann T., Feistel R., Harvey A.H. (2011) J. Phys. Chem. Ref. Data 40, 043103"

// The triple point of water, where the laws of ice begin.
const (
	triplePointTemperature = 273.16  // K
	triplePointPressure    = 611.657 // Pa
)

// icePressure gives the vapour pressure of ice in Pa at a temperature in K
// (R14-08, eq. 6).
func icePressure(temperature float64) float64 {
	th := temperature / triplePointTemperature
	log := column.Ln(th)
	power := func(a, b float64) float64 { return float64(a * column.Exp(float64(b*log))) }
	sum := power(-0.212144006e2, 0.333333333e-2) + power(0.273203819e2, 0.120666667e1) + power(-0.610598130e1, 0.170333333e1)
	return triplePointPressure * column.Exp(sum/th)
}

// meltingPressure gives the melting pressure of ice in Pa at a temperature in K
// (R14-08, eq. 1).
func meltingPressure(temperature float64) float64 {
	log := column.Ln(temperature / triplePointTemperature)
	fall := func(a, b float64) float64 { return float64(-a * column.Expm1(float64(b*log))) }
	return triplePointPressure * (1 + fall(0.119539337e7, 0.300000e1) + fall(0.808183159e5, 0.257500e2) + fall(0.333826860e4, 0.103750e3))
}

// kellBody takes temperature and the name of its scale.
func kellBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	of := kellDensity90
	if arguments[1].Text == scaleIPTS68 {
		of = kellDensity68
	}
	for i := range dst {
		dst[i] = of(arguments[0].At(i) - nature.IcePoint)
	}
}

// kellDensity68 gives the density in kg/m^3 at degrees Celsius on IPTS-68.
func kellDensity68(t float64) float64 {
	return (float64((float64((float64((float64((float64(-280.54253e-12*t)+105.56302e-9)*t)-46.170461e-6)*t)-7.9870401e-3)*t)+16.945176)*t) + 999.83952) /
		(1 + float64(16.879850e-3*t))
}

// kellDensity90 gives the density in kg/m^3 at degrees Celsius on ITS-90.
func kellDensity90(t float64) float64 {
	return (float64((float64((float64((float64((float64(-281.03006e-12*t)+105.84601e-9)*t)-46.241757e-6)*t)-7.9905127e-3)*t)+16.952577)*t) + 999.83952) /
		(1 + float64(16.887236e-3*t))
}
