package plugins_test

import (
	"testing"

	"wane/plugins"
	"wane/sim/law"
)

// TestDefaults holds the list of laws and the list of defaults together: each
// default is built in, and each process with a law has a default.
func TestDefaults(t *testing.T) {
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	defaults := plugins.Defaults()
	for process, name := range defaults {
		if _, ok := r.Find(process, name); !ok {
			t.Errorf("default %s/%s is not built in", process, name)
		}
	}
	for _, p := range law.Processes {
		if _, ok := defaults[p.Name]; !ok && len(r.Names(p.Name)) > 0 {
			t.Errorf("process %s has laws %v but no default", p.Name, r.Names(p.Name))
		}
	}
}
