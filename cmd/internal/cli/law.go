package cli

import (
	"fmt"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
)

// law is the group of commands for who writes a law.
func (p *Program) law(s *settings) *cobra.Command {
	c := &cobra.Command{
		Use:   "law",
		Short: "Begin a law of your own, and check it",
		Long: "Commands for a law of your own: a folder outside the program, in Python or Go, that any command takes by\n" +
			"its path in place of a built-in law.",
		Example: "  wane law new evaporation/my-burden --lang python\n" +
			"  wane law check ./my-burden\n" +
			"  wane ask ./my-burden mass=10Msun\n" +
			"  wane run lantern-reach --law evaporation=./my-burden",
		RunE: func(c *cobra.Command, args []string) error {
			if len(args) > 0 {
				return fmt.Errorf("unknown command %q for law%s", args[0], inquiry.Meant(args[0], []string{"new", "check"}))
			}
			return c.Help()
		},
	}
	c.AddCommand(p.lawNew(s), p.lawCheck(s))
	for _, sub := range c.Commands() {
		sub.Long = wrapped(sub.Long)
	}
	return c
}
