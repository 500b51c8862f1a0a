package sky_test

import (
	"math"
	"testing"

	"wane/plugins/expansion"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/sky"
)

var inf = math.Inf(1)

// space is a law of expansion for tests: log10 of the dark-energy density and
// the curvature as functions of ln a, date and time since the decay began.
type space struct {
	name                     string
	hubble, matter, radiated float64
	inputs                   []string
	density                  func(x, date, since float64) (dark, curvature float64)
}

func (s space) Describe() law.Card {
	p := func(name string, v float64) law.Parameter {
		return law.Parameter{Name: name, Low: 0, High: 100, Preset: v, Citation: "test"}
	}
	return law.Card{Process: "expansion", Name: s.name, Version: "1", Summary: "test", Sources: []string{"test"},
		Questions:  []law.Question{{Name: "density", Inputs: s.inputs}},
		Parameters: []law.Parameter{p("hubble", s.hubble), p("matter", s.matter), p("radiation", s.radiated), p("temperature", 2.7255)}}
}

func (s space) Answer(_ string, in law.Batch) (law.Batch, error) {
	x, date, since := in.Values("ln_a"), in.Values("log10_date"), in.Values("log10_since")
	get := func(v []float64, i int) float64 {
		if v == nil {
			return math.NaN()
		}
		return v[i]
	}
	dark, curvature := in.NewValues(), in.NewValues()
	for i := range dark {
		dark[i], curvature[i] = s.density(get(x, i), get(date, i), get(since, i))
	}
	return in.Answer(law.Numbers("log10_dark", dark), law.Numbers("curvature", curvature)), nil
}

// constantW has dark energy of pressure w.
func constantW(h, om, w float64) space {
	dark := num.Log10(1 - om)
	return space{name: "w-cdm", hubble: h, matter: om, inputs: []string{"ln_a"},
		density: func(x, _, _ float64) (float64, float64) { return dark - 3*(1+w)*x/num.Ln10, 0 }}
}

// matterOnly is flat; h sets its age.
func matterOnly(h float64) space {
	return space{name: "matter-only", hubble: h, matter: 1,
		density: func(_, _, _ float64) (float64, float64) { return math.Inf(-1), 0 }}
}

// open has matter and negative curvature.
func open(h, om float64) space {
	return space{name: "open", hubble: h, matter: om,
		density: func(_, _, _ float64) (float64, float64) { return math.Inf(-1), 1 - om }}
}

// today is the age of the default universe, 13.791501 Gyr.
var today = num.Log10(13.7915010e9)

// decaying loses half its dark energy every halfLife years, from today on.
func decaying(h, om, halfLife float64) space {
	dark := num.Log10(1 - om)
	return space{name: "decaying", hubble: h, matter: om, inputs: []string{"log10_date"},
		density: func(_, date, _ float64) (float64, float64) {
			return dark - num.Log10(2)*num.Exp10(num.Sub10(date, today))/halfLife, 0
		}}
}

// fading loses half its dark energy every halfLife years, from the date on at
// which an ending lets it decay.
func fading(h, om, halfLife float64) space {
	dark := num.Log10(1 - om)
	return space{name: "fading", hubble: h, matter: om, inputs: []string{"log10_since"},
		density: func(_, _, since float64) (float64, float64) {
			return dark - num.Log10(2)*num.Exp10(since)/halfLife, 0
		}}
}

// ending is a law of an ending for tests.
type ending struct {
	process, effect string
	idle            bool
	hazard          func(date, fourVolume float64) float64
}

func (e ending) Describe() law.Card {
	return law.Card{Process: e.process, Name: "test", Version: "1", Summary: "test", Sources: []string{"test"}, Effect: e.effect, Idle: e.idle,
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date", "log10_four_volume"}}}}
}

func (e ending) Answer(_ string, in law.Batch) (law.Batch, error) {
	date, v4, h := in.Values("log10_date"), in.Values("log10_four_volume"), in.NewValues()
	for i := range h {
		h[i] = e.hazard(date[i], v4[i])
	}
	return in.Answer(law.Numbers("log10_hazard", h)), nil
}

// constantRate comes after a mean of 10^logMean years.
func constantRate(process, effect string, logMean float64) ending {
	return ending{process: process, effect: effect, hazard: func(date, _ float64) float64 { return date - logMean }}
}

// atDate comes at a fixed date.
func atDate(process, effect string, l float64) ending {
	return ending{process: process, effect: effect, hazard: func(date, _ float64) float64 {
		if date >= l {
			return inf
		}
		return math.Inf(-1)
	}}
}

func lambda(t testing.TB, values map[string]float64) *law.Use {
	t.Helper()
	u := law.NewUse(expansion.LambdaCDM())
	for name, v := range values {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	return u
}

func prepare(t testing.TB, uses ...*law.Use) *sky.Prepared {
	t.Helper()
	set, faults := law.NewSet(uses...)
	if faults != nil {
		t.Fatal(faults)
	}
	p, err := sky.Prepare(set)
	if err != nil {
		t.Fatal(err)
	}
	return p
}

func drawn(t testing.TB, uses ...*law.Use) *sky.Sky {
	t.Helper()
	s, err := prepare(t, uses...).Draw(1, 0)
	if err != nil {
		t.Fatal(err)
	}
	return s
}
