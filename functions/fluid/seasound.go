package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// seaSoundLaws are those of sound in the sea.
func seaSoundLaws() []*law.Law {
	return []*law.Law{{
		Name: "sea_sound_speed", Group: "fluid",
		Gives: "speed of sound in sea water",
		Parameters: []law.Parameter{
			practicalSalinity(law.Within(0, 40), law.Within(0, 60)),
			seaTemperature(law.Within(0, 40), law.Within(-5, 50)),
			seaPressureAbove(law.Within(0, 10000), law.Within(-10.1325, 12000)),
			temperatureScale(),
		},
		Result:   law.Result{Unit: "m/s"},
		Equation: "c = C(t, p) + A(t, p) S + B(t, p) S^1.5 + D(p) S^2; S practical_salinity, t temperature in degC on IPTS-68, p sea_pressure in bar; C, A, B, D polynomials of 19, 17, 4 and 2 coefficients",
		Source:   "Chen C.-T., Millero F.J. (1977) Speed of sound in seawater at high pressures, J. Acoust. Soc. Am. 62, 1129-1135; " + unesco44Source,
		Caution:  "Standard deviation 0.19 m/s; under high pressure in cold water it lies up to 0.9 m/s above sea_sound_speed_gibbs, which rests on later measurements.",
		Examples: []law.Example{
			{Formula: `sea_sound_speed(40, 40[degC], 10000[dbar], scale: "IPTS-68")`, Gives: "1731.995 m/s"},
			{Formula: `sea_sound_speed(35, 10[degC], 2000[dbar], scale: "IPTS-68")`, Gives: "1523.0 m/s"},
		},
		Body: ofSea(seaSoundSpeed),
	}}
}

// seaSoundSpeed gives the speed of sound in m/s from practical salinity,
// temperature in degC on IPTS-68 and sea pressure in bar (UNESCO 44, section 9).
func seaSoundSpeed(s, t, p float64) float64 {
	water0 := float64((float64((float64((float64((float64(3.1464e-9*t)-1.47800e-6)*t)+3.3420e-4)*t)-5.80852e-2)*t)+5.03711)*t) + 1402.388
	water1 := float64((float64((float64((float64(-6.1185e-10*t)+1.3621e-7)*t)-8.1788e-6)*t)+6.8982e-4)*t) + 0.153563
	water2 := float64((float64((float64((float64(1.0405e-12*t)-2.5335e-10)*t)+2.5974e-8)*t)-1.7107e-6)*t) + 3.1260e-5
	water3 := float64((float64(-2.3643e-12*t)+3.8504e-10)*t) - 9.7729e-9
	salt0 := float64((float64((float64((float64(-3.21e-8*t)+2.006e-6)*t)+7.164e-5)*t)-1.262e-2)*t) + 1.389
	salt1 := float64((float64((float64((float64(-2.0122e-10*t)+1.0507e-8)*t)-6.4885e-8)*t)-1.2580e-5)*t) + 9.4742e-5
	salt2 := float64((float64((float64(7.988e-12*t)-1.6002e-10)*t)+9.1041e-9)*t) - 3.9064e-7
	salt3 := float64((float64(-3.389e-13*t)+6.649e-12)*t) + 1.100e-10
	root0 := float64(-4.42e-5*t) - 1.922e-2
	root1 := float64(1.7945e-7*t) + 7.3637e-5
	water := float64((float64((float64(water3*p)+water2)*p)+water1)*p) + water0
	salt := float64((float64((float64(salt3*p)+salt2)*p)+salt1)*p) + salt0
	root := float64(root1*p) + root0
	square := float64(-7.9836e-6*p) + 1.727e-3
	return float64((float64(square*s)+float64(root*math.Sqrt(s))+salt)*s) + water
}
