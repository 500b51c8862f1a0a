package cooling

import "sync/atomic"

// masses are the masses, in solar masses, of the columns of a table.
var masses = [...]float64{
	0.001, 0.0015, 0.0022, 0.0033, 0.005, 0.007, 0.01, 0.014, 0.02, 0.028, 0.04,
	0.05, 0.06, 0.07, 0.08, 0.09, 0.10, 0.11, 0.12, 0.13, 0.14, 0.15, 0.16, 0.18, 0.20, 0.22, 0.24, 0.26, 0.28, 0.30,
	0.325, 0.35, 0.375, 0.40, 0.425, 0.45, 0.475, 0.50, 0.525, 0.55, 0.575, 0.60, 0.64, 0.68, 0.72, 0.76, 0.80, 0.84, 0.88,
	0.92, 0.96, 1.00, 1.04, 1.08, 1.12, 1.15, 1.18, 1.21, 1.24, 1.27, 1.30, 1.32, 1.34, 1.36, 1.38, 1.40, 1.42, 1.44,
}

// DwarfTable is the temperature of white dwarfs by mass and age, for one
// envelope and one kind of ion: what [Dwarf.Age] says, inverted. Columns are
// worked out when first asked for and never change; it is safe for concurrent
// use, and what it answers does not depend on what was asked before.
type DwarfTable struct {
	ions    Ions
	env     Envelope
	columns [len(masses)]atomic.Pointer[column]
}

// NewDwarfTable returns an empty table.
func NewDwarfTable(ions Ions, env Envelope) *DwarfTable { return &DwarfTable{ions: ions, env: env} }

// Temperature returns log10 of the effective temperature of a white dwarf of
// mass m at an age.
//
// Units: m in solar masses, logAge in log10 years, result in log10 K.
// Domain: any age, -Inf and +Inf included; m is held to 0.001 .. 1.44.
// Falls, or stays, as the age rises.
// Error: interpolation within 0.002 dex of [Dwarf.Age], in log10 T or in log10
// age, from 0.05 to 1.40 solar masses.
// Special cases: 5 at -Inf, -Inf at +Inf.
func (t *DwarfTable) Temperature(m, logAge float64) float64 {
	i, w, beyond := place(logAge)
	low, share := t.bracket(m)
	a, b := t.columnOf(low), t.columnOf(low+1)
	ya := a[i] + w*(a[i+1]-a[i])
	yb := b[i] + w*(b[i+1]-b[i])
	return ya + share*(yb-ya) - beyond
}

// bracket finds the column at or below a mass and the weight of the next.
func (t *DwarfTable) bracket(m float64) (low int, share float64) {
	last := len(masses) - 1
	if !(m > masses[0]) {
		return 0, 0
	}
	if m >= masses[last] {
		return last - 1, 1
	}
	low, high := 0, last
	for high-low > 1 {
		if middle := (low + high) / 2; masses[middle] <= m {
			low = middle
		} else {
			high = middle
		}
	}
	return low, (m - masses[low]) / (masses[low+1] - masses[low])
}

func (t *DwarfTable) columnOf(i int) *column {
	if c := t.columns[i].Load(); c != nil {
		return c
	}
	c := NewDwarf(masses[i], t.ions, t.env).column()
	t.columns[i].Store(c)
	return c
}
