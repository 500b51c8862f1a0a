package sky_test

import (
	"math"
	"slices"
	"testing"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/cosmology"
	"wane/sim/sky"
)

// skies are backgrounds of every sort.
func skies(t testing.TB) map[string]*sky.Sky {
	decay := func(l float64) *law.Use { return law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, l)) }
	return map[string]*sky.Sky{
		"default":           drawn(t, lambda(t, nil)),
		"radiation":         drawn(t, lambda(t, map[string]float64{"radiation": 2e-4})),
		"w -0.9":            drawn(t, law.NewUse(constantW(67.66, 0.3111, -0.9))),
		"w -0.9999":         drawn(t, law.NewUse(constantW(67.66, 0.3111, -0.9999))),
		"w -0.5":            drawn(t, law.NewUse(constantW(67.66, 0.3111, -0.5))),
		"w -1.0001":         drawn(t, law.NewUse(constantW(67.66, 0.3111, -1.0001))),
		"w -1.5":            drawn(t, law.NewUse(constantW(70, 0.3, -1.5))),
		"matter only":       drawn(t, law.NewUse(matterOnly(47.28))),
		"open":              drawn(t, law.NewUse(open(67.66, 0.3))),
		"half in 1e10 yr":   drawn(t, law.NewUse(decaying(67.66, 0.3111, 1e10))),
		"half in 1e13 yr":   drawn(t, law.NewUse(decaying(67.66, 0.3111, 1e13))),
		"decay at 10^11":    drawn(t, lambda(t, nil), decay(11)),
		"decay at 10^15":    drawn(t, lambda(t, nil), decay(15)),
		"decay at 10^100":   drawn(t, lambda(t, nil), decay(100)),
		"decay at 10^1100":  drawn(t, lambda(t, nil), decay(1100)),
		"fading from 10^11": drawn(t, law.NewUse(fading(67.66, 0.3111, 5e10)), decay(11)),
		"fading from 10^14": drawn(t, law.NewUse(fading(67.66, 0.3111, 1e9)), decay(14)),
		"fading slowly":     drawn(t, law.NewUse(fading(67.66, 0.3111, 1e20)), decay(40)),
	}
}

// No answer is NaN at any date, and what cannot fall does not fall: the scale
// factor, the particle horizon, the four-volume; nor does the sky warm up.
func TestEveryDate(t *testing.T) {
	var dates []float64
	for l := -300.0; l < 20; l += 0.0137 {
		dates = append(dates, l)
	}
	for _, d := range []float64{11, 14, 15, 100, 300, 1100} {
		for _, e := range []float64{0, 1e-14, 1e-12, 1e-9, 1e-6, 1e-3, 0.1} {
			dates = append(dates, d+e, d-e)
		}
	}
	for l := 20.0; l < 1e300; l *= 1.07 {
		dates = append(dates, l)
	}
	dates = append(dates, 1e300)
	slices.Sort(dates)
	for name, s := range skies(t) {
		answers := map[string]func(float64) float64{
			"ln a": s.LnA, "particle horizon": s.LogParticleHorizon, "four-volume": s.LogFourVolume,
			"cold":   func(l float64) float64 { return -s.LogTemperature(l) },
			"Hubble": s.LogHubble, "event horizon": s.LogEventHorizon, "horizon's heat": s.LogHorizon, "relic": s.LogRelic,
		}
		for what, f := range answers {
			before := math.Inf(-1)
			for _, l := range dates {
				v := f(l)
				if v != v {
					t.Errorf("%s: %s at 10^%v yr is NaN", name, what, l)
					break
				}
				rises := what == "ln a" || what == "particle horizon" || what == "four-volume" || what == "cold"
				if rises && v < before-1e-9*(1+math.Abs(before)) {
					t.Errorf("%s: %s falls from %v to %v at 10^%v yr", name, what, before, v, l)
					break
				}
				before = v
			}
		}
	}
}

// LogColderSince undoes LogTemperature, wherever that falls.
func TestColderSince(t *testing.T) {
	for name, s := range skies(t) {
		for l := -20.0; l < 40; l += 0.0473 {
			at := s.LogTemperature(l)
			since := s.LogColderSince(at)
			if math.IsInf(at, -1) || s.LogTemperature(l+1e-3) > at-1e-7 { // as cold as it gets
				continue
			}
			if !(math.Abs(since-l) < 1e-7) {
				t.Errorf("%s: 10^%v K at 10^%v yr, but colder since 10^%v yr", name, at, l, since)
			}
		}
		if got := s.LogColderSince(inf); !math.IsInf(got, -1) {
			t.Errorf("%s: colder than +Inf since %v, want always", name, got)
		}
		if got := s.LogColderSince(math.Inf(-1)); !math.IsInf(got, 1) {
			t.Errorf("%s: colder than nothing since %v, want never", name, got)
		}
	}
	s := drawn(t, lambda(t, nil))
	floor := s.LogHorizon(30)
	for logT, want := range map[float64]float64{floor - 1e-9: inf, floor: inf} {
		if got := s.LogColderSince(logT); got != want {
			t.Errorf("colder than 10^%v K since 10^%v yr, want never: the horizon is as warm", logT, got)
		}
	}
	if got := s.LogColderSince(floor + 1e-9); !(got > 12.08 && got < 12.2) {
		t.Errorf("just above the horizon's heat: since 10^%v yr", got)
	}
	// A decay of dark energy takes the floor away at its date.
	s = drawn(t, lambda(t, nil), law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, 100)))
	if got := s.LogColderSince(floor - 5); math.Abs(got-100) > 1e-9 {
		t.Errorf("without its horizon the sky is colder since 10^%v yr, want 10^100", got)
	}
}

// The closed form of matter and a constant, at dates between nodes.
func TestInterpolation(t *testing.T) {
	s, f := drawn(t, lambda(t, nil)), cosmology.Flat{Hubble: 67.66, Matter: 0.3111}
	worst := 0.0
	for l := 0.0; l < 12.3; l += 0.00173 {
		worst = math.Max(worst, math.Abs(s.LnA(l)-f.LnA(l))/math.Max(1, s.LnA(l)))
	}
	t.Logf("largest difference of ln a: %.2g", worst)
	if worst > 1e-6 {
		t.Errorf("ln a is off by %v, want 1e-6", worst)
	}
}

// A power law stays one: H t = 2/(3(1+w)) for dark energy of constant w > -1,
// 1 in open space; and the event horizon is c/H/(1 - 1/(H t)).
func TestPowerLawTails(t *testing.T) {
	all := skies(t)
	for name, p := range map[string]float64{"w -0.9": 2 / 0.3, "w -0.5": 2 / 1.5, "matter only": 2. / 3, "open": 1, "half in 1e10 yr": 2. / 3} {
		s := all[name]
		for _, l := range []float64{40, 80, 1e4} {
			if got := s.LogHubble(l) + l; math.Abs(got-num.Log10(p)) > 1e-8 {
				t.Errorf("%s: H t = %v at 10^%v yr, want %v", name, num.Exp10(got), l, p)
			}
			want := inf
			if p > 1 {
				want = -num.Log10(1 - 1/p)
			}
			if got := s.LogEventHorizon(l) + s.LogHubble(l); got != want && !(math.Abs(got-want) < 1e-8) {
				t.Errorf("%s: event horizon 10^%v c/H at 10^%v yr, want 10^%v", name, got, l, want)
			}
		}
	}
}

// A rip ends the sky, and says so.
func TestRip(t *testing.T) {
	s := drawn(t, law.NewUse(constantW(70, 0.3, -1.5)))
	date, cause := s.End()
	if cause != sky.Rip || math.Abs(date-10.55567214) > 1e-7 { // mpmath, 10 digits: see the rip in published values
		t.Errorf("ends at 10^%v yr by %q", date, cause)
	}
	if got := s.LnA(date + 1e-9); !math.IsInf(got, 1) {
		t.Errorf("ln a after the rip = %v, want +Inf", got)
	}
}

// Draw costs nothing when nothing random changes the sky.
func TestDrawAllocatesNothing(t *testing.T) {
	p := prepare(t, lambda(t, nil))
	s, _ := p.Draw(1, 1)
	if n := testing.AllocsPerRun(100, func() {
		s, _ = p.Draw(2, 3)
		s.LogColderSince(-8)
		s.LogTemperature(11.3)
	}); n != 0 {
		t.Errorf("%v allocations", n)
	}
}

func BenchmarkPrepare(b *testing.B) {
	set, _ := law.NewSet(lambda(b, nil))
	for b.Loop() {
		if _, err := sky.Prepare(set); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkDrawWithDecay(b *testing.B) {
	p := prepare(b, lambda(b, nil), law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, 11)))
	for i := uint64(0); b.Loop(); i++ {
		if _, err := p.Draw(1, i); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkLogTemperature(b *testing.B) {
	s := drawn(b, lambda(b, nil))
	l := 10.0
	for b.Loop() {
		s.LogTemperature(l)
		if l += 0.001; l > 13 {
			l = 10
		}
	}
}

func BenchmarkLogColderSince(b *testing.B) {
	s := drawn(b, lambda(b, nil))
	for b.Loop() {
		s.LogColderSince(-8)
	}
}
