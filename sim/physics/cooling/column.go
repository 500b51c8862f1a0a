package cooling

import "wane/sim/num"

// A column is log10 age on a fixed grid of log10 T, from 1e5 K down: fine to
// 1e-2 K, coarse to 1e-50 K, and beyond that the electrons' power law, age ~
// T^-2. Node 166 is the knee of the envelope law, 5000 K, where curves bend.
const (
	fineStep, coarseStep   = 1.3010299956639813 / 166, 1.0 / 16 // log10(1e5/5000)/166
	fineCells, coarseCells = 893, 48 * 16
	lastNode               = fineCells + coarseCells
)

type column [lastNode + 1]float64

// gridTemperature is log10 T of a node, or of a place between two.
func gridTemperature(i int, w float64) float64 {
	if i < fineCells {
		return DwarfStart - (float64(i)+w)*fineStep
	}
	return DwarfStart - fineCells*fineStep - (float64(i-fineCells)+w)*coarseStep
}

// column tabulates [Dwarf.Age].
func (d Dwarf) column() *column {
	c := new(column)
	meet := d.SwitchTemperature()
	logMeet := num.Log10(meet)
	age, high := d.MestelAge(meet), meet
	for i := range c {
		t := num.Exp10(gridTemperature(i, 0))
		if t >= meet { // log age rises by 20/7 of what log T falls
			c[i] = num.Log10(age) + (logMeet-gridTemperature(i, 0))*20/7
			continue
		}
		age += d.Between(high, t)
		high = t
		c[i] = num.Log10(age)
	}
	return c
}
