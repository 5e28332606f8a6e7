package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// Names of the equations for saturated water that the laws know.
const (
	industrialEquation = "IAPWS-IF97"
	auxiliaryEquation  = "IAPWS SR1-86"
)

// auxiliaryRelease is the source of the compact equations of saturation.
const auxiliaryRelease = "IAPWS SR1-86(1992), Revised Supplementary Release on Saturation Properties of Ordinary Water Substance; Wagner W., Pruss A. (1993) J. Phys. Chem. Ref. Data 22, 783-787"

// The critical point of water (IAPWS R2-83(1992)).
const (
	criticalTemperature = 647.096  // K
	criticalPressure    = 22.064e6 // Pa
	criticalDensity     = 322.0    // kg/m^3
)

// saturationLaws are those of water and steam in equilibrium.
func saturationLaws() []*law.Law {
	saturated := law.Parameter{
		Name: "temperature", Meaning: "temperature of both phases on ITS-90", Unit: "K",
		// Supercooled water, down to where it freezes by itself, has a vapour
		// pressure that the equations carry on to.
		Valid: law.Within(273.15, criticalTemperature), Finite: law.Within(235, criticalTemperature),
	}
	return []*law.Law{
		{
			Name: "water_saturation_pressure", Group: "fluid",
			Gives: "vapour pressure of liquid water: the absolute pressure at which it boils",
			Parameters: []law.Parameter{
				saturated,
				{
					Name: "equation", Meaning: "which equation: the industrial one, or the auxiliary one that goes with saturated densities", Type: law.Text,
					Default: `"` + industrialEquation + `"`, Choices: []string{industrialEquation, auxiliaryEquation},
				},
			},
			Result:   law.Result{Unit: "kPa(a)"},
			Equation: "IAPWS-IF97: p = 1 MPa [2 C/(-B + sqrt(B^2 - 4 A C))]^4, A = th^2 + n1 th + n2, B = n3 th^2 + n4 th + n5, C = n6 th^2 + n7 th + n8, th = T/K + n9/(T/K - n10); IAPWS SR1-86: ln(p/p_c) = (T_c/T)(a1 x + a2 x^1.5 + a3 x^3 + a4 x^3.5 + a5 x^4 + a6 x^7.5), x = 1 - T/T_c, T_c = 647.096 K, p_c = 22.064 MPa",
			Source:   industrialFormulation + ", section 8.1; " + auxiliaryRelease,
			Caution:  "Over liquid water, pure and without air: over ice below 0 degC the pressure is lower, see ice_saturation_pressure. " + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "water_saturation_pressure(300[K])", Gives: "3.53658941 kPa"},
				{Formula: `water_saturation_pressure(273.16[K], equation: "IAPWS SR1-86")`, Gives: "611.657 Pa"},
			},
			Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
				of := saturationPressure
				if arguments[1].Text == auxiliaryEquation {
					of = auxiliaryPressure
				}
				for i := range dst {
					dst[i] = of(arguments[0].At(i))
				}
			},
		},
		{
			Name: "water_boiling_temperature", Group: "fluid",
			Gives: "boiling temperature of water: the temperature at which its vapour has the pressure",
			Parameters: []law.Parameter{{
				Name: "pressure", Meaning: "absolute pressure over the water", Unit: "Pa(a)",
				Valid: law.Within(611.213, criticalPressure), Finite: law.Within(15, criticalPressure),
			}},
			Result:   law.Result{Unit: "K"},
			Equation: "T = 1 K [n10 + D - sqrt((n10 + D)^2 - 4 (n9 + n10 D))]/2, D = 2 G/(-F - sqrt(F^2 - 4 E G)), E = b^2 + n3 b + n6, F = n1 b^2 + n4 b + n7, G = n2 b^2 + n5 b + n8, b = (p/1 MPa)^0.25",
			Source:   industrialFormulation + ", section 8.2",
			Caution:  "Of pure water in equilibrium with its vapour. Clean vessels superheat; dissolved salt raises it by 0.5 K per 30 g/kg. " + law.CautionPressure,
			Examples: []law.Example{
				{Formula: "water_boiling_temperature(10[MPa])", Gives: "584.149488 K"},
			},
			Body: law.Of1(boilingTemperature),
		},
		{
			Name: "steam_boundary_pressure", Group: "fluid",
			Gives: "pressure on the boundary of steam with the region around the critical point",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: "temperature on ITS-90", Unit: "K",
				Valid: law.Within(623.15, 863.15), Finite: law.Within(623.15, 863.15),
			}},
			Result:   law.Result{Unit: "MPa(a)"},
			Equation: "p = 1 MPa (n1 + n2 T/K + n3 (T/K)^2); n1 = 348.05185628969, n2 = -1.1671859879975, n3 = 1.0192970039326e-3",
			Source:   industrialFormulation + ", section 4, eq. 5",
			Caution:  "A line drawn through the equations of state, not a change of phase.",
			Examples: []law.Example{
				{Formula: "steam_boundary_pressure(623.15[K])", Gives: "16.5291643 MPa"},
			},
			Body: law.Of1(boundaryPressure),
		},
		{
			Name: "saturated_water_density", Group: "fluid",
			Gives: "density of liquid water in equilibrium with its vapour",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: saturated.Meaning, Unit: "K",
				Valid: law.Within(273.16, criticalTemperature), Finite: saturated.Finite,
			}},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "rho/rho_c = 1 + b1 x^(1/3) + b2 x^(2/3) + b3 x^(5/3) + b4 x^(16/3) + b5 x^(43/3) + b6 x^(110/3), x = 1 - T/T_c, T_c = 647.096 K, rho_c = 322 kg/m^3",
			Source:   auxiliaryRelease,
			Examples: []law.Example{
				{Formula: "saturated_water_density(647.096[K])", Gives: "322 kg/m^3"},
			},
			Body: law.Of1(saturatedWaterDensity),
		},
		{
			Name: "saturated_steam_density", Group: "fluid",
			Gives: "density of steam in equilibrium with liquid water",
			Parameters: []law.Parameter{{
				Name: "temperature", Meaning: saturated.Meaning, Unit: "K",
				Valid: law.Within(273.16, criticalTemperature), Finite: saturated.Finite,
			}},
			Result:   law.Result{Unit: "kg/m^3"},
			Equation: "ln(rho/rho_c) = c1 x^(2/6) + c2 x^(4/6) + c3 x^(8/6) + c4 x^(18/6) + c5 x^(37/6) + c6 x^(71/6), x = 1 - T/T_c, T_c = 647.096 K, rho_c = 322 kg/m^3",
			Source:   auxiliaryRelease,
			Examples: []law.Example{
				{Formula: "saturated_steam_density(373.1243[K])", Gives: "0.597586 kg/m^3"},
			},
			Body: law.Of1(saturatedSteamDensity),
		},
	}
}

// Coefficients of region 4 (IAPWS R7-97(2012), table 34).
const (
	saturation1  = 0.11670521452767e4
	saturation2  = -0.72421316703206e6
	saturation3  = -0.17073846940092e2
	saturation4  = 0.12020824702470e5
	saturation5  = -0.32325550322333e7
	saturation6  = 0.14915108613530e2
	saturation7  = -0.48232657361591e4
	saturation8  = 0.40511340542057e6
	saturation9  = -0.23855557567849
	saturation10 = 0.65017534844798e3
)

// saturationPressure gives the vapour pressure of water in Pa at a temperature
// in K (eq. 30).
func saturationPressure(temperature float64) float64 {
	th := temperature + saturation9/(temperature-saturation10)
	a := float64((th+saturation1)*th) + saturation2
	b := float64((float64(saturation3*th)+saturation4)*th) + saturation5
	c := float64((float64(saturation6*th)+saturation7)*th) + saturation8
	root := 2 * c / (math.Sqrt(float64(b*b)-float64(4*a*c)) - b)
	square := root * root
	return square * square * 1e6
}

// boilingTemperature gives the temperature in K at which water has a vapour
// pressure in Pa (eq. 31).
func boilingTemperature(pressure float64) float64 {
	b := math.Sqrt(math.Sqrt(pressure * 1e-6))
	e := float64((b+saturation3)*b) + saturation6
	f := float64((float64(saturation1*b)+saturation4)*b) + saturation7
	g := float64((float64(saturation2*b)+saturation5)*b) + saturation8
	root := math.Sqrt(float64(f*f) - float64(4*e*g))
	// Two forms of one root: each adds numbers of one sign.
	d := -2 * g / (f + root)
	if f < 0 {
		d = (root - f) / (2 * e)
	}
	sum, difference := saturation10+d, saturation10-d
	// (n10 + D)^2 - 4 (n9 + n10 D) = (n10 - D)^2 - 4 n9, without cancellation.
	return 0.5 * (sum - math.Sqrt(float64(difference*difference)-4*saturation9))
}

// boundaryPressure gives the pressure in Pa on the boundary of regions 2 and 3
// at a temperature in K (eq. 5).
func boundaryPressure(temperature float64) float64 {
	return 1e6 * (float64((float64(0.10192970039326e-2*temperature)-0.11671859879975e1)*temperature) + 0.34805185628969e3)
}

// auxiliaryPressure gives the vapour pressure of water in Pa at a temperature
// in K by the compact equation.
func auxiliaryPressure(temperature float64) float64 {
	x := 1 - temperature/criticalTemperature
	root := math.Sqrt(x)
	x3 := x * x * x
	sum := float64(-7.85951783*x) + float64(1.84408259*x*root) + float64(-11.7866497*x3) +
		float64(22.6807411*x3*root) + float64(-15.9618719*x3*x) + float64(1.80122502*x3*x3*x*root)
	return criticalPressure * column.Exp(float64(criticalTemperature/temperature*sum))
}

// saturatedWaterDensity gives the density of boiling water in kg/m^3 at a
// temperature in K.
func saturatedWaterDensity(temperature float64) float64 {
	x := column.Cbrt(1 - temperature/criticalTemperature)
	x2 := x * x
	x16 := whole(x, 16)
	sum := float64(1.99274064*x) + float64(1.09965342*x2) + float64(-0.510839303*x2*x2*x) +
		float64(-1.75493479*x16) + float64(-45.5170352*x16*x16*whole(x, 11)) + float64(-6.74694450e5*whole(x, 110))
	return criticalDensity * (1 + sum)
}

// saturatedSteamDensity gives the density of steam over boiling water in
// kg/m^3 at a temperature in K.
func saturatedSteamDensity(temperature float64) float64 {
	x := column.Cbrt(1 - temperature/criticalTemperature)
	root := math.Sqrt(x)
	x2 := x * x
	sum := float64(-2.03150240*x) + float64(-2.68302940*x2) + float64(-5.38626492*x2*x2) +
		float64(-17.2991605*whole(x, 9)) + float64(-44.7586581*whole(x, 18)*root) + float64(-63.9201063*whole(x, 35)*root)
	return criticalDensity * column.Exp(sum)
}

// whole gives x^n for a whole n above 0, by squaring.
func whole(x float64, n int) float64 {
	power := 1.0
	for ; n > 0; n >>= 1 {
		if n&1 == 1 {
			power *= x
		}
		x *= x
	}
	return power
}
