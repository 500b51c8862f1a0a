package engine

import (
	"wane/sim/law"
	"wane/sim/num"
)

// remove takes object i out of the bound galaxy at date t.
func (w *Workspace) remove(i uint32, t float64, fate law.Fate, cause uint8) {
	m, c, e := w.m, &w.c, w.env
	w.subtract(i)
	mass := m.Weight * w.massOf(i)
	switch fate {
	case law.FateAdrift:
		c.place[i] = law.Adrift
		e.add(slotCarried, mass)
	case law.FateCentral:
		c.place[i] = law.Central
		e.add(slotCarried, mass)
		e.add(slotCentral, mass)
		w.central.swallow(w, t, mass)
	default:
		c.place[i] = placeGone
	}
	c.leave[i], c.left[i] = w.coded(t), cause
	w.bound--
}

// placeGone marks an object that ceased to exist while bound.
const placeGone = 255

// coded writes a date of the dynamics as columns hold it: years, or, when the
// unit of time has outgrown them, minus the log10 of years.
func (w *Workspace) coded(t float64) float64 {
	if w.env.unit == 0 {
		return t
	}
	return -(num.Log10(t) + w.env.unit)
}

// subtract takes object i as it now is out of the galaxy values, and out of
// reach of others.
func (w *Workspace) subtract(i uint32) {
	w.count(i, -1)
	w.meets.tree.drop(i)
}

// count adds sign times object i to the galaxy values.
func (w *Workspace) count(i uint32, sign float64) {
	w.env.add(slotNumber, sign*w.m.Weight)
	w.countStuff(i, sign)
}

// countStuff is count but for the number of objects, which a change of an object
// leaves as it is.
func (w *Workspace) countStuff(i uint32, sign float64) {
	m, e := w.m, w.env
	x := sign * m.Weight
	mass := w.massOf(i)
	e.add(slotMass, x*mass)
	if !m.deathsMatter {
		return
	}
	if m.kindsCount {
		kind := int(w.kindOf(i))
		e.add(m.slotNumberKind(kind), x)
		e.add(m.slotMassKind(kind), x*mass)
	}
	for k := range m.Clocks {
		if m.sums[k] {
			e.add(m.slotSum(k), x*w.sus(k, i))
		}
		if m.soughts[k] {
			e.add(m.slotSought(k), x*w.meets.counted(w, k, i, sign))
		}
	}
}

// stageOf is the stage of a bound object, links from 3 on.
func (w *Workspace) stageOf(i uint32) int { return int(w.stage[i] &^ waiting) }

// massOf is the mass of object i in its present stage; unborn ones have that
// of their first.
func (w *Workspace) massOf(i uint32) float64 {
	switch s := w.stageOf(i); {
	case s <= 1:
		return w.c.mass0[i]
	case s == 2:
		return w.c.mass1[i]
	default:
		return w.c.chain[i][s-3].mass
	}
}

func (w *Workspace) kindOf(i uint32) uint8 {
	switch s := w.stageOf(i); {
	case s <= 1:
		return w.c.kind0[i]
	case s == 2:
		return w.c.kind1[i]
	default:
		return w.c.chain[i][s-3].kind
	}
}

// sus is the susceptibility of object i to clock k in its present stage.
func (w *Workspace) sus(k int, i uint32) float64 {
	switch s := w.stageOf(i); {
	case s <= 1:
		if w.compact {
			return w.few[i][0][k]
		}
		return w.s[0][k][i]
	case s == 2:
		if w.compact {
			return w.few[i][1][k]
		}
		return w.s[1][k][i]
	default:
		return w.c.chain[i][s-3].s[k]
	}
}
