package constant_test

import (
	"math"
	"testing"

	. "wane/sim/physics/constant"
	"wane/testdata/published"
)

// Combinations of the constants against printed values and against the same
// combinations in 40 digits.
func TestPublished(t *testing.T) {
	const c4 = C * C * C * C
	planckTime := math.Sqrt(HBar * G / (c4 * C))
	values := map[string]float64{
		"reduced-planck":       HBar,
		"stefan-boltzmann":     StefanBoltzmann,
		"radiation":            Radiation,
		"planck-mass":          math.Sqrt(HBar * C / G),
		"planck-time":          planckTime,
		"planck-length":        math.Sqrt(HBar * G / (C * C * C)),
		"planck-time-log10-yr": math.Log10(planckTime) - Log10Year,
		"solar-mass":           Sun,
		"solar-rest-energy":    Sun * C * C,
		"nucleons-in-sun":      Sun / AtomicMass,
		"ln-nucleons-in-sun":   math.Log(Sun / AtomicMass),
		"evaporation-unit":     GMSun * GMSun * Sun / (HBar * c4) / Year,
		"mass-loss-unit":       HBar * c4 / (G * G),
		"parsec":               Parsec,
		"light-year":           C * Year,
	}
	for _, row := range published.Rows(t, "constants.csv") {
		value, known := values[row.Inputs["quantity"]]
		if !known {
			t.Errorf("%s: unknown quantity %q", row.Where(), row.Inputs["quantity"])
			continue
		}
		row.Check(t, value)
	}
}
