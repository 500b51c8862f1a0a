package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/num"
)

// Nodes: the ages at which bare objects (no floor) of one kind and composition
// cross a threshold, on a grid of masses. They only bracket the crossing of a
// real object, so nothing of a result hangs on them.
const (
	nodeSpacing = 0.02  // in ln mass
	nodeMargin  = 0.002 // dex of age: how far a guess may be off and still serve
)

type nodeKey struct {
	kind, comp uint8
	index      int32
}

// nodeAge returns the table of nodes of a threshold.
func (w *Workspace) nodeAges(x *galaxy.Warmth) map[nodeKey]float64 {
	if w.warmNodes == nil {
		w.warmNodes = map[galaxy.Warmth]map[nodeKey]float64{}
	}
	if w.warmNodes[*x] == nil {
		w.warmNodes[*x] = map[nodeKey]float64{}
	}
	return w.warmNodes[*x]
}

// guesses sets the log10 ages at which the chosen stays would cross if nothing
// but their own heat counted, by interpolation between nodes; never when the
// threshold is none of their own heat or hangs on more than mass.
func (f *feeler) guesses(which []int32) error {
	if f.x.Unit == "floor" || f.bare || f.w.m.coolsByMetals {
		for _, j := range which {
			f.guess[j] = never
		}
		return nil
	}
	table := f.w.nodeAges(f.x)
	var missing []nodeKey
	for _, j := range which {
		f.guess[j] = num.Log(f.all.mass[j]) / nodeSpacing
		i := int32(math.Floor(f.guess[j]))
		for _, index := range [2]int32{i, i + 1} {
			key := nodeKey{f.all.kind[j], f.all.comp[j], index}
			if _, ok := table[key]; !ok {
				table[key] = never
				missing = append(missing, key)
			}
		}
	}
	if err := f.fillNodes(table, missing); err != nil {
		return err
	}
	for _, j := range which {
		at := f.guess[j]
		i := math.Floor(at)
		key := nodeKey{f.all.kind[j], f.all.comp[j], int32(i)}
		a := table[key]
		key.index++
		if f.guess[j] = a + (table[key]-a)*(at-i); f.guess[j] != f.guess[j] {
			f.guess[j] = never
		}
	}
	return nil
}

// fillNodes solves the missing nodes: stays that begin at date 0 and last for
// ever, under no floor.
func (f *feeler) fillNodes(table map[nodeKey]float64, missing []nodeKey) error {
	n := len(missing)
	if n == 0 {
		return nil
	}
	bare := &feeler{w: f.w, x: f.x, bare: true, stays: make([]stay, n)}
	bare.resize(n)
	which := make([]int32, n)
	for i, key := range missing {
		r := bare.all
		r.id[i], r.gen[i], r.kind[i], r.comp[i] = 0, 0, key.kind, key.comp
		r.place[i], r.origin[i], r.metals[i] = 0, 0, f.w.c.metal
		r.mass[i] = num.Exp(nodeSpacing * float64(key.index))
		r.birthMass[i] = r.mass[i]
		bare.goal[i], bare.dark[i] = f.goalOf(key.kind, r.mass[i]), true
		bare.stays[i] = stay{entered: math.Inf(-1), enter: math.Inf(-1), leave: never}
		which[i] = int32(i)
	}
	if err := bare.solve(which, never); err != nil {
		return err
	}
	for i, key := range missing {
		table[key] = bare.cross[i]
	}
	return nil
}
