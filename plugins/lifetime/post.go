package lifetime

import "wane/sim/law"

// postFormula says what every law here adds to the main sequence.
const postFormula = "times 1 + post w, w = 0 below 0.25 solMass, 1 above 0.5, linear in mass between"

// post is the parameter of that.
func post() law.Parameter {
	return law.Parameter{Name: "post", Doc: "giant and later phases, as a share of the main sequence, for stars above 0.5 solMass",
		Low: 0.05, High: 0.15, Preset: 0.10, Citation: "assumption, after Schaller et al. 1992"}
}
