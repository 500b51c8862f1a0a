// Package metals holds the laws of process metals: the heavy elements
// objects are born with.
package metals
