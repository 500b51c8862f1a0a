package cli

import (
	"context"
	"errors"
	"os"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
)

// Standard is the program with the built-in laws and scenarios.
func Standard() *Program {
	return &Program{
		Out: os.Stdout, Err: os.Stderr, Builtin: plugins.Builtin, Defaults: plugins.Defaults,
		Embedded: scenarios.FS, Run: engine,
	}
}

func engine(context.Context, *scenario.Scenario, *law.Registry, int, func(done, total int)) (*ensemble.Summary, error) {
	return nil, errors.New("this build has no engine")
}
