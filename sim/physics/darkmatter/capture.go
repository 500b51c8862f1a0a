// Package darkmatter is the heat of dark matter that a cold body captures and
// that annihilates inside it.
//
// It lasts only while the body is bound in a halo of dark matter and the halo
// survives. Left out: that capture by brown dwarfs is less complete, and the
// time until capture and annihilation balance.
//
// Sources: Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section IV;
// Baryakhtar et al. 2017, Phys. Rev. Lett. 119, 131801.
package darkmatter

import (
	"math"

	"wane/sim/physics/constant"
)

// Surface returns the energy per rest energy of what falls from rest far away
// onto a body.
//
//	1/sqrt(1 - 2 G m/(r c^2))
//
// Units: m in solar masses, r in km. Domain: r above the horizon; NaN inside.
// A body that stops what it captures is heated by this minus one times
// [Power]'s rest energy even if nothing annihilates: a quarter for a neutron
// star, nothing for a dwarf.
//
// Source: Baryakhtar et al. 2017. Checked by darkmatter.csv.
func Surface(m, r float64) float64 {
	return 1 / math.Sqrt(1-2*constant.GMSun*m/(r*1e3*constant.C*constant.C))
}

// Power returns the heat of captured and annihilated dark matter.
//
//	L = f pi R^2 (1 + v_esc^2/v^2) rho c^2 v,  v_esc^2 = 2 G m/R
//
// Units: m in solar masses, r in km, density in GeV/cm^3 (of rest energy), v
// in km/s, result in W.
// Domain: m >= 0, r > 0, density >= 0, v > 0; efficiency 0 .. 1 is the share
// of what crosses the body that is captured.
// Error: Newtonian focusing (a neutron star gains some per cent more); the
// efficiency is uncertain by decades.
// Special cases: 0 for r = 0.
//
// Source: Adams & Laughlin 1997, section IV. Checked by testdata/published/darkmatter.csv.
func Power(m, r, efficiency, density, v float64) float64 {
	if !(r > 0) {
		return 0
	}
	r, v = r*1e3, v*1e3
	rho := density * 1e9 * constant.EV * 1e6 // J/m3
	// pi R^2 (1 + v_esc^2/v^2) without dividing by a small radius.
	area := math.Pi * (r*r + 2*constant.GMSun*m*r/(v*v))
	return efficiency * area * rho * v
}
