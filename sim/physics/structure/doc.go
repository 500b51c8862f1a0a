// Package structure holds the sizes of cold and burning objects: radius,
// mean and central density by mass.
//
//	M      mass, solar masses
//	R      radius, km
//	rho    density, g/cm3 (the field's usual unit for dense matter)
//	mu_e   nucleons per electron: 2 for helium to neon, 56/26 for iron
//
// White dwarfs are the only objects with structure here: spheres of ideal
// electrons at zero temperature in Newtonian gravity [Chandrasekhar1935].
// Left out: the pull between ions and electrons (makes dwarfs smaller by 1 %
// at one solar mass, near 10 % at 0.05), heat (young light dwarfs are larger), general relativity
// and electron capture (they end stability at about 1.38 to 1.42 solar
// masses, before the limit given here), rotation.
// Neutron stars and brown dwarfs have one radius each: an assumption, good to
// 10 to 20 %.
package structure
