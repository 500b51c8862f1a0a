package expansion

import (
	"math"

	"wane/sim/law"
)

// MatterOnly returns the law expansion/matter-only: flat space without dark
// energy, joined to today's age.
func MatterOnly() law.Law { return matterOnly{} }

type matterOnly struct{}

func (matterOnly) Describe() law.Card {
	p := today()
	p[hubble].Low, p[hubble].High, p[hubble].Preset = 44, 50, 47.28
	p[hubble].Doc = "2/(3 t0), the rate that makes it t0 old today: 47.28 for 13.787e9 yr. It is not the rate that is measured"
	p[hubble].Citation = planck + " (age 13.787 +- 0.020 Gyr); range 13.0 to 14.8 Gyr"
	p[matter].Low, p[matter].High, p[matter].Preset, p[matter].Citation = 1, 1, 1, "flat and nothing else"
	p[radiation].High, p[radiation].Citation = 0, "left out, so that a = (t/t0)^(2/3)"
	return law.Card{
		Process: "expansion", Name: "matter-only", Version: "1",
		Summary: "flat space, matter alone: the sky cools for ever, and no horizon keeps anything warm",
		Formula: "a = (t/t0)^(2/3), H = 2/(3 t); relic temperature T0 (t/t0)^(-2/3)",
		Domain:  "a world that is not ours: its expansion rate today is 47 km/s/Mpc. The cosmology behind the far futures of 1979 and 1997",
		Sources: []string{
			"Einstein, A. & de Sitter, W. 1932, Proc. Natl. Acad. Sci. 18, 213",
			"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337",
			fixsen,
		},
		Notes: []string{
			"Joined to today's age and not to today's expansion rate, with which today would be 9.6e9 yr.",
			nothing,
		},
		Questions:  []law.Question{{Name: "density", Inputs: []string{"log10_since"}}},
		Parameters: p,
	}
}

func (matterOnly) Answer(question string, in law.Batch) (law.Batch, error) { return empty(in, 0), nil }

// empty answers question density for space without dark energy.
func empty(in law.Batch, bent float64) law.Batch {
	dark, curvature := in.NewValues(), in.NewValues()
	for i := range dark {
		dark[i], curvature[i] = math.Inf(-1), bent
	}
	return in.Answer(law.Numbers("log10_dark", dark), law.Numbers("curvature", curvature))
}
