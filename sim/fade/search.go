package fade

import "math"

// bin counts the dates that share their leading bits: entries in its lower
// half, exits in its upper half.
type bin uint64

func (b bin) in() int  { return int(uint32(b)) }
func (b bin) out() int { return int(b >> 32) }

// run is a bin that is looked into: its dates lie in keys[at:], entries
// first, then exits.
type run struct {
	bin     uint64
	before  int // count before the bin
	at      int
	in, out int // how many
	fill    [2]int
	sorted  bool
}

// most is an upper bound of the count within the bin.
func (r *run) most() int { return r.before + r.in }

// search finds peak and marks when exits overlap entries. Counts at the ends
// of bins are exact, and within a bin the count is at most that before it and
// all its entries. So only those bins are looked into that may hold the peak
// or the last fall through a half or a hundredth of it.
func (s *Scratch) search(m *Marks, entries, exits []float64, in, out extent) {
	g := newGrid(min(in.first, out.first), max(in.last, out.last), in.n+out.n, 1<<15)
	bins := s.clearBins(g.bins)
	positive := in.first > 0 && out.first > 0
	if positive {
		g.countBelow(bins, entries, 1)
		g.countBelow(bins, exits, 1<<32)
	} else {
		g.count(bins, entries, 1)
		g.count(bins, exits, 1<<32)
	}
	low, high := s.peakBounds()
	if high <= 0 {
		return
	}
	s.chooseRuns(low, high, m.Remaining)
	s.gather(g, entries, exits, positive)
	s.findPeak(m, low)
	if m.Peak > 0 {
		m.Half = s.lastFall(m.Peak/2, m.Remaining)
		m.Hundredth = s.lastFall(m.Peak/100, m.Remaining)
	}
}

// peakBounds returns bounds of the peak.
func (s *Scratch) peakBounds() (low, high int) {
	c := 0
	for _, b := range s.bins {
		high = max(high, c+b.in())
		c += b.in() - b.out()
		low = max(low, c)
	}
	return low, high
}

// chooseRuns marks the bins to look into, and lays out their memory. The peak
// is only known to lie between low and high, and so are its parts.
func (s *Scratch) chooseRuns(low, high, remaining int) {
	if cap(s.slot) < len(s.bins) {
		s.slot = make([]int32, len(s.bins))
	}
	s.slot = s.slot[:len(s.bins)]
	c, reached := 0, false
	for i, b := range s.bins {
		s.slot[i] = -1
		// A bin that can only equal low, after low was reached, can't matter.
		if most := c + b.in(); b.in() > 0 && most > 0 && (most > low || most == low && !reached) {
			s.slot[i] = 0
		}
		c += b.in() - b.out()
		reached = reached || c == low
	}
	s.chooseFalls(low/2, high/2, remaining)
	s.chooseFalls(low/100, high/100, remaining)
	s.runs = s.runs[:0]
	c, at := 0, 0
	for i, b := range s.bins {
		if s.slot[i] == 0 {
			s.slot[i] = int32(len(s.runs))
			r := run{bin: uint64(i), before: c, at: at, in: b.in(), out: b.out()}
			r.fill = [2]int{at, at + r.in}
			at += r.in + r.out
			s.runs = append(s.runs, r)
		}
		c += b.in() - b.out()
	}
	s.keys = grow(s.keys, at)
}

// chooseFalls marks the bins that may hold the last fall to a level between
// low and high.
func (s *Scratch) chooseFalls(low, high, remaining int) {
	c := remaining // at the end of the bin
	if c > high {
		return
	}
	for i := len(s.bins) - 1; i >= 0; i-- {
		b := s.bins[i]
		c += b.out() - b.in() // now before it
		if b.out() > 0 && c+b.in() > low {
			s.slot[i] = 0
		}
		if c > high { // whatever the level, the fall is here or later
			return
		}
	}
}

// count adds unit to the bin of each finite date.
func (g grid) count(bins []bin, dates []float64, unit bin) {
	low, shift := g.low, g.shift
	for _, v := range dates {
		b := (key(v) - low) >> (shift & 63)
		if b < uint64(len(bins)) && v <= math.MaxFloat64 {
			bins[b] += unit
		}
	}
}

// countBelow is count for dates > 0.
func (g grid) countBelow(bins []bin, dates []float64, unit bin) {
	low, shift := g.low^1<<63, g.shift
	for _, v := range dates {
		x := math.Float64bits(v)
		if b := (x - low) >> (shift & 63); b < uint64(len(bins)) && x < infBits {
			bins[b] += unit
		}
	}
}

const infBits = 0x7ff << 52

// gather collects the dates of the chosen bins.
func (s *Scratch) gather(g grid, entries, exits []float64, positive bool) {
	for side, dates := range [2][]float64{entries, exits} {
		put := func(slot int32, v float64) {
			r := &s.runs[slot]
			s.keys[r.fill[side]] = key(v)
			r.fill[side]++
		}
		if positive {
			g.chooseBelow(s.slot, dates, put)
		} else {
			g.choose(s.slot, dates, put)
		}
	}
}

// choose yields the dates in bins with a slot.
func (g grid) choose(slots []int32, dates []float64, yield func(slot int32, v float64)) {
	low, shift := g.low, g.shift
	for _, v := range dates {
		b := (key(v) - low) >> (shift & 63)
		if b < uint64(len(slots)) && slots[b] >= 0 && v <= math.MaxFloat64 {
			yield(slots[b], v)
		}
	}
}

// chooseBelow is choose for dates > 0.
func (g grid) chooseBelow(slots []int32, dates []float64, yield func(slot int32, v float64)) {
	low, shift := g.low^1<<63, g.shift
	for _, v := range dates {
		x := math.Float64bits(v)
		if b := (x - low) >> (shift & 63); b < uint64(len(slots)) && slots[b] >= 0 && x < infBits {
			yield(slots[b], v)
		}
	}
}

// dates returns the entries and exits of a run in order.
func (s *Scratch) dates(r *run) (in, out []uint64) {
	in, out = s.keys[r.at:r.at+r.in], s.keys[r.at+r.in:r.at+r.in+r.out]
	if !r.sorted {
		s.sort(in)
		s.sort(out)
		r.sorted = true
	}
	return in, out
}

// findPeak finds the largest count, at least low, and its first date.
func (s *Scratch) findPeak(m *Marks, low int) {
	best := max(low-1, 0)
	for i := range s.runs {
		r := &s.runs[i]
		if r.most() <= best {
			continue
		}
		in, out := s.dates(r)
		for c := r.before; len(in) > 0; {
			var at uint64
			c, at, in, out = step(c, in, out)
			if c > best {
				best = c
				m.Peak, m.PeakAt = c, date(at)
			}
		}
	}
}

// lastFall returns the date at which the count last falls from above level to
// level or less, +Inf if it stays above.
func (s *Scratch) lastFall(level, remaining int) float64 {
	if remaining > level {
		return inf
	}
	for i := len(s.runs) - 1; i >= 0; i-- {
		r := &s.runs[i]
		if r.most() <= level {
			continue
		}
		fall, found := uint64(0), false
		in, out := s.dates(r)
		for c := r.before; len(out) > 0; {
			was := c
			var at uint64
			if c, at, in, out = step(c, in, out); was > level && c <= level {
				fall, found = at, true
			}
		}
		if found {
			return date(fall)
		}
	}
	return inf
}

// step takes all changes of the next date.
func step(c int, in, out []uint64) (after int, at uint64, restIn, restOut []uint64) {
	switch {
	case len(out) == 0:
		at = in[0]
	case len(in) == 0:
		at = out[0]
	default:
		at = min(in[0], out[0])
	}
	for len(in) > 0 && in[0] == at {
		c++
		in = in[1:]
	}
	for len(out) > 0 && out[0] == at {
		c--
		out = out[1:]
	}
	return c, at, in, out
}
