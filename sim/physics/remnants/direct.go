package remnants

// FailureLimit is the mass at birth, in solar masses, above which stars fail to
// explode where all of them do: 18 to 25.
// Source: the red supergiants seen to explode end near 17 [Smartt2009], and some
// heavier ones may vanish unseen [KochanekEtAl2008] (both from memory); the
// numbers are assumptions.
const FailureLimit = 18.0

// DirectHole returns the mass of the hole that a star leaves when it falls in
// without an explosion.
//
//	f M_core + (1 - f) m,   M_core = -2.049 + 0.4140 m
//
// Units: m and result in solar masses; f, the share of the envelope that is
// lost, 0 .. 1.
// Domain: m >= 10; the core is fitted from 15 to 40 and carried on.
// Error: stars above 40 lose their envelopes to winds before, so that f = 0
// gives too much there.
// Source: [RaithelEtAl2018] for the core (from memory); the rest is an
// assumption. Checked by testdata/published/remnants.csv.
func DirectHole(m, f float64) float64 { return f*core(m) + (1-f)*m }

// StepHole is the mass, in solar masses, of every hole where one number serves
// for all; the mean of those known in binaries is near it. Assumption.
const StepHole = 8.0

// StepNeutronStar is the same for neutron stars. Assumption.
const StepNeutronStar = 1.35
