package reference

import (
	"container/heap"
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// learn asks how fast a bound object wears, and from when.
func (g *run) learn(o *object) {
	o.wearRate = 0
	if o.now().kind == law.Star && o.at == 0 {
		return
	}
	o.wearSince = g.linear(o.now().from)
	for _, u := range g.wearing {
		if r := o.row(); r.speaks(u) {
			s, err := g.start(u, r)
			if err == nil {
				o.wearSince = max(o.wearSince, g.linear(s))
			}
		}
	}
	g.setWear(o)
}

func (g *run) setWear(o *object) {
	o.wearRate = g.wearOf(o.row())
	if o.wearRate > 0 {
		if d := o.wearSince + wearToStep*o.now().mass/o.wearRate; d < never {
			heap.Push(&g.wears, event{date: d, o: o, life: o.life, at: o.at})
		}
	}
}

// wearOf is what all wearing laws take from an object, per unit of time.
func (g *run) wearOf(r row) float64 {
	rate := 0.0
	for _, u := range g.wearing {
		if !r.speaks(u) {
			continue
		}
		if out, err := g.ask(u, "wear", r, drawU); err == nil {
			rate += num.Exp10(out.Columns[0].Values[0] + g.env.Unit())
		}
	}
	return rate
}

// nextWear is the date at which the first bound object has lost 1 % since its
// mass was last set.
func (g *run) nextWear() float64 {
	for len(g.wears) > 0 {
		e := g.wears[0]
		if e.holds() && e.o.wearRate > 0 && math.Abs(e.o.wearSince+wearToStep*e.o.now().mass/e.o.wearRate-e.date) <= 1e-12*e.date {
			return e.date
		}
		heap.Pop(&g.wears)
	}
	return never
}

// wearStep sets the mass of every bound object that has lost half a per cent
// or more to what it then weighs.
func (g *run) wearStep() error {
	heap.Pop(&g.wears)
	stepped := false
	for _, o := range g.objects {
		s := o.now()
		if !o.available() || o.wearRate == 0 {
			continue
		}
		dt := g.t - o.wearSince
		if !(o.wearRate*dt >= wearToJoin*(1-1e-12)*s.mass) {
			continue
		}
		o.wearSince = g.t
		least := 0.0
		for _, u := range g.wearing {
			if _, m, ok := g.thresholdOf(u, s.kind); ok {
				least = max(least, m)
			}
		}
		least = max(least*(1+1e-9), wornAway*s.entry)
		mass := s.mass - o.wearRate*dt
		if mass > least {
			r := o.row()
			r.mass = s.mass - 0.5*o.wearRate*dt
			mass = s.mass - max(g.wearOf(r), 0.5*o.wearRate)*dt
			stepped = true
		}
		if !(mass > least) {
			o.wearRate = 0 // its prospect is about to end it
			continue
		}
		g.keep(o)
		g.count(o, -1)
		g.light += s.mass - mass
		s.mass = mass
		if err := g.exposeStage(o, o.at); err != nil {
			return err
		}
		g.count(o, +1)
		g.spend(o)
		g.setWear(o)
	}
	if !stepped {
		return nil
	}
	return g.changed()
}
