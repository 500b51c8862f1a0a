package imf

import (
	"math"
	"testing"

	"wane/testdata/published"
	"wane/testdata/reference"
)

func kroupa(t *testing.T, low, high float64, slopes [3]float64) BrokenPowerLaw {
	t.Helper()
	b, err := Kroupa(low, high, slopes)
	if err != nil {
		t.Fatal(err)
	}
	return b
}

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "imf.csv") {
		b := kroupa(t, row.Number(t, "low_Msun"), row.Number(t, "high_Msun"), KroupaSlopes())
		switch quantity := row.Inputs["quantity"]; quantity {
		case "mean":
			row.Check(t, b.Mean())
		case "median":
			row.Check(t, b.Median())
		case "number-between":
			row.Check(t, b.NumberBelow(row.Number(t, "m2_Msun"))-b.NumberBelow(row.Number(t, "m1_Msun")))
		case "density":
			const step = 1e-7 // solMass, a part in 1e6 of where it is taken
			m := row.Number(t, "m1_Msun")
			row.Check(t, (b.NumberBelow(m+step)-b.NumberBelow(m))/step)
		case "mass-between":
			row.Check(t, b.MassBelow(row.Number(t, "m2_Msun"))-b.MassBelow(row.Number(t, "m1_Msun")))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// Moments and median against SciPy's adaptive quadrature and Brent's method,
// which share no formula with the closed forms: presets, and a case with slopes
// of exactly and nearly one.
func TestAgainstQuadrature(t *testing.T) {
	cases := []struct {
		args   []string
		low    float64
		slopes [3]float64
	}{
		{[]string{"0.01", "120", "0.3", "0.08", "1.3", "0.5", "2.3"}, 0.01, [3]float64{0.3, 1.3, 2.3}},
		{[]string{"0.01", "120", "1", "0.08", "1.0000000001", "0.5", "2"}, 0.01, [3]float64{1, 1.0000000001, 2}},
		{[]string{"0.1", "120", "-0.4", "0.08", "1.8", "0.5", "2.7"}, 0.1, [3]float64{-0.4, 1.8, 2.7}},
	}
	for _, c := range cases {
		b := kroupa(t, c.low, 120, c.slopes)
		want := reference.Python(t, "testdata/moments.py", c.args...)
		close := func(what string, got, want float64) {
			t.Helper()
			if !(math.Abs(got-want) <= 1e-9*math.Abs(want)) {
				t.Errorf("%v: %s is %.12g, SciPy says %.12g", c.args, what, got, want)
			}
		}
		close("mean", b.Mean(), want[0][0])
		close("median", b.Median(), want[0][1])
		for i, m := range []float64{0.08, 0.5, 1, 8, 20} {
			close("number", b.NumberBelow(m), want[1][i])
			close("mass", b.MassBelow(m), want[2][i])
		}
	}
}

func TestQuantileInvertsNumber(t *testing.T) {
	b := kroupa(t, 0.01, 120, KroupaSlopes())
	before := 0.0
	for i := 0; i <= 10000; i++ {
		u := float64(i) / 10000
		m := b.Quantile(u)
		if m < before {
			t.Fatalf("quantile falls at u = %v: %v after %v", u, m, before)
		}
		if got := b.NumberBelow(m); math.Abs(got-u) > 1e-12 {
			t.Fatalf("number below the quantile of %v is %v", u, got)
		}
		before = m
	}
	if low, high := b.Quantile(0), b.Quantile(1); low != 0.01 || high != 120 {
		t.Errorf("quantiles of 0 and 1 are %v and %v, want the limits 0.01 and 120", low, high)
	}
}

func TestFaults(t *testing.T) {
	for _, c := range []struct{ edges, slopes []float64 }{
		{[]float64{1}, nil},
		{[]float64{1, 2}, []float64{1, 2}},
		{[]float64{2, 1}, []float64{1}},
		{[]float64{0, 1}, []float64{1}},
		{[]float64{1, math.Inf(1)}, []float64{1}},
		{[]float64{1, 2}, []float64{math.NaN()}},
	} {
		if _, err := NewBrokenPowerLaw(c.edges, c.slopes); err == nil {
			t.Errorf("edges %v, slopes %v: no error", c.edges, c.slopes)
		}
	}
}
