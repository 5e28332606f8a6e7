package main

import (
	"math"
	"sort"
)

// handWater is the density of liquid water after region 1 of IAPWS-IF97 by
// hand, with the test that the water is liquid; K and Pa.
func handWater(dst, temperature, pressure []float64) {
	for i := range dst {
		kelvin, pascals := temperature[i], pressure[i]
		th := kelvin - 0.23855557567849/(kelvin-650.17534844798)
		a := th*th + 1167.0521452767*th - 724213.16703206
		b := -17.073846940092*th*th + 12020.824702470*th - 3232555.0322333
		c := 14.915108613530*th*th - 4823.2657361591*th + 405113.40542057
		root := 2 * c / (-b + math.Sqrt(b*b-4*a*c))
		if pascals < root*root*root*root*1e6 {
			dst[i] = math.NaN()
			continue
		}
		x, y := 7.1-pascals/16.53e6, 1386/kelvin-1.222
		z := 1 / y
		x2, y2, z2 := x*x, y*y, z*z
		x4, y3, z4 := x2*x2, y2*y, z2*z2
		x16, y6, z5, z6, z8 := x4*x4*x4*x4, y3*y3, z4*z, z4*z2, z4*z4
		y10 := y6 * y3 * y
		r := x * z
		sum := 0.28319080123804e-3*z8*z - 0.60706301565874e-3*z5*z2 - 0.18990068218419e-1*z - 0.32529748770505e-1 - 0.21841717171414e-1*y - 0.52838357969930e-4*y3 +
			2*x*(-0.47184321073267e-3*z2*z-0.30001780793026e-3+0.47661393906987e-4*y-0.44141845330846e-5*y3-0.72694996297594e-15*y10*y6*y) +
			3*x2*(-0.31679644845054e-4*z4-0.28270797985312e-5-0.85205128120103e-9*y6) +
			4*x2*x*(-0.22425281908000e-5*z5-0.65171222895601e-6*z2-0.14341729937924e-12*y10) -
			5*0.40516996860117e-6*x4*z8 +
			8*x4*x2*x*(-0.12734301741641e-8*z6*z5-0.17424871230634e-9*z6) +
			x16*x4*z8*z8*z8*z5*(-21*0.68762131295531e-18+x2*z2*(23*0.14478307828521e-19+x4*x2*z5*z2*(29*0.26335781662795e-22+r*(-30*0.11947622640071e-22+r*(31*0.18228094581404e-23-32*0.93537087292458e-25*r)))))
		dst[i] = -16.53e6 / (461.526 * kelvin * sum)
	}
}

// handMoistAir is the density of moist air after CIPM-2007 by hand; Pa, K and
// relative humidity.
func handMoistAir(dst, pressure, temperature, humidity []float64) {
	for i := range dst {
		p, kelvin, h := pressure[i], temperature[i], humidity[i]
		t := kelvin - 273.15
		saturated := math.Exp(1.2378847e-5*kelvin*kelvin - 1.9121316e-2*kelvin + 33.93711047 - 6.3431645e3/kelvin)
		xv := h * (1.00062 + 3.14e-8*p + 5.6e-7*t*t) * saturated / p
		q := p / kelvin
		z := 1 - q*(1.58123e-6-2.9331e-8*t+1.1043e-10*t*t+(5.707e-6-2.051e-8*t)*xv+(1.9898e-4-2.376e-6*t)*xv*xv) + q*q*(1.83e-11-0.765e-8*xv*xv)
		const ma = 28.96546e-3
		dst[i] = q * ma / (z * 8.314472) * (1 - xv*(1-18.01528e-3/ma))
	}
}

// handTable interpolates the logarithm of a density in a table of rising
// heights, as one does above 86 km by hand.
func handTable(dst, height, heights, logarithms []float64) {
	for i, h := range height {
		j := max(1, min(sort.SearchFloat64s(heights, h), len(heights)-1))
		f := (h - heights[j-1]) / (heights[j] - heights[j-1])
		dst[i] = math.Exp(logarithms[j-1] + f*(logarithms[j]-logarithms[j-1]))
	}
}

// handProfile is the pressure in a profile of piecewise linear temperature by
// hand, with the levels' pressures made once.
func handProfile(dst, height, heights, temperatures []float64, base float64) {
	const gmr = 9.80665 * 0.0289644 / 8.314462618
	pressures := make([]float64, len(heights))
	pressures[0] = base
	above := func(i int, h float64) float64 {
		lapse := (temperatures[i+1] - temperatures[i]) / (heights[i+1] - heights[i])
		if lapse == 0 {
			return pressures[i] * math.Exp(-gmr*(h-heights[i])/temperatures[i])
		}
		return pressures[i] * math.Pow(1+lapse*(h-heights[i])/temperatures[i], -gmr/lapse)
	}
	for i := 1; i < len(heights); i++ {
		pressures[i] = above(i-1, heights[i])
	}
	for i, h := range height {
		j := sort.SearchFloat64s(heights, h)
		dst[i] = above(max(0, min(j-1, len(heights)-2)), h)
	}
}

// handRotor is the partition sum of a vibrating rotor by hand: the levels are
// listed once, from v = 0, J = 0, while they rise and stay bound; cm^-1.
func handRotor(dst, temperature []float64) {
	const we, wexe, be, alpha, d0 = 2169.81358, 13.28831, 1.93128087, 0.01750441, 11.09 * 8065.543937
	const de = 4 * be * be * be / (we * we)
	vibration := func(v float64) float64 { return we*(v+0.5) - wexe*(v+0.5)*(v+0.5) }
	var energies, weights []float64
	rest := -1.0
	for v := 0.0; ; v++ {
		g := vibration(v) - vibration(0)
		if g <= rest || g > d0 {
			break
		}
		rest = g
		last := -1.0
		for j := 0.0; ; j++ {
			x := j * (j + 1)
			f := (be-alpha*(v+0.5))*x - de*x*x
			if f <= last || g+f > d0 {
				break
			}
			last = f
			energies, weights = append(energies, g+f), append(weights, 2*j+1)
		}
	}
	for i, t := range temperature {
		sum := 0.0
		for k := range energies {
			sum += weights[k] * math.Exp(-1.438776877*energies[k]/t)
		}
		dst[i] = sum
	}
}
