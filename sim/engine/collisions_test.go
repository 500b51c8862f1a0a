package engine_test

import (
	"testing"

	"wane/sim/engine"
)

// Galaxies so dense, or so slow to dissolve, that nearly everything collides
// under the built-in law: both engines tell the same story, in which stars are
// made of others, live and die.
func TestCollidingGalaxies(t *testing.T) {
	for _, x := range []struct {
		name     string
		s        engine.Setup
		meetings int64
		merged   bool
	}{
		{"while stars live", builtin(t, 1500, 1500, 0.05, 30, map[string]string{"ejection": "none"}), 500, true},
		{"when stars are dead", builtin(t, 1500, 1500, 30, 30, map[string]string{"ejection": "none"}), 500, true},
		{"until everything is one", builtin(t, 400, 400, 3, 0, map[string]string{"ejection": "none", "nucleon-decay": "stable", "infall": "none"}), 200, false},
		{"contracting", builtin(t, 2500, 2e9, 1, 30, nil), 300, false},
		{"balanced", builtin(t, 1000, 2e9, 1, 30, map[string]string{"ejection": "balanced"}), 100, false},
		{"seven clocks", builtin(t, 500, 2e9, 1, 30, map[string]string{"ejection": "balanced", "infall": "loss-cone"}), 30, false},
	} {
		t.Run(x.name, func(t *testing.T) {
			for realisation := range uint64(2) {
				got := compare(t, x.s, realisation)
				stars := int64(0)
				for i, p := range x.s.Populations {
					if p.Name == "merged-stars" {
						stars = got.Populations[i].Peak
					}
				}
				t.Logf("fired %v, merged stars at most %d", got.Fired, stars)
				if got.Fired["encounter"] < x.meetings || x.merged && stars == 0 {
					t.Errorf("%d meetings, at most %d merged stars", got.Fired["encounter"], stars)
				}
			}
		})
	}
}
