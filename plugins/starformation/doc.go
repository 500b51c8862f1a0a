// Package starformation holds the laws of process star-formation: when
// objects are born.
package starformation
