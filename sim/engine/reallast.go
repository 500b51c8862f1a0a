package engine

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/orderstat"
)

// realLasts estimates, in a sample, when the last of the real number goes, for
// each population whose last member was taken by something that was settled
// when it was founded: a star by the end of its life, what wears away by
// reaching its threshold. The rest stay NaN.
//
// The date of such an end is birth + life + wait, a function of four uniforms
// that are drawn independently: those of birth, of mass, of the kind of remnant
// and of its size. The laws themselves are asked on a grid of these (see
// lot.go) how many of the real N have not come to theirs by t, and the median
// of the last date is where
//
//	sum over kinds of  q N P(birth + life + wait > t) = ln 2
//
// Assumed:
//   - q, the share of a kind that comes to that end in that population rather
//     than being hit by a clock before, is as in the sample, and the same for
//     all masses of a kind (among the last few it may differ; where the date has
//     an edge, as lives and waits have, that hardly moves it);
//   - members are independent of each other, given q;
//   - every object has the metals of the sample;
//   - a birth that is 17 decades before the end does not count.
//
// NaN where the last was taken by a clock, by the end of the galaxy, of the run
// or of the sky; where a law draws the wait itself, several laws wear one kind,
// or a law does not answer at the edge; where objects meet, but for stars as they
// were founded, since what merges has no such date; for populations with a
// condition on warmth; where the last might be of a kind of which the sample
// holds none that came to its end, or follows from a change (a relic); and where
// no member of the real number is to be expected.
//
// No draw is used, and nothing else in the outcome hangs on it.
//
// Sources: [Gumbel1958], section 5.2; [DavidNagaraja2003].
func (w *Workspace) realLasts(o *Outcome) {
	if !(w.m.Weight > 1) {
		return
	}
	var seen ways
	for p := range o.Populations {
		out := &o.Populations[p]
		if w.m.populations[p].Warmth != nil || out.Peak == 0 || out.CutLast || !w.m.settled(w.counts.lastWhy[p]) ||
			w.m.encounter != nil && !w.m.populations[p].foundedStars() {
			continue
		}
		if w.reach == nil {
			w.reach = w.ask.newReach(w.c.metal)
		}
		if !w.reach.ok || w.c.metals != nil {
			return
		}
		switch {
		case w.m.encounter != nil:
			seen = w.waysOfStars(p)
		case seen.total == nil:
			seen = w.waysOfEnding()
		}
		if t := w.realLast(&w.m.populations[p], &seen, orderstat.Target(0.5)); t <= o.End {
			out.RealLast = t
		}
	}
}

// settled tells whether a cause strikes at a date that was settled when the
// object was founded.
func (m *Model) settled(cause uint8) bool {
	if m.isBecoming(cause) {
		return true
	}
	for _, row := range m.thresholds {
		for _, t := range row {
			if t.applies && t.cause == cause {
				return true
			}
		}
	}
	return false
}

// isBecoming tells whether a cause is that of a star becoming its remnant.
func (m *Model) isBecoming(cause uint8) bool {
	for _, u := range m.ends {
		for _, word := range wordsOf(u, "die") {
			if m.Causes[cause] == (Cause{u.Card.Process, becameWord + word}) {
				return true
			}
		}
	}
	return false
}

// ways counts how the lives of a sample ended: by place at the end and by kind.
// The kind of a star is that of a star; other kinds are those of the last stage
// that was settled at founding.
type ways struct {
	total []int64    // by kind, however they ended
	ended [2][]int64 // of them, at their settled end: in the galaxy, adrift
	links float64    // log10 date of the last end of what follows from a change
	made  [256]bool  // by kind: a turning law made some
}

func (w *Workspace) waysOfEnding() ways {
	c, kinds := &w.c, len(w.m.Set.Kinds)
	x := ways{total: make([]int64, kinds), links: -never}
	for place := range x.ended {
		x.ended[place] = make([]int64, kinds)
	}
	for i, kind := range c.kind0[:c.n] {
		leave, adrift := c.leave[i], c.place[i] == law.Adrift
		if leave < 0 {
			leave = math.MaxFloat64 // after all that is told in years
		}
		if kind == law.Star {
			x.total[law.Star]++
			switch {
			case c.death[i] == never:
			case !(leave < c.death[i]):
				x.ended[0][law.Star]++
			case adrift && c.leave[i] >= c.birth[i]:
				x.ended[1][law.Star]++
			}
		}
		if kind == law.Star && c.died[i] == 0 {
			continue
		}
		k := c.kind1[i]
		x.total[k]++
		switch {
		case c.end[i] == never:
		case leave == never:
			x.ended[0][k]++
		case adrift:
			x.ended[1][k]++
		}
	}
	for i, links := range c.chain {
		cause := c.ended[i]
		for _, l := range links {
			if l.end < never {
				x.links = max(x.links, l.end)
			}
			x.made[l.kind] = x.made[l.kind] || w.books.turns[cause]
			cause = l.ended
		}
	}
	return x
}

// foundedStars tells whether a population is one of stars as they were founded,
// and of nothing else.
func (p *population) foundedStars() bool {
	for s, in := range p.in {
		if in && (state(s).kind() != law.Star || state(s)%2 != law.Founded) {
			return false
		}
	}
	return true
}

// waysOfStars is waysOfEnding for a population of founded stars: those that
// have met others are not in the columns any more, but they were counted.
func (w *Workspace) waysOfStars(p int) ways {
	kinds := len(w.m.Set.Kinds)
	x := ways{total: make([]int64, kinds), links: -never}
	for place := range x.ended {
		x.ended[place] = make([]int64, kinds)
	}
	x.total[law.Star] = int64(w.counts.entered[p])
	for cause, count := range w.counts.left[p] {
		if count > 0 && w.m.isBecoming(uint8(cause)) {
			x.ended[0][law.Star] += count
		}
	}
	return x
}

// part is a lot, thinned.
type part struct {
	*lot
	share float64
}

// realLast is the log10 date at which as many members of a population are
// expected as target says; NaN where it can't be told.
func (w *Workspace) realLast(p *population, seen *ways, target float64) float64 {
	var parts []part
	doubt, linked := -never, false
	for kind := range uint8(len(w.m.Set.Kinds)) {
		l := &w.reach.lots[kind]
		ended, exits := int64(0), false
		for place := range uint8(2) {
			how := w.leavesBy(p, kind, place)
			linked = linked || seen.made[kind] && how != notIn
			switch how {
			case byItsEnd:
				exits = true
				ended += seen.ended[place][kind]
			case after:
				linked = linked || kind != law.Star
				doubt = max(doubt, l.latest)
			case byALink:
				linked = true
			}
		}
		switch {
		case !exits || !(l.expected > target):
		case l.untold || ended == 0:
			doubt = max(doubt, l.latest)
		default:
			parts = append(parts, part{l, float64(ended) / float64(seen.total[kind])})
		}
	}
	low, high := never, -never
	for _, x := range parts {
		low, high = min(low, x.earliest), max(high, x.latest)
	}
	t, err := orderstat.LastDate(func(t float64) float64 {
		sum := 0.0
		for _, x := range parts {
			sum += x.share * x.lot.left(t)
		}
		return sum
	}, num.Exp(-target), low, high)
	if err != nil || !(doubt < t) || linked && !(seen.links < t-clearly) {
		return math.NaN()
	}
	for _, x := range parts {
		if w.sky != nil && x.coldest < never && !(w.sky.LogColderSince(x.coldest) < t-unseen) {
			return math.NaN() // when it begins to wear would count
		}
	}
	return t
}

// clearly: what ends by so many decades before a date does not bear on it.
const clearly = 0.3

// leaving is how an object of a kind leaves a population for good.
type leaving uint8

const (
	notIn    leaving = iota // it is none of its members
	byItsEnd                // when the end comes that was settled at founding
	after                   // by what follows that end
	byALink                 // it is what follows such an end
)

func (w *Workspace) leavesBy(p *population, kind, place uint8) leaving {
	in := func(kind uint8) bool { return kind != law.NoWord && p.in[stateOf(kind, place, law.Founded)] }
	if !in(kind) {
		return notIn
	}
	if kind == law.Star {
		for k := range uint8(len(w.m.Set.Kinds)) {
			if k != law.Star && in(k) && w.reach.lots[k].expected > 0 {
				return after
			}
		}
		return byItsEnd
	}
	how := notIn // it never ends
	for _, row := range w.m.thresholds {
		for k, t := range row {
			switch {
			case !t.applies:
			case t.kind == kind:
				return byALink
			case uint8(k) != kind:
			case in(t.kind):
				how = after
			default:
				how = byItsEnd
			}
		}
	}
	return how
}
