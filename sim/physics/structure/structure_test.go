package structure

import (
	"fmt"
	"math"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
	"wane/testdata/reference"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "structure.csv") {
		in := func(column string) float64 { return row.Number(t, column) }
		switch quantity := row.Inputs["quantity"]; quantity {
		case "radius":
			row.Check(t, WhiteDwarfRadius(in("mass_Msun")))
		case "central-density":
			row.Check(t, CentralDensity(in("mass_Msun")))
		case "mean-density":
			m := in("mass_Msun")
			row.Check(t, MeanDensity(m, WhiteDwarfRadius(m)))
		case "limiting-mass":
			row.Check(t, LimitingMass(in("mu_e")))
		case "fit-deviation":
			m := in("mass_Msun")
			x := math.Pow(1.459/m, 2.0/3)
			row.Check(t, 0.01125*constant.SunR/1e3*math.Sqrt(x-1/x)/WhiteDwarfRadius(m)-1)
		case "relativistic-peak":
			row.Check(t, RelativisticPeak(in("mu_e")))
		case "hole-radius":
			row.Check(t, HoleRadius(in("mass_Msun")))
		case "star-radius":
			row.Check(t, MainSequenceRadius(in("mass_Msun")))
		case "earth-mean-density":
			row.Check(t, MeanDensity(constant.GMEarth/constant.GMSun, 6371.0))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// Radius and central density against Chandrasekhar's equation, solved by
// SciPy at masses between the table's.
func TestAgainstStructureEquation(t *testing.T) {
	masses := []float64{0.055, 0.07, 0.09, 0.175, 0.35, 0.45, 0.65, 0.85, 1.05, 1.15, 1.275, 1.34, 1.395, 1.425, 1.437}
	var args []string
	for _, m := range masses {
		args = append(args, fmt.Sprint(m))
	}
	for i, want := range reference.Python(t, "testdata/structure.py", args...) {
		m := masses[i]
		if got := WhiteDwarfRadius(m); math.Abs(got/want[1]-1) > 7e-4 {
			t.Errorf("radius at %v is %.7g km, SciPy says %.7g", m, got, want[1])
		}
		if got := CentralDensity(m); math.Abs(got/want[2]-1) > 2.1e-3 {
			t.Errorf("central density at %v is %.7g g/cm3, SciPy says %.7g", m, got, want[2])
		}
	}
	if limit := reference.Python(t, "testdata/structure.py")[0][0]; math.Abs(LimitingMass(2)/limit-1) > 1e-7 {
		t.Errorf("limiting mass is %.9g, SciPy says %.9g", LimitingMass(2), limit)
	}
}

// The greatest mass in general relativity against SciPy, which integrates in
// another variable.
func TestRelativisticPeakAgainstSciPy(t *testing.T) {
	mus := []float64{2, 56. / 26, 2.4}
	var args []string
	for _, mu := range mus {
		args = append(args, fmt.Sprint(mu))
	}
	for i, want := range reference.Python(t, "testdata/relativistic.py", args...) {
		got := RelativisticPeak(mus[i])
		if math.Abs(got/want[0]-1) > 1e-5 {
			t.Errorf("mu_e = %v: peak at %.8g, SciPy says %.8g", mus[i], got, want[0])
		}
		if limit := LimitingMass(mus[i]); !(got < limit) || got < 0.95*limit {
			t.Errorf("mu_e = %v: peak at %v, Newton's limit is %v", mus[i], got, limit)
		}
	}
}

// Limits: electrons without and with speed near light, light bodies of
// constant density, the scaling with mu_e.
func TestLimits(t *testing.T) {
	// Not degenerate any more: R ~ M^1/3, so the mean density is constant.
	if a, b := WhiteDwarfRadius(1e-15), WhiteDwarfRadius(8e-15); math.Abs(b/a-2) > 0.01 {
		t.Errorf("eight times the mass of a pebble has %v times the radius, want 2", b/a)
	}
	if a, b := WhiteDwarfRadius(math.Nextafter(0.05, 0)), WhiteDwarfRadius(0.05); math.Abs(a/b-1) > 1e-9 {
		t.Errorf("radius jumps at 0.05: %v, %v km", a, b)
	}
	before := math.Inf(1)
	for m := 0.003; m < 1.44; m *= 1.002 {
		r := WhiteDwarfRadius(m)
		if !(r < before) {
			t.Fatalf("radius at %v does not fall: %v after %v km", m, r, before)
		}
		before = r
	}
	if got := WhiteDwarfRadius(2); got != WhiteDwarfRadius(1.44) {
		t.Errorf("radius at 2 is %v km, want that at 1.44 held", got)
	}
	iron := 56.0 / 26
	m := 0.5
	if got, want := WhiteDwarfRadiusOf(m, iron), WhiteDwarfRadius(m*iron*iron/4)*2/iron; got != want {
		t.Errorf("iron dwarf: %v km, want %v", got, want)
	}
	if r := WhiteDwarfRadius(0); r != 0 {
		t.Errorf("radius at mass 0 is %v km", r)
	}
	if !math.IsNaN(WhiteDwarfRadius(-1)) {
		t.Error("a negative mass has a radius")
	}
}
