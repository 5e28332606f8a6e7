package levels

import (
	"plumbrule/engine/column"
	"plumbrule/engine/law"
)

// A ladder given as lists is summed level by level, a whole block of rows at a
// time: the exponentials of one level are one column. Each energy and each
// degeneracy may be one number or a column of its own.
//
// Energies are counted from the lowest level of the row, so that the largest
// term is its degeneracy and nothing overflows, however cold. What underflows
// is below 1e-308 of that.

// listed puts a quantity of a listed ladder into value and its lowest energy
// into lowest. Lists of unequal length have no value.
func (s *scratch) listed(mode *law.Argument, want quantity, rows int) {
	energies, degeneracies := mode.Items[0].Items, mode.Items[1].Items
	if len(energies) != len(degeneracies) || len(energies) == 0 {
		column.Fill(s.value, notANumber)
		clear(s.lowest)
		return
	}
	moving := s.findLowest(energies)
	s.sums.clear(rows)
	if want == partition {
		for i := range energies {
			s.level(&energies[i], &degeneracies[i], moving)
			s.sums.add(s.weight)
		}
		copy(s.value, s.sums.settle())
		return
	}
	// The logarithm's ground level apart, too: the moment costs little more.

	// First moment, and the ground level's states apart from all others.
	s.moments.clear(rows)
	s.ground.clear(rows)
	for i := range energies {
		s.level(&energies[i], &degeneracies[i], moving)
		for row, x := range s.reduced {
			w := s.weight[row]
			s.deviate[row] = float64(x * w)
			if x == 0 {
				s.ground.sum[row] += w
				s.weight[row] = 0
			}
		}
		s.sums.add(s.weight)
		s.moments.add(s.deviate)
	}
	excited, ground, moment := s.sums.settle(), s.ground.sum, s.moments.settle()
	for row := range s.value {
		mean := moment[row] / (ground[row] + excited[row])
		switch want {
		case entropic:
			// ln(ground + excited) keeps its small part in the cold.
			s.value[row] = column.Ln(ground[row]) + column.Log1p(excited[row]/ground[row]) + mean
		case logarithm:
			s.value[row] = column.Ln(ground[row]) + column.Log1p(excited[row]/ground[row])
		default:
			s.value[row] = mean
		}
	}
	if want != variance {
		return
	}

	// Second pass about the mean: no difference of large numbers.
	s.moments.clear(rows)
	for i := range energies {
		s.level(&energies[i], &degeneracies[i], moving)
		for row, x := range s.reduced {
			d := x - s.value[row]
			s.deviate[row] = float64(s.weight[row] * float64(d*d))
		}
		s.moments.add(s.deviate)
	}
	moment = s.moments.settle()
	for row := range s.value {
		s.value[row] = moment[row] / (ground[row] + excited[row])
	}
}

// findLowest puts the lowest energy of each row into lowest and says whether it
// differs from row to row.
func (s *scratch) findLowest(energies []law.Argument) (moving bool) {
	for i := range energies {
		moving = moving || len(energies[i].Values) > 1
	}
	if !moving {
		lowest := energies[0].Values[0]
		for i := range energies {
			lowest = min(lowest, energies[i].Values[0])
		}
		column.Fill(s.lowest, lowest)
		return false
	}
	for row := range s.lowest {
		lowest := energies[0].At(row)
		for i := range energies {
			lowest = min(lowest, energies[i].At(row))
		}
		s.lowest[row] = lowest
	}
	return true
}

// level puts (E - lowest)/kT of one level into reduced and its weight g
// exp(-(E - lowest)/kT) into weight. A degeneracy that is not above 0 has no
// weight.
func (s *scratch) level(energy, degeneracy *law.Argument, moving bool) {
	x, w := s.reduced, s.weight[:len(s.reduced)]
	if moving {
		for row := range x {
			x[row] = float64((energy.At(row) - s.lowest[row]) * s.beta[row])
			w[row] = -x[row]
		}
	} else {
		height := energy.Values[0] - s.lowest[0]
		for row, beta := range s.beta[:len(x)] {
			x[row] = float64(height * beta)
			w[row] = -x[row]
		}
	}
	column.ExpColumn(w, w)
	switch {
	case len(degeneracy.Values) > 1:
		for row := range w {
			w[row] = float64(w[row] * positive(degeneracy.Values[row]))
		}
	case degeneracy.Values[0] != 1:
		g := positive(degeneracy.Values[0])
		for row := range w {
			w[row] = float64(w[row] * g)
		}
	}
}

// positive gives x, or no number where it is not above 0.
func positive(x float64) float64 {
	if x > 0 {
		return x
	}
	return notANumber
}

// listedOccupancy puts the share of level n among all into dst.
func (s *scratch) listedOccupancy(mode, n *law.Argument, dst []float64) {
	s.listed(mode, partition, len(dst))
	energies, degeneracies := mode.Items[0].Items, mode.Items[1].Items
	for row := range dst {
		level := n.At(row)
		if !wholeNumber(level) || level >= float64(len(energies)) {
			dst[row] = notANumber
			continue
		}
		at := int(level)
		dst[row] = s.listedShare(&energies[at], &degeneracies[at], row, s.value[row])
	}
}
