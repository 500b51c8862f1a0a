package engine_test

import (
	"context"
	"fmt"
	"maps"
	"math"
	"slices"
	"strings"
	"sync"
	"testing"

	"wane/plugins"
	"wane/sim/engine"
	"wane/sim/engine/reference"
	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/sky"
)

// lamp is the galaxy of the scenario little-lamp with other laws, by process.
// Laws are shared between galaxies, and with them the tables they keep.
func lamp(r *law.Registry, objects int, swap map[string]string) (engine.Setup, error) {
	choice := plugins.Defaults()
	maps.Copy(choice, swap)
	var uses []*law.Use
	for process, name := range choice {
		l, ok := r.Find(process, name)
		if !ok {
			return engine.Setup{}, fmt.Errorf("no law %s/%s", process, name)
		}
		uses = append(uses, law.NewUse(l))
	}
	s, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		return engine.Setup{}, fmt.Errorf("%v", faults)
	}
	p, err := sky.Prepare(s)
	if err != nil {
		return engine.Setup{}, err
	}
	return engine.Setup{Set: s, Sky: prepared{p}, Objects: objects, Real: float64(objects), Radius: 30, CentralMass: 30,
		Until: math.Inf(1), Seed: 1, Populations: galaxy.Default()}, nil
}

// alternatives are the built-in laws that are not the default of their process,
// but those of pairs, which no run asks.
func alternatives(r *law.Registry) [][2]string {
	var out [][2]string
	defaults := plugins.Defaults()
	for _, p := range law.Processes {
		for _, name := range r.Names(p.Name) {
			if p.Role != law.TwoBody && name != defaults[p.Name] {
				out = append(out, [2]string{p.Name, name})
			}
		}
	}
	return out
}

// TestEveryLaw runs little-lamp once with each built-in law in place of the
// default of its process, and once with each two of them.
func TestEveryLaw(t *testing.T) {
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	all := alternatives(r)
	if len(all) < 3 {
		t.Fatalf("only the alternatives %v", all)
	}
	objects := 400
	if testing.Short() {
		objects = 120
	}
	for i, a := range all {
		t.Run(a[0]+"="+a[1], func(t *testing.T) {
			t.Parallel()
			throughGalaxy(t, r, objects, map[string]string{a[0]: a[1]})
		})
		if testing.Short() {
			continue
		}
		for _, b := range all[:i] {
			if a[0] == b[0] {
				continue
			}
			t.Run(fmt.Sprintf("%s=%s,%s=%s", b[0], b[1], a[0], a[1]), func(t *testing.T) {
				t.Parallel()
				throughGalaxy(t, r, 120, map[string]string{a[0]: a[1], b[0]: b[1]})
			})
		}
	}
}

// throughGalaxy runs one realisation in both engines, which must agree, and
// four by one and by two workers, which must give the same bits.
func throughGalaxy(t *testing.T, r *law.Registry, objects int, swap map[string]string) {
	t.Helper()
	s, err := lamp(r, objects, swap)
	if err != nil {
		t.Fatal(err)
	}
	inOrder(t, compare(t, s, 0))
	one := outcomesOf(t, s, 1)
	if two := outcomesOf(t, s, 2); one != two {
		t.Fatalf("two workers give other bits than one:\n%s\n%s", one, two)
	}
}

// outcomesOf runs four realisations by so many workers, each of which takes
// every such one in turn, and writes what they came to so that other bits give
// another text.
func outcomesOf(t *testing.T, s engine.Setup, workers int) string {
	t.Helper()
	m, err := engine.Compile(s)
	if err != nil {
		t.Fatal(err)
	}
	texts, faults := make([]string, 4), make([]error, 4)
	var all sync.WaitGroup
	for first := range workers {
		all.Go(func() {
			w := m.NewWorkspace()
			for r := first; r < len(texts); r += workers {
				var o *engine.Outcome
				if o, faults[r] = w.Run(context.Background(), uint64(r)); faults[r] == nil {
					texts[r] = fmt.Sprintf("%+v", *o)
				}
			}
		})
	}
	all.Wait()
	for r, err := range faults {
		if err != nil {
			t.Fatalf("realisation %d: %v", r, err)
		}
	}
	return strings.Join(texts, "\n")
}

// inOrder holds the histories to what must be true under any laws: changes of
// an object are in the order of time and begin where the last one led, and a
// mark comes not before the one before it.
func inOrder(t *testing.T, r *reference.Result) {
	t.Helper()
	for i, h := range r.Histories {
		if !slices.IsSortedFunc(h, func(a, b reference.Change) int { return cmpDates(a.Date, b.Date) }) {
			t.Fatalf("object %d: changes out of order: %v", i, h)
		}
		for j := 1; j < len(h); j++ {
			if h[j].From != h[j-1].To {
				t.Fatalf("object %d: change %d begins elsewhere than the one before it led: %v", i, j, h)
			}
		}
	}
	for i, p := range r.Populations {
		if p.Peak > 0 && (p.Half > p.Hundredth || p.Hundredth > p.Last || p.PeakDate > p.Last) {
			t.Fatalf("population %d: marks out of order: %+v", i, p)
		}
	}
}

func cmpDates(a, b float64) int {
	switch {
	case a < b:
		return -1
	case a > b:
		return 1
	}
	return 0
}
