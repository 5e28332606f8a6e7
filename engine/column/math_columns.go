package column

// eachNumber sets dst[i] = f(src[i]) over the shorter length.
func eachNumber(dst, src []float64, f func(float64) float64) {
	n := min(len(dst), len(src))
	dst, src = dst[:n], src[:n]
	for i, x := range src {
		dst[i] = f(x)
	}
}

// eachPair sets dst[i] = f(first[i], second[i]) over the shortest length.
func eachPair(dst, first, second []float64, f func(float64, float64) float64) {
	n := min(len(dst), len(first), len(second))
	dst, first, second = dst[:n], first[:n], second[:n]
	for i, x := range first {
		dst[i] = f(x, second[i])
	}
}

// Expm1Column sets dst[i] = Expm1(src[i]) over the shorter length; dst may be src.
func Expm1Column(dst, src []float64) { eachNumber(dst, src, Expm1) }

// Log1pColumn sets dst[i] = Log1p(src[i]) over the shorter length; dst may be src.
func Log1pColumn(dst, src []float64) { eachNumber(dst, src, Log1p) }

// Log10Column sets dst[i] = Log10(src[i]) over the shorter length; dst may be src.
func Log10Column(dst, src []float64) { eachNumber(dst, src, Log10) }

// SinColumn sets dst[i] = Sin(src[i]) over the shorter length; dst may be src.
func SinColumn(dst, src []float64) { eachNumber(dst, src, Sin) }

// CosColumn sets dst[i] = Cos(src[i]) over the shorter length; dst may be src.
func CosColumn(dst, src []float64) { eachNumber(dst, src, Cos) }

// TanColumn sets dst[i] = Tan(src[i]) over the shorter length; dst may be src.
func TanColumn(dst, src []float64) { eachNumber(dst, src, Tan) }

// AsinColumn sets dst[i] = Asin(src[i]) over the shorter length; dst may be src.
func AsinColumn(dst, src []float64) { eachNumber(dst, src, Asin) }

// AcosColumn sets dst[i] = Acos(src[i]) over the shorter length; dst may be src.
func AcosColumn(dst, src []float64) { eachNumber(dst, src, Acos) }

// AtanColumn sets dst[i] = Atan(src[i]) over the shorter length; dst may be src.
func AtanColumn(dst, src []float64) { eachNumber(dst, src, Atan) }

// SinhColumn sets dst[i] = Sinh(src[i]) over the shorter length; dst may be src.
func SinhColumn(dst, src []float64) { eachNumber(dst, src, Sinh) }

// CoshColumn sets dst[i] = Cosh(src[i]) over the shorter length; dst may be src.
func CoshColumn(dst, src []float64) { eachNumber(dst, src, Cosh) }

// TanhColumn sets dst[i] = Tanh(src[i]) over the shorter length; dst may be src.
func TanhColumn(dst, src []float64) { eachNumber(dst, src, Tanh) }

// CbrtColumn sets dst[i] = Cbrt(src[i]) over the shorter length; dst may be src.
func CbrtColumn(dst, src []float64) { eachNumber(dst, src, Cbrt) }

// ErfColumn sets dst[i] = Erf(src[i]) over the shorter length; dst may be src.
func ErfColumn(dst, src []float64) { eachNumber(dst, src, Erf) }

// ErfcColumn sets dst[i] = Erfc(src[i]) over the shorter length; dst may be src.
func ErfcColumn(dst, src []float64) { eachNumber(dst, src, Erfc) }

// Atan2Column sets dst[i] = Atan2(y[i], x[i]) over the shortest length; dst may
// be y or x.
func Atan2Column(dst, y, x []float64) { eachPair(dst, y, x, Atan2) }

// HypotColumn sets dst[i] = Hypot(x[i], y[i]) over the shortest length; dst may
// be x or y.
func HypotColumn(dst, x, y []float64) { eachPair(dst, x, y, Hypot) }
