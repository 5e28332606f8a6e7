package unit

// The sources of the definitions.
const (
	brochure     = "SI Brochure, 9th edition (2019)"
	brochureUse  = "SI Brochure, 9th edition (2019), table 8"
	guide        = "NIST SP 811 (2008), appendix B"
	constants    = "CODATA 2022"
	astronomers  = "IAU 2012 resolution B2, IAU 2015 resolution B2"
	yearOfIAU    = "IAU Style Manual (1989)"
	weather      = "WMO-No. 8; U.S. Standard Atmosphere 1976"
	navy         = "U.S. Navy Diving Manual (SS521-AG-PRO-010)"
	common       = "common practice"
	milesOfYards = "international yard and pound agreement (1959); NIST SP 811 (2008), appendix B"
)

func baseUnits() []definition {
	return []definition{
		{symbol: "kg", name: "kilogram", base: 1 + placeMass, source: brochure},
		{symbol: "m", name: "metre", base: 1 + placeLength, source: brochure, prefixes: true},
		{symbol: "s", name: "second", base: 1 + placeTime, source: brochure, prefixes: true},
		{symbol: "A", name: "ampere", base: 1 + placeCurrent, source: brochure, prefixes: true},
		{symbol: "K", name: "kelvin", base: 1 + placeTemperature, source: brochure, prefixes: true,
			aliases: "\u212a", note: "a temperature or a difference of temperatures"},
		{symbol: "mol", name: "mole", base: 1 + placeAmount, source: brochure, prefixes: true},
		{symbol: "cd", name: "candela", base: 1 + placeLuminousIntensity, source: brochure, prefixes: true},
		{symbol: "g", name: "gram", number: "0.001", of: "kg", source: brochure, prefixes: true},
	}
}

func derivedUnits() []definition {
	return []definition{
		{symbol: "Hz", name: "hertz", number: "1", of: "1/s", source: brochure, prefixes: true},
		{symbol: "N", name: "newton", number: "1", of: "kg m/s^2", source: brochure, prefixes: true},
		{symbol: "Pa", name: "pascal", number: "1", of: "N/m^2", source: brochure, prefixes: true, pressure: true},
		{symbol: "J", name: "joule", number: "1", of: "N m", source: brochure, prefixes: true},
		{symbol: "W", name: "watt", number: "1", of: "J/s", source: brochure, prefixes: true},
		{symbol: "C", name: "coulomb", number: "1", of: "A s", source: brochure, prefixes: true},
		{symbol: "V", name: "volt", number: "1", of: "W/A", source: brochure, prefixes: true},
		{symbol: "F", name: "farad", number: "1", of: "C/V", source: brochure, prefixes: true},
		{symbol: "Ω", name: "ohm", number: "1", of: "V/A", source: brochure, prefixes: true, aliases: "\u2126 ohm Ohm"},
		{symbol: "S", name: "siemens", number: "1", of: "A/V", source: brochure, prefixes: true},
		{symbol: "Wb", name: "weber", number: "1", of: "V s", source: brochure, prefixes: true},
		{symbol: "T", name: "tesla", number: "1", of: "Wb/m^2", source: brochure, prefixes: true},
		{symbol: "H", name: "henry", number: "1", of: "Wb/A", source: brochure, prefixes: true},
		{symbol: "sr", name: "steradian", number: "1", of: "1", source: brochure, prefixes: true},
		{symbol: "lm", name: "lumen", number: "1", of: "cd sr", source: brochure, prefixes: true},
		{symbol: "lx", name: "lux", number: "1", of: "lm/m^2", source: brochure, prefixes: true},
		{symbol: "Bq", name: "becquerel", number: "1", of: "1/s", source: brochure, prefixes: true},
		{symbol: "Gy", name: "gray", number: "1", of: "J/kg", source: brochure, prefixes: true},
		{symbol: "Sv", name: "sievert", number: "1", of: "J/kg", source: brochure, prefixes: true},
		{symbol: "kat", name: "katal", number: "1", of: "mol/s", source: brochure, prefixes: true},
	}
}

func acceptedUnits() []definition {
	return []definition{
		{symbol: "min", name: "minute", number: "60", of: "s", source: brochureUse},
		{symbol: "h", name: "hour", number: "60", of: "min", source: brochureUse},
		{symbol: "d", name: "day", number: "24", of: "h", source: brochureUse},
		{symbol: "au", name: "astronomical unit", number: "149597870700", of: "m", source: brochureUse, aliases: "ua AU"},
		{symbol: "ha", name: "hectare", number: "1", of: "hm^2", source: brochureUse},
		{symbol: "L", name: "litre", number: "1", of: "dm^3", source: brochureUse, prefixes: true, aliases: "l ℓ"},
		{symbol: "t", name: "tonne", number: "1000", of: "kg", source: brochureUse, prefixes: true},
		{symbol: "Da", name: "dalton", number: "1", of: "u", source: constants, prefixes: true},
		{symbol: "eV", name: "electronvolt", number: "1.602176634e-19", of: "J", source: brochureUse, prefixes: true},
	}
}

func ratioUnits() []definition {
	return []definition{
		{symbol: "1", name: "one", number: "1", of: "1", source: brochure},
		{symbol: "%", name: "per cent", number: "0.01", of: "1", source: brochure},
		{symbol: "‰", name: "per mille", number: "0.001", of: "1", source: common},
		{symbol: "ppm", name: "part per million", number: "1e-6", of: "1", source: brochure,
			note: "of what the sheet divides: amounts, masses or volumes"},
		{symbol: "ppb", name: "part per billion", number: "1e-9", of: "1", source: common, note: "billion is 10^9"},
	}
}

func angleUnits() []definition {
	return []definition{
		{symbol: "rad", name: "radian", number: "1", of: "1", source: brochure, prefixes: true, kind: Angle,
			note: "the unit of absorbed dose is rad_dose"},
		{symbol: "deg", name: "degree", number: "pi/180", of: "rad", source: brochureUse, aliases: "°", kind: Angle},
		{symbol: "arcmin", name: "minute of arc", number: "1/60", of: "deg", source: brochureUse, aliases: "′", kind: Angle},
		{symbol: "arcsec", name: "second of arc", number: "1/60", of: "arcmin", source: brochureUse, aliases: "″", prefixes: true, kind: Angle},
		{symbol: "gon", name: "gon", number: "pi/200", of: "rad", source: guide, prefixes: true, kind: Angle},
		{symbol: "rev", name: "revolution", number: "2 pi", of: "rad", source: guide, kind: Angle},
		{symbol: "mil_angle", name: "mil (angle)", number: "2 pi/6400", of: "rad", source: guide, kind: Angle},
		{symbol: "rpm", name: "revolution per minute", number: "2 pi/60", of: "rad/s", source: guide,
			note: "an angular speed; a rate of events per minute is 1/min"},
	}
}

func temperatureUnits() []definition {
	return []definition{
		{symbol: "degC", name: "degree Celsius", number: "1", of: "K", source: brochure, aliases: "°C ℃",
			kind: TemperaturePoint, zero: 273.15, difference: "K",
			note: "alone a point, T/K = t/degC + 273.15; in a compound unit a difference"},
		{symbol: "degF", name: "degree Fahrenheit", number: "5/9", of: "K", source: guide, aliases: "°F ℉",
			kind: TemperaturePoint, zero: 459.67, difference: "degR",
			note: "alone a point, T/K = (t/degF + 459.67)/1.8; in a compound unit a difference"},
		{symbol: "degR", name: "degree Rankine", number: "5/9", of: "K", source: guide, aliases: "°R",
			note: "a temperature from absolute zero or a difference of temperatures"},
	}
}
