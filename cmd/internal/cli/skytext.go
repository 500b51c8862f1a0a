package cli

import (
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"
	"unicode/utf8"

	"wane/cmd/internal/report"
	"wane/sim/num"
)

// text prints the sky for people.
func (v *skyView) text(w io.Writer, style report.Style, quiet bool) {
	if !quiet {
		v.header(w, style)
	}
	v.table(w, style, []string{"date", "age", "log10 a", "expansion", "relic sky", "horizon", "felt"},
		[]string{"", "", "", "km/s/Mpc", "K", "K", "K"}, func(l float64) []string {
			return []string{
				v.scale(l), powerOf(v.logRate(l), "at rest", "infinite"), v.relic(l),
				powerOf(v.LogHorizon(l), "none", ""), powerOf(v.LogTemperature(l), "0", ""),
			}
		})
	fmt.Fprintln(w)
	v.table(w, style, []string{"date", "age", "event horizon", "Hubble radius", "particle horizon", "visible limit"},
		[]string{"", "", "Gly", "Gly", "Gly, comoving", "Gly, comoving"}, func(l float64) []string {
			return []string{
				powerOf(v.LogEventHorizon(l)-9, "0", "none"), powerOf(v.LogHubbleRadius(l)-9, "0", "infinite"),
				powerOf(v.LogParticleHorizon(l)-9, "0", "infinite"), powerOf(v.LogVisibleLimit()-9, "0", "none"),
			}
		})
	fmt.Fprintln(w)
	fmt.Fprintln(w, style.Heading("special dates"))
	for _, m := range v.marks() {
		if m.why() != "" && m.optional {
			continue
		}
		when := m.why()
		if when == "" {
			when = report.Date(m.date, 0) + " yr"
		}
		field(w, 2, 24, when, m.doc)
	}
}

func (v *skyView) header(w io.Writer, style report.Style) {
	title := "How space expands, and how warm the sky is"
	if !v.alone {
		title = v.run.Name + ": how space expands, and how warm the sky is"
	}
	const column = 14
	fmt.Fprintln(w, style.Heading(title))
	fmt.Fprintln(w)
	for _, l := range v.run.Resolve(v.run.registry).Laws {
		if !ofSky(l.Process) || l.Name == "none" {
			continue
		}
		name := l.Process + "/" + l.Name
		for i, p := range l.Parameters {
			name += []string{": ", ", "}[min(i, 1)] + p.Name + " " + p.Value
		}
		term := ""
		if l.Process == expansion {
			term = "laws"
		}
		field(w, 0, column, term, name)
	}
	if v.draws {
		field(w, 0, column, "realisation", fmt.Sprintf("%d of seed %d: what an ending draws differs from one to the next", v.realisation, v.run.Seed))
	}
	field(w, 0, column, "dates", "years since the Big Bang")
	fmt.Fprintln(w)
}

// table prints one line a date, with cells that say what is asked. Where all
// of it is too wide, the age goes: the date tells it.
func (v *skyView) table(w io.Writer, style report.Style, names, units []string, cells func(l float64) []string) {
	lines := [][]string{names, units}
	for _, l := range v.dates {
		age := ""
		if l < 300 {
			age = powerOf(l, "", "") + " yr"
		}
		line := []string{report.Date(l, 0), age}
		if v.over(l) {
			line = append(line, "everything has ended")
		} else {
			line = append(line, cells(l)...)
		}
		lines = append(lines, line)
	}
	widths := make([]int, len(names))
	for _, line := range lines {
		for i, c := range line {
			if i < 2 || len(line) == len(names) { // a sentence may be wider than its column
				widths[i] = max(widths[i], utf8.RuneCountInString(c))
			}
		}
	}
	whole := 2 * (len(names) - 1)
	for _, n := range widths {
		whole += n
	}
	for i, line := range lines {
		var b strings.Builder
		for j, c := range line {
			if j == 1 && whole > report.Width {
				continue
			}
			b.WriteString(c)
			b.WriteString(strings.Repeat(" ", max(0, widths[j]-utf8.RuneCountInString(c))+2))
		}
		text := strings.TrimRight(b.String(), " ")
		if i == 0 {
			text = style.Heading(text)
		}
		fmt.Fprintln(w, text)
	}
}

// scale is log10 of the scale factor.
func (v *skyView) scale(l float64) string {
	x := v.logA(l)
	switch {
	case math.IsInf(x, 1):
		return exponent(v.logLogA(l))
	case math.Abs(x) < 5e-5:
		return "0.0000"
	case math.Abs(x) < 1e6:
		return strconv.FormatFloat(x, 'f', 4, 64)
	}
	return shortNumber(x, 5)
}

// relic is the temperature of the relic radiation, which is T0/a also where a
// is beyond the range of numbers.
func (v *skyView) relic(l float64) string {
	if x := v.LogRelic(l); !math.IsInf(x, -1) || !math.IsInf(v.logA(l), 1) || math.IsInf(v.logLogA(l), 1) {
		return powerOf(x, "0", "infinite")
	}
	return "10^(-" + exponent(v.logLogA(l)) + ")"
}

// exponent prints 10^x where x is large.
func exponent(x float64) string {
	if x > 1e6 {
		return "10^(10^" + strconv.FormatFloat(num.Log10(x), 'f', 3, 64) + ")"
	}
	return "10^" + strconv.FormatFloat(x, 'f', 3, 64)
}

// powerOf prints 10^x to five digits, as a power of ten beyond the range of
// numbers; words for nothing and for no bound.
func powerOf(x float64, nothing, endless string) string {
	switch {
	case math.IsInf(x, -1):
		return nothing
	case math.IsInf(x, 1):
		return endless
	case x > 1e6:
		return exponent(x)
	case x < -1e6:
		return "10^(-" + exponent(num.Log10(-x)) + ")"
	case math.Abs(x) > 300:
		return "10^" + strconv.FormatFloat(x, 'f', 3, 64)
	}
	return shortNumber(num.Exp10(x), 5)
}

// shortNumber prints a number to some digits, 1.5e9 rather than 1.5e+09.
func shortNumber(v float64, digits int) string {
	s := strconv.FormatFloat(v, 'g', digits, 64)
	return strings.NewReplacer("e+0", "e", "e+", "e", "e-0", "e-").Replace(s)
}
