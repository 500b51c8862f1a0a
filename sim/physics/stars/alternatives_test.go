package stars

import (
	"math"
	"testing"

	"wane/testdata/published"
)

func TestMetalsPublished(t *testing.T) {
	for _, row := range published.Rows(t, "metals.csv") {
		switch quantity := row.Inputs["quantity"]; quantity {
		case "growing":
			row.Check(t, GrowingMetals(row.Number(t, "log10_yr"), SolarMetals, 10, 10, 14)/SolarMetals)
		case "hydrogen-limit":
			row.Check(t, HydrogenLimit(row.Number(t, "suns")*SolarMetals, SolarMetals))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

func TestLifetimesPublished(t *testing.T) {
	for _, row := range published.Rows(t, "lifetimes.csv") {
		m := row.Number(t, "mass_Msun")
		switch quantity := row.Inputs["quantity"]; quantity {
		case "power-law":
			row.Check(t, math.Pow(10, PowerLawLife(m, row.Number(t, "alpha"))))
		case "fuel":
			row.Check(t, math.Pow(10, FuelLife(m, 0.1)))
		case "stretch":
			row.Check(t, math.Pow(10, MetalsStretch(m, row.Number(t, "suns")*SolarMetals, SolarMetals, PeakMetals, MetalsExponent)))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// The limit falls as metals grow, without steps, and stays at both ends.
func TestHydrogenLimitFalls(t *testing.T) {
	before := HydrogenLimit(0, SolarMetals)
	for l := -6.0; l < 2; l += 1e-3 {
		m := HydrogenLimit(SolarMetals*math.Pow(10, l), SolarMetals)
		if m > before || before-m > 1e-4 {
			t.Fatalf("limit at 10^%v suns: %v after %v", l, m, before)
		}
		before = m
	}
	if before != 0.040 {
		t.Errorf("limit at 100 suns is %v, want 0.040", before)
	}
}

// The ratio of mass to light in logarithms is that of the luminosity.
func TestMassToLight(t *testing.T) {
	for m := 0.01; m < 150; m *= 1.01 {
		if got, want := massToLight(m, math.Log10(m)), math.Log10(m/Luminosity(m)); math.Abs(got-want) > 1e-12 {
			t.Errorf("m/L at %v: 10^%v, want 10^%v", m, got, want)
		}
	}
}
