package main

import (
	"math"
	"math/big"
	"math/bits"
	"strconv"
)

// appendShortest appends the fewest digits that read back as the same float64,
// with an exponent only for sizes below 1e-6 or from 1e21 on; nothing for NaN.
func appendShortest(to []byte, x float64) []byte {
	const wholeBelow = 1 << 53 // integers below it are float64s, and all their digits are needed
	size := math.Abs(x)
	switch {
	case size < wholeBelow && x == math.Trunc(x) && !(x == 0 && math.Signbit(x)):
		return strconv.AppendInt(to, int64(x), 10)
	case math.IsNaN(x):
		return to
	case size == 0 || math.IsInf(x, 0):
		return strconv.AppendFloat(to, x, 'f', -1, 64)
	case size < 1e-6 || size >= 1e21:
		return strconv.AppendFloat(to, x, 'e', -1, 64)
	}
	if x < 0 {
		to = append(to, '-')
	}
	digits, exponent := shortestDecimal(size)
	return appendDecimal(to, digits, exponent)
}

// powerOfTen is 10^n as high·2^64 + low, times a power of two, rounded up; the
// highest bit is set.
type powerOfTen struct{ high, low uint64 }

// The powers that sizes from 1e-6 to 1e21 need.
const leastPower, mostPower = -6, 24

var powersOfTen = func() (table [mostPower - leastPower + 1]powerOfTen) {
	one := big.NewInt(1)
	for i := range table {
		n := int64(i + leastPower)
		power := new(big.Int).Exp(big.NewInt(10), big.NewInt(max(n, -n)), nil)
		g := new(big.Int)
		if n >= 0 {
			g.Lsh(power, 128-uint(power.BitLen()))
		} else {
			// 2^(127+m)/10^-n with m bits in 10^-n lies between 2^127 and 2^128.
			g.Lsh(one, 127+uint(power.BitLen()))
			g.Div(g, power).Add(g, one)
		}
		table[i] = powerOfTen{new(big.Int).Rsh(g, 64).Uint64(), g.Uint64()}
	}
	return table
}()

// shortestDecimal gives digits · 10^exponent, of the decimal numbers that read
// back as x the one with the fewest digits that lies nearest to it. x is from
// 1e-6 to 1e21. Method: Giulietti R. (2022) The Schubfach way to render doubles.
func shortestDecimal(x float64) (digits uint64, exponent int) {
	ieee := math.Float64bits(x)
	c := ieee&(1<<52-1) | 1<<52
	q := int(ieee>>52) - 1075
	closer := ieee&(1<<52-1) == 0 // below a power of two the neighbour is only half as far
	odd := c & 1                  // the bounds of an even number's interval belong to it
	left := 4*c - 2
	k := q * 1262611 >> 22 // floor(log10(2^q))
	if closer {
		left++
		k = (q*1262611 - 524031) >> 22 // floor(log10(3/4·2^q))
	}
	h := q + (-k*1741647)>>19 + 1 // with floor(log2(10^-k))
	g := powersOfTen[-k-leastPower]
	lower := g.times(left<<h) + odd
	middle := g.times(4 * c << h)
	upper := g.times((4*c+2)<<h) - odd
	s := middle / 4
	if s >= 10 {
		tens := s / 10
		under, over := lower <= 40*tens, 40*tens+40 <= upper
		if under != over {
			if over {
				tens++
			}
			return tens, k + 1
		}
	}
	under, over := lower <= 4*s, 4*s+4 <= upper
	if under != over {
		if over {
			s++
		}
		return s, k
	}
	if half := 4*s + 2; middle > half || middle == half && s&1 != 0 {
		s++
	}
	return s, k
}

// times gives the highest bits of the product, the last of them set where any
// bit below it is: that keeps on which side of a number the product lies.
func (p powerOfTen) times(c uint64) uint64 {
	carry, _ := bits.Mul64(p.low, c)
	high, low := bits.Mul64(p.high, c)
	low, over := bits.Add64(low, carry, 0)
	high += over
	if low > 1 {
		high |= 1
	}
	return high
}

// pairs are the digits of 00 to 99.
const pairs = "00010203040506070809101112131415161718192021222324" +
	"25262728293031323334353637383940414243444546474849" +
	"50515253545556575859606162636465666768697071727374" +
	"75767778798081828384858687888990919293949596979899"

// appendDecimal appends digits · 10^exponent without an exponent.
func appendDecimal(to []byte, digits uint64, exponent int) []byte {
	for digits%100 == 0 {
		digits /= 100
		exponent += 2
	}
	if digits%10 == 0 {
		digits /= 10
		exponent++
	}
	var buffer [20]byte
	i := len(buffer)
	for digits >= 100 {
		rest := digits % 100
		digits /= 100
		i -= 2
		buffer[i], buffer[i+1] = pairs[2*rest], pairs[2*rest+1]
	}
	if digits >= 10 {
		i -= 2
		buffer[i], buffer[i+1] = pairs[2*digits], pairs[2*digits+1]
	} else {
		i--
		buffer[i] = byte('0' + digits)
	}
	text := buffer[i:]
	point := len(text) + exponent // how many digits stand before the point
	switch {
	case exponent >= 0:
		to = append(to, text...)
		for range exponent {
			to = append(to, '0')
		}
		return to
	case point > 0:
		to = append(append(to, text[:point]...), '.')
		return append(to, text[point:]...)
	}
	to = append(to, '0', '.')
	for range -point {
		to = append(to, '0')
	}
	return append(to, text...)
}
