package coldmatter

import "wane/sim/num"

// Masses between which the delay of a black-dwarf supernova was worked out,
// solar masses.
const (
	LightestExploding = 1.16
	HeaviestAnchor    = 1.35
	heaviestDwarf     = 1.40 // no dwarf is heavier: it has collapsed before
)

// Log10SupernovaDelay returns how long a dwarf of mass m burns without heat
// until its core is iron enough to collapse.
//
//	log10 t = first (last/first)^[(1.35 - m)/0.19]
//
// Units: m in solar masses; first and last are the log10 of the years at 1.35
// and at 1.16 solar masses; result log10 of years.
// Domain: 1.16 <= m <= 1.35. Above, the same line up to 1.40, where it is held;
// below 1.16 a dwarf of iron is stable, but the line goes on.
// Error: only the two ends are published, from memory; the line between them
// is a guess (assumption).
// Source: [Caplan2020]. Checked by testdata/published/coldmatter.csv.
func Log10SupernovaDelay(m, first, last float64) float64 {
	x := (HeaviestAnchor - min(m, heaviestDwarf)) / (HeaviestAnchor - LightestExploding)
	return first * num.Pow(last/first, x)
}
