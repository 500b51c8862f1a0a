package report

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/ensemble"
)

// longestName is how wide a population's name may be beside its row; a longer
// one gets a line of its own.
const longestName = 20

// peakPlaces is the decimals of a peak's date, whose error is not estimated:
// peaks are flat, and their dates known to a few hundredths at best.
const peakPlaces = 2

// row is one population in two lines of five cells, with remarks below.
type row struct {
	cells   [2][5]string
	remarks []string
}

func (p *page) populations(s *ensemble.Summary) {
	last := "last of the sample"
	if s.Whole {
		last = "last"
	}
	head := [5]string{"population", "peak", "half", "hundredth", last}
	rows := make([]row, len(s.Populations))
	widths := [5]int{}
	for i, c := range head {
		widths[i] = columns(c)
	}
	for i, population := range s.Populations {
		rows[i] = rowOf(s, population)
		for _, line := range rows[i].cells {
			for j, c := range line {
				if j == 0 && columns(c) > longestName {
					continue
				}
				widths[j] = max(widths[j], columns(c))
			}
		}
	}
	total := 2 * (len(widths) - 1)
	for _, w := range widths {
		total += w
	}
	if total > Width {
		p.stacked(head, rows)
		return
	}
	p.line(p.style.Heading(strings.TrimRight(join(head, widths), " ")))
	for _, r := range rows {
		if columns(r.cells[0][0]) > longestName {
			p.line(r.cells[0][0])
			r.cells[0][0] = ""
		}
		p.line(join(r.cells[0], widths))
		if below := strings.TrimRight(join(r.cells[1], widths), " "); below != "" {
			p.line(below)
		}
		p.remarks(r.remarks)
	}
	p.line("")
}

func join(cells [5]string, widths [5]int) string {
	var b strings.Builder
	for i, c := range cells {
		if i > 0 {
			b.WriteString("  ")
		}
		b.WriteString(pad(c, widths[i]))
	}
	return b.String()
}

// stacked is the layout for dates too long to stand side by side: one line a
// mark.
func (p *page) stacked(head [5]string, rows []row) {
	for _, r := range rows {
		p.line(p.style.Heading(r.cells[0][0]))
		for i := 1; i < len(head); i++ {
			if r.cells[0][i] == "" {
				continue
			}
			p.line("    " + pad(head[i], 20) + pad(r.cells[0][i], 28) + r.cells[1][i])
		}
		p.remarks(r.remarks)
	}
	p.line("")
}

func (p *page) remarks(remarks []string) {
	for _, remark := range remarks {
		for i, l := range Wrap(remark, Width-6) {
			indent := "    "
			if i > 0 {
				indent = "      "
			}
			p.line(indent + l)
		}
	}
}

func rowOf(s *ensemble.Summary, population ensemble.Population) row {
	r := row{}
	r.cells[0][0] = population.Name
	if !everMember(population) {
		r.cells[0][1] = "no members"
		return r
	}
	r.cells[0][1] = Count(population.PeakCount, peakDigits(s, population.PeakCount))
	r.cells[1][1] = "at " + shown{places: peakPlaces, double: population.PeakDate > doubled}.date(population.PeakDate)
	marks := []struct {
		name string
		ensemble.Mark
	}{{"half", population.Half}, {"hundredth", population.Hundredth}, {"last", population.Last}}
	for i, m := range marks {
		r.cells[0][2+i], r.cells[1][2+i] = markCells(m.Mark)
	}
	if about := about(population); about != "" {
		r.remarks = append(r.remarks, about)
	}
	var without []string
	for _, m := range marks {
		switch {
		case math.IsNaN(m.Date):
			without = append(without, m.name)
		case m.Cut > 0:
			r.remarks = append(r.remarks, fmt.Sprintf("%s not reached in %s of the realisations, which count as later than any date",
				m.name, percent(m.Cut)))
		}
	}
	if len(without) > 0 {
		r.remarks = append(r.remarks, strings.Join(without, ", ")+" not reached: "+reason(population.Last))
	}
	if real := realLast(s, population); real != "" {
		r.remarks = append(r.remarks, real)
	}
	return r
}

// about says what a population counts, where its name does not, and what
// became of its members.
func about(population ensemble.Population) string {
	var parts []string
	if c := population.Condition; !sayTheSame(population.Name, c) {
		parts = append(parts, "counts "+c)
	}
	if c := causes(population.Causes); c != "" {
		parts = append(parts, "fate: "+c)
	}
	return strings.Join(parts, "; ")
}

// sayTheSame tells whether a name says all that a condition does: brown-dwarfs
// and "brown dwarfs", central-hole and "the central hole".
func sayTheSame(name, condition string) bool {
	condition = strings.ReplaceAll(strings.TrimPrefix(condition, "the "), " ", "-")
	return condition == "" || condition == name || condition+"s" == name
}

// reason is why a mark was never reached.
func reason(m ensemble.Mark) string {
	if m.Reason == "" {
		return "the run ended first"
	}
	return m.Reason
}

func markCells(m ensemble.Mark) (above, below string) {
	if math.IsNaN(m.Date) {
		return "not reached", ""
	}
	s := show(m.Date, m.Error)
	if math.IsNaN(m.Error) && m.Low == m.High {
		return s.date(m.Date), "" // one realisation has no spread
	}
	return s.date(m.Date) + s.margin(), s.interval(m.Low, m.High)
}

// causes lists what took the members, largest share first as given; the
// process is named where two share a word.
func causes(list []ensemble.Cause) string {
	seen := map[string]int{}
	for _, c := range list {
		seen[c.Outcome]++
	}
	var parts []string
	for _, c := range list {
		word := c.Outcome
		if seen[word] > 1 {
			word += " (" + c.Process + ")"
		}
		parts = append(parts, word+" "+percent(c.Fraction))
	}
	return strings.Join(parts, ", ")
}

// realLast says how far the last of the real number lies beyond the last of
// the sample.
func realLast(s *ensemble.Summary, population ensemble.Population) string {
	if s.Whole || math.IsNaN(population.RealLast) || math.IsNaN(population.Last.Date) {
		return ""
	}
	how := show(population.RealLast, population.Last.Error)
	of := "the last of the real number"
	if n := population.PeakCount; n > 0 { // else most realisations had no member
		of = "the last of all " + Count(n, peakDigits(s, n))
	}
	beyond := population.RealLast - population.Last.Date
	if math.Abs(beyond) < math.Pow10(-how.places)/2 {
		return of + " goes at the same date, within its error"
	}
	if how.double {
		return fmt.Sprintf("%s goes at about %s", of, how.date(population.RealLast))
	}
	return fmt.Sprintf("%s goes at about %s, %.*f dex beyond that of the sample", of,
		how.date(population.RealLast), how.places, beyond)
}
