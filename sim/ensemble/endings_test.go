package ensemble

import (
	"testing"

	"wane/sim/engine"
)

// An ending that came in one realisation is not inactive: by ending
// everything, or by the decay of dark energy before the end.
func TestInactiveEndings(t *testing.T) {
	info := dwarfs()
	for _, l := range [][2]string{{"vacuum-decay", "literal"}, {"dark-energy-decay", "drawn"}} {
		info.Laws = append(info.Laws, LawInUse{Process: l[0], Name: l[1], Version: "1"})
	}
	const never = "nothing got that far: no realisation lasted until it came"
	for _, x := range []struct {
		end, decays  float64
		cause        string
		vacuum, dark bool // inactive
	}{
		{inf, inf, "", true, true},
		{139, inf, "vacuum-decay", false, true},
		{inf, 11, "", true, false},
		{139, 11, "vacuum-decay", false, false},
		{10.5, 11, "rip", true, true},
		{10.7, inf, "dark-energy-decay", true, false},
	} {
		plain, o := outcome(population(1, 10, 20, 20, 20)), outcome(population(1, 10, 20, 20, 20))
		plain.End, plain.DarkEnergyDecays = inf, inf
		o.End, o.EndCause, o.DarkEnergyDecays = x.end, x.cause, x.decays
		found := map[string]string{}
		for _, i := range Summarise([]engine.Outcome{plain, o}, info).Inactive {
			found[i.Process] = i.Why
		}
		if why, inactive := found["vacuum-decay"]; inactive != x.vacuum || inactive && why != never {
			t.Errorf("%+v: vacuum-decay inactive %v: %q", x, inactive, why)
		}
		if why, inactive := found["dark-energy-decay"]; inactive != x.dark || inactive && why != never+", or it found no dark energy" {
			t.Errorf("%+v: dark-energy-decay inactive %v: %q", x, inactive, why)
		}
	}
}
