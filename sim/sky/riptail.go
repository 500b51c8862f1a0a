package sky

import (
	"math"

	"wane/sim/num"
)

// ripping returns K0..K3 of the package comment in powers of the first 1/H,
// where space has grown by e^dx since the tail began and eps < 0. Unlike
// elsewhere they keep a memory of how they were: 1/H falls so fast that K2 may
// not follow. With h = e^(eps dx) the equations are
//
//	dK0/dx = h - 3 K0,  dK1/dx = h K0 - 2 K1,  dK2/dx = 2 h K1 - K2,  dK3/dx = 3 h K2
//
// and their solutions sums of exponentials.
func (t *tail) ripping(dx float64) (k [4]float64) {
	e := t.eps
	if math.Abs(1+3*e) < resonant {
		e = (resonant - 1) / 3 // two of the exponentials are all but the same
	}
	var k0 [4]float64
	for j := range k0 {
		k0[j] = num.Exp10(t.logK[j] + float64(j+1)*t.logH)
	}
	power := func(b float64) float64 { return num.Exp(b * dx) }
	grows := func(b float64) float64 { return num.Expm1(b*dx) / b } // its integral
	c0, c1, c2 := powers(e, 0)
	a0 := k0[0] - c0
	b1 := a0 / (e - 1)
	a1 := k0[1] - c1 - b1
	b2, d2 := b1/(e-1), 2*a1/(e-1)
	a2 := k0[2] - c2 - b2 - d2
	k[0] = c0*power(e) + a0*power(-3)
	k[1] = c1*power(2*e) + b1*power(e-3) + a1*power(-2)
	k[2] = c2*power(3*e) + b2*power(2*e-3) + d2*power(e-2) + a2*power(-1)
	k[3] = k0[3] + 3*(c2*grows(4*e)+b2*grows(3*e-3)+d2*grows(2*e-2)+a2*grows(e-1))
	return k
}

// resonant is how close to -1/3 eps may come: the error it makes, and that of
// the digits lost to the difference of two large terms, stay below 1e-7.
const resonant = 1e-7
