// Package remnant holds the laws of process remnant: what light stars leave.
package remnant
