package plan

import (
	"math/rand/v2"
	"slices"
	"testing"
)

// What is put in comes out in order, each once, also when more is put in above
// what was taken.
func TestPending(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 5))
	for range 200 {
		n := 1 + random.IntN(20_000)
		p := newPending(n)
		var want, got []int
		for range random.IntN(50) {
			slot := random.IntN(n)
			p.put(slot)
			want = append(want, slot)
		}
		for slot, ok := p.take(); ok; slot, ok = p.take() {
			got = append(got, slot)
			if more := slot + 1 + random.IntN(n); more < n && random.IntN(3) > 0 {
				p.put(more)
				want = append(want, more)
			}
		}
		slices.Sort(want)
		want = slices.Compact(want)
		if !slices.Equal(got, want) {
			t.Fatalf("of %d: %v, not %v", n, got, want)
		}
	}
}
