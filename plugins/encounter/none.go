package encounter

import "wane/sim/law"

// None lets no two objects meet.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "encounter", Name: "none", Version: "1",
		Summary: "no two objects ever meet",
		Formula: "no clock",
		Domain:  "every galaxy",
		Sources: []string{"assumption: a galaxy in which objects leave long before they meet"},
	})
}
