package hole

import (
	"fmt"
	"math"
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
	"wane/testdata/reference"
)

// lists are the species of the literature, by the name the rows use.
func lists() map[string][]Species {
	with := func(n int) []Species { return append(Light(), MasslessNeutrinos(n)...) }
	return map[string][]Species{
		"photons-gravitons":        Light(),
		"one-massless-neutrino":    with(1),
		"page-1976":                with(2),
		"three-massless-neutrinos": with(3),
	}
}

func sets() map[string]*Emission {
	out := map[string]*Emission{}
	for name, list := range lists() {
		out[name] = NewEmission(list)
	}
	return out
}

// spins are in the order in which greybody.py prints them.
var spins = []struct {
	name string
	spin Spin
}{{"scalar", Scalar}, {"half", Half}, {"vector", Vector}, {"graviton", Graviton}}

func spinNamed(t *testing.T, name string) Spin {
	for _, s := range spins {
		if s.name == name {
			return s.spin
		}
	}
	t.Fatalf("unknown spin %q", name)
	return 0
}

func speciesNamed(t *testing.T, name string) Species {
	for _, s := range append(append(Light(), MasslessNeutrinos(1)...), Massive()...) {
		if s.Name == name {
			return s
		}
	}
	t.Fatalf("unknown species %q", name)
	return Species{}
}

// TestStatesAgainstWaveEquation compares alpha of one state with the radial
// wave equation solved by SciPy, from the horizon to far outside.
func TestStatesAgainstWaveEquation(t *testing.T) {
	for i, want := range reference.Python(t, "testdata/greybody.py")[0] {
		if got := StateAlpha(spins[i].spin); math.Abs(got/want-1) > 2e-4 {
			t.Errorf("alpha of one %s state is %.5g, SciPy says %.6g", spins[i].name, got, want)
		}
	}
}

func TestPublished(t *testing.T) {
	alpha := func(set string) float64 {
		if set == "black-body" {
			return BlackBodyAlpha
		}
		e, ok := sets()[set]
		if !ok {
			t.Fatalf("unknown set %q", set)
		}
		return e.Massless()
	}
	for _, row := range published.Rows(t, "holes.csv") {
		set := row.Inputs["set"]
		mass := func() float64 { return row.Number(t, "mass_Msun") }
		switch q := row.Inputs["quantity"]; q {
		case "temperature":
			row.Check(t, Temperature(mass()))
		case "thermal-energy":
			row.Check(t, Temperature(mass())*constant.Boltzmann/constant.EV)
		case "alpha":
			row.Check(t, alpha(set))
		case "state-alpha":
			row.Check(t, StateAlpha(spinNamed(t, set)))
		case "state-weight":
			// dM/dt = -5.34e25 g^3/s f/M^2, hbar c^4/G^2 = 1.912263e29 g^3/s.
			row.Check(t, StateAlpha(spinNamed(t, set))*1.912263e29/5.34e25)
		case "species-alpha":
			row.Check(t, speciesNamed(t, set).Alpha())
		case "sum-of-species":
			sum := 0.0
			for _, s := range lists()[set] {
				sum += s.Alpha()
			}
			row.Check(t, sum)
		case "fraction-page-1976":
			var part float64
			switch set {
			case "neutrinos":
				part = MasslessNeutrinos(2)[0].Alpha()
			case "photons":
				part = Light()[0].Alpha()
			case "gravitons":
				part = Light()[1].Alpha()
			}
			row.Check(t, part/alpha("page-1976"))
		case "lifetime-natural":
			// G^2 M^3/(hbar c^4) is 1/lossUnit years at one solar mass.
			row.Check(t, math.Pow(10, Log10Lifetime(mass(), alpha(set)))*lossUnit)
		case "log10-lifetime":
			row.Check(t, Log10Lifetime(mass(), alpha(set)))
		case "lifetime":
			row.Check(t, math.Pow(10, Log10Lifetime(mass(), alpha(set)))*constant.Year)
		case "lifetime-years":
			row.Check(t, math.Pow(10, Log10Lifetime(mass(), alpha(set))))
		case "entropy":
			row.Check(t, Log10Entropy(mass()))
		case "absorbed-power":
			row.Check(t, AbsorbedPower(mass(), today))
		case "absorbed-mass":
			row.Check(t, AbsorbedPower(mass(), today)/(constant.C*constant.C))
		case "absorbed-part":
			row.Check(t, AbsorbedPower(mass(), today)*absorbingSeconds()/(mass()*constant.Sun*constant.C*constant.C))
		case "largest-mass":
			row.Check(t, LargestMass(h0*math.Sqrt(1-matter)))
		case "absorbed-over-emitted":
			emitted := math.Pow(10, Log10LossRate(mass(), alpha("photons-gravitons"))) * constant.Sun * constant.C * constant.C / constant.Year
			row.Check(t, AbsorbedPower(mass(), Temperature(mass()))/emitted)
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// today is the temperature of the relic sky, K (Fixsen 2009).
const today = 2.7255

// The expansion rate today, 1/s, and the share of matter (Planck Collaboration
// 2018).
const h0, matter = 67.66e3 / 3.0856775814913673e22, 0.3111

// absorbingSeconds is for how long the sky of today would have to last to give
// a hole what it takes in from now on: the integral of (T/today)^4 dt = a^-4
// da/(a H), in steps of ln a.
func absorbingSeconds() float64 {
	const steps, most = 4000, 12.0
	sum := 0.0
	for i := range steps {
		x := (float64(i) + 0.5) * most / steps // ln a
		sum += math.Exp(-4*x) / (h0 * math.Sqrt(matter*math.Exp(-3*x)+1-matter)) * most / steps
	}
	return sum
}

// TestMasslessSetLivesByClosedForm holds the integral to the closed form.
func TestMasslessSetLivesByClosedForm(t *testing.T) {
	for name, e := range sets() {
		for _, m := range []float64{1e-30, 1, 1e12} {
			if got, want := e.Log10Lifetime(m), Log10Lifetime(m, e.Massless()); got != want {
				t.Errorf("%s, %v Msun: got %v, want %v", name, m, got, want)
			}
		}
	}
}

// TestLifeIsIntegralOfLoss compares the quadrature with mpmath's (30 digits)
// of the same integral, from far above the first switch to far below the last.
func TestLifeIsIntegralOfLoss(t *testing.T) {
	e := NewEmission(Light(), Neutrinos(1e-3), Massive())
	masses := []string{"1e-25", "1e-19", "5e-18", "1e-16", "1e-13", "3e-10", "1e-9", "2.5e-8", "1e-6", "0.02", "0.03", "10", "1e12"}
	args := append([]string{"testdata/lifetime.py"}, masses...)
	out, err := exec.Command("/usr/bin/python3", args...).Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("mpmath is required: %v", err)
		}
		t.Skipf("no mpmath: %v", err)
	}
	lines := strings.Fields(string(out))
	if len(lines) != len(masses) {
		t.Fatalf("lifetime.py printed %d values for %d masses", len(lines), len(masses))
	}
	for i, s := range masses {
		m, _ := strconv.ParseFloat(s, 64)
		want, err := strconv.ParseFloat(lines[i], 64)
		if err != nil {
			t.Fatal(err)
		}
		// 1e-12 in ln t, and the rounding of the logarithm itself.
		if got := e.Log10Lifetime(m); math.Abs(got-want) > 1e-12+2e-16*math.Abs(want) {
			t.Errorf("%s Msun: log10 life %.15g, mpmath %.15g, difference %.1e", s, got, want, got-want)
		}
	}
}

func TestCorners(t *testing.T) {
	e := NewEmission(Light(), Neutrinos(1e-3), Massive())
	inf := math.Inf(1)
	for _, c := range []struct {
		what      string
		got, want float64
	}{
		{"temperature of nothing", Temperature(0), inf},
		{"log10 temperature of a hole that is gone", Log10Temperature(0), -inf},
		{"loss of nothing", Log10LossRate(0, 1e-5), -inf},
		{"loss without particles", Log10LossRate(1, 0), -inf},
		{"life of nothing", e.Log10Lifetime(0), -inf},
		{"life without particles", NewEmission().Log10Lifetime(1), inf},
	} {
		if c.got != c.want {
			t.Errorf("%s: got %v, want %v", c.what, c.got, c.want)
		}
	}
	if !math.IsNaN(Temperature(-1)) {
		t.Error("a negative mass has a temperature")
	}
	// At the extremes of float64 the logarithms stay finite.
	for _, m := range []float64{5e-324, 1e300} {
		if l := e.Log10Lifetime(m); l-l != 0 {
			t.Errorf("life of %v Msun: %v", m, l)
		}
	}
}

func ExampleEmission_Log10Lifetime() {
	e := NewEmission(Light())
	fmt.Printf("10 Msun: 10^%.3f yr\n", e.Log10Lifetime(10))
	// Output: 10 Msun: 10^70.064 yr
}
