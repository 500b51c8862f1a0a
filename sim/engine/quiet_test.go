package engine_test

import (
	"fmt"
	"math"
	"testing"

	"pgregory.net/rapid"

	"wane/sim/engine"
	"wane/sim/engine/enginetest"
	"wane/sim/law"
)

// Galaxies of thousands, in which the clocks hardly move while stars still
// die: the fast engine leaves most objects out of that time, leaves out
// entries of clocks that come second, and holds little.
func TestSlowGalaxies(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		compare(t, slow(t), rapid.Uint64Range(0, 3).Draw(t, "realisation"))
	})
}

func slow(t *rapid.T) engine.Setup {
	chance := func(p float64, label string) bool { return rapid.Float64Range(0, 1).Draw(t, label) < p }
	between := func(a, b float64, label string) float64 { return rapid.Float64Range(a, b).Draw(t, label) }
	fates := []law.Fate{law.FateAdrift, law.FateCentral, law.FateGas}
	f := enginetest.Frame{}
	for k := range rapid.IntRange(1, 3).Draw(t, "clocks") {
		name := fmt.Sprintf("clock%d", k)
		f.Clocks = append(f.Clocks, law.Clock{Name: name, Outcome: "hit-" + name, Fate: rapid.SampledFrom(fates).Draw(t, "fate")})
		r := enginetest.Rates{Log10: between(-9, -5, name)}
		if chance(0.7, "hangs on number") {
			r.Number = between(-1.5, 1.5, "power")
		}
		if chance(0.15, "hangs on date") {
			r.Date = between(-0.5, 0.9, "power of date") // may outrun the bound on a quiet time
		}
		if chance(0.15, "hangs on mass") {
			r.Mass = between(-1.5, 1.5, "power of mass")
		}
		f.Rates = append(f.Rates, r)
		f.Touches = append(f.Touches, touch(t, name))
	}
	if chance(0.5, "stops") {
		f.StopAt = between(0.01, 0.3, "stop at")
		f.StopFate = rapid.SampledFrom(fates).Draw(t, "stop fate")
	}
	laws := []*enginetest.Law{
		enginetest.Masses(0.1, 10), enginetest.Births(1, between(1.5, 3, "last birth")), enginetest.Metals(false), enginetest.Sort(0.15),
		enginetest.Lifetimes(between(2, 4, "life"), between(0, 2, "slope"), rapid.SampledFrom([]float64{0, 0, 0.3}).Draw(t, "immortal")),
		enginetest.Remnants(), f.Law(),
	}
	if chance(0.4, "infall") {
		in := enginetest.Infall{Rates: enginetest.Rates{Log10: between(-9, -6, "fall"), Number: 1}, Touch: touch(t, "fall"), Share: 0.3}
		if chance(0.7, "divert") {
			in.Divert = []string{"clock0"}
		}
		laws = append(laws, in.Law())
	}
	if chance(0.25, "encounters") {
		laws = append(laws, enginetest.Meeting{Names: []string{"meet0"},
			Rates: []enginetest.Rates{{Log10: between(-8, -5, "meet"), Number: between(-1, 2, "meet power")}},
			Seeks: []enginetest.Touch{touch(t, "seeks")}, Sought: []enginetest.Touch{touch(t, "sought")}}.Law())
	}
	if chance(0.5, "decay") {
		laws = append(laws, enginetest.Wearing{Process: "nucleon-decay", Kinds: []string{"white-dwarf", "neutron-star", "relic"},
			Log10: between(-14, -8, "decay rate"), Power: 1, Closed: true,
			New: []law.Kind{{Name: "relic", Doc: "what is left", Composition: law.Iron}},
			Thresholds: []law.Threshold{
				{Kind: "white-dwarf", Mass: 0.1, Becomes: law.Gone, Outcome: "dissolved"},
				{Kind: "neutron-star", Mass: 0.2, Becomes: "relic", Outcome: "expanded"},
				{Kind: "relic", Mass: 0.1, Becomes: law.Gone, Outcome: "dissolved"},
			}}.Law())
	}
	n := rapid.IntRange(120, 500).Draw(t, "objects")
	s := engine.Setup{Set: set(t, laws...), Objects: n, Real: float64(n), Radius: 1, Until: math.Inf(1),
		Seed: rapid.Uint64().Draw(t, "seed"), Populations: populations()[:9]}
	if chance(0.3, "sample") {
		s.Real *= 1e6
	}
	return s
}
