package supernova

import (
	"wane/sim/law"
	"wane/sim/physics/coldmatter"
)

type anchored struct{}

// Anchored is a line between the first and the last published date.
func Anchored() law.Law { return anchored{} }

// Places of the parameters on the card.
const (
	first = iota
	last
	anchoredOutcome
)

func (anchored) Describe() law.Card {
	return law.Card{
		Process: "supernova", Name: "anchored", Version: "1",
		Summary: "cold dwarfs above 1.16 solMass burn to iron and collapse, the heaviest first",
		Formula: "log10 t = first (last/first)^[(1.35 - M)/0.19], first and last the log10 of years at 1.35 and 1.16 solMass; M in solMass, held from 1.40 on",
		Domain:  "white dwarfs from 1.16 solMass on; only the two ends are published, the line between is a guess; the date of the first is uncertain by hundreds of decades",
		Sources: []string{"Caplan, M. E. 2020, Mon. Not. R. Astron. Soc. 497, 4357 (the two ends; masses from memory)"},
		Notes: []string{
			"the line between the ends and beyond the upper one, to 10^453 yr at 1.40 solMass, is an assumption",
			"rates of fusion on a cold lattice do not reproduce 10^1100 yr: at the centre of 1.35 solMass they give some 10^285 (law zero-temperature-lattice). Unresolved",
			"lighter dwarfs stay stable as iron; process iron speaks for them, and its 10^1500 yr would be earlier than most dates here. Unresolved",
			remains,
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			{Name: "first", Unit: "yr", Log10: true, Doc: "delay at 1.35 solMass", Low: 250, High: 1100, Preset: 1100,
				Citation: "Caplan 2020; lower end: fusion on a cold lattice at the centre (assumption)"},
			{Name: "last", Unit: "yr", Log10: true, Doc: "delay at 1.16 solMass", Low: 1e4, High: 1e5, Preset: 32000,
				Citation: "Caplan 2020; range: assumption"},
			outcomeParameter(),
		},
		Outcomes: outcomes(),
	}
}

// Soonest is below the delay of the heaviest dwarf at any parameters.
func (anchored) Soonest() float64 { return 50 }

func (anchored) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, wait := in.Values("mass"), in.NewValues()
	for i := range m {
		wait[i] = coldmatter.Log10SupernovaDelay(m[i], in.Parameters[first], in.Parameters[last])
	}
	return answer(in, wait, in.Parameters[anchoredOutcome]), nil
}
