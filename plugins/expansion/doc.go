// Package expansion holds the laws of process expansion: how space expands
// and how warm the sky is.
package expansion
