//go:build !purego

package engine

import "golang.org/x/sys/cpu"

// The kernels in assembly take eight objects at once. They perform the
// operations of the functions beside which they stand, in their order and
// rounded as they are, so both give the same bits. The build tag purego leaves
// them out.
const lanes = 8

func haveLanes() bool { return cpu.X86.HasAVX512F && cpu.X86.HasAVX512DQ }

//go:noescape
func countRatesBlocks(c *countRates, n int)

// countRatesLanes fills at least n rates, and returns how many it has.
func countRatesLanes(c *countRates, n int) (done int) {
	if !haveLanes() {
		return 0
	}
	n = (n + lanes - 1) &^ (lanes - 1)
	countRatesBlocks(c, n)
	return n
}

// steadyBlocks makes readings by whole blocks up to the first with an object
// that the clock can reach.
//
//go:noescape
func steadyBlocks(x, birth, death, s0, s1 []float64, of *steadyNumbers) (done int)

// steadyLanes returns how many readings it has made and how many are then left
// to the loop before the next try.
func steadyLanes(x, birth, death, s0, s1 []float64, of *steadyNumbers) (done, next int) {
	if !haveLanes() {
		return 0, len(x)
	}
	return steadyBlocks(x, birth, death, s0, s1, of), lanes
}

//go:noescape
func aloneBlocks(a *alone, n int)

// aloneLanes sorts whole blocks of a chunk of n objects into those that the
// lead clock provably takes and the rest, and returns how many it has sorted.
func aloneLanes(a *alone, n int) (done int) {
	if !haveLanes() {
		return 0
	}
	if n &^= lanes - 1; n > 0 {
		aloneBlocks(a, n)
	}
	return n
}
