package massfunction

import "wane/sim/law"

// masses answers with the quantiles of a mass function.
func masses(in law.Batch, f interface{ Quantile(u float64) float64 }) law.Batch {
	u, mass := in.Values("u"), in.NewValues()
	for i := range mass {
		mass[i] = f.Quantile(u[i])
	}
	return in.Answer(law.Numbers("mass", mass))
}
