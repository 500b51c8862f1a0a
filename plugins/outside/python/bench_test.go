package python_test

import (
	"fmt"
	"testing"

	"wane/sim/law"
	"wane/sim/rpc"
)

// BenchmarkAnswer is what a row of a law costs, in process and outside in
// Python: the wait of black holes, one logarithm a row.
func BenchmarkAnswer(b *testing.B) {
	outside := open(b, "blackbody", rpc.Options{})
	for _, l := range []struct {
		name string
		law  law.Law
	}{{"in-process", builtin(b)}, {"python", outside}} {
		for _, rows := range []int{64, 1000, 16384, 100_000} {
			in, u, arena := batch(masses(rows)), law.NewUse(l.law), new(law.Arena)
			b.Run(fmt.Sprintf("%s/%d", l.name, rows), func(b *testing.B) {
				for b.Loop() {
					if _, err := u.Ask("foretell", in.With(arena)); err != nil {
						b.Fatal(err)
					}
					arena.Reset()
				}
				b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*rows), "ns/row")
			})
		}
	}
}
