package engine

import (
	"context"
	"math"
	"testing"

	"wane/plugins"
	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/orderstat"
	"wane/sim/sky"
)

// run runs one realisation of a setup.
func runOne(t *testing.T, w *Workspace, realisation uint64) *Outcome {
	t.Helper()
	o, err := w.Run(context.Background(), realisation)
	if err != nil {
		t.Fatal(err)
	}
	return o
}

// plainSetup is a galaxy in which nothing is hit: births fall exponentially
// with 7e9 yr, stars live 1e10 yr, all alike, and leave dwarfs of 1 + u solar
// masses that last 1e37 yr a solar mass.
func plainSetup(t *testing.T, objects int, real float64) Setup {
	t.Helper()
	column := func(name string, f func(in law.Batch, i int) float64) func(string, law.Batch) law.Batch {
		return func(_ string, in law.Batch) law.Batch {
			v := in.NewValues()
			for i := range v {
				v[i] = f(in, i)
			}
			return in.Answer(law.Numbers(name, v))
		}
	}
	live := toyCard("lifetime", "toy", ask("live", "mass"))
	live.Accepts = law.Accepts{Kinds: []string{"star"}}
	die := ask("die", "mass")
	die.Words = []string{"white-dwarf"}
	leave := toyCard("remnant", "toy", die, ask("remain", "mass", "u"))
	leave.Accepts = law.Accepts{Kinds: []string{"star"}}
	wear := toyCard("nucleon-decay", "toy", ask("wear", "mass"), ask("foretell", "mass"))
	wear.Accepts = law.Accepts{Kinds: []string{"white-dwarf"}}
	wear.Thresholds = []law.Threshold{{Kind: "white-dwarf", Mass: 0, Becomes: law.Gone, Outcome: "dissolved"}}
	var uses []*law.Use
	for _, l := range []law.Law{
		function{toyCard("mass-function", "toy", ask("mass", "u")), column("mass", func(law.Batch, int) float64 { return 3 })},
		function{toyCard("star-formation", "toy", ask("birth", "u")), column("log10_date", func(in law.Batch, i int) float64 {
			return num.Log10(-7e9 * num.Log1p(-in.Columns[0].Values[i]))
		})},
		toyMetals(), toySort(),
		function{live, column("wait", func(law.Batch, int) float64 { return 10 })},
		function{leave, func(q string, in law.Batch) law.Batch {
			v, comp := in.NewValues(), in.NewWords()
			for i := range v {
				v[i] = 1
				if q == "remain" {
					v[i], comp[i] = 1+in.Columns[1].Values[i], law.CarbonOxygen
				}
			}
			if q == "die" {
				return in.Answer(law.Numbers("chance_white_dwarf", v))
			}
			return in.Answer(law.Numbers("mass", v), law.Codes("composition", comp))
		}},
		function{wear, func(q string, in law.Batch) law.Batch {
			v, heat := in.NewValues(), in.NewValues()
			clear(heat)
			for i, m := range in.Columns[0].Values {
				v[i] = 37 + num.Log10(m)
				if q == "wear" {
					v[i] = -37
				}
			}
			if q == "wear" {
				return in.Answer(law.Numbers("log10_rate", v), law.Numbers("heat", heat))
			}
			return in.Answer(law.Numbers("wait", v))
		}},
	} {
		uses = append(uses, law.NewUse(l))
	}
	set, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	return Setup{Set: set, Objects: objects, Real: real, Radius: 1e4, Until: math.Inf(1), Seed: 1, Populations: []galaxy.Population{byName("stars"), byName("brown-dwarfs"), byName("white-dwarfs")}}
}

// byName is one of the populations that every run counts.
func byName(name string) galaxy.Population {
	for _, p := range galaxy.Default() {
		if p.Name == name {
			return p
		}
	}
	panic("no population " + name)
}

// TestRealLastClosedForm: the last of N births that fall exponentially is
// expected at tau ln(N/ln 2), median [Gumbel1958]; the largest of N uniforms at
// 1 - ln 2/N. The chances are those of the law of rare events, exp(-N S).
func TestRealLastClosedForm(t *testing.T) {
	for _, real := range []float64{50, 1e3, 1e6, 2e11} {
		m, err := Compile(plainSetup(t, 10, real))
		if err != nil {
			t.Fatal(err)
		}
		o := runOne(t, m.NewWorkspace(), 0)
		for p, want := range map[int]float64{
			0: num.Log10(1e10 + 7e9*num.Log(real/math.Ln2)),
			2: 37 + num.Log10(2-math.Ln2/real),
		} {
			if got := o.Populations[p].RealLast; !(math.Abs(got-want) < 2*lotResolution) {
				t.Errorf("%g %s: the last at 10^%.7f yr, want 10^%.7f", real, m.populations[p].Name, got, want)
			}
		}
		if got := o.Populations[1].RealLast; !math.IsNaN(got) {
			t.Errorf("the last of no brown dwarf goes at 10^%v yr", got)
		}
	}
	m, err := Compile(plainSetup(t, 50, 50))
	if err != nil {
		t.Fatal(err)
	}
	if got := runOne(t, m.NewWorkspace(), 0).Populations[0].RealLast; !math.IsNaN(got) {
		t.Errorf("a whole galaxy has a last of the real number, 10^%v yr", got)
	}
}

type builtinSkies struct{ prepared *sky.Prepared }

func (s builtinSkies) Draw(seed, realisation uint64) (Sky, error) {
	return s.prepared.Draw(seed, realisation)
}

// builtin is a galaxy under the default laws, but for that of encounters.
func builtin(t testing.TB, objects int, real float64, seed uint64, encounter string) *Model {
	t.Helper()
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	var uses []*law.Use
	for _, p := range law.Processes {
		if name, ok := plugins.Defaults()[p.Name]; ok {
			if p.Name == "encounter" {
				name = encounter
			}
			l, _ := r.Find(p.Name, name)
			uses = append(uses, law.NewUse(l))
		}
	}
	set, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	background, err := sky.Prepare(set)
	if err != nil {
		t.Fatal(err)
	}
	m, err := Compile(Setup{Set: set, Sky: builtinSkies{background}, Objects: objects, Real: real, Radius: 1e4, CentralMass: 1e3,
		Until: math.Inf(1), Seed: seed, Populations: galaxy.Default()})
	if err != nil {
		t.Fatal(err)
	}
	return m
}

// TestRealLastOfWhole holds what samples of 1e4 say of the last of 3e5 to the
// last of a whole galaxy of 3e5, other draws: it must fall where the sample
// expects between 9.2 and 1e-4 objects left, which it misses once in 5000 times.
func TestRealLastOfWhole(t *testing.T) {
	const real = 3e5
	whole := builtin(t, real, real, 2, "none").NewWorkspace()
	sample := builtin(t, 1e4, real, 1, "none").NewWorkspace()
	told := 0
	for r := range uint64(4) {
		truth, said := runOne(t, whole, r), runOne(t, sample, r)
		seen := sample.waysOfEnding()
		for p, name := range galaxy.Default() {
			got := said.Populations[p].RealLast
			if math.IsNaN(got) {
				continue
			}
			told++
			at := func(q float64) float64 {
				return sample.realLast(&sample.m.populations[p], &seen, orderstat.Target(q))
			}
			low, high, last := at(1e-4), at(1-1e-4), truth.Populations[p].Last
			if !(last >= low-lotResolution && last <= high+lotResolution) {
				t.Errorf("%s: the last of the whole goes at 10^%.5f yr; the sample says 10^%.5f, %.5f to %.5f",
					name.Name, last, got, low, high)
			}
			if own := said.Populations[p].Last; own > high+lotResolution {
				t.Errorf("%s: the last of the sample goes at 10^%.5f yr, that of all at 10^%.5f at most", name.Name, own, high)
			}
			t.Logf("%-20s sample %.5f, real %.5f (%.5f to %.5f), whole %.5f", name.Name, said.Populations[p].Last, got, low, high, last)
		}
	}
	if told < 4*5 { // stars, brown dwarfs, white dwarfs, and of the rare ones most
		t.Errorf("told for %d populations of 4 realisations only", told)
	}
}

// TestRealLastWhereObjectsMeet: what merges has no date that was settled when it
// was founded, so only stars as they were founded are told of; collisions come
// after they are dead, and the date is the one without.
func TestRealLastWhereObjectsMeet(t *testing.T) {
	alone, meeting := builtin(t, 5000, 2e11, 1, "none"), builtin(t, 5000, 2e11, 1, "collisions")
	a, b := runOne(t, alone.NewWorkspace(), 0), runOne(t, meeting.NewWorkspace(), 0)
	if b.Fired["encounter"] == 0 {
		t.Fatal("nobody met")
	}
	for p, pop := range galaxy.Default() {
		got := b.Populations[p].RealLast
		if pop.Name != "stars" {
			if !math.IsNaN(got) {
				t.Errorf("%s: the last of all at 10^%v yr", pop.Name, got)
			}
			continue
		}
		if want := a.Populations[p].RealLast; got != want || math.IsNaN(want) {
			t.Errorf("stars: the last of all at 10^%v yr, without encounters at 10^%v yr", got, want)
		}
	}
}

// TestRealLastForgetsOthers: it is a function of the realisation alone, not of
// what the workspace ran before.
func TestRealLastForgetsOthers(t *testing.T) {
	used := builtin(t, 2000, 2e11, 1, "none").NewWorkspace()
	runOne(t, used, 5)
	again, fresh := runOne(t, used, 3), runOne(t, builtin(t, 2000, 2e11, 1, "none").NewWorkspace(), 3)
	for p := range again.Populations {
		a, b := again.Populations[p].RealLast, fresh.Populations[p].RealLast
		if a != b && !(math.IsNaN(a) && math.IsNaN(b)) {
			t.Errorf("%s: 10^%v yr after another realisation, 10^%v yr alone", galaxy.Default()[p].Name, a, b)
		}
	}
}

// BenchmarkRealLast is what the estimate adds to a realisation of a sample.
func BenchmarkRealLast(b *testing.B) {
	w := builtin(b, 1e5, 2e11, 1, "none").NewWorkspace()
	o, err := w.Run(context.Background(), 0)
	if err != nil {
		b.Fatal(err)
	}
	b.Run("first", func(b *testing.B) {
		for b.Loop() {
			w.ask.newReach(w.c.metal)
		}
	})
	b.Run("each", func(b *testing.B) {
		for b.Loop() {
			w.realLasts(o)
		}
	})
}
