package engine

import (
	"context"
	"fmt"
	"testing"
)

// BenchmarkToyGalaxy runs the toy galaxy through the real engine with real
// laws; ns/life is per object and realisation.
func BenchmarkToyGalaxy(b *testing.B) {
	for _, n := range []int{1e4, 1e5, 1e6, 1e7} {
		b.Run(fmt.Sprintf("n=1e%d", digits(n)), func(b *testing.B) {
			setup, err := toySetup(n, 1)
			if err != nil {
				b.Fatal(err)
			}
			m, err := Compile(setup)
			if err != nil {
				b.Fatal(err)
			}
			w := m.NewWorkspace()
			b.ReportAllocs()
			b.ResetTimer()
			for r := range b.N {
				if _, err := w.Run(context.Background(), uint64(r)); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/life")
		})
	}
}

func digits(n int) int {
	d := 0
	for ; n >= 10; n /= 10 {
		d++
	}
	return d
}
