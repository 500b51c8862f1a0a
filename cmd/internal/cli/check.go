package cli

import (
	"fmt"

	"github.com/spf13/cobra"

	"wane/sim/scenario"
)

func (p *Program) check(s *settings) *cobra.Command {
	var laws, sets []string
	var trust bool
	c := &cobra.Command{
		Use:   "check scenario",
		Short: "Check a scenario without running it, and print it laid open",
		Long: "Check a scenario, a .toml file or the name of an embedded one, without running it. All faults of a file\n" +
			"are reported together, each with its line and column. A sound scenario is printed laid open: every\n" +
			"setting, law and parameter, where its value comes from, what is allowed, and the citation of its preset.\n" +
			"With --quiet nothing is printed but faults.",
		Example: "  wane check lantern-reach\n" +
			"  wane check my-galaxy.toml --quiet && wane run my-galaxy.toml\n" +
			"  wane check lantern-reach --set nucleon-decay.lifetime=1e35yr --json\n" +
			"  wane check lantern-reach --law evaporation=./my-burden",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) != 1 {
				return fmt.Errorf("check: want one scenario, not %d", len(args))
			}
			return nil
		},
		ValidArgsFunction: p.completeScenario,
		RunE: func(c *cobra.Command, args []string) error {
			l, err := p.load(c.Context(), s, args[0], scenario.Overrides{Laws: laws, Sets: sets}, trust)
			if err != nil {
				return err
			}
			defer l.close()
			resolved := l.Resolve(l.registry)
			switch {
			case s.json:
				return printJSON(p.Out, resolved)
			case s.quiet:
				return nil
			}
			return resolved.Print(p.Out)
		},
	}
	lawFlags(c, &laws, &trust)
	c.Flags().StringArrayVar(&sets, "set", nil, "set `name=value`: process.parameter or galaxy.radius=8kpc (repeatable)")
	return c
}
