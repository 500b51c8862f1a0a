package reference

import (
	"strings"

	"wane/sim/draw"
	"wane/sim/law"
	"wane/sim/physics/structure"
)

// Draw numbers within a process's stream, as package engine promises them.
const (
	drawU      = 0
	drawE      = 1
	drawPick   = 2
	drawSize   = 3
	drawClock  = 8
	drawDivert = 16
	drawMeet   = 32
	drawSeek   = 64
)

// row is one object about to be asked about.
type row struct {
	id                        uint64
	gen                       uint32
	kind, comp, place, origin uint8
	mass, birthMass, metals   float64
	other                     map[string]float64
}

func (g *run) stream(process string) draw.Stream {
	s, ok := g.streams[process]
	if !ok {
		s = draw.New(g.setup.Seed, g.realisation, process)
		g.streams[process] = s
	}
	return s
}

// ask asks one question about one object. number is the draw of a u column.
func (g *run) ask(u *law.Use, question string, r row, number uint32) (law.Batch, error) {
	in := law.Batch{Rows: 1}
	for _, name := range questionOf(u, question).Inputs {
		in.Columns = append(in.Columns, g.column(u, name, name, r, number))
	}
	return u.Ask(question, in)
}

// column is the value of one column, base by the catalogue and name to the law.
func (g *run) column(u *law.Use, name, base string, r row, number uint32) law.Column {
	one := func(v float64) law.Column { return law.Numbers(name, []float64{v}) }
	word := func(w uint8) law.Column { return law.Codes(name, []uint8{w}) }
	switch base {
	case "kind":
		return word(r.kind)
	case "composition":
		return word(r.comp)
	case "place":
		return word(r.place)
	case "origin":
		return word(r.origin)
	case "mass":
		return one(r.mass)
	case "birth_mass":
		return one(r.birthMass)
	case "metals":
		return one(r.metals)
	case "radius":
		return one(radiusOf(r.kind, r.mass))
	case "u":
		return one(g.stream(u.Card.Process).Uniform(r.id, r.gen, number))
	case "e":
		return one(g.stream(u.Card.Process).Exp(r.id, r.gen, drawE))
	}
	return one(r.other[base])
}

// askPair asks meet about two objects: columns ending in _1 are of the first,
// in _2 of the second, others of the first.
func (g *run) askPair(u *law.Use, first, second row) (law.Batch, error) {
	in := law.Batch{Rows: 1}
	for _, name := range questionOf(u, "meet").Inputs {
		base, r := name, first
		if s, ok := strings.CutSuffix(name, "_1"); ok {
			base = s
		} else if s, ok := strings.CutSuffix(name, "_2"); ok {
			base, r = s, second
		}
		in.Columns = append(in.Columns, g.column(u, name, base, r, drawMeet))
	}
	return u.Ask("meet", in)
}

func questionOf(u *law.Use, name string) law.Question {
	for _, q := range u.Card.Questions {
		if q.Name == name {
			return q
		}
	}
	return law.Question{}
}

func (r row) speaks(u *law.Use) bool { return u.Speaks(r.kind, r.mass, r.metals) }

// choose picks one of the words whose chances stand in the columns from first on.
func choose(out law.Batch, first, words int, u float64) int {
	sum, last := 0.0, 0
	for w := range words {
		c := out.Columns[first+w].Values[0]
		if sum += c; u < sum {
			return w
		}
		if c > 0 {
			last = w
		}
	}
	return last
}

// radiusOf is the radius of an object in km.
func radiusOf(kind uint8, mass float64) float64 {
	switch kind {
	case law.Star:
		return structure.MainSequenceRadius(mass)
	case law.WhiteDwarf:
		return structure.WhiteDwarfRadius(mass)
	case law.NeutronStar:
		return structure.NeutronStarRadius(mass)
	case law.BlackHole, law.CentralHole:
		return structure.HoleRadius(mass)
	}
	return structure.BrownDwarfRadius(mass)
}

// compositionOf is what an object that has become a kind is made of.
func (g *run) compositionOf(kind, before uint8) uint8 {
	switch kind {
	case law.NeutronStar:
		return law.Neutrons
	case law.BlackHole, law.CentralHole:
		return law.Pure
	}
	for _, u := range g.setup.Set.All() {
		for _, k := range u.Card.Kinds {
			if g.setup.Set.Kind(k.Name) == kind {
				return k.Composition
			}
		}
	}
	return before
}
