package remnants

// Limits of the white-dwarf relation, solar masses. HeaviestWhiteDwarf and
// OxygenNeonMass are rounded from models; LightestWhiteDwarf bounds only what
// the scatter may do. All three are assumptions.
const (
	HeaviestWhiteDwarf = 1.40
	OxygenNeonMass     = 1.05
	LightestWhiteDwarf = 0.10
)

// HeliumLimit is the mass at birth, in solar masses, below which a star
// leaves its own mass as helium: where M_f = M_i meets the relation of
// [CummingsMean]. 0.489/(1 - 0.080).
const HeliumLimit = 0.489 / 0.920

// CummingsMean returns the mean mass of the white dwarf that a star leaves.
//
//	M_f = M_i                    below 0.5315: the whole star, as helium
//	      0.080 M_i + 0.489      below 2.85
//	      0.187 M_i + 0.184      below 3.60
//	      0.107 M_i + 0.471      above
//
// Units: m and result in solar masses.
// Domain: m >= 0. Measured from 0.83 to 7.20; the relation is carried on to
// both sides, and its low end is an assumption, for such stars have yet to
// die.
// Error: coefficients (0.016, 0.030), (0.061, 0.199), (0.016, 0.077); the
// pieces as printed join to 0.001 at 2.85 and 3.60 and are left so.
// Source: [CummingsEtAl2018], eqs. 4-6. Checked by
// testdata/published/remnants.csv.
func CummingsMean(m float64) float64 {
	switch {
	case m < HeliumLimit:
		return m
	case m < 2.85:
		return 0.080*m + 0.489
	case m < 3.60:
		return 0.187*m + 0.184
	}
	return 0.107*m + 0.471
}

// CummingsInitial returns the mass at birth of the stars that leave white
// dwarfs of mean mass mf: the inverse of [CummingsMean]. Inside the seam at
// 3.60, where two masses share an answer, it gives the smaller.
//
// Units: mf and result in solar masses.
// Domain: mf >= 0.
func CummingsInitial(mf float64) float64 {
	switch {
	case mf < HeliumLimit:
		return mf
	case mf < 0.080*2.85+0.489:
		return (mf - 0.489) / 0.080
	case mf < 0.187*3.60+0.184:
		return (mf - 0.184) / 0.187
	}
	return (mf - 0.471) / 0.107
}

// WhiteDwarf returns the mass of the white dwarf below which the fraction u
// of stars of mass m ends: the mean of [CummingsMean] with a Gaussian scatter
// cut at 3 sigma, kept between 0.10 and the smaller of m and 1.40. Stars
// below [HeliumLimit] do not scatter.
//
//	M_f = mean + scatter sqrt2 erfinv((2u - 1) erf(3/sqrt2))
//
// Units: m, scatter and result in solar masses.
// Domain: m >= 0, 0 <= u <= 1, scatter >= 0.
// Error: as for the mean; that the scatter is Gaussian, the same for all
// masses, and ends at 3 sigma are assumptions. Monotone in u.
// Source: [CummingsEtAl2018] for the mean.
func WhiteDwarf(m, u, scatter float64) float64 {
	return scattered(CummingsMean(m), m, u, scatter, HeliumLimit)
}

// threeSigma is erf(3/sqrt2), the share of a Gaussian inside 3 sigma.
const threeSigma = 0.99730020393673981
