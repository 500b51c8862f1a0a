// Package sim is the face of Wane: it takes a scenario and the laws a program
// knows, runs every realisation, and returns the summary. It reads no file,
// flag, clock or network.
package sim

import (
	"context"
	"fmt"

	"wane/sim/engine"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
	"wane/sim/sky"
)

// Options of a run that do not touch its result.
type Options struct {
	// Workers is how many realisations are run at a time; 0: one per processor.
	Workers int
	// Progress, if not nil, is told after each realisation, one call at a time.
	Progress func(done, total int)
}

// Run runs a scenario. When ctx ends first it returns the summary of the
// realisations that are finished, with Interrupted set; an error when none is.
func Run(ctx context.Context, sc *scenario.Scenario, reg *law.Registry, opt Options) (*ensemble.Summary, error) {
	set, err := sc.Set(reg)
	if err != nil {
		return nil, err
	}
	model, err := compile(sc, set)
	if err != nil {
		return nil, err
	}
	done, err := ensemble.Each(ctx, sc.Realisations, opt.Workers, model.NewWorkspace,
		func(w *engine.Workspace, r int) (*engine.Outcome, error) {
			return w.Run(ctx, uint64(r))
		}, opt.Progress)
	if err != nil {
		return nil, err
	}
	if len(done.Results) == 0 {
		return nil, fmt.Errorf("sim: interrupted before the first realisation was finished: %w", context.Cause(ctx))
	}
	outcomes := make([]engine.Outcome, len(done.Results))
	for i, o := range done.Results {
		outcomes[i] = *o
	}
	s := ensemble.Summarise(outcomes, info(sc, set, model, done.Interrupted))
	return &s, nil
}

func compile(sc *scenario.Scenario, set *law.Set) (*engine.Model, error) {
	background, err := sky.Prepare(set)
	if err != nil {
		return nil, err
	}
	return engine.Compile(engine.Setup{
		Set: set, Sky: skies{background}, Objects: int(sc.Held()), Real: sc.Objects, Radius: sc.Radius,
		CentralMass: sc.CentralMass, Until: sc.Until, Seed: sc.Seed, Populations: sc.Populations,
	})
}

// skies hands the prepared background to the engine.
type skies struct{ prepared *sky.Prepared }

func (s skies) Draw(seed, realisation uint64) (engine.Sky, error) {
	return s.prepared.Draw(seed, realisation)
}

func info(sc *scenario.Scenario, set *law.Set, m *engine.Model, interrupted bool) ensemble.Info {
	i := ensemble.Info{
		Engine: "individuals", Objects: int64(m.Objects), StandsFor: sc.Objects, Whole: m.Weight == 1,
		Requested: sc.Realisations, Interrupted: interrupted, Seed: sc.Seed, Scenario: sc.Name, Populations: sc.Populations,
	}
	for _, u := range set.All() {
		outside := sc.Outside[u.Card.Process]
		i.Laws = append(i.Laws, ensemble.LawInUse{
			Process: u.Card.Process, Name: u.Card.Name, Version: u.Card.Version, Path: outside.Written, Digest: outside.Digest,
		})
		if u.Card.Idle {
			i.Idle = append(i.Idle, u.Card.Process)
		}
	}
	return i
}
