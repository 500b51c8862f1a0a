package plugins_test

import (
	"testing"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/law/lawtest"
)

// TestContract takes every built-in law through the kit, beside the others.
func TestContract(t *testing.T) {
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	among := defaults(t, r)
	for _, l := range r.All() {
		c := l.Describe()
		t.Run(c.Process+"/"+c.Name, func(t *testing.T) { lawtest.Run(t, l, lawtest.Among(among...)) })
	}
}

// TestCoverage proves that the default laws leave no object without an answer,
// and that each other law may take the place of its process's default.
func TestCoverage(t *testing.T) {
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	for _, swapped := range r.All() {
		uses := []*law.Use{law.NewUse(swapped)}
		for _, l := range defaults(t, r) {
			if u := law.NewUse(l); u.Card.Process != uses[0].Card.Process {
				uses = append(uses, u)
			}
		}
		set, faults := law.NewSet(uses...)
		for _, f := range append(faults, law.CheckCoverage(set)...) {
			t.Errorf("with %s: %v", uses[0].ID(), f)
		}
	}
}

// defaults are the default laws, in the order of processes.
func defaults(t *testing.T, r *law.Registry) []law.Law {
	t.Helper()
	var out []law.Law
	for _, p := range law.Processes {
		name, ok := plugins.Defaults()[p.Name]
		if !ok {
			continue
		}
		l, ok := r.Find(p.Name, name)
		if !ok {
			t.Fatalf("default %s/%s is not built in", p.Name, name)
		}
		out = append(out, l)
	}
	return out
}
