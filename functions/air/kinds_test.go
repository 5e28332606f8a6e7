package air_test

import (
	"math"
	"testing"

	"plumbrule/engine/rows"
)

// Geopotential and geometric heights each give their own table, and what lies
// beyond is refused or stretched as the law says.
func TestKindsAndStates(t *testing.T) {
	c := catalogue(t)
	cases := []struct {
		formula string
		unit    string
		state   rows.State
		want    float64
		half    float64
		source  string
	}{
		{"standard_pressure(11000[gpm])", "Pa", rows.Sound, 22632, 0.5, "ICAO Doc 7488/3, by geopotential altitude"},
		{"standard_pressure(11000[m])", "hPa", rows.Sound, 226.99, 0.01, "U.S. Standard Atmosphere 1976, table I, by geometric altitude, cut off and not rounded"},
		{"icao_temperature(20000[gpm])", "K", rows.Sound, 216.65, 0.0005, "ICAO Doc 7488/3"},
		{"standard_density(500[km])", "kg/m^3", rows.Sound, 5.215e-13, 5e-17, "U.S. Standard Atmosphere 1976, table I"},
		{"standard_density(geopotential_height(500[km]))", "kg/m^3", rows.Sound, 5.215e-13, 5e-17, "U.S. Standard Atmosphere 1976, table I"},
		{"standard_density(1000[km])", "kg/m^3", rows.Sound, 3.561e-15, 5e-19, "U.S. Standard Atmosphere 1976, table I"},
		{"standard_temperature(-5[km])", "K", rows.Sound, 320.676, 0.0005, "U.S. Standard Atmosphere 1976, table I"},
		{formula: "standard_density(1000.1[km])", unit: "kg/m^3", state: rows.Refused},
		{formula: "standard_pressure(864.1[kgpm])", unit: "Pa", state: rows.Refused},
		{formula: "standard_temperature(-5.1[km])", unit: "K", state: rows.Refused},
		{formula: "standard_sound_speed(87[km])", unit: "m/s", state: rows.Refused},
		{formula: "standard_viscosity(87[km])", unit: "Pa s", state: rows.Refused},
		{formula: "standard_species_density(\"H\", 149[km])", unit: "m^-3", state: rows.Refused},
		{formula: "standard_species_density(\"O\", 85[km])", unit: "m^-3", state: rows.Refused},
		{formula: "icao_pressure(80.1[kgpm])", unit: "Pa", state: rows.Refused},
		{formula: "saturation_pressure_over_water(61[degC], method: \"WMO-No. 8\")", unit: "Pa", state: rows.Refused},
		{formula: "saturation_pressure_over_ice(1[degC])", unit: "Pa", state: rows.Refused},
		{formula: "world_pressure(\"Mars\", 5[km])", unit: "Pa", state: rows.Refused},
		{formula: "mixture_molar_mass(\"N2, O2\", [1, 2, 3])", unit: "g/mol", state: rows.Refused},
		{"geopotential_height(1100[km])", "kgpm", rows.Stretched, 6356.766 * 1100 / 7456.766, 1e-9, "equation 18"},
		{"gas_viscosity(\"N2\", 2000[K])", "uPa s", rows.Stretched, 1.663e1 * math.Pow(2000.0/273, 1.5) * 380 / 2107, 1e-9, "Sutherland's formula"},
	}
	for _, k := range cases {
		got, state, reason := value(t, c, k.unit, k.formula)
		if state != k.state {
			t.Errorf("%s is %v (%s), want %v", k.formula, state, reason, k.state)
		}
		if k.state.Computed() && !(math.Abs(got-k.want) <= k.half) {
			t.Errorf("%s = %v %s, want %v (%s)", k.formula, got, k.unit, k.want, k.source)
		}
	}
}
