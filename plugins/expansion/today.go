package expansion

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// Indices of the parameters that every law has; its own follow.
const (
	hubble = iota
	matter
	radiation
	temperature
	own
)

const (
	planck = "Planck Collaboration VI 2020, A&A 641, A6, table 2 (TT,TE,EE+lowE+lensing+BAO)"
	fixsen = "Fixsen 2009, ApJ 707, 916 (temperature)"
	// gone is a note of every law with dark energy.
	gone = "If an ending makes dark energy decay, it is gone at once and leaves nothing (assumption)."
	// nothing is a note of every law without dark energy.
	nothing = "It has no dark energy: an ending that makes dark energy decay changes nothing."
)

// today are the parameters of the universe as it is now.
func today(more ...law.Parameter) []law.Parameter {
	return append([]law.Parameter{
		hubble: {Name: "hubble", Unit: "km/s/Mpc", Doc: "expansion rate today", Low: 66, High: 74, Preset: 67.66,
			Citation: planck + "; range: Riess et al. 2022, ApJ 934, L7 (73.0 +- 1.0)"},
		matter: {Name: "matter", Doc: "matter over the critical density today, massive neutrinos included",
			Low: 0.27, High: 0.34, Preset: 0.3111, Citation: planck},
		radiation: {Name: "radiation", Doc: "radiation over the critical density today: 5.402e-5 photons, 9.139e-5 with massless neutrinos",
			Low: 0, High: 2e-4, Preset: 0, Citation: "assumption: left out, since it matters before 1e9 yr only"},
		temperature: {Name: "temperature", Unit: "K", Doc: "relic radiation today", Low: 2.7, High: 2.75, Preset: 2.7255,
			Citation: "Fixsen 2009, ApJ 707, 916 (2.72548 +- 0.00057)"},
	}, more...)
}

// logDark is log10 of today's density of dark energy in flat space: what
// matter and radiation leave of the critical one.
func logDark(parameters []float64) float64 {
	return num.Log10(1 - parameters[matter] - parameters[radiation])
}

// flat answers question density for flat space whose dark energy, while it
// has not begun to decay, has the density that dark says of row i.
func flat(in law.Batch, dark func(i int) float64) law.Batch {
	since, out, curvature := in.Values("log10_since"), in.NewValues(), in.NewValues()
	for i := range out {
		curvature[i] = 0
		if since[i] > math.Inf(-1) {
			out[i] = math.Inf(-1)
			continue
		}
		out[i] = dark(i)
	}
	return in.Answer(law.Numbers("log10_dark", out), law.Numbers("curvature", curvature))
}
