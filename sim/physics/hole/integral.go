package hole

import (
	"math"

	"wane/sim/num"
)

// legendre holds the positive nodes and the weights of the 10-point
// Gauss-Legendre rule on -1 .. 1 (Abramowitz & Stegun 1964, table 25.4).
var legendre = [5][2]float64{
	{0.148874338981631, 0.295524224714753},
	{0.433395394129247, 0.269266719309996},
	{0.679409568299024, 0.219086362515982},
	{0.865063366688985, 0.149451349150581},
	{0.973906528517172, 0.066671344308688},
}

const (
	// panel is the width in ln m of one application of the rule, panels how
	// many there are: what lies below e^-14 of the mass takes e^-42 of the life.
	panel, panels = 0.5, 28
	// cold is the number of heaviest switch masses above which massive
	// species change the life by less than one rounding.
	cold = 1e6
)

// Log10Lifetime returns how long a hole of mass m lasts while species join as
// it heats up: [Emission.Log10Wait] to mass 0.
func (e *Emission) Log10Lifetime(m float64) float64 { return e.Log10Wait(m, 0) }

// Log10Wait returns how long a hole takes from mass m to mass end while species
// join as it heats up.
//
//	t = G^2/(hbar c^4) int_end^m x^2 dx / alpha(x)
//
// Shapes: scalar to scalar.
// Units: masses in solar masses; result log10 of years.
// Domain: m > end >= 0; -Inf for m <= end, +Inf when nothing is ever emitted.
// Error: of the quadrature, below 1e-11 relative (measured against mpmath
// from 1e-25 to 1e12 Msun); of alpha, see [Emission.Alpha]. For a
// hole above 1e6 times the mass at which the first massive particle joins,
// late switches change the life by under 1e-17, and the closed form is used.
//
// Source: Page 1976, integrated over the life.
func (e *Emission) Log10Wait(m, end float64) float64 {
	switch {
	case !(m > end):
		return math.Inf(-1)
	case len(e.alpha) == 0, e.always > 0 && m > cold*e.heaviest:
		return Log10Wait(m, end, e.always)
	}
	// With x = m e^-y the integral is m^3 int_0^span e^-3y / alpha(m e^-y) dy.
	span := float64(panel * panels)
	if end > 0 {
		span = math.Min(span, logRatio(m, end))
	}
	pieces := math.Ceil(span / panel)
	width, sum := span/pieces, 0.0
	for p := range int(pieces) {
		middle := (float64(p) + 0.5) * width
		for _, node := range legendre {
			for _, side := range [2]float64{-1, 1} {
				y := middle + side*node[0]*width/2
				if a := e.Alpha(m * num.Exp(-y)); a > 0 {
					sum += node[1] * width / 2 * num.Exp(-3*y) / a
				} else {
					return math.Inf(1)
				}
			}
		}
	}
	return 3*num.Log10(m) + num.Log10(sum) - num.Log10(lossUnit)
}
