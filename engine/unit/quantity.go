package unit

// DimensionOf returns the dimension of unit text such as "W/(m K)". Text that
// is no unit gives the dimension of a pure number: use Parse where the text is
// not known beforehand.
func DimensionOf(text string) Dimension {
	u, err := Parse(text)
	if err != nil {
		return Dimension{}
	}
	return u.Dimension()
}

// powers returns a dimension with whole powers of the first three base
// quantities.
func powers(mass, length, time int) Dimension {
	var d Dimension
	d.twelfths[placeMass] = clamp(mass * wholePower)
	d.twelfths[placeLength] = clamp(length * wholePower)
	d.twelfths[placeTime] = clamp(time * wholePower)
	return d
}

// None is the dimension of a pure number.
func None() Dimension { return Dimension{} }

// Length is the dimension of m.
func Length() Dimension { return base(placeLength) }

// Area is the dimension of m^2.
func Area() Dimension { return powers(0, 2, 0) }

// Volume is the dimension of m^3.
func Volume() Dimension { return powers(0, 3, 0) }

// Wavenumber is the dimension of 1/m.
func Wavenumber() Dimension { return powers(0, -1, 0) }

// Mass is the dimension of kg.
func Mass() Dimension { return base(placeMass) }

// Density is the dimension of kg/m^3.
func Density() Dimension { return powers(1, -3, 0) }

// Time is the dimension of s.
func Time() Dimension { return base(placeTime) }

// Frequency is the dimension of 1/s.
func Frequency() Dimension { return powers(0, 0, -1) }

// Speed is the dimension of m/s.
func Speed() Dimension { return powers(0, 1, -1) }

// Acceleration is the dimension of m/s^2.
func Acceleration() Dimension { return powers(0, 1, -2) }

// Force is the dimension of N.
func Force() Dimension { return powers(1, 1, -2) }

// Pressure is the dimension of Pa.
func Pressure() Dimension { return powers(1, -1, -2) }

// Energy is the dimension of J.
func Energy() Dimension { return powers(1, 2, -2) }

// SpecificEnergy is the dimension of J/kg.
func SpecificEnergy() Dimension { return powers(0, 2, -2) }

// EnergyPower is the dimension of W. (Power is the operation on dimensions.)
func EnergyPower() Dimension { return powers(1, 2, -3) }

// Viscosity is the dimension of Pa s.
func Viscosity() Dimension { return powers(1, -1, -1) }

// SurfaceTension is the dimension of N/m.
func SurfaceTension() Dimension { return powers(1, 0, -2) }

// Current is the dimension of A.
func Current() Dimension { return base(placeCurrent) }

// Charge is the dimension of C.
func Charge() Dimension { return Current().Times(Time()) }

// Temperature is the dimension of K.
func Temperature() Dimension { return base(placeTemperature) }

// Entropy is the dimension of J/K, also that of a heat capacity.
func Entropy() Dimension { return Energy().Over(Temperature()) }

// SpecificEntropy is the dimension of J/(kg K), also that of a specific heat.
func SpecificEntropy() Dimension { return SpecificEnergy().Over(Temperature()) }

// Amount is the dimension of mol.
func Amount() Dimension { return base(placeAmount) }

// MolarMass is the dimension of kg/mol.
func MolarMass() Dimension { return Mass().Over(Amount()) }

// MolarEnergy is the dimension of J/mol.
func MolarEnergy() Dimension { return Energy().Over(Amount()) }

// MolarEntropy is the dimension of J/(mol K).
func MolarEntropy() Dimension { return MolarEnergy().Over(Temperature()) }

// LuminousIntensity is the dimension of cd.
func LuminousIntensity() Dimension { return base(placeLuminousIntensity) }
