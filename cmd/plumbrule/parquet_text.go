package main

import (
	"fmt"
	"math"
	"math/big"
	"strconv"
	"time"
	"unicode/utf8"

	"github.com/parquet-go/parquet-go"
	"github.com/parquet-go/parquet-go/format"
)

// logical tells what the values of a column stand for, nil where nothing is said.
func logical(t parquet.Type) format.LogicalTypeValue {
	if l := t.LogicalType(); l != nil {
		return l.Value
	}
	return nil
}

// parquetKind tells what a column of a type holds.
func parquetKind(t parquet.Type) fieldType {
	switch logical(t).(type) {
	case *format.DecimalType:
		return anyField // a text that reads as a number
	case *format.DateType, *format.TimeType, *format.TimestampType:
		return textField
	}
	switch t.Kind() {
	case parquet.Boolean:
		return truthField
	case parquet.Int32, parquet.Int64:
		return wholeField
	case parquet.Float, parquet.Double:
		return numberField
	}
	return textField
}

func unsigned(t parquet.Type) bool {
	whole, is := logical(t).(*format.IntType)
	return is && !whole.IsSigned
}

func (s *parquetStretch) cell(row, column int) cell {
	v, t := s.values[column][row], s.in.nodes[column].Type()
	if v.IsNull() {
		return cell{}
	}
	switch v.Kind() {
	case parquet.Boolean:
		c := cell{kind: truthCell}
		if v.Boolean() {
			c.whole = 1
		}
		return c
	case parquet.Int32:
		return wholeText(int64(v.Int32()), uint64(v.Uint32()), t)
	case parquet.Int64:
		return wholeText(v.Int64(), v.Uint64(), t)
	case parquet.Float:
		if x := float64(v.Float()); math.IsNaN(x) || math.IsInf(x, 0) {
			return cell{kind: numberCell, number: x}
		}
		return cell{kind: jsonCell, text: strconv.AppendFloat(nil, float64(v.Float()), 'g', -1, 32)}
	case parquet.Double:
		return cell{kind: numberCell, number: v.Double()}
	case parquet.ByteArray, parquet.FixedLenByteArray:
		bytes := v.ByteArray()
		if decimal, is := logical(t).(*format.DecimalType); is {
			return cell{kind: textCell, text: []byte(decimalText(signedInteger(bytes), decimal.Scale))}
		}
		if v.Kind() == parquet.FixedLenByteArray || !utf8.Valid(bytes) {
			return cell{kind: textCell, text: fmt.Appendf(nil, "%x", bytes)}
		}
		if len(bytes) == 0 {
			return cell{}
		}
		return cell{kind: textCell, text: bytes}
	}
	return cell{kind: textCell, text: []byte(v.String())}
}

// wholeText gives an integer, or what it stands for: a decimal number, a date, a
// time (ISO 8601).
func wholeText(x int64, bits uint64, t parquet.Type) cell {
	text := ""
	switch l := logical(t).(type) {
	case *format.DecimalType:
		text = decimalText(big.NewInt(x), l.Scale)
	case *format.DateType:
		text = time.Unix(0, 0).UTC().AddDate(0, 0, int(x)).Format("2006-01-02")
	case *format.TimestampType:
		layout := "2006-01-02T15:04:05.999999999"
		if l.IsAdjustedToUTC {
			layout += "Z"
		}
		text = instant(x, l.Unit).Format(layout)
	case *format.TimeType:
		text = instant(x, l.Unit).Format("15:04:05.999999999")
	default:
		if unsigned(t) {
			return cell{kind: jsonCell, text: strconv.AppendUint(nil, bits, 10)}
		}
		return cell{kind: wholeCell, whole: x}
	}
	return cell{kind: textCell, text: []byte(text)}
}

// instant counts from the beginning of 1970 in a file's unit of time.
func instant(x int64, unit format.TimeUnit) time.Time {
	step := time.Nanosecond
	if unit.Value != nil {
		step = unit.Value.Duration()
	}
	inSecond := int64(time.Second / step)
	return time.Unix(x/inSecond, x%inSecond*int64(step)).UTC()
}

// decimalText writes unscaled · 10^-scale.
func decimalText(unscaled *big.Int, scale int32) string {
	digits := new(big.Int).Abs(unscaled).String()
	if scale > 0 {
		for len(digits) <= int(scale) {
			digits = "0" + digits
		}
		digits = digits[:len(digits)-int(scale)] + "." + digits[len(digits)-int(scale):]
	}
	if unscaled.Sign() < 0 {
		return "-" + digits
	}
	return digits
}

// signedInteger reads two's complement, the highest byte first.
func signedInteger(bytes []byte) *big.Int {
	x := new(big.Int).SetBytes(bytes)
	if len(bytes) > 0 && bytes[0]&0x80 != 0 {
		x.Sub(x, new(big.Int).Lsh(big.NewInt(1), uint(8*len(bytes))))
	}
	return x
}
