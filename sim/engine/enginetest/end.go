package enginetest

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// Wearing is a wearing law dM/dt = 10^Log10 M^Power solMass/yr.
type Wearing struct {
	Process    string
	Kinds      []string // speaks for
	Log10      float64
	Power      float64
	Thresholds []law.Threshold
	New        []law.Kind
	Closed     bool    // answers foretell in closed form
	Heat       float64 // log10 of a temperature that grows with 1/M; 0: no heat
	Heavier    float64 // speaks only for masses from here on, if not 0
	Never      string  // rate zero for this kind
}

// Law makes the law.
func (f Wearing) Law() *Law {
	l := made(f.Process, "power")
	l.card.Accepts = law.Accepts{Kinds: f.Kinds}
	if f.Heavier > 0 {
		l.card.Accepts.Column, l.card.Accepts.Low = "mass", law.At(f.Heavier)
	}
	l.card.Thresholds, l.card.Kinds, l.card.Wears = f.Thresholds, f.New, "loss"
	stopped := func(in law.Batch, i int) bool { return f.Never != "" && in.Words("kind")[i] == in.Kind(f.Never) }
	l.asked("wear", []string{"kind", "mass"}, func(in law.Batch) []law.Column {
		m := in.Values("mass")
		return []law.Column{
			each(in, "log10_rate", func(i int) float64 {
				if stopped(in, i) {
					return math.Inf(-1)
				}
				return f.Log10 + f.Power*num.Log10(m[i])
			}),
			each(in, "heat", func(int) float64 { return 0.5 }),
		}
	})
	if f.Heat != 0 {
		l.asked("heat", []string{"mass"}, func(in law.Batch) []law.Column {
			m := in.Values("mass")
			return []law.Column{each(in, "log10_temperature", func(i int) float64 { return f.Heat - num.Log10(m[i]) })}
		})
	}
	if !f.Closed {
		return l
	}
	return l.asked("foretell", []string{"kind", "mass"}, func(in law.Batch) []law.Column {
		m, k := in.Values("mass"), in.Words("kind")
		return []law.Column{each(in, "wait", func(i int) float64 {
			end, found := 0.0, false
			for _, t := range f.Thresholds {
				if k[i] == in.Kind(t.Kind) {
					end, found = t.Mass, true
				}
			}
			if !found || stopped(in, i) {
				return math.Inf(1)
			}
			return f.wait(m[i], end)
		})}
	})
}

// wait is log10 of the integral of dM/rate from end to m.
func (f Wearing) wait(m, end float64) float64 {
	q := 1 - f.Power
	if q == 0 {
		return num.Log10(num.Log(m/end)) - f.Log10
	}
	return num.Log10((num.Pow(m, q)-num.Pow(end, q))/q) - f.Log10
}

// Turning is a turning law: an exponential wait of mean 10^Log10 yr, never for
// masses below Never, and outcomes by chance.
type Turning struct {
	Process  string
	Kinds    []string
	Log10    float64
	Never    float64
	Outcomes []law.Outcome
	New      []law.Kind
	Keeps    float64 // share of the mass that is left
	Gas      float64 // share that goes to gas
}

// Law makes the law.
func (f Turning) Law() *Law {
	l := made(f.Process, "exponential")
	l.card.Accepts = law.Accepts{Kinds: f.Kinds}
	l.card.Outcomes, l.card.Kinds = f.Outcomes, f.New
	return l.asked("foretell", []string{"mass", "u"}, func(in law.Batch) []law.Column {
		m, u := in.Values("mass"), in.Values("u")
		out := []law.Column{each(in, "wait", func(i int) float64 {
			if m[i] < f.Never {
				return math.Inf(1)
			}
			return f.Log10 + num.Log10(-num.Log(u[i]))
		})}
		for w, o := range f.Outcomes {
			out = append(out, each(in, law.ChanceColumn(o.Word), func(i int) float64 {
				if len(f.Outcomes) == 1 {
					return 1
				}
				first := m[i] / (1 + m[i])
				if w == 0 {
					return first
				}
				return (1 - first) / float64(len(f.Outcomes)-1)
			}))
		}
		return append(out, each(in, "mass", func(i int) float64 { return f.Keeps * m[i] }),
			each(in, "gas", func(i int) float64 { return f.Gas * m[i] }))
	})
}

// Sky is a sky whose temperature falls as a power of the date.
type Sky struct {
	Log10, Slope   float64 // log10 T = Log10 - Slope log10 date
	EndAt          float64 // log10 date, +Inf: none
	AllAdrift      float64 // log10 date, +Inf: none
	LeastLog10Warm float64 // it never falls below this
}

// LogTemperature is log10 of the temperature in K.
func (s Sky) LogTemperature(date float64) float64 {
	return max(s.Log10-s.Slope*date, s.LeastLog10Warm)
}

// LogColderSince is the log10 date from which the sky is colder.
func (s Sky) LogColderSince(t float64) float64 {
	if t <= s.LeastLog10Warm {
		return math.Inf(1)
	}
	return (s.Log10 - t) / s.Slope
}

// End is when and why the sky ends.
func (s Sky) End() (float64, string) { return s.EndAt, "vacuum-decay" }

// Adrift is when everything is cast adrift.
func (s Sky) Adrift() float64 { return s.AllAdrift }
