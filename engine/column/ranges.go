package column

// AllFinite says whether no row is infinite or NaN: x - x is 0 for every
// finite number and NaN for all others, so one sum tells.
func AllFinite(a []float64) bool {
	var s0, s1, s2, s3 float64
	for len(a) >= 8 {
		x := (*[8]float64)(a)
		s0 += (x[0] - x[0]) + (x[4] - x[4])
		s1 += (x[1] - x[1]) + (x[5] - x[5])
		s2 += (x[2] - x[2]) + (x[6] - x[6])
		s3 += (x[3] - x[3]) + (x[7] - x[7])
		a = a[8:]
	}
	for _, x := range a {
		s0 += x - x
	}
	return s0+s1+s2+s3 == 0
}

// AllInside says whether every row lies from low to high, both included; NaN
// does not.
func AllInside(a []float64, low, high float64) bool {
	for len(a) >= 8 {
		x := (*[8]float64)(a)
		if !(x[0] >= low && x[0] <= high && x[1] >= low && x[1] <= high &&
			x[2] >= low && x[2] <= high && x[3] >= low && x[3] <= high &&
			x[4] >= low && x[4] <= high && x[5] >= low && x[5] <= high &&
			x[6] >= low && x[6] <= high && x[7] >= low && x[7] <= high) {
			return false
		}
		a = a[8:]
	}
	for _, x := range a {
		if !(x >= low && x <= high) {
			return false
		}
	}
	return true
}
