package reference

import (
	"fmt"

	"wane/sim/law"
)

// object is one object with its whole story.
type object struct {
	id         uint64
	metals     float64
	founded    float64 // mass it was founded with
	origin     uint8
	place      uint8
	gone       bool
	waiting    bool   // for what comes of a meeting
	generation uint32 // of its present life's first stage and thresholds
	life       int    // how often it has merged
	stages     []stage
	at         int // -1: unborn

	takes   []float64 // per clock: the reading at which it takes the object
	unspent []float64 // per clock: what is left of the exponential while nothing can hit it

	wearRate, wearSince float64 // solMass per unit of time; date

	changes []Change
	spans   []span
}

// stage is what an object is between two changes of kind.
type stage struct {
	kind, comp    uint8
	mass          float64 // now
	entry         float64 // mass at entry
	from, end     float64 // log10 dates
	cause         Cause   // of its end
	gas           float64 // mass to gas at its end, turning laws
	star          bool    // ends by death: mass lost goes to gas
	turning       bool    // ends by a turning law
	seeks, sought []float64
	diverted      []string // per clock: the word under which its hit falls to the centre
}

func (o *object) now() *stage { return &o.stages[max(o.at, 0)] }

// row is the object as a law sees it now.
func (o *object) row() row { return o.rowAt(max(o.at, 0)) }

func (o *object) rowAt(at int) row {
	s := &o.stages[at]
	return row{id: o.id, gen: o.generation + uint32(at), kind: s.kind, comp: s.comp, place: law.Bound, origin: o.origin,
		mass: s.mass, birthMass: s.entry, metals: o.metals}
}

// found makes object id.
func (g *run) found(id uint64) (*object, error) {
	of := g.setup.Set.Of
	r := row{id: id, kind: law.Star, comp: law.Hydrogen, place: law.Bound, origin: law.Founded}
	out, err := g.ask(of("mass-function"), "mass", r, drawU)
	if err != nil {
		return nil, err
	}
	r.mass = out.Columns[0].Values[0]
	r.birthMass = r.mass
	if out, err = g.ask(of("star-formation"), "birth", r, drawU); err != nil {
		return nil, err
	}
	birth := out.Columns[0].Values[0]
	r.other = map[string]float64{"log10_date": birth}
	if out, err = g.ask(of("metals"), "metals", r, drawU); err != nil {
		return nil, err
	}
	r.metals, r.other = out.Columns[0].Values[0], nil
	if out, err = g.ask(of("substellar-limit"), "sort", r, drawU); err != nil {
		return nil, err
	}
	r.kind = out.Columns[0].Words[0]
	o := &object{id: id, metals: r.metals, founded: r.mass, origin: law.Founded, at: -1}
	return o, g.live(o, r, birth)
}

// live lays out the stages of a life that begins as r at a log10 date.
func (g *run) live(o *object, r row, from float64) error {
	o.stages = nil
	first := stage{kind: r.kind, comp: r.comp, mass: r.mass, entry: r.mass, from: from, end: never}
	if r.kind != law.Star {
		o.stages = append(o.stages, first)
		return g.follow(o, r, from)
	}
	first.star = true
	out, err := g.ask(g.setup.Set.Of("lifetime"), "live", r, drawU)
	if err != nil {
		return err
	}
	first.end = later(from, out.Columns[0].Values[0])
	next, cause, err := g.remnant(r)
	if err != nil {
		return err
	}
	first.cause = cause
	p, err := g.foretell(r, from)
	if err != nil {
		return err
	}
	if p.date < first.end {
		if p.kind == law.NoWord {
			return fmt.Errorf("reference: a star of %v Msun would be gone before it dies", r.mass)
		}
		first.end, first.cause, first.gas, first.star, first.turning = p.date, p.cause, p.gas, false, g.isTurning(p.cause)
		next.kind, next.mass, next.comp = p.kind, p.mass, g.compositionOf(p.kind, r.comp)
	}
	o.stages = append(o.stages, first)
	next.gen++
	next.birthMass = next.mass
	o.stages = append(o.stages, stage{kind: next.kind, comp: next.comp, mass: next.mass, entry: next.mass, from: first.end, end: never})
	return g.follow(o, next, first.end)
}

// remnant is what a star leaves, and the cause of its end.
func (g *run) remnant(r row) (row, Cause, error) {
	for _, u := range g.ends {
		if !r.speaks(u) {
			continue
		}
		words := questionOf(u, "die").Words
		out, err := g.ask(u, "die", r, drawU)
		if err != nil {
			return r, Cause{}, err
		}
		w := choose(out, 0, len(words), g.stream(u.Card.Process).Uniform(r.id, r.gen, drawPick))
		left := r
		left.kind = g.setup.Set.Kind(words[w])
		if out, err = g.ask(u, "remain", left, drawSize); err != nil {
			return r, Cause{}, err
		}
		left.mass, left.comp = out.Columns[0].Values[0], out.Columns[1].Words[0]
		return left, Cause{u.Card.Process, "became " + words[w]}, nil
	}
	return r, Cause{}, fmt.Errorf("reference: no law says what a star of %v Msun leaves", r.mass)
}

// follow asks what ends the last stage, which is r, and what comes after that.
func (g *run) follow(o *object, r row, since float64) error {
	for range 20 {
		last := &o.stages[len(o.stages)-1]
		p, err := g.foretell(r, since)
		if err != nil {
			return err
		}
		last.end, last.cause, last.gas, last.turning = p.date, p.cause, p.gas, g.isTurning(p.cause)
		if p.date == never || p.kind == law.NoWord {
			return g.expose(o)
		}
		r.comp = g.compositionOf(p.kind, r.comp)
		r.kind, r.mass, r.birthMass, since = p.kind, p.mass, p.mass, p.date
		r.gen++
		o.stages = append(o.stages, stage{kind: r.kind, comp: r.comp, mass: r.mass, entry: r.mass, from: since, end: never})
	}
	return fmt.Errorf("reference: object %d changes for ever", o.id)
}

// expose asks how the clocks touch each stage of an object.
func (g *run) expose(o *object) error {
	for at := range o.stages {
		s := &o.stages[at]
		if err := g.exposeStage(o, at); err != nil {
			return err
		}
		s.diverted = make([]string, len(g.clocks))
		for _, d := range g.diverts {
			r := o.rowAt(at)
			if !r.speaks(d.use) {
				continue
			}
			out, err := g.ask(d.use, "divert", r, drawU)
			if err != nil {
				return err
			}
			if g.stream(d.use.Card.Process).Uniform(o.id, o.generation, drawDivert+uint32(d.column)) < out.Columns[d.column].Values[0] {
				s.diverted[d.clock] = d.outcome
			}
		}
	}
	return nil
}

// exposeStage asks the susceptibilities of a stage with its present mass.
func (g *run) exposeStage(o *object, at int) error {
	s := &o.stages[at]
	s.seeks, s.sought = make([]float64, len(g.clocks)), make([]float64, len(g.clocks))
	for k, c := range g.clocks {
		r := o.rowAt(at)
		if !c.use.Card.Answers("expose") || !r.speaks(c.use) {
			continue
		}
		out, err := g.ask(c.use, "expose", r, drawU)
		if err != nil {
			return err
		}
		s.seeks[k] = out.Columns[c.index].Values[0]
		if c.use == g.encounter {
			s.sought[k] = out.Columns[len(c.use.Card.Clocks)+c.index].Values[0]
		}
	}
	return nil
}
