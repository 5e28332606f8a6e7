package fluid

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// TestPublishedNumbers holds bodies against printed numbers, coherent SI units.
func TestPublishedNumbers(t *testing.T) {
	const (
		if97    = "IAPWS R7-97(2012), tables 5, 15, 35 and 36"
		release = "IAPWS R12-08 table 4, R1-76 table 1, R14-08 table 3, SR1-86"
		unesco  = "UNESCO 44, check values"
		teos    = "TEOS-10 documentation, examples"
	)
	cases := []struct {
		name       string
		arguments  []float64
		text       string // of a text argument, which stands behind the numbers
		want, half float64
		source     string
	}{
		{"water_density", []float64{300, 3e6}, "", 1 / 0.100215168e-2, 5e-6, if97},
		{"water_density", []float64{300, 80e6}, "", 1 / 0.971180894e-3, 6e-7, if97},
		{"water_enthalpy", []float64{500, 3e6}, "", 975542.239, 0.0005, if97},
		{"water_entropy", []float64{500, 3e6}, "", 2580.41912, 5e-6, if97},
		{"water_sound_speed", []float64{500, 3e6}, "", 1240.71337, 5e-6, if97},
		{"steam_enthalpy", []float64{300, 3500}, "", 2549911.45, 0.005, if97},
		{"steam_entropy", []float64{700, 30e6}, "", 5175.40298, 5e-6, if97},
		{"steam_internal_energy", []float64{700, 30e6}, "", 2468610.76, 0.005, if97},
		{"steam_sound_speed", []float64{700, 3500}, "", 644.289068, 5e-7, if97},
		{"water_saturation_pressure", []float64{500}, industrialEquation, 2.63889776e6, 5e-3, if97},
		{"water_saturation_pressure", []float64{373.1243}, auxiliaryEquation, 101325, 0.5, release},
		{"water_boiling_temperature", []float64{10e6}, "", 584.149488, 5e-7, if97},
		{"saturated_steam_density", []float64{273.16}, "", 0.00485426, 5e-9, release},
		{"water_viscosity", []float64{433.15, 1000}, "", 217.685358e-6, 5e-13, release},
		{"water_surface_tension", []float64{313.15}, "", 69.60e-3, 5e-6, release},
		{"ice_saturation_pressure", []float64{230}, "", 8.94735, 5e-6, release},
		{"ice_melting_pressure", []float64{260}, "", 138.268e6, 500, release},
		{"kell_water_density", []float64{423.15}, scaleIPTS68, 916.829, 5e-4, "Kell 1975"},
		{"sea_sound_speed", []float64{40, 313.15, 1e8}, scaleIPTS68, 1731.995, 5e-4, unesco},
		{"sea_freezing_temperature", []float64{40, 5e6}, scaleIPTS68, 273.15 - 2.588567, 5e-7, unesco},
		{"sea_heat_capacity", []float64{35, 303.15, 1e8}, scaleIPTS68, 3844.3, 0.05, unesco},
		{"sea_lapse_rate", []float64{40, 313.15, 1e8}, scaleIPTS68, 3.255976e-8, 5e-15, unesco},
		{"sea_potential_temperature", []float64{40, 313.15, 1e8, 0}, scaleIPTS68, 273.15 + 36.89073, 5e-6, unesco},
		{"saunders_pressure", []float64{7321.45, 30 * degree}, "", 7500.004e4, 30, "Saunders 1981"},
		{"conservative_temperature", []float64{34.7324e-3, 277.5536, 1e7}, "", 273.15 + 4.323575749, 5e-10, teos},
		{"sea_water_density_teos", []float64{34.7324e-3, 277.4736, 1e7}, "", 1032.002453225, 5e-10, teos},
		{"sea_height_teos", []float64{1e7, 4 * degree}, "", -992.091906072, 5e-10, teos},
		{"sea_pressure_teos", []float64{-1000, 4 * degree}, "", 1007.99033769e4, 5e-5, teos},
		{"mercury_density", []float64{293.15, 101325}, "", 13545.87, 0.005, "Bigg 1964"},
		{"stiff_liquid_pressure", []float64{0, 1e5, 1000, 2e9, 10}, "", 2e9 * math.Ln2, 1e-5, "closed form"},
		{"wall_moment", []float64{1, 3, 1000, 10}, "", 45000, 1e-9, "closed form"},
	}
	for _, c := range cases {
		arguments := numbers(c.arguments...)
		if c.text != "" {
			arguments = append(arguments, textOf(c.text))
		}
		near(t, c.name, one(t, c.name, arguments...), c.want, c.half, c.source)
	}
}

// TestRegionsAgree holds the regions of IAPWS-IF97 against each other: what is
// written out for speed against the sums, and the Gibbs energies of liquid and
// steam on the saturation curve, which a perfect formulation makes equal.
func TestRegionsAgree(t *testing.T) {
	for kelvin := 273.15; kelvin <= 623.15; kelvin += 2.5 {
		saturated := saturationPressure(kelvin)
		for _, pressure := range []float64{saturated, 1.01 * saturated, 2e7, 6e7, 1e8, 1.2e8} {
			if pressure < saturated {
				continue
			}
			g := liquidGibbs(kelvin, pressure)
			sums := liquidPressure / (steamGasConstant * kelvin * g.p)
			if written := liquidDensity(kelvin, pressure); !(math.Abs(written/sums-1) < 1e-13) {
				t.Errorf("%g K, %g Pa: %v written out, %v as sums", kelvin, pressure, written, sums)
			}
		}
		liquid, steam := liquidGibbs(kelvin, saturated), steamGibbs(kelvin, saturated)
		apart := steamGasConstant * kelvin * (liquid.value - steam.value - math.Log(saturated/steamPressure))
		if math.Abs(apart) > 15 { // J/kg
			t.Errorf("%g K: Gibbs energies %g J/kg apart", kelvin, apart)
		}
	}
	if math.Abs(boundaryPressure(623.15)/saturationPressure(623.15)-1) > 1e-5 {
		t.Error("the boundary of region 3 does not begin on the saturation curve")
	}
	// Liquid is refused below saturation and steam above it, and on the curve
	// both have a density.
	for _, kelvin := range []float64{280, 373.124, 500, 620} {
		p := saturationPressure(kelvin)
		for name, at := range map[string]float64{"water_density": 0.999 * p, "steam_density": 1.001 * p} {
			if got := one(t, name, numbers(kelvin, at)...); !math.IsNaN(got) {
				t.Errorf("%s beyond saturation at %g K: %v", name, kelvin, got)
			}
			if got := one(t, name, numbers(kelvin, p)...); math.IsNaN(got) {
				t.Errorf("%s at saturation at %g K: none", name, kelvin)
			}
		}
	}
}

// TestSeaEquationsAgree holds the equations of 1980 and of 2010 against each
// other in the open ocean: density within 0.025 kg/m^3, sound within 1 m/s, depth
// within 0.7 m down to 8000 dbar, and the polynomial of 75 terms within its fit
// to the Gibbs function.
func TestSeaEquationsAgree(t *testing.T) {
	for _, practical := range []float64{33, 35, 37} {
		for celsius := 0.0; celsius <= 30; celsius += 5 {
			for decibar := 0.0; decibar <= 8000; decibar += 1000 {
				if celsius > 5 && decibar > 3000 {
					continue // no ocean is so
				}
				absolute, kelvin, pascal := practical*saltPerPractical, celsius+273.15, decibar*1e4
				g := seaGibbsAt(absolute, kelvin, pascal)
				old := seaDensity(t, practical, celsius, decibar/10, scaleITS90)
				near(t, "density of 1980 and 2010", old, 1/g.p, 0.025, "TEOS-10 manual, appendix K")
				conservative := conservativeTemperature(absolute, kelvin, pascal)
				fitted := one(t, "sea_water_density_teos", numbers(absolute, conservative, pascal)...)
				near(t, "75 terms and Gibbs function", fitted, 1/g.p, 0.003, "Roquet et al. 2015")
				sound := one(t, "sea_sound_speed", append(numbers(practical, kelvin, pascal), textOf(scaleITS90))...)
				near(t, "sound of 1977 and 2008", sound, gibbsSoundSpeed(g, 0), 1, "the caution of sea_sound_speed")
			}
		}
	}
	for k, z := range []float64{0, 0.1, 0.5, 0.8, 1.2} {
		fitted := seaSpecificVolume(35.16504, 0, z*1e4)
		near(t, "volume of the standard ocean", standardVolumeAt(z)/fitted, 1, 4e-16, "the same polynomial")
		if z > 0.8 {
			continue
		}
		depth := -teosHeight(z*1e8, float64(k)*0.3)
		near(t, "depth of 2010 and 1980", depth, seaDepth(z*1e4, surfaceGravity(float64(k)*0.3)), 0.7, "UNESCO 44")
	}
}

// TestWalls holds the stresses in walls against what they must be at the
// surfaces, and thick walls against thin ones.
func TestWalls(t *testing.T) {
	const inside, outside = 3e6, 60e6
	for _, inner := range []float64{0.01, 0.05, 0.0999} {
		const outer = 0.1
		for _, component := range []string{hoopStress, radialStress, equivalentStress} {
			for _, shape := range []string{"thick_cylinder_stress", "sphere_stress"} {
				at := func(radius float64) float64 {
					return one(t, shape, append(numbers(inner, outer, inside, outside, radius), textOf(component))...)
				}
				switch component {
				case radialStress:
					near(t, shape+" at the inner surface", at(inner), -inside, 1e-6*outside, "boundary condition")
					near(t, shape+" at the outer surface", at(outer), -outside, 1e-6*outside, "boundary condition")
				case equivalentStress:
					if !(at(inner) > at(outer)) {
						t.Errorf("%s: the inner surface is not the one loaded most", shape)
					}
				}
				for _, radius := range []float64{inner * 0.99, outer * 1.01, 0} {
					if !math.IsNaN(at(radius)) {
						t.Errorf("%s outside of the wall: %v", shape, at(radius))
					}
				}
			}
		}
		// Force balance of the cut tube: the hoop stress summed over the wall is
		// p_i r_i - p_o r_o (Simpson's rule).
		const n = 2000
		sum := 0.0
		for k := 0; k <= n; k++ {
			weight := 2.0 + 2*float64(k&1)
			if k == 0 || k == n {
				weight = 1
			}
			radius := inner + (outer-inner)*float64(k)/n
			sum += weight * cylinderStress(inner, outer, inside, outside, math.Min(radius, outer), hoopStress)
		}
		near(t, "force on the cut", sum*(outer-inner)/n/3, inside*inner-outside*outer, 1e-6*outside*outer, "equilibrium")
	}
	thick := one(t, "thick_cylinder_stress", append(numbers(0.9995, 1.0005, 1e6, 0, 1), textOf(hoopStress))...)
	thin := one(t, "thin_cylinder_stress", append(numbers(1, 0.001, 1e6), textOf(hoopStress))...)
	near(t, "thin and thick tube", thick/thin, 1, 1.1e-3, "limit of a thin wall")
	// The wall that is asked for bears just what it may.
	for _, pressure := range []float64{1e6, 30e6, 110e6} {
		wall := one(t, "thick_cylinder_wall", numbers(0.1, pressure, 4e8)...)
		near(t, "stress in the tube asked for", cylinderStress(0.1, 0.1+wall, 0, pressure, 0.1, equivalentStress), 4e8, 4e8*1e-12*4e8/pressure, "inverse")
		wall = one(t, "sphere_wall", numbers(0.1, pressure, 4e8)...)
		near(t, "stress in the sphere asked for", sphereStress(0.1, 0.1+wall, 0, pressure, 0.1, equivalentStress), 4e8, 4e8*1e-12*4e8/pressure, "inverse")
	}
	if !math.IsNaN(one(t, "thick_cylinder_wall", numbers(0.1, 2.4e8, 4e8)...)) {
		t.Error("a wall for a pressure that no wall stands")
	}
}

// TestBuckling holds the two formulas for tubes against each other where both
// mean to hold, and against the long tube's closed form.
func TestBuckling(t *testing.T) {
	for _, slender := range []float64{0.002, 0.005, 0.01} { // wall/diameter
		for _, long := range []float64{0.5, 1, 2} { // length/diameter
			both := func(equation string) float64 {
				return one(t, "cylinder_buckling_pressure", append(numbers(0.5, slender, long, 2e11, 0.3), textOf(equation))...)
			}
			// Windenburg and Trilling put 1934 their formula within some per
			// cent of von Mises's.
			if ratio := both(windenburgTrilling) / both(vonMises); !(ratio > 0.9 && ratio < 1.1) {
				t.Errorf("w/D = %g, L/D = %g: the short formula gives %g of von Mises's", slender, long, ratio)
			}
		}
	}
	tube := one(t, "cylinder_buckling_pressure", append(numbers(1, 0.01, 1e6, 2e11, 0.3), textOf(vonMises))...)
	near(t, "long tube", tube/(2e11*1e-6/(4*0.91)), 1, 1e-6, "Timoshenko & Gere, section 7.5")
	for what, got := range map[string]float64{
		"thick wall":  one(t, "cylinder_buckling_pressure", append(numbers(1, 0.6, 2, 2e11, 0.3), textOf(vonMises))...),
		"short tube":  one(t, "cylinder_buckling_pressure", append(numbers(1, 0.02, 0.01, 2e11, 0.3), textOf(windenburgTrilling))...),
		"thick shell": one(t, "sphere_buckling_pressure", numbers(1, 0.6, 2e11, 0.3, 1)...),
	} {
		if !math.IsNaN(got) {
			t.Errorf("%s: %v", what, got)
		}
	}
}

// TestAirAndWeighing holds moist air against the approximation of legal
// metrology, whose stated uncertainty is 2e-4, and against ideal gas.
func TestAirAndWeighing(t *testing.T) {
	for pressure := 9e4; pressure <= 1.1e5; pressure += 5e3 {
		for celsius := 15.0; celsius <= 27; celsius += 3 {
			for humidity := 0.0; humidity <= 0.8; humidity += 0.2 {
				full := one(t, "moist_air_density", numbers(pressure, celsius+273.15, humidity, 0.0004)...)
				short := one(t, "oiml_air_density", numbers(pressure, celsius+273.15, humidity)...)
				near(t, "approximation", short/full, 1, 2.5e-4, "OIML R 111-1 annex E")
			}
		}
	}
	thin := one(t, "moist_air_density", numbers(1, 293.15, 0, 0.0004)...)
	near(t, "thin dry air", thin, 28.96546e-3/(8.314472*293.15), 1e-13, "ideal gas")
	if !math.IsNaN(one(t, "moist_air_density", numbers(1, 293.15, 0.5, 0.0004)...)) {
		t.Error("more vapour than air pressure")
	}
	for _, name := range []string{"balance_reading", "buoyancy_corrected_mass"} {
		if !math.IsNaN(one(t, name, numbers(1, 1.2, 0.18, 8000)...)) {
			t.Errorf("%s: a balloon is weighed", name)
		}
	}
}

// TestPlates holds the centre of pressure against moments summed over strips.
func TestPlates(t *testing.T) {
	for _, p := range plates {
		for _, c := range [][3]float64{{0, 90, 0}, {2, 90, 3e4}, {1, 30, 0}, {4, 60, 1e5}} {
			const width, length, density, gravity = 1.3, 2.1, 1025.0, 9.81
			sine := math.Sin(c[1] * degree)
			force, moment := 0.0, 0.0
			const strips = 200000
			for k := range strips {
				share := (float64(k) + 0.5) / strips
				chord := width
				switch p.name {
				case "ellipse":
					chord = width * 2 * math.Sqrt(share*(1-share))
				case "triangle point up":
					chord = width * share
				case "triangle point down":
					chord = width * (1 - share)
				}
				depth := c[0] + share*length*sine
				push := (c[2] + density*gravity*depth) * chord * length / strips
				force += push
				moment += push * depth
			}
			arguments := append([]law.Argument{textOf(p.name)}, numbers(width, length, c[0], density, c[1]*degree, c[2], gravity)...)
			near(t, p.name+" force", one(t, "plate_force", arguments...)/force, 1, 1e-7, "summed over strips")
			near(t, p.name+" centre", one(t, "plate_centre", arguments...)/(moment/force), 1, 1e-7, "summed over strips")
		}
	}
}
