package sky

import (
	"math"

	"wane/sim/num"
)

// LogLnA returns log10 of ln a. It keeps telling dates apart where ln a itself
// is beyond the range of numbers; -Inf as long as a <= 1, +Inf after a rip.
func (s *Sky) LogLnA(l float64) float64 {
	p, since := s.at(l)
	x := p.lnA(since)
	switch {
	case x <= 0:
		return zero
	case x < inf || p.tail.eps != 0:
		return num.Log10(x)
	}
	return p.tail.turned(since) // ln a = H t in de Sitter space
}

// LogHubbleRadius returns log10 of c/H, a proper distance in light years: +Inf
// where space is at rest.
func (s *Sky) LogHubbleRadius(l float64) float64 { return -s.LogHubble(l) }

// LogVisibleLimit returns log10 of the comoving distance (proper distance
// today), in light years, of the farthest matter whose light an observer who
// stays to the end will ever have received: the particle horizon at the end of
// everything, or after an infinite time. It is the same at every date, the
// comoving sum of particle horizon and event horizon, and +Inf in a sky that
// does not accelerate in the end.
func (s *Sky) LogVisibleLimit() float64 {
	if s.end < inf {
		return s.LogParticleHorizon(s.end)
	}
	if last := s.pieces[len(s.pieces)-1]; last.tail.eps > 1-margin {
		return inf
	}
	return s.LogParticleHorizon(lastDate)
}

// DarkEnergyDecays returns the date at which an ending lets dark energy decay;
// +Inf if none does.
func (s *Sky) DarkEnergyDecays() float64 {
	if len(s.pieces) < 2 {
		return inf
	}
	return s.pieces[1].origin
}

// LogRelicMeetsHorizon returns the first date at which space has a warm
// horizon and the relic radiation is no warmer than it; +Inf if never.
func (s *Sky) LogRelicMeetsHorizon() float64 {
	for i, p := range s.pieces {
		until := inf
		if i+1 < len(s.pieces) {
			until = p.sinceAt(s.pieces[i+1].origin)
		}
		if since := p.relicMeetsHorizon(s.logT0, until); since < inf {
			return p.date(since)
		}
	}
	return inf
}

// relicMeetsHorizon does it for one piece that ends at s = until. Nodes are
// close: between two of them the horizon stays warm or stays cold.
func (p *piece) relicMeetsHorizon(logT0, until float64) float64 {
	warmer := func(s float64) bool {
		horizon := p.horizonHeat(s)
		return horizon == zero || p.relic(s, logT0) > horizon
	}
	low := p.s[0]
	for _, s := range p.s {
		if s > until {
			break
		}
		if !warmer(s) {
			return bisect(warmer, low, s)
		}
		low = s
	}
	if !warmAt(p.tail.eps) {
		return inf
	}
	// In the tail the relic radiation falls as 1/a, the horizon more slowly.
	for d := 1.0 / 64; low < until && low < lastDate; d *= 2 {
		high := math.Min(p.tail.s+d, until)
		if !warmer(high) {
			return bisect(warmer, low, high)
		}
		low = high
	}
	return inf
}
