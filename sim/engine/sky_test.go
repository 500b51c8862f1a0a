package engine_test

import (
	"context"
	"math"
	"strings"
	"testing"

	"wane/plugins"
	"wane/sim/engine"
	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/sky"
)

// under is little-lamp under other laws of the sky, with stable nucleons and
// no heat from outside, so that nothing but the sky keeps a cold dwarf warm.
// Parameters are named process.parameter.
func under(t *testing.T, objects int, swap map[string]string, values map[string]float64) engine.Setup {
	t.Helper()
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	choice := plugins.Defaults()
	choice["nucleon-decay"], choice["warmth"] = "stable", "none"
	for process, name := range swap {
		choice[process] = name
	}
	var uses []*law.Use
	for process, name := range choice {
		l, ok := r.Find(process, name)
		if !ok {
			t.Fatalf("no law %s/%s", process, name)
		}
		u := law.NewUse(l)
		for key, v := range values {
			if p, parameter, _ := strings.Cut(key, "."); p == process {
				if err := u.Set(parameter, v); err != nil {
					t.Fatal(err)
				}
			}
		}
		uses = append(uses, u)
	}
	s, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	p, err := sky.Prepare(s)
	if err != nil {
		t.Fatal(err)
	}
	cold := func(name string, above float64) galaxy.Population {
		return galaxy.Population{Name: name, Condition: galaxy.Condition{Kinds: []string{"white-dwarf"},
			Warmth: &galaxy.Warmth{Quantity: "temperature", Above: true, Value: above, Unit: "K"}}}
	}
	return engine.Setup{Set: s, Sky: prepared{p}, Objects: objects, Real: float64(objects), Radius: 30, CentralMass: 30,
		Until: math.Inf(1), Seed: 1, Populations: append(galaxy.Default(), cold("colder than the horizon", 1e-30), cold("warmer", 1e-29))}
}

func outcome(t *testing.T, s engine.Setup) *engine.Outcome {
	t.Helper()
	m, err := engine.Compile(s)
	if err != nil {
		t.Fatal(err)
	}
	o, err := m.NewWorkspace().Run(context.Background(), 0)
	if err != nil {
		t.Fatal(err)
	}
	return o
}

// Under the horizon of the default universe, 2.2e-30 K, no white dwarf ever
// gets colder than 1e-30 K, as long as it is one. Where dark energy decays they
// all do: at that date if they are cold by then, else when they have cooled so
// far themselves, which is the same date under any sky without a horizon. And a
// hole of 1e9 Msun starts to evaporate at 10^11.83 yr, or at 10^35.2 yr where
// dark energy has decayed before (recomputed: see the published endings).
func TestFloorOfTheSky(t *testing.T) {
	forever := math.Inf(1)
	run := func(heavy float64, expansion string, decay float64) (colder, warmer engine.PopulationOutcome) {
		t.Helper()
		swap, values := map[string]string{"expansion": expansion}, map[string]float64{}
		if decay < forever {
			swap["dark-energy-decay"], values["dark-energy-decay.date"] = "fixed", decay
		}
		s := under(t, 300, swap, values)
		compare(t, s, 0) // with the reference
		o := outcome(t, s)
		if math.Abs(o.HeavyStarts-heavy) > 1e-5 {
			t.Errorf("%s, decay at 10^%v yr: a hole of 1e9 Msun starts at 10^%v yr, want 10^%v", expansion, decay, o.HeavyStarts, heavy)
		}
		n := len(o.Populations)
		colder, warmer = o.Populations[n-2], o.Populations[n-1]
		if colder.Peak < 50 || warmer.Peak < 50 {
			t.Fatalf("%s, decay at 10^%v yr: %d and %d white dwarfs, want many", expansion, decay, colder.Peak, warmer.Peak)
		}
		return colder, warmer
	}
	const begun, late, matter = 11.832501, 35.205087, 35.107192
	colder, warmer := run(begun, "lambda-cdm", forever)
	if !(colder.Half > 1000) || !(warmer.Last < 70) {
		t.Errorf("with a horizon: half colder than it at 10^%v yr, the last at 10 times it at 10^%v yr, want never and long before", colder.Half, warmer.Last)
	}
	at300, _ := run(begun, "lambda-cdm", 300)
	if math.Abs(at300.Half-300) > 1e-9 || math.Abs(at300.Last-300) > 1e-9 {
		t.Errorf("decay at 10^300 yr: half of the dwarfs colder at 10^%v yr, the last at 10^%v, want all at 10^300", at300.Half, at300.Last)
	}
	alone, warm := run(matter, "matter-only", forever)
	for _, decay := range []float64{11, 20} {
		heavy := begun
		if decay < begun {
			heavy = late
		}
		got, w := run(heavy, "lambda-cdm", decay)
		if math.Abs(got.Half-alone.Half) > 1e-9 || math.Abs(got.Last-alone.Last) > 1e-9 || math.Abs(w.Last-warm.Last) > 1e-9 {
			t.Errorf("decay at 10^%v yr: dwarfs cool to 1e-30 K at 10^%v and 10^%v yr, to 1e-29 K at 10^%v; in matter alone at 10^%v, 10^%v, 10^%v",
				decay, got.Half, got.Last, w.Last, alone.Half, alone.Last, warm.Last)
		}
	}
	// A floor lower by a factor of 0.22 is felt: 0.24 % of the power.
	if !(warmer.Last > warm.Last+1e-5 && warmer.Last < warm.Last+1e-2) {
		t.Errorf("the horizon's heat is not felt at a fifth of the threshold: 10^%v yr with it, 10^%v without", warmer.Last, warm.Last)
	}
}
