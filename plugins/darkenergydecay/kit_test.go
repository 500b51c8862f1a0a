package darkenergydecay_test

import (
	"math"
	"testing"

	"wane/plugins/darkenergydecay"
	"wane/sim/law"
	"wane/sim/law/lawtest"
)

func TestKit(t *testing.T) {
	for _, l := range []law.Law{darkenergydecay.None(), darkenergydecay.Drawn(), darkenergydecay.Fixed(), darkenergydecay.Recollapse()} {
		lawtest.Run(t, l)
	}
}

func hazards(t *testing.T, l law.Law, values map[string]float64, dates ...float64) []float64 {
	t.Helper()
	u := law.NewUse(l)
	for name, v := range values {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	out, err := u.Ask("end", law.Batch{Rows: len(dates), Columns: []law.Column{law.Numbers("log10_date", dates)}})
	if err != nil {
		t.Fatal(err)
	}
	return out.Values("log10_hazard")
}

// A half-life after today half of all draws have come, exp(-hazard) = 1/2; none
// before today; and ten half-lives after, all but 2^-10.
func TestDrawn(t *testing.T) {
	today := 13.79e9
	got := hazards(t, darkenergydecay.Drawn(), map[string]float64{"half_life": 12, "today": math.Log10(today)},
		10, math.Log10(today), math.Log10(today+1e12), math.Log10(today+1e13))
	if !math.IsInf(got[0], -1) || !math.IsInf(got[1], -1) {
		t.Errorf("up to today: log10 hazards %v, want -Inf", got[:2])
	}
	for i, want := range []float64{0.5, math.Pow(2, -10)} {
		if left := math.Exp(-math.Pow(10, got[2+i])); math.Abs(left/want-1) > 1e-9 {
			t.Errorf("left %v, want %v", left, want)
		}
	}
}

// What has a date comes at it and not before.
func TestDated(t *testing.T) {
	for l, effect := range map[law.Law]string{darkenergydecay.Fixed(): "dark-energy-decays", darkenergydecay.Recollapse(): "everything-ends"} {
		got := hazards(t, l, map[string]float64{"date": 10.9}, 10.89999, 10.9, 11)
		if !math.IsInf(got[0], -1) || !math.IsInf(got[1], 1) || !math.IsInf(got[2], 1) {
			t.Errorf("%s: log10 hazards %v, want -Inf and twice +Inf", l.Describe().Name, got)
		}
		if got := l.Describe().Effect; got != effect {
			t.Errorf("%s: effect %q, want %q", l.Describe().Name, got, effect)
		}
	}
}
