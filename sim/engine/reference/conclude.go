package reference

import (
	"math"
	"slices"

	"wane/sim/engine"
	"wane/sim/galaxy"
	"wane/sim/law"
)

// conclude ends the realisation: what is still to come, books, populations.
func (g *run) conclude() (*Result, error) {
	res := &Result{}
	res.End, res.StoppedAt, res.Fired = g.setup.Until, g.stoppedAt, g.fired
	if res.End < never {
		res.EndCause = "until"
	}
	if g.sky != nil {
		if end, cause := g.sky.End(); end < res.End {
			res.End, res.EndCause = end, cause
		}
	}
	if g.hole.mass > 0 {
		if err := g.hole.foretell(g); err != nil {
			return nil, err
		}
		if g.hole.end.date <= res.End && g.hole.end.date < never {
			g.hole.finish(g)
		}
	}
	var bound, adrift float64
	for _, o := range g.objects {
		for !o.gone && o.place == law.Bound && o.at >= 0 && o.now().end <= res.End && o.now().end < never {
			g.finishStage(o)
		}
		switch {
		case o.place == law.Adrift && (!o.gone || o.at < 0):
			adrift += o.now().mass
		case o.place == law.Bound && !o.gone:
			bound += o.now().mass
		}
	}
	founded := 0.0
	for _, o := range g.objects {
		founded += o.founded
	}
	x := g.weight
	res.Ledger = engine.Ledger{Founded: x*founded + g.setup.CentralMass, Bound: x * bound, Adrift: x * adrift,
		Central: g.hole.mass, Gas: x * g.gas, Radiated: x * g.light}
	for _, p := range g.setup.Populations {
		out, err := g.population(p, res.End)
		if err != nil {
			return nil, err
		}
		res.Populations = append(res.Populations, out)
	}
	for _, o := range g.objects {
		res.Histories = append(res.Histories, o.changes)
	}
	return res, nil
}

// exit is one leaving of a population.
type exit struct {
	date  float64
	cause Cause
}

func (g *run) population(p galaxy.Population, end float64) (engine.PopulationOutcome, error) {
	in := func(word string) bool {
		for k, kind := range g.setup.Set.Kinds {
			for place := range law.PlaceWords {
				for origin := range law.OriginWords {
					if word == g.word(uint8(k), uint8(place), uint8(origin)) {
						return fits(p.Kinds, kind) && fits(p.Places, law.PlaceWords[place]) && fits(p.Origins, law.OriginWords[origin])
					}
				}
			}
		}
		return false
	}
	known := map[string]bool{}
	member := func(word string) bool {
		m, ok := known[word]
		if !ok {
			m = in(word)
			known[word] = m
		}
		return m
	}
	var entries []float64
	var exits []exit
	if p.Warmth != nil {
		for _, o := range g.objects {
			in, out, err := g.warm(o, p.Warmth, func(s span) bool { return member(g.word(s.kind, s.place, s.origin)) }, end)
			if err != nil {
				return engine.PopulationOutcome{}, err
			}
			entries, exits = append(entries, in...), append(exits, out...)
		}
		return g.marks(entries, exits), nil
	}
	take := func(changes []Change) {
		for _, c := range changes {
			before, after := member(c.From), member(c.To)
			if c.Date > end {
				continue
			}
			if after && !before {
				entries = append(entries, c.Date)
			}
			if before && !after {
				exits = append(exits, exit{c.Date, causeOf(c.Cause)})
			}
		}
	}
	for _, o := range g.objects {
		take(o.changes)
	}
	take(g.hole.story)
	return g.marks(entries, exits), nil
}

func fits(words []string, word string) bool { return len(words) == 0 || slices.Contains(words, word) }

func causeOf(word string) Cause {
	for i := range word {
		if word[i] == ':' {
			return Cause{word[:i], word[i+1:]}
		}
	}
	return Cause{}
}

// marks walks through the sorted changes of a population.
func (g *run) marks(entries []float64, exits []exit) engine.PopulationOutcome {
	type change struct {
		date float64
		by   int
	}
	var all []change
	o := engine.PopulationOutcome{PeakDate: math.NaN(), Half: never, Hundredth: never, Last: never, Left: map[string]int64{}, RealLast: math.NaN()}
	for _, d := range entries {
		all = append(all, change{d, 1})
	}
	for _, e := range exits {
		all = append(all, change{e.date, -1})
		o.Left[e.cause.String()]++
	}
	slices.SortFunc(all, func(a, b change) int {
		switch {
		case a.date < b.date:
			return -1
		case a.date > b.date:
			return 1
		}
		return 0
	})
	var dates []float64
	var counts []int64
	n := int64(0)
	for i, c := range all {
		n += int64(c.by)
		if i+1 == len(all) || all[i+1].date != c.date {
			dates, counts = append(dates, c.date), append(counts, n)
		}
	}
	o.Remaining = n
	for i, c := range counts {
		if c > o.Peak {
			o.Peak, o.PeakDate = c, dates[i]
		}
	}
	for i := 1; i < len(counts) && o.Peak > 0; i++ {
		if 2*counts[i-1] > o.Peak && 2*counts[i] <= o.Peak {
			o.Half = dates[i]
		}
		if 100*counts[i-1] > o.Peak && 100*counts[i] <= o.Peak {
			o.Hundredth = dates[i]
		}
	}
	if n > 0 && 2*n > o.Peak {
		o.Half = never
	}
	if n > 0 && 100*n > o.Peak {
		o.Hundredth = never
	}
	if n == 0 && o.Peak > 0 {
		o.Last = dates[len(dates)-1]
		for _, e := range exits {
			if e.date == o.Last {
				o.Hangs = g.lawOf(e.cause.Process)
			}
		}
	}
	o.CutHalf, o.CutHundredth, o.CutLast = o.Half == never, o.Hundredth == never, o.Last == never
	return o
}

func (g *run) lawOf(process string) string {
	if u := g.setup.Set.Of(process); u != nil {
		return u.ID()
	}
	return process
}
