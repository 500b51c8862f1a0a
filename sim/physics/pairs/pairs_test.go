package pairs

import (
	"math"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "pairs.csv") {
		switch q := row.Inputs["quantity"]; q {
		case "life":
			row.Check(t, Log10Life(row.Number(t, "density_gcm3"), Kappa))
		case "density-of-life":
			// By the power law from one solution.
			life := math.Log10(row.Number(t, "life_yr"))
			row.Check(t, math.Pow(10, (Log10Life(1, Kappa)-life)/1.5))
		case "kappa":
			years := row.Number(t, "life_yr")
			row.Check(t, years/math.Pow(10, Log10Life(row.Number(t, "density_gcm3"), 1)))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestWaitIsIntegralOfLoss follows the loss in small steps, across the mass
// below which density stays.
func TestWaitIsIntegralOfLoss(t *testing.T) {
	for name, b := range map[string]Body{
		"white dwarf": WhiteDwarf(0.6, Kappa), "brown dwarf": BrownDwarf(0.05, Kappa), "iron": IronBall(0.1, Kappa),
		"rigid": WhiteDwarf(1, Kappa).Rigid(), "small": BrownDwarf(5e-4, Kappa),
	} {
		end := 1e21 / constant.Sun
		const steps = 100000
		h := math.Log(b.Birth/end) / steps
		sum := 0.0
		for i := range steps {
			m := end * math.Exp((float64(i)+0.5)*h)
			sum += m * h / math.Pow(10, b.Log10LossRate(m))
		}
		if got := math.Pow(10, b.Log10Wait(b.Birth, end)); math.Abs(sum/got-1) > 1e-7 {
			t.Errorf("%s: wait %.15g yr, integral of the loss %.15g yr", name, got, sum)
		}
	}
}

func TestCorners(t *testing.T) {
	b := NeutronStar(1.4, Kappa)
	for _, c := range []struct {
		what      string
		got, want float64
	}{
		{"life of nothing dense", Log10Life(0, Kappa), math.Inf(1)},
		{"loss of nothing", b.Log10LossRate(0), math.Inf(-1)},
		{"wait at the end", b.Log10Wait(0.1, 0.1), math.Inf(-1)},
		{"time of a planet", WhiteDwarf(1e-9, Kappa).Log10Life, WhiteDwarf(PlanetLike, Kappa).Log10Life},
	} {
		if c.got != c.want {
			t.Errorf("%s: got %v, want %v", c.what, c.got, c.want)
		}
	}
}
