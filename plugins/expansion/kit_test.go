package expansion_test

import (
	"math"
	"testing"

	"wane/plugins/expansion"
	"wane/sim/law"
	"wane/sim/law/lawtest"
)

func TestKit(t *testing.T) { lawtest.Run(t, expansion.LambdaCDM()) }

// Dark energy is what matter and radiation leave of the critical density, as
// flat space has it, and is gone once it has begun to decay.
func TestLambdaCDM(t *testing.T) {
	u := law.NewUse(expansion.LambdaCDM())
	if err := u.Set("radiation", 1e-4); err != nil {
		t.Fatal(err)
	}
	out, err := u.Ask("density", law.Batch{Rows: 2, Columns: []law.Column{law.Numbers("log10_since", []float64{math.Inf(-1), 3})}})
	if err != nil {
		t.Fatal(err)
	}
	dark, curvature := out.Values("log10_dark"), out.Values("curvature")
	if want := math.Log10(1 - 0.3111 - 1e-4); math.Abs(dark[0]-want) > 1e-15 {
		t.Errorf("log10_dark = %v, want %v", dark[0], want)
	}
	if !math.IsInf(dark[1], -1) || curvature[0] != 0 || curvature[1] != 0 {
		t.Errorf("after the decay began: log10_dark = %v, curvature %v", dark[1], curvature)
	}
}
