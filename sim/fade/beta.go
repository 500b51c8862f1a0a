package fade

import (
	"math"

	"wane/sim/num"
)

// betaLaw is the beta law of parameters a, b > 0: the law of the order
// statistics of uniform values.
type betaLaw struct {
	a, b  float64
	whole float64 // the integral from 0 to 1, see integral
}

func newBetaLaw(a, b float64) betaLaw {
	l := betaLaw{a: a, b: b}
	mean := a / (a + b)
	l.whole = l.integral(mean, a, b) + l.integral(1-mean, b, a)
	return l
}

// below is the regularised incomplete beta function I_x(a, b): the chance of
// a value below x. Domain: 0 <= x <= 1. Error: under 1e-14 up to a = b = 500
// (against mpmath).
func (l betaLaw) below(x float64) float64 {
	switch {
	case x <= 0:
		return 0
	case x >= 1:
		return 1
	case x <= l.a/(l.a+l.b):
		return l.integral(x, l.a, l.b) / l.whole
	}
	return 1 - l.integral(1-x, l.b, l.a)/l.whole
}

// integral is that of t^(a-1) (1-t)^(b-1) from 0 to x, in units of t^a (1-t)^b
// at the mean (it would vanish in others), by the continued fraction DLMF
// 8.17.22 after the method of Lentz.
func (l betaLaw) integral(x, a, b float64) float64 {
	const tiny, most = 1e-300, 100000
	mean, rest := a/(a+b), b/(a+b)
	off := x - mean
	front := num.Exp(float64(a*num.Log1p(off/mean))+float64(b*num.Log1p(-off/rest))) / a
	if front == 0 {
		return 0
	}
	c := 1.0
	d := 1 - float64((a+b)*x)/(a+1)
	if math.Abs(d) < tiny {
		d = tiny
	}
	d = 1 / d
	f := d
	for i := 1; i < most; i++ {
		m := float64(i)
		even := float64(m*(b-m)) * x / float64((a+2*m-1)*(a+2*m))
		odd := -float64((a+m)*(a+b+m)) * x / float64((a+2*m)*(a+2*m+1))
		step := 1.0
		for _, term := range [2]float64{even, odd} {
			if d = 1 + float64(term*d); math.Abs(d) < tiny {
				d = tiny
			}
			if c = 1 + term/c; math.Abs(c) < tiny {
				c = tiny
			}
			d = 1 / d
			step = float64(c * d)
			f *= step
		}
		if math.Abs(step-1) < 1e-16 {
			break
		}
	}
	return front * f
}
