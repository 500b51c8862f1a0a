package main

import (
	"context"
	"fmt"
	"testing"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/law"
	"wane/sim/law/lawtest"
	"wane/sim/rpc"
	"wane/sim/scenario"
)

// BenchmarkAnswer is the price of being asked outside the program: ns a row
// for a law in process and through the wire, by the rows of a batch.
func BenchmarkAnswer(b *testing.B) {
	for _, id := range [][2]string{{"evaporation", "page"}, {"neutron-star-cooling", "minimal"}} {
		reg, err := plugins.Builtin()
		if err != nil {
			b.Fatal(err)
		}
		inside, _ := reg.Find(id[0], id[1])
		start := rpc.Start{Name: built, Args: []string{built, id[0] + "/" + id[1]}}
		out := opened(b, start)
		start.OnlyCalls = true
		calls := opened(b, start)
		question := inside.Describe().Questions[0].Name
		for _, rows := range []int{64, 1000, 16384, 100000} {
			in := lawtest.Rows(inside, question, rows)
			for _, side := range []struct {
				name string
				law  law.Law
			}{{"inside", inside}, {"outside", out}, {"outside, grpc", calls}} {
				b.Run(fmt.Sprintf("%s/%s/rows=%d/%s", id[0], question, rows, side.name), func(b *testing.B) {
					var arena law.Arena
					b.ReportAllocs()
					for b.Loop() {
						arena.Reset()
						if _, err := side.law.Answer(question, in.With(&arena)); err != nil {
							b.Fatal(err)
						}
					}
					b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(rows), "ns/row")
				})
			}
		}
	}
}

func opened(b *testing.B, s rpc.Start) *rpc.Law {
	b.Helper()
	l, err := rpc.Open(context.Background(), s)
	if err != nil {
		b.Fatal(err)
	}
	b.Cleanup(func() {
		if err := l.Close(); err != nil {
			b.Error(err)
		}
	})
	return l
}

// BenchmarkLanternReach runs the reference galaxy with no law outside, with
// one, and with all of them; each against the first is what a law outside
// costs.
func BenchmarkLanternReach(b *testing.B) {
	laws := builtin(b)
	defaults := plugins.Defaults()
	run := func(b *testing.B, outside func(law.Card) bool) {
		var mixed []law.Law
		for _, l := range laws {
			card := l.Describe()
			if defaults[card.Process] == card.Name && outside(card) {
				l = opened(b, rpc.Start{Name: built, Args: []string{built, card.Process + "/" + card.Name}})
			}
			mixed = append(mixed, l)
		}
		reg, err := law.NewRegistry(mixed...)
		if err != nil {
			b.Fatal(err)
		}
		sc, _, err := scenario.Load(scenarios.FS, "lantern-reach.toml", reg, defaults, scenario.Overrides{Realisations: 4})
		if err != nil {
			b.Fatal(err)
		}
		for b.Loop() {
			if _, err := sim.Run(context.Background(), sc, reg, sim.Options{}); err != nil {
				b.Fatal(err)
			}
		}
	}
	b.Run("none", func(b *testing.B) { run(b, func(law.Card) bool { return false }) })
	for _, l := range laws {
		if card := l.Describe(); defaults[card.Process] == card.Name && !card.Idle {
			b.Run(card.Process, func(b *testing.B) { run(b, func(c law.Card) bool { return c.Process == card.Process }) })
		}
	}
	b.Run("all", func(b *testing.B) { run(b, func(law.Card) bool { return true }) })
}
