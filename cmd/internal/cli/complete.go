package cli

import (
	"strings"

	"github.com/spf13/cobra"

	"wane/sim/law"
)

// completeLaws completes process/name, or the path of a law outside the program.
func (p *Program) completeLaws(_ *cobra.Command, args []string, begun string) ([]string, cobra.ShellCompDirective) {
	if len(args) > 0 {
		return nil, cobra.ShellCompDirectiveNoFileComp
	}
	if strings.HasPrefix(begun, ".") || strings.HasPrefix(begun, "/") {
		return nil, cobra.ShellCompDirectiveDefault
	}
	registry, err := p.Builtin()
	if err != nil {
		return nil, cobra.ShellCompDirectiveError
	}
	var out []string
	for _, l := range registry.All() {
		c := l.Describe()
		if id := c.Process + "/" + c.Name; strings.HasPrefix(id, begun) {
			out = append(out, id+"\t"+c.Summary)
		}
	}
	return out, cobra.ShellCompDirectiveNoFileComp
}

// completeAsk completes the law, then the names of its parameters and inputs.
func (p *Program) completeAsk(c *cobra.Command, args []string, begun string) ([]string, cobra.ShellCompDirective) {
	if len(args) == 0 {
		return p.completeLaws(c, args, begun)
	}
	quiet := cobra.ShellCompDirectiveNoFileComp | cobra.ShellCompDirectiveNoSpace
	registry, err := p.Builtin()
	if err != nil {
		return nil, cobra.ShellCompDirectiveError
	}
	process, name, _ := strings.Cut(args[0], "/")
	l, ok := registry.Find(process, name)
	if !ok {
		return nil, quiet
	}
	var out []string
	seen := map[string]bool{}
	add := func(name, doc string) {
		key := strings.TrimPrefix(name, "log10_") + "="
		if strings.HasPrefix(key, begun) && !seen[key] {
			seen[key] = true
			out = append(out, key+"\t"+doc)
		}
	}
	card := l.Describe()
	for _, x := range card.Parameters {
		add(x.Name, x.Doc)
	}
	for _, q := range card.Questions {
		for _, in := range q.Inputs {
			info, _ := law.ColumnNamed(q.Name, in)
			add(in, info.Doc)
		}
	}
	return out, quiet
}
