package metals

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// Growing returns the law metals/growing: the later an object is born, the
// more heavy elements it has.
func Growing() law.Law { return growing{} }

type growing struct{}

// Indices of the parameters.
const (
	growingSun = iota
	growingFactor
	growingFrom
	growingTo
)

func (growing) Describe() law.Card {
	const source = "Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II"
	return law.Card{
		Process: "metals", Name: "growing", Version: "1",
		Summary: "later objects have more heavy elements, up to ten times the Sun's",
		Formula: "metals = sun (1 + (factor - 1) w), w = (log10 date - log10 from)/(log10 to - log10 from) within 0 .. 1",
		Domain:  "any date; constant before from and after to. Good to a factor of two; objects of one date scatter as much",
		Sources: []string{source + " (several to about ten times the Sun's metals at last)"},
		Notes: []string{
			"The straight line in log10 of the date, its ends and the factor are assumptions.",
			"Only laws that read metals feel it: lifetime/table-with-metals and substellar-limit/by-metals.",
			"Hardly an object is late enough to be rich under star-formation/exponential, which ends near 1e11 yr: take gas-limited with n above 1, or ends-at.",
		},
		Questions: []law.Question{{Name: "metals", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{
			growingSun:    {Name: "sun", Doc: "heavy elements by mass at birth, to begin with", Low: 0.0134, High: 0.0201, Preset: stars.SolarMetals, Citation: "Anders & Grevesse 1989; lower end Asplund et al. 2009"},
			growingFactor: {Name: "factor", Doc: "metals at last, over those to begin with", Low: 1, High: 20, Preset: 10, Citation: source + ": several to about 10; 20 is its far end"},
			growingFrom:   {Name: "from", Unit: "yr", Doc: "date from which metals grow", Log10: true, Low: 9, High: 11, Preset: 10, Citation: "assumption"},
			growingTo:     {Name: "to", Unit: "yr", Doc: "date at which they have grown", Log10: true, Low: 12, High: 15, Preset: 14, Citation: "assumption: about the end of star formation"},
		},
	}
}

func (growing) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	date, metals := in.Values("log10_date"), in.NewValues()
	for i := range metals {
		metals[i] = stars.GrowingMetals(date[i], p[growingSun], p[growingFactor], p[growingFrom], p[growingTo])
	}
	return in.Answer(law.Numbers("metals", metals)), nil
}
