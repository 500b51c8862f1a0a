package lifetime

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// Fuel returns the law lifetime/fuel: the hydrogen a star burns over how
// brightly it burns it.
func Fuel() law.Law { return fuel{} }

type fuel struct{}

func (fuel) Describe() law.Card {
	return law.Card{
		Process: "lifetime", Name: "fuel", Version: "1",
		Summary: "lifetime is fuel over luminosity; light stars burn all their hydrogen, others a tenth",
		Formula: "main sequence = 1e10 yr (m/L) (f/0.1), f = core above 0.5 solMass, rising linearly in log m to 1 at 0.25 and below; " +
			"L = 0.23 m^2.3 below 0.43, m^4 below 2, 1.4 m^3.5 below 55, 32000 m above, solar units; " + postFormula,
		Domain: "tens of per cent from 0.08 to 10 solMass (1.16e13 yr at 0.08, 50 % too long at 0.1), too short above, by eight at 120",
		Sources: []string{
			"textbook scaling of luminosity with mass (from memory)",
			"Laughlin, Bodenheimer & Adams 1997, ApJ 482, 420 (stars below 0.25 solMass burn nearly all hydrogen)",
		},
		Notes: []string{
			"The path of f between 0.25 and 0.5 solMass is an assumption; lifetimes step by 4 % at 0.43, 1 % at 2, 2 % at 55 solMass, where the luminosity does.",
			"Metals, rotation and companions are left out.",
		},
		Accepts:   law.Accepts{Kinds: []string{"star"}},
		Questions: []law.Question{{Name: "live", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			post(),
			{Name: "core", Doc: "share of its hydrogen that a star above 0.5 solMass burns", Low: 0.08, High: 0.15, Preset: 0.1, Citation: "assumption: textbook 0.1, with which the Sun lives 1e10 yr"},
		},
	}
}

func (fuel) Answer(question string, in law.Batch) (law.Batch, error) {
	share, core := in.Parameters[0], in.Parameters[1]
	mass, wait := in.Values("mass"), in.NewValues()
	for i := range wait {
		wait[i] = stars.WithGiant(stars.FuelLife(mass[i], core), mass[i], share)
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
