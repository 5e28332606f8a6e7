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
	users := map[string][]*symbol{}
	waiting := map[*symbol]int{}
	var free []*symbol
	for _, name := range c.names {
		s := c.symbols[name]
		if s.ready {
			continue
		}
		s.needs = c.needsOf(s)
		for _, need := range s.needs {
			users[need] = append(users[need], s)
		}
		waiting[s] = len(s.needs)
		if len(s.needs) == 0 {
			free = append(free, s)
		}
	}
	slices.Reverse(free) // the last one is taken first
	var order []*symbol
	for len(free) > 0 {
		s := free[len(free)-1]
		free = free[:len(free)-1]
		order = append(order, s)
		delete(waiting, s)
		for _, user := range slices.Backward(users[s.name.Value]) {
			waiting[user]--
			if waiting[user] == 0 {
				free = append(free, user)
			}
		}
	}
	if len(waiting) > 0 {
		order = append(order, c.circles(waiting)...)
	}
	return order
}

// needsOf lists the names with formulas that a formula reads, each once.
func (c *compilation) needsOf(s *symbol) []string {
	var needs []string
	seen := map[string]bool{}
	local := map[string]bool{}
	if s.Law != nil {
		for _, p := range s.Law.Parameters {
			local[p.Name] = true
		}
	}
	visit := func(name string, called bool) {
		other, known := c.symbols[name]
		if local[name] && !called || !known || other.ready || seen[name] {
			return
		}
		seen[name] = true
		needs = append(needs, name)
	}
	for _, e := range []*formula.Expression{s.parsed, s.valid} {
		if e != nil {
			e.Names(visit)
		}
	}
	return needs
}

// circles reports each circle once, as the path of names, and gives what only
// hangs on a circle: it is broken without a problem of its own.
func (c *compilation) circles(waiting map[*symbol]int) []*symbol {
	const (
		unseen = iota
		onPath
		done
	)
	colour := map[*symbol]int{}
	var rest []*symbol
	for _, name := range c.names {
		start := c.symbols[name]
		if _, left := waiting[start]; !left {
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
			for _, need := range s.needs {
				if other := c.symbols[need]; colour[other] != done {
					if _, left := waiting[other]; left {
						next = other
						break
					}
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
