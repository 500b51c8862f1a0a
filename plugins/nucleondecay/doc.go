// Package nucleondecay holds the laws of how nucleons decay, and with them
// every body of ordinary matter. The laws differ in the mean life of a
// nucleon; what follows from it is the same for all.
package nucleondecay

import "wane/sim/law"

// accepts is every kind made of nucleons that outlives the stars.
func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"brown-dwarf", "white-dwarf", "neutron-star", "relic"}}
}

// atOnce is the wait of a body at or below its threshold, log10 yr.
const atOnce = -1000
