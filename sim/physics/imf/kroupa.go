package imf

// Breaks of the Kroupa mass function, solar masses.
const (
	KroupaBrownBreak = 0.08
	KroupaRedBreak   = 0.5
)

// KroupaSlopes returns the exponents of the three segments: brown dwarfs (0.3
// +- 0.7), red dwarfs (1.3 +- 0.5) and everything above half a solar mass (2.3
// +- 0.36).
// Source: [Kroupa2001], eq. (2); errors from memory.
func KroupaSlopes() [3]float64 { return [3]float64{0.3, 1.3, 2.3} }

// Kroupa returns the mass function
//
//	xi ~ m^-slopes[0]   low < m < 0.08
//	     m^-slopes[1]   0.08 < m < 0.5
//	     m^-slopes[2]   0.5 < m < high
//
// A lower limit at or above a break leaves the segments below it out.
//
// Units: low, high in solar masses.
// Domain: 0 < low < high.
// Error: slopes as in [KroupaSlopes]; the brown-dwarf end is the least
// certain. Not corrected for unresolved binaries (that gives 2.7 above 1).
// Source: [Kroupa2001], eq. (2). Checked by testdata/published/imf.csv.
func Kroupa(low, high float64, slopes [3]float64) (BrokenPowerLaw, error) {
	edges, used := []float64{low}, []float64{}
	for i, top := range []float64{KroupaBrownBreak, KroupaRedBreak, high} {
		if top > high {
			top = high
		}
		if top > edges[len(edges)-1] {
			edges, used = append(edges, top), append(used, slopes[i])
		}
	}
	return NewBrokenPowerLaw(edges, used)
}
