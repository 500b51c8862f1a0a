package ensemble_test

import (
	"context"
	"math"
	"testing"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"

	"wane/plugins"
	"wane/sim/engine"
	"wane/sim/ensemble"
	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/sky"
)

type skies struct{ *sky.Prepared }

func (s skies) Draw(seed, realisation uint64) (engine.Sky, error) {
	return s.Prepared.Draw(seed, realisation)
}

// The outcomes of realisations are the same to the bit whoever runs them, in
// whatever workspace, after whatever else.
func TestOutcomesDoNotHangOnWorkers(t *testing.T) {
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	var uses []*law.Use
	for process, name := range plugins.Defaults() {
		l, ok := registry.Find(process, name)
		if !ok {
			t.Fatalf("no law %s/%s", process, name)
		}
		uses = append(uses, law.NewUse(l))
	}
	set, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	prepared, err := sky.Prepare(set)
	if err != nil {
		t.Fatal(err)
	}
	m, err := engine.Compile(engine.Setup{Set: set, Sky: skies{prepared}, Objects: 1500, Real: 1500, Radius: 30, CentralMass: 30,
		Until: math.Inf(1), Seed: 7, Populations: galaxy.Default()})
	if err != nil {
		t.Fatal(err)
	}
	run := func(workers int) []*engine.Outcome {
		f, err := ensemble.Each(context.Background(), 9, workers, m.NewWorkspace,
			func(w *engine.Workspace, r int) (*engine.Outcome, error) {
				return w.Run(context.Background(), uint64(r))
			}, nil)
		if err != nil {
			t.Fatal(err)
		}
		return f.Results
	}
	one := run(1)
	for _, workers := range []int{2, 5, 9} {
		if d := cmp.Diff(one, run(workers), cmpopts.EquateNaNs()); d != "" {
			t.Errorf("%d workers:\n%s", workers, d)
		}
	}
	// A realisation alone in a fresh workspace is what it was as one of many.
	alone, err := m.NewWorkspace().Run(context.Background(), 8)
	if err != nil {
		t.Fatal(err)
	}
	if d := cmp.Diff(one[8], alone, cmpopts.EquateNaNs()); d != "" {
		t.Errorf("alone:\n%s", d)
	}
}
