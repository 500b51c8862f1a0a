package engine

import (
	"wane/sim/law"
	"wane/sim/num"
)

// What follows is how another engine uses the one piecewise law of rates.

// Slot returns the place of a galaxy value, by its name in the catalogue of
// columns; ok is false when this run has no such value, or when it is a
// constant of the run.
func (m *Model) Slot(name string) (slot int, ok bool) {
	ref, err := m.resolveValue(&law.Use{}, name)
	return ref.slot, err == nil && ref.slot >= 0
}

// Add changes a galaxy value (real units) by d, without gathering rounding.
func (e *Environment) Add(slot int, d float64) { e.add(slot, d) }

// Refresh asks every rate anew at the present values. date is in the present
// unit of time; readings are the clocks'. It returns how long the new rates
// may stand before values that move with time alone call for another refresh
// (+Inf if there are none).
func (e *Environment) Refresh(date float64, readings []float64) (float64, error) {
	return e.refresh(date, readings)
}

// Moved tells whether a declared value has moved by 1 % since the last refresh.
func (e *Environment) Moved() bool { return e.moved() }

// Update sets Rates from the present values by the local power law.
func (e *Environment) Update() { e.update() }

// Coarsen makes the unit of time 10^decades longer.
func (e *Environment) Coarsen(decades float64) {
	e.unit += decades
	f := num.Exp10(decades)
	for k := range e.Rates {
		e.Rates[k] *= f
		e.rate0[k] *= f
	}
}

// Unit is log10 of the unit of time in years.
func (e *Environment) Unit() float64 { return e.unit }
