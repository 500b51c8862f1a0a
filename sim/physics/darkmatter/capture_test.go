package darkmatter

import (
	"math"
	"testing"

	"wane/sim/physics/constant"
	"wane/testdata/published"
)

// temperature of a body that radiates power (W) from radius r (km).
func temperature(power, r float64) float64 {
	return math.Pow(power/(4*math.Pi*r*r*1e6*constant.StefanBoltzmann), 0.25)
}

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "darkmatter.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		power := func() float64 {
			return Power(number("mass_Msun"), number("radius_km"), number("efficiency"), number("density_GeV_cm3"), number("speed_km_s"))
		}
		switch q := row.Inputs["quantity"]; q {
		case "power":
			row.Check(t, power())
		case "power-Lsun":
			row.Check(t, power()/constant.SunL)
		case "temperature":
			row.Check(t, temperature(power(), number("radius_km")))
		case "temperature-with-kinetic":
			row.Check(t, temperature(power()*Surface(number("mass_Msun"), number("radius_km")), number("radius_km")))
		case "temperature-kinetic":
			row.Check(t, temperature(power()*(Surface(number("mass_Msun"), number("radius_km"))-1), number("radius_km")))
		case "temperature-of-1e-12-Lsun":
			row.Check(t, temperature(1e-12*constant.SunL, number("radius_km")))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestLimits: without gravity a body captures what its cross-section sweeps
// up, and focusing adds a term in proportion to mass and radius.
func TestLimits(t *testing.T) {
	sweep := Power(0, 1000, 1, 0.3, 200)
	want := math.Pi * 1e12 * 0.3e15 * constant.EV * 2e5
	if math.Abs(sweep/want-1) > 1e-14 {
		t.Errorf("no mass: %v W, want %v W", sweep, want)
	}
	focus := Power(1, 1000, 1, 0.3, 200) - sweep
	if twice := Power(2, 1000, 1, 0.3, 200) - sweep; math.Abs(twice/focus-2) > 1e-12 {
		t.Errorf("twice the mass focuses %v times as much, want 2", twice/focus)
	}
	if got := Power(1, 0, 1, 0.3, 200); got != 0 {
		t.Errorf("a point captures %v W, want 0", got)
	}
}
