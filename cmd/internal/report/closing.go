package report

import (
	"fmt"
	"math"
	"sort"
	"strings"

	"wane/sim/ensemble"
)

// closing writes what is said once for all populations.
func (p *page) closing(s *ensemble.Summary) {
	if hangs := hangsOn(s); len(hangs) > 0 {
		p.paragraph("The last dates hang on: " + strings.Join(hangs, "; ") + ".")
	}
	p.paragraph(evaporation(s.EvaporationStarts))
	if line := untold(s); line != "" {
		p.paragraph(line)
	}
	if beyondTelling(s) {
		p.paragraph("Beyond 10^(10^15) yr only the exponent means anything: half, hundredth and last are one number there.")
	}
	for _, note := range s.Notes {
		p.paragraph(sentence(note))
	}
	p.paragraph(ledger(s))
	if len(s.Inactive) > 0 {
		p.line("")
		p.line(p.style.Heading("Inactive"))
		for _, x := range s.Inactive {
			p.remarks([]string{x.Process + "/" + x.Law + ": " + x.Why})
		}
	}
	if len(s.Laws) > 0 {
		p.line("")
		p.line(p.style.Heading("Laws"))
		names := make([]string, len(s.Laws))
		for i, l := range s.Laws {
			names[i] = l.Process + "/" + l.Name
		}
		for _, l := range Wrap(strings.Join(names, ", "), Width-4) {
			p.line("    " + l)
		}
	}
	p.outside(s)
}

// outside names the laws that are not built in.
func (p *page) outside(s *ensemble.Summary) {
	head := false
	for _, l := range s.Laws {
		if l.Path == "" {
			continue
		}
		if !head {
			p.line("")
			p.line(p.style.Heading("Laws outside the program"))
			head = true
		}
		p.remarks([]string{l.Process + "/" + l.Name + ", version " + l.Version + ": " + l.Path + ", " + l.Digest})
	}
}

func (p *page) paragraph(text string) {
	for i, l := range Wrap(text, Width-2) {
		if i > 0 {
			l = "  " + l
		}
		p.line(l)
	}
}

// hangsOn groups the populations by the law that took their last member, in
// the order in which the laws first appear.
func hangsOn(s *ensemble.Summary) []string {
	var order []string
	groups := map[string][]string{}
	for _, population := range s.Populations {
		law := population.LastHangsOn
		if law == "" || !everMember(population) || math.IsNaN(population.Last.Date) {
			continue
		}
		if groups[law] == nil {
			order = append(order, law)
		}
		groups[law] = append(groups[law], population.Name)
	}
	for i, law := range order {
		order[i] = law + " (" + strings.Join(groups[law], ", ") + ")"
	}
	return order
}

func evaporation(starts float64) string {
	switch {
	case math.IsNaN(starts):
		return "It was not worked out when holes of 10 Msun begin to evaporate."
	case math.IsInf(starts, 1):
		return "Holes of 10 Msun never begin to evaporate: the sky stays warmer than they are."
	}
	return "Holes of 10 Msun evaporate from " + Date(starts, math.NaN()) + " yr on, when the sky has become colder than they are."
}

// untold names the populations of a sample for which the last of the real
// number cannot be told. Where there is but one, as the central hole, it is its
// own last.
func untold(s *ensemble.Summary) string {
	if s.Whole {
		return ""
	}
	var names []string
	told := false
	for _, population := range s.Populations {
		if !everMember(population) || math.IsNaN(population.Last.Date) || population.PeakCount <= 1 {
			continue
		}
		if math.IsNaN(population.RealLast) {
			names = append(names, population.Name)
		} else {
			told = true
		}
	}
	switch {
	case len(names) == 0:
		return ""
	case !told:
		names = []string{"any population"}
	}
	return "How far the last of the real number lies beyond that of the sample cannot be told for " +
		strings.Join(names, ", ") + "."
}

func beyondTelling(s *ensemble.Summary) bool {
	for _, population := range s.Populations {
		if population.Last.Date > exponentOnly {
			return true
		}
	}
	return false
}

// ledger says where the founded mass is at the end.
func ledger(s *ensemble.Summary) string {
	l := s.Ledger
	closes := "the mass ledger closes to " + closesTo(s.LedgerClosesTo)
	if !(l.Founded > 0) {
		return sentence(closes)
	}
	places := []struct {
		name string
		mass float64
	}{{"radiated", l.Radiated}, {"gas", l.Gas}, {"adrift", l.Adrift}, {"bound", l.Bound}, {"in the central hole", l.Central}}
	sort.SliceStable(places, func(i, j int) bool { return places[i].mass > places[j].mass })
	var parts []string
	for _, x := range places {
		if x.mass > 0 {
			parts = append(parts, x.name+" "+percent(x.mass/l.Founded))
		}
	}
	return fmt.Sprintf("Of %s Msun founded, at the end: %s; %s.", Count(l.Founded, 3), strings.Join(parts, ", "), closes)
}

func closesTo(mismatch float64) string {
	if mismatch < 1e-15 {
		return "the last bit"
	}
	return "one part in " + Count(1/mismatch, 1)
}

// sentence gives a note its capital and its full stop.
func sentence(note string) string {
	note = strings.TrimSpace(note)
	if note == "" {
		return note
	}
	note = strings.ToUpper(note[:1]) + note[1:]
	if !strings.ContainsAny(note[len(note)-1:], ".!?") {
		note += "."
	}
	return note
}
