package plugins_test

import (
	"math"
	"testing"

	"wane/plugins/ejection"
	"wane/sim/law"
	"wane/testdata/reference"
)

// TestBalancedGalaxy follows the remnants of the default laws in a galaxy that
// is heated from within, to the date at which nucleons decay, against the same
// formulas in NumPy. C is the reading of a clock of its own.
func TestBalancedGalaxy(t *testing.T) {
	const real, radius, step = 2e11, 1e4, 0.002
	uses := defaultUses(t)
	pop := remnantsOf(t, uses, 2000)
	uses["ejection"] = law.NewUse(ejection.Balanced())
	if _, faults := law.NewSet(uses["ejection"]); faults != nil {
		t.Fatal(faults)
	}
	s := ask(t, uses, "ejection", "expose", law.WhiteDwarf, map[string][]float64{"mass": pop.mass}).Values("to_ejection")
	at := func(c float64) (number, mass, sum float64) {
		for i, m := range pop.mass {
			n := real * pop.weight[i] * math.Exp(-s[i]*c)
			number, mass, sum = number+n, mass+n*m, sum+n*s[i]
		}
		return
	}
	_, founded, _ := at(0)
	years, reading, half, share := 0.0, 0.0, 0.0, 0.0
	for c := 0.0; years < 1e37; c += step {
		one := func(v float64) []float64 { return []float64{v} }
		number, mass, sum := at(c + step/2)
		// The two clocks differ by a factor: C at the middle of the step needs no root.
		ahead := 140 * step / 2 * sum / number
		out := ask(t, uses, "ejection", "rate", law.WhiteDwarf, map[string][]float64{
			"number": one(number), "mass_bound": one(mass), "sum_ejection": one(sum), "carried_off": one(founded - mass),
			"founded_radius": one(radius), "reading_relaxation": one(reading + ahead),
		})
		wait := step / math.Pow(10, out.Values("log10_rate_ejection")[0])
		years += wait
		reading += wait * math.Pow(10, out.Values("log10_rate_relaxation")[0])
		after, _, _ := at(c + step)
		if half == 0 && after <= real/2 {
			before, _, _ := at(c)
			half = math.Log10(years - wait*(real/2-after)/(before-after))
		}
		share = after / real
	}
	want := reference.Python(t, "testdata/balanced.py")[0]
	t.Logf("half after 10^%.4f yr, %.4f left after 1e37 yr; NumPy 10^%.4f, %.4f", half, share, want[0], want[1])
	if math.Abs(half-want[0]) > 5e-3 || math.Abs(share/want[1]-1) > 5e-3 {
		t.Errorf("half after 10^%.4f yr, %.5f left after 1e37 yr; NumPy says 10^%.4f, %.5f", half, share, want[0], want[1])
	}
	if share < 0.06 || share > 0.10 {
		t.Errorf("%v of the objects are bound when nucleons decay", share)
	}
}
