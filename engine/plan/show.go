package plan

import (
	"strconv"

	"plumbrule/engine/unit"
)

// showNumber prints a number with its unit for a reason.
func showNumber(x float64, u unit.Unit) string {
	text := strconv.FormatFloat(x, 'g', 10, 64)
	if name := u.Text(); name != "1" {
		text += " " + name
	}
	return text
}
