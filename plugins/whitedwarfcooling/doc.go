// Package whitedwarfcooling holds the laws of process white-dwarf-cooling:
// how white dwarfs cool.
package whitedwarfcooling
