package draw_test

import (
	"hash/fnv"
	"math"
	"testing"

	"wane/sim/draw"
)

// The values in this file may never change. A seed printed beside a published
// result is a promise that the same seed gives the same result again; one bit
// of difference here breaks every such promise without any other test noticing.
// Whoever needs another generator adds one under another name.
//
// They were computed by a separate program in Python's exact integers, the
// exponentials with the tables and the decisions of the ziggurat in 60 digits.

func TestFrozenDraws(t *testing.T) {
	for _, f := range []struct {
		seed, realisation  uint64
		process            string
		object             uint64
		generation, number uint32
		bits               uint64
		uniform, exp       float64
	}{
		{0x0, 0x0, "", 0x0, 0, 0, 0x648c67d94a2632de, 0x1.92319f652898dp-2, 0x1.f1dd6716b0e48p-3},
		{0x1, 0x0, "evaporation", 0x0, 0, 0, 0x06cbbc35838a99cc, 0x1.b2ef0d60e2a70p-6, 0x1.650201ffb4126p-6},
		{0x1, 0x0, "evaporation", 0x1, 0, 0, 0xb1cfe5eb12cee4ff, 0x1.639fcbd6259dcp-1, 0x1.6864c81c6e458p-1},
		{0x1, 0x0, "evaporation", 0x0, 1, 0, 0x5929cfc030b4edd9, 0x1.64a73f00c2d3bp-2, 0x1.e2b276feba92fp-3},
		{0x1, 0x0, "evaporation", 0x0, 0, 1, 0xdd4b04d30aea845f, 0x1.ba9609a615d50p-1, 0x1.d6c10392b0ee6p+0},
		{0x1, 0x1, "evaporation", 0x0, 0, 0, 0x4dd953bb80a98a10, 0x1.37654eee02a63p-2, 0x1.5cc79af3da0d1p+0},
		{0x2, 0x0, "evaporation", 0x0, 0, 0, 0x94a67694b0b65dca, 0x1.294ced29616cbp-1, 0x1.f4f51de263ea1p-2},
		{12345, 99, "capture by the central hole", 99_999_999_999, 3, 7, 0x474a11fb115cfd2d, 0x1.1d2847ec4573fp-2, 0x1.c320645c84784p-1},
		{1<<64 - 1, 1<<64 - 1, "µ", 1<<64 - 1, 1<<32 - 1, 1<<32 - 1, 0x29cbec468a4a3766, 0x1.4e5f62345251ap-3, 0x1.51fb3abc7a17cp-2},
	} {
		s := draw.New(f.seed, f.realisation, f.process)
		if got := s.Bits(f.object, f.generation, f.number); got != f.bits {
			t.Errorf("%v: bits %#x", f, got)
		}
		if got := s.Uniform(f.object, f.generation, f.number); got != f.uniform {
			t.Errorf("%v: uniform %x", f, got)
		}
		if got := s.Exp(f.object, f.generation, f.number); got != f.exp {
			t.Errorf("%v: exponential %x", f, got)
		}
	}
}

// One draw for each way through the ziggurat.
func TestFrozenWaysThroughTheZiggurat(t *testing.T) {
	s := draw.New(1, 0, "evaporation")
	for _, f := range []struct {
		object uint64
		want   float64
		way    string
	}{
		{1, 0x1.6864c81c6e458p-1, "rejected, then inside"},
		{36, 0x1.d76aeac2aa0a1p-2, "wedge"},
		{3242, 0x1.0e6ff719c5b41p+3, "tail"},
		{3884, 0x1.4e4de1b11c648p-2, "rejected, then wedge"},
		{16205, 0x1.10a5209612c64p+3, "tail, then wedge"},
		{16312, 0x1.bb25d11bff14ep-4, "rejected twice"},
	} {
		if got := s.Exp(f.object, 0, 0); got != f.want {
			t.Errorf("object %d (%s): %x, want %x", f.object, f.way, got, f.want)
		}
	}
}

// A million draws at once; the sum stands for all of them.
func TestFrozenMillion(t *testing.T) {
	xs, h, s := make([]float64, 1<<20), fnv.New64a(), draw.New(1, 0, "million")
	add := func() {
		for _, x := range xs {
			b := math.Float64bits(x)
			h.Write([]byte{byte(b), byte(b >> 8), byte(b >> 16), byte(b >> 24), byte(b >> 32), byte(b >> 40), byte(b >> 48), byte(b >> 56)})
		}
	}
	s.Exps(xs, 0, 0, 0)
	add()
	s.Uniforms(xs, 0, 0, 0)
	add()
	if got, want := h.Sum64(), uint64(0xdfdbe8b194a39af2); got != want {
		t.Errorf("sum %#x, want %#x", got, want)
	}
}
