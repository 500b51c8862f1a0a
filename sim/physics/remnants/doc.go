// Package remnants holds what stars leave behind: the mass of a white dwarf
// by the mass of its star, and neutron stars or black holes from collapse.
//
//	m   mass of the star at birth, solar masses
//	u   a uniform number, for what scatters between like stars
//
// Sizes that scatter are quantile functions of u, monotone; words (neutron
// star or hole) are probabilities. Metals, rotation and companions are left
// out: all relations are for single stars of about solar composition.
//
// Sources: [CummingsEtAl2018], [KaliraiEtAl2008] and [SalarisEtAl2009] for
// white dwarfs, [RaithelEtAl2018] (fits to the explosions of
// [SukhboldEtAl2016]) for collapse.
package remnants
