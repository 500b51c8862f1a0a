// Package tunnelling holds the laws of how cold matter tunnels into black
// holes.
package tunnelling

import "wane/sim/law"

// accepts is every cold body that is no hole yet.
func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"brown-dwarf", "white-dwarf", "neutron-star", "relic", "iron-star"}}
}

// soonest is below the wait of a hole of the Planck mass, the lightest there
// is: log10 of years.
const soonest = 1e26
