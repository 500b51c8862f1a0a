package engine

import (
	"wane/sim/draw"
	"wane/sim/law"
)

// asker asks laws about rows. One per worker.
type asker struct {
	m       *Model
	streams map[string]draw.Stream
	clocks  []draw.Stream // of each clock's process
	sky     Sky
	arena   *law.Arena
	arenas  [3]law.Arena // the first is for all but exposures, which outlive the next question
	turn    int
	columns []law.Column
	latest  float64 // log10: no since of the rows being asked is later

	sub, alone, rest   *rows // gathered rows
	pick, pick2, pick3 []int32
	nodes              nodes
	view               rows // of the galaxy's columns
	constants          constantColumns
	offers             []prospect
	linked             []int32
	parts              [][]int32
	links              []prospect
	kept, start        []float64
	gens               []uint32
	words, kinds       []uint8
	exposed            [2][][]float64
	soughts            [][]float64
}

// constantColumns are columns that say the same of every row of a chunk.
type constantColumns struct {
	hydrogen, bound, founded []uint8
	metals                   []float64
}

func newAsker(m *Model) *asker {
	a := &asker{m: m, streams: map[string]draw.Stream{}, sub: newRows(0), alone: newRows(0), rest: newRows(0)}
	a.arena = &a.arenas[0]
	n := min(m.batch, m.Objects)
	a.constants = constantColumns{make([]uint8, n), make([]uint8, n), make([]uint8, n), make([]float64, n)}
	for i := range n {
		a.constants.hydrogen[i], a.constants.bound[i], a.constants.founded[i] = law.Hydrogen, law.Bound, law.Founded
	}
	return a
}

func (a *asker) begin(realisation uint64) {
	for _, p := range law.Processes {
		a.streams[p.Name] = a.m.stream(realisation, p.Name)
	}
	a.clocks = grown(a.clocks, len(a.m.Clocks))
	for k := range a.m.Clocks {
		a.clocks[k] = a.streams[a.m.Clocks[k].Process]
	}
}

// firstStage is a view of objects first .. first+n-1 as they are born.
func (a *asker) firstStage(c *columns, first, n int) *rows {
	a.view = rows{n: n, first: uint32(first), contiguous: true, other: a.view.other[:0],
		kind: c.kind0[first : first+n], comp: a.constants.hydrogen[:n],
		place: a.constants.bound[:n], origin: a.constants.founded[:n],
		mass: c.mass0[first : first+n], birthMass: c.mass0[first : first+n], metals: a.metalColumn(c, first, n)}
	return &a.view
}

// secondStage is a view of them as what they become.
func (a *asker) secondStage(c *columns, first, n int) *rows {
	r := a.firstStage(c, first, n)
	r.kind, r.comp = c.kind1[first:first+n], c.comp1[first:first+n]
	r.mass, r.birthMass = c.mass1[first:first+n], c.mass1[first:first+n]
	if !a.m.stagesDraw {
		return r // nobody asks for the generation
	}
	r.gen = grown(a.gens, n)
	a.gens = r.gen
	for i := range n {
		r.gen[i] = 0
		if c.died[first+i] != 0 {
			r.gen[i] = 1
		}
	}
	return r
}

func (a *asker) metalColumn(c *columns, first, n int) []float64 {
	if c.metals != nil {
		return c.metals[first : first+n]
	}
	m := a.constants.metals[:n]
	if n > 0 && (m[0] != c.metal || m[n-1] != c.metal) {
		fill(a.constants.metals, c.metal)
	}
	return m
}

// ask asks one question about every row of r. number is the draw number of a
// u column. The answer is good until the next ask.
func (a *asker) ask(use *law.Use, question string, r *rows, number uint32) (law.Batch, error) {
	a.arena.Reset()
	return a.askKeeping(use, question, r, number)
}

// askKeeping is ask without taking back the answers before.
func (a *asker) askKeeping(use *law.Use, question string, r *rows, number uint32) (law.Batch, error) {
	a.columns = a.columns[:0]
	for _, name := range inputsOf(use, question) {
		a.columns = append(a.columns, a.column(use, name, name, r, number))
	}
	return use.Ask(question, law.Batch{Rows: r.n, Columns: a.columns}.With(a.arena))
}

// column is one column of r, by its name in the catalogue (base), under the
// name the law knows it by.
func (a *asker) column(use *law.Use, name, base string, r *rows, number uint32) law.Column {
	c := law.Column{Name: name}
	switch base {
	case "kind":
		c.Words = r.kind[:r.n]
	case "composition":
		c.Words = r.comp[:r.n]
	case "place":
		c.Words = r.place[:r.n]
	case "origin":
		c.Words = r.origin[:r.n]
	case "mass":
		c.Values = r.mass[:r.n]
	case "birth_mass":
		c.Values = r.birthMass[:r.n]
	case "metals":
		c.Values = r.metals[:r.n]
	case "radius":
		c.Values = a.arena.Values(r.n)
		for i := range r.n {
			c.Values[i] = radiusOf(r.kind[i], r.mass[i])
		}
	case "u":
		c.Values = a.arena.Values(r.n)
		a.uniforms(c.Values, use.Card.Process, r, number)
	case "e":
		c.Values = a.arena.Values(r.n)
		a.exponentials(c.Values, use.Card.Process, r, drawE)
	default:
		for _, o := range r.other {
			if o.Name == base {
				c.Values = o.Values
			}
		}
	}
	return c
}

func (a *asker) uniforms(dst []float64, process string, r *rows, number uint32) {
	s := a.streams[process]
	if r.contiguous && r.gen == nil {
		s.Uniforms(dst[:r.n], uint64(r.first), r.gen0, number)
		return
	}
	for i := range r.n {
		dst[i] = s.Uniform(uint64(r.idOf(i)), r.genOf(i), number)
	}
}

func (a *asker) exponentials(dst []float64, process string, r *rows, number uint32) {
	s := a.streams[process]
	if r.contiguous && r.gen == nil {
		s.Exps(dst[:r.n], uint64(r.first), r.gen0, number)
		return
	}
	for i := range r.n {
		dst[i] = s.Exp(uint64(r.idOf(i)), r.genOf(i), number)
	}
}
