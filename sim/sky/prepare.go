package sky

import (
	"errors"
	"fmt"
	"math"

	"wane/sim/draw"
	"wane/sim/law"
	"wane/sim/num"
)

// The processes that a sky is made of, and the effects an ending may have.
const (
	expansionProcess = "expansion"

	EverythingEnds   = "everything-ends"
	AllAdrift        = "all-adrift"
	DarkEnergyDecays = "dark-energy-decays"

	// Rip is the cause of an end by expansion itself.
	Rip = "rip"
)

// Prepared is the part of the sky that is the same in every realisation of a
// run. It is safe for concurrent use.
type Prepared struct {
	set     *law.Set
	endings []*law.Use // those that may come
	sky     *Sky       // before any ending
}

// Prepare integrates the expansion of space under the law of process
// expansion. It fails if the set has none, if the law's answers break its
// contract, or if the expansion comes neither to a constant rate nor to a
// power law.
func Prepare(set *law.Set) (*Prepared, error) {
	u := set.Of(expansionProcess)
	if u == nil {
		return nil, errors.New("sky: no law of process expansion in the run")
	}
	p := &Prepared{set: set}
	for _, e := range set.OfRole(law.Ending) {
		switch e.Card.Effect {
		case "":
			continue
		case EverythingEnds, AllAdrift, DarkEnergyDecays:
		default:
			return nil, fmt.Errorf("sky: law %s: effect %q: want %s, %s or %s", e.ID(), e.Card.Effect, EverythingEnds, AllAdrift, DarkEnergyDecays)
		}
		if !e.Card.Idle {
			p.endings = append(p.endings, e)
		}
	}
	e, err := newExpansion(u)
	if err != nil {
		return nil, err
	}
	for _, ending := range p.endings {
		if ending.Card.Effect == DarkEnergyDecays && !e.reads("log10_since") {
			return nil, fmt.Errorf("sky: law %s lets dark energy decay, but law %s does not read log10_since, so it cannot say what follows",
				ending.ID(), u.ID())
		}
	}
	first, err := e.integrate(e.bigBang())
	if err != nil {
		return nil, err
	}
	s := &Sky{pieces: []*piece{first}, logT0: e.logT0, end: inf, adrift: inf}
	if rip := first.tail.rip(); rip < inf {
		s.end, s.cause = rip, Rip
	}
	s.now = bisect(func(l float64) bool { return first.lnA(l) < 0 }, first.s[0], 1e3)
	p.sky = s
	return p, nil
}

// Draw returns the sky of one realisation. Without an ending that may come it
// is the same sky every time and costs nothing. Each ending takes one
// exponential draw, keyed by its process.
func (p *Prepared) Draw(seed, realisation uint64) (*Sky, error) {
	if len(p.endings) == 0 {
		return p.sky, nil
	}
	s := *p.sky
	hazards := make([]float64, len(p.endings))
	dates := make([]float64, len(p.endings))
	decay := -1
	for i, e := range p.endings {
		hazards[i] = num.Log10(draw.New(seed, realisation, e.Card.Process).Exp(0, 0, 0))
		var err error
		if dates[i], err = p.sky.date(e, hazards[i]); err != nil {
			return nil, err
		}
		if e.Card.Effect == DarkEnergyDecays && dates[i] < s.end && (decay < 0 || dates[i] < dates[decay]) {
			decay = i
		}
	}
	if decay >= 0 {
		if err := p.decay(&s, dates[decay]); err != nil {
			return nil, err
		}
	}
	for i, e := range p.endings {
		if decay >= 0 && dates[i] > dates[decay] {
			// Its hazard goes on growing under the new sky.
			var err error
			if dates[i], err = s.date(e, hazards[i]); err != nil {
				return nil, err
			}
		}
		switch e.Card.Effect {
		case EverythingEnds:
			if dates[i] < s.end {
				s.end, s.cause = dates[i], e.Card.Process
			}
		case AllAdrift:
			s.adrift = min(s.adrift, dates[i])
		}
	}
	return &s, nil
}

// decay replaces what follows date by the sky after dark energy begins to
// decay; nothing, where none is left that could.
func (p *Prepared) decay(s *Sky, date float64) error {
	e, err := newExpansion(p.set.Of(expansionProcess))
	if err != nil {
		return err
	}
	old := p.sky.pieces[0]
	if x := old.lnA(date); !math.IsInf(x, 0) {
		var now [1]density
		if err := e.at([]where{{x: x, date: date, since: zero}}, now[:]); err != nil || now[0].dark == 0 {
			return err
		}
	}
	unit := math.Min(-old.hubble(date), date) // space may be at rest already
	st := start{origin: date, unit: unit, s: unit - 7, x: old.lnA(date), logEta: old.comoving(date)}
	for j := range st.logK {
		st.logK[j] = old.chain(j, date)
	}
	next, err := e.integrate(st)
	if err != nil {
		return err
	}
	s.pieces = []*piece{old, next}
	s.horizonAt = next.eventHorizon(next.s[0])
	s.end, s.cause = inf, ""
	if rip := next.tail.rip(); rip < inf {
		s.end, s.cause = next.date(rip), Rip
	}
	s.now = bisect(func(l float64) bool { return s.LnA(l) < 0 }, old.s[0], 1e3)
	return nil
}
