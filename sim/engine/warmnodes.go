package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
)

// Nodes: the ages at which bare objects (no floor) of one kind and composition
// cross a threshold, on a grid of masses. They only tell where to look for the
// crossing of a real object.
const (
	nodeSpacing = 0.005 // in ln mass
	nodeMargin  = 0.002 // dex of age: how far a guess may be off and still serve
	slopeStep   = 1e-4  // dex of age
	mostNodes   = 1 << 14
)

// node is a bare object's crossing.
type node struct {
	age   float64 // log10 yr; never: it never crosses
	slope float64 // of the excess there, a dex of age
}

// nodeLine is the nodes of one kind and composition, from index first.
type nodeLine struct {
	first int
	nodes []node
	// low and high are the indices to be covered next.
	low, high int
}

// nodesOf returns the lines of nodes of a threshold, by kind and composition.
func (w *Workspace) nodesOf(x *galaxy.Warmth) []nodeLine {
	if w.warmNodes == nil {
		w.warmNodes = map[galaxy.Warmth][]nodeLine{}
	}
	if w.warmNodes[*x] == nil {
		w.warmNodes[*x] = make([]nodeLine, len(w.m.Set.Kinds)*len(law.CompositionWords))
	}
	return w.warmNodes[*x]
}

func (f *feeler) lineOf(lines []nodeLine, j int32) *nodeLine {
	return &lines[int(f.all.kind[j])*len(law.CompositionWords)+int(f.all.comp[j])]
}

// guesses sets the log10 ages at which the chosen stays would cross if nothing
// but their own heat counted, by interpolation between nodes; never when the
// threshold is none of their own heat or hangs on more than mass.
func (f *feeler) guesses(which []int32) error {
	if f.x.Unit == "floor" || f.bare || f.w.m.coolsByMetals {
		for _, j := range which {
			f.guess[j], f.slope[j] = never, 0
		}
		return nil
	}
	lines := f.w.nodesOf(f.x)
	for i := range lines {
		lines[i].low, lines[i].high = math.MaxInt, math.MinInt
	}
	for _, j := range which {
		f.guess[j] = num.Log(f.all.mass[j]) / nodeSpacing
		l, i := f.lineOf(lines, j), int(math.Floor(f.guess[j]))
		l.low, l.high = min(l.low, i), max(l.high, i+1)
	}
	for i := range lines {
		if err := f.cover(&lines[i], uint8(i/len(law.CompositionWords)), uint8(i%len(law.CompositionWords))); err != nil {
			return err
		}
	}
	for _, j := range which {
		f.guess[j], f.slope[j] = f.lineOf(lines, j).at(f.guess[j])
	}
	return nil
}

// at is the age and slope at a place between two nodes.
func (l *nodeLine) at(x float64) (age, slope float64) {
	i := int(math.Floor(x)) - l.first
	if i < 0 || i+1 >= len(l.nodes) {
		return never, 0
	}
	a, b, share := &l.nodes[i], &l.nodes[i+1], x-math.Floor(x)
	age, slope = a.age+(b.age-a.age)*share, a.slope+(b.slope-a.slope)*share
	if math.IsNaN(age) {
		return never, 0
	}
	return age, slope
}

// cover extends a line so that it reaches from low to high, without a gap:
// objects in between will come. A line that would be too long stays as it is.
func (f *feeler) cover(l *nodeLine, kind, comp uint8) error {
	if l.low > l.high {
		return nil
	}
	low, high := l.low, l.high
	if len(l.nodes) > 0 {
		low, high = min(low, l.first), max(high, l.first+len(l.nodes)-1)
	}
	if high-low+1 == len(l.nodes) || high-low >= mostNodes {
		return nil
	}
	nodes := make([]node, high-low+1)
	var missing []int
	for i := range nodes {
		if at := low + i - l.first; at >= 0 && at < len(l.nodes) {
			nodes[i] = l.nodes[at]
		} else {
			missing = append(missing, i)
		}
	}
	solved, err := f.solveNodes(kind, comp, low, missing)
	if err != nil {
		return err
	}
	for k, i := range missing {
		nodes[i] = solved[k]
	}
	l.first, l.nodes = low, nodes
	return nil
}

// solveNodes solves nodes by their indices above low: stays that begin at date
// 0 and last for ever, under no floor.
func (f *feeler) solveNodes(kind, comp uint8, low int, missing []int) ([]node, error) {
	n := len(missing)
	bare := &feeler{w: f.w, x: f.x, bare: true, stays: make([]stay, n)}
	bare.resize(n)
	which := make([]int32, n)
	for i, index := range missing {
		r := bare.all
		r.id[i], r.gen[i], r.kind[i], r.comp[i] = 0, 0, kind, comp
		r.place[i], r.origin[i], r.metals[i] = 0, 0, f.w.c.metal
		r.mass[i] = num.Exp(nodeSpacing * float64(low+index))
		r.birthMass[i] = r.mass[i]
		bare.goal[i], bare.dark[i] = f.goalOf(kind, r.mass[i]), true
		bare.stays[i] = stay{entered: math.Inf(-1), enter: math.Inf(-1), leave: never}
		which[i] = int32(i)
	}
	if err := bare.solve(which, never); err != nil {
		return nil, err
	}
	ages := make([]float64, n)
	for i := range ages {
		ages[i] = min(bare.cross[i]+slopeStep, forever)
	}
	g, err := bare.excess(ages, nil)
	if err != nil {
		return nil, err
	}
	solved := make([]node, n)
	for i := range solved {
		solved[i] = node{bare.cross[i], g[i] / slopeStep}
	}
	return solved, nil
}
