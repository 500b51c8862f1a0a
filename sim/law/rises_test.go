package law

import (
	"math"
	"strings"
	"testing"
)

// stranger is a law outside the program.
type stranger struct{ fake }

func (stranger) Label() string { return "./mine" }
func (stranger) Log() string   { return "all is well" }

func TestRises(t *testing.T) {
	never := math.Inf(1)
	masses := card("mass-function", "test", Question{Name: "mass", Inputs: []string{"u"}})
	ends := card("vacuum-decay", "test", Question{Name: "end", Inputs: []string{"log10_date"}})
	for _, c := range []struct {
		name     string
		card     Card
		question string
		in, out  Column
		want     string
	}{
		{"rises", masses, "mass", Numbers("u", []float64{0.5, 0.2, 0.9}), Numbers("mass", []float64{5, 2, 9}), ""},
		{"stays", masses, "mass", Numbers("u", []float64{0.5, 0.2, 0.9}), Numbers("mass", []float64{5, 5, 5}), ""},
		{"rounding", masses, "mass", Numbers("u", []float64{0.2, 0.5}), Numbers("mass", []float64{5, math.Nextafter(5, 0)}), ""},
		{"falls", masses, "mass", Numbers("u", []float64{0.5, 0.2, 0.9}), Numbers("mass", []float64{5, 6, 9}),
			"law ./mine (mass-function/test): question mass, row 1 (u 0.2): mass: got 6, and 5 in row 0 (u 0.5), want a quantile, which never falls as u rises; its log: all is well"},
		{"hazard", ends, "end", Numbers("log10_date", []float64{1, 2, 3, 4}), Numbers("log10_hazard", []float64{-never, -9, never, never}), ""},
		{"hazard falls", ends, "end", Numbers("log10_date", []float64{1, 2, 3}), Numbers("log10_hazard", []float64{-9, -3, -4}),
			"question end, row 2 (log10_date 3 yr): log10_hazard: got -4, and -3 in row 1 (log10_date 2 yr), want a hazard that never falls"},
		{"hazard falls from certainty", ends, "end", Numbers("log10_date", []float64{1, 2}), Numbers("log10_hazard", []float64{never, 3}), "got 3, and +Inf in row 0"},
	} {
		u := NewUse(stranger{fake{card: c.card}})
		err := u.Rises(c.question, rows(len(c.in.Values), c.in), rows(len(c.in.Values), c.out))
		if (err != nil) != (c.want != "") || err != nil && !strings.Contains(err.Error(), c.want) {
			t.Errorf("%s: got %v, want %q", c.name, err, c.want)
		}
	}
	// What is built in is not looked at in every run.
	err := use(masses).Rises("mass", rows(2, Numbers("u", []float64{0.5, 0.2})), rows(2, Numbers("mass", []float64{5, 6})))
	if err != nil {
		t.Error(err)
	}
}
