package fluid

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/functions/nature"
)

// This file holds the Gibbs function of sea water: liquid water by IAPWS-09 and
// the saline part by IAPWS-08. Every property follows from its derivatives.

// salinityScale is the absolute salinity in kg/kg at which x is 1: 40 times
// that of a practical salinity of one.
const salinityScale = 40 * 35.16504e-3 / 35

// Reducing quantities: y = t/(40 degC), z = p/(10^8 Pa).
const (
	gibbsTemperature = 40.0
	gibbsPressure    = 1e8
)

// gibbsTerm is n X_i y^j z^k, X_1 = x^2 ln x, X_i = x^i, X_0 = 1.
type gibbsTerm struct {
	i, j, k uint8
	n       float64
}

// seaGibbs is the Gibbs energy of sea water in J/kg and its derivatives by
// temperature in K (t), pressure in Pa (p) and absolute salinity in kg/kg (s).
type seaGibbs struct {
	value, t, p, tt, tp, pp, s, sp float64
}

// seaGibbsAt gives the Gibbs function at an absolute salinity in kg/kg, a
// temperature in K and a sea pressure in Pa.
func seaGibbsAt(salinity, temperature, pressure float64) seaGibbs {
	var ofY, ofZ [8]float64
	y, z := (temperature-nature.IcePoint)/gibbsTemperature, pressure/gibbsPressure
	ofY[0], ofZ[0] = 1, 1
	for i := 1; i < len(ofY); i++ {
		ofY[i], ofZ[i] = ofY[i-1]*y, ofZ[i-1]*z
	}
	// ofX is X_i, slopeX its derivative by x^2: that by salinity times the
	// scale, finite for every term but the first in water without salt.
	var ofX, slopeX [8]float64
	ofX[0] = 1
	if salinity > 0 {
		square := salinity / salinityScale
		x := math.Sqrt(square)
		log := float64(0.5 * column.Ln(square))
		ofX[1], slopeX[1] = square*log, log+0.5
		power := 1.0
		for i := 2; i < len(ofX); i++ {
			slopeX[i] = float64(i) / 2 * power
			power *= x
			ofX[i] = power * x
		}
	}
	var g seaGibbs
	g.add(pureTerms[:], &ofX, &slopeX, &ofY, &ofZ)
	if salinity > 0 {
		g.add(salineTerms[:], &ofX, &slopeX, &ofY, &ofZ)
	}
	g.t /= gibbsTemperature
	g.tt /= gibbsTemperature * gibbsTemperature
	g.tp /= gibbsTemperature * gibbsPressure
	g.p /= gibbsPressure
	g.pp /= gibbsPressure * gibbsPressure
	g.s /= salinityScale
	g.sp /= salinityScale * gibbsPressure
	return g
}

// add adds terms and their derivatives by y, z and x^2.
func (g *seaGibbs) add(terms []gibbsTerm, ofX, slopeX, ofY, ofZ *[8]float64) {
	for index := range terms {
		term := &terms[index]
		j, k := float64(term.j), float64(term.k)
		// A derivative that is zero reads a power that does not exist: its
		// index is held at zero.
		x, slope := term.n*ofX[term.i&7], term.n*slopeX[term.i&7]
		y0 := ofY[term.j&7]
		y1 := j * ofY[max(int(term.j)-1, 0)&7]
		y2 := float64(j*(j-1)) * ofY[max(int(term.j)-2, 0)&7]
		z0 := ofZ[term.k&7]
		z1 := k * ofZ[max(int(term.k)-1, 0)&7]
		z2 := float64(k*(k-1)) * ofZ[max(int(term.k)-2, 0)&7]
		g.value += float64(x * y0 * z0)
		g.t += float64(x * y1 * z0)
		g.tt += float64(x * y2 * z0)
		g.p += float64(x * y0 * z1)
		g.pp += float64(x * y0 * z2)
		g.tp += float64(x * y1 * z1)
		g.s += float64(slope * y0 * z0)
		g.sp += float64(slope * y0 * z1)
	}
}

// pureTerms are those of liquid water (IAPWS SR7-09, table 1) in J/kg.
var pureTerms = [...]gibbsTerm{
	{0, 0, 0, 0.101342743139674e3}, {0, 0, 1, 0.100015695367145e6}, {0, 0, 2, -0.254457654203630e4},
	{0, 0, 3, 0.284517778446287e3}, {0, 0, 4, -0.333146754253611e2}, {0, 0, 5, 0.420263108803084e1},
	{0, 0, 6, -0.546428511471039}, {0, 1, 0, 0.590578347909402e1}, {0, 1, 1, -0.270983805184062e3},
	{0, 1, 2, 0.776153611613101e3}, {0, 1, 3, -0.196512550881220e3}, {0, 1, 4, 0.289796526294175e2},
	{0, 1, 5, -0.213290083518327e1}, {0, 2, 0, -0.123577859330390e5}, {0, 2, 1, 0.145503645404680e4},
	{0, 2, 2, -0.756558385769359e3}, {0, 2, 3, 0.273479662323528e3}, {0, 2, 4, -0.555604063817218e2},
	{0, 2, 5, 0.434420671917197e1}, {0, 3, 0, 0.736741204151612e3}, {0, 3, 1, -0.672507783145070e3},
	{0, 3, 2, 0.499360390819152e3}, {0, 3, 3, -0.239545330654412e3}, {0, 3, 4, 0.488012518593872e2},
	{0, 3, 5, -0.166307106208905e1}, {0, 4, 0, -0.148185936433658e3}, {0, 4, 1, 0.397968445406972e3},
	{0, 4, 2, -0.301815380621876e3}, {0, 4, 3, 0.152196371733841e3}, {0, 4, 4, -0.263748377232802e2},
	{0, 5, 0, 0.580259125842571e2}, {0, 5, 1, -0.194618310617595e3}, {0, 5, 2, 0.120520654902025e3},
	{0, 5, 3, -0.552723052340152e2}, {0, 5, 4, 0.648190668077221e1}, {0, 6, 0, -0.189843846514172e2},
	{0, 6, 1, 0.635113936641785e2}, {0, 6, 2, -0.222897317140459e2}, {0, 6, 3, 0.817060541818112e1},
	{0, 7, 0, 0.305081646487967e1}, {0, 7, 1, -0.963108119393062e1},
}

// salineTerms are those of the salt (IAPWS R13-08, table 2) in J/kg.
var salineTerms = [...]gibbsTerm{
	{1, 0, 0, 5812.81456626732}, {1, 1, 0, 851.226734946706}, {2, 0, 0, 1416.27648484197},
	{3, 0, 0, -2432.14662381794}, {4, 0, 0, 2025.80115603697}, {5, 0, 0, -1091.66841042967},
	{6, 0, 0, 374.601237877840}, {7, 0, 0, -48.5891069025409}, {2, 1, 0, 168.072408311545},
	{3, 1, 0, -493.407510141682}, {4, 1, 0, 543.835333000098}, {5, 1, 0, -196.028306689776},
	{6, 1, 0, 36.7571622995805}, {2, 2, 0, 880.031352997204}, {3, 2, 0, -43.0664675978042},
	{4, 2, 0, -68.5572509204491}, {2, 3, 0, -225.267649263401}, {3, 3, 0, -10.0227370861875},
	{4, 3, 0, 49.3667694856254}, {2, 4, 0, 91.4260447751259}, {3, 4, 0, 0.875600661808945},
	{4, 4, 0, -17.1397577419788}, {2, 5, 0, -21.6603240875311}, {4, 5, 0, 2.49697009569508},
	{2, 6, 0, 2.13016970847183}, {2, 0, 1, -3310.49154044839}, {3, 0, 1, 199.459603073901},
	{4, 0, 1, -54.7919133532887}, {5, 0, 1, 36.0284195611086}, {2, 1, 1, 729.116529735046},
	{3, 1, 1, -175.292041186547}, {4, 1, 1, -22.6683558512829}, {2, 2, 1, -860.764303783977},
	{3, 2, 1, 383.058066002476}, {2, 3, 1, 694.244814133268}, {3, 3, 1, -460.319931801257},
	{2, 4, 1, -297.728741987187}, {3, 4, 1, 234.565187611355}, {2, 0, 2, 384.794152978599},
	{3, 0, 2, -52.2940909281335}, {4, 0, 2, -4.08193978912261}, {2, 1, 2, -343.956902961561},
	{3, 1, 2, 83.1923927801819}, {2, 2, 2, 337.409530269367}, {3, 2, 2, -54.1917262517112},
	{2, 3, 2, -204.889641964903}, {2, 4, 2, 74.7261411387560}, {2, 0, 3, -96.5324320107458},
	{3, 0, 3, 68.0444942726459}, {4, 0, 3, -30.1755111971161}, {2, 1, 3, 124.687671116248},
	{3, 1, 3, -29.4830643494290}, {2, 2, 3, -178.314556207638}, {3, 2, 3, 25.6398487389914},
	{2, 3, 3, 113.561697840594}, {2, 4, 3, -36.4872919001588}, {2, 0, 4, 15.8408172766824},
	{3, 0, 4, -3.41251932441282}, {2, 1, 4, -31.6569643860730}, {2, 2, 4, 44.2040358308000},
	{2, 3, 4, -11.1282734326413}, {2, 0, 5, -2.62480156590992}, {2, 1, 5, 7.04658803315449},
	{2, 2, 5, -7.92001547211682},
}
