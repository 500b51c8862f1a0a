// Package substellarlimit holds the laws of process substellar-limit: the
// mass below which a newborn object is a brown dwarf.
package substellarlimit
