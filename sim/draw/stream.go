package draw

import "math/bits"

// Odd constants: φ is 2^64 over the golden ratio; the others are fractional
// parts of square roots of 2, 3, 5 and 7 made odd, numbers with nothing up their sleeves.
const (
	phi          = 0x9e3779b97f4a7c15
	drawStep     = 0x6a09e667f3bcc909
	rejectStep   = 0xbb67ae8584caa73b
	seedSalt     = 0x3c6ef372fe94f82b
	realiseSalt  = 0xa54ff53a5f1d36f1
	fnvOffset    = 0xcbf29ce484222325
	fnvPrime     = 0x100000001b3
	finalFirst   = 0xbf58476d1ce4e5b9
	finalSecond  = 0x94d049bb133111eb
	nearlyHalf   = 0x1.fffffffffffffp-2 // the float64 below 1/2
	unit53       = 0x1p-53
	halfRotation = 32
)

// Stream is the random numbers of one process in one realisation. It is a
// value: copy it freely, use it from any number of goroutines.
type Stream struct{ key uint64 }

// New returns the stream of a process, named in words, in one realisation of
// one seed. Any seed and realisation will do, 0, 1 and 2 included.
func New(seed, realisation uint64, process string) Stream {
	h := uint64(fnvOffset)
	for i := range len(process) {
		h = (h ^ uint64(process[i])) * fnvPrime
	}
	return Stream{mix(mix(mix(seed+seedSalt)+realisation+realiseSalt) + h)}
}

// Bits returns 64 random bits.
func (s Stream) Bits(object uint64, generation, number uint32) uint64 {
	return mix(state(s.column(generation, number), object))
}

// column returns what all objects share in one draw of one generation.
func (s Stream) column(generation, number uint32) uint64 {
	return mix(s.key + (uint64(generation)<<32|uint64(number))*drawStep)
}

// state returns the hashed name of one draw. The column's key enters twice,
// so that two columns are never shifted copies of one another.
func state(column, object uint64) uint64 {
	return mix(column+object*phi) ^ bits.RotateLeft64(column, halfRotation)
}

// mix is Stafford's mixing function 13, a bijection of 64 bits.
func mix(x uint64) uint64 {
	x = (x ^ x>>30) * finalFirst
	x = (x ^ x>>27) * finalSecond
	return x ^ x>>31
}
