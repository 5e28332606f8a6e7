package unit

// Kind tells apart quantities of equal dimension that may not be mixed freely.
type Kind uint8

const (
	// Plain is every quantity for which the dimension says all there is to say.
	Plain Kind = iota
	// TemperaturePoint is a reading on a scale with a shifted zero (degC, degF).
	TemperaturePoint
	// TemperatureDifference is the difference of two temperature points. No unit
	// carries it by itself; it arises when two points are subtracted.
	TemperatureDifference
	// AbsolutePressure counts from vacuum (bara, psia, kPa(a)).
	AbsolutePressure
	// GaugePressure counts from the pressure of the surroundings (barg, psig, kPa(g)).
	GaugePressure
	// Geopotential is a geopotential height (gpm, gpft).
	Geopotential
	// Angle is a plane angle (rad, deg, arcmin, arcsec, gon, rev).
	Angle
)

// String returns the kind in words, fit for a message.
func (k Kind) String() string {
	switch k {
	case Plain:
		return "a plain quantity"
	case TemperaturePoint:
		return "a temperature point"
	case TemperatureDifference:
		return "a temperature difference"
	case AbsolutePressure:
		return "an absolute pressure"
	case GaugePressure:
		return "a gauge pressure"
	case Geopotential:
		return "a geopotential height"
	case Angle:
		return "an angle"
	}
	return "an unknown kind"
}
