package cli

import (
	"context"
	"errors"
	"fmt"
	"io"
	"math"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"wane/sim/law"
	"wane/sim/scenario"
	"wane/sim/sky"
)

// skyFlags are the flags of sky as they are given.
type skyFlags struct {
	at, laws, sets    []string
	grid              string
	seed, realisation wholeNumber
	csv, trust        bool
}

func (p *Program) sky(s *settings) *cobra.Command {
	var f skyFlags
	c := &cobra.Command{
		Use:   "sky [scenario | law]",
		Short: "Print how space expands and how warm the sky is, by date",
		Long: `Print the sky of a scenario, or of a law of expansion: by date its scale factor, expansion rate,
temperatures, horizons and age; and the dates at which something changes: the relic radiation is as cold
as the horizon, a hole of so many suns is at last warmer than the sky, dark energy decays, everything
ends.

The law is lambda-cdm or expansion/lambda-cdm, an ending (process/name), or the path of a law of expansion
outside the program. Without a word it is the default. What an ending draws is that of one realisation, the
first one, number 0, unless --realisation says another; so 'wane run' has it with the same seed.

Dates are times since the Big Bang, of any size, or "today". A grid is of log10 of years: from:to:how many.
In files all is log10, with inf where there is no bound and -inf for none at all; units are VOUnits. A CSV
is an ECSV 1.0, whose head holds units and the special dates.

Event horizon and Hubble radius are proper distances, particle horizon and visible limit comoving ones. The
visible limit is what an observer who stays to the end will have seen; the event horizon is that of space,
which knows of a rip and of decaying dark energy, and of no other end. The horizon is as warm as hbar H/(2 pi k) while space accelerates, and what an object feels is the fourth root
of the sum of fourth powers.`,
		Example: "  wane sky\n" +
			"  wane sky lantern-reach --at 1e10yr,today,1e12yr,10^1500yr\n" +
			"  wane sky lambda-cdm --grid 9:14:51 --csv > sky.ecsv\n" +
			"  wane sky lambda-cdm --set expansion.hubble=73km/s/Mpc --set expansion.matter=0.3\n" +
			"  wane sky lantern-reach --law expansion=./my-space --realisation 3 --json",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) > 1 {
				return fmt.Errorf("sky: want one scenario or law, not %d", len(args))
			}
			return nil
		},
		ValidArgsFunction: p.completeSky,
		RunE: func(c *cobra.Command, args []string) error {
			which := ""
			if len(args) == 1 {
				which = args[0]
			}
			return p.printSky(c, s, which, &f)
		},
	}
	flags := c.Flags()
	flags.StringArrayVar(&f.at, "at", nil, "at these `dates`: 1e10yr,13.8Gyr,today (repeatable)")
	flags.StringVar(&f.grid, "grid", "", "at evenly spaced log10 of years, `from:to:count`")
	flags.BoolVar(&f.csv, "csv", false, "print CSV (ECSV 1.0)")
	flags.StringArrayVar(&f.sets, "set", nil, "set `name=value`: process.parameter (repeatable)")
	flags.Var(&f.seed, "seed", "seed of the draws (default: the scenario's)")
	flags.Var(&f.realisation, "realisation", "draw the endings of this realisation, from 0 on")
	lawFlags(c, &f.laws, &f.trust)
	return c
}

// overrides reads the flags, and reports all faults together.
func (f *skyFlags) overrides(c *cobra.Command, s *settings) (o scenario.Overrides, realisation uint64, dates []skyDate, err error) {
	dates, faults := f.dates(c)
	bad := func(format string, a ...any) { faults = append(faults, fmt.Errorf(format, a...)) }
	o = scenario.Overrides{Laws: f.laws, Sets: f.sets}
	if c.Flags().Changed("seed") {
		seed, err := f.seed.within(0, math.MaxUint64)
		if err != nil {
			bad("--seed %w", err)
		}
		o.Seed = &seed
	}
	if c.Flags().Changed("realisation") {
		if realisation, err = f.realisation.within(0, scenario.MaxRealisations-1); err != nil {
			bad("--realisation %w", err)
		}
	}
	if f.csv && s.json {
		bad("--csv and --json: want one of them")
	}
	return o, realisation, dates, errors.Join(faults...)
}

func (p *Program) printSky(c *cobra.Command, s *settings, which string, f *skyFlags) error {
	o, realisation, dates, err := f.overrides(c, s)
	if err != nil {
		return err
	}
	l, alone, err := p.skyOf(c.Context(), s, which, o, f.trust)
	if err != nil {
		return err
	}
	defer l.close()
	v, err := viewSky(c.Context(), l, realisation, dates)
	if err != nil {
		return err
	}
	v.alone = alone
	if !s.quiet {
		f.warn(p.Err)
		l.healed(p.Err)
	}
	switch {
	case s.json:
		return printJSON(p.Out, v.document())
	case f.csv:
		return v.csv(p.Out)
	}
	v.text(p.Out, styleFor(p.Out), s.quiet)
	return nil
}

// warn names what was given and changes nothing.
func (f *skyFlags) warn(w io.Writer) {
	for i, text := range slices.Concat(f.laws, f.sets) {
		flag := "--law"
		if i >= len(f.laws) {
			flag = "--set"
		}
		key, _, _ := strings.Cut(text, "=")
		if process, _, _ := strings.Cut(key, "."); !ofSky(strings.TrimSpace(process)) {
			fmt.Fprintf(w, "wane: warning: %s %s has no effect: the sky hangs on laws of expansion and of endings alone\n", flag, key)
		}
	}
}

// skyView is one sky, ready to be printed.
type skyView struct {
	*sky.Sky
	run         *loaded
	alone       bool // a law and no scenario
	realisation uint64
	draws       bool // whether an ending of the run may come
	dates       []float64
}

// viewSky draws the sky, and turns dates into numbers.
func viewSky(ctx context.Context, l *loaded, realisation uint64, dates []skyDate) (*skyView, error) {
	set, err := l.Set(l.registry)
	if err != nil {
		return nil, bad(err)
	}
	v := &skyView{run: l, realisation: realisation}
	for _, u := range set.OfRole(law.Ending) {
		v.draws = v.draws || u.Card.Effect != "" && !u.Card.Idle
	}
	prepared, err := sky.Prepare(set)
	if err == nil {
		v.Sky, err = prepared.Draw(l.Seed, realisation)
	}
	if err != nil {
		if ctx.Err() != nil {
			return nil, &fault{ExitInterrupted, errors.New("interrupted")}
		}
		return nil, failed(err)
	}
	for _, d := range dates {
		v.dates = append(v.dates, d.on(v.Sky))
	}
	slices.Sort(v.dates)
	v.dates = slices.Compact(v.dates)
	return v, nil
}
