package column

import "math"

// NegColumn sets dst to -a.
func NegColumn(dst, a []float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = -x[0]
		d[1] = -x[1]
		d[2] = -x[2]
		d[3] = -x[3]
		d[4] = -x[4]
		d[5] = -x[5]
		d[6] = -x[6]
		d[7] = -x[7]
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = -a[i]
	}
}

// SqrtColumn sets dst to the square root of a.
func SqrtColumn(dst, a []float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = math.Sqrt(x[0])
		d[1] = math.Sqrt(x[1])
		d[2] = math.Sqrt(x[2])
		d[3] = math.Sqrt(x[3])
		d[4] = math.Sqrt(x[4])
		d[5] = math.Sqrt(x[5])
		d[6] = math.Sqrt(x[6])
		d[7] = math.Sqrt(x[7])
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = math.Sqrt(a[i])
	}
}

// AbsColumn sets dst to the size of a.
func AbsColumn(dst, a []float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = math.Abs(x[0])
		d[1] = math.Abs(x[1])
		d[2] = math.Abs(x[2])
		d[3] = math.Abs(x[3])
		d[4] = math.Abs(x[4])
		d[5] = math.Abs(x[5])
		d[6] = math.Abs(x[6])
		d[7] = math.Abs(x[7])
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = math.Abs(a[i])
	}
}

// NotColumn sets dst to 1 - a: the opposite of a truth.
func NotColumn(dst, a []float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = 1 - x[0]
		d[1] = 1 - x[1]
		d[2] = 1 - x[2]
		d[3] = 1 - x[3]
		d[4] = 1 - x[4]
		d[5] = 1 - x[5]
		d[6] = 1 - x[6]
		d[7] = 1 - x[7]
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = 1 - a[i]
	}
}

// LessColumn sets dst to 1 where a < b, else to 0, and to NaN where an operand is no
// number. An operand of length 1 serves all rows of dst.
func LessColumn(dst, a, b []float64) {
	var k, l [4]float64
	a, sa := spread(a, &k)
	b, sb := spread(b, &l)
	for len(dst) >= 4 {
		d, x, y := (*[4]float64)(dst), (*[4]float64)(a), (*[4]float64)(b)
		d[0] = truthOf(x[0] < y[0], x[0], y[0])
		d[1] = truthOf(x[1] < y[1], x[1], y[1])
		d[2] = truthOf(x[2] < y[2], x[2], y[2])
		d[3] = truthOf(x[3] < y[3], x[3], y[3])
		dst, a, b = dst[4:], a[sa:], b[sb:]
	}
	for i := range dst {
		dst[i] = truthOf(a[i] < b[i], a[i], b[i])
	}
}

// LessEqualColumn sets dst to 1 where a <= b, else to 0, and to NaN where an operand is no
// number. An operand of length 1 serves all rows of dst.
func LessEqualColumn(dst, a, b []float64) {
	var k, l [4]float64
	a, sa := spread(a, &k)
	b, sb := spread(b, &l)
	for len(dst) >= 4 {
		d, x, y := (*[4]float64)(dst), (*[4]float64)(a), (*[4]float64)(b)
		d[0] = truthOf(x[0] <= y[0], x[0], y[0])
		d[1] = truthOf(x[1] <= y[1], x[1], y[1])
		d[2] = truthOf(x[2] <= y[2], x[2], y[2])
		d[3] = truthOf(x[3] <= y[3], x[3], y[3])
		dst, a, b = dst[4:], a[sa:], b[sb:]
	}
	for i := range dst {
		dst[i] = truthOf(a[i] <= b[i], a[i], b[i])
	}
}

// EqualColumn sets dst to 1 where a equals b, else to 0, and to NaN where an operand is no
// number. An operand of length 1 serves all rows of dst.
func EqualColumn(dst, a, b []float64) {
	var k, l [4]float64
	a, sa := spread(a, &k)
	b, sb := spread(b, &l)
	for len(dst) >= 4 {
		d, x, y := (*[4]float64)(dst), (*[4]float64)(a), (*[4]float64)(b)
		d[0] = truthOf(x[0] == y[0], x[0], y[0])
		d[1] = truthOf(x[1] == y[1], x[1], y[1])
		d[2] = truthOf(x[2] == y[2], x[2], y[2])
		d[3] = truthOf(x[3] == y[3], x[3], y[3])
		dst, a, b = dst[4:], a[sa:], b[sb:]
	}
	for i := range dst {
		dst[i] = truthOf(a[i] == b[i], a[i], b[i])
	}
}

// NotEqualColumn sets dst to 1 where a differs from b, else to 0, and to NaN where an operand is no
// number. An operand of length 1 serves all rows of dst.
func NotEqualColumn(dst, a, b []float64) {
	var k, l [4]float64
	a, sa := spread(a, &k)
	b, sb := spread(b, &l)
	for len(dst) >= 4 {
		d, x, y := (*[4]float64)(dst), (*[4]float64)(a), (*[4]float64)(b)
		d[0] = truthOf(x[0] != y[0], x[0], y[0])
		d[1] = truthOf(x[1] != y[1], x[1], y[1])
		d[2] = truthOf(x[2] != y[2], x[2], y[2])
		d[3] = truthOf(x[3] != y[3], x[3], y[3])
		dst, a, b = dst[4:], a[sa:], b[sb:]
	}
	for i := range dst {
		dst[i] = truthOf(a[i] != b[i], a[i], b[i])
	}
}

// spread gives a column as it is and the step from one four rows to the next; a
// single number becomes four rows that serve all.
func spread(a []float64, four *[4]float64) (rows []float64, step int) {
	if len(a) != 1 {
		return a, 4
	}
	four[0], four[1], four[2], four[3] = a[0], a[0], a[0], a[0]
	return four[:], 0
}

// truthOf gives a comparison's truth as a number. Whole numbers and one
// question at a time let the compiler select instead of branch.
func truthOf(holds bool, x, y float64) float64 {
	const one, none = 0x3FF0000000000000, 0x7FF8000000000001 // the bits of 1 and NaN
	truth := uint64(0)
	if holds {
		truth = one
	}
	if x != x {
		truth = none
	}
	if y != y {
		truth = none
	}
	return math.Float64frombits(truth)
}

// Trues counts the rows of a condition that hold; all is false where a row is
// neither true nor false.
func Trues(condition []float64) (count int, all bool) {
	var s0, s1, s2, s3 float64
	for len(condition) >= 4 {
		c := (*[4]float64)(condition)
		s0 += c[0]
		s1 += c[1]
		s2 += c[2]
		s3 += c[3]
		condition = condition[4:]
	}
	for _, c := range condition {
		s0 += c
	}
	sum := s0 + s1 + s2 + s3
	return int(sum), sum == sum
}
