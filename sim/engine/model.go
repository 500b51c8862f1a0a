package engine

import (
	"errors"
	"fmt"
	"math"

	"wane/sim/draw"
	"wane/sim/galaxy"
	"wane/sim/law"
)

// Setup is everything a run needs.
type Setup struct {
	Set         *law.Set
	Sky         Skies   // nil: no sky (nothing warms, nothing ends)
	Objects     int     // simulated
	Real        float64 // real objects they stand for; equal to Objects: whole
	Radius      float64 // pc, half-mass radius at the start
	CentralMass float64 // solMass
	Until       float64 // log10 yr; +Inf: never
	Seed        uint64
	Populations []galaxy.Population
}

// Skies draws the sky of one realisation.
type Skies interface {
	Draw(seed, realisation uint64) (Sky, error)
}

// Sky is what the engine asks of the background.
type Sky interface {
	LogTemperature(log10Date float64) float64        // log10 K
	LogColderSince(log10Temperature float64) float64 // log10 date; +Inf never, -Inf always
	End() (log10Date float64, cause string)          // +Inf: none
	Adrift() float64                                 // log10 date, +Inf: none
}

// Model is a compiled Setup: laws sorted by role, clocks numbered, causes
// listed. It is read-only and shared by all workers.
type Model struct {
	Setup
	Weight float64 // real objects per simulated one
	Clocks []Clock
	Causes []Cause // by code; code 0 is none

	mass, birth, metals, sort, live *law.Use
	ends                            []*law.Use // answer die and remain
	exposing                        []exposer
	diverts                         []diverter
	wearing, turning                []*law.Use
	soonest                         []float64    // by turning law: log10 of its shortest wait, -Inf if unknown
	turns                           [256]float64 // by kind: the shortest of those that speak for it, +Inf: none does
	encounter                       *law.Use
	cooling                         []*law.Use
	warm                            *law.Use
	frame                           *law.Use
	rateAsks                        []rateAsk
	declared                        []int  // slots the rates depend on
	timed                           []bool // per declared: moves with time alone
	timedSlots                      []int
	sums, soughts                   []bool // per clock: the sum of that is declared
	kindsCount                      bool   // a value of one kind is declared
	simple                          bool
	wornBy                          [256]int8 // by kind: the wearing law, -1: none; good in a simple run
	wornInPart                      bool      // a law speaks for part of a kind only
	stagesDraw                      bool      // a law of what objects become reads a draw
	batch, rounds                   int       // rows to ask about at a time; where questions come in rounds
	coolsByMetals                   bool
	voices                          map[*law.Use]*voice
	made                            [256]uint8 // by kind: composition of those that laws add, law.NoWord of others
	deathsMatter                    bool       // a declared value changes when a star dies
	stopFate                        law.Fate
	stopCause, allAdrift            uint8
	oneFate                         bool // a cause of leaving sends objects one way only
	populations                     []population
	anyState                        population    // every object
	anyWarm                         bool          // some population has a condition on warmth
	thresholds                      [][]threshold // [wearing law][kind]: mass, becomes, cause
	causeOf                         map[Cause]uint8
}

// Clock is a clock of the run.
type Clock struct {
	law.Clock
	Process string
	use     *law.Use
	index   int // within its law
	cause   uint8
}

// Cause is why an object left: the process and its word.
type Cause struct{ Process, Outcome string }

type exposer struct {
	use   *law.Use
	first int // index of its first clock
}

type diverter struct {
	use    *law.Use
	clock  int // whose firing it takes
	column int // in its answer
	cause  uint8
}

type threshold struct {
	mass    float64
	kind    uint8 // becomes; law.NoWord: gone
	cause   uint8
	applies bool
}

// Compile sorts a setup's laws by role and checks that the engine can run it.
func Compile(s Setup) (*Model, error) {
	if s.Objects < 0 || s.Objects > maxObjects {
		return nil, fmt.Errorf("engine: %d objects: want 0 .. %d", s.Objects, maxObjects)
	}
	m := &Model{Setup: s, Causes: []Cause{{}}, causeOf: map[Cause]uint8{}, Weight: 1}
	if s.Objects > 0 {
		m.Weight = s.Real / float64(s.Objects)
	}
	of := func(p string) *law.Use { return s.Set.Of(p) }
	m.mass, m.birth, m.metals, m.sort = of("mass-function"), of("star-formation"), of("metals"), of("substellar-limit")
	m.live, m.warm = of("lifetime"), active(of("warmth"))
	for _, need := range []struct {
		use  *law.Use
		name string
	}{{m.mass, "mass-function"}, {m.birth, "star-formation"}, {m.metals, "metals"}, {m.sort, "substellar-limit"}, {m.live, "lifetime"}} {
		if need.use == nil {
			return nil, fmt.Errorf("engine: no law of process %s", need.name)
		}
	}
	for _, u := range s.Set.OfRole(law.Stellar) {
		if u.Card.Answers("die") {
			m.ends = append(m.ends, u)
		}
	}
	m.wearing = actives(s.Set.OfRole(law.Wearing))
	m.turning = actives(s.Set.OfRole(law.Turning))
	m.cooling = actives(s.Set.OfRole(law.Cooling))
	m.compileBatch()
	m.compileCauses()
	m.compileSimple()
	m.compileTurning()
	m.compileMade()
	m.compileVoices()
	return m, errors.Join(m.compileClocks(), m.compileThresholds(), m.compilePopulations())
}

// maxObjects is the most the individuals engine holds.
const maxObjects = 1 << 26

func active(u *law.Use) *law.Use {
	if u == nil || u.Card.Idle {
		return nil
	}
	return u
}

func actives(uses []*law.Use) []*law.Use {
	var out []*law.Use
	for _, u := range uses {
		if !u.Card.Idle {
			out = append(out, u)
		}
	}
	return out
}

// cause returns the code of a cause, listing it when it is new.
func (m *Model) cause(process, outcome string) uint8 {
	c := Cause{process, outcome}
	if code, ok := m.causeOf[c]; ok {
		return code
	}
	code := uint8(len(m.Causes))
	m.Causes = append(m.Causes, c)
	m.causeOf[c] = code
	return code
}

func inputsOf(u *law.Use, question string) []string {
	for _, q := range u.Card.Questions {
		if q.Name == question {
			return q.Inputs
		}
	}
	return nil
}

func wordsOf(u *law.Use, question string) []string {
	for _, q := range u.Card.Questions {
		if q.Name == question {
			return q.Words
		}
	}
	return nil
}

// stream is the stream of draws of a process in one realisation.
func (m *Model) stream(realisation uint64, process string) draw.Stream {
	return draw.New(m.Seed, realisation, process)
}

var never = math.Inf(1)
