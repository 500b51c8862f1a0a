package engine

// Outcome is what one realisation came to.
type Outcome struct {
	Populations []PopulationOutcome // in the order of Setup.Populations
	Ledger      Ledger
	End         float64          // log10 yr: when the run or the sky ended; +Inf: never
	EndCause    string           // "until", "rip", "vacuum-decay", ...; empty: it ran out
	Fired       map[string]int64 // events per process, to tell which were inactive
	// EvaporationStarts is the log10 date from which a hole of 10 solar
	// masses is warmer than the sky; +Inf: never, NaN: no sky.
	EvaporationStarts float64
	// SkyFloor is log10 of the temperature, in K, below which the sky never
	// falls; -Inf: there is none, NaN: no sky.
	SkyFloor float64
	// DarkEnergyDecays is the log10 date when dark energy begins to decay at one
	// stroke; +Inf: it does not.
	DarkEnergyDecays float64
	// HeavyStarts is as EvaporationStarts, for a hole of 1e9 solar masses.
	HeavyStarts float64
	// StoppedAt is the log10 date at which the ejection law declared the
	// galaxy over, NaN if it did not.
	StoppedAt float64
	Events    int64
}

// PopulationOutcome is the fade of one population in one realisation. Counts
// are of simulated objects; multiply by the weight of the sample.
type PopulationOutcome struct {
	Peak     int64
	PeakDate float64 // log10 yr; NaN when it never had a member
	// Half, Hundredth and Last are log10 dates. +Inf with Cut set: not
	// reached before the run or the sky ended.
	Half, Hundredth, Last          float64
	CutHalf, CutHundredth, CutLast bool
	// Left counts exits by outcome word; the key is "process:outcome".
	Left map[string]int64
	// Remaining is how many were left at the end.
	Remaining int64
	// Hangs is the process that took the last member, "process/law".
	Hangs string
	// RealLast is the median log10 date of the last of the real number, where
	// the survival of each member is known in closed form (physics of order
	// statistics); NaN where it is not, and for a whole galaxy.
	RealLast float64
}

// Ledger tells where the founded mass is at the end, in solar masses of the
// real galaxy.
type Ledger struct {
	Founded  float64 // what the galaxy started with, central hole included
	Bound    float64
	Adrift   float64
	Central  float64
	Gas      float64
	Radiated float64
	Gained   map[string]float64 // by source
}

// Closes returns the relative mismatch of the ledger.
func (l Ledger) Closes() float64 {
	in := l.Founded
	for _, g := range l.Gained {
		in += g
	}
	out := l.Bound + l.Adrift + l.Central + l.Gas + l.Radiated
	if in == 0 {
		return out
	}
	d := (in - out) / in
	if d < 0 {
		d = -d
	}
	return d
}
