package levels

import (
	"math"
	"testing"

	"plumbrule/engine/law"
)

// Energies of J = 1 and 2 in closed form: Herzberg G. (1945) Infrared and Raman
// Spectra of Polyatomic Molecules, chapter I.
func TestAsymmetricTopInClosedForm(t *testing.T) {
	const a, b, c = 27.877, 14.512, 9.285
	root := 2 * math.Sqrt((b-c)*(b-c)+(a-c)*(a-b))
	want := []float64{0, b + c, a + c, a + b,
		2*(a+b+c) - root, a + b + 4*c, a + 4*b + c, 4*a + b + c, 2*(a+b+c) + root}
	var got []float64
	for j := 0.0; j <= 2; j++ {
		var found []float64
		for block := range 4 {
			sign := 1.0
			if block > 1 {
				sign = -1
			}
			d, e := wang(j, block%2, sign, a, b, c, nil, nil)
			if !tridiagonalEigenvalues(d, e) {
				t.Fatal("no eigenvalues")
			}
			found = append(found, d...)
		}
		sortAscending(found)
		got = append(got, found...)
	}
	if len(got) != len(want) {
		t.Fatalf("%d levels, want %d", len(got), len(want))
	}
	for i := range want {
		if math.Abs(got[i]-want[i]) > 1e-12*math.Max(1, want[i]) {
			t.Errorf("level %d: %v, want %v", i, got[i], want[i])
		}
	}
}

// An asymmetric top with two equal constants is a symmetric one; a nearly
// symmetric one comes near it; and each J has 2J + 1 eigenvalues whose sum is
// the trace J(J + 1)(2J + 1)(A + B + C)/3.
func TestAsymmetricTopLimits(t *testing.T) {
	for _, temperature := range []float64{10, 80, 300} {
		at := number(temperature)
		prolate := made(asymmetricTopLaw, wavenumbers(5.2), wavenumbers(0.85), wavenumbers(0.85), number(3))
		oblate := made(asymmetricTopLaw, wavenumbers(6.2), wavenumbers(9.9), wavenumbers(9.9), number(3))
		for _, l := range []*law.Law{partitionSumLaw, heatCapacityLaw, entropyLaw} {
			closeTo(t, "prolate", one(l, prolate, at), one(l, made(symmetricTopLaw, wavenumbers(5.2), wavenumbers(0.85), number(3)), at), 1e-11)
			closeTo(t, "oblate", one(l, oblate, at), one(l, made(symmetricTopLaw, wavenumbers(6.2), wavenumbers(9.9), number(3)), at), 1e-11)
		}
		near := made(asymmetricTopLaw, wavenumbers(5.2), wavenumbers(0.851), wavenumbers(0.849), number(3))
		closeTo(t, "near-symmetric", one(partitionSumLaw, near, at), one(partitionSumLaw, prolate, at), 1e-5)
	}
	const a, b, c = 3.0, 2.0, 1.2
	for j := 0.0; j <= 40; j++ {
		n, trace := 0, 0.0
		for block := range 4 {
			sign := 1.0
			if block > 1 {
				sign = -1
			}
			d, e := wang(j, block%2, sign, a, b, c, nil, nil)
			tridiagonalEigenvalues(d, e)
			for _, x := range d {
				trace += x
				n++
			}
		}
		if n != int(2*j+1) {
			t.Errorf("J = %v has %d levels", j, n)
		}
		closeTo(t, "trace", trace, j*(j+1)*(2*j+1)*(a+b+c)/3, 1e-13)
	}
}

// Characteristic values of Mathieu's equation, q = 5: Abramowitz M., Stegun I.A.
// (1964) Handbook of Mathematical Functions, table 20.1.
func TestMathieu(t *testing.T) {
	const q = 5.0
	var set levelSet
	set.span = 1000
	// fold 2, B 1: q = V/4, characteristic value = E - V/2. Even orders are the
	// class 0, odd ones the class 1.
	if _, ok := hinderedClass(&set, 0, 2, 4*q, 1); !ok {
		t.Fatal("no eigenvalues")
	}
	for i, want := range []float64{-5.80004602, 2.09946045, 7.44910974} { // a0, b2, a2
		within(t, "even Mathieu value", set.diagonal[i]-2*q, want, 5e-9, "Abramowitz, Stegun, table 20.1")
	}
	if _, ok := hinderedClass(&set, 1, 2, 4*q, 1); !ok {
		t.Fatal("no eigenvalues")
	}
	for i, want := range []float64{-5.79008060, 1.85818754} { // b1, a1
		within(t, "odd Mathieu value", set.diagonal[i]-2*q, want, 5e-9, "Abramowitz, Stegun, table 20.1")
	}
}

// Where the matrix ends the series goes on.
func TestFastRotationMeetsTheMatrix(t *testing.T) {
	for _, barrier := range []float64{0, 1, 100, 3000} {
		var set levelSet
		last, ok := hinderedClass(&set, 0, 3, barrier, 1)
		if !ok {
			t.Fatal("no eigenvalues")
		}
		closeTo(t, "rotation", set.diagonal[len(set.diagonal)-1], fastRotation(3*last, 3, barrier, 1), 2e-14)
	}
}

func TestHinderedRotorLimits(t *testing.T) {
	const b = 5.0
	free := made(hinderedRotorLaw, number(0), number(3), wavenumbers(b), number(1))
	sum := 1.0
	for m := 1.0; m < 60; m++ {
		sum += 2 * math.Exp(-b*m*m*perCentimetre*inverseOf(300))
	}
	closeTo(t, "free rotation", one(partitionSumLaw, free, number(300)), sum, 1e-12)
	// A high barrier: n oscillators of wavenumber n sqrt(V B), less b n²/4 anharmonic.
	const barrier = 40000.0
	stiff := made(hinderedRotorLaw, wavenumbers(barrier), number(3), wavenumbers(b), number(3))
	swing := 3*math.Sqrt(barrier*b) - b*9/4
	closeTo(t, "stiff", one(meanEnergyLaw, stiff, number(400)), one(meanEnergyLaw, oscillatorOf(swing*perCentimetre), number(400)), 0.02)
	// Large moment of inertia: the classical functions of Pitzer and Gwinn.
	heavy := made(hinderedRotorLaw, wavenumbers(600), number(3), wavenumbers(0.02), number(1))
	classical := one(classicalHinderedRotorLaw, wavenumbers(600), number(300), word("heat capacity"))
	closeTo(t, "heavy", one(heatCapacityLaw, heavy, number(300)), classical, 1e-3)
	lost := one(entropyLaw, made(hinderedRotorLaw, number(0), number(3), wavenumbers(0.02), number(1)), number(300)) - one(entropyLaw, heavy, number(300))
	closeTo(t, "entropy lost", lost, one(classicalHinderedRotorLaw, wavenumbers(600), number(300), word("entropy lost")), 2e-3)
}

// Bessel's ratio: both ways agree at the border, and with I1(1)/I0(1) =
// 0.44639000 (Abramowitz, Stegun, table 9.8).
func TestBesselRatio(t *testing.T) {
	r, ln := besselRatio(1)
	within(t, "I1/I0", r, 0.565159104/1.266065878, 2e-9, "Abramowitz, Stegun, table 9.8")
	within(t, "ln I0 - 1", ln, math.Log(1.266065878)-1, 2e-9, "Abramowitz, Stegun, table 9.8")
	a, b := math.Nextafter(25, 0), math.Nextafter(25, 26)
	ra, la := besselRatio(a)
	rb, lb := besselRatio(b)
	closeTo(t, "ratio at the border", ra, rb, 2e-15)
	closeTo(t, "logarithm at the border", la, lb, 2e-15)
}

func TestEigenvaluesOfAKnownMatrix(t *testing.T) {
	// 2 on the diagonal, -1 beside it: 2 - 2 cos(k pi/(n + 1)).
	const n = 150
	d, e := make([]float64, n), make([]float64, n-1)
	for i := range d {
		d[i] = 2
	}
	for i := range e {
		e[i] = -1
	}
	if !tridiagonalEigenvalues(d, e) {
		t.Fatal("no eigenvalues")
	}
	for k := range d {
		if want := 2 - 2*math.Cos(float64(k+1)*math.Pi/(n+1)); math.Abs(d[k]-want) > 3e-15 {
			t.Errorf("eigenvalue %d: %v, want %v", k, d[k], want)
		}
	}
	if tridiagonalEigenvalues(make([]float64, mostRows+1), make([]float64, mostRows)) {
		t.Error("a matrix too large is taken")
	}
}
