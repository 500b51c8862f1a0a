package engine_test

import (
	"math"
	"testing"

	"wane/plugins"
	"wane/sim/engine"
	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/sky"
)

// builtin is a galaxy of the default laws; swap names other laws by process.
func builtin(t testing.TB, objects int, stands, radius, central float64, swap map[string]string) engine.Setup {
	t.Helper()
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	var uses []*law.Use
	for process, name := range plugins.Defaults() {
		if other, ok := swap[process]; ok {
			name = other
		}
		l, ok := r.Find(process, name)
		if !ok {
			t.Fatalf("no law %s/%s", process, name)
		}
		uses = append(uses, law.NewUse(l))
	}
	s, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	p, err := sky.Prepare(s)
	if err != nil {
		t.Fatal(err)
	}
	return engine.Setup{Set: s, Sky: prepared{p}, Objects: objects, Real: stands, Radius: radius, CentralMass: central,
		Until: math.Inf(1), Seed: 1, Populations: galaxy.Default()}
}

type prepared struct{ *sky.Prepared }

func (p prepared) Draw(seed, realisation uint64) (engine.Sky, error) {
	return p.Prepared.Draw(seed, realisation)
}

// A dwarf companion held whole, as in the scenario of that name, and the same
// with the other built-in laws.
func TestBuiltinLaws(t *testing.T) {
	for _, x := range []struct {
		name string
		s    engine.Setup
	}{
		{"contracting", builtin(t, 2000, 2000, 30, 30, nil)},
		{"balanced", builtin(t, 2000, 2000, 30, 30, map[string]string{"ejection": "balanced"})},
		{"black bodies, stable nucleons", builtin(t, 1500, 1500, 30, 30, map[string]string{"evaporation": "black-body", "nucleon-decay": "stable", "warmth": "none"})},
		{"sample", builtin(t, 1000, 2e11, 7800, 4.3e6, nil)},
		{"stable matter", builtin(t, 1500, 1500, 30, 30, map[string]string{"nucleon-decay": "stable"})},
		{"stable matter, other ends", builtin(t, 1500, 1500, 30, 30, map[string]string{"nucleon-decay": "stable", "supernova": "zero-temperature-lattice", "tunnelling": "planck-speck", "evaporation": "none"})},
		{"stable matter, no iron", builtin(t, 1500, 1500, 30, 30, map[string]string{"nucleon-decay": "stable", "iron": "none", "infall": "loss-cone", "ejection": "fixed-radius"})},
		{"nothing thrown out, other cooling", builtin(t, 1000, 1000, 30, 30, map[string]string{"ejection": "none", "infall": "none", "white-dwarf-cooling": "mestel-forever", "neutron-star-cooling": "none", "brown-dwarf-cooling": "none"})},
		{"held by a halo", builtin(t, 1500, 1500, 30, 30, map[string]string{"ejection": "fixed-halo", "white-dwarf-cooling": "barrow-tipler", "encounter": "none"})},
		{"few", builtin(t, 3, 3, 30, 0, nil)},
		{"one", builtin(t, 1, 1, 30, 1, nil)},
		{"none", builtin(t, 0, 0, 30, 1, nil)},
	} {
		t.Run(x.name, func(t *testing.T) { compare(t, x.s, 0) })
	}
}

// A galaxy small enough to relax while its stars still die.
func TestSmallGalaxy(t *testing.T) {
	n := 10000
	if testing.Short() {
		n = 2500
	}
	compare(t, builtin(t, n, float64(n), 30, 30, nil), 3)
}

func TestDefaultGalaxy(t *testing.T) {
	if testing.Short() {
		t.Skip("a run of the reference with 1e5 objects")
	}
	compare(t, builtin(t, 100000, 2e11, 7800, 4.3e6, nil), 0)
}
