package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
)

// The toy galaxy: a model small enough to be written by hand in C or NumPy,
// here as laws like any other. N stars with masses of slope 2.35 on 0.1 .. 100
// solar masses, births uniform on 0 .. 1e10 yr, lives of 1e10 m^-2.5 yr, three
// hazards whose rates follow the number bound, remnants that drift and end.
// All numbers are invented.

// function is a law made of a card and one function.
type function struct {
	card   law.Card
	answer func(question string, in law.Batch) law.Batch
}

func (f function) Describe() law.Card { return f.card }

func (f function) Answer(question string, in law.Batch) (law.Batch, error) {
	return f.answer(question, in), nil
}

func toyCard(process, name string, questions ...law.Question) law.Card {
	return law.Card{Process: process, Name: name, Version: "1", Summary: "toy", Sources: []string{"assumption"}, Questions: questions}
}

func ask(name string, inputs ...string) law.Question {
	return law.Question{Name: name, Inputs: inputs}
}

// toyMass: m = (p1 + u (p2 - p1))^(-1/1.35).
func toyMass() law.Law {
	p1 := num.Pow(0.1, -1.35)
	p2 := num.Pow(100, -1.35)
	return function{toyCard("mass-function", "toy", ask("mass", "u")), func(_ string, in law.Batch) law.Batch {
		u, m := in.Columns[0].Values, in.NewValues()
		for i, u := range u {
			m[i] = p1 + u*(p2-p1)
		}
		num.LogInto(m, m)
		for i := range m {
			m[i] *= -1 / 1.35
		}
		num.ExpInto(m, m)
		return in.Answer(law.Numbers("mass", m))
	}}
}

func toyBirth() law.Law {
	return function{toyCard("star-formation", "toy", ask("birth", "u")), func(_ string, in law.Batch) law.Batch {
		d := in.NewValues()
		num.Log10Into(d, in.Columns[0].Values)
		for i := range d {
			d[i] += 10
		}
		return in.Answer(law.Numbers("log10_date", d))
	}}
}

func toyMetals() law.Law {
	return function{toyCard("metals", "toy", ask("metals")), func(_ string, in law.Batch) law.Batch {
		z := in.NewValues()
		for i := range z {
			z[i] = 0.02
		}
		return in.Answer(law.Numbers("metals", z))
	}}
}

func toySort() law.Law {
	return function{toyCard("substellar-limit", "toy", ask("sort", "mass")), func(_ string, in law.Batch) law.Batch {
		k := in.NewWords()
		clear(k) // every object is a star
		return in.Answer(law.Codes("kind", k))
	}}
}

func toyLifetime() law.Law {
	c := toyCard("lifetime", "toy", ask("live", "mass"))
	c.Accepts = law.Accepts{Kinds: []string{"star"}}
	return function{c, func(_ string, in law.Batch) law.Batch {
		w := in.NewValues()
		num.Log10Into(w, in.Columns[0].Values)
		for i := range w {
			w[i] = 10 - 2.5*w[i]
		}
		return in.Answer(law.Numbers("wait", w))
	}}
}

// toyRemnant: below 8 a white dwarf of min(0.9 m, 0.4 + 0.1 m), below 25 a
// neutron star of 1.4, else a black hole of 0.2 m.
func toyRemnant() law.Law {
	die := ask("die", "mass")
	die.Words = []string{"white-dwarf", "neutron-star", "black-hole"}
	c := toyCard("remnant", "toy", die, ask("remain", "kind", "mass"))
	c.Accepts = law.Accepts{Kinds: []string{"star"}}
	return function{c, func(q string, in law.Batch) law.Batch {
		if q == "die" {
			w, n, b := in.NewValues(), in.NewValues(), in.NewValues()
			for i, m := range in.Columns[0].Values {
				w[i], n[i], b[i] = 0, 0, 0
				switch {
				case m < 8:
					w[i] = 1
				case m < 25:
					n[i] = 1
				default:
					b[i] = 1
				}
			}
			return in.Answer(law.Numbers("chance_white_dwarf", w), law.Numbers("chance_neutron_star", n), law.Numbers("chance_black_hole", b))
		}
		r, comp := in.NewValues(), in.NewWords()
		kind := in.Columns[0].Words
		for i, m := range in.Columns[1].Values {
			switch kind[i] {
			case law.WhiteDwarf:
				r[i], comp[i] = min(0.9*m, 0.4+0.1*m), law.CarbonOxygen
			case law.NeutronStar:
				r[i], comp[i] = 1.4, law.Neutrons
			default:
				r[i], comp[i] = 0.2*m, law.Pure
			}
		}
		return in.Answer(law.Numbers("mass", r), law.Codes("composition", comp))
	}}
}

// toyDynamics: with f = number / founded number, ejection sqrt(0.5/m) x 1e-19 /
// sqrt(f), infall 2 m x 1e-20 f, collision (0.5 + m) x 1e-21 f^2 per year.
func toyDynamics() law.Law {
	c := toyCard("ejection", "toy", ask("rate", "number", "founded_number"), ask("expose", "mass"))
	c.Clocks = []law.Clock{
		{Name: "ejection", Outcome: "ejected", Fate: law.FateAdrift},
		{Name: "infall", Outcome: "swallowed", Fate: law.FateCentral},
		{Name: "collision", Outcome: "destroyed", Fate: law.FateGas},
	}
	c.Frame, c.StopOutcome, c.StopFate = true, "swallowed", law.FateCentral
	return function{c, func(q string, in law.Batch) law.Batch {
		if q == "expose" {
			e, f, k := in.NewValues(), in.NewValues(), in.NewValues()
			// sqrt(0.5/m) by way of the column forms, which are faster than roots.
			num.LogInto(e, in.Columns[0].Values)
			for i, m := range in.Columns[0].Values {
				f[i], k[i] = 2*m, 0.5+m
			}
			for i, l := range e {
				e[i] = -0.5 * (l + math.Ln2)
			}
			num.ExpInto(e, e)
			return in.Answer(law.Numbers("to_ejection", e), law.Numbers("to_infall", f), law.Numbers("to_collision", k))
		}
		e, f, k, r, v, s := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
		for i, n := range in.Columns[0].Values {
			x := num.Log10(n / in.Columns[1].Values[i])
			e[i], f[i], k[i] = -19-0.5*x, -20+x, -21+2*x
			r[i], v[i], s[i] = 1e4, 100, 0
		}
		return in.Answer(law.Numbers("log10_rate_ejection", e), law.Numbers("log10_rate_infall", f), law.Numbers("log10_rate_collision", k),
			law.Numbers("radius", r), law.Numbers("dispersion", v), law.Numbers("stop", s))
	}}
}

// toyEnd: white dwarfs and neutron stars end after 1e37 ln(m / 1e-3) yr.
func toyEnd() law.Law {
	c := toyCard("nucleon-decay", "toy", ask("wear", "mass"), ask("foretell", "mass"))
	c.Accepts = law.Accepts{Kinds: []string{"white-dwarf", "neutron-star"}}
	c.Thresholds = []law.Threshold{
		{Kind: "white-dwarf", Mass: 1e-3, Becomes: law.Gone, Outcome: "dissolved"},
		{Kind: "neutron-star", Mass: 1e-3, Becomes: law.Gone, Outcome: "dissolved"},
	}
	return function{c, func(q string, in law.Batch) law.Batch {
		m, w := in.Columns[0].Values, in.NewValues()
		if q == "wear" {
			h := in.NewValues()
			clear(h)
			num.Log10Into(w, m)
			for i := range w {
				w[i] -= 37
			}
			return in.Answer(law.Numbers("log10_rate", w), law.Numbers("heat", h))
		}
		num.LogInto(w, m)
		for i := range w {
			w[i] += 3 * num.Ln10
		}
		num.Log10Into(w, w)
		for i := range w {
			w[i] += 37
		}
		return in.Answer(law.Numbers("wait", w))
	}}
}

// toyEvaporation: black holes end after 2.1e67 m^3 yr.
func toyEvaporation() law.Law {
	c := toyCard("evaporation", "toy", ask("wear", "mass"), ask("foretell", "mass"))
	c.Accepts = law.Accepts{Kinds: []string{"black-hole"}}
	c.Thresholds = []law.Threshold{{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"}}
	return function{c, func(q string, in law.Batch) law.Batch {
		w := in.NewValues()
		num.Log10Into(w, in.Columns[0].Values)
		if q == "wear" {
			h := in.NewValues()
			clear(h)
			for i := range w {
				w[i] = -2*w[i] - num.Log10(3*2.1) - 67
			}
			return in.Answer(law.Numbers("log10_rate", w), law.Numbers("heat", h))
		}
		for i := range w {
			w[i] = 3*w[i] + num.Log10(2.1) + 67
		}
		return in.Answer(law.Numbers("wait", w))
	}}
}

// toySetup is the toy galaxy of n objects.
func toySetup(n int, seed uint64) (Setup, error) {
	var uses []*law.Use
	for _, l := range []law.Law{toyMass(), toyBirth(), toyMetals(), toySort(), toyLifetime(), toyRemnant(), toyDynamics(), toyEnd(), toyEvaporation()} {
		uses = append(uses, law.NewUse(l))
	}
	set, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		return Setup{}, faults[0]
	}
	pops := []galaxy.Population{{Name: "stars", Condition: galaxy.Condition{Kinds: []string{"star"}}}}
	for _, k := range []string{"white-dwarf", "neutron-star", "black-hole"} {
		for _, p := range []string{"bound", "adrift"} {
			pops = append(pops, galaxy.Population{Name: p + " " + k, Condition: galaxy.Condition{Kinds: []string{k}, Places: []string{p}}})
		}
	}
	return Setup{Set: set, Objects: n, Real: float64(n), Radius: 1e4, Until: math.Inf(1), Seed: seed, Populations: pops}, nil
}
