package engine

import (
	"context"
	"testing"
)

func TestToyPrint(t *testing.T) {
	setup, err := toySetup(100000, 1)
	if err != nil {
		t.Fatal(err)
	}
	m, err := Compile(setup)
	if err != nil {
		t.Fatal(err)
	}
	w := m.NewWorkspace()
	for r := range 3 {
		o, err := w.Run(context.Background(), uint64(r))
		if err != nil {
			t.Fatal(err)
		}
		for i, p := range o.Populations {
			t.Logf("%-22s %7d %9.4f %9.4f %9.4f %9.4f %v", m.Populations[i].Name, p.Peak, p.PeakDate, p.Half, p.Hundredth, p.Last, p.Left)
		}
	}
}
