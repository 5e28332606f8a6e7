package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// gammaOf gives the gamma function for 0 < x <= 60 (Lanczos C. (1964) SIAM J.
// Numer. Anal. 1, 86, with the coefficients of Godfrey for g = 607/128), between
// 1 and 2, and by its recurrence elsewhere.
func gammaOf(x float64) float64 {
	factor := 1.0
	for x > 2 {
		x--
		factor *= x
	}
	if x < 1 {
		factor /= x
		x++
	}
	if x == 1.5 {
		return factor * (math.Sqrt(math.Pi) / 2)
	}
	const g = 607.0 / 128
	coefficients := [...]float64{
		57.156235665862923517, -59.597960355475491248, 14.136097974741747174, -0.49191381609762019978,
		.33994649984811888699e-4, .46523628927048575665e-4, -.98374475304879564677e-4, .15808870322491248884e-3,
		-.21026444172410488319e-3, .21743961811521264320e-3, -.16431810653676389022e-3, .84418223983852743293e-4,
		-.26190838401581408670e-4, .36899182659531622704e-5,
	}
	sum := 0.99999999999999709182
	for i, c := range coefficients {
		sum += c / (x + float64(i))
	}
	base := x + g - 0.5
	return float64(float64(factor*math.Sqrt(2*math.Pi)) * float64(sum*float64(column.Pow(base, x-0.5)*column.Exp(-base))))
}

// fermiIntegral gives F_j(x) = 1/gamma(j + 1) times the integral of
// t^j/(exp(t - x) + 1) over t > 0, for j from -1 to 50.
func fermiIntegral(order, x float64) float64 {
	switch {
	case order == -1:
		return fermiOf(-x)
	case !(order > -1 && order <= 50) || !column.Finite(x):
		return notANumber
	case order == 0:
		if x > 0 {
			return x + column.Log1p(column.Exp(-x))
		}
		return column.Log1p(column.Exp(x))
	case x <= 0:
		return fermiSeries(order, x)
	case x >= 40+float64(order*order):
		return fermiSommerfeld(order, x)
	}
	return fermiQuadrature(order, x)
}

// fermiSeries sums the alternating series of exp(n x)/n^(j + 1), x <= 0, whose
// terms are moments of a positive measure, by the algorithm 1 of Cohen H.,
// Rodriguez Villegas F., Zagier D. (2000) Exp. Math. 9, 3: with 26 terms its
// error is below 5.8^-26 = 1e-20 of the sum.
func fermiSeries(order, x float64) float64 {
	const n = 26
	d := 1.0
	root := 3 + math.Sqrt(8)
	for range n {
		d *= root
	}
	d = (d + 1/d) / 2
	b, c, sum := -1.0, -d, 0.0
	first := column.Exp(x)
	for k := 0.0; k < n; k++ {
		c = b - c
		// exp(x) is taken out, so that nothing underflows before it must.
		sum += float64(c * float64(column.Exp(float64(k*x))/column.Pow(k+1, order+1)))
		b *= float64((k+n)*(k-n)) / float64((k+0.5)*(k+1))
	}
	return float64(first * (sum / d))
}

// fermiSommerfeld uses the expansion of Sommerfeld A. (1928) Z. Phys. 47, 1:
// x^(j+1)/gamma(j + 2) (1 + sum of 2 eta(2k) (j + 1) j ... (j + 2 - 2k)/x^2k),
// eta Dirichlet's function, up to its smallest term, which is below exp(-x).
func fermiSommerfeld(order, x float64) float64 {
	sum, power := 1.0, 1.0
	for k := 1.0; k <= 40; k++ {
		power = float64(power * (float64((order+3-float64(2*k))*(order+2-float64(2*k))) / float64(x*x)))
		term := float64(float64(2*dirichlet(2*k)) * power)
		sum += term
		if math.Abs(term) < 1e-18 {
			break
		}
	}
	return float64(float64(column.Pow(x, order+1)/gammaOf(order+2)) * sum)
}

// dirichlet gives eta(n) = 1 - 2^-n + 3^-n - ... = (1 - 2^(1 - n)) zeta(n) for
// even n.
func dirichlet(n float64) float64 {
	return (1 - column.Pow(2, 1-n)) * zetaEven(n)
}

// fermiQuadrature integrates by the double exponential rule (Takahasi H., Mori
// M. (1974) Publ. RIMS 9, 721) with t = exp(u - exp(-u)). The integrand is
// analytic up to its poles at t = x ± i pi, which lie pi/(x + pi) or more from
// the real axis in u; the step is a fortieth of 2 pi times that, for an error
// of exp(-40).
func fermiQuadrature(order, x float64) float64 {
	width := math.Pi / (x + math.Pi + 1)
	h := float64(2*math.Pi*width) / 40
	high := column.Ln(x+float64(8*order)+60) + 0.5
	var sum total
	for k := 0.0; ; k++ {
		u := high - float64(k*h)
		fall := column.Exp(-u)
		ln := u - fall
		t := column.Exp(ln)
		// t^j dt = t^(j + 1) (1 + exp(-u)) du
		power := column.Exp(float64((order + 1) * ln))
		term := float64(power*(1+fall)) * fermiOf(t-x)
		sum.add(term)
		if u < 0 && term < 1e-19*sum.sum {
			break
		}
	}
	return float64(h*sum.value()) / gammaOf(order+1)
}

// fermiOf gives 1/(exp(x) + 1).
func fermiOf(x float64) float64 {
	if x > 0 {
		fall := column.Exp(-x)
		return fall / (1 + fall)
	}
	return 1 / (1 + column.Exp(x))
}

const (
	fermiSource    = "Fermi E. (1926) Z. Phys. 36, 902; Dirac P.A.M. (1926) Proc. Roy. Soc. A 112, 661"
	integralSource = "McDougall J., Stoner E.C. (1938) Phil. Trans. Roy. Soc. A 237, 67; Blakemore J.S. (1982) Solid-State Electron. 25, 1067"
)

var fermiOccupancyLaw = &law.Law{
	Name:       "fermi_occupancy",
	Group:      group,
	Gives:      "how far a state of fermions is filled",
	Parameters: []law.Parameter{energyParameter("energy of the state above the chemical potential (Fermi level)"), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "f = 1/(exp(E/(k_B T)) + 1)",
	Source:     fermiSource,
	Examples: []law.Example{
		{Formula: "fermi_occupancy(300[K], 300[K])", Gives: "0.2689414"},
		{Formula: "fermi_occupancy(0[eV], 300[K])", Gives: "0.5"},
	},
	Body: law.Of2(func(energy, temperature float64) float64 {
		return fermiOf(energy * inverseOf(temperature))
	}),
}

var boseOccupancyLaw = &law.Law{
	Name:       "bose_occupancy",
	Group:      group,
	Gives:      "how many bosons are in a state: photons or phonons in a mode",
	Parameters: []law.Parameter{energyParameter("energy of the state above the chemical potential; h nu for photons and phonons"), temperatureParameter()},
	Result:     law.Result{Unit: "1"},
	Equation:   "n = 1/(exp(E/(k_B T)) - 1)",
	Source:     "Bose S.N. (1924) Z. Phys. 26, 178; Einstein A. (1924) Sitzungsber. Preuss. Akad. Wiss. 261",
	Refusal:    "the energy does not lie above the chemical potential",
	Examples: []law.Example{
		{Formula: "bose_occupancy(300[K], 300[K])", Gives: "0.5819767"},
	},
	Body: law.Of2(func(energy, temperature float64) float64 { return boseOf(energy * inverseOf(temperature)) }),
}

// boseOf gives 1/(exp(x) - 1).
func boseOf(x float64) float64 {
	if !(x > 0) {
		return notANumber
	}
	return column.Exp(-x) / -column.Expm1(-x)
}

var fermiIntegralLaw = &law.Law{
	Name:  "fermi_integral",
	Group: group,
	Gives: "the Fermi-Dirac integral of an order, normalised by the gamma function",
	Parameters: []law.Parameter{
		{Name: "order", Meaning: "order j: 1/2 for the density of carriers, 3/2 for their energy", Unit: "1", Finite: law.Within(-1, 50)},
		{Name: "eta", Meaning: "reduced chemical potential, mu/(k_B T)", Unit: "1", Finite: law.Within(-700, 1e5)},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "F_j(eta) = 1/Gamma(j + 1) integral of t^j/(exp(t - eta) + 1) over t > 0; F_-1 = 1/(1 + exp(-eta))",
	Source:   integralSource,
	Caution:  "Some tables leave 1/Gamma(j + 1) out: for j = 1/2 theirs is 0.886227 times this.",
	Examples: []law.Example{
		{Formula: "fermi_integral(0.5, 1.5)", Gives: "2.144860877583"},
		{Formula: "fermi_integral(1, 20)", Gives: "201.6449340648"},
	},
	Body: law.Of2(fermiIntegral),
}

func densityParameter(name, meaning string) law.Parameter {
	return law.Parameter{Name: name, Meaning: meaning, Unit: "cm^-3", Finite: law.Above(0)}
}

var carrierDensityLaw = &law.Law{
	Name:  "carrier_density",
	Group: group,
	Gives: "the density of carriers in a band",
	Parameters: []law.Parameter{
		densityParameter("effective_density", "effective density of states of the band at the temperature"),
		energyParameter("Fermi level above the edge of the band, into it: below 0 in the gap"),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "cm^-3"},
	Equation: "n = N_c F_1/2((E_F - E_c)/(k_B T)); holes with N_v and E_v - E_F",
	Source:   integralSource,
	Caution:  "A parabolic band.",
	Examples: []law.Example{
		{Formula: "carrier_density(2.8e19[cm^-3], 0[eV], 300[K])", Gives: "2.142e19 cm^-3"},
	},
	Body: law.Of3(func(effective, energy, temperature float64) float64 {
		return float64(effective * fermiIntegral(0.5, energy*inverseOf(temperature)))
	}),
}

var fermiLevelForDensityLaw = &law.Law{
	Name:  "fermi_level_for_density",
	Group: group,
	Gives: "the Fermi level above the edge of a band at which it holds a given density of carriers",
	Parameters: []law.Parameter{
		densityParameter("effective_density", "effective density of states of the band at the temperature"),
		densityParameter("density", "density of carriers"),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "eV"},
	Equation: "n = N_c F_1/2((E_F - E_c)/(k_B T)), solved for E_F - E_c",
	Source:   integralSource,
	Refusal:  "the density is below 1e-290 or above 1e7 of the effective density of states",
	Examples: []law.Example{
		{Formula: "fermi_level_for_density(1.04e19[cm^-3], 5e15[cm^-3], 300.5[K])", Gives: "-0.198 eV"},
	},
	Body: law.Of3(fermiLevelForDensity),
}

func fermiLevelForDensity(effective, density, temperature float64) float64 {
	if !(temperature > 0) {
		return notANumber
	}
	ratio := density / effective
	if !(ratio > 1e-290 && ratio < 1e7) {
		return notANumber
	}
	ln := column.Ln(ratio)
	// F_1/2(eta) is below exp(eta), and above it less 1/(2 sqrt 2) of its square.
	f := func(eta float64) float64 { return column.Ln(fermiIntegral(0.5, eta)) - ln }
	high := ln + 1
	if ratio > 0.1 {
		high = float64(1.3*column.Pow(ratio, 2.0/3)) + 4
	}
	eta, ok := column.BracketedRoot(f, ln-1e-9-float64(1e-12*math.Abs(ln)), high)
	if !ok {
		return notANumber
	}
	return float64(eta * float64(nature.BoltzmannConstant*temperature))
}

var effectiveDensityLaw = &law.Law{
	Name:  "effective_density_of_states",
	Group: group,
	Gives: "the effective density of states of a parabolic band",
	Parameters: []law.Parameter{
		{Name: "mass_ratio", Meaning: "effective mass of the density of states over the mass of the free electron", Unit: "1", Finite: law.Above(0)},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "cm^-3"},
	Equation: "N = 2 (2 pi m k_B T/h^2)^(3/2)",
	Source:   "Blakemore J.S. (1962) Semiconductor Statistics, chapter 2",
	Examples: []law.Example{
		{Formula: "effective_density_of_states(1, 300[K])", Gives: "2.509e19 cm^-3"},
	},
	Body: law.Of2(func(ratio, temperature float64) float64 {
		wave := thermalWavelength(temperature, ratio*(nature.ElectronMass*nature.AvogadroConstant))
		return 2 / wave / wave / wave
	}),
}
