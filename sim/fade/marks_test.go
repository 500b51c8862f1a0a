package fade

import (
	"fmt"
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"pgregory.net/rapid"
)

// naive finds the marks by sorting all dates and walking through them.
func naive(entries, exits []float64) Marks {
	m := Marks{LastIndex: -1, PeakAt: inf, Half: inf, Hundredth: inf, Last: inf}
	type change struct {
		at float64
		d  int
	}
	var all []change
	for _, v := range entries {
		if !math.IsInf(v, 1) {
			all = append(all, change{v, 1})
		}
	}
	for i, v := range exits {
		if !math.IsInf(v, 1) {
			all = append(all, change{v, -1})
			if m.LastIndex < 0 || v >= exits[m.LastIndex] {
				m.LastIndex = i
			}
		}
	}
	slices.SortFunc(all, func(a, b change) int {
		switch {
		case a.at < b.at:
			return -1
		case a.at > b.at:
			return 1
		}
		return 0
	})
	var dates []float64
	var counts []int
	c := 0
	for i, e := range all {
		c += e.d
		if i+1 == len(all) || all[i+1].at != e.at {
			dates, counts = append(dates, e.at), append(counts, c)
		}
	}
	m.Remaining = c
	for i, c := range counts {
		if c > m.Peak {
			m.Peak, m.PeakAt = c, dates[i]
		}
	}
	if m.Peak == 0 {
		return m
	}
	stays := func(part float64) float64 {
		level := float64(m.Peak) / part
		for i := len(counts) - 1; i >= 0; i-- {
			if float64(counts[i]) > level {
				if i+1 == len(counts) {
					return inf
				}
				return dates[i+1]
			}
		}
		panic("fade: the peak does not exceed a part of itself")
	}
	m.Half, m.Hundredth = stays(2), stays(100)
	if m.Remaining == 0 {
		m.Last = exits[m.LastIndex]
	}
	return m
}

func TestSmallPopulations(t *testing.T) {
	type row struct {
		name           string
		entries, exits []float64
		want           Marks
	}
	for _, r := range []row{
		{"empty", nil, nil, Marks{0, inf, inf, inf, inf, 0, -1}},
		{"one", []float64{1}, []float64{5}, Marks{1, 1, 5, 5, 5, 0, 0}},
		{"one for ever", []float64{1}, []float64{inf}, Marks{1, 1, inf, inf, inf, 1, -1}},
		{"one for ever, no exit", []float64{1}, nil, Marks{1, 1, inf, inf, inf, 1, -1}},
		{"two", []float64{2, 1}, []float64{7, 4}, Marks{2, 2, 4, 7, 7, 0, 0}},
		{"two, one stays", []float64{2, 1}, []float64{inf, 4}, Marks{2, 2, 4, inf, inf, 1, 1}},
		// Peak 3: the half is when it falls from 2 to 1, not from 3 to 2.
		{"three", []float64{1, 2, 3}, []float64{6, 5, 4}, Marks{3, 3, 5, 6, 6, 0, 0}},
		{"enters twice", []float64{1, 10}, []float64{5, 20}, Marks{1, 1, 20, 20, 20, 0, 1}},
		{"never for a time", []float64{3}, []float64{3}, Marks{0, inf, inf, inf, inf, 0, 0}},
		{"one after the other", []float64{1, 5}, []float64{5, 9}, Marks{1, 1, 9, 9, 9, 0, 1}},
		{"last two at once", []float64{1, 1}, []float64{9, 9}, Marks{2, 1, 9, 9, 9, 0, 1}},
		{"back above the half", []float64{1, 1, 1, 1, 8, 8}, []float64{2, 3, 4, 12, 10, 11},
			Marks{4, 1, 10, 12, 12, 0, 3}},
		// With a reach of many powers of ten the last bin is wide.
		{"one stays, far reach", []float64{-1e300, -2e27, 1}, []float64{inf, 3e199, 1},
			Marks{2, -2e27, 3e199, inf, inf, 1, 1}},
		{"before the epoch", []float64{-3, -2}, []float64{-1, 0}, Marks{2, -2, -1, 0, 0, 0, 1}},
	} {
		var s Scratch
		if got := s.Find(r.entries, r.exits); got != r.want {
			t.Errorf("%s: got %+v, want %+v", r.name, got, r.want)
		}
		if got := naive(r.entries, r.exits); got != r.want {
			t.Errorf("%s: the reference says %+v, want %+v", r.name, got, r.want)
		}
	}
}

// populations draws lists of entries and exits of many shapes.
func populations(t *rapid.T) (entries, exits []float64) {
	n := rapid.OneOf(rapid.IntRange(0, 3), rapid.IntRange(0, 50), rapid.IntRange(0, 3000)).Draw(t, "objects")
	shape := rapid.SampledFrom([]string{"ties", "overlap", "steady", "late", "log", "huge", "wild", "outlier"}).Draw(t, "shape")
	never := rapid.SampledFrom([]float64{0, 0, 0.01, 0.5, 1}).Draw(t, "share that never leaves")
	stays := rapid.IntRange(1, 3).Draw(t, "stays")
	rng := rand.New(rand.NewPCG(rapid.Uint64().Draw(t, "seed"), 1))
	for range n {
		at, wait := 0.0, func() float64 { return rng.ExpFloat64() }
		switch shape {
		case "ties":
			at = float64(rng.IntN(4)) - 2
			wait = func() float64 { return float64(rng.IntN(4)) }
		case "overlap":
			at = rng.Float64() * 3
		case "steady":
			at = rng.Float64() * 100
		case "late":
			at = rng.Float64()
			wait = func() float64 { return 1 + rng.ExpFloat64() }
		case "log":
			at = 6 + 4*rng.Float64()
			wait = func() float64 { return 60 * rng.Float64() * rng.Float64() }
		case "huge":
			at = 1e300 * rng.Float64()
			wait = func() float64 { return 1e307 * rng.ExpFloat64() }
		case "wild":
			at = -math.Exp(700 * rng.Float64())
			wait = func() float64 { return math.Exp(700 * rng.Float64()) }
		case "outlier":
			at = 1 + 1e-9*rng.Float64()
			wait = func() float64 {
				if rng.IntN(500) == 0 {
					return 1e300
				}
				return 1e-9 * rng.Float64()
			}
		}
		for k := range stays {
			entries = append(entries, at)
			at += wait()
			if rng.Float64() < never {
				at = inf
			}
			exits = append(exits, at)
			if at += wait(); math.IsInf(at, 1) || k > 0 && rng.IntN(2) == 0 {
				break
			}
		}
	}
	rng.Shuffle(len(entries), func(i, j int) { entries[i], entries[j] = entries[j], entries[i] })
	rng.Shuffle(len(exits), func(i, j int) { exits[i], exits[j] = exits[j], exits[i] })
	if rapid.Bool().Draw(t, "leave out who never leaves") {
		exits = slices.DeleteFunc(exits, func(v float64) bool { return math.IsInf(v, 1) })
	}
	return entries, exits
}

func TestFindAgainstSorting(t *testing.T) {
	var s Scratch
	rapid.Check(t, func(t *rapid.T) {
		entries, exits := populations(t)
		was := [2][]float64{slices.Clone(entries), slices.Clone(exits)}
		got, want := s.Find(entries, exits), naive(entries, exits)
		if got != want {
			t.Fatalf("%d entries, %d exits: got %+v, want %+v", len(entries), len(exits), got, want)
		}
		if first, last, ok := finite(entries, exits); ok {
			within := s.FindWithin(entries, exits, first, last[0], last[1])
			if within.LastIndex = want.LastIndex; within != want {
				t.Fatalf("%d entries, %d exits, FindWithin: got %+v, want %+v", len(entries), len(exits), within, want)
			}
		}
		if !slices.Equal(was[0], entries) || !slices.Equal(was[1], exits) {
			t.Fatal("the lists were changed")
		}
		if got.Peak > 0 && !(got.PeakAt <= got.Half && got.Half <= got.Hundredth && got.Hundredth <= got.Last) {
			t.Fatalf("marks out of order: %+v", got)
		}
	})
}

// finite returns the first of all dates and the last of each list, if there
// are any, all of them finite and above zero.
func finite(lists ...[]float64) (first float64, last []float64, ok bool) {
	first = inf
	for _, l := range lists {
		if len(l) == 0 || slices.Max(l) == inf {
			return 0, nil, false
		}
		first, last = min(first, slices.Min(l)), append(last, slices.Max(l))
	}
	return first, last, first > 0
}

func TestKeysKeepTheOrder(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a, b := rapid.Float64().Draw(t, "a"), rapid.Float64().Draw(t, "b")
		if (a < b) != (key(a) < key(b)) || (a == b) != (key(a) == key(b)) {
			t.Fatalf("keys of %v and %v do not order as they do", a, b)
		}
		if date(key(a)) != a {
			t.Fatalf("%v came back as %v", a, date(key(a)))
		}
	})
}

func TestSort(t *testing.T) {
	var s Scratch
	rapid.Check(t, func(t *rapid.T) {
		rng := rand.New(rand.NewPCG(rapid.Uint64().Draw(t, "seed"), 2))
		bits := rapid.IntRange(1, 64).Draw(t, "bits")
		keys := make([]uint64, rapid.IntRange(0, 5000).Draw(t, "n"))
		for i := range keys {
			keys[i] = rng.Uint64() >> (64 - bits) >> rng.IntN(bits)
		}
		want := slices.Clone(keys)
		slices.Sort(want)
		s.sort(keys)
		if !slices.Equal(keys, want) {
			t.Fatal("not sorted, or not the same keys")
		}
	})
}

func TestFindDoesNotAllocate(t *testing.T) {
	var s Scratch
	for _, tau := range []float64{1e37, 1e9, 1e7} {
		entries, exits := sample(20000, tau)
		s.Find(entries, exits)
		if n := testing.AllocsPerRun(5, func() { s.Find(entries, exits) }); n != 0 {
			t.Errorf("tau %v: %v allocations a search, want 0", tau, n)
		}
	}
}

// sample draws births from 3e9 to 1.3e10 and an exponential stay of mean tau
// years, as log10 years.
func sample(n int, tau float64) (entries, exits []float64) {
	rng := rand.New(rand.NewPCG(1, 2))
	entries, exits = make([]float64, n), make([]float64, n)
	for i := range entries {
		born := 1e9 * (3 + 10*rng.Float64())
		entries[i] = math.Log10(born)
		exits[i] = math.Log10(born + tau*rng.ExpFloat64())
	}
	return entries, exits
}

// BenchmarkFind: late has nobody leave before the last enters; in steady the
// count is level for long, so that its peak may lie anywhere.
func BenchmarkFind(b *testing.B) {
	for _, c := range []struct {
		name string
		tau  float64
	}{{"late", 1e37}, {"overlap", 1e9}, {"steady", 1e7}} {
		for _, n := range []int{1e3, 1e5, 1e6} {
			b.Run(fmt.Sprintf("%s/n=%d", c.name, n), func(b *testing.B) {
				var s Scratch
				entries, exits := sample(n, c.tau)
				s.Find(entries, exits)
				b.ReportAllocs()
				for b.Loop() {
					s.Find(entries, exits)
				}
				b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/object")
			})
		}
	}
}
