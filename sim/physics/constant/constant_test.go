package constant

import (
	"math"
	"testing"
)

// TestDerived compares combinations with the values that CODATA prints for
// them or that follow from IAU 2015 B3 by hand.
func TestDerived(t *testing.T) {
	for _, c := range []struct {
		name           string
		got, want, tol float64
	}{
		{"solar mass, kg", Sun, 1.988410e30, 3e-7},
		{"Planck mass, kg (CODATA 2022)", math.Sqrt(HBar * C / G), 2.176434e-8, 3e-7},
		{"Planck time, s (CODATA 2022)", math.Sqrt(HBar * G / (C * C * C * C * C)), 5.391247e-44, 3e-7},
		{"log10 of a year in s", Log10Year, math.Log10(Year), 1e-15},
		{"hbar", HBar, Planck / (2 * math.Pi), 1e-15},
		{"parsec, m", Parsec, 648000 / math.Pi * AU, 1e-15},
		{"Stefan-Boltzmann", StefanBoltzmann, 2 * math.Pow(math.Pi, 5) * math.Pow(Boltzmann, 4) / (15 * math.Pow(Planck, 3) * C * C), 1e-10},
		{"radiation constant", Radiation, 7.56573325e-16, 1e-9},
	} {
		if math.Abs(c.got/c.want-1) > c.tol {
			t.Errorf("%s: got %.12g, want %.12g", c.name, c.got, c.want)
		}
	}
}
