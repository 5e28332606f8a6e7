package column

import (
	"math"
	"math/bits"
)

// reduceUsual bounds the arguments of Cody and Waite's reduction: the
// multiples of pi/2 stay below 2^20.
const reduceUsual = 1e6

// reduceByHalfPi writes a finite x with |x| > pi/4 as k pi/2 + high + low with
// |high| <= pi/4, to a relative error of high+low below 2^-70, and returns
// k modulo 4. Arguments up to 10^6: Cody and Waite (Software Manual for the
// Elementary Functions, 1980) with pi/2 in three parts, whose products with k
// are exact but for the last. Greater ones, and those so near a multiple of
// pi/2 that three parts are too few: reduceByWords.
func reduceByHalfPi(x float64) (quadrant int, high, low float64) {
	if math.Abs(x) < reduceUsual {
		shifted := float64(x*twoOverPi) + expShift
		multiple := shifted - expShift
		sum, rest := twoSum(x-float64(multiple*halfPiFirst), -float64(multiple*halfPiSecond))
		if math.Abs(sum) > 0x1p-24 {
			high, low = fastTwoSum(sum, rest-float64(multiple*halfPiThird))
			return int(math.Float64bits(shifted) & 3), high, low
		}
	}
	return reduceByWords(x)
}

// reduceByWords is reduceByHalfPi by the method of Payne and Hanek (ACM SIGNUM
// Newsletter 18 (1983)): the 53-bit integer of x times those 192 binary digits
// of 2/pi that neither add a multiple of 4 nor lie below the precision wanted.
func reduceByWords(x float64) (quadrant int, high, low float64) {
	pattern := math.Float64bits(x)
	integer := pattern&(1<<52-1) | 1<<52
	// x = integer 2^exponent. Digit i of 2/pi, counted from 1, then has the
	// weight integer 2^(exponent-i); digits before exponent-1 weigh multiples of 4.
	exponent := int(pattern>>52&0x7ff) - 1075
	position := 64 + exponent - 2 // digits skipped, with the 64 leading zeros
	word, shift := position>>6, uint(position&63)
	digits := func(i int) uint64 {
		// A shift by 64 gives 0.
		return twoOverPiWords[word+i]<<shift | twoOverPiWords[word+i+1]>>(64-shift)
	}
	// The product modulo 2^192, in units of 2^-190.
	middleHigh, middleLow := bits.Mul64(integer, digits(1))
	lowestHigh, lowest := bits.Mul64(integer, digits(2))
	middle, carry := bits.Add64(middleLow, lowestHigh, 0)
	highest, _ := bits.Add64(integer*digits(0), middleHigh, carry)

	// The two leading bits are the quadrant, the others a fraction of it.
	quadrant = int(highest >> 62)
	highest = highest<<2 | middle>>62
	middle = middle<<2 | lowest>>62
	lowest <<= 2
	negative := highest>>63 == 1
	if negative { // a half or more: count back from the next quadrant
		quadrant++
		var borrow uint64
		lowest, borrow = bits.Sub64(0, lowest, 0)
		middle, borrow = bits.Sub64(0, middle, borrow)
		highest, _ = bits.Sub64(0, highest, borrow)
	}
	// No double comes nearer than 2^-62 to a multiple of pi/2 (Kahan's
	// search, in Muller, Elementary Functions, table of worst cases), so the
	// leading word holds a bit or nearly so; move the first bit to the front.
	zeros := bits.LeadingZeros64(highest)
	if zeros == 64 {
		highest, middle, lowest = middle, lowest, 0
		zeros += bits.LeadingZeros64(highest)
	}
	front := uint(zeros & 63)
	highest, middle = highest<<front|middle>>(64-front), middle<<front|lowest>>(64-front)
	fraction := float64(float64(int64(highest>>11)) * powerOfTwo(-53-zeros))
	below := float64(float64(int64(highest&(1<<11-1)<<42|middle>>22)) * powerOfTwo(-106-zeros))

	product, rest := twoProduct(fraction, halfPiHigh)
	rest += float64(fraction*halfPiLow) + float64(below*halfPiHigh)
	high, low = fastTwoSum(product, rest)
	if negative != math.Signbit(x) {
		high, low = -high, -low
	}
	if math.Signbit(x) {
		quadrant = -quadrant
	}
	return quadrant & 3, high, low
}
