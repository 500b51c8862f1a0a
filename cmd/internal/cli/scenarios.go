package cli

import (
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"wane/scenarios"
	"wane/sim/scenario"
)

// scenarioLine is an embedded scenario in a list.
type scenarioLine struct {
	Name     string `json:"name"`
	Title    string `json:"title"`
	Group    string `json:"group"`
	Question string `json:"question"`
	LookAt   string `json:"look_at"`
	Cost     string `json:"cost"`
}

func (p *Program) scenarios(s *settings) *cobra.Command {
	return &cobra.Command{
		Use:   "scenarios",
		Short: "List the scenarios that are built in",
		Long: "List the scenarios that are built in by the question they are about, what each asks, what to look at in its answer, " +
			"and what it costs to run.",
		Example: "  wane scenarios\n  wane run little-lamp",
		Args:    cobra.NoArgs,
		RunE: func(*cobra.Command, []string) error {
			registry, err := p.Builtin()
			if err != nil {
				return failed(err)
			}
			lines := []scenarioLine{}
			for _, name := range p.embedded() {
				sc, _, err := scenario.Load(p.Embedded, name+".toml", registry, p.Defaults(), scenario.Overrides{})
				if err != nil {
					return failed(err)
				}
				head, err := scenarios.ReadHead(p.Embedded, name+".toml")
				if err != nil {
					return failed(err)
				}
				lines = append(lines, scenarioLine{name, sc.Title, head.Group, sc.Question, head.LookAt, head.Cost})
			}
			slices.SortStableFunc(lines, func(a, b scenarioLine) int {
				return slices.Index(scenarios.Groups, a.Group) - slices.Index(scenarios.Groups, b.Group)
			})
			if s.json {
				return printJSON(p.Out, lines)
			}
			for i, l := range lines {
				if i > 0 && l.Group != lines[i-1].Group {
					fmt.Fprintln(p.Out)
				}
				if i == 0 || l.Group != lines[i-1].Group {
					fmt.Fprintln(p.Out, l.Group)
				}
				field(p.Out, 2, 22, l.Name, l.Question)
				for _, more := range [2][2]string{{"look at: ", l.LookAt}, {"cost: ", l.Cost}} {
					if more[1] != "" && !s.quiet {
						field(p.Out, 2, 22, "", more[0]+more[1])
					}
				}
			}
			return nil
		},
	}
}

// completeScenario completes the names of embedded scenarios, and files.
func (p *Program) completeScenario(_ *cobra.Command, args []string, begun string) ([]string, cobra.ShellCompDirective) {
	if len(args) > 0 {
		return nil, cobra.ShellCompDirectiveNoFileComp
	}
	var out []string
	for _, name := range p.embedded() {
		if strings.HasPrefix(name, begun) {
			out = append(out, name)
		}
	}
	return out, cobra.ShellCompDirectiveDefault
}
