package engine

import (
	"wane/sim/draw"
	"wane/sim/law"
)

// chunk is how many rows are asked at a time.
const chunk = 16384

// rows is a table of objects about to be asked about. All columns have n rows.
type rows struct {
	n                         int
	id                        []uint32
	gen                       []uint32
	kind, comp, place, origin []uint8
	mass, birthMass, metals   []float64
	other                     []law.Column // further columns by name
	contiguous                bool         // ids rise by one, all of generation 0
}

func newRows(capacity int) *rows {
	return &rows{
		id: make([]uint32, 0, capacity), gen: make([]uint32, 0, capacity),
		kind: make([]uint8, 0, capacity), comp: make([]uint8, 0, capacity),
		place: make([]uint8, 0, capacity), origin: make([]uint8, 0, capacity),
		mass: make([]float64, 0, capacity), birthMass: make([]float64, 0, capacity),
		metals: make([]float64, 0, capacity),
	}
}

// resize sets the number of rows; new rows hold anything.
func (r *rows) resize(n int) {
	r.n = n
	r.id, r.gen = grown(r.id, n), grown(r.gen, n)
	r.kind, r.comp, r.place, r.origin = grown(r.kind, n), grown(r.comp, n), grown(r.place, n), grown(r.origin, n)
	r.mass, r.birthMass, r.metals = grown(r.mass, n), grown(r.birthMass, n), grown(r.metals, n)
	r.other, r.contiguous = r.other[:0], false
}

func grown[T any](s []T, n int) []T {
	if cap(s) < n {
		return make([]T, n, 2*n)
	}
	return s[:n]
}

// copyRow copies row j of from to row i.
func (r *rows) copyRow(i int, from *rows, j int) {
	r.id[i], r.gen[i] = from.id[j], from.gen[j]
	r.kind[i], r.comp[i], r.place[i], r.origin[i] = from.kind[j], from.comp[j], from.place[j], from.origin[j]
	r.mass[i], r.birthMass[i], r.metals[i] = from.mass[j], from.birthMass[j], from.metals[j]
}

// asker asks laws about rows. One per worker.
type asker struct {
	m            *Model
	realisation  uint64
	streams      map[string]draw.Stream
	arena        law.Arena
	columns      []law.Column
	sub          *rows // rows of one law of several
	pick, pick2  []int32
	alone        *rows
	nodes        rows
	found1       []prospect
	kept, start  []float64
	words        []uint8
	kinds        []uint8
	exposed      [][]float64
	soughts      [][]float64
	sky          Sky
	latest       float64 // log10: no since of the rows being asked is later
	starProspect bool
}

func newAsker(m *Model) *asker {
	return &asker{m: m, streams: map[string]draw.Stream{}, sub: newRows(0), alone: newRows(0)}
}

func (a *asker) begin(realisation uint64) {
	a.realisation = realisation
	for _, p := range law.Processes {
		a.streams[p.Name] = a.m.stream(realisation, p.Name)
	}
}

// ask asks one question about every row of r. number is the draw number of a
// u column. The answer is good until the next ask.
func (a *asker) ask(use *law.Use, question string, r *rows, number uint32) (law.Batch, error) {
	a.arena.Reset()
	a.columns = a.columns[:0]
	for _, name := range inputsOf(use, question) {
		a.columns = append(a.columns, a.column(use, name, name, r, number))
	}
	return use.Ask(question, law.Batch{Rows: r.n, Columns: a.columns}.With(&a.arena))
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
	if r.contiguous && r.n > 0 {
		s.Uniforms(dst[:r.n], uint64(r.id[0]), 0, number)
		return
	}
	for i := range r.n {
		dst[i] = s.Uniform(uint64(r.id[i]), r.gen[i], number)
	}
}

func (a *asker) exponentials(dst []float64, process string, r *rows, number uint32) {
	s := a.streams[process]
	if r.contiguous && r.n > 0 {
		s.Exps(dst[:r.n], uint64(r.id[0]), 0, number)
		return
	}
	for i := range r.n {
		dst[i] = s.Exp(uint64(r.id[i]), r.gen[i], number)
	}
}

// spoken returns the rows of r that use speaks for: r itself when it speaks
// for all, else a gathered copy, with the row numbers in a.pick. The copy is
// good until the next call.
func (a *asker) spoken(use *law.Use, r *rows) (*rows, []int32) {
	a.pick = a.pick[:0]
	for i := range r.n {
		if use.Speaks(r.kind[i], r.mass[i], r.metals[i]) {
			a.pick = append(a.pick, int32(i))
		}
	}
	if len(a.pick) == r.n {
		return r, nil
	}
	a.sub.resize(len(a.pick))
	for i, j := range a.pick {
		a.sub.copyRow(i, r, int(j))
	}
	for _, o := range r.other {
		c := law.Column{Name: o.Name, Values: a.arenaless(len(a.pick))}
		for i, j := range a.pick {
			c.Values[i] = o.Values[j]
		}
		a.sub.other = append(a.sub.other, c)
	}
	return a.sub, a.pick
}

// arenaless returns a fresh column: gathered columns outlive the arena's reset.
func (a *asker) arenaless(n int) []float64 { return make([]float64, n) }

// at returns the row of r that row i of the spoken rows stands for.
func at(pick []int32, i int) int {
	if pick == nil {
		return i
	}
	return int(pick[i])
}
