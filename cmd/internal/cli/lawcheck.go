package cli

import (
	"context"
	"errors"
	"fmt"
	"os"

	"github.com/spf13/cobra"

	"wane/sim/law"
	"wane/sim/rpc/conform"
)

func (p *Program) lawCheck(s *settings) *cobra.Command {
	return &cobra.Command{
		Use:   "check path",
		Short: "Check that a law of your own is fit to be used in a run",
		Long: "Start the law at a path, a folder with a law.toml or an executable file, and check that it is fit to be\n" +
			"used in a run: its card, its answers in every corner, that a row's answer depends on that row alone,\n" +
			"that it gives the same bits again and in a new process, how fast it is, and how it ends. Built-in laws\n" +
			"are held to the same. Each check is one line: pass, warn (somebody should look) or fail; and what to do\n" +
			"about it. The exit code is 0 only if nothing fails, else 3.",
		Example: "  wane law check ./my-burden\n  wane law check ./my-burden --json",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) != 1 {
				return fmt.Errorf("law check: want one path, not %d", len(args))
			}
			return nil
		},
		RunE: func(c *cobra.Command, args []string) error { return p.checkLaw(c.Context(), s, args[0]) },
	}
}

// checkedJSON is a judgement for programs.
type checkedJSON struct {
	Path     string            `json:"path"`
	Law      string            `json:"law"`
	Version  string            `json:"version"`
	Digest   string            `json:"digest"`
	Runtime  string            `json:"runtime"`
	Fit      bool              `json:"fit"`
	Findings []conform.Finding `json:"findings"`
}

func (p *Program) checkLaw(ctx context.Context, s *settings, path string) error {
	if _, err := os.Stat(path); err != nil {
		return bad(fmt.Errorf("law check: %s: no such file or folder: want the folder of a law (wane law new makes one) or an executable file", path))
	}
	among, err := p.defaultLaws()
	if err != nil {
		return failed(err)
	}
	outside := &conform.Outside{Path: path, Log: p.lawLog(s, false)}
	subject := outside.Subject()
	subject.Among = among
	if !s.quiet && isTerminal(p.Err) {
		subject.Begins = func(check string) { fmt.Fprintf(p.Err, "\r\033[Kchecking %s ...", check) }
		defer fmt.Fprint(p.Err, "\r\033[K")
	}
	findings, err := conform.Judge(ctx, subject)
	if err != nil {
		return &fault{ExitInterrupted, errors.New("interrupted")}
	}
	told := checkedJSON{Path: path, Fit: conform.Fit(findings), Findings: findings}
	if o := outside.Opened; o != nil {
		card := o.Law.Describe()
		told.Law, told.Version, told.Digest, told.Runtime = card.Process+"/"+card.Name, card.Version, o.Digest, o.Law.Runtime()
	}
	if s.json {
		err = printJSON(p.Out, told)
	} else {
		p.printChecked(s, told)
	}
	if err == nil && !told.Fit {
		err = &fault{code: ExitCheckFails}
	}
	return err
}

// defaultLaws are the built-in laws that run where a scenario names no others.
func (p *Program) defaultLaws() ([]law.Law, error) {
	registry, err := p.Builtin()
	if err != nil {
		return nil, err
	}
	var out []law.Law
	for _, process := range law.Processes {
		if l, ok := registry.Find(process.Name, p.Defaults()[process.Name]); ok {
			out = append(out, l)
		}
	}
	return out, nil
}

func (p *Program) printChecked(s *settings, told checkedJSON) {
	const column = 18
	if told.Law != "" && !s.quiet {
		fmt.Fprintf(p.Out, "%s, version %s, from %s\n%s\n%s\n\n", told.Law, told.Version, told.Path, told.Digest, told.Runtime)
	}
	count := map[conform.Level]int{}
	alike := map[[2]string]int{} // by check and question
	for _, f := range told.Findings {
		count[f.Level]++
		alike[[2]string{f.Check, f.Question}]++
	}
	shown := map[[2]string]bool{}
	for _, f := range told.Findings {
		which := [2]string{f.Check, f.Question}
		if f.Level == conform.Pass && s.quiet || f.Check != "card" && shown[which] {
			continue
		}
		shown[which] = true
		text := f.Text
		if f.Question != "" {
			text = "question " + f.Question + ": " + text
		}
		field(p.Out, 0, column, fmt.Sprintf("%-4s  %s", f.Level, f.Check), text)
		if more := alike[which] - 1; more > 0 && f.Check != "card" {
			field(p.Out, 0, column, "", fmt.Sprintf("And %d more of this; --json lists them.", more))
		}
		if f.Advice != "" {
			field(p.Out, 0, column, "", "What to do: "+f.Advice+".")
		}
	}
	if s.quiet {
		return
	}
	verdict := "fit to be used in a run"
	if !told.Fit {
		verdict = "not fit to be used in a run"
	}
	fmt.Fprintf(p.Out, "\n%s: %s, %s\n", verdict, several(count[conform.Fail], "failure"), several(count[conform.Warn], "warning"))
}

// several is a number of things in words.
func several(n int, what string) string {
	switch n {
	case 0:
		return "no " + what
	case 1:
		return "1 " + what
	}
	return fmt.Sprintf("%d %ss", n, what)
}
