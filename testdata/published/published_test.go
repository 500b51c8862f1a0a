package published

import (
	"math"
	"testing"
)

func TestHolds(t *testing.T) {
	for _, c := range []struct {
		row  Row
		got  float64
		want bool
	}{
		{Row{Value: 100, Tol: 0.01}, 101, true},
		{Row{Value: 100, Tol: 0.01}, 101.1, false},
		{Row{Value: -3, Tol: 0.03, Dex: true}, -3.02, true},
		{Row{Value: -3, Tol: 0.03, Dex: true}, -3.04, false},
		{Row{Value: 0, Tol: 0.01}, 1e-300, false},
		{Row{Value: 0, Tol: 0}, 0, true},
		{Row{Value: math.Inf(1), Tol: 0.5}, 1e300, false},
		{Row{Value: math.Inf(1), Tol: 0.5}, math.Inf(1), true},
		{Row{Value: 1, Tol: 0.5}, math.Inf(1), false},
		{Row{Value: 1, Tol: 0.5}, math.NaN(), false},
	} {
		if got := c.row.Holds(c.got); got != c.want {
			t.Errorf("value %v within %s: %v holds = %v, want %v", c.row.Value, c.row.tolerance(), c.got, got, c.want)
		}
	}
}

func TestRowOfRefuses(t *testing.T) {
	for name, record := range map[string][]string{
		"value":     {"1", "one", "K", "1e-3", "published", "S", "eq. 1", ""},
		"tolerance": {"1", "1", "K", "", "published", "S", "eq. 1", ""},
		"negative":  {"1", "1", "K", "-1", "published", "S", "eq. 1", ""},
		"infinite":  {"1", "1", "K", "Inf", "published", "S", "eq. 1", ""},
		"kind":      {"1", "1", "K", "1e-3", "guessed", "S", "eq. 1", ""},
	} {
		if _, err := rowOf([]string{"mass_Msun"}, record); err == nil {
			t.Errorf("%s: accepted %v", name, record)
		}
	}
}
