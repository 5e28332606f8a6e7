package column

// The scaled kernels join two columns that are each multiplied by a number, so
// that a product on the way costs no pass over memory of its own. Each product
// is rounded by itself, as if it had been stored.

// AddScaledColumns sets dst to (a·ka) + (b·kb). All columns are as long as dst.
func AddScaledColumns(dst, a []float64, ka float64, b []float64, kb float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = float64(x[0]*ka) + float64(y[0]*kb)
		d[1] = float64(x[1]*ka) + float64(y[1]*kb)
		d[2] = float64(x[2]*ka) + float64(y[2]*kb)
		d[3] = float64(x[3]*ka) + float64(y[3]*kb)
		d[4] = float64(x[4]*ka) + float64(y[4]*kb)
		d[5] = float64(x[5]*ka) + float64(y[5]*kb)
		d[6] = float64(x[6]*ka) + float64(y[6]*kb)
		d[7] = float64(x[7]*ka) + float64(y[7]*kb)
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*ka) + float64(b[i]*kb)
	}
}

// SubScaledColumns sets dst to (a·ka) - (b·kb). All columns are as long as dst.
func SubScaledColumns(dst, a []float64, ka float64, b []float64, kb float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = float64(x[0]*ka) - float64(y[0]*kb)
		d[1] = float64(x[1]*ka) - float64(y[1]*kb)
		d[2] = float64(x[2]*ka) - float64(y[2]*kb)
		d[3] = float64(x[3]*ka) - float64(y[3]*kb)
		d[4] = float64(x[4]*ka) - float64(y[4]*kb)
		d[5] = float64(x[5]*ka) - float64(y[5]*kb)
		d[6] = float64(x[6]*ka) - float64(y[6]*kb)
		d[7] = float64(x[7]*ka) - float64(y[7]*kb)
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*ka) - float64(b[i]*kb)
	}
}

// MulScaledColumns sets dst to (a·ka) * (b·kb). All columns are as long as dst.
func MulScaledColumns(dst, a []float64, ka float64, b []float64, kb float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = float64(x[0]*ka) * float64(y[0]*kb)
		d[1] = float64(x[1]*ka) * float64(y[1]*kb)
		d[2] = float64(x[2]*ka) * float64(y[2]*kb)
		d[3] = float64(x[3]*ka) * float64(y[3]*kb)
		d[4] = float64(x[4]*ka) * float64(y[4]*kb)
		d[5] = float64(x[5]*ka) * float64(y[5]*kb)
		d[6] = float64(x[6]*ka) * float64(y[6]*kb)
		d[7] = float64(x[7]*ka) * float64(y[7]*kb)
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*ka) * float64(b[i]*kb)
	}
}

// DivScaledColumns sets dst to (a·ka) / (b·kb). All columns are as long as dst.
func DivScaledColumns(dst, a []float64, ka float64, b []float64, kb float64) {
	a, b = a[:len(dst)], b[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 && len(b) >= 8 {
		d, x, y := (*[8]float64)(dst), (*[8]float64)(a), (*[8]float64)(b)
		d[0] = float64(x[0]*ka) / float64(y[0]*kb)
		d[1] = float64(x[1]*ka) / float64(y[1]*kb)
		d[2] = float64(x[2]*ka) / float64(y[2]*kb)
		d[3] = float64(x[3]*ka) / float64(y[3]*kb)
		d[4] = float64(x[4]*ka) / float64(y[4]*kb)
		d[5] = float64(x[5]*ka) / float64(y[5]*kb)
		d[6] = float64(x[6]*ka) / float64(y[6]*kb)
		d[7] = float64(x[7]*ka) / float64(y[7]*kb)
		dst, a, b = dst[8:], a[8:], b[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*ka) / float64(b[i]*kb)
	}
}

// AddScaledNumber sets dst to (a·k) + y. a is as long as dst.
func AddScaledNumber(dst, a []float64, k, y float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = float64(x[0]*k) + y
		d[1] = float64(x[1]*k) + y
		d[2] = float64(x[2]*k) + y
		d[3] = float64(x[3]*k) + y
		d[4] = float64(x[4]*k) + y
		d[5] = float64(x[5]*k) + y
		d[6] = float64(x[6]*k) + y
		d[7] = float64(x[7]*k) + y
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*k) + y
	}
}

// DivScaledNumber sets dst to (a·k) / y. a is as long as dst.
func DivScaledNumber(dst, a []float64, k, y float64) {
	a = a[:len(dst)]
	for len(dst) >= 8 && len(a) >= 8 {
		d, x := (*[8]float64)(dst), (*[8]float64)(a)
		d[0] = float64(x[0]*k) / y
		d[1] = float64(x[1]*k) / y
		d[2] = float64(x[2]*k) / y
		d[3] = float64(x[3]*k) / y
		d[4] = float64(x[4]*k) / y
		d[5] = float64(x[5]*k) / y
		d[6] = float64(x[6]*k) / y
		d[7] = float64(x[7]*k) / y
		dst, a = dst[8:], a[8:]
	}
	for i := range dst {
		dst[i] = float64(a[i]*k) / y
	}
}

// SubFromNumberScaled sets dst to x - (b·k). b is as long as dst.
func SubFromNumberScaled(dst []float64, x float64, b []float64, k float64) {
	b = b[:len(dst)]
	for len(dst) >= 8 && len(b) >= 8 {
		d, y := (*[8]float64)(dst), (*[8]float64)(b)
		d[0] = x - float64(y[0]*k)
		d[1] = x - float64(y[1]*k)
		d[2] = x - float64(y[2]*k)
		d[3] = x - float64(y[3]*k)
		d[4] = x - float64(y[4]*k)
		d[5] = x - float64(y[5]*k)
		d[6] = x - float64(y[6]*k)
		d[7] = x - float64(y[7]*k)
		dst, b = dst[8:], b[8:]
	}
	for i := range dst {
		dst[i] = x - float64(b[i]*k)
	}
}

// DivNumberScaled sets dst to x / (b·k). b is as long as dst.
func DivNumberScaled(dst []float64, x float64, b []float64, k float64) {
	b = b[:len(dst)]
	for len(dst) >= 8 && len(b) >= 8 {
		d, y := (*[8]float64)(dst), (*[8]float64)(b)
		d[0] = x / float64(y[0]*k)
		d[1] = x / float64(y[1]*k)
		d[2] = x / float64(y[2]*k)
		d[3] = x / float64(y[3]*k)
		d[4] = x / float64(y[4]*k)
		d[5] = x / float64(y[5]*k)
		d[6] = x / float64(y[6]*k)
		d[7] = x / float64(y[7]*k)
		dst, b = dst[8:], b[8:]
	}
	for i := range dst {
		dst[i] = x / float64(b[i]*k)
	}
}
