package ensemble

import (
	"wane/sim/galaxy"
)

// Info is what a summary has to know about a run beside its outcomes.
type Info struct {
	Engine      string  // "individuals"
	Objects     int64   // simulated
	StandsFor   float64 // real objects in the galaxy
	Whole       bool    // each object is itself
	Requested   int     // realisations asked for
	Interrupted bool
	Seed        uint64
	Scenario    string
	Populations []galaxy.Population // in the order of the outcomes'
	Laws        []LawInUse          // in the order in which they are printed
	// Idle names the processes whose law never does anything (law.Card.Idle).
	Idle []string
	// Reasons tells, by process, why it may have had nothing to do, in words
	// that go after "nothing got that far: ". Those missing have a general one.
	Reasons map[string]string
}

// weight is how many real objects of the population each counted one is. The
// central hole is itself in any sample.
func (i *Info) weight(p galaxy.Population) float64 {
	if i.Whole || i.Objects == 0 || len(p.Kinds) == 1 && p.Kinds[0] == "central-hole" {
		return 1
	}
	return i.StandsFor / float64(i.Objects)
}
