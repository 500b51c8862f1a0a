package cooling

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// DwarfStart is log10 of the effective temperature, K, that young white
// dwarfs are held at: Mestel's law has no beginning. Assumption.
const DwarfStart = 5.0

// switchLuminosity is where Mestel's law hands over, solar luminosities.
const switchLuminosity = 1e-4

// cellWidth is the widest cell of a quadrature, in ln T: 1/128 decade and a
// little, for the grid of a column is that wide.
const cellWidth = num.Ln10 / 127

// SwitchTemperature returns the effective temperature, K, at which the dwarf
// has faded to 1e-4 solar luminosities.
func (d Dwarf) SwitchTemperature() float64 {
	return math.Sqrt(math.Sqrt(switchLuminosity / Luminosity(d.radius, 1)))
}

// MestelAge returns the age, in years, by [MestelAge] at effective
// temperature t, K.
func (d Dwarf) MestelAge(t float64) float64 {
	return MestelAge(Luminosity(d.radius, t), d.mass, d.ions.A, d.ions.A/d.ions.Z)
}

// Between returns the years in which the dwarf cools from effective
// temperature high to low by its heat alone.
//
//	t = int C dT_c/L,   L = 4 pi R^2 sigma T^4
//
// Units: K, years.
// Domain: high >= low > 0.
// Error: quadrature 1e-6 (two-point Gauss in ln T, cells of at most 1/127
// decade).
func (d Dwarf) Between(high, low float64) float64 {
	if high > knee && low < knee { // the rate jumps there
		return d.Between(high, knee) + d.Between(knee, low)
	}
	x, end := num.Log(high), num.Log(low)
	cells := math.Ceil((x - end) / cellWidth)
	sum := 0.0
	for i := 0.0; i < cells; i++ {
		sum += d.cell(x+(end-x)*i/cells, x+(end-x)*(i+1)/cells)
	}
	return sum
}

// cell is the time, in years, between ln T = from and to: two-point Gauss.
func (d Dwarf) cell(from, to float64) float64 {
	const node = 0.57735026918962576 // 1/sqrt 3
	middle, half := (from+to)/2, (from-to)/2
	return (d.rate(middle-node*half) + d.rate(middle+node*half)) * half / constant.Year
}

// rate is -dt/d ln T, s.
func (d Dwarf) rate(lnT float64) float64 {
	t := num.Exp(lnT)
	core, slope := d.interior(lnT, t)
	return d.HeatCapacity(core) * slope / watts(d.radius, t)
}

// Age returns the age at which the dwarf has cooled to effective temperature
// t: Mestel's law down to 1e-4 solar luminosities, and from there the time
// that its heat takes.
//
// Units: t in K, result in years.
// Domain: 0 < t <= 1e5 K.
// Error: the two laws, where they meet, differ by 0.01 dex at 0.6 and up to
// 0.17 at other masses; 0.3 dex down to 798 K; below that as the package says.
func (d Dwarf) Age(t float64) float64 {
	meet := d.SwitchTemperature()
	if t >= meet {
		return d.MestelAge(t)
	}
	return d.MestelAge(meet) + d.Between(meet, t)
}
