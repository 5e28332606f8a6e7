package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// zetas are Riemann's zeta(n), n = 2 to 11 (Abramowitz M., Stegun I.A. (1964)
// Handbook of Mathematical Functions, table 23.3).
var zetas = [...]float64{
	2: 1.64493406684822643647, 3: 1.20205690315959428540, 4: 1.08232323371113819152, 5: 1.03692775514336992633,
	6: 1.01734306198444913971, 7: 1.00834927738192282684, 8: 1.00407735619794433938, 9: 1.00200839282608221442,
	10: 1.00099457512781808534, 11: 1.00049418860411946456,
}

// debyeFunction gives D_n(x) = n/x^n times the integral of t^n/(exp(t) - 1) from
// 0 to x, n = 1 to 10.
func debyeFunction(n int, x float64) float64 {
	if n < 1 || n > 10 || !(x >= 0) {
		return notANumber
	}
	order := float64(n)
	if x <= 4 {
		// 1 - n x/(2(n + 1)) + n sum of B_2k x^2k/((2k + n) (2k)!), with
		// B_2k/(2k)! = -2 zeta(2k) (-1/(2 pi)^2)^k.
		y := -float64(float64(x/(2*math.Pi)) * (x / (2 * math.Pi)))
		var sum total
		power := 1.0
		for k := 1.0; k < 60; k++ {
			power *= y
			term := -2 * zetaEven(2*k) * power / (float64(2*k) + order)
			sum.add(term)
			if math.Abs(term) < 1e-19 {
				break
			}
		}
		return 1 + (float64(order*sum.value()) - float64(order*x)/float64(2*(order+1)))
	}
	whole := zetas[n+1]
	for i := 2.0; i <= order; i++ {
		whole *= i
	}
	power := 1.0
	for range n {
		power *= x
	}
	if math.IsInf(power, 1) {
		return 0
	}
	return float64(order*(whole-debyeTail(n, x))) / power
}

// debyeTail gives the integral of t^n/(exp(t) - 1) from x on: for each k the
// integral of t^n exp(-k t) by parts.
func debyeTail(n int, x float64) float64 {
	var sum total
	for k := 1.0; k < 400; k++ {
		part, power := 0.0, 1.0
		for range n {
			power *= x
		}
		over := 1 / k
		for i := n; i >= 0; i-- {
			part += float64(power * over)
			// the next: n (n-1) ... i x^(i-1)/k^(n-i+2)
			over *= float64(i) / k
			power /= x
		}
		term := part * column.Exp(-float64(k*x))
		sum.add(term)
		if term < 1e-19*sum.sum || term == 0 {
			break
		}
	}
	return sum.value()
}

// zetaEven gives zeta(n) for even n.
func zetaEven(n float64) float64 {
	if n <= 10 {
		return zetas[int(n)]
	}
	sum := 1.0
	for m := 2.0; m < 30; m++ {
		term := column.Pow(m, -n)
		sum += term
		if term < 1e-18 {
			break
		}
	}
	return sum
}

func thetaParameter(meaning string) law.Parameter {
	return law.Parameter{Name: "theta", Meaning: meaning, Unit: "K", Finite: law.Above(0)}
}

const debyeSource = "Debye P. (1912) Ann. Phys. 344, 789"

var debyeFunctionLaw = &law.Law{
	Name:  "debye_function",
	Group: group,
	Gives: "Debye's function of an order",
	Parameters: []law.Parameter{
		{Name: "order", Meaning: "order n, a whole number", Unit: "1", Finite: law.Within(1, 10)},
		{Name: "x", Meaning: "upper bound, theta/T", Unit: "1", Finite: law.AtLeast(0)},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "D_n(x) = n/x^n integral of t^n/(exp(t) - 1) from 0 to x",
	Source:   debyeSource + "; Abramowitz M., Stegun I.A. (1964) Handbook of Mathematical Functions, 27.1",
	Refusal:  "the order is no whole number",
	Examples: []law.Example{
		{Formula: "debye_function(3, 1)", Gives: "0.6744155640778"},
	},
	Body: law.Of2(func(order, x float64) float64 {
		if !wholeNumber(order) || order > 10 {
			return notANumber
		}
		return debyeFunction(int(order), x)
	}),
}

var debyeHeatCapacityLaw = &law.Law{
	Name:       "debye_heat_capacity",
	Group:      group,
	Gives:      "the molar heat capacity at constant volume of a crystal's lattice, per mole of atoms, after Debye",
	Parameters: []law.Parameter{thetaParameter("Debye temperature"), temperatureParameter()},
	Result:     law.Result{Unit: "J/(mol K)"},
	Equation:   "C_V = 3 R (4 D_3(y) - 3 y/(exp(y) - 1)), y = theta/T",
	Source:     debyeSource,
	Caution:    "One atom in the cell, no electrons: metals have a term linear in T besides.",
	Examples: []law.Example{
		{Formula: "debye_heat_capacity(300[K], 60[K]) / (3 * nature.R)", Gives: "0.368635"},
	},
	Body: law.Of2(func(theta, temperature float64) float64 {
		y := theta / temperature
		if !(temperature > 0) {
			return notANumber
		}
		return float64(3 * nature.MolarGasConstant * (float64(4*debyeFunction(3, y)) - float64(3*oscillatorQuantity(y, meanLevel))))
	}),
}

var einsteinHeatCapacityLaw = &law.Law{
	Name:  "einstein_heat_capacity",
	Group: group,
	Gives: "the molar heat capacity of equal oscillators, after Einstein",
	Parameters: []law.Parameter{
		thetaParameter("Einstein temperature, h nu/k_B"),
		temperatureParameter(),
		{Name: "modes", Meaning: "how many oscillators each atom or molecule is: 3 for a crystal of atoms", Unit: "1", Finite: law.AtLeast(0), Default: "3"},
	},
	Result:   law.Result{Unit: "J/(mol K)"},
	Equation: "C = modes R x^2 exp(x)/(exp(x) - 1)^2, x = theta/T",
	Source:   "Einstein A. (1907) Ann. Phys. 327, 180",
	Caution:  "In the cold a crystal has far more: use Debye's law there.",
	Examples: []law.Example{
		{Formula: "einstein_heat_capacity(100[K], 50[K]) / (3 * nature.R)", Gives: "0.724062"},
	},
	Body: law.Of3(func(theta, temperature, modes float64) float64 {
		if !(temperature > 0) {
			return notANumber
		}
		return float64(float64(modes*nature.MolarGasConstant) * oscillatorQuantity(theta/temperature, variance))
	}),
}

var planckRadianceLaw = &law.Law{
	Name:  "planck_radiance",
	Group: group,
	Gives: "the spectral radiance of a black body, per unit of wavelength",
	Parameters: []law.Parameter{
		{Name: "wavelength", Meaning: "wavelength in vacuum", Unit: "um", Finite: law.Above(0)},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "W/(m^3 sr)"},
	Equation: "L = (2 h c^2/lambda^5)/(exp(h c/(lambda k_B T)) - 1)",
	Source:   "Planck M. (1901) Ann. Phys. 309, 553",
	Caution:  "Per unit of frequency the maximum lies elsewhere.",
	Examples: []law.Example{
		{Formula: "planck_radiance(nature.b_wien/300[K], 300[K])", Gives: "9.95249e6 W/(m^3 sr)"},
	},
	Body: law.Of2(func(wavelength, temperature float64) float64 {
		photon := nature.PlanckConstant * nature.SpeedOfLight / wavelength
		occupied := boseOf(photon * inverseOf(temperature))
		return float64(2*nature.SpeedOfLight*photon) / wavelength / wavelength / wavelength / wavelength * occupied
	}),
}

var blackBodyFractionLaw = &law.Law{
	Name:  "black_body_fraction",
	Group: group,
	Gives: "the share of a black body's radiation at wavelengths up to a given one",
	Parameters: []law.Parameter{
		{Name: "wavelength", Meaning: "longest wavelength that is counted, in vacuum", Unit: "um", Finite: law.Above(0)},
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "F = (15/pi^4) integral of z^3/(exp(z) - 1) from c_2/(lambda T) on",
	Source:   "Planck M. (1901) Ann. Phys. 309, 553; Chang S.L., Rhee K.T. (1984) Int. Comm. Heat Mass Transfer 11, 451",
	Examples: []law.Example{
		{Formula: "black_body_fraction(10[um], 300[K])", Gives: "0.273229"},
	},
	Body: law.Of2(func(wavelength, temperature float64) float64 {
		if !(temperature > 0) || !(wavelength > 0) {
			return notANumber
		}
		x := nature.SecondRadiationConstant / float64(wavelength*temperature)
		if x > 2 {
			return 15 / (math.Pi * math.Pi * math.Pi * math.Pi) * debyeTail(3, x)
		}
		cube := float64(float64(x*x) * x)
		return 1 - float64(5/(math.Pi*math.Pi*math.Pi*math.Pi)*float64(cube*debyeFunction(3, x)))
	}),
}
