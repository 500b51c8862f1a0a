package fade

import (
	"math"
	"math/bits"
	"slices"
)

// grid divides the keys from low up into bins of 2^shift keys.
type grid struct {
	low   uint64
	shift uint
	bins  int
}

// newGrid covers first..last with a bin for every eight of n dates, but with
// no more than most, a power of two: the bins should stay in the cache.
func newGrid(first, last float64, n, most int) grid {
	lg := min(max(bits.Len(uint(n/8)), 6), bits.Len(uint(most))-1)
	span := bits.Len64(key(last) - key(first))
	return grid{low: key(first), shift: uint(max(span, lg) - lg), bins: 1 << lg}
}

// orderStatistics returns the j-th and the k-th smallest of dates > 0 (from
// 1, j <= k), +Inf if there are fewer finite ones: a histogram of the leading
// bits, and a sort of the bins they lie in.
func (s *Scratch) orderStatistics(dates []float64, e extent, j, k int) (jth, kth float64) {
	jth, kth = inf, inf
	if j > e.n { // then k > e.n too
		return jth, kth
	}
	g := newGrid(e.first, e.last, e.n, 1<<12)
	bins := s.clearBins(g.bins)
	g.countPositive(bins, dates)
	binJ, binK := ^uint64(0), ^uint64(0)
	var sizeJ, sizeK int
	for b, before := 0, 0; b < len(bins); b++ {
		n := int(bins[b])
		if before < j && j <= before+n {
			binJ, sizeJ = uint64(b), n
			j -= before
		}
		if before < k && k <= before+n {
			k -= before
			if binK = uint64(b); binK != binJ {
				sizeK = n
			}
			break
		}
		before += n
	}
	s.keys = grow(s.keys, sizeJ+sizeK)
	inJ, inK := s.keys[:sizeJ], s.keys[sizeJ:]
	g.collect(dates, binJ, binK, inJ, inK)
	s.sort(inJ)
	jth = date(inJ[j-1])
	switch {
	case binK == binJ:
		kth = date(inJ[k-1])
	case sizeK > 0:
		s.sort(inK)
		kth = date(inK[k-1])
	}
	return jth, kth
}

// countPositive counts dates > 0. A date beyond the last, such as +Inf, is in
// the last bin or in none.
func (g grid) countPositive(bins []bin, dates []float64) {
	low, shift := g.low^1<<63, g.shift
	for _, v := range dates {
		if b := (math.Float64bits(v) - low) >> (shift & 63); b < uint64(len(bins)) {
			bins[b]++
		}
	}
}

// collect copies the keys of two bins of dates > 0.
func (g grid) collect(dates []float64, binJ, binK uint64, inJ, inK []uint64) {
	low, shift := g.low^1<<63, g.shift
	for _, v := range dates {
		b := (math.Float64bits(v) - low) >> (shift & 63)
		if b == binJ {
			inJ[0], inJ = key(v), inJ[1:]
		} else if b == binK {
			inK[0], inK = key(v), inK[1:]
		}
	}
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
