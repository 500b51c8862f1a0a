package draw_test

import (
	"testing"

	"wane/sim/draw"
)

var sink float64

func BenchmarkUniform(b *testing.B) {
	s := draw.New(1, 0, "bench")
	for i := range b.N {
		sink = s.Uniform(uint64(i), 0, 1)
	}
}

func BenchmarkExp(b *testing.B) {
	s := draw.New(1, 0, "bench")
	for i := range b.N {
		sink = s.Exp(uint64(i), 0, 1)
	}
}

func benchmarkColumn(b *testing.B, fill func(dst []float64, first uint64, generation, number uint32)) {
	dst := make([]float64, 1024)
	b.ReportAllocs()
	for i := 0; i < b.N; i += len(dst) {
		fill(dst[:min(len(dst), b.N-i)], uint64(i), 0, 1)
	}
}

func BenchmarkUniforms(b *testing.B) { benchmarkColumn(b, draw.New(1, 0, "bench").Uniforms) }
func BenchmarkExps(b *testing.B)     { benchmarkColumn(b, draw.New(1, 0, "bench").Exps) }
