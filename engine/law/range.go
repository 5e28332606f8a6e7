package law

import "strconv"

// Range is an interval of a parameter's values in the parameter's unit. The
// zero Range has no bounds.
type Range struct {
	Low, High           float64
	HasLow, HasHigh     bool
	LowOpen, HighIsOpen bool // the bound itself lies outside
}

// Within is the closed interval from low to high.
func Within(low, high float64) Range {
	return Range{Low: low, High: high, HasLow: true, HasHigh: true}
}

// AtLeast is everything from low upwards, low included.
func AtLeast(low float64) Range { return Range{Low: low, HasLow: true} }

// Above is everything above low, low itself excluded.
func Above(low float64) Range { return Range{Low: low, HasLow: true, LowOpen: true} }

// AtMost is everything up to high, high included.
func AtMost(high float64) Range { return Range{High: high, HasHigh: true} }

// Below is everything below high, high itself excluded.
func Below(high float64) Range { return Range{High: high, HasHigh: true, HighIsOpen: true} }

// Between is the interval from low to high with both bounds excluded.
func Between(low, high float64) Range {
	return Range{Low: low, High: high, HasLow: true, HasHigh: true, LowOpen: true, HighIsOpen: true}
}

// Bounded says whether the range has any bound.
func (r Range) Bounded() bool { return r.HasLow || r.HasHigh }

// TooLow says whether x lies under the lower bound; NaN does not.
func (r Range) TooLow(x float64) bool {
	return r.HasLow && (x < r.Low || r.LowOpen && x == r.Low)
}

// TooHigh says whether x lies over the upper bound; NaN does not.
func (r Range) TooHigh(x float64) bool {
	return r.HasHigh && (x > r.High || r.HighIsOpen && x == r.High)
}

// Text gives the range in words with its unit: "-2 to 40 degC", "above 0 K",
// "" where there are no bounds.
func (r Range) Text(unit string) string {
	if unit == "1" {
		unit = ""
	} else {
		unit = " " + unit
	}
	switch {
	case r.HasLow && r.HasHigh && r.LowOpen && r.HighIsOpen:
		return "between " + number(r.Low) + " and " + number(r.High) + unit + ", both excluded"
	case r.HasLow && r.HasHigh:
		return number(r.Low) + " to " + number(r.High) + unit
	case r.HasLow && r.LowOpen:
		return "above " + number(r.Low) + unit
	case r.HasLow:
		return "at least " + number(r.Low) + unit
	case r.HasHigh && r.HighIsOpen:
		return "below " + number(r.High) + unit
	case r.HasHigh:
		return "at most " + number(r.High) + unit
	}
	return ""
}

func number(x float64) string { return strconv.FormatFloat(x, 'g', -1, 64) }
