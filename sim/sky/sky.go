package sky

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/cosmology"
)

// Sky is one realisation's background. It is safe for concurrent use. Dates
// are log10 of years since the Big Bang, and may be any number up to 1e300;
// no answer is ever NaN. Answers come from tables on at least 64 nodes a
// decade, within 1e-6 (log10) of the equations, and from closed forms before
// and after them.
type Sky struct {
	pieces []*piece // one, or a second from the date when dark energy decays
	logT0  float64
	now    float64
	end    float64
	cause  string
	adrift float64
	// what the second piece does to the horizon of the first
	horizonAt float64 // log10 of the event horizon at the origin of the second, ly
}

// at returns the piece that holds date l, and its own time.
func (s *Sky) at(l float64) (*piece, float64) {
	if len(s.pieces) > 1 && l > s.pieces[1].origin {
		return s.pieces[1], s.pieces[1].sinceAt(l)
	}
	return s.pieces[0], l
}

// LogTemperature returns log10 of the temperature, in K, that an object feels
// at date l: (relic^4 + horizon^4)^(1/4).
func (s *Sky) LogTemperature(l float64) float64 {
	p, since := s.at(l)
	return p.temperature(since, s.logT0)
}

// LogRelic returns log10 of the temperature of the relic radiation, K; -Inf
// once ln a has left the range of numbers or space is torn apart.
func (s *Sky) LogRelic(l float64) float64 {
	p, since := s.at(l)
	return p.relic(since, s.logT0)
}

// LogHorizon returns log10 of the temperature of the horizon, K; -Inf while
// space does not accelerate.
func (s *Sky) LogHorizon(l float64) float64 {
	p, since := s.at(l)
	return p.horizonHeat(since)
}

func (p *piece) relic(s, logT0 float64) float64 { return logT0 - p.lnA(s)/num.Ln10 }

func (p *piece) horizonHeat(s float64) float64 {
	if !p.accelerates(s) {
		return zero
	}
	return cosmology.LogHorizonTemperature(p.hubble(s))
}

func (p *piece) temperature(s, logT0 float64) float64 {
	return num.Add10(4*p.relic(s, logT0), 4*p.horizonHeat(s)) / 4
}

// LnA returns ln of the scale factor, 0 today; +Inf beyond the range of
// numbers (about l = 318 in a de Sitter sky) and after a rip.
func (s *Sky) LnA(l float64) float64 {
	p, since := s.at(l)
	return p.lnA(since)
}

// LogHubble returns log10 of the expansion rate in 1/yr.
func (s *Sky) LogHubble(l float64) float64 {
	p, since := s.at(l)
	return p.hubble(since)
}

// LogEventHorizon returns log10 of the proper distance, in light years, of
// the farthest events whose light will ever arrive; +Inf in a sky that does
// not accelerate in the end, -Inf after a rip.
func (s *Sky) LogEventHorizon(l float64) float64 {
	p, since := s.at(l)
	logR := p.eventHorizon(since)
	if len(s.pieces) < 2 || p != s.pieces[0] || math.IsInf(logR, 1) {
		return logR
	}
	if math.IsInf(s.horizonAt, 1) {
		return inf
	}
	// Two solutions of dR/dt = H R - c differ by a multiple of a.
	d := s.pieces[1].origin
	was, shrink := p.eventHorizon(d), (p.lnA(since)-p.lnA(d))/num.Ln10
	switch {
	case shrink != shrink || shrink == zero || was == s.horizonAt:
		return logR
	case s.horizonAt > was:
		return num.Add10(logR, num.Sub10(s.horizonAt, was)+shrink)
	}
	return num.Sub10(logR, num.Sub10(was, s.horizonAt)+shrink)
}

func (p *piece) eventHorizon(s float64) float64 {
	if p.tail.eps > 1-margin {
		return inf
	}
	return p.look(&p.logR, s, p.tail.horizon)
}

// LogParticleHorizon returns log10 of the comoving distance (proper distance
// today), in light years, of the farthest events whose light has arrived by
// date l.
func (s *Sky) LogParticleHorizon(l float64) float64 {
	p, since := s.at(l)
	return p.comoving(since)
}

// LogFourVolume returns log10 of the four-volume of the past light cone at
// date l, yr^4 with c = 1.
func (s *Sky) LogFourVolume(l float64) float64 {
	p, since := s.at(l)
	return p.fourVolume(since) + num.Log10(4*math.Pi/3)
}

// Now returns the date at which the scale factor is 1.
func (s *Sky) Now() float64 { return s.now }

// End returns the date at which everything ends and what ends it: the name of
// a process, or "rip". It is +Inf and "" for a sky without end.
func (s *Sky) End() (date float64, cause string) { return s.end, s.cause }

// Adrift returns the date at which everything comes adrift; +Inf if never.
func (s *Sky) Adrift() float64 { return s.adrift }
