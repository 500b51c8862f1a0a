package enginetest

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// Rates says how the rate of a clock hangs on the galaxy: 10^Log10 per yr
// times powers of its values over those at the start.
type Rates struct {
	Log10   float64
	Number  float64 // power of number / founded number
	Mass    float64 // power of mass bound / founded mass
	Carried float64 // power of 1 + carried off / founded mass
	Sum     float64 // power of the clock's sum / founded number
	Central float64 // power of 1 + central mass / founded mass
	Date    float64 // power of the date / 10^3 yr
	Reading float64 // power of 1 + the clock's reading
	Kind    string  // power 1 of 1 + number of that kind / founded number
}

// inputs lists the columns that the rates of some clocks need.
func inputs(clocks []string, rates []Rates) []string {
	out := []string{"founded_number", "founded_mass"}
	seen := map[string]bool{}
	need := func(wanted bool, name string) {
		if wanted && !seen[name] {
			seen[name] = true
			out = append(out, name)
		}
	}
	for i, r := range rates {
		need(r.Number != 0, "number")
		need(r.Mass != 0, "mass_bound")
		need(r.Carried != 0, "carried_off")
		need(r.Sum != 0, "sum_"+clocks[i])
		need(r.Central != 0, "central_mass")
		need(r.Date != 0, "log10_date")
		need(r.Reading != 0, "reading_"+clocks[i])
		need(r.Kind != "", "number_"+r.Kind)
	}
	return out
}

func (r Rates) at(in law.Batch, clock string, i int) float64 {
	n0, m0 := in.Values("founded_number")[i], in.Values("founded_mass")[i]
	x := r.Log10
	power := func(p float64, name string, of, plus float64) {
		if p != 0 && of > 0 {
			x += p * num.Log10(max(plus+in.Values(name)[i]/of, 1e-2))
		}
	}
	power(r.Number, "number", n0, 0)
	power(r.Mass, "mass_bound", m0, 0)
	power(r.Carried, "carried_off", m0, 1)
	power(r.Sum, "sum_"+clock, n0, 0)
	power(r.Central, "central_mass", m0, 1)
	power(r.Reading, "reading_"+clock, 1, 1)
	if r.Date != 0 {
		x += r.Date * (in.Values("log10_date")[i] - 3)
	}
	if r.Kind != "" {
		power(1, "number_"+r.Kind, n0, 1)
	}
	return x
}

// Touch says how a clock touches objects: Scale m^Power, zero for the kind Not.
type Touch struct {
	Scale, Power float64
	Not          string
}

func (t Touch) at(in law.Batch, i int) float64 {
	if t.Not != "" && in.Words("kind")[i] == in.Kind(t.Not) {
		return 0
	}
	if t.Scale == 0 {
		return 0
	}
	return t.Scale * num.Pow(in.Values("mass")[i], t.Power)
}

// Frame is an ejection law with any number of clocks. It stops at a share of
// the founded number (never if that is 0).
type Frame struct {
	Clocks   []law.Clock
	Rates    []Rates
	Touches  []Touch
	StopAt   float64
	StopFate law.Fate
}

// Law makes the law.
func (f Frame) Law() *Law {
	l := made("ejection", "made")
	l.card.Clocks, l.card.Frame = f.Clocks, true
	if f.StopFate != "" {
		l.card.StopFate, l.card.StopOutcome = f.StopFate, "stopped"
	}
	names := clockNames(f.Clocks)
	in := inputs(names, f.Rates)
	if f.StopAt > 0 {
		in = with(in, "number")
	}
	l.asked("rate", in, func(in law.Batch) []law.Column {
		var out []law.Column
		for k, r := range f.Rates {
			out = append(out, each(in, law.RateColumn(names[k]), func(i int) float64 { return r.at(in, names[k], i) }))
		}
		return append(out, each(in, "radius", func(int) float64 { return 1 }), each(in, "dispersion", func(int) float64 { return 1 }),
			each(in, "stop", func(i int) float64 {
				if f.StopAt > 0 && in.Values("number")[i] <= f.StopAt*in.Values("founded_number")[i] {
					return 1
				}
				return 0
			}))
	})
	return l.exposed(law.ToColumn, names, f.Touches)
}

func clockNames(clocks []law.Clock) []string {
	var names []string
	for _, c := range clocks {
		names = append(names, c.Name)
	}
	return names
}

func with(names []string, name string) []string {
	for _, n := range names {
		if n == name {
			return names
		}
	}
	return append(names, name)
}

func (l *Law) exposed(column func(string) string, names []string, touches []Touch) *Law {
	return l.asked("expose", []string{"kind", "mass"}, func(in law.Batch) []law.Column {
		var out []law.Column
		for k, t := range touches {
			out = append(out, each(in, column(names[k]), func(i int) float64 { return t.at(in, i) }))
		}
		return out
	})
}

// Infall is a law with one clock of its own, fate central, and a share of
// another law's clocks that it takes, growing with mass.
type Infall struct {
	Rates  Rates
	Touch  Touch
	Divert []string
	Share  float64
}

// Law makes the law.
func (f Infall) Law() *Law {
	l := made("infall", "made")
	l.card.Clocks = []law.Clock{{Name: "fall", Outcome: "fell", Fate: law.FateCentral}}
	l.asked("rate", inputs([]string{"fall"}, []Rates{f.Rates}), func(in law.Batch) []law.Column {
		return []law.Column{each(in, law.RateColumn("fall"), func(i int) float64 { return f.Rates.at(in, "fall", i) })}
	})
	l.exposed(law.ToColumn, []string{"fall"}, []Touch{f.Touch})
	if len(f.Divert) == 0 {
		return l
	}
	return l.askedOf("divert", []string{"mass"}, f.Divert, func(in law.Batch) []law.Column {
		var out []law.Column
		for _, clock := range f.Divert {
			m := in.Values("mass")
			out = append(out, each(in, law.ShareColumn(clock), func(i int) float64 { return math.Min(1, f.Share*math.Sqrt(m[i])) }))
		}
		return out
	})
}

// Meeting is an encounter law. Its outcomes: the two merge into a star (or
// into what the heavier is, if neither is a star or brown dwarf), the lighter
// is torn up, both lose a tenth, both are gone.
type Meeting struct {
	Names  []string
	Rates  []Rates
	Seeks  []Touch
	Sought []Touch
}

// Law makes the law.
func (f Meeting) Law() *Law {
	l := made("encounter", "made")
	for _, n := range f.Names {
		l.card.Clocks = append(l.card.Clocks, law.Clock{Name: n, Fate: law.FateMeet})
	}
	l.card.Outcomes = []law.Outcome{{Word: "merged"}, {Word: "torn"}, {Word: "brushed"}, {Word: "destroyed"}}
	l.asked("rate", inputs(f.Names, f.Rates), func(in law.Batch) []law.Column {
		var out []law.Column
		for k, r := range f.Rates {
			out = append(out, each(in, law.RateColumn(f.Names[k]), func(i int) float64 { return r.at(in, f.Names[k], i) }))
		}
		return out
	})
	l.asked("expose", []string{"kind", "mass"}, func(in law.Batch) []law.Column {
		var out []law.Column
		for k, t := range f.Seeks {
			out = append(out, each(in, law.SeeksColumn(f.Names[k]), func(i int) float64 { return t.at(in, i) }))
		}
		for k, t := range f.Sought {
			out = append(out, each(in, law.SoughtColumn(f.Names[k]), func(i int) float64 { return t.at(in, i) }))
		}
		return out
	})
	return l.asked("meet", []string{"kind_1", "mass_1", "composition_1", "kind_2", "mass_2", "composition_2", "u"}, meet)
}

func meet(in law.Batch) []law.Column {
	outcome := in.NewWords()
	kinds, comps := [2][]uint8{in.NewWords(), in.NewWords()}, [2][]uint8{in.NewWords(), in.NewWords()}
	masses := [2][]float64{in.NewValues(), in.NewValues()}
	gas := in.NewValues()
	u := in.Values("u")
	for i := range in.Rows {
		var k, c [2]uint8
		var m [2]float64
		for s, suffix := range [2]string{"_1", "_2"} {
			k[s], m[s], c[s] = in.Words("kind" + suffix)[i], in.Values("mass" + suffix)[i], in.Words("composition" + suffix)[i]
		}
		for s := range 2 {
			kinds[s][i], masses[s][i], comps[s][i] = law.NoWord, 0, law.NoWord
		}
		total := m[0] + m[1]
		switch {
		case u[i] < 0.5: // merge
			heavier := 0
			if m[1] > m[0] {
				heavier = 1
			}
			kinds[0][i], comps[0][i] = k[heavier], c[heavier]
			if k[0] <= law.BrownDwarf || k[1] <= law.BrownDwarf {
				kinds[0][i], comps[0][i] = law.Star, law.Hydrogen
			}
			masses[0][i], gas[i] = total*0.9, total*0.05
		case u[i] < 0.7: // the lighter is torn up
			outcome[i] = 1
			s := 0
			if m[1] > m[0] {
				s = 1
			}
			kinds[s][i], masses[s][i], comps[s][i] = k[s], m[s], c[s]
			gas[i] = m[1-s]
		case u[i] < 0.9: // both lose a tenth
			outcome[i] = 2
			for s := range 2 {
				kinds[s][i], masses[s][i], comps[s][i] = k[s], 0.9*m[s], c[s]
			}
			gas[i] = total * 0.1
			gas[i] = min(gas[i], total-masses[0][i]-masses[1][i])
		default:
			outcome[i] = 3
			gas[i] = total / 2
		}
		if u[i] < 0.5 {
			outcome[i] = 0
		}
	}
	return []law.Column{law.Codes("outcome", outcome),
		law.Codes("kind_1", kinds[0]), law.Numbers("mass_1", masses[0]), law.Codes("composition_1", comps[0]),
		law.Codes("kind_2", kinds[1]), law.Numbers("mass_2", masses[1]), law.Codes("composition_2", comps[1]),
		law.Numbers("gas", gas)}
}
