// Package cosmology holds formulas of the expanding background: ages and
// scale factors of a flat universe of matter and a cosmological constant,
// densities, the temperature of a horizon, and the date of a rip.
//
// Symbols: a is the scale factor, 1 today; x = ln a; L = log10(t/yr) since
// the Big Bang; H the expansion rate, H0 today's in km/s/Mpc; Om, OL, Or the
// matter, dark-energy and radiation densities over the critical one today;
// eps = -d ln H / d ln a, 0 in de Sitter space, 3/2 in matter.
//
// Left out: perturbations, and neutrinos that turn from radiation to matter
// (every massive neutrino counts as matter, right for the future).
//
// Sources: Weinberg 2008, Cosmology, chapter 1; Gibbons & Hawking 1977, Phys.
// Rev. D 15, 2738; Caldwell, Kamionkowski & Weinberg 2003, Phys. Rev. Lett.
// 91, 071301; Planck Collaboration VI 2020, A&A 641, A6.
package cosmology
