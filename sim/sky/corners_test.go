package sky_test

import (
	"fmt"
	"math"
	"slices"
	"testing"

	"wane/sim/law"
	"wane/sim/sky"
)

// Every built-in law of expansion makes a sky with each parameter at each end
// of its range and near -1 where that is special, alone and with dark energy
// decaying, early and late: answers at every date are numbers, what cannot
// fall does not, and the sky does not warm up while it lasts.
func TestEveryCorner(t *testing.T) {
	for name, e := range expansions() {
		card := e.law.Describe()
		settings := []map[string]float64{nil}
		for _, p := range card.Parameters {
			values := []float64{p.Low, p.High}
			if p.Name == "w" {
				sign := math.Copysign(1, p.Low+p.High+2)
				for _, d := range []float64{1e-2, 1e-3, 2e-3} {
					values = append(values, -1+sign*d)
				}
				if sign > 0 {
					values = append(values, -1+1e-5, -1+1e-8, -1+1e-10)
				}
			}
			for _, v := range values {
				settings = append(settings, map[string]float64{p.Name: v})
			}
		}
		for _, values := range settings {
			for _, decay := range []float64{inf, 10.2, 11, 12.5, 20, 40, 1000} {
				uses := []*law.Use{in(t, e.law, values)}
				if decay < inf {
					uses = append(uses, decaysAt(t, decay))
				}
				set, faults := law.NewSet(uses...)
				if faults != nil {
					t.Fatal(faults)
				}
				where := fmt.Sprintf("%s %v, decay at 10^%v yr", name, values, decay)
				p, err := sky.Prepare(set)
				if err != nil {
					t.Errorf("%s: %v", where, err)
					break
				}
				s, err := p.Draw(1, 0)
				if err != nil {
					t.Errorf("%s: %v", where, err)
					continue
				}
				sound(t, where, s)
			}
		}
	}
}

func sound(t *testing.T, where string, s *sky.Sky) {
	t.Helper()
	end, _ := s.End()
	var dates []float64
	for l := 0.0; l < 14; l += 0.0537 {
		dates = append(dates, l)
	}
	for l := 14.0; l < 1e20; l *= 1.3 {
		dates = append(dates, l)
	}
	if d := s.DarkEnergyDecays(); d < inf {
		dates = append(dates, d, d+1e-12, d+1e-6, d-1e-6)
		slices.Sort(dates)
	}
	var before [4]float64
	for j := range before {
		before[j] = math.Inf(-1)
	}
	for _, l := range dates {
		if l > end {
			break
		}
		now := [4]float64{s.LnA(l), s.LogFourVolume(l), s.LogParticleHorizon(l), -s.LogTemperature(l)}
		for j, what := range [4]string{"ln a", "four-volume", "particle horizon", "cold"} {
			if now[j] != before[j] && !(now[j] >= before[j]-1e-9*(1+math.Abs(before[j]))) {
				t.Errorf("%s: %s falls from %v to %v at 10^%v yr", where, what, before[j], now[j], l)
				return
			}
		}
		if h, r := s.LogHubble(l), s.LogEventHorizon(l); h != h || r != r {
			t.Errorf("%s: at 10^%v yr: rate 10^%v, event horizon 10^%v", where, l, h, r)
			return
		}
		before = now
	}
}

// An end of dark energy that is gone already changes nothing, also where space
// has come to rest meanwhile; there the light cone grows as in flat space-time
// at rest, V4 = pi/3 t^4.
func TestDecayOfNothing(t *testing.T) {
	for _, c := range []struct {
		name   string
		values map[string]float64
		dates  []float64
	}{
		{"matter-only", nil, []float64{10.2, 40, 1000}}, {"open", nil, []float64{10.2, 40, 1000}},
		{"decaying-dark-energy", map[string]float64{"half_life": 11}, []float64{14, 40, 1000}},
		{"decaying-dark-energy", map[string]float64{"half_life": 16}, []float64{30, 40, 1000}},
	} {
		plain := drawn(t, expanding(t, c.name, c.values))
		for _, decay := range c.dates {
			s := drawn(t, expanding(t, c.name, c.values), decaysAt(t, decay))
			if got := s.DarkEnergyDecays(); got < inf && decay > 14 {
				t.Errorf("%s %v: dark energy decays at 10^%v yr, of which there is none left", c.name, c.values, got)
			}
			for _, more := range []float64{1e-9, 1e-3, 0.1, 1, 3, 10, 100} {
				l := decay + more
				for what, pair := range map[string][2]float64{
					"rate": {s.LogHubble(l), plain.LogHubble(l)}, "sky": {s.LogTemperature(l), plain.LogTemperature(l)},
					"four-volume": {s.LogFourVolume(l), plain.LogFourVolume(l)}, "particle horizon": {s.LogParticleHorizon(l), plain.LogParticleHorizon(l)},
				} {
					if !(math.Abs(pair[0]-pair[1]) <= 1e-6*(1+math.Abs(pair[1])*1e-6)) {
						t.Errorf("%s %v, decay at 10^%v yr: %s at 10^%v yr is 10^%v, without it 10^%v", c.name, c.values, decay, what, l, pair[0], pair[1])
					}
				}
			}
		}
	}
	s := drawn(t, expanding(t, "decaying-dark-energy", map[string]float64{"half_life": 16}), decaysAt(t, 20))
	if got := s.DarkEnergyDecays(); got != 20 {
		t.Errorf("decays at 10^%v yr, want 10^20", got)
	}
	for _, l := range []float64{40, 139} {
		if got, want := s.LogFourVolume(l), 4*l+math.Log10(math.Pi/3); math.Abs(got-want) > 1e-6 {
			t.Errorf("at rest, 10^%v yr: four-volume 10^%v, want 10^%v", l, got, want)
		}
	}
}
