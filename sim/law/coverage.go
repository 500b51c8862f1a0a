package law

import (
	"fmt"
	"math"
	"sort"
	"strings"
)

// exclusive are the questions that exactly one law must answer for every
// object they are asked about, and the processes whose laws share each.
var exclusive = []struct {
	question  string
	kind      string // the kind it is asked about; empty: what is not sorted yet
	processes []string
}{
	{"live", "star", []string{"lifetime"}},
	{"die", "star", []string{"remnant", "collapse"}},
	{"remain", "star", []string{"remnant", "collapse"}},
	{"sort", "", []string{"substellar-limit"}},
}

// cooled names the kind each cooling process is for.
var cooled = []struct{ process, kind string }{
	{"white-dwarf-cooling", "white-dwarf"},
	{"neutron-star-cooling", "neutron-star"},
	{"brown-dwarf-cooling", "brown-dwarf"},
}

// CheckCoverage proves that the laws of a set leave no gap and no overlap:
// every object that is asked an exclusive question (live, die, remain, sort,
// shine) has exactly one law to answer it, the galaxy has one frame, and every
// word that one law says of another's clocks or kinds means something in this
// set. It returns every fault it finds.
//
// The proof is on the cards alone: two laws may share a kind only by ranges of
// one and the same column that meet end to end over all its values.
func CheckCoverage(s *Set) []error {
	var faults []error
	for _, e := range exclusive {
		faults = append(faults, s.covered(e.question, e.kind, s.present(e.processes))...)
	}
	for _, c := range cooled {
		faults = append(faults, s.cools(c.process, c.kind)...)
	}
	return append(faults, s.references()...)
}

func (s *Set) present(processes []string) []*Use {
	var out []*Use
	for _, p := range processes {
		if u := s.uses[p]; u != nil {
			out = append(out, u)
		}
	}
	return out
}

// covered proves that the laws tile all objects of one kind.
func (s *Set) covered(question, kind string, uses []*Use) []error {
	what := "question " + question
	if kind != "" {
		what += " of a " + kind
	}
	var tiles []*Use
	for _, u := range uses {
		if u.Card.Answers(question) && (kind == "" || u.acceptsKind(kind)) {
			tiles = append(tiles, u)
		}
	}
	if len(tiles) == 0 {
		return []error{fmt.Errorf("%s: no law answers it", what)}
	}
	return tile(what, tiles)
}

func (u *Use) acceptsKind(word string) bool {
	return len(u.Card.Accepts.Kinds) == 0 || contains(u.Card.Accepts.Kinds, word)
}

// tile proves that the ranges of the laws meet end to end. Masses and metals
// start at 0; there is no upper end.
func tile(what string, uses []*Use) []error {
	column := uses[0].Card.Accepts.Column
	for _, u := range uses[1:] {
		if u.Card.Accepts.Column != column {
			return []error{fmt.Errorf("%s: laws %s and %s are not told apart by one column", what, uses[0].ID(), u.ID())}
		}
	}
	if column == "" {
		if len(uses) > 1 {
			return []error{fmt.Errorf("%s: laws %s all answer it", what, ids(uses))}
		}
		return nil
	}
	uses = append([]*Use(nil), uses...)
	sort.SliceStable(uses, func(i, j int) bool { return uses[i].limits[0] < uses[j].limits[0] })
	var faults []error
	reached, by := 0.0, "the start"
	for _, u := range uses {
		low, high := max(u.limits[0], 0), u.limits[1]
		switch {
		case !(low < high):
			faults = append(faults, fmt.Errorf("%s: law %s speaks for no %s: %v .. %v", what, u.ID(), column, u.limits[0], high))
			continue
		case low > reached:
			faults = append(faults, fmt.Errorf("%s: no law for %s %v .. %v, between %s and %s", what, column, reached, low, by, u.ID()))
		case low < reached:
			faults = append(faults, fmt.Errorf("%s: %s and %s both answer for %s %v .. %v", what, by, u.ID(), column, low, min(reached, high)))
		}
		if high > reached {
			reached, by = high, "law "+u.ID()
		}
	}
	if !math.IsInf(reached, 1) {
		faults = append(faults, fmt.Errorf("%s: no law for %s from %v on, beyond %s", what, column, reached, by))
	}
	return faults
}

func ids(uses []*Use) string {
	names := make([]string, len(uses))
	for i, u := range uses {
		names[i] = u.ID()
	}
	return strings.Join(names, ", ")
}

// cools proves that a cooling process, where there is one, speaks for all
// objects of its kind and for no other.
func (s *Set) cools(process, kind string) []error {
	u := s.uses[process]
	if u == nil {
		return nil
	}
	var faults []error
	if len(u.Card.Accepts.Kinds) != 1 || u.Card.Accepts.Kinds[0] != kind {
		faults = append(faults, fmt.Errorf("question shine: law %s speaks for %s, want %s alone",
			u.ID(), kindsInWords(u.Card.Accepts.Kinds), kind))
	}
	if !u.acceptsKind(kind) {
		return faults
	}
	return append(faults, tile("question shine of a "+kind, []*Use{u})...)
}

func kindsInWords(kinds []string) string {
	if len(kinds) == 0 {
		return "every kind"
	}
	return strings.Join(kinds, ", ")
}

// references checks what laws say of one another.
func (s *Set) references() []error {
	var faults []error
	clocks := map[string]string{} // clock to law
	frames := 0
	for _, u := range s.All() {
		if u.Card.Frame {
			frames++
		}
		for _, c := range u.Card.Clocks {
			if other, taken := clocks[underscored(c.Name)]; taken {
				faults = append(faults, fmt.Errorf("clock %s: laws %s and %s both have it", c.Name, other, u.ID()))
			}
			clocks[underscored(c.Name)] = u.ID()
		}
	}
	if frames != 1 {
		faults = append(faults, fmt.Errorf("%d laws give the radius and dispersion of the galaxy, want one", frames))
	}
	for _, u := range s.All() {
		for _, w := range u.Card.question("divert").Words {
			if owner, ok := clocks[underscored(w)]; !ok {
				faults = append(faults, fmt.Errorf("law %s takes a share of clock %s, which no law of this run has", u.ID(), w))
			} else if owner == u.ID() {
				faults = append(faults, fmt.Errorf("law %s takes a share of its own clock %s", u.ID(), w))
			}
		}
		for _, name := range u.Card.question("rate").Inputs {
			if clock, ok := clockOf(name); ok && !s.clockNamed(clock, clocks) {
				faults = append(faults, fmt.Errorf("law %s reads %s, but no law of this run has that clock", u.ID(), name))
			}
		}
		for _, k := range u.makes() {
			if k != Gone && !contains(s.Kinds, k) {
				faults = append(faults, fmt.Errorf("law %s makes objects of kind %q, which this run does not know", u.ID(), k))
			}
		}
	}
	return faults
}

// clockOf is the clock that a galaxy value is about.
func clockOf(value string) (clock string, ok bool) {
	for _, prefix := range []string{"sum_sought_", "sum_", "reading_"} {
		if clock, ok = strings.CutPrefix(value, prefix); ok {
			return clock, true
		}
	}
	return "", false
}

// clockNamed tells whether text is a clock, or a clock and a kind.
func (s *Set) clockNamed(text string, clocks map[string]string) bool {
	if _, ok := clocks[text]; ok {
		return true
	}
	for _, k := range s.Kinds {
		if clock, ok := strings.CutSuffix(text, "_"+underscored(k)); ok {
			if _, ok := clocks[clock]; ok {
				return true
			}
		}
	}
	return false
}

// makes lists the kinds the law's objects may become.
func (u *Use) makes() []string {
	kinds := append([]string(nil), u.Card.question("die").Words...)
	for _, t := range u.Card.Thresholds {
		kinds = append(kinds, t.Becomes)
	}
	if u.role == Turning {
		for _, o := range u.Card.Outcomes {
			kinds = append(kinds, o.Becomes)
		}
	}
	return kinds
}
