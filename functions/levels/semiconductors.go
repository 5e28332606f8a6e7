package levels

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// material holds how the intrinsic carrier density of a semiconductor runs with
// temperature: density (T/300 K)^power exp(-slope/T).
type material struct {
	name    string
	density float64 // cm^-3
	power   float64
	slope   float64 // K
}

// materials: silicon as measured; gallium arsenide from the bands, N_c =
// 4.7e17, N_v = 7.0e18 cm^-3, 1.42 eV at 300 K.
var materials = [...]material{
	{"Si", 5.29e19, 2.54, 6726},
	{"GaAs", 1.813835713e18, 1.5, 1.42 / 2 / 8.617333262e-5},
}

func materialOf(name string) *material {
	for i := range materials {
		if materials[i].name == name {
			return &materials[i]
		}
	}
	return nil
}

var intrinsicCarrierDensityLaw = &law.Law{
	Name:  "intrinsic_carrier_density",
	Group: group,
	Gives: "the density of electrons, and of holes, in a pure semiconductor",
	Parameters: []law.Parameter{
		{Name: "material", Meaning: "the semiconductor", Type: law.Text, Choices: []string{"Si", "GaAs"}},
		{Name: "temperature", Meaning: "temperature", Unit: "K", Finite: law.Above(0), Valid: law.Within(78, 340)},
	},
	Result:   law.Result{Unit: "cm^-3"},
	Equation: "Si: n_i = 5.29e19 (T/300)^2.54 exp(-6726/T) cm^-3; GaAs: n_i = sqrt(N_c N_v) (T/300)^1.5 exp(-E_g/(2 k_B T)) with N_c = 4.7e17, N_v = 7.0e18 cm^-3, E_g = 1.42 eV",
	Source:   "Si: Misiakos K., Tsamakis D. (1993) J. Appl. Phys. 74, 3293; GaAs: Neamen D.A., Semiconductor Physics and Devices, band parameters at 300 K",
	Caution:  "GaAs: the gap is that at 300 K, good near it. Older textbooks give 1.5e10 cm^-3 for silicon at 300 K: half as much again as measured.",
	Examples: []law.Example{
		{Formula: `intrinsic_carrier_density("Si", 300[K])`, Gives: "9.7e9 cm^-3"},
	},
	Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
		m := materialOf(arguments[0].Text)
		for i := range dst {
			t := arguments[1].At(i)
			if m == nil || !(t > 0) {
				dst[i] = notANumber
				continue
			}
			dst[i] = float64(float64(m.density*1e6)*column.Pow(t/300, m.power)) * column.Exp(-m.slope/t)
		}
	},
}

var intrinsicDensityOfBandsLaw = &law.Law{
	Name:  "intrinsic_density_of_bands",
	Group: group,
	Gives: "the intrinsic carrier density from the effective densities of states and the gap",
	Parameters: []law.Parameter{
		densityParameter("conduction", "effective density of states of the conduction band at the temperature"),
		densityParameter("valence", "effective density of states of the valence band at the temperature"),
		energyParameter("width of the gap at the temperature"),
		temperatureParameter(),
	},
	Result:   law.Result{Unit: "cm^-3"},
	Equation: "n_i = sqrt(N_c N_v) exp(-E_g/(2 k_B T))",
	Source:   "Blakemore J.S. (1962) Semiconductor Statistics, chapter 2",
	Examples: []law.Example{
		{Formula: "intrinsic_density_of_bands(4.7e17[cm^-3], 7.0e18[cm^-3], 1.42[eV], 300.56[K])", Gives: "2.26e6 cm^-3"},
	},
	Body: law.Of4(func(conduction, valence, gap, temperature float64) float64 {
		return float64(float64(math.Sqrt(conduction)*math.Sqrt(valence)) * column.Exp(-float64(0.5*gap)*inverseOf(temperature)))
	}),
}

var dopantOccupancyLaw = &law.Law{
	Name:  "dopant_occupancy",
	Group: group,
	Gives: "the share of donors that hold their electron",
	Parameters: []law.Parameter{
		energyParameter("level of the donor above the Fermi level"),
		temperatureParameter(),
		{Name: "degeneracy", Meaning: "states of the filled donor for one of the empty one: 2 for donors, 4 for holes on acceptors of silicon", Unit: "1", Finite: law.Above(0), Default: "2"},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "f = 1/(1 + (1/g) exp((E_d - E_F)/(k_B T)))",
	Source:   "Blakemore J.S. (1962) Semiconductor Statistics, chapter 3",
	Examples: []law.Example{
		{Formula: "dopant_occupancy(0[eV], 300[K])", Gives: "0.666667"},
	},
	Body: law.Of3(func(energy, temperature, degeneracy float64) float64 {
		return fermiOf(float64(energy*inverseOf(temperature)) - column.Ln(positive(degeneracy)))
	}),
}

var ionisedDopantFractionLaw = &law.Law{
	Name:  "ionised_dopant_fraction",
	Group: group,
	Gives: "the share of dopants that have given up their carrier, in a semiconductor of one dopant",
	Parameters: []law.Parameter{
		densityParameter("dopants", "density of dopants"),
		densityParameter("effective_density", "effective density of states of the band at the temperature"),
		energyParameter("binding energy of the carrier"),
		temperatureParameter(),
		{Name: "degeneracy", Meaning: "states of the neutral dopant for one of the ionised one: 2 for donors, 4 for acceptors of silicon", Unit: "1", Finite: law.Above(0), Default: "2"},
	},
	Result:   law.Result{Unit: "1"},
	Equation: "n^2/(N_d - n) = (N_c/g) exp(-E_d/(k_B T)), share n/N_d",
	Source:   "Blakemore J.S. (1962) Semiconductor Statistics, chapter 3",
	Caution:  "No compensation, no intrinsic carriers (n well above n_i), Boltzmann's limit (n well below N_c).",
	Examples: []law.Example{
		{Formula: "ionised_dopant_fraction(1e16[cm^-3], 2.8e19[cm^-3], 0.045[eV], 300[K])", Gives: "0.99596"},
	},
	Body: law.OfMany(func(x []float64) float64 {
		// y^2/(1 - y) = a; y = 2/(1 + sqrt(1 + 4/a)), free of cancellation.
		a := float64(x[1]/float64(positive(x[4])*x[0])) * column.Exp(-x[2]*inverseOf(x[3]))
		return 2 / (1 + math.Sqrt(1+4/a))
	}),
}
