package cli

import (
	"fmt"
	"strings"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/sim/law"
)

func (p *Program) laws(s *settings) *cobra.Command {
	return &cobra.Command{
		Use:   "laws [process[/name] | path]",
		Short: "List the laws, or print one law's card",
		Long: "List every process with its laws; the one marked * is the default of a scenario that names none.\n" +
			"With a process, list its laws alone. With process/name, print the law's card in full: its formula,\n" +
			"parameters with ranges, presets and citations, what it speaks for, assumptions and sources. So it does\n" +
			"with the path of a law outside the program, a folder with a law.toml or an executable file.",
		Example:           "  wane laws\n  wane laws evaporation\n  wane laws evaporation/page\n  wane laws ./my-burden",
		Args:              cobra.MaximumNArgs(1),
		ValidArgsFunction: p.completeLaws,
		RunE: func(c *cobra.Command, args []string) error {
			registry, err := p.Builtin()
			if err != nil {
				return failed(err)
			}
			which := ""
			if len(args) == 1 {
				which = args[0]
			}
			if isLawPath(registry, which) {
				o, err := p.openTyped(c.Context(), s, registry, which)
				if err != nil {
					return err
				}
				defer o.Close()
				return p.oneLaw(s, o.card(), o)
			}
			if strings.Contains(which, "/") {
				l, err := inquiry.Find(registry, which)
				if err != nil {
					return err
				}
				return p.oneLaw(s, l.Describe(), nil)
			}
			return p.listLaws(s, registry, which)
		},
	}
}

// lawLine is a law in a list.
type lawLine struct {
	Process string `json:"process"`
	Name    string `json:"name"`
	Version string `json:"version"`
	Default bool   `json:"default"`
	Summary string `json:"summary"`
}

func (p *Program) listLaws(s *settings, registry *law.Registry, process string) error {
	defaults := p.Defaults()
	lines := []lawLine{}
	for _, l := range registry.All() {
		c := l.Describe()
		if process == "" || c.Process == process {
			lines = append(lines, lawLine{c.Process, c.Name, c.Version, defaults[c.Process] == c.Name, c.Summary})
		}
	}
	lines = withNone(lines)
	if len(lines) == 0 {
		var names []string
		for _, known := range law.Processes {
			if known.Name == process {
				return bad(fmt.Errorf("process %s has no law yet", process))
			}
			names = append(names, known.Name)
		}
		return fmt.Errorf("process %q is not known%s", process, inquiry.Meant(process, names))
	}
	if s.json {
		return printJSON(p.Out, lines)
	}
	last := ""
	for _, l := range lines {
		if l.Process != last {
			known, _ := law.ProcessNamed(l.Process)
			fmt.Fprintf(p.Out, "%s: %s\n", l.Process, known.Doc)
			last = l.Process
		}
		star := " "
		if l.Default {
			star = "*"
		}
		field(p.Out, 2, 26, star+" "+l.Name, l.Summary)
	}
	return nil
}

// withNone adds to each process that a run may do without, after its last law,
// that it may be given none. A law of that name tells itself.
func withNone(lines []lawLine) []lawLine {
	var out []lawLine
	named := false
	for i, l := range lines {
		out = append(out, l)
		named = named || l.Name == "none"
		if i+1 < len(lines) && lines[i+1].Process == l.Process {
			continue
		}
		if known, _ := law.ProcessNamed(l.Process); known.Optional && !named {
			out = append(out, lawLine{Process: l.Process, Name: "none", Summary: "no law: the run does without"})
		}
		named = false
	}
	return out
}

func (p *Program) oneLaw(s *settings, c law.Card, outside *Outside) error {
	isDefault := outside == nil && p.Defaults()[c.Process] == c.Name
	if s.json {
		j := cardOf(c, isDefault)
		j.Outside = outsideOf(outside)
		return printJSON(p.Out, j)
	}
	printCard(p.Out, c, isDefault)
	return nil
}
