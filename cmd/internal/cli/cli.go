// Package cli is the command line of Wane: one file per command.
//
// Everything that touches files, terminals, signals and the wall clock is
// here. What a command answers goes to standard output and is valid JSON with
// --json; warnings, progress and faults go to standard error.
package cli

import (
	"context"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"os/signal"
	"strings"
	"syscall"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/cmd/internal/report"
	"wane/cmd/internal/verify"
	"wane/sim/law"
)

// Program is what the commands work with. Its fields let a test put other
// laws or streams in their place.
type Program struct {
	Out, Err io.Writer
	Builtin  func() (*law.Registry, error)
	Defaults func() map[string]string // process to law
	Embedded fs.FS                    // scenarios that need no file
	Run      RunFunc
	Open     OpenFunc // of laws outside the program
	Dates    func() ([]verify.Date, error)
}

// Main runs the command line and returns the exit code. The first interrupt
// ends a run at the next finished realisation; the second one kills.
func (p *Program) Main(args []string) int {
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt, syscall.SIGTERM)
	defer stop()
	go func() {
		<-ctx.Done()
		stop()
	}()
	out := &output{Writer: p.Out}
	checked := *p
	checked.Out = out
	root := checked.root()
	root.SetArgs(args)
	root.SetOut(out)
	root.SetErr(p.Err)
	cmd, err := root.ExecuteContextC(ctx)
	if out.err != nil {
		err = failed(out.err) // what could not be written was not answered
	}
	if err == nil {
		return ExitOK
	}
	var failure *fault
	if !errors.As(err, &failure) {
		failure = &fault{code: ExitBadInput, err: err}
		if !strings.Contains(err.Error(), "\n") {
			defer fmt.Fprintf(p.Err, "see: %s --help\n", cmd.CommandPath())
		}
	}
	if failure.err != nil {
		fmt.Fprintln(p.Err, "wane: "+strings.ReplaceAll(failure.Error(), "\n", "\nwane: "))
	}
	return failure.code
}

// settings are the flags that every command has.
type settings struct {
	json, quiet bool
}

func (p *Program) root() *cobra.Command {
	s := &settings{}
	root := &cobra.Command{
		Use:   "wane",
		Short: "When the stars, dead suns and black holes of a galaxy fade, and what takes them",
		Long: "Wane works out when each population of a galaxy fades in the far future: its stars, brown and white\n" +
			"dwarfs, neutron stars and black holes. It plays many random histories under exchangeable laws and\n" +
			"reports when half, all but a hundredth, and the last of each are gone, with error bars and the culprit.",
		Example: "  wane run lantern-reach\n" +
			"  wane run lantern-reach --law nucleon-decay=stable --out stable\n" +
			"  wane laws evaporation/page\n" +
			"  wane ask evaporation/page mass=10Msun",
		SilenceErrors:     true,
		SilenceUsage:      true,
		Args:              unknownCommand,
		RunE:              func(c *cobra.Command, _ []string) error { return c.Help() },
		DisableAutoGenTag: true,
	}
	root.PersistentFlags().BoolVar(&s.json, "json", false, "print JSON instead of text")
	root.PersistentFlags().BoolVarP(&s.quiet, "quiet", "q", false, "print the answer only: no progress, no warnings, no remarks")
	root.SetHelpTemplate(root.HelpTemplate() + exitCodes)
	root.AddCommand(p.run(s), p.check(s), p.scenarios(s), p.laws(s), p.ask(s), p.sky(s), p.law(s), p.verify(s), p.schema(s), p.version(s))
	for _, c := range append(root.Commands(), root) {
		c.Long = wrapped(c.Long)
	}
	return root
}

// wrapped fits paragraphs to the width of answers.
func wrapped(text string) string {
	paragraphs := strings.Split(text, "\n\n")
	for i, p := range paragraphs {
		paragraphs[i] = strings.Join(report.Wrap(p, report.Width), "\n")
	}
	return strings.Join(paragraphs, "\n\n")
}

// unknownCommand is the fault of a first word that is no command.
func unknownCommand(root *cobra.Command, args []string) error {
	if len(args) == 0 {
		return nil
	}
	var names []string
	for _, c := range root.Commands() {
		if c.IsAvailableCommand() {
			names = append(names, c.Name())
		}
	}
	return fmt.Errorf("unknown command %q%s", args[0], inquiry.Meant(args[0], names))
}
