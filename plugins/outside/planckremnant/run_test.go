package main

import (
	"context"
	"fmt"
	"math"
	"os"
	"reflect"
	"testing"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc/folder"
	"wane/sim/scenario"
)

// run runs remnants.toml, smaller than it stands there, with a law at its path.
func run(t *testing.T, l law.Law, workers int, sets ...string) *ensemble.Summary {
	t.Helper()
	files := scenario.Layered(os.DirFS("."), scenarios.FS)
	o := scenario.Overrides{Objects: 20000, Realisations: 3, Sets: sets}
	paths := scenario.Paths(files, "remnants.toml", o)
	if len(paths) != 1 || paths[0].Process != "evaporation" {
		t.Fatalf("laws given by path: %+v, want that of evaporation", paths)
	}
	o.Outside = []scenario.Outside{{Given: paths[0], Law: l}}
	registry, err := plugins.Builtin()
	if err == nil {
		err = registry.Put(l)
	}
	if err != nil {
		t.Fatal(err)
	}
	sc, warnings, err := scenario.Load(files, "remnants.toml", registry, plugins.Defaults(), o)
	if err != nil || len(warnings) > 0 {
		t.Fatal(err, warnings)
	}
	s, err := sim.Run(context.Background(), sc, registry, sim.Options{Workers: workers})
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func population(t *testing.T, s *ensemble.Summary, name string) ensemble.Population {
	t.Helper()
	for _, p := range s.Populations {
		if p.Name == name {
			return p
		}
	}
	t.Fatalf("no population %s", name)
	return ensemble.Population{}
}

// TestHolesLeaveRemnants: each hole that is not swallowed leaves one, none of
// them ever goes, and the holes themselves go as Hawking's do. The heaviest
// hole that the default laws leave, 14.6 solMass, lasts 2.0955e67 yr times the
// cube of its mass (black body).
func TestHolesLeaveRemnants(t *testing.T) {
	s := run(t, planckRemnant{}, 2)
	remnants, holes := population(t, s, "planck-remnants"), population(t, s, "black-holes")
	if !(remnants.PeakCount > 0) || !math.IsNaN(remnants.Last.Date) || !math.IsNaN(remnants.Half.Date) {
		t.Errorf("remnants: %v at the peak, half at %v, last at %v; want some, that never go", remnants.PeakCount, remnants.Half.Date, remnants.Last.Date)
	}
	burned := 0.0
	for _, c := range holes.Causes {
		if c.Outcome == "burned-out" {
			burned = c.Fraction
		}
	}
	// The central hole leaves one too.
	each := s.StandsFor / float64(s.Objects)
	if left := remnants.PeakCount / holes.PeakCount; math.Abs(left-burned) > 0.05+each/holes.PeakCount {
		t.Errorf("remnants are %.3f of the holes, of which %.3f burned out", left, burned)
	}
	if latest := 67.3213 + 3*math.Log10(14.6); holes.Last.Date > latest+0.01 || holes.Last.Date < latest-1 {
		t.Errorf("the last hole goes at 10^%.3f yr, want just before 10^%.3f", holes.Last.Date, latest)
	}
	if central := population(t, s, "central-hole"); math.IsNaN(central.Last.Date) {
		t.Errorf("the central hole never goes: %s", central.Last.Reason)
	}
	if s.LedgerClosesTo > 1e-12 {
		t.Errorf("the mass ledger closes to %v", s.LedgerClosesTo)
	}
}

// TestAlphaSetsThePace: photons and gravitons alone (Page 1976, 3.7474e-5)
// take 1.808 times the power of a black body, so holes go 0.257 dex earlier.
func TestAlphaSetsThePace(t *testing.T) {
	a := population(t, run(t, planckRemnant{}, 2), "black-holes").Half.Date
	b := population(t, run(t, planckRemnant{}, 2, "evaporation.alpha=3.7474e-5"), "black-holes").Half.Date
	if want := math.Log10(3.7474e-5 * 15360 * math.Pi); math.Abs(a-b-want) > 1e-6 {
		t.Errorf("half of the holes go %.6f dex earlier, want %.6f", a-b, want)
	}
}

// TestOutside runs the law in a process of its own, built from its folder, and
// wants the bytes of the law in this process.
func TestOutside(t *testing.T) {
	opened, err := folder.Open(context.Background(), ".", folder.Options{})
	if err != nil {
		t.Fatal(err)
	}
	defer func() {
		if err := opened.Close(); err != nil {
			t.Error(err)
		}
	}()
	if got, want := opened.Law.Describe(), (planckRemnant{}).Describe(); !reflect.DeepEqual(got, want) {
		t.Errorf("the card comes across as\n%+v, want\n%+v", got, want)
	}
	inside := printed(run(t, planckRemnant{}, 1))
	for _, workers := range []int{1, 2} {
		if outside := printed(run(t, opened.Law, workers)); outside != inside {
			t.Errorf("%d workers: outside\n%s\ninside\n%s", workers, outside, inside)
		}
	}
}

// printed is a summary with every digit.
func printed(s *ensemble.Summary) string { return fmt.Sprintf("%+v", *s) }
