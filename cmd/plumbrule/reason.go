package main

import (
	"context"
	"strings"

	"plumbrule/engine"
	"plumbrule/engine/rows"
)

// worded gives a reason in words; where the value is known that lies outside
// of a bound, it stands behind the bound.
func worded(reason *rows.Reason, value float64, has bool) string {
	if !has {
		return reason.Text
	}
	it := " (it is " + withUnit(readable(reason.Scale.FromSI(value), defaultDigits), reason.Unit) + ")"
	before, after, found := strings.Cut(reason.Text, reason.Bound)
	if reason.Bound == "" || !found {
		return reason.Text + it
	}
	return before + reason.Bound + it + after
}

// reasonText tells in words why an entry of a run of one row is not sound.
func reasonText(p rows.Program, out *rows.Outcome, entry int) string {
	index, reasons := out.Reason(entry, 0), p.Reasons()
	if index <= 0 || index >= len(reasons) {
		return ""
	}
	for i := range out.Tallies {
		if t := &out.Tallies[i]; t.Entry == entry && t.Reason == index {
			return worded(&reasons[index], t.Worst, t.HasWorst)
		}
	}
	return reasons[index].Text
}

// putValues puts the values that lie outside of a bound into the reasons of an
// explanation. They come from a run of the same row.
func putValues(ctx context.Context, o *opened, e *engine.Explanation) error {
	var out rows.Outcome
	if err := o.program.Run(ctx, o.input, &out); err != nil {
		return err
	}
	// The same words may tell of two calls of a law with two values: those are
	// left without one except at the entry itself.
	texts := map[string]string{}
	of := map[string]string{}
	for i := range o.program.Describe().Entries {
		index := out.Reason(i, 0)
		if index == 0 {
			continue
		}
		plain, full := o.program.Reasons()[index].Text, reasonText(o.program, &out, i)
		of[o.program.Describe().Entries[i].Name] = full
		if other, found := texts[plain]; found && other != full {
			full = plain
		}
		texts[plain] = full
	}
	var put func(e *engine.Explanation)
	put = func(e *engine.Explanation) {
		if full := of[e.Name]; full != "" && e.Reason != "" {
			e.Reason = full
		} else if full := texts[e.Reason]; full != "" {
			e.Reason = full
		}
		for _, part := range e.Parts {
			put(part)
		}
	}
	put(e)
	return nil
}
