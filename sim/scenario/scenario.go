package scenario

import (
	"wane/sim/galaxy"
)

// Scenario is one galaxy under one set of laws: what a run needs to know.
type Scenario struct {
	Name     string   // of the file, without .toml
	Title    string   // may be empty
	Question string   // what it answers; may be empty
	Base     []string // the scenarios it starts from, nearest first

	Objects      float64 // of the real galaxy
	Sample       int64   // objects held one by one for all; 0: each is itself
	Radius       float64 // pc, holds half the mass at the start
	CentralMass  float64 // solMass, of the central hole at the start; 0: none
	Realisations int
	Seed         uint64
	Until        float64 // log10 of years since the Big Bang; +Inf: never

	// Laws names the law of each process; "none" where a process that a run
	// may do without has none.
	Laws map[string]string
	// Outside holds those of Laws that are not built in; nil if all are.
	Outside map[string]Outside
	// Parameters holds every parameter of every law in use, preset or set, as
	// it is handed to the law: log10 where the card says so, an index for a word.
	Parameters map[string]map[string]float64
	// Populations holds those that every run counts, then the scenario's own.
	Populations []galaxy.Population

	// Digest is the SHA-256, in hexadecimal, of [Scenario.Text].
	Digest string

	versions map[string]string // of each law in use
	own      int               // how many of Populations are the scenario's own
	from     map[string]string // where each setting comes from; absent: preset
	canon    string
}

// Held is how many objects are simulated: the sample, or all.
func (s *Scenario) Held() int64 {
	if s.Sample > 0 {
		return s.Sample
	}
	return int64(s.Objects)
}

// Weight is how many real objects each simulated one stands for.
func (s *Scenario) Weight() float64 { return s.Objects / float64(s.Held()) }

// Overrides are settings of the command line. They come after those of the
// file; the zero value changes nothing.
type Overrides struct {
	Laws         []string // "process=name", "process=./path"
	Sets         []string // "process.parameter=value", "galaxy.radius=8kpc"
	Realisations int      // 0: as the scenario says
	Objects      int64    // objects to simulate, the sample; 0: as the scenario says
	Seed         *uint64
	Until        string // a date or "never"; empty: as the scenario says

	// Outside is the laws of [Paths], opened, or why not. The registry must hold
	// those that are opened.
	Outside []Outside
}
