package main

import (
	"math"
	"math/rand/v2"
	"strconv"
	"strings"
	"testing"
)

// TestScanNumber compares the quick way with strconv, whose results are
// rounded correctly, bit for bit.
func TestScanNumber(t *testing.T) {
	taken := 0
	check := func(text string) {
		t.Helper()
		x, ok := scanNumber([]byte(text))
		if !ok {
			return
		}
		taken++
		want, err := strconv.ParseFloat(text, 64)
		if err != nil || math.Float64bits(x) != math.Float64bits(want) {
			t.Errorf("%q: %x, not %x (%v)", text, x, want, err)
		}
	}
	for _, text := range []string{
		"", "+", "-", ".", "e5", "1e", "1e+", "0", "-0", "+0.0", "1.", ".5", "-.5e-3", "1..2", "1.2.3", "1_000", "0x10", "inf", "nan", "1 ", " 1",
		"9007199254740991", "9007199254740992", "9007199254740993", "900719925474099.3e1", "1e22", "1e23", "123456789012345678", "1234567890123456789",
		"1e-22", "1e-23", "0.000000000000000000000001", "1e0001", "1e00001", "1e99999", "4.35", "0.1", "1,5", "1\n", "1-", "१",
	} {
		check(text)
	}
	random := rand.New(rand.NewPCG(3, 4))
	for range 200_000 {
		var b strings.Builder
		if random.IntN(2) == 0 {
			b.WriteByte('-')
		}
		whole := strconv.FormatUint(random.Uint64()>>random.IntN(64), 10)
		b.WriteString(whole)
		if random.IntN(3) > 0 {
			b.WriteString("." + strconv.FormatUint(random.Uint64()>>random.IntN(64), 10))
		}
		if random.IntN(3) == 0 {
			b.WriteString("e" + strconv.Itoa(random.IntN(60)-30))
		}
		check(b.String())
	}
	if taken < 30_000 {
		t.Errorf("only %d numbers took the quick way", taken)
	}
}

func BenchmarkScanNumber(b *testing.B) {
	text := []byte("1234.5678")
	for b.Loop() {
		if _, ok := scanNumber(text); !ok {
			b.Fatal("not read")
		}
	}
}
