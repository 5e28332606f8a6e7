package fluid

import (
	"math"
	"strings"
	"testing"

	"plumbrule/engine/law"
	"plumbrule/engine/unit"
	"plumbrule/functions/nature"
)

// loads are the laws whose numbers load a wall, breathing those of gases that
// people breathe, exact those that follow from definitions and balance alone and
// hold wherever they mean anything.
const (
	loads = " head_pressure pressure_at_depth depth_at_pressure stiff_liquid_pressure stiff_liquid_depth layered_pressure layered_depth " +
		"profile_liquid_pressure plate_force plate_centre wall_moment sea_pressure_at_depth sea_depth_at_pressure saunders_depth saunders_pressure " +
		"sea_column_pressure sea_column_depth sea_height_teos sea_pressure_teos water_saturation_pressure water_boiling_temperature ice_melting_pressure " +
		"water_density water_enthalpy water_internal_energy water_entropy water_heat_capacity water_sound_speed " +
		"steam_density steam_enthalpy steam_internal_energy steam_entropy steam_heat_capacity steam_sound_speed " +
		"thick_cylinder_stress thin_cylinder_stress sphere_stress thick_cylinder_wall sphere_wall cylinder_buckling_pressure sphere_buckling_pressure "
	breathing = " gas_partial_pressure depth_for_partial_pressure breathing_gas_density equivalent_air_depth "
	exact     = " head_pressure pressure_at_depth depth_at_pressure absolute gauge stiff_liquid_pressure stiff_liquid_depth layered_pressure layered_depth " +
		"profile_liquid_pressure manometer_difference plate_force plate_centre wall_moment buoyant_force net_buoyancy ballast_for_neutral floating_fraction weighed_density " +
		"conventional_mass mass_of_conventional thick_cylinder_stress thin_cylinder_stress sphere_stress thick_cylinder_wall sphere_wall depth_for_partial_pressure "
)

// TestCatalogue asks of every law what pages and checks need.
func TestCatalogue(t *testing.T) {
	if _, err := law.NewCatalogue(Laws(), nature.Constants()); err != nil {
		t.Fatal(err)
	}
	for _, l := range Laws() {
		if l.Group != "fluid" || l.Equation == "" || len(l.Examples) == 0 || l.Body == nil || l.Result.Unit == "" {
			t.Errorf("%s is not fully told", l.Name)
		}
		if strings.HasSuffix(l.Gives, ".") || strings.HasSuffix(l.Equation, ".") {
			t.Errorf("%s: a line of its own ends without a full stop", l.Name)
		}
		if cautioned := strings.Contains(l.Caution, law.CautionPressure); cautioned != strings.Contains(loads, " "+l.Name+" ") {
			t.Errorf("%s: caution of pressure: %v", l.Name, cautioned)
		}
		if cautioned := strings.Contains(l.Caution, law.CautionDiving); cautioned != strings.Contains(breathing, " "+l.Name+" ") {
			t.Errorf("%s: caution of diving: %v", l.Name, cautioned)
		}
		optional, bounded := false, false
		for _, p := range l.Parameters {
			bounded = bounded || p.Valid.Bounded()
			if p.Name == "" || p.Meaning == "" || p.Type != law.Text && p.Unit == "" {
				t.Errorf("%s: parameter %q is not fully told", l.Name, p.Name)
			}
			if optional && !p.Optional() {
				t.Errorf("%s: %s must stand before the optional ones", l.Name, p.Name)
			}
			optional = optional || p.Optional()
			if p.Valid.HasLow && !p.Valid.LowOpen && p.Finite.TooLow(p.Valid.Low) || p.Valid.HasHigh && !p.Valid.HighIsOpen && p.Finite.TooHigh(p.Valid.High) {
				t.Errorf("%s: %s is valid where it is refused", l.Name, p.Name)
			}
			if p.Type == law.Text && len(p.Choices) == 0 && p.CheckText == nil {
				t.Errorf("%s: %s takes any text", l.Name, p.Name)
			}
		}
		if !bounded && !strings.Contains(exact, " "+l.Name+" ") {
			t.Errorf("%s: fitted to measurements, yet without a range", l.Name)
		}
	}
}

// usualSpans are where parameters without bounds on both sides are tried, in
// coherent SI units by the parameter's unit.
var usualSpans = map[string][2]float64{
	"m": {0.5, 40}, "m^3": {0.1, 3}, "kg": {1, 900}, "kg/m^3": {700, 9000}, "m/s^2": {9.7, 9.9},
	"Pa(a)": {2e5, 5e6}, "Pa(g)": {1e4, 5e6}, "MPa(a)": {1e5, 5e6}, "dbar(g)": {0, 1e8},
	"mm": {0.7, 0.8}, "MPa(g)": {0, 9e6}, "GPa": {2e9, 3e9}, "bar(a)": {1e5, 3e6},
}

// spans are where a parameter of one law is tried, where its own range or the
// usual span will not do.
var spans = map[string][2]float64{
	"thick_cylinder_stress inner_radius": {0.05, 0.06}, "thick_cylinder_stress outer_radius": {0.08, 0.09}, "thick_cylinder_stress radius": {0.06, 0.08},
	"sphere_stress inner_radius": {0.05, 0.06}, "sphere_stress outer_radius": {0.08, 0.09}, "sphere_stress radius": {0.06, 0.08},
	"thick_cylinder_wall stress": {2e8, 3e8}, "sphere_wall stress": {2e8, 3e8},
	"thin_cylinder_stress wall": {0.004, 0.02}, "thin_cylinder_stress radius": {0.2, 0.3},
	"cylinder_buckling_pressure wall": {0.004, 0.02}, "cylinder_buckling_pressure radius": {0.2, 0.3}, "cylinder_buckling_pressure length": {0.3, 30},
	"sphere_buckling_pressure wall": {0.004, 0.02}, "sphere_buckling_pressure radius": {0.2, 0.3},
	"breathing_gas_density oxygen": {0.1, 0.4}, "breathing_gas_density helium": {0.1, 0.6},
	"depth_for_partial_pressure partial_pressure": {1.2e5, 1.6e5}, "depth_for_partial_pressure fraction": {0.1, 0.4}, "depth_for_partial_pressure surface_pressure": {0.8e5, 1.1e5},
	"weighed_density in_liquid":           {0.01, 0.5},
	"stiff_liquid_depth surface_pressure": {1e4, 1e5}, "stiff_liquid_depth pressure": {2e5, 1e8},
	"depth_at_pressure surface_pressure": {1e4, 1e5}, "layered_depth surface_pressure": {1e4, 1e5}, "layered_depth pressure": {1e5, 2e5},
	"floating_fraction object_density": {200, 800}, "floating_fraction fluid_density": {800, 1100},
	"ballast_for_neutral fluid_density": {800, 1100}, "ballast_for_neutral ballast_density": {2000, 9000},
	"moist_air_density humidity": {0, 1}, "depth_at_pressure pressure": {2e5, 9e7},
	"water_density pressure":        {4e6, 1e8},
	"profile_liquid_pressure depth": {0, 20}, "profile_liquid_pressure depths": {0, 100},
	"sea_column_pressure depth": {0, 2000}, "sea_column_pressure depths": {0, 6000}, "sea_column_depth sea_pressure": {0, 2e7}, "sea_column_depth depths": {0, 6000},
}

// spanOf gives where a parameter is tried.
func spanOf(t *testing.T, l *law.Law, p *law.Parameter) [2]float64 {
	t.Helper()
	if span, ok := spans[l.Name+" "+p.Name]; ok {
		return span
	}
	if strings.HasPrefix(l.Name, "steam_") && p.Name == "pressure" {
		return [2]float64{100, 600} // below saturation at every temperature
	}
	u, err := unit.Parse(p.Unit)
	if err != nil {
		t.Fatalf("%s: unit %s: %v", l.Name, p.Unit, err)
	}
	for _, r := range []law.Range{p.Valid, p.Finite} {
		if r.HasLow && r.HasHigh {
			return [2]float64{u.ToSI(r.Low), u.ToSI(r.High)}
		}
	}
	span, ok := usualSpans[p.Unit]
	if !ok {
		t.Fatalf("%s: no span for %s in %s", l.Name, p.Name, p.Unit)
	}
	return span
}

// TestShapes runs every body with columns, single numbers and mixtures, lists
// with items of one number and of a column: the same bits must come out, row by
// row, and numbers everywhere within the laws' ranges.
func TestShapes(t *testing.T) {
	const rows, items = 9, 4
	for _, l := range Laws() {
		texts := [][]string{nil}
		varying := []int{}
		for j, p := range l.Parameters {
			if p.Type != law.Text {
				varying = append(varying, j)
				continue
			}
			var longer [][]string
			for _, before := range texts {
				for _, choice := range p.Choices {
					longer = append(longer, append(append([]string(nil), before...), choice))
				}
			}
			texts = longer
		}
		masks := min(1<<len(varying), 32)
		answered, refused := 0, 0
		for _, chosen := range texts {
			for mask := range masks {
				arguments := make([]law.Argument, len(l.Parameters))
				next := 0
				for j := range l.Parameters {
					p := &l.Parameters[j]
					if p.Type == law.Text {
						arguments[j].Text = chosen[next]
						next++
						continue
					}
					bounds := spanOf(t, l, p)
					count := 1
					if mask>>(j%5)&1 == 1 {
						count = rows
					}
					// out of step between the arguments
					at := func(i int) float64 {
						return bounds[0] + float64((i*(j+2)+j)%rows)/(rows-1)*(bounds[1]-bounds[0])
					}
					if p.Type == law.List {
						arguments[j].Items = make([]law.Argument, items)
						for k := range items {
							for i := range count {
								low := bounds[0] + (bounds[1]-bounds[0])*float64(k)/items
								arguments[j].Items[k].Values = append(arguments[j].Items[k].Values, low+(at(i)-bounds[0])/items/2)
							}
						}
						continue
					}
					for i := range count {
						arguments[j].Values = append(arguments[j].Values, at(i))
					}
				}
				dst := make([]float64, rows)
				l.Body(dst, arguments, &law.Work{})
				for i := range dst {
					alone := []float64{0}
					l.Body(alone, rowOf(arguments, i), &law.Work{})
					same := math.Float64bits(alone[0]) == math.Float64bits(dst[i]) || math.IsNaN(alone[0]) && math.IsNaN(dst[i])
					if math.IsNaN(dst[i]) {
						refused++
					} else {
						answered++
					}
					if math.IsNaN(dst[i]) && l.Refusal == "" || math.IsInf(dst[i], 0) || !same {
						t.Fatalf("%s %v, shape %b, row %d: %v alone, %v in a block, of %v", l.Name, chosen, mask, i, alone[0], dst[i], rowOf(arguments, i))
					}
				}
			}
		}
		if answered < refused {
			t.Errorf("%s refuses %d rows and answers %d: its spans say little", l.Name, refused, answered)
		}
	}
}

// rowOf gives one row of a call's arguments.
func rowOf(arguments []law.Argument, i int) []law.Argument {
	row := make([]law.Argument, len(arguments))
	for j := range arguments {
		row[j].Text = arguments[j].Text
		if arguments[j].Items != nil {
			row[j].Items = rowOf(arguments[j].Items, i)
		} else if arguments[j].Values != nil {
			row[j].Values = []float64{arguments[j].At(i)}
		}
	}
	return row
}

// TestBadArguments runs every body with numbers that no law can take: none
// panics, hangs or allocates for each row.
func TestBadArguments(t *testing.T) {
	bad := []float64{math.NaN(), math.Inf(1), math.Inf(-1), 0, -1, 1, 1e-300, 1e300, -1e300, math.MaxFloat64, 273.15, 1e5}
	const rows = 1024
	for _, l := range Laws() {
		arguments := make([]law.Argument, len(l.Parameters))
		for j := range l.Parameters {
			p := &l.Parameters[j]
			column := make([]float64, rows)
			for i := range column {
				column[i] = bad[(i*(2*j+1)+i/len(bad)*j)%len(bad)]
			}
			switch p.Type {
			case law.Text:
				arguments[j].Text = p.Choices[len(p.Choices)-1]
			case law.List:
				arguments[j].Items = []law.Argument{{Values: column}, {Values: bad[3:4]}, {Values: column}}
			default:
				arguments[j].Values = column
			}
		}
		dst, work := make([]float64, rows), &law.Work{}
		if allocations := testing.AllocsPerRun(2, func() { l.Body(dst, arguments, work) }); allocations > 4 {
			t.Errorf("%s allocates %v times for %d rows", l.Name, allocations, rows)
		}
		for j := range arguments {
			arguments[j].Items = nil // an empty list
		}
		l.Body(dst, arguments, work)
		// A text that is no choice never gets here, but must not hurt.
		for j := range arguments {
			if l.Parameters[j].Type == law.Text {
				arguments[j].Text = "nothing"
			}
		}
		l.Body(dst, arguments, work)
	}
}
