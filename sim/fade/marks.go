package fade

import "math"

// Marks are the fade dates of one population, in the unit of its entries and
// exits. A date that is not reached is +Inf.
type Marks struct {
	// Peak is the largest count, PeakAt the first date at which it is
	// reached. Peak is 0 when there never was a member for any length of
	// time; then all dates are +Inf.
	Peak   int
	PeakAt float64
	// Half and Hundredth are the dates after which the count never again
	// exceeds Peak/2 and Peak/100 as real numbers: with a peak of 3, Half is
	// when it last falls from 2 to 1.
	Half, Hundredth float64
	// Last is the date of the last exit, if nobody remains.
	Last float64
	// Remaining is the count at the end of time: those that never leave.
	Remaining int
	// LastIndex is the index in exits of the last finite exit, of several at
	// one date the highest; -1 if there is none. It is set even if some remain.
	LastIndex int
}

// Scratch is the memory of a search, to be kept by one worker and used again.
// The zero value is ready. It is not safe for concurrent use.
type Scratch struct {
	bins []bin
	slot []int32 // per bin: its run, or -1
	runs []run
	keys []uint64 // dates of the bins looked into, as keys
	tmp  []uint64
}

// Find returns the marks of a population.
//
// Shapes: entries and exits in any order and independent of each other; an
// object may have several pairs. Exits may be fewer than entries: those
// missing never leave. Neither is changed.
// Domain: any number; an entry or exit of +Inf never happens. NaN is not
// allowed. Exits must not precede their own entries.
// Error: none; dates are those given.
// Cost: two passes over each list and a sort of a few of its elements. No
// allocation once the scratch has seen a population as large.
func (s *Scratch) Find(entries, exits []float64) Marks {
	in, out := scan(entries), scan(exits)
	if m, ok := s.apart(in.n, in.last, exits, out); ok {
		return m
	}
	m := newMarks(in.n, out)
	s.search(&m, entries, exits, in, out)
	m.close(out)
	return m
}

// FindAfter is Find for a population that is known to have had so many
// entries, all finite, the last at lastEntry, and whose exits, all finite too,
// lie between first and last. ok is false, and nothing is found, when somebody
// leaves before the last entry: then the entries matter one by one. LastIndex
// is not looked for.
func (s *Scratch) FindAfter(entered int, lastEntry float64, exits []float64, first, last float64) (m Marks, ok bool) {
	return s.apart(entered, lastEntry, exits, extent{n: len(exits), first: first, last: last, lastIndex: -1})
}

// FindLate is FindAfter for a population that early members have left before the
// last entry, while more than early entries came after the last of those exits:
// so the count is largest at the last entry, and only then.
func (s *Scratch) FindLate(entered int, lastEntry float64, exits []float64, first, last float64, early int) Marks {
	out := extent{n: len(exits), first: first, last: last, lastIndex: -1}
	m := newMarks(entered, out)
	m.Peak, m.PeakAt = entered-early, lastEntry
	m.Half, m.Hundredth = s.orderStatistics(exits, out, entered-m.Peak/2, entered-m.Peak/100)
	m.close(out)
	return m
}

// FindWithin is Find for dates > 0 that are all finite and none before first,
// the last entry and the last exit being lastEntry and lastExit. LastIndex is
// not looked for.
func (s *Scratch) FindWithin(entries, exits []float64, first, lastEntry, lastExit float64) Marks {
	in := extent{n: len(entries), first: first, last: lastEntry, lastIndex: -1}
	out := extent{n: len(exits), first: first, last: lastExit, lastIndex: -1}
	m := newMarks(in.n, out)
	s.search(&m, entries, exits, in, out)
	m.close(out)
	return m
}

// apart finds the marks when everybody is in before the first leaves: they are
// order statistics of the exits. (With negative dates it leaves the work to
// search.)
func (s *Scratch) apart(entered int, lastEntry float64, exits []float64, out extent) (m Marks, ok bool) {
	m = newMarks(entered, out)
	if entered == 0 {
		return m, true
	}
	if out.n > 0 && !(lastEntry < out.first && out.first > 0) {
		return m, false
	}
	m.Peak, m.PeakAt = entered, lastEntry
	m.Half, m.Hundredth = s.orderStatistics(exits, out, entered-entered/2, entered-entered/100)
	m.close(out)
	return m, true
}

func newMarks(entered int, out extent) Marks {
	return Marks{Remaining: entered - out.n, LastIndex: out.lastIndex, PeakAt: inf, Half: inf, Hundredth: inf, Last: inf}
}

// close sets the last date.
func (m *Marks) close(out extent) {
	if m.Remaining == 0 && m.Peak > 0 {
		m.Last = out.last
	}
}

var inf = math.Inf(1)

// extent is where the finite dates of a list lie.
type extent struct {
	n           int
	first, last float64 // +Inf, -Inf when n = 0
	lastIndex   int
}

func scan(dates []float64) extent {
	e := extent{n: len(dates), first: inf, last: -inf, lastIndex: -1}
	// first <= date < last is one comparison of bits, if first > 0.
	low, span := uint64(0), uint64(0)
	for i, v := range dates {
		if math.Float64bits(v)-low < span {
			continue
		}
		if v > math.MaxFloat64 {
			e.n--
			continue
		}
		if v < e.first {
			e.first, low, span = v, 0, 0
		}
		if v >= e.last {
			e.last, e.lastIndex = v, i
		}
		if e.first > 0 {
			low = math.Float64bits(e.first)
			span = math.Float64bits(e.last) - low
		}
	}
	return e
}

// key is an integer that orders as the date does. Both zeros have one key.
func key(date float64) uint64 {
	b := math.Float64bits(date + 0)
	return b ^ (uint64(int64(b)>>63) | 1<<63)
}

// date is the inverse of key.
func date(key uint64) float64 {
	return math.Float64frombits(key ^ (^uint64(int64(key)>>63) | 1<<63))
}
