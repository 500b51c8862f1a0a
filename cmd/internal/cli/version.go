package cli

import (
	"fmt"
	"runtime"
	"runtime/debug"

	"github.com/spf13/cobra"
)

// Version of the program.
const Version = "0.1.0"

// build is what is known about this very program.
type build struct {
	Version      string `json:"version"`
	Revision     string `json:"revision,omitempty"`
	Modified     bool   `json:"modified,omitempty"`
	Go           string `json:"go"`
	OS           string `json:"os"`
	Architecture string `json:"architecture"`
}

func thisBuild() build {
	b := build{Version: Version, Go: runtime.Version(), OS: runtime.GOOS, Architecture: runtime.GOARCH}
	info, ok := debug.ReadBuildInfo()
	if !ok {
		return b
	}
	for _, s := range info.Settings {
		switch s.Key {
		case "vcs.revision":
			b.Revision = s.Value
		case "vcs.modified":
			b.Modified = s.Value == "true"
		}
	}
	return b
}

func (p *Program) version(s *settings) *cobra.Command {
	return &cobra.Command{
		Use:     "version",
		Short:   "Print the version of the program",
		Example: "  wane version\n  wane version --json",
		Args:    cobra.NoArgs,
		RunE: func(*cobra.Command, []string) error {
			b := thisBuild()
			switch {
			case s.json:
				return printJSON(p.Out, b)
			case s.quiet:
				fmt.Fprintln(p.Out, b.Version)
				return nil
			}
			line := "wane " + b.Version
			if b.Revision != "" {
				line += " (" + b.Revision[:min(12, len(b.Revision))]
				if b.Modified {
					line += ", modified"
				}
				line += ")"
			}
			fmt.Fprintf(p.Out, "%s, %s, %s/%s\n", line, b.Go, b.OS, b.Architecture)
			return nil
		},
	}
}
