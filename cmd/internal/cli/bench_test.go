package cli_test

import (
	"context"
	"testing"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/scenario"
)

// BenchmarkLanternReach runs the default laws on a sample of 1e5 objects, one
// realisation on one worker; ns/life is per object.
func BenchmarkLanternReach(b *testing.B) {
	reg, err := plugins.Builtin()
	if err != nil {
		b.Fatal(err)
	}
	sc, _, err := scenario.Load(scenarios.FS, "lantern-reach.toml", reg, plugins.Defaults(), scenario.Overrides{Realisations: b.N})
	if err != nil {
		b.Fatal(err)
	}
	b.ReportAllocs()
	b.ResetTimer()
	if _, err := sim.Run(context.Background(), sc, reg, sim.Options{Workers: 1}); err != nil {
		b.Fatal(err)
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(sc.Sample), "ns/life")
}
