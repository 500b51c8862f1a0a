package cooling

import "sync/atomic"

// zones are the masses, in solar masses, of the columns of a table: evenly
// spaced in each zone, by 2 % or less from 0.05 on, because the heat of
// freezing is a step in age that moves with mass.
var zones = [...]struct {
	first, step float64
	columns     int // before the next zone
}{
	{0.001, 0.001, 9}, {0.01, 0.0025, 16}, {0.05, 0.001, 50}, {0.10, 0.002, 50},
	{0.20, 0.004, 50}, {0.40, 0.005, 80}, {0.80, 0.01, 40}, {1.20, 0.01, 24},
}

// Ends of the table, and its number of columns.
const (
	lightestColumn = 0.001
	heaviestColumn = 1.44
	columns        = 9 + 16 + 50 + 50 + 50 + 80 + 40 + 24 + 1
)

// DwarfTable is the temperature of white dwarfs by mass and age, for one
// envelope and one kind of ion: what [Dwarf.Age] says, turned round. Between
// two columns the log of the age at a given temperature is linear in mass.
// Columns are worked out when first asked for and never change; it is safe for
// concurrent use, and what it answers does not depend on what was asked before.
type DwarfTable struct {
	ions    Ions
	env     Envelope
	columns [columns]atomic.Pointer[column]
}

// NewDwarfTable returns an empty table.
func NewDwarfTable(ions Ions, env Envelope) *DwarfTable { return &DwarfTable{ions: ions, env: env} }

// Temperature returns log10 of the effective temperature of a white dwarf of
// mass m at an age.
//
// Units: m in solar masses, logAge in log10 years, result in log10 K.
// Domain: any age, -Inf and +Inf included; m is held to 0.001 .. 1.44.
// Falls, or stays, as the age rises.
// Error: interpolation within 0.004 dex of [Dwarf.Age], in log10 age, from
// 0.05 to 1.40 solar masses (helium to 0.6, oxygen-neon from 1.0).
// Special cases: 5 at -Inf, -Inf at +Inf.
func (t *DwarfTable) Temperature(m, logAge float64) float64 {
	k, share := bracket(m)
	a, b := t.columnOf(k), t.columnOf(k+1)
	at := func(i int) float64 { return a[i] + share*(b[i]-a[i]) }
	if !(logAge > at(0)) {
		return DwarfStart
	}
	if end := at(lastNode); logAge >= end {
		return gridTemperature(lastNode, 0) - (logAge-end)/2
	}
	i, n := 0, lastNode // at(i) <= logAge < at(i+n)
	for n > 1 {
		half := n / 2
		if at(i+half) <= logAge {
			i += half
			n -= half
		} else {
			n = half
		}
	}
	low, high := at(i), at(i+1)
	return gridTemperature(i, (logAge-low)/(high-low))
}

// bracket finds the column at or below a mass and the weight of the next.
func bracket(m float64) (k int, share float64) {
	if !(m > lightestColumn) {
		return 0, 0
	}
	if m >= heaviestColumn {
		return columns - 2, 1
	}
	zone := 0
	for zone+1 < len(zones) && m >= zones[zone+1].first {
		k += zones[zone].columns
		zone++
	}
	x := (m - zones[zone].first) / zones[zone].step
	i := min(int(x), zones[zone].columns-1)
	return k + i, min(x-float64(i), 1)
}

// massOf is the mass of a column.
func massOf(k int) float64 {
	for _, z := range zones {
		if k < z.columns {
			return z.first + float64(k)*z.step
		}
		k -= z.columns
	}
	return heaviestColumn
}

func (t *DwarfTable) columnOf(k int) *column {
	if c := t.columns[k].Load(); c != nil {
		return c
	}
	c := NewDwarf(massOf(k), t.ions, t.env).column()
	t.columns[k].Store(c)
	return c
}
