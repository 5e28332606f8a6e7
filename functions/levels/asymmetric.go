package levels

import (
	"math"

	"plumbrule/engine/law"
)

var asymmetricTopLaw = &law.Law{
	Name:  "asymmetric_top",
	Group: group,
	Gives: "the ladder of a rigid asymmetric top, counted from J = 0",
	Parameters: []law.Parameter{
		positiveConstant("A", "one rotational constant"),
		positiveConstant("B", "another"),
		positiveConstant("C", "the third; in any order"),
		{Name: "symmetry", Meaning: "symmetry number: 2 for water", Unit: "1", Finite: law.Above(0), Default: "1"},
	},
	Result:   law.Result{Type: law.Made, Made: madeLadder},
	Equation: "eigenvalues of A J_a^2 + B J_b^2 + C J_c^2 for each J, from the four tridiagonal matrices of Wang; g = (2J + 1)/symmetry",
	Source:   "Wang S.C. (1929) Phys. Rev. 34, 243; King G.W., Hainer R.M., Cross P.C. (1943) J. Chem. Phys. 11, 27",
	Caution:  "No centrifugal distortion: at high J the real levels lie lower. The symmetry number stands for the weights of nuclear spin. Its levels are worked out once for the constants; with constants that vary from row to row that is slow.",
	Refusal:  "more than 1,000,000 levels count at the temperature: it is too hot for the constants; take the classical limit",
	Examples: []law.Example{
		{Formula: "occupancy(asymmetric_top(3[K], 2[K], 1[K]), 1, 1e-3[K])", Gives: "0"},
		{Formula: "partition_sum(asymmetric_top(27.877[cm^-1], 14.512[cm^-1], 9.285[cm^-1], symmetry: 2), 296[K])", Gives: "43"},
	},
}

// wang fills the diagonal and the sides of one of the four matrices of a J:
// parity 0 or 1 of K, sign +1 or -1. Constants in descending order.
func wang(j float64, parity int, sign, a, b, c float64, diagonal, side []float64) (d, e []float64) {
	square := float64(j * (j + 1))
	mean, half := float64(0.5*(b+c)), float64(0.25*(b-c))
	diagonal, side = diagonal[:0], side[:0]
	first := float64(parity)
	if parity == 0 && sign < 0 {
		first = 2
	}
	for k := first; k <= j; k += 2 {
		own := float64(mean*square) + float64((a-mean)*float64(k*k))
		if k == 1 {
			own += float64(sign * float64(half*square))
		}
		diagonal = append(diagonal, own)
		if k+2 <= j {
			x := float64((square - float64(k*(k+1))) * (square - float64((k+1)*(k+2))))
			between := float64(half * math.Sqrt(x))
			if k == 0 {
				between *= math.Sqrt2
			}
			side = append(side, between)
		}
	}
	return diagonal, side
}

func buildAsymmetricTop(set *levelSet, _ []law.Argument, numbers []float64) bool {
	a, b, c, symmetry := numbers[0], numbers[1], numbers[2], numbers[3]
	if !(a > 0) || !(b > 0) || !(c > 0) || !(symmetry > 0) {
		return false
	}
	a, b = max(a, b), min(a, b)
	b, c = max(b, c), min(b, c)
	a, b = max(a, b), min(a, b)
	ceiling := set.ceiling(b + c)
	if ceiling/a > mostLevels {
		// All levels up to J = sqrt(ceiling/A) lie below the ceiling.
		set.tooMany = true
		return false
	}
	for j := 0.0; ; j++ {
		// No level of J lies below that of rotation about the axis of C.
		if float64(c*float64(j*(j+1))) > ceiling {
			set.truncated = true
			return true
		}
		weight := (float64(2*j) + 1) / symmetry
		for block := range 4 {
			sign := 1.0
			if block > 1 {
				sign = -1
			}
			set.diagonal, set.side = wang(j, block%2, sign, a, b, c, set.diagonal, set.side)
			if !tridiagonalEigenvalues(set.diagonal, set.side) {
				return false
			}
			for _, energy := range set.diagonal {
				if energy > ceiling {
					set.truncated = true
					break
				}
				// The lowest level is 0 exactly, whatever rounding left of it.
				if !set.add(max(energy, 0), weight) {
					return false
				}
			}
			set.endRun()
		}
	}
}
