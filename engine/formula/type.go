package formula

import (
	"plumbrule/engine/unit"
)

// Shape is what a value is made of.
type Shape uint8

// The shapes. Invalid stands for a value with a problem; it takes part in
// everything without a further problem.
const (
	Invalid Shape = iota
	NumberShape
	ListShape
	TextShape
	TruthShape
	MadeShape
)

// String gives the shape in words.
func (s Shape) String() string {
	switch s {
	case NumberShape:
		return "a number"
	case ListShape:
		return "a list"
	case TextShape:
		return "a text"
	case TruthShape:
		return "a condition"
	case MadeShape:
		return "a ladder"
	}
	return "a value with a problem"
}

// Type is what is known of a value before the first row.
type Type struct {
	Shape     Shape
	Dimension unit.Dimension
	Kind      unit.Kind
	Length    int    // of a list
	Made      string // the made type
}

// plain is a pure number.
func plain() Type { return Type{Shape: NumberShape} }

// truth is a condition.
func truth() Type { return Type{Shape: TruthShape} }

// Describe gives the type in words, for messages.
func (t Type) Describe() string {
	switch t.Shape {
	case NumberShape, ListShape:
		if t.Kind != unit.Plain {
			return t.Shape.String() + " (" + t.Kind.String() + ")"
		}
		if t.Dimension.IsNone() {
			return t.Shape.String() + " without a unit"
		}
		return t.Shape.String() + " in " + unit.CoherentText(t.Dimension)
	case MadeShape:
		return "a " + t.Made
	}
	return t.Shape.String()
}

// dimensionText names a dimension for messages.
func dimensionText(d unit.Dimension) string {
	if d.IsNone() {
		return "a pure number"
	}
	return unit.CoherentText(d)
}

// clash says why two kinds do not go together in an operation and what to
// write instead; an empty message means that they do.
type clash struct{ message, suggestion string }

var (
	fine            = clash{}
	twoPoints       = clash{"two temperatures on a scale cannot be added", "add a difference in K to a temperature"}
	pressureMix     = clash{"an absolute and a gauge pressure cannot be combined", "convert one with absolute(p, ambient) or gauge(p, ambient)"}
	twoAbsolutes    = clash{"two absolute pressures cannot be added", "add a pressure difference (unmarked) to an absolute pressure"}
	heightMix       = clash{"a geometric and a geopotential height cannot be combined", "convert one with geopotential_height(h) or geometric_height(h)"}
	angleMix        = clash{"an angle and a pure number cannot be combined", "give the number its unit, as in 0.5[deg] or 0.5[rad]"}
	pointDifference = clash{"a temperature on a scale and a temperature difference cannot be compared", "compare two temperatures or two differences"}
)

// addKinds gives the kind of a sum.
func addKinds(a, b unit.Kind) (unit.Kind, clash) {
	if a == b {
		switch a {
		case unit.TemperaturePoint:
			return a, twoPoints
		case unit.AbsolutePressure:
			return a, twoAbsolutes
		}
		return a, fine
	}
	kind, why := pair(a, b)
	if why != fine {
		return kind, why
	}
	switch {
	case a == unit.TemperaturePoint || b == unit.TemperaturePoint:
		return unit.TemperaturePoint, fine
	case a == unit.TemperatureDifference || b == unit.TemperatureDifference:
		return unit.Plain, fine
	}
	return kind, fine
}

// subtractKinds gives the kind of a difference a − b.
func subtractKinds(a, b unit.Kind) (unit.Kind, clash) {
	if a == b {
		switch a {
		case unit.TemperaturePoint:
			return unit.TemperatureDifference, fine
		case unit.AbsolutePressure, unit.GaugePressure:
			return unit.Plain, fine
		}
		return a, fine
	}
	kind, why := pair(a, b)
	if why != fine {
		return kind, why
	}
	switch {
	case a == unit.TemperaturePoint:
		return unit.TemperaturePoint, fine
	case b == unit.TemperaturePoint:
		return unit.TemperatureDifference, fine
	case a == unit.AbsolutePressure || a == unit.GaugePressure:
		return a, fine
	}
	return unit.Plain, fine
}

// alikeKinds gives the kind of two values that stand for one another: the
// branches of a choice, the smaller of two, the sides of a comparison.
func alikeKinds(a, b unit.Kind) (unit.Kind, clash) {
	if a == b {
		return a, fine
	}
	if a == unit.TemperaturePoint && b == unit.TemperatureDifference || a == unit.TemperatureDifference && b == unit.TemperaturePoint {
		return unit.Plain, pointDifference
	}
	return pair(a, b)
}

// pair finds what two different kinds of one dimension have in common.
func pair(a, b unit.Kind) (unit.Kind, clash) {
	if a == unit.Geopotential || b == unit.Geopotential {
		return unit.Plain, heightMix
	}
	if a == unit.Angle || b == unit.Angle {
		return unit.Plain, angleMix
	}
	if a == unit.Plain {
		return b, fine
	}
	if b == unit.Plain {
		return a, fine
	}
	if a == unit.AbsolutePressure || a == unit.GaugePressure {
		return unit.Plain, pressureMix
	}
	return unit.Plain, fine
}

// scaleKind gives the kind of a value times a pure number.
func scaleKind(value, factor Type) unit.Kind {
	if !factor.Dimension.IsNone() || factor.Kind != unit.Plain || value.Kind == unit.TemperaturePoint {
		return unit.Plain
	}
	return value.Kind
}

// Showable says whether a value of kind value may be shown, or declared, in a
// unit of kind shown; the result's kind is the value's, or the unit's where
// the value has none.
func Showable(value, shown unit.Kind) (unit.Kind, string, string) {
	if value == shown || shown == unit.Plain && value != unit.Geopotential {
		return value, "", ""
	}
	switch {
	case value == unit.Geopotential:
		return value, "a geopotential height is not a geometric one", "write the unit gpm, or convert with geometric_height(h)"
	case shown == unit.Angle:
		return shown, "a pure number is not an angle", "give it its unit, as in (x)[rad] or 45[deg]"
	case shown == unit.Geopotential:
		return shown, "a geometric height is not a geopotential one", "write the unit m, or convert with geopotential_height(h)"
	case value == unit.TemperatureDifference:
		return value, "a temperature difference is not a temperature on a scale", "write the unit K"
	case value == unit.GaugePressure:
		return value, "a gauge pressure is not an absolute one", "convert with absolute(p, ambient)"
	case value == unit.AbsolutePressure:
		return value, "an absolute pressure is not a gauge one", "convert with gauge(p, ambient)"
	}
	return shown, "", ""
}
