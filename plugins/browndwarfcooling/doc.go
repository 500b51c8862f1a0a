// Package browndwarfcooling holds the laws of process brown-dwarf-cooling:
// how brown dwarfs cool.
package browndwarfcooling
