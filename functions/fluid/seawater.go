package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// Names of the temperature scales that sea-water laws take.
const (
	scaleITS90  = "ITS-90"
	scaleIPTS68 = "IPTS-68"
)

// its90ToIPTS68 turns a Celsius temperature on ITS-90 into one on IPTS-68 in
// the oceanic range (Saunders P.M. (1990) The International Temperature Scale
// of 1990, ITS-90, WOCE Newsletter 10).
const its90ToIPTS68 = 1.00024

// barsPerPascal turns pressures into the unit of the UNESCO equations.
const barsPerPascal = 1e-5

// seaWaterLaws are those of sea water by the equations of 1980.
func seaWaterLaws() []*law.Law {
	return []*law.Law{{
		Name:  "sea_water_density",
		Group: "fluid",
		Gives: "density of sea water by the international equation of state EOS-80",
		Parameters: []law.Parameter{
			// The finite ranges are where the polynomials still rise with salinity
			// and pressure as sea water does: from vacuum to nearly twice the
			// pressure of the deepest trench.
			practicalSalinity(law.Within(0, 42), law.Within(0, 80)),
			seaTemperature(law.Within(-2, 40), law.Within(-10, 60)),
			seaPressureAbove(law.Within(0, 10000), law.Within(-10.1325, 20000)),
			temperatureScale(),
		},
		Result:   law.Result{Unit: "kg/m^3"},
		Equation: "rho = rho0(S, t)/(1 - p/K(S, t, p)); S practical_salinity, t temperature in degC on IPTS-68, p sea_pressure in bar, rho0 density at one atmosphere, K secant bulk modulus, both polynomials in t, S, sqrt(S) and p",
		Source:   "Millero F.J., Poisson A. (1981) International one-atmosphere equation of state of seawater, Deep-Sea Research 28A, 625-629; " + unesco44Source,
		Caution:  "Practical salinity is not absolute salinity (35 against 35.165 g/kg), and sea pressure is no absolute pressure.",
		Examples: []law.Example{
			{Formula: `sea_water_density(35, 5[degC], 1000[bar], scale: "IPTS-68")`, Gives: "1069.48914 kg/m^3"},
			{Formula: `sea_water_density(0, 25[degC], 1000[bar], scale: "IPTS-68")`, Gives: "1037.90204 kg/m^3"},
		},
		Body: seaWaterDensityBody,
	}}
}

// seaWaterDensityBody is sea_water_density over rows: a loop without a call,
// which in the module costs as much as a fifth of the polynomials.
func seaWaterDensityBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	seaWaterDensities(dst, arguments[0].Values, arguments[1].Values, arguments[2].Values, nature.IcePoint, scaleFactor(&arguments[3]), barsPerPascal)
}

// seaWaterDensity gives the density of sea water in kg/m^3 from the practical
// salinity, the temperature in degC on IPTS-68 and the sea pressure in bar.
func seaWaterDensity(s, t, p float64) float64 {
	var dst [1]float64
	row := [3]float64{s, t, p}
	seaWaterDensities(dst[:], row[0:1], row[1:2], row[2:3], 0, 1, 1)
	return dst[0]
}

// seaWaterDensities sets dst to the densities of sea water in kg/m^3:
// EOS-80 as printed in UNESCO 44, section 3. Temperatures less zero, times
// degree, are in degC on IPTS-68; pressures times bar are in bar. Every
// polynomial is in Horner's form, in t for each power of the salinity.
func seaWaterDensities(dst, salinities, temperatures, pressures []float64, zero, degree, bar float64) {
	salinityStep, temperatureStep, pressureStep := column.Stride(salinities), column.Stride(temperatures), column.Stride(pressures)
	for i := range dst {
		s := salinities[i*salinityStep]
		t := float64((temperatures[i*temperatureStep] - zero) * degree)
		p := float64(pressures[i*pressureStep] * bar)
		root := math.Sqrt(s)

		// Density at one atmosphere (eqs. 13 and 14), kg/m^3.
		water := float64((float64((float64((float64((float64(6.536332e-9*t)-1.120083e-6)*t)+1.001685e-4)*t)-9.095290e-3)*t)+6.793952e-2)*t) + 999.842594
		salt := float64((float64((float64((float64(5.3875e-9*t)-8.2467e-7)*t)+7.6438e-5)*t)-4.0899e-3)*t) + 8.24493e-1
		saltRoot := float64((float64(-1.6546e-6*t)+1.0227e-4)*t) - 5.72466e-3
		surface := float64((float64(4.8314e-4*s)+float64(saltRoot*root)+salt)*s) + water

		// Secant bulk modulus (eqs. 15 to 19), bar.
		stiffness := float64((float64((float64((float64(-5.155288e-5*t)+1.360477e-2)*t)-2.327105)*t)+148.4206)*t) + 19652.21
		stiffnessSalt := float64((float64((float64(-6.1670e-5*t)+1.09987e-2)*t)-0.603459)*t) + 54.6746
		stiffnessRoot := float64((float64(-5.3009e-4*t)+1.6483e-2)*t) + 7.944e-2
		linear := float64((float64((float64(-5.77905e-7*t)+1.16092e-4)*t)+1.43713e-3)*t) + 3.239908
		linearSalt := float64((float64(-1.6078e-6*t)-1.0981e-5)*t) + 2.2838e-3
		square := float64((float64(5.2787e-8*t)-6.12293e-6)*t) + 8.50935e-5
		squareSalt := float64((float64(9.1697e-10*t)+2.0816e-8)*t) - 9.9348e-7
		modulus := float64((float64(stiffnessRoot*root)+stiffnessSalt)*s) + stiffness +
			float64((float64((float64(squareSalt*s)+square)*p)+
				float64((float64(1.91075e-4*root)+linearSalt)*s)+linear)*p)

		// 1/(1 - p/K) = 1 + p/(K - p): one division, and exact at the surface.
		dst[i] = surface + float64(surface*(p/(modulus-p)))
	}
}
