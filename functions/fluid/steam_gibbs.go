package fluid

// This file holds the basic equations of regions 1 (liquid) and 2 (steam) of
// IAPWS-IF97: the Gibbs energy, divided by R T, as a sum of powers of the
// reduced pressure and the inverse reduced temperature. Every property follows
// from its derivatives.

// steamGasConstant is the specific gas constant of IAPWS-IF97 in J/(kg K).
const steamGasConstant = 461.526

// Reducing quantities (IAPWS R7-97(2012), sections 5.1 and 6.1), in Pa and K.
const (
	liquidPressure    = 16.53e6
	liquidTemperature = 1386.0
	steamPressure     = 1e6
	steamTemperature  = 540.0
)

// powerTerm is n a^i b^j.
type powerTerm struct {
	i, j int
	n    float64
}

// reducedGibbs is a reduced Gibbs energy and its derivatives by the reduced
// pressure (p) and the inverse reduced temperature (t).
type reducedGibbs struct {
	value, p, pp, t, tt, pt float64
}

// Powers that the terms and their derivatives need: of a from 0 on, of b from
// lowestPower on.
const (
	lowestPower = -43
	powersOfA   = 33
	powersOfB   = 59 - lowestPower
)

// add adds terms n a^i b^j and their derivatives by a and b.
func (g *reducedGibbs) add(terms []powerTerm, a, b float64, lowest int) {
	var ofA [powersOfA]float64
	var ofB [powersOfB]float64
	ofA[0] = 1
	for i := 1; i < len(ofA); i++ {
		ofA[i] = ofA[i-1] * a
	}
	ofB[-lowestPower] = 1
	for j := 1 - lowestPower; j < len(ofB); j++ {
		ofB[j] = ofB[j-1] * b
	}
	if lowest < 0 {
		inverse := 1 / b
		for j := -1 - lowestPower; j >= lowest-lowestPower; j-- {
			ofB[j] = ofB[j+1] * inverse
		}
	}
	for k := range terms {
		term := &terms[k]
		i, j := float64(term.i), float64(term.j)
		// A derivative that is zero reads a power that may not exist: its
		// index is held at the lowest one there is.
		a0 := term.n * ofA[term.i]
		a1 := i * term.n * ofA[max(term.i-1, 0)]
		a2 := float64(i*(i-1)) * term.n * ofA[max(term.i-2, 0)]
		b0 := ofB[term.j-lowestPower]
		b1 := j * ofB[max(term.j-1, lowest)-lowestPower]
		b2 := float64(j*(j-1)) * ofB[max(term.j-2, lowest)-lowestPower]
		g.value += float64(a0 * b0)
		g.p += float64(a1 * b0)
		g.pp += float64(a2 * b0)
		g.t += float64(a0 * b1)
		g.tt += float64(a0 * b2)
		g.pt += float64(a1 * b1)
	}
}

// liquidGibbs gives the reduced Gibbs energy of region 1 (eq. 7) from
// temperature in K and pressure in Pa.
func liquidGibbs(temperature, pressure float64) reducedGibbs {
	var g reducedGibbs
	g.add(liquidTerms[:], 7.1-pressure/liquidPressure, liquidTemperature/temperature-1.222, -43)
	// The variable is 7.1 - pi.
	g.p, g.pt = -g.p, -g.pt
	return g
}

// steamGibbs gives the reduced Gibbs energy of region 2 (eqs. 15 to 17) but
// for the ideal part's ln(pi), which steamEntropy alone needs.
func steamGibbs(temperature, pressure float64) reducedGibbs {
	var g reducedGibbs
	pi, tau := pressure/steamPressure, steamTemperature/temperature
	g.add(steamIdealTerms[:], 1, tau, -7)
	g.p, g.pp, g.pt = 1/pi, -1/float64(pi*pi), 0
	g.add(steamTerms[:], pi, tau-0.5, 0)
	return g
}

// liquidTerms are those of region 1 (table 2), in powers of 7.1 - pi and tau - 1.222.
var liquidTerms = [...]powerTerm{
	{0, -2, 0.14632971213167}, {0, -1, -0.84548187169114}, {0, 0, -0.37563603672040e1},
	{0, 1, 0.33855169168385e1}, {0, 2, -0.95791963387872}, {0, 3, 0.15772038513228},
	{0, 4, -0.16616417199501e-1}, {0, 5, 0.81214629983568e-3}, {1, -9, 0.28319080123804e-3},
	{1, -7, -0.60706301565874e-3}, {1, -1, -0.18990068218419e-1}, {1, 0, -0.32529748770505e-1},
	{1, 1, -0.21841717175414e-1}, {1, 3, -0.52838357969930e-4}, {2, -3, -0.47184321073267e-3},
	{2, 0, -0.30001780793026e-3}, {2, 1, 0.47661393906987e-4}, {2, 3, -0.44141845330846e-5},
	{2, 17, -0.72694996297594e-15}, {3, -4, -0.31679644845054e-4}, {3, 0, -0.28270797985312e-5},
	{3, 6, -0.85205128120103e-9}, {4, -5, -0.22425281908000e-5}, {4, -2, -0.65171222895601e-6},
	{4, 10, -0.14341729937924e-12}, {5, -8, -0.40516996860117e-6}, {8, -11, -0.12734301741641e-8},
	{8, -6, -0.17424871230634e-9}, {21, -29, -0.68762131295531e-18}, {23, -31, 0.14478307828521e-19},
	{29, -38, 0.26335781662795e-22}, {30, -39, -0.11947622640071e-22}, {31, -40, 0.18228094581404e-23},
	{32, -41, -0.93537087292458e-25},
}

// steamIdealTerms are those of region 2's ideal part (table 10), in powers of tau.
var steamIdealTerms = [...]powerTerm{
	{0, 0, -0.96927686500217e1}, {0, 1, 0.10086655968018e2}, {0, -5, -0.56087911283020e-2},
	{0, -4, 0.71452738081455e-1}, {0, -3, -0.40710498223928}, {0, -2, 0.14240819171444e1},
	{0, -1, -0.43839511319450e1}, {0, 2, -0.28408632460772}, {0, 3, 0.21268463753307e-1},
}

// steamTerms are those of region 2's residual part (table 11), in powers of pi and tau - 0.5.
var steamTerms = [...]powerTerm{
	{1, 0, -0.17731742473213e-2}, {1, 1, -0.17834862292358e-1}, {1, 2, -0.45996013696365e-1},
	{1, 3, -0.57581259083432e-1}, {1, 6, -0.50325278727930e-1}, {2, 1, -0.33032641670203e-4},
	{2, 2, -0.18948987516315e-3}, {2, 4, -0.39392777243355e-2}, {2, 7, -0.43797295650573e-1},
	{2, 36, -0.26674547914087e-4}, {3, 0, 0.20481737692309e-7}, {3, 1, 0.43870667284435e-6},
	{3, 3, -0.32277677238570e-4}, {3, 6, -0.15033924542148e-2}, {3, 35, -0.40668253562649e-1},
	{4, 1, -0.78847309559367e-9}, {4, 2, 0.12790717852285e-7}, {4, 3, 0.48225372718507e-6},
	{5, 7, 0.22922076337661e-5}, {6, 3, -0.16714766451061e-10}, {6, 16, -0.21171472321355e-2},
	{6, 35, -0.23895741934104e2}, {7, 0, -0.59059564324270e-17}, {7, 11, -0.12621808899101e-5},
	{7, 25, -0.38946842435739e-1}, {8, 8, 0.11256211360459e-10}, {8, 36, -0.82311340897998e1},
	{9, 13, 0.19809712802088e-7}, {10, 4, 0.10406965210174e-18}, {10, 10, -0.10234747095929e-12},
	{10, 14, -0.10018179379511e-8}, {16, 29, -0.80882908646985e-10}, {16, 50, 0.10693031879409},
	{18, 57, -0.33662250574171}, {20, 20, 0.89185845355421e-24}, {20, 35, 0.30629316876232e-12},
	{20, 48, -0.42002467698208e-5}, {21, 21, -0.59056029685639e-25}, {22, 53, 0.37826947613457e-5},
	{23, 39, -0.12768608934681e-14}, {24, 26, 0.73087610595061e-28}, {24, 40, 0.55414715350778e-16},
	{24, 58, -0.94369707241210e-6},
}

// liquidDensity gives the density of region 1 in kg/m^3 from temperature in K
// and pressure in Pa: rho = p*/(R T dgamma/dpi), the terms of eq. 7 gathered by
// powers of a = 7.1 - pi. It is what liquidGibbs gives, written out for speed.
func liquidDensity(temperature, pressure float64) float64 {
	a := 7.1 - pressure/liquidPressure
	b := liquidTemperature/temperature - 1.222
	c := 1 / b
	a2 := a * a
	a4 := a2 * a2
	a8 := a4 * a4
	a16 := a8 * a8
	b2 := b * b
	b3 := b2 * b
	b6 := b3 * b3
	b10 := b6 * b3 * b
	b17 := b10 * b6 * b
	c2 := c * c
	c3 := c2 * c
	c4 := c2 * c2
	c5 := c4 * c
	c6 := c3 * c3
	c8 := c4 * c4
	c9 := c5 * c4
	c29 := c8 * c8 * c8 * c5
	ratio := a * c

	slope := float64(0.28319080123804e-3*c9) + float64(-0.60706301565874e-3*(c5*c2)) + float64(-0.18990068218419e-1*c) - 0.32529748770505e-1 + float64(-0.21841717175414e-1*b) + float64(-0.52838357969930e-4*b3) +
		float64(2*a*(float64(-0.47184321073267e-3*c3)-0.30001780793026e-3+float64(0.47661393906987e-4*b)+float64(-0.44141845330846e-5*b3)+float64(-0.72694996297594e-15*b17))) +
		float64(3*a2*(float64(-0.31679644845054e-4*c4)-0.28270797985312e-5+float64(-0.85205128120103e-9*b6))) +
		float64(4*(a2*a)*(float64(-0.22425281908000e-5*c5)+float64(-0.65171222895601e-6*c2)+float64(-0.14341729937924e-12*b10))) +
		float64(5*-0.40516996860117e-6*(a4*c8)) +
		float64(8*(a4*a2*a)*(float64(-0.12734301741641e-8*(c6*c5))+float64(-0.17424871230634e-9*c6))) +
		float64(a16*a4*c29*(21*-0.68762131295531e-18+float64(a2*c2*(23*0.14478307828521e-19+
			float64(a4*a2*(c5*c2)*(29*0.26335781662795e-22+float64(ratio*(30*-0.11947622640071e-22+float64(ratio*(31*0.18228094581404e-23+float64(32*-0.93537087292458e-25*ratio)))))))))))
	return -liquidPressure / (steamGasConstant * temperature * slope)
}
