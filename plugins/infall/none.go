package infall

import "wane/sim/law"

// None is a central hole that takes nothing but what is left when the galaxy
// counts as over.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "infall", Name: "none", Version: "1",
		Summary: "nothing falls into the central hole",
		Formula: "hazard 0",
		Domain:  "an assumption",
		Sources: []string{"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337 (what is left out)"},
		Notes:   []string{"what is left at the end of a contracting galaxy still falls to its centre"},
		Accepts: law.Accepts{},
	})
}
