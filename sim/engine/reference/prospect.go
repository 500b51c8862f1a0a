package reference

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"

	"wane/sim/law"
	"wane/sim/num"
)

var never = math.Inf(1)

// Cause is why something happened: the process and its word.
type Cause struct{ Process, Outcome string }

// prospect is the first thing in store for an object by itself.
type prospect struct {
	date  float64 // log10 yr
	kind  uint8   // law.NoWord: gone
	mass  float64 // after
	gas   float64
	cause Cause
}

// later is the log10 date a wait after another.
func later(since, wait float64) float64 { return num.Add10(since, wait) }

// foretell is the earliest prospect of an object that is so since a date.
func (g *run) foretell(r row, since float64) (prospect, error) {
	best := prospect{date: never, kind: law.NoWord}
	offer := func(p prospect) {
		if p.date < best.date {
			best = p
		}
	}
	var acting []*law.Use
	for _, u := range g.wearing {
		if r.speaks(u) {
			acting = append(acting, u)
		}
	}
	if len(acting) > 0 {
		p, err := g.wornOut(r, acting, since)
		if err != nil {
			return best, err
		}
		offer(p)
	}
	for _, u := range g.turning {
		if !r.speaks(u) {
			continue
		}
		out, err := g.ask(u, "foretell", r, drawU)
		if err != nil {
			return best, err
		}
		words := len(u.Card.Outcomes)
		o := u.Card.Outcomes[choose(out, 1, words, g.stream(u.Card.Process).Uniform(r.id, r.gen, drawPick))]
		p := prospect{date: later(since, out.Columns[0].Values[0]), kind: law.NoWord, cause: Cause{u.Card.Process, o.Word},
			mass: out.Columns[1+words].Values[0], gas: out.Columns[2+words].Values[0]}
		if o.Becomes != law.Gone {
			p.kind = g.setup.Set.Kind(o.Becomes)
		}
		offer(p)
	}
	return best, nil
}

// thresholdOf is the threshold of a kind on a law's card; ok tells whether it
// has one.
func (g *run) thresholdOf(u *law.Use, kind uint8) (t law.Threshold, mass float64, ok bool) {
	for _, t := range u.Card.Thresholds {
		if g.setup.Set.Kind(t.Kind) == kind {
			return t, u.ThresholdMass(t), true
		}
	}
	return t, 0, false
}

// wornOut is where wearing takes an object: one law by what it foretells,
// several by the integral over the sum of their rates.
func (g *run) wornOut(r row, acting []*law.Use, since float64) (prospect, error) {
	none := prospect{date: never, kind: law.NoWord}
	var next *law.Use
	target, found := 0.0, false
	var t law.Threshold
	for _, u := range acting {
		if th, m, ok := g.thresholdOf(u, r.kind); ok && (!found || m > target) {
			t, target, next, found = th, m, u, true
		}
	}
	if !found {
		return none, nil
	}
	p := prospect{date: since, mass: min(target, r.mass), kind: law.NoWord, cause: Cause{next.Card.Process, t.Outcome}}
	if t.Becomes != law.Gone {
		p.kind = g.setup.Set.Kind(t.Becomes)
	}
	if r.mass <= target {
		return p, nil
	}
	start := make([]float64, len(acting))
	for i, u := range acting {
		s, err := g.start(u, r)
		if err != nil {
			return none, err
		}
		start[i] = max(since, s)
	}
	if len(acting) == 1 && acting[0].Card.Answers("foretell") {
		out, err := g.ask(acting[0], "foretell", r, drawU)
		if err != nil {
			return none, err
		}
		p.date = later(start[0], out.Columns[0].Values[0])
		return p, nil
	}
	date, mass := since, r.mass
	for {
		var now []*law.Use
		change := never
		for i, u := range acting {
			if start[i] <= date {
				now = append(now, u)
			} else {
				change = min(change, start[i])
			}
		}
		wait, err := g.wearTime(r, now, mass, target)
		if err != nil {
			return none, err
		}
		if p.date = later(date, wait); p.date <= change {
			p.cause, err = g.foremost(r, now, t, p.cause, lowEnd(mass, target))
			return p, err
		}
		if mass, err = g.massAfter(r, now, mass, target, num.Sub10(change, date)); err != nil {
			return none, err
		}
		date = change
	}
}

// start is the log10 date from which a law with heat acts: when the sky is
// colder. -Inf for others.
func (g *run) start(u *law.Use, r row) (float64, error) {
	if g.sky == nil || !u.Card.Answers("heat") {
		return -never, nil
	}
	out, err := g.ask(u, "heat", r, drawU)
	if err != nil {
		return 0, err
	}
	return g.sky.LogColderSince(out.Columns[0].Values[0]), nil
}

// foremost is the cause of crossing a threshold under several laws: of those
// with a threshold of that kind which makes the same of the object, the one
// that wears it fastest there.
func (g *run) foremost(r row, acting []*law.Use, crossed law.Threshold, cause Cause, mass float64) (Cause, error) {
	r.mass = mass
	fastest := -never
	for _, u := range acting {
		t, _, ok := g.thresholdOf(u, r.kind)
		if !ok || t.Becomes != crossed.Becomes {
			continue
		}
		out, err := g.ask(u, "wear", r, drawU)
		if err != nil {
			return cause, err
		}
		if l := out.Columns[0].Values[0]; l > fastest {
			fastest, cause = l, Cause{u.Card.Process, t.Outcome}
		}
	}
	return cause, nil
}

// The nodes of the integral, which are part of the model: Gauss-Legendre in ln
// M, twelve to a panel, panels of at most a factor of two, down to 1e-25 of
// the starting mass where the threshold is zero.
const (
	nodes = 12
	dust  = 1e-25
)

func lowEnd(from, to float64) float64 {
	if to > 0 {
		return to
	}
	return from * dust
}

func (g *run) wearTime(r row, acting []*law.Use, from, to float64) (float64, error) {
	if len(acting) == 0 {
		return never, nil
	}
	span := num.Log(from / lowEnd(from, to))
	panels := max(1, int(math.Ceil(span/math.Ln2)))
	x, w := make([]float64, nodes), make([]float64, nodes)
	quad.Legendre{}.FixedLocations(x, w, 0, 1)
	sum := -never
	for p := range panels {
		for k := range nodes {
			width := span / float64(panels)
			r.mass = from * num.Exp(-width*(float64(p)+x[k]))
			rate, err := g.wearRate(r, acting)
			if err != nil {
				return 0, err
			}
			if rate == -never {
				return never, nil
			}
			sum = num.Add10(sum, num.Log10(width*w[k]*r.mass)-rate)
		}
	}
	return sum, nil
}

// wearRate is log10 of what the laws take from an object, solMass per yr.
func (g *run) wearRate(r row, acting []*law.Use) (float64, error) {
	rate := -never
	for _, u := range acting {
		out, err := g.ask(u, "wear", r, drawU)
		if err != nil {
			return 0, err
		}
		rate = num.Add10(rate, out.Columns[0].Values[0])
	}
	return rate, nil
}

// massAfter is the mass left after 10^wait yr, between to and from.
func (g *run) massAfter(r row, acting []*law.Use, from, to, wait float64) (float64, error) {
	if len(acting) == 0 || math.IsInf(wait, -1) {
		return from, nil
	}
	low, high := num.Log(lowEnd(from, to)), num.Log(from)
	for range 60 {
		mid := (low + high) / 2
		t, err := g.wearTime(r, acting, from, num.Exp(mid))
		if err != nil {
			return 0, err
		}
		if t > wait {
			low = mid
		} else {
			high = mid
		}
	}
	return num.Exp(high), nil
}
