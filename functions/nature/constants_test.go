package nature

import (
	"math"
	"testing"
)

// value finds a constant by name.
func value(t *testing.T, name string) float64 {
	t.Helper()
	for _, constant := range Constants() {
		if constant.Name == name {
			return constant.Value
		}
	}
	t.Fatalf("no constant %s", name)
	return 0
}

// TestExactConstants compares constants that follow exactly from the defining
// ones with their values to 20 digits: the published digits of CODATA 2022,
// which cuts them off, continued with 30-digit arithmetic.
func TestExactConstants(t *testing.T) {
	cases := []struct {
		name string
		want float64
	}{
		{"hbar", 1.0545718176461563913e-34},
		{"R", 8.31446261815324},
		{"F", 96485.3321233100184},
		{"c_1", 3.7417718521927580114e-16},
		{"c_1L", 1.1910429723971884141e-16},
		{"c_2", 0.014387768775039338021},
		{"sigma_SB", 5.670374419184429454e-8},
		{"b_wien", 0.0028977719551851726615},
		{"b_wien_frequency", 58789257576.468249466},
		{"K_J", 483597848416983.63245},
		{"n_0_bar", 2.6516458048837343424e+25},
		{"n_0_atm", 2.6867801117984438224e+25},
		{"N_A_h", 3.9903127128934314e-10},
		{"V_m_bar", 0.02271095464148557506},
		{"V_m_atm", 0.022413969545014137735},
	}
	for _, c := range cases {
		if got := value(t, c.name); got != c.want {
			t.Errorf("%s = %.17g, want %.17g", c.name, got, c.want)
		}
	}
}

// TestDefiningConstants holds the seven values that define the SI and the
// adopted ones against the SI Brochure (9th ed., BIPM 2019) and the CODATA
// listing.
func TestDefiningConstants(t *testing.T) {
	cases := []struct {
		name string
		want float64
		unit string
	}{
		{"c", 299792458, "m/s"},
		{"h", 6.62607015e-34, "J s"},
		{"e", 1.602176634e-19, "C"},
		{"k_B", 1.380649e-23, "J/K"},
		{"N_A", 6.02214076e23, "mol^-1"},
		{"g_n", 9.80665, "m/s^2"}, // 3rd CGPM (1901)
		{"atm", 101325, "Pa"},     // 10th CGPM (1954)
		{"standard_state_pressure", 100000, "Pa"},
	}
	for _, c := range cases {
		for _, constant := range Constants() {
			if constant.Name == c.name && (constant.Value != c.want || constant.Unit != c.unit || constant.Uncertainty != 0) {
				t.Errorf("%s = %v ± %v %s", c.name, constant.Value, constant.Uncertainty, constant.Unit)
			}
		}
		value(t, c.name)
	}
}

// TestRelations holds measured constants against the relations of physics that
// bind them; each within the relative standard uncertainty of the adjustment
// times three or the last digit printed.
func TestRelations(t *testing.T) {
	c, h, e := value(t, "c"), value(t, "h"), value(t, "e")
	hbar, alpha := value(t, "hbar"), value(t, "alpha")
	electron := value(t, "m_e")
	cases := []struct {
		name      string
		got, want float64
		relative  float64
	}{
		{"eps_0 mu_0 c^2 = 1", value(t, "eps_0") * value(t, "mu_0") * c * c, 1, 2e-11},
		{"alpha = e^2/(2 eps_0 h c)", e * e / (2 * value(t, "eps_0") * h * c), alpha, 5e-10},
		{"R_inf = alpha^2 m_e c/(2 h)", alpha * alpha * electron * c / (2 * h), value(t, "R_inf"), 1e-9},
		{"E_h = 2 h c R_inf", 2 * h * c * value(t, "R_inf"), value(t, "E_h"), 1e-12},
		{"a_0 = hbar/(alpha m_e c)", hbar / (alpha * electron * c), value(t, "a_0"), 1e-9},
		{"r_e = alpha^2 a_0", alpha * alpha * value(t, "a_0"), value(t, "r_e"), 1e-9},
		{"lambda_C = h/(m_e c)", h / (electron * c), value(t, "lambda_C"), 1e-9},
		{"sigma_e = 8 pi r_e^2/3", 8 * math.Pi / 3 * value(t, "r_e") * value(t, "r_e"), value(t, "sigma_e"), 2e-9},
		{"mu_B = e hbar/(2 m_e)", e * hbar / (2 * electron), value(t, "mu_B"), 1e-9},
		{"mu_N = e hbar/(2 m_p)", e * hbar / (2 * value(t, "m_p")), value(t, "mu_N"), 1e-9},
		{"mu_e = g_e mu_B/2", value(t, "g_e") * value(t, "mu_B") / 2, value(t, "mu_e"), 1e-10},
		{"mu_p = g_p mu_N/2", value(t, "g_p") * value(t, "mu_N") / 2, value(t, "mu_p"), 1e-9},
		{"gamma_e = |g_e| mu_B/hbar", -value(t, "g_e") * value(t, "mu_B") / hbar, value(t, "gamma_e"), 1e-10},
		{"gamma_p = g_p mu_N/hbar", value(t, "g_p") * value(t, "mu_N") / hbar, value(t, "gamma_p"), 1e-9},
		{"neutron moment by magneton", value(t, "neutron_magnetic_moment_to_nuclear_magneton_ratio") * value(t, "mu_N"), value(t, "neutron_magnetic_moment"), 1e-7},
		{"m_p/m_e", value(t, "m_p") / electron, value(t, "proton_electron_mass_ratio"), 1e-9},
		{"m_e/m_p", electron / value(t, "m_p"), value(t, "electron_proton_mass_ratio"), 1e-9},
		{"m_e/m_n", electron / value(t, "m_n"), value(t, "electron_neutron_mass_ratio"), 2e-9},
		{"m_e/m_d", electron / value(t, "deuteron_mass"), value(t, "electron_deuteron_mass_ratio"), 1e-9},
		{"m_e/m_h", electron / value(t, "helion_mass"), value(t, "electron_helion_mass_ratio"), 1e-9},
		{"electron energy", electron * c * c, value(t, "electron_mass_energy"), 1e-10},
		{"proton energy", value(t, "m_p") * c * c, value(t, "proton_mass_energy"), 1e-10},
		{"neutron energy", value(t, "m_n") * c * c, value(t, "neutron_mass_energy"), 1e-10},
		{"deuteron energy", value(t, "deuteron_mass") * c * c, value(t, "deuteron_mass_energy"), 1e-10},
		{"helion energy", value(t, "helion_mass") * c * c, value(t, "helion_mass_energy"), 1e-10},
		{"alpha particle energy", value(t, "alpha_particle_mass") * c * c, value(t, "alpha_particle_mass_energy"), 1e-10},
		{"m_u energy", value(t, "m_u") * c * c, value(t, "atomic_mass_constant_energy"), 1e-10},
		{"M_u = N_A m_u", value(t, "N_A") * value(t, "m_u"), value(t, "M_u"), 1e-11},
		{"M(12C) = 12 M_u", 12 * value(t, "M_u"), value(t, "molar_mass_of_carbon_12"), 1e-11},
		{"planck mass", math.Sqrt(hbar * c / value(t, "G")), value(t, "planck_mass"), 1e-6},
		{"planck length", hbar / (value(t, "planck_mass") * c), value(t, "planck_length"), 1e-6},
		{"planck time", value(t, "planck_length") / c, value(t, "planck_time"), 1e-6},
		{"planck temperature", value(t, "planck_mass") * c * c / value(t, "k_B"), value(t, "planck_temperature"), 1e-6},
		{"Sackur-Tetrode", 2.5 + math.Log(math.Pow(2*math.Pi*value(t, "m_u")*value(t, "k_B")/(h*h), 1.5)*value(t, "k_B")/1e5), value(t, "sackur_tetrode_bar"), 1e-11},
	}
	for _, c := range cases {
		if math.Abs(c.got/c.want-1) > c.relative {
			t.Errorf("%s: %.12g against %.12g, apart by %.2g", c.name, c.got, c.want, c.got/c.want-1)
		}
	}
}

// TestTableIsSound asks of every constant what formulas and pages need.
func TestTableIsSound(t *testing.T) {
	seen := map[string]bool{}
	for _, constant := range Constants() {
		if constant.Name == "" || constant.Meaning == "" || constant.Unit == "" || constant.Source == "" {
			t.Errorf("%+v: something is not told", constant)
		}
		if seen[constant.Name] {
			t.Errorf("%s stands twice", constant.Name)
		}
		seen[constant.Name] = true
		// CODATA's least certain constant here is the electron-tau mass ratio.
		if relative := constant.Uncertainty / math.Abs(constant.Value); !(relative >= 0 && relative < 2e-4) {
			t.Errorf("%s: relative uncertainty %g", constant.Name, relative)
		}
		for _, letter := range constant.Name {
			if letter != '_' && digitOf(letter) < 0 && !isSmall(letter) && !isCapital(letter) {
				t.Errorf("%s: %q does not belong in a name", constant.Name, letter)
			}
		}
	}
	if len(seen) != 98 { // CODATA 2022 without the same quantity in other units, and pi
		t.Errorf("%d constants", len(seen))
	}
}
