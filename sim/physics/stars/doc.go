// Package stars holds what is true of stars while they shine: when they are
// born, how long they live, how bright and how hot they are, and what divides
// them from brown dwarfs.
//
//	m     mass at birth, solar masses
//	t     time, years (log10 of it where a result may leave float64's range)
//	L, R  luminosity and radius in nominal solar units
//	T     effective temperature, K
//	Z     heavy elements, as a fraction of the mass
//
// Everything is for single stars, and but for what takes Z for those of solar
// composition. Left out: binaries, rotation, and how a star brightens while it
// ages.
//
// Sources: [SchallerEtAl1992] and [LaughlinEtAl1997] for lifetimes,
// [BurrowsEtAl2001] for the hydrogen-burning limit, [AdamsLaughlin1997] for
// what metals and recycled gas do; textbook power laws for luminosity and
// radius.
package stars
