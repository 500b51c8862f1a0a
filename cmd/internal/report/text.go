package report

import (
	"fmt"
	"io"
	"math"
	"strings"
	"unicode/utf8"

	"wane/sim/ensemble"
)

// Width is the number of columns a text summary keeps within.
const Width = 100

// Style is how a text is dressed. The zero value is plain.
type Style struct {
	Bold bool // headings in bold, by terminal escapes
}

// Heading dresses a heading.
func (s Style) Heading(text string) string {
	if !s.Bold {
		return text
	}
	return "\x1b[1m" + text + "\x1b[0m"
}

// Text writes a summary for people.
func Text(w io.Writer, s *ensemble.Summary, style Style) error {
	p := &page{style: style}
	p.header(s)
	p.populations(s)
	p.closing(s)
	_, err := io.WriteString(w, p.String())
	return err
}

// page is a text under construction.
type page struct {
	strings.Builder
	style Style
}

func (p *page) line(text string) {
	p.WriteString(strings.TrimRight(text, " "))
	p.WriteByte('\n')
}

// entry writes a term and its text, wrapped beside it.
func (p *page) entry(term, text string) {
	const column = 14
	first := fmt.Sprintf("%-*s", column, term)
	for i, l := range Wrap(text, Width-column) {
		if i > 0 {
			first = strings.Repeat(" ", column)
		}
		p.line(first + l)
	}
}

func (p *page) header(s *ensemble.Summary) {
	title := "How the populations of this galaxy fade"
	if s.Scenario != "" {
		title = s.Scenario + ": how the populations of this galaxy fade"
	}
	p.line(p.style.Heading(title))
	p.line("")
	if s.Interrupted {
		p.entry("INTERRUPTED", fmt.Sprintf("%d of %d realisations were finished; all that follows is of these alone",
			s.Realisations, s.Requested))
	}
	p.entry("engine", s.Engine+", "+standing(s))
	p.entry("realisations", fmt.Sprintf("%d, seed %d", s.Realisations, s.Seed))
	if s.Realisations > 1 {
		p.entry("dates", "years since the Big Bang, medians over the realisations; ± is the Monte Carlo error of the "+
			"exponent, in brackets its 5-95 % range between realisations")
	} else {
		p.entry("dates", "years since the Big Bang; one realisation tells neither spread nor error")
	}
	p.entry("marks", "half, hundredth: from here on the count stays at or below this part of its peak; last: the last member goes")
	p.line("")
}

func standing(s *ensemble.Summary) string {
	one := s.Objects == 1
	switch {
	case s.Whole && one:
		return "whole: 1 object, which is itself"
	case s.Whole:
		return fmt.Sprintf("whole: %s objects, each is itself", grouped(s.Objects))
	case one:
		return "a sample: 1 object stands for " + Count(s.StandsFor, 3)
	}
	return fmt.Sprintf("a sample: %s objects stand for %s, each for %s",
		grouped(s.Objects), Count(s.StandsFor, 3), Count(s.StandsFor/float64(s.Objects), 3))
}

// grouped prints a whole number with thin groups of three digits.
func grouped(n int64) string {
	t := fmt.Sprint(n)
	for i := len(t) - 3; i > 0 && t[i-1] != '-'; i -= 3 {
		t = t[:i] + " " + t[i:]
	}
	return t
}

// Wrap breaks a text into lines of at most width columns at its blanks. A word
// that is longer stands alone.
func Wrap(text string, width int) []string {
	var lines []string
	line := ""
	for _, word := range unbroken(text) {
		if line != "" && columns(line)+1+columns(word) > width {
			lines = append(lines, line)
			line = ""
		}
		if line != "" {
			line += " "
		}
		line += word
	}
	return append(lines, line)
}

// unbroken splits a text at its blanks, but keeps a number and its unit in one.
func unbroken(text string) []string {
	var out []string
	for _, word := range strings.Fields(text) {
		unit := strings.TrimRight(word, ".,;:)")
		if last := len(out) - 1; last >= 0 && (unit == "%" || unit == "yr" || unit == "Msun" || unit == "K" || unit == "dex") {
			if c := out[last][len(out[last])-1]; c >= '0' && c <= '9' {
				out[last] += " " + word
				continue
			}
		}
		out = append(out, word)
	}
	return out
}

func columns(s string) int { return utf8.RuneCountInString(s) }

func pad(s string, width int) string {
	return s + strings.Repeat(" ", max(0, width-columns(s)))
}

// peakDigits is how many digits of a peak count a sample supports: the count
// of n sampled objects over all realisations scatters by 1/sqrt(n).
func peakDigits(s *ensemble.Summary, peak float64) int {
	if s.Whole || s.StandsFor <= 0 {
		return 3
	}
	n := peak * float64(s.Objects) / s.StandsFor * float64(max(s.Realisations, 1))
	switch {
	case n >= 1e4:
		return 3
	case n >= 100:
		return 2
	}
	return 1
}

// everMember tells whether a population had a member in any realisation.
func everMember(p ensemble.Population) bool { return !math.IsNaN(p.PeakDate) }
