package draw

import (
	"hash/fnv"
	"testing"
)

// The first outputs of the public splitmix64 generator seeded with 0 are
// mix(φ), mix(2φ), mix(3φ). Source: S. Vigna, splitmix64.c (2015), whose
// outputs are printed in several standard libraries' tests.
func TestMixIsThePublishedFinaliser(t *testing.T) {
	step := uint64(phi)
	for i, want := range []uint64{0xe220a8397b1dcdaf, 0x6e789e6aa1b965f4, 0x06c45d188009454f} {
		if got := mix(uint64(i+1) * step); got != want {
			t.Errorf("mix(%dφ) = %#x, want %#x", i+1, got, want)
		}
	}
}

func TestProcessHashIsFNV1a(t *testing.T) {
	for _, process := range []string{"", "evaporation", "capture by the central hole", "µ"} {
		h := fnv.New64a()
		h.Write([]byte(process))
		want := mix(mix(mix(7+seedSalt)+3+realiseSalt) + h.Sum64())
		if got := New(7, 3, process).key; got != want {
			t.Errorf("New(7, 3, %q).key = %#x, want %#x with the standard library's FNV-1a", process, got, want)
		}
	}
}

func TestColumnsEqualScalars(t *testing.T) {
	const n = 100_000
	dst := make([]float64, n)
	for _, first := range []uint64{0, 1, 1 << 40, 1<<64 - n/2} {
		for _, name := range [][2]uint32{{0, 0}, {1, 2}, {1<<32 - 1, 1<<32 - 1}} {
			s := New(5, first, "column")
			s.Uniforms(dst, first, name[0], name[1])
			for i, got := range dst {
				if want := s.Uniform(first+uint64(i), name[0], name[1]); got != want {
					t.Fatalf("Uniforms, object %d + %d: %x, scalar %x", first, i, got, want)
				}
			}
			s.Exps(dst, first, name[0], name[1])
			for i, got := range dst {
				if want := s.Exp(first+uint64(i), name[0], name[1]); got != want {
					t.Fatalf("Exps, object %d + %d: %x, scalar %x", first, i, got, want)
				}
			}
		}
	}
}

func TestColumnsOfAnyLength(t *testing.T) {
	s := New(1, 2, "lengths")
	for n := range 1100 {
		if n > 40 && n < 500 {
			continue
		}
		dst := make([]float64, n+1)
		for _, fill := range []struct {
			column func(dst []float64, first uint64, generation, number uint32)
			scalar func(object uint64, generation, number uint32) float64
		}{{s.Uniforms, s.Uniform}, {s.Exps, s.Exp}} {
			dst[n] = 42
			fill.column(dst[:n], 3, 0, 1)
			if dst[n] != 42 {
				t.Errorf("a column of %d wrote past its end", n)
			}
			for i, got := range dst[:n] {
				if want := fill.scalar(3+uint64(i), 0, 1); got != want {
					t.Errorf("column of %d, element %d: %x, scalar %x", n, i, got, want)
				}
			}
		}
	}
}

func TestEndsAreNeverReached(t *testing.T) {
	low, high := uniform(0), uniform(1<<64-1)
	if low <= 0 || low > 0x1p-54 {
		t.Errorf("least uniform = %x, want over 0 and at most 2^-54", low)
	}
	if want := 1 - 0x1p-53; high != want {
		t.Errorf("greatest uniform = %x, want %x", high, want)
	}
	// Neighbours differ everywhere, also where j + 1/2 no longer fits.
	for _, j := range []uint64{0, 1, 1<<51 - 1, 1<<52 - 2, 1<<52 - 1, 1 << 52, 1<<52 + 1, 1<<53 - 2} {
		if a, b := uniform(j<<11), uniform((j+1)<<11); !(a < b) {
			t.Errorf("uniform of j = %d is %x, of j + 1 %x: want a rise", j, a, b)
		}
	}
	for i := range layerTable {
		if x := (0 + nearlyHalf) * layerTable[i].width; !(x > 0) {
			t.Errorf("least exponential of layer %d = %x, want over 0", i, x)
		}
	}
}

func TestFillsDoNotAllocate(t *testing.T) {
	s, dst := New(1, 2, "column"), make([]float64, 100)
	if n := testing.AllocsPerRun(10, func() { s.Exps(dst, 0, 0, 0); s.Uniforms(dst, 0, 0, 0) }); n != 0 {
		t.Errorf("%v allocations, want none", n)
	}
}
