// Package hole is the thermodynamics of black holes that are isolated,
// uncharged and not rotating: their temperature, the mass they radiate away,
// and how long that takes.
//
// A hole of mass M loses mass as
//
//	dM/dt = -alpha hbar c^4 / (G^2 M^2)
//
// where alpha adds up, over the particles that the hole is hot enough to
// radiate, how well they leave its field (the grey-body factors). Masses are
// in solar masses, times in years and, where they may be long, as log10 of
// years; temperatures in kelvin.
//
// Left out: spin, charge, absorption from the sky, quarks and gluons (holes
// below 1e11 kg, the last hour of a life), and the back-reaction of the
// emission on the metric.
//
// Sources: Hawking 1975; Page 1976, Phys. Rev. D 13, 198; MacGibbon 1991,
// Phys. Rev. D 44, 376.
package hole
