package metals

import "wane/sim/law"

// Solar returns the law metals/solar: every object is born with the Sun's
// share of heavy elements.
func Solar() law.Law { return solar{} }

type solar struct{}

func (solar) Describe() law.Card {
	return law.Card{
		Process: "metals", Name: "solar", Version: "1",
		Summary: "every object is born with the Sun's heavy elements, whatever the date",
		Formula: "metals = sun (fraction of the mass in elements heavier than helium)",
		Domain:  "any date. Real objects scatter by a factor of about two, and the share grows as stars enrich the gas",
		Sources: []string{
			"assumption: no enrichment",
			"Anders & Grevesse 1989, Geochim. Cosmochim. Acta 53, 197 (0.02, the composition of the stellar models used for lifetimes); Asplund et al. 2009, ARA&A 47, 481 (0.0134)",
		},
		Notes:     []string{"Only laws that read metals feel it: lifetime/table, substellar-limit/fixed, remnant/cummings and collapse/raithel do not."},
		Questions: []law.Question{{Name: "metals"}},
		Parameters: []law.Parameter{{Name: "sun", Doc: "heavy elements by mass at birth", Low: 0.0134, High: 0.0201, Preset: 0.02,
			Citation: "Anders & Grevesse 1989; lower end Asplund et al. 2009"}},
	}
}

func (solar) Answer(question string, in law.Batch) (law.Batch, error) {
	metals := in.NewValues()
	for i := range metals {
		metals[i] = in.Parameters[0]
	}
	return in.Answer(law.Numbers("metals", metals)), nil
}
