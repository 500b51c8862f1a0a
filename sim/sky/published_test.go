package sky_test

import (
	"testing"

	"wane/sim/num"
	"wane/sim/physics/hole"
	"wane/sim/sky"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	type key struct {
		law                   string
		h, om, rad, parameter float64
	}
	skies := map[key]*sky.Sky{}
	for _, r := range published.Rows(t, "sky.csv") {
		k := key{r.Inputs["law"], r.Number(t, "hubble_km_per_s_per_Mpc"), r.Number(t, "matter"), r.Number(t, "radiation"), r.Number(t, "parameter")}
		s := skies[k]
		if s == nil {
			values := map[string]float64{"hubble": k.h, "matter": k.om, "radiation": k.rad}
			if own := expansions()[k.law].own; own != "" {
				values[own] = k.parameter
			}
			s = drawn(t, expanding(t, k.law, values))
			skies[k] = s
		}
		answer, ok := quantity(s, r.Inputs["quantity"], r.Number(t, "at"))
		if !ok {
			t.Fatalf("%s: no quantity %q", r.Where(), r.Inputs["quantity"])
		}
		r.Check(t, answer)
	}
}

func quantity(s *sky.Sky, name string, at float64) (float64, bool) {
	now := s.Now()
	switch name {
	case "age":
		return num.Exp10(now - 9), true
	case "event_horizon":
		return num.Exp10(s.LogEventHorizon(now) - 9), true
	case "particle_horizon":
		return num.Exp10(s.LogParticleHorizon(now) - 9), true
	case "limit_horizon": // what any observer will ever receive: all of conformal time
		return num.Exp10(s.LogParticleHorizon(1e6) - 9), true
	case "log10_a":
		return s.LnA(at) / num.Ln10, true
	case "log10_horizon":
		return s.LogHorizon(at), true
	case "log10_relic":
		return s.LogRelic(at), true
	case "log10_temperature":
		return s.LogTemperature(at), true
	case "log10_colder_than_hole":
		return s.LogColderSince(hole.Log10Temperature(at)), true
	case "log10_four_volume":
		return s.LogFourVolume(at), true
	case "log10_four_volume_rate":
		return s.LogFourVolume(at) - at, true
	case "rip_wait":
		end, _ := s.End()
		return num.Exp10(end-9) - num.Exp10(now-9), true
	}
	return 0, false
}
