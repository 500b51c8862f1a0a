package cosmology_test

import (
	"math"
	"testing"

	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/cosmology"
	"wane/sim/physics/hole"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, r := range published.Rows(t, "cosmology.csv") {
		h, om, at := r.Number(t, "hubble_km_per_s_per_Mpc"), r.Number(t, "matter"), r.Number(t, "at")
		f := cosmology.Flat{Hubble: h, Matter: om}
		joule := cosmology.DarkEnergyDensity(h, 1-om)
		answers := map[string]func() float64{
			"age":                 func() float64 { return num.Exp10(f.LogDate(0) - 9) },
			"log10_a":             func() float64 { return f.LnA(at) / num.Ln10 },
			"photons":             func() float64 { return cosmology.PhotonDensity(h, at) },
			"radiation":           func() float64 { return cosmology.RadiationDensity(h, at, 3.046) },
			"hubble_radius_end":   func() float64 { return num.Exp10(-f.LogHubbleEnd() - 9) },
			"horizon_temperature": func() float64 { return num.Exp10(cosmology.LogHorizonTemperature(f.LogHubbleEnd())) },
			"dark_energy_joule":   func() float64 { return joule },
			"dark_energy_gev":     func() float64 { return joule / (1e9 * constant.EV) },
			"dark_energy_kg":      func() float64 { return joule / (constant.C * constant.C) },
			"lambda":              func() float64 { return cosmology.CosmologicalConstant(h, 1-om) },
			"log10_entropy":       func() float64 { return cosmology.LogHorizonEntropy(f.LogHubbleEnd()) },
			"log10_date_of_relic": func() float64 { return f.LogDateOfRelic(num.Log10(at), 2.7255) },
			"hole_as_warm_msun":   func() float64 { return hole.Temperature(1) / at },
			"hole_as_warm_kg":     func() float64 { return hole.Temperature(1) / at * constant.Sun },
			"age_with_radiation":  func() float64 { return cosmology.Age(h, om, at) / 1e9 },
			"rip_date":            func() float64 { return cosmology.RipDate(h, om, r.Number(t, "w")) / 1e9 },
			"log10_vacuum_tau":    func() float64 { return cosmology.LogVacuumTau(at) },
			"log10_vacuum_wait":   func() float64 { return cosmology.LogVacuumWait(at, f.LogHubbleEnd()) },
			"rip_wait":            func() float64 { return cosmology.RipWait(h, om, r.Number(t, "w")) / 1e9 },
		}
		answer, ok := answers[r.Inputs["quantity"]]
		if !ok {
			t.Fatalf("%s: quantity %q has no formula", r.Where(), r.Inputs["quantity"])
		}
		r.Check(t, answer())
	}
}

// LogDate and LnA undo one another, over the joints between their forms.
func TestFlatInverse(t *testing.T) {
	for _, f := range []cosmology.Flat{{67.66, 0.3111}, {70, 0.3}, {50, 1}} {
		for x := -30.0; x < 200; x += 0.37 {
			if back := f.LnA(f.LogDate(x)); !(math.Abs(back-x) < 1e-11*(1+math.Abs(x))) {
				t.Errorf("%+v: ln a %v: LnA(LogDate) = %v", f, x, back)
			}
		}
	}
}

// The limits of the closed form: matter alone early, a constant rate late.
func TestFlatLimits(t *testing.T) {
	f := cosmology.Flat{Hubble: 67.66, Matter: 0.3111}
	if slope := (f.LnA(3) - f.LnA(2)) / num.Ln10; math.Abs(slope-2./3) > 1e-12 {
		t.Errorf("early slope %v, want 2/3", slope)
	}
	if rate := (f.LnA(14) - f.LnA(13)) / 9e13; math.Abs(rate*num.Exp10(-f.LogHubbleEnd())-1) > 1e-12 {
		t.Errorf("late rate %v/yr, want H0 sqrt(OL)", rate)
	}
	for _, l := range []float64{400, 1e77} {
		if got := f.LnA(l); !math.IsInf(got, 1) {
			t.Errorf("ln a at 10^%v yr = %v, want +Inf", l, got)
		}
	}
}

// A system is stripped sqrt(7)/(3 pi) of its period before a rip with
// w = -1.5. Caldwell, Kamionkowski & Weinberg 2003 print, to one digit, 60 Myr
// for the Milky Way and 30 minutes for the Earth (from memory); their periods,
// 2.2e8 yr and 84.5 minutes at the surface, are handbook values.
func TestStripTime(t *testing.T) {
	for _, c := range []struct{ period, want float64 }{{220, 60}, {84.5, 30}, {1, math.Sqrt(7) / (3 * math.Pi)}} {
		if got := cosmology.StripTime(c.period, -1.5); !(math.Abs(got/c.want-1) < 0.3) {
			t.Errorf("period %v: stripped %v before the rip, want about %v", c.period, got, c.want)
		}
	}
	if got := cosmology.StripTime(1, -1.5); math.Abs(got-math.Sqrt(7)/(3*math.Pi)) > 1e-15 {
		t.Errorf("got %v", got)
	}
	if !math.IsNaN(cosmology.StripTime(1, -1)) || !math.IsNaN(cosmology.RipWait(70, 0.3, -0.9)) {
		t.Error("w >= -1 has no rip: want NaN")
	}
}
