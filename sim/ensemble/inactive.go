package ensemble

import (
	"slices"

	"wane/sim/engine"
	"wane/sim/law"
)

// inactive lists the processes that did nothing in any realisation. Those
// whose laws make no events (the sky, founding, cooling, warmth) are listed
// only if their law is idle.
func inactive(outcomes []engine.Outcome, info *Info) []Inactive {
	var out []Inactive
	for _, l := range info.Laws {
		process, _ := law.ProcessNamed(l.Process)
		why := info.Reasons[l.Process]
		if why == "" && (process.Role != law.Stellar || counted(outcomes, l.Process)) {
			why = generalReason(process.Role)
		}
		if l.Process == "dark-energy-decay" {
			why += ", or it found no dark energy"
		}
		switch {
		case slices.Contains(info.Idle, l.Process) || l.Name == "none":
			out = append(out, Inactive{l.Process, l.Name, "it is switched off"})
		case len(outcomes) == 0 || fired(outcomes, l.Process) || process.Role == law.Ending && came(outcomes, l.Process):
		case process.Role == law.TwoBody:
			out = append(out, Inactive{l.Process, l.Name, "it speaks of pairs, and a run follows objects one by one"})
		case why != "":
			out = append(out, Inactive{l.Process, l.Name, "nothing got that far: " + why})
		}
	}
	return out
}

// generalReason is why a process of the role may have had nothing to do; empty
// for roles that make no events.
func generalReason(r law.Role) string {
	switch r {
	case law.Ending:
		return "no realisation lasted until it came"
	case law.Stellar:
		return "nobody it speaks for was founded, or none came to its end"
	case law.Dynamics:
		return "no object stayed bound until it acted"
	case law.Encounter:
		return "no two objects met"
	case law.Turning:
		return "whatever it could turn was gone before"
	case law.Wearing:
		return "whatever it wears was never there, or was gone before"
	}
	return ""
}

func fired(outcomes []engine.Outcome, process string) bool {
	for i := range outcomes {
		if outcomes[i].Fired[process] > 0 {
			return true
		}
	}
	return false
}

// came tells whether an ending came in any realisation: it ended everything,
// or dark energy decayed.
func came(outcomes []engine.Outcome, process string) bool {
	for i := range outcomes {
		o := &outcomes[i]
		if o.EndCause == process || process == "dark-energy-decay" && o.DarkEnergyDecays < o.End {
			return true
		}
	}
	return false
}

// counted tells whether the engine counts events of the process at all.
func counted(outcomes []engine.Outcome, process string) bool {
	for i := range outcomes {
		if _, ok := outcomes[i].Fired[process]; ok {
			return true
		}
	}
	return false
}
