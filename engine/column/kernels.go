package column

// The arithmetic kernels work on eight rows at a time: in the module a loop's
// way back costs more than an addition. An operand of length 1 serves all rows
// of dst.

// AddColumn sets dst to a + b.
func AddColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(dst) && len(b) == len(dst):
		addColumns(dst, a, b)
	case len(b) == 1:
		addNumber(dst, a, b[0])
	default:
		addNumber(dst, b, a[0])
	}
}

func addColumns(dst, a, b []float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = x[0] + y[0]
		d[1] = x[1] + y[1]
		d[2] = x[2] + y[2]
		d[3] = x[3] + y[3]
		d[4] = x[4] + y[4]
		d[5] = x[5] + y[5]
		d[6] = x[6] + y[6]
		d[7] = x[7] + y[7]
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = a[i] + b[i]
	}
}

func addNumber(dst, a []float64, y float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = x[0] + y
		d[1] = x[1] + y
		d[2] = x[2] + y
		d[3] = x[3] + y
		d[4] = x[4] + y
		d[5] = x[5] + y
		d[6] = x[6] + y
		d[7] = x[7] + y
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = a[i] + y
	}
}

// SubColumn sets dst to a - b.
func SubColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(dst) && len(b) == len(dst):
		subColumns(dst, a, b)
	case len(b) == 1:
		addNumber(dst, a, -b[0])
	default:
		subFromNumber(dst, a[0], b)
	}
}

func subColumns(dst, a, b []float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = x[0] - y[0]
		d[1] = x[1] - y[1]
		d[2] = x[2] - y[2]
		d[3] = x[3] - y[3]
		d[4] = x[4] - y[4]
		d[5] = x[5] - y[5]
		d[6] = x[6] - y[6]
		d[7] = x[7] - y[7]
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = a[i] - b[i]
	}
}

func subFromNumber(dst []float64, x float64, b []float64) {
	b = b[:len(dst)]
	for len(dst) >= 8 && len(b) >= 8 {
		d, y := (*[8]float64)(dst), (*[8]float64)(b)
		d[0] = x - y[0]
		d[1] = x - y[1]
		d[2] = x - y[2]
		d[3] = x - y[3]
		d[4] = x - y[4]
		d[5] = x - y[5]
		d[6] = x - y[6]
		d[7] = x - y[7]
		dst, b = dst[8:], b[8:]
	}
	for i := range dst {
		dst[i] = x - b[i]
	}
}

// MulColumn sets dst to a times b.
func MulColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(dst) && len(b) == len(dst):
		mulColumns(dst, a, b)
	case len(b) == 1:
		mulNumber(dst, a, b[0])
	default:
		mulNumber(dst, b, a[0])
	}
}

func mulColumns(dst, a, b []float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = x[0] * y[0]
		d[1] = x[1] * y[1]
		d[2] = x[2] * y[2]
		d[3] = x[3] * y[3]
		d[4] = x[4] * y[4]
		d[5] = x[5] * y[5]
		d[6] = x[6] * y[6]
		d[7] = x[7] * y[7]
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = a[i] * b[i]
	}
}

func mulNumber(dst, a []float64, y float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = x[0] * y
		d[1] = x[1] * y
		d[2] = x[2] * y
		d[3] = x[3] * y
		d[4] = x[4] * y
		d[5] = x[5] * y
		d[6] = x[6] * y
		d[7] = x[7] * y
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = a[i] * y
	}
}

// DivColumn sets dst to a/b.
func DivColumn(dst, a, b []float64) {
	switch {
	case len(a) == len(dst) && len(b) == len(dst):
		divColumns(dst, a, b)
	case len(b) == 1:
		divByNumber(dst, a, b[0])
	default:
		divNumber(dst, a[0], b)
	}
}

func divColumns(dst, a, b []float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = x[0] / y[0]
		d[1] = x[1] / y[1]
		d[2] = x[2] / y[2]
		d[3] = x[3] / y[3]
		d[4] = x[4] / y[4]
		d[5] = x[5] / y[5]
		d[6] = x[6] / y[6]
		d[7] = x[7] / y[7]
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = a[i] / b[i]
	}
}

func divByNumber(dst, a []float64, y float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = x[0] / y
		d[1] = x[1] / y
		d[2] = x[2] / y
		d[3] = x[3] / y
		d[4] = x[4] / y
		d[5] = x[5] / y
		d[6] = x[6] / y
		d[7] = x[7] / y
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = a[i] / y
	}
}

func divNumber(dst []float64, x float64, b []float64) {
	b = b[:len(dst)]
	for len(dst) >= 8 && len(b) >= 8 {
		d, y := (*[8]float64)(dst), (*[8]float64)(b)
		d[0] = x / y[0]
		d[1] = x / y[1]
		d[2] = x / y[2]
		d[3] = x / y[3]
		d[4] = x / y[4]
		d[5] = x / y[5]
		d[6] = x / y[6]
		d[7] = x / y[7]
		dst, b = dst[8:], b[8:]
	}
	for i := range dst {
		dst[i] = x / b[i]
	}
}
