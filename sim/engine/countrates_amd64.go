//go:build !purego

package engine

import "golang.org/x/sys/cpu"

// countRatesBlocks fills n rates, a multiple of 8, by the operations of fill in
// their order and rounded as they are: the same bits, eight at a time.
//
//go:noescape
func countRatesBlocks(c *countRates, n int)

// countRatesLanes fills at least n rates if the processor can, and returns how
// many it has.
func countRatesLanes(c *countRates, n int) (done int) {
	if !cpu.X86.HasAVX512F || !cpu.X86.HasAVX512DQ {
		return 0
	}
	n = (n + 7) &^ 7
	countRatesBlocks(c, n)
	return n
}
