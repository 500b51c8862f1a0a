package python_test

import (
	"strings"
	"testing"

	"wane/sim/law"
	"wane/sim/rpc"
)

// TestFaults: what goes wrong in Python is told in Python's own words, with
// the line; what ends a process is healed once.
func TestFaults(t *testing.T) {
	l := open(t, "faulty", rpc.Options{})
	ask := func(deed string) (law.Batch, error) {
		t.Helper()
		u := law.NewUse(l)
		for i, w := range l.Describe().Parameters[0].Words {
			if w == deed {
				if err := u.Set("deed", float64(i)); err != nil {
					t.Fatal(err)
				}
				return u.Ask("wear", batch([]float64{3, 4}))
			}
		}
		t.Fatalf("no deed %s", deed)
		return law.Batch{}, nil
	}
	for _, c := range []struct{ deed, want string }{
		{"raises", "ValueError: bad physics ? at 3 solMass\n  law.py:24, in wear: raise ValueError("},
		{"exits", "SystemExit: 0"},
		{"wrong-length", "question wear: column log10_rate has shape (1,); want (2,): one element a row"},
		{"nan", "row 0 (mass 3 solMass): log10_rate: got NaN, want a number or -Inf (zero)"},
		{"recurses", "RecursionError: maximum recursion depth exceeded"},
	} {
		_, err := ask(c.deed)
		if err == nil || !strings.Contains(err.Error(), c.want) || !strings.Contains(err.Error(), "evaporation/faulty") {
			t.Errorf("%s: got %v, want %s", c.deed, err, c.want)
		}
	}
	for _, deed := range []string{"none", "prints", "dies-once", "none"} {
		if out, err := ask(deed); err != nil || out.Columns[0].Values[1] != -8 {
			t.Errorf("%s: %v, %v", deed, out, err)
		}
	}
	if l.Restarts() != 1 {
		t.Errorf("started again %d times, want once: for the death, and for nothing else", l.Restarts())
	}
	if log := l.Log(); !strings.Contains(log, "about to die") || !strings.Contains(log, "a stray print while it loads") {
		t.Errorf("what it printed is not in its log: %q", log)
	}
	if _, err := ask("dies"); err == nil || !strings.Contains(err.Error(), "about to die") {
		t.Errorf("a law that always dies: %v", err)
	}
}
