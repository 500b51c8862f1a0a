package cli

import (
	"math"

	"wane/sim/ensemble"
)

var never = math.NaN()

// sampled is a summary by hand of what a sample of a large galaxy looks like:
// every kind of cell a table can hold.
func sampled() *ensemble.Summary {
	return &ensemble.Summary{
		Engine: "individuals", Objects: 100000, StandsFor: 2e11, Realisations: 40, Requested: 40, Seed: 1,
		Scenario: "lantern-reach", LedgerClosesTo: 3e-15, EvaporationStarts: 11.5612, Events: 4e6,
		Ledger: ensemble.LedgerMeans{Founded: 7.6e10, Adrift: 1e10, Central: 2e8, Gas: 1e10, Radiated: 5.58e10},
		Populations: []ensemble.Population{
			{
				Name: "stars", Condition: "founded stars", PeakCount: 1.2934e11, PeakDate: 10.8931,
				Half:      ensemble.Mark{Date: 12.81331, Low: 12.8101, High: 12.8178, Error: 0.0021},
				Hundredth: ensemble.Mark{Date: 13.12149, Low: 13.11801, High: 13.1255, Error: 0.0009},
				Last:      ensemble.Mark{Date: 13.14971, Low: 13.14968, High: 13.14972, Error: 0.00001},
				Causes: []ensemble.Cause{{Process: "lifetime", Outcome: "died", Fraction: 0.99984},
					{Process: "ejection", Outcome: "ejected", Fraction: 0.00016}},
				LastHangsOn: "lifetime/table", RealLast: 13.14973,
			},
			{
				Name: "white-dwarfs", Condition: "white dwarfs", PeakCount: 1.2918e11, PeakDate: 13.149,
				Half:      ensemble.Mark{Date: 38.2831, Low: 38.2815, High: 38.2848, Error: 0.0003},
				Hundredth: ensemble.Mark{Date: 38.3391, Low: 38.3373, High: 38.3404, Error: 0.0003},
				Last:      ensemble.Mark{Date: 38.3581, Low: 38.3549, High: 38.3598, Error: 0.0004},
				Causes: []ensemble.Cause{{Process: "nucleon-decay", Outcome: "dissolved", Fraction: 0.951},
					{Process: "infall", Outcome: "swallowed", Fraction: 0.0491}},
				LastHangsOn: "nucleon-decay/grand-unified", RealLast: 38.3612,
			},
			{
				Name: "black-holes", Condition: "black-hole", PeakCount: 2.21e8, PeakDate: 10.41,
				Half:      ensemble.Mark{Date: 69.31, Low: 69.18, High: 69.47, Error: 0.03},
				Hundredth: ensemble.Mark{Date: 70.4, Low: 70.21, High: 70.55, Error: 0.04},
				Last:      ensemble.Mark{Date: 70.51, Low: 70.38, High: math.Inf(1), Error: 0.02, Cut: 0.125},
				Causes: []ensemble.Cause{{Process: "evaporation", Outcome: "evaporated", Fraction: 0.93},
					{Process: "ejection", Outcome: "taken", Fraction: 0.04}, {Process: "infall", Outcome: "taken", Fraction: 0.03}},
				LastHangsOn: "evaporation/page", RealLast: never,
			},
			{
				Name: "central-hole", Condition: "the central hole", PeakCount: 1, PeakDate: 9,
				Half:      ensemble.Mark{Date: never, Reason: "the run ended at 10^80 yr"},
				Hundredth: ensemble.Mark{Date: never, Reason: "the run ended at 10^80 yr"},
				Last:      ensemble.Mark{Date: never, Cut: 1, Reason: "the run ended at 10^80 yr"},
				RealLast:  never,
			},
			{
				Name: "a-population-of-a-scenario-with-a-long-name", Condition: "white dwarfs adrift", PeakCount: 6e6, PeakDate: 18.4,
				Half:      ensemble.Mark{Date: 19.5, Low: 19, High: 20, Error: 0.25},
				Hundredth: ensemble.Mark{Date: 21, Low: 20, High: 22, Error: 0.4},
				Last:      ensemble.Mark{Date: 22, Low: 21, High: 23, Error: 1.2},
				Causes:    []ensemble.Cause{{Process: "nucleon-decay", Outcome: "dissolved", Fraction: 1}},
				RealLast:  22.4, LastHangsOn: "nucleon-decay/grand-unified",
			},
			{Name: "ghosts", Condition: "star, central", PeakDate: never, Half: ensemble.Mark{Date: never},
				Hundredth: ensemble.Mark{Date: never}, Last: ensemble.Mark{Date: never}, RealLast: never},
		},
		Laws: []ensemble.LawInUse{{Process: "lifetime", Name: "table", Version: "1"},
			{Process: "nucleon-decay", Name: "grand-unified", Version: "1"}, {Process: "evaporation", Name: "page", Version: "1"}},
		Inactive: []ensemble.Inactive{{Process: "vacuum-decay", Law: "none", Why: "its law says that the vacuum never decays"}},
		Notes:    []string{"hundredth and last of every bound population are one date by assumption: the rest falls in at N_stop"},
	}
}

// whole is a small galaxy whose every object is itself, one realisation of
// several, ended by an interrupt.
func whole() *ensemble.Summary {
	s := sampled()
	s.Objects, s.StandsFor, s.Whole, s.Realisations, s.Interrupted = 2000, 2000, true, 1, true
	s.Scenario = "little-lamp"
	s.EvaporationStarts = math.Inf(1)
	s.Populations = s.Populations[:1]
	p := &s.Populations[0]
	p.PeakCount, p.RealLast = 1293, never
	for _, m := range []*ensemble.Mark{&p.Half, &p.Hundredth, &p.Last} {
		m.Error, m.Low, m.High = never, m.Date, m.Date
	}
	s.Inactive, s.Notes = nil, nil
	return s
}

// beyond has dates whose logarithms have logarithms.
func beyond() *ensemble.Summary {
	s := sampled()
	s.Scenario = "iron"
	s.Populations = []ensemble.Population{{
		Name: "white-dwarfs", Condition: "white-dwarf", PeakCount: 1.3e11, PeakDate: 13.1,
		Half:      ensemble.Mark{Date: 1.41e26, Low: 1.39e26, High: 1.43e26, Error: 2e23},
		Hundredth: ensemble.Mark{Date: 1.41e26, Low: 1.39e26, High: 1.43e26, Error: 2e23},
		Last:      ensemble.Mark{Date: 5.9e76, Low: 5.9e76, High: 5.9e76, Error: 1e60},
		Causes:    []ensemble.Cause{{Process: "tunnelling", Outcome: "collapsed", Fraction: 1}},
		RealLast:  never, LastHangsOn: "tunnelling/whole-star",
	}, {
		Name: "iron-stars", Condition: "iron-star", PeakCount: 1.3e11, PeakDate: 1500.1234,
		Half:      ensemble.Mark{Date: 32000.1234, Low: 32000.1, High: 32000.2, Error: 0.0004},
		Hundredth: ensemble.Mark{Date: 32000.1234, Low: 32000.1, High: 32000.2, Error: 0.0004},
		Last:      ensemble.Mark{Date: 32000.1234, Low: 32000.1, High: 32000.2, Error: 0.0004},
		RealLast:  never,
	}}
	return s
}
