//go:build !purego

package draw

import (
	"encoding/binary"
	"math/bits"

	"golang.org/x/sys/cpu"
)

// lanes is how many draws of a column the kernels in assembly take at once, by
// the operations of the scalar functions. The build tag purego leaves them out.
const lanes = 8

// stride is how many exponentials one call of a kernel draws at most.
const stride = 512

// laneNumbers is what the kernels compute with, in the order of lanes_amd64.s.
type laneNumbers struct {
	names         [lanes]uint64 // multiples of phi
	step          uint64        // from one block of names to the next
	first, second uint64        // of mix
	half, unit    float64       // of uniform
	layer         uint64        // the bits of a layer, times its 16 bytes
}

const all = 1<<64 - 1

var numbers = laneNumbers{
	names: [lanes]uint64{0, phi, 2 * phi & all, 3 * phi & all, 4 * phi & all, 5 * phi & all, 6 * phi & all, 7 * phi & all},
	step:  lanes * phi & all,
	first: finalFirst, second: finalSecond,
	half: nearlyHalf, unit: unit53,
	layer: 255 << 4,
}

// uniformLanes sets whole blocks of dst to the uniforms of objects named
// name, name + phi, ...; turned as in Uniforms.
//
//go:noescape
func uniformLanes(dst []float64, name, turned uint64, c *laneNumbers)

// exponentialLanes sets whole blocks of dst to exponentials likewise. A bit of
// outside tells of each draw whether it fell outside the inner part of its
// layer, so that it is not yet right. At most stride draws.
//
//go:noescape
func exponentialLanes(dst []float64, name, turned uint64, c *laneNumbers, table *[256]layer, outside *[stride / lanes]uint8)

// haveLanes reports whether this processor has the instructions of the kernels.
func haveLanes() bool { return cpu.X86.HasAVX512F && cpu.X86.HasAVX512DQ }

// uniformBlocks does what the kernel can of a column and returns how much.
func uniformBlocks(dst []float64, name, turned uint64) (done int) {
	if !haveLanes() {
		return 0
	}
	uniformLanes(dst, name, turned, &numbers)
	return len(dst) &^ (lanes - 1)
}

// exponentialBlocks does what the kernel can of a column and returns how much.
func exponentialBlocks(dst []float64, name, turned uint64) (done int) {
	if !haveLanes() {
		return 0
	}
	dst = dst[:len(dst)&^(lanes-1)]
	for first := 0; first < len(dst); first += stride {
		var out [stride / lanes]uint8
		exponentialLanes(dst[first:min(first+stride, len(dst))], name+uint64(first)*phi, turned, &numbers, &layerTable, &out)
		for word := 0; word < len(out); word += 8 {
			for set := binary.LittleEndian.Uint64(out[word:]); set != 0; set &= set - 1 {
				i := first + word*lanes + bits.TrailingZeros64(set)
				z := mix(name+uint64(i)*phi) ^ turned
				dst[i] = outside(z, mix(z))
			}
		}
	}
	return len(dst)
}
