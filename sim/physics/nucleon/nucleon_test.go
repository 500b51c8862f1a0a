package nucleon

import (
	"math"
	"strconv"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
)

// endMass reads the end of a row: a mass or a word.
func endMass(t *testing.T, row published.Row) float64 {
	switch word := row.Inputs["end"]; word {
	case "transparent":
		return Transparent
	case "last-nucleon":
		return LastNucleon()
	default:
		m, err := strconv.ParseFloat(word, 64)
		if err != nil {
			t.Fatalf("%s: end %q", row.Where(), word)
		}
		return m
	}
}

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "nucleon.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		power := func() float64 { return Power(number("mass_Msun"), number("share"), number("log10_tau_yr")) }
		switch q := row.Inputs["quantity"]; q {
		case "power":
			row.Check(t, power())
		case "power-Lsun":
			row.Check(t, power()/constant.SunL)
		case "temperature":
			row.Check(t, Temperature(power(), number("radius_km")))
		case "wait-tau":
			row.Check(t, math.Pow(10, Log10Wait(number("mass_Msun"), endMass(t, row), 0)))
		case "log10-wait":
			row.Check(t, Log10Wait(number("mass_Msun"), endMass(t, row), number("log10_tau_yr")))
		case "log10-operator":
			row.Check(t, Log10OperatorLife(number("dimension"), number("log10_scale_GeV")))
		case "log10-virtual-hole":
			row.Check(t, Log10VirtualHoleLife(number("power")))
		case "log10-tunnel":
			row.Check(t, Log10TunnelLife(number("inverse_coupling")))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestWaitIsIntegralOfLoss follows the loss rate in small steps from one mass
// to another and arrives after the wait.
func TestWaitIsIntegralOfLoss(t *testing.T) {
	const steps = 4000
	from, to, tau := 0.6, Transparent, 37.0
	h := math.Log(from/to) / steps
	sum := 0.0
	for i := range steps {
		m := to * math.Exp((float64(i)+0.5)*h)
		sum += m * h / math.Pow(10, Log10LossRate(m, tau))
	}
	if got := math.Pow(10, Log10Wait(from, to, tau)); math.Abs(sum/got-1) > 1e-11 {
		t.Errorf("wait %.15g yr, integral of the loss %.15g yr", got, sum)
	}
}

// TestWaitNearEnd holds the wait of a body just above its end to the first
// terms of the series ln(1+r) = r - r^2/2.
func TestWaitNearEnd(t *testing.T) {
	for _, r := range []float64{1e-4, 1e-6, 1e-9} {
		m := 0.1 * (1 + r)
		x := (m - 0.1) / 0.1
		want := math.Log10(x - x*x/2 + x*x*x/3)
		if got := Log10Wait(m, 0.1, 0); math.Abs(got-want) > 1e-11 {
			t.Errorf("r = %v: got %.15g, want %.15g", r, got, want)
		}
	}
	if got := Log10Wait(0.1, 0.1, 37); !math.IsInf(got, -1) {
		t.Errorf("at the end: wait %v, want -Inf", got)
	}
	if got := Log10LossRate(0, 37); !math.IsInf(got, -1) {
		t.Errorf("no mass: rate %v, want -Inf", got)
	}
}
