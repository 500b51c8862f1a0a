// Package sky computes one realisation's background: how space expands, how
// warm the sky is, and what ends it all. It depends on nothing in the galaxy,
// so it is drawn first.
//
// The law of process expansion says how dense dark energy is; the package
// integrates
//
//	H^2 = H0^2 [Om a^-3 + Or a^-4 + Ok a^-2 + Ode]
//
// into tables of base-10 logarithms against L = log10(t/yr), up to where H is
// constant or a power law of time. From there on every answer is a closed
// form in L, so any date has one: ln a itself leaves the range of numbers at
// L = 318, temperatures and lengths do not.
//
// Symbols: x = ln a (0 today); since = time from the origin of a piece of sky
// (the Big Bang, or the date when dark energy began to decay), s its log10;
// p = H t; eps = -d ln H/dx (0 in de Sitter space, 3/2 in matter).
//
// The four-volume of the past light cone, c = 1, comes from a chain of four
// integrals that lose no digits to cancellation:
//
//	V4 = 4 pi/3 K3,  K_j = a^(j-3) int a'^3 (eta - eta')^j dt',  eta = int dt/a
//	dK0/dt = 1 - 3 H K0,  dK1/dt = K0 - 2 H K1,  dK2/dt = 2 K1 - H K2,  dK3/dt = 3 K2
//
// In curved space, with k = Ok H0^2, the powers of y = eta - eta' are those of
// a ball there: S = sinh(sqrt k y)/sqrt k and C = cosh(sqrt k y) make y^2 into
// S^2, y into S C, y^3 into 3 int S^2 dy, and dK1/dt gains 2 (k/a^2) K2.
//
// Assumptions: the horizon's temperature is hbar H/(2 pi k) while space
// accelerates (0 <= eps < 1), and zero otherwise; it adds to the relic
// radiation as the fourth power. The relic radiation stays a black body.
//
// Left out: skies that stop expanding and fall back; dark energy that changes
// only after ln a has left the range of numbers.
//
// Sources: Gibbons & Hawking 1977, Phys. Rev. D 15, 2738; Andreassen, Frost &
// Schwartz 2018, Phys. Rev. D 97, 056006 (four-volume).
package sky
