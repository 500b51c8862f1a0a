// Package neutronstarcooling holds the laws of process neutron-star-cooling:
// how neutron stars cool.
package neutronstarcooling
