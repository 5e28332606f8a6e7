package unit

func timeUnits() []definition {
	return []definition{
		{symbol: "wk", name: "week", number: "7", of: "d", source: common},
		{symbol: "yr", name: "year (julian)", number: "365.25", of: "d", source: yearOfIAU, prefixes: true},
		{symbol: "yr_365", name: "year (365 days)", number: "365", of: "d", source: guide},
		{symbol: "yr_sid", name: "year (sidereal)", number: "3.155815e7", of: "s", source: guide, note: "rounded"},
		{symbol: "yr_trop", name: "year (tropical)", number: "3.155693e7", of: "s", source: guide, note: "rounded"},
		{symbol: "d_sid", name: "day (sidereal)", number: "8.616409e4", of: "s", source: guide, note: "rounded"},
		{symbol: "h_sid", name: "hour (sidereal)", number: "3590.170", of: "s", source: guide, note: "rounded"},
		{symbol: "min_sid", name: "minute (sidereal)", number: "59.83617", of: "s", source: guide, note: "rounded"},
		{symbol: "s_sid", name: "second (sidereal)", number: "0.9972696", of: "s", source: guide, note: "rounded"},
		{symbol: "shake", name: "shake", number: "1e-8", of: "s", source: guide},
	}
}

func motionUnits() []definition {
	return []definition{
		{symbol: "kn", name: "knot", number: "1", of: "nmi/h", source: guide, aliases: "knot"},
		{symbol: "Gal", name: "gal", number: "0.01", of: "m/s^2", source: guide, prefixes: true, note: "an acceleration; gal is the U.S. gallon"},
		{symbol: "g_n", name: "standard acceleration of free fall", number: "9.80665", of: "m/s^2", source: guide},
	}
}

func massUnits() []definition {
	return []definition{
		{symbol: "u", name: "unified atomic mass unit", number: "1.66053906892e-27", of: "kg", source: constants,
			note: "measured: relative standard uncertainty 3.1e-10"},
		{symbol: "m_e", name: "electron mass", number: "9.1093837139e-31", of: "kg", source: constants,
			note: "measured: relative standard uncertainty 3.1e-10"},
		{symbol: "lb", name: "pound", number: "0.45359237", of: "kg", source: milesOfYards},
		{symbol: "oz", name: "ounce", number: "1/16", of: "lb", source: guide},
		{symbol: "gr", name: "grain", number: "1/7000", of: "lb", source: guide},
		{symbol: "stone", name: "stone", number: "14", of: "lb", source: common},
		{symbol: "cwt_US", name: "hundredweight (short)", number: "100", of: "lb", source: guide},
		{symbol: "cwt_UK", name: "hundredweight (long)", number: "112", of: "lb", source: guide},
		{symbol: "ton_US", name: "ton (short)", number: "2000", of: "lb", source: guide},
		{symbol: "ton_UK", name: "ton (long)", number: "2240", of: "lb", source: guide},
		{symbol: "oz_t", name: "ounce (troy or apothecary)", number: "480", of: "gr", source: guide},
		{symbol: "lb_t", name: "pound (troy or apothecary)", number: "12", of: "oz_t", source: guide},
		{symbol: "dwt", name: "pennyweight", number: "24", of: "gr", source: guide},
		{symbol: "scruple", name: "scruple", number: "20", of: "gr", source: guide},
		{symbol: "dr_ap", name: "dram (apothecary)", number: "60", of: "gr", source: guide},
		{symbol: "ct", name: "carat (metric)", number: "0.2", of: "g", source: guide},
		{symbol: "ton_assay", name: "assay ton", number: "175/6", of: "g", source: guide, aliases: "AT",
			note: "as many milligrams as a short ton has troy ounces"},
		{symbol: "slug", name: "slug", number: "1", of: "lbf s^2/ft", source: guide},
		{symbol: "den", name: "denier", number: "1/9000", of: "g/m", source: guide, aliases: "denier", note: "a linear density"},
		{symbol: "tex", name: "tex", number: "1", of: "g/km", source: guide, prefixes: true, note: "a linear density"},
	}
}

func forceUnits() []definition {
	return []definition{
		{symbol: "dyn", name: "dyne", number: "1e-5", of: "N", source: guide, prefixes: true},
		{symbol: "gf", name: "gram-force", number: "1", of: "g g_n", source: guide},
		{symbol: "kgf", name: "kilogram-force", number: "1", of: "kg g_n", source: guide},
		{symbol: "tf", name: "tonne-force", number: "1", of: "t g_n", source: common},
		{symbol: "kp", name: "kilopond", number: "1", of: "kgf", source: guide},
		{symbol: "lbf", name: "pound-force", number: "1", of: "lb g_n", source: guide},
		{symbol: "ozf", name: "ounce-force", number: "1/16", of: "lbf", source: guide},
		{symbol: "kip", name: "kip", number: "1000", of: "lbf", source: guide, aliases: "klbf"},
		{symbol: "tonf_US", name: "ton-force (short)", number: "2000", of: "lbf", source: guide},
		{symbol: "tonf_UK", name: "ton-force (long)", number: "2240", of: "lbf", source: common},
		{symbol: "pdl", name: "poundal", number: "1", of: "lb ft/s^2", source: guide},
	}
}

func pressureUnits() []definition {
	const water = "the conventional column of 1000 kg/m^3 under 9.80665 m/s^2"
	const mercury = "the conventional column of 13595.1 kg/m^3 under 9.80665 m/s^2"
	return []definition{
		{symbol: "bar", name: "bar", number: "100000", of: "Pa", source: brochure, prefixes: true, pressure: true, shortMark: true,
			note: "bara is absolute, barg gauge, bar unmarked"},
		{symbol: "atm", name: "standard atmosphere", number: "101325", of: "Pa", source: guide, pressure: true},
		{symbol: "at", name: "technical atmosphere", number: "1", of: "kgf/cm^2", source: guide, pressure: true},
		{symbol: "torr", name: "torr", number: "101325/760", of: "Pa", source: guide, prefixes: true, pressure: true, aliases: "Torr"},
		{symbol: "psi", name: "pound-force per square inch", number: "1", of: "lbf/in^2", source: guide, pressure: true, shortMark: true,
			note: "psia is absolute, psig gauge, psi unmarked"},
		{symbol: "ksi", name: "kip per square inch", number: "1000", of: "psi", source: guide, pressure: true, aliases: "kpsi"},
		{symbol: "mmHg", name: "millimetre of mercury", number: "13595.1", of: "kg g_n mm/m^3", source: guide, pressure: true, note: mercury},
		{symbol: "cmHg", name: "centimetre of mercury", number: "10", of: "mmHg", source: guide, pressure: true, note: mercury},
		{symbol: "inHg", name: "inch of mercury", number: "13595.1", of: "kg g_n in/m^3", source: guide, pressure: true, note: mercury},
		{symbol: "ftHg", name: "foot of mercury", number: "12", of: "inHg", source: guide, pressure: true, note: mercury},
		{symbol: "mmH2O", name: "millimetre of water", number: "1000", of: "kg g_n mm/m^3", source: guide, pressure: true, note: water},
		{symbol: "cmH2O", name: "centimetre of water", number: "10", of: "mmH2O", source: guide, pressure: true, note: water},
		{symbol: "mH2O", name: "metre of water", number: "1000", of: "mmH2O", source: guide, pressure: true, note: water},
		{symbol: "inH2O", name: "inch of water", number: "1000", of: "kg g_n in/m^3", source: guide, pressure: true, note: water},
		{symbol: "ftH2O", name: "foot of water", number: "12", of: "inH2O", source: guide, pressure: true, note: water},
		{symbol: "cmHg_0C", name: "centimetre of mercury (0 degC)", number: "1333.22", of: "Pa", source: guide, note: "rounded"},
		{symbol: "inHg_32F", name: "inch of mercury (32 degF)", number: "3386.38", of: "Pa", source: guide, note: "rounded"},
		{symbol: "inHg_60F", name: "inch of mercury (60 degF)", number: "3376.85", of: "Pa", source: guide, note: "rounded"},
		{symbol: "cmH2O_4C", name: "centimetre of water (4 degC)", number: "98.0638", of: "Pa", source: guide, note: "rounded"},
		{symbol: "ftH2O_39F", name: "foot of water (39.2 degF)", number: "2988.98", of: "Pa", source: guide, note: "rounded"},
		{symbol: "inH2O_39F", name: "inch of water (39.2 degF)", number: "249.082", of: "Pa", source: guide, note: "rounded"},
		{symbol: "inH2O_60F", name: "inch of water (60 degF)", number: "248.84", of: "Pa", source: guide, note: "rounded"},
		{symbol: "msw", name: "metre of sea water", number: "10000", of: "Pa", source: common,
			note: "a pressure, a tenth of a bar by definition, not a depth"},
		{symbol: "fsw", name: "foot of sea water", number: "64", of: "lbf/ft^2", source: navy,
			note: "a pressure: a foot of water of 64 lb/ft^3 under 9.80665 m/s^2, not a depth"},
		{symbol: "ba", name: "barye", number: "1", of: "dyn/cm^2", source: common},
	}
}
