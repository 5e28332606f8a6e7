package unit

import (
	"math"
	"math/big"
	"math/rand"
	"testing"
)

// The bits of pi, by Machin's formula pi = 16 arctan(1/5) - 4 arctan(1/239)
// (John Machin, 1706), with 144 bits to spare.
func TestPiBits(t *testing.T) {
	const spare = 144
	unity := new(big.Int).Lsh(big.NewInt(1), piFraction+spare)
	arctangent := func(reciprocal int64) *big.Int {
		power := new(big.Int).Div(unity, big.NewInt(reciprocal))
		sum := new(big.Int)
		square := big.NewInt(reciprocal * reciprocal)
		for n := int64(1); power.Sign() != 0; n += 2 {
			part := new(big.Int).Div(power, big.NewInt(n))
			if n%4 == 1 {
				sum.Add(sum, part)
			} else {
				sum.Sub(sum, part)
			}
			power.Div(power, square)
		}
		return sum
	}
	pi := new(big.Int).Mul(big.NewInt(4), arctangent(5))
	pi.Sub(pi, arctangent(239)).Mul(pi, big.NewInt(4)).Rsh(pi, spare)
	if got := bigOf(piBits); got.Cmp(pi) != 0 {
		t.Errorf("piBits is %x, want %x", got, pi)
	}
}

func bigOf(n natural) *big.Int {
	sum := new(big.Int)
	for i := len(n) - 1; i >= 0; i-- {
		sum.Lsh(sum, 64).Or(sum, new(big.Int).SetUint64(n[i]))
	}
	return sum
}

// Arithmetic of natural numbers against math/big.
func TestNatural(t *testing.T) {
	random := rand.New(rand.NewSource(1))
	for range 2000 {
		a, b := make(natural, random.Intn(6)), make(natural, random.Intn(6))
		for _, n := range []natural{a, b} {
			for i := range n {
				n[i] = random.Uint64() >> (random.Intn(2) * random.Intn(64)) // long and short words
			}
		}
		a, b = a.trimmed(), b.trimmed()
		bigA, bigB := bigOf(a), bigOf(b)
		if got, want := bigOf(a.times(b)), new(big.Int).Mul(bigA, bigB); got.Cmp(want) != 0 {
			t.Fatalf("%x * %x = %x, want %x", bigA, bigB, got, want)
		}
		if got, want := a.compare(b), bigA.Cmp(bigB); got != want {
			t.Fatalf("%x compared with %x: %d, want %d", bigA, bigB, got, want)
		}
		word, places, power := random.Uint64()|1, random.Intn(200), random.Intn(20)
		bigWord := new(big.Int).SetUint64(word)
		if got, want := bigOf(a.timesWord(word)), new(big.Int).Mul(bigA, bigWord); got.Cmp(want) != 0 {
			t.Fatalf("%x * %x = %x, want %x", bigA, word, got, want)
		}
		if got, want := bigOf(a.shifted(places)), new(big.Int).Lsh(bigA, uint(places)); got.Cmp(want) != 0 {
			t.Fatalf("%x shifted by %d = %x, want %x", bigA, places, got, want)
		}
		if got, want := a.bitLength(), bigA.BitLen(); got != want {
			t.Fatalf("%x has %d bits, want %d", bigA, got, want)
		}
		if got, want := a.remainder(word), new(big.Int).Mod(bigA, bigWord).Uint64(); got != want {
			t.Fatalf("%x mod %x = %x, want %x", bigA, word, got, want)
		}
		short := word >> random.Intn(64)
		want := new(big.Int).Exp(new(big.Int).SetUint64(short), big.NewInt(int64(power)), nil)
		if got := bigOf(a.timesPower(short, power)); got.Cmp(want.Mul(want, bigA)) != 0 {
			t.Fatalf("%x * %x^%d = %x, want %x", bigA, short, power, got, want)
		}
	}
}

// A rational factor is rounded to the nearest float64, and told to be exact when
// it is, as math/big has it.
func TestRationalValue(t *testing.T) {
	random := rand.New(rand.NewSource(2))
	for range 5000 {
		rational := big.NewRat(1, 1)
		var f factor
		for range 1 + random.Intn(5) {
			n := random.Uint64()>>random.Intn(64) | 1
			if random.Intn(3) == 0 {
				n = []uint64{2, 5, 10, 1000, 3, 9, 45359237, 254}[random.Intn(8)]
			}
			power := random.Intn(9) - 4
			g := integerFactor(n)
			f.timesPower(&g, power*wholePower)
			whole := new(big.Rat).SetInt(new(big.Int).SetUint64(n))
			if power < 0 {
				whole.Inv(whole)
			}
			for range max(power, -power) {
				rational.Mul(rational, whole)
			}
		}
		got, exact, ok := f.value()
		want, wantExact := rational.Float64()
		if !ok {
			if want > 0x1p-999 && want < 0x1p999 {
				t.Fatalf("%v is said to be out of range", rational)
			}
			continue
		}
		if got != want || exact != wantExact {
			t.Fatalf("%v is %v, exact %v, want %v, exact %v", rational, got, exact, want, wantExact)
		}
	}
}

// The root of a rational factor lies between the middles towards its
// neighbours: its power is compared exactly.
func TestRootValue(t *testing.T) {
	random := rand.New(rand.NewSource(3))
	for range 1000 {
		degree := []int{2, 3, 4, 6, 12}[random.Intn(5)]
		over, under := random.Uint64()>>random.Intn(64)|1, random.Uint64()>>random.Intn(64)|1
		if random.Intn(4) == 0 { // a perfect power
			over, under = uint64(random.Intn(35)+1), 1
			root := over
			for range degree - 1 {
				over *= root
			}
		}
		var f factor
		g, h := integerFactor(over), integerFactor(under)
		f.timesPower(&g, wholePower/degree)
		f.timesPower(&h, -wholePower/degree)
		got, exact, ok := f.value()
		if !ok {
			t.Fatalf("(%d/%d)^(1/%d) is said to be out of range", over, under, degree)
		}
		rational := new(big.Rat).SetFrac(new(big.Int).SetUint64(over), new(big.Int).SetUint64(under))
		powered := func(x float64, y float64) *big.Rat { // ((x+y)/2)^degree
			middle := new(big.Rat).Add(new(big.Rat).SetFloat64(x), new(big.Rat).SetFloat64(y))
			middle.Mul(middle, big.NewRat(1, 2))
			product := big.NewRat(1, 1)
			for range degree {
				product.Mul(product, middle)
			}
			return product
		}
		if powered(got, math.Nextafter(got, 0)).Cmp(rational) > 0 || powered(got, math.Nextafter(got, math.Inf(1))).Cmp(rational) < 0 {
			t.Fatalf("(%d/%d)^(1/%d) is not nearest to %v", over, under, degree, got)
		}
		if exact != (powered(got, got).Cmp(rational) == 0) {
			t.Fatalf("(%d/%d)^(1/%d): %v is said to be exact: %v", over, under, degree, got, exact)
		}
	}
}

// Factors with pi in them, rounded from 2^256 pi by math/big.
func TestPiValue(t *testing.T) {
	pi := new(big.Rat).SetFrac(bigOf(piBits), new(big.Int).Lsh(big.NewInt(1), piFraction))
	for _, row := range []struct {
		number string
		power  int
		other  *big.Rat
	}{
		{"pi", 1, big.NewRat(1, 1)},
		{"pi/180", 1, big.NewRat(1, 180)},
		{"pi/648000", 1, big.NewRat(1, 648000)},
		{"1/pi", -1, big.NewRat(1, 1)},
		{"250/pi", -1, big.NewRat(250, 1)},
		{"pi pi", 2, big.NewRat(1, 1)},
		{"7/pi pi pi", -3, big.NewRat(7, 1)},
	} {
		f, ok := parseNumber(row.number)
		if !ok {
			t.Errorf("%s is not read", row.number)
			continue
		}
		want := new(big.Rat).Set(row.other)
		for range max(row.power, -row.power) {
			if row.power > 0 {
				want.Mul(want, pi)
			} else {
				want.Quo(want, pi)
			}
		}
		nearest, _ := want.Float64()
		if got, exact, _ := f.value(); got != nearest || exact {
			t.Errorf("%s is %v, exact %v, want %v", row.number, got, exact, nearest)
		}
	}
}

func TestParseNumber(t *testing.T) {
	for _, row := range []struct {
		text string
		want float64
	}{
		{"1", 1},
		{"0.45359237", 0.45359237},
		{"1e-7", 1e-7},
		{"1.5e+3", 1500},
		{"9/4", 2.25},
		{"2 3/4 6", 0.25},
	} {
		f, ok := parseNumber(row.text)
		if got, _, _ := f.value(); !ok || got != row.want {
			t.Errorf("%s is read as %v, %v", row.text, got, ok)
		}
	}
	for _, text := range []string{"x", "0", "1e", "1e+", "1.2.3", "-1", "99999999999999999999", "1e9999", "1/x", "."} {
		if _, ok := parseNumber(text); ok {
			t.Errorf("%q is read as a number", text)
		}
	}
}
