package cli

import (
	"github.com/spf13/cobra"

	"wane/cmd/internal/report"
)

func (p *Program) schema(*settings) *cobra.Command {
	return &cobra.Command{
		Use:   "schema",
		Short: "Print the JSON Schema of a run's JSON",
		Long: "Print the JSON Schema (draft 2020-12) of what 'wane run --json' prints and 'wane run --out' writes to\n" +
			"summary.json. The field \"schema\" of a document names the version of its form.",
		Example: "  wane schema\n  wane schema > summary.schema.json",
		Args:    cobra.NoArgs,
		RunE: func(*cobra.Command, []string) error {
			_, err := p.Out.Write(report.Schema)
			return err
		},
	}
}
