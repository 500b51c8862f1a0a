// Package galaxy holds what a galaxy is made of: populations and the
// conditions that define them, the ledger of mass, and galaxy values.
package galaxy

// Population is a named set of objects: those that satisfy its condition.
type Population struct {
	Name string
	Condition
}

// Condition tells whether an object is counted. Empty lists mean any.
type Condition struct {
	Kinds   []string
	Places  []string
	Origins []string
	Warmth  *Warmth
}

// Warmth is a condition on how warm or bright an object is.
type Warmth struct {
	Quantity string  // "temperature" or "luminosity"
	Above    bool    // > or <
	Value    float64 // in Unit
	Unit     string  // "K", "solLum", or "floor": times the object's own floor
}

// Default lists the populations every run counts.
func Default() []Population {
	return []Population{
		{"stars", Condition{Kinds: []string{"star"}, Origins: []string{"founded"}}},
		{"merged-stars", Condition{Kinds: []string{"star"}, Origins: []string{"merged"}}},
		{"all-stars", Condition{Kinds: []string{"star"}}},
		{"brown-dwarfs", Condition{Kinds: []string{"brown-dwarf"}}},
		{"white-dwarfs", Condition{Kinds: []string{"white-dwarf"}}},
		{"glowing-white-dwarfs", Condition{Kinds: []string{"white-dwarf"},
			Warmth: &Warmth{Quantity: "temperature", Above: true, Value: 798, Unit: "K"}}},
		{"neutron-stars", Condition{Kinds: []string{"neutron-star"}}},
		{"black-holes", Condition{Kinds: []string{"black-hole"}}},
		{"central-hole", Condition{Kinds: []string{"central-hole"}}},
		{"bound-objects", Condition{Places: []string{"bound"}}},
		{"adrift-objects", Condition{Places: []string{"adrift"}}},
	}
}
