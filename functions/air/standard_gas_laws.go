package air

import "plumbrule/engine/law"

// standardGasLaws are the standard's derived quantities.
func standardGasLaws() []*law.Law {
	one := func(name, gives string, altitude law.Parameter, unit, equation, source, caution string, body func(float64) float64, examples ...law.Example) *law.Law {
		return &law.Law{
			Name: "standard_" + name, Group: group, Gives: gives + " of the U.S. Standard Atmosphere 1976",
			Parameters: []law.Parameter{altitude}, Result: law.Result{Unit: unit}, Equation: equation,
			Source: standardSource + ", " + source, Caution: caution, Examples: examples, Body: law.Of1(body),
		}
	}
	return []*law.Law{
		one("kinematic_viscosity", "the kinematic viscosity", altitudeInLowerPart(), "m^2/s",
			"eta = mu/rho", "equation 52", standardCaution, standardKinematicViscosity,
			law.Example{Formula: "standard_kinematic_viscosity(0[m])", Gives: "1.4607e-5 m^2/s"}),
		one("conductivity", "the thermal conductivity", altitudeInLowerPart(), "W/(m K)",
			"k_t = 2.64638e-3 T^1.5/(T + 245.4 10^(-12/T)), T in K", "equation 53",
			"Of air in bulk: where the mean free path is no longer small against the gap, less heat passes and it goes with pressure.", standardConductivity,
			law.Example{Formula: "standard_conductivity(0[m])", Gives: "2.5326e-2 W/(m K)"}),
		one("number_density", "the number of particles in a volume", altitudeInStandard(), "m^-3",
			"N = N_A P/(R* T), N_A = 6.022169e26 kmol^-1; above 86 km N = sum(n_i), the n_i "+upperEquations, "equations 33c and 36", standardCaution, standardNumberDensity,
			law.Example{Formula: "standard_number_density(0[m])", Gives: "2.5470e25 m^-3"},
			law.Example{Formula: "standard_number_density(90[km])", Gives: "7.116e19 m^-3"}),
		one("mean_free_path", "the mean free path of the particles", altitudeInStandard(), "m",
			"L = 1/(sqrt(2) pi sigma^2 N), sigma = 3.65e-10 m", "equation 44",
			"Of hard spheres of one diameter: real molecules differ, atoms and ions aloft by more.", standardMeanFreePath,
			law.Example{Formula: "standard_mean_free_path(0[m])", Gives: "6.6332e-8 m"}),
		one("collision_rate", "how often a particle meets another", altitudeInStandard(), "s^-1",
			"nu = V/L; V mean particle speed, L mean free path", "equation 46",
			"Of hard spheres of one diameter: real molecules differ, atoms and ions aloft by more.", standardCollisionRate,
			law.Example{Formula: "standard_collision_rate(0[m])", Gives: "6.9189e9 s^-1"}),
		one("particle_speed", "the mean speed of the particles", altitudeInStandard(), "m/s",
			"V = sqrt(8 R* T/(pi M))", "equation 43", standardCaution, standardParticleSpeed,
			law.Example{Formula: "standard_particle_speed(0[m])", Gives: "458.94 m/s"}),
		one("scale_height", "the pressure scale height", altitudeInStandard(), "m",
			"H_P = R* T/(g M)", "equation 40", standardCaution, standardScaleHeight,
			law.Example{Formula: "standard_scale_height(0[m])", Gives: "8434.5 m"}),
		one("molar_mass", "the mean molar mass", altitudeInStandard(), "kg/kmol",
			"M = 28.9644 kg/kmol below 80 km, to 86 km by the standard's table, linear in geometric altitude; above M = sum(n_i M_i)/sum(n_i), the n_i "+upperEquations,
			"equation 20, tables 3 and 8", standardCaution, standardMolarMassAt,
			law.Example{Formula: "standard_molar_mass(0[m])", Gives: "28.9644 kg/kmol"},
			law.Example{Formula: "standard_molar_mass(800[km])", Gives: "5.543 kg/kmol"}),
		one("gravity", "the acceleration of gravity", altitudeInStandard(), "m/s^2",
			"g = g0 (r0/(r0 + z))^2, g0 = 9.80665 m/s^2, r0 = 6356766 m, z geometric altitude", "equation 17",
			"An inverse square that fits latitude 45.54 deg: at the ground gravity differs by up to 0.3 % from equator to pole.", standardGravityAt,
			law.Example{Formula: "standard_gravity(0[m])", Gives: "9.80665 m/s^2"},
			law.Example{Formula: "standard_gravity(86[km])", Gives: "9.5466 m/s^2"}),
		speciesDensityLaw,
	}
}

var speciesDensityLaw = &law.Law{
	Name:  "standard_species_density",
	Group: group,
	Gives: "the number density of one gas in the upper part of the U.S. Standard Atmosphere 1976",
	Parameters: []law.Parameter{
		{Name: "species", Meaning: "the gas", Type: law.Text, Choices: []string{"N2", "O", "O2", "Ar", "He", "H"}},
		altitudeWithin(lowestSpecies, topGeopotential, "86 km to 1000 km geometric"),
	},
	Result: law.Result{Unit: "m^-3"},
	Equation: "n_i = n_i,7 (T_7/T) exp(-integral from 86 km to z of (f_i + v_i) dz), f_i = (g/(R* T)) (D_i/(D_i + K)) (M_i + M K/D_i + (alpha_i R*/g) dT/dz), " +
		"v_i = Q_i (z - U_i)^2 exp(-W_i (z - U_i)^3) + q_i (u_i - z)^2 exp(-w_i (u_i - z)^3); for N2 D = 0 up to 100 km, K = 0 above; " +
		"for H n = [n_11 - integral from 500 km to z of (phi/D) (T/T_11)^(1 + alpha) e^tau dz] (T_11/T)^(1 + alpha) e^-tau, tau = integral from 500 km to z of g M/(R* T) dz, phi = 0 above 500 km; " +
		"constants of the standard's tables 3, 6, 7 and 9",
	Source:  standardSource + ", equations 32 to 39",
	Caution: standardCaution + " The printed tables carry the rounding of their own numerical integration: they differ from the exact solution by up to 1.2 units of the fourth digit.",
	Refusal: "the standard gives hydrogen from 150 km upwards only",
	Examples: []law.Example{
		{Formula: `standard_species_density("O", 86[km])`, Gives: "8.600e16 m^-3"},
		{Formula: `standard_species_density("N2", 91[km])`, Gives: "4.643e19 m^-3"},
	},
	Body: func(dst []float64, arguments []law.Argument, _ *law.Work) {
		gas := 0
		for i := range upperGasTable {
			if upperGasTable[i].name == arguments[0].Text {
				gas = i
			}
		}
		altitude := &arguments[1]
		for i := range dst {
			dst[i] = speciesDensity(gas, altitude.At(i))
		}
	},
}
