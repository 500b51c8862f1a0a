package vacuumdecay_test

import (
	"math"
	"testing"

	"wane/plugins/vacuumdecay"
	"wane/sim/law"
	"wane/sim/law/lawtest"
)

func TestKit(t *testing.T) {
	for _, l := range []law.Law{vacuumdecay.None(), vacuumdecay.FourVolume(), vacuumdecay.Literal(), vacuumdecay.Other()} {
		lawtest.Run(t, l)
	}
}

// The three laws at one place: the hazard is one where V4 = tau^4, at t = tau,
// and where the published rate fills the four-volume once: 1 Gyr Gpc3 is
// 1e9 (3.26156e9)^3 yr4 (handbook: 1 pc = 3.26156 ly).
func TestHazard(t *testing.T) {
	for _, c := range []struct {
		law    law.Law
		column string
		one    float64
	}{
		{vacuumdecay.FourVolume(), "log10_four_volume", 4 * 139},
		{vacuumdecay.Literal(), "log10_date", 139},
		{vacuumdecay.Other(), "log10_four_volume", 577 + 9 + 3*(9+math.Log10(3.26156))},
	} {
		u := law.NewUse(c.law)
		out, err := u.Ask("end", law.Batch{Rows: 3, Columns: []law.Column{law.Numbers(c.column, []float64{c.one, c.one + 1.5, math.Inf(-1)})}})
		if err != nil {
			t.Fatal(err)
		}
		got := out.Values("log10_hazard")
		if math.Abs(got[0]) > 1e-5 || math.Abs(got[1]-1.5) > 1e-5 || !math.IsInf(got[2], -1) {
			t.Errorf("%s: log10 hazards %v, want 0, 1.5, -Inf", u.ID(), got)
		}
		if u.Card.Effect != "everything-ends" {
			t.Errorf("%s: effect %q", u.ID(), u.Card.Effect)
		}
	}
}
