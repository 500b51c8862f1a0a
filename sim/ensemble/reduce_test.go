package ensemble

import (
	"math"
	"slices"
	"strings"
	"testing"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"

	"wane/sim/engine"
	"wane/sim/galaxy"
)

var inf, nan = math.Inf(1), math.NaN()

func population(peak int64, peakDate, half, hundredth, last float64) engine.PopulationOutcome {
	return engine.PopulationOutcome{Peak: peak, PeakDate: peakDate, Half: half, Hundredth: hundredth, Last: last, RealLast: nan}
}

// dwarfs is a run of one population in a sample where each stands for ten.
func dwarfs() Info {
	return Info{
		Engine: "individuals", Objects: 100, StandsFor: 1000, Requested: 5, Seed: 7, Scenario: "test",
		Populations: []galaxy.Population{{Name: "white-dwarfs", Condition: galaxy.Condition{Kinds: []string{"white-dwarf"}}}},
	}
}

func outcome(p ...engine.PopulationOutcome) engine.Outcome {
	return engine.Outcome{Populations: p, End: inf, EvaporationStarts: nan, HeavyStarts: nan, SkyFloor: nan, DarkEnergyDecays: inf, StoppedAt: nan}
}

func near(t *testing.T, what string, got, want float64) {
	t.Helper()
	if !cmp.Equal(got, want, cmpopts.EquateNaNs(), cmpopts.EquateApprox(1e-12, 0)) {
		t.Errorf("%s: got %v, want %v", what, got, want)
	}
}

func TestMarksOfFive(t *testing.T) {
	var outcomes []engine.Outcome
	for i, last := range []float64{40, 39, 41, 37, 38} {
		o := population(int64(50+i), 10, 20+float64(i), last, last)
		o.Left = map[string]int64{"nucleon-decay:dissolved": 30, "ejection:ejected": int64(10 * (i % 2))}
		o.Hangs = []string{"a/x", "b/y", "b/y", "a/x", "b/y"}[i]
		o.RealLast = last + 0.5
		outcomes = append(outcomes, outcome(o))
		outcomes[i].Events = 3
		outcomes[i].EvaporationStarts = 21
	}
	s := Summarise(outcomes, dwarfs())
	p := s.Populations[0]
	near(t, "peak", p.PeakCount, 520) // the middle of 50 .. 54, each for ten
	near(t, "peak date", p.PeakDate, 10)
	near(t, "half", p.Half.Date, 22)
	near(t, "last", p.Last.Date, 39)
	near(t, "5 %", p.Last.Low, 37.2) // definition 7: rank 0.2 of 0 .. 4
	near(t, "95 %", p.Last.High, 40.8)
	// Beta(3, 3) at 0.2, 0.4, ...: I = 0.05792, 0.31744, 0.68256, 0.94208, so
	// the variance is 2 (0.05792 x 4 + 0.25952 x 1).
	near(t, "error", p.Last.Error, math.Sqrt(2*(4*0.05792+0.25952)))
	near(t, "cut", p.Last.Cut, 0)
	near(t, "last of the real number", p.RealLast, 39.5)
	if p.LastHangsOn != "b/y" {
		t.Errorf("last hangs on %q, want b/y", p.LastHangsOn)
	}
	want := []Cause{{"nucleon-decay", "dissolved", 150. / 170}, {"ejection", "ejected", 20. / 170}}
	if d := cmp.Diff(want, p.Causes); d != "" {
		t.Errorf("causes (-want +got):\n%s", d)
	}
	if s.Events != 15 || s.EvaporationStarts != 21 || s.Realisations != 5 || s.Requested != 5 || s.Seed != 7 || s.Scenario != "test" {
		t.Errorf("header: %+v", s)
	}
}

func TestCutRealisationsCountAsLater(t *testing.T) {
	run := func(lasts ...float64) (Mark, []Cause) {
		var outcomes []engine.Outcome
		for _, last := range lasts {
			p := population(9, 10, 11, 12, last)
			p.Left = map[string]int64{"ejection:ejected": 9}
			o := outcome(p)
			if math.IsInf(last, 1) {
				o.Populations[0].CutLast = true
				o.Populations[0].Remaining = 3
				o.Populations[0].Left = map[string]int64{"ejection:ejected": 6}
				o.EndCause = "vacuum-decay"
			}
			outcomes = append(outcomes, o)
		}
		p := Summarise(outcomes, dwarfs()).Populations[0]
		return p.Last, p.Causes
	}
	m, causes := run(30, 31, 32, inf, inf)
	near(t, "median", m.Date, 32)
	near(t, "5 %", m.Low, 30.2)
	near(t, "95 %", m.High, inf)
	near(t, "cut", m.Cut, 0.4)
	if m.Reason != "" {
		t.Errorf("reason %q for a mark that has a date", m.Reason)
	}
	if want := []Cause{{"ejection", "ejected", 39. / 45}, {"", Remaining, 6. / 45}}; !cmp.Equal(causes, want) {
		t.Errorf("causes %+v, want %+v", causes, want)
	}
	m, _ = run(30, 31, inf, inf, inf)
	near(t, "median", m.Date, nan)
	near(t, "5 %", m.Low, 30.2)
	near(t, "error", m.Error, nan)
	if m.Reason != "in 3 of 5 realisations everything ended first (vacuum decay)" {
		t.Errorf("reason %q", m.Reason)
	}
	m, _ = run(inf, inf)
	if m.Reason != "everything ended first (vacuum decay)" || m.Cut != 1 {
		t.Errorf("reason %q, cut %v", m.Reason, m.Cut)
	}
	for cause, want := range map[string]string{"": "nothing takes those who remain", "until": "the run ended first"} {
		if got := endWords(cause); got != want {
			t.Errorf("end %q: got %q, want %q", cause, got, want)
		}
	}
}

func TestWithoutMembers(t *testing.T) {
	none := outcome(population(0, nan, inf, inf, inf))
	p := Summarise([]engine.Outcome{none, none}, dwarfs()).Populations[0]
	near(t, "peak", p.PeakCount, 0)
	near(t, "peak date", p.PeakDate, nan)
	if p.Last.Reason != neverMember || !math.IsNaN(p.Last.Date) || p.Last.Cut != 0 || len(p.Causes) != 0 {
		t.Errorf("%+v", p)
	}
	// In some realisations only: the marks are of the others.
	s := Summarise([]engine.Outcome{none, outcome(population(1, 10, 20, 20, 20)), outcome(population(2, 10, 20, 21, 22))}, dwarfs())
	near(t, "last", s.Populations[0].Last.Date, 21)
	near(t, "peak date", s.Populations[0].PeakDate, 10)
	wantNote(t, s, "white-dwarfs (1 of 3)")
	// No outcome at all.
	if s := Summarise(nil, dwarfs()); s.Realisations != 0 || !math.IsNaN(s.Populations[0].PeakDate) {
		t.Errorf("no realisations: %+v", s)
	}
}

func TestCentralHoleStandsForItself(t *testing.T) {
	info := dwarfs()
	info.Populations[0] = galaxy.Population{Name: "central-hole", Condition: galaxy.Condition{Kinds: []string{"central-hole"}}}
	one := []engine.Outcome{outcome(population(1, 10, 20, 20, 20))}
	near(t, "central hole", Summarise(one, info).Populations[0].PeakCount, 1)
	near(t, "one realisation tells no error", Summarise(one, info).Populations[0].Last.Error, nan)
	info = dwarfs()
	info.Whole = true
	near(t, "whole", Summarise(one, info).Populations[0].PeakCount, 1)
}

func TestLedger(t *testing.T) {
	a, b := outcome(population(1, 10, 20, 20, 20)), outcome(population(1, 10, 20, 20, 20))
	a.Ledger = engine.Ledger{Founded: 10, Bound: 1, Adrift: 2, Central: 3, Gas: 2, Radiated: 2}
	b.Ledger = engine.Ledger{Founded: 10, Bound: 3, Adrift: 2, Central: 3, Gas: 1, Radiated: 2}
	s := Summarise([]engine.Outcome{b, a}, dwarfs())
	if want := (LedgerMeans{Founded: 10, Bound: 2, Adrift: 2, Central: 3, Gas: 1.5, Radiated: 2}); s.Ledger != want {
		t.Errorf("means %+v, want %+v", s.Ledger, want)
	}
	near(t, "worst closure", s.LedgerClosesTo, 0.1)
	b.Ledger.Founded = nan
	if s := Summarise([]engine.Outcome{b, a}, dwarfs()); !math.IsNaN(s.LedgerClosesTo) {
		t.Errorf("a ledger with NaN closes to %v", s.LedgerClosesTo)
	}
}

func TestInactive(t *testing.T) {
	info := dwarfs()
	for _, l := range [][2]string{
		{"expansion", "lambda-cdm"}, {"warmth", "none"}, {"vacuum-decay", "never"}, {"ejection", "contracting"},
		{"infall", "branching"}, {"nucleon-decay", "stable"}, {"evaporation", "page"}, {"orbital-decay", "peters"},
	} {
		info.Laws = append(info.Laws, LawInUse{Process: l[0], Name: l[1], Version: "1"})
	}
	info.Idle = []string{"vacuum-decay"}
	info.Reasons = map[string]string{"evaporation": "the sky never grew colder than a hole"}
	a, b := outcome(population(1, 10, 20, 20, 20)), outcome(population(1, 10, 20, 20, 20))
	a.Fired = map[string]int64{"ejection": 0, "infall": 0}
	b.Fired = map[string]int64{"ejection": 5}
	want := []Inactive{
		{"warmth", "none", "it is switched off"},
		{"vacuum-decay", "never", "it is switched off"},
		{"infall", "branching", "nothing got that far: no object stayed bound until it acted"},
		{"nucleon-decay", "stable", "nothing got that far: whatever it wears was never there, or was gone before"},
		{"evaporation", "page", "nothing got that far: the sky never grew colder than a hole"},
		{"orbital-decay", "peters", "it speaks of pairs, and a run follows objects one by one"},
	}
	s := Summarise([]engine.Outcome{a, b}, info)
	if d := cmp.Diff(want, s.Inactive); d != "" {
		t.Errorf("inactive (-want +got):\n%s", d)
	}
	wantNote(t, s, "no law in this run: dark-energy-decay, mass-function")
}

func TestNotes(t *testing.T) {
	stopped := outcome(population(9, 10, 11, 19.25, 19.25))
	stopped.StoppedAt = 19.25
	wantNote(t, Summarise([]engine.Outcome{stopped, stopped}, dwarfs()),
		"Hundredth and last are one date by assumption, that at which the galaxy counts as over (10^19.25 yr): white-dwarfs.")
	stopped.Populations = []engine.PopulationOutcome{population(9, 10, 11, 18, 19.25)}
	wantNote(t, Summarise([]engine.Outcome{stopped, stopped}, dwarfs()), "The last date is an assumption")
	far := outcome(population(9, 10, 1e26, 1e26, 1e26))
	wantNote(t, Summarise([]engine.Outcome{far}, dwarfs()), "Beyond 10^(10^15) yr only the exponent means anything")
	part := outcome(population(9, 10, 11, 12, inf))
	part.Populations[0].CutLast = true
	wantNote(t, Summarise([]engine.Outcome{part, outcome(population(9, 10, 11, 12, 13))}, dwarfs()), "later than any date (white-dwarfs)")
	if s := Summarise([]engine.Outcome{outcome(population(9, 10, 11, 12, 13))}, dwarfs()); len(s.Notes) != 0 {
		t.Errorf("a plain run has notes: %q", s.Notes)
	}
}

func wantNote(t *testing.T, s Summary, part string) {
	t.Helper()
	if !slices.ContainsFunc(s.Notes, func(n string) bool { return strings.Contains(n, part) }) {
		t.Errorf("no note says %q: %q", part, s.Notes)
	}
}

func TestConditionsInWords(t *testing.T) {
	want := map[string]string{
		"stars": "founded stars", "merged-stars": "merged stars", "all-stars": "stars", "brown-dwarfs": "brown dwarfs", "white-dwarfs": "white dwarfs",
		"glowing-white-dwarfs": "white dwarfs hotter than 798 K", "neutron-stars": "neutron stars", "black-holes": "black holes",
		"central-hole": "the central hole", "bound-objects": "objects bound to the galaxy", "adrift-objects": "objects adrift",
	}
	for _, p := range galaxy.Default() {
		if got := Words(p.Condition); got != want[p.Name] {
			t.Errorf("%s: got %q, want %q", p.Name, got, want[p.Name])
		}
	}
	got := Words(galaxy.Condition{Kinds: []string{"star", "relic", "iron-star"}, Places: []string{"bound", "central"}, Origins: []string{"merged"},
		Warmth: &galaxy.Warmth{Quantity: "luminosity", Value: 1e-4, Unit: "solLum"}})
	if got != "merged stars, relics or iron stars bound to the galaxy or in the centre fainter than 0.0001 Lsun" {
		t.Errorf("got %q", got)
	}
	got = Words(galaxy.Condition{Warmth: &galaxy.Warmth{Quantity: "temperature", Above: true, Value: 2, Unit: "floor"}})
	if got != "objects hotter than 2 times their own floor" {
		t.Errorf("got %q", got)
	}
}

// TestSkyNotes: what is said of the sky follows from what the realisations saw.
func TestSkyNotes(t *testing.T) {
	sky := func(floor, decays, heavy float64) engine.Outcome {
		return engine.Outcome{End: inf, SkyFloor: floor, DarkEnergyDecays: decays, HeavyStarts: heavy}
	}
	ended := func(cause string, end float64) engine.Outcome {
		return engine.Outcome{End: end, EndCause: cause, SkyFloor: -29.66, DarkEnergyDecays: inf, HeavyStarts: 11.83}
	}
	cold := math.Inf(-1)
	for _, x := range []struct {
		name     string
		outcomes []engine.Outcome
		want     []string
	}{
		{"floor", []engine.Outcome{sky(-29.655, inf, 11.83)}, []string{"The horizon keeps the sky at 10^-29.66 K for ever: nothing gets colder than that."}},
		{"no floor", []engine.Outcome{sky(cold, inf, 35)}, []string{"Nothing keeps the sky warm: it cools without end, and so does all that has no heat of its own."}},
		{"decays", []engine.Outcome{sky(cold, 11.2, 35), sky(cold, 11.9, 11.83), sky(-29.655, inf, 11.83)}, []string{
			"Dark energy decays in 2 of 3 realisations at 10^11.55 yr (10^11.20 to 10^11.90): from then on no horizon keeps the sky warm.",
			"Where it does so early in 1 of 2 realisations, a hole of 1e9 Msun evaporates only from 10^35.00 yr on: without dark energy the sky cools that slowly.",
			"Where it does so late in 1 of 2 realisations, a hole of 1e9 Msun has begun to evaporate at 10^11.83 yr, before.",
			"The horizon keeps the sky at 10^-29.66 K for ever in 1 of 3 realisations: nothing gets colder than that.",
			"Nothing keeps the sky warm in 2 of 3 realisations: it cools without end, and so does all that has no heat of its own.",
		}},
		{"decays after the end", []engine.Outcome{{End: 10, EndCause: "rip", SkyFloor: cold, DarkEnergyDecays: 11, HeavyStarts: inf}}, []string{"Space is torn apart, at 10^10.00 yr."}},
		{"vacuum", []engine.Outcome{ended("vacuum-decay", 524.2), ended("vacuum-decay", 524.8)}, []string{
			"The vacuum decays, which ends everything, at 10^524.50 yr (10^524.20 to 10^524.80)."}},
	} {
		if got := skyNotes(x.outcomes); !slices.Equal(got, x.want) {
			t.Errorf("%s:\n got  %q\n want %q", x.name, got, x.want)
		}
	}
}
