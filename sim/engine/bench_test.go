package engine

import (
	"context"
	"fmt"
	"sync"
	"testing"
)

// BenchmarkToyGalaxy runs the toy galaxy through the real engine with real
// laws on one worker; ns/life is per object and realisation. The script
// .ci/bench compares it with programs written by hand.
func BenchmarkToyGalaxy(b *testing.B) {
	for _, n := range []int{1e4, 1e5, 1e6, 1e7} {
		b.Run(fmt.Sprintf("n=1e%d", digits(n)), func(b *testing.B) { toyGalaxy(b, n, 1) })
	}
}

// BenchmarkToyWorkers is the same for two workers side by side: ns/life of one
// worker over that of two is the gain.
func BenchmarkToyWorkers(b *testing.B) {
	for _, workers := range []int{1, 2} {
		b.Run(fmt.Sprintf("workers=%d", workers), func(b *testing.B) { toyGalaxy(b, 1e5, workers) })
	}
}

func toyGalaxy(b *testing.B, n, workers int) {
	setup, err := toySetup(n, 1)
	if err != nil {
		b.Fatal(err)
	}
	m, err := Compile(setup)
	if err != nil {
		b.Fatal(err)
	}
	spaces := make([]*Workspace, workers)
	for i := range spaces {
		spaces[i] = m.NewWorkspace()
		if _, err := spaces[i].Run(context.Background(), 0); err != nil {
			b.Fatal(err) // also takes the memory that every later run uses
		}
	}
	b.ReportAllocs()
	b.ResetTimer()
	var group sync.WaitGroup
	for i, w := range spaces {
		group.Go(func() {
			for r := i; r < b.N; r += workers {
				if _, err := w.Run(context.Background(), uint64(r)); err != nil {
					b.Error(err)
				}
			}
		})
	}
	group.Wait()
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/life")
}

func digits(n int) int {
	d := 0
	for ; n >= 10; n /= 10 {
		d++
	}
	return d
}
