package draw

import "math/bits"

// Uniform returns a number between 0 and 1, neither end included.
//
//	u = (j + 1/2) 2^-53,  j the upper 53 bits
//
// j + 1/2 needs 54 bits when j ≥ 2^52 and would round up to 1 at the top, so
// the term added is the float64 just below 1/2: the lower half is as written
// (the least value, 2^-54, one part in 2^53 lower), the upper half rounds down
// to j 2^-53. All 2^53 values differ, rise with j, and lie in [2^-54, 1 - 2^-53].
func (s Stream) Uniform(object uint64, generation, number uint32) float64 {
	return uniform(s.Bits(object, generation, number))
}

// Uniforms fills dst with the Uniform of objects first, first+1, ...
func (s Stream) Uniforms(dst []float64, first uint64, generation, number uint32) {
	c := s.column(generation, number)
	name, turned := c+first*phi, bits.RotateLeft64(c, halfRotation)
	done := uniformBlocks(dst, name, turned)
	name += uint64(done) * phi
	for i := done; i < len(dst); i++ {
		dst[i] = uniform(mix(mix(name) ^ turned))
		name += phi
	}
}

func uniform(b uint64) float64 {
	return float64((float64(int64(b>>11)) + nearlyHalf) * unit53)
}
