package cli

import (
	"errors"
	"fmt"
	"math"
	"strings"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/sim/law"
	"wane/sim/rpc"
)

func (p *Program) ask(s *settings) *cobra.Command {
	question := ""
	c := &cobra.Command{
		Use:   "ask law key=value...",
		Short: "Ask one law one thing",
		Long: `Ask one law about one object, outside any galaxy. The law is process/name, or the path of a law
outside the program: a folder with a law.toml, or an executable file.

A key is a parameter of the law, an input of one of its questions, or one of its answers; where a name
is both, it is the parameter. With an answer given, the one input left open is found, where only one
value of it leads there: an age from a temperature, a mass from a lifetime.

Quantities need their units (Msun, kg, yr, Gyr, s, K, eV, km/s, pc, ...); pure numbers take none. Inputs
with a sensible default are filled in, and the answer says so. Times are read and printed far beyond
10^308 yr; in JSON they are logarithms, unit log(yr). The keys of a law stand on its card, 'wane laws
process/name', without the log10_ of their names.`,
		Example: "  wane ask evaporation/page mass=10Msun\n" +
			"  wane ask evaporation/page lifetime=1e70yr\n" +
			"  wane ask white-dwarf-cooling/mestel-debye mass=0.6Msun age=1Gyr\n" +
			"  wane ask white-dwarf-cooling/mestel-debye mass=0.6Msun temperature=798K\n" +
			"  wane ask nucleon-decay/grand-unified mass=0.6Msun lifetime=1e36yr\n" +
			"  wane ask evaporation/page mass=10Msun --question heat\n" +
			"  wane ask ./my-burden mass=10Msun",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) == 0 {
				return fmt.Errorf("ask: which law? want process/name, such as evaporation/page")
			}
			return nil
		},
		ValidArgsFunction: p.completeAsk,
		RunE: func(c *cobra.Command, args []string) error {
			registry, err := p.Builtin()
			if err != nil {
				return failed(err)
			}
			id, outside := args[0], (*Outside)(nil)
			if isLawPath(registry, id) {
				if outside, err = p.openTyped(c.Context(), s, registry, id); err != nil {
					return err
				}
				defer outside.Close()
				id = outside.id()
			}
			answer, err := inquiry.Ask(inquiry.Inquiry{
				Registry: registry, Defaults: p.Defaults(), ID: id, Question: question, Given: args[1:],
			})
			if ofTheLaw(err) {
				return failed(err)
			}
			if err != nil {
				return err
			}
			if s.json {
				return printJSON(p.Out, answerOf(answer, outside))
			}
			p.printAnswer(s, answer)
			return nil
		},
	}
	c.Flags().StringVar(&question, "question", "", "ask this `question` of the card only (default: all that can be answered)")
	return c
}

// ofTheLaw tells whether an error is the law's own, and not the asker's.
func ofTheLaw(err error) bool {
	var wrong *law.Fault
	var cannot *rpc.AnswerError
	var stopped *rpc.StoppedError
	return errors.As(err, &wrong) || errors.As(err, &cannot) || errors.As(err, &stopped)
}

type answerJSON struct {
	Law       string               `json:"law"`
	Outside   *outsideJSON         `json:"outside,omitempty"`
	Questions []string             `json:"questions"`
	Inputs    map[string]valueJSON `json:"inputs"`
	Outputs   map[string]valueJSON `json:"outputs"`
	Formula   string               `json:"formula"`
	Notes     []string             `json:"notes"`
	Sources   []string             `json:"sources"`
}

type valueJSON struct {
	Value any    `json:"value"` // a number, a word, or null: then Why says why
	Unit  string `json:"unit"`
	Why   string `json:"why,omitempty"`
}

func answerOf(a *inquiry.Answer, outside *Outside) answerJSON {
	out := answerJSON{
		Law: a.Law, Outside: outsideOf(outside), Questions: a.Questions, Inputs: map[string]valueJSON{}, Outputs: map[string]valueJSON{},
		Formula: a.Card.Formula, Notes: append([]string{}, a.Notes...), Sources: append([]string{}, a.Card.Sources...),
	}
	for _, v := range a.Inputs {
		out.Inputs[v.Name] = valueOf(v)
	}
	for _, v := range a.Outputs {
		out.Outputs[v.Name] = valueOf(v)
	}
	return out
}

func valueOf(v inquiry.Value) valueJSON {
	j := valueJSON{Unit: inquiry.Symbol(v), Why: v.Why}
	switch {
	case v.Word != "":
		j.Value = v.Word
	case math.IsNaN(v.Number) || math.IsInf(v.Number, 0):
		j.Value = nil
		if j.Why == "" {
			j.Why = strings.TrimSpace(inquiry.Format(v))
		}
	default:
		j.Value = v.Number
	}
	return j
}

func (p *Program) printAnswer(s *settings, a *inquiry.Answer) {
	const column = 22
	if !s.quiet {
		field(p.Out, 0, 0, a.Law+":", a.Card.Summary)
		for _, v := range a.Inputs {
			text := inquiry.Format(v)
			if v.Why != "" {
				text += " (" + v.Why + ")"
			}
			field(p.Out, 2, column, v.Name, text)
		}
		fmt.Fprintln(p.Out)
	}
	for _, v := range a.Outputs {
		field(p.Out, 2, column, v.Name, inquiry.Format(v))
	}
	if s.quiet {
		return
	}
	fmt.Fprintln(p.Out)
	for _, n := range a.Notes {
		field(p.Out, 0, 10, "note", n)
	}
	field(p.Out, 0, 10, "formula", a.Card.Formula)
	for _, source := range a.Card.Sources {
		field(p.Out, 0, 10, "source", source)
	}
}
