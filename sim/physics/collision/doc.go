// Package collision is how often bodies that move among each other at random
// meet, gravity drawing their paths together.
//
// Two bodies of masses m1, m2 that pass at a relative speed v far away come
// within d of each other if they fall within the area
//
//	sigma = pi d^2 [1 + 2 G (m1 + m2)/(d v^2)]
//
// d is the sum of the radii for a collision, or the distance at which a body
// is detached from its star. The rate of meetings of one body with n others
// per volume is n sigma v.
//
// Left out: the spread of speeds (all meet at the dispersion v: with a spread
// that is isotropic and Gaussian the second term would be some tens of per
// cent larger), tides that catch what does not quite touch, binaries.
//
// Sources: Binney & Tremaine 2008, Galactic Dynamics, section 7.5.8 (focused
// collisions); Dyson 1979, Rev. Mod. Phys. 51, 447; Adams & Laughlin 1997,
// Rev. Mod. Phys. 69, 337, section III.
package collision
