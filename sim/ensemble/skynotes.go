package ensemble

import (
	"fmt"
	"maps"
	"math"
	"slices"

	"wane/sim/engine"
	"wane/sim/fade"
)

// skyNotes say what the sky does for ever, when dark energy decays, and what
// ends everything.
func skyNotes(outcomes []engine.Outcome) []string {
	var out []string
	say := func(format string, a ...any) { out = append(out, fmt.Sprintf(format, a...)) }
	ends := map[string][]float64{}
	var floors, decays, early, late []float64
	cold := 0
	for i := range outcomes {
		o := &outcomes[i]
		switch {
		case o.EndCause != "" && o.EndCause != "until":
			ends[o.EndCause] = append(ends[o.EndCause], o.End)
		case math.IsInf(o.SkyFloor, -1):
			cold++
		case !math.IsNaN(o.SkyFloor):
			floors = append(floors, o.SkyFloor)
		}
		if o.DarkEnergyDecays < o.End {
			decays = append(decays, o.DarkEnergyDecays)
			// A hole that has begun before goes on: its date is the earlier one.
			if o.HeavyStarts > o.DarkEnergyDecays {
				early = append(early, o.HeavyStarts)
			} else {
				late = append(late, o.HeavyStarts)
			}
		}
	}
	n := len(outcomes)
	if len(decays) > 0 {
		say("Dark energy decays%s at %s: from then on no horizon keeps the sky warm.", of(len(decays), n), dates(decays))
		if len(early) > 0 {
			say("Where it does so early%s, a hole of 1e9 Msun evaporates only from %s on: without dark energy the sky cools that slowly.",
				of(len(early), len(decays)), dates(early))
		}
		if len(late) > 0 {
			say("Where it does so late%s, a hole of 1e9 Msun has begun to evaporate at %s, before.", of(len(late), len(decays)), dates(late))
		}
	}
	if len(floors) > 0 {
		say("The horizon keeps the sky at 10^%.2f K for ever%s: nothing gets colder than that.", fade.Median(slices.Sorted(slices.Values(floors))), of(len(floors), n))
	}
	if cold > 0 {
		say("Nothing keeps the sky warm%s: it cools without end, and so does all that has no heat of its own.", of(cold, n))
	}
	for _, cause := range slices.Sorted(maps.Keys(ends)) {
		what := "Process " + cause + " ends everything"
		switch cause {
		case "rip":
			what = "Space is torn apart"
		case "vacuum-decay":
			what = "The vacuum decays, which ends everything"
		case "dark-energy-decay":
			what = "Dark energy decays, which ends everything"
		}
		say("%s%s, at %s.", what, of(len(ends[cause]), n), dates(ends[cause]))
	}
	return out
}

// of tells in how many of n realisations something is so, if not in all.
func of(k, n int) string {
	if k == n {
		return ""
	}
	return fmt.Sprintf(" in %d of %d realisations", k, n)
}

// dates are log10 dates in words: their median, and their range if they have one.
func dates(l []float64) string {
	l = slices.Clone(l)
	slices.Sort(l)
	low, high := l[0], l[len(l)-1]
	one := func(v float64) string {
		if v > 9999 {
			return fmt.Sprintf("10^%.4g", v)
		}
		return fmt.Sprintf("10^%.2f", v)
	}
	if one(low) == one(high) {
		return one(low) + " yr"
	}
	return fmt.Sprintf("%s yr (%s to %s)", one(fade.Median(l)), one(low), one(high))
}
