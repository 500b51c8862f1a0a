package fade

import (
	"math/bits"
	"slices"
)

// Bins hold eight dates on average; more of them would leave the cache.
const (
	minBins = 64
	maxBins = 1 << 15
)

// grid divides the keys low to low + span into bins of 2^shift keys.
type grid struct {
	low, span uint64
	shift     uint
	bins      int
}

// newGrid covers first..last with about n/8 bins.
func newGrid(first, last float64, n int) grid {
	g := grid{low: key(first), span: key(last) - key(first), bins: minBins}
	for g.bins < maxBins && g.bins < n/8 {
		g.bins *= 2
	}
	lg := bits.Len(uint(g.bins)) - 1
	g.shift = uint(max(bits.Len64(g.span), lg) - lg)
	return g
}

// beyond is the bin of dates that are not on the grid.
const beyond = ^uint64(0)

// of returns the bin of a date.
func (g grid) of(date float64) uint64 {
	k := key(date) - g.low
	if k > g.span {
		return beyond
	}
	return k >> (g.shift & 63)
}

// orderStatistics returns the j-th and the k-th smallest date (from 1), +Inf
// if there are fewer finite ones: a histogram of the leading bits, and a sort
// of the bins they lie in.
func (s *Scratch) orderStatistics(dates []float64, e extent, j, k int) (jth, kth float64) {
	jth, kth = inf, inf
	if j > e.n { // then k > e.n too
		return jth, kth
	}
	g := newGrid(e.first, e.last, e.n)
	bins := s.clearBins(g.bins)
	for _, v := range dates {
		if b := g.of(v); b < uint64(len(bins)) {
			bins[b].out++
		}
	}
	binJ, binK := beyond-1, beyond-1
	var sizeJ, sizeK int
	for b, before := 0, 0; b < len(bins); b++ {
		n := int(bins[b].out)
		if before < j && j <= before+n {
			binJ, sizeJ = uint64(b), n
			j -= before
		}
		if before < k && k <= before+n {
			binK, sizeK = uint64(b), n
			k -= before
			break
		}
		before += n
	}
	s.keys = grow(s.keys, sizeJ+sizeK)
	inJ, inK := s.keys[:0:sizeJ], s.keys[sizeJ:sizeJ:sizeJ+sizeK]
	for _, v := range dates {
		b := g.of(v)
		if b == binJ {
			inJ = append(inJ, key(v))
		}
		if b == binK {
			inK = append(inK, key(v))
		}
	}
	s.sort(inJ)
	jth = date(inJ[j-1])
	if sizeK > 0 {
		s.sort(inK)
		kth = date(inK[k-1])
	}
	return jth, kth
}

// smallSort is the length up to which a comparison sort is quicker.
const smallSort = 256

// sort sorts keys: by comparison when few, else bin by bin, so that no
// distribution of dates costs more than a few passes.
func (s *Scratch) sort(keys []uint64) {
	if len(keys) <= smallSort {
		slices.Sort(keys)
		return
	}
	low, high := keys[0], keys[0]
	for _, k := range keys {
		low, high = min(low, k), max(high, k)
	}
	if low == high {
		return
	}
	const lg = 9
	shift := max(bits.Len64(high-low), lg) - lg
	var end [1<<lg + 1]int32 // start of each bin, then its end
	for _, k := range keys {
		end[(k-low)>>shift+1]++
	}
	for b := 1; b < len(end); b++ {
		end[b] += end[b-1]
	}
	s.tmp = grow(s.tmp, len(keys))
	for _, k := range keys {
		b := (k - low) >> shift
		s.tmp[end[b]] = k
		end[b]++
	}
	copy(keys, s.tmp)
	for b, start := 0, int32(0); b < len(end)-1 && shift > 0; b++ {
		s.sort(keys[start:end[b]])
		start = end[b]
	}
}

func (s *Scratch) clearBins(n int) []bin {
	if cap(s.bins) < n {
		s.bins = make([]bin, n)
	}
	s.bins = s.bins[:n]
	clear(s.bins)
	return s.bins
}

// grow returns a slice of length n, with the memory of old where it is enough.
func grow(old []uint64, n int) []uint64 {
	if cap(old) < n {
		return make([]uint64, n, n+n/4)
	}
	return old[:n]
}
