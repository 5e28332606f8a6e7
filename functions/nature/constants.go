package nature

import (
	"math"

	"plumbrule/engine/law"
)

// The constants that laws of other rooms compute with, in coherent SI units.
// Constants lists them, and all others, for use in formulas. Those that follow
// exactly from defining constants are written as they follow.
const (
	SpeedOfLight          = 299792458.0     // m/s, exact
	PlanckConstant        = 6.62607015e-34  // J s, exact
	ElementaryCharge      = 1.602176634e-19 // C, exact
	BoltzmannConstant     = 1.380649e-23    // J/K, exact
	AvogadroConstant      = 6.02214076e23   // 1/mol, exact
	StandardGravity       = 9.80665         // m/s^2, exact
	StandardAtmosphere    = 101325.0        // Pa, exact
	StandardStatePressure = 100000.0        // Pa, exact
	IcePoint              = 273.15          // K, zero of the Celsius scale, exact

	ReducedPlanckConstant  = PlanckConstant / (2 * math.Pi)                             // J s, exact
	MolarGasConstant       = AvogadroConstant * BoltzmannConstant                       // J/(mol K), exact
	FaradayConstant        = AvogadroConstant * ElementaryCharge                        // C/mol, exact
	FirstRadiationConstant = 2 * math.Pi * PlanckConstant * SpeedOfLight * SpeedOfLight // W m^2, exact

	SecondRadiationConstant = PlanckConstant * SpeedOfLight / BoltzmannConstant // m K, exact

	// Exact, in W/(m^2 K^4): pi^2 k^4/(60 hbar^3 c^2).
	StefanBoltzmannConstant = math.Pi * math.Pi / 60 * BoltzmannConstant *
		thermalRate * thermalRate * thermalRate / (SpeedOfLight * SpeedOfLight)
	thermalRate = BoltzmannConstant / ReducedPlanckConstant // rad/(s K)

	// Exact. The numbers are the roots of x = 5 (1 - exp(-x)) and of
	// x = 3 (1 - exp(-x)), where Planck's spectrum has its maximum by wavelength
	// (m K) and by frequency (Hz/K).
	WienWavelengthConstant = SecondRadiationConstant / 4.965114231744276303698759131322893944
	WienFrequencyConstant  = 2.821439372122078893403191330294485195 * BoltzmannConstant / PlanckConstant

	AtomicMassConstant    = 1.66053906892e-27   // kg
	ElectronMass          = 9.1093837139e-31    // kg
	ProtonMass            = 1.67262192595e-27   // kg
	NeutronMass           = 1.67492750056e-27   // kg
	FineStructureConstant = 7.2973525643e-3     // pure number
	HartreeEnergy         = 4.3597447222060e-18 // J
	RydbergConstant       = 10973731.568157     // 1/m
	BohrMagneton          = 9.2740100657e-24    // J/T
	NuclearMagneton       = 5.0507837393e-27    // J/T
	VacuumPermittivity    = 8.8541878188e-12    // F/m
	VacuumPermeability    = 1.25663706127e-6    // N/A^2
	GravitationalConstant = 6.67430e-11         // m^3/(kg s^2)
)

// codata is the source of every constant of the table.
const codata = "Tiesinga E., Mohr P.J., Newell D.B., Taylor B.N. (2024) The 2022 CODATA recommended values of the fundamental physical constants, NIST"

// listed is one row of the table: what Constants needs to know of a constant.
type listed struct {
	name, meaning      string
	value, uncertainty float64
	unit               string
}

// Constants lists pi and the CODATA 2022 constants for use in formulas as
// nature.NAME, each in the unit given with its standard uncertainty; 0 marks
// an exact one. Values of one quantity in several units appear once: sheets
// convert units.
func Constants() []law.Constant {
	constants := make([]law.Constant, len(table), len(table)+1)
	for i, row := range table {
		constants[i] = law.Constant{
			Name: row.name, Meaning: row.meaning, Value: row.value,
			Uncertainty: row.uncertainty, Unit: row.unit, Source: codata,
		}
	}
	return append(constants, law.Constant{
		Name: "pi", Meaning: "circumference of a circle over its diameter", Value: math.Pi, Unit: "1",
		Source: "mathematics: the double nearest to the number",
	})
}

// table holds every constant: the universal and electromagnetic ones and those
// adopted by convention, the physico-chemical ones, then atoms, the electron
// and the other particles.
var table = [...]listed{
	{"c", "speed of light in vacuum", SpeedOfLight, 0, "m/s"},
	{"h", "Planck constant", PlanckConstant, 0, "J s"},
	{"hbar", "reduced Planck constant", ReducedPlanckConstant, 0, "J s"},
	{"G", "Newtonian constant of gravitation", GravitationalConstant, 0.00015e-11, "m^3/(kg s^2)"},
	{"planck_mass", "Planck mass", 2.176434e-8, 0.000024e-8, "kg"},
	{"planck_temperature", "Planck temperature", 1.416784e32, 0.000016e32, "K"},
	{"planck_length", "Planck length", 1.616255e-35, 0.000018e-35, "m"},
	{"planck_time", "Planck time", 5.391247e-44, 0.000060e-44, "s"},
	{"e", "elementary charge", ElementaryCharge, 0, "C"},
	{"K_J", "Josephson constant", 2 * ElementaryCharge / PlanckConstant, 0, "Hz/V"},
	{"eps_0", "vacuum electric permittivity", VacuumPermittivity, 0.0000000014e-12, "F/m"},
	{"mu_0", "vacuum magnetic permeability", VacuumPermeability, 0.00000000020e-6, "N/A^2"},
	{"g_n", "standard acceleration of gravity", StandardGravity, 0, "m/s^2"},
	{"atm", "standard atmosphere", StandardAtmosphere, 0, "Pa"},
	{"standard_state_pressure", "standard-state pressure", StandardStatePressure, 0, "Pa"},
	{"eV", "electron volt", ElementaryCharge, 0, "J"},
	{"u", "unified atomic mass unit", AtomicMassConstant, 0.00000000052e-27, "kg"},
	{"m_u", "atomic mass constant", AtomicMassConstant, 0.00000000052e-27, "kg"},
	{"atomic_mass_constant_energy", "atomic mass constant energy equivalent", 1.49241808768e-10, 0.00000000046e-10, "J"},

	{"N_A", "Avogadro constant", AvogadroConstant, 0, "mol^-1"},
	{"k_B", "Boltzmann constant", BoltzmannConstant, 0, "J/K"},
	{"R", "molar gas constant", MolarGasConstant, 0, "J/(mol K)"},
	{"F", "Faraday constant", FaradayConstant, 0, "C/mol"},
	{"M_u", "molar mass constant", 1.00000000105e-3, 0.00000000031e-3, "kg/mol"},
	{"molar_mass_of_carbon_12", "molar mass of carbon-12", 12.0000000126e-3, 0.0000000037e-3, "kg/mol"},
	{"N_A_h", "molar Planck constant", AvogadroConstant * PlanckConstant, 0, "J s/mol"},
	{"V_m_bar", "molar volume of ideal gas (273.15 K, 100 kPa)", MolarGasConstant * IcePoint / StandardStatePressure, 0, "m^3/mol"},
	{"V_m_atm", "molar volume of ideal gas (273.15 K, 101.325 kPa)", MolarGasConstant * IcePoint / StandardAtmosphere, 0, "m^3/mol"},
	{"n_0_bar", "Loschmidt constant (273.15 K, 100 kPa)", StandardStatePressure / (BoltzmannConstant * IcePoint), 0, "m^-3"},
	{"n_0_atm", "Loschmidt constant (273.15 K, 101.325 kPa)", StandardAtmosphere / (BoltzmannConstant * IcePoint), 0, "m^-3"},
	{"sackur_tetrode_bar", "Sackur-Tetrode constant (1 K, 100 kPa)", -1.15170753496, 0.00000000047, "1"},
	{"sackur_tetrode_atm", "Sackur-Tetrode constant (1 K, 101.325 kPa)", -1.16487052149, 0.00000000047, "1"},
	{"molar_volume_of_silicon", "molar volume of silicon", 1.205883199e-5, 0.000000060e-5, "m^3/mol"},
	{"sigma_SB", "Stefan-Boltzmann constant", StefanBoltzmannConstant, 0, "W/(m^2 K^4)"},
	{"c_1", "first radiation constant", FirstRadiationConstant, 0, "W m^2"},
	{"c_1L", "first radiation constant for spectral radiance", 2 * PlanckConstant * SpeedOfLight * SpeedOfLight, 0, "W m^2/sr"},
	{"c_2", "second radiation constant", SecondRadiationConstant, 0, "m K"},
	{"b_wien", "Wien wavelength displacement law constant", WienWavelengthConstant, 0, "m K"},
	{"b_wien_frequency", "Wien frequency displacement law constant", WienFrequencyConstant, 0, "Hz/K"},

	{"alpha", "fine-structure constant", FineStructureConstant, 0.0000000011e-3, "1"},
	{"R_inf", "Rydberg constant", RydbergConstant, 0.000012, "m^-1"},
	{"E_h", "Hartree energy", HartreeEnergy, 0.0000000000048e-18, "J"},
	{"a_0", "Bohr radius", 5.29177210544e-11, 0.00000000082e-11, "m"},
	{"r_e", "classical electron radius", 2.8179403205e-15, 0.0000000013e-15, "m"},
	{"lambda_C", "Compton wavelength", 2.42631023538e-12, 0.00000000076e-12, "m"},
	{"sigma_e", "Thomson cross section", 6.6524587051e-29, 0.0000000062e-29, "m^2"},
	{"mu_B", "Bohr magneton", BohrMagneton, 0.0000000029e-24, "J/T"},
	{"mu_N", "nuclear magneton", NuclearMagneton, 0.0000000016e-27, "J/T"},

	{"electron_deuteron_magnetic_moment_ratio", "electron-deuteron magnetic moment ratio", -2143.9234921, 0.0000056, "1"},
	{"electron_deuteron_mass_ratio", "electron-deuteron mass ratio", 2.724437107629e-4, 0.000000000047e-4, "1"},
	{"g_e", "electron g factor", -2.00231930436092, 0.00000000000036, "1"},
	{"gamma_e", "electron gyromagnetic ratio", 1.76085962784e11, 0.00000000055e11, "s^-1 T^-1"},
	{"electron_helion_mass_ratio", "electron-helion mass ratio", 1.819543074649e-4, 0.000000000053e-4, "1"},
	{"mu_e", "electron magnetic moment", -9.2847646917e-24, 0.0000000029e-24, "J/T"},
	{"electron_magnetic_moment_anomaly", "electron magnetic moment anomaly", 1.15965218046e-3, 0.00000000018e-3, "1"},
	{"electron_magnetic_moment_to_Bohr_magneton_ratio", "electron magnetic moment to Bohr magneton ratio", -1.00115965218046, 0.00000000000018, "1"},
	{"electron_magnetic_moment_to_nuclear_magneton_ratio", "electron magnetic moment to nuclear magneton ratio", -1838.281971877, 0.000000032, "1"},
	{"m_e", "electron mass", ElectronMass, 0.0000000028e-31, "kg"},
	{"electron_mass_energy", "electron mass energy equivalent", 8.1871057880e-14, 0.0000000026e-14, "J"},
	{"electron_muon_magnetic_moment_ratio", "electron-muon magnetic moment ratio", 206.7669881, 0.0000046, "1"},
	{"electron_muon_mass_ratio", "electron-muon mass ratio", 4.83633170e-3, 0.00000011e-3, "1"},
	{"electron_neutron_magnetic_moment_ratio", "electron-neutron magnetic moment ratio", 960.92048, 0.00023, "1"},
	{"electron_neutron_mass_ratio", "electron-neutron mass ratio", 5.4386734416e-4, 0.0000000022e-4, "1"},
	{"electron_proton_magnetic_moment_ratio", "electron-proton magnetic moment ratio", -658.21068789, 0.00000019, "1"},
	{"electron_proton_mass_ratio", "electron-proton mass ratio", 5.446170214889e-4, 0.000000000094e-4, "1"},
	{"electron_tau_mass_ratio", "electron-tau mass ratio", 2.87585e-4, 0.00019e-4, "1"},
	{"electron_triton_mass_ratio", "electron-triton mass ratio", 1.819200062327e-4, 0.000000000068e-4, "1"},

	{"alpha_particle_mass", "alpha particle mass", 6.6446573450e-27, 0.0000000021e-27, "kg"},
	{"alpha_particle_mass_energy", "alpha particle mass energy equivalent", 5.9719201997e-10, 0.0000000019e-10, "J"},
	{"deuteron_g_factor", "deuteron g factor", 0.8574382335, 0.0000000022, "1"},
	{"deuteron_magnetic_moment", "deuteron magnetic moment", 4.330735087e-27, 0.000000011e-27, "J/T"},
	{"deuteron_magnetic_moment_to_Bohr_magneton_ratio", "deuteron magnetic moment to Bohr magneton ratio", 4.669754568e-4, 0.000000012e-4, "1"},
	{"deuteron_magnetic_moment_to_nuclear_magneton_ratio", "deuteron magnetic moment to nuclear magneton ratio", 0.8574382335, 0.0000000022, "1"},
	{"deuteron_mass", "deuteron mass", 3.3435837768e-27, 0.0000000010e-27, "kg"},
	{"deuteron_mass_energy", "deuteron mass energy equivalent", 3.00506323491e-10, 0.00000000094e-10, "J"},
	{"helion_mass", "helion mass", 5.0064127862e-27, 0.0000000016e-27, "kg"},
	{"helion_mass_energy", "helion mass energy equivalent", 4.4995394185e-10, 0.0000000014e-10, "J"},
	{"neutron_g_factor", "neutron g factor", -3.82608552, 0.00000090, "1"},
	{"neutron_gyromagnetic_ratio", "neutron gyromagnetic ratio", 1.83247174e8, 0.00000043e8, "s^-1 T^-1"},
	{"neutron_magnetic_moment", "neutron magnetic moment", -9.6623653e-27, 0.0000023e-27, "J/T"},
	{"neutron_magnetic_moment_to_Bohr_magneton_ratio", "neutron magnetic moment to Bohr magneton ratio", -1.04187565e-3, 0.00000025e-3, "1"},
	{"neutron_magnetic_moment_to_nuclear_magneton_ratio", "neutron magnetic moment to nuclear magneton ratio", -1.91304276, 0.00000045, "1"},
	{"m_n", "neutron mass", NeutronMass, 0.00000000085e-27, "kg"},
	{"neutron_mass_energy", "neutron mass energy equivalent", 1.50534976514e-10, 0.00000000076e-10, "J"},
	{"proton_electron_mass_ratio", "proton-electron mass ratio", 1836.152673426, 0.000000032, "1"},
	{"g_p", "proton g factor", 5.5856946893, 0.0000000016, "1"},
	{"gamma_p", "proton gyromagnetic ratio", 2.6752218708e8, 0.0000000011e8, "s^-1 T^-1"},
	{"mu_p", "proton magnetic moment", 1.41060679545e-26, 0.00000000060e-26, "J/T"},
	{"proton_magnetic_moment_to_Bohr_magneton_ratio", "proton magnetic moment to Bohr magneton ratio", 1.52103220230e-3, 0.00000000045e-3, "1"},
	{"proton_magnetic_moment_to_nuclear_magneton_ratio", "proton magnetic moment to nuclear magneton ratio", 2.79284734463, 0.00000000082, "1"},
	{"proton_magnetic_shielding_correction", "proton magnetic shielding correction", 2.56715e-5, 0.00041e-5, "1"},
	{"m_p", "proton mass", ProtonMass, 0.00000000052e-27, "kg"},
	{"proton_mass_energy", "proton mass energy equivalent", 1.50327761802e-10, 0.00000000047e-10, "J"},
	{"shielded_proton_gyromagnetic_ratio", "shielded proton gyromagnetic ratio", 2.675153194e8, 0.000000011e8, "s^-1 T^-1"},
	{"shielded_proton_magnetic_moment", "shielded proton magnetic moment", 1.4105705830e-26, 0.0000000058e-26, "J/T"},
	{"shielded_proton_magnetic_moment_to_Bohr_magneton_ratio", "shielded proton magnetic moment to Bohr magneton ratio", 1.5209931551e-3, 0.0000000062e-3, "1"},
	{"shielded_proton_magnetic_moment_to_nuclear_magneton_ratio", "shielded proton magnetic moment to nuclear magneton ratio", 2.792775648, 0.000000011, "1"},
}
