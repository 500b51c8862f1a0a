package engine_test

import (
	"math"
	"strings"
	"testing"

	"wane/sim/engine"
	"wane/sim/engine/reference"
)

// named is a population's outcome.
func named(t *testing.T, r *reference.Result, s engine.Setup, name string) engine.PopulationOutcome {
	t.Helper()
	for i, p := range s.Populations {
		if p.Name == name {
			return r.Populations[i]
		}
	}
	t.Fatalf("no population %q", name)
	return engine.PopulationOutcome{}
}

// TestWearingLawsTogether runs the laws that wear the same objects, and those of
// holes, through both engines, and holds what they do together to closed forms
// and to the published order of their times.
func TestWearingLawsTogether(t *testing.T) {
	run := func(swap map[string]string) (*reference.Result, engine.Setup) {
		s := builtin(t, 300, 300, 30, 30, swap)
		return compare(t, s, 1), s
	}
	last := func(swap map[string]string) (float64, map[string]int64) {
		r, s := run(swap)
		p := named(t, r, s, "white-dwarfs")
		return p.Last, p.Left
	}
	alone, _ := last(map[string]string{"nucleon-decay": "stable", "curvature": "falcke"})
	both, left := last(map[string]string{"nucleon-decay": "sphaleron", "curvature": "falcke"})
	// The kink of the rate at 1e-3 Msun lies inside a panel of the integral, which
	// costs it up to 1e-4 of the wait, 6e-5 dex; alone the law's closed form is used.
	if math.Abs(both-alone) > 6e-5 || left["curvature:thinned-out"] == 0 || left["nucleon-decay:dissolved"] > 0 {
		t.Errorf("curvature beside decay in 1e141 yr: last dwarf 10^%.6f yr, alone 10^%.6f yr; left by %v", both, alone, left)
	}
	alone, _ = last(map[string]string{"nucleon-decay": "grand-unified"})
	both, left = last(map[string]string{"nucleon-decay": "grand-unified", "curvature": "falcke"})
	if math.Abs(both-alone) > 1e-9 || left["curvature:thinned-out"] > 0 || left["nucleon-decay:dissolved"] == 0 {
		t.Errorf("decay in 1e37 yr beside curvature: last dwarf 10^%.6f yr, alone 10^%.6f yr; left by %v", both, alone, left)
	}
	for _, swap := range []map[string]string{
		{"nucleon-decay": "virtual-holes", "curvature": "falcke-fixed-density", "evaporation": "remnant"},
		{"nucleon-decay": "higher-dimension", "evaporation": "memory-burden"},
		{"evaporation": "page-kerr"}, {"evaporation": "extra-light-species"}, {"evaporation": "none"},
		{"evaporation": "three-neutrinos"}, {"evaporation": "lightest-neutrino-massless"},
	} {
		run(swap)
	}
}

// TestRatesAdd holds two laws by which a body loses its mass in proportion, set
// to one time each, to the closed form: the rates add.
func TestRatesAdd(t *testing.T) {
	set := func(s engine.Setup, process, parameter string, value float64) {
		if err := s.Set.Of(process).Set(parameter, value); err != nil {
			t.Fatal(err)
		}
	}
	swap := map[string]string{"nucleon-decay": "virtual-holes", "curvature": "falcke-fixed-density"}
	together := builtin(t, 300, 300, 30, 30, swap)
	// A power that makes tau 1e83 yr, between the times of light and heavy dwarfs.
	set(together, "nucleon-decay", "power", 5.9983)
	for _, word := range []float64{0, 2} { // transparent, last-nucleon
		set(together, "nucleon-decay", "gone", word)
		set(together, "curvature", "gone", word)
		r := compare(t, together, 1)
		swap["nucleon-decay"] = "stable"
		curved := builtin(t, 300, 300, 30, 30, swap)
		set(curved, "curvature", "gone", word)
		c := compare(t, curved, 1)
		swap = map[string]string{"nucleon-decay": "virtual-holes"}
		decaying := builtin(t, 300, 300, 30, 30, swap)
		set(decaying, "nucleon-decay", "power", 5.9983)
		set(decaying, "nucleon-decay", "gone", word)
		d := compare(t, decaying, 1)
		seen := 0
		for i, h := range r.Histories {
			if len(h) == 0 || h[len(h)-1].Date < 60 || len(c.Histories[i]) != len(h) || len(d.Histories[i]) != len(h) {
				continue
			}
			end := func(x *reference.Result) float64 { return x.Histories[i][len(h)-1].Date }
			// 1/t = 1/t1 + 1/t2, from the same mass to the same mass.
			want := -math.Log10(math.Pow(10, -end(c)) + math.Pow(10, -end(d)))
			if from := h[len(h)-1].From; !strings.Contains(from, "white-dwarf") && !strings.Contains(from, "brown-dwarf") {
				continue // a relic's end is the second of two waits
			}
			if seen++; math.Abs(end(r)-want) > 1e-9 {
				t.Errorf("object %d: together 10^%.9f yr, by the closed form 10^%.9f yr", i, end(r), want)
			}
		}
		if seen < 100 {
			t.Errorf("only %d objects compared", seen)
		}
		swap = map[string]string{"nucleon-decay": "virtual-holes", "curvature": "falcke-fixed-density"}
	}
}
