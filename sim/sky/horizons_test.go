package sky_test

import (
	"math"
	"testing"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/cosmology"
	"wane/sim/sky"
)

// In the default universe 1.219e12 yr (recomputed); and wherever the closed
// form of matter and a constant puts it: T0/a = hbar H/(2 pi k), H = H0
// sqrt(1 - Om) (Weinberg 2008, section 1.5; Gibbons & Hawking 1977).
func TestRelicMeetsHorizon(t *testing.T) {
	if got := drawn(t, lambda(t, nil)).LogRelicMeetsHorizon(); math.Abs(got-12.0860) > 1e-4 {
		t.Errorf("10^%v yr, want 10^12.0860", got)
	}
	for _, c := range []cosmology.Flat{{Hubble: 66, Matter: 0.34}, {Hubble: 70, Matter: 0.3}, {Hubble: 74, Matter: 0.27}} {
		s := drawn(t, lambda(t, map[string]float64{"hubble": c.Hubble, "matter": c.Matter}))
		want := c.LogDateOfRelic(cosmology.LogHorizonTemperature(c.LogHubbleEnd()), 2.7255)
		if got := s.LogRelicMeetsHorizon(); math.Abs(got-want) > 1e-6 {
			t.Errorf("%+v: 10^%v yr, want 10^%v", c, got, want)
		}
	}
}

// With w = -0.9 the horizon cools as 1/t and the relic radiation as
// t^(-2/(3(1+w))), which is faster: they meet, at the date when both are equal.
// After 3 (1+w)/2 = eps has passed 1 they never do.
func TestRelicMeetsFallingHorizon(t *testing.T) {
	s := drawn(t, law.NewUse(constantW(67.66, 0.3111, -0.9)))
	l := s.LogRelicMeetsHorizon()
	if !(l > 12 && l < 1e3) || math.Abs(s.LogRelic(l)-s.LogHorizon(l)) > 1e-9 || s.LogRelic(l-0.01) <= s.LogHorizon(l-0.01) {
		t.Errorf("10^%v yr: relic 10^%v K, horizon 10^%v K", l, s.LogRelic(l), s.LogHorizon(l))
	}
	for name, u := range map[string]*law.Use{
		"matter only": law.NewUse(matterOnly(47.28)), "open": law.NewUse(open(67.66, 0.3111)),
		"rip": law.NewUse(constantW(67.66, 0.3111, -1.5)), "decaying": law.NewUse(decaying(67.66, 0.3111, 1e10)),
	} {
		if got := drawn(t, u).LogRelicMeetsHorizon(); !math.IsInf(got, 1) {
			t.Errorf("%s: 10^%v yr, want never", name, got)
		}
	}
}

// When dark energy decays first, the two never meet; when it decays later,
// they have met as if it did not.
func TestRelicAndDecay(t *testing.T) {
	plain := drawn(t, lambda(t, nil))
	if got := plain.DarkEnergyDecays(); !math.IsInf(got, 1) {
		t.Errorf("decays at 10^%v yr without a law of it", got)
	}
	for _, date := range []float64{10.5, 11.9, 12.3, 40} {
		s := drawn(t, lambda(t, nil), law.NewUse(atDate("dark-energy-decay", sky.DarkEnergyDecays, date)))
		if got := s.DarkEnergyDecays(); math.Abs(got-date) > 1e-12*date {
			t.Errorf("decays at 10^%v yr, want 10^%v", got, date)
		}
		want := plain.LogRelicMeetsHorizon()
		if date < want {
			want = inf
		}
		if got := s.LogRelicMeetsHorizon(); got != want {
			t.Errorf("decay at 10^%v yr: they meet at 10^%v yr, want 10^%v", date, got, want)
		}
		if !math.IsInf(s.LogVisibleLimit(), 1) {
			t.Errorf("decay at 10^%v yr: a limit of 10^%v ly", date, s.LogVisibleLimit())
		}
	}
}

// ln a = H t, whether it is a number or its logarithm alone is one.
func TestLogLnA(t *testing.T) {
	f := cosmology.Flat{Hubble: 67.66, Matter: 0.3111}
	s := drawn(t, lambda(t, nil))
	for _, l := range []float64{14, 40, 300, 400, 1500, 1e20, 1e77} {
		if got, want := s.LogLnA(l), f.LogHubbleEnd()+l; math.Abs(got-want) > 2e-4+1e-15*want {
			t.Errorf("10^%v yr: log10 ln a = %v, want %v", l, got, want)
		}
	}
	if got := s.LogLnA(11); math.Abs(got-num.Log10(f.LnA(11))) > 1e-5 {
		t.Errorf("10^11 yr: log10 ln a = %v, want %v", got, num.Log10(f.LnA(11)))
	}
	if got := s.LogLnA(9); !math.IsInf(got, -1) {
		t.Errorf("while a < 1: %v", got)
	}
	rip := drawn(t, law.NewUse(constantW(67.66, 0.3111, -1.5)))
	if got := rip.LogLnA(20); !math.IsInf(got, 1) {
		t.Errorf("after a rip: %v", got)
	}
}

// Particle horizon and event horizon add up, comoving, to the same limit at
// all dates: 62.97 Gly with photons (recomputed).
func TestVisibleLimit(t *testing.T) {
	s := drawn(t, lambda(t, map[string]float64{"radiation": 5.402e-5}))
	limit := s.LogVisibleLimit()
	if got := num.Exp10(limit - 9); math.Abs(got-62.97) > 0.01 {
		t.Errorf("%v Gly, want 62.97", got)
	}
	for l := 6.0; l < 12; l += 0.17 {
		sum := num.Add10(s.LogParticleHorizon(l), s.LogEventHorizon(l)-s.LnA(l)/num.Ln10)
		if math.Abs(sum-limit) > 2e-6 {
			t.Errorf("10^%v yr: horizons add up to 10^%v ly, the limit is 10^%v", l, sum, limit)
		}
		if got := s.LogHubbleRadius(l); got != -s.LogHubble(l) {
			t.Errorf("10^%v yr: Hubble radius 10^%v ly at 10^%v/yr", l, got, s.LogHubble(l))
		}
	}
	for name, want := range map[string]float64{"ends": 10.5, "ripped": math.NaN()} {
		u := lambda(t, nil)
		uses := []*law.Use{u, law.NewUse(atDate("vacuum-decay", sky.EverythingEnds, want))}
		if name == "ripped" {
			uses = []*law.Use{law.NewUse(constantW(67.66, 0.3111, -1.5))}
		}
		e := drawn(t, uses...)
		end, _ := e.End()
		if got := e.LogVisibleLimit(); got != e.LogParticleHorizon(end) || math.IsInf(got, 0) {
			t.Errorf("%s at 10^%v yr: limit 10^%v ly, particle horizon then 10^%v", name, end, got, e.LogParticleHorizon(end))
		}
	}
	if got := drawn(t, law.NewUse(matterOnly(47.28))).LogVisibleLimit(); !math.IsInf(got, 1) {
		t.Errorf("matter only: 10^%v ly, want no limit", got)
	}
}
