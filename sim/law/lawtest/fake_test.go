package lawtest

import (
	"math"
	"slices"

	"wane/sim/law"
	"wane/sim/num"
)

// fake is a law made of a card and a function.
type fake struct {
	card   law.Card
	answer func(question string, in law.Batch) (law.Batch, error)
}

func (f fake) Describe() law.Card                               { return f.card }
func (f fake) Answer(q string, in law.Batch) (law.Batch, error) { return f.answer(q, in) }

// spoilt changes a fake's answers; the card stays.
func (f fake) spoilt(change func(question string, in, out law.Batch) law.Batch) fake {
	good := f.answer
	f.answer = func(q string, in law.Batch) (law.Batch, error) {
		out, err := good(q, in)
		if err != nil {
			return out, err
		}
		return change(q, in, out), nil
	}
	return f
}

func card(process string, questions ...law.Question) law.Card {
	return law.Card{Process: process, Name: "test", Version: "1", Summary: "a test law", Formula: "none", Domain: "everywhere",
		Sources: []string{"assumption"}, Questions: questions}
}

func number(name string, low, preset, high float64) law.Parameter {
	return law.Parameter{Name: name, Low: low, Preset: preset, High: high, Doc: "a number", Citation: "assumption"}
}

// onlyNumbers answers one column, row by row, from columns of numbers.
func onlyNumbers(column string, inputs []string, f func(p, x []float64) float64) func(string, law.Batch) (law.Batch, error) {
	return func(_ string, in law.Batch) (law.Batch, error) {
		out := in.NewValues()
		x := make([]float64, len(inputs))
		for i := range out {
			for j, name := range inputs {
				x[j] = in.Values(name)[i]
			}
			out[i] = f(in.Parameters, x)
		}
		return in.Answer(law.Numbers(column, out)), nil
	}
}

// shine is white dwarfs that cool as a power of age.
func shine() fake {
	inputs := []string{"mass", "log10_age"}
	c := card("white-dwarf-cooling", law.Question{Name: "shine", Inputs: inputs})
	c.Accepts.Kinds = []string{"white-dwarf"}
	c.Parameters = []law.Parameter{number("slope", 0.2, 0.35, 0.5)}
	return fake{c, onlyNumbers("log10_temperature", inputs, func(p, x []float64) float64 {
		return min(8, 7-p[0]*x[1]+0.1*max(-300, num.Log10(x[0])))
	})}
}

// births is a mass function by its quantiles.
func births() fake {
	c := card("mass-function", law.Question{Name: "mass", Inputs: []string{"u"}})
	c.Parameters = []law.Parameter{number("least", 0.01, 0.08, 0.1)}
	return fake{c, onlyNumbers("mass", []string{"u"}, func(p, x []float64) float64 { return p[0] * num.Exp(7*x[0]) })}
}

// endless is a vacuum whose decay follows the four-volume.
func endless() fake {
	inputs := []string{"log10_date", "log10_four_volume"}
	c := card("vacuum-decay", law.Question{Name: "end", Inputs: inputs})
	c.Effect = "everything-ends"
	c.Parameters = []law.Parameter{number("log10_rate", -1e3, -500, -100)}
	return fake{c, onlyNumbers("log10_hazard", inputs, func(p, x []float64) float64 { return p[0] + x[1] })}
}

// remnants is stars that leave a tenth to a fifth of themselves.
func remnants() fake {
	c := card("remnant", law.Question{Name: "die", Inputs: []string{"mass"}, Words: []string{"white-dwarf", "neutron-star"}},
		law.Question{Name: "remain", Inputs: []string{"kind", "mass", "u"}})
	c.Accepts = law.Accepts{Kinds: []string{"star"}, Column: "mass", High: law.AtParameter("collapse.m_up")}
	c.Parameters = []law.Parameter{number("share", 0, 0.1, 0.5)}
	return fake{c, func(q string, in law.Batch) (law.Batch, error) {
		first, second := in.NewValues(), in.NewValues()
		mass := in.Values("mass")
		if q == "die" {
			for i := range first {
				first[i] = mass[i] / (mass[i] + 1)
				second[i] = 1 - first[i]
			}
			return in.Answer(law.Numbers("chance_white_dwarf", first), law.Numbers("chance_neutron_star", second)), nil
		}
		words, u := in.NewWords(), in.Values("u")
		for i := range first {
			first[i] = mass[i] * (in.Parameters[0] + 0.1*u[i])
			words[i] = law.CarbonOxygen
			if in.Words("kind")[i] == law.NeutronStar {
				words[i] = law.Neutrons
			}
		}
		return in.Answer(law.Numbers("mass", first), law.Codes("composition", words)), nil
	}}
}

// wearing is a rate M^power / 10^life, down to thresholds.
func wearing(process string, power float64, thresholds ...law.Threshold) fake {
	c := card(process, law.Question{Name: "wear", Inputs: []string{"mass"}}, law.Question{Name: "foretell", Inputs: []string{"kind", "mass"}})
	for _, t := range thresholds {
		if !slices.Contains(c.Accepts.Kinds, t.Kind) {
			c.Accepts.Kinds = append(c.Accepts.Kinds, t.Kind)
		}
	}
	c.Thresholds = thresholds
	c.Parameters = []law.Parameter{number("life", 30, 37, 40)}
	return fake{c, func(q string, in law.Batch) (law.Batch, error) {
		out, mass := in.NewValues(), in.Values("mass")
		life := in.Parameters[0]
		if q == "wear" {
			heat := in.NewValues()
			for i := range out {
				out[i], heat[i] = power*num.Log10(mass[i])-life, 0
			}
			return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
		}
		for i := range out {
			end, ends := 0.0, false
			for _, t := range thresholds {
				if in.Kind(t.Kind) == in.Words("kind")[i] && t.Mass < mass[i] {
					end, ends = max(end, t.Mass), true
				}
			}
			out[i] = -1000 // below the last threshold: crossed at once
			if ends {
				out[i] = max(-1000, life+log10Integral(power, end, mass[i]))
			}
		}
		return in.Answer(law.Numbers("wait", out)), nil
	}}
}

// log10Integral is log10 of the integral of M^-power dM.
func log10Integral(power, low, high float64) float64 {
	q := 1 - power
	switch {
	case q == 0:
		return num.Log10(num.Log(high / low))
	case low == 0:
		return q*num.Log10(high) - num.Log10(q)
	}
	a, b := q*num.Log10(low), q*num.Log10(high)
	return max(a, b) + num.Log10(-num.Expm1(-math.Abs(b-a)*num.Ln10)) - num.Log10(math.Abs(q))
}

// holes lose mass as 1/M^2, to nothing.
func holes() fake {
	return wearing("evaporation", -2, law.Threshold{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"})
}

// matter loses mass as M, past two thresholds.
func matter() fake {
	return wearing("nucleon-decay", 1,
		law.Threshold{Kind: "neutron-star", Mass: 1, Becomes: "white-dwarf", Outcome: "expanded"},
		law.Threshold{Kind: "neutron-star", Mass: 0.1, Becomes: law.Gone, Outcome: "dissolved"},
		law.Threshold{Kind: "white-dwarf", Mass: 1e-3, Becomes: law.Gone, Outcome: "dissolved"})
}

// turning is cold dwarfs that turn to iron.
func turning() fake {
	c := card("iron", law.Question{Name: "foretell", Inputs: []string{"mass", "u"}})
	c.Accepts.Kinds = []string{"white-dwarf"}
	c.Outcomes = []law.Outcome{{Word: "turned", Becomes: "iron-star"}, {Word: "exploded", Becomes: law.Gone}}
	c.Parameters = []law.Parameter{number("exploding", 0.1, 0.2, 0.3)}
	return fake{c, func(_ string, in law.Batch) (law.Batch, error) {
		wait, turned, exploded, mass, gas := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
		for i := range wait {
			wait[i] = 1500 + num.Log10(-num.Log(in.Values("u")[i]))
			exploded[i] = in.Parameters[0]
			turned[i] = 1 - exploded[i]
			mass[i] = in.Values("mass")[i]
			gas[i] = 0
		}
		return in.Answer(law.Numbers("wait", wait), law.Numbers("chance_turned", turned), law.Numbers("chance_exploded", exploded),
			law.Numbers("mass", mass), law.Numbers("gas", gas)), nil
	}}
}

// throwing is a galaxy that ejects at its relaxation.
func throwing() fake {
	c := card("ejection", law.Question{Name: "rate", Inputs: []string{"number", "mass_bound", "carried_off", "founded_radius", "sum_throw", "number_white_dwarf", "reading_throw"}},
		law.Question{Name: "expose", Inputs: []string{"mass", "place"}})
	c.Frame, c.Clocks = true, []law.Clock{{Name: "throw", Outcome: "ejected", Fate: law.FateAdrift}}
	c.StopOutcome, c.StopFate = "swallowed", law.FateCentral
	c.Parameters = []law.Parameter{number("exponent", 0.1, 0.5, 1)}
	return fake{c, func(q string, in law.Batch) (law.Batch, error) {
		if q == "expose" {
			return onlyNumbers("to_throw", []string{"mass"}, func(p, x []float64) float64 {
				return min(1e20, num.Pow(max(x[0], 1e-100), -p[0]))
			})(q, in)
		}
		rate, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
		for i := range rate {
			n, m, gone := in.Values("number")[i], in.Values("mass_bound")[i], in.Values("carried_off")[i]
			rate[i] = -10 - num.Log10(n)
			radius[i] = in.Values("founded_radius")[i] * m / (m + gone)
			dispersion[i], stop[i] = 200, 0
			if n < 2 {
				stop[i] = 1
			}
		}
		return in.Answer(law.Numbers("log10_rate_throw", rate), law.Numbers("radius", radius),
			law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
	}}
}

func collapse() fake {
	f := remnants()
	f.card.Process = "collapse"
	f.card.Accepts = law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.AtParameter("m_up")}
	f.card.Parameters = append([]law.Parameter{f.card.Parameters[0]}, number("m_up", 6, 8, 11))
	return f
}

// lives are stars that burn a share of themselves at M^3.5 suns.
func lives() fake {
	c := card("lifetime", law.Question{Name: "live", Inputs: []string{"mass"}})
	c.Accepts.Kinds = []string{"star"}
	c.Parameters = []law.Parameter{number("slope", 2, 2.5, 3)}
	return fake{c, onlyNumbers("wait", []string{"mass"}, func(p, x []float64) float64 { return 10 - p[0]*num.Log10(x[0]) })}
}
