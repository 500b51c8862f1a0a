package engine

import (
	"bytes"
	"slices"

	"wane/sim/draw"
	"wane/sim/law"
)

// chunk is how many rows are asked at a time: few enough for their columns to
// stay in the processor's cache. No answer depends on it.
const chunk = 4096

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
	hasAll = 1<<iota - 1
)

var columnBits = map[string]columnSet{"kind": hasKind, "composition": hasComposition, "place": hasPlace, "origin": hasOrigin,
	"mass": hasMass, "birth_mass": hasBirthMass, "metals": hasMetals, "radius": hasKind | hasMass}

// reads is the set of object columns that any question of a law reads; kind
// and mass are always among them, for the engine's own use.
func reads(u *law.Use) columnSet {
	set := hasKind | hasMass
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

func gatherColumn[T any](dst, src []T, pick []int32) {
	for i, j := range pick {
		dst[i] = src[j]
	}
}

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
	nodes              rows
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
	n := min(chunk, m.Objects)
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

// spoken returns the rows of r that use speaks for: r itself when it speaks
// for all, else a gathered copy, with the row numbers in pick. Both are good
// until the next call.
func (a *asker) spoken(use *law.Use, r *rows) (s *rows, pick []int32) {
	v := a.m.voices[use]
	whole, none := true, true
	if kind, one := oneKind(r.kind[:r.n]); one {
		whole, none = v.all[kind], !v.some[kind]
	} else {
		for _, k := range r.kind[:r.n] {
			whole = whole && v.all[k]
			none = none && !v.some[k]
		}
	}
	if whole {
		return r, nil
	}
	a.pick = a.pick[:0]
	if !none {
		for i, k := range r.kind[:r.n] {
			if v.all[k] || v.some[k] && use.Speaks(k, r.mass[i], r.metals[i]) {
				a.pick = append(a.pick, int32(i))
			}
		}
	}
	if len(a.pick) == r.n && r.n > 0 {
		return r, nil
	}
	a.sub.gather(r, a.pick, v.reads)
	return a.sub, a.pick
}

// oneKind tells whether all are of one kind, and which.
func oneKind(kinds []uint8) (kind uint8, one bool) {
	if len(kinds) == 0 {
		return 0, true
	}
	return kinds[0], bytes.Count(kinds, kinds[:1]) == len(kinds)
}

// voice is for which kinds a law speaks, for some or all objects of a kind,
// and which columns it reads.
type voice struct {
	some, all [256]bool
	reads     columnSet
	draws     bool // it reads a draw of the object
}

func (m *Model) compileVoices() {
	m.voices = map[*law.Use]*voice{}
	for _, u := range m.Set.All() {
		v := &voice{reads: reads(u)}
		for _, q := range u.Card.Questions {
			if slices.Contains(q.Inputs, "u") || slices.Contains(q.Inputs, "e") {
				v.draws = true
			}
		}
		switch p, _ := law.ProcessNamed(u.Card.Process); p.Role {
		case law.Turning:
			m.stagesDraw = true
		case law.Wearing, law.Dynamics, law.Encounter:
			m.stagesDraw = m.stagesDraw || v.draws
		}
		for k := range m.Set.Kinds {
			v.some[k], v.all[k] = u.SpeaksForKind(uint8(k))
		}
		m.voices[u] = v
	}
}

// at returns the row of r that row i of the spoken rows stands for.
func at(pick []int32, i int) int {
	if pick == nil {
		return i
	}
	return int(pick[i])
}
