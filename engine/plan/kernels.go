package plan

import (
	"math"

	"plumbrule/engine/column"
	"plumbrule/engine/formula"
)

// compute runs one arithmetic step over a block. Operands are columns as long
// as dst or single numbers. Conditions are 1, 0 or NaN.
func compute(op formula.Op, dst, a, b, c []float64) {
	switch op {
	case formula.Add:
		column.AddColumn(dst, a, b)
	case formula.Sub:
		column.SubColumn(dst, a, b)
	case formula.Mul:
		column.MulColumn(dst, a, b)
	case formula.Div:
		column.DivColumn(dst, a, b)
	case formula.Pow:
		if len(b) == 1 && len(a) == len(dst) {
			column.PowColumnNumber(dst, a, b[0])
		} else {
			column.Map2(dst, a, b, column.Pow)
		}
	case formula.Neg:
		for i := range dst {
			dst[i] = -a[i]
		}
	case formula.Sqrt:
		for i := range dst {
			dst[i] = math.Sqrt(a[i])
		}
	case formula.Abs:
		for i := range dst {
			dst[i] = math.Abs(a[i])
		}
	case formula.Exp:
		column.ExpColumn(dst, a)
	case formula.Ln:
		column.LnColumn(dst, a)
	case formula.Log10:
		column.Log10Column(dst, a)
	case formula.Sin:
		column.SinColumn(dst, a)
	case formula.Cos:
		column.CosColumn(dst, a)
	case formula.Tan:
		column.TanColumn(dst, a)
	case formula.Asin:
		column.AsinColumn(dst, a)
	case formula.Acos:
		column.AcosColumn(dst, a)
	case formula.Atan:
		column.AtanColumn(dst, a)
	case formula.Sinh:
		column.SinhColumn(dst, a)
	case formula.Cosh:
		column.CoshColumn(dst, a)
	case formula.Tanh:
		column.TanhColumn(dst, a)
	case formula.Cbrt:
		column.CbrtColumn(dst, a)
	case formula.Floor:
		column.Map1(dst, a, math.Floor)
	case formula.Ceil:
		column.Map1(dst, a, math.Ceil)
	case formula.Round:
		column.Map1(dst, a, column.RoundOf)
	case formula.Sign:
		column.Map1(dst, a, column.SignOf)
	case formula.Not:
		for i := range dst {
			dst[i] = 1 - a[i]
		}
	case formula.Atan2:
		column.Map2(dst, a, b, column.Atan2)
	case formula.Hypot:
		column.Map2(dst, a, b, column.Hypot)
	case formula.Min:
		column.Map2(dst, a, b, column.Min)
	case formula.Max:
		column.Map2(dst, a, b, column.Max)
	case formula.Less:
		column.Map2(dst, a, b, func(x, y float64) float64 { return condition(x < y, x, y) })
	case formula.LessEqual:
		column.Map2(dst, a, b, func(x, y float64) float64 { return condition(x <= y, x, y) })
	case formula.Equal:
		column.Map2(dst, a, b, func(x, y float64) float64 { return condition(x == y, x, y) })
	case formula.NotEqual:
		column.Map2(dst, a, b, func(x, y float64) float64 { return condition(x != y, x, y) })
	case formula.Select:
		selectColumn(dst, a, b, c)
	}
}

// condition gives a comparison's truth, NaN where an operand is no number.
func condition(holds bool, x, y float64) float64 {
	if x != x || y != y {
		return math.NaN()
	}
	if holds {
		return 1
	}
	return 0
}

// selectColumn takes each row from one of two columns.
func selectColumn(dst, condition, yes, no []float64) {
	ic, iy, in := column.Stride(condition), column.Stride(yes), column.Stride(no)
	for i := range dst {
		switch c := condition[i*ic]; {
		case c == 1:
			dst[i] = yes[i*iy]
		case c == 0:
			dst[i] = no[i*in]
		default:
			dst[i] = math.NaN()
		}
	}
}
