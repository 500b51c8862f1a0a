package imf

import (
	"fmt"
	"math"
	"testing"

	"wane/testdata/published"
	"wane/testdata/reference"
)

// form is a mass function with the closed forms that the tests read.
type form interface {
	Mean() float64
	Median() float64
	NumberBelow(m float64) float64
	MassBelow(m float64) float64
	Quantile(u float64) float64
	Limits() (low, high float64)
}

func named(t *testing.T, name string, low, high float64) form {
	t.Helper()
	var f form
	var err error
	switch name {
	case "salpeter":
		f, err = Salpeter(low, high, SalpeterSlope)
	case "chabrier":
		c := ChabrierSingle()
		f, err = c.With(low, high, c.Centre, c.Width, c.Slope)
	case "chabrier-system":
		c := ChabrierSystem()
		f, err = c.With(low, high, c.Centre, c.Width, c.Slope)
	default:
		t.Fatalf("no mass function %q", name)
	}
	if err != nil {
		t.Fatal(err)
	}
	return f
}

func TestMassFunctionsPublished(t *testing.T) {
	for _, row := range published.Rows(t, "massfunctions.csv") {
		if row.Inputs["quantity"] == "per-decade" {
			row.Check(t, perDecade(t, row.Inputs["function"], row.Number(t, "m1_Msun")))
			continue
		}
		f := named(t, row.Inputs["function"], row.Number(t, "low_Msun"), row.Number(t, "high_Msun"))
		switch quantity := row.Inputs["quantity"]; quantity {
		case "mean":
			row.Check(t, f.Mean())
		case "median":
			row.Check(t, f.Median())
		case "number-between":
			row.Check(t, f.NumberBelow(row.Number(t, "m2_Msun"))-f.NumberBelow(row.Number(t, "m1_Msun")))
		case "mass-between":
			row.Check(t, f.MassBelow(row.Number(t, "m2_Msun"))-f.MassBelow(row.Number(t, "m1_Msun")))
		case "step":
			const small = 1e-7 // solMass
			below := (f.NumberBelow(1) - f.NumberBelow(1-small)) / small
			above := (f.NumberBelow(1+small) - f.NumberBelow(1)) / small
			row.Check(t, above/below)
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// perDecade is dN/dlog10 m of the printed form, 1/pc^3, out of the normalised
// one: by what it is at ten solar masses, where it is 0.0443 x 10^-1.3.
func perDecade(t *testing.T, name string, m float64) float64 {
	f := named(t, name, 0.01, 120)
	slope := func(m float64) float64 {
		const small = 1e-6
		return (f.NumberBelow(m*(1+small)) - f.NumberBelow(m*(1-small))) / (2 * small)
	}
	return slope(m) / slope(10) * 0.0443 * math.Pow(10, -1.3)
}

// Moments, fractions, and the fraction below each quantile, against SciPy's
// quadrature of the printed form, which shares nothing with the error functions
// here.
func TestLogNormalAgainstQuadrature(t *testing.T) {
	uniforms := []float64{1e-6, 0.01, 0.2, 0.5, 0.8, 0.93, 0.95, 0.999, 1 - 1e-7}
	type input struct{ low, high, centre, width, amplitude, tail, slope float64 }
	for _, c := range []input{
		{0.01, 120, 0.079, 0.69, 0.158, 0.0443, 2.3},
		{0.08, 120, 0.079, 0.69, 0.158, 0.0443, 2.3},
		{0.01, 120, 0.22, 0.57, 0.086, 0.0443, 2.3},
		{0.03, 80, 0.1, 0.74, 0.112, 0.05, 2},
	} {
		f, err := NewLogNormal(c.low, c.high, c.centre, c.width, c.amplitude, c.tail, c.slope)
		if err != nil {
			t.Fatal(err)
		}
		var args []string
		for _, v := range []float64{c.low, c.high, c.centre, c.width, c.amplitude, c.tail, c.slope} {
			args = append(args, fmt.Sprintf("%.17g", v))
		}
		for _, u := range uniforms {
			args = append(args, fmt.Sprintf("%.17g", f.Quantile(u)))
		}
		want := reference.Python(t, "testdata/lognormal.py", args...)
		close := func(what string, got, want float64) {
			t.Helper()
			if !(math.Abs(got-want) <= 1e-9*math.Abs(want)) {
				t.Errorf("%+v: %s is %.12g, SciPy says %.12g", c, what, got, want)
			}
		}
		close("mean", f.Mean(), want[0][0])
		for i, m := range []float64{0.08, 0.5, 1, 8, 20} {
			close(fmt.Sprintf("number below %v", m), f.NumberBelow(m), want[1][i])
			close(fmt.Sprintf("mass below %v", m), f.MassBelow(m), want[2][i])
		}
		for i, u := range uniforms {
			close(fmt.Sprintf("number below the quantile of %v", u), u, want[3][i])
		}
	}
}

// Every quantile inverts the number below it, never falls, and keeps within
// the limits, with uniforms a few roundings apart where the two parts join.
func TestLogNormalQuantileInvertsNumber(t *testing.T) {
	for _, name := range []string{"chabrier", "chabrier-system"} {
		f := named(t, name, 0.01, 120)
		at := f.NumberBelow(1)
		var us []float64
		for i := 0; i <= 10000; i++ {
			us = append(us, float64(i)/10000)
		}
		for i := -200; i <= 200; i++ {
			us = append(us, at+float64(i)*1e-15)
		}
		for _, u := range us {
			m := f.Quantile(u)
			if got := f.NumberBelow(m); math.Abs(got-u) > 1e-12 {
				t.Fatalf("%s: number below the quantile of %v is %v", name, u, got)
			}
		}
		before := 0.0
		for i := 0; i <= 10000; i++ {
			m := f.Quantile(us[i])
			if m < before {
				t.Fatalf("%s: quantile falls at u = %v: %v after %v", name, us[i], m, before)
			}
			before = m
		}
		if low, high := f.Quantile(0), f.Quantile(1); low != 0.01 || high != 120 {
			t.Errorf("%s: quantiles of 0 and 1 are %v and %v, want the limits 0.01 and 120", name, low, high)
		}
	}
}

// A centre and width of the reader's leave the step at one solar mass as
// printed.
func TestChabrierKeepsItsStep(t *testing.T) {
	step := func(f LogNormal) float64 {
		const small = 1e-7
		return (f.NumberBelow(1+small) - f.NumberBelow(1)) / (f.NumberBelow(1) - f.NumberBelow(1-small))
	}
	c := ChabrierSingle()
	printed, err := c.With(0.01, 120, c.Centre, c.Width, c.Slope)
	if err != nil {
		t.Fatal(err)
	}
	for _, x := range [][2]float64{{0.063, 0.68}, {0.1, 0.74}} {
		f, err := c.With(0.01, 120, x[0], x[1], 2.3)
		if err != nil {
			t.Fatal(err)
		}
		if got, want := step(f), step(printed); math.Abs(got/want-1) > 1e-5 {
			t.Errorf("centre %v, width %v: step of %v, want %v", x[0], x[1], got, want)
		}
	}
}

func TestLogNormalFaults(t *testing.T) {
	good := [7]float64{0.01, 120, 0.079, 0.69, 0.158, 0.0443, 2.3}
	for i, bad := range []float64{0, 0.5, 0, 0, 0, 0, math.NaN()} {
		x := good
		x[i] = bad
		if _, err := NewLogNormal(x[0], x[1], x[2], x[3], x[4], x[5], x[6]); err == nil {
			t.Errorf("argument %d = %v: no error", i, bad)
		}
	}
	if _, err := NewLogNormal(1, 120, 0.079, 0.69, 0.158, 0.0443, 2.3); err == nil {
		t.Error("a lower limit of 1: no error")
	}
}
