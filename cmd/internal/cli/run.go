package cli

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"math"

	"github.com/spf13/cobra"

	"wane/cmd/internal/report"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
)

// RunFunc runs a scenario on so many workers (0: as many as the machine has)
// and tells how many realisations are done. When ctx ends it returns what is
// finished, marked as interrupted.
type RunFunc func(ctx context.Context, sc *scenario.Scenario, reg *law.Registry, workers int, progress func(done, total int)) (*ensemble.Summary, error)

// runFlags are the flags of run as they are given.
type runFlags struct {
	laws, sets                           []string
	realisations, objects, seed, workers wholeNumber
	until                                string
	out                                  string
	force, trust                         bool
}

func (p *Program) run(s *settings) *cobra.Command {
	var f runFlags
	c := &cobra.Command{
		Use:   "run scenario",
		Short: "Run a scenario and print when each population fades",
		Long: `Run a scenario, a .toml file or the name of an embedded one ('wane scenarios'), and print the fade
summary: for each population its peak, and the dates from which it never again exceeds half and a
hundredth of that, and at which its last member goes; what took its members; and which law each last
date hangs on.

A law is named, or given by the path of a law outside the program: a folder with a law.toml, or an
executable file. A path that you type is started, and its digest shown. One in a scenario file counts
from that file, and is started only with --trust, or if the file says its digest: [trust] process =
"sha256:...".

The same scenario, seed and laws give the same answer for any number of workers. An interrupt ends
the run: what is finished is reported, labelled as such, and the exit code is 130.

With --out DIR, the folder holds summary.json, its JSON Schema, summary.txt and manifest.json (version,
resolved scenario and digest, laws with versions and parameters, seed, Go version, architecture), whole
or not at all.`,
		Example: "  wane run lantern-reach\n" +
			"  wane run scenarios/lantern-reach.toml --realisations 100 --seed 7\n" +
			"  wane run lantern-reach --law evaporation=black-body\n" +
			"  wane run lantern-reach --law evaporation=./my-burden\n" +
			"  wane run lantern-reach --set nucleon-decay.lifetime=1e35yr --set galaxy.radius=8kpc\n" +
			"  wane run little-lamp --until 1e20yr --out little --force\n" +
			"  wane run lantern-reach --json | jq '.populations[] | {name, last: .marks.last}'",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) != 1 {
				return fmt.Errorf("run: want one scenario, not %d; 'wane scenarios' lists those that are built in", len(args))
			}
			return nil
		},
		ValidArgsFunction: p.completeScenario,
		RunE: func(c *cobra.Command, args []string) error {
			o, workers, err := f.overrides(c)
			if err != nil {
				return err
			}
			return p.runScenario(c.Context(), s, args[0], o, workers, &f)
		},
	}
	flags := c.Flags()
	lawFlags(c, &f.laws, &f.trust)
	flags.StringArrayVar(&f.sets, "set", nil, "set `name=value`: process.parameter or galaxy.radius=8kpc (repeatable)")
	flags.Var(&f.realisations, "realisations", "random histories (default: the scenario's)")
	flags.Var(&f.objects, "objects", "objects to simulate, such as 1e5 (default: the scenario's)")
	flags.Var(&f.seed, "seed", "seed of all draws (default: the scenario's)")
	flags.Var(&f.workers, "workers", "realisations computed at a time (default: one a core)")
	flags.StringVar(&f.until, "until", "", "end at this `date`: 1e20yr, never (default: the scenario's)")
	flags.StringVar(&f.out, "out", "", "write the answer to this new folder, `DIR`")
	flags.BoolVar(&f.force, "force", false, "let --out replace an earlier run's folder")
	return c
}

// lawFlags are the flags about laws that run and check have.
func lawFlags(c *cobra.Command, laws *[]string, trust *bool) {
	c.Flags().StringArrayVar(laws, "law", nil, "use this law: `process=name` or process=./path (repeatable)")
	c.Flags().BoolVar(trust, "trust", false, "start the laws outside the program that the scenario file names")
}

// maxWorkers is more than any machine has cores for; each holds a realisation.
const maxWorkers = 4096

// overrides turns the flags into settings and the number of workers (0: one a
// core), and reports all faults together.
func (f *runFlags) overrides(c *cobra.Command) (o scenario.Overrides, workers int, err error) {
	var faults []error
	bad := func(format string, a ...any) { faults = append(faults, fmt.Errorf(format, a...)) }
	given := c.Flags().Changed
	number := func(flag string, w *wholeNumber, low, high uint64) uint64 {
		if !given(flag) {
			return 0
		}
		v, err := w.within(low, high)
		if err != nil {
			bad("--%s %w", flag, err)
		}
		return v
	}
	o = scenario.Overrides{
		Laws: f.laws, Sets: f.sets, Until: f.until,
		Realisations: int(number("realisations", &f.realisations, 1, scenario.MaxRealisations)),
		Objects:      int64(number("objects", &f.objects, 1, scenario.MaxHeld)),
	}
	if seed := number("seed", &f.seed, 0, math.MaxUint64); given("seed") {
		o.Seed = &seed
	}
	workers = int(number("workers", &f.workers, 1, maxWorkers))
	if given("out") && f.out == "" {
		bad("--out: want a folder")
	}
	if f.force && f.out == "" {
		bad("--force: it has no effect without --out")
	}
	if given("until") && f.until == "" {
		bad("--until: want a date such as 1e20yr, or never")
	}
	return o, workers, errors.Join(faults...)
}

func (p *Program) runScenario(ctx context.Context, s *settings, which string, o scenario.Overrides, workers int, f *runFlags) error {
	l, err := p.load(ctx, s, which, o, f.trust)
	if err != nil {
		return err
	}
	defer l.close()
	if f.out != "" {
		if err := mayWrite(f.out, f.force); err != nil {
			return bad(err)
		}
	}
	bar := newBar(p.Err, s.quiet)
	summary, err := p.Run(ctx, l.Scenario, l.registry, workers, bar.set)
	bar.close()
	if err != nil {
		if ctx.Err() != nil && errors.Is(err, ctx.Err()) {
			return &fault{ExitInterrupted, errors.New("interrupted before the first realisation was finished")}
		}
		return failed(err)
	}
	if summary.Interrupted && summary.Realisations == 0 {
		return &fault{ExitInterrupted, errors.New("interrupted before the first realisation was finished")}
	}
	if !s.quiet {
		l.healed(p.Err)
	}
	if err := p.printSummary(s, summary); err != nil {
		return failed(err)
	}
	if f.out != "" {
		files, err := runFiles(l, summary)
		if err == nil {
			err = writeFolder(f.out, f.force, files)
		}
		if err != nil {
			return failed(err)
		}
		if !s.quiet {
			fmt.Fprintln(p.Err, "wane: written to "+f.out)
		}
	}
	if summary.Interrupted {
		return &fault{ExitInterrupted, fmt.Errorf("interrupted: %d of %d realisations were finished",
			summary.Realisations, summary.Requested)}
	}
	return nil
}

func (p *Program) printSummary(s *settings, summary *ensemble.Summary) error {
	if s.json {
		return report.JSON(p.Out, summary)
	}
	return report.Text(p.Out, summary, styleFor(p.Out))
}

// runFiles is what --out writes.
func runFiles(l *loaded, summary *ensemble.Summary) (map[string][]byte, error) {
	var text, data, manifest bytes.Buffer
	if err := report.Text(&text, summary, report.Style{}); err != nil {
		return nil, err
	}
	if err := report.JSON(&data, summary); err != nil {
		return nil, err
	}
	if err := printJSON(&manifest, manifestOf(l, summary)); err != nil {
		return nil, err
	}
	return map[string][]byte{
		"summary.txt": text.Bytes(), "summary.json": data.Bytes(), "summary.schema.json": report.Schema, manifestName: manifest.Bytes(),
	}, nil
}
