package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/stars"
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
	guess       []float64 // of the log10 age of the crossing; never: none
	slope       []float64 // of the excess there; 0: unknown
	probes      []probe
	ages, tops  []float64
}

func (w *Workspace) newFeeler(x *galaxy.Warmth, stays []stay) (*feeler, error) {
	f := &w.feel
	f.w, f.x, f.stays, f.bare = w, x, stays, false
	n := len(stays)
	f.resize(n)
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
	from := -never
	if w.sky != nil && x.Unit != "floor" {
		from = w.sky.LogColderSince(least - skyUnfelt)
	}
	for j, s := range stays {
		f.dark[j] = x.Unit != "floor" && s.enter >= from
	}
	return f, nil
}

// resize readies the feeler's memory, which it keeps, for n stays.
func (f *feeler) resize(n int) {
	if f.all == nil {
		f.all, f.part = newRows(n), newRows(n)
	}
	f.all.resize(n)
	for _, x := range []*[]float64{&f.steady, &f.goal, &f.cross, &f.low, &f.high, &f.glow, &f.ghigh, &f.guess, &f.slope} {
		*x = grown(*x, n)
	}
	f.dark, f.warm, f.probes = grown(f.dark, n), grown(f.warm, n), grown(f.probes, n)
	clear(f.steady)
	clear(f.warm)
	fill(f.cross, never)
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
