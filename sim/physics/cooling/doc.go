// Package cooling holds how white dwarfs, neutron stars and brown dwarfs cool
// when nothing warms them.
//
//	M, R      mass (solar masses), radius (km)
//	T         effective temperature, K
//	T_c       temperature of the isothermal interior, K
//	L         luminosity, 4 pi R^2 sigma T^4
//	Z, A      charge and mass number of the ions
//	theta     Debye temperature of the ion crystal, K
//	Gamma     Coulomb energy between ions over k T_c; they freeze at 175 to 230
//	r0        T_c/T at T = 5000 K for 0.6 solar masses and 8841 km
//	q         how T_c/T falls below 5000 K: as T^q
//
// White dwarfs follow two phases: Mestel's law while they are bright, then the
// heat of an ion crystal and of its electrons behind an envelope of given
// T_c/T. Neutron stars cool by neutrinos, then by photons; brown dwarfs by a
// fit. All are curves of temperature against age that only fall. Left out:
// hydrogen burning in shells, separation of elements (may hold a dwarf for
// another 1e9 to 1e10 yr), magnetic and rotational heat, and every floor: sky,
// dark matter, decay.
//
// The late atmosphere of a white dwarf is an unsolved problem: q alone moves
// the date at which it reaches 5 K by three decades.
//
// Sources: [Mestel1952], [IbenTutukov1984], [ShapiroTeukolsky1983],
// [GudmundssonEtAl1983], [BurrowsLiebert1993].
package cooling
