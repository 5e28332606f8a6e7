package unit

func electricUnits() []definition {
	const gaussian = "the SI unit that corresponds to the one of the CGS systems"
	return []definition{
		{symbol: "Ah", name: "ampere hour", number: "1", of: "A h", source: guide, prefixes: true},
		{symbol: "G", name: "gauss", number: "1e-4", of: "T", source: guide, prefixes: true, aliases: "gauss", note: gaussian},
		{symbol: "gamma", name: "gamma", number: "1e-9", of: "T", source: guide},
		{symbol: "Mx", name: "maxwell", number: "1e-8", of: "Wb", source: guide, aliases: "maxwell", note: gaussian},
		{symbol: "Oe", name: "oersted", number: "250/pi", of: "A/m", source: guide, prefixes: true, aliases: "oersted", note: gaussian},
		{symbol: "Gi", name: "gilbert", number: "2.5/pi", of: "A", source: guide, aliases: "gilbert", note: gaussian},
		{symbol: "Bi", name: "biot", number: "10", of: "A", source: guide, aliases: "biot"},
		{symbol: "mho", name: "mho", number: "1", of: "S", source: guide, prefixes: true, aliases: "℧"},
		{symbol: "abA", name: "abampere", number: "10", of: "A", source: guide},
		{symbol: "abC", name: "abcoulomb", number: "10", of: "C", source: guide},
		{symbol: "abF", name: "abfarad", number: "1e9", of: "F", source: guide},
		{symbol: "abH", name: "abhenry", number: "1e-9", of: "H", source: guide},
		{symbol: "abS", name: "absiemens", number: "1e9", of: "S", source: guide, aliases: "abmho"},
		{symbol: "abohm", name: "abohm", number: "1e-9", of: "Ω", source: guide, aliases: "abΩ"},
		{symbol: "abV", name: "abvolt", number: "1e-8", of: "V", source: guide},
		{symbol: "statA", name: "statampere", number: "0.1/299792458", of: "A", source: guide},
		{symbol: "statC", name: "statcoulomb", number: "0.1/299792458", of: "C", source: guide, aliases: "Fr esu", note: "also the franklin"},
		{symbol: "statF", name: "statfarad", number: "1e5/299792458 299792458", of: "F", source: guide},
		{symbol: "statH", name: "stathenry", number: "299792458 299792458 1e-5", of: "H", source: guide},
		{symbol: "statS", name: "statsiemens", number: "1e5/299792458 299792458", of: "S", source: guide, aliases: "statmho"},
		{symbol: "statohm", name: "statohm", number: "299792458 299792458 1e-5", of: "Ω", source: guide, aliases: "statΩ"},
		{symbol: "statV", name: "statvolt", number: "299.792458", of: "V", source: guide},
		{symbol: "unit_pole", name: "unit pole", number: "4 pi 1e-8", of: "Wb", source: guide},
		{symbol: "e", name: "elementary charge", number: "1.602176634e-19", of: "C", source: brochure},
		{symbol: "Fd", name: "faraday", number: "6.02214076e23", of: "e", source: brochure, aliases: "faraday",
			note: "the charge of a mole of electrons, exact since 2019"},
		{symbol: "D", name: "debye", number: "1e-21/299792458", of: "C m", source: guide, prefixes: true, aliases: "debye",
			note: "an electric dipole moment; the permeability is darcy"},
		{symbol: "mu_B", name: "Bohr magneton", number: "9.2740100657e-24", of: "J/T", source: constants, aliases: "µ_B μ_B",
			note: "measured: relative standard uncertainty 3.1e-10"},
		{symbol: "Jy", name: "jansky", number: "1e-26", of: "W/(m^2 Hz)", source: guide, prefixes: true, aliases: "jansky"},
		{symbol: "Td", name: "townsend", number: "1e-21", of: "V m^2", source: common},
	}
}

func lightUnits() []definition {
	return []definition{
		{symbol: "sb", name: "stilb", number: "1", of: "cd/cm^2", source: guide},
		{symbol: "ph", name: "phot", number: "1e4", of: "lx", source: guide},
		{symbol: "nit", name: "nit", number: "1", of: "cd/m^2", source: guide},
		{symbol: "Lb", name: "lambert", number: "1/pi", of: "cd/cm^2", source: guide, prefixes: true, aliases: "lambert"},
		{symbol: "ftL", name: "footlambert", number: "1/pi", of: "cd/ft^2", source: guide},
		{symbol: "ftc", name: "footcandle", number: "1", of: "lm/ft^2", source: guide},
	}
}

func radiationUnits() []definition {
	return []definition{
		{symbol: "Ci", name: "curie", number: "3.7e10", of: "Bq", source: guide, prefixes: true},
		{symbol: "rad_dose", name: "rad (absorbed dose)", number: "0.01", of: "Gy", source: guide, prefixes: true, note: "rad is the radian"},
		{symbol: "rem", name: "rem", number: "0.01", of: "Sv", source: guide, prefixes: true},
		{symbol: "roentgen", name: "roentgen", number: "2.58e-4", of: "C/kg", source: guide, prefixes: true, note: "R is refused: it is also the revolution and degR"},
	}
}
