package plugins_test

import (
	"math"
	"strings"
	"testing"

	"wane/sim/law"
	"wane/sim/physics/dynamics"
	"wane/testdata/published"
	"wane/testdata/reference"
)

// contracting follows the remnants of the default laws as the galaxy throws
// them out, with a constant Coulomb logarithm: a real number of 18, treated as
// continuous, keeps ln(gamma N) on its floor of 1. It returns the mean mass and
// when half and all but 1e-4 are gone, in relaxation times of the start.
func contracting(t *testing.T) (mean, half, end float64) {
	const real, step = 18, 0.004
	uses := defaultUses(t)
	pop := remnantsOf(t, uses, 4000)
	s := ask(t, uses, "ejection", "expose", law.WhiteDwarf, map[string][]float64{"mass": pop.mass}).Values("to_ejection")
	at := func(c float64) (number, mass, sum float64) {
		for i, m := range pop.mass {
			n := real * pop.weight[i] * math.Exp(-s[i]*c)
			number, mass, sum = number+n, mass+n*m, sum+n*s[i]
		}
		return
	}
	_, founded, _ := at(0)
	trh := math.Pow(10, dynamics.Log10HalfMassRelaxation(real, founded, 1, 1))
	years := 0.0
	for c := 0.0; ; c += step {
		one := func(v float64) []float64 { return []float64{v} }
		number, mass, sum := at(c + step/2)
		rate := ask(t, uses, "ejection", "rate", law.WhiteDwarf, map[string][]float64{
			"number": one(number), "mass_bound": one(mass), "sum_ejection": one(sum), "carried_off": one(founded - mass),
			"central_mass": one(0), "founded_number": one(real), "founded_radius": one(1),
		}).Values("log10_rate_ejection")[0]
		before, _, _ := at(c)
		after, _, _ := at(c + step)
		passed := step / math.Pow(10, rate)
		if half == 0 && after <= real/2 {
			half = (years + passed*(before-real/2)/(before-after)) / trh
		}
		if years += passed; after < 1e-4*real {
			return founded / real, half, years / trh
		}
	}
}

// TestDefaultRemnantsContract checks how a galaxy of unequal masses ends, with
// light objects leaving first, against published formulas integrated by SciPy.
func TestDefaultRemnantsContract(t *testing.T) {
	mean, half, end := contracting(t)
	found := map[string]float64{"mean-mass": mean, "half": half, "end": end}
	for _, row := range published.Rows(t, "dynamics.csv") {
		if name, ours := strings.CutPrefix(row.Inputs["quantity"], "fixed-logarithm-"); ours {
			row.Check(t, found[name])
			delete(found, name)
		}
	}
	if len(found) > 0 {
		t.Errorf("no check values for %v", found)
	}
	// The script leaves out how the masses of dwarfs and neutron stars
	// scatter, which changes few objects.
	for i, want := range reference.Python(t, "testdata/contracting.py")[0] {
		if got := []float64{mean, half, end}[i]; math.Abs(got/want-1) > 1e-3 {
			t.Errorf("number %d (mean mass, half, end): %.6g, SciPy says %.6g", i, got, want)
		}
	}
}
