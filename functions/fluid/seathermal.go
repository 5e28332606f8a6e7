package fluid

import (
	"math"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// seaThermalLaws are those of heat, of freezing and of the temperature of water
// that sinks or rises in the sea.
func seaThermalLaws() []*law.Law {
	salinity := practicalSalinity(law.Within(0, 40), law.Within(0, 60))
	temperature := seaTemperature(law.Within(0, 40), law.Within(-5, 50))
	pressure := seaPressureAbove(law.Within(0, 10000), law.Within(-10.1325, 12000))
	potential := pressure
	potential.Name, potential.Meaning, potential.Default = "reference", "sea pressure to which the water is brought without exchange of heat", "0[dbar]"
	return []*law.Law{
		{
			Name: "sea_freezing_temperature", Group: "fluid",
			Gives: "temperature at which sea water freezes",
			Parameters: []law.Parameter{
				practicalSalinity(law.Within(4, 40), law.Within(0, 60)),
				seaPressureAbove(law.Within(0, 500), law.Within(0, 5000)),
				temperatureScale(),
			},
			Result:   law.Result{Unit: "degC"},
			Equation: "t_f = -0.0575 S + 1.710523e-3 S^1.5 - 2.154996e-4 S^2 - 7.53e-4 p; S practical_salinity, p sea_pressure in dbar, t_f in degC on IPTS-68",
			Source:   "Millero F.J. (1978) Freezing point of seawater, UNESCO Technical Papers in Marine Science 28, annex 6; " + unesco44Source,
			Caution:  "For water saturated with air; within 0.004 K.",
			Examples: []law.Example{
				{Formula: `sea_freezing_temperature(40, 500[dbar], scale: "IPTS-68")`, Gives: "-2.588567 degC"},
			},
			Body: seaFreezingBody,
		},
		{
			Name: "sea_heat_capacity", Group: "fluid",
			Gives:      "specific heat capacity of sea water at constant pressure",
			Parameters: []law.Parameter{salinity, temperature, pressure, temperatureScale()},
			Result:     law.Result{Unit: "J/(kg K)"},
			Equation:   "c_p = c(S, t, 0) + dc(0, t, p) + dc(S, t, p), polynomials in t (degC on IPTS-68), S, S^1.5 and p (bar); S practical_salinity, t temperature, p sea_pressure",
			Source:     "Millero F.J., Perron G., Desnoyers J.E. (1973) Heat capacity of seawater solutions from 5 degC to 35 degC and 0.5 to 22 per mille chlorinity, J. Geophys. Res. 78, 4499-4507; " + unesco44Source,
			Examples: []law.Example{
				{Formula: `sea_heat_capacity(35, 10[degC], 0[dbar], scale: "IPTS-68")`, Gives: "3986.3 J/(kg K)"},
			},
			Body: ofSea(seaHeatCapacity),
		},
		{
			Name: "sea_lapse_rate", Group: "fluid",
			Gives:      "change of temperature with pressure of sea water that exchanges no heat (adiabatic lapse rate)",
			Parameters: []law.Parameter{salinity, temperature, pressure, temperatureScale()},
			Result:     law.Result{Unit: "mK/dbar"},
			Equation:   "G = polynomial of 15 coefficients in t (degC on IPTS-68), S - 35 and p (dbar), in degC/dbar; S practical_salinity, t temperature, p sea_pressure",
			Source:     "Bryden H.L. (1973) New polynomials for thermal expansion, adiabatic temperature gradient and potential temperature of sea water, Deep-Sea Research 20, 401-408; " + unesco44Source,
			Examples: []law.Example{
				{Formula: `sea_lapse_rate(40, 40[degC], 10000[dbar], scale: "IPTS-68")`, Gives: "0.3255976 mK/dbar"},
			},
			Body: seaLapseRateBody,
		},
		{
			Name: "sea_potential_temperature", Group: "fluid",
			Gives:      "temperature that sea water takes on when brought to another pressure without exchange of heat",
			Parameters: []law.Parameter{salinity, temperature, pressure, potential, temperatureScale()},
			Result:     law.Result{Unit: "degC"},
			Equation:   "dt/dp = G(S, t, p), G sea_lapse_rate, integrated from sea_pressure to reference in one step of the fourth-order Runge-Kutta method as Gill wrote it",
			Source:     "Fofonoff N.P. (1977) Computation of potential temperature of seawater for an arbitrary reference pressure, Deep-Sea Research 24, 489-491; " + unesco44Source,
			Caution:    "The published scheme with one step: it differs from exact integration by up to 1e-4 K from 10000 dbar. Not Conservative Temperature.",
			Examples: []law.Example{
				{Formula: `sea_potential_temperature(40, 40[degC], 10000[dbar], scale: "IPTS-68")`, Gives: "36.89073 degC"},
			},
			Body: seaPotentialBody,
		},
	}
}

// seaFreezingBody takes practical salinity, sea pressure and the scale.
func seaFreezingBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	scale := scaleFactor(&arguments[2])
	for i := range dst {
		s, p := arguments[0].At(i), arguments[1].At(i)/pascalsPerDecibar
		t := float64((-0.0575+float64(1.710523e-3*math.Sqrt(s))-float64(2.154996e-4*s))*s) - float64(7.53e-4*p)
		dst[i] = t/scale + nature.IcePoint
	}
}

// seaHeatCapacity gives the specific heat capacity in J/(kg K) from practical
// salinity, temperature in degC on IPTS-68 and sea pressure in bar (UNESCO 44,
// section 6). A degree on IPTS-68 and one on ITS-90 are taken as equal, as the
// equation's own uncertainty is twice the difference.
func seaHeatCapacity(s, t, p float64) float64 {
	water0 := float64((float64((float64((float64(2.093236e-5*t)-2.654387e-3)*t)+0.1412855)*t)-3.720283)*t) + 4217.4
	water1 := float64((float64((float64((float64(1.7168e-8*t)+2.0357e-6)*t)-3.13885e-4)*t)+1.45747e-2)*t) - 0.49592
	water2 := float64((float64((float64((float64(2.2956e-11*t)-4.0027e-9)*t)+2.87533e-7)*t)-1.08645e-5)*t) + 2.4931e-4
	water3 := float64((float64((float64(6.136e-13*t)-6.5637e-11)*t)+2.6380e-9)*t) - 5.422e-8
	salt0 := float64((float64(-1.38385e-3*t)+0.1072763)*t) - 7.643575
	salt1 := float64((float64((float64((float64(-2.9179e-10*t)+2.5941e-8)*t)+9.802e-7)*t)-1.28315e-4)*t) + 4.9247e-3
	salt2 := float64((float64((float64(1.8448e-11*t)-2.3905e-9)*t)+1.17054e-7)*t) - 2.9558e-6
	salt3 := float64((float64(3.513e-13*t)-1.7682e-11)*t) + 5.540e-10
	root0 := float64((float64(5.148e-5*t)-4.07718e-3)*t) + 0.1770383
	root1 := float64((float64(3.122e-8*t)-1.517e-6)*t) - 1.2331e-4
	root2 := 9.971e-8
	root3 := float64(-1.4300e-12 * t)
	water := float64((float64((float64(water3*p)+water2)*p)+water1)*p) + water0
	salt := float64((float64((float64(salt3*p)+salt2)*p)+salt1)*p) + salt0
	root := float64((float64((float64(root3*p)+root2)*p)+root1)*p) + root0
	return float64((float64(root*math.Sqrt(s))+salt)*s) + water
}

// seaLapseRateBody takes practical salinity, temperature, sea pressure and the
// scale.
func seaLapseRateBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	scale := scaleFactor(&arguments[3])
	for i := range dst {
		t := float64((arguments[1].At(i) - nature.IcePoint) * scale)
		dst[i] = seaLapseRate(arguments[0].At(i), t, arguments[2].At(i)/pascalsPerDecibar) / (scale * pascalsPerDecibar)
	}
}

// seaPotentialBody takes practical salinity, temperature, sea pressure, the
// reference pressure and the scale.
func seaPotentialBody(dst []float64, arguments []law.Argument, _ *law.Work) {
	scale := scaleFactor(&arguments[4])
	for i := range dst {
		t := float64((arguments[1].At(i) - nature.IcePoint) * scale)
		from, to := arguments[2].At(i)/pascalsPerDecibar, arguments[3].At(i)/pascalsPerDecibar
		dst[i] = seaPotentialTemperature(arguments[0].At(i), t, from, to)/scale + nature.IcePoint
	}
}

// seaLapseRate gives the adiabatic lapse rate in degC/dbar from practical
// salinity, temperature in degC on IPTS-68 and sea pressure in dbar (UNESCO 44,
// section 7).
func seaLapseRate(s, t, p float64) float64 {
	water0 := float64((float64((float64(6.6228e-10*t)-6.836e-8)*t)+8.5258e-6)*t) + 3.5803e-5
	water1 := float64((float64((float64(-5.4481e-14*t)+8.733e-12)*t)-6.7795e-10)*t) + 1.8741e-8
	water2 := float64((float64(-2.1687e-16*t)+1.8676e-14)*t) - 4.6206e-13
	salt0 := float64(-4.2393e-8*t) + 1.8932e-6
	salt1 := float64(2.7759e-12*t) - 1.1351e-10
	salt := float64(salt1*p) + salt0
	return float64((float64((float64(water2*p)+water1)*p) + water0)) + float64(salt*(s-35))
}

// seaPotentialTemperature carries water of a practical salinity and a
// temperature in degC on IPTS-68 from one sea pressure to another in dbar
// (UNESCO 44, section 8): one step of Gill's form of the Runge-Kutta method
// with the constants as printed.
func seaPotentialTemperature(s, t, from, to float64) float64 {
	h := to - from
	middle := from + float64(h/2)
	k := float64(h * seaLapseRate(s, t, from))
	t += float64(k / 2)
	q := k
	k = float64(h * seaLapseRate(s, t, middle))
	t += float64(0.29289322 * (k - q))
	q = float64(0.58578644*k) + float64(0.121320344*q)
	k = float64(h * seaLapseRate(s, t, middle))
	t += float64(1.707106781 * (k - q))
	q = float64(3.414213562*k) - float64(4.121320344*q)
	k = float64(h * seaLapseRate(s, t, to))
	return t + (k-float64(2*q))/6
}
