// Package collapse holds the laws of process collapse: what heavy stars
// leave.
package collapse
