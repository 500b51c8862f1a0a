package cli

import (
	"context"
	"os"

	"wane/cmd/internal/verify"
	"wane/plugins"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
)

// Standard is the program with the built-in laws and scenarios.
func Standard() *Program {
	return &Program{
		Out: os.Stdout, Err: os.Stderr, Builtin: plugins.Builtin, Defaults: plugins.Defaults,
		Embedded: scenarios.FS, Run: engine, Open: openFolder, Dates: verify.Dates,
	}
}

func engine(ctx context.Context, sc *scenario.Scenario, reg *law.Registry, workers int, progress func(done, total int)) (*ensemble.Summary, error) {
	return sim.Run(ctx, sc, reg, sim.Options{Workers: workers, Progress: progress})
}
