package hole

// SpinHastens is the factor by which a hole that was born with spin a (0, none,
// to 1, as fast as can be) loses mass faster, in the mean over its life, than
// one without spin.
//
//	t(a) = t(0)/(1 + 1.2 a^2)
//
// Domain: 0 <= a <= 1. Error: at a = 1 Page finds 2.0 to 2.7, by which species
// there are; the shape between is a guess.
//
// Source: assumption, through the range of Page 1976, Phys. Rev. D 14, 3260.
func SpinHastens(a float64) float64 { return 1 + 1.2*a*a }
