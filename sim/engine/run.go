package engine

import (
	"context"
	"math"

	"wane/sim/galaxy"
	"wane/sim/num"
)

// Workspace runs realisations one after another in memory it keeps. One per
// worker.
type Workspace struct {
	m   *Model
	ask *asker
	c   columns
	env *Environment
	sky Sky

	// The dynamics. t and base are in units of 10^env.unit yr.
	t             float64   // date of the last event
	base          float64   // date at which the rates last changed
	reading       []float64 // readings of the clocks then
	windowAt      float64   // date at which values that move with time call for a refresh
	horizon       float64   // date at which the run or the sky ends
	adriftAt      float64   // date at which everything is cast adrift
	bound         int       // objects in the bound galaxy
	awaiting      int       // objects waiting for the next refresh after an encounter
	stage         []uint8   // of every object: 0 unborn, 1 first, 2 second, 3.. links; waiting is set on top
	clocks        []queue
	schedule      queue
	sorter        sorter
	caps          []float64      // clock readings at which a quiet leg ends
	quiet         bool           // only the objects in active are on the clocks
	compact       bool           // susceptibilities are not held
	s             [2][][]float64 // by stage, clock, object
	few           map[uint32]few // of the objects on the clocks in a compact run
	view          [2][][]float64
	kept          []float64 // of the active objects, while their chunk is settled
	active        []uint32
	isActive      []bool
	unspent       [maxClocks]float64
	spared        [maxClocks]map[uint32]float64 // of those that nothing can hit at present
	stayed        []stay
	feel          feeler
	warmNodes     map[galaxy.Warmth][]nodeLine
	rho           [maxClocks][maxClocks]float64
	broken        [maxClocks][maxClocks]uint8 // how often a bound in rho has not held
	anyBroken     bool
	checked       int
	endAt         float64 // date before which no prospect ends a stage
	endsScheduled bool
	adriftPending bool
	stoppedAt     float64 // log10
	past          past    // the readings through a quiet leg
	events        int64
	central       centralHole
	wear          wearing
	meets         meetings
	books         books
	ahead         *countRates // of the countdown
	rest          []uint32    // of a chunk, while the clocks are filled
	counts        counts
	reach         *reach // how far the ends of the real number reach; nil: not asked yet
}

const waiting = 0x80

// NewWorkspace returns a workspace for the model.
func (m *Model) NewWorkspace() *Workspace {
	k := len(m.Clocks)
	return &Workspace{m: m, ask: newAsker(m), env: m.NewEnvironment(), reading: make([]float64, k),
		clocks: make([]queue, k), caps: make([]float64, k), few: map[uint32]few{}}
}

// Run runs one realisation.
func (w *Workspace) Run(ctx context.Context, realisation uint64) (*Outcome, error) {
	w.ask.begin(realisation)
	w.sky = nil
	if w.m.Sky != nil {
		s, err := w.m.Sky.Draw(w.m.Seed, realisation)
		if err != nil {
			return nil, err
		}
		w.sky = s
	}
	w.ask.sky = w.sky
	if err := w.ask.found(&w.c); err != nil {
		return nil, err
	}
	w.begin()
	if err := w.dynamics(ctx); err != nil {
		return nil, err
	}
	return w.conclude()
}

// begin sets the galaxy up before the first event.
func (w *Workspace) begin() {
	m, c, e := w.m, &w.c, w.env
	w.books.reset(m, c)
	w.central.begin(m.CentralMass, c.earliest)
	e.Reset()
	e.add(slotNumber, m.Real)
	e.add(slotMass, m.Weight*c.founded.value())
	e.add(slotCentral, m.CentralMass)
	if m.kindsCount {
		for i := range c.n {
			e.add(m.slotNumberKind(int(c.kind0[i])), m.Weight)
			e.add(m.slotMassKind(int(c.kind0[i])), m.Weight*c.mass0[i])
		}
	}
	e.Founded(m.Weight * c.founded.value())
	w.stoppedAt, w.broken, w.anyBroken = math.NaN(), [maxClocks][maxClocks]uint8{}, false
	w.t, w.base, w.bound, w.awaiting, w.events = 0, 0, c.n, 0, 0
	clear(w.reading)
	w.windowAt = never
	w.horizon, w.adriftAt = linear(m.Until), never
	if w.sky != nil {
		end, _ := w.sky.End()
		w.horizon = min(w.horizon, linear(end))
		w.adriftAt = linear(w.sky.Adrift())
		w.adriftPending = w.adriftAt == never && w.sky.Adrift() < never
	}
	w.stage = grown(w.stage, c.n)
	clear(w.stage)
	for k := range w.spared {
		clear(w.spared[k])
	}
	w.wear.begin()
	w.meets.begin()
}

// linear is 10^L, +Inf where that overflows.
func linear(l float64) float64 {
	if l > 308 {
		return never
	}
	return num.Exp10(l)
}

// readingAt is what clock k shows at date t under the present rates.
func (w *Workspace) readingAt(k int, t float64) float64 {
	return w.reading[k] + w.env.Rates[k]*(t-w.base)
}

// rebase moves the point from which readings are counted to date t.
func (w *Workspace) rebase(t float64) {
	for k := range w.reading {
		w.reading[k] = w.readingAt(k, t)
	}
	w.base = t
}

// changed takes in that galaxy values have changed at date t.
func (w *Workspace) changed(t float64) error {
	w.rebase(t)
	if w.bound == 0 {
		return nil
	}
	if w.bound < fewObjects || w.env.moved() || w.awaiting > 0 && 100*w.awaiting >= w.bound {
		return w.refresh(t)
	}
	w.env.update()
	if w.quiet {
		w.past.note(w.base, w.reading, w.env.Rates)
	}
	return nil
}

// refresh asks the rates anew at date t, after bringing in the products of
// encounters that were waiting for it.
func (w *Workspace) refresh(t float64) error {
	if w.awaiting > 0 {
		if err := w.resolve(t); err != nil {
			return err
		}
	}
	if w.bound == 0 {
		return w.central.look(w, t)
	}
	window, err := w.env.refresh(max(t, w.central.since*num.Exp10(-w.env.unit)), w.reading)
	if err != nil {
		return err
	}
	w.windowAt = t + window
	if w.quiet {
		w.past.note(w.base, w.reading, w.env.Rates)
	}
	return w.central.look(w, t)
}
