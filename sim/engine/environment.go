package engine

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/law"
)

// Refresh rules of the model.
const (
	moveToRefresh  = 0.01 // relative move of a declared value that calls for new rates
	fewObjects     = 100  // below this many bound, every removal is a refresh
	probeStep      = 0.005
	timeStepInRate = 0.05 // largest change of ln rate through values that move with time alone
	maxTimeMove    = 0.5  // largest relative move of such a value in one window
)

// Slots of the galaxy values in Environment.value.
const (
	slotNumber = iota
	slotMass
	slotCarried
	slotCentral
	slotDate // log10 yr
	slotKinds
)

// Environment holds the galaxy values and, from them, the rates of the clocks.
// Every engine uses this one piecewise law, so they agree to rounding.
//
// Between refreshes the rate of clock k is
//
//	r_k = r_k0 exp( sum_j slope_kj ln(y_j / y_j0) ),  y_j = v_j + a_j
//
// over the declared values v_j. a_j is 0 but for what starts from nothing
// (carried_off), where it is the bound mass at the refresh. Logarithm and
// exponential are the short series in lnNear and expNear: their arguments are
// small, and every engine uses the same ones.
//
// Values that move with time alone (the date, clock readings) stand at the
// expected middle of the window until the next refresh, which comes when the
// rates would have moved by 5 % through them.
type Environment struct {
	m     *Model
	value []float64 // by slot, real units
	lost  []float64 // Neumaier compensation of value

	base   []float64 // y_j0
	offset []float64 // a_j
	seen   []float64 // y_j at the last update, NaN after a refresh
	lny    []float64 // of that
	slope  [][]float64
	rate0  []float64
	Rates  []float64 // now, per yr times 10^unit
	unit   float64   // rates and dates are in units of 10^unit yr

	Radius, Dispersion float64
	Stop               bool
	Refreshes          int

	arena                        law.Arena
	step                         []float64
	frameRadius, frameDispersion []float64
	ask                          []rateAsk
}

// rateAsk is one law with a rate question, and where its answers go.
type rateAsk struct {
	use     *law.Use
	inputs  []valueRef
	columns []law.Column
	first   int // index of its first clock
}

// valueRef tells where a rate's input column comes from: a declared value
// (slot >= 0), a constant of the run, or the frame's radius or dispersion.
type valueRef struct {
	slot     int
	constant float64
	frame    int // 1 radius, 2 dispersion
}

func (m *Model) slots() int { return slotKinds + 2*len(m.Set.Kinds) + 3*len(m.Clocks) }

func (m *Model) slotNumberKind(kind int) int { return slotKinds + kind }
func (m *Model) slotMassKind(kind int) int   { return slotKinds + len(m.Set.Kinds) + kind }
func (m *Model) slotSum(k int) int           { return slotKinds + 2*len(m.Set.Kinds) + k }
func (m *Model) slotSought(k int) int        { return m.slotSum(k) + len(m.Clocks) }
func (m *Model) slotReading(k int) int       { return m.slotSum(k) + 2*len(m.Clocks) }

// resolveValue finds a galaxy value by its column name.
func (m *Model) resolveValue(u *law.Use, name string) (valueRef, error) {
	ref := valueRef{slot: -1}
	clock := func(prefix string) int {
		for i, c := range m.Clocks {
			if prefix+strings.ReplaceAll(c.Name, "-", "_") == name {
				return i
			}
		}
		return -1
	}
	kind := func(prefix string) int {
		for i, k := range m.Set.Kinds {
			if prefix+strings.ReplaceAll(k, "-", "_") == name {
				return i
			}
		}
		return -1
	}
	switch name {
	case "number":
		ref.slot = slotNumber
	case "mass_bound":
		ref.slot = slotMass
	case "carried_off":
		ref.slot = slotCarried
	case "central_mass":
		ref.slot = slotCentral
	case "log10_date":
		ref.slot = slotDate
	case "founded_number":
		ref.constant = m.Real
	case "founded_mass":
		ref.constant = math.NaN() // known once founded
	case "founded_radius":
		ref.constant = m.Radius
	case "founded_dispersion":
		ref.constant = math.NaN()
	case "galaxy_radius":
		ref.frame = 1
	case "galaxy_dispersion":
		ref.frame = 2
	default:
		if i := kind("number_"); i >= 0 {
			ref.slot = m.slotNumberKind(i)
		} else if i := kind("mass_bound_"); i >= 0 {
			ref.slot = m.slotMassKind(i)
		} else if i := clock("sum_sought_"); i >= 0 {
			ref.slot = m.slotSought(i)
		} else if i := clock("sum_"); i >= 0 {
			ref.slot = m.slotSum(i)
		} else if i := clock("reading_"); i >= 0 {
			ref.slot = m.slotReading(i)
		} else {
			return ref, fmt.Errorf("engine: law %s: question rate: no galaxy value %q in this run", u.ID(), name)
		}
	}
	if ref.frame != 0 && u.Card.Frame {
		return ref, fmt.Errorf("engine: law %s: question rate: %s is its own answer", u.ID(), name)
	}
	return ref, nil
}

// movesWithTime tells whether a slot changes between events.
func (m *Model) movesWithTime(slot int) bool {
	return slot == slotDate || slot >= m.slotReading(0)
}

// NewEnvironment prepares galaxy values for one worker.
func (m *Model) NewEnvironment() *Environment {
	e := &Environment{m: m}
	n, k, j := m.slots(), len(m.Clocks), len(m.declared)
	e.value, e.lost = make([]float64, n), make([]float64, n)
	e.base, e.offset = make([]float64, j), make([]float64, j)
	e.seen, e.lny = make([]float64, j), make([]float64, j)
	e.rate0, e.Rates = make([]float64, k), make([]float64, k)
	e.step = make([]float64, j+1)
	e.slope = make([][]float64, k)
	for i := range e.slope {
		e.slope[i] = make([]float64, j)
	}
	for _, a := range m.rateAsks {
		b := a
		b.columns = make([]law.Column, len(a.inputs))
		for i, q := range inputsOf(a.use, "rate") {
			b.columns[i] = law.Numbers(q, make([]float64, j+1))
		}
		e.ask = append(e.ask, b)
	}
	return e
}

// Reset empties the galaxy; foundedMass is filled into the laws' constants.
func (e *Environment) Reset() {
	clear(e.value)
	clear(e.lost)
	e.unit, e.Stop, e.Refreshes = 0, false, 0
}

// Founded tells the laws the mass and dispersion the galaxy started with.
func (e *Environment) Founded(mass float64) {
	// BT08: v^2 = 0.4 G M / R for the three-dimensional dispersion.
	v := math.Sqrt(0.4 * gravityInGalaxy * mass / e.m.Radius)
	for i := range e.ask {
		for j, name := range inputsOf(e.ask[i].use, "rate") {
			switch name {
			case "founded_mass":
				fill(e.ask[i].columns[j].Values, mass)
			case "founded_dispersion":
				fill(e.ask[i].columns[j].Values, v)
			}
		}
	}
}

// gravityInGalaxy is G in pc (km/s)^2 / Msun: nominal GM_sun (IAU 2015 B3)
// over the parsec.
const gravityInGalaxy = 1.3271244e20 / 3.085677581491367e16 / 1e6

func fill(dst []float64, v float64) {
	for i := range dst {
		dst[i] = v
	}
}

// Add changes a value by d, compensated so that no rounding gathers.
func (e *Environment) add(slot int, d float64) {
	v := e.value[slot]
	s := v + d
	if math.Abs(v) >= math.Abs(d) {
		e.lost[slot] += (v - s) + d
	} else {
		e.lost[slot] += (d - s) + v
	}
	e.value[slot] = s
}

func (e *Environment) get(slot int) float64 { return e.value[slot] + e.lost[slot] }

// Moved tells whether a declared value has moved by 1 % since the last refresh.
func (e *Environment) moved() bool {
	for j, slot := range e.m.declared {
		if e.m.timed[j] {
			continue
		}
		y := e.get(slot) + e.offset[j]
		if d := math.Abs(y - e.base[j]); d > moveToRefresh*e.base[j] {
			return true
		}
	}
	return false
}

// Update sets Rates from the present values by the local power law.
func (e *Environment) update() {
	n, lny := len(e.m.declared), e.lny
	for j, slot := range e.m.declared {
		if !e.m.timed[j] && e.base[j] > 0 {
			if y := e.get(slot) + e.offset[j]; y != e.seen[j] {
				e.seen[j], lny[j] = y, lnNear((y-e.base[j])/e.base[j])
			}
		}
	}
	for k, s := range e.slope {
		x := 0.0
		for j := range n {
			x += float64(s[j] * lny[j])
		}
		e.Rates[k] = e.rate0[k] * expNear(x)
	}
}
