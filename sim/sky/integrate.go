package sky

import (
	"fmt"
	"math"

	"wane/sim/num"
)

// How finely the integration goes. Steps are bounded in ln since, x and ln H;
// the classical Runge-Kutta method of fourth order on them keeps every table
// within 1e-6.
const (
	stepLog   = num.Ln10 / 64
	stepX     = 0.04
	stepH     = 0.2   // in ln H
	slavedAt  = 100   // p above which K0..K2 follow H without delay
	firstLnA  = -18.4 // ln a at the first node: 1e-8
	maxNodes  = 40000
	maxSince  = 100.0 // by how many decades after its first 1/H (or a year) a tail must be found
	tailEvery = 8     // nodes between attempts to end the table
)

// start is the state in which a piece of sky begins.
type start struct {
	origin, s, x float64
	logK         [4]float64
	logEta       float64
	// unit is log10 of the time that keeps the K in range at since = 0; -Inf
	// at the Big Bang.
	unit float64
}

// bigBang is the start in matter and radiation alone, where dark energy and
// curvature do not count yet.
//
//	t = 2/3 a_eq^2 w^2 (3 + w) / (H0 sqrt Or),  w = sqrt(1 + a/a_eq) - 1
func (e *expansion) bigBang() start {
	om, or := num.Exp(e.lnMatter), num.Exp(e.lnOther)
	a := num.Exp(firstLnA)
	h := math.Sqrt(om*a+or) / (a * a) // in units of H0
	var t float64
	if or == 0 {
		t = 2. / 3 / h
	} else {
		y := om * a / or
		w := y / (math.Sqrt(1+y) + 1)
		t = 2. / 3 * w * w * (3 + w) * a * a / (y * y * math.Sqrt(or))
		if om == 0 {
			t = 0.5 / h
		}
	}
	st := start{origin: zero, unit: zero, x: firstLnA, s: num.Log10(t) - e.logH0}
	eps := 0.5 * (3*om*a + 4*or) / (om*a + or)
	c0, c1, c2 := powers(eps, 0)
	logH := num.Log10(h) + e.logH0
	st.logK = [4]float64{num.Log10(c0) - logH, num.Log10(c1) - 2*logH, num.Log10(c2) - 3*logH, num.Log10(3*c2/(4*eps)) - 4*logH}
	st.logEta = num.Log10(2*a/(math.Sqrt(om*a+or)+math.Sqrt(or))) - e.logH0
	return st
}

// march is the integration in progress. Its state is x and q_j = K_j/T^(j+1)
// with T = 10^unit + since.
type march struct {
	*expansion
	start
	p      *piece
	state  [4]float64 // x, q0, q1, q2
	points [3]where
	found  [3]density
}

// rates are what the equations say at one point.
type rates struct {
	density
	ps, sigma float64    // H since, since/T
	d         [4]float64 // derivatives of the state against ln since
}

func (m *march) where(s, x float64) where {
	w := where{x: x, date: num.Add10(m.origin, s), since: s}
	if m.origin == zero {
		w.since = zero
	}
	return w
}

func (m *march) rates(s float64, y [4]float64) (rates, error) {
	m.points[0] = m.where(s, y[0])
	if err := m.at(m.points[:1], m.found[:1]); err != nil {
		return rates{}, err
	}
	return m.equations(s, y, m.found[0]), nil
}

func (m *march) equations(s float64, y [4]float64, found density) rates {
	r := rates{density: found, ps: num.Exp10(found.logH + s), sigma: num.Exp10(s - num.Add10(m.unit, s))}
	r.d[0] = r.ps
	r.d[1] = r.sigma*(1-y[1]) - 3*r.ps*y[1]
	r.d[2] = r.sigma*(y[1]-2*y[2]) - 2*r.ps*y[2] + 2*r.curvature*r.ps*r.ps/r.sigma*y[3]
	r.d[3] = r.sigma*(2*y[2]-3*y[3]) - r.ps*y[3]
	return r
}

// node asks the law at the present point and next to it on the way, and
// returns the equations there and g = -d ln H / d ln since.
func (m *march) node(s float64) (r rates, g float64, err error) {
	const d = 1e-3
	if r, err = m.rates(s, m.state); err != nil {
		return
	}
	for i, l := range [3]float64{0, -d, d} {
		m.points[i] = m.where(s+l/num.Ln10, m.state[0]+l*r.ps)
	}
	if err = m.at(m.points[:], m.found[:]); err != nil {
		return
	}
	g = 0.5 * r.ps * (3*r.matter + 4*r.radiation + 2*r.curvature)
	if r.dark > 0 {
		g -= 0.5 * r.dark * (m.found[2].lnDark - m.found[1].lnDark) / (2 * d)
	}
	return r, g, nil
}

// integrate makes the piece of sky that begins at st.
func (e *expansion) integrate(st start) (*piece, error) {
	m := &march{expansion: e, start: st, p: &piece{origin: st.origin}}
	s := st.s
	unit := num.Add10(m.unit, s)
	m.state = [4]float64{st.x, num.Exp10(st.logK[0] - unit), num.Exp10(st.logK[1] - 2*unit), num.Exp10(st.logK[2] - 3*unit)}
	logK3, logEta := st.logK[3], st.logEta
	r, g, err := m.node(s)
	if err != nil {
		return nil, err
	}
	for n := 0; ; n++ {
		m.record(s, r, g, logK3, logEta)
		if n%tailEvery == 0 && n > 0 {
			done, err := m.end(s, r, g, logK3, logEta)
			if err != nil {
				return nil, err
			}
			if done {
				m.p.finish(e.logT0)
				return m.p, nil
			}
		}
		if latest := maxSince + math.Max(st.unit, 0); n > maxNodes || s > latest {
			return nil, fmt.Errorf("sky: law %s: H is neither constant nor a power law of time by 10^%.4g yr after 10^%.4g yr: "+
				"want one within 10^%.4g yr", e.use.ID(), s, math.Max(st.origin, 0), latest)
		}
		step := stepLog
		if !slaved(r.ps, g) {
			step = math.Min(step, stepX/r.ps)
		}
		if r.ps > resting { // H may fall within much less than its own time
			step = math.Min(step, stepH/math.Abs(g))
		}
		before, was := m.state, r
		if err := m.step(s, step, r); err != nil {
			return nil, err
		}
		next := s + step/num.Ln10
		if r, g, err = m.node(next); err != nil {
			return nil, err
		}
		if slaved(r.ps, g) {
			r = m.follow(next, r, g)
		}
		logK3 = num.Add10(logK3, m.addedK3(s, next, step, before, was, r))
		logEta = num.Add10(logEta, s-before[0]/num.Ln10+num.Log10(light(step, m.state[0]-before[0], was.ps, r.ps)))
		s = next
	}
}

// step is one step of the classical Runge-Kutta method, h in ln since.
func (m *march) step(s, h float64, k1 rates) error {
	y := m.state
	moved := func(d [4]float64, h float64) (z [4]float64) {
		for i := range z {
			z[i] = y[i] + h*d[i]
		}
		return z
	}
	half := s + h/2/num.Ln10
	k2, err := m.rates(half, moved(k1.d, h/2))
	if err != nil {
		return err
	}
	k3, err := m.rates(half, moved(k2.d, h/2))
	if err != nil {
		return err
	}
	k4, err := m.rates(s+h/num.Ln10, moved(k3.d, h))
	if err != nil {
		return err
	}
	for i := range y {
		m.state[i] = y[i] + h/6*(k1.d[i]+2*k2.d[i]+2*k3.d[i]+k4.d[i])
	}
	return nil
}

// slaved tells whether K0..K2 have no memory left. On the way to a rip they
// keep it.
func slaved(ps, g float64) bool { return ps > slavedAt && g > -0.2*ps }

// follow sets K0..K2 to what they are for constant eps: once space has
// doubled many times within the age, they have forgotten everything else.
// Their slopes follow too; the equations would lose them to cancellation.
func (m *march) follow(s float64, r rates, g float64) rates {
	c0, c1, c2 := powers(g/r.ps, 0)
	h := num.Exp10(-r.logH - num.Add10(m.unit, s))
	m.state[1], m.state[2], m.state[3] = c0*h, c1*h*h, c2*h*h*h
	for j := 1; j < 4; j++ {
		r.d[j] = m.state[j] * float64(j) * (g - r.sigma)
	}
	return r
}

// addedK3 returns log10 of 3 int K2 dt over a step: the trapezium rule with
// its end correction, of the fourth order.
func (m *march) addedK3(s0, s1, h float64, y0 [4]float64, r0, r1 rates) float64 {
	t0, t1 := num.Add10(m.unit, s0), num.Add10(m.unit, s1)
	slope := func(q float64, r rates) float64 { return r.d[3]/q + 3*r.sigma + 1 }
	f1 := m.state[3] / y0[3] * num.Exp10(3*(t1-t0)+s1-s0)
	sum := h/2*(1+f1) + h*h/12*(slope(y0[3], r0)-f1*slope(m.state[3], r1))
	return num.Log10(3*sum*y0[3]) + 3*t0 + s0
}

// light returns int e^(-(x - x0)) dt over a step, in units of since at its
// start: the proper way of light as seen from there.
func light(h, dx, ps0, ps1 float64) float64 {
	if dx != dx { // ln a has left the range of numbers
		dx = 0
	}
	if ps0 > slavedAt { // where ln a is so large that it hides its growth
		dx = math.Max(dx, h*(ps0+ps1)/2)
	}
	if dx > 5*stepX {
		return -num.Expm1(-dx) * num.Expm1(h) / dx
	}
	f1 := num.Exp(h - dx)
	return h/2*(1+f1) + h*h/12*((1-ps0)-f1*(1-ps1))
}

// record writes a node into the table.
func (m *march) record(s float64, r rates, g, logK3, logEta float64) {
	p, t := m.p, num.Add10(m.unit, s)
	p.s = append(p.s, s)
	p.x.add(m.state[0], r.ps*num.Ln10)
	p.logH.add(r.logH, -g)
	for j, q := range m.state[1:] {
		p.logK[j].add(num.Log10(q)+float64(j+1)*t, r.d[j+1]/q+float64(j+1)*r.sigma)
	}
	p.logK[3].add(logK3, 3*r.sigma*num.Exp10(num.Log10(m.state[3])+4*t-logK3))
	p.logEta.add(logEta, num.Exp10(s-m.state[0]/num.Ln10-logEta))
	p.warm = append(p.warm, warmAt(g/r.ps))
}
