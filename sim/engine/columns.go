package engine

import "wane/sim/law"

// columns holds the objects of one realisation. An object has two stages: what
// it is born as and, for a star, what it leaves. Dates are years.
type columns struct {
	n     int
	birth []float64
	death []float64 // when it enters its second stage; its birth if it has one stage only
	mass0 []float64 // in the first stage
	mass1 []float64 // in the second
	kind0 []uint8
	kind1 []uint8
	comp1 []uint8
	died  []uint8   // cause of the change of stage, 0 for one stage only
	end   []float64 // log10 date at which its prospect ends the second stage; +Inf: never
	ended []uint8   // cause of that
	// metals, nil when every object has the metals in metal.
	metals []float64
	metal  float64

	// Clocks. reading is where clock k takes the object: first a unit
	// exponential, then a reading.
	reading [][]float64
	turned  []uint8 // bit 2k: clock k's hit in the first stage falls to the centre; 2k+1: in the second. Nil when no law diverts

	leave []float64 // date it left the bound galaxy, +Inf: it has not
	left  []uint8   // cause
	place []uint8

	// chain holds what follows a prospect that does not end the object.
	chain map[uint32][]link

	// All three nil when nothing merges. generation is that of the thresholds.
	origin     []uint8
	generation []uint32
	continued  []bool // its entry into the first stage is in the journal

	// gas holds the mass that goes to gas when a turning law takes an object,
	// by object and step; see noteGas.
	gas map[[2]uint32]float64

	lastDeath float64     // yr
	immortal  bool        // a star never dies by itself
	earliest  float64     // birth, yr
	founded   compensated // mass, solMass of the sample
	wearAt    float64     // log10 date before which no object has lost 1 % by wearing
	wearStep  float64     // log10 of the shortest time in which an object loses that
}

// link is one further stage of an object, entered at the end of the one before.
type link struct {
	mass   float64
	end    float64 // log10 date of the next prospect
	kind   uint8
	comp   uint8
	ended  uint8
	turned uint8              // bit k: clock k's hit falls to the centre
	s      [maxClocks]float64 // susceptibilities
	sought [maxClocks]float64
}

// maxClocks is how many clocks a run may have.
const maxClocks = 8

func (c *columns) resize(m *Model, n int) {
	c.n = n
	for _, f := range []*[]float64{&c.birth, &c.death, &c.mass0, &c.mass1, &c.end, &c.leave} {
		*f = grown(*f, n)
	}
	for _, b := range []*[]uint8{&c.kind0, &c.kind1, &c.comp1, &c.died, &c.ended, &c.left, &c.place} {
		*b = grown(*b, n)
	}
	if len(m.diverts) > 0 {
		c.turned = grown(c.turned, n)
	}
	if c.reading == nil {
		k := len(m.Clocks)
		c.reading = make([][]float64, k)
	}
	for k := range m.Clocks {
		c.reading[k] = grown(c.reading[k], n)
	}
	c.chain, c.gas = nil, nil
	c.immortal = false
	c.lastDeath, c.earliest, c.founded, c.wearAt, c.wearStep = 0, never, compensated{}, never, never
	if m.encounter != nil {
		c.origin = grown(c.origin, n)
		clear(c.origin)
		c.generation, c.continued = grown(c.generation, n), grown(c.continued, n)
		clear(c.generation)
		clear(c.continued)
	}
}

// metalsOf returns the metals of object i.
func (c *columns) metalsOf(i int) float64 {
	if c.metals == nil {
		return c.metal
	}
	return c.metals[i]
}

// consume empties the columns of an object that is no more; its history is in
// the journal.
func (c *columns) consume(i uint32) {
	c.kind0[i], c.kind1[i] = law.NoWord, law.NoWord
	c.mass0[i], c.mass1[i], c.died[i], c.end[i], c.leave[i] = 0, 0, 0, never, never
	c.continued[i] = true
	delete(c.chain, i)
}

// starStep is the step of noteGas that ends the first stage.
const starStep = longestChain + 1

// noteGas keeps how much of what a turning law takes goes to gas. Step 0 ends
// the second stage, step n the n-th link.
func (c *columns) noteGas(i uint32, step int, p prospect) {
	if p.gas == 0 {
		return
	}
	if c.gas == nil {
		c.gas = map[[2]uint32]float64{}
	}
	c.gas[[2]uint32{i, uint32(step)}] = p.gas
}

// generationOf is the generation of object i's draws in its present stage.
func (w *Workspace) generationOf(i uint32) uint32 {
	g := w.thresholdGeneration(i)
	s := w.stageOf(i)
	if s >= 2 && w.c.died[i] != 0 {
		g++
	}
	if s > 2 {
		g += uint32(s - 2)
	}
	return g
}

// thresholdGeneration is the generation in which its thresholds were drawn.
func (w *Workspace) thresholdGeneration(i uint32) uint32 {
	if w.c.generation == nil {
		return 0
	}
	return w.c.generation[i]
}

func (w *Workspace) originOf(i uint32) uint8 {
	if w.c.origin == nil {
		return law.Founded
	}
	return w.c.origin[i]
}
