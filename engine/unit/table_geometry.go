package unit

func lengthUnits() []definition {
	return []definition{
		{symbol: "Å", name: "ångström", number: "1e-10", of: "m", source: guide, aliases: "\u212b angstrom Angstrom"},
		{symbol: "fermi", name: "fermi", number: "1e-15", of: "m", source: guide},
		{symbol: "micron", name: "micron", number: "1e-6", of: "m", source: guide},
		{symbol: "xu", name: "X unit", number: "1.002e-13", of: "m", source: guide, note: "rounded"},
		{symbol: "a_0", name: "bohr", number: "5.29177210544e-11", of: "m", source: constants, aliases: "bohr",
			note: "measured: relative standard uncertainty 1.6e-10"},
		{symbol: "in", name: "inch", number: "0.0254", of: "m", source: milesOfYards},
		{symbol: "uin", name: "microinch", number: "1e-6", of: "in", source: guide, aliases: "µin μin"},
		{symbol: "mil", name: "mil", number: "0.001", of: "in", source: guide, aliases: "thou"},
		{symbol: "hand", name: "hand", number: "4", of: "in", source: common},
		{symbol: "ft", name: "foot", number: "0.3048", of: "m", source: milesOfYards},
		{symbol: "yd", name: "yard", number: "0.9144", of: "m", source: milesOfYards},
		{symbol: "mi", name: "mile", number: "5280", of: "ft", source: milesOfYards},
		{symbol: "ft_US", name: "foot (U.S. survey)", number: "1200/3937", of: "m", source: guide, note: "withdrawn at the end of 2022"},
		{symbol: "mi_US", name: "mile (U.S. survey)", number: "5280", of: "ft_US", source: guide},
		{symbol: "ch", name: "chain (U.S. survey)", number: "66", of: "ft_US", source: guide, aliases: "chain"},
		{symbol: "rod", name: "rod (U.S. survey)", number: "16.5", of: "ft_US", source: guide, aliases: "rd"},
		{symbol: "link", name: "link (U.S. survey)", number: "0.66", of: "ft_US", source: guide},
		{symbol: "furlong", name: "furlong (U.S. survey)", number: "660", of: "ft_US", source: guide},
		{symbol: "fathom", name: "fathom", number: "6", of: "ft", source: common},
		{symbol: "fathom_US", name: "fathom (U.S. survey)", number: "6", of: "ft_US", source: guide},
		{symbol: "cable", name: "cable", number: "0.1", of: "nmi", source: common, note: "a tenth of a nautical mile"},
		{symbol: "nmi", name: "nautical mile", number: "1852", of: "m", source: guide},
		{symbol: "pica", name: "pica (computer)", number: "1/6", of: "in", source: guide},
		{symbol: "point", name: "point (computer)", number: "1/72", of: "in", source: guide},
		{symbol: "pica_pr", name: "pica (printer)", number: "12", of: "point_pr", source: guide},
		{symbol: "point_pr", name: "point (printer)", number: "0.013837", of: "in", source: guide},
		{symbol: "lightyear", name: "light year", number: "9460730472580800", of: "m", source: yearOfIAU, prefixes: true, aliases: "l.y.",
			note: "299792458 m/s for a julian year of 365.25 d"},
		{symbol: "pc", name: "parsec", number: "648000/pi", of: "au", source: astronomers, prefixes: true},
		{symbol: "kayser", name: "kayser", number: "1", of: "cm^-1", source: guide, prefixes: true},
		{symbol: "dpt", name: "dioptre", number: "1", of: "1/m", source: common},
	}
}

func geopotentialUnits() []definition {
	return []definition{
		{symbol: "gpm", name: "geopotential metre", number: "1", of: "m", source: weather, prefixes: true, kind: Geopotential,
			note: "geopotential divided by 9.80665 m/s^2; kgpm for a thousand"},
		{symbol: "gpft", name: "geopotential foot", number: "0.3048", of: "m", source: weather, prefixes: true, kind: Geopotential},
	}
}

func areaUnits() []definition {
	return []definition{
		{symbol: "are", name: "are", number: "100", of: "m^2", source: guide},
		{symbol: "ac", name: "acre (U.S. survey)", number: "43560", of: "ft_US^2", source: guide, aliases: "acre"},
		{symbol: "b", name: "barn", number: "1e-28", of: "m^2", source: guide, prefixes: true, aliases: "barn"},
		{symbol: "cmil", name: "circular mil", number: "pi/4", of: "mil^2", source: guide},
		{symbol: "darcy", name: "darcy", number: "1", of: "cP cm^2/(s atm)", source: guide, prefixes: true,
			note: "a permeability; D is the debye"},
	}
}

func volumeUnits() []definition {
	return []definition{
		{symbol: "stere", name: "stere", number: "1", of: "m^3", source: guide},
		{symbol: "gal", name: "gallon (U.S.)", number: "231", of: "in^3", source: guide, aliases: "gal_US", note: "the acceleration is Gal"},
		{symbol: "qt", name: "quart (U.S. liquid)", number: "1/4", of: "gal", source: guide, aliases: "qt_liq"},
		{symbol: "pt", name: "pint (U.S. liquid)", number: "1/8", of: "gal", source: guide, aliases: "pt_liq"},
		{symbol: "cup", name: "cup (U.S.)", number: "1/16", of: "gal", source: guide},
		{symbol: "gi", name: "gill (U.S.)", number: "1/32", of: "gal", source: guide},
		{symbol: "floz", name: "fluid ounce (U.S.)", number: "1/128", of: "gal", source: guide, aliases: "fl_oz"},
		{symbol: "tbsp", name: "tablespoon", number: "1/256", of: "gal", source: guide},
		{symbol: "tsp", name: "teaspoon", number: "1/768", of: "gal", source: guide},
		{symbol: "gal_UK", name: "gallon (U.K. and Canada)", number: "4.54609", of: "L", source: guide},
		{symbol: "qt_UK", name: "quart (U.K.)", number: "1/4", of: "gal_UK", source: common},
		{symbol: "pt_UK", name: "pint (U.K.)", number: "1/8", of: "gal_UK", source: common},
		{symbol: "gi_UK", name: "gill (U.K.)", number: "1/32", of: "gal_UK", source: guide},
		{symbol: "floz_UK", name: "fluid ounce (U.K.)", number: "1/160", of: "gal_UK", source: guide, aliases: "fl_oz_UK"},
		{symbol: "bu", name: "bushel (U.S.)", number: "2150.42", of: "in^3", source: guide},
		{symbol: "pk", name: "peck (U.S.)", number: "1/4", of: "bu", source: guide},
		{symbol: "qt_dry", name: "quart (U.S. dry)", number: "1/32", of: "bu", source: guide},
		{symbol: "pt_dry", name: "pint (U.S. dry)", number: "1/64", of: "bu", source: guide},
		{symbol: "bbl", name: "barrel (petroleum)", number: "42", of: "gal", source: guide},
		{symbol: "board_ft", name: "board foot", number: "1/12", of: "ft^3", source: guide},
		{symbol: "cord", name: "cord", number: "128", of: "ft^3", source: guide},
		{symbol: "ton_reg", name: "register ton", number: "100", of: "ft^3", source: guide},
	}
}
