package imf

// SalpeterSlope is the exponent of the Salpeter mass function per unit mass;
// 1.35 per unit logarithm of the mass.
// Source: [Salpeter1955].
const SalpeterSlope = 2.35

// Salpeter returns the mass function xi ~ m^-slope from low to high.
//
// Units: low, high in solar masses.
// Domain: 0 < low < high. Measured between 0.4 and 10.
// Error: below 0.5 the real slope is much flatter, so that the number of light
// stars is too large, by more the lower the limit.
// Source: [Salpeter1955]. Checked by testdata/published/massfunctions.csv.
func Salpeter(low, high, slope float64) (BrokenPowerLaw, error) {
	return NewBrokenPowerLaw([]float64{low, high}, []float64{slope})
}
