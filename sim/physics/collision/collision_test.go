package collision

import (
	"math"
	"testing"

	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "collisions.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		switch q := row.Inputs["quantity"]; q {
		case "mean-density":
			row.Check(t, MeanDensity(number("number"), number("radius_pc")))
		case "time", "time-geometric":
			v := number("speed_km_s")
			years := Time(number("density_per_pc3"), CrossSection(number("distance_km"), number("mass_Msun"), v), v)
			if row.Dex {
				row.Check(t, math.Log10(years))
				continue
			}
			row.Check(t, years)
		case "star-making", "star-making-share", "per-object", "per-survivor":
			// Checked beside the laws, in plugins.
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestTermsAddUp: what two bodies seek of one another by the four terms is
// n sigma v shared among all, for each pair of a group of unlike ones.
func TestTermsAddUp(t *testing.T) {
	type body struct{ r, m float64 } // km, solMass
	bodies := []body{{7e5, 1}, {6.4e4, 0.03}, {8841, 0.6}, {11.5, 1.4}, {30, 10}, {2e5, 0.2}}
	g := Galaxy{Radius: 3000, Dispersion: 86}
	const each = 1e9 // of every kind
	for _, b := range bodies {
		g.Number, g.Mass, g.Radii = g.Number+each, g.Mass+each*b.m, g.Radii+each*InSolarRadii(b.r)
	}
	rates := RatesOf(g)
	// seeks is how often a given body a hits a given body b by its own clocks.
	seeks := func(a, b body) float64 {
		ra, rb := InSolarRadii(a.r), InSolarRadii(b.r)
		return math.Pow(10, rates.Area)*ra*ra/g.Number + math.Pow(10, rates.Touch)*ra*rb/g.Radii +
			math.Pow(10, rates.Weight)*a.m*ra/g.Number + math.Pow(10, rates.Pull)*ra*b.m/g.Mass
	}
	for _, a := range bodies {
		for _, b := range bodies {
			want := 1 / Time(MeanDensity(g.Number, g.Radius), CrossSection(a.r+b.r, a.m+b.m, g.Dispersion), g.Dispersion) / g.Number
			if got := seeks(a, b) + seeks(b, a); math.Abs(got/want-1) > 1e-12 {
				t.Errorf("%v with %v: %v a year, n sigma v/number is %v", a, b, got, want)
			}
		}
	}
}

func TestNothingToMeet(t *testing.T) {
	for _, g := range []Galaxy{{}, {Number: 10, Radius: 1}, {Number: 10, Dispersion: 1}, {Radius: 1, Dispersion: 1}} {
		if r := RatesOf(g); r.Area != math.Inf(-1) || r.Touch != math.Inf(-1) || r.Weight != math.Inf(-1) || r.Pull != math.Inf(-1) {
			t.Errorf("%+v: %+v, want no rate", g, r)
		}
	}
}
