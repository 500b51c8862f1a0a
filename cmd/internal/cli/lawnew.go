package cli

import (
	"errors"
	"fmt"
	"sort"
	"strings"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/cmd/internal/newlaw"
	"wane/sim/law"
)

func (p *Program) lawNew(s *settings) *cobra.Command {
	language := ""
	c := &cobra.Command{
		Use:   "new process/name --lang python|go",
		Short: "Make the folder of a new law, which runs as it is",
		Long: "Make a folder ./name for a new law of a process. In it are one file with the law's card and a function for\n" +
			"each question, a simple law to begin with; a test; a page on how to go on; a law.toml that says how the\n" +
			"law is started; and all it needs of Wane. 'wane laws' lists the processes.",
		Example: "  wane law new evaporation/my-burden --lang python\n  wane law new iron/my-pace --lang go",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) != 1 {
				return fmt.Errorf("law new: want one process/name, such as evaporation/my-burden, not %d", len(args))
			}
			return nil
		},
		ValidArgsFunction: completeProcess,
		RunE:              func(_ *cobra.Command, args []string) error { return p.newLaw(s, args[0], language) },
	}
	c.Flags().StringVar(&language, "lang", "", "the `language`: "+strings.Join(newlaw.Languages(), " or "))
	_ = c.RegisterFlagCompletionFunc("lang", func(*cobra.Command, []string, string) ([]string, cobra.ShellCompDirective) {
		return newlaw.Languages(), cobra.ShellCompDirectiveNoFileComp
	}) // it fails only for a flag that is not there
	return c
}

// madeJSON is a new law's folder for programs.
type madeJSON struct {
	Law    string   `json:"law"`
	Folder string   `json:"folder"`
	Files  []string `json:"files"`
}

func (p *Program) newLaw(s *settings, id, language string) error {
	process, name, ok := strings.Cut(id, "/")
	if !ok {
		return fmt.Errorf("law new: %q: want process/name, such as evaporation/my-burden", id)
	}
	if language == "" {
		return fmt.Errorf("law new: in which language? want --lang %s", strings.Join(newlaw.Languages(), " or --lang "))
	}
	files, err := newlaw.Files(process, name, language)
	var unknown *newlaw.UnknownProcess
	if errors.As(err, &unknown) {
		return bad(fmt.Errorf("law new: %w%s; 'wane laws' lists them", err, inquiry.Meant(process, processNames())))
	}
	if err != nil {
		return bad(fmt.Errorf("law new: %w", err))
	}
	if err := newlaw.Write(name, files); err != nil {
		return bad(fmt.Errorf("law new: %w", err))
	}
	made := madeJSON{Law: id, Folder: "./" + name, Files: []string{}}
	for file := range files {
		made.Files = append(made.Files, file)
	}
	sort.Strings(made.Files)
	if s.json {
		return printJSON(p.Out, made)
	}
	if s.quiet {
		return nil
	}
	main := map[string]string{"python": "law.py", "go": "law.go"}[language]
	fmt.Fprintf(p.Out, "%s is a law of %s. It runs as it is: change %s/%s to make it yours.\n", made.Folder, process, made.Folder, main)
	fmt.Fprintf(p.Out, "  wane law check %s\n  wane run lantern-reach --law %s=%s\n", made.Folder, process, made.Folder)
	return nil
}

func processNames() []string {
	var out []string
	for _, p := range law.Processes {
		out = append(out, p.Name)
	}
	return out
}

// completeProcess completes the process of process/name.
func completeProcess(_ *cobra.Command, args []string, begun string) ([]string, cobra.ShellCompDirective) {
	var out []string
	for _, p := range law.Processes {
		if len(args) == 0 && strings.HasPrefix(p.Name+"/", begun) {
			out = append(out, p.Name+"/\t"+p.Doc)
		}
	}
	return out, cobra.ShellCompDirectiveNoFileComp | cobra.ShellCompDirectiveNoSpace
}
