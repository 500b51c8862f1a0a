package reference

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/stars"
)

// warm lists when an object enters and leaves a population with a condition on
// warmth. Nothing cools within a year of becoming what it is, nor is cooling
// followed beyond 10^10000 yr.
func (g *run) warm(o *object, x *galaxy.Warmth, in func(span) bool, end float64) (entries []float64, exits []exit, err error) {
	open := false
	for i, s := range o.spans {
		if s.from > end || !in(s) {
			continue
		}
		leave := s.to
		if leave > end {
			leave = never
		}
		same := func(j int) bool { // the neighbouring span is of the same object unchanged but for its place
			return j >= 0 && j < len(o.spans) && o.spans[j].kind == s.kind && o.spans[j].life == s.life && in(o.spans[j]) &&
				o.spans[j].from <= end
		}
		if !same(i - 1) {
			open = false
		}
		from, to, cause, err := g.member(x, o, s, leave, end)
		if err != nil {
			return nil, nil, err
		}
		if !(from < to) || from > end {
			if open {
				exits = append(exits, exit{s.from, g.cooled(s.kind)})
			}
			open = false
			continue
		}
		if !open {
			entries = append(entries, from)
		}
		open = to == leave && leave < never && same(i+1)
		if !open && to <= end && to < never {
			exits = append(exits, exit{to, cause})
		}
	}
	return entries, exits, nil
}

// member is the part of a span through which an object is on the right side of
// a threshold.
func (g *run) member(x *galaxy.Warmth, o *object, s span, leave, end float64) (from, to float64, cause Cause, err error) {
	w, err := g.warmed(x, o, s)
	if err != nil {
		return 0, 0, cause, err
	}
	low := max(num.Sub10(s.from, s.entered), 0)
	warmAt := func(age float64) (bool, error) {
		e, err := w.excess(age)
		return e > 0, err
	}
	warm, err := warmAt(low)
	if err != nil {
		return 0, 0, cause, err
	}
	cross := never
	if high := max(num.Sub10(min(leave, end, 1e4), s.entered), low); warm {
		still, err := warmAt(high)
		if err != nil {
			return 0, 0, cause, err
		}
		if !still {
			for high-low > 1e-12 {
				mid := (low + high) / 2
				if still, err = warmAt(mid); err != nil {
					return 0, 0, cause, err
				}
				if still {
					low = mid
				} else {
					high = mid
				}
			}
			cross = min(max(later(s.entered, high), s.from), leave)
		}
	}
	from, to, cause = s.from, leave, s.cause
	switch {
	case x.Above && !warm:
		from = never
	case x.Above && cross < to:
		to, cause = cross, g.cooled(s.kind)
	case !x.Above && warm:
		from = cross
	}
	return from, to, cause, nil
}

func (g *run) cooled(kind uint8) Cause {
	for _, u := range g.cools {
		if u.Speaks(kind, 1, 0.02) {
			return Cause{u.Card.Process, "cooled"}
		}
	}
	return Cause{"warmth", "cooled"}
}

// thermometer tells how far an object is above a threshold.
type thermometer struct {
	g      *run
	x      *galaxy.Warmth
	r      row
	s      span
	steady float64 // fourth power of the temperature that warmth and wearing keep up
}

func (g *run) warmed(x *galaxy.Warmth, o *object, s span) (*thermometer, error) {
	w := &thermometer{g: g, x: x, s: s, r: row{id: o.id, kind: s.kind, comp: s.s.comp, place: s.place, origin: s.origin,
		mass: s.s.entry, birthMass: s.s.entry, metals: o.metals}}
	radius := radiusOf(s.kind, w.r.mass) * 1e3
	add := func(watts float64) {
		w.steady += watts / (4 * math.Pi * radius * radius * constant.StefanBoltzmann)
	}
	if g.warmth != nil && w.r.speaks(g.warmth) {
		out, err := g.ask(g.warmth, "warm", w.r, drawU)
		if err != nil {
			return nil, err
		}
		add(out.Columns[0].Values[0])
	}
	for _, u := range g.wearing {
		if !w.r.speaks(u) {
			continue
		}
		out, err := g.ask(u, "wear", w.r, drawU)
		if err != nil {
			return nil, err
		}
		add(out.Columns[1].Values[0] * num.Exp10(out.Columns[0].Values[0]) * constant.Sun * constant.C * constant.C / constant.Year)
	}
	return w, nil
}

// excess is log10 of temperature over threshold at a log10 age.
func (w *thermometer) excess(age float64) (float64, error) {
	own := -never
	if w.s.kind == law.Star {
		own = num.Log10(stars.Temperature(w.r.mass))
	}
	r := w.r
	r.other = map[string]float64{"log10_age": age}
	for _, u := range w.g.cools {
		if r.speaks(u) {
			out, err := w.g.ask(u, "shine", r, drawU)
			if err != nil {
				return 0, err
			}
			own = out.Columns[0].Values[0]
		}
	}
	floor4 := w.steady
	if w.g.sky != nil {
		floor4 += num.Exp10(4 * w.g.sky.LogTemperature(later(w.s.entered, age)))
	}
	t := num.Add10(4*own, num.Log10(floor4)) / 4
	switch {
	case w.x.Unit == "floor":
		return t - num.Log10(w.x.Value) - num.Log10(floor4)/4, nil
	case w.x.Quantity == "luminosity":
		radius := radiusOf(w.s.kind, w.r.mass) * 1e3
		return t - num.Log10(w.x.Value*constant.SunL/(4*math.Pi*radius*radius*constant.StefanBoltzmann))/4, nil
	}
	return t - num.Log10(w.x.Value), nil
}
