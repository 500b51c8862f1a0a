package sky_test

import (
	"math"
	"strings"
	"testing"

	"wane/plugins/expansion"
	"wane/sim/draw"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/sky"
)

func end(t *testing.T, seed uint64, uses ...*law.Use) (date float64, cause string) {
	t.Helper()
	s, err := prepare(t, uses...).Draw(seed, 3)
	if err != nil {
		t.Fatal(err)
	}
	return s.End()
}

// A constant rate ends at its mean times the draw of its process, whatever
// the mean and whatever other endings are in the run.
func TestEndOfConstantRate(t *testing.T) {
	for _, mean := range []float64{9, 139, 524.7, 1e15, 1e77} {
		e := constantRate("vacuum-decay", sky.EverythingEnds, mean)
		other := constantRate("dark-energy-decay", sky.AllAdrift, 12)
		for seed := uint64(1); seed < 6; seed++ {
			want := mean + num.Log10(draw.New(seed, 3, "vacuum-decay").Exp(0, 0, 0))
			for _, uses := range [][]*law.Use{
				{lambda(t, nil), law.NewUse(e)},
				{lambda(t, nil), law.NewUse(e), law.NewUse(other)},
			} {
				got, cause := end(t, seed, uses...)
				if math.Abs(got-want) > 1e-12*(1+math.Abs(want)) || cause != "vacuum-decay" {
					t.Errorf("mean 10^%v yr: ends at 10^%v yr by %q, want 10^%v yr", mean, got, cause, want)
				}
			}
		}
	}
}

// The dates of a constant rate are exponential: the mean of t/tau over many
// realisations is 1 within 5 standard errors, and so is the share past tau.
func TestEndIsExponential(t *testing.T) {
	const n = 4000
	p := prepare(t, lambda(t, nil), law.NewUse(constantRate("vacuum-decay", sky.EverythingEnds, 139)))
	sum, late := 0.0, 0.0
	for i := range uint64(n) {
		s, err := p.Draw(7, i)
		if err != nil {
			t.Fatal(err)
		}
		date, _ := s.End()
		sum += num.Exp10(date - 139)
		if date > 139 {
			late++
		}
	}
	if mean := sum / n; math.Abs(mean-1) > 5/math.Sqrt(n) {
		t.Errorf("mean %v tau, want 1", mean)
	}
	if share := late / n; math.Abs(share-1/math.E) > 5*math.Sqrt(0.2326/n) {
		t.Errorf("share %v past tau, want 1/e", share)
	}
}

// A rate per four-volume of the light cone, Gamma = tau^-4: with a horizon
// the wait is tau^4/((4 pi/3)(c/H)^3), 10^524.66 yr for tau = 10^139 yr
// (Andreassen, Frost & Schwartz 2018 give tau); without one, P = exp(-0.17136
// (t/tau)^4), whose median is 1.4182 tau.
func TestEndOfFourVolume(t *testing.T) {
	const tau = 139.0
	e := ending{process: "vacuum-decay", effect: sky.EverythingEnds, hazard: func(_, v float64) float64 { return v - 4*tau }}
	for seed := uint64(1); seed < 6; seed++ {
		draw := num.Log10(draw.New(seed, 3, "vacuum-decay").Exp(0, 0, 0))
		got, _ := end(t, seed, lambda(t, nil), law.NewUse(e))
		if want := 524.6554019 + draw; math.Abs(got-want) > 1e-6 {
			t.Errorf("de Sitter: 10^%v yr, want 10^%v", got, want)
		}
		got, _ = end(t, seed, law.NewUse(matterOnly(47.28)), law.NewUse(e))
		if want := tau + (draw-num.Log10(0.1713595993))/4; math.Abs(got-want) > 1e-6 {
			t.Errorf("matter only: 10^%v yr, want 10^%v", got, want)
		}
	}
}

// Endings that never come, are idle, or have no effect leave the sky as it is.
func TestNoEnd(t *testing.T) {
	never := ending{process: "vacuum-decay", effect: sky.EverythingEnds, hazard: func(_, _ float64) float64 { return math.Inf(-1) }}
	saturates := ending{process: "vacuum-decay", effect: sky.EverythingEnds, hazard: func(_, _ float64) float64 { return -30 }}
	idle := constantRate("vacuum-decay", sky.EverythingEnds, 9)
	idle.idle = true
	for name, e := range map[string]ending{"never": never, "saturates": saturates, "idle": idle, "none": constantRate("vacuum-decay", "", 9)} {
		p := prepare(t, lambda(t, nil), law.NewUse(e))
		s, err := p.Draw(1, 2)
		if err != nil {
			t.Fatal(err)
		}
		if date, cause := s.End(); date != inf || cause != "" || s.Adrift() != inf {
			t.Errorf("%s: ends at %v by %q, adrift at %v", name, date, cause, s.Adrift())
		}
		if again, _ := p.Draw(8, 9); e.idle && again != s {
			t.Errorf("%s: a sky that nothing changes is integrated again", name)
		}
	}
}

func TestAdrift(t *testing.T) {
	s := drawn(t, lambda(t, nil), law.NewUse(atDate("vacuum-decay", sky.AllAdrift, 12.25)))
	if got := s.Adrift(); math.Abs(got-12.25) > 1e-12 {
		t.Errorf("adrift at 10^%v yr, want 10^12.25", got)
	}
	if date, _ := s.End(); date != inf {
		t.Errorf("ends at %v", date)
	}
}

// When dark energy decays, what lies before stays as it was, the scale factor
// and both volumes go on without a jump, the horizon's heat is gone, and in
// the end a grows as t^(2/3).
func TestDarkEnergyDecays(t *testing.T) {
	for _, date := range []float64{10.2, 10.5, 11, 11.5, 12} {
		plain := drawn(t, lambda(t, nil))
		s := drawn(t, lambda(t, nil), law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, date)))
		for l := 6.0; l < date; l += 0.1 {
			if s.LnA(l) != plain.LnA(l) || s.LogTemperature(l) != plain.LogTemperature(l) || s.LogFourVolume(l) != plain.LogFourVolume(l) {
				t.Errorf("decay at 10^%v yr changes 10^%v yr", date, l)
			}
		}
		for name, f := range map[string]func(float64) float64{"ln a": s.LnA, "four-volume": s.LogFourVolume, "particle horizon": s.LogParticleHorizon} {
			if jump := f(date+1e-7) - f(date); !(jump >= 0 && jump < 1e-4) {
				t.Errorf("decay at 10^%v yr: %s jumps by %v", date, name, jump)
			}
		}
		if !math.IsInf(s.LogHorizon(date+0.01), -1) || !math.IsInf(s.LogEventHorizon(date-1), 1) {
			t.Errorf("decay at 10^%v yr: the horizon stays", date)
		}
		// H = 2/(3t) and V4 = 0.17136 t^4 far beyond, see [Weinberg 2008].
		for _, l := range []float64{60, 90, 1000} {
			if math.Abs(s.LogHubble(l)+l-num.Log10(2./3)) > 1e-9 {
				t.Errorf("decay at 10^%v yr: H t = %v at 10^%v yr, want 2/3", date, num.Exp10(s.LogHubble(l)+l), l)
			}
			if math.Abs(s.LogFourVolume(l)-4*l-num.Log10(0.1713595993)) > 1e-5 {
				t.Errorf("decay at 10^%v yr: V4 = 10^%v t^4 at 10^%v yr", date, s.LogFourVolume(l)-4*l, l)
			}
		}
	}
}

// After the decay H^2 = H0^2 Om a^-3 exactly, so a^(3/2) grows linearly.
func TestAfterDecayInClosedForm(t *testing.T) {
	const date = 10.8
	s := drawn(t, lambda(t, nil), law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, date)))
	f := s.LnA(date)
	rate := 1.5 * math.Sqrt(0.3111) * 6.91967051e-11 // H0 in 1/yr
	for l := date + 1e-4; l < 14; l += 0.0371 {
		since := num.Exp10(l) - num.Exp10(date)
		want := 2. / 3 * num.Log(num.Exp(1.5*f)+rate*since)
		if got := s.LnA(l); math.Abs(got-want) > 2e-6 {
			t.Errorf("ln a at 10^%v yr = %v, want %v", l, got, want)
		}
	}
}

// A hazard by four-volume goes on under the new sky; one that falls before
// the decay does not feel it.
func TestEndAfterDecay(t *testing.T) {
	decay := law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, 11))
	volume := func(tau float64) *law.Use {
		return law.NewUse(ending{process: "vacuum-decay", effect: sky.EverythingEnds, hazard: func(_, v float64) float64 { return v - 4*tau }})
	}
	draw := num.Log10(draw.New(1, 3, "vacuum-decay").Exp(0, 0, 0))
	got, _ := end(t, 1, lambda(t, nil), decay, volume(139))
	if want := 139 + (draw-num.Log10(0.1713595993))/4; math.Abs(got-want) > 1e-5 {
		t.Errorf("ends at 10^%v yr, want 10^%v", got, want)
	}
	before, _ := end(t, 1, lambda(t, nil), decay, volume(9))
	alone, _ := end(t, 1, lambda(t, nil), volume(9))
	if before != alone || before > 11 {
		t.Errorf("ends at 10^%v yr with and 10^%v yr without a later decay", before, alone)
	}
}

func TestPrepareRefuses(t *testing.T) {
	closed := space{name: "closed", hubble: 70, matter: 2, density: func(_, _, _ float64) (float64, float64) { return math.Inf(-1), -1 }}
	broken := space{name: "broken", hubble: 70, matter: 0.3, density: func(_, _, _ float64) (float64, float64) { return math.NaN(), 0 }}
	wavering := space{name: "wavering", hubble: 70, matter: 0.3, inputs: []string{"log10_date"}, density: func(_, date, _ float64) (float64, float64) {
		return math.Floor(date) - date, 0
	}}
	decays := law.NewUse(constantRate("dark-energy-decay", sky.DarkEnergyDecays, 12))
	odd := law.NewUse(constantRate("vacuum-decay", "everybody-dances", 12))
	for want, uses := range map[string][]*law.Use{
		"no law of process expansion":  {},
		"stops expanding":              {law.NewUse(closed)},
		"log10_dark: got NaN":          {law.NewUse(broken)},
		"neither constant nor a power": {law.NewUse(wavering)},
		"does not read log10_since":    {law.NewUse(constantW(70, 0.3, -0.9)), decays},
		`effect "everybody-dances"`:    {lambda(t, nil), odd},
		"want hubble > 0":              {law.NewUse(matterOnly(0))},
	} {
		set, faults := law.NewSet(uses...)
		if faults != nil {
			t.Fatal(faults)
		}
		if _, err := sky.Prepare(set); err == nil || !strings.Contains(err.Error(), want) {
			t.Errorf("got error %v, want one that says %q", err, want)
		}
	}
	bad := law.NewUse(ending{process: "vacuum-decay", effect: sky.EverythingEnds, hazard: func(_, _ float64) float64 { return math.NaN() }})
	if _, err := prepare(t, law.NewUse(expansion.LambdaCDM()), bad).Draw(1, 1); err == nil {
		t.Error("a hazard of NaN is accepted")
	}
}
