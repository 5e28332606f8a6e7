package plan

import (
	"math"
	"strconv"

	"plumbrule/engine/law"
	"plumbrule/engine/rows"
	"plumbrule/engine/unit"
)

// bounds are a parameter's ranges in coherent SI units, every bound closed: an
// open bound has moved to the next float64. low and high hold for both ranges
// together, so that one comparison decides the usual case.
type bounds struct {
	any                     bool
	low, high               float64
	validLow, validHigh     float64
	finiteLow, finiteHigh   float64
	shown                   unit.Unit
	validRange, finiteRange law.Range
}

func boundsOf(p *law.Parameter) bounds {
	b := bounds{low: math.Inf(-1), high: math.Inf(1), validLow: math.Inf(-1), validHigh: math.Inf(1), finiteLow: math.Inf(-1), finiteHigh: math.Inf(1)}
	if !p.Valid.Bounded() && !p.Finite.Bounded() {
		return b
	}
	u, err := unit.Parse(p.Unit)
	if err != nil {
		return b
	}
	b.any, b.shown, b.validRange, b.finiteRange = true, u, p.Valid, p.Finite
	b.validLow, b.validHigh = closed(p.Valid, u)
	b.finiteLow, b.finiteHigh = closed(p.Finite, u)
	b.low = math.Max(b.validLow, b.finiteLow)
	b.high = math.Min(b.validHigh, b.finiteHigh)
	return b
}

func closed(r law.Range, u unit.Unit) (low, high float64) {
	low, high = math.Inf(-1), math.Inf(1)
	if r.HasLow {
		low = u.ToSI(r.Low)
		if r.LowOpen {
			low = math.Nextafter(low, math.Inf(1))
		}
	}
	if r.HasHigh {
		high = u.ToSI(r.High)
		if r.HighIsOpen {
			high = math.Nextafter(high, math.Inf(-1))
		}
	}
	return low, high
}

// scaleOf gives a unit's conversion as plain data.
func scaleOf(u unit.Unit) rows.Scale {
	before, multiply, divide := u.Affine()
	return rows.Scale{Before: before, Multiply: multiply, Divide: divide}
}

// boundReason words the reason of one side of one range.
func boundReason(l *law.Law, p *law.Parameter, r law.Range, u unit.Unit, below, finite bool) rows.Reason {
	bound, open := r.High, r.HighIsOpen
	if below {
		bound, open = r.Low, r.LowOpen
	}
	text := strconv.FormatFloat(bound, 'g', -1, 64)
	if name := u.Text(); name != "1" {
		text += " " + name
	}
	position := "above"
	switch {
	case below && open:
		position = "at or below"
	case below:
		position = "below"
	case open:
		position = "at or above"
	}
	words := p.Name + " of " + l.Name + " lies " + position + " " + text
	if finite {
		words += ", where the law means nothing"
	} else {
		words += ", outside its stated range"
	}
	return rows.Reason{Text: words, Law: l.Name, Argument: p.Name, Bound: text, Unit: u.Text(), Scale: scaleOf(u), Below: below}
}
