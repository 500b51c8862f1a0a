// Package curvature holds the laws of how dense matter might radiate itself
// away without a horizon. They wear matter beside whatever else does; holes
// keep the law of process evaporation.
package curvature

import "wane/sim/law"

// accepts is every kind made of matter that outlives the stars.
func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"white-dwarf", "neutron-star", "brown-dwarf", "relic"}}
}

// atOnce is the wait of a body at or below its threshold, log10 yr.
const atOnce = -1000
