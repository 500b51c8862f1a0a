// Package ensemble runs many realisations and sums them up.
package ensemble

// Summary is the answer of a run.
type Summary struct {
	Engine       string  // "individuals"
	Objects      int64   // simulated
	StandsFor    float64 // real objects in the galaxy
	Whole        bool    // each object is itself
	Realisations int     // finished
	Requested    int
	Interrupted  bool
	Seed         uint64
	Scenario     string
	Populations  []Population
	// LedgerClosesTo is the worst relative mismatch of any realisation.
	LedgerClosesTo float64
	Ledger         LedgerMeans
	Laws           []LawInUse
	Inactive       []Inactive
	// EvaporationStarts: log10 date from which 10 solar-mass holes evaporate.
	EvaporationStarts float64
	// Notes are sentences for the reader, such as that hundredth and last are
	// one date by assumption.
	Notes  []string
	Events int64 // over all realisations
}

// Population is the fade of one population over the ensemble. Counts are of
// the real galaxy.
type Population struct {
	Name      string
	Condition string  // in words
	PeakCount float64 // median; 0 if most realisations have no member
	PeakDate  float64 // median, log10 yr; NaN: it never had a member
	Half      Mark
	Hundredth Mark
	Last      Mark
	Causes    []Cause // by falling fraction
	// LastHangsOn is the law that took the last member, "process/law".
	LastHangsOn string
	// RealLast is the median date of the last of the real number, log10 yr;
	// NaN where it can't be told.
	RealLast float64
}

// Mark is one fade date over the ensemble, log10 yr. Quantiles are over all
// realisations in which the population had a member; those that did not reach
// the mark count as later than any date.
type Mark struct {
	Date   float64 // median; NaN: half of the realisations or more did not reach it
	Low    float64 // 5 % quantile between realisations; +Inf: not reached
	High   float64 // 95 % quantile; +Inf: not reached
	Error  float64 // Monte Carlo error of Date, dex; NaN or +Inf: can't be told
	Cut    float64 // share of realisations that did not reach it
	Reason string  // why Date is NaN
}

// Cause is one way members left a population.
type Cause struct {
	Process  string // empty for Remaining
	Outcome  string
	Fraction float64 // of all stays in all realisations; they sum to 1
}

// LedgerMeans is the mean over realisations of where the mass went, solar masses.
type LedgerMeans struct {
	Founded, Bound, Adrift, Central, Gas, Radiated float64
}

// LawInUse names a law of the run. Path, as it was given, and the digest of its
// files are those of a law outside the program.
type LawInUse struct{ Process, Name, Version, Path, Digest string }

// Inactive is a process that did nothing, and why.
type Inactive struct{ Process, Law, Why string }
