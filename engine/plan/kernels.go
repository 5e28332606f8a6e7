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
		column.NegColumn(dst, a)
	case formula.Sqrt:
		column.SqrtColumn(dst, a)
	case formula.Abs:
		column.AbsColumn(dst, a)
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
		column.NotColumn(dst, a)
	case formula.Atan2:
		column.Map2(dst, a, b, column.Atan2)
	case formula.Hypot:
		column.Map2(dst, a, b, column.Hypot)
	case formula.Min:
		column.Map2(dst, a, b, column.Min)
	case formula.Max:
		column.Map2(dst, a, b, column.Max)
	case formula.Less:
		column.LessColumn(dst, a, b)
	case formula.LessEqual:
		column.LessEqualColumn(dst, a, b)
	case formula.Equal:
		column.EqualColumn(dst, a, b)
	case formula.NotEqual:
		column.NotEqualColumn(dst, a, b)
	case formula.Select:
		selectColumn(dst, a, b, c)
	}
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
