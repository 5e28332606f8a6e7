package air

import (
	"math"
	"strings"

	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// gasLaws are those of ideal gases and their mixtures.
var gasLaws = []*law.Law{
	{
		Name: "gas_density", Group: group, Gives: "the density of a gas",
		Parameters: []law.Parameter{pressureOrNone(), temperatureOfGas(), meanMolarMass(), gasCompressibility},
		Result:     law.Result{Unit: "kg/m^3"}, Equation: "rho = p M/(Z R T); p pressure, Z compressibility", Source: gasSource, Caution: gasIdeal,
		Examples: []law.Example{{Formula: "gas_density(92.10[bar], 735.3[K], 43.44[g/mol], compressibility: 1.0100)", Gives: "64.8 kg/m^3"}},
		Body:     law.Of4(func(p, t, m, z float64) float64 { return p * m / (z * nature.MolarGasConstant * t) }),
	},
	{
		Name: "gas_number_density", Group: group, Gives: "the number of particles of a gas in a volume",
		Parameters: []law.Parameter{pressureOrNone(), temperatureOfGas()},
		Result:     law.Result{Unit: "m^-3"}, Equation: "n = p/(k_B T); p pressure", Source: gasSource, Caution: gasIdeal,
		Examples: []law.Example{{Formula: "gas_number_density(101325[Pa], 273.15[K])", Gives: "2.6867801e25 m^-3"}},
		Body:     law.Of2(func(p, t float64) float64 { return p / (nature.BoltzmannConstant * t) }),
	},
	{
		Name: "molar_volume", Group: group, Gives: "the volume of one mole of a gas",
		Parameters: []law.Parameter{pressureOfGas(), temperatureOfGas()},
		Result:     law.Result{Unit: "m^3/mol"}, Equation: "V_m = R T/p; p pressure", Source: gasSource, Caution: gasIdeal,
		Examples: []law.Example{{Formula: "molar_volume(101325[Pa], 273.15[K])", Gives: "22.413970e-3 m^3/mol"}},
		Body:     law.Of2(func(p, t float64) float64 { return nature.MolarGasConstant * t / p }),
	},
	{
		Name: "column_amount", Group: group, Gives: "the amount of gas in the whole column above an area",
		Parameters: []law.Parameter{
			{Name: "surface_pressure", Meaning: "absolute pressure at the foot of the column", Unit: "Pa(a)", Finite: law.AtLeast(0)},
			meanMolarMass(), gravityOfColumn(),
		},
		Result: law.Result{Unit: "mol/m^2"}, Equation: "N = p_s/(M g); p_s surface_pressure",
		Source:   "hydrostatic equation; Wallace J.M., Hobbs P.V. (2006) Atmospheric Science, 2nd ed., section 3.2",
		Caution:  "One gravity over the whole height: true amounts are 0.3 % larger on Earth.",
		Examples: []law.Example{{Formula: "column_amount(9.80665[Pa], 1[kg/mol])", Gives: "1 mol/m^2"}},
		Body:     law.Of3(func(p, m, g float64) float64 { return p / (m * g) }),
	},
	mixtureLaw,
}

const gasIdeal = "An ideal gas: 0.1 % off for air at the ground, some percent near condensation or above 10 bar; give a compressibility there."
const gasSource = "Clapeyron E. (1834) J. Ecole Polytech. 14, 153; Atkins P., de Paula J. (2014) Physical Chemistry, 10th ed., section 1A; R of CODATA 2022, exact"

var gasCompressibility = law.Parameter{
	Name: "compressibility", Meaning: "compressibility factor Z of the gas there: 1 for an ideal gas", Unit: "1", Valid: law.Within(0.2, 4), Finite: law.Above(0), Default: "1",
}

func pressureOrNone() law.Parameter {
	return law.Parameter{Name: "pressure", Meaning: "absolute pressure of the gas", Unit: "Pa(a)", Finite: law.AtLeast(0)}
}

func meanMolarMass() law.Parameter {
	return law.Parameter{Name: "molar_mass", Meaning: "mean molar mass of the gas", Unit: "g/mol", Finite: law.Above(0)}
}

// Tables of molar masses in g/mol that publications of the composition of air
// use; names not in them have none there.
var (
	massesOfUSSA = []namedMass{
		{"N2", 28.0134}, {"O2", 31.9988}, {"Ar", 39.948}, {"CO2", 44.00995}, {"Ne", 20.183}, {"He", 4.0026},
		{"Kr", 83.80}, {"Xe", 131.30}, {"CH4", 16.04303}, {"H2", 2.01594},
	}
	massesOfCIPM = []namedMass{
		{"N2", 28.0134}, {"O2", 31.9988}, {"Ar", 39.948}, {"CO2", 44.01}, {"Ne", 20.18}, {"He", 4.0}, {"CH4", 16.0},
		{"Kr", 83.8}, {"H2", 2}, {"N2O", 44}, {"CO", 28}, {"Xe", 131},
	}
)

type namedMass struct {
	name string
	mass float64
}

// massesOf lists the molar masses in kg/mol of the gases in a text of names
// that commas part; nil where one has none.
func massesOf(names, table string) []float64 {
	var masses []float64
	for name := range strings.SplitSeq(names, ",") {
		name = strings.TrimSpace(name)
		mass := notANumber
		listed := massesOfUSSA
		switch table {
		case "CIPM-2007":
			listed = massesOfCIPM
		case "CIAAW 2021":
			mass, listed = nature.MolarMass(name), nil
		}
		for _, entry := range listed {
			if entry.name == name {
				mass = entry.mass / 1000
			}
		}
		if math.IsNaN(mass) {
			return nil
		}
		masses = append(masses, mass)
	}
	return masses
}

var mixtureLaw = &law.Law{
	Name: "mixture_molar_mass", Group: group, Gives: "the mean molar mass of a mixture of gases",
	Parameters: []law.Parameter{
		{
			Name: "names", Meaning: "chemical formulas of the gases, parted by commas, as \"N2, O2, Ar\"", Type: law.Text,
			CheckText: func(text string) string {
				for name := range strings.SplitSeq(text, ",") {
					if math.IsNaN(nature.MolarMass(strings.TrimSpace(name))) {
						return "there is no molar mass for \"" + strings.TrimSpace(name) + "\": write chemical formulas parted by commas, as \"N2, O2, Ar\""
					}
				}
				return ""
			},
		},
		{Name: "fractions", Meaning: "mole or volume fraction of each gas, in the same order, of any sum", Type: law.List, Unit: "1", Finite: law.AtLeast(0)},
		{Name: "table", Meaning: "whose molar masses", Type: law.Text, Default: `"CIAAW 2021"`, Choices: []string{"CIAAW 2021", "USSA-1976", "CIPM-2007"}},
	},
	Result:   law.Result{Unit: "g/mol"},
	Equation: "M = sum(x_i M_i)/sum(x_i); x_i fractions, M_i molar mass of each gas",
	Source: "definition; molar masses of CIAAW, standard atomic weights 2021 (abridged); U.S. Standard Atmosphere, 1976, table 3; " +
		"Picard A. et al. (2008) Metrologia 45, 149 (CIPM-2007), table 1",
	Refusal:  "not as many fractions as names, a gas that the table of molar masses does not have, or fractions that are all 0",
	Examples: []law.Example{{Formula: `mixture_molar_mass("N2, O2", [1, 1])`, Gives: "30.006 g/mol"}},
	Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
		masses := massesOf(arguments[0].Text, arguments[2].Text)
		fractions := arguments[1].Items
		for i := range dst {
			if len(masses) != len(fractions) {
				dst[i] = notANumber
				continue
			}
			sum, weight := 0.0, 0.0
			for j := range fractions {
				x := fractions[j].At(i)
				sum += x
				weight += float64(x * masses[j])
			}
			dst[i] = weight / sum
		}
	},
}

// sutherlandSet is one fit of Sutherland's formula, to be used whole: mu0 in
// Pa s at T0 in K, S in K.
type sutherlandSet struct {
	name      string
	mu0, base float64
	constant  float64
}

// sutherlandSets: air as in the U.S. Standard Atmosphere 1976 (there written
// with beta = mu0 (T0 + S)/T0^1.5), the others of White, helium, ammonia and
// sulfur dioxide of the handbook set.
var sutherlandSets = []sutherlandSet{
	{"air", 0, 0, sutherlandS},
	{"N2", 1.663e-5, 273, 107},
	{"O2", 1.919e-5, 273, 139},
	{"Ar", 2.125e-5, 273, 144},
	{"CO2", 1.370e-5, 273, 222},
	{"CO", 1.657e-5, 273, 136},
	{"H2", 8.411e-6, 273, 97},
	{"H2O", 1.12e-5, 350, 1064},
	{"He", 1.9e-5, 273, 79.4},
	{"NH3", 9.82e-6, 293.15, 370},
	{"SO2", 1.254e-5, 293.65, 416},
}

// transportLaws are those of viscosity and heat conduction.
func transportLaws() []*law.Law {
	names := make([]string, len(sutherlandSets))
	for i := range sutherlandSets {
		names[i] = sutherlandSets[i].name
	}
	return []*law.Law{
		{
			Name: "gas_viscosity", Group: group, Gives: "the dynamic viscosity of a gas by Sutherland's formula",
			Parameters: []law.Parameter{
				{Name: "gas", Meaning: "the gas; H2O is steam", Type: law.Text, Choices: names},
				{Name: "temperature", Meaning: "temperature of the gas", Unit: "K", Valid: law.Within(100, 1900), Finite: law.Within(20, 5000)},
			},
			Result:   law.Result{Unit: "Pa s"},
			Equation: "mu = mu0 (T/T0)^1.5 (T0 + S)/(T + S); air: mu = 1.458e-6 Pa s K^-0.5 T^1.5/(T + 110.4 K); N2: mu0 = 1.663e-5 Pa s, T0 = 273 K, S = 107 K",
			Source: "Sutherland W. (1893) Phil. Mag. 36, 507; air: U.S. Standard Atmosphere, 1976, equation 51; N2, O2, Ar, CO2, CO, H2, H2O: White F.M. (1991) Viscous Fluid Flow, 2nd ed., table 1-2; " +
				"He, NH3, SO2: Tan Z. (2014) Air Pollution and Greenhouse Gases, Springer",
			Caution: "Within 2 % to 3 % in the range of each fit: air 100 to 1900 K, N2 100 to 1500, O2 190 to 2000, Ar 120 to 1500, CO2 190 to 1700, CO 130 to 1500, H2 220 to 1100, H2O 360 to 1500 K; " +
				"He, NH3 and SO2 near room temperature only. Pressures below about 10 bar, and gaps wide against the mean free path.",
			Examples: []law.Example{{Formula: `gas_viscosity("air", 288.15[K])`, Gives: "1.7894e-5 Pa s"}},
			Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
				set := &sutherlandSets[0]
				for i := range sutherlandSets {
					if sutherlandSets[i].name == arguments[0].Text {
						set = &sutherlandSets[i]
					}
				}
				beta := sutherlandBeta
				if set.base > 0 {
					beta = set.mu0 * (set.base + set.constant) / (set.base * math.Sqrt(set.base))
				}
				for i := range dst {
					t := arguments[1].At(i)
					dst[i] = beta * t * math.Sqrt(t) / (t + set.constant)
				}
			},
		},
		{
			Name: "air_conductivity", Group: group, Gives: "the thermal conductivity of air of a temperature",
			Parameters: []law.Parameter{{Name: "temperature", Meaning: "temperature of the air", Unit: "K", Valid: law.Within(150, 1000), Finite: law.Within(50, 2500)}},
			Result:     law.Result{Unit: "W/(m K)"},
			Equation:   "k_t = 2.64638e-3 T^1.5/(T + 245.4 10^(-12/T)), T in K", Source: standardSource + ", equation 53",
			Caution:  "Agrees with handbooks within 1 % from 200 to 500 K. Dry air in bulk: where the mean free path is no longer small against the gap, less heat passes.",
			Examples: []law.Example{{Formula: "air_conductivity(288.15[K])", Gives: "2.5326e-2 W/(m K)"}},
			Body:     law.Of1(func(t float64) float64 { return conductivityOfAir(t, standardConductivityCoefficient) }),
		},
	}
}
