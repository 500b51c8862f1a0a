package engine_test

import (
	"context"
	"fmt"
	"testing"

	"wane/sim/engine"
)

// A workspace used again gives what a new one gives, whatever the histories
// before it did: here one in which bound objects wear comes before one in which
// two meet before anything wears.
func TestWorkspaceAgain(t *testing.T) {
	s := builtin(t, 60, 60, 30, 30, map[string]string{"ejection": "none"})
	m, err := engine.Compile(s)
	if err != nil {
		t.Fatal(err)
	}
	again := m.NewWorkspace()
	for realisation := range uint64(6) {
		got, err := again.Run(context.Background(), realisation)
		if err != nil {
			t.Fatal(err)
		}
		want, err := m.NewWorkspace().Run(context.Background(), realisation)
		if err != nil {
			t.Fatal(err)
		}
		if a, b := fmt.Sprintf("%+v", *got), fmt.Sprintf("%+v", *want); a != b {
			t.Fatalf("realisation %d: a workspace used again gives\n%s\na new one\n%s", realisation, a, b)
		}
	}
}
