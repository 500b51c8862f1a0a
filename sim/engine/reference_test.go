package engine_test

import (
	"context"
	"fmt"
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"wane/sim/engine"
	"wane/sim/engine/enginetest"
	"wane/sim/engine/reference"
	"wane/sim/galaxy"
	"wane/sim/law"
)

// exact is how well dates must agree, relative to the date itself, and never
// asked closer than a part in 10^12 of a year's log10 unit.
const exact = 1e-12

func agree(a, b, tol float64) bool {
	if a == b || math.IsNaN(a) && math.IsNaN(b) {
		return true
	}
	return math.Abs(a-b) <= tol*max(1, math.Abs(b))
}

// failer is what testing.T and rapid.T have in common.
type failer interface {
	Fatalf(format string, args ...any)
	Helper()
}

// compare runs a realisation through both engines and holds every date, state,
// cause, count and sum of the one to those of the other.
func compare(t failer, s engine.Setup, realisation uint64) *reference.Result {
	t.Helper()
	m, err := engine.Compile(s)
	if err != nil {
		t.Fatalf("compile: %v", err)
	}
	return compareWith(t, m.NewWorkspace(), s, realisation)
}

func compareWith(t failer, w *engine.Workspace, s engine.Setup, realisation uint64) *reference.Result {
	t.Helper()
	want, err := reference.Run(s, realisation)
	if err != nil {
		t.Fatalf("reference: %v", err)
	}
	got, err := w.Run(context.Background(), realisation)
	if err != nil {
		t.Fatalf("engine: %v", err)
	}
	histories := w.Histories(got.End)
	for i, h := range histories {
		r := want.Histories[i]
		for j := range max(len(h), len(r)) {
			if j >= len(h) || j >= len(r) || h[j].From != r[j].From || h[j].To != r[j].To || h[j].Cause != r[j].Cause ||
				!agree(h[j].Date, r[j].Date, exact) {
				t.Fatalf("object %d, change %d:\n got  %v\n want %v", i, j, h, r)
			}
		}
	}
	for i, p := range s.Populations {
		a, b := got.Populations[i], want.Populations[i]
		tol := exact
		if p.Warmth != nil {
			tol = warmExact
		}
		same := a.Peak == b.Peak && a.Remaining == b.Remaining && fmt.Sprint(a.Left) == fmt.Sprint(b.Left) &&
			a.CutHalf == b.CutHalf && a.CutHundredth == b.CutHundredth && a.CutLast == b.CutLast &&
			agree(a.Half, b.Half, tol) && agree(a.Hundredth, b.Hundredth, tol) && agree(a.Last, b.Last, tol) &&
			agree(a.PeakDate, b.PeakDate, tol)
		if !same {
			t.Fatalf("population %s:\n got  %+v\n want %+v", p.Name, a, b)
		}
	}
	if x, y, all := got.Ledger, want.Ledger, want.Ledger.Founded; !closeTo(x.Founded, y.Founded, all) || !closeTo(x.Bound, y.Bound, all) ||
		!closeTo(x.Adrift, y.Adrift, all) || !closeTo(x.Central, y.Central, all) || !closeTo(x.Gas, y.Gas, all) || !closeTo(x.Radiated, y.Radiated, all) {
		t.Fatalf("ledger:\n got  %+v\n want %+v", x, y)
	}
	if got.Ledger.Closes() > exact {
		t.Fatalf("the ledger is %v off", got.Ledger.Closes())
	}
	if fmt.Sprint(got.Fired) != fmt.Sprint(want.Fired) {
		t.Fatalf("fired: got %v, want %v", got.Fired, want.Fired)
	}
	if !agree(got.StoppedAt, want.StoppedAt, exact) || got.End != want.End || got.EndCause != want.EndCause {
		t.Fatalf("end: got %v %v %v, want %v %v %v", got.StoppedAt, got.End, got.EndCause, want.StoppedAt, want.End, want.EndCause)
	}
	return want
}

// warmExact is how well dates of cooling must agree: both engines find them as
// roots.
const warmExact = 1e-12

// closeTo compares parts of a mass that add up to all: small ones are what
// rounding leaves of differences of large ones.
func closeTo(a, b, all float64) bool {
	return math.Abs(a-b) <= max(1e-10*max(1, math.Abs(b)), 1e-15*all)
}

// populations are those that every run counts, and some that are hard to.
func populations() []galaxy.Population {
	warm := func(quantity string, above bool, value float64, unit string) *galaxy.Warmth {
		return &galaxy.Warmth{Quantity: quantity, Above: above, Value: value, Unit: unit}
	}
	return append(galaxy.Default(),
		galaxy.Population{Name: "merged-dwarfs", Condition: galaxy.Condition{Kinds: []string{"white-dwarf", "brown-dwarf"}, Origins: []string{"merged"}}},
		galaxy.Population{Name: "relics", Condition: galaxy.Condition{Kinds: []string{"relic"}}},
		galaxy.Population{Name: "bound-remnants", Condition: galaxy.Condition{Kinds: []string{"white-dwarf", "neutron-star"}, Places: []string{"bound"}}},
		galaxy.Population{Name: "warm-bound", Condition: galaxy.Condition{Places: []string{"bound"}, Warmth: warm("temperature", true, 3000, "K")}},
		galaxy.Population{Name: "cold", Condition: galaxy.Condition{Kinds: []string{"white-dwarf", "star", "brown-dwarf"}, Warmth: warm("temperature", false, 2000, "K")}},
		galaxy.Population{Name: "bright", Condition: galaxy.Condition{Kinds: []string{"white-dwarf", "star"}, Warmth: warm("luminosity", true, 1e-4, "solLum")}},
		galaxy.Population{Name: "above-floor", Condition: galaxy.Condition{Kinds: []string{"white-dwarf"}, Warmth: warm("temperature", true, 2, "floor")}},
	)
}

type skies struct{ enginetest.Sky }

func (s skies) Draw(_, _ uint64) (engine.Sky, error) { return s.Sky, nil }

// set makes a set of laws, and fails where their cards do.
func set(t failer, laws ...*enginetest.Law) *law.Set {
	t.Helper()
	var uses []*law.Use
	for _, l := range laws {
		if l == nil {
			continue
		}
		if faults := law.CheckCard(l.Describe()); len(faults) > 0 {
			t.Fatalf("%s: %v", l.Describe().Process, faults)
		}
		uses = append(uses, law.NewUse(l))
	}
	s, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatalf("%v", faults)
	}
	if faults := law.CheckCoverage(s); len(faults) > 0 {
		t.Fatalf("%v", faults)
	}
	return s
}

func TestRandomScenarios(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := scenario(t)
		if _, err := engine.Compile(s); err != nil && strings.Contains(err.Error(), "at most 16") {
			t.Skip(err) // more declared values than an engine holds
		}
		compare(t, s, rapid.Uint64Range(0, 3).Draw(t, "realisation"))
	})
}

// scenario draws a galaxy and laws for it.
func scenario(t *rapid.T) engine.Setup {
	chance := func(p float64, label string) bool { return rapid.Float64Range(0, 1).Draw(t, label) < p }
	between := func(a, b float64, label string) float64 { return rapid.Float64Range(a, b).Draw(t, label) }
	laws := []*enginetest.Law{
		enginetest.Masses(between(0.02, 1, "lightest"), between(1.5, 60, "heaviest")),
		enginetest.Births(between(1, 2, "first"), between(2.5, 3.5, "last")),
		enginetest.Metals(chance(0.3, "metals")),
		enginetest.Sort(rapid.SampledFrom([]float64{0, 0.08, 0.5, 100}).Draw(t, "limit")),
		enginetest.Lifetimes(between(2, 6, "life"), between(0, 3, "slope"), rapid.SampledFrom([]float64{0, 0, 0, 0.3}).Draw(t, "immortal")),
		enginetest.Remnants(),
	}
	if chance(0.8, "cooling") {
		laws = append(laws, enginetest.Cooling("white-dwarf-cooling", "white-dwarf", between(0.1, 0.4, "cooling slope")))
		laws = append(laws, enginetest.Cooling("brown-dwarf-cooling", "brown-dwarf", between(0.1, 0.4, "cooling slope")))
	}
	if chance(0.3, "warmth") {
		laws = append(laws, enginetest.Warmth(num10(between(15, 24, "power"))))
	}
	laws = append(laws, dynamics(t)...)
	laws = append(laws, endings(t)...)
	n := rapid.OneOf(rapid.IntRange(0, 3), rapid.IntRange(4, 30), rapid.IntRange(4, 30), rapid.IntRange(96, 104), rapid.IntRange(105, 160)).Draw(t, "objects")
	s := engine.Setup{Set: set(t, laws...), Objects: n, Real: float64(n), Radius: 1, Until: math.Inf(1),
		Seed: rapid.Uint64().Draw(t, "seed"), Populations: populations()}
	if chance(0.3, "sample") {
		s.Real = float64(n) * between(1.5, 1e6, "weight")
	}
	if chance(0.5, "hole") {
		s.CentralMass = between(0.1, 100, "central mass")
	}
	if chance(0.2, "until") {
		s.Until = between(1, 8, "until date")
	}
	if chance(0.5, "sky") {
		sky := enginetest.Sky{Log10: between(2, 5, "sky"), Slope: between(0.2, 1, "sky slope"), EndAt: math.Inf(1), AllAdrift: math.Inf(1),
			LeastLog10Warm: -30}
		if chance(0.2, "sky ends") {
			sky.EndAt = between(2, 8, "sky's end")
		}
		if chance(0.2, "all adrift") {
			sky.AllAdrift = between(2, 8, "adrift")
		}
		s.Sky = skies{sky}
	}
	return s
}

func num10(l float64) float64 { return math.Pow(10, l) }

func rates(t *rapid.T, label string, least float64) enginetest.Rates {
	chance := func(p float64) bool { return rapid.Float64Range(0, 1).Draw(t, label+" hangs") < p }
	power := func() float64 { return rapid.Float64Range(-2, 2).Draw(t, label+" power") }
	r := enginetest.Rates{Log10: rapid.Float64Range(least, least+4).Draw(t, label)}
	if chance(0.1) {
		r.Log10 = math.Inf(-1)
	}
	if chance(0.6) {
		r.Number = power()
	}
	if chance(0.3) {
		r.Mass = power()
	}
	if chance(0.3) {
		r.Carried = power()
	}
	if chance(0.2) {
		r.Sum = power()
	}
	if chance(0.2) {
		r.Central = power()
	}
	if chance(0.15) {
		r.Date = rapid.Float64Range(-0.9, 0.9).Draw(t, label+" date")
	}
	if chance(0.1) {
		r.Reading = rapid.Float64Range(-2, 0.5).Draw(t, label+" reading") // from 1 on it would run away
	}
	if chance(0.2) {
		r.Kind = rapid.SampledFrom([]string{"star", "white_dwarf", "black_hole"}).Draw(t, label+" kind")
	}
	return r
}

func touch(t *rapid.T, label string) enginetest.Touch {
	return enginetest.Touch{Scale: rapid.SampledFrom([]float64{1, 1, 1, 5, 0}).Draw(t, label+" scale"),
		Power: rapid.Float64Range(-1, 1).Draw(t, label+" power"),
		Not:   rapid.SampledFrom([]string{"", "", "", "star", "white-dwarf", "neutron-star", "brown-dwarf"}).Draw(t, label+" not")}
}

func dynamics(t *rapid.T) []*enginetest.Law {
	chance := func(p float64, label string) bool { return rapid.Float64Range(0, 1).Draw(t, label) < p }
	fates := []law.Fate{law.FateAdrift, law.FateAdrift, law.FateCentral, law.FateGas}
	f := enginetest.Frame{}
	for k := range rapid.IntRange(0, 3).Draw(t, "clocks") {
		name := fmt.Sprintf("clock%d", k)
		f.Clocks = append(f.Clocks, law.Clock{Name: name, Outcome: "hit-" + name, Fate: rapid.SampledFrom(fates).Draw(t, "fate")})
		f.Rates = append(f.Rates, rates(t, name, -7))
		f.Touches = append(f.Touches, touch(t, name))
	}
	if chance(0.5, "stops") {
		f.StopAt = rapid.Float64Range(0.01, 0.5).Draw(t, "stop at")
		f.StopFate = rapid.SampledFrom(fates).Draw(t, "stop fate")
	}
	out := []*enginetest.Law{f.Law()}
	if chance(0.4, "infall") {
		in := enginetest.Infall{Rates: rates(t, "fall", -7), Touch: touch(t, "fall"), Share: rapid.Float64Range(0.05, 1).Draw(t, "share")}
		if len(f.Clocks) > 0 && chance(0.7, "divert") {
			in.Divert = append(in.Divert, f.Clocks[0].Name)
			if len(f.Clocks) > 1 && chance(0.5, "divert more") {
				in.Divert = append(in.Divert, f.Clocks[1].Name)
			}
		}
		out = append(out, in.Law())
	}
	if chance(0.4, "encounters") {
		e := enginetest.Meeting{}
		for k := range rapid.IntRange(1, 2).Draw(t, "meetings") {
			name := fmt.Sprintf("meet%d", k)
			e.Names = append(e.Names, name)
			e.Rates = append(e.Rates, rates(t, name, -7))
			e.Seeks = append(e.Seeks, touch(t, name+" seeks"))
			e.Sought = append(e.Sought, touch(t, name+" sought"))
		}
		out = append(out, e.Law())
	}
	return out
}

func endings(t *rapid.T) []*enginetest.Law {
	chance := func(p float64, label string) bool { return rapid.Float64Range(0, 1).Draw(t, label) < p }
	between := func(a, b float64, label string) float64 { return rapid.Float64Range(a, b).Draw(t, label) }
	matter := []string{"brown-dwarf", "white-dwarf", "neutron-star", "relic"}
	var out []*enginetest.Law
	if chance(0.5, "decay") {
		w := enginetest.Wearing{Process: "nucleon-decay", Kinds: matter, Log10: between(-8, -2, "decay rate"), Power: between(0, 2, "decay power"),
			Closed: chance(0.7, "decay foretells"), New: []law.Kind{{Name: "relic", Doc: "what is left", Composition: law.Iron}},
			Thresholds: []law.Threshold{
				{Kind: "brown-dwarf", Mass: 0.01, Becomes: law.Gone, Outcome: "dissolved"},
				{Kind: "white-dwarf", Mass: 0.2, Becomes: law.Gone, Outcome: "dissolved"},
				{Kind: "neutron-star", Mass: 0.6, Becomes: "relic", Outcome: "expanded"},
				{Kind: "relic", Mass: 0.05, Becomes: law.Gone, Outcome: "dissolved"},
			}}
		w.Never = rapid.SampledFrom([]string{"", "", "white-dwarf"}).Draw(t, "decay never")
		if chance(0.2, "decay of stars") {
			w.Kinds = append(w.Kinds, "star")
			w.Thresholds = append(w.Thresholds, law.Threshold{Kind: "star", Mass: 0.3, Becomes: "relic", Outcome: "expanded"})
		}
		out = append(out, w.Law())
	}
	if chance(0.5, "evaporation") {
		w := enginetest.Wearing{Process: "evaporation", Kinds: []string{"black-hole", "central-hole"}, Log10: between(-8, -2, "evaporation rate"),
			Power: between(-2, 0.5, "evaporation power"), Closed: chance(0.7, "evaporation foretells"),
			Thresholds: []law.Threshold{
				{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
				{Kind: "central-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
			}}
		if chance(0.5, "heat") {
			w.Heat = between(-2, 4, "temperature")
		}
		out = append(out, w.Law())
	}
	if chance(0.3, "curvature") {
		w := enginetest.Wearing{Process: "curvature", Kinds: []string{"neutron-star", "white-dwarf"}, Log10: between(-8, -2, "curvature rate"),
			Power: between(0, 2, "curvature power"), Closed: chance(0.5, "curvature foretells"), Heavier: rapid.SampledFrom([]float64{0, 0.5}).Draw(t, "heavier"),
			Thresholds: []law.Threshold{
				{Kind: "neutron-star", Mass: 0.3, Becomes: law.Gone, Outcome: "thinned"},
				{Kind: "white-dwarf", Mass: 0.4, Becomes: law.Gone, Outcome: "thinned"},
			}}
		if chance(0.3, "curvature heat") {
			w.Heat = between(-2, 4, "curvature temperature")
		}
		out = append(out, w.Law())
	}
	if chance(0.4, "supernova") {
		out = append(out, enginetest.Turning{Process: "supernova", Kinds: []string{"white-dwarf"}, Log10: between(3, 7, "supernova wait"),
			Never: rapid.SampledFrom([]float64{0, 0.7}).Draw(t, "supernova never"), Keeps: 0.6, Gas: between(0, 0.4, "supernova gas"),
			Outcomes: []law.Outcome{{Word: "collapsed", Becomes: "neutron-star"}, {Word: "exploded", Becomes: law.Gone}, {Word: "sank", Becomes: "black-hole"}}}.Law())
	}
	if chance(0.3, "tunnelling") {
		kinds := []string{"neutron-star", "brown-dwarf"}
		if chance(0.3, "tunnelling of stars") {
			kinds = append(kinds, "star")
		}
		out = append(out, enginetest.Turning{Process: "tunnelling", Kinds: kinds, Log10: between(3, 7, "tunnelling wait"), Keeps: 1,
			Outcomes: []law.Outcome{{Word: "tunnelled", Becomes: "black-hole"}}}.Law())
	}
	return out
}
