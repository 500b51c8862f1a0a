package structure

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// RelativisticPeak returns the greatest mass of a cold dwarf of ideal electrons
// in general relativity. Denser ones are unstable; in Newton's gravity the mass
// rises on to [LimitingMass].
//
//	dP/dr = -G (eps + P)(m + 4 pi r^3 P/c^2) / [c^2 r (r - 2 G m/c^2)]
//	dm/dr = 4 pi r^2 eps/c^2
//
// with the pressure P and the energy density eps of ideal electrons at zero
// temperature and of the mass at rest of mu_e atomic mass units each.
//
// Units: mu_e nucleons per electron, result in solar masses.
// Domain: 1.5 <= mu_e <= 3. Error: 1e-5 of the integration; the pull of ions and
// the capture of electrons, left out, lower it by some per cent.
// Source: [OppenheimerVolkoff1939]; [ShapiroTeukolsky1983], section 6.10.
// Checked by testdata/published/structure.csv.
func RelativisticPeak(muE float64) float64 {
	low, high := num.Log(5.), num.Log(100.) // of x = p_F/(m_e c) at the centre
	const golden = 0.61803398874989485
	a, b := high-golden*(high-low), low+golden*(high-low)
	ma, mb := relativisticMass(num.Exp(a), muE), relativisticMass(num.Exp(b), muE)
	for high-low > 1e-4 {
		if ma > mb {
			high, b, mb = b, a, ma
			a = high - golden*(high-low)
			ma = relativisticMass(num.Exp(a), muE)
		} else {
			low, a, ma = a, b, mb
			b = low + golden*(high-low)
			mb = relativisticMass(num.Exp(b), muE)
		}
	}
	return math.Max(ma, mb)
}

// gas is ideal electrons at y = sqrt(1 + x^2) - 1: pressure and energy density,
// and (eps + P)/(8 A x^3), where dP/dy = 8 A x^3. In units of 1/m^2.
func gas(y, unitP, unitRho float64) (p, eps, push float64) {
	x := math.Sqrt(y * (y + 2))
	x3 := x * x * x
	f := x3 * x * x * (8./5 - x*x*(4./7-x*x/3)) // small x: the closed form cancels
	if x > 0.05 {
		f = x*(2*x*x-3)*(y+1) + 3*num.Asinh(x)
	}
	p = unitP * f
	eps = unitRho*x3 + unitP*(8*x3*y-f)
	if x3 == 0 {
		return 0, 0, unitRho / (8 * unitP)
	}
	return p, eps, (eps + p) / (8 * unitP * x3)
}

// relativisticMass is the mass, solar masses, of the dwarf with x at its centre.
func relativisticMass(x, muE float64) float64 {
	const (
		c, h  = constant.C, constant.Planck
		me    = constant.ElectronMass
		toGeo = constant.G / (c * c * c * c)
		steps = 400
	)
	compton := me * c / h // 1/m
	density := compton * compton * compton
	unitP := math.Pi / 3 * me * c * c * density * toGeo
	unitRho := 8 * math.Pi / 3 * density * muE * constant.AtomicMass * c * c * toGeo
	slope := func(r, y, m float64) (dy, dm float64) {
		p, eps, push := gas(math.Max(y, 0), unitP, unitRho)
		dm = 4 * math.Pi * r * r * eps
		return -push * (m + 4*math.Pi*r*r*r*p) / (r * (r - 2*m)), dm
	}
	y := math.Sqrt(1+x*x) - 1
	p, eps, push := gas(y, unitP, unitRho)
	// y falls as y - k r^2 at the centre; the first step goes a little way out.
	k := push * 2 * math.Pi * (eps/3 + p)
	step := math.Sqrt(y/k) / steps
	r := step
	m := 4 * math.Pi / 3 * eps * r * r * r
	y -= k * r * r
	for surface := 1e-12 * y; y > surface; {
		dy, _ := slope(r, y, m)
		r, y, m = rungeKutta(slope, r, y, m, math.Min(step, -y/dy))
	}
	return m / (constant.GMSun / (c * c))
}

func rungeKutta(slope func(r, y, m float64) (dy, dm float64), r, y, m, h float64) (float64, float64, float64) {
	y1, m1 := slope(r, y, m)
	y2, m2 := slope(r+h/2, y+h/2*y1, m+h/2*m1)
	y3, m3 := slope(r+h/2, y+h/2*y2, m+h/2*m2)
	y4, m4 := slope(r+h, y+h*y3, m+h*m3)
	return r + h, y + h/6*(y1+2*y2+2*y3+y4), m + h/6*(m1+2*m2+2*m3+m4)
}
