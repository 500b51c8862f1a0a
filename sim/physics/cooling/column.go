package cooling

import (
	"math"

	"wane/sim/num"
)

// A column is log10 T on a fixed grid of log10 age: fine from 1e3 to 1e18 yr,
// coarse to 1e98 yr, and beyond that the electrons' power law T ~ t^-1/2.
const (
	fineStart, fineStep   = 3.0, 1.0 / 128
	fineCells             = 15 * 128
	coarseStart           = fineStart + fineCells*fineStep
	coarseStep            = 1.0 / 8
	coarseCells           = 80 * 8
	coarseEnd             = coarseStart + coarseCells*coarseStep
	curveStep, curveSteps = num.Ln10 / 128, 8 * 128 // of ln T, below the switch
	tailStep, tailSteps   = num.Ln10 / 16, 46 * 16
)

type column [fineCells + 1 + coarseCells]float64

// column tabulates the dwarf's log10 T against log10 age.
func (d Dwarf) column() *column {
	c := new(column)
	meet := d.SwitchTemperature()
	age := d.MestelAge(meet)
	lnT := num.Log(meet)
	// Mestel: log age falls by 20/7 of log T.
	logAge, logT := num.Log10(age), lnT/num.Ln10
	i := 0
	for ; i < len(c) && gridAge(i) <= logAge; i++ {
		c[i] = math.Min(DwarfStart, logT+(logAge-gridAge(i))*7/20)
	}
	for step := 0; step < curveSteps+tailSteps && i < len(c); step++ {
		h := curveStep
		if step >= curveSteps {
			h = tailStep
		}
		age += d.cell(lnT, lnT-h)
		lnT -= h
		nextAge, nextT := num.Log10(age), lnT/num.Ln10
		for ; i < len(c) && gridAge(i) <= nextAge; i++ {
			w := (gridAge(i) - logAge) / (nextAge - logAge)
			c[i] = logT + w*(nextT-logT)
		}
		logAge, logT = nextAge, nextT
	}
	for ; i < len(c); i++ {
		c[i] = logT - (gridAge(i)-logAge)/2
	}
	return c
}

// gridAge is log10 age of a node.
func gridAge(i int) float64 {
	if i <= fineCells {
		return fineStart + float64(i)*fineStep
	}
	return coarseStart + float64(i-fineCells)*coarseStep
}

// place finds the cell of an age, the weight of its far end, and how much
// log10 T falls beyond the grid.
func place(logAge float64) (i int, w, beyond float64) {
	switch {
	case !(logAge > fineStart):
		return 0, 0, 0
	case logAge < coarseStart:
		x := (logAge - fineStart) / fineStep
		i = int(x)
		return i, x - float64(i), 0
	case logAge < coarseEnd:
		x := (logAge - coarseStart) / coarseStep
		i = int(x)
		return fineCells + i, x - float64(i), 0
	}
	return fineCells + coarseCells - 1, 1, (logAge - coarseEnd) / 2
}
