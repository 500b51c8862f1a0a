// Package enginetest holds laws and scenarios to try engines on. They are
// whole laws with whole cards, but no model of anything: their numbers are
// chosen so that many things happen, in every order.
package enginetest

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// Law is a law made of a card and a function per question.
type Law struct {
	card    law.Card
	answers map[string]func(law.Batch) []law.Column
}

// Describe returns the card.
func (l *Law) Describe() law.Card { return l.card }

// Answer answers a question of the card.
func (l *Law) Answer(question string, in law.Batch) (law.Batch, error) {
	return in.Answer(l.answers[question](in)...), nil
}

func made(process, name string) *Law {
	return &Law{
		card: law.Card{Process: process, Name: name, Version: "1", Summary: "for tests of engines",
			Formula: "see the code", Domain: "none", Sources: []string{"assumption"}},
		answers: map[string]func(law.Batch) []law.Column{},
	}
}

func (l *Law) asked(question string, inputs []string, f func(law.Batch) []law.Column) *Law {
	return l.askedOf(question, inputs, nil, f)
}

func (l *Law) askedOf(question string, inputs, words []string, f func(law.Batch) []law.Column) *Law {
	l.card.Questions = append(l.card.Questions, law.Question{Name: question, Inputs: inputs, Words: words})
	l.answers[question] = f
	return l
}

// each builds a column of numbers row by row.
func each(in law.Batch, name string, f func(row int) float64) law.Column {
	v := in.NewValues()
	for i := range v {
		v[i] = f(i)
	}
	return law.Numbers(name, v)
}

func eachWord(in law.Batch, name string, f func(row int) uint8) law.Column {
	w := in.NewWords()
	for i := range w {
		w[i] = f(i)
	}
	return law.Codes(name, w)
}

// Masses spreads masses evenly in ln m from low to high.
func Masses(low, high float64) *Law {
	return made("mass-function", "even").asked("mass", []string{"u"}, func(in law.Batch) []law.Column {
		u := in.Values("u")
		return []law.Column{each(in, "mass", func(i int) float64 { return low * num.Exp(u[i]*num.Log(high/low)) })}
	})
}

// Births spreads births evenly in log10 date.
func Births(from, to float64) *Law {
	return made("star-formation", "even").asked("birth", []string{"u"}, func(in law.Batch) []law.Column {
		u := in.Values("u")
		return []law.Column{each(in, "log10_date", func(i int) float64 { return from + u[i]*(to-from) })}
	})
}

// Metals grows from 0.001 with the date of birth, or is 0.02 for all.
func Metals(grow bool) *Law {
	return made("metals", "grown").asked("metals", []string{"log10_date", "u"}, func(in law.Batch) []law.Column {
		d, u := in.Values("log10_date"), in.Values("u")
		return []law.Column{each(in, "metals", func(i int) float64 {
			if !grow {
				return 0.02
			}
			return 0.001 + 0.01*u[i] + 0.001*math.Abs(d[i])
		})}
	})
}

// Sort makes what is lighter than a limit a brown dwarf.
func Sort(limit float64) *Law {
	return made("substellar-limit", "limit").asked("sort", []string{"mass"}, func(in law.Batch) []law.Column {
		m := in.Values("mass")
		return []law.Column{eachWord(in, "kind", func(i int) uint8 {
			if m[i] < limit {
				return law.BrownDwarf
			}
			return law.Star
		})}
	})
}

// Lifetimes lets a star of a solar mass live 10^solar yr, others m^-slope
// times that; stars below a mass live for ever.
func Lifetimes(solar, slope, immortal float64) *Law {
	l := made("lifetime", "power")
	l.card.Accepts = law.Accepts{Kinds: []string{"star"}}
	return l.asked("live", []string{"mass", "metals"}, func(in law.Batch) []law.Column {
		m, z := in.Values("mass"), in.Values("metals")
		return []law.Column{each(in, "wait", func(i int) float64 {
			if m[i] < immortal {
				return math.Inf(1)
			}
			return solar - slope*num.Log10(m[i]) + z[i]
		})}
	})
}

// Remnants lets stars leave white dwarfs, neutron stars or black holes.
func Remnants() *Law {
	l := made("remnant", "three")
	l.card.Accepts = law.Accepts{Kinds: []string{"star"}}
	words := []string{"white-dwarf", "neutron-star", "black-hole"}
	l.askedOf("die", []string{"mass"}, words, func(in law.Batch) []law.Column {
		m := in.Values("mass")
		heavy := func(i int) float64 { return m[i] / (m[i] + 2) }
		return []law.Column{
			each(in, law.ChanceColumn(words[0]), func(i int) float64 { return 1 - heavy(i) }),
			each(in, law.ChanceColumn(words[1]), func(i int) float64 { return heavy(i) / 2 }),
			each(in, law.ChanceColumn(words[2]), func(i int) float64 { return heavy(i) / 2 }),
		}
	})
	return l.asked("remain", []string{"kind", "mass", "u"}, func(in law.Batch) []law.Column {
		k, m, u := in.Words("kind"), in.Values("mass"), in.Values("u")
		return []law.Column{
			each(in, "mass", func(i int) float64 { return m[i] * (0.3 + 0.5*u[i]) }),
			eachWord(in, "composition", func(i int) uint8 {
				return map[uint8]uint8{law.WhiteDwarf: law.CarbonOxygen, law.NeutronStar: law.Neutrons, law.BlackHole: law.Pure}[k[i]]
			}),
		}
	})
}

// Cooling lets a kind cool as T = 10^4 K (age/10^3 yr)^-slope m^0.3.
func Cooling(process, kind string, slope float64) *Law {
	l := made(process, "power")
	l.card.Accepts = law.Accepts{Kinds: []string{kind}}
	return l.asked("shine", []string{"mass", "log10_age"}, func(in law.Batch) []law.Column {
		m, age := in.Values("mass"), in.Values("log10_age")
		return []law.Column{each(in, "log10_temperature", func(i int) float64 {
			return 4 - slope*max(age[i]-3, -3) + 0.3*num.Log10(m[i])
		})}
	})
}

// Warmth heats what is bound with a power by mass, what is adrift with less.
func Warmth(watts float64) *Law {
	return made("warmth", "steady").asked("warm", []string{"mass", "place"}, func(in law.Batch) []law.Column {
		m, p := in.Values("mass"), in.Words("place")
		return []law.Column{each(in, "power", func(i int) float64 {
			if p[i] == law.Bound {
				return watts * m[i]
			}
			return watts * m[i] / 100
		})}
	})
}
