// Package inquiry asks one law one thing, outside any galaxy: how long does
// this hole live, how warm is this dwarf, at which age is it that cold.
//
// Inputs are columns of the catalogue by plain names: age for log10_age. A key
// that names a parameter of the law sets the parameter; one that names an
// input gives the input; one that names an answer turns the question round,
// and the one input left open is solved for. Inputs with a sensible default
// are filled in, and the answer says so.
package inquiry
