package expansion

import "wane/sim/law"

// Open returns the law expansion/open: space without dark energy and with too
// little matter to be flat.
func Open() law.Law { return open{} }

type open struct{}

func (open) Describe() law.Card {
	p := today()
	p[hubble].Low = 50
	p[hubble].Citation = planck + "; 57.3 makes it 13.79e9 yr old"
	p[matter].Low, p[matter].High, p[matter].Preset, p[matter].Citation = 0.2, 0.9, 0.3, "assumption: the matter that is measured, without dark energy"
	return law.Card{
		Process: "expansion", Name: "open", Version: "1",
		Summary: "open space without dark energy: in the end it coasts, and the sky cools as 1/t for ever",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + (1 - Om - Or) a^-2]; in the end a = sqrt(1-Om) H0 t; no warm horizon",
		Domain:  "a world that is not ours: flatness and distant supernovae exclude it",
		Sources: []string{
			"Weinberg, S. 2008, Cosmology, Oxford University Press, section 1.5",
			"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (the open universe as a future)",
			fixsen,
		},
		Notes: []string{
			"With the preset rate today is 11.7e9 yr, and the sky at any date as cold as that makes it.",
			nothing,
		},
		Questions:  []law.Question{{Name: "density", Inputs: []string{"log10_since"}}},
		Parameters: p,
	}
}

func (open) Answer(question string, in law.Batch) (law.Batch, error) {
	return empty(in, 1-in.Parameters[matter]-in.Parameters[radiation]), nil
}
