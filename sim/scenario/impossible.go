package scenario

import (
	"wane/sim/galaxy"
	"wane/sim/law"
)

// impossible warns of own populations that can never have a member.
func (b *builder) impossible(set *law.Set) {
	made := makes(set)
	if b.s.CentralMass > 0 || swallows(set) {
		made["central-hole"] = true
	}
	merges := false
	for _, u := range set.OfRole(law.Encounter) {
		merges = merges || u.Card.Answers("meet")
	}
	for _, p := range b.s.Populations[len(b.s.Populations)-b.s.own:] {
		if why := never(p.Condition, made, merges); why != "" {
			b.warn(b.at["populations."+p.Name], "population %s can never have a member: %s", p.Name, why)
		}
	}
}

// swallows tells whether a law of the run sends objects to the centre, where
// the first of them makes a hole if there is none.
func swallows(set *law.Set) bool {
	for _, u := range set.All() {
		if u.Card.StopFate == law.FateCentral || u.Card.Answers("divert") {
			return true
		}
		for _, c := range u.Card.Clocks {
			if c.Fate == law.FateCentral {
				return true
			}
		}
	}
	return false
}

// makes lists the kinds that can come to be in a run.
func makes(set *law.Set) map[string]bool {
	made := map[string]bool{"star": true, "brown-dwarf": true}
	for _, u := range set.All() {
		for _, q := range u.Card.Questions {
			if q.Name == "die" {
				for _, w := range q.Words {
					made[w] = true
				}
			}
		}
		for _, t := range u.Card.Thresholds {
			made[t.Becomes] = true
		}
		for _, o := range u.Card.Outcomes {
			made[o.Becomes] = true
		}
		if u.Card.Answers("meet") {
			for _, k := range []string{"white-dwarf", "neutron-star", "black-hole"} {
				made[k] = true
			}
			for _, k := range u.Card.Kinds {
				made[k.Name] = true
			}
		}
	}
	return made
}

// never tells why no object can satisfy a condition, "" if one can.
func never(c galaxy.Condition, made map[string]bool, merges bool) string {
	kinds := c.Kinds
	if len(kinds) == 0 {
		kinds = sortedKeys(made)
	}
	why := ""
	for _, k := range kinds {
		if why = neverKind(k, c, made); why == "" {
			break
		}
	}
	if len(kinds) > 1 && why != "" {
		why = "none of its kinds is ever in one of its places"
	}
	switch {
	case why != "":
		return why
	case len(c.Origins) == 1 && c.Origins[0] == "merged" && !merges:
		return "no law of this run merges objects"
	case c.Warmth != nil && c.Warmth.Unit == "floor" && !c.Warmth.Above && c.Warmth.Value <= 1:
		return "no object is ever colder than its own floor"
	}
	return ""
}

func neverKind(kind string, c galaxy.Condition, made map[string]bool) string {
	switch {
	case kind == "central-hole" && !made[kind]:
		return "the galaxy has no central hole (galaxy.central-mass is 0), and no law of this run makes one"
	case !made[kind]:
		return "no law of this run makes a " + kind
	case len(c.Places) == 0:
		return ""
	case kind == "central-hole" && !contains(c.Places, "central"):
		return "the central hole is always in place central"
	case kind == "central-hole":
		if len(c.Origins) == 1 && c.Origins[0] == "merged" {
			return "the central hole is founded"
		}
	case len(c.Places) == 1 && c.Places[0] == "central":
		return "only the central hole is ever in place central"
	}
	return ""
}
