// Package massfunction holds the laws of process mass-function: the masses
// objects are born with.
package massfunction
