package fluid

import "math"

// seaSpecificVolume gives the specific volume of sea water in m^3/kg from
// absolute salinity in g/kg, conservative temperature in degC and sea pressure
// in dbar: the polynomial of 75 terms of Roquet et al. 2015, for each power of
// the pressure and the temperature one in x = sqrt((S_A + 24 g/kg)/40.19 g/kg).
func seaSpecificVolume(salinity, temperature, pressure float64) float64 {
	x := math.Sqrt(float64(0.0248826675584615*salinity) + 0.5971840214030754)
	y, z := temperature*0.025, pressure*1e-4
	c00 := float64((float64((float64((float64((float64((float64(3.1932457305e-5*x)-2.1092370507e-4)*x)+5.8086069943e-4)*x)-8.5047933937e-4)*x)+6.6928067038e-4)*x)-3.1038981976e-4)*x) + 1.0769995862e-3
	c10 := float64((float64((float64((float64((float64(1.3864594581e-6*x)-1.1959409788e-5)*x)+3.4532461828e-5)*x)-4.3592678561e-5)*x)+3.5009599764e-5)*x) - 1.5649734675e-5
	c20 := float64((float64((float64((float64(3.8595339244e-6*x)-1.8698584187e-5)*x)+3.5907822760e-5)*x)-3.7435842344e-5)*x) + 2.7762106484e-5
	c30 := float64((float64((float64(2.2863324556e-6*x)-1.4353633048e-5)*x)+2.4141479483e-5)*x) - 1.6521159259e-5
	c40 := float64((float64(4.3703680598e-6*x)-8.7595873154e-6)*x) + 6.9111322702e-6
	c50 := float64(-3.3052758900e-7*x) - 8.0539615540e-7
	v0 := float64((float64((float64((float64((float64((float64(2.0543094268e-7*y)+c50)*y)+c40)*y)+c30)*y)+c20)*y)+c10)*y) + c00
	c01 := float64((float64((float64((float64((float64(3.0927427253e-6*x)-1.7322218612e-5)*x)+3.7470777305e-5)*x)-3.4792460974e-5)*x)+2.4262468747e-5)*x) - 6.0799143809e-5
	c11 := float64((float64((float64((float64(2.5909225260e-6*x)-9.8447117844e-6)*x)+1.1100834765e-5)*x)-9.5677088156e-6)*x) + 1.8505765429e-5
	c21 := float64((float64((float64(-4.8826139200e-7*x)+2.9283346295e-6)*x)-2.3678308361e-7)*x) - 1.1716606853e-5
	c31 := float64((float64(3.1655306078e-7*x)-3.4558773655e-6)*x) + 7.9279656173e-6
	c41 := float64(1.2956717783e-6*x) - 3.4102187482e-6
	v1 := float64((float64((float64((float64((float64(5.0736766814e-7*y)+c41)*y)+c31)*y)+c21)*y)+c11)*y) + c01
	c02 := float64((float64((float64((float64(-1.7811974727e-6*x)+4.9263106998e-6)*x)-4.8122251597e-6)*x)-5.8484432984e-7)*x) + 9.9856169219e-6
	c12 := float64((float64((float64(-1.3544185627e-6*x)+5.4620748834e-6)*x)-5.5699154557e-6)*x) - 1.1736386731e-6
	c22 := float64((float64(-6.5731104067e-7*x)+3.9137387080e-7)*x) + 2.1305028740e-6
	c32 := float64(7.7618888092e-9*x) - 4.6132540037e-7
	v2 := float64((float64((float64((float64(-6.3352916514e-8*y)+c32)*y)+c22)*y)+c12)*y) + c02
	c03 := float64((float64(1.6746303780e-8*x)+3.6310188515e-7)*x) - 1.1309361437e-6
	c13 := float64(-2.7295696237e-7*x) - 3.6527006553e-7
	v3 := float64((float64(2.8695905159e-7*y)+c13)*y) + c03
	c04 := float64(-1.1147125423e-7*x) + 1.0531153080e-7
	v4 := float64(3.1454099902e-7*y) + c04

	return float64((float64((float64((float64((float64((float64(1.9613503930e-9*z)-1.2647261286e-8)*z)+v4)*z)+v3)*z)+v2)*z)+v1)*z) + v0
}

// standardVolume holds the same polynomial for the standard ocean, S_A =
// 35.16504 g/kg at a conservative temperature of 0 degC: coefficients in m^3/kg
// of the powers of sea pressure in 10^8 Pa.
var standardVolume = [7]float64{
	9.72661385484387198e-4,
	-4.50591321116092948e-5,
	7.13072896592712648e-6,
	-6.65717947976831057e-7,
	-2.99405444723288200e-8,
	-1.26472612860000000e-8,
	1.96135039300000000e-9,
}
