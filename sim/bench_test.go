package sim_test

import (
	"context"
	"fmt"
	"testing"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/scenario"
)

// BenchmarkLanternReach runs the reference galaxy under the default laws, end
// to end, by number of workers; ns/life is per object and realisation, by the
// clock on the wall.
func BenchmarkLanternReach(b *testing.B) {
	reg, err := plugins.Builtin()
	if err != nil {
		b.Fatal(err)
	}
	const realisations = 8
	s, _, err := scenario.Load(scenarios.FS, "lantern-reach.toml", reg, plugins.Defaults(), scenario.Overrides{Realisations: realisations})
	if err != nil {
		b.Fatal(err)
	}
	for _, workers := range []int{1, 2} {
		b.Run(fmt.Sprintf("workers=%d", workers), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if _, err := sim.Run(context.Background(), s, reg, sim.Options{Workers: workers}); err != nil {
					b.Fatal(err)
				}
			}
			lives := float64(b.N) * realisations * float64(s.Held())
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/lives, "ns/life")
		})
	}
}
