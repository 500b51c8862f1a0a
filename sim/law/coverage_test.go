package law

import (
	"strings"
	"testing"
)

// whole is a set of cards without gap or overlap, by process.
func whole() map[string]*Card {
	frame := card("ejection", "test", Question{Name: "rate"}, Question{Name: "expose"})
	frame.Frame, frame.Clocks = true, []Clock{{Name: "throw", Outcome: "ejected", Fate: FateAdrift}}
	infall := card("infall", "test", Question{Name: "divert", Words: []string{"throw"}})
	collapse := stars(card("collapse", "test", die, remain), AtParameter("m_up"), Limit{})
	collapse.Parameters = []Parameter{mUp(8)}
	live := card("lifetime", "test", Question{Name: "live"})
	live.Accepts.Kinds = []string{"star"}
	cooling := card("white-dwarf-cooling", "test", Question{Name: "shine"})
	cooling.Accepts.Kinds = []string{"white-dwarf"}
	out := map[string]*Card{}
	for _, c := range []Card{frame, infall, collapse, live, cooling,
		stars(card("remnant", "test", die, remain), Limit{}, AtParameter("collapse.m_up")),
		card("substellar-limit", "test", Question{Name: "sort"}),
	} {
		out[c.Process] = &c
	}
	return out
}

func coverage(t *testing.T, cards map[string]*Card) []error {
	t.Helper()
	var uses []*Use
	for _, c := range cards {
		uses = append(uses, use(*c))
	}
	s, faults := NewSet(uses...)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	return CheckCoverage(s)
}

func TestCoverageOfAWholeSet(t *testing.T) {
	if faults := coverage(t, whole()); len(faults) > 0 {
		t.Error(faults)
	}
}

func TestCoverageFindsFaults(t *testing.T) {
	for name, x := range map[string]struct {
		spoil func(map[string]*Card)
		want  []string
	}{
		"no lifetime": {func(c map[string]*Card) { delete(c, "lifetime") }, []string{"question live of a star: no law answers it"}},
		"lifetime of heavy stars only": {func(c map[string]*Card) {
			*c["lifetime"] = stars(*c["lifetime"], At(1), Limit{})
		}, []string{"question live of a star: no law for mass 0 .. 1"}},
		"lifetime of light stars only": {func(c map[string]*Card) {
			*c["lifetime"] = stars(*c["lifetime"], Limit{}, At(50))
		}, []string{"no law for mass from 50 on"}},
		"gap": {func(c map[string]*Card) { c["remnant"].Accepts.High = At(7) },
			[]string{"die of a star: no law for mass 7 .. 8", "remain of a star: no law for mass 7 .. 8"}},
		"overlap": {func(c map[string]*Card) { c["remnant"].Accepts.High = At(9) },
			[]string{"law remnant/test and collapse/test both answer for mass 8 .. 9", "mass 8 .. 9"}},
		"all twice": {func(c map[string]*Card) {
			c["remnant"].Accepts = Accepts{Kinds: []string{"star"}}
			c["collapse"].Accepts = Accepts{}
		}, []string{"laws remnant/test, collapse/test all answer it", "all answer it"}},
		"two columns": {func(c map[string]*Card) { c["remnant"].Accepts.Column = "metals" },
			[]string{"not told apart by one column", "not told apart by one column"}},
		"nothing": {func(c map[string]*Card) { c["remnant"].Accepts.High = At(-1) },
			[]string{"speaks for no mass", "0 .. 8", "speaks for no mass", "0 .. 8"}},
		"sort of some": {func(c map[string]*Card) { c["substellar-limit"].Accepts = Accepts{Column: "metals", Low: At(0.01)} },
			[]string{"question sort: no law for metals 0 .. 0.01"}},
		"cooling of another kind": {func(c map[string]*Card) { c["white-dwarf-cooling"].Accepts.Kinds = []string{"brown-dwarf"} },
			[]string{"speaks for brown-dwarf, want white-dwarf alone"}},
		"cooling of all": {func(c map[string]*Card) { c["white-dwarf-cooling"].Accepts.Kinds = nil },
			[]string{"speaks for every kind"}},
		"cooling of some": {func(c map[string]*Card) {
			c["white-dwarf-cooling"].Accepts = Accepts{Kinds: []string{"white-dwarf"}, Column: "mass", High: At(1)}
		}, []string{"shine of a white-dwarf: no law for mass from 1 on"}},
		"no frame": {func(c map[string]*Card) { delete(c, "ejection"); delete(c, "infall") }, []string{"0 laws give the radius"}},
		"share of nothing": {func(c map[string]*Card) { c["infall"].Questions[0].Words = []string{"tide"} },
			[]string{"takes a share of clock tide, which no law of this run has"}},
		"sum of nothing": {func(c map[string]*Card) {
			c["ejection"].Questions[0].Inputs = []string{"sum_tide", "sum_throw_white_dwarf", "reading_throw"}
		},
			[]string{"reads sum_tide"}},
		"unknown remnant": {func(c map[string]*Card) { c["remnant"].Questions[0].Words = []string{"relic"} },
			[]string{`makes objects of kind "relic"`}},
		"one clock twice": {func(c map[string]*Card) {
			c["infall"].Clocks = []Clock{{Name: "throw"}}
			c["infall"].Questions = nil
		}, []string{"clock throw: laws ejection/test and infall/test both have it"}},
	} {
		t.Run(name, func(t *testing.T) {
			cards := whole()
			x.spoil(cards)
			faults := coverage(t, cards)
			if len(faults) != len(x.want) {
				t.Fatalf("got %v, want %q", faults, x.want)
			}
			for i, w := range x.want {
				if !strings.Contains(faults[i].Error(), w) {
					t.Errorf("got %q, want %q in it", faults[i], w)
				}
			}
		})
	}
}

func TestCoverageFollowsParameters(t *testing.T) {
	cards := whole()
	cards["collapse"].Parameters = []Parameter{mUp(11)}
	if faults := coverage(t, cards); len(faults) > 0 {
		t.Error(faults)
	}
}
