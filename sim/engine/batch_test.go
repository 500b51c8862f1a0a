package engine_test

import (
	"context"
	"testing"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"

	"wane/sim/engine"
	"wane/sim/law"
)

// many is a law that wants to be asked about many rows at a time.
type many struct {
	law.Law
	rows int
}

func (m many) Rows() int { return m.rows }

// TestBatchesLeaveNoTrace: how many rows a law is asked about at a time changes
// no bit of a result.
func TestBatchesLeaveNoTrace(t *testing.T) {
	outcome := func(objects int, radius float64, rows int) *engine.Outcome {
		s := builtin(t, objects, 2e11, radius, 4.3e6, nil)
		if rows > 0 {
			l := s.Set.Of("evaporation")
			l.Law = many{l.Law, rows}
		}
		m, err := engine.Compile(s)
		if err != nil {
			t.Fatal(err)
		}
		o, err := m.NewWorkspace().Run(context.Background(), 2)
		if err != nil {
			t.Fatal(err)
		}
		return o
	}
	for _, x := range []struct {
		objects int
		radius  float64
	}{{30_000, 7800}, {9_000, 0.5}} { // the second relaxes while stars still die
		want := outcome(x.objects, x.radius, 0)
		for _, rows := range []int{1, 4097, 16_384, 1 << 30} {
			if d := cmp.Diff(want, outcome(x.objects, x.radius, rows), cmpopts.EquateNaNs()); d != "" {
				t.Errorf("%d objects, %d rows a batch:\n%s", x.objects, rows, d)
			}
		}
	}
}
