package collision

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// The rate of a pair is no product of what its two bodies are, but a sum of
// such products: with d = r1 + r2
//
//	sigma = pi (r1^2 + r2^2) + 2 pi r1 r2
//	      + (2 pi G/v^2) (m1 r1 + m2 r2) + (2 pi G/v^2) (r1 m2 + r2 m1)
//
// Each term is shared between the two, so that either seeks the other:
//
//	term    one seeks by   the other is sought by   rate of one unit
//	area    r^2            1                        pi n v
//	touch   r              r                        pi n v mean r
//	weight  m r            1                        2 pi G n/v
//	pull    r              m                        2 pi G n/v mean m
//
// Radii count in solar radii, masses in solar masses. A partner is picked in
// proportion to how much it is sought; then seeking and being sought add up to
// n sigma v for every pair (tested).

// Galaxy is what the rates hang on.
type Galaxy struct {
	Number     float64 // objects
	Mass       float64 // of all, solMass
	Radii      float64 // sum of all radii, solar radii
	Radius     float64 // of the galaxy: half-mass, pc
	Dispersion float64 // km/s
}

// Rates are log10 of the rate of one unit of each term, 1/yr; -Inf where
// nothing can meet.
type Rates struct{ Area, Touch, Weight, Pull float64 }

const (
	// log10 of pi Rsun^2 (km/s)/pc^3 in 1/yr
	sunRadius = constant.SunR / 1e3 // km
	// G Msun, km^3/s^2
	gravity = constant.GMSun * 1e-9
)

// RatesOf returns the rates of the terms.
//
// Domain: number > 0, radius > 0, dispersion > 0; else all are -Inf.
// Error: that of [MeanDensity] and of the uniform speed: a factor of 2 to 3.
// Source: the algebra above. Checked by collisions.csv.
func RatesOf(g Galaxy) Rates {
	zero := math.Inf(-1)
	r := Rates{zero, zero, zero, zero}
	if !(g.Number > 0 && g.Radius > 0 && g.Dispersion > 0) {
		return r
	}
	lv := num.Log10(g.Dispersion)
	n := num.Log10(3*constant.Year/(8*math.Pi)) + num.Log10(g.Number) - 3*(num.Log10(g.Radius)+num.Log10(parsec)) // yr/(s km^3)
	r.Area = n + lv + num.Log10(math.Pi*sunRadius*sunRadius)
	r.Weight = n - lv + num.Log10(2*math.Pi*gravity*sunRadius)
	if g.Radii > 0 {
		r.Touch = r.Area + num.Log10(g.Radii) - num.Log10(g.Number)
	}
	if g.Mass > 0 {
		r.Pull = r.Weight + num.Log10(g.Mass) - num.Log10(g.Number)
	}
	return r
}

// InSolarRadii converts a radius in km.
func InSolarRadii(r float64) float64 { return r / sunRadius }
