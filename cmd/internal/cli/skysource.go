package cli

import (
	"context"
	"embed"
	"fmt"
	"os"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/sim/law"
	"wane/sim/scenario"
)

// alone holds the scenario of a law that has none: default laws beside it.
//
//go:embed alone.toml
var alone embed.FS

// skyOf loads what a sky is asked of: a scenario, or a law in the place of its
// process's default; nothing for the defaults alone. It tells whether it is a
// law without a scenario.
func (p *Program) skyOf(ctx context.Context, s *settings, which string, o scenario.Overrides, trust bool) (l *loaded, isLaw bool, err error) {
	registry, err := p.Builtin()
	if err != nil {
		return nil, false, failed(err)
	}
	load := func() (*loaded, bool, error) {
		l, err := p.load(ctx, s, which, o, trust)
		return l, false, err
	}
	laws, ids := skyLaws(registry)
	process, name, slash := strings.Cut(which, "/")
	switch {
	case which == "":
	case contains(p.embedded(), which) || strings.HasSuffix(which, ".toml"):
		return load()
	case contains(laws, which):
		process, name = expansion, which
	case contains(ids, which):
	case isLawPath(registry, which):
		if process, name = expansion, which; !scenario.IsPath(name) {
			name = "./" + name
		}
	case slash && isProcess(process):
		return nil, false, notOfSky(registry, which, ids)
	default:
		if _, err := os.Stat(which); err == nil {
			return load()
		}
		return nil, false, p.unknownSky(which, laws, ids)
	}
	if which != "" {
		o.Laws = append([]string{process + "=" + name}, o.Laws...)
	}
	l, err = p.loadFrom(ctx, s, alone, "alone.toml", o, trust)
	return l, true, err
}

const expansion = "expansion"

// skyLaws lists the names of the laws of expansion, and process/name of all
// laws that make a sky.
func skyLaws(registry *law.Registry) (laws, ids []string) {
	for _, l := range registry.All() {
		c := l.Describe()
		if c.Process == expansion {
			laws = append(laws, c.Name)
		}
		if ofSky(c.Process) {
			ids = append(ids, c.Process+"/"+c.Name)
		}
	}
	return laws, ids
}

// ofSky tells whether the sky hangs on a process.
func ofSky(process string) bool {
	p, _ := law.ProcessNamed(process)
	return p.Role == law.Sky || p.Role == law.Ending
}

func isProcess(name string) bool {
	_, ok := law.ProcessNamed(name)
	return ok
}

// notOfSky is the fault of a law that makes no sky, or that nobody knows.
func notOfSky(registry *law.Registry, which string, ids []string) error {
	process, name, _ := strings.Cut(which, "/")
	if _, known := registry.Find(process, name); known {
		return fmt.Errorf("sky: the sky does not hang on %s: want a law of expansion or of an ending, one of %s", which, strings.Join(ids, ", "))
	}
	return fmt.Errorf("sky: law %q is not known: want one of %s%s", which, strings.Join(ids, ", "), inquiry.Meant(which, ids))
}

func (p *Program) unknownSky(which string, laws, ids []string) error {
	known := p.embedded()
	return fmt.Errorf("sky: no scenario or law of expansion %q: want a .toml file, a scenario (%s) or a law (%s)%s", which,
		strings.Join(known, ", "), strings.Join(laws, ", "), inquiry.Meant(which, slices.Concat(known, laws, ids)))
}

// completeSky completes scenarios and laws of expansion.
func (p *Program) completeSky(c *cobra.Command, args []string, begun string) ([]string, cobra.ShellCompDirective) {
	out, directive := p.completeScenario(c, args, begun)
	registry, err := p.Builtin()
	if len(args) > 0 || err != nil {
		return out, directive
	}
	laws, ids := skyLaws(registry)
	for _, name := range slices.Concat(laws, ids) {
		if strings.HasPrefix(name, begun) {
			out = append(out, name)
		}
	}
	return out, directive
}
