// Package stars holds what is true of stars while they shine: when they are
// born, how long they live, how bright and how hot they are, and what divides
// them from brown dwarfs.
//
//	m     mass at birth, solar masses
//	t     time, years (log10 of it where a result may leave float64's range)
//	L, R  luminosity and radius in nominal solar units
//	T     effective temperature, K
//
// Everything is for single stars of solar composition on the main sequence.
// Left out: metals (see the laws that read them), binaries, rotation, and how
// a star brightens while it ages.
//
// Sources: [SchallerEtAl1992] and [LaughlinEtAl1997] for lifetimes,
// [BurrowsEtAl2001] for the hydrogen-burning limit; textbook power laws for
// luminosity and radius.
package stars
