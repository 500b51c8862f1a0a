package engine

import (
	"wane/sim/law"
)

// chunk is how many objects are taken at a time: few enough for their columns
// to stay in the processor's cache. So many rows laws are asked about at a
// time, too, unless one wants more of them.
const chunk = 4096

// mostRows is the most that are asked about at a time. Dates of cooling are
// found in rounds of questions, the later ones about few objects: there a law
// that wants many rows gets several times as many.
const (
	mostRows = 16 * chunk
	inRounds = 4
)

// compileBatch finds how many rows to ask about at a time, a multiple of
// chunk. No answer depends on it.
func (m *Model) compileBatch() {
	m.batch = chunk
	for _, u := range m.Set.All() {
		if b, ok := u.Law.(law.Batcher); ok && !u.Card.Idle {
			m.batch = max(m.batch, min((b.Rows()+chunk-1)/chunk*chunk, mostRows))
		}
	}
	m.rounds = m.batch
	if m.batch > chunk {
		m.rounds *= inRounds
	}
}

// rows is a table of objects about to be asked about. All columns have n rows;
// they may be views of the galaxy's own columns, which laws only read.
type rows struct {
	n                       int
	first                   uint32   // when contiguous: the id of row 0, ids rise by one
	contiguous              bool     //
	id                      []uint32 // otherwise
	gen                     []uint32 // nil: all of generation gen0
	gen0                    uint32
	kind, comp              []uint8
	place, origin           []uint8
	mass, birthMass, metals []float64
	other                   []law.Column // further columns by name
}

func newRows(capacity int) *rows {
	r := &rows{}
	r.resize(capacity)
	r.resize(0)
	return r
}

// resize makes a table of its own of n rows, which hold anything.
func (r *rows) resize(n int) {
	r.n, r.contiguous, r.gen0 = n, false, 0
	r.id, r.gen = grown(r.id, n), grown(r.gen, n)
	r.kind, r.comp, r.place, r.origin = grown(r.kind, n), grown(r.comp, n), grown(r.place, n), grown(r.origin, n)
	r.mass, r.birthMass, r.metals = grown(r.mass, n), grown(r.birthMass, n), grown(r.metals, n)
	r.other = r.other[:0]
}

// grown returns s with n elements, which hold anything if it had to grow.
func grown[T any](s []T, n int) []T {
	if cap(s) < n {
		return make([]T, n)
	}
	return s[:n]
}

func (r *rows) idOf(i int) uint32 {
	if r.contiguous {
		return r.first + uint32(i)
	}
	return r.id[i]
}

func (r *rows) genOf(i int) uint32 {
	if r.gen == nil {
		return r.gen0
	}
	return r.gen[i]
}

// copyRow copies row j of from to row i of a table of its own.
func (r *rows) copyRow(i int, from *rows, j int) {
	r.id[i], r.gen[i] = from.idOf(j), from.genOf(j)
	r.kind[i], r.comp[i], r.place[i], r.origin[i] = from.kind[j], from.comp[j], from.place[j], from.origin[j]
	r.mass[i], r.birthMass[i], r.metals[i] = from.mass[j], from.birthMass[j], from.metals[j]
}

// columnSet is a set of object columns.
type columnSet uint8

const (
	hasKind columnSet = 1 << iota
	hasComposition
	hasPlace
	hasOrigin
	hasMass
	hasBirthMass
	hasMetals
	hasDraws // number and generation, which key the object's draws
	hasAll   = 1<<iota - 1
)

var columnBits = map[string]columnSet{"kind": hasKind, "composition": hasComposition, "place": hasPlace, "origin": hasOrigin,
	"mass": hasMass, "birth_mass": hasBirthMass, "metals": hasMetals, "radius": hasKind | hasMass, "u": hasDraws, "e": hasDraws}

// reads is the set of object columns that any question of a law reads; kind
// and mass are always among them, for the engine's own use, and for all but
// wearing laws what keys the draws, for what the engine decides by a draw.
func reads(u *law.Use) columnSet {
	set := hasKind | hasMass
	if p, _ := law.ProcessNamed(u.Card.Process); p.Role != law.Wearing {
		set |= hasDraws
	}
	for _, q := range u.Card.Questions {
		for _, in := range q.Inputs {
			set |= columnBits[in]
		}
	}
	return set
}

// gather fills r with the picked rows of from: the wanted columns only.
func (r *rows) gather(from *rows, pick []int32, want columnSet) {
	r.resize(len(pick))
	if want&hasDraws != 0 {
		r.gatherKeys(from, pick)
	} else {
		r.id, r.gen = r.id[:0], r.gen[:0]
	}
	if want&hasKind != 0 {
		gatherColumn(r.kind, from.kind, pick)
	}
	if want&hasComposition != 0 {
		gatherColumn(r.comp, from.comp, pick)
	}
	if want&hasPlace != 0 {
		gatherColumn(r.place, from.place, pick)
	}
	if want&hasOrigin != 0 {
		gatherColumn(r.origin, from.origin, pick)
	}
	if want&hasMass != 0 {
		gatherColumn(r.mass, from.mass, pick)
	}
	if want&hasBirthMass != 0 {
		gatherColumn(r.birthMass, from.birthMass, pick)
	}
	if want&hasMetals != 0 {
		gatherColumn(r.metals, from.metals, pick)
	}
	for _, o := range from.other {
		c := law.Column{Name: o.Name, Values: make([]float64, len(pick))}
		gatherColumn(c.Values, o.Values, pick)
		r.other = append(r.other, c)
	}
}

// gatherKeys gathers what keys the draws.
func (r *rows) gatherKeys(from *rows, pick []int32) {
	for i, j := range pick {
		r.id[i] = from.idOf(int(j))
	}
	if from.gen == nil {
		for i := range r.gen {
			r.gen[i] = from.gen0
		}
	} else {
		gatherColumn(r.gen, from.gen, pick)
	}
}

func gatherColumn[T any](dst, src []T, pick []int32) {
	for i, j := range pick {
		dst[i] = src[j]
	}
}
