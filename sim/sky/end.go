package sky

import (
	"math"

	"wane/sim/num"
)

// What the end of a table asks for.
const (
	alone        = 1e-9 // share of H^2 that may differ from the one that stays
	settled      = 1e-8 // how far K2 may be from its power law
	resting      = 1e-3 // p below which space is at rest
	longRest     = 30   // decades of rest worth a shortcut
	tailAgrees   = 1e-7 // relative difference of ln H between tail and law
	tailFarthest = 1e77
)

// end closes the table at s if from there on one density rules and its
// exponent stays what it is, as far as the law can be asked.
func (m *march) end(s float64, r rates, g, logK3, logEta float64) (bool, error) {
	eps, ok := r.ruling(g)
	if !ok {
		return false, nil
	}
	t := num.Add10(m.unit, s)
	next := tail{s: s, x: m.state[0], logH: r.logH, eps: eps, logEta: logEta}
	for j, q := range m.state[1:] {
		next.logK[j] = num.Log10(q) + float64(j+1)*t
	}
	next.logK[3] = logK3
	next.still = r.ps < resting
	if r.curvature > 1-alone {
		next.bent = 1
	}
	switch {
	case next.still && -r.logH-s < longRest:
		return false, nil
	case !next.still && eps >= 0:
		_, _, c2 := powers(eps, next.bent)
		if math.Abs(next.logK[2]+3*r.logH-num.Log10(c2)) > settled {
			return false, nil
		}
	}
	if agrees, err := m.agrees(&next); !agrees || err != nil {
		return false, err
	}
	m.p.tail = next
	return true, nil
}

// ruling returns eps of the density that makes up all of H^2.
func (r rates) ruling(g float64) (eps float64, ok bool) {
	switch {
	case r.logH == zero:
		return 1.5, true // nothing is left: at rest for ever
	case r.matter > 1-alone:
		return 1.5, true
	case r.radiation > 1-alone:
		return 2, true
	case r.curvature > 1-alone:
		return 1, true
	case r.dark > 1-alone && r.ps > 1e-100: // with less, g/ps is nothing but rounding
		eps = (g - 0.5*r.ps*(3*r.matter+4*r.radiation+2*r.curvature)) / (r.dark * r.ps)
		if math.Abs(eps) < 1e-11 {
			eps = 0
		}
		return eps, true
	}
	return 0, false
}

// agrees asks the law along the tail, as far as ln a is a number, on points
// close enough not to step over a spell of dark energy.
func (m *march) agrees(t *tail) (bool, error) {
	const batch = 64
	points, at := make([]where, 0, batch), make([]float64, 0, batch)
	found := make([]density, batch)
	rip := t.rip()
	for d := 0.125; ; d += math.Max(0.125, d/16) {
		s := t.s + d
		if rip < inf {
			s = num.Add10(t.s, num.Sub10(rip, t.s)+num.Log10(-num.Expm1(-d)))
		}
		x := t.lnA(s)
		last := s > tailFarthest || rip < inf && d > 32 || math.IsInf(x, 0) && t.logH != zero
		if !last {
			points, at = append(points, m.where(s, x)), append(at, s)
		}
		if last || len(points) == batch {
			if err := m.at(points, found); err != nil {
				return false, err
			}
			for i, s := range at {
				want := t.hubble(s)
				if found[i].logH != want && !(math.Abs(found[i].logH-want) <= tailAgrees*(1+math.Abs(want-t.logH))) {
					return false, nil
				}
			}
			points, at = points[:0], at[:0]
		}
		if last {
			return true, nil
		}
	}
}

// finish computes what needs the whole piece: the event horizon, backwards
// from the tail, and from when on the sky is colder.
func (p *piece) finish(logT0 float64) {
	n := len(p.s)
	p.logR.value, p.logR.slope = make([]float64, n), make([]float64, n)
	logR := p.tail.horizon(p.tail.s)
	for i := n - 1; i >= 0; i-- {
		ps := p.x.slope[i] / num.Ln10
		if i < n-1 && logR < inf {
			h, dx := (p.s[i+1]-p.s[i])*num.Ln10, p.x.value[i+1]-p.x.value[i]
			if ps > slavedAt && p.warm[i] {
				logR = -p.logH.value[i] - num.Log10(1+p.logH.slope[i]/ps)
			} else {
				own := p.s[i] + num.Log10(light(h, dx, ps, p.x.slope[i+1]/num.Ln10))
				logR = num.Add10(logR-dx/num.Ln10, own)
			}
		}
		p.logR.value[i] = logR
		p.logR.slope[i] = ps - num.Exp10(p.s[i]-logR)
	}
	p.coldAt = make([]float64, n)
	hottest := math.Inf(-1)
	for i := n - 1; i >= 0; i-- {
		hottest = math.Max(hottest, p.temperature(p.s[i], logT0))
		p.coldAt[i] = hottest
	}
}
