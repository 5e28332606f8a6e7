package engine

import (
	"slices"
	"strconv"
	"strings"

	"plumbrule/engine/formula"
	"plumbrule/engine/problem"
)

func itoa(n int) string { return strconv.Itoa(n) }

// ordered gives the names with formulas in an order in which each comes after
// all that it needs, found by counting what is still needed (Kahn 1962). What a
// name has made ready comes next, so that values are read soon after they are
// made. Names that need each other in a circle are reported and left out as
// broken.
func (c *compilation) ordered() []*symbol {
	var free []*symbol
	order := make([]*symbol, 0, len(c.declared))
	left := 0
	for _, s := range c.declared {
		if s.ready {
			continue
		}
		left++
		c.findNeeds(s)
		for _, need := range s.needs {
			need.users = append(need.users, s)
		}
		s.waiting = len(s.needs)
		if len(s.needs) == 0 {
			free = append(free, s)
		}
	}
	slices.Reverse(free) // the last one is taken first
	for len(free) > 0 {
		s := free[len(free)-1]
		free = free[:len(free)-1]
		order = append(order, s)
		for _, user := range slices.Backward(s.users) {
			user.waiting--
			if user.waiting == 0 {
				free = append(free, user)
			}
		}
	}
	if len(order) < left {
		order = append(order, c.circles()...)
	}
	return order
}

// reading is a name that a formula reads or calls.
type reading struct {
	name   string
	called bool
}

// readBy lists the names of a formula, while it is fresh.
func readBy(reads []reading, e *formula.Expression) []reading {
	if e != nil {
		e.Names(func(name string, called bool) { reads = append(reads, reading{name, called}) })
	}
	return reads
}

// findNeeds lists the names with formulas that a formula reads, each once.
func (c *compilation) findNeeds(s *symbol) {
	for _, r := range s.reads {
		if s.Law != nil && !r.called && hasParameter(s.Law, r.name) {
			continue
		}
		if other := c.symbols[r.name]; other != nil && !other.ready && other.neededBy != s {
			other.neededBy = s
			s.needs = append(s.needs, other)
		}
	}
	s.reads = nil
}

func hasParameter(l *formula.UserLaw, name string) bool {
	for i := range l.Parameters {
		if l.Parameters[i].Name == name {
			return true
		}
	}
	return false
}

// circles reports each circle once, as the path of names, and gives what only
// hangs on a circle: it is broken without a problem of its own.
func (c *compilation) circles() []*symbol {
	const (
		unseen = iota
		onPath
		done
	)
	colour := map[*symbol]int{}
	var rest []*symbol
	for _, start := range c.declared {
		if start.waiting == 0 {
			continue
		}
		start.Broken = true
		rest = append(rest, start)
		var path []*symbol
		for s := start; s != nil && colour[s] != done; {
			if colour[s] == onPath {
				c.reportCircle(path, s)
				break
			}
			colour[s] = onPath
			path = append(path, s)
			var next *symbol
			for _, other := range s.needs {
				if colour[other] != done && other.waiting > 0 {
					next = other
					break
				}
			}
			s = next
		}
		for _, s := range path {
			colour[s] = done
		}
	}
	return rest
}

func (c *compilation) reportCircle(path []*symbol, start *symbol) {
	for len(path) > 0 && path[0] != start {
		path = path[1:]
	}
	var names []string
	for _, s := range path {
		names = append(names, s.name.Value)
	}
	names = append(names, start.name.Value)
	const most = 20
	if len(names) > most {
		names = append(names[:most-1], "...", start.name.Value)
	}
	message := "these need each other in a circle: " + strings.Join(names, " needs ")
	if len(path) == 1 {
		message = "'" + start.name.Value + "' needs itself"
	}
	suggestion := "break the circle by making one of them a known"
	if start.law != nil {
		suggestion = "a law of a sheet does not recur: write its formula without the call"
	}
	c.problems.Add(start.name, problem.Circle, message, suggestion)
}
