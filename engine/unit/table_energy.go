package unit

func energyUnits() []definition {
	return []definition{
		{symbol: "erg", name: "erg", number: "1e-7", of: "J", source: guide, prefixes: true},
		{symbol: "Wh", name: "watt hour", number: "1", of: "W h", source: guide, prefixes: true},
		{symbol: "cal", name: "calorie", number: "1", of: "cal_th", source: guide, prefixes: true, note: "the thermochemical one, 4.184 J"},
		{symbol: "cal_th", name: "calorie (thermochemical)", number: "4.184", of: "J", source: guide, prefixes: true},
		{symbol: "cal_IT", name: "calorie (International Table)", number: "4.1868", of: "J", source: guide, prefixes: true},
		{symbol: "cal_mean", name: "calorie (mean)", number: "4.19002", of: "J", source: guide, note: "rounded"},
		{symbol: "cal_15", name: "calorie (15 degC)", number: "4.18580", of: "J", source: guide, note: "rounded"},
		{symbol: "cal_20", name: "calorie (20 degC)", number: "4.18190", of: "J", source: guide, note: "rounded"},
		{symbol: "Btu", name: "British thermal unit", number: "1", of: "Btu_IT", source: guide, note: "the one of the International Table"},
		{symbol: "MMBtu", name: "million British thermal units", number: "1e6", of: "Btu", source: common},
		{symbol: "Btu_IT", name: "British thermal unit (International Table)", number: "1055.05585262", of: "J", source: guide},
		{symbol: "Btu_th", name: "British thermal unit (thermochemical)", number: "5/9", of: "cal_th lb K/(g K)", source: guide},
		{symbol: "Btu_mean", name: "British thermal unit (mean)", number: "1055.87", of: "J", source: guide, note: "rounded"},
		{symbol: "Btu_39", name: "British thermal unit (39 degF)", number: "1059.67", of: "J", source: guide, note: "rounded"},
		{symbol: "Btu_59", name: "British thermal unit (59 degF)", number: "1054.80", of: "J", source: guide, note: "rounded"},
		{symbol: "Btu_60", name: "British thermal unit (60 degF)", number: "1054.68", of: "J", source: guide, note: "rounded"},
		{symbol: "quad", name: "quad", number: "1e15", of: "Btu_IT", source: guide},
		{symbol: "thm_EC", name: "therm (EC)", number: "1.05506e8", of: "J", source: guide},
		{symbol: "thm_US", name: "therm (U.S.)", number: "1.054804e8", of: "J", source: guide},
		{symbol: "tTNT", name: "ton of TNT", number: "4.184e9", of: "J", source: guide, prefixes: true},
		{symbol: "hartree", name: "hartree", number: "4.3597447222060e-18", of: "J", source: constants, prefixes: true,
			note: "measured: relative standard uncertainty 1.1e-12"},
		{symbol: "rydberg", name: "rydberg", number: "2.1798723611030e-18", of: "J", source: constants, aliases: "Ry",
			note: "measured: relative standard uncertainty 1.1e-12"},
		{symbol: "clo", name: "clo", number: "0.155", of: "m^2 K/W", source: guide, note: "a thermal insulance"},
		{symbol: "langley", name: "langley", number: "1", of: "cal_th/cm^2", source: guide, note: "an energy by area"},
	}
}

func powerUnits() []definition {
	return []definition{
		{symbol: "VA", name: "volt ampere", number: "1", of: "V A", source: brochure, prefixes: true},
		{symbol: "var", name: "var", number: "1", of: "V A", source: common, prefixes: true},
		{symbol: "hp", name: "horsepower", number: "550", of: "ft lbf/s", source: guide, note: "the mechanical one of 550 ft lbf/s"},
		{symbol: "hp_metric", name: "horsepower (metric)", number: "75", of: "kgf m/s", source: guide},
		{symbol: "hp_boiler", name: "horsepower (boiler)", number: "9809.50", of: "W", source: guide, note: "rounded"},
		{symbol: "hp_e", name: "horsepower (electric)", number: "746", of: "W", source: guide},
		{symbol: "hp_UK", name: "horsepower (U.K.)", number: "1", of: "hp", source: guide},
		{symbol: "hp_water", name: "horsepower (water)", number: "746.043", of: "W", source: guide, note: "rounded"},
		{symbol: "ton_refrigeration", name: "ton of refrigeration", number: "12000", of: "Btu_IT/h", source: guide, aliases: "TR"},
	}
}

func flowUnits() []definition {
	return []definition{
		{symbol: "P", name: "poise", number: "0.1", of: "Pa s", source: guide, prefixes: true},
		{symbol: "St", name: "stokes", number: "1", of: "cm^2/s", source: guide, prefixes: true},
		{symbol: "rhe", name: "rhe", number: "1", of: "1/P", source: guide},
		{symbol: "perm_0C", name: "perm (0 degC)", number: "5.72135e-11", of: "kg/(Pa s m^2)", source: guide, note: "rounded"},
		{symbol: "perm_23C", name: "perm (23 degC)", number: "5.74525e-11", of: "kg/(Pa s m^2)", source: guide, note: "rounded"},
		{symbol: "Sverdrup", name: "sverdrup", number: "1e6", of: "m^3/s", source: common, note: "an ocean transport; Sv is the sievert"},
	}
}
