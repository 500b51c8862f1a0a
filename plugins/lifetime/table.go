package lifetime

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// Table returns the law lifetime/table: lifetimes interpolated in published
// stellar models of solar composition.
func Table() law.Law { return table{stars.NewLifetimes()} }

type table struct{ lifetimes *stars.Lifetimes }

func (table) Describe() law.Card {
	return law.Card{
		Process: "lifetime", Name: "table", Version: "1",
		Summary: "lifetimes of stellar models of solar composition, 2.6 million to 14 trillion years",
		Formula: "log-log interpolation of the main-sequence lifetime between 0.075 (1.4e13 yr) and 120 solMass (2.56e6 yr), " +
			"m^-2.8 below, last slope above; times 1 + post w, w = 0 below 0.25 solMass, 1 above 0.5, linear in mass between",
		Domain: "0.04 .. 150 solMass at solar metals. Some per cent above 0.8 solMass, 25 % from 0.12 to 0.6, tens of per cent below 0.08",
		Sources: []string{
			"Schaller et al. 1992, A&AS 96, 269 (0.8 .. 120 solMass, Z = 0.02)",
			"Laughlin, Bodenheimer & Adams 1997, ApJ 482, 420 (0.08 and 0.10 solMass)",
		},
		Notes: []string{
			"0.12 .. 0.6 solMass is bridged between the two sources, and 0.075 continues them: assumptions.",
			"Metals are not read. More metals lengthen the lives of red dwarfs up to about twice the Sun's (Adams & Laughlin 1997).",
			"Stars under 0.25 solMass burn nearly all their hydrogen and never become giants (Laughlin et al. 1997).",
			"Rotation and companions are left out.",
		},
		Accepts:    law.Accepts{Kinds: []string{"star"}},
		Questions:  []law.Question{{Name: "live", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{post()},
	}
}

func (l table) Answer(question string, in law.Batch) (law.Batch, error) {
	post := in.Parameters[0]
	mass, wait := in.Values("mass"), in.NewValues()
	for i := range wait {
		wait[i] = l.lifetimes.Life(mass[i], post)
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
