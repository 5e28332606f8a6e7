package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

func wavelengthParameter() law.Parameter {
	return law.Parameter{Name: "wavelength", Meaning: "wavelength of the line in vacuum", Unit: "nm", Finite: law.Above(0)}
}

func transitionParameter() law.Parameter {
	return law.Parameter{Name: "A", Meaning: "transition probability A (Einstein coefficient of spontaneous emission)", Unit: "s^-1", Finite: law.Above(0)}
}

var lineStrengthAtLaw = &law.Law{
	Name:  "line_strength_at",
	Group: group,
	Gives: "the strength of a spectral line of a gas at a temperature, from that at 296 K",
	Parameters: []law.Parameter{
		temperatureParameter(),
		{Name: "strength_296", Meaning: "line strength at 296 K, in cm^-1/(molecule cm^-2) = cm", Unit: "cm", Finite: law.AtLeast(0)},
		energyParameter("energy of the lower level of the line"),
		{Name: "wavenumber", Meaning: "energy of the line's photon, " + asLevelEnergy, Unit: "J", Finite: law.Above(0), Accepts: levelEnergies()},
		ladderParameter(),
	},
	Result:   law.Result{Unit: "cm"},
	Equation: "S(T) = S(296 K) (Q(296 K)/Q(T)) exp(-E\"/k_B (1/T - 1/296 K)) (1 - exp(-h c nu/(k_B T)))/(1 - exp(-h c nu/(k_B 296 K)))",
	Source:   "Rothman L.S. et al. (1998) J. Quant. Spectrosc. Radiat. Transfer 60, 665, appendix A",
	Caution:  "Energies of line and ladder are counted from the same zero.",
	Examples: []law.Example{
		{Formula: "line_strength_at(296[K], 1e-20[cm], 100[cm^-1], 2000[cm^-1], rotor(1.9[cm^-1])) / 1e-20[cm]", Gives: "1.000000000000"},
	},
	Body: lineStrengthAt,
}

// hitranTemperature is the reference temperature of line lists in K.
const hitranTemperature = 296.0

// linesWork keeps the levels at the row's and at the reference temperature
// apart.
type linesWork struct{ at, reference scratch }

func lineStrengthAt(dst []float64, arguments []law.Argument, work *law.Work) {
	w, known := work.Keep.(*linesWork)
	if !known {
		w = &linesWork{}
		work.Keep = w
	}
	reference := inverseOf(hitranTemperature)
	for i := range dst {
		beta := inverseOf(arguments[0].At(i))
		hot, hotLow := w.at.sumRow(&arguments[4], i, beta, logarithm)
		cold, coldLow := w.reference.sumRow(&arguments[4], i, reference, logarithm)
		// both sums from their own lowest level, which the exponents below move to the zero
		ln := cold - hot - float64((arguments[2].At(i)-hotLow)*beta) + float64((arguments[2].At(i)-coldLow)*reference)
		photon := arguments[3].At(i)
		induced := column.Expm1(-float64(photon*beta)) / column.Expm1(-float64(photon*reference))
		dst[i] = float64(arguments[1].At(i)*column.Exp(ln)) * induced
	}
}

var dopplerWidthLaw = &law.Law{
	Name:  "doppler_width",
	Group: group,
	Gives: "the full width at half height of a line that thermal motion broadens",
	Parameters: []law.Parameter{
		{Name: "line", Meaning: "frequency of the line, or its wavenumber", Unit: "Hz", Finite: law.Above(0),
			Accepts: []law.Conversion{{Unit: "cm^-1", Factor: nature.SpeedOfLight}}},
		temperatureParameter(),
		molarMassParameter(),
	},
	Result:   law.Result{Unit: "Hz"},
	Equation: "FWHM = (2 nu/c) sqrt(2 ln 2 R T/M)",
	Source:   "Demtroeder W. (2003) Laser Spectroscopy, 3rd ed., chapter 3",
	Caution:  "Full width: half of it is the half width. Pressure broadens besides.",
	Examples: []law.Example{
		{Formula: "doppler_width(2147.0811[cm^-1], 296[K], 27.994915[g/mol]) / nature.c", Gives: "0.00500045 cm^-1"},
	},
	Body: law.Of3(func(line, temperature, molarMass float64) float64 {
		if !(temperature > 0) || !(molarMass > 0) {
			return notANumber
		}
		speed := math.Sqrt(float64(2*lnTwo*nature.MolarGasConstant*temperature) / molarMass)
		return float64(float64(2*line)*speed) / nature.SpeedOfLight
	}),
}

var einsteinAbsorptionLaw = &law.Law{
	Name:  "einstein_absorption",
	Group: group,
	Gives: "Einstein's coefficient of absorption, for the density of radiation per unit of frequency",
	Parameters: []law.Parameter{
		transitionParameter(),
		{Name: "frequency", Meaning: "frequency of the line", Unit: "Hz", Finite: law.Above(0), Accepts: []law.Conversion{{Unit: "cm^-1", Factor: nature.SpeedOfLight}}},
		{Name: "upper_degeneracy", Meaning: "states of the upper level", Unit: "1", Finite: law.Above(0), Default: "1"},
		{Name: "lower_degeneracy", Meaning: "states of the lower level; with both at 1 the coefficient of stimulated emission", Unit: "1", Finite: law.Above(0), Default: "1"},
	},
	Result:   law.Result{Unit: "m^3/(J s^2)"},
	Equation: "B_lu = (g_u/g_l) A c^3/(8 pi h nu^3)",
	Source:   "Einstein A. (1917) Phys. Z. 18, 121; Hilborn R.C. (1982) Am. J. Phys. 50, 982",
	Caution:  "Other definitions, per angular frequency or for intensity, differ by 2 pi or c/4 pi.",
	Examples: []law.Example{
		{Formula: "einstein_absorption(6.16e7[s^-1], nature.c/5889.950[angstrom])", Gives: "7.55822e20 m^3/(J s^2)"},
	},
	Body: law.Of4(func(a, frequency, upper, lower float64) float64 {
		wave := nature.SpeedOfLight / frequency
		return upper / lower * a * wave * wave * wave / (8 * math.Pi * nature.PlanckConstant)
	}),
}

var oscillatorStrengthLaw = &law.Law{
	Name:  "oscillator_strength",
	Group: group,
	Gives: "the oscillator strength of a line in absorption",
	Parameters: []law.Parameter{
		transitionParameter(),
		wavelengthParameter(),
		degeneracyParameter("upper_degeneracy", "states of the upper level"),
		degeneracyParameter("lower_degeneracy", "states of the lower level"),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "f = (g_u/g_l) A eps_0 m_e c lambda^2/(2 pi e^2) = 1.4992e-16 s (lambda/angstrom)^2 (g_u/g_l) A",
	Source:   "Hilborn R.C. (1982) Am. J. Phys. 50, 982",
	Examples: []law.Example{
		{Formula: "oscillator_strength(6.16e7[s^-1], 5889.950[angstrom], 4, 2)", Gives: "0.641"},
	},
	Body: law.Of4(func(a, wavelength, upper, lower float64) float64 {
		const factor = nature.VacuumPermittivity * nature.ElectronMass * nature.SpeedOfLight /
			(2 * math.Pi * nature.ElementaryCharge * nature.ElementaryCharge) // s/m^2
		return upper / lower * a * wavelength * wavelength * factor
	}),
}

var lineEmissionLaw = &law.Law{
	Name:  "line_emission",
	Group: group,
	Gives: "the mean power that one atom or molecule of a gas sends out in a line, in all directions",
	Parameters: []law.Parameter{
		ladderParameter(),
		energyParameter("energy of the upper level, from the zero from which the ladder's energies are counted"),
		degeneracyParameter("upper_degeneracy", "states of the upper level"),
		transitionParameter(),
		wavelengthParameter(),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "W"},
	Equation: "P = (h c/lambda) A g_u exp(-E_u/(k_B T))/Q",
	Source:   "Griem H.R. (1964) Plasma Spectroscopy; Boltzmann's distribution: " + sumsSource,
	Caution:  "Optically thin and in thermal equilibrium; times the number density over 4 pi it is the emission coefficient.",
	Examples: []law.Example{
		{Formula: `line_emission(ladder([0, 0][J], [1, 1]), 0[J], 1, 1e8[s^-1], 500[nm], 1000[K])`, Gives: "1.98645e-11 W"},
	},
	Body: lineEmission,
}

func lineEmission(dst []float64, arguments []law.Argument, work *law.Work) {
	w, known := work.Keep.(*linesWork)
	if !known {
		w = &linesWork{}
		work.Keep = w
	}
	for i := range dst {
		beta := inverseOf(arguments[5].At(i))
		sum, lowest := w.at.sumRow(&arguments[0], i, beta, logarithm)
		share := float64(positive(arguments[2].At(i)) * column.Exp(-float64((arguments[1].At(i)-lowest)*beta)-sum))
		photon := nature.PlanckConstant * nature.SpeedOfLight / arguments[4].At(i)
		dst[i] = float64(photon*arguments[3].At(i)) * share
	}
}

var excitationTemperatureLaw = &law.Law{
	Name:  "excitation_temperature",
	Group: group,
	Gives: "the temperature of excitation from the intensities of two or more lines of one species (Boltzmann plot); negative where the upper levels are overfilled",
	Parameters: []law.Parameter{
		{Name: "intensities", Meaning: "intensities of the lines, energy per time, in any one unit", Type: law.List, Unit: "1", Finite: law.Above(0)},
		{Name: "wavelengths", Meaning: "their wavelengths", Type: law.List, Unit: "nm", Finite: law.Above(0)},
		{Name: "strengths", Meaning: "g A of each: states of the upper level times transition probability", Type: law.List, Unit: "s^-1", Finite: law.Above(0)},
		{Name: "energies", Meaning: "energies of the upper levels, " + asLevelEnergy, Type: law.List, Unit: "J", Accepts: levelEnergies()},
	},
	Result:   law.Result{Unit: "K"},
	Equation: "slope of ln(I lambda/(g A)) against E by least squares = -1/(k_B T)",
	Source:   "Griem H.R. (1964) Plasma Spectroscopy",
	Caution:  "Optically thin lines, equal weights. Two lines close in energy tell little: the error of T is T times k_B T/(E_2 - E_1) times that of the ratio.",
	Refusal:  "fewer than two lines, all upper levels at one energy, or intensities that fit an infinite temperature",
	Examples: []law.Example{
		{Formula: "excitation_temperature([1, exp(-1)], [500, 500][nm], [1, 1][s^-1], [0, 300][K])", Gives: "300.00000 K"},
	},
	Body: excitationTemperature,
}

func excitationTemperature(dst []float64, arguments []law.Argument, _ *law.Work) {
	n := len(arguments[0].Items)
	for i := range dst {
		dst[i] = notANumber
		if n < 2 {
			continue
		}
		height := func(k int) (energy, ln float64) {
			weight := arguments[0].Items[k].At(i) * arguments[1].Items[k].At(i) / arguments[2].Items[k].At(i)
			return arguments[3].Items[k].At(i), column.Ln(weight)
		}
		var energies, logarithms total
		for k := range n {
			energy, ln := height(k)
			energies.add(energy)
			logarithms.add(ln)
		}
		meanEnergy, meanLn := energies.value()/float64(n), logarithms.value()/float64(n)
		var square, product total
		for k := range n {
			energy, ln := height(k)
			d := energy - meanEnergy
			square.add(float64(d * d))
			product.add(float64(d * (ln - meanLn)))
		}
		// T = -1/(k_B slope)
		if value := -square.value() / float64(nature.BoltzmannConstant*product.value()); column.Finite(value) && square.value() > 0 {
			dst[i] = value
		}
	}
}
