package stars

import (
	"math"
	"testing"

	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	lifetimes := NewLifetimes()
	for _, row := range published.Rows(t, "stars.csv") {
		in := func(column string) float64 { return row.Number(t, column) }
		switch quantity := row.Inputs["quantity"]; quantity {
		case "main-sequence-life":
			row.Check(t, math.Pow(10, lifetimes.MainSequence(in("mass_Msun"))))
		case "life":
			row.Check(t, math.Pow(10, lifetimes.Life(in("mass_Msun"), 0.10)))
		case "turn-off":
			row.Check(t, lifetimes.TurnOff(math.Log10(in("years"))))
		case "luminosity":
			row.Check(t, Luminosity(in("mass_Msun")))
		case "temperature":
			row.Check(t, Temperature(in("mass_Msun")))
		case "log10-last-birth": // the median of the last of n is the quantile 2^(-1/n)
			u := math.Exp2(-1 / in("number"))
			row.Check(t, BirthDate(u, 9, math.Log10(in("tau_yr"))))
		case "log10-birth":
			row.Check(t, BirthDate(1-1/in("number"), 9, math.Log10(in("tau_yr"))))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// Lifetimes fall with mass everywhere, and the turn-off mass inverts them.
func TestTurnOffInvertsMainSequence(t *testing.T) {
	lifetimes := NewLifetimes()
	before := math.Inf(1)
	for m := 0.03; m < 150; m *= 1.003 {
		l := lifetimes.MainSequence(m)
		if !(l < before) {
			t.Fatalf("lifetime at %v does not fall: 10^%v after 10^%v yr", m, l, before)
		}
		if life := lifetimes.Life(m, 0.15); life < l || life > l+math.Log10(1.15)+1e-12 {
			t.Fatalf("whole life of %v is 10^%v yr, main sequence 10^%v", m, life, l)
		}
		if got := lifetimes.TurnOff(l); math.Abs(got/m-1) > 1e-10 {
			t.Fatalf("turn-off mass at the lifetime of %v is %v", m, got)
		}
		before = l
	}
	if got := lifetimes.MainSequence(0); !math.IsInf(got, 1) {
		t.Errorf("lifetime at mass 0 is 10^%v yr, want never", got)
	}
}

// The textbook pieces join to the per cents that their docs state.
func TestPiecesJoin(t *testing.T) {
	for m, within := range map[float64]float64{0.43: 0.04, 2: 0.011, 55: 0.02} {
		below, above := Luminosity(math.Nextafter(m, 0)), Luminosity(m)
		if math.Abs(below/above-1) > within {
			t.Errorf("luminosity at %v: %v below, %v above", m, below, above)
		}
	}
}

// Births: all dates are finite, none before the start, and the share born
// before a date is 1 - e^-x.
func TestBirthDate(t *testing.T) {
	for _, u := range []float64{0, 0x1p-53, 0.25, 0.5, 1 - 0x1p-53, 1} {
		d := BirthDate(u, 9, 9.5)
		if math.IsInf(d, 0) || math.IsNaN(d) || d < 9 {
			t.Errorf("birth date of %v is 10^%v yr", u, d)
		}
	}
	tau := math.Pow(10, 9.5)
	for _, u := range []float64{0.01, 0.3, 0.9, 0.999} {
		x := (math.Pow(10, BirthDate(u, 9, 9.5)) - 1e9) / tau
		if got := -math.Expm1(-x); math.Abs(got-u) > 1e-12 {
			t.Errorf("share born before the date of %v is %v", u, got)
		}
	}
}
