package engine

import (
	"context"
	"math"
	"slices"
	"testing"
)

// TestToyGalaxy compares the toy galaxy with what two programs written by hand
// for the same model find with 1e5 objects: one in C with binary heaps, event
// by event, one in NumPy with narrow windows of time. Theirs are medians of
// eight realisations; the half dates scatter by 0.002 dex between realisations,
// the others by less than 0.01. They count from all ever formed, we from the
// peak, which is the same where all are formed before the first is gone.
func TestToyGalaxy(t *testing.T) {
	const realisations = 8
	setup, err := toySetup(100_000, 1)
	if err != nil {
		t.Fatal(err)
	}
	m, err := Compile(setup)
	if err != nil {
		t.Fatal(err)
	}
	w := m.NewWorkspace()
	dates := map[string][]float64{}
	for r := range realisations {
		o, err := w.Run(context.Background(), uint64(r))
		if err != nil {
			t.Fatal(err)
		}
		for i, p := range o.Populations {
			name := m.Populations[i].Name
			dates[name+" half"] = append(dates[name+" half"], p.Half)
			dates[name+" hundredth"] = append(dates[name+" hundredth"], p.Hundredth)
			dates[name+" last"] = append(dates[name+" last"], p.Last)
		}
	}
	for _, row := range []struct {
		mark      string
		want, tol float64 // tol: five standard errors of the difference of two medians
	}{
		{"bound white-dwarf half", 18.52672, 0.006},
		{"bound white-dwarf hundredth", 19.06090, 0.01},
		{"bound white-dwarf last", 19.12888, 0.015},
		{"stars hundredth", 12.49267, 0.002},
		{"stars last", 12.50120, 0.0005},
		{"adrift white-dwarf half", 37.69956, 0.001},
		{"adrift white-dwarf hundredth", 37.81112, 0.003},
		{"adrift white-dwarf last", 37.85049, 0.0005},
		{"adrift neutron-star half", 37.85999, 0.00001},
	} {
		got := dates[row.mark]
		slices.Sort(got)
		if d := got[realisations/2] - row.want; !(math.Abs(d) <= row.tol) {
			t.Errorf("%s: 10^%.5f yr, the other programs 10^%.5f", row.mark, got[realisations/2], row.want)
		}
	}
}
