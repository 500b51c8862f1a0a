package num_test

import (
	"testing"

	"wane/sim/num"
)

var sink float64

func benchmarkScalar(b *testing.B, f func(float64) float64, low, high float64) {
	xs := make([]float64, 1024)
	for i := range xs {
		xs[i] = low + (high-low)*float64(i*619%1024)/1024
	}
	b.ResetTimer()
	for i := range b.N {
		sink = f(xs[i&1023])
	}
}

func benchmarkInto(b *testing.B, f func(dst, src []float64), low, high float64) {
	xs, dst := make([]float64, 1024), make([]float64, 1024)
	for i := range xs {
		xs[i] = low + (high-low)*float64(i*619%1024)/1024
	}
	b.ResetTimer()
	for i := 0; i < b.N; i += len(xs) {
		n := min(len(xs), b.N-i)
		f(dst[:n], xs[:n])
	}
}

func BenchmarkExp(b *testing.B)       { benchmarkScalar(b, num.Exp, -50, 50) }
func BenchmarkExp10(b *testing.B)     { benchmarkScalar(b, num.Exp10, -20, 20) }
func BenchmarkLog(b *testing.B)       { benchmarkScalar(b, num.Log, 1e-3, 1e3) }
func BenchmarkLog10(b *testing.B)     { benchmarkScalar(b, num.Log10, 1e-3, 1e3) }
func BenchmarkExpInto(b *testing.B)   { benchmarkInto(b, num.ExpInto, -50, 50) }
func BenchmarkExp10Into(b *testing.B) { benchmarkInto(b, num.Exp10Into, -20, 20) }
func BenchmarkLogInto(b *testing.B)   { benchmarkInto(b, num.LogInto, 1e-3, 1e3) }
func BenchmarkLog10Into(b *testing.B) { benchmarkInto(b, num.Log10Into, 1e-3, 1e3) }

func BenchmarkAllWithin(b *testing.B) {
	xs := make([]float64, 1024)
	for i := 0; i < b.N; i += len(xs) {
		if !num.AllWithin(xs[:min(len(xs), b.N-i)], 0, 1) {
			b.Fatal("0 is not within 0 .. 1")
		}
	}
}
