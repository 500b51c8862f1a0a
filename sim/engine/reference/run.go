package reference

import (
	"container/heap"
	"math"
	"strings"

	"wane/sim/draw"
	"wane/sim/engine"
	"wane/sim/law"
	"wane/sim/num"
)

// run is one realisation.
type run struct {
	setup       engine.Setup
	model       *engine.Model
	env         *engine.Environment
	sky         engine.Sky
	realisation uint64
	weight      float64

	clocks                        []clock
	diverts                       []diverter
	wearing, turning, ends, cools []*law.Use
	encounter, frame, warmth      *law.Use
	matters                       bool // a change of kind or mass may move a declared value

	slots   map[string]int // by name of galaxy value
	streams map[string]draw.Stream
	objects []*object
	hole    hole
	fired   map[string]int64
	gas     float64
	light   float64 // radiated mass

	t, base   float64 // dates in the unit of env
	windowAt  float64
	horizon   float64 // log10
	adriftAt  float64 // log10
	first     float64 // log10 date of the first birth
	reading   []float64
	bound     int
	waiting   int
	pairs     []pair
	scheduled events
	hits      []hits
	wears     events
	stoppedAt float64
}

type clock struct {
	law.Clock
	use   *law.Use
	index int
}

type diverter struct {
	use           *law.Use
	clock, column int
	outcome       string
}

// Result is what came of a realisation.
type Result struct {
	engine.Outcome
	// Histories are the changes of each object, in order of date.
	Histories [][]Change
}

// Change is one change of an object's state. From and To are kind, place and
// origin in words, empty for an object that is not there.
type Change struct {
	Date     float64 // log10 yr
	From, To string
	Cause    string // process:outcome, empty for a birth
}

// Run runs one realisation.
func Run(setup engine.Setup, realisation uint64) (*Result, error) {
	g, err := newRun(setup, realisation)
	if err != nil {
		return nil, err
	}
	if err := g.begin(); err != nil {
		return nil, err
	}
	if err := g.dynamics(); err != nil {
		return nil, err
	}
	return g.conclude()
}

func newRun(setup engine.Setup, realisation uint64) (*run, error) {
	model, err := engine.Compile(setup)
	if err != nil {
		return nil, err
	}
	g := &run{setup: setup, model: model, env: model.NewEnvironment(), realisation: realisation, weight: 1,
		fired: map[string]int64{}, slots: map[string]int{}, streams: map[string]draw.Stream{}, stoppedAt: math.NaN(), horizon: setup.Until, adriftAt: never, windowAt: never}
	if setup.Objects > 0 {
		g.weight = setup.Real / float64(setup.Objects)
	}
	busy := func(r law.Role) (out []*law.Use) {
		for _, u := range setup.Set.OfRole(r) {
			if !u.Card.Idle {
				out = append(out, u)
			}
		}
		return out
	}
	g.wearing, g.turning, g.cools = busy(law.Wearing), busy(law.Turning), busy(law.Cooling)
	for _, u := range setup.Set.OfRole(law.Stellar) {
		if u.Card.Answers("die") {
			g.ends = append(g.ends, u)
		}
	}
	for _, u := range busy(law.Warmth) {
		g.warmth = u
	}
	movers := append(busy(law.Dynamics), busy(law.Encounter)...)
	for _, u := range movers {
		if u.Card.Frame {
			g.frame = u
		}
		for i, c := range u.Card.Clocks {
			g.clocks = append(g.clocks, clock{c, u, i})
		}
		for _, name := range questionOf(u, "rate").Inputs {
			g.matters = g.matters || strings.HasPrefix(name, "mass_bound") || strings.HasPrefix(name, "number_") ||
				strings.HasPrefix(name, "sum_") || name == "carried_off"
		}
	}
	for _, u := range busy(law.Encounter) {
		g.encounter, g.matters = u, true
	}
	for _, u := range movers {
		for i, word := range questionOf(u, "divert").Words {
			d := diverter{u, -1, i, "swallowed"}
			if i < len(u.Card.Outcomes) {
				d.outcome = u.Card.Outcomes[i].Word
			}
			for k, c := range g.clocks {
				if c.Name == word {
					d.clock = k
					g.diverts = append(g.diverts, d)
				}
			}
		}
	}
	if setup.Sky != nil {
		if g.sky, err = setup.Sky.Draw(setup.Seed, realisation); err != nil {
			return nil, err
		}
		end, _ := g.sky.End()
		g.horizon, g.adriftAt = min(g.horizon, end), g.sky.Adrift()
	}
	g.reading, g.hits = make([]float64, len(g.clocks)), make([]hits, len(g.clocks))
	return g, nil
}

// begin founds the objects and fills the galaxy values.
func (g *run) begin() error {
	g.first = never
	founded := 0.0
	for i := range g.setup.Objects {
		o, err := g.found(uint64(i))
		if err != nil {
			return err
		}
		g.objects = append(g.objects, o)
		g.first = min(g.first, o.stages[0].from)
		founded += o.stages[0].mass
	}
	g.env.Reset()
	g.hole.begin(g)
	g.bound = g.setup.Objects
	g.add("central_mass", g.setup.CentralMass)
	for _, o := range g.objects {
		o.takes, o.unspent = make([]float64, len(g.clocks)), make([]float64, len(g.clocks))
		for k := range g.clocks {
			o.takes[k], o.unspent[k] = never, g.exponential(k, o)
		}
		g.count(o, +1)
		g.schedule(o, o.stages[0].from, -1)
	}
	g.env.Founded(g.weight * founded)
	return nil
}

func (g *run) exponential(k int, o *object) float64 {
	return g.stream(g.clocks[k].use.Card.Process).Exp(o.id, o.generation, drawClock+uint32(g.clocks[k].index))
}

func (g *run) add(name string, x float64) {
	slot, known := g.slots[name]
	if !known {
		var ok bool
		if slot, ok = g.model.Slot(strings.ReplaceAll(name, "-", "_")); !ok {
			slot = -1
		}
		g.slots[name] = slot
	}
	if slot >= 0 {
		g.env.Add(slot, x)
	}
}

// count adds an object, as it is, to the galaxy values, or takes it out.
func (g *run) count(o *object, sign float64) {
	s := o.now()
	x := sign * g.weight
	g.add("number", x)
	g.add("mass_bound", x*s.mass)
	g.add("number_"+g.setup.Set.Kinds[s.kind], x)
	g.add("mass_bound_"+g.setup.Set.Kinds[s.kind], x*s.mass)
	for k, c := range g.clocks {
		g.add("sum_"+c.Name, x*s.seeks[k])
		if g.encounter != nil {
			g.add("sum_sought_"+c.Name, x*s.sought[k])
		}
	}
}

// linear is a log10 date in the unit of the dynamics, +Inf beyond its numbers.
func (g *run) linear(l float64) float64 {
	if l-g.env.Unit() > 308 {
		return never
	}
	return num.Exp10(l - g.env.Unit())
}

func (g *run) log(t float64) float64 { return num.Log10(t) + g.env.Unit() }

// event is something due at a date: a birth (at = -1), or the end of stage at.
type event struct {
	date float64
	what int
	o    *object
	life int
	at   int
}

type events []event

func (e events) Len() int { return len(e) }
func (e events) Less(i, j int) bool {
	a, b := e[i], e[j]
	switch {
	case a.date != b.date:
		return a.date < b.date
	case a.what != b.what:
		return a.what < b.what
	}
	return a.o.id < b.o.id
}
func (e events) Swap(i, j int) { e[i], e[j] = e[j], e[i] }
func (e *events) Push(x any)   { *e = append(*e, x.(event)) }
func (e *events) Pop() any {
	last := (*e)[len(*e)-1]
	*e = (*e)[:len(*e)-1]
	return last
}

func (g *run) schedule(o *object, logDate float64, at int) {
	what := 2
	switch {
	case at < 0:
		what = 0
	case at == 0 && o.stages[0].kind == law.Star:
		what = 1
	}
	if d := g.linear(logDate); d < never {
		heap.Push(&g.scheduled, event{d, what, o, o.life, at})
	}
}

// holds tells whether an event is still to come.
func (e event) holds() bool {
	return e.o.place == law.Bound && !e.o.gone && !e.o.waiting && e.o.life == e.life && e.o.at == e.at
}

// hit is an entry of a clock's heap.
type hit struct {
	reading float64
	o       *object
}

type hits []hit

func (h hits) Len() int { return len(h) }
func (h hits) Less(i, j int) bool {
	return h[i].reading < h[j].reading || h[i].reading == h[j].reading && h[i].o.id < h[j].o.id
}
func (h hits) Swap(i, j int) { h[i], h[j] = h[j], h[i] }
func (h *hits) Push(x any)   { *h = append(*h, x.(hit)) }
func (h *hits) Pop() any {
	last := (*h)[len(*h)-1]
	*h = (*h)[:len(*h)-1]
	return last
}

// bound tells whether an object is in the galaxy, born or not.
func (o *object) bound() bool { return o.place == law.Bound && !o.gone }

// available: bound, born, and not waiting for what comes of a meeting.
func (o *object) available() bool {
	return o.bound() && !o.waiting && o.at >= 0
}
