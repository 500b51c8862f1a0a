package engine

import (
	"fmt"

	"wane/sim/law"
)

// books follows every solar mass of the sample.
type books struct {
	founded, bound, adrift, central, gas, radiated compensated
	fired                                          []int64                         // by cause
	radiates, turns                                []bool                          // by cause: what it takes is radiated; it is a turning
	part                                           struct{ gas, radiated float64 } // of one chunk
}

// post enters a chunk's plain sums.
func (b *books) post() {
	b.gas.add(b.part.gas)
	b.radiated.add(b.part.radiated)
	b.part.gas, b.part.radiated = 0, 0
}

// compensated is a sum without gathered rounding (Neumaier 1974).
type compensated struct{ sum, lost float64 }

func (c *compensated) add(x float64) {
	s := c.sum + x
	if abs(c.sum) >= abs(x) {
		c.lost += (c.sum - s) + x
	} else {
		c.lost += (x - s) + c.sum
	}
	c.sum = s
}

func (c *compensated) value() float64 { return c.sum + c.lost }

func abs(x float64) float64 {
	if x < 0 {
		return -x
	}
	return x
}

func (b *books) reset(m *Model, c *columns) {
	*b = books{fired: grown(b.fired, 256), radiates: b.radiates, turns: b.turns}
	clear(b.fired)
	if len(b.radiates) < len(m.Causes) {
		b.radiates, b.turns = make([]bool, len(m.Causes)), make([]bool, len(m.Causes))
		for i, cause := range m.Causes {
			p, _ := law.ProcessNamed(cause.Process)
			b.radiates[i], b.turns[i] = p.Role == law.Wearing, p.Role == law.Turning
		}
	}
	b.founded = c.founded
}

// met enters what a meeting gave off.
func (b *books) met(_ *Model, gas, radiated float64) {
	b.gas.add(gas)
	b.radiated.add(radiated - 0)
}

// life enters one life of an object, up to a log10 date: where its mass went,
// and what took it. What it still is at that date goes nowhere: remains does
// that at the end of the run.
func (b *books) life(w *Workspace, i uint32, dates [3]float64, limit float64) (mass float64, at state) {
	c := &w.c
	mass = c.mass0[i]
	stage := 1
	if c.died[i] == 0 {
		stage, mass = 2, c.mass1[i]
	}
	if c.kind0[i] == law.NoWord {
		return 0, stateGone
	}
	if dates[2] < dates[0] { // carried off as gas, unborn
		b.count(c.left[i])
		b.takes(w, i, c.mass0[i])
		return 0, stateGone
	}
	at = w.each(i, dates, limit, func(_ float64, from, to state, cause uint8) {
		b.fired[cause]++
		switch {
		case from == stateGone:
		case cause == c.left[i] && (to == stateGone || to%6/2 != from%6/2) && b.leaves(c, i, to):
			if to == stateGone {
				b.takes(w, i, mass)
				mass = 0
			}
		default:
			stage++
			after := 0.0
			if to != stateGone {
				after = w.stageMass(i, stage)
			}
			b.loses(w, i, stage-3, cause, mass-after)
			mass = after
		}
	})
	if dates[0] > limit {
		return c.mass0[i], stateOf(c.kind0[i], law.Bound, w.originOf(i))
	}
	return mass, at
}

// leaves tells whether a change of state is the leaving of the bound galaxy.
func (b *books) leaves(c *columns, i uint32, to state) bool {
	return (to == stateGone) == (c.place[i] != law.Adrift)
}

func (b *books) count(cause uint8) { b.fired[cause]++ }

// takes enters a mass that left the bound galaxy for the centre or as gas.
func (b *books) takes(w *Workspace, i uint32, mass float64) {
	switch w.c.place[i] {
	case law.Central:
		b.central.add(mass)
	case law.Adrift:
		b.adrift.add(mass)
	default:
		b.gas.add(mass)
	}
}

// loses enters what a change of stage gave off.
func (b *books) loses(w *Workspace, i uint32, step int, cause uint8, loss float64) {
	if b.turns[cause] {
		if step < 0 {
			step = starStep
		}
		gas := w.c.gas[[2]uint32{i, uint32(step)}]
		b.gas.add(gas)
		b.radiated.add(loss - gas)
		return
	}
	if b.radiates[cause] {
		b.radiated.add(loss)
		return
	}
	b.gas.add(loss)
}

// stageMass is the mass with which object i enters a stage.
func (w *Workspace) stageMass(i uint32, stage int) float64 {
	if stage == 2 {
		return w.c.mass1[i]
	}
	if links := w.c.chain[i]; stage-3 < len(links) {
		return links[stage-3].mass
	}
	return 0
}

// ledger closes the books.
func (b *books) ledger(w *Workspace) (Ledger, error) {
	x := w.m.Weight
	b.radiated.add(w.wear.lost)
	// What fell to the centre is real mass there; the hole's own account is
	// kept as it grew, and both must agree.
	l := Ledger{
		Founded:  x*b.founded.value() + w.m.CentralMass,
		Bound:    x * b.bound.value(),
		Adrift:   x * b.adrift.value(),
		Central:  w.central.mass,
		Gas:      x * b.gas.value(),
		Radiated: x*b.radiated.value() + w.central.evapour,
	}
	if off := l.Closes(); !(off <= closure) {
		return l, fmt.Errorf("engine: the mass ledger does not close: founded %v Msun, accounted for %v Msun (%.1e off, at most %.0e)",
			l.Founded, l.Bound+l.Adrift+l.Central+l.Gas+l.Radiated, off, closure)
	}
	return l, nil
}

// closure is how well the ledger of a realisation must close.
const closure = 1e-12
