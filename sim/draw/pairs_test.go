package draw_test

import (
	"fmt"
	"math"
	"math/bits"
	"testing"

	"wane/sim/draw"
)

// smallKeys are the raw keys that a person types, and that an unhashed
// generator fails on.
var smallKeys = []uint64{0, 1, 2, 99, 12345}

// A source names draw i of one of two sequences that should be independent.
type source func(i uint64) uint64

// pairDeviate returns the chi-square deviate, in sigma, of the 64 x 64 table of
// the six bits above shift of a and b.
func pairDeviate(a, b source, n int, shift uint) float64 {
	counts := make([]int, 4096)
	for i := range uint64(n) {
		counts[(a(i)>>shift&63)<<6|b(i)>>shift&63]++
	}
	return chiSquareDeviate(counts, n)
}

// flipDeviate returns the deviate of the number of equal bits of a and b.
func flipDeviate(a, b source, n int) float64 {
	ones := 0
	for i := range uint64(n) {
		ones += bits.OnesCount64(a(i) ^ b(i))
	}
	return (float64(ones) - 32*float64(n)) / math.Sqrt(16*float64(n))
}

func TestNeighboursAreIndependent(t *testing.T) {
	n := 1 << 18
	if testing.Short() {
		n = 1 << 15
	}
	for _, seed := range smallKeys {
		for _, realisation := range smallKeys {
			s := draw.New(seed, realisation, "evaporation")
			base := func(i uint64) uint64 { return s.Bits(i, 0, 0) }
			bits := func(o draw.Stream) source { return func(i uint64) uint64 { return o.Bits(i, 0, 0) } }
			others := map[string]source{
				"next object":          func(i uint64) uint64 { return s.Bits(i+1, 0, 0) },
				"object 1000 on":       func(i uint64) uint64 { return s.Bits(i+1000, 0, 0) },
				"next draw":            func(i uint64) uint64 { return s.Bits(i, 0, 1) },
				"next generation":      func(i uint64) uint64 { return s.Bits(i, 1, 0) },
				"next object and draw": func(i uint64) uint64 { return s.Bits(i+1, 0, 1) },
				"next seed":            bits(draw.New(seed+1, realisation, "evaporation")),
				"next realisation":     bits(draw.New(seed, realisation+1, "evaporation")),
				"next of both keys":    bits(draw.New(seed+1, realisation+1, "evaporation")),
				"process one letter":   bits(draw.New(seed, realisation, "evaporatioo")),
				"nameless process":     bits(draw.New(seed, realisation, "")),
			}
			for name, other := range others {
				where := fmt.Sprintf("seed %d, realisation %d, %s", seed, realisation, name)
				for _, shift := range []uint{0, 11, 58} { // low bits, low bits of a uniform, high bits
					if z := pairDeviate(base, other, n, shift); math.Abs(z) > fiveSigma {
						t.Errorf("%s: pairs of bits from %d off by %.1f sigma", where, shift, z)
					}
				}
				if z := flipDeviate(base, other, n); math.Abs(z) > fiveSigma {
					t.Errorf("%s: equal bits off by %.1f sigma", where, z)
				}
			}
		}
	}
}

// Sequences that run along the draw number, the generation or the realisation
// must be as good as those that run along objects.
func TestSerialCorrelationAlongEveryPartOfTheName(t *testing.T) {
	const n = 1 << 18
	s := draw.New(0, 0, "capture")
	along := map[string]func(i uint64) float64{
		"object":      func(i uint64) float64 { return s.Uniform(i, 0, 0) },
		"number":      func(i uint64) float64 { return s.Uniform(1, 0, uint32(i)) },
		"generation":  func(i uint64) float64 { return s.Uniform(1, uint32(i), 0) },
		"realisation": func(i uint64) float64 { return draw.New(0, i, "capture").Uniform(1, 0, 0) },
		"seed":        func(i uint64) float64 { return draw.New(i, 0, "capture").Uniform(1, 0, 0) },
	}
	for name, u := range along {
		for _, lag := range []uint64{1, 2, 3, 7, 64, 4096} {
			sum, mean := 0.0, 0.0
			for i := range uint64(n) {
				sum += (u(i) - 0.5) * (u(i+lag) - 0.5)
				mean += u(i) - 0.5
			}
			// A product of two centred uniforms has standard deviation 1/12.
			if z := sum * 12 / math.Sqrt(n); math.Abs(z) > fiveSigma {
				t.Errorf("along %s, lag %d: off by %.1f sigma", name, lag, z)
			}
			if z := mean * math.Sqrt(12.0/n); math.Abs(z) > fiveSigma {
				t.Errorf("along %s: mean off by %.1f sigma", name, z)
			}
		}
	}
}

// 2^20 draws of 64 bits should hold no equal pair (3e-8 expected).
func TestNoRepeats(t *testing.T) {
	s, seen := draw.New(1, 1, "repeat"), make(map[uint64]bool, 1<<20)
	for i := range uint64(1 << 20) {
		b := s.Bits(i>>2, uint32(i>>1&1), uint32(i&1))
		if seen[b] {
			t.Fatalf("draw %d repeats %#x", i, b)
		}
		seen[b] = true
	}
}
