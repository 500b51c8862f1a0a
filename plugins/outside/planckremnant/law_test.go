package main

import (
	"math"
	"testing"

	"wane/sim/law"
	"wane/sim/law/lawtest"
	"wane/testdata/published"
	"wane/testdata/reference"
)

func TestKit(t *testing.T) { lawtest.Run(t, planckRemnant{}) }

// ask asks one question about one mass, in remnants of the preset.
func ask(t *testing.T, question string, remnants float64) float64 {
	t.Helper()
	out, err := law.NewUse(planckRemnant{}).Ask(question, law.Batch{
		Rows: 1, Columns: []law.Column{law.Numbers("mass", []float64{remnants * planckMass})},
	})
	if err != nil {
		t.Fatal(err)
	}
	return out.Columns[0].Values[0]
}

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "planckremnant.csv") {
		x := row.Number(t, "remnants")
		switch q := row.Inputs["quantity"]; q {
		case "remnant-mass":
			// solMass c^2 in GeV: 1.98840987e30 kg, CODATA 2018.
			row.Check(t, planckMass*1.98840987e30*299792458*299792458/1.602176634e-10)
		case "temperature":
			row.Check(t, math.Pow(10, ask(t, "heat", x)))
		case "loss-over-hawking":
			loss := ask(t, "wear", x) + 2*math.Log10(x*planckMass)
			row.Check(t, math.Pow(10, loss)*evaporation/blackBody)
		case "time":
			// In 15360 pi Planck times, 5.391247e-44 s: Adler, Chen & Santiago's t_ch.
			row.Check(t, math.Pow(10, ask(t, "foretell", x))*31557600/(15360*math.Pi*5.391247e-44))
		case "log10-life":
			row.Check(t, ask(t, "foretell", x/planckMass))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestLifeAgainstClosedForm holds the quadrature to the closed form of Adler,
// Chen & Santiago 2001, and mpmath's quadrature (30 digits) of the loss.
func TestLifeAgainstClosedForm(t *testing.T) {
	closed := func(x float64) float64 {
		r := math.Sqrt(x*x - 1)
		return (8./3*x*x*x - 8*x - 1/x + 8./3*r*r*r - 4*r + 4*math.Acos(1/x) + 19./3) / 16
	}
	for x := 1.1; x < 1e8; x *= 1.3 {
		if got, want := life(x), closed(x); math.Abs(got/want-1) > 1e-9 {
			t.Errorf("from %.4g least masses: %.12g, closed form %.12g", x, got, want)
		}
	}
	for _, want := range reference.Python(t, "testdata/life.py") {
		if got := life(want[0]); math.Abs(got/want[1]-1) > 1e-9 {
			t.Errorf("from %v least masses: %.12g, mpmath says %.12g", want[0], got, want[1])
		}
	}
}
