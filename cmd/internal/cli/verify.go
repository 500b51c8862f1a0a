package cli

import (
	"context"
	"errors"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"wane/cmd/internal/inquiry"
	"wane/cmd/internal/verify"
	"wane/sim/ensemble"
	"wane/sim/scenario"
)

func (p *Program) verify(s *settings) *cobra.Command {
	list := false
	c := &cobra.Command{
		Use:   "verify [name...]",
		Short: "Hold the laws against the dates that the literature prints",
		Long: `Work out again the dates of the far future that the literature prints, each under the assumptions of its
source: one question to one law, or a small galaxy or sky of its own. For each date: what is printed,
what comes out, the difference in decades (dex), and a verdict. A date agrees within what the digits of
its source say; or it lies within the source's own spread; or it differs, and the table says why.

Which it is has been recorded for every date. The exit code is 0 if all are as recorded, else 3. A name
is that of a date or of a topic, with - for blanks; without names, all are worked out.`,
		Example:           "  wane verify\n  wane verify --list\n  wane verify earth-spirals-in\n  wane verify black-holes --json",
		ValidArgsFunction: p.completeVerify,
		RunE: func(c *cobra.Command, names []string) error {
			dates, err := p.Dates()
			if err != nil {
				return failed(err)
			}
			if dates, err = chosen(dates, names); err != nil {
				return err
			}
			if list {
				return p.listDates(s, dates)
			}
			return p.verifyDates(c.Context(), s, dates)
		},
	}
	c.Flags().BoolVar(&list, "list", false, "list the dates and their sources, and work nothing out")
	return c
}

// topicName is a topic as it is typed.
func topicName(topic string) string { return strings.ReplaceAll(topic, " ", "-") }

// chosen keeps the dates of the given names, in their own order.
func chosen(dates []verify.Date, names []string) ([]verify.Date, error) {
	if len(names) == 0 {
		return dates, nil
	}
	var known []string
	for _, d := range dates {
		known = append(known, d.Name)
		if t := topicName(d.Topic); !slices.Contains(known, t) {
			known = append(known, t)
		}
	}
	var faults []error
	for _, name := range names {
		if !slices.Contains(known, name) {
			faults = append(faults, fmt.Errorf("verify: no date or topic %q%s; 'wane verify --list' lists them", name, inquiry.Meant(name, known)))
		}
	}
	out := slices.DeleteFunc(slices.Clone(dates), func(d verify.Date) bool {
		return !slices.Contains(names, d.Name) && !slices.Contains(names, topicName(d.Topic))
	})
	return out, errors.Join(faults...)
}

func (p *Program) verifyDates(ctx context.Context, s *settings, dates []verify.Date) error {
	registry, err := p.Builtin()
	if err != nil {
		return failed(err)
	}
	m := &verify.Means{Registry: registry, Defaults: p.Defaults(),
		Run: func(ctx context.Context, sc *scenario.Scenario) (*ensemble.Summary, error) {
			return p.Run(ctx, sc, registry, 0, nil)
		}}
	bar := newBarOf("dates", p.Err, s.quiet)
	defer bar.close()
	var results []verify.Result
	for i, d := range dates {
		bar.set(i, len(dates))
		r, err := verify.Judge(ctx, d, m)
		if err != nil {
			return &fault{ExitInterrupted, fmt.Errorf("interrupted: %d of %d dates were worked out", i, len(dates))}
		}
		results = append(results, r)
	}
	bar.close()
	if s.json {
		err = printJSON(p.Out, verifiedOf(results))
	} else {
		p.printVerified(s, results)
	}
	if err != nil {
		return failed(err)
	}
	var strays []error
	for _, r := range results {
		if !r.AsRecorded {
			strays = append(strays, fmt.Errorf("verify: %s is not as recorded: %s", r.Date.Name, r.Stray))
		}
	}
	if len(strays) > 0 {
		return &fault{ExitCheckFails, errors.Join(strays...)}
	}
	return nil
}

// completeVerify completes the names of dates and topics.
func (p *Program) completeVerify(_ *cobra.Command, _ []string, begun string) ([]string, cobra.ShellCompDirective) {
	dates, err := p.Dates()
	if err != nil {
		return nil, cobra.ShellCompDirectiveError
	}
	var out []string
	topics := map[string]bool{}
	for _, d := range dates {
		if t := topicName(d.Topic); !topics[t] && strings.HasPrefix(t, begun) {
			topics[t] = true
			out = append(out, t+"\tall dates of "+d.Topic)
		}
		if strings.HasPrefix(d.Name, begun) {
			out = append(out, d.Name+"\t"+d.What)
		}
	}
	return out, cobra.ShellCompDirectiveNoFileComp
}
