package main

import (
	"math"
)

// handAtmosphere is the density of the U.S. Standard Atmosphere 1976 by hand,
// for geopotential metres below 71 km.
func handAtmosphere(dst, h []float64) {
	const g, m, r = 9.80665, 28.9644, 8314.32
	base := []float64{0, 11000, 20000, 32000, 47000, 51000, 71000}
	temperature := []float64{288.15, 216.65, 216.65, 228.65, 270.65, 270.65, 214.65}
	lapse := []float64{-0.0065, 0, 0.001, 0.0028, 0, -0.0028, -0.002}
	pressure := []float64{101325, 22632.06, 5474.889, 868.0187, 110.9063, 66.93887, 3.956420}
	for i, z := range h {
		b := 0
		for b < 6 && z >= base[b+1] {
			b++
		}
		t := temperature[b] + lapse[b]*(z-base[b])
		var p float64
		if lapse[b] == 0 {
			p = pressure[b] * math.Exp(-g*m*(z-base[b])/(r*t))
		} else {
			p = pressure[b] * math.Pow(temperature[b]/t, g*m/(r*lapse[b]))
		}
		dst[i] = p * m / (r * t)
	}
}

// handSeaWater is the density of sea water after UNESCO 1983 by hand; p in Pa,
// t in K, on the ITS-90.
func handSeaWater(dst, salinity, temperature, pressure []float64) {
	for i := range dst {
		s, t, p := salinity[i], 1.00024*(temperature[i]-273.15), pressure[i]*1e-5
		root := s * math.Sqrt(s)
		rho := 999.842594 + t*(6.793952e-2+t*(-9.095290e-3+t*(1.001685e-4+t*(-1.120083e-6+t*6.536332e-9))))
		rho += s*(8.24493e-1+t*(-4.0899e-3+t*(7.6438e-5+t*(-8.2467e-7+t*5.3875e-9)))) + root*(-5.72466e-3+t*(1.0227e-4-t*1.6546e-6)) + 4.8314e-4*s*s
		k := 19652.21 + t*(148.4206+t*(-2.327105+t*(1.360477e-2-t*5.155288e-5)))
		k += s*(54.6746+t*(-0.603459+t*(1.09987e-2-t*6.1670e-5))) + root*(7.944e-2+t*(1.6483e-2-t*5.3009e-4))
		a := 3.239908 + t*(1.43713e-3+t*(1.16092e-4-t*5.77905e-7)) + s*(2.2838e-3+t*(-1.0981e-5-t*1.6078e-6)) + root*1.91075e-4
		b := 8.50935e-5 + t*(-6.12293e-6+t*5.2787e-8) + s*(-9.9348e-7+t*(2.0816e-8+t*9.1697e-10))
		dst[i] = rho / (1 - p/(k+p*(a+p*b)))
	}
}

// handOccupancy is the share of level 7 of forty by hand.
func handOccupancy(dst, temperature []float64) {
	var energy, weight [40]float64
	for j := range energy {
		energy[j], weight[j] = 50*float64(j), float64(2*j+1)
	}
	const c2 = 1.438776877 // cm K, CODATA 2022
	for i, t := range temperature {
		sum := 0.0
		for j := range energy {
			sum += weight[j] * math.Exp(-c2*energy[j]/t)
		}
		dst[i] = weight[7] * math.Exp(-c2*energy[7]/t) / sum
	}
}

const fortyLevels = `
known T [K] = 300
derive share = occupancy(ladder([0, 50, 100, 150, 200, 250, 300, 350, 400, 450, 500, 550, 600, 650, 700, 750, 800, 850, 900, 950,
  1000, 1050, 1100, 1150, 1200, 1250, 1300, 1350, 1400, 1450, 1500, 1550, 1600, 1650, 1700, 1750, 1800, 1850, 1900, 1950][cm^-1],
  [1, 3, 5, 7, 9, 11, 13, 15, 17, 19, 21, 23, 25, 27, 29, 31, 33, 35, 37, 39,
  41, 43, 45, 47, 49, 51, 53, 55, 57, 59, 61, 63, 65, 67, 69, 71, 73, 75, 77, 79]), 7, T)
`

func lawLines(b *bench) ([]line, error) {
	n := b.rows
	dst := make([]float64, n)
	h := ramp(n, 0, 70_000)
	atmosphere, err := run(native(1), "known h [gpm] = 0\nderive rho [kg/m^3] = standard_density(h)", n, h)
	if err != nil {
		return nil, err
	}
	s, t, p := ramp(n, 30, 40), ramp(n, 273.15, 303.15), ramp(n, 0, 1e8)
	sea, err := run(native(1), "known s [1] = 35\nknown t [degC] = 5\nknown p [dbar] = 0\nderive rho [kg/m^3] = sea_water_density(s, t, p)", n, s, t, p)
	if err != nil {
		return nil, err
	}
	few := n / 16
	temperature := ramp(few, 200, 2000)
	levels, err := run(native(1), fortyLevels, few, temperature)
	if err != nil {
		return nil, err
	}
	return []line{
		{"standard_density, native, 1 core / hand function", 0.9, 0.5, atmosphere, func() { handAtmosphere(dst, h) }},
		{"sea_water_density, native, 1 core / hand function", 1.1, 0.8, sea, func() { handSeaWater(dst, s, t, p) }},
		{"occupancy of 1 of 40 levels, native / hand loop (1/16 of the rows)", 0.8, 0.5, levels, func() { handOccupancy(dst[:few], temperature) }},
	}, nil
}
