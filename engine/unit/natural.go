package unit

import "math/bits"

// natural is a natural number of any size: 64-bit words, the least first, with
// no zero word at the top; the empty slice is zero.
type natural []uint64

// one returns the natural number 1.
func one() natural { return natural{1} }

// timesWord returns n * word.
func (n natural) timesWord(word uint64) natural {
	if word == 1 || len(n) == 0 {
		return n
	}
	if word == 0 {
		return nil
	}
	product := make(natural, 0, len(n)+1)
	carry := uint64(0)
	for _, digit := range n {
		high, low := bits.Mul64(digit, word)
		low, over := bits.Add64(low, carry, 0)
		product = append(product, low)
		carry = high + over
	}
	if carry != 0 {
		product = append(product, carry)
	}
	return product
}

// timesPower returns n * word^power for power >= 0.
func (n natural) timesPower(word uint64, power int) natural {
	for power > 0 {
		// gather as many factors as one word holds
		step, gathered := word, 1
		for gathered < power {
			high, low := bits.Mul64(step, word)
			if high != 0 {
				break
			}
			step = low
			gathered++
		}
		n = n.timesWord(step)
		power -= gathered
	}
	return n
}

// times returns n * m.
func (n natural) times(m natural) natural {
	if len(n) == 0 || len(m) == 0 {
		return nil
	}
	product := make(natural, len(n)+len(m))
	for i, a := range n {
		carry := uint64(0)
		for j, b := range m {
			high, low := bits.Mul64(a, b)
			low, over := bits.Add64(low, product[i+j], 0)
			high += over
			low, over = bits.Add64(low, carry, 0)
			product[i+j] = low
			carry = high + over
		}
		product[i+len(m)] = carry
	}
	return product.trimmed()
}

// shifted returns n * 2^places for places >= 0.
func (n natural) shifted(places int) natural {
	if len(n) == 0 || places == 0 {
		return n
	}
	words, rest := places/64, uint(places%64)
	shifted := make(natural, words, words+len(n)+1)
	carry := uint64(0)
	for _, digit := range n {
		shifted = append(shifted, digit<<rest|carry)
		carry = digit >> (64 - rest) // zero when rest is zero: Go shifts all bits out
	}
	return append(shifted, carry).trimmed()
}

// trimmed returns n without zero words at the top.
func (n natural) trimmed() natural {
	for len(n) > 0 && n[len(n)-1] == 0 {
		n = n[:len(n)-1]
	}
	return n
}

// compare returns -1, 0 or 1 as n is less than, equal to or greater than m.
func (n natural) compare(m natural) int {
	if len(n) != len(m) {
		if len(n) < len(m) {
			return -1
		}
		return 1
	}
	for i := len(n) - 1; i >= 0; i-- {
		if n[i] != m[i] {
			if n[i] < m[i] {
				return -1
			}
			return 1
		}
	}
	return 0
}

// bitLength returns the number of bits needed to write n.
func (n natural) bitLength() int {
	if len(n) == 0 {
		return 0
	}
	return 64*(len(n)-1) + bits.Len64(n[len(n)-1])
}

// remainder returns n modulo word, for word > 0.
func (n natural) remainder(word uint64) uint64 {
	rest := uint64(0)
	for i := len(n) - 1; i >= 0; i-- {
		rest = bits.Rem64(rest, n[i], word)
	}
	return rest
}
