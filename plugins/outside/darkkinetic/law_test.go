// Package darkkinetic_test tries the law in this folder, which is in Python.
package darkkinetic_test

import (
	"context"
	"io/fs"
	"math"
	"os"
	"os/exec"
	"testing"

	"wane/plugins"
	kit "wane/plugins/outside/python"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc/folder"
	"wane/sim/scenario"
)

const interpreter = "/usr/bin/python3"

func needs(t *testing.T) {
	t.Helper()
	if out, err := exec.Command(interpreter, "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3-numpy, python3-grpcio, python3-protobuf: %v\n%s", err, out)
		}
		t.Skipf("needs python3-numpy, python3-grpcio, python3-protobuf: %v", err)
	}
}

func opened(t *testing.T) law.Law {
	t.Helper()
	needs(t)
	o, err := folder.Open(context.Background(), ".", folder.Options{})
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() {
		if err := o.Close(); err != nil {
			t.Error(err)
		}
	})
	return o.Law
}

// TestLaw runs the law's own test against what the paper prints.
func TestLaw(t *testing.T) {
	needs(t)
	if out, err := exec.Command(interpreter, "-B", "-m", "unittest", "test_law").CombinedOutput(); err != nil {
		t.Errorf("%v\n%s", err, out)
	}
}

// TestKitIsThatOfTheTree: the folder's copy of the kit has not been left behind.
func TestKitIsThatOfTheTree(t *testing.T) {
	want, err := fs.Glob(kit.Kit, "wanelaw/*")
	if err != nil {
		t.Fatal(err)
	}
	have, err := fs.Glob(os.DirFS("."), "wanelaw/*.py")
	if err != nil || len(have) != len(want) {
		t.Errorf("%d files, want %d (%v)", len(have), len(want), err)
	}
	for _, name := range want {
		a, _ := fs.ReadFile(kit.Kit, name)
		if b, err := os.ReadFile(name); err != nil || string(a) != string(b) {
			t.Errorf("%s differs from that of plugins/outside/python (%v): copy it", name, err)
		}
	}
}

// embers runs embers.toml, smaller than it stands there, with the law of this
// folder or another in its place.
func embers(t *testing.T, l law.Law, o scenario.Overrides) *ensemble.Summary {
	t.Helper()
	files := scenario.Layered(os.DirFS("."), scenarios.FS)
	o.Objects, o.Realisations = 20000, 2
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	for _, given := range scenario.Paths(files, "embers.toml", o) {
		o.Outside = append(o.Outside, scenario.Outside{Given: given, Law: l})
		if err := registry.Put(l); err != nil {
			t.Fatal(err)
		}
	}
	sc, warnings, err := scenario.Load(files, "embers.toml", registry, plugins.Defaults(), o)
	if err != nil || len(warnings) > 0 {
		t.Fatal(err, warnings)
	}
	s, err := sim.Run(context.Background(), sc, registry, sim.Options{Workers: 2})
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

// TestEmbersGlowUntilTheyLeave: warmed so, a neutron star glows exactly as long
// as it is in the halo; without heat, until 10^7.6 yr after its birth (the
// minimal cooling of Gudmundsson et al. 1983, 798 K).
func TestEmbersGlowUntilTheyLeave(t *testing.T) {
	l := opened(t)
	warm, cold := embers(t, l, scenario.Overrides{}), embers(t, l, scenario.Overrides{Laws: []string{"warmth=none"}})
	glow, without := population(t, warm, "glowing-neutron-stars"), population(t, cold, "glowing-neutron-stars")
	if stars := population(t, warm, "neutron-stars"); glow.PeakCount < 0.9*stars.PeakCount {
		t.Errorf("%v neutron stars glow at the peak, of %v", glow.PeakCount, stars.PeakCount)
	}
	t.Logf("half of the glow goes at 10^%.3f yr, without heat at 10^%.3f yr", glow.Half.Date, without.Half.Date)
	if !(glow.Half.Date > 17) {
		t.Errorf("half of the glow goes at 10^%v yr, want with the galaxy", glow.Half.Date)
	}
	if gain := glow.Half.Date - without.Half.Date; !(gain > 4) || math.IsInf(gain, 1) {
		t.Errorf("the fall of dark matter adds %v decades to the glow, want more than 4", gain)
	}
	weak := population(t, embers(t, l, scenario.Overrides{Sets: []string{"warmth.cross_section=1e-48cm2"}}), "glowing-neutron-stars")
	// At 1e-48 cm2 the floor is 284 K, (284/798)^4 = 1.6 % of the flux at 798 K.
	if late := weak.Half.Date - without.Half.Date; !(late >= 0 && late < 1e-3) {
		t.Errorf("at 1e-48 cm2 the glow ends at 10^%v yr, want hardly later than 10^%v", weak.Half.Date, without.Half.Date)
	}
}
