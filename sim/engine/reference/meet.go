package reference

import (
	"fmt"
	"slices"

	"wane/sim/law"
)

// pair is two objects waiting for the next refresh.
type pair struct {
	seeker, partner *object
	date            float64 // log10
}

const maxTries = 4096

// meet lets an object whose clock k has fired find a partner among those that
// are bound; who is not yet born or waits is passed over.
func (g *run) meet(k int, o *object) error {
	total := 0.0
	for _, c := range g.objects {
		if c.bound() {
			total += c.now().sought[k]
		}
	}
	stream := g.stream(g.clocks[k].use.Card.Process)
	for try := range uint32(maxTries) {
		if total == 0 {
			break
		}
		u := stream.Uniform(o.id, o.generation+uint32(o.at), drawSeek+try) * total
		sum := 0.0
		var found *object
		for _, c := range g.objects {
			if !c.bound() {
				continue
			}
			if sum += c.now().sought[k]; sum >= u {
				found = c
				break
			}
		}
		if found == nil || found == o || !found.available() || found.now().sought[k] == 0 {
			continue
		}
		o.waiting, found.waiting = true, true
		g.waiting += 2
		g.pairs = append(g.pairs, pair{o, found, g.log(g.t)})
		return g.changed()
	}
	// Nobody left to meet: this clock has nothing more for this object.
	o.takes[k], o.unspent[k] = never, never
	return nil
}

// resolve asks what comes of the meetings since the last refresh.
func (g *run) resolve() error {
	pairs := g.pairs
	g.pairs, g.waiting = nil, 0
	type product struct {
		o *object
		r row
	}
	var products []product
	dates := map[*object]float64{}
	causes := map[*object]Cause{}
	for _, p := range pairs {
		out, err := g.askPair(g.encounter, p.seeker.row(), p.partner.row())
		if err != nil {
			return err
		}
		cause := Cause{g.encounter.Card.Process, g.encounter.Card.Outcomes[out.Columns[0].Words[0]].Word}
		g.fired[cause.Process]++
		gas := out.Columns[7].Values[0]
		light := p.seeker.now().mass + p.partner.now().mass - gas
		for side, o := range []*object{p.seeker, p.partner} {
			kind, mass, comp := out.Columns[1+3*side].Words[0], out.Columns[2+3*side].Values[0], out.Columns[3+3*side].Words[0]
			g.count(o, -1)
			o.waiting = false
			if kind == law.NoWord {
				g.record(o, p.date, true, cause)
				o.gone = true
				g.bound--
				continue
			}
			light -= mass
			r := o.row()
			if kind != r.kind || mass > r.mass*(1+1e-12) {
				o.origin = law.Merged
			}
			o.generation = ((o.generation+uint32(o.at))/16 + 1) * 16
			r.kind, r.mass, r.birthMass, r.comp, r.origin, r.gen = kind, mass, mass, comp, o.origin, o.generation
			products = append(products, product{o, r})
			dates[o], causes[o] = p.date, cause
		}
		if light < -1e-12 {
			return fmt.Errorf("reference: a meeting makes %v Msun", -light)
		}
		g.gas += gas
		g.light += light
	}
	slices.SortFunc(products, func(a, b product) int { return int(a.o.id) - int(b.o.id) })
	for _, p := range products {
		if err := g.rejoin(p.o, p.r, dates[p.o], causes[p.o]); err != nil {
			return err
		}
	}
	return nil
}

// rejoin begins a new life of an object that has met another.
func (g *run) rejoin(o *object, r row, date float64, cause Cause) error {
	if r.kind == law.Star || r.kind == law.BrownDwarf {
		out, err := g.ask(g.setup.Set.Of("substellar-limit"), "sort", r, drawU)
		if err != nil {
			return err
		}
		if r.kind = out.Columns[0].Words[0]; r.kind == law.Star {
			r.comp = law.Hydrogen
		}
	}
	o.life++
	if err := g.live(o, r, date); err != nil {
		return err
	}
	o.at = 0
	g.record(o, date, false, cause)
	g.count(o, +1)
	for k := range g.clocks {
		o.unspent[k] = g.exponential(k, o)
	}
	g.enter(o, 0)
	return nil
}
