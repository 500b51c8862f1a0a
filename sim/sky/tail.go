package sky

import (
	"math"

	"wane/sim/num"
)

// tail continues a piece of sky from s on with constant eps:
//
//	1/H = 1/H_s + eps (t - t_s),  a ~ H^(-1/eps);  a ~ exp(H t) for eps = 0
//
// For eps < 0 it ends in a rip, when 1/H is zero.
type tail struct {
	s, x, logH, eps float64
	logK            [4]float64 // log10 K0..K3, in yr^1..yr^4
	logEta          float64
	still           bool    // H t << 1: space has come to rest for a while
	bent            float64 // share of H^2 that curvature has: 1 where it rules, else 0
}

// powers returns c0..c2 with K_j = c_j / H^(j+1) when eps and the share of
// curvature are constant.
func powers(eps, bent float64) (c0, c1, c2 float64) {
	c0 = 1 / (3 + eps)
	c1 = c0 / (2 + 2*eps - 4*bent/(1+3*eps))
	return c0, c1, 2 * c1 / (1 + 3*eps)
}

// turned returns log10 of H_s (t - t_s).
func (t *tail) turned(s float64) float64 {
	if t.logH == zero {
		return zero
	}
	return num.Sub10(s, t.s) + t.logH
}

// grown returns x - x_s; +Inf beyond the range of numbers and after a rip.
func (t *tail) grown(s float64) float64 {
	u := t.turned(s)
	if u == zero {
		return 0
	}
	if t.eps == 0 {
		return num.Exp10(u)
	}
	v := u + num.Log10(math.Abs(t.eps))
	if t.eps < 0 {
		if v >= 0 {
			return inf
		}
		return num.Log1p(-num.Exp10(v)) / t.eps
	}
	if v > 20 {
		return v * num.Ln10 / t.eps
	}
	return num.Log1p(num.Exp10(v)) / t.eps
}

// rip returns log10 of since at which space tears apart; +Inf if it does not.
func (t *tail) rip() float64 {
	if t.eps >= 0 {
		return inf
	}
	return num.Add10(t.s, -t.logH-num.Log10(-t.eps))
}

func (t *tail) lnA(s float64) float64 { return t.x + t.grown(s) }

func (t *tail) hubble(s float64) float64 {
	if t.eps == 0 {
		return t.logH
	}
	return t.logH - t.eps*t.grown(s)/num.Ln10
}

// fourVolume returns log10 K3.
func (t *tail) fourVolume(s float64) float64 {
	if t.eps < 0 {
		return num.Log10(t.ripping(t.grown(s))[3]) - 4*t.logH
	}
	k3, from := t.logK[3], t.s
	if t.still {
		// Space at rest until 1/H has passed, then the power law. The junction
		// is monotone; log10 K3 is up to 0.5 off around it.
		k3 = t.resting(math.Min(num.Sub10(s, t.s), -t.logH))[3]
		if from = num.Add10(t.s, -t.logH); s <= from {
			return k3
		}
	}
	_, _, c2 := powers(t.eps, t.bent)
	if t.eps == 0 {
		return num.Add10(k3, num.Log10(3*c2)-3*t.logH+num.Sub10(s, from))
	}
	scale := -4*t.logH + num.Log10(3*c2/(4*t.eps))
	return num.Add10(k3, num.Sub10(scale+4*t.eps*t.grown(s)/num.Ln10, scale+4*t.eps*t.grown(from)/num.Ln10))
}

// resting returns log10 of K0..K3 after 10^d years of rest.
func (t *tail) resting(d float64) [4]float64 {
	k := t.logK
	three := num.Log10(3)
	return [4]float64{
		num.Add10(k[0], d),
		num.Sum10(k[1], k[0]+d, 2*d-num.Log10(2)),
		num.Sum10(k[2], num.Log10(2)+k[1]+d, k[0]+2*d, 3*d-three),
		num.Sum10(k[3], three+k[2]+d, three+k[1]+2*d, k[0]+3*d, 4*d-num.Log10(4)),
	}
}

// comoving returns log10 of the comoving particle horizon, ly.
func (t *tail) comoving(s float64) float64 {
	if t.logH == zero { // at rest for ever
		return num.Add10(t.logEta, num.Sub10(s, t.s)-t.x/num.Ln10)
	}
	unit := -t.x/num.Ln10 - t.logH
	return num.Add10(t.logEta, unit+t.reach(t.grown(s)))
}

// reach returns log10 of int e^(-y) (H_s/H) dy from 0 to dx: the comoving way
// of light in units of its first 1/(a H).
func (t *tail) reach(dx float64) float64 {
	e := t.eps - 1
	switch {
	case e == 0:
		return num.Log10(dx)
	case e < 0:
		return num.Log10(num.Expm1(e*dx) / e)
	case e*dx > 40:
		return (e*dx - num.Log(e)) / num.Ln10
	}
	return num.Log10(num.Expm1(e*dx) / e)
}

// horizon returns log10 of the event horizon in ly, if the piece lasts for
// ever: c/H / (1 - eps), +Inf without acceleration.
func (t *tail) horizon(s float64) float64 {
	if t.eps > 1-margin {
		return inf
	}
	return -t.hubble(s) - num.Log10(1-t.eps)
}

// chain returns log10 K_j.
func (t *tail) chain(j int, s float64) float64 {
	if j == 3 {
		return t.fourVolume(s)
	}
	switch {
	case t.still && s <= num.Add10(t.s, -t.logH):
		return t.resting(num.Sub10(s, t.s))[j]
	case t.eps < 0:
		return num.Log10(t.ripping(t.grown(s))[j]) - float64(j+1)*t.logH
	}
	c0, c1, c2 := powers(t.eps, t.bent)
	return num.Log10([3]float64{c0, c1, c2}[j]) - float64(j+1)*t.hubble(s)
}
