package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/stars"
)

// stay is one object in one state of a population with a condition on warmth.
type stay struct {
	i             uint32
	stage         int
	state         state
	entered       float64 // log10 date at which its kind began, from which its age counts
	enter, leave  float64 // log10 dates of the stay
	cause         uint8   // of leaving
	follows, goes bool    // the stay before, or after, is of the same object without a gap
	mass          float64 // with which its kind began
	comp          uint8
}

// tallyWarm counts the populations with a condition on warmth.
func (w *Workspace) tallyWarm(end float64) error {
	for p, pop := range w.m.populations {
		if pop.Warmth == nil {
			continue
		}
		if err := w.tallyOne(p, &w.m.populations[p], end); err != nil {
			return err
		}
	}
	return nil
}

func (w *Workspace) tallyOne(p int, pop *population, end float64) error {
	stays := w.stays(pop, end)
	for first, last := 0, 0; first < len(stays); first = last {
		last = min(first+chunk, len(stays))
		for last < len(stays) && stays[last].follows {
			last++ // the stays of one object are looked at together
		}
		part := stays[first:last]
		cross, warmAtStart, err := w.crossings(pop.Warmth, part, end)
		if err != nil {
			return err
		}
		w.enterWarm(p, pop.Warmth, part, cross, warmAtStart, end)
	}
	return nil
}

// enterWarm turns crossings into entries and exits. Above: a member from the
// start of a stay, if it is warm then, to the crossing or the end of the stay.
// Below: from the crossing, or the start if it is cold then, to the end.
func (w *Workspace) enterWarm(p int, x *galaxy.Warmth, stays []stay, cross []float64, warm []bool, end float64) {
	n := &w.counts
	open := false
	for j, s := range stays {
		if !s.follows {
			open = false
		}
		from, to, cause := s.enter, s.leave, s.cause
		if x.Above {
			if !warm[j] {
				from = never
			}
			if cross[j] < to {
				to, cause = cross[j], w.m.coolCause(s.state.kind())
			}
		} else if warm[j] {
			from = cross[j]
		}
		if !(from < to) || from > end {
			if open {
				n.exit(p, s.enter, w.m.coolCause(s.state.kind()))
			}
			open = false
			continue
		}
		if !open {
			n.give(p, from)
		}
		open = s.goes && to == s.leave
		if !open && to <= end && to < never {
			n.exit(p, to, cause)
		}
	}
}

// coolCause is the cause cooledWord of a kind.
func (m *Model) coolCause(kind uint8) uint8 {
	for _, u := range m.cooling {
		if u.Speaks(kind, 1, 0.02) {
			return m.causeOf[Cause{u.Card.Process, cooledWord}]
		}
	}
	return m.causeOf[Cause{"warmth", cooledWord}]
}

// stays lists the stays of all objects in the states of a population.
func (w *Workspace) stays(pop *population, end float64) []stay {
	c := &w.c
	out := w.stayed[:0]
	for _, s := range w.meets.stays { // of lives that a meeting ended
		if pop.in[s.state] {
			out = append(out, s)
		}
	}
	for first := 0; first < c.n; first += chunk {
		size := min(chunk, c.n-first)
		w.logChunk(first, size)
		for k := range size {
			i := uint32(first + k)
			if c.kind0[i] == law.NoWord || !pop.couldHold(c, i) {
				continue
			}
			out = w.staysOf(out, pop, i, [3]float64{w.counts.logs[0][k], w.counts.logs[1][k], w.counts.logs[2][k]}, end)
		}
	}
	w.stayed = out
	return out
}

// couldHold is a quick look whether an object is ever of the population's kinds.
func (p *population) couldHold(c *columns, i uint32) bool {
	for _, kind := range [2]uint8{c.kind0[i], c.kind1[i]} {
		for place := range uint8(3) {
			for origin := range uint8(2) {
				if p.in[stateOf(kind, place, origin)] {
					return true
				}
			}
		}
	}
	_, linked := c.chain[i]
	return linked
}

func (w *Workspace) staysOf(out []stay, pop *population, i uint32, dates [3]float64, end float64) []stay {
	stage, began := 1, dates[0]
	if w.c.died[i] == 0 {
		stage = 2
	}
	last := -1
	enter := func(s state, date float64, follows bool) {
		mass, comp := w.atEntry(i, stage)
		out = append(out, stay{i: i, stage: stage, state: s, entered: began, enter: date, leave: never, follows: follows, mass: mass, comp: comp})
		last = len(out) - 1
	}
	if c := &w.c; c.continued[i] {
		// It has been there since the meeting, which is in the journal.
		if s := stateOf(c.kind0[i], law.Bound, w.originOf(i)); pop.in[s] {
			enter(s, dates[0], false)
		}
	}
	w.each(i, dates, end, func(date float64, from, to state, cause uint8) {
		if last >= 0 {
			out[last].leave, out[last].cause = date, cause
		}
		changed := from != stateGone && to != stateGone && from.kind() == to.kind()
		if from != stateGone && to != stateGone && from.kind() != to.kind() {
			stage++
			began = date
		}
		if to != stateGone && pop.in[to] {
			follows := last >= 0 && changed
			if follows {
				out[last].goes = true
			}
			enter(to, date, follows)
			return
		}
		last = -1
	})
	return out
}

// atEntry is the mass with which object i entered a stage, and what it is made
// of.
func (w *Workspace) atEntry(i uint32, stage int) (mass float64, comp uint8) {
	c := &w.c
	switch {
	case stage == 1:
		mass, comp = c.mass0[i], law.Hydrogen
	case stage == 2:
		mass, comp = c.mass1[i], c.comp1[i]
	default:
		l := c.chain[i][stage-3]
		mass, comp = l.mass, l.comp
	}
	for _, x := range w.wear.worn[i] {
		if x.stage >= stage {
			mass += x.mass
		}
	}
	return mass, comp
}

// crossings finds, for each stay, the log10 date at which the object falls
// below the threshold (+Inf: not within the stay), and whether it is above at
// the start.
func (w *Workspace) crossings(x *galaxy.Warmth, stays []stay, end float64) ([]float64, []bool, error) {
	n := len(stays)
	f, err := w.newFeeler(x, stays)
	if err != nil {
		return nil, nil, err
	}
	f.cross, f.warm = make([]float64, n), make([]bool, n)
	f.low, f.high = make([]float64, n), make([]float64, n)
	f.glow, f.ghigh = make([]float64, n), make([]float64, n)
	fill(f.cross, never)
	// What has fallen below in one stay is still below in the next, unless
	// something keeps it warmer there.
	var first, next []int32
	for j, s := range stays {
		if s.follows {
			next = append(next, int32(j))
		} else {
			first = append(first, int32(j))
		}
	}
	if err := f.solve(first, end); err != nil {
		return nil, nil, err
	}
	open := next[:0]
	for _, j := range next {
		if f.warm[j-1] && f.cross[j-1] >= stays[j-1].leave || f.steady[j] > f.steady[j-1] {
			open = append(open, j)
		}
	}
	return f.cross, f.warm, f.solve(open, end)
}

// solve finds the crossings of the chosen stays.
func (f *feeler) solve(which []int32, end float64) error {
	if len(which) == 0 {
		return nil
	}
	ages := make([]float64, len(which))
	for k, j := range which {
		s := &f.stays[j]
		f.low[j] = youngest
		if s.enter > s.entered {
			f.low[j] = max(num.Sub10(s.enter, s.entered), youngest)
		}
		ages[k] = f.low[j]
	}
	g, err := f.excess(ages, which)
	if err != nil {
		return err
	}
	var open []int32
	for k, j := range which {
		f.glow[j] = g[k]
		if f.warm[j] = g[k] > 0; f.warm[j] {
			open = append(open, j)
		}
	}
	if open, err = f.bracket(open, end); err != nil {
		return err
	}
	if err := f.roots(open); err != nil {
		return err
	}
	for _, j := range open {
		s := &f.stays[j]
		f.cross[j] = min(max(later(s.entered, f.high[j]), s.enter), s.leave)
	}
	return nil
}

// bracket brings a crossing between low and high: by the guess of the nodes
// first, by the end of the stay where that fails. It returns the stays that
// have one.
func (f *feeler) bracket(open []int32, end float64) ([]int32, error) {
	if len(open) == 0 {
		return nil, nil
	}
	last := func(s *stay) float64 {
		l := min(s.leave, end, forever)
		if s.entered > l-unseen {
			l = num.Sub10(l, s.entered)
		}
		return l
	}
	guess, err := f.guesses(open)
	if err != nil {
		return nil, err
	}
	tops := make([]float64, len(open))
	for k, j := range open {
		tops[k] = max(last(&f.stays[j]), f.low[j])
		if guess != nil && guess[k]+nodeMargin < tops[k] {
			tops[k] = max(guess[k]+nodeMargin, f.low[j])
		}
	}
	g, err := f.excess(tops, open)
	if err != nil {
		return nil, err
	}
	var have, missed []int32
	for k, j := range open {
		switch {
		case g[k] <= 0:
			f.high[j], f.ghigh[j] = tops[k], g[k]
			have = append(have, j)
		default:
			if f.low[j] < tops[k] {
				f.low[j], f.glow[j] = tops[k], g[k]
			}
			missed = append(missed, j)
		}
	}
	if err := f.raise(have, guess, open); err != nil {
		return nil, err
	}
	if guess == nil || len(missed) == 0 {
		return have, nil
	}
	tops = tops[:0]
	for _, j := range missed {
		tops = append(tops, max(last(&f.stays[j]), f.low[j]))
	}
	if g, err = f.excess(tops, missed); err != nil {
		return nil, err
	}
	for k, j := range missed {
		if g[k] <= 0 {
			f.high[j], f.ghigh[j] = tops[k], g[k]
			have = append(have, j)
		}
	}
	return have, nil
}

// raise moves the lower ends of brackets up to just below the guess.
func (f *feeler) raise(have []int32, guess []float64, open []int32) error {
	if guess == nil {
		return nil
	}
	var which []int32
	var ages []float64
	k := 0
	for _, j := range have {
		for open[k] != j {
			k++
		}
		if g := guess[k] - nodeMargin; g > f.low[j] && g < f.high[j] {
			which, ages = append(which, j), append(ages, g)
		}
	}
	if len(which) == 0 {
		return nil
	}
	g, err := f.excess(ages, which)
	if err != nil {
		return err
	}
	for k, j := range which {
		if g[k] > 0 {
			f.low[j], f.glow[j] = ages[k], g[k]
		} else {
			f.high[j], f.ghigh[j] = ages[k], g[k]
		}
	}
	return nil
}

const (
	youngest = 0.0   // log10 yr: nothing cools within a year of its birth
	forever  = 1e4   // log10 yr: as far as cooling is followed
	coolTol  = 1e-10 // of log10 age
)

// feeler computes how far objects are above a threshold at an age.
type feeler struct {
	w      *Workspace
	x      *galaxy.Warmth
	stays  []stay
	all    *rows
	steady []float64 // fourth power of the temperature that warmth and wearing keep up
	goal   []float64 // log10 K; for a floor: log10 of the multiple
	part   *rows
	age    []float64
	g      []float64
	bare   bool   // solving nodes
	dark   []bool // the sky is too cold to be felt at the threshold

	cross       []float64
	warm        []bool
	low, high   []float64 // log10 ages of the bracket
	glow, ghigh []float64
}

func (w *Workspace) newFeeler(x *galaxy.Warmth, stays []stay) (*feeler, error) {
	f := &feeler{w: w, x: x, stays: stays, all: newRows(len(stays)), part: newRows(len(stays))}
	n := len(stays)
	f.all.resize(n)
	f.steady, f.goal = make([]float64, n), make([]float64, n)
	for j, s := range stays {
		i := s.i
		f.all.id[j], f.all.gen[j] = i, 0
		f.all.kind[j], f.all.place[j], f.all.origin[j] = s.state.kind(), uint8(s.state)%statesAKind/2, uint8(s.state)%2
		f.all.metals[j] = w.c.metalsOf(int(i))
		f.all.mass[j], f.all.comp[j], f.all.birthMass[j] = s.mass, s.comp, s.mass
	}
	if err := f.heats(); err != nil {
		return nil, err
	}
	least := never
	for j := range n {
		f.goal[j] = f.goalOf(f.all.kind[j], f.all.mass[j])
		least = min(least, f.goal[j])
	}
	f.dark = make([]bool, n)
	from := -never
	if w.sky != nil && x.Unit != "floor" {
		from = w.sky.LogColderSince(least - skyUnfelt)
	}
	for j, s := range stays {
		f.dark[j] = x.Unit != "floor" && s.enter >= from
	}
	return f, nil
}

// goalOf is log10 of the temperature an object must be above, in K; for a
// floor, of the multiple.
func (f *feeler) goalOf(kind uint8, mass float64) float64 {
	if f.x.Quantity == "luminosity" && f.x.Unit != "floor" {
		r := radiusOf(kind, mass) * 1e3
		return 0.25 * num.Log10(f.x.Value*constant.SunL/(4*math.Pi*r*r*constant.StefanBoltzmann))
	}
	return num.Log10(f.x.Value)
}

// skyUnfelt: a sky colder than the threshold by this many decades adds less
// than 1e-10 of the power.
const skyUnfelt = 2.5

// heats sums what keeps each object warm from within and without, but the sky.
func (f *feeler) heats() error {
	w, r := f.w, f.all
	add := func(j int, watts float64) {
		radius := radiusOf(r.kind[j], r.mass[j]) * 1e3
		f.steady[j] += watts / (4 * math.Pi * radius * radius * constant.StefanBoltzmann)
	}
	if w.m.warm != nil {
		s, pick := w.ask.spoken(w.m.warm, r)
		if s.n > 0 {
			out, err := w.ask.ask(w.m.warm, "warm", s, drawU)
			if err != nil {
				return err
			}
			for i, p := range out.Columns[0].Values {
				add(at(pick, i), p)
			}
		}
	}
	for _, u := range w.m.wearing {
		s, pick := w.ask.spoken(u, r)
		if s.n == 0 {
			continue
		}
		out, err := w.ask.ask(u, "wear", s, drawU)
		if err != nil {
			return err
		}
		for i, l := range out.Columns[0].Values {
			share := out.Columns[1].Values[i]
			if share > 0 && l > math.Inf(-1) {
				// solMass per yr to W
				add(at(pick, i), share*num.Exp10(l)*constant.Sun*constant.C*constant.C/constant.Year)
			}
		}
	}
	return nil
}

// excess is log10 of temperature over threshold at log10 ages, for all stays
// (which nil, ages by stay) or for the chosen ones (ages by position).
func (f *feeler) excess(age []float64, which []int32) ([]float64, error) {
	r := f.all
	if which != nil {
		r = f.part
		r.resize(len(which))
		for k, j := range which {
			r.copyRow(k, f.all, int(j))
		}
	}
	f.age, f.g = grown(f.age, r.n), grown(f.g, r.n)
	copy(f.age, age)
	if err := f.cool(r); err != nil {
		return nil, err
	}
	for k := range r.n {
		j := k
		if which != nil {
			j = int(which[k])
		}
		floor4 := f.steady[j]
		if f.w.sky != nil && !f.dark[j] {
			floor4 += num.Exp10(4 * f.w.sky.LogTemperature(later(f.stays[j].entered, f.age[k])))
		}
		goal := f.goal[j]
		if f.x.Unit == "floor" {
			goal += 0.25 * num.Log10(floor4)
		}
		own := f.g[k]
		if floor4 > 0 && num.Exp10(4*min(own, 70)) < 1e12*floor4 {
			own = 0.25 * num.Log10(num.Exp10(4*own)+floor4)
		}
		f.g[k] = own - goal
	}
	return f.g, nil
}

// cool sets f.g to the log10 temperature without any floor.
func (f *feeler) cool(r *rows) error {
	for k := range r.n {
		f.g[k] = math.Inf(-1)
		if r.kind[k] == law.Star {
			f.g[k] = num.Log10(stars.Temperature(r.mass[k]))
		}
	}
	r.other = append(r.other[:0], law.Numbers("log10_age", f.age[:r.n]))
	for _, u := range f.w.m.cooling {
		s, pick := f.w.ask.spoken(u, r)
		if s.n == 0 {
			continue
		}
		out, err := f.w.ask.ask(u, "shine", s, drawU)
		if err != nil {
			return err
		}
		for i, t := range out.Columns[0].Values {
			f.g[at(pick, i)] = t
		}
	}
	return nil
}

// roots narrows the brackets [low, high] (log10 ages) to the crossing by the
// Illinois variant of regula falsi, all stays side by side, with a bisection
// where that is slow. The answer is in high.
func (f *feeler) roots(open []int32) error {
	open = append([]int32(nil), open...)
	low, high, glow, ghigh := f.low, f.high, f.glow, f.ghigh
	side := make([]int8, len(low))
	ages := make([]float64, len(open))
	for try := 0; len(open) > 0 && try < 200; try++ {
		for k, j := range open {
			x := (low[j]*ghigh[j] - high[j]*glow[j]) / (ghigh[j] - glow[j])
			if try%4 == 3 || !(x > low[j] && x < high[j]) {
				x = 0.5 * (low[j] + high[j])
			}
			ages[k] = x
		}
		g, err := f.excess(ages[:len(open)], open)
		if err != nil {
			return err
		}
		still := open[:0]
		for k, j := range open {
			// How far the zero can be from here, by the slope of the bracket.
			off := math.Abs(g[k]) * (high[j] - low[j]) / (glow[j] - ghigh[j])
			if g[k] > 0 {
				low[j], glow[j] = ages[k], g[k]
				if side[j] == 1 {
					ghigh[j] *= 0.5
				}
				side[j] = 1
			} else {
				high[j], ghigh[j] = ages[k], g[k]
				if side[j] == -1 {
					glow[j] *= 0.5
				}
				side[j] = -1
			}
			if off < coolTol || high[j]-low[j] < coolTol {
				high[j] = ages[k]
				continue
			}
			still = append(still, j)
		}
		open = still
	}
	return nil
}
