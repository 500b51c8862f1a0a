package cli

import (
	"fmt"
	"math"
	"strings"
	"unicode/utf8"

	"wane/cmd/internal/report"
	"wane/cmd/internal/verify"
)

func (p *Program) listDates(s *settings, dates []verify.Date) error {
	if s.json {
		lines := []dateJSON{}
		for _, d := range dates {
			lines = append(lines, dateOf(d))
		}
		return printJSON(p.Out, lines)
	}
	topic := ""
	for _, d := range dates {
		if d.Topic != topic {
			topic = d.Topic
			fmt.Fprintln(p.Out, topicName(topic))
		}
		field(p.Out, 2, 26, d.Name, d.What)
		if !s.quiet {
			field(p.Out, 2, 26, "", d.Printed+": "+d.Source)
		}
	}
	return nil
}

// verdictWords are what a verdict is called in the table.
var verdictWords = map[string]string{
	verify.Agrees: "agrees", verify.Within: "within its spread", verify.Differs: "differs", "": "no date",
}

// printVerified prints the table: a line a date, and below it what it is,
// where it is printed, how ours comes about and why it differs.
func (p *Program) printVerified(s *settings, results []verify.Result) {
	style := styleFor(p.Out)
	if !s.quiet {
		p.paragraph("Dates of the literature beside ours, each worked out under the assumptions of its source. printed: as the " +
			"source has it; dex: decades by which ours is later, for dates of 10^(10^x) yr the difference in x.")
		fmt.Fprintln(p.Out)
	}
	topic := ""
	for _, r := range results {
		if r.Date.Topic != topic {
			if topic != "" {
				fmt.Fprintln(p.Out)
			}
			topic = r.Date.Topic
			fmt.Fprintln(p.Out, style.Heading(cells(topic, "printed", "in yr", "ours in yr", "dex", "verdict")))
		}
		p.printDate(s, r)
	}
	if !s.quiet {
		fmt.Fprintln(p.Out)
		p.paragraph(closing(results))
	}
}

func (p *Program) paragraph(text string) {
	for _, line := range report.Wrap(text, report.Width) {
		fmt.Fprintln(p.Out, line)
	}
}

func (p *Program) printDate(s *settings, r verify.Result) {
	d, ours, difference := r.Date, "unknown", ""
	if r.Verdict != "" {
		ours, difference = report.Date(r.Ours, 0), decades(r.Difference)
	}
	fmt.Fprintln(p.Out, cells(d.Name, d.Printed, report.Date(d.LogPrinted(), 0), ours, difference, verdictWords[r.Verdict]))
	if !r.AsRecorded {
		field(p.Out, 4, 9, "NOT AS RECORDED:", r.Stray)
	}
	if s.quiet {
		return
	}
	what := d.What
	if d.Clock == "now" {
		what += "; from now"
	}
	field(p.Out, 4, 9, "what", what)
	from := d.Source + ", " + d.Locator
	if len(d.Span) == 2 {
		from += "; its spread: " + d.Span[0] + " to " + d.Span[1]
	}
	if d.Kind != "published" {
		from += " (" + strings.ReplaceAll(d.Kind, "-", " ") + ")"
	}
	field(p.Out, 4, 9, "from", from)
	field(p.Out, 4, 9, "ours", d.By())
	if d.Reason != "" {
		field(p.Out, 4, 9, "why", d.Reason)
	}
}

// decades are as exact as anybody knows them.
func decades(difference float64) string {
	switch size := math.Abs(difference); {
	case math.IsInf(size, 0):
		return "" // never
	case size >= 100:
		return fmt.Sprintf("%+.0f", difference)
	case size >= 10:
		return fmt.Sprintf("%+.1f", difference)
	}
	return fmt.Sprintf("%+.3f", difference)
}

// cells are the six columns of the table.
func cells(texts ...string) string {
	line, at := "", 0
	for i, width := range []int{26, 14, 15, 17, 10, 0} {
		line += texts[i]
		at += width
		if i < len(texts)-1 {
			line += strings.Repeat(" ", max(1, at-utf8.RuneCountInString(line)))
		}
	}
	return strings.TrimRight(line, " ")
}

func closing(results []verify.Result) string {
	count, stray := map[string]int{}, 0
	for _, r := range results {
		count[r.Verdict]++
		if !r.AsRecorded {
			stray++
		}
	}
	text := fmt.Sprintf("%s: %d within the digits of the source, %d within its spread, %d different",
		several(len(results), "date"), count[verify.Agrees], count[verify.Within], count[verify.Differs])
	if stray == 0 {
		return text + "; as recorded."
	}
	return text + fmt.Sprintf("; %d not as recorded.", stray)
}
