package cli

import (
	"bufio"
	"bytes"
	"io/fs"
	"strings"

	"github.com/spf13/cobra"

	"wane/sim/scenario"
)

// scenarioLine is an embedded scenario in a list.
type scenarioLine struct {
	Name     string `json:"name"`
	Title    string `json:"title"`
	Question string `json:"question"`
	Cost     string `json:"cost"`
}

func (p *Program) scenarios(s *settings) *cobra.Command {
	return &cobra.Command{
		Use:     "scenarios",
		Short:   "List the scenarios that are built in",
		Long:    "List the scenarios that are built in, the question each answers, and what it costs to run.",
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
				lines = append(lines, scenarioLine{name, sc.Title, sc.Question, cost(p.Embedded, name+".toml")})
			}
			if s.json {
				return printJSON(p.Out, lines)
			}
			for _, l := range lines {
				field(p.Out, 0, 18, l.Name, l.Question)
				if l.Cost != "" && !s.quiet {
					field(p.Out, 0, 18, "", "cost: "+l.Cost)
				}
			}
			return nil
		},
	}
}

// cost is the paragraph of a scenario's head comment that begins with "cost:".
func cost(fsys fs.FS, file string) string {
	data, err := fs.ReadFile(fsys, file)
	if err != nil {
		return ""
	}
	var found []string
	for lines := bufio.NewScanner(bytes.NewReader(data)); lines.Scan(); {
		text, comment := strings.CutPrefix(lines.Text(), "#")
		text = strings.TrimSpace(text)
		switch {
		case !comment:
			return strings.Join(found, " ")
		case len(text) >= 5 && strings.EqualFold(text[:5], "cost:"):
			found = []string{strings.TrimSpace(text[5:])}
		case len(found) > 0 && (text == "" || strings.Contains(text, ":") && !strings.Contains(strings.SplitN(text, ":", 2)[0], " ")):
			return strings.Join(found, " ")
		case len(found) > 0:
			found = append(found, text)
		}
	}
	return strings.Join(found, " ")
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
