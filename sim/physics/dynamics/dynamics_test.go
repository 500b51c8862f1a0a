package dynamics

import (
	"math"
	"strings"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "dynamics.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		switch q := row.Inputs["quantity"]; q {
		case "crossing":
			row.Check(t, CrossingTime(number("radius_pc"), number("speed_km_s")))
		case "relaxation":
			row.Check(t, RelaxationTime(number("number"), number("radius_pc"), number("speed_km_s")))
		case "relaxation-100":
			row.Check(t, 100*RelaxationTime(number("number"), number("radius_pc"), number("speed_km_s")))
		case "relaxation-140":
			row.Check(t, 140*RelaxationTime(number("number"), number("radius_pc"), number("speed_km_s")))
		case "relaxation-al":
			row.Check(t, RelaxationTimeAL(number("number"), number("radius_pc"), number("speed_km_s")))
		case "half-mass-relaxation":
			n, m := number("number"), number("mass_Msun")
			row.Check(t, math.Pow(10, Log10HalfMassRelaxation(n, n*m, number("radius_pc"), CoulombLogarithm(n, 0.11))))
		case "dispersion":
			row.Check(t, Dispersion(number("number")*number("mass_Msun"), number("radius_pc")))
		case "closed-contracting":
			row.Check(t, ContractingTime(number("left"), number("xi")))
		case "closed-fixed-radius":
			row.Check(t, FixedRadiusTime(number("left"), number("xi")))
		case "closed-fixed-halo":
			row.Check(t, FixedHaloTime(number("left"), number("xi")))
		case "closed-balanced":
			row.Check(t, BalancedTime(number("left"), number("xi"), number("zeta")))
		case "balanced-exponent":
			row.Check(t, BalancedExponent(number("xi"), number("zeta")))
		case "influence":
			row.Check(t, InfluenceRadius(number("mass_Msun"), number("speed_km_s")))
		case "loss-cone-log10-rate":
			row.Check(t, Log10LossConeRate(4.3e6, number("mass_Msun"), number("speed_km_s"), number("radius_pc"), 1e11))
		case "swallow":
			row.Check(t, SwallowMass(number("mass_Msun"), number("radius_pc")*constant.Parsec/1e3))
		default:
			// Whole histories are checked beside the laws, in plugins and
			// plugins/ejection.
			if strings.HasPrefix(q, "galaxy-") || strings.HasPrefix(q, "default-galaxy-") || strings.HasPrefix(q, "fixed-logarithm-") {
				continue
			}
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestClosedForms integrates dN/dC = -xi N and the radius step by step and
// arrives where the closed forms say.
func TestClosedForms(t *testing.T) {
	const xi, zeta, steps = 1. / 140, 0.1, 20000
	for _, c := range []struct {
		name   string
		heat   float64
		closed func(x float64) float64
	}{
		{"contracting", 0, func(x float64) float64 { return ContractingTime(x, xi) }},
		{"balanced", zeta, func(x float64) float64 { return BalancedTime(x, xi, zeta) }},
	} {
		const left = 0.05
		h := math.Log(1/left) / xi / steps // of C
		sum := 0.0
		for i := range steps {
			C := (float64(i) + 0.5) * h
			n := math.Exp(-xi * C)
			r := ContractedRadius(1, n, 1-n, c.heat*C)
			sum += h * math.Sqrt(n) * r * math.Sqrt(r) // t_rh in units of its first value
		}
		if want := c.closed(left); math.Abs(sum/want-1) > 1e-6 {
			t.Errorf("%s: integrated %.9g t_rh, closed form %.9g", c.name, sum, want)
		}
	}
}

// TestRadiusIgnoresWinds: mass blown off before anything leaves does not
// contract the galaxy.
func TestRadiusIgnoresWinds(t *testing.T) {
	if got := ContractedRadius(1e4, 4e10, 0, 0); got != 1e4 {
		t.Errorf("radius %v pc, want 1e4", got)
	}
	if got := ContractedRadius(1e4, 1e9, 3e9, 0); got != 625 {
		t.Errorf("a quarter left: radius %v pc, want 1e4/16", got)
	}
	if got := CoulombLogarithm(3, 0.11); got != 1 {
		t.Errorf("three objects: Coulomb logarithm %v, want its floor 1", got)
	}
}
