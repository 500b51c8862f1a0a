package law

// Card is what a law says of itself. It is data: listing, checking and
// documenting a law need no instance in a galaxy.
type Card struct {
	Process string // "evaporation"
	Name    string // "page"
	Version string // changes whenever an answer changes
	Summary string // one line: what this law says
	Formula string // the formula in words and symbols, units included
	Domain  string // where it holds, and its error
	Sources []string
	Notes   []string // assumptions, doubts, what it leaves out

	Accepts    Accepts
	Questions  []Question
	Parameters []Parameter

	// Thresholds of a wearing law, per kind from the largest mass down.
	Thresholds []Threshold
	// Effect of wearing: "loss", or "gain from <source>". Empty means loss.
	Wears string

	// Clocks of a dynamics or encounter law.
	Clocks []Clock
	// Frame says that this law's rate also answers radius, dispersion and
	// stop. Exactly one law of a run, that of process ejection, does.
	Frame bool
	// StopOutcome is the word for those still bound when stop turns 1, and
	// StopFate where they go: FateAdrift, FateCentral or FateGas.
	StopOutcome string
	StopFate    Fate

	// Outcomes of a turning law or of meet.
	Outcomes []Outcome
	// Effect of an ending: "everything-ends", "all-adrift" or
	// "dark-energy-decays". Empty for an ending that never comes.
	Effect string
	// Kinds this law adds to the run.
	Kinds []Kind

	// Idle says that this law never does anything (the law "none" of an
	// optional process): the engine does not ask it.
	Idle bool

	// Tolerance is 0 for a law that gives the same bits on every machine of
	// one architecture, else the relative size of what may differ.
	Tolerance float64
}

// Question is one question a law answers.
type Question struct {
	Name string
	// Inputs are the columns it reads, by their names in the catalogue.
	Inputs []string
	// Words the answer gives chances or shares for: kinds for die, clocks of
	// other laws for divert. Other questions have none. What divert takes
	// falls to the central hole, under the word of the card's outcome at the
	// same index, or "swallowed".
	Words []string
}

// Accepts tells which objects a law speaks for.
type Accepts struct {
	Kinds []string // empty: every kind
	// Column, if not empty, narrows it to Low <= column < High. With an empty
	// bound that side is open. The only columns are mass and metals.
	Column    string
	Low, High Limit
}

// Limit is a number, or a parameter of this law ("m_up") or of another
// process's law ("collapse.m_up"). The zero value is no limit.
type Limit struct {
	Set       bool
	Value     float64
	Parameter string
}

// At is the limit at a number.
func At(value float64) Limit { return Limit{Set: true, Value: value} }

// AtParameter is the limit at a parameter's value.
func AtParameter(name string) Limit { return Limit{Set: true, Parameter: name} }

// Parameter is one adjustable number or word of a law.
type Parameter struct {
	Name string
	Unit string // in VOUnit spelling (yr, solMass, K); empty for a pure number
	Doc  string
	// Low <= value <= High. For a Log10 parameter these, the preset and the
	// value handed to the law are log10 of the quantity in Unit.
	Low, High, Preset float64
	Log10             bool
	Citation          string
	// Words makes it a choice; the value is the index. Low, High unused.
	Words []string
}

// Threshold of a wearing law: at Mass the object becomes something else.
type Threshold struct {
	Kind string
	// Mass in solar masses; or, with Parameter set, that parameter's value;
	// or, with ByWord set as well, ByWord[index of the parameter's word].
	Mass      float64
	Parameter string
	ByWord    []float64
	Becomes   string // a kind, or Gone
	Outcome   string // the word printed for it, such as "dissolved"
}

// Fate is where a clock's firing sends an object.
type Fate string

// The fates. Meet is for encounter clocks only.
const (
	FateAdrift  Fate = "adrift"
	FateCentral Fate = "central"
	FateGas     Fate = "gas"
	FateMeet    Fate = "meet"
)

// Clock is a galaxy-wide running total of a rate. An object with
// susceptibility s is hit with probability s dC while the clock advances dC.
type Clock struct {
	Name    string
	Doc     string
	Outcome string // the word printed for a hit: "ejected"
	Fate    Fate
}

// Outcome is a word that a turning or encounter law may pick.
type Outcome struct {
	Word    string
	Doc     string
	Becomes string // turning: a kind, or Gone
}

// Kind is a kind of object that a law adds.
type Kind struct {
	Name        string
	Doc         string
	Composition uint8
}
