package plan

import "math/bits"

// pending is a set of slots that are taken out from the lowest to the highest.
// What is put in while they are taken out lies above the last one taken, since
// a slot is read by later ones only; so taking moves forward only, over words
// of 64 slots and words that tell which of those hold any.
type pending struct {
	slots []uint64 // a bit a slot
	words []uint64 // a bit a word of slots
	low   int      // no word of words below it holds any
}

func newPending(slots int) pending {
	words := (slots + 63) / 64
	return pending{slots: make([]uint64, words), words: make([]uint64, (words+63)/64)}
}

// put adds a slot.
func (p *pending) put(slot int) {
	word := slot >> 6
	p.slots[word] |= 1 << (slot & 63)
	p.words[word>>6] |= 1 << (word & 63)
	p.low = min(p.low, word>>6)
}

// take removes the lowest slot and gives it; ok is false where there is none.
func (p *pending) take() (slot int, ok bool) {
	for ; p.low < len(p.words); p.low++ {
		some := p.words[p.low]
		if some == 0 {
			continue
		}
		word := p.low<<6 | bits.TrailingZeros64(some)
		slot = word<<6 | bits.TrailingZeros64(p.slots[word])
		p.slots[word] &= p.slots[word] - 1
		if p.slots[word] == 0 {
			p.words[p.low] &= some - 1
		}
		return slot, true
	}
	p.low = 0
	return 0, false
}
